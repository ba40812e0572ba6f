using System;
using System.Numerics;
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

        // log m = y + log(m·exp(−y)) for any y; here y is log m within 2⁻²⁶, so that the second logarithm is of a number next
        // to 1 and its series is short. As |log m| > 2⁻²², 24 more bits suffice.
        int working = precision + 24;
        Dyadic guess = LogGuess(m.Center);
        Ball scaled = Ball.Multiply(m, Exp(Ball.FromDyadic(-guess), working, cancellation), working);
        Ball rest = LogOnePlus(Ball.Subtract(scaled, Ball.FromInteger(1), working), working, cancellation);
        return Ball.Add(Ball.FromDyadic(guess), rest, precision);
    }

    /// <summary>log(1 + d) for a ball d within 2⁻¹⁸ of zero, with about so many bits relative to d.</summary>
    private static Ball LogOnePlus(Ball d, int precision, CancellationToken cancellation)
    {
        // |log(1 + x) − log(1 + d)| ≤ r/(1 − 2⁻¹⁸) < r (1 + 2⁻¹⁶) for |x − d| ≤ r.
        Bound radius = d.Radius + d.Radius.ScaleByPowerOfTwo(-16);
        if (d.Midpoint.IsZero)
        {
            return new Ball(BigInteger.Zero, 0, radius);
        }

        int size = checked(-(Magnitude.BitLength(d.Midpoint) + d.Exponent));
        int bits = checked(Math.Max(precision, 1) + size + 16);
        BigInteger series = Artanh(d.Center, bits, cancellation, out ulong units);
        return new Ball(series, 1 - bits, radius + Bound.FromParts(units, 1 - bits));
    }

    /// <summary>
    /// artanh(d/(2 + d)), half of log(1 + d), in units of 2^−bits for 0 &lt; |d| &lt; 2⁻¹⁸, off by less than
    /// <paramref name="error"/> units.
    /// </summary>
    /// <remarks>
    /// Σ s^(2i+1)/(2i+1), s = d/(2 + d) (NIST DLMF 4.6.4), of the magnitude of s. The quotient s is too small by less than one
    /// unit, its square by less than 2 and each power by less than 2, so each term by less than 3. With the series' argument
    /// below 2^−17 what follows the first power below one unit sums to less than 3.
    /// </remarks>
    private static BigInteger Artanh(Dyadic d, int bits, CancellationToken cancellation, out ulong error)
    {
        Dyadic divisor = d + new Dyadic(2, 0);
        int shift = checked(d.Exponent - divisor.Exponent + bits);
        BigInteger s = shift >= 0
            ? (BigInteger.Abs(d.Mantissa) << shift) / divisor.Mantissa
            : BigInteger.Abs(d.Mantissa) / (divisor.Mantissa << -shift);
        BigInteger square = (s * s) >> bits;
        BigInteger power = s;
        BigInteger sum = s;
        int index = 1;
        while (!power.IsZero)
        {
            cancellation.ThrowIfCancellationRequested();
            power = (power * square) >> bits;
            sum += power / ((2 * index) + 1);
            index++;
        }

        error = (3UL * (ulong)index) + 3;
        return d.Sign < 0 ? -sum : sum;
    }

    /// <summary>log m within 2⁻²⁶ for m in [3/4, 3/2), in integers, so that it is the same number on every host.</summary>
    private static Dyadic LogGuess(Dyadic m)
    {
        const int Bits = 30;
        long x = (long)Shift(m.Mantissa, m.Exponent + (long)Bits);
        long one = 1L << Bits;
        long s = ((x - one) << Bits) / (x + one);
        long square = (s * s) >> Bits;
        long sum = 0;
        // |s| ≤ 1/5, so that eight terms leave less than 2^−39; the roundings of some units of 2⁻³⁰ shrink with the powers of s.
        for (int i = 15; i >= 1; i -= 2)
        {
            sum = ((sum * square) >> Bits) + (one / i);
        }

        return new Dyadic((2 * sum * s) >> Bits, -Bits);
    }
}
