using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Baselines;

/// <summary>
/// What declarations promise, in words without markup. Baselines keep these, so that a title worded anew is a new format of baselines.
/// </summary>
public static class ClaimTitle
{
    /// <summary>The title of a Gauss–Hermite rule.</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="isPhysicist">Whether the weight is exp(−x²) and not the standard normal density.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussHermite(int points, bool isPhysicist, bool dropZeroWeights, bool hasErrorEstimate) => Rule(
        "Gauss–Hermite rule",
        points,
        isPhysicist ? "weight exp(−x²)" : "standard normal density",
        dropZeroWeights,
        hasErrorEstimate);

    /// <summary>The title of a rule for the half-normal density.</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussHalfRangeHermite(int points, bool dropZeroWeights, bool hasErrorEstimate) =>
        Rule("Half-range Gauss–Hermite rule", points, "half-normal density", dropZeroWeights, hasErrorEstimate);

    /// <summary>The title of a rule for the standard normal density on an interval.</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="lower">The lower end.</param>
    /// <param name="upper">The upper end.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussTruncatedNormal(int points, double lower, double upper, bool dropZeroWeights, bool hasErrorEstimate) => Rule(
        "Gauss rule",
        points,
        "standard normal density between " + Write(lower) + " and " + Write(upper),
        dropZeroWeights,
        hasErrorEstimate);

    /// <summary>The title of a rule for |x|^(2μ) exp(−x²).</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="exponent">μ.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussGeneralizedHermite(int points, double exponent, bool dropZeroWeights, bool hasErrorEstimate) =>
        Rule("Generalized Gauss–Hermite rule", points, "exponent " + Write(exponent), dropZeroWeights, hasErrorEstimate);

    /// <summary>The title of a rule for a log-normal density.</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="logMean">The mean of the logarithm.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussLogNormal(
        int points, double logMean, double logStandardDeviation, bool dropZeroWeights, bool hasErrorEstimate) => Rule(
        "Gauss rule",
        points,
        "log-normal density with log-mean " + Write(logMean) + " and log-standard-deviation " + Write(logStandardDeviation),
        dropZeroWeights,
        hasErrorEstimate);

    /// <summary>The title of a rule for a mixture of normal densities.</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="weights">The weights of the components, as they were given.</param>
    /// <param name="means">Their means.</param>
    /// <param name="standardDeviations">Their standard deviations.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussNormalMixture(
        int points,
        IEnumerable<double> weights,
        IEnumerable<double> means,
        IEnumerable<double> standardDeviations,
        bool dropZeroWeights,
        bool hasErrorEstimate) => Rule(
        "Gauss rule",
        points,
        "mixture of normal densities with weights " + Write(weights) + ", means " + Write(means) + " and standard deviations "
            + Write(standardDeviations),
        dropZeroWeights,
        hasErrorEstimate);

    /// <summary>The title of a rule for the density proportional to exp(−(c₁x² + c₂x⁴ + …)).</summary>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="coefficients">c₁, c₂, ….</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string GaussEvenExponential(
        int points, IEnumerable<double> coefficients, bool dropZeroWeights, bool hasErrorEstimate) =>
        Rule("Gauss rule", points, EvenExponential(coefficients), dropZeroWeights, hasErrorEstimate);

    /// <summary>The title of a nested rule for the standard normal density.</summary>
    /// <param name="level">The level.</param>
    /// <param name="points">The number of points before any is dropped.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    public static string NestedHermite(int level, int points, bool dropZeroWeights, bool hasErrorEstimate) => Rule(
        "Nested Hermite rule of level " + level.ToString(CultureInfo.InvariantCulture),
        points,
        "standard normal density",
        dropZeroWeights,
        hasErrorEstimate);

    /// <summary>The title of the moments of a normal distribution.</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="mean">The mean; −0 and 0 are the same.</param>
    /// <param name="standardDeviation">The standard deviation.</param>
    public static string NormalMoments(int maximumOrder, double mean, double standardDeviation) => Moments(
        maximumOrder, "the normal distribution with mean " + Write(mean) + " and standard deviation " + Write(standardDeviation));

    /// <summary>The title of the moments of a normal distribution on an interval.</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="mean">The mean before truncation.</param>
    /// <param name="standardDeviation">The standard deviation before truncation.</param>
    /// <param name="lower">The lower end, in the variable's own unit.</param>
    /// <param name="upper">The upper end.</param>
    public static string TruncatedNormalMoments(int maximumOrder, double mean, double standardDeviation, double lower, double upper) => Moments(
        maximumOrder,
        "the normal distribution with mean " + Write(mean) + " and standard deviation " + Write(standardDeviation) + " truncated to between "
            + Write(lower) + " and " + Write(upper));

    /// <summary>The title of the moments of a half-normal distribution.</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="scale">The scale.</param>
    public static string HalfNormalMoments(int maximumOrder, double scale) =>
        Moments(maximumOrder, "the half-normal distribution with scale " + Write(scale));

    /// <summary>The title of the moments of a log-normal distribution.</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="logMean">The mean of the logarithm.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm.</param>
    public static string LogNormalMoments(int maximumOrder, double logMean, double logStandardDeviation) => Moments(
        maximumOrder,
        "the log-normal distribution with log-mean " + Write(logMean) + " and log-standard-deviation " + Write(logStandardDeviation));

    /// <summary>The title of the moments of the density proportional to exp(−(c₁x² + c₂x⁴ + …)).</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="coefficients">c₁, c₂, ….</param>
    public static string EvenExponentialMoments(int maximumOrder, IEnumerable<double> coefficients) =>
        Moments(maximumOrder, "the " + EvenExponential(coefficients));

    /// <summary>The title of the values of the gamma function at half-integers.</summary>
    /// <param name="maximumOrder">The largest k of Γ(k + ½).</param>
    public static string HalfIntegerGamma(int maximumOrder) =>
        "Γ(k + ½) and 1/Γ(k + ½) for k from 0 to " + maximumOrder.ToString(CultureInfo.InvariantCulture);

    /// <summary>The title of matrix elements in the basis of the harmonic oscillator.</summary>
    /// <param name="size">The number of basis functions.</param>
    /// <param name="power">The power of x.</param>
    public static string OscillatorMatrixElements(int size, int power) => string.Format(
        CultureInfo.InvariantCulture, "Matrix elements of x^{0} between the first {1} states of the harmonic oscillator", power, size);

    private static string Rule(string name, int points, string weight, bool dropZeroWeights, bool hasErrorEstimate) => string.Format(
        CultureInfo.InvariantCulture,
        "{0} with {1} {2}, {3}{4}{5}",
        name,
        points,
        points == 1 ? "point" : "points",
        weight,
        dropZeroWeights ? ", without zero weights" : string.Empty,
        hasErrorEstimate ? ", with error estimate" : string.Empty);

    private static string Moments(int maximumOrder, string distribution) => string.Format(
        CultureInfo.InvariantCulture, "Moments to order {0} of {1}", maximumOrder, distribution);

    private static string EvenExponential(IEnumerable<double> coefficients) =>
        "even exponential density with coefficients " + Write(coefficients);

    private static string Write(IEnumerable<double> values) => string.Join(", ", values.Select(Write));

    private static string Write(double value) => double.IsPositiveInfinity(value) ? "∞"
        : double.IsNegativeInfinity(value) ? "−∞"
        // −0 and 0 are one number.
        : ShortestDecimal.Write((ulong)BitConverter.DoubleToInt64Bits(value == 0 ? 0.0 : value), BinaryFormat.Binary64);
}
