using System;
using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>
/// Mistakes in the arguments of rules beside Gauss–Hermite and of lists: told once, where they are to be mended, while all uses of
/// the members compile.
/// </summary>
public sealed class FamilyArgumentTests
{
    private const string Sixty = "0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, "
        + "0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, "
        + "0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1";

    [Theory]
    [InlineData("{|GAUSS004:0|}")]
    [InlineData("{|GAUSS004:65|}")]
    [InlineData("points: {|GAUSS004:int.MinValue|}")]
    [InlineData("5, Format = {|GAUSS010:(NumberFormat)2|}")]
    public Task Half_range(string arguments) => Rule("GaussHalfRangeHermite", arguments);

    [Theory]
    [InlineData("5, 2, {|GAUSS016:2|}")]
    [InlineData("5, 2, {|GAUSS016:-1|}")]
    [InlineData("5, 0.0, {|GAUSS016:-0.0|}")]
    [InlineData("upper: {|GAUSS016:1|}, points: 5, lower: 3")]
    [InlineData("5, double.PositiveInfinity, {|GAUSS016:double.PositiveInfinity|}")]
    [InlineData("5, double.PositiveInfinity, {|GAUSS016:double.NegativeInfinity|}")]
    [InlineData("5, {|GAUSS017:double.NaN|}, 1")]
    [InlineData("5, 0, {|GAUSS017:0 / 0.0|}")]
    [InlineData("5, {|GAUSS017:double.NaN|}, double.NaN")]
    [InlineData("5, {|GAUSS018:double.NegativeInfinity|}, double.PositiveInfinity")]
    [InlineData("{|GAUSS004:65|}, 0, {|GAUSS016:0|}")]
    [InlineData("5, {|GAUSS029:38|}, double.PositiveInfinity")]
    [InlineData("5, {|GAUSS029:1e300|}, 1e301")]
    [InlineData("5, double.NegativeInfinity, {|GAUSS029:-38|}")]
    [InlineData("5, -39, {|GAUSS029:-38|}")]
    public Task Truncated_normal(string arguments) => Rule("GaussTruncatedNormal", arguments);

    [Theory]
    [InlineData("5, {|GAUSS024:-0.5|}")]
    [InlineData("5, {|GAUSS024:double.NaN|}")]
    [InlineData("5, {|GAUSS024:1000001|}")]
    [InlineData("5, exponent: {|GAUSS024:double.PositiveInfinity|}")]
    [InlineData("{|GAUSS004:-1|}, {|GAUSS024:-2|}, DropZeroWeights = true")]
    public Task Generalized_hermite(string arguments) => Rule("GaussGeneralizedHermite", arguments);

    [Theory]
    [InlineData("5, {|GAUSS007:double.NaN|}, 1")]
    [InlineData("5, 0, {|GAUSS008:0|}")]
    [InlineData("5, 0, {|GAUSS008:double.PositiveInfinity|}")]
    [InlineData("{|GAUSS030:64|}, 0, 1")]
    [InlineData("{|GAUSS031:5|}, 800, 0.125")]
    [InlineData("{|GAUSS031:5|}, -800, 0.125")]
    [InlineData("{|GAUSS031:5|}, 90, 0.125, Format = NumberFormat.Binary32")]
    [InlineData("{|GAUSS031:1|}, 0, 1e300")]
    public Task Log_normal(string arguments) => Rule("GaussLogNormal", arguments);

    [Theory]
    [InlineData("5, {|GAUSS019:null|}, null, null")]
    [InlineData("5, {|GAUSS019:new double[0]|}, new double[0], new double[] { 1 }")]
    [InlineData("5, {|GAUSS019:new double[] { }|}, new double[] { }, new double[] { }")]
    [InlineData("5, {|GAUSS019:new[] { " + Sixty + ", 1, 1, 1, 1, 1 }|}, new double[] { 1 }, new double[] { 1 }")]
    [InlineData("5, new double[] { 1, 2 }, {|GAUSS020:new double[] { 1 }|}, new double[] { 1, 2 }")]
    [InlineData("5, new double[] { 1, 2 }, {|GAUSS020:null|}, new double[] { 1, 2 }")]
    [InlineData("5, new double[] { 1, 2 }, new double[] { 1, 2 }, {|GAUSS020:new double[] { 1, 2, 3 }|}")]
    [InlineData("5, new double[] { 1 }, {|GAUSS020:new double[] { 1, 2 }|}, new double[] { 1, 2 }")]
    [InlineData("5, new[] { 0.5, {|GAUSS021:-0.5|} }, new[] { 0.0, 1 }, new[] { 1.0, 1 }")]
    [InlineData("5, new[] { {|GAUSS021:double.NaN|}, -0.5 }, new[] { 0.0, 1 }, new[] { 1.0, 1 }")]
    [InlineData("5, new[] { 0.5, {|GAUSS021:1 / 0.0|} }, new[] { 0.0, {|GAUSS007:1 / 0.0|} }, new double[] { {|GAUSS008:0|}, 1 }")]
    [InlineData("5, {|GAUSS022:new double[] { 0, -0.0 }|}, new[] { 0.0, 1 }, new[] { 1.0, 1 }")]
    [InlineData("5, new[] { 0.5, 0 }, new[] { 0.0, 1 }, new[] { 1.0, {|GAUSS008:-1|} }")]
    [InlineData("standardDeviations: new[] { {|GAUSS008:-1.0|} }, means: new[] { 1.0 }, weights: new[] { 1.0 }, points: {|GAUSS004:0|}")]
    public Task Normal_mixture(string arguments) => Rule("GaussNormalMixture", arguments);

