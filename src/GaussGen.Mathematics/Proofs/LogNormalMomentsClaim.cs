using System;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded moments of a log-normal distribution, of exp(Y) for normal Y: spans "Raw", "Central" and
/// "Absolute" by order from 0, and a constant for each entry. Each is proven by <see cref="LogNormalMomentsProof"/>.
/// </summary>
public sealed record LogNormalMomentsClaim : TableClaim
{
    /// <summary>The largest order.</summary>
    public const int LargestOrder = 100;

    /// <summary>A claim with the given promises; both numbers are the exact values of binary64 numbers.</summary>
    /// <param name="logMean">The mean of the logarithm; finite.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the moments.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public LogNormalMomentsClaim(double logMean, double logStandardDeviation, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        if (!ClaimNumbers.IsFinite(logMean))
        {
            throw new ArgumentOutOfRangeException(nameof(logMean), logMean, "The mean of the logarithm must be finite.");
        }

        if (!ClaimNumbers.IsPositive(logStandardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(logStandardDeviation), logStandardDeviation, "The standard deviation of the logarithm must be finite and above zero.");
        }

        // −0 and 0 are one number, also where claims are compared.
        LogMean = logMean == 0 ? 0.0 : logMean;
        LogStandardDeviation = logStandardDeviation;
        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>The mean of the logarithm.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the logarithm.</summary>
    public double LogStandardDeviation { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.LogNormalMoments(MaximumOrder, LogMean, LogStandardDeviation);

    /// <inheritdoc/>
    public override string Method =>
        "Moments of a log-normal distribution: raw moments are exponentials of exact numbers. Those about the mean are, for each order by "
        + "itself, a series in powers of the log-standard-deviation whose terms are all positive, from the powers of sinh and the moments of "
        + "the normal distribution, with a bound of the rest; where that is long, the alternating binomial sum of the raw moments at raised "
        + "precision. The absolute moment of order 1 is an integral of the normal density. The precision grows until each enclosure lies "
        + "between the midpoints around one representable value. Every found bit pattern, in spans and in constants, is then compared "
        + "with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new LogNormalMomentsProof(this).Run(data, progress, cancellation);
}
