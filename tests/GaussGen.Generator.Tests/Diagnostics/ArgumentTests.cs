using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Arguments with a mistake: told at the argument, once, while all uses of the members compile.</summary>
public sealed class ArgumentTests
{
    [Theory]
    [InlineData("{|GAUSS004:0|}")]
    [InlineData("{|GAUSS004:-3|}")]
    [InlineData("{|GAUSS004:1001|}")]
    [InlineData("{|GAUSS004:int.MinValue|}")]
    [InlineData("{|GAUSS004:int.MaxValue|}")]
    [InlineData("points: {|GAUSS004:500 + 501|}")]
    [InlineData("5, Convention = {|GAUSS010:(HermiteConvention)2|}")]
    [InlineData("5, Convention = {|GAUSS010:(HermiteConvention)(-1)|}")]
    [InlineData("5, DropZeroWeights = true, Format = {|GAUSS010:(NumberFormat)9|}")]
    [InlineData("{|GAUSS004:0|}, Convention = {|GAUSS010:(HermiteConvention)7|}")]
    public Task A_rule(string arguments) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [GaussHermite({{arguments}})]
        internal static partial class Echo { }

        internal readonly struct Square : IIntegrand<double>
        {
            public double Evaluate(double x) => x * x;
        }

        internal static class Use
        {
            internal const int Share = 100 / Echo.PointCount + Echo.DegreeOfExactness;

            internal static double Of() => Echo.Expectation(1, 2, x => x) + Echo.Expectation(1, 2, new Square())
                + Echo.Integral(x => x) + Echo.Integral(new Square()) + Echo.Nodes[0] + Echo.Weights.Length;
        }
        """);

    [Theory]
    [InlineData("{|GAUSS007:double.NaN|}, 1")]
    [InlineData("{|GAUSS007:double.PositiveInfinity|}, 1")]
    [InlineData("standardDeviation: 1, mean: {|GAUSS007:-1 / 0.0|}")]
    [InlineData("0, {|GAUSS008:0|}")]
    [InlineData("0, {|GAUSS008:-0.0|}")]
    [InlineData("0, {|GAUSS008:-2.5|}")]
    [InlineData("0, {|GAUSS008:double.NaN|}")]
    [InlineData("0, {|GAUSS008:double.PositiveInfinity|}")]
    [InlineData("{|GAUSS007:double.NaN|}, {|GAUSS008:-1|}")]
    [InlineData("0, 1, MaximumOrder = {|GAUSS009:201|}")]
    [InlineData("0, 1, Format = {|GAUSS010:(NumberFormat)(-1)|}")]
    [InlineData("1e300, 1, Format = NumberFormat.Binary32, MaximumOrder = {|GAUSS011:5|}")]
    [InlineData("0, 1e200, MaximumOrder = {|GAUSS011:4|}")]
    public Task Moments(string arguments) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [NormalMoments({{arguments}})]
        internal static partial class Noise { }

        internal static class Use
        {
            internal static double Of() => Noise.Raw[1] + Noise.Central.Length + Noise.Absolute[2] + Noise.Raw4 + Noise.Central0 + 1 / Noise.Absolute3;
        }
        """);

    [Fact]
    public Task An_order_below_zero() => DeclarationTest.Report(
        """
        using GaussGen;

        [NormalMoments(0, 1, MaximumOrder = {|GAUSS009:-1|})]
        internal static partial class Noise { }
        """);

    [Fact]
    public Task A_moment_that_overflows_at_an_order_that_the_source_does_not_name_is_told_at_the_attribute() => DeclarationTest.Report(
        """
        using GaussGen;

        [{|GAUSS011:NormalMoments(0, 1e100)|}]
        internal static partial class Noise { }

        internal static class Use
        {
            internal static double Of() => Noise.Raw4;
        }
        """);

    [Theory]
    [InlineData("\"five\"", "\"five\"", "CS1503")]
    [InlineData("", "GaussHermite()", "CS7036")]
    [InlineData("Count", "Count", "CS0182")]
    [InlineData("5, Format = 1", "1", "CS0266")]
    public Task What_the_compiler_refuses_is_its_own_to_tell(string arguments, string place, string id)
    {
        string attribute = $"GaussHermite({arguments})";
        return DeclarationTest.Report(
            $$"""
            using GaussGen;

            [{{attribute.Replace(place, $"{{|{id}:{place}|}}", System.StringComparison.Ordinal)}}]
            internal static partial class Echo
            {
                internal static readonly int Count = 5;
            }

            internal static class Use
            {
                internal static double Of() => Echo.Expectation(1, 2, x => x) + Echo.Nodes[Echo.PointCount];
            }
            """);
    }

    [Fact]
    public Task A_second_attribute_of_the_same_family_is_the_compilers_to_tell() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static partial class Echo { }
        """,
        """
        using GaussGen;

        [{|CS0579:GaussHermite|}(7)]
        internal static partial class Echo { }

        internal static class Use
        {
            internal static double Of() => Echo.Expectation(1, 2, x => x) + Echo.Nodes[Echo.PointCount];
        }
        """);
}
