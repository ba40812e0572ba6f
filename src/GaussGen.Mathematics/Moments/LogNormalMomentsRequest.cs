using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Moments;

/// <summary>
/// A request for the moments of the log-normal distribution, that of exp(Y) for normal Y, orders 0 to <see cref="MaximumOrder"/>. Mean and
/// standard deviation of Y are the exact values of two binary64 numbers.
/// </summary>
public sealed record LogNormalMomentsRequest : MomentRequest
{
    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>
    /// The largest order that may be asked for. E Xᵏ grows like exp(k²s²/2), so that with a log-standard-deviation s above 0.38 it exceeds the
    /// largest binary64 number before that order.
    /// </summary>
    public const int LargestOrder = 100;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="logMean">The mean of the logarithm; finite.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public LogNormalMomentsRequest(double logMean, double logStandardDeviation, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        if (!IsLogMean(logMean))
        {
            throw new ArgumentOutOfRangeException(
                nameof(logMean), logMean, "The mean of the logarithm must be finite: give a number that is neither NaN nor infinite.");
        }

        if (!IsLogStandardDeviation(logStandardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(logStandardDeviation), logStandardDeviation, "The standard deviation of the logarithm must be finite and above zero.");
        }

        MaximumOrder = Parameters.RequireCount(maximumOrder, SmallestOrder, LargestOrder, "The highest order", nameof(maximumOrder));
        // A request is a key: −0 and 0 are one mean.
        LogMean = logMean == 0 ? 0.0 : logMean;
        LogStandardDeviation = logStandardDeviation;
    }

    /// <summary>The mean of the logarithm; never −0.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the logarithm, above zero.</summary>
    public double LogStandardDeviation { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.LogNormalMoments(MaximumOrder, LogMean, LogStandardDeviation);

    /// <summary>Whether a number can be the mean of the logarithm: whether it is finite.</summary>
    public static bool IsLogMean(double value) => Parameters.IsFinite(value);

    /// <summary>Whether a number can be the standard deviation of the logarithm: whether it is finite and above zero.</summary>
    public static bool IsLogStandardDeviation(double value) => Parameters.IsPositive(value);

    /// <summary>Whether a number can be the highest order.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">
    /// A moment is so far beyond every number format that it cannot even be enclosed: <see cref="RuleFailure.MomentNotRepresentable"/>.
    /// </exception>
    public override MomentTable Construct(CancellationToken cancellation)
    {
        var moments = new LogNormalMoments(Parameters.ValueOf(LogMean), Parameters.ValueOf(LogStandardDeviation), MaximumOrder);
        IReadOnlyList<RealNumber> central = moments.Central();
        return new MomentTable(Describe(), moments.Raw(cancellation), central, moments.Absolute(central));
    }

    private MomentDescription Describe() => new(
        "the log-normal distribution with log-mean " + Parameters.Write(LogMean) + " and log-standard-deviation "
            + Parameters.Write(LogStandardDeviation),
        "raw moments are exponentials, central ones a recurrence with positive terms, odd absolute ones a series or a sum of error functions, "
            + "all enclosed",
        "Aitchison and Brown, The Lognormal Distribution (1957), 2.3; NIST DLMF 7.6.2");
}
