using System;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The claim to be a correctly rounded Gauss rule for the density proportional to |x|^(2μ) exp(−x²).</summary>
public sealed record GaussGeneralizedHermiteClaim : GaussRuleClaim
{
    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="exponent">μ, as the exact value of the binary64 number; above −½ and at most 10⁶.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public GaussGeneralizedHermiteClaim(int points, double exponent, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
        if (!(exponent is > -0.5 and <= 1e6))
        {
            throw new ArgumentOutOfRangeException(nameof(exponent), exponent, "The exponent must be above -0.5 and at most 1e6.");
        }

        Exponent = exponent == 0 ? 0.0 : exponent;
    }

    /// <summary>μ.</summary>
    public double Exponent { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.GaussGeneralizedHermite(Points, Exponent, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Generalized Gauss–Hermite rules: the moments are the rational numbers (μ + ½)(μ + 3/2) ⋯ (μ + k − ½).";

    private protected override WeightMoments Moments() => new GeneralizedHermiteMoments(ClaimNumbers.ValueOf(Exponent));
}
