using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Sequences;

/// <summary>⟨m|xᵖ|n⟩ for the harmonic oscillator with x = (a + a†)/√2, as integers and one square root.</summary>
/// <remarks>
/// In normal order (a + a†)ᵖ = Σⱼ hⱼ Σᵣ C(p−2j, r) a†ʳ aᵖ⁻²ʲ⁻ʳ with hⱼ = p!/(2ʲ j! (p−2j)!), the number of ways to pair 2j of p factors (Wick
/// 1950, "The evaluation of the collision matrix"). For m ≥ n and l = n − s = m − r, ⟨m|a†ʳ aˢ|n⟩ = √(m! n!)/l! = (n!/l!) √(m!/n!), so that
/// ⟨m|xᵖ|n⟩ = 2^(−p/2) √((n+1)(n+2)…m) Σₗ hⱼ C(p−2j, m−l) n!/l!, 2j = p − (m − l) − (n − l) ≥ 0: a sum of positive integers. It is empty,
/// and the element zero, where m + n + p is odd or m − n exceeds p. The element is rational where the root's argument is a square.
/// </remarks>
internal static class OscillatorElements
{
    /// <summary>The matrix row by row; elements that symmetry makes equal are one object.</summary>
    internal static IReadOnlyList<RealNumber> RowMajor(int size, int power, CancellationToken cancellation)
    {
        BigInteger[][] binomials = Binomials(power);
        BigInteger[] pairings = Pairings(power);
        RealNumber zero = RealNumber.Exact(Rational.Zero);
        var elements = new RealNumber[size * size];
        for (int m = 0; m < size; m++)
        {
            // (n+1)…m as n falls from m.
            BigInteger product = BigInteger.One;
            for (int n = m; n >= 0; n--)
            {
                cancellation.ThrowIfCancellationRequested();
                BigInteger sum = Sum(m, n, power, binomials, pairings);
                RealNumber element = sum.IsZero ? zero : Element(sum, product, power);
                elements[(m * size) + n] = element;
                elements[(n * size) + m] = element;
                product *= n;
            }
        }

        return elements;
    }

    private static BigInteger Sum(int m, int n, int power, BigInteger[][] binomials, BigInteger[] pairings)
    {
        BigInteger sum = BigInteger.Zero;
        if (((m + n + power) & 1) != 0)
        {
            return sum;
        }

        // n!/l! as l falls from n.
        BigInteger factor = BigInteger.One;
        for (int l = n; l >= 0 && m + n - (2 * l) <= power; l--)
        {
            int unpaired = m + n - (2 * l);
            sum += pairings[(power - unpaired) / 2] * binomials[unpaired][m - l] * factor;
            factor *= l;
        }

        return sum;
    }

    /// <summary>sum · √product · 2^(−power/2).</summary>
    private static RealNumber Element(BigInteger sum, BigInteger product, int power)
    {
        // 2^(−p/2) √N = 2^−⌈p/2⌉ √(2N) for odd p.
        BigInteger square = (power & 1) == 0 ? product : product * 2;
        var factor = new Dyadic(sum, -((power + 1) / 2));
        BigInteger root = IntegerRoot.Floor(square, out BigInteger remainder);
        return remainder.IsZero
            ? RealNumber.Exact((factor * new Dyadic(root, 0)).Reduce().ToRational())
            : RealNumber.FromEnclosures((precision, _) => Ball.Multiply(
                Ball.FromDyadic(factor).Trim(precision + 2), Ball.Sqrt(Ball.FromInteger(square), precision + 2), precision));
    }

    /// <summary>Pascal's triangle to a row.</summary>
    private static BigInteger[][] Binomials(int last)
    {
        var rows = new BigInteger[last + 1][];
        for (int n = 0; n <= last; n++)
        {
            rows[n] = new BigInteger[n + 1];
            rows[n][0] = rows[n][n] = BigInteger.One;
            for (int k = 1; k < n; k++)
            {
                rows[n][k] = rows[n - 1][k - 1] + rows[n - 1][k];
            }
        }

        return rows;
    }

    /// <summary>hⱼ = p!/(2ʲ j! (p−2j)!) by hⱼ₊₁ = hⱼ (p−2j)(p−2j−1)/(2(j+1)).</summary>
    private static BigInteger[] Pairings(int power)
    {
        var counts = new BigInteger[(power / 2) + 1];
        counts[0] = BigInteger.One;
        for (int j = 0; j + 1 < counts.Length; j++)
        {
            counts[j + 1] = counts[j] * ((power - (2 * j)) * (power - (2 * j) - 1)) / (2 * (j + 1));
        }

        return counts;
    }
}
