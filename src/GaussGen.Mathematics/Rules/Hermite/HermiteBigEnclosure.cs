using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// One positive zero of Heₙ and its weight, enclosed at any precision from the point at which <see cref="HermiteEnclosure"/> has
/// proven it: section 6 of Derivation.md.
/// </summary>
internal static class HermiteBigEnclosure
{
    /// <summary>Bits that each term of the Taylor series gains on the one before: λ·1.125/2²⁵ ≤ 2⁻¹⁸ for n up to 1000.</summary>
    private const int BitsPerTerm = 18;

    /// <summary>Bits that the recurrence and the roundings of the series may lose.</summary>
    private const int GuardBits = 64;

    /// <summary>1.125·2⁻²⁵: as far from the point as the tails of the series are bounded, and farther than the zero can be.</summary>
    private static readonly Dyadic Reach = new(9, -3 - HermiteRecurrence.PointBits);

    /// <summary>Balls around the zero next to the point, and around (n−1)!/(n·Heₙ₋₁²) there.</summary>
    /// <param name="rule">The rule, with n from 3 to 1000 nodes.</param>
    /// <param name="point">X, where <see cref="HermiteEnclosure.TryEnclose"/> succeeded.</param>
    /// <param name="precision">The bits that are wanted; the relative radii are about 2^−precision or less.</param>
    /// <param name="cancellation">Looked at between terms and steps.</param>
    internal static (Ball Node, Ball Weight) Enclose(HermiteRule rule, uint point, int precision, CancellationToken cancellation)
    {
        int points = rule.Points;
        int working = checked(precision + GuardBits);
        (Ball value, Ball lower) = HermiteBigRecurrence.Evaluate(points, point, rule.Roots, working, cancellation);
        Ball x = new(point, -HermiteRecurrence.PointBits, Bound.Zero);
        Ball ratio = Ball.Divide(value, Ball.Multiply(lower, Ball.FromInteger(points), working), working);
        Ball[] series = Coefficients(points, x, ratio, working, cancellation);

        // Newton's method on midpoints; its last result is an exact number like any other, and only its residual counts.
        Ball zero = Midpoint(Ball.Negate(ratio), working);
        for (int bits = 2 * BitsPerTerm; bits < working; bits *= 2)
        {
            (Ball residual, Ball derivative) = Evaluate(series, zero, Math.Min(working, 2 * bits), cancellation);
            zero = Midpoint(Ball.Subtract(zero, Ball.Divide(residual, derivative, working), working), working);
        }

        if (Dyadic.Abs(zero.Center) > Reach)
        {
            throw new InvalidOperationException("Newton's method left the proven neighbourhood of a Hermite zero.");
        }

        // Theorem 7: |F′ − 1| ≤ 2⁻¹⁷ and |F″| ≤ 2⁷ where the zero can be.
        (Ball last, Ball slope) = Evaluate(series, zero, working, cancellation);
        Bound distance = Bound.FromDyadic(Dyadic.Abs(last.Center) + last.Radius.ToDyadic());
        distance += distance.ScaleByPowerOfTwo(-16);
        Ball node = Ball.Add(x, zero.Enlarge(distance), working);
        Ball atZero = Ball.Multiply(lower, slope.Enlarge(distance.ScaleByPowerOfTwo(7)), working);
        Ball square = Ball.Multiply(Ball.FromInteger(points), Ball.Square(atZero, working), working);
        return (node, Ball.Divide(Ball.FromInteger(rule.Factorial), square, working));
    }

    /// <summary>c₀ = u, c₁ = 1 and (j+1)(j+2)·c_{j+2} = (j+1)·x·c_{j+1} − (n−j)·c_j, as many as the precision needs.</summary>
    private static Ball[] Coefficients(int points, Ball x, Ball ratio, int working, CancellationToken cancellation)
    {
        var series = new Ball[(working / BitsPerTerm) + 3];
        series[0] = ratio;
        series[1] = Ball.FromInteger(1);
        for (int j = 0; j + 2 < series.Length; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            int precision = TermPrecision(working, j + 2);
            Ball first = Ball.Multiply(Ball.Multiply(x, series[j + 1], precision), Ball.FromInteger(j + 1), precision);
            Ball second = Ball.Multiply(series[j], Ball.FromInteger(points - j), precision);
            series[j + 2] = Ball.Divide(Ball.Subtract(first, second, precision), Ball.FromInteger((j + 1) * (j + 2)), precision);
        }

        return series;
    }

    /// <summary>F and F′ at an exact h within 1.125·2⁻²⁵ of 0, with the tails of both series.</summary>
    private static (Ball Value, Ball Slope) Evaluate(Ball[] series, Ball h, int working, CancellationToken cancellation)
    {
        int terms = Math.Min(series.Length, (working / BitsPerTerm) + 3);
        Ball value = default, slope = default;
        for (int j = terms - 1; j >= 0; j--)
        {
            cancellation.ThrowIfCancellationRequested();
            int precision = TermPrecision(working, j);
            value = Ball.Add(Ball.Multiply(value, h, precision), series[j], precision);
            if (j > 0)
            {
                Ball term = Ball.Multiply(series[j], Ball.FromInteger(j), precision);
                slope = Ball.Add(Ball.Multiply(slope, h, precision), term, precision);
            }
        }

        int tail = -BitsPerTerm * (terms - 1);
        return (value.Enlarge(Bound.PowerOfTwo(tail - HermiteRecurrence.PointBits)), slope.Enlarge(Bound.PowerOfTwo(tail)));
    }

    private static int TermPrecision(int working, int term) => Math.Max(64, working - (BitsPerTerm * (term - 1)));

    private static Ball Midpoint(Ball value, int precision) => Ball.FromDyadic(value.Trim(precision).Center);
}
