using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// |x|^(2μ) exp(−x²). The recurrence is rational: aₖ = 0, bₖ = k/2 for even k and k/2 + μ for odd k (Chihara, An Introduction to
/// Orthogonal Polynomials, 1978, V.2; Szegő 1939, problem 25), and so are the moments of the normalised weight, m₂ₖ = (μ + ½)ₖ.
/// </summary>
/// <param name="exponent">μ, above −½.</param>
internal sealed class GeneralizedHermiteWeight(Dyadic exponent) : WeightFunction
{
    private readonly Rational _exponent = exponent.ToRational();

    /// <inheritdoc/>
    internal override bool IsEven => true;

    /// <inheritdoc/>
    internal override RationalRecurrence ExactRecurrence(int count)
    {
        var squares = new Rational[count];
        for (int k = 1; k < count; k++)
        {
            squares[k] = new Rational(k, 2) + ((k & 1) == 0 ? Rational.Zero : _exponent);
        }

        return new RationalRecurrence(new Rational[count], squares, isEven: true);
    }

    /// <inheritdoc/>
    internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation) =>
        Rules.Universal.Recurrence.FromRationals(ExactRecurrence(count), accuracy + 8, cancellation);

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        var moments = new Ball[count];
        Ball moment = Ball.FromInteger(1);
        for (int k = 0; k < count; k += 2)
        {
            cancellation.ThrowIfCancellationRequested();
            moments[k] = moment;
            moment = Ball.Multiply(moment, Ball.FromRational(_exponent + new Rational(k + 1, 2), precision + 8), precision + 8);
        }

        return moments;
    }
}
