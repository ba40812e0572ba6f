using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>Chebyshev's algorithm (see <see cref="ChebyshevAlgorithm"/>) in exact arithmetic, for few nodes.</summary>
internal static class RationalChebyshev
{
    /// <summary>The recurrence with n coefficients aₖ of a weight with the rational moments m₀ … m₂ₙ₋₁.</summary>
    internal static RationalRecurrence Run(Rational[] moments, int count, bool isEven)
    {
        var diagonal = new Rational[count];
        var squares = new Rational[count];
        var twoBack = new Rational[2 * count];
        var back = (Rational[])moments.Clone();
        Rational ratioBack = Rational.Zero;
        for (int k = 0; k < count; k++)
        {
            for (int l = k; k > 0 && l <= (2 * count) - k - 1; l++)
            {
                Rational entry = back[l + 1] - (diagonal[k - 1] * back[l]);
                twoBack[l] = k == 1 ? entry : entry - (squares[k - 1] * twoBack[l]);
            }

            (twoBack, back) = k > 0 ? (back, twoBack) : (twoBack, back);
            squares[k] = k == 0 ? Rational.One : back[k] / twoBack[k - 1];
            Rational ratio = back[k + 1] / back[k];
            diagonal[k] = ratio - ratioBack;
            ratioBack = ratio;
        }

        return new RationalRecurrence(diagonal, squares, isEven);
    }
}
