using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of log-normal moments.</summary>
/// <remarks>
/// With X = M Y, M = exp(m + s²/2) the mean and Y = exp(sZ − s²/2): E Xᵏ = exp(km + k²s²/2), and the moments about the mean are Mᵏ times those
/// of Y about 1, which <see cref="LogNormalDistancesFromOne"/> encloses. All exponents are exact. For s² ≥ 2¹⁴ the moments about the mean are the
/// raw ones within a factor 1 ± 2⁻²⁰⁰⁰⁰: in Σ (−1)ᵏ⁻ʲ C(k, j) Q^(j(j−1)/2), Q = exp(s²), what is not the last term is at most 2ᵏ Q^(1−k) of it, and
/// E |Y − 1|ᵏ exceeds the sum by 2 at most.
/// </remarks>
internal sealed class LogNormalMomentsProof(LogNormalMomentsClaim claim)
{
    // A moment whose exponent is above this is too large for every format, whatever its factor: a factor E (Y − 1)ᵏ is at least
    // (s²)^((k+1)/2), so at least 2^(−1074·102) > exp(−80000).
    private static readonly Dyadic TooLarge = new(1, 20);

    private static readonly Dyadic VeryWide = new(1, 14);

    private readonly Dyadic _logMean = ClaimNumbers.ValueOf(claim.LogMean);
    private readonly Dyadic _deviation = ClaimNumbers.ValueOf(claim.LogStandardDeviation);

    private Dyadic Variance => _deviation * _deviation;

    private bool IsVeryWide => Variance >= VeryWide;

    public TableProof Run(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var lists = new MomentLists(claim.Format, claim.MaximumOrder);
        for (int k = 1; k <= claim.MaximumOrder; k++)
        {
            if (RawExponent(k).IsZero)
            {
                lists.Raw(k, Rational.One);
            }
            else if (RawExponent(k) > TooLarge)
            {
                lists.RawTooLarge(k);
            }

            if (AboutMeanExponent(k) > TooLarge)
            {
                lists.AboutMeanTooLarge(k);
            }
        }

        return lists.Prove(claim, data, precision => Enclose(lists, precision, cancellation), progress, cancellation);
    }

    private MomentBalls Enclose(MomentLists lists, int precision, CancellationToken cancellation)
    {
        int count = claim.MaximumOrder + 1;
        var raw = new Ball[count];
        var central = new Ball[count];
        var absolute = new Ball[count];
        var distances = new LogNormalDistancesFromOne(_deviation, claim.MaximumOrder, precision + 16);
        for (int k = 1; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            raw[k] = lists.IsRawKnown(k) ? default : Exponential(RawExponent(k), precision, cancellation);
            if (k == 1)
            {
                Ball mean = lists.IsAbsoluteKnown(1) ? default : Exponential(RawExponent(1), precision, cancellation);
                absolute[1] = Ball.Multiply(mean, distances.First(cancellation), precision + 8);
            }
            else if (!lists.IsCentralKnown(k))
            {
                Ball scale = Exponential(AboutMeanExponent(k), precision, cancellation);
                (Ball signed, Ball magnitude) = IsVeryWide ? Nearly(1) : distances.Of(k, cancellation);
                central[k] = Ball.Multiply(scale, signed, precision + 8);
                absolute[k] = Ball.Multiply(scale, magnitude, precision + 8);
            }
        }

        return new MomentBalls(raw, central, absolute);
    }

    private Dyadic RawExponent(int k) => (new Dyadic(k, 0) * _logMean) + (new Dyadic(k * k, -1) * Variance);

    /// <summary>The exponent of the factor Mᵏ, or for a very wide distribution that of the raw moment.</summary>
    private Dyadic AboutMeanExponent(int k) =>
        IsVeryWide ? RawExponent(k) : new Dyadic(k, 0) * (_logMean + Variance.ScaleByPowerOfTwo(-1));

    private static (Ball Signed, Ball Magnitude) Nearly(int value)
    {
        Ball ball = Ball.FromInteger(value).Enlarge(Bound.PowerOfTwo(-20000));
        return (ball, ball);
    }

    private static Ball Exponential(Dyadic exponent, int precision, CancellationToken cancellation) =>
        Elementary.Exp(Ball.FromDyadic(exponent), precision + 16, cancellation);
}
