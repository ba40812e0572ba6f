using System.Collections.Generic;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>What the certificate of a node is made from, at one point x.</summary>
/// <param name="Value">πₙ(x).</param>
/// <param name="Previous">πₙ₋₁(x).</param>
/// <param name="Sum">S = Σ πₖ(x)² hₙ₋₁/hₖ over k &lt; n, with hₖ = b₁⋯bₖ; it is hₙ₋₁ over the Christoffel function.</param>
internal readonly record struct MonicValues(Ball Value, Ball Previous, Ball Sum);

/// <summary>The monic orthogonal polynomials at a point, by their recurrence.</summary>
internal static class MonicPolynomials
{
    /// <summary>The values that a certificate needs at an exact point.</summary>
    /// <param name="recurrence">The recurrence of πₙ, n coefficients aₖ.</param>
    /// <param name="point">The point x.</param>
    /// <param name="precision">The working precision of the recurrence.</param>
    /// <param name="sumPrecision">The working precision of S, whose terms are all positive.</param>
    internal static MonicValues At(Recurrence recurrence, Dyadic point, int precision, int sumPrecision)
    {
        Ball x = Ball.FromDyadic(point);
        Ball before = default;
        Ball current = Ball.FromInteger(1);
        Ball sum = default;
        for (int k = 0; k < recurrence.Count; k++)
        {
            Ball square = Ball.Square(current.Trim(sumPrecision), sumPrecision);
            sum = k == 0 ? square : Ball.Add(square, Ball.Multiply(recurrence.Square(k).Trim(sumPrecision), sum, sumPrecision), sumPrecision);
            Ball next = Next(recurrence, k, x, current, before, precision);
            before = current;
            current = next;
        }

        return new MonicValues(current, before, sum);
    }

    /// <summary>π₁(x), …, πₙ(x).</summary>
    internal static IEnumerable<Ball> AllAt(Recurrence recurrence, Ball x, int precision)
    {
        Ball before = default;
        Ball current = Ball.FromInteger(1);
        for (int k = 0; k < recurrence.Count; k++)
        {
            Ball next = Next(recurrence, k, x, current, before, precision);
            before = current;
            current = next;
            yield return current;
        }
    }

    /// <summary>πₙ(x) and πₙ′(x), for Newton's method.</summary>
    internal static (Ball Value, Ball Derivative) WithDerivative(Recurrence recurrence, Dyadic point, int precision)
    {
        Ball x = Ball.FromDyadic(point);
        Ball before = default, slopeBefore = default;
        Ball current = Ball.FromInteger(1), slope = default;
        for (int k = 0; k < recurrence.Count; k++)
        {
            Ball next = Next(recurrence, k, x, current, before, precision);
            Ball slopeNext = Ball.Add(current, Next(recurrence, k, x, slope, slopeBefore, precision), precision);
            before = current;
            current = next;
            slopeBefore = slope;
            slope = slopeNext;
        }

        return (current, slope);
    }

    /// <summary>(x − aₖ) current − bₖ before.</summary>
    private static Ball Next(Recurrence recurrence, int k, Ball x, Ball current, Ball before, int precision)
    {
        Ball difference = recurrence.IsEven ? x : Ball.Subtract(x, recurrence.Diagonal(k), precision);
        Ball next = Ball.Multiply(difference, current, precision);
        return k == 0 ? next : Ball.Subtract(next, Ball.Multiply(recurrence.Square(k), before, precision), precision);
    }
}
