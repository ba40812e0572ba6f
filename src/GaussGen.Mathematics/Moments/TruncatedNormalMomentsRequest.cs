using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Moments;

/// <summary>
/// A request for the moments of a normal distribution that is truncated to an interval, orders 0 to <see cref="MaximumOrder"/>. Mean and standard
/// deviation are those before truncation; the ends are in the variable's own unit. All are the exact values of binary64 numbers.
/// </summary>
public sealed record TruncatedNormalMomentsRequest : MomentRequest
{
    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>
    /// The largest order that may be asked for. In far tails an order costs some 11 bits of working precision, so that this many stay near a
    /// thousand bits.
    /// </summary>
    public const int LargestOrder = 100;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="mean">The mean before truncation; finite.</param>
    /// <param name="standardDeviation">The standard deviation before truncation; finite and above zero.</param>
    /// <param name="lower">The lower end; −∞ is allowed where the upper end is finite.</param>
    /// <param name="upper">The upper end, above the lower one; +∞ is allowed where the lower end is finite.</param>
    /// <param name="maximumOrder">The highest order, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public TruncatedNormalMomentsRequest(
        double mean, double standardDeviation, double lower, double upper, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        if (!IsMean(mean))
        {
            throw new ArgumentOutOfRangeException(nameof(mean), mean, "The mean must be finite: give a number that is neither NaN nor infinite.");
        }

        if (!IsStandardDeviation(standardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(standardDeviation), standardDeviation, "The standard deviation must be finite and above zero.");
        }

        if (!IsInterval(lower, upper))
        {
            throw new ArgumentOutOfRangeException(
                nameof(upper), upper, "The lower end must be below the upper end, and one of them finite. For the whole line use NormalMoments.");
        }

        MaximumOrder = Parameters.RequireCount(maximumOrder, SmallestOrder, LargestOrder, "The highest order", nameof(maximumOrder));
        // A request is a key: −0 and 0 are one number.
        Mean = mean == 0 ? 0.0 : mean;
        StandardDeviation = standardDeviation;
        Lower = lower == 0 ? 0.0 : lower;
        Upper = upper == 0 ? 0.0 : upper;
    }

    /// <summary>The mean before truncation; never −0.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation before truncation, above zero.</summary>
    public double StandardDeviation { get; }

    /// <summary>The lower end; never −0.</summary>
    public double Lower { get; }

    /// <summary>The upper end; never −0.</summary>
    public double Upper { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.TruncatedNormalMoments(MaximumOrder, Mean, StandardDeviation, Lower, Upper);

    /// <summary>Whether a number can be the mean: whether it is finite.</summary>
    public static bool IsMean(double value) => Parameters.IsFinite(value);

    /// <summary>Whether a number can be the standard deviation: whether it is finite and above zero.</summary>
    public static bool IsStandardDeviation(double value) => Parameters.IsPositive(value);

    /// <summary>Whether two numbers can be the ends: the lower below the upper, and one of them finite.</summary>
    public static bool IsInterval(double lower, double upper) => GaussTruncatedNormalRequest.IsInterval(lower, upper);

    /// <summary>Whether a number can be the highest order.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">
    /// The probability of the interval is below 2^−1022, or a moment cannot be resolved within the limit on the precision.
    /// </exception>
    public override MomentTable Construct(CancellationToken cancellation)
    {
        var distribution = new TruncatedNormalDistribution(
            Parameters.ValueOf(Mean),
            Parameters.ValueOf(StandardDeviation),
            TruncatedNormalParameters.End(Lower),
            TruncatedNormalParameters.End(Upper));
        TruncatedNormalParameters.RequireMass(distribution, cancellation);
        var moments = new TruncatedNormalMoments(distribution, MaximumOrder, cancellation);
        IReadOnlyList<RealNumber> central = moments.Central();
        return new MomentTable(Describe(), moments.Raw(cancellation), central, moments.Absolute(central));
    }

    private MomentDescription Describe() => new(
        "the normal distribution with mean " + Parameters.Write(Mean) + " and standard deviation " + Parameters.Write(StandardDeviation)
            + ", truncated to " + TruncatedNormalParameters.Write(Lower, Upper),
        "moments about a point near the mean by a recurrence of enclosures, those about the mean and about zero by the binomial theorem; "
            + "rational ones are exact",
        "Tallis 1961; Stein 1981; NIST DLMF 7.6.2");
}
