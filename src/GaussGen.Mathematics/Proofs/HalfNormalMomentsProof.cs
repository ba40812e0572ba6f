using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of half-normal moments.</summary>
/// <remarks>
/// With the scale s, E Xᵏ = sᵏ 2^(k/2) Γ((k+1)/2)/√π (Winkelbauer 2012): (2j)!/(2ʲ j!) s²ʲ for k = 2j and sᵏ √2 (2j)!/(2ʲ Γ(j+½)) for k = 2j + 1, the
/// latter by the duplication formula DLMF 5.5.5. The other moments are quotients of integrals about the mean √(2/π) s, by
/// <see cref="TruncatedPowers"/>.
/// </remarks>
internal sealed class HalfNormalMomentsProof(HalfNormalMomentsClaim claim)
{
    private readonly Dyadic _scale = ClaimNumbers.ValueOf(claim.Scale);

    public TableProof Run(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var lists = new MomentLists(claim.Format, claim.MaximumOrder);
        Dyadic power = new(BigInteger.One, 0);
        BigInteger factorial = BigInteger.One;
        for (int j = 1; 2 * j <= claim.MaximumOrder; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            // (2j)!/(2ʲ j!) is 2j(2j−1)/(2j) times its predecessor.
            power = (power * _scale * _scale).Reduce();
            factorial *= (2 * j) - 1;
            lists.Raw(2 * j, (power * new Dyadic(factorial, 0)).ToRational());
        }

        return lists.Prove(claim, data, precision => Enclose(precision, cancellation), progress, cancellation);
    }

    private MomentBalls Enclose(int precision, CancellationToken cancellation)
    {
        int count = claim.MaximumOrder + 1;
        int working = precision + 64;
        Ball mean = Ball.Divide(Constants.Sqrt2(working), Constants.SqrtPi(working, cancellation), working);
        (Ball[] central, Ball[] absolute) = MomentBalls.FromSides(
            TruncatedPowers.OneSided(Ball.Negate(mean), mean, count, precision, cancellation),
            TruncatedPowers.OneSided(mean, null, count, precision, cancellation),
            _scale,
            working);
        return new MomentBalls(Raw(count, working, cancellation), central, absolute);
    }

    /// <summary>The raw moments of odd order; zeros, which are not looked at, for the others.</summary>
    private Ball[] Raw(int count, int precision, CancellationToken cancellation)
    {
        var raw = new Ball[count];
        BigInteger factorial = BigInteger.One;
        Ball power = Ball.FromDyadic(_scale);
        for (int j = 0; (2 * j) + 1 < count; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            factorial *= j == 0 ? 1 : 2 * j * ((2 * j) - 1);
            Ball numerator = Ball.Multiply(Ball.FromInteger(factorial).ScaleByPowerOfTwo(-j), Constants.Sqrt2(precision), precision);
            Ball quotient = Ball.Divide(numerator, HalfIntegerGamma.Value(j, precision), precision);
            raw[(2 * j) + 1] = Ball.Multiply(quotient, power, precision);
            power = Ball.Multiply(power, Ball.FromDyadic(_scale * _scale), precision);
        }

        return raw;
    }
}
