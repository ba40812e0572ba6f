using System;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Diagnostics;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;
using Xunit;
using Convention = GaussGen.Mathematics.Rules.HermiteConvention;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Numbers that a format cannot hold: too small ones are a warning, too large ones a mistake.</summary>
public sealed class RangeTests
{
    [Theory]
    [InlineData("{|GAUSS012:500|}")]
    [InlineData("Format = NumberFormat.Binary32, points: {|GAUSS012:100|}")]
    [InlineData("{|GAUSS012:1000|}, Convention = HermiteConvention.Physicist, DropZeroWeights = false")]
    [InlineData("1000, DropZeroWeights = true")]
    [InlineData("300")]
    public Task Weights_that_round_to_zero_are_told_at_the_number_of_points(string arguments)
    {
        // A named argument of the constructor stands before the settings.
        string[] parts = arguments.Split(", ");
        string ordered = string.Join(", ", parts.OrderBy(part => part.Contains(" = ", StringComparison.Ordinal)));
        return DeclarationTest.Report(
            $$"""
            using GaussGen;

            [GaussHermite({{ordered}})]
            internal static partial class Wide
            {
                internal static double Of() => Expectation(1, 2, x => x) + Nodes[PointCount - 1];
            }
            """);
    }

    [Theory]
    [InlineData(500, NumberFormat.Binary64)]
    [InlineData(100, NumberFormat.Binary32)]
    public async Task The_warning_says_how_many_and_from_where(int points, NumberFormat format)
    {
        BinaryFormat binary = Bits.FormatOf(format);
        RoundedRule rule = TableMemo.Get(new GaussHermiteRequest(points, Convention.Probabilist, binary, false), CancellationToken.None);
        RoundedValue innermost = rule.Nodes
            .Zip(rule.Weights, (node, weight) => (Node: node, Weight: weight))
            .First(pair => pair.Weight.Bits == 0 && !binary.IsNegative(pair.Node.Bits))
            .Node;

        Diagnostic only = Assert.Single(await Analyze($"[GaussHermite({points}, Format = NumberFormat.{format})] static partial class Wide {{ }}"));

        Assert.Equal(DiagnosticSeverity.Error, only.Severity); // as the project treats warnings
        Assert.Equal(DiagnosticSeverity.Warning, only.DefaultSeverity);
        Assert.StartsWith(
            $"{rule.Weights.Count(weight => weight.Bits == 0)} of the {points} weights round to zero in {binary.Name}, those of nodes of magnitude "
                + ShortestDecimal.Write(innermost.Bits, binary),
            only.GetMessage(CultureInfo.InvariantCulture),
            StringComparison.Ordinal);
        Assert.Contains("DropZeroWeights = true", only.GetMessage(CultureInfo.InvariantCulture), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("NormalMoments(0, 1, MaximumOrder = 200)", null)]
    [InlineData("NormalMoments(0, 1e100)", 4)]
    [InlineData("NormalMoments(1e200, 1, MaximumOrder = 1)", null)]
    [InlineData("NormalMoments(1e200, 1, MaximumOrder = 9)", 2)]
    [InlineData("NormalMoments(0, 1, MaximumOrder = 200, Format = NumberFormat.Binary32)", 58)] // 57!! is 4.9e38
    [InlineData("NormalMoments(1e39, 1, Format = NumberFormat.Binary32)", 1)]
    public async Task The_mistake_says_the_first_order_that_is_too_large(string attribute, int? order)
    {
        ImmutableArray<Diagnostic> diagnostics = await Analyze($"[{attribute}] static partial class Noise {{ }}");

        Assert.Equal(order is null ? 0 : 1, diagnostics.Length);
        Assert.All(diagnostics, diagnostic =>
        {
            Assert.Equal("GAUSS011", diagnostic.Id);
            string message = diagnostic.GetMessage(CultureInfo.InvariantCulture);
            Assert.Contains($"the moment of order {order} is too large", message, StringComparison.Ordinal);
            Assert.Contains($"Set MaximumOrder to {order - 1} at most", message, StringComparison.Ordinal);
        });
    }

    [Fact]
    public async Task A_pragma_or_an_attribute_silences_the_warning()
    {
        Assert.Empty(await Analyze(
            "#pragma warning disable GAUSS012 // measured at the bench\n[GaussHermite(500)] static partial class Wide { }"));
        Assert.Empty(await Analyze(
            "[System.Diagnostics.CodeAnalysis.SuppressMessage(\"Range\", \"GAUSS012\")] [GaussHermite(500)] static partial class Wide { }"));
    }

    [Fact]
    public async Task Cancelling_ends_the_work()
    {
        Outcome outcome = new Consumer("using GaussGen; [GaussHermite(5)] static partial class Echo { }").Run();
        using CancellationTokenSource source = new();
        await source.CancelAsync();

        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => outcome.Compilation
            .WithAnalyzers([new DeclarationAnalyzer()])
            .GetAnalyzerDiagnosticsAsync(source.Token));
    }

    private static Task<ImmutableArray<Diagnostic>> Analyze(string declaration)
    {
        string source = declaration.StartsWith('#') ? declaration.Insert(declaration.IndexOf('\n', StringComparison.Ordinal) + 1, "using GaussGen;\n") : "using GaussGen;\n" + declaration;
        return new Consumer(source).Run().AnalyzerDiagnostics();
    }
}
