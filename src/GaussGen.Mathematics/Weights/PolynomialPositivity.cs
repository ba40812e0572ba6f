using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>Proves in exact arithmetic that a polynomial is above zero on [0, ∞).</summary>
internal static class PolynomialPositivity
{
    private const int MaximumHalvings = 48;

    /// <summary>
    /// Whether the polynomial with the given coefficients, lowest first, is proven to be above zero for all T ≥ 0. Bernstein's
    /// criterion on [0, B] with bisection (Lane and Riesenfeld 1981), and beyond B by the signs of the Taylor coefficients.
    /// </summary>
    /// <param name="coefficients">The coefficients; the last one above zero.</param>
    /// <param name="beyond">A point B of the caller's choice.</param>
    /// <param name="cancellation">Looked at in each bisection.</param>
    internal static bool IsPositive(Dyadic[] coefficients, Dyadic beyond, CancellationToken cancellation)
    {
        foreach (Dyadic coefficient in Shift(coefficients, beyond))
        {
            if (coefficient.Sign < 0)
            {
                return false;
            }
        }

        return IsPositive(ToBernstein(coefficients, beyond), MaximumHalvings, cancellation);
    }

    /// <summary>The Taylor coefficients at a point, by Horner's scheme.</summary>
    internal static Dyadic[] Shift(Dyadic[] coefficients, Dyadic point)
    {
        var shifted = (Dyadic[])coefficients.Clone();
        for (int i = 0; i < shifted.Length - 1; i++)
        {
            for (int j = shifted.Length - 2; j >= i; j--)
            {
                shifted[j] = (shifted[j] + (shifted[j + 1] * point)).Reduce();
            }
        }

        return shifted;
    }

    /// <summary>
    /// Bernstein coefficients on [0, B], all times d! so that they stay dyadic: d! Σᵢ C(j,i)/C(d,i) cᵢ Bⁱ at j.
    /// </summary>
    private static Dyadic[] ToBernstein(Dyadic[] coefficients, Dyadic end)
    {
        int degree = coefficients.Length - 1;
        var result = new Dyadic[degree + 1];
        for (int j = 0; j <= degree; j++)
        {
            Dyadic power = new(1, 0);
            for (int i = 0; i <= j; i++)
            {
                // d! C(j,i)/C(d,i) = j!/(j−i)! · (d−i)!.
                Dyadic factor = new(FallingFactorial(j, i) * FallingFactorial(degree - i, degree - i), 0);
                result[j] += coefficients[i] * power * factor;
                power *= end;
            }

            result[j] = result[j].Reduce();
        }

        return result;
    }

    private static System.Numerics.BigInteger FallingFactorial(int value, int count)
    {
        System.Numerics.BigInteger product = 1;
        for (int i = 0; i < count; i++)
        {
            product *= value - i;
        }

        return product;
    }

    private static bool IsPositive(Dyadic[] bernstein, int halvings, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        if (Array.TrueForAll(bernstein, coefficient => coefficient.Sign > 0))
        {
            return true;
        }

        // The first and last coefficients are values of the polynomial.
        if (halvings == 0 || bernstein[0].Sign <= 0 || bernstein[bernstein.Length - 1].Sign <= 0)
        {
            return false;
        }

        Dyadic[] left = new Dyadic[bernstein.Length], right = (Dyadic[])bernstein.Clone();
        for (int i = 0; i < left.Length; i++)
        {
            left[i] = right[0];
            for (int j = 0; j < right.Length - 1 - i; j++)
            {
                right[j] = (right[j] + right[j + 1]).ScaleByPowerOfTwo(-1).Reduce();
            }
        }

        return IsPositive(left, halvings - 1, cancellation) && IsPositive(right, halvings - 1, cancellation);
    }
}
