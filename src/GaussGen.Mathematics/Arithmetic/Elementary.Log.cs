using System;
using System.Threading;

namespace GaussGen.Mathematics.Arithmetic;

/// <content>The logarithm.</content>
public static partial class Elementary
{
    /// <summary>The natural logarithm; the whole line where the ball reaches zero.</summary>
    /// <param name="value">The argument; numbers at or below zero in it have no logarithm and are left out.</param>
    /// <param name="precision">Bits that the result's midpoint keeps; for an exact argument the relative radius is below 2^(8−precision).</param>
    /// <param name="cancellation">Looked at in every loop.</param>
    /// <exception cref="ArgumentOutOfRangeException">No number in the ball is positive.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static Ball Log(Ball value, int precision, CancellationToken cancellation = default)
    {
        if (value.IsPositive == Trilean.False)
        {
            throw new ArgumentOutOfRangeException(nameof(value), "The logarithm needs a ball that reaches above zero.");
        }

        if (value.ContainsZero)
        {
            return Ball.WholeLine;
        }

        Ball center = LogOf(value.Center, precision, cancellation);
        if (value.IsExact)
        {
            return center;
        }

        // |log(m + d) − log m| ≤ −log(1 − r/m) ≤ (r/m)/(1 − r/m) = r/(m − r) for |d| ≤ r < m.
        return center.Enlarge(Bound.DivideByAtLeast(value.Radius, value.Lower)).Trim(precision);
    }

    private static Ball LogOf(Dyadic value, int precision, CancellationToken cancellation)
    {
        // value = 2^k m with m in [3/4, 3/2), so that log m cannot cancel k·ln 2.
        int length = value.BitLength;
        bool large = Shift(value.Mantissa, 2L - length) >= 3;
        int k = checked(value.Exponent + length - (large ? 0 : 1));
        Ball m = Ball.FromDyadic(new Dyadic(value.Mantissa, large ? -length : 1 - length));
        Ball logarithm = LogNearOne(m, precision + 8, cancellation);
        return k == 0
            ? logarithm.Trim(precision)
            : Ball.Add(
                Ball.Multiply(Ball.FromInteger(k), Constants.Ln2(precision + 8, cancellation), precision + 8),
                logarithm,
                precision);
    }

    /// <summary>log m for m in [3/4, 3/2).</summary>
    private static Ball LogNearOne(Ball m, int precision, CancellationToken cancellation)
    {
        Ball distance = Ball.Subtract(m, Ball.FromInteger(1), int.MaxValue);
        if (distance.IsZero == Trilean.True)
        {
            return Ball.FromInteger(0);
        }

        long top = (long)Magnitude.BitLength(distance.Midpoint) + distance.Exponent;
        if (top < -20)
        {
            return LogOnePlus(distance, precision, cancellation);
        }

        // log m = y + log(m·exp(−y)) for any y; here y is log m to some 28 bits, so that the second logarithm is of a number
        // next to 1. Nothing depends on how good y is but the length of the series. As |log m| > 2^−22, 24 more bits suffice.
        int working = precision + 24;
        Dyadic guess = LogGuess(m.Center);
        Ball scaled = Ball.Multiply(m, Exp(Ball.FromDyadic(-guess), working, cancellation), working);
        Ball rest = LogOnePlus(Ball.Subtract(scaled, Ball.FromInteger(1), working), working, cancellation);
        return Ball.Add(Ball.FromDyadic(guess), rest, precision);
    }

    /// <summary>log(1 + d) for a ball d below 1/2 in magnitude.</summary>
    /// <remarks>
    /// 2 artanh(s), s = d/(2 + d), by its series Σ s^(2i+1)/(2i+1) (NIST DLMF 4.6.4). With |s| ≤ 2^−p the terms from the
    /// n-th on sum to at most 2^−p(2n+1) · 4/3.
    /// </remarks>
    private static Ball LogOnePlus(Ball d, int precision, CancellationToken cancellation)
    {
        Ball s = Ball.Divide(d, Ball.Add(d, Ball.FromInteger(2), precision), precision);
        Ball square = Ball.Square(s, precision);
        int sizeLog2 = (Bound.FromMagnitude(s.Midpoint, s.Exponent) + s.Radius).CeilingLog2;
        int p = sizeLog2 == int.MinValue ? precision : -sizeLog2;
        Ball power = s;
        Ball sum = s;
        int index = 1;
        for (; (long)p * 2 * index < precision; index++)
        {
            cancellation.ThrowIfCancellationRequested();
            power = Ball.Multiply(power, square, precision);
            sum = Ball.Add(sum, Ball.Divide(power, Ball.FromInteger((2 * index) + 1), precision), precision);
        }

        Bound truncation = Bound.PowerOfTwo(checked(-p * ((2 * index) + 1) + 1));
        return sum.Enlarge(truncation).ScaleByPowerOfTwo(1);
    }

    /// <summary>log m to some 28 bits for m in [3/4, 3/2), in integers, so that it is the same number on every host.</summary>
    private static Dyadic LogGuess(Dyadic m)
    {
        const int Bits = 30;
        long x = (long)Shift(m.Mantissa, m.Exponent + (long)Bits);
        long one = 1L << Bits;
        long s = ((x - one) << Bits) / (x + one);
        long square = (s * s) >> Bits;
        long sum = 0;
        // |s| ≤ 1/5, so that eight terms leave less than 2^−39.
        for (int i = 15; i >= 1; i -= 2)
        {
            sum = ((sum * square) >> Bits) + (one / i);
        }

        return new Dyadic((2 * sum * s) >> Bits, -Bits);
    }
}
