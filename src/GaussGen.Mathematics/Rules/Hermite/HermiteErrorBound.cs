using System;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// What section 2 of Derivation.md proves about the recurrence Mₖ₊₁ = ⌊(X·Mₖ − k·2¹⁸·Mₖ₋₁)/2³²⌋, whatever the size of its integers.
/// Bounds are doubles in units of the last place. Each is a sum of products of positive numbers, and so off by less than one
/// part in 2³⁰ for n up to 1000, which <see cref="Slack"/> covers.
/// </summary>
internal static class HermiteErrorBound
{
    /// <summary>Covers the roundings of the bound's own arithmetic and the second-order terms named in the derivation.</summary>
    internal const double Slack = 1.001;

    /// <summary>K = ⌊x²/4⌋: up to K the polynomials grow with their degree, above K + 1 they oscillate.</summary>
    internal static int Turn(uint point) => (int)(((ulong)point * point) >> ((2 * HermiteRecurrence.PointBits) + 2));

    /// <summary>
    /// The bound E at degree K + 1, from which <see cref="Step"/> goes on: theorem 3. It is
    /// (x + √(K+2))·ε·M_{K+1} + (K+1)/2⁷·ε·M_K, where theorem 1 gives the relative error ε ≤ (K+1)·2^(13−p) at both degrees.
    /// </summary>
    /// <param name="turn">K.</param>
    /// <param name="point">X.</param>
    /// <param name="current">M_{K+1}/2^p, where of two neighbours one is at least 2^p units after every step.</param>
    /// <param name="previous">M_K/2^p.</param>
    internal static double AtTurn(int turn, uint point, double current, double previous)
    {
        if (turn == 0)
        {
            // x < 2: the first step is already above the turn, and M₁ and M₀ are exact.
            return 0;
        }

        double x = point / (double)(1 << HermiteRecurrence.PointBits);
        double scaled = (turn + 1) * 8192.0 * Slack;
        return scaled * (((x + Math.Sqrt(turn + 2)) * current) + ((turn + 1) / 128.0 * previous));
    }

    /// <summary>The bound at degree k + 1 from that at degree k: theorem 2.</summary>
    /// <param name="bound">The bound at degree k, above the turn.</param>
    /// <param name="root">√(k+1).</param>
    internal static double Step(double bound, double root) => root * ((bound * (1.0 / (1 << HermiteRecurrence.StepBits))) + 1);

    /// <summary>The bound of the error of Mₙ, in its units.</summary>
    internal static double AtEnd(double bound) => Slack * bound;

    /// <summary>The bound of the error of Mₙ₋₁, in its units.</summary>
    /// <param name="bound">The bound at degree n.</param>
    /// <param name="root">√n.</param>
    internal static double BeforeEnd(double bound, double root) => Slack * bound * (1 << HermiteRecurrence.StepBits) / root;

    /// <summary>A bound of double · 2^exponent.</summary>
    internal static Bound ToBound(double units, int exponent)
    {
        while (units >= 1L << 62)
        {
            units *= 0.5;
            exponent++;
        }

        return Bound.FromParts((ulong)units + 1, exponent);
    }
}
