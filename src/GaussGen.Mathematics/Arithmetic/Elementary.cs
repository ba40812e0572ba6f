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

        // exp(value) = 2^k exp(t) with 0 ≤ t < 1; t is halved until its series is short, and the sum squared as often. Halving the
        // argument about p^(1/3) times balances the squarings with a series that takes its terms in rows.
        int halvings = 2 + CubeRoot(precision);
        int bits = checked(precision + halvings + 32);
        BigInteger reduced = Reduce(value, bits, cancellation, out int k);
        BigInteger sum = ExpSeries(reduced >> halvings, halvings, bits, cancellation);
        for (int i = 0; i < halvings; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            sum = (sum * sum) >> bits;
        }

        // Relative errors: d₀ < 11·2^−bits at first, and d' ≤ 2d + d² + 2^−bits after a squaring rounded down, so that
        // d' + 2^−bits ≤ (2 + 2⁻⁸)(d + 2^−bits) while d ≤ 2⁻⁸. As (1 + 2⁻⁹)^halvings < 2 for halvings ≤ 256, the last one is
        // below 2^(halvings+1)·12·2^−bits, and exp(t) < 4.
        Bound radius = Bound.FromParts(12, checked(halvings + 3 - bits));
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

    /// <summary>
    /// exp(s) in units of 2^−bits for s in [0, 2^−size), size at least 2, off by less than 11 units where s is off by less than 3.
    /// </summary>
    /// <remarks>
    /// Taylor's series in rows of m terms (Smith 1989, "Efficient multiple-precision evaluation of elementary functions"):
    /// R_j = (Σ q_k s^k + s^m R_(j+1)) / q₀ with the integers q_k = (mj+k+1)…(mj+m), and the sum is R₀. In units, each power is
    /// too small by at most 1/(1 − s) ≤ 4/3; with e units the error of R_(j+1) ≤ 1.3, that of R_j is at most
    /// (4/3)(1/2! + 1/3! + …) + (4/3)·1.3/2 + e/32 + 1/2 + 1 &lt; 3.4 + e/32, so always below 4. The terms left out are below
    /// 2·2^(−size·N)/N! ≤ 1 unit. The argument's 3 units count for 3.9.
    /// </remarks>
    private static BigInteger ExpSeries(BigInteger s, int size, int bits, CancellationToken cancellation)
    {
        int count = TermCount(size, bits);
        int columns = 2;
        while (columns * columns < count)
        {
            columns++;
        }

        var powers = new BigInteger[columns + 1];
        powers[0] = BigInteger.One << bits;
        powers[1] = s;
        for (int k = 2; k <= columns; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            powers[k] = (powers[k - 1] * s) >> bits;
        }

        BigInteger sum = BigInteger.Zero;
        for (int row = (count - 1) / columns; row >= 0; row--)
        {
            cancellation.ThrowIfCancellationRequested();
            BigInteger factor = BigInteger.One;
            sum = (powers[columns] * sum) >> bits;
            for (int k = columns - 1; k >= 0; k--)
            {
                factor *= (row * columns) + k + 1;
                sum += powers[k] * factor;
            }

            sum /= factor;
        }

        return sum;
    }

    /// <summary>The least N with 2^(−size·N)/N! ≤ 2^(−bits−1), or a little more.</summary>
    private static int TermCount(int size, int bits)
    {
        int count = 1;
        long factorialLog2 = 0;
        while (((long)size * count) + factorialLog2 <= bits)
        {
            count++;
            factorialLog2 += Magnitude.BitLength((ulong)count) - 1;
        }

        return count;
    }

    private static BigInteger Shift(BigInteger value, long shift) =>
        shift >= 0 ? value << checked((int)shift) : value >> checked((int)Math.Min(-shift, int.MaxValue));

    private static int CubeRoot(int value)
    {
        int root = 0;
        while ((long)(root + 1) * (root + 1) * (root + 1) <= value && root < 250)
        {
            root++;
        }

        return root;
    }
}
