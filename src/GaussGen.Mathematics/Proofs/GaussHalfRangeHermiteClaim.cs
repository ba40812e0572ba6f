using System;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The claim to be a correctly rounded Gauss rule for the half-normal density √(2/π) exp(−x²/2) on [0, ∞).</summary>
public sealed record GaussHalfRangeHermiteClaim : GaussRuleClaim
{
    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentOutOfRangeException">The points are outside their range.</exception>
    public GaussHalfRangeHermiteClaim(int points, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
    }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.GaussHalfRangeHermite(Points, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Half-range Gauss–Hermite rules: the moments of the half-normal density are values of the gamma function at integers and half-integers.";

    private protected override WeightMoments Moments() => new HalfRangeMoments();
}
