using System.Collections.Immutable;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Sequences;

namespace GaussGen.Generator.Declarations;

/// <summary>
/// Every family there is. A new one is its file in the mathematics, its attribute in the runtime library, and one line here.
/// </summary>
internal static class DeclarationTable
{
    public static ImmutableArray<Family> Families { get; } = ImmutableArray.Create(
        Family.OfRules("GaussHermite", read => new GaussHermiteRequest(
            read.Points(GaussHermite.MaximumPoints),
            read.Choice("Convention", HermiteConvention.Probabilist),
            read.Format(),
            read.DropZeroWeights())),
        Family.OfRules("GaussHalfRangeHermite", read => new GaussHalfRangeHermiteRequest(
            read.Points(UniversalRuleRequest.MaximumPoints), read.Format(), read.DropZeroWeights())),
        Family.OfRules("GaussTruncatedNormal", read =>
        {
            int points = read.Points(UniversalRuleRequest.MaximumPoints);
            (double lower, double upper) = read.Interval();
            return new GaussTruncatedNormalRequest(points, lower, upper, read.Format(), read.DropZeroWeights());
        }),
        Family.OfRules("GaussGeneralizedHermite", read => new GaussGeneralizedHermiteRequest(
            read.Points(UniversalRuleRequest.MaximumPoints), read.Exponent(), read.Format(), read.DropZeroWeights())),
        Family.OfRules("GaussLogNormal", read => new GaussLogNormalRequest(
            read.Points(UniversalRuleRequest.MaximumPoints),
            read.Finite("logMean"),
            read.Positive("logStandardDeviation"),
            read.Format(),
            read.DropZeroWeights())),
        Family.OfRules("GaussNormalMixture", read =>
        {
            int points = read.Points(UniversalRuleRequest.MaximumPoints);
            (ValueList weights, ValueList means, ValueList deviations) = read.Mixture();
            return new GaussNormalMixtureRequest(points, weights, means, deviations, read.Format(), read.DropZeroWeights());
        }),
        Family.OfRules(
            "GaussEvenExponential",
            read => new GaussEvenExponentialRequest(
                read.Points(UniversalRuleRequest.MaximumPoints), read.Coefficients(), read.Format(), read.DropZeroWeights()),
            constants: "NormalizingIntegral"),
        Family.OfRules(
            "NestedHermite",
            read => new NestedHermiteRequest(read.Level(NestedHermiteRequest.MaximumLevel), read.Format(), read.DropZeroWeights()),
            sizeArgument: ArgumentReader.LevelArgument),
        Family.OfMoments("NormalMoments", read => new NormalMomentsRequest(
            read.Finite("mean"),
            read.Positive("standardDeviation"),
            read.MaximumOrder(NormalMomentsRequest.LargestOrder),
            read.Format())),
        Family.OfMoments("TruncatedNormalMoments", read =>
        {
            double mean = read.Finite("mean");
            double deviation = read.Positive("standardDeviation");
            (double lower, double upper) = read.Interval(mean);
            return new TruncatedNormalMomentsRequest(
                mean, deviation, lower, upper, read.MaximumOrder(TruncatedNormalMomentsRequest.LargestOrder), read.Format());
        }),
        Family.OfMoments("HalfNormalMoments", read => new HalfNormalMomentsRequest(
            read.Positive("scale"), read.MaximumOrder(HalfNormalMomentsRequest.LargestOrder), read.Format())),
        Family.OfMoments("LogNormalMoments", read => new LogNormalMomentsRequest(
            read.Finite("logMean"),
            read.Positive("logStandardDeviation"),
            read.MaximumOrder(LogNormalMomentsRequest.LargestOrder),
            read.Format())),
        Family.OfMoments("EvenExponentialMoments", read => new EvenExponentialMomentsRequest(
            read.Coefficients(), read.MaximumOrder(EvenExponentialMomentsRequest.LargestOrder), read.Format())),
        Family.OfSequences(
            "HalfIntegerGamma",
            read => new HalfIntegerGammaRequest(
                read.Size("maximumOrder", HalfIntegerGammaRequest.SmallestOrder, HalfIntegerGammaRequest.LargestOrder), read.Format()),
            sizeArgument: "maximumOrder",
            "Gamma",
            "Reciprocal"),
        Family.OfSequences(
            "OscillatorMatrixElements",
            read => new OscillatorMatrixElementsRequest(
                read.Size("size", OscillatorMatrixElementsRequest.MinimumSize, OscillatorMatrixElementsRequest.MaximumSize),
                read.Size("power", OscillatorMatrixElementsRequest.MinimumPower, OscillatorMatrixElementsRequest.MaximumPower),
                read.Format()),
            sizeArgument: "power",
            "Elements"));
}