    [Theory]
    [InlineData("5, {|GAUSS019:null|}")]
    [InlineData("5, {|GAUSS019:new double[0]|}")]
    [InlineData("5, {|GAUSS019:1|}, 1, 1, 1, 1, 1, 1, 1, 1")]
    [InlineData("5, {|GAUSS007:double.NaN|}, 1")]
    [InlineData("5, 1, {|GAUSS007:double.PositiveInfinity|}, -1")]
    [InlineData("5, 1, {|GAUSS023:-1|}")]
    [InlineData("5, 1, {|GAUSS023:-0.0|}, Format = NumberFormat.Binary32")]
    [InlineData("5, {|GAUSS023:0|}")]
    [InlineData("5, coefficients: new double[] { 1, 2, {|GAUSS023:-2|} }")]
    [InlineData("5, new[] { 1, {|GAUSS023:-2.5|} }")]
    [InlineData("points: {|GAUSS004:0|}, coefficients: {|GAUSS019:null|}")]
    public Task Even_exponential(string arguments) => Rule("GaussEvenExponential", arguments);

    [Theory]
    [InlineData("{|GAUSS019:GaussEvenExponential(5)|}")]
    [InlineData("{|GAUSS027:GaussEvenExponential(5, -30, 1, Format = NumberFormat.Binary32)|}")]
    [InlineData("{|GAUSS027:GaussEvenExponential(5, 1e100, Format = NumberFormat.Binary32)|}")]
    [InlineData("{|GAUSS027:GaussEvenExponential(5, -60, 1)|}")]
    public Task Even_exponential_at_the_whole_attribute(string attribute) => Report(attribute, Uses.OfRule + Uses.OfConstant);

    [Theory]
    [InlineData("GaussEvenExponential(5, -30, 1)")]
    [InlineData("GaussEvenExponential(5, 1e100)")]
    [InlineData("GaussEvenExponential(5, new double[] { 1 })")]
    [InlineData("GaussTruncatedNormal(5, 37, double.PositiveInfinity)")]
    [InlineData("GaussTruncatedNormal(5, double.NegativeInfinity, -8)")]
    [InlineData("GaussGeneralizedHermite(5, -0.49999999999999994)")]
    [InlineData("GaussLogNormal(1, 700, 0.5)")]
    [InlineData("GaussNormalMixture(5, new[] { 1e300, 0, 1e-300 }, new[] { 0.0, 1, 2 }, new[] { 1.0, 1, 1 })")]
    public Task What_is_just_in_range_has_no_mistake(string attribute) => Report(attribute, "Echo.Expectation(x => x) + Echo.Nodes[0]");

    [Theory]
    [InlineData("{|GAUSS025:-1|}")]
    [InlineData("{|GAUSS025:5|}")]
    [InlineData("level: {|GAUSS025:int.MaxValue|}, ErrorEstimate = true")]
    public Task Nested_hermite(string arguments) => Rule("NestedHermite", arguments);

    [Theory]
    [InlineData("GaussHermite(201, ErrorEstimate = {|GAUSS034:true|})")]
    [InlineData("GaussHermite(1000, DropZeroWeights = true, ErrorEstimate = {|GAUSS034:true|})")]
    [InlineData("GaussHermite({|GAUSS004:1001|}, ErrorEstimate = true)")]
    public Task Error_estimates_that_there_are_not(string attribute) => Report(attribute, Uses.OfRule);

    [Theory]
    [InlineData("GaussHermite(200, ErrorEstimate = true)", "1, 2, ")]
    [InlineData("GaussHermite(5, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32, ErrorEstimate = true)", "1, 2, ")]
    [InlineData("GaussHalfRangeHermite(5, ErrorEstimate = true)", "1, ")]
    [InlineData("GaussTruncatedNormal(5, -20, 20, ErrorEstimate = true)", "")]
    [InlineData("GaussTruncatedNormal(1, 0, 1, Format = NumberFormat.Binary32, ErrorEstimate = true)", "")]
    [InlineData("GaussLogNormal(4, 0, 0.25, ErrorEstimate = true)", "")]
    [InlineData("NestedHermite(0, ErrorEstimate = true)", "1, 2, ")]
    [InlineData("NestedHermite(4, ErrorEstimate = true)", "1, 2, ")]
    [InlineData("GaussHermite({|GAUSS012:60|}, Format = NumberFormat.Binary32, ErrorEstimate = true)", "1, 2, ")]
    [InlineData("GaussHermite(60, Format = NumberFormat.Binary32, ErrorEstimate = true, DropZeroWeights = true)", "1, 2, ")]
    public Task Error_estimates_that_there_are(string attribute, string before) => Report(
        attribute,
        $"Echo.ExpectationWithError({before}x => x, out error) + Echo.ExpectationWithError({before}new Square(), out error) + Echo.CompanionNodes[0] + Echo.CompanionWeights[0]");

