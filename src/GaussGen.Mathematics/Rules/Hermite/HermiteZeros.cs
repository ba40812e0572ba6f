using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>All positive zeros of Heₙ, proven to be all: theorem 5 of Derivation.md.</summary>
internal static class HermiteZeros
{
    /// <summary>
    /// Intervals of 1.1 units around two points are disjoint if the points are this far apart; and such an interval around this
    /// point or a larger one has no part at or below zero.
    /// </summary>
    private const uint LeastDistance = 3;

    /// <summary>The zeros from guesses, or from slower ones where the proof refuses those.</summary>
    /// <param name="points">n, at least 1.</param>
    /// <param name="convention">The convention of nodes and weights.</param>
    /// <param name="guesses">Guesses of the ⌊n/2⌋ positive zeros, ascending.</param>
    /// <param name="cancellation">Looked at before each zero.</param>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    /// <exception cref="InvalidOperationException">The proof refused both; the host's arithmetic is broken.</exception>
    internal static HermiteZero[] Find(int points, HermiteConvention convention, double[] guesses, CancellationToken cancellation)
    {
        return TryProve(points, convention, guesses, cancellation)
            ?? TryProve(points, convention, HermiteIsolation.PositiveZeros(points, cancellation), cancellation)
            ?? throw new InvalidOperationException("The zeros of a Hermite polynomial could not be separated on this host.");
    }

    /// <summary>The zeros, or <c>null</c> where the guesses do not lead to disjoint intervals with one zero each.</summary>
    internal static HermiteZero[]? TryProve(
        int points, HermiteConvention convention, double[] guesses, CancellationToken cancellation)
    {
        var rule = new HermiteRule(points, convention, Roots(points));
        FixedBall factor = Factor(points);
        var zeros = new HermiteZero[guesses.Length];
        uint before = 0;
        for (int i = 0; i < zeros.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            if (!TryPoint(guesses[i], out uint point) || point < before || point - before < LeastDistance)
            {
                return null;
            }

            if (!HermiteEnclosure.TryEnclose(points, point, rule.Roots, in factor, out FixedBall node, out FixedBall weight))
            {
                return null;
            }

            if (convention == HermiteConvention.Physicist)
            {
                node = FixedBall.Multiply(in node, FixedConstants.InverseSqrt2);
                weight = FixedBall.Multiply(in weight, FixedConstants.SqrtPi);
            }

            zeros[i] = new HermiteZero(
                rule, point, node.WidenTo(HermiteEnclosure.NodeRadius), weight.WidenTo(HermiteEnclosure.WeightRadius));
            before = point;
        }

        return zeros.Length == points / 2 ? zeros : null;
    }

    private static bool TryPoint(double guess, out uint point)
    {
        double scaled = (guess * (1 << HermiteRecurrence.PointBits)) + 0.5;
        bool isInRange = scaled is >= 1 and < 1U << 31;
        point = isInRange ? (uint)scaled : 0;
        return isInRange;
    }

    private static double[] Roots(int points)
    {
        var roots = new double[points + 1];
        for (int k = 0; k <= points; k++)
        {
            roots[k] = Math.Sqrt(k);
        }

        return roots;
    }

    /// <summary>(n−1)!/n.</summary>
    private static FixedBall Factor(int points)
    {
        FixedBall product = FixedBall.FromInteger(1);
        for (int k = 2; k < points; k++)
        {
            product = FixedBall.Multiply(in product, (uint)k);
        }

        return FixedBall.Divide(in product, FixedBall.FromInteger((uint)points));
    }
}
