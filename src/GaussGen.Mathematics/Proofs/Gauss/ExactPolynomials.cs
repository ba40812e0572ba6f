using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Monic orthogonal polynomials with rational coefficients from rational moments.</summary>
/// <remarks>
/// Stieltjes' procedure, with hₖ = L(yᵏ πₖ) and gₖ = L(yᵏ⁺¹ πₖ), which hold as πₖ is orthogonal to all lower degrees:
/// αₖ = gₖ/hₖ − gₖ₋₁/hₖ₋₁ and βₖ = hₖ/hₖ₋₁ (Gautschi, Orthogonal Polynomials, 2004, 1.3 and 2.1).
/// </remarks>
internal sealed class ExactPolynomials
{
    private readonly List<Rational[]> _polynomials;
    private readonly List<Rational> _norms;

    private ExactPolynomials(List<Rational[]> polynomials, List<Rational> norms)
    {
        _polynomials = polynomials;
        _norms = norms;
    }

    /// <summary>The polynomials up to a degree.</summary>
    /// <param name="moments">μ₀, …, up to μ of 2·degree − 1; one more where the norm of that degree is wanted.</param>
    /// <param name="degree">The degree.</param>
    /// <param name="cancellation">Looked at once a polynomial.</param>
    public static ExactPolynomials Of(Rational[] moments, int degree, CancellationToken cancellation)
    {
        List<Rational[]> polynomials = [[Rational.One]];
        List<Rational> norms = [moments[0]];
        Rational lastQuotient = Rational.Zero;
        for (int k = 0; k < degree; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Rational quotient = Inner(polynomials[k], moments, k + 1) / norms[k];
            Rational diagonal = quotient - lastQuotient;
            lastQuotient = quotient;
            var next = new Rational[k + 2];
            for (int i = 0; i <= k; i++)
            {
                next[i + 1] += polynomials[k][i];
                next[i] -= diagonal * polynomials[k][i];
            }

            for (int i = 0; i < k; i++)
            {
                next[i] -= norms[k] / norms[k - 1] * polynomials[k - 1][i];
            }

            polynomials.Add(next);
            if ((2 * k) + 2 < moments.Length)
            {
                norms.Add(Inner(next, moments, k + 1));
            }
        }

        return new ExactPolynomials(polynomials, norms);
    }

    /// <summary>The coefficients, ascending; the caller may change them.</summary>
    public Rational[] Polynomial(int degree) => (Rational[])_polynomials[degree].Clone();

    /// <summary>L(πₖ²).</summary>
    public Rational Norm(int degree) => _norms[degree];

    private static Rational Inner(Rational[] polynomial, Rational[] moments, int power)
    {
        Rational sum = Rational.Zero;
        for (int i = 0; i < polynomial.Length; i++)
        {
            sum += polynomial[i] * moments[i + power];
        }

        return sum;
    }
}
