using System;
using System.Collections.Generic;
using CsCheck;
using Xunit;

namespace GaussGen.Tests;

/// <summary>The runtime library together with tables that were generated while this project was compiled.</summary>
public sealed class GeneratedRuleTests
{
    [Fact]
    public void The_expectation_of_a_polynomial_is_exact_up_to_the_degree_that_is_promised()
    {
        // Horner on ascending powers of (x − mean)/deviation: its expectation is that of a standard normal variable.
        var cases = Gen.Select(Gen.Double[-10, 10], Gen.Double[0.01, 5], Gen.Double[-1, 1].Array[14]);
        cases.Sample((mean, deviation, coefficients) =>
        {
            double expected = 0.0;
            double size = 0.0;
            for (int i = 0; i < coefficients.Length; i++)
            {
                double moment = SmallRules.StandardMoment(coefficients.Length - 1 - i);
                expected += coefficients[i] * moment;
                size += Math.Abs(coefficients[i]) * SmallRules.StandardMoment(2 * ((coefficients.Length - i) / 2));
            }

            double Standardized(double x) => new Polynomial(coefficients).Evaluate((x - mean) / deviation);
            double tolerance = 1e-11 * size / Math.Min(1.0, deviation);
            return Seven.DegreeOfExactness == coefficients.Length - 1
                && Math.Abs(Seven.Expectation(mean, deviation, Standardized) - expected) <= tolerance
                && Math.Abs(SixteenPhysicist.Expectation(mean, deviation, Standardized) - expected) <= tolerance;
        });
    }

    [Fact]
    public void Both_conventions_give_the_expectation_under_the_normal_distribution()
    {
        // E exp(aX) = exp(aμ + a²σ²/2).
        double expected = Math.Exp((0.5 * 1.25) + (0.125 * 0.49));
        Assert.Equal(expected, Seven.Expectation(1.25, 0.7, x => Math.Exp(0.5 * x)), 1e-12);
        Assert.Equal(expected, SixteenPhysicist.Expectation(1.25, 0.7, x => Math.Exp(0.5 * x)), 1e-14);
        Assert.Equal(expected, SevenSingle.Expectation(1.25f, 0.7f, x => MathF.Exp(0.5f * x)), 1e-6);
        Assert.Equal(expected, TwentySingle.Expectation(1.25f, 0.7f, x => MathF.Exp(0.5f * x)), 1e-6);
    }

    [Fact]
    public void The_integral_is_taken_with_the_weight_that_the_nodes_belong_to()
    {
        // ∫ exp(−x²) dx = √π, ∫ x² exp(−x²) dx = √π/2, ∫ cos x exp(−x²) dx = √π exp(−1/4).
        double root = Math.Sqrt(Math.PI);
        Assert.Equal(root, SixteenPhysicist.Integral(new Constant(1.0)), 1e-14);
        Assert.Equal(root / 2.0, SixteenPhysicist.Integral(x => x * x), 1e-14);
        Assert.Equal(root * Math.Exp(-0.25), SixteenPhysicist.Integral(Math.Cos), 1e-14);
        Assert.Equal(root * Math.Exp(-0.25), TwentySingle.Integral(MathF.Cos), 1e-6);
    }

    [Fact]
    public void The_two_forms_of_an_expectation_are_the_same_to_the_last_bit()
    {
        Gen.Select(Gen.Double[-3, 3], Gen.Double[0, 2]).Sample((mean, deviation) =>
        {
            Echo echo = new(2.0, 0.3);
            Func<double, double> function = echo.Evaluate;
            Func<float, float> single = echo.Evaluate;
            return Six.Expectation(mean, deviation, echo).Equals(Six.Expectation(mean, deviation, function))
                && Seven.Expectation(mean, deviation, echo).Equals(Seven.Expectation(mean, deviation, function))
                && SixteenPhysicist.Expectation(mean, deviation, echo)
                    .Equals(SixteenPhysicist.Expectation(mean, deviation, function))
                && SixteenPhysicist.Integral(echo).Equals(SixteenPhysicist.Integral(function))
                && SevenSingle.Expectation((float)mean, (float)deviation, echo)
                    .Equals(SevenSingle.Expectation((float)mean, (float)deviation, single))
                && TwentySingle.Expectation((float)mean, (float)deviation, echo)
                    .Equals(TwentySingle.Expectation((float)mean, (float)deviation, single));
        });
    }

    [Theory]
    [InlineData(0.1)]
    [InlineData(-1.0 / 3.0)]
    [InlineData(1e300)]
    public void Without_noise_an_expectation_is_the_value_at_the_mean_to_the_last_bit(double mean)
    {
        List<double> points = [];
        Recorder recorder = new(points);
        Assert.Equal(mean, One.Expectation(mean, 0.0, recorder));
        Assert.Equal(mean, Six.Expectation(mean, 0.0, recorder));
        Assert.Equal(mean, Seven.Expectation(mean, -0.0, recorder));
        Assert.Equal(mean, SixteenPhysicist.Expectation(mean, 0.0, recorder));
        Assert.Equal((float)mean, SevenSingle.Expectation((float)mean, 0.0f, recorder));
        Assert.Equal((float)mean, TwentySingle.Expectation((float)mean, 0.0f, recorder));
        Assert.Equal(6, points.Count);
    }

    [Theory]
    [InlineData(-double.Epsilon)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void A_standard_deviation_that_is_none_is_refused_before_the_function_is_called(double deviation)
    {
        List<double> points = [];
        Recorder recorder = new(points);
        Func<double, double> function = recorder.Evaluate;
        Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => Seven.Expectation(1.0, deviation, recorder));
        Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => Seven.Expectation(1.0, deviation, function));
        Assert.Throws<ArgumentOutOfRangeException>(
            "standardDeviation", () => SixteenPhysicist.Expectation(1.0, deviation, recorder));
        float single = deviation < 0.0 ? -float.Epsilon : (float)deviation;
        Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => SevenSingle.Expectation(1.0f, single, recorder));
        Assert.Empty(points);
    }

    [Fact]
    public void A_missing_function_is_refused()
    {
        Assert.Throws<ArgumentNullException>("integrand", () => Seven.Expectation(1.0, 0.5, null!));
        Assert.Throws<ArgumentNullException>("integrand", () => Seven.Expectation(1.0, 0.0, null!));
        Assert.Throws<ArgumentNullException>("integrand", () => SixteenPhysicist.Integral(null!));
        Assert.Throws<ArgumentNullException>("integrand", () => TwentySingle.Expectation(1.0f, 0.5f, null!));
    }

    [Fact]
    public void A_mean_that_is_not_finite_flows_through()
    {
        Assert.True(double.IsNaN(Seven.Expectation(double.NaN, 1.0, new Identity())));
        Assert.Equal(double.PositiveInfinity, SixteenPhysicist.Expectation(double.PositiveInfinity, 1.0, new Identity()));
        Assert.True(float.IsNaN(SevenSingle.Expectation(float.NaN, 1.0f, new Identity())));
    }

    [Fact]
    public void The_smallest_and_largest_standard_deviations_work()
    {
        Assert.Equal(3.0, Seven.Expectation(3.0, double.Epsilon, new Identity()), 1e-15);
        Assert.Equal(3.0, SixteenPhysicist.Expectation(3.0, double.Epsilon, new Identity()), 1e-15);
        Assert.Equal(1.0, Seven.Expectation(3.0, double.MaxValue, new Constant(1.0)), 1e-15);
        Assert.Equal(1.0, SixteenPhysicist.Expectation(3.0, double.MaxValue, new Constant(1.0)), 1e-15);
    }
}
