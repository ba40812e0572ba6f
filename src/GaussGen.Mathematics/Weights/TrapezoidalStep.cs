using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>The step h of a trapezoidal rule, with a proven bound of its error for each integral.</summary>
internal sealed class TrapezoidalStep
{
    private readonly double _exponent;
    private readonly double _firstLog;
    private readonly double _lastLog;
    private readonly int _last;

    private TrapezoidalStep(Dyadic size, double exponent, double firstLog, double lastLog, int last, double expectedTerms)
    {
        Size = size;
        _exponent = exponent;
        _firstLog = firstLog;
        _lastLog = lastLog;
        _last = last;
        ExpectedTerms = expectedTerms;
    }

    /// <summary>h, a dyadic number of few bits.</summary>
    internal Dyadic Size { get; }

    /// <summary>About how many terms the sum will have.</summary>
    internal double ExpectedTerms { get; }

    /// <summary>
    /// The largest step, among strips of several heights a, whose error is below 2^−precision of every integral ∫ x²ᵏ exp(−p) dx, k ≤ last.
    /// </summary>
    /// <exception cref="Rules.RuleConstructionException">More terms than allowed are needed.</exception>
    internal static TrapezoidalStep Choose(EvenPolynomial exponent, int last, int precision, CancellationToken cancellation)
    {
        Dyadic[] onAxis = exponent.RealPartOnLine(Dyadic.Zero);
        // The integrals themselves by Laplace's method, to a few nats; the error is compared with them only to choose the step.
        double squareAtLast = StripBound.Peak(onAxis, Math.Max(last, 1), 0, out double lastTop);
        _ = StripBound.Peak(onAxis, 0, 0, out double firstTop);
        lastTop = last == 0 ? firstTop : lastTop;
        double range = Math.Sqrt(squareAtLast);
        // Where the peak is not found it lies beyond 10¹²; where it is so high the wells are too deep by far.
        if (!(range > 0) || !(Math.Max(firstTop, lastTop) < 1e9))
        {
            throw EvenExponentialIntegrals.TooManyTerms();
        }

        double wanted = (precision + 8) * Math.Log(2), bestStep = 0, bestHeight = range;
        for (double height = range * 4; height > range * 1e-4; height /= 1.4)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic a = Short(height);
            double loss = Loss(exponent.RealPartOnLine(a), last, Approximation.ToDouble(a), firstTop, lastTop);
            double step = 2 * Math.PI * height / (wanted + loss + 4);
            (bestStep, bestHeight) = step > bestStep ? (step, height) : (bestStep, bestHeight);
        }

        return Prove(exponent, last, Short(bestHeight), firstTop, lastTop, wanted, cancellation);
    }

    /// <summary>log₂ of a bound of the error for the integral with index k, rounded up.</summary>
    internal int ErrorLog2(int k)
    {
        double fraction = _last == 0 ? 0 : (double)k / _last;
        double log = _firstLog + (fraction * (_lastLog - _firstLog)) - _exponent;
        // 2/(e^v − 1) ≤ 4 e^−v for v ≥ 1: two bits; two more cover the rounding of these numbers.
        return (int)Math.Ceiling(log / Math.Log(2)) + 4;
    }

    private static TrapezoidalStep Prove(
        EvenPolynomial exponent, int last, Dyadic height, double firstTop, double lastTop, double wanted, CancellationToken cancellation)
    {
        double firstLog = StripBound.LogOfIntegral(exponent, height, 0, cancellation);
        double lastLog = last == 0 ? firstLog : StripBound.LogOfIntegral(exponent, height, last, cancellation);
        double loss = Math.Max(firstLog - firstTop, lastLog - lastTop) + 12;
        double a = Approximation.ToDouble(height);
        double step = 2 * Math.PI * a / (wanted + Math.Max(loss, 0));
        double expected = Extent(exponent, last, lastTop, wanted) / step;
        if (!(expected < EvenExponentialIntegrals.MaximumTerms))
        {
            throw EvenExponentialIntegrals.TooManyTerms();
        }

        Dyadic size = Short(step);
        // The exponent that the bound of the error is made from belongs to the step as it is, and is rounded down.
        double decay = 2 * Math.PI * a / Approximation.ToDouble(size) * (1 - 1e-12);
        return new TrapezoidalStep(size, decay, firstLog, lastLog, last, expected);
    }

    /// <summary>About how many nats the integrand on the line at height a exceeds that on the axis by.</summary>
    private static double Loss(Dyadic[] real, int last, double a, double firstTop, double lastTop)
    {
        _ = StripBound.Peak(real, 0, a * a, out double first);
        _ = StripBound.Peak(real, last, a * a, out double other);
        return Math.Max(0, Math.Max(first - firstTop, other - lastTop));
    }

    /// <summary>About where x²ᵏ exp(−p(x)) falls below 2^−precision of its largest value.</summary>
    private static double Extent(EvenPolynomial exponent, int last, double lastTop, double wanted)
    {
        double[] c = Array.ConvertAll(exponent.RealPartOnLine(Dyadic.Zero), Approximation.ToDouble);
        double square = 1e30;
        for (; square > 1e-24; square /= 1.1)
        {
            double value = 0;
            for (int k = c.Length - 1; k >= 0; k--)
            {
                value = (value * square) + c[k];
            }

            if ((last * Math.Log(square)) - value >= lastTop - wanted)
            {
                break;
            }
        }

        return Math.Sqrt(square);
    }

    private static Dyadic Short(double value)
    {
        Dyadic exact = Approximation.FromDouble(value).Reduce();
        int shift = Math.Max(0, exact.BitLength - 8);
        return new Dyadic(exact.Mantissa >> shift, exact.Exponent + shift);
    }
}
