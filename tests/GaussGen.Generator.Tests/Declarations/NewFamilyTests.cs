using System;
using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Diagnostics;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Generator.Tests.Declarations;

/// <summary>
/// A family that the generator does not have, added by one line in the table: a rule on an interval, whose weight has no free
/// location and whose nodes are not symmetric. Nothing in emission or analysis knows it.
/// </summary>
public sealed class NewFamilyTests
{
    private const string Attribute =
        """
        namespace GaussGen
        {
            [System.AttributeUsage(System.AttributeTargets.Class | System.AttributeTargets.Struct)]
            internal sealed class RadauAttribute : System.Attribute
            {
                internal RadauAttribute(int points) => Points = points;
                internal int Points { get; }
                public int Format { get; set; }
            }
        }
        """;

    private static readonly ImmutableArray<Family> Families = DeclarationTable.Families.Add(
        Family.OfRules("Radau", read => new RadauRequest(read.Points(most: 2), BinaryFormat.Binary64)));

    [Fact]
    public async Task One_line_in_the_table_is_all_it_takes()
    {
        Outcome outcome = new Consumer(
            Attribute,
            """
            using GaussGen;

            [Radau(2)]
            internal static partial class Drag { }

            public static class Probe
            {
                public static double[] Nodes() => Drag.Nodes.ToArray();
                public static double OfFunction() => Drag.Expectation(x => x * x);
                public static double OfStruct() => Drag.Expectation(new Square());
            }

            public struct Square : IIntegrand<double>
            {
                public double Evaluate(double x) => x * x;
            }
            """).Run(new TableGenerator(Families));

        Assert.Empty(outcome.CompilerDiagnostics);
        Assert.Empty(await outcome.AnalyzerDiagnostics(new DeclarationAnalyzer(Families)));
        Assert.Equal(["Drag.Radau.g.cs"], outcome.Texts.Keys);
        Assert.Contains("Two-point rule with 2 nodes for the uniform density on 0 &lt; x &lt; 1.", outcome.Text, StringComparison.Ordinal);
        Assert.Contains("every value is known exactly", outcome.Text, StringComparison.Ordinal);
        using LoadedAssembly loaded = new(outcome.Emit());
        Assert.Equal([0.0, 2.0 / 3], loaded.Call<double[]>("Probe", "Nodes"));
        Assert.Equal(1.0 / 3, loaded.Call<double>("Probe", "OfFunction"), 1e-15);
        Assert.Equal(loaded.Call<double>("Probe", "OfFunction"), loaded.Call<double>("Probe", "OfStruct"));
    }

    [Fact]
    public async Task Its_range_is_checked_like_that_of_any_other()
    {
        Outcome outcome = new Consumer(
            Attribute,
            """
            [GaussGen.Radau(3)]
            internal static partial class Drag
            {
                internal static double Of() => Expectation(x => x) + Nodes[PointCount - 1];
            }
            """).Run(new TableGenerator(Families));

        Assert.Empty(outcome.CompilerDiagnostics);
        Diagnostic only = Assert.Single(await outcome.AnalyzerDiagnostics(new DeclarationAnalyzer(Families)));
        Assert.Equal("GAUSS004", only.Id);
        Assert.Equal("Ask for 1 to 2 points instead of 3", only.GetMessage(null));
    }

    [Theory]
    [InlineData("[Radau(2), GaussHermite(5)]", "GaussHermite(5)", "Move [GaussHermite] to a type of its own: [Radau] already gives 'Drag' members of the same names")]
    [InlineData("[GaussHermite(5)] [Radau(2)]", "Radau(2)", "Move [Radau] to a type of its own: [GaussHermite] already gives 'Drag' members of the same names")]
    [InlineData("[GaussHermite(5), NormalMoments(0, 1), Radau(2)]", "Radau(2)", "Move [Radau] to a type of its own: [GaussHermite] already gives 'Drag' members of the same names")]
    public async Task Two_rules_on_one_type_are_told_once_at_the_second(string attributes, string place, string message)
    {
        Outcome outcome = new Consumer(
            Attribute,
            $$"""
            using GaussGen;

            {{attributes}}
            internal static partial class Drag
            {
                internal static double Of() => Expectation(1.0, 2.0, x => x) + Nodes[PointCount - 1];
            }
            """).Run(new TableGenerator(Families));

        Assert.Empty(outcome.CompilerDiagnostics);
        Diagnostic only = Assert.Single(await outcome.AnalyzerDiagnostics(new DeclarationAnalyzer(Families)));
        Assert.Equal("GAUSS005", only.Id);
        Assert.Equal(message, only.GetMessage(null));
        Assert.Equal(place, only.Location.SourceTree!.GetText().ToString(only.Location.SourceSpan));
    }

    /// <summary>
    /// Radau's rules with one and two nodes, the first at 0, for the uniform density on (0, 1): 0 with weight 1; 0 and 2/3 with
    /// weights 1/4 and 3/4 (NIST DLMF 3.5(v), carried from (−1, 1)).
    /// </summary>
    private sealed record RadauRequest(int Points, BinaryFormat Format) : RuleRequest(Format, DropZeroWeights: false)
    {
        public override RuleTable Construct(CancellationToken cancellation)
        {
            Rational[] nodes = [Rational.Zero, new(2, 3)];
            Rational[] weights = Points == 1 ? [Rational.One] : [new(1, 4), new(3, 4)];
            return new RuleTable(
                new RuleDescription("Two-point rule", "the uniform density on 0 < x < 1", "0 and 2/3", "solved by hand", "NIST DLMF 3.5(v)"),
                nodes.Take(Points).Select(RealNumber.Exact).ToArray(),
                weights.Select(RealNumber.Exact).ToArray(),
                DegreeOfExactness: (2 * Points) - 2,
                IsSymmetric: false,
                LocationScale: null);
        }
    }
}
