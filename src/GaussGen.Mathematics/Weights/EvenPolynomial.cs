using System.Collections.Generic;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>The exponent p(x) = c₁x² + c₂x⁴ + … + c_d x²ᵈ with dyadic coefficients and c_d above zero, as a polynomial in T = x².</summary>
/// <param name="coefficients">c₁ … c_d.</param>
internal sealed class EvenPolynomial(IReadOnlyList<Dyadic> coefficients)
{
    /// <summary>The number d of coefficients: half the degree in x.</summary>
    internal int Terms => coefficients.Count;

    /// <summary>cₖ, for k from 1.</summary>
    internal Dyadic Coefficient(int k) => coefficients[k - 1];

    /// <summary>p at T = x², exactly.</summary>
    internal Dyadic At(Dyadic square)
    {
        Dyadic value = Dyadic.Zero;
        for (int k = Terms; k >= 1; k--)
        {
            value = ((value + Coefficient(k)) * square).Reduce();
        }

        return value;
    }

    /// <summary>
    /// The coefficients, from T⁰, of Re p(x + ia) as a polynomial in T = x²: Re (x + ia)²ᵏ = Σ (−1)ʲ C(2k, 2j) a²ʲ Tᵏ⁻ʲ.
    /// </summary>
    internal Dyadic[] RealPartOnLine(Dyadic height)
    {
        Dyadic square = height * height;
        var result = new Dyadic[Terms + 1];
        for (int k = 1; k <= Terms; k++)
        {
            Dyadic power = Coefficient(k);
            BigInteger binomial = BigInteger.One;
            for (int j = 0; j <= k; j++)
            {
                result[k - j] = (result[k - j] + (power * new Dyadic(binomial, 0))).Reduce();
                power = -power * square;
                binomial = binomial * (((2 * k) - (2 * j)) * ((2 * k) - (2 * j) - 1)) / (((2 * j) + 1) * ((2 * j) + 2));
            }
        }

        return result;
    }

    /// <summary>Whether p″ is certainly not negative anywhere beyond x: whether the Taylor coefficients of p″ at T = x² are not negative.</summary>
    internal bool IsConvexBeyond(Dyadic x)
    {
        var second = new Dyadic[Terms];
        for (int k = 1; k <= Terms; k++)
        {
            second[k - 1] = Coefficient(k) * new Dyadic(2 * k * ((2 * k) - 1), 0);
        }

        foreach (Dyadic coefficient in PolynomialPositivity.Shift(second, x * x))
        {
            if (coefficient.Sign < 0)
            {
                return false;
            }
        }

        return true;
    }
}
