using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// The log-normal density with log-mean m and log-standard-deviation s, for rules of n points. With Q = exp(s²), aₖ = eᵐ Q^(k−½) (Qᵏ⁺¹ + Qᵏ − 1)
/// and bₖ = e²ᵐ Q^(3k−2) (Qᵏ − 1): the Stieltjes–Wigert polynomials (Wigert 1923; Chihara 1978, VI.2).
/// </summary>
/// <remarks>
/// <para>
/// In z = x/(eᵐ Q^(n−½)) the n nodes are symmetric in the logarithm: with zᵢ also 1/zᵢ is a node. For Σ C(n,k)_q q^(k²) (−t)ᵏ, q = 1/Q, to which πₙ is
/// proportional, has palindromic coefficients after t is scaled so, as the Gaussian binomial coefficients C(n,k)_q are symmetric in k and n − k. So for
/// odd n the middle node is z = 1, x = exp(m + (n − ½) s²).
/// </para>
/// <para>
/// Where s is small the nodes lie close to z = 1, and the coordinate is y = (z − 1)·2ʲ with 2^−j near s; else it is z itself, in which
/// the Jacobi matrix is graded and positive definite.
/// </para>
/// </remarks>
internal sealed class LogNormalWeight : WeightFunction
{
    private readonly Dyadic _variance;
    private readonly Rational _logScale;
    private readonly int _points;
    private readonly int _power;

    /// <summary>The weight for rules with the given number of points.</summary>
    internal LogNormalWeight(Dyadic logMean, Dyadic logStandardDeviation, int points)
    {
        _variance = (logStandardDeviation * logStandardDeviation).Reduce();
        _points = points;
        _logScale = logMean.ToRational() + (_variance.ToRational() * new Rational((2 * points) - 1, 2));
        // s·√n·2 is about how far log z reaches where s is small.
        IsGraded = _variance.ToRational() * points > new Rational(1, 16);
        _power = IsGraded ? 0 : -Approximation.FloorLog2(logStandardDeviation);
    }

    /// <inheritdoc/>
    internal override bool IsGraded { get; }

    /// <inheritdoc/>
    internal override RealNumber? Lower => RealNumber.Exact(IsGraded ? Rational.Zero : -new Dyadic(1, _power).ToRational());

    /// <inheritdoc/>
    internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation)
    {
        // Qᵏ − 1 and aₖ − 1 lose the leading bits that Q has in common with 1.
        int working = accuracy + 24 + (2 * Math.Max(0, _power)) + Math.Max(0, -Approximation.FloorLog2(_variance));
        Ball one = Ball.FromInteger(1);
        var diagonal = new Ball[count];
        var squares = new Ball[count];
        squares[0] = one;
        // a₀ = Q^(1−n), where nothing cancels and nothing can be out of range.
        diagonal[0] = Shifted(Power(1 - _points, working, cancellation), working);
        Ball q = count > 1 ? Power(1, working, cancellation) : one;
        Ball cube = Ball.Multiply(Ball.Square(q, working), q, working);
        Ball power = one, low = count > 1 ? Power(-_points, working, cancellation) : one;
        Ball lowest = count > 1 ? Power((-2 * _points) - 1, working, cancellation) : one;
        for (int k = 1; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            power = Ball.Multiply(power, q, working);
            low = Ball.Multiply(low, q, working);
            lowest = Ball.Multiply(lowest, cube, working);
            Ball excess = Ball.Subtract(power, one, working);
            Ball sum = Ball.Add(Ball.Multiply(power, q, working), excess, working);
            diagonal[k] = Shifted(Ball.Multiply(low, sum, working), working);
            squares[k] = Ball.Multiply(lowest, excess, working).ScaleByPowerOfTwo(2 * _power);
        }

        return new Recurrence(diagonal, squares, isEven: false);
    }

    /// <inheritdoc/>
    /// <remarks>E zᵏ = Q^(k²/2 − k (n − ½)).</remarks>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        var moments = new Ball[count];
        for (int k = 0; k < count; k++)
        {
            moments[k] = Power(new Dyadic((k * (long)k) - (k * ((2L * _points) - 1)), -1), precision + 8, cancellation);
        }

        return moments;
    }

    /// <inheritdoc/>
    internal override Ball ToMomentCoordinate(Ball coordinate) => IsGraded
        ? coordinate
        : Ball.Add(Ball.FromInteger(1), coordinate.ScaleByPowerOfTwo(-_power), int.MaxValue);

    /// <inheritdoc/>
    internal override Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation)
    {
        int working = precision + Math.Max(0, _power) + 16;
        Ball scale = Elementary.Exp(Ball.FromRational(_logScale, working + 64), working, cancellation);
        return Ball.Multiply(ToMomentCoordinate(coordinate), scale, working);
    }

    /// <inheritdoc/>
    internal override Rational? ToLineExactly(Rational coordinate) => null;

    /// <inheritdoc/>
    /// <remarks>The middle node exp(m + (n − ½) s²) is rational only where its exponent is 0 (Lindemann).</remarks>
    internal override Rational? ExactNode(int points, int index) =>
        (2 * index) + 1 == points && points == _points && _logScale.IsZero ? Rational.One : null;

    private Ball Shifted(Ball z, int working) =>
        IsGraded ? z : Ball.Subtract(z, Ball.FromInteger(1), working).ScaleByPowerOfTwo(_power);

    private Ball Power(int exponent, int precision, CancellationToken cancellation) =>
        Power(new Dyadic(exponent, 0), precision, cancellation);

    /// <summary>Q to a power.</summary>
    private Ball Power(Dyadic exponent, int precision, CancellationToken cancellation) =>
        Elementary.Exp(Ball.FromDyadic((_variance * exponent).Reduce()), precision, cancellation);
}
