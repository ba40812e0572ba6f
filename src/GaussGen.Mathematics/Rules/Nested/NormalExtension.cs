using System;
using System.Numerics;
using System.Threading;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>
/// The polynomial whose zeros extend the nodes of a rule for the standard normal density (Genz and Keister 1996, after Patterson 1968), in
/// t = x², exactly: README.md, section 1.
/// </summary>
internal static class NormalExtension
{
    /// <summary>
    /// The polynomial E of the given degree q in t, unique up to a factor, with ∫ F E tˢ φ = 0 for s = 1 … q; its coefficients have no common
    /// divisor, and the leading one is above zero.
    /// </summary>
    /// <param name="nodes">F: its zeros are the squares of the nodes beside 0.</param>
    /// <param name="degree">q.</param>
    /// <param name="cancellation">Looked at in each step of the elimination.</param>
    /// <exception cref="InvalidOperationException">There is no such polynomial, or more than one.</exception>
    internal static IntegerPolynomial Of(IntegerPolynomial nodes, int degree, CancellationToken cancellation)
    {
        // Σ eᵢ Gᵢ₊ₛ = 0 with e_q = 1, for each s a row: the coefficients of e₀ … e_q₋₁ and the right-hand side.
        var system = new BigInteger[degree, degree + 1];
        BigInteger[] integrals = Integrals(nodes, 2 * degree);
        for (int row = 0; row < degree; row++)
        {
            for (int i = 0; i <= degree; i++)
            {
                system[row, i] = i < degree ? integrals[row + 1 + i] : -integrals[row + 1 + i];
            }
        }

        BigInteger determinant = Diagonalize(system, degree, cancellation);
        var coefficients = new BigInteger[degree + 1];
        BigInteger divisor = coefficients[degree] = determinant;
        for (int i = 0; i < degree; i++)
        {
            coefficients[i] = system[i, degree];
            divisor = BigInteger.GreatestCommonDivisor(divisor, coefficients[i]);
        }

        divisor = determinant.Sign < 0 ? -divisor : divisor;
        return new IntegerPolynomial(Array.ConvertAll(coefficients, coefficient => coefficient / divisor));
    }

    /// <summary>(2k−1)!! = ∫ tᵏ φ.</summary>
    internal static BigInteger Moment(int k)
    {
        BigInteger product = BigInteger.One;
        for (int factor = 3; factor < 2 * k; factor += 2)
        {
            product *= factor;
        }

        return product;
    }

    /// <summary>Gₘ = ∫ F tᵐ φ for m = 0 … last.</summary>
    private static BigInteger[] Integrals(IntegerPolynomial nodes, int last)
    {
        var integrals = new BigInteger[last + 1];
        for (int k = 0; k <= last + nodes.Degree; k++)
        {
            BigInteger moment = Moment(k);
            for (int m = Math.Max(0, k - nodes.Degree); m <= Math.Min(k, last); m++)
            {
                integrals[m] += nodes[k - m] * moment;
            }
        }

        return integrals;
    }

    /// <summary>
    /// Carries the system to diagonal form by elimination without fractions (Bareiss 1968), in which every division is exact, with an
    /// exchange of rows where a pivot is zero. All entries of the diagonal are then the determinant, up to its sign, which is returned.
    /// </summary>
    private static BigInteger Diagonalize(BigInteger[,] system, int size, CancellationToken cancellation)
    {
        BigInteger previous = BigInteger.One;
        for (int k = 0; k < size; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            FindPivot(system, size, k);
            BigInteger pivot = system[k, k];
            for (int row = 0; row < size; row++)
            {
                BigInteger factor = system[row, k];
                for (int i = 0; row != k && i <= size; i++)
                {
                    system[row, i] = ((pivot * system[row, i]) - (factor * system[k, i])) / previous;
                }
            }

            previous = pivot;
        }

        return previous;
    }

    private static void FindPivot(BigInteger[,] system, int size, int k)
    {
        int row = k;
        while (row < size && system[row, k].IsZero)
        {
            row++;
        }

        if (row == size)
        {
            throw new InvalidOperationException("The nodes have no unique extension of this degree.");
        }

        for (int i = 0; row != k && i <= size; i++)
        {
            (system[k, i], system[row, i]) = (system[row, i], system[k, i]);
        }
    }
}
