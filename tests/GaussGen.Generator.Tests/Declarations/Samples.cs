using System.Collections.Immutable;
using System.Linq;
using Xunit;

namespace GaussGen.Generator.Tests.Declarations;

/// <summary>Attributes of every family, without a mistake and with one that leaves the members as they are.</summary>
public static class Samples
{
    public static readonly ImmutableArray<(string Sound, string Mistaken)> Pairs =
    [
        ("GaussHermite(5)", "GaussHermite(0)"),
        ("GaussHermite(5, Convention = HermiteConvention.Physicist)", "GaussHermite(0, Convention = HermiteConvention.Physicist)"),
        ("GaussHermite(5, ErrorEstimate = true)", "GaussHermite(0, ErrorEstimate = true)"),
        ("GaussHalfRangeHermite(5)", "GaussHalfRangeHermite(65)"),
        ("GaussTruncatedNormal(5, -1, 2)", "GaussTruncatedNormal(5, 2, -1)"),
        ("GaussGeneralizedHermite(5, 0.5)", "GaussGeneralizedHermite(5, -0.5)"),
        ("GaussLogNormal(4, 0, 0.25)", "GaussLogNormal(4, 0, 0)"),
        ("GaussNormalMixture(5, new[] { 0.9, 0.1 }, new[] { 4, 3.2 }, new[] { 0.05, 0.2 })",
            "GaussNormalMixture(5, new[] { 0.9, 0.1 }, new[] { 4, 3.2 }, new[] { 0.05 })"),
        ("GaussEvenExponential(5, -2, 1)", "GaussEvenExponential(5, 1, -2)"),
        ("GaussEvenExponential(5, -2, 1, ErrorEstimate = true)", "GaussEvenExponential(5, 1, -2, ErrorEstimate = true)"),
        ("NestedHermite(2)", "NestedHermite(5)"),
        ("NestedHermite(2, ErrorEstimate = true)", "NestedHermite(-1, ErrorEstimate = true)"),
        ("TruncatedNormalMoments(1, 2, 0, 4, MaximumOrder = 9)", "TruncatedNormalMoments(1, 2, 4, 0, MaximumOrder = 9)"),
        ("HalfNormalMoments(0.5, MaximumOrder = 9)", "HalfNormalMoments(-0.5, MaximumOrder = 9)"),
        ("NormalMoments(0, 1, MaximumOrder = 9)", "NormalMoments(0, -1, MaximumOrder = 9)"),
        ("LogNormalMoments(0, 0.25, MaximumOrder = 9)", "LogNormalMoments(0, -1, MaximumOrder = 9)"),
        ("EvenExponentialMoments(-2, 1)", "EvenExponentialMoments(1, -2)"),
        ("HalfIntegerGamma(10)", "HalfIntegerGamma(201)"),
        ("OscillatorMatrixElements(4, 3)", "OscillatorMatrixElements(4, -1)"),
    ];

    /// <summary>Rules beside Gauss–Hermite.</summary>
    public static readonly ImmutableArray<string> OtherRules =
    [
        "GaussHalfRangeHermite(5)",
        "GaussTruncatedNormal(5, -20, 20)",
        "GaussGeneralizedHermite(5, 0.5)",
        "GaussLogNormal(4, 0, 0.25)",
        "GaussNormalMixture(5, new[] { 0.9, 0.1 }, new[] { 4, 3.2 }, new[] { 0.05, 0.2 })",
        "GaussEvenExponential(5, -2, 1)",
        "NestedHermite(2)",
    ];

    /// <summary>Moments beside those of the normal distribution.</summary>
    public static readonly ImmutableArray<string> OtherMoments =
    [
        "TruncatedNormalMoments(1, 2, 0, 4)",
        "HalfNormalMoments(0.5)",
        "LogNormalMoments(0, 0.25)",
        "EvenExponentialMoments(-2, 1)",
    ];

    /// <summary>Tables that are lists.</summary>
    public static readonly ImmutableArray<string> Sequences =
    [
        "HalfIntegerGamma(10)",
        "OscillatorMatrixElements(4, 3)",
    ];

    /// <summary>Rules whose outermost weights round to zero in binary32.</summary>
    public static readonly ImmutableArray<string> RulesWithZeroWeights =
    [
        "GaussHalfRangeHermite(64)",
        "GaussTruncatedNormal(64, -1, double.PositiveInfinity)",
        "GaussGeneralizedHermite(64, 0.5)",
        "GaussLogNormal(20, 0, 0.5)",
        "GaussNormalMixture(64, new[] { 0.9, 0.1 }, new[] { 4, 3.2 }, new[] { 0.05, 0.2 })",
        "GaussEvenExponential(64, 1)",
    ];

    public static TheoryData<string> SoundAndMistaken => [.. Pairs.SelectMany(pair => new[] { pair.Sound, pair.Mistaken })];
}
