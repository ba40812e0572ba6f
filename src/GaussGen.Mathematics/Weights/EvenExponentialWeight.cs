using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// exp(−(c₁x² + c₂x⁴ + … + c_d x²ᵈ)) with c_d above zero, wells included. With one coefficient it is the normal density of variance
/// 1/(2c₁), whose recurrence is bₖ = k/(2c₁) exactly (NIST DLMF 18.9.1); with more, its moments come from <see cref="EvenExponentialIntegrals"/>.
/// </summary>
internal sealed class EvenExponentialWeight : MomentWeight
{
    private readonly EvenPolynomial _exponent;
    private readonly int _power;
    private readonly SharedByPrecision<Ball[]> _integral;

    /// <summary>The weight with the given coefficients, the last one above zero.</summary>
    internal EvenExponentialWeight(IReadOnlyList<Dyadic> coefficients)
    {
        // y = 2^−s x brings the largest of the |cₖ|^(1/k) near 1, so that binary64 arithmetic can propose steps and bounds.
        double largest = double.NegativeInfinity;
        for (int k = 1; k <= coefficients.Count; k++)
        {
            largest = Math.Max(largest, Approximation.Log2(coefficients[k - 1]) / (2 * k));
        }

        _power = -(int)Math.Round(largest);
        var scaled = new Dyadic[coefficients.Count];
        for (int k = 1; k <= scaled.Length; k++)
        {
            scaled[k - 1] = coefficients[k - 1].ScaleByPowerOfTwo(2 * k * _power);
        }

        _exponent = new EvenPolynomial(scaled);
        _integral = new SharedByPrecision<Ball[]>(
            (precision, cancellation) => EvenExponentialIntegrals.Evaluate(_exponent, 1, precision, cancellation));
    }

    /// <inheritdoc/>
    internal override bool IsEven => true;

    /// <summary>p in the coordinate y.</summary>
    internal EvenPolynomial Exponent => _exponent;

    /// <summary>The binary logarithm of the unit of the coordinate y: x = 2^power · y.</summary>
    internal int Power => _power;

    private bool IsNormal => _exponent.Terms == 1;

    /// <summary>∫ exp(−p(x)) dx over the real line.</summary>
    internal Ball NormalizingIntegral(int precision, CancellationToken cancellation)
    {
        if (!IsNormal)
        {
            return _integral.At(precision, cancellation)[0].ScaleByPowerOfTwo(_power).Trim(precision);
        }

        int working = precision + 8;
        Ball quotient = Ball.Divide(Constants.Pi(working, cancellation), Ball.FromDyadic(_exponent.Coefficient(1)), working);
        return Ball.Sqrt(quotient, precision).ScaleByPowerOfTwo(_power);
    }

    /// <inheritdoc/>
    internal override RationalRecurrence? ExactRecurrence(int count)
    {
        if (!IsNormal)
        {
            return null;
        }

        var squares = new Rational[count];
        Rational first = Rational.One / (2 * _exponent.Coefficient(1).ToRational());
        for (int k = 0; k < count; k++)
        {
            squares[k] = k * first;
        }

        return new RationalRecurrence(new Rational[count], squares, isEven: true);
    }

    /// <inheritdoc/>
    internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation) =>
        ExactRecurrence(count) is { } exact
            ? Rules.Universal.Recurrence.FromRationals(exact, accuracy + 8, cancellation)
            : base.Recurrence(count, accuracy, cancellation);

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        if (IsNormal)
        {
            return NormalMoments(count, precision);
        }

        Ball[] integrals = EvenExponentialIntegrals.Evaluate(_exponent, (count + 1) / 2, precision, cancellation);
        var moments = new Ball[count];
        for (int k = 0; k < count; k += 2)
        {
            moments[k] = integrals[k / 2];
        }

        return moments;
    }

    /// <inheritdoc/>
    internal override Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation) =>
        coordinate.ScaleByPowerOfTwo(_power);

    /// <inheritdoc/>
    internal override Rational? ToLineExactly(Rational coordinate) => coordinate * new Dyadic(1, _power).ToRational();

    /// <summary>(k−1)!! (2c₁)^(−k/2) for even k.</summary>
    private Ball[] NormalMoments(int count, int precision)
    {
        Ball variance = Ball.Divide(Ball.FromInteger(1), Ball.FromDyadic(_exponent.Coefficient(1).ScaleByPowerOfTwo(1)), precision + 8);
        var moments = new Ball[count];
        Ball moment = Ball.FromInteger(1);
        for (int k = 0; k < count; k += 2)
        {
            moments[k] = moment;
            moment = Ball.Multiply(Ball.Multiply(moment, variance, precision + 8), Ball.FromInteger(k + 1), precision + 8);
        }

        return moments;
    }

    /// <inheritdoc/>
    protected override int ExpectedLoss(int count) =>
        (int)Math.Max(4, count * ((0.9 * Math.Log(Math.Max(count, 2), 2)) - 0.6));
}
