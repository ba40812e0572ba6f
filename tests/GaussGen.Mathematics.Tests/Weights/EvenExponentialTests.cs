using System;
using System.Linq;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Weights;

public class EvenExponentialTests
{
    // 2Γ(5/4), classical (recalled, recomputed); the double well by modified Bessel functions, ∫ exp(2x² − x⁴/2) dx = (π/2) √2 e (I₋₁/₄(1) + I₁/₄(1)) (DLMF 10.32,
    // recalled, recomputed with mpmath at 50 digits); 2Γ(7/6) for x⁶; √(π/c) for one coefficient.
    [Theory]
    [InlineData("1.8128049541109541559653425779338360014976", 0.0, 1.0)]
    [InlineData("14.743640098075209439224968593453031250900", -2.0, 0.5)]
    [InlineData("1.8554386672600784014166989650692420371329", 0.0, 0.0, 1.0)]
    [InlineData("2.5066282746310005024157652848110452530070", 0.5)]
    public void The_normalizing_integral_is_the_published_one(string value, params double[] coefficients)
    {
        foreach (int precision in new[] { 64, 128, 400 })
        {
            Ball integral = Weight(coefficients).NormalizingIntegral(precision, default);
            (Rational low, Rational high) = DecimalText.Interval(value);
            Assert.True(integral.Lower.ToRational() <= high && low <= integral.Upper.ToRational(), integral + " is not " + value);
            Assert.True(integral.RelativeAccuracyBits >= precision - 8, integral.RelativeAccuracyBits + " bits at " + precision);
        }
    }

    [Fact]
    public void Moments_satisfy_integration_by_parts()
    {
        // ∫ (xᵏ⁺¹ e^−p)′ = 0: (k+1) Mₖ = Σ 2j cⱼ Mₖ₊₂ⱼ; and the enclosures are as narrow as was asked.
        double[][] weights = [[0, 1], [-2, 0.5], [1, 0, 0.1], [-10, 1], [0.1, 0.2, 0.3, 0.4], [3, -2, 0.3], [1, 1e-12], [1e10, 1e-300], [-40, 1]];
        foreach (double[] c in weights)
        {
            EvenExponentialWeight weight = Weight(c);
            const int Count = 40, Precision = 200;
            Ball[] scaled = weight.Moments(Count, Precision, default);
            // In the weight's own coordinate y = x/unit.
            Rational unit = weight.ToLineExactly(1)!.Value;
            for (int k = 0; k + (2 * c.Length) < Count; k += 2)
            {
                Assert.True(scaled[k].RelativeAccuracyBits >= Precision - 20, $"{scaled[k].RelativeAccuracyBits} bits of moment {k} of {string.Join(' ', c)}");
                Ball sum = Ball.Multiply(Ball.FromInteger(-(k + 1)), scaled[k], 400);
                for (int j = 1; j <= c.Length; j++)
                {
                    Rational factor = 2 * j * Rational.FromDouble(c[j - 1]) * unit.Pow(2 * j);
                    sum = Ball.Add(sum, Ball.Multiply(Ball.FromRational(factor, 400), scaled[k + (2 * j)], 400), 400);
                }

                Assert.True(sum.ContainsZero, $"moment {k} of {string.Join(' ', c)}");
            }
        }
    }

    [Fact]
    public void The_strip_bound_is_above_the_integral_on_the_line_and_not_far_above()
    {
        foreach (double[] c in new double[][] { [0, 1], [-2, 0.5], [1, 0, 0.1], [-10, 1] })
        {
            var exponent = new EvenPolynomial(Array.ConvertAll(c, Approximation.FromDouble));
            foreach (double a in new[] { 0.25, 1, 2 })
            {
                foreach (int k in new[] { 0, 5, 40 })
                {
                    double bound = StripBound.LogOfIntegral(exponent, Approximation.FromDouble(a), k, default);
                    double integral = LogOfIntegral(c, a, k);
                    Assert.InRange(bound, integral, integral + 12);
                }
            }
        }
    }

    [Fact]
    public void Wells_that_are_too_deep_are_refused_with_a_reason()
    {
        var failure = Assert.Throws<RuleConstructionException>(() => Weight(-1e8, 1e-6).Moments(10, 200, default));

        Assert.Equal(RuleFailure.RecurrenceNotDetermined, failure.Failure);
    }

    [Fact]
    public void A_polynomial_is_proven_positive_only_where_it_is()
    {
        // ((T − r)² + e)·(T + s) in exact arithmetic: positive for e > 0; with e = 0 it touches zero, with e < 0 it crosses it.
        Gen.Select(Gen.Int[1, 400], Gen.Int[-3, 3], Gen.Int[1, 50]).Sample((r, e, s) =>
        {
            Dyadic root = new(r, -4), gap = new(e, -6), shift = new(s, -2);
            Dyadic square = (root * root) + gap;
            Dyadic[] coefficients = [square * shift, square - (root * shift).ScaleByPowerOfTwo(1), shift - root.ScaleByPowerOfTwo(1), new(1, 0)];
            Assert.Equal(e > 0, PolynomialPositivity.IsPositive(coefficients, new Dyadic(100, 0), default));
        });
    }

    [Fact]
    public void The_real_part_on_a_line_is_that_of_complex_arithmetic()
    {
        double[] c = [1.5, -0.25, 0.125, 2];
        Dyadic[] real = new EvenPolynomial(Array.ConvertAll(c, Approximation.FromDouble)).RealPartOnLine(new Dyadic(3, -2));
        foreach (double x in new[] { 0, 0.5, 1.25, 3 })
        {
            var z = new System.Numerics.Complex(x, 0.75);
            double expected = c.Select((value, k) => (value * System.Numerics.Complex.Pow(z, 2 * (k + 1))).Real).Sum();
            double actual = real.Select((value, k) => Approximation.ToDouble(value) * Math.Pow(x * x, k)).Sum();
            Assert.Equal(expected, actual, 1e-9 * (1 + Math.Abs(expected)));
        }
    }

    private static EvenExponentialWeight Weight(params double[] coefficients) =>
        new(Array.ConvertAll(coefficients, Approximation.FromDouble));

    private static double LogOfIntegral(double[] c, double a, int k)
    {
        var logs = new System.Collections.Generic.List<double>();
        for (double x = -20; x <= 20; x += 1.0 / 512)
        {
            var z = new System.Numerics.Complex(x, a);
            System.Numerics.Complex square = z * z, power = 1, exponent = 0;
            foreach (double coefficient in c)
            {
                power *= square;
                exponent += coefficient * power;
            }

            logs.Add((2 * k * Math.Log(z.Magnitude)) - exponent.Real);
        }

        double top = logs.Max();
        return top + Math.Log(logs.Sum(log => Math.Exp(log - top)) / 512);
    }
}
