using System;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The claim to be a correctly rounded Gauss rule for a log-normal density.</summary>
public sealed record GaussLogNormalClaim : GaussRuleClaim
{
    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="logMean">The mean of the logarithm, as the exact value of the binary64 number; finite.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm, likewise; finite and above zero.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public GaussLogNormalClaim(
        int points, double logMean, double logStandardDeviation, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
        if (!ClaimNumbers.IsFinite(logMean))
        {
            throw new ArgumentOutOfRangeException(nameof(logMean), logMean, "The mean of the logarithm must be finite.");
        }

        if (!ClaimNumbers.IsPositive(logStandardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(logStandardDeviation),
                logStandardDeviation,
                "The standard deviation of the logarithm must be finite and above zero.");
        }

        LogMean = logMean == 0 ? 0.0 : logMean;
        LogStandardDeviation = logStandardDeviation;
    }

    /// <summary>The mean of the logarithm.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the logarithm.</summary>
    public double LogStandardDeviation { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.GaussLogNormal(Points, LogMean, LogStandardDeviation, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Gauss rules for log-normal densities: the moments are the numbers exp(km + k²s²/2).";

    private protected override WeightMoments Moments() =>
        new LogNormalMoments(ClaimNumbers.ValueOf(LogMean), ClaimNumbers.ValueOf(LogStandardDeviation));
}
