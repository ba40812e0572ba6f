using System;
using System.Collections.Generic;
using System.Linq;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Generated rules beside Gauss–Hermite, against moments in closed form up to the degree that is promised.</summary>
public sealed class FamilyRuleTests
{
    private static readonly double RootTwoOverPi = Math.Sqrt(2.0 / Math.PI);

    [Fact]
    public void Powers_of_a_half_normal_variable()
    {
        // E Xᵏ = (k − 1) s² E Xᵏ⁻², from 1 and s √(2/π).
        const double Scale = 0.75;
        double before = 1.0;
        double current = Scale * RootTwoOverPi;
        Assert.Equal(15, Roll.DegreeOfExactness);
        for (int order = 1; order <= Roll.DegreeOfExactness; order++)
        {
            AssertClose(current, Roll.Expectation(Scale, x => Math.Pow(x, order)), 1e-13);
            AssertClose(current, RollSingle.Expectation((float)Scale, x => MathF.Pow(x, order)), 1e-5);
            (before, current) = (current, order * Scale * Scale * before);
        }

        AssertClose(Scale * RootTwoOverPi, Roll.Expectation(Scale, new Identity()), 1e-15);
    }

    [Fact]
    public void Moments_of_a_half_normal_variable()
    {
        double mean = 0.75 * RootTwoOverPi;
        AssertClose(mean, RollMoments.Raw1, 1e-15);
        AssertClose(0.5625, RollMoments.Raw2, 0.0);
        AssertClose(0.5625 - (mean * mean), RollMoments.Central2, 1e-15);
        for (int order = 2; order <= 9; order++)
        {
            AssertClose((order - 1) * 0.5625 * RollMoments.Raw[order - 2], RollMoments.Raw[order], 1e-15);
        }
    }

    [Fact]
    public void Moments_of_a_truncated_normal_variable()
    {
        // X = 1.5 + 0.5 Z with Z in [−2, ∞), whose moments are a = h, b = 1 − 2h, … with the hazard h.
        double hazard = Density(-2.0) / (1.0 - Cumulative(-2.0));
        AssertClose(1.5 + (0.5 * hazard), Depth.Raw1, 1e-14);
        double variance = 1.0 - (2.0 * hazard) - (hazard * hazard);
        AssertClose(0.25 * variance, Depth.Central2, 1e-13);
        AssertClose(Depth.Central2 + (Depth.Raw1 * Depth.Raw1), Depth.Raw2, 1e-15);
        Assert.Equal(0.0, Depth.Central1);
        Assert.Equal(Depth.Central4, Depth.Absolute4);
    }

    [Fact]
    public void Moments_of_an_even_exponential()
    {
        Assert.Equal(1.0, PendulumMoments.Raw0);
        for (int order = 1; order <= 8; order++)
        {
            double expected = Pendulum.Expectation(x => Math.Pow(x, order));
            AssertClose(expected, PendulumMoments.Raw[order], 1e-13);
            Assert.Equal(PendulumMoments.Raw[order], PendulumMoments.Central[order]);
        }

        // E |X| = ∫ |x| exp(2x² − x⁴) dx over the integral; x = t² would do, but the sum on a fine grid does as well.
        double mean = Trapezoid(x => x <= 0.0 ? 0.0 : 2.0 * x * Math.Exp((2.0 * x * x) - (x * x * x * x)), 65536.0) / Pendulum.NormalizingIntegral;
        AssertClose(mean, PendulumMoments.Absolute1, 1e-9);
    }

    [Fact]
    public void A_scale_of_zero_gives_the_value_at_zero_in_one_call()
    {
        List<double> points = [];
        Assert.Equal(0.0, Roll.Expectation(0.0, new Recorder(points)));
        Assert.Equal(0.0f, RollSingle.Expectation(-0.0f, new Recorder(points)));
        Assert.Equal([0.0, 0.0], points);
        Assert.Equal(7.0, Roll.Expectation(0.0, x => x == 0.0 ? 7.0 : throw new InvalidOperationException()));
    }

