using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded moments of the density proportional to exp(−(c₁x² + c₂x⁴ + …)): spans "Raw", "Central" and
/// "Absolute" by order from 0, and a constant for each entry. Each is proven by <see cref="EvenExponentialMomentsProof"/>.
/// </summary>
public sealed record EvenExponentialMomentsClaim : TableClaim
{
    /// <summary>The largest order.</summary>
    public const int LargestOrder = 100;

    /// <summary>The largest number of coefficients.</summary>
    public const int LargestCoefficientCount = 8;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="coefficients">
    /// c₁, c₂, …, as the exact values of binary64 numbers; from 1 to <see cref="LargestCoefficientCount"/> finite ones, the last above zero.
    /// </param>
    /// <param name="maximumOrder">The highest order, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the moments.</param>
    /// <exception cref="ArgumentException">A promise is outside its range.</exception>
    public EvenExponentialMomentsClaim(IReadOnlyList<double> coefficients, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        Coefficients = new ClaimValues(coefficients);
        if (Coefficients.Count is < 1 or > LargestCoefficientCount
            || !Coefficients.All(ClaimNumbers.IsFinite)
            || !ClaimNumbers.IsPositive(Coefficients[Coefficients.Count - 1]))
        {
            string message = string.Format(
                CultureInfo.InvariantCulture,
                "Give from 1 to {0} finite coefficients, the last one above zero.",
                LargestCoefficientCount);
            throw new ArgumentOutOfRangeException(nameof(coefficients), message);
        }

        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>c₁, c₂, ….</summary>
    public ClaimValues Coefficients { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.EvenExponentialMoments(MaximumOrder, Coefficients);

    /// <inheritdoc/>
    public override string Method =>
        "Moments of an even exponential density: for each order by itself, the integral over the half-line is cut into panels on which "
        + "the exponent varies little, and on each the exponential's Taylor series times the power is integrated term by term. What a series "
        + "leaves out, the panels that are too light to matter and the tail are bounded. Moments of odd order are 0 by symmetry; those of a "
        + "single power x^(2d) whose order is a multiple of 2d are rational and judged exactly. The precision grows until each enclosure "
        + "lies between the midpoints around one representable value. Every found bit pattern, in spans and in constants, is then "
        + "compared with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new EvenExponentialMomentsProof(this).Run(data, progress, cancellation);
}
