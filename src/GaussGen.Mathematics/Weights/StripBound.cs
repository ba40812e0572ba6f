using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// Bounds of Iₖ(a) = ∫ |x + ia|²ᵏ exp(−Re p(x + ia)) dx over the real line, on which the error of the trapezoidal rule for
/// ∫ x²ᵏ exp(−p(x)) dx depends: with step h it is at most 2 Iₖ(a)/(e^(2πa/h) − 1) (Trefethen and Weideman 2014, theorem 5.1).
/// </summary>
/// <remarks>
/// With T = x², Q(T) = Re p(x + ia), any λ &gt; 0 and U ≥ k ln(T + a²) − Q(T) + λT for all T ≥ 0, Iₖ ≤ e^U ∫ e^(−λx²) dx = e^U √(π/λ). The
/// logarithm is concave, so that k ln(T + a²) ≤ k (g (T + a²) − 1 − ln g) for any g &gt; 0; what remains is that a polynomial in T is
/// above zero on [0, ∞), which <see cref="PolynomialPositivity"/> proves exactly. Binary64 arithmetic only proposes U, g and λ.
/// </remarks>
internal static class StripBound
{
    private const double RoundingSlack = 1e-6;

    /// <summary>An upper bound of ln Iₖ(a), proven.</summary>
    /// <param name="exponent">p.</param>
    /// <param name="height">a.</param>
    /// <param name="k">k.</param>
    /// <param name="cancellation">Passed on.</param>
    /// <returns>The bound; +∞ where none is proven.</returns>
    internal static double LogOfIntegral(EvenPolynomial exponent, Dyadic height, int k, CancellationToken cancellation)
    {
        Dyadic[] real = exponent.RealPartOnLine(height);
        double a = Approximation.ToDouble(height);
        double at = Peak(real, k, a * a, out double top);
        // A tangent a little beyond the peak leaves the polynomial some growth, of which the damping takes a part.
        Dyadic damping = ShortBelow(0.1 / Reach(real, k, a * a, at, top));
        Dyadic slope = ShortBelow(0.8 / (at + (a * a)));
        double offset = -1 - Math.Log(Approximation.ToDouble(slope)) + RoundingSlack;
        for (double slack = 1; slack < 1e6; slack *= 4)
        {
            Dyadic bound = ShortAbove(top + 1 + slack);
            var difference = (Dyadic[])real.Clone();
            difference[0] += bound - Times(k, Approximation.FromDouble(offset) + (slope * height * height));
            difference[1] -= damping + Times(k, slope);
            if (IsPositive(difference, at, cancellation))
            {
                return Approximation.ToDouble(bound) + (0.5 * Math.Log(Math.PI / Approximation.ToDouble(damping))) + RoundingSlack;
            }
        }

        return double.PositiveInfinity;
    }

    /// <summary>About the largest value of k ln(T + a²) − Q(T) over T ≥ 0, and where it is. No bound.</summary>
    internal static double Peak(Dyadic[] coefficients, int k, double heightSquared, out double top)
    {
        double[] c = Array.ConvertAll(coefficients, Approximation.ToDouble);
        double Value(double t) => (k == 0 ? 0 : k * Math.Log(t + heightSquared)) - Horner(c, t);

        double at = 0;
        top = k > 0 && heightSquared == 0 ? double.NegativeInfinity : Value(0);
        const double Ratio = 1.5;
        for (double t = 1e-24; t < 1e24; t *= Ratio)
        {
            double middle = Value(t);
            if (middle < Value(t / Ratio) || middle < Value(t * Ratio))
            {
                continue;
            }

            double candidate = Maximise(Value, t / Ratio, t * Ratio);
            if (Value(candidate) > top)
            {
                (at, top) = (candidate, Value(candidate));
            }
        }

        return at;
    }

    /// <summary>About where the same expression has fallen by one, beyond its peak. No bound.</summary>
    private static double Reach(Dyadic[] coefficients, int k, double heightSquared, double at, double top)
    {
        double[] c = Array.ConvertAll(coefficients, Approximation.ToDouble);
        double reach = Math.Max(at, 1e-24);
        while (reach < 1e24 && (k == 0 ? 0 : k * Math.Log(reach + heightSquared)) - Horner(c, reach) > top - 1)
        {
            reach *= 1.1;
        }

        return reach;
    }

    private static double Maximise(Func<double, double> value, double low, double high)
    {
        for (int i = 0; i < 40; i++)
        {
            double left = low + ((high - low) * 0.4), right = low + ((high - low) * 0.6);
            (low, high) = value(left) < value(right) ? (left, high) : (low, right);
        }

        return low + ((high - low) / 2);
    }

    private static double Horner(double[] coefficients, double t)
    {
        double value = 0;
        for (int k = coefficients.Length - 1; k >= 0; k--)
        {
            value = (value * t) + coefficients[k];
        }

        return value;
    }

    private static bool IsPositive(Dyadic[] coefficients, double at, CancellationToken cancellation)
    {
        for (double beyond = Math.Max(4 * at, 1e-6); beyond < 1e30; beyond *= 4)
        {
            Dyadic end = ShortAbove(beyond);
            if (Array.TrueForAll(PolynomialPositivity.Shift(coefficients, end), coefficient => coefficient.Sign >= 0))
            {
                return PolynomialPositivity.IsPositive(coefficients, end, cancellation);
            }
        }

        return false;
    }

    private static Dyadic Times(int factor, Dyadic value) => value * new Dyadic(factor, 0);

    /// <summary>A dyadic number of 12 bits, not above the given positive one and close to it.</summary>
    private static Dyadic ShortBelow(double value)
    {
        Dyadic exact = Approximation.FromDouble(value).Reduce();
        int shift = Math.Max(0, exact.BitLength - 12);
        return new Dyadic(exact.Mantissa >> shift, exact.Exponent + shift);
    }

    /// <summary>A dyadic number of 24 bits or so, above the given one and close to it.</summary>
    private static Dyadic ShortAbove(double value)
    {
        Dyadic exact = Approximation.FromDouble(value).Reduce();
        int shift = Math.Max(0, exact.BitLength - 24);
        return new Dyadic((exact.Mantissa >> shift) + 1, exact.Exponent + shift);
    }
}
