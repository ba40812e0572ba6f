using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The monic polynomial Π of degree N whose zeros are the nodes of an interpolatory rule, with the polynomial that gives the weights,
/// both enclosed.
/// </summary>
/// <remarks>
/// A rule with the nodes yᵢ that is exact to degree N − 1 has the weights wᵢ = L(Π/(y − yᵢ))/Π′(yᵢ), L being the functional with the
/// moments μ, as the quotient vanishes at all other nodes. With A(y) = L((Π(y) − Π(u))/(y − u)), L acting on u, that is A(yᵢ)/Π′(yᵢ);
/// and A(y) = Σ cₖ Σ μⱼ y^(k−1−j) over j &lt; k, the cₖ being the coefficients of Π.
/// </remarks>
internal sealed class NodePolynomial
{
    private readonly Ball[] _coefficients;
    private readonly Ball[] _derivative;
    private readonly Ball[] _numerator;
    private readonly int _precision;

    /// <summary>The polynomial with the given coefficients.</summary>
    /// <param name="coefficients">Ascending; the last one is 1.</param>
    /// <param name="moments">μ₀, …, μ of N − 1 at least.</param>
    /// <param name="precision">Working precision in bits.</param>
    /// <param name="cancellation">Looked at once a coefficient.</param>
    public NodePolynomial(Ball[] coefficients, Ball[] moments, int precision, CancellationToken cancellation)
    {
        int degree = coefficients.Length - 1;
        _coefficients = coefficients;
        _precision = precision;
        _derivative = new Ball[degree];
        _numerator = new Ball[degree];
        for (int i = 0; i < degree; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            _derivative[i] = Ball.Multiply(coefficients[i + 1], Ball.FromInteger(i + 1), precision);
            Ball sum = default;
            for (int k = i + 1; k <= degree; k++)
            {
                sum = Ball.Add(sum, Ball.Multiply(coefficients[k], moments[k - 1 - i], precision), precision);
            }

            _numerator[i] = sum;
        }
    }

    /// <summary>N.</summary>
    public int Degree => _coefficients.Length - 1;

    /// <summary>The coefficients, ascending.</summary>
    public Ball Coefficient(int index) => _coefficients[index];

    /// <summary>The sign of Π at a point; <c>null</c> where the enclosure does not tell.</summary>
    public int? Sign(Dyadic y)
    {
        Ball value = Value(Ball.FromDyadic(y));
        return value.ContainsZero ? null : value.Midpoint.Sign;
    }

    /// <summary>Π.</summary>
    public Ball Value(Ball y) => Horner(_coefficients, y);

    /// <summary>Π′.</summary>
    public Ball Slope(Ball y) => Horner(_derivative, y);

    /// <summary>A/Π′: the weight, in the units of the moments, of a node that lies in the ball.</summary>
    public Ball Weight(Ball y)
    {
        Ball slope = Slope(y);
        return slope.ContainsZero ? Ball.WholeLine : Ball.Divide(Horner(_numerator, y), slope, _precision);
    }

    private Ball Horner(Ball[] coefficients, Ball y)
    {
        Ball value = default;
        for (int k = coefficients.Length - 1; k >= 0; k--)
        {
            value = Ball.Add(Ball.Multiply(value, y, _precision), coefficients[k], _precision);
        }

        return value;
    }
}
