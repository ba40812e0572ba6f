using System;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded moments of a normal distribution: spans "Raw", "Central" and "Absolute" by order from 0, and
/// a constant for each entry, "Raw0", "Raw1" and so on. Each is proven by <see cref="NormalMomentsProof"/>.
/// </summary>
public sealed record NormalMomentsClaim : TableClaim
{
    /// <summary>The largest order.</summary>
    public const int LargestOrder = 200;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="mean">The mean, as the exact value of the binary64 number; finite.</param>
    /// <param name="standardDeviation">The standard deviation, likewise; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the moments.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public NormalMomentsClaim(double mean, double standardDeviation, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        if (!ClaimNumbers.IsFinite(mean))
        {
            throw new ArgumentOutOfRangeException(nameof(mean), mean, "The mean must be finite.");
        }

        if (!ClaimNumbers.IsPositive(standardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(standardDeviation), standardDeviation, "The standard deviation must be finite and above zero.");
        }

        Mean = mean;
        StandardDeviation = standardDeviation;
        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>The mean.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation.</summary>
    public double StandardDeviation { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.NormalMoments(MaximumOrder, Mean, StandardDeviation);

    /// <inheritdoc/>
    public override string Method =>
        "Moments of a normal distribution: each moment is evaluated from its own closed form and not from the one before it. Raw "
        + "and central moments, and absolute moments of even order, are exact finite sums of binary fractions, rounded once "
        + "(DLMF 5.4.6). Absolute moments of odd order hold a factor √(2/π) (Winkelbauer 2012); they are enclosed at growing "
        + "precision until the enclosure lies between the midpoints around one representable value. Every found bit pattern, in "
        + "spans and in constants, is then compared with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new NormalMomentsProof(this, data).Run(progress, cancellation);
}
