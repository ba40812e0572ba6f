using System;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The claim to be a correctly rounded Gauss rule for the standard normal density on an interval, one end of which may be infinite.</summary>
public sealed record GaussTruncatedNormalClaim : GaussRuleClaim
{
    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="lower">The lower end, as the exact value of the binary64 number; −∞ where the upper end is finite.</param>
    /// <param name="upper">The upper end, likewise, above the lower one; +∞ where the lower end is finite.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public GaussTruncatedNormalClaim(
        int points, double lower, double upper, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
        if (!(lower < upper) || (double.IsInfinity(lower) && double.IsInfinity(upper)))
        {
            throw new ArgumentOutOfRangeException(
                nameof(upper), upper, "The lower end must be below the upper end, and one of them finite.");
        }

        Lower = lower == 0 ? 0.0 : lower;
        Upper = upper == 0 ? 0.0 : upper;
    }

    /// <summary>The lower end.</summary>
    public double Lower { get; }

    /// <summary>The upper end.</summary>
    public double Upper { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.GaussTruncatedNormal(Points, Lower, Upper, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Gauss rules for truncated normal densities: the moments are differences of incomplete gamma functions, from series of positive "
        + "terms, carried to the middle of the interval.";

    private protected override WeightMoments Moments() => new TruncatedNormalMoments(End(Lower), End(Upper), Points);

    private static Dyadic? End(double value) => double.IsInfinity(value) ? null : ClaimNumbers.ValueOf(value);
}
