using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// What one evaluation of a Hermite polynomial at an exact point proves of the zero beside it: where it is, and the weight
/// that belongs to it. The recurrence is run in balls, so that every rounding is in the radius.
/// </summary>
/// <remarks>
/// <para>
/// Notation: P and c as in <see cref="HermiteZeroCount"/>, hₖ = cᵏ k!, κ(u) = Σ Pₖ(u)²/hₖ over k &lt; n, ξ a zero of Pₙ
/// with |ξ − u| ≤ δ, and X = |u| + δ. The weight of ξ is the Christoffel number 1/κ(ξ) (Szegő 3.4; DLMF 3.5(v)), in units
/// of the integral of the weight function.
/// </para>
/// <para>
/// Christoffel–Darboux (DLMF 18.2.13) gives κ h₍ₙ₋₁₎ = n Pₙ₋₁² − Pₙ (u Pₙ₋₁ − Pₙ)/c, and the differential equation
/// c P″ = u P′ − n P (DLMF 18.8) gives κ′ = (u κ − Pₙ Pₙ₋₁/h₍ₙ₋₁₎)/c. Between u and ξ each Pₖ² is at most hₖ K, where K is
/// the maximum of κ there, and so |Pₙ| ≤ n δ √(h₍ₙ₋₁₎ K). With q = δ (X + n δ)/c ≤ ⅛ it follows that K ≤ κ(u)/(1 − q), and then
/// </para>
/// <list type="bullet">
/// <item><description>
/// Pₙ₋₁ differs from Pₙ₋₁(u) by at most δ √((8/7)(n−1) κ(u) h₍ₙ₋₁₎/c), so that ξ − u = −Pₙ(u)/(n Pₙ₋₁(η)) is enclosed
/// (the mean value theorem; this is one step of the interval Newton method, Moore 1966);
/// </description></item>
/// <item><description>
/// κ(u) exp(−u²/2c) differs from κ(ξ) exp(−ξ²/2c), its local maximum, by a factor within 1 ± 0.65 n δ²/c: the derivative
/// of that product is −Pₙ Pₙ₋₁ exp(−u²/2c)/(c h₍ₙ₋₁₎), which is zero at ξ.
/// </description></item>
/// </list>
/// </remarks>
internal sealed class HermiteZeroEnclosure
{
    private readonly int _degree;
    private readonly int _variance;
    private readonly BigInteger _norm;

    /// <summary>Prepares the enclosures of one polynomial's zeros.</summary>
    /// <param name="degree">n, at least 1.</param>
    /// <param name="variance">c, 1 or 2.</param>
    public HermiteZeroEnclosure(int degree, int variance)
    {
        _degree = degree;
        _variance = variance;
        _norm = BigInteger.One;
        for (int k = 2; k < degree; k++)
        {
            _norm *= k;
        }

        _norm <<= (variance - 1) * (degree - 1);
    }

    /// <summary>Whether the zero is near enough to the point for <see cref="At"/>: δ (X + n) ≤ ⅛.</summary>
    public bool IsNearEnough(Dyadic u, Dyadic distance)
    {
        Dyadic product = distance * (u + distance + new Dyadic(_degree, 0));
        return product <= new Dyadic(BigInteger.One, -3);
    }

    /// <summary>Encloses the zero that is known to lie within a distance of a point, and its weight.</summary>
    /// <param name="u">The point, at least 0.</param>
    /// <param name="distance">δ; 0 if the point is the zero itself.</param>
    /// <param name="precision">Working precision in bits.</param>
    /// <returns>ξ − u and 1/κ(ξ).</returns>
    public (Ball Offset, Ball Weight) At(Dyadic u, Dyadic distance, int precision)
    {
        if (!IsNearEnough(u, distance))
        {
            throw new ArgumentException("The enclosure of the zero is too wide.", nameof(distance));
        }

        Ball point = Ball.FromDyadic(u);
        (Ball value, Ball before) = Evaluate(point, precision);

        // κ(u) h₍ₙ₋₁₎
        Ball product = Ball.Subtract(Ball.Multiply(point, before, precision), value, precision);
        Ball sum = Ball.Subtract(
            Ball.Multiply(Ball.FromInteger(_degree), Ball.Square(before, precision), precision),
            DivideByVariance(Ball.Multiply(value, product, precision)),
            precision);

        Ball offset = OffsetOfZero(distance, value, before, sum, precision);
        Ball weight = Ball.Divide(Ball.FromInteger(_norm), sum, precision);
        return (offset, Ball.Multiply(weight, Carry(point, distance, offset, precision), precision));
    }

    /// <summary>Pₙ and Pₙ₋₁ by the three-term recurrence.</summary>
    private (Ball Value, Ball Before) Evaluate(Ball point, int precision)
    {
        Ball before = Ball.FromInteger(BigInteger.One);
        Ball value = point;
        for (int k = 1; k < _degree; k++)
        {
            Ball lower = Ball.Multiply(Ball.FromInteger(_variance * k), before, precision);
            before = value;
            value = Ball.Subtract(Ball.Multiply(point, value, precision), lower, precision);
        }

        return (value, before);
    }

    private Ball OffsetOfZero(Dyadic distance, Ball value, Ball before, Ball sum, int precision)
    {
        var limits = new Ball(BigInteger.Zero, 0, Bound.FromDyadic(distance));
        if (distance.IsZero)
        {
            return limits;
        }

        // (8/7)(n−1)/c · sum, under the root, times δ.
        Ball squared = Ball.Multiply(Ball.FromRational(new Rational(8 * (_degree - 1), 7 * _variance), 64), sum, 64);
        if (!squared.IsFinite || squared.IsNegative == Trilean.True)
        {
            return limits;
        }

        Ball spread = Ball.Sqrt(squared, 64);
        Ball slope = before.Enlarge(Bound.FromDyadic(spread.Upper) * Bound.FromDyadic(distance));
        if (slope.ContainsZero)
        {
            return limits;
        }

        Ball offset = Ball.Divide(value, Ball.Multiply(Ball.FromInteger(-_degree), slope, precision), precision);
        return offset.IsFinite && offset.Radius < limits.Radius ? offset : limits;
    }

    /// <summary>κ(u)/κ(ξ): exp(−s) with s = (ξ² − u²)/2c, times the factor of the remarks, here taken within 1 ± n δ².</summary>
    private Ball Carry(Ball point, Dyadic distance, Ball offset, int precision)
    {
        Ball twicePoint = point.ScaleByPowerOfTwo(1);
        Ball exponent = Ball.Multiply(offset, Ball.Add(twicePoint, offset, precision), precision).ScaleByPowerOfTwo(-1);
        exponent = DivideByVariance(exponent);

        // |s| ≤ X δ/c ≤ ⅛, and |exp(−s) − 1 + s| ≤ s² there.
        Bound size = Bound.FromMagnitude(exponent.Midpoint, exponent.Exponent) + exponent.Radius;
        Ball exponential = Ball.Subtract(Ball.FromInteger(BigInteger.One), exponent, precision).Enlarge(size * size);

        Bound square = Bound.FromDyadic(distance) * Bound.FromDyadic(distance);
        Ball factor = Ball.FromInteger(BigInteger.One).Enlarge(square * Bound.FromParts((ulong)_degree, 0));
        return Ball.Multiply(exponential, factor, precision);
    }

    private Ball DivideByVariance(Ball value) => value.ScaleByPowerOfTwo(1 - _variance);
}
