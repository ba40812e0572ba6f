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
/// A request for the moments of the half-normal distribution, that of s|Z| for standard normal Z, orders 0 to <see cref="MaximumOrder"/>. The
/// scale s is the exact value of a binary64 number; it is not the standard deviation, which is s √(1 − 2/π).
/// </summary>
public sealed record HalfNormalMomentsRequest : MomentRequest
{
    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>The largest order that may be asked for, that of <see cref="NormalMomentsRequest"/>.</summary>
    public const int LargestOrder = NormalMomentsRequest.LargestOrder;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="scale">The scale s; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public HalfNormalMomentsRequest(double scale, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        Scale = IsScale(scale)
            ? scale
            : throw new ArgumentOutOfRangeException(nameof(scale), scale, "The scale must be finite and above zero.");
        MaximumOrder = Parameters.RequireCount(maximumOrder, SmallestOrder, LargestOrder, "The highest order", nameof(maximumOrder));
    }

    /// <summary>The scale, above zero.</summary>
    public double Scale { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.HalfNormalMoments(MaximumOrder, Scale);

    /// <summary>Whether a number can be the scale: whether it is finite and above zero.</summary>
    public static bool IsScale(double value) => Parameters.IsPositive(value);

    /// <summary>Whether a number can be the highest order.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <remarks>
    /// E Xᵏ is the absolute moment of the normal distribution about its mean (<see cref="NormalMoments"/>): exact for even k, a dyadic number
    /// times √(2/π) for odd k. Those about the mean are the ones of the normal distribution truncated to [0, ∞).
    /// </remarks>
    /// <exception cref="RuleConstructionException">A moment cannot be resolved within the limit on the precision.</exception>
    public override MomentTable Construct(CancellationToken cancellation)
    {
        Dyadic scale = Parameters.ValueOf(Scale);
        IReadOnlyList<RealNumber> even = NormalMoments.Central(scale, MaximumOrder, cancellation);
        IReadOnlyList<RealNumber> raw = NormalMoments.Absolute(scale, even, cancellation);
        var truncated = new TruncatedNormalMoments(
            new TruncatedNormalDistribution(Dyadic.Zero, scale, Dyadic.Zero, upper: null), MaximumOrder, cancellation);
        IReadOnlyList<RealNumber> central = truncated.Central();
        return new MomentTable(Describe(), raw, central, truncated.Absolute(central));
    }

    private MomentDescription Describe() => new(
        "the half-normal distribution with scale " + Parameters.Write(Scale),
        "even raw moments are exact rational numbers, odd ones a rational number times an enclosure of the square root of 2/π; moments about the "
            + "mean by a recurrence of enclosures and the binomial theorem",
        "Winkelbauer 2012; Tallis 1961; NIST DLMF 5.4, 7.6.2");
}
