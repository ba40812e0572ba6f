using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be a correctly rounded Gauss rule for the density proportional to exp(−(c₁x² + c₂x⁴ + …)), with the constant
/// "NormalizingIntegral", ∫ exp(−(c₁x² + c₂x⁴ + …)) dx, besides.
/// </summary>
public sealed record GaussEvenExponentialClaim : GaussRuleClaim
{
    /// <summary>The largest number of coefficients: up to x¹⁶.</summary>
    public const int LargestCoefficientCount = 8;

    private const int FirstPrecision = 128;
    private const int LargestPrecision = 1 << 11;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="coefficients">
    /// c₁, c₂, …, as the exact values of the binary64 numbers: from 1 to <see cref="LargestCoefficientCount"/> finite ones, the last above zero.
    /// </param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentNullException">The coefficients are <c>null</c>.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public GaussEvenExponentialClaim(
        int points, IReadOnlyList<double> coefficients, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
        Coefficients = new ClaimValues(coefficients);
        if (Coefficients.Count is < 1 or > LargestCoefficientCount
            || !Coefficients.All(ClaimNumbers.IsFinite)
            || !(Coefficients[Coefficients.Count - 1] > 0))
        {
            string message = string.Format(
                CultureInfo.InvariantCulture, "Give from 1 to {0} finite coefficients, the last one above zero.", LargestCoefficientCount);
            throw new ArgumentOutOfRangeException(nameof(coefficients), message);
        }
    }

    /// <summary>c₁, c₂, ….</summary>
    public ClaimValues Coefficients { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.GaussEvenExponential(Points, Coefficients, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Gauss rules for even exponentials: the first moments are integrals of Taylor polynomials over panels, with Cauchy's estimate for the "
        + "rest, and the others follow from them by parts; so is the normalizing integral enclosed.";

    private protected override WeightMoments Moments() => Weight();

    /// <inheritdoc/>
    private protected override Action<ProofReport>? Constants(CancellationToken cancellation) => report =>
    {
        EvenExponentialMoments weight = Weight();
        for (int precision = FirstPrecision; ; precision *= 2)
        {
            Ball integral = weight.Integral(precision, cancellation);
            ulong? bits = integral.IsFinite ? NearestValue.Of(Format, integral) : null;
            if (bits is not null || precision >= LargestPrecision)
            {
                report.Constant(
                    "NormalizingIntegral",
                    integral.IsFinite
                        ? new KnownNumber(integral.Lower, integral.Upper, bits)
                        : new KnownNumber(Dyadic.Zero, Dyadic.Zero, null),
                    isRequired: true);
                return;
            }
        }
    };

    private EvenExponentialMoments Weight() => new([.. Coefficients.Select(ClaimNumbers.ValueOf)]);
}
