using System;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded moments of a half-normal distribution, of |X| for normal X with mean 0: spans "Raw", "Central"
/// and "Absolute" by order from 0, and a constant for each entry. Each is proven by <see cref="HalfNormalMomentsProof"/>.
/// </summary>
public sealed record HalfNormalMomentsClaim : TableClaim
{
    /// <summary>The largest order.</summary>
    public const int LargestOrder = 200;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="scale">The standard deviation of X, as the exact value of the binary64 number; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the moments.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public HalfNormalMomentsClaim(double scale, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        if (!ClaimNumbers.IsPositive(scale))
        {
            throw new ArgumentOutOfRangeException(nameof(scale), scale, "The scale must be finite and above zero.");
        }

        Scale = scale;
        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>The scale.</summary>
    public double Scale { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.HalfNormalMoments(MaximumOrder, Scale);

    /// <inheritdoc/>
    public override string Method =>
        "Moments of a half-normal distribution: raw moments from factorials, those of odd order over the gamma function at a half-integer "
        + "(Winkelbauer 2012; DLMF 5.5.5), each by itself; even ones are exact. Central and absolute moments are integrated about the mean "
        + "√(2/π), where the density's Taylor series times a power is summed term by term on each side, with a bound of what is left out. The "
        + "precision grows until each enclosure lies between the midpoints around one representable value. Every found bit pattern, in "
        + "spans and in constants, is then compared with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new HalfNormalMomentsProof(this).Run(data, progress, cancellation);
}
