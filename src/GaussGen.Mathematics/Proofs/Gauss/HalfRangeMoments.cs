using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The half-normal density √(2/π) exp(−x²/2) on [0, ∞): mₖ = 2^(k/2) Γ((k+1)/2)/√π (NIST DLMF 5.9.1).</summary>
internal sealed class HalfRangeMoments : WeightMoments
{
    /// <inheritdoc/>
    public override Dyadic? Lower => Dyadic.Zero;

    /// <inheritdoc/>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation)
    {
        // √(2/π), which odd moments hold: Γ(j+1) = j! there.
        Ball root = Ball.Divide(Constants.Sqrt2(precision), Constants.SqrtPi(precision, cancellation), precision);
        var moments = new Ball[count];
        Ball factorial = root;
        for (int k = 0; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            int j = k / 2;
            if (k % 2 == 0)
            {
                moments[k] = Ball.FromRational(HalfIntegerGamma.OverSqrtPi(j), precision).ScaleByPowerOfTwo(j);
            }
            else
            {
                factorial = j == 0 ? factorial : Ball.Multiply(factorial, Ball.FromInteger(j), precision);
                moments[k] = factorial.ScaleByPowerOfTwo(j);
            }
        }

        return moments;
    }
}
