using System;
using System.Globalization;
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
    public static string GaussHermite(int points, bool isPhysicist, bool dropZeroWeights) => string.Format(
        CultureInfo.InvariantCulture,
        "Gauss–Hermite rule with {0} {1}, {2}{3}",
        points,
        points == 1 ? "point" : "points",
        isPhysicist ? "weight exp(−x²)" : "standard normal density",
        dropZeroWeights ? ", without zero weights" : string.Empty);

    /// <summary>The title of the moments of a normal distribution.</summary>
    /// <param name="maximumOrder">The highest order.</param>
    /// <param name="mean">The mean; −0 and 0 are the same.</param>
    /// <param name="standardDeviation">The standard deviation.</param>
    public static string NormalMoments(int maximumOrder, double mean, double standardDeviation) => string.Format(
        CultureInfo.InvariantCulture,
        "Moments to order {0} of the normal distribution with mean {1} and standard deviation {2}",
        maximumOrder,
        Write(mean == 0 ? 0.0 : mean),
        Write(standardDeviation));

    private static string Write(double value) =>
        ShortestDecimal.Write((ulong)BitConverter.DoubleToInt64Bits(value), BinaryFormat.Binary64);
}
