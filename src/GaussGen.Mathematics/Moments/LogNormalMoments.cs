using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Moments;

/// <summary>The moments of X = exp(m + sZ), Z standard normal, m and s dyadic.</summary>
/// <remarks>
/// <para>E Xᵏ = exp(km + k²s²/2) (Aitchison and Brown 1957, 2.3). With M = E X, X = M Y, and Y is log-normal with mean 1.</para>
/// <para>
/// Let Q = exp(s²) and d = Q − 1. E Y f(Y) = E f(QY) for any f (complete the square), so that for cₖ = E (Y − 1)ᵏ, from f(y) = (y − 1)ᵏ⁻¹ and
/// QY − 1 = Q(Y − 1) + d, cₖ = (Qᵏ⁻¹ − 1) cₖ₋₁ + Σ C(k−1, j) Qʲ dᵏ⁻¹⁻ʲ cⱼ, j from 0 to k − 2. All terms are positive: nothing cancels, however small
/// s is, where the binomial sum over the raw moments would lose k log₂(1/s) bits.
/// </para>
/// <para>
/// Exact are E Xᵏ with km + k²s²/2 = 0, and the moments of order 0 and the central one of order 1. No other raw or central moment is rational: each
/// is a sum of exponentials of different rational numbers with rational factors that are not zero (Lindemann and Weierstrass 1885).
/// </para>
/// </remarks>
internal sealed class LogNormalMoments
{
    // Exponents of e up to here stay far inside what a ball's exponent can say, and far beyond every number format.
    private const int LargestExponent = 1 << 24;

    private readonly Dyadic _logMean;
    private readonly Dyadic _variance;
    private readonly int _maximumOrder;
    private readonly SharedByPrecision<Ball[]> _central;
    private readonly SharedByPrecision<Ball[]> _absolute;

    /// <summary>The moments to an order.</summary>
    /// <exception cref="RuleConstructionException">A moment is beyond what can be enclosed.</exception>
    internal LogNormalMoments(Dyadic logMean, Dyadic logStandardDeviation, int maximumOrder)
    {
        _logMean = logMean;
        _variance = (logStandardDeviation * logStandardDeviation).Reduce();
        _maximumOrder = maximumOrder;
        RequireRange();
        var distances = new LogNormalDistances(logStandardDeviation, maximumOrder);
        _central = new SharedByPrecision<Ball[]>(CentralOfUnitMean);
        _absolute = new SharedByPrecision<Ball[]>(distances.Evaluate);
    }

    /// <summary>E Xᵏ.</summary>
    internal IReadOnlyList<RealNumber> Raw(CancellationToken cancellation)
    {
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic exponent = RawExponent(k);
            moments[k] = exponent.IsZero
                ? RealNumber.Exact(Rational.One)
                : RealNumber.FromEnclosures((precision, token) => Elementary.Exp(Ball.FromDyadic(exponent), precision, token));
        }

        return moments;
    }

    /// <summary>E (X − M)ᵏ = Mᵏ cₖ.</summary>
    internal IReadOnlyList<RealNumber> Central()
    {
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            moments[k] = k <= 1 ? RealNumber.Exact(1 - k) : TimesPowerOfMean(_central, k);
        }

        return moments;
    }

    /// <summary>E |X − M|ᵏ, the central moment for even k.</summary>
    internal IReadOnlyList<RealNumber> Absolute(IReadOnlyList<RealNumber> central)
    {
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            moments[k] = (k & 1) == 0 ? central[k] : TimesPowerOfMean(_absolute, k);
        }

        return moments;
    }

    private Dyadic RawExponent(int k) =>
        ((_logMean * new Dyadic(k, 0)) + (_variance * new Dyadic(k * k, -1))).Reduce();

    private void RequireRange()
    {
        var limit = new Dyadic(LargestExponent, 0);
        // km + k²s²/2 is convex in k, so that its largest value is at one end.
        bool isLarge = RawExponent(_maximumOrder) > limit || (_maximumOrder > 0 && RawExponent(1) > limit)
            || _variance * new Dyadic(_maximumOrder * _maximumOrder, -1) > limit;
        if (isLarge)
        {
            throw new RuleConstructionException(
                RuleFailure.MomentNotRepresentable,
                "A moment of this log-normal distribution is beyond every number format; ask for a lower order, or for a smaller log-mean or "
                + "log-standard-deviation.");
        }
    }

    private RealNumber TimesPowerOfMean(SharedByPrecision<Ball[]> ofUnitMean, int k)
    {
        Dyadic exponent = ((_logMean + _variance.ScaleByPowerOfTwo(-1)) * new Dyadic(k, 0)).Reduce();
        return RealNumber.FromEnclosures((precision, token) => Ball.Multiply(
            Elementary.Exp(Ball.FromDyadic(exponent), precision + 8, token), ofUnitMean.At(precision, token)[k], precision));
    }

    /// <summary>cₖ for all k, with a relative radius near 2^−precision.</summary>
    private Ball[] CentralOfUnitMean(int precision, CancellationToken cancellation)
    {
        int working = precision + 32;
        Ball one = Ball.FromInteger(1);
        // Q − 1 keeps the bits that Q does not have in common with 1.
        int close = working + Math.Max(0, -Approximation.FloorLog2(_variance));
        Ball q = Elementary.Exp(Ball.FromDyadic(_variance), close, cancellation);
        Ball excess = Ball.Subtract(q, one, close).Trim(working);
        q = q.Trim(working);
        var moments = new Ball[_maximumOrder + 1];
        // Qʲ cⱼ/j! and dʲ/j!: their convolution is the sum over the binomial coefficients, divided by (k−1)!.
        var scaled = new Ball[_maximumOrder + 1];
        var powers = new Ball[_maximumOrder + 1];
        moments[0] = scaled[0] = powers[0] = one;
        Ball power = one, powerLessOne = default, factorial = one;
        for (int k = 1; k <= _maximumOrder; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball order = Ball.FromInteger(k);
            powers[k] = Ball.Divide(Ball.Multiply(powers[k - 1], excess, working), order, working);
            Ball sum = default;
            for (int j = 0; j <= k - 2; j++)
            {
                sum = Ball.Add(sum, Ball.Multiply(scaled[j], powers[k - 1 - j], working), working);
            }

            // power is Qᵏ⁻¹ here, and factorial (k−1)!.
            moments[k] = Ball.Add(
                Ball.Multiply(powerLessOne, moments[k - 1], working), Ball.Multiply(factorial, sum, working), working);
            power = Ball.Multiply(power, q, working);
            powerLessOne = Ball.Add(Ball.Multiply(powerLessOne, q, working), excess, working);
            factorial = Ball.Multiply(factorial, order, working);
            scaled[k] = Ball.Divide(Ball.Multiply(power, moments[k], working), factorial, working);
        }

        return moments;
    }
}
