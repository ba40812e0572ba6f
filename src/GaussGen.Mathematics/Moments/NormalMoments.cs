using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Moments;

/// <summary>The moments of the normal distribution with mean m and standard deviation s, both dyadic.</summary>
/// <remarks>
/// <para>
/// Sums and products of dyadic numbers are dyadic, so nothing here needs a common divisor, and the size of a number is bounded:
/// each order adds at most the bits of m and s, about 4200 for the most distant binary64 numbers.
/// </para>
/// <para>
/// Sources: Stein's identity E[(X − m) f(X)] = s² E f′(X) (Stein 1981) with f = xᵏ⁻¹ gives the recurrence of the raw moments;
/// E (X − m)ᵏ = (k−1)!! sᵏ for even k and E |X − m|ᵏ = sᵏ 2^(k/2) Γ((k+1)/2)/√π are in Winkelbauer, "Moments and absolute moments
/// of the normal distribution" (2012; recalled, recomputed), with Γ(j+1) = j! (NIST DLMF 5.4.1).
/// </para>
/// </remarks>
internal static class NormalMoments
{
    /// <summary>E Xᵏ = m E Xᵏ⁻¹ + (k−1) s² E Xᵏ⁻², from 1 and m; exact.</summary>
    public static IReadOnlyList<RealNumber> Raw(
        Dyadic mean, Dyadic standardDeviation, int maximumOrder, CancellationToken cancellation)
    {
        Dyadic variance = standardDeviation * standardDeviation;
        var moments = new RealNumber[maximumOrder + 1];
        Dyadic before = Dyadic.Zero;
        Dyadic current = One;
        for (int order = 0; order <= maximumOrder; order++)
        {
            cancellation.ThrowIfCancellationRequested();
            moments[order] = Exact(current);
            Dyadic next = (mean * current) + (variance * before * Integer(order));
            before = current;
            current = next;
        }

        return moments;
    }

    /// <summary>E (X − m)ᵏ: (k−1)!! sᵏ for even k, 0 for odd k; exact.</summary>
    public static IReadOnlyList<RealNumber> Central(Dyadic standardDeviation, int maximumOrder, CancellationToken cancellation)
    {
        Dyadic variance = standardDeviation * standardDeviation;
        RealNumber zero = RealNumber.Exact(Rational.Zero);
        var moments = new RealNumber[maximumOrder + 1];
        Dyadic even = One;
        for (int order = 0; order <= maximumOrder; order++)
        {
            cancellation.ThrowIfCancellationRequested();
            moments[order] = (order & 1) == 0 ? Exact(even) : zero;
            even = (order & 1) == 0 ? even * variance * Integer(order + 1) : even;
        }

        return moments;
    }

    /// <summary>
    /// E |X − m|ᵏ: the central moment for even k; 2ʲ j! sᵏ √(2/π) for k = 2j + 1, a dyadic number times an enclosed one.
    /// </summary>
    public static IReadOnlyList<RealNumber> Absolute(
        Dyadic standardDeviation, IReadOnlyList<RealNumber> central, CancellationToken cancellation)
    {
        Dyadic variance = standardDeviation * standardDeviation;
        var moments = new RealNumber[central.Count];
        Dyadic factor = standardDeviation;
        for (int order = 0; order < moments.Length; order++)
        {
            cancellation.ThrowIfCancellationRequested();
            if ((order & 1) == 0)
            {
                moments[order] = central[order];
                continue;
            }

            moments[order] = TimesRootOfTwoOverPi(factor);
            factor = factor * variance * Integer(order + 1);
        }

        return moments;
    }

    private static Dyadic One => new(BigInteger.One, 0);

    private static Dyadic Integer(int value) => new(value, 0);

    private static RealNumber Exact(Dyadic value) => RealNumber.Exact(value.ToRational());

    private static RealNumber TimesRootOfTwoOverPi(Dyadic factor) => RealNumber.FromEnclosures((precision, cancellation) =>
    {
        // Two guard bits: each operation adds less than a unit in the last place.
        int working = precision + 2;
        Ball ratio = Ball.Divide(Constants.Sqrt2(working), Constants.SqrtPi(working, cancellation), working);
        return Ball.Multiply(Ball.FromDyadic(factor).Trim(working), ratio, precision);
    });
}
