using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// The half-normal density √(2/π) exp(−x²/2) on [0, ∞). Its moments are (k−1)!! for even k and √(2/π) (k−1)!! for odd k
/// (Winkelbauer 2012, recalled, recomputed): integers and one root.
/// </summary>
internal sealed class HalfRangeWeight : MomentWeight
{
    /// <inheritdoc/>
    internal override RealNumber? Lower => RealNumber.Exact(Rational.Zero);

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        int working = precision + 8;
        Ball root = Ball.Divide(Constants.Sqrt2(working), Constants.SqrtPi(working, cancellation), working);
        BigInteger even = BigInteger.One, odd = BigInteger.One;
        var moments = new Ball[count];
        for (int k = 0; k < count; k++)
        {
            if ((k & 1) == 0)
            {
                moments[k] = Ball.FromInteger(even);
                even *= k + 1;
            }
            else
            {
                moments[k] = Ball.Multiply(root, Ball.FromInteger(odd), working);
                odd *= k + 1;
            }
        }

        return moments;
    }

    /// <inheritdoc/>
    protected override int ExpectedLoss(int count) => (int)(count * ((1.8 * Math.Log(Math.Max(count, 2), 2)) + 0.4));
}