    [Theory]
    [InlineData("{|GAUSS007:double.NaN|}, 1, 0, 2")]
    [InlineData("0, {|GAUSS008:0|}, 0, 2")]
    [InlineData("1, 1, {|GAUSS017:double.NaN|}, 2")]
    [InlineData("1, 1, 2, {|GAUSS016:2|}")]
    [InlineData("1, 1, {|GAUSS018:-1 / 0.0|}, 1 / 0.0")]
    [InlineData("1, 1, {|GAUSS029:100|}, 1 / 0.0")]
    [InlineData("100, 1, 0, {|GAUSS029:50|}")]
    [InlineData("0, 1, 0, 2, MaximumOrder = {|GAUSS009:101|}")]
    [InlineData("1e100, 1e100, 0, 1e101, MaximumOrder = {|GAUSS011:4|}")]
    public Task Truncated_normal_moments(string arguments) => Report($"TruncatedNormalMoments({arguments})", Uses.OfMoments);

    [Theory]
    [InlineData("1, {|GAUSS023:-2|}")]
    [InlineData("{|GAUSS019:null|}")]
    [InlineData("{|GAUSS007:double.NaN|}, 1")]
    [InlineData("coefficients: new double[] { 1, {|GAUSS023:0|} }")]
    [InlineData("1, MaximumOrder = {|GAUSS009:101|}")]
    [InlineData("1e-100, MaximumOrder = {|GAUSS011:8|}")]
    public Task Even_exponential_moments(string arguments) => Report($"EvenExponentialMoments({arguments})", Uses.OfMoments);

    [Theory]
    [InlineData("{|GAUSS008:0|}")]
    [InlineData("{|GAUSS008:double.NaN|}")]
    [InlineData("1, MaximumOrder = {|GAUSS009:201|}")]
    [InlineData("scale: 1e200, MaximumOrder = {|GAUSS011:4|}")]
    public Task Half_normal_moments(string arguments) => Report($"HalfNormalMoments({arguments})", Uses.OfMoments);

    [Theory]
    [InlineData("{|GAUSS026:-1|}")]
    [InlineData("{|GAUSS026:201|}")]
    [InlineData("maximumOrder: {|GAUSS028:172|}")]
    [InlineData("171")]
    [InlineData("{|GAUSS028:35|}, Format = NumberFormat.Binary32")]
    [InlineData("34, Format = NumberFormat.Binary32")]
    public Task Half_integer_gamma(string arguments) => Report($"HalfIntegerGamma({arguments})", "Echo.Gamma[0] + Echo.Reciprocal.Length");

    [Theory]
    [InlineData("{|GAUSS026:0|}, 4")]
    [InlineData("{|GAUSS026:65|}, {|GAUSS026:-1|}")]
    [InlineData("size: 4, power: {|GAUSS026:65|}")]
    [InlineData("64, {|GAUSS028:64|}, Format = NumberFormat.Binary32")]
    [InlineData("4, 4, Format = {|GAUSS010:(NumberFormat)5|}")]
    [InlineData("8, 64")]
    public Task Oscillator(string arguments) => Report($"OscillatorMatrixElements({arguments})", "Echo.Elements[0]");

    [Theory]
    [InlineData("{|GAUSS007:double.NaN|}, 1")]
    [InlineData("0, {|GAUSS008:-1|}")]
    [InlineData("0, 1, MaximumOrder = {|GAUSS009:101|}")]
    [InlineData("0, 1, MaximumOrder = {|GAUSS011:40|}")]
    [InlineData("0, 1e300, MaximumOrder = {|GAUSS036:4|}")]
    public Task Log_normal_moments(string arguments) => Report($"LogNormalMoments({arguments})", Uses.OfMoments);

    private static Task Rule(string name, string arguments) =>
        Report($"{name}({arguments})", name == "GaussEvenExponential" ? Uses.OfRule + Uses.OfConstant : Uses.OfRule);

    private static Task Report(string attribute, string use) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [{{attribute}}]
        internal static partial class Echo { }

        internal readonly struct Square : IIntegrand<double>, IIntegrand<float>
        {
            public double Evaluate(double x) => x * x;
            public float Evaluate(float x) => x * x;
        }

        internal static class Use
        {
            internal static double Of()
            {
                {{(attribute.Contains("Binary32", StringComparison.Ordinal) ? "float" : "double")}} error = 0;
                return {{use}} + error;
            }
        }
        """);
}
