using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// Counts the zeros of a Hermite polynomial beyond a point in exact integers: no error bound is involved, and none is needed.
/// </summary>
/// <remarks>
/// <para>
/// Both conventions are one monic family: P₀ = 1, P₁ = u, Pₖ₊₁ = u Pₖ − c k Pₖ₋₁, which is He (u = x, c = 1) or H
/// (u = 2x, c = 2). Every second member depends on t = u² alone, after a factor u for odd degrees, and obeys
/// Pₖ₊₂ = (t − c(2k+1)) Pₖ − c² k(k−1) Pₖ₋₂.
/// </para>
/// <para>
/// The polynomials in t have positive leading coefficients and positive products c²k(k−1) in their recurrence, so they are a
/// Sturm sequence: the number of sign changes of R₀(t), …, Rₘ(t), zeros left out, is the number of zeros of Rₘ above t
/// (Sturm 1829; for orthogonal polynomials Szegő, Orthogonal Polynomials, 3.3; DLMF 18.2(vi)). Each zero of Rₘ above t
/// is the square of one zero of Pₙ above √t. So one evaluation proves, for that point alone, how many nodes lie beyond it.
/// </para>
/// </remarks>
internal static class HermiteZeroCount
{
    /// <summary>How many zeros of Pₙ, n ≥ 1, are larger than <paramref name="u"/>.</summary>
    /// <param name="degree">n, at least 1.</param>
    /// <param name="variance">c, 1 or 2.</param>
    /// <param name="u">The point, at least 0.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    public static int Above(int degree, int variance, Dyadic u, CancellationToken cancellation)
    {
        if (u.Sign < 0)
        {
            throw new ArgumentOutOfRangeException(nameof(u), "The point must not be negative; use the symmetry of the zeros.");
        }

        // t = square / 2^twice. R_j is carried as 2^(twice·j) R_j, which is an integer.
        u = u.Reduce();
        BigInteger square = u.Exponent > 0 ? BigInteger.Pow(u.Mantissa << u.Exponent, 2) : BigInteger.Pow(u.Mantissa, 2);
        int twice = u.Exponent < 0 ? checked(-2 * u.Exponent) : 0;
        int parity = degree & 1;

        BigInteger before = BigInteger.One;
        BigInteger current = square - ((BigInteger)(variance * ((2 * parity) + 1)) << twice);
        int steps = degree / 2;
        if (steps == 0)
        {
            return 0;
        }

        int lastSign = 1;
        int changes = CountChange(current.Sign, ref lastSign);
        for (int step = 1; step < steps; step++)
        {
            cancellation.ThrowIfCancellationRequested();
            long k = (2L * step) + parity;
            BigInteger next = ((square - ((BigInteger)(variance * ((2 * k) + 1)) << twice)) * current)
                - ((variance * variance * k * (k - 1) * before) << (2 * twice));
            before = current;
            current = next;
            changes += CountChange(current.Sign, ref lastSign);
        }

        return changes;
    }

    private static int CountChange(int sign, ref int lastSign)
    {
        if (sign == 0 || sign == lastSign)
        {
            return 0;
        }

        lastSign = sign;
        return 1;
    }
}
