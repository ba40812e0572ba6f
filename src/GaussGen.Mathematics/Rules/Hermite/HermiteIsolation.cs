using System;
using System.Threading;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// Guesses of the zeros of Heₙ that need nothing but the four operations: slower than <see cref="HermiteGuess"/>, and used only
/// where a proof refused those. Bisection on the number of zeros above a point, which is the number of negative terms of
/// rₖ₊₁ = x − k/rₖ, rₖ = Heₖ/Heₖ₋₁: Sturm's theorem for the symmetric tridiagonal matrix of the recurrence, as in Givens (1954).
/// </summary>
internal static class HermiteIsolation
{
    private const int Steps = 44;

    /// <summary>The ⌊n/2⌋ positive zeros of Heₙ, ascending, to about 12 decimal places.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    internal static double[] PositiveZeros(int points, CancellationToken cancellation)
    {
        var zeros = new double[points / 2];
        double lower = 0;
        for (int i = 0; i < zeros.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            // All zeros lie below 2√n, and zero i has the others of higher index above it.
            double upper = 2 * Math.Sqrt(points);
            int above = zeros.Length - 1 - i;
            double from = lower;
            for (int step = 0; step < Steps; step++)
            {
                double middle = 0.5 * (from + upper);
                if (CountAbove(points, middle) > above)
                {
                    from = middle;
                }
                else
                {
                    upper = middle;
                }
            }

            zeros[i] = lower = 0.5 * (from + upper);
        }

        return zeros;
    }

    private static int CountAbove(int points, double x)
    {
        int count = 0;
        double ratio = x;
        for (int k = 1; k <= points; k++)
        {
            if (ratio < 0)
            {
                count++;
            }

            ratio = x - (k / (ratio == 0 ? double.Epsilon : ratio));
        }

        return count;
    }
}
