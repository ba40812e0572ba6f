using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;
using Xunit.Abstractions;

namespace GaussGen.Generator.Tests.Fuzz;

/// <summary>Ten thousand random attributes: no crash, and a table, or a stand-in and a reason.</summary>
public sealed class ArgumentListTests(ITestOutputHelper output)
{
    private const int Batches = 100;
    private const int BatchSize = 100;

    private const string Known =
        """
        internal static class Known
        {
            internal const int Five = 5;
            internal const double Half = 0.5;
            internal static readonly int NoConstant = 5;
        }
        """;

    [Fact]
    public async Task Any_arguments_give_a_table_or_a_stand_in_and_a_reason()
    {
        output.WriteLine($"GAUSSGEN_SEED={FuzzSeed.Value}");
        ArgumentListSource source = new(new Random(FuzzSeed.Value));
        int tables = 0;
        for (int batch = 0; batch < Batches; batch++)
        {
            string[] attributes = Enumerable.Range(0, BatchSize).Select(_ => source.Next()).ToArray();
            Consumer consumer = new(attributes.Select(Source).Prepend(Known).ToArray());
            Outcome outcome = consumer.Run();
            Assert.Null(outcome.Result.Results.Single().Exception);
            Assert.Empty(outcome.GeneratorDiagnostics);
            tables += await CheckReasons(attributes, outcome, consumer.Compile());
            if (batch % 10 == 0)
            {
                CheckUses(outcome);
            }
        }

        // Both kinds are well represented.
        output.WriteLine($"{tables} tables");
        Assert.InRange(tables, Batches * BatchSize / 10, Batches * BatchSize * 9 / 10);
    }

    /// <summary>
    /// A stand-in has a reason, told by compiler or analyzer, and a table has none that the analyzer tells. Returns how many
    /// tables there are. What is asked is the compilation before generation, which is far smaller.
    /// </summary>
    private static async Task<int> CheckReasons(string[] attributes, Outcome outcome, CSharpCompilation declared)
    {
        ILookup<string, Diagnostic> analyzed = ByFile(await (outcome with { Compilation = declared }).AnalyzerDiagnosticsOrThrow());
        ILookup<string, Diagnostic> compiled = ByFile(declared.GetDiagnostics());
        int tables = 0;
        for (int i = 0; i < attributes.Length; i++)
        {
            string file = $"Source{i + 1}.cs";
            bool isStandIn = outcome.Texts
                .Single(each => each.Key.StartsWith($"Echo{i}.", StringComparison.Ordinal))
                .Value.Contains("stand-in", StringComparison.Ordinal);
            Diagnostic[] mistakes = analyzed[file].Where(each => each.Id != "GAUSS012").ToArray();
            Diagnostic[] refusals = compiled[file].Where(IsErrorInAttribute).ToArray();

            // What the compiler refuses may leave a table: an unknown setting beside known ones, say.
            Assert.True(
                isStandIn ? mistakes.Length + refusals.Length > 0 : mistakes.Length == 0,
                $"[{attributes[i]}] is {(isStandIn ? "a stand-in" : "a table")}; {string.Join("; ", mistakes.Concat(refusals))}");
            tables += isStandIn ? 0 : 1;
        }

        return tables;
    }

    /// <summary>Whatever the attributes say, the code that uses the members compiles.</summary>
    private static void CheckUses(Outcome outcome) => Assert.Empty(outcome.Compilation
        .GetDiagnostics()
        .Where(diagnostic => diagnostic.Severity == DiagnosticSeverity.Error && !IsErrorInAttribute(diagnostic)));

    private static bool IsErrorInAttribute(Diagnostic diagnostic) =>
        diagnostic.Severity == DiagnosticSeverity.Error && diagnostic.Location.GetLineSpan() is { Path: var path, StartLinePosition.Line: 1 }
        && path.StartsWith("Source", StringComparison.Ordinal);

    private static string Source(string attribute, int index)
    {
        string use = attribute.StartsWith("Gauss", StringComparison.Ordinal) || attribute.StartsWith("Nested", StringComparison.Ordinal) ? "Nodes.Length + Weights.Length + PointCount + DegreeOfExactness"
            : attribute.StartsWith("HalfInteger", StringComparison.Ordinal) ? "Gamma.Length + Reciprocal.Length"
            : attribute.StartsWith("Oscillator", StringComparison.Ordinal) ? "Elements.Length"
            : "Raw.Length + Central.Length + Absolute.Length + (int)Raw0";
        return string.Create(CultureInfo.InvariantCulture, $"using GaussGen;\n[{attribute}]\ninternal static partial class Echo{index} {{ internal static int Use() => {use}; }}\n");
    }

    private static ILookup<string, Diagnostic> ByFile(IEnumerable<Diagnostic> diagnostics) =>
        diagnostics.ToLookup(diagnostic => diagnostic.Location.SourceTree?.FilePath ?? string.Empty);
}
