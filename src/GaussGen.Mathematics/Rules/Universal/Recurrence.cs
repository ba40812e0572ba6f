using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// The monic orthogonal polynomials of a weight by their three-term recurrence π₀ = 1, π₁ = y − a₀,
/// πₖ₊₁ = (y − aₖ) πₖ − bₖ πₖ₋₁ (NIST DLMF 18.2(iv); Gautschi, Orthogonal Polynomials, 2004, 1.3).
/// </summary>
/// <param name="diagonal">a₀ … aₙ₋₁. All exactly zero for a weight that is even.</param>
/// <param name="squares">b₁ … bₙ₋₁, all above zero, at their indices; the entry at 0 is not used.</param>
/// <param name="isEven">Whether the weight is even in y.</param>
internal sealed class Recurrence(Ball[] diagonal, Ball[] squares, bool isEven)
{
    /// <summary>The number n of coefficients aₖ: the degree up to which the polynomials are known.</summary>
    internal int Count => diagonal.Length;

    /// <summary>Whether the weight is even, so that πₖ has the parity of k.</summary>
    internal bool IsEven => isEven;

    /// <summary>aₖ.</summary>
    internal Ball Diagonal(int k) => diagonal[k];

    /// <summary>bₖ, the square of the Jacobi matrix's entry beside the diagonal, for k at least 1.</summary>
    internal Ball Square(int k) => squares[k];

    /// <summary>The same coefficients with midpoints of about <paramref name="precision"/> bits.</summary>
    internal Recurrence Trim(int precision) => new(
        Array.ConvertAll(diagonal, ball => ball.Trim(precision)), Array.ConvertAll(squares, ball => ball.Trim(precision)), isEven);

    /// <summary>The first <paramref name="count"/> of the coefficients aₖ, and the bₖ between them.</summary>
    internal Recurrence Take(int count) => count == Count
        ? this
        : new Recurrence([.. Enumerable.Take(diagonal, count)], [.. Enumerable.Take(squares, count)], isEven);

    /// <summary>The same coefficients with twice the last bₖ; there are at least two aₖ.</summary>
    internal Recurrence DoubleLastSquare()
    {
        var changed = (Ball[])squares.Clone();
        changed[Count - 1] = changed[Count - 1].ScaleByPowerOfTwo(1);
        return new Recurrence(diagonal, changed, isEven);
    }

    /// <summary>
    /// How many bits of the Jacobi matrix are known in the least known place: of each bₖ relative to itself, of each aₖ relative
    /// to the root of a neighbouring bₖ.
    /// </summary>
    internal int AccuracyBits()
    {
        int worst = int.MaxValue;
        for (int k = 1; k < Count; k++)
        {
            Ball square = squares[k];
            worst = Math.Min(worst, square.RelativeAccuracyBits);
            worst = Math.Min(worst, DiagonalBits(diagonal[k], square));
            worst = k == 1 ? Math.Min(worst, DiagonalBits(diagonal[0], square)) : worst;
        }

        return worst;
    }

    /// <summary>The recurrence whose coefficients are exact rational numbers, at a precision.</summary>
    internal static Recurrence FromRationals(RationalRecurrence exact, int precision, CancellationToken cancellation)
    {
        var diagonal = new Ball[exact.Count];
        var squares = new Ball[exact.Count];
        for (int k = 0; k < exact.Count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            diagonal[k] = Ball.FromRational(exact.Diagonal(k), precision);
            squares[k] = k == 0 ? Ball.FromInteger(1) : Ball.FromRational(exact.Square(k), precision);
        }

        return new Recurrence(diagonal, squares, exact.IsEven);
    }

    private static int DiagonalBits(Ball diagonal, Ball square) => diagonal.IsExact
        ? int.MaxValue
        : (Approximation.FloorLog2(square) / 2) - diagonal.Radius.CeilingLog2;
}
