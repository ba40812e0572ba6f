using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of moments of a truncated normal distribution, with <see cref="TruncatedPowers"/> about the mean.</summary>
/// <remarks>
/// With X = m + sZ, Z between a and b: the point c₀ of [a, b] that is nearest to 0 is where the density is largest; E Z = c₀ + d with
/// d the quotient of the first two integrals about c₀. On each side of E Z the powers of the distance are integrated. So the cancellation
/// that far tails and narrow intervals bring with formulas about 0 does not arise. E Xᵏ = Σ C(k, j) (E X)ᵏ⁻ʲ E (X − E X)ʲ.
/// An interval that is symmetric about m leaves the mean and the odd central moments exactly m and 0.
/// </remarks>
internal sealed class TruncatedNormalMomentsProof
{
    private readonly TruncatedNormalMomentsClaim _claim;
    private readonly Dyadic _deviation;
    private readonly Dyadic _reference;
    private readonly Dyadic? _below;
    private readonly Dyadic? _above;
    private readonly bool _isSymmetric;

    public TruncatedNormalMomentsProof(TruncatedNormalMomentsClaim claim)
    {
        _claim = claim;
        Dyadic mean = ClaimNumbers.ValueOf(claim.Mean);
        _deviation = ClaimNumbers.ValueOf(claim.StandardDeviation);
        Dyadic? lower = double.IsInfinity(claim.Lower) ? null : ClaimNumbers.ValueOf(claim.Lower);
        Dyadic? upper = double.IsInfinity(claim.Upper) ? null : ClaimNumbers.ValueOf(claim.Upper);
        _reference = lower is { } left && left > mean ? left : upper is { } right && right < mean ? right : mean;
        _below = lower is { } from ? _reference - from : null;
        _above = upper is { } to ? to - _reference : null;
        _isSymmetric = _below is { } one && _above is { } other && one == other && _reference == mean;
    }

    public TableProof Run(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var lists = new MomentLists(_claim.Format, _claim.MaximumOrder);
        for (int order = 1; _isSymmetric && order <= _claim.MaximumOrder; order += 2)
        {
            lists.Central(order, Rational.Zero);
            if (order == 1 || _claim.Mean == 0)
            {
                lists.Raw(order, order == 1 ? ClaimNumbers.ValueOf(_claim.Mean).ToRational() : Rational.Zero);
            }
        }

        return lists.Prove(_claim, data, precision => Enclose(precision, cancellation), progress, cancellation);
    }

    private MomentBalls Enclose(int precision, CancellationToken cancellation)
    {
        int working = precision + 64;
        Ball start = InUnits(_reference - ClaimNumbers.ValueOf(_claim.Mean), working);
        Ball? below = _below is { } lower ? InUnits(lower, working) : null;
        Ball? above = _above is { } upper ? InUnits(upper, working) : null;
        Ball shift = default;
        if (!_isSymmetric)
        {
            Ball[] first = TruncatedPowers.About(start, below, above, 2, precision + 16, cancellation);
            shift = Ball.Divide(first[1], first[0], working);
        }

        int count = _claim.MaximumOrder + 1;
        Ball center = Ball.Add(start, shift, working);
        below = below is { } left ? Ball.Add(left, shift, working) : null;
        above = above is { } right ? Ball.Subtract(right, shift, working) : null;
        (Ball[] central, Ball[] absolute) = MomentBalls.FromSides(
            TruncatedPowers.OneSided(Ball.Negate(center), below, count, precision, cancellation),
            TruncatedPowers.OneSided(center, above, count, precision, cancellation),
            _deviation,
            working);
        Ball mean = Ball.Add(Ball.FromDyadic(_reference), Ball.Multiply(shift, Ball.FromDyadic(_deviation), working), working);
        for (int order = 1; order < count; order += 2)
        {
            central[order] = order == 1 || _isSymmetric ? default : central[order];
        }

        return new MomentBalls(Raw(mean, central, working, cancellation), central, absolute);
    }

    private static Ball[] Raw(Ball mean, Ball[] central, int precision, CancellationToken cancellation)
    {
        var powers = new Ball[central.Length];
        var binomials = new BigInteger[central.Length];
        var raw = new Ball[central.Length];
        powers[0] = Ball.FromInteger(1);
        for (int k = 0; k < raw.Length; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            powers[k] = k == 0 ? powers[0] : Ball.Multiply(powers[k - 1], mean, precision);
            binomials[k] = BigInteger.One;
            for (int j = k - 1; j > 0; j--)
            {
                binomials[j] += binomials[j - 1];
            }

            Ball sum = powers[k];
            for (int j = 2; j <= k; j++)
            {
                Ball term = Ball.Multiply(Ball.Multiply(powers[k - j], central[j], precision), Ball.FromInteger(binomials[j]), precision);
                sum = Ball.Add(sum, term, precision);
            }

            raw[k] = sum;
        }

        return raw;
    }

    private Ball InUnits(Dyadic distance, int precision) =>
        Ball.Divide(Ball.FromDyadic(distance), Ball.FromDyadic(_deviation), precision);
}
