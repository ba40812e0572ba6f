using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// From moments to recurrence coefficients by the algorithm of Chebyshev (1859) as in Gautschi, Orthogonal Polynomials
/// (2004), 2.1.7, in balls. The conditioning of the moments shows as the radii of the coefficients.
/// </summary>
/// <remarks>
/// With σₖ,ₗ = ∫ πₖ yˡ w: σₖ,ₗ = σₖ₋₁,ₗ₊₁ − aₖ₋₁ σₖ₋₁,ₗ − bₖ₋₁ σₖ₋₂,ₗ, bₖ = σₖ,ₖ/σₖ₋₁,ₖ₋₁, aₖ = σₖ,ₖ₊₁/σₖ,ₖ − σₖ₋₁,ₖ/σₖ₋₁,ₖ₋₁. As σₖ,ₖ = ∫ πₖ² w,
/// its ball lying above zero proves that the weight has at least k + 1 points of increase.
/// </remarks>
internal static class ChebyshevAlgorithm
{
    /// <summary>
    /// The recurrence of a weight with the moments m₀ … m₂ₙ₋₁, or <c>null</c> where the balls are too wide to tell the sign of a
    /// σₖ,ₖ; then <paramref name="rows"/> is the first such k.
    /// </summary>
    /// <param name="moments">The moments, at least 2n of them, of a weight with any total mass.</param>
    /// <param name="count">The number n of coefficients aₖ.</param>
    /// <param name="isEven">Whether the weight is even; its odd moments are then not looked at.</param>
    /// <param name="precision">The working precision in bits.</param>
    /// <param name="cancellation">Looked at in each row.</param>
    /// <param name="rows">How many rows were finished.</param>
    internal static Recurrence? TryRun(
        Ball[] moments, int count, bool isEven, int precision, CancellationToken cancellation, out int rows)
    {
        var diagonal = new Ball[count];
        var squares = new Ball[count];
        var twoBack = new Ball[2 * count];
        var back = (Ball[])moments.Clone();
        Ball ratioBack = default;
        rows = 0;
        for (int k = 0; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            if (k > 0)
            {
                AdvanceRow(twoBack, back, k, (2 * count) - k - 1, diagonal[k - 1], squares[k - 1], isEven, precision);
                (twoBack, back) = (back, twoBack);
            }

            if (back[k].IsPositive != Trilean.True || back[k].RelativeAccuracyBits < 4)
            {
                return null;
            }

            squares[k] = k == 0 ? Ball.FromInteger(1) : Ball.Divide(back[k], twoBack[k - 1], precision);
            if (!isEven)
            {
                Ball ratio = Ball.Divide(back[k + 1], back[k], precision);
                diagonal[k] = Ball.Subtract(ratio, ratioBack, precision);
                ratioBack = ratio;
            }

            rows = k + 1;
        }

        return new Recurrence(diagonal, squares, isEven);
    }

    /// <summary>Writes row k over row k − 2.</summary>
    private static void AdvanceRow(
        Ball[] twoBack, Ball[] back, int k, int top, Ball diagonal, Ball square, bool isEven, int precision)
    {
        for (int l = k; l <= top; l += isEven ? 2 : 1)
        {
            Ball entry = back[l + 1];
            if (!isEven)
            {
                entry = Ball.Subtract(entry, Ball.Multiply(diagonal, back[l], precision), precision);
            }

            twoBack[l] = k == 1 ? entry : Ball.Subtract(entry, Ball.Multiply(square, twoBack[l], precision), precision);
        }
    }
}
