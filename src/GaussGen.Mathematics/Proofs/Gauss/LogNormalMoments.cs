using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The log-normal density: E Xᵏ = exp(km + k²s²/2) (Johnson, Kotz and Balakrishnan 1994, chapter 14).</summary>
/// <remarks>
/// Where s is small the nodes lie close together beside exp(m), and the moments are taken about a binary fraction c near that, by
/// E (X − c)^(k+1) = E X (X − c)ᵏ − c E (X − c)ᵏ applied again and again; what cancels is paid for in bits.
/// </remarks>
/// <param name="logMean">m.</param>
/// <param name="logStandardDeviation">s.</param>
internal sealed class LogNormalMoments(Dyadic logMean, Dyadic logStandardDeviation) : WeightMoments
{
    // 2^−3, below which shifted moments are worth their cost.
    private static readonly Dyadic Narrow = new(1, -3);

    private Dyadic? _center;

    /// <inheritdoc/>
    public override Dyadic? Lower => Dyadic.Zero;

    /// <inheritdoc/>
    public override Dyadic Center => _center ??= FindCenter();

    /// <inheritdoc/>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation)
    {
        Dyadic half = (logStandardDeviation * logStandardDeviation).ScaleByPowerOfTwo(-1);
        return ShiftedMoments.Of(
            (bits, token) =>
            {
                var moments = new Ball[count];
                for (int k = 0; k < count; k++)
                {
                    Dyadic order = new(k, 0);
                    Dyadic exponent = ((logMean * order) + (half * order * order)).Reduce();
                    moments[k] = Elementary.Exp(Ball.FromDyadic(exponent), bits, token);
                }

                return moments;
            },
            Center,
            precision,
            cancellation);
    }

    private Dyadic FindCenter()
    {
        if (logStandardDeviation > Narrow)
        {
            return Dyadic.Zero;
        }

        // A few bits more than tell exp(m) from exp(m + s).
        int bits = 4 - (logStandardDeviation.BitLength + logStandardDeviation.Exponent);
        return Elementary.Exp(Ball.FromDyadic(logMean), bits + 8).Trim(bits).Center.Reduce();
    }
}
