using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The Gauss rule with n nodes: Π is the orthogonal polynomial πₙ, exact to degree 2n − 1 (NIST DLMF 3.5(v)).</summary>
/// <remarks>
/// For an even weight πₙ(y) = yᵖ R(y²), and R is orthogonal under the functional f ↦ ∫ f(y²) y²ᵖ w (Chihara, An Introduction to
/// Orthogonal Polynomials, I.8).
/// </remarks>
internal sealed class GaussSource(WeightMoments moments, int points) : RuleSource(moments, points)
{
    /// <inheritdoc/>
    public override RuleLevel? At(int precision, CancellationToken cancellation, out int wanted)
    {
        Ball[] moments = Moments.Enclose(2 * Points, precision, cancellation);
        Ball[] functional = InCoordinate(moments, Moments.IsEven, Parity);
        var factors = HankelFactors.Of(functional, Zeros, needsLastPivot: false, precision, cancellation, out int rows);
        if (factors is null)
        {
            wanted = AfterRow(rows, Zeros, precision);
            return null;
        }

        wanted = precision;
        var diagonal = new Ball[Zeros];
        var squares = new Ball[Zeros];
        for (int k = 0; k < Zeros; k++)
        {
            diagonal[k] = factors.Diagonal(k);
            squares[k] = k == 0 ? default : factors.Square(k);
        }

        var count = new ZeroCount(diagonal, squares, precision);
        return Level(factors.Polynomial(Zeros, cancellation), moments, count, precision, cancellation);
    }

    /// <inheritdoc/>
    public override ExactRule? Exact(CancellationToken cancellation)
    {
        if (Zeros is 0 or > ExactRule.LargestDegree || Moments.Exact(2 * Points, cancellation) is not { } moments)
        {
            return null;
        }

        Rational[] functional = InCoordinate(System.Array.ConvertAll(moments, moment => moment.ToRational()), Moments.IsEven, Parity);
        return new ExactRule(this, ExactPolynomials.Of(functional, Zeros, cancellation).Polynomial(Zeros), moments);
    }
}
