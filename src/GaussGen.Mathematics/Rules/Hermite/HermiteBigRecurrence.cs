using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>The recurrence of <see cref="HermiteRecurrence"/> with integers of any size, and the same bound of its error.</summary>
internal static class HermiteBigRecurrence
{
    private const int MoveBits = 32;

    /// <summary>Balls around Heₙ and Heₙ₋₁ at x = X/2²⁵.</summary>
    /// <param name="points">n, at least 2.</param>
    /// <param name="point">X, where <see cref="HermiteRecurrence.IsCovered"/> holds.</param>
    /// <param name="roots">√k at index k, up to n.</param>
    /// <param name="precision">p: of two neighbours, one is kept at 2^p units at least.</param>
    /// <param name="cancellation">Looked at every few steps.</param>
    internal static (Ball Value, Ball Lower) Evaluate(
        int points, uint point, double[] roots, int precision, CancellationToken cancellation)
    {
        // M₀ = 2^(p+31) and M₁ = X·2^(p−1), exactly; S counts the scale as in HermiteRecurrence.
        BigInteger previous = BigInteger.One << (precision + 31);
        BigInteger current = (BigInteger)point << (precision - 1);
        BigInteger limit = BigInteger.One << precision;
        int scale = precision + 31;
        int turn = HermiteErrorBound.Turn(point);
        double error = 0;
        for (int k = 1; k < points; k++)
        {
            if ((k & 31) == 0)
            {
                cancellation.ThrowIfCancellationRequested();
            }

            if (k == turn + 1)
            {
                error = HermiteErrorBound.AtTurn(turn, point, ScaledDown(current, precision), ScaledDown(previous, precision));
            }

            BigInteger next = ((point * current) - ((k << 18) * previous)) >> 32;
            previous = current;
            current = next;
            error = HermiteErrorBound.Step(error, roots[k + 1]);
            if (IsWithin(current, limit) && IsWithin(previous, limit))
            {
                current <<= MoveBits;
                previous <<= MoveBits;
                scale += MoveBits;
                error *= 4294967296.0;
            }
        }

        int exponent = (HermiteRecurrence.StepBits * points) - scale;
        int lower = exponent - HermiteRecurrence.StepBits;
        Bound radius = HermiteErrorBound.ToBound(HermiteErrorBound.AtEnd(error), exponent);
        Bound lowerRadius = HermiteErrorBound.ToBound(HermiteErrorBound.BeforeEnd(error, roots[points]), lower);
        return (new Ball(current, exponent, radius), new Ball(previous, lower, lowerRadius));
    }

    private static bool IsWithin(BigInteger value, BigInteger limit) => BigInteger.Abs(value) < limit;

    /// <summary>value/2^power, where that is at most 2³² and not tiny, off by one part in 2²⁰ at most.</summary>
    private static double ScaledDown(BigInteger value, int power) => (double)(value >> (power - 64)) / 18446744073709551616.0;
}
