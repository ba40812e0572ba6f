using System;
using System.Collections.Generic;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;

namespace GaussGen.Mathematics.Moments;

/// <summary>
/// A request for the moments of the normal distribution, orders 0 to <see cref="MaximumOrder"/>. Mean and standard deviation
/// are the exact values of two binary64 numbers: 0.1 means 3602879701896397/2⁵⁵.
/// </summary>
public sealed record NormalMomentsRequest : MomentRequest
{
    /// <summary>The largest order that may be asked for.</summary>
    public const int LargestOrder = 200;

    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="mean">The mean; finite.</param>
    /// <param name="standardDeviation">The standard deviation; finite and above zero.</param>
    /// <param name="maximumOrder">The highest order, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is outside its range; the message says what to give.</exception>
    public NormalMomentsRequest(double mean, double standardDeviation, int maximumOrder, BinaryFormat format)
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

        if (!IsMaximumOrder(maximumOrder))
        {
            string message = string.Format(
                CultureInfo.InvariantCulture, "The highest order must be from {0} to {1}.", SmallestOrder, LargestOrder);
            throw new ArgumentOutOfRangeException(nameof(maximumOrder), maximumOrder, message);
        }

        // A request is a key: −0 and 0 are one mean.
        Mean = mean == 0 ? 0.0 : mean;
        StandardDeviation = standardDeviation;
        MaximumOrder = maximumOrder;
    }

    /// <summary>The mean; never −0.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation, above zero.</summary>
    public double StandardDeviation { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.NormalMoments(MaximumOrder, Mean, StandardDeviation);

    /// <summary>Whether a number can be a mean: whether it is finite.</summary>
    public static bool IsMean(double value) => Parameters.IsFinite(value);

    /// <summary>Whether a number can be a standard deviation: whether it is finite and above zero.</summary>
    public static bool IsStandardDeviation(double value) => Parameters.IsPositive(value);

    /// <summary>Whether a number can be the highest order.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <remarks>
    /// Raw moments by E Xᵏ = m E Xᵏ⁻¹ + (k−1) s² E Xᵏ⁻², central and absolute ones in closed form; see
    /// <see cref="NormalMoments"/>. Everything but the absolute moments of odd order is exact.
    /// </remarks>
    public override MomentTable Construct(CancellationToken cancellation)
    {
        Dyadic mean = Parameters.ValueOf(Mean);
        Dyadic standardDeviation = Parameters.ValueOf(StandardDeviation);
        IReadOnlyList<RealNumber> raw = NormalMoments.Raw(mean, standardDeviation, MaximumOrder, cancellation);
        IReadOnlyList<RealNumber> central = NormalMoments.Central(standardDeviation, MaximumOrder, cancellation);
        IReadOnlyList<RealNumber> absolute = NormalMoments.Absolute(standardDeviation, central, cancellation);
        return new MomentTable(Describe(), raw, central, absolute);
    }

    private MomentDescription Describe() => new(
        "the normal distribution with mean " + Parameters.Write(Mean) + " and standard deviation " + Parameters.Write(StandardDeviation),
        "raw, central and even absolute moments are exact rational numbers, odd absolute ones are a rational number times an "
            + "enclosure of the square root of 2/π",
        "Stein 1981; Winkelbauer 2012; NIST DLMF 5.4");
}
