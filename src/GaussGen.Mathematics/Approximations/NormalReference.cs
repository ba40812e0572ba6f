using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Approximations;

/// <summary>
/// The functions of the standard normal distribution as balls, by <see cref="ErrorFunctionGrid"/> and the definitions of NIST DLMF
/// 7.2 and 7.17 and of Abramowitz and Stegun 26.2.
/// </summary>
public sealed class NormalReference
{
    private readonly CancellationToken _cancellation;

    /// <summary>Prepares the error functions.</summary>
    /// <param name="precision">The working precision in bits, 64 to 1000.</param>
    /// <param name="cancellation">Looked at here and in each evaluation later.</param>
    /// <exception cref="ArgumentOutOfRangeException">The precision is outside its range.</exception>
    public NormalReference(int precision, CancellationToken cancellation = default)
    {
        _cancellation = cancellation;
        ErrorFunctions = new ErrorFunctionGrid(precision, cancellation);
    }

    /// <summary>The error functions.</summary>
    public ErrorFunctionGrid ErrorFunctions { get; }

    private int Precision => ErrorFunctions.Precision;

    /// <summary>exp(−x²/2)/√(2π).</summary>
    public Ball Density(Ball x) => Ball.Multiply(
        Elementary.Exp(HalfSquare(x).Negate(), Precision, _cancellation), ErrorFunctions.PeakDensity, Precision);

    /// <summary>ln Density.</summary>
    public Ball LogDensity(Ball x) => Ball.Subtract(
        Elementary.Log(ErrorFunctions.PeakDensity, Precision, _cancellation), HalfSquare(x), Precision);

    /// <summary>The probability above x, ½ erfc(x/√2).</summary>
    public Ball UpperTail(Ball x) => ErrorFunctions.Erfc(Reduced(x)).ScaleByPowerOfTwo(-1);

    /// <summary>The probability below x.</summary>
    public Ball Cumulative(Ball x) => UpperTail(x.Negate());

    /// <summary>The probability between 0 and x, ½ erf(x/√2).</summary>
    public Ball FromZero(Ball x) => ErrorFunctions.Erf(Reduced(x)).ScaleByPowerOfTwo(-1);

    /// <summary>UpperTail x / exp(−x²/2), for x above −30.</summary>
    public Ball ScaledTail(Ball x) => ErrorFunctions.ErfcScaled(Reduced(x)).ScaleByPowerOfTwo(-1);

    /// <summary>ln Cumulative.</summary>
    public Ball LogCumulative(Ball x)
    {
        if (x.Midpoint.Sign < 0 && x.Center < new Dyadic(-1, 0))
        {
            return Ball.Subtract(
                Elementary.Log(ScaledTail(x.Negate()), Precision, _cancellation), HalfSquare(x), Precision);
        }

        Ball tail = UpperTail(x);
        if (Approximation.CeilingLog2(tail) > -16)
        {
            return Elementary.Log(Cumulative(x), Precision + 16, _cancellation);
        }

        // ln(1 − q) = −Σ q^k/k; the rest after n terms is below 2 q^(n+1) for q at most one half.
        Ball sum = default, power = tail;
        int small = Approximation.CeilingLog2(tail) - Precision;
        for (int k = 1; k == 1 || Approximation.CeilingLog2(power) > small; k++)
        {
            sum = Ball.Add(sum, Ball.Divide(power, Ball.FromInteger(k), Precision), Precision);
            power = Ball.Multiply(power, tail, Precision);
        }

        return sum.Enlarge(Approximation.Magnitude(power).ScaleByPowerOfTwo(1)).Negate();
    }

    /// <summary>The probability between two numbers, the first not above the second.</summary>
    public Ball IntervalProbability(Ball lower, Ball upper)
    {
        if (lower.Midpoint.Sign <= 0 && upper.Midpoint.Sign <= 0)
        {
            (lower, upper) = (upper.Negate(), lower.Negate());
        }

        // From one on, tails keep their relative accuracy; below it, integrals from zero do.
        return lower.Center > new Dyadic(1, 0)
            ? Ball.Subtract(UpperTail(lower), UpperTail(upper), Precision)
            : Ball.Subtract(FromZero(upper), FromZero(lower), Precision);
    }

    /// <summary>The number above which the probability is <paramref name="tail"/>, near a given number.</summary>
    /// <param name="tail">The probability, above zero and below one.</param>
    /// <param name="near">A number so near that Newton's method converges; the result says how well it did.</param>
    /// <returns>An enclosure, by the mean value theorem about the last approximation.</returns>
    public Ball UpperQuantile(Ball tail, Dyadic near)
    {
        Ball x = Ball.FromDyadic(near);
        for (int i = 0; i < 60; i++)
        {
            _cancellation.ThrowIfCancellationRequested();
            Ball step = Ball.Divide(Ball.Subtract(UpperTail(x), tail, Precision), Density(x), Precision);
            if (Approximation.CeilingLog2(step) < -(Precision / 2) + 16)
            {
                return Refine(x, step);
            }

            x = Ball.FromDyadic(Ball.Add(x, step, Precision).Center);
        }

        throw new InvalidOperationException("Newton's method did not reach the quantile; start nearer to it.");
    }

    /// <summary>
    /// An enclosure of the quantile from an approximation and Newton's step s: the true step is s·φ(x)/φ(ξ) for a ξ between, and
    /// |ln(φ(x)/φ(ξ))| = |x² − ξ²|/2 ≤ (|x| + |e|)|e| for the error e, which is below 2|s| where (|x| + 2|s|)·2|s| ≤ 1/4.
    /// </summary>
    public Ball Refine(Ball x, Ball step)
    {
        Bound twice = Approximation.Magnitude(step).ScaleByPowerOfTwo(1);
        Bound exponent = (Approximation.Magnitude(x) + twice) * twice;
        return exponent.CeilingLog2 <= -2
            ? Ball.Add(x, step.Enlarge(twice * exponent), 2 * Precision)
            : throw new InvalidOperationException("The approximation is too far from the quantile.");
    }

    private Ball Reduced(Ball x) => Ball.Multiply(x, ErrorFunctions.HalfSqrt2, Precision);

    private Ball HalfSquare(Ball x) => Ball.Square(x, 4 * Precision).ScaleByPowerOfTwo(-1);
}
