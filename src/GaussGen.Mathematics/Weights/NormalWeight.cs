using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// The normal density with mean 0 and a rational variance v. Its recurrence is bₖ = k v (NIST DLMF 18.9.1), its moments are (k−1)!! v^(k/2) for
/// even k. Gauss rules for it have a fast road of their own; this is for the rules that belong to them.
/// </summary>
/// <param name="variance">v, above zero: 1 for the standard normal density, ½ for the one proportional to exp(−x²).</param>
internal sealed class NormalWeight(Rational variance) : WeightFunction
{
    /// <inheritdoc/>
    internal override bool IsEven => true;

    /// <inheritdoc/>
    internal override RationalRecurrence ExactRecurrence(int count)
    {
        var squares = new Rational[count];
        for (int k = 1; k < count; k++)
        {
            squares[k] = k * variance;
        }

        return new RationalRecurrence(new Rational[count], squares, isEven: true);
    }

    /// <inheritdoc/>
    internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation) =>
        Rules.Universal.Recurrence.FromRationals(ExactRecurrence(count), accuracy + 8, cancellation);

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        int working = precision + 8;
        Ball factor = Ball.FromRational(variance, working);
        var moments = new Ball[count];
        Ball moment = Ball.FromInteger(1);
        for (int k = 0; k < count; k += 2)
        {
            cancellation.ThrowIfCancellationRequested();
            moments[k] = moment;
            moment = Ball.Multiply(Ball.Multiply(moment, factor, working), Ball.FromInteger(k + 1), working);
        }

        return moments;
    }
}
