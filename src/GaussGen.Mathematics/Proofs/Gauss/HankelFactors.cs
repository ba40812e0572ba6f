using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The factors L D Lᵀ of the matrix of moments (μᵢ₊ⱼ), by Cholesky's method in balls, and what they tell of the orthogonal polynomials.</summary>
/// <remarks>
/// <para>
/// The monic polynomials π₀, π₁, … that are orthogonal under a functional with the moments μ are the rows of L⁻¹, as L⁻¹ M L⁻ᵀ = D says that
/// they are orthogonal, with ∫ πₖ² = dₖ. Pivots d₀, …, d₍ₙ₋₁₎ above zero prove that the functional is positive definite, so that the zeros of
/// πₙ are real and simple (Szegő, Orthogonal Polynomials, 2.1 and 3.3).
/// </para>
/// <para>
/// From x πₖ = πₖ₊₁ + αₖ πₖ + βₖ πₖ₋₁ follow αₖ = l(k+1, k) − l(k, k−1), where l(k, k−1) is minus the second coefficient of πₖ, and
/// βₖ = dₖ/dₖ₋₁.
/// </para>
/// </remarks>
internal sealed class HankelFactors
{
    private readonly Ball[][] _lower;
    private readonly Ball[] _pivots;
    private readonly int _precision;

    private HankelFactors(Ball[][] lower, Ball[] pivots, int precision)
    {
        _lower = lower;
        _pivots = pivots;
        _precision = precision;
    }

    /// <summary>Factorises the matrix with the rows 0, …, <paramref name="size"/>.</summary>
    /// <param name="moments">μ₀, …, up to μ of 2·size − 1, or of 2·size where the last pivot is wanted.</param>
    /// <param name="size">The highest degree n that polynomials are wanted of.</param>
    /// <param name="needsLastPivot">Whether dₙ is wanted.</param>
    /// <param name="precision">Working precision in bits.</param>
    /// <param name="cancellation">Looked at once a row.</param>
    /// <param name="rows">How many pivots were found to be above zero.</param>
    /// <returns>The factors; <c>null</c> where the balls do not show a pivot to be above zero.</returns>
    public static HankelFactors? Of(
        Ball[] moments, int size, bool needsLastPivot, int precision, CancellationToken cancellation, out int rows)
    {
        var lower = new Ball[size + 1][];
        var pivots = new Ball[size + 1];
        for (rows = 0; rows <= size; rows++)
        {
            // scaled[k] = l(row, k) dₖ.
            var scaled = new Ball[rows];
            lower[rows] = new Ball[rows];
            for (int column = 0; column <= rows; column++)
            {
                cancellation.ThrowIfCancellationRequested();
                if (column == rows && rows == size && !needsLastPivot)
                {
                    break;
                }

                Ball[] other = lower[column];
                Ball sum = default;
                for (int k = 0; k < column; k++)
                {
                    sum = Ball.Add(sum, Ball.Multiply(scaled[k], other[k], precision), precision);
                }

                Ball value = Ball.Subtract(moments[rows + column], sum, precision);
                if (column < rows)
                {
                    scaled[column] = value;
                    lower[rows][column] = Ball.Divide(value, pivots[column], precision);
                }
                else if (value.IsPositive == Trilean.True)
                {
                    pivots[rows] = value;
                }
                else
                {
                    return null;
                }
            }
        }

        return new HankelFactors(lower, pivots, precision);
    }

    /// <summary>dₖ, above zero.</summary>
    public Ball Pivot(int k) => _pivots[k];

    /// <summary>αₖ.</summary>
    public Ball Diagonal(int k) => k == 0
        ? _lower[1][0]
        : Ball.Subtract(_lower[k + 1][k], _lower[k][k - 1], _precision);

    /// <summary>βₖ, k at least 1.</summary>
    public Ball Square(int k) => Ball.Divide(_pivots[k], _pivots[k - 1], _precision);

    /// <summary>The coefficients of the monic orthogonal polynomial of a degree, ascending: a row of L⁻¹, by back substitution.</summary>
    public Ball[] Polynomial(int degree, CancellationToken cancellation)
    {
        var coefficients = new Ball[degree + 1];
        coefficients[degree] = Ball.FromInteger(1);
        for (int k = degree - 1; k >= 0; k--)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default;
            for (int j = k + 1; j <= degree; j++)
            {
                sum = Ball.Add(sum, Ball.Multiply(_lower[j][k], coefficients[j], _precision), _precision);
            }

            coefficients[k] = Ball.Negate(sum);
        }

        return coefficients;
    }
}
