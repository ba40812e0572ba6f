using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>Carries starting points close enough to the nodes for a certificate. No bound is made here.</summary>
internal static class NewtonSearch
{
    private const int MaximumSteps = 12;

    // The radii of the recurrence are wider than its errors by some 25 bits (measured); the certificate judges the point in the end.
    private const int Pessimism = 24;

    /// <summary>
    /// Moves a point towards the node near it by Newton's method until the next error should be below the gap times 2^−target.
    /// </summary>
    /// <param name="recurrence">The recurrence.</param>
    /// <param name="start">Where to start.</param>
    /// <param name="gapLog2">About log₂ of the distance to the nearest other node.</param>
    /// <param name="target">The bits that are wanted, relative to the gap.</param>
    /// <param name="extra">Bits of working precision beyond what usually serves.</param>
    /// <param name="missing">How many bits of working precision were missing, where that was why the search failed; else 0.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    /// <returns>The point, on a grid that is finer than the wanted error; <c>null</c> where the search failed.</returns>
    internal static Dyadic? Refine(
        Recurrence recurrence, Dyadic start, int gapLog2, int target, int extra, out int missing, CancellationToken cancellation)
    {
        int n = recurrence.Count;
        // The recurrence radii grow by up to log₂(1 + √2) bits a step (measured), and a node far from the origin has its own leading bits.
        int leading = Math.Max(0, Approximation.FloorLog2(start) - gapLog2);
        int precision = checked(target + (5 * n / 4) + leading + extra + 8);
        int grid = gapLog2 - target - 16;
        int countLog2 = Approximation.FloorLog2(new Dyadic(n, 0)) + 1;
        Dyadic point = Round(start, grid);
        missing = 0;
        for (int step = 0; step < MaximumSteps; step++)
        {
            cancellation.ThrowIfCancellationRequested();
            (Ball value, Ball derivative) = MonicPolynomials.WithDerivative(recurrence, point, precision);
            missing = MissingBits(value, derivative, gapLog2 - target + Pessimism);
            if (missing > 0)
            {
                return null;
            }

            Dyadic move = Ball.Divide(Middle(value), Middle(derivative), target + 8).Center;
            int moveLog2 = Approximation.FloorLog2(move) + 1 - gapLog2;
            if (moveLog2 > -2)
            {
                return null;
            }

            point = Round(point - move, grid);
            // The error after a step is about its square over the gap, times at most n.
            if ((2 * moveLog2) + countLog2 <= -target)
            {
                return point;
            }
        }

        return null;
    }

    /// <summary>How many bits the quotient of value and derivative lacks for an error of about 2^error.</summary>
    private static int MissingBits(Ball value, Ball derivative, int error) => derivative.RelativeAccuracyBits < 8
        ? 24 + Math.Max(0, Math.Min(1 << 12, -derivative.RelativeAccuracyBits))
        : value.IsExact ? 0 : value.Radius.CeilingLog2 - Approximation.FloorLog2(derivative) - error;

    private static Ball Middle(Ball ball) => Ball.FromDyadic(ball.Center);

    private static Dyadic Round(Dyadic value, int grid) => value.Exponent >= grid
        ? value
        : new Dyadic(value.Mantissa >> (grid - value.Exponent), grid);
}
