using System;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded moments of a normal distribution on an interval: spans "Raw", "Central" and "Absolute" by
/// order from 0, and a constant for each entry, "Raw0", "Raw1" and so on. Each is proven by <see cref="TruncatedNormalMomentsProof"/>.
/// </summary>
public sealed record TruncatedNormalMomentsClaim : TableClaim
{
    /// <summary>The largest order.</summary>
    public const int LargestOrder = 100;

    /// <summary>A claim with the given promises; each number is the exact value of a binary64 number.</summary>
    /// <param name="mean">The mean before truncation; finite.</param>
    /// <param name="standardDeviation">The standard deviation before truncation; finite and above zero.</param>
    /// <param name="lower">The lower end, in the variable's own unit; −∞ is allowed where the upper end is finite.</param>
    /// <param name="upper">The upper end, above the lower one; +∞ is allowed where the lower end is finite.</param>
    /// <param name="maximumOrder">The highest order, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the moments.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public TruncatedNormalMomentsClaim(
        double mean, double standardDeviation, double lower, double upper, int maximumOrder, BinaryFormat format)
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

        if (!(lower < upper) || (double.IsInfinity(lower) && double.IsInfinity(upper)))
        {
            throw new ArgumentOutOfRangeException(
                nameof(upper), upper, "The lower end must be below the upper end, and one of them finite.");
        }

        // −0 and 0 are one number, also where claims are compared.
        Mean = mean == 0 ? 0.0 : mean;
        StandardDeviation = standardDeviation;
        Lower = lower == 0 ? 0.0 : lower;
        Upper = upper == 0 ? 0.0 : upper;
        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>The mean before truncation.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation before truncation.</summary>
    public double StandardDeviation { get; }

    /// <summary>The lower end.</summary>
    public double Lower { get; }

    /// <summary>The upper end.</summary>
    public double Upper { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.TruncatedNormalMoments(MaximumOrder, Mean, StandardDeviation, Lower, Upper);

    /// <inheritdoc/>
    public override string Method =>
        "Moments of a normal distribution on an interval: the distribution's own mean is enclosed first, and each moment about it is then "
        + "integrated by itself: the density's Taylor series about the mean, times a power, term by term on each side, with a bound of what is "
        + "left out and of what lies beyond the reach of the series. No moment is found from another by integration by parts, and no value "
        + "of the error function is used. Raw moments follow by the binomial theorem. The precision grows until each enclosure lies "
        + "between the midpoints around one representable value; what symmetry makes exact is judged exactly. Every found bit pattern, "
        + "in spans and in constants, is then compared with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new TruncatedNormalMomentsProof(this).Run(data, progress, cancellation);
}