    [Theory]
    [InlineData(-double.Epsilon)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void A_scale_that_is_none_is_refused_before_the_function_is_called(double scale)
    {
        List<double> points = [];
        Recorder recorder = new(points);
        float single = scale < 0.0 ? -float.Epsilon : (float)scale;
        Assert.Throws<ArgumentOutOfRangeException>(nameof(scale), () => Roll.Expectation(scale, recorder));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(scale), () => Roll.Expectation(scale, (Func<double, double>)recorder.Evaluate));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(scale), () => RollSingle.Expectation(single, recorder));
        Assert.Empty(points);
    }

    [Fact]
    public void A_missing_function_is_refused()
    {
        Assert.Throws<ArgumentNullException>("integrand", () => Roll.Expectation(1.0, null!));
        Assert.Throws<ArgumentNullException>("integrand", () => Roll.Expectation(0.0, null!));
        Assert.Throws<ArgumentNullException>("integrand", () => Shallow.Expectation(null!));
        Assert.Throws<ArgumentNullException>("integrand", () => PendulumSingle.Expectation(null!));
    }

    [Fact]
    public void Powers_of_a_truncated_normal_variable()
    {
        // E Xᵏ = (k − 1) E Xᵏ⁻² + aᵏ⁻¹ φ(a)/(1 − Φ(a)) on [a, ∞), by parts.
        const double Lower = -2.0;
        double hazard = Density(Lower) / (1.0 - Cumulative(Lower));
        double before = 1.0;
        double current = hazard;
        for (int order = 1; order <= Shallow.DegreeOfExactness; order++)
        {
            AssertClose(current, Shallow.Expectation(x => Math.Pow(x, order)), 1e-12);
            (before, current) = (current, (order * before) + (Math.Pow(Lower, order) * hazard));
        }

        Assert.All(Shallow.Nodes.ToArray(), node => Assert.True(node > Lower));
    }

    [Fact]
    public void The_mean_of_a_far_tail_is_the_inverse_of_Mills_ratio()
    {
        // φ(x)/(1 − Φ(x)) = x + 1/(x + 2/(x + 3/(x + …))): Abramowitz and Stegun 1964, 26.2.14.
        double fraction = 8.0;
        for (int k = 60; k >= 1; k--)
        {
            fraction = 8.0 + (k / fraction);
        }

        AssertClose(fraction, FarTail.Expectation(x => x), 1e-15);
        AssertClose(1.0 + (8.0 * fraction), FarTail.Expectation(x => x * x), 1e-15);
        Assert.All(FarTail.Nodes.ToArray(), node => Assert.True(node > 8.0));
    }

    [Fact]
    public void The_square_of_a_variable_with_density_x_exp_of_minus_x_squared_is_exponential()
    {
        double factorial = 1.0;
        for (int k = 1; 2 * k <= Miss.DegreeOfExactness; k++)
        {
            factorial *= k;
            AssertClose(factorial, Miss.Expectation(x => Math.Pow(x * x, k)), 1e-13);
            Assert.Equal(0.0, Miss.Expectation(x => Math.Pow(x, (2 * k) - 1)));
        }
    }

    [Fact]
    public void Powers_of_a_log_normal_variable()
    {
        for (int order = 0; order <= Fading.DegreeOfExactness; order++)
        {
            AssertClose(Math.Exp(order * order / 32.0), Fading.Expectation(x => Math.Pow(x, order)), 1e-12);
        }

        for (int order = 0; order <= 6; order++)
        {
            AssertClose(Math.Exp(order * order / 32.0), FadingMoments.Raw[order], 1e-15);
        }

        AssertClose(Math.Exp(1.0 / 16.0) * (Math.Exp(1.0 / 16.0) - 1.0), FadingMoments.Central2, 1e-14);
    }

    [Fact]
    public void A_mixture_is_the_weighted_sum_of_its_components()
    {
        for (int order = 0; order <= Quay.DegreeOfExactness; order++)
        {
            double expected = (0.75 * NormalMoment(4.0, 0.125, order)) + (0.25 * NormalMoment(3.25, 0.5, order));
            AssertClose(expected, Quay.Expectation(x => Math.Pow(x, order)), 1e-13);
        }

        double exponential = (0.75 * Math.Exp(4.0 + (0.5 * 0.015625))) + (0.25 * Math.Exp(3.25 + 0.125));
        AssertClose(exponential, Quay.Expectation(Math.Exp), 1e-13);
    }

    [Fact]
    public void Even_exponentials_fulfil_their_moment_recurrence()
    {
        // By parts: E (2 c₁ Xᵏ⁺¹ + 4 c₂ Xᵏ⁺³) = k E Xᵏ⁻¹.
        for (int k = 1; k + 3 <= Pendulum.DegreeOfExactness; k += 2)
        {
            AssertClose(k * QuarticWell.Expectation(x => Math.Pow(x, k - 1)), QuarticWell.Expectation(x => 4.0 * Math.Pow(x, k + 3)), 1e-12);
            AssertClose(k * Pendulum.Expectation(x => Math.Pow(x, k - 1)), Pendulum.Expectation(x => (-4.0 * Math.Pow(x, k + 1)) + (4.0 * Math.Pow(x, k + 3))), 1e-12);
            Assert.Equal(0.0, Pendulum.Expectation(x => Math.Pow(x, k)));
        }

        AssertClose(0.25, QuarticWell.Expectation(x => x * x * x * x), 1e-15);
    }

    [Fact]
    public void The_integral_of_an_even_exponential()
    {
        // ∫ exp(−x⁴) dx = Γ(¼)/2 with Γ(¼) = 3.6256099082219083 (NIST DLMF 5.4(i); recalled, and recomputed by the sum below).
        AssertClose(3.6256099082219083 / 2.0, QuarticWell.NormalizingIntegral, 1e-15);
        AssertClose(Trapezoid(x => Math.Exp(-x * x * x * x)), QuarticWell.NormalizingIntegral, 1e-14);
        AssertClose(Trapezoid(x => Math.Exp((2.0 * x * x) - (x * x * x * x))), Pendulum.NormalizingIntegral, 1e-14);
        Assert.Equal((float)Pendulum.NormalizingIntegral, PendulumSingle.NormalizingIntegral);
    }

    [Fact]
    public void The_two_forms_of_an_expectation_are_the_same_to_the_last_bit()
    {
        Echo echo = new(2.0, 0.3);
        Func<double, double> function = echo.Evaluate;
        Func<float, float> single = echo.Evaluate;
        Assert.Equal(Roll.Expectation(0.7, function), Roll.Expectation(0.7, echo));
        Assert.Equal(RollSingle.Expectation(0.7f, single), RollSingle.Expectation(0.7f, echo));
        Assert.Equal(Shallow.Expectation(function), Shallow.Expectation(echo));
        Assert.Equal(Miss.Expectation(function), Miss.Expectation(echo));
        Assert.Equal(Fading.Expectation(function), Fading.Expectation(echo));
        Assert.Equal(Quay.Expectation(function), Quay.Expectation(echo));
        Assert.Equal(PendulumSingle.Expectation(single), PendulumSingle.Expectation(echo));
    }

    /// <summary>E Xᵏ = m E Xᵏ⁻¹ + (k − 1) s² E Xᵏ⁻² (Stein 1981).</summary>
    private static double NormalMoment(double mean, double deviation, int order)
    {
        double before = 0.0;
        double current = 1.0;
        for (int k = 1; k <= order; k++)
        {
            (before, current) = (current, (mean * current) + ((k - 1) * deviation * deviation * before));
        }

        return current;
    }

    private static double Density(double x) => Math.Exp(-0.5 * x * x) / Math.Sqrt(2.0 * Math.PI);

    /// <summary>Φ(x) = ½ + φ(x) (x + x³/3 + x⁵/(3·5) + …): Abramowitz and Stegun 1964, 26.2.11.</summary>
    private static double Cumulative(double x)
    {
        double term = x;
        double sum = 0.0;
        for (int k = 1; k < 200; k += 2)
        {
            sum += term;
            term *= x * x / (k + 2);
        }

        return 0.5 + (Density(x) * sum);
    }

    /// <summary>
    /// The trapezoidal sum from −8 to 8, exact to rounding for such functions without a corner (Trefethen and Weideman 2014).
    /// </summary>
    private static double Trapezoid(Func<double, double> function, double steps = 64.0) =>
        Enumerable.Range((int)(-8.0 * steps), (int)(16.0 * steps) + 1).Sum(k => function(k / steps)) / steps;

    private static void AssertClose(double expected, double actual, double tolerance) =>
        Assert.InRange(actual, expected - (tolerance * Math.Abs(expected)), expected + (tolerance * Math.Abs(expected)));
}
