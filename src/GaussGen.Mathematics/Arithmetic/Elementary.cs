using System;
using System.Numerics;
using System.Threading;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>Elementary functions of balls, from integer arithmetic with stated error bounds.</summary>
public static partial class Elementary
{
    // Beyond this power of two a result has an exponent that nothing else here could handle.
    private const int LargestExponent = 1 << 28;

    /// <summary>The exponential function.</summary>
    /// <param name="value">The argument.</param>
    /// <param name="precision">Bits that the result's midpoint keeps; for an exact argument the relative radius is below 2^(2−precision).</param>
    /// <param name="cancellation">Looked at in every loop.</param>
    /// <exception cref="OverflowException">The result may exceed 2^(2²⁸).</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static Ball Exp(Ball value, int precision, CancellationToken cancellation = default)
    {
        if (!value.IsFinite)
        {
            return Ball.WholeLine;
        }

        // With a wide argument only the ends matter: 0 < exp x ≤ exp(upper end).
        if (value.Radius.CeilingLog2 > 0)
        {
            Ball top = ExpOf(value.Upper, Math.Min(precision, 64), cancellation);
            return Ball.FromEndpoints(Dyadic.Zero, top.Upper, precision);
        }

        Ball center = ExpOf(value.Center, precision, cancellation);
        if (value.IsExact)
        {
            return center;
        }

        // |exp(m + d) − exp m| ≤ exp(m) (exp r − 1) ≤ exp(m) (r + r²) for |d| ≤ r ≤ 1.
        Bound above = Bound.FromDyadic(center.Upper);
        return center.Enlarge(above * (value.Radius + (value.Radius * value.Radius))).Trim(precision);
    }

    private static Ball ExpOf(Dyadic value, int precision, CancellationToken cancellation)
    {
        if (value.IsZero)
        {
            return Ball.FromInteger(1);
        }

        long top = (long)value.BitLength + value.Exponent;
        if (top > 28)
        {
            return value.Sign > 0
                ? throw new OverflowException("The exponential of a number beyond 2^28 is out of range.")
                : Ball.FromEndpoints(Dyadic.Zero, new Dyadic(1, -LargestExponent), precision);
        }

        // exp(value) = 2^k exp(t) with t in [0, ln 2], up to the error of k's guess; t = 2^halvings · s is then halved until
        // its series is short, and the sum squared as often.
        int halvings = 2 + IntegerSquareRoot(precision);
        int bits = checked(precision + halvings + 32);
        BigInteger reduced = Reduce(value, bits, cancellation, out int k);
        BigInteger sum = ExpSeries(reduced >> halvings, bits, cancellation, out ulong units);
        for (int i = 0; i < halvings; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            sum = (sum * sum) >> bits;
        }

        // Relative errors: d₀ ≤ units·2^−bits at first, and d' ≤ 2d + d² + 2^−bits after a squaring rounded down, so that
        // d' + 2^−bits ≤ (2 + 2⁻⁸)(d + 2^−bits) while d ≤ 2⁻⁸. As (1 + 2⁻⁹)^halvings < 2 for halvings ≤ 256, the last one is
        // below 2^(halvings+1) (units + 1) 2^−bits, and exp(t) < 4.
        Bound radius = Bound.FromParts(units + 1, checked(halvings + 3 - bits));
        return new Ball(sum, -bits, radius).ScaleByPowerOfTwo(k).Trim(precision);
    }

    /// <summary>t with value = k ln 2 + t and 0 ≤ t &lt; 1, in units of 2^−bits, off by less than 4 units.</summary>
    private static BigInteger Reduce(Dyadic value, int bits, CancellationToken cancellation, out int k)
    {
        // |value| < 2^28, so |k| < 2^29 and k·ln 2 is off by less than 2 units with 32 more bits of ln 2.
        Ball ln2 = Constants.Ln2(bits + 32, cancellation);
        BigInteger fixedValue = Shift(value.Mantissa, value.Exponent + (long)bits);
        BigInteger fixedLn2 = Shift(ln2.Midpoint, ln2.Exponent + (long)bits + 32);
        BigInteger quotient = BigInteger.Divide(fixedValue << 32, fixedLn2);
        k = (int)quotient;
        BigInteger remainder = fixedValue - ((quotient * fixedLn2) >> 32);
        if (remainder.Sign < 0)
        {
            k--;
            remainder += fixedLn2 >> 32;
        }

        return remainder.Sign < 0 ? BigInteger.Zero : remainder;
    }

    /// <summary>exp(s) for s in [0, 1/4), in units of 2^−bits, off by less than <paramref name="error"/> units.</summary>
    /// <remarks>
    /// Taylor's series. A term is too small by e' ≤ (e·s + 1)/i + 1 units, which stays below 3; what follows the first term
    /// below one unit is less than that term's true value, 4 units. The argument is off by less than 5 units, and
    /// exp' &lt; 1.3 there.
    /// </remarks>
    private static BigInteger ExpSeries(BigInteger s, int bits, CancellationToken cancellation, out ulong error)
    {
        BigInteger term = BigInteger.One << bits;
        BigInteger sum = term;
        int index = 1;
        while (true)
        {
            cancellation.ThrowIfCancellationRequested();
            term = ((term * s) >> bits) / index;
            if (term.IsZero)
            {
                break;
            }

            sum += term;
            index++;
        }

        error = (3UL * (ulong)index) + 16;
        return sum;
    }

    private static BigInteger Shift(BigInteger value, long shift) =>
        shift >= 0 ? value << checked((int)shift) : value >> checked((int)Math.Min(-shift, int.MaxValue));

    private static int IntegerSquareRoot(int value)
    {
        int root = 0;
        while ((root + 1) * (root + 1) <= value / 2)
        {
            root++;
        }

        return Math.Min(root, 250);
    }
}
