using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Moments;

/// <summary>
/// A request for the moments of the density proportional to exp(−(c₁x² + c₂x⁴ + c₃x⁶ + …)), orders 0 to <see cref="MaximumOrder"/>. Each coefficient is
/// the exact value of a binary64 number; the last one is above zero. The density is normalised: the moment of order 0 is 1.
/// </summary>
public sealed record EvenExponentialMomentsRequest : MomentRequest
{
    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>
    /// The largest order that may be asked for. The work for the odd absolute moments grows with its square; this many stay well below a
    /// second.
    /// </summary>
    public const int LargestOrder = 100;

    /// <summary>The largest number of coefficients: up to x¹⁶.</summary>
    public const int MaximumCoefficients = GaussEvenExponentialRequest.MaximumCoefficients;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="coefficients">c₁, c₂, …; finite, the last one above zero, at most <see cref="MaximumCoefficients"/>.</param>
    /// <param name="maximumOrder">The highest order, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public EvenExponentialMomentsRequest(ValueList coefficients, int maximumOrder, BinaryFormat format)
        : base(format)
    {
        Coefficients = EvenExponentialParameters.Require(coefficients, nameof(coefficients));
        MaximumOrder = Parameters.RequireCount(maximumOrder, SmallestOrder, LargestOrder, "The highest order", nameof(maximumOrder));
    }

    /// <summary>c₁, c₂, ….</summary>
    public ValueList Coefficients { get; }

    /// <summary>The highest order.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.EvenExponentialMoments(MaximumOrder, Coefficients);

    /// <summary>Whether numbers can be the coefficients: one to <see cref="MaximumCoefficients"/> finite ones, the last above zero.</summary>
    public static bool AreCoefficients(ValueList values) => GaussEvenExponentialRequest.AreCoefficients(values);

    /// <summary>Whether a number can be the highest order.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">The wells are too deep, or the parts too narrow, to be resolved within the limits.</exception>
    public override MomentTable Construct(CancellationToken cancellation)
    {
        var moments = new EvenExponentialMoments(Array.ConvertAll(Coefficients.ToArray(), Parameters.ValueOf), MaximumOrder);
        IReadOnlyList<RealNumber> central = moments.Central(cancellation);
        IReadOnlyList<RealNumber> absolute = moments.Absolute(central);
        // What the limits do not allow is told here; the enclosure is kept for the rounding.
        _ = absolute[Math.Min(1, MaximumOrder)].Enclose(Rounding.FirstPrecision, cancellation);
        _ = absolute[MaximumOrder & ~1].Enclose(Rounding.FirstPrecision, cancellation);
        return new MomentTable(Describe(), central, central, absolute);
    }

    private MomentDescription Describe() => new(
        "the density proportional to " + EvenExponentialParameters.Write(Coefficients),
        "even moments by the trapezoidal rule, odd absolute ones by Taylor series on panels of the half-line, both with proven bounds of the error; "
            + "rational ones are exact",
        "Trefethen and Weideman 2014, theorem 5.1; Winkelbauer 2012");
}
