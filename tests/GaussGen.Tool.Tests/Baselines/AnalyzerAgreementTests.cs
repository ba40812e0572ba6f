extern alias generator;

using System;
using System.Collections.Immutable;
using System.Linq;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Tests.Fixtures;
using generator::GaussGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Text;
using Xunit;

namespace GaussGen.Tool.Tests.Baselines;

/// <summary>
/// The analyzer knows tables by their declarations and the tool by what was compiled: a baseline that the tool writes is one with
/// which the analyzer agrees, to the last digit.
/// </summary>
public sealed class AnalyzerAgreementTests : IDisposable
{
    // Beside the usual ones: zeros that stay, a mean of −0, names that need an escape, and constants of the user's that look like a
    // table's and are of none.
    private const string Corners = """
        using GaussGen;
        [GaussHermite(70, Format = NumberFormat.Binary32)] public static partial class Kept { }
        [GaussHermite(390, Convention = HermiteConvention.Physicist, DropZeroWeights = true)] public static partial class Far { }
        [NormalMoments(-0.0, 1e-3, MaximumOrder = 40)] public static partial class Still { public const double Raw41 = 1; public const double Raw00 = 2; }
        [GaussHermite(3)] public static partial class Lead { public const double Nodes0 = 5; public const int Weights1 = 6; public const double NormalizingIntegral = 7; public const double ErrorFactor = 8; }
        namespace @namespace.Größe { partial struct @struct { partial record Log { [GaussHermite(2)] partial class \u0041line { } } } }
        """;

    private readonly Folder _folder = new();

    [Theory]
    [InlineData(Sources.Small, 14)]
    [InlineData(Sources.Families, 24)]
    [InlineData(Sources.Large, 5)]
    [InlineData(Corners, 5)]
    public async Task The_analyzer_agrees_with_what_the_tool_writes_and_notices_each_changed_digit(string source, int tables)
    {
        string file = _folder.Below("gaussgen.baseline");
        Run run = await CommandLine.RunAsync("baseline", "write", _folder.Add("Boat.dll", FixtureCompiler.Generate(source)), "--file", file);
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        string baseline = await System.IO.File.ReadAllTextAsync(file);
        Assert.Empty(await WarningsAsync(source, baseline));

        string[] lines = baseline.TrimEnd().Split('\n');
        Assert.Equal(tables, lines.Length - 1);
        for (int i = 1; i < lines.Length; i++)
        {
            string line = lines[i];
            char last = line[^1] == '0' ? '1' : '0';
            string changed = string.Join('\n', lines[..i].Append(line[..^1] + last).Concat(lines[(i + 1)..]));
            string warning = Assert.Single(await WarningsAsync(source, changed));
            string name = line.Split(" | ")[1].Split('.')[^1];
            Assert.StartsWith("GAUSS014: Review the table of '", warning, StringComparison.Ordinal);
            Assert.Contains($"{name}' and renew gaussgen.baseline", warning, StringComparison.Ordinal);
            Assert.Contains(": data sha256:", warning, StringComparison.Ordinal);
        }

        string without = string.Join('\n', lines[..^1]);
        Assert.EndsWith(": the table is not in it", Assert.Single(await WarningsAsync(source, without)), StringComparison.Ordinal);
    }

    public void Dispose() => _folder.Dispose();

    private static async Task<string[]> WarningsAsync(string source, string baseline)
    {
        Compilation compilation = FixtureCompiler.CreateCompilation(
            Framework.Net8, OptimizationLevel.Release, "Boat", [source], [FixtureCompiler.OwnLibrary(Framework.Net8)]);
        ImmutableArray<Diagnostic> diagnostics = await compilation
            .WithAnalyzers([new DeclarationAnalyzer()], new AnalyzerOptions([new Text("/boat/gaussgen.baseline", baseline)]))
            .GetAnalyzerDiagnosticsAsync(CancellationToken.None);
        return [.. diagnostics
            .Where(each => each.Id != "GAUSS012")
            .Select(each => $"{each.Id}: {each.GetMessage(System.Globalization.CultureInfo.InvariantCulture)}")];
    }

    private sealed class Text(string path, string text) : AdditionalText
    {
        private readonly SourceText _text = SourceText.From(text, Encoding.UTF8);

        public override string Path { get; } = path;

        public override SourceText GetText(CancellationToken cancellationToken = default) => _text;
    }
}
