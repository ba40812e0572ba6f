using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Expectations with an estimate of their error, against true errors in closed form.</summary>
public sealed class ErrorEstimateTests
{
    [Fact]
    public void Where_the_companion_is_exact_the_estimate_is_the_error()
    {
        // With n points the first polynomial that is not integrated exactly is x²ⁿ, and the error is n! (Laurie 1996: the
        // companion errs by as much to the other side). E Z⁸ = 105; with a scale s both grow by s⁸.
        double value = FourWithError.ExpectationWithError(0.0, 0.5, x => Math.Pow(x, 8), out double error);
        Assert.Equal((105.0 - 24.0) / 256.0, value, 1e-14);
        Assert.Equal(24.0 / 256.0, error, 1e-14);

        float single = FivePhysicistWithError.ExpectationWithError(0.0f, 0.5f, x => MathF.Pow(x, 10), out float singleError);
        Assert.Equal((945.0 - 120.0) / 1024.0, single, 1e-5);
        Assert.Equal(120.0 / 1024.0, singleError, 1e-5);
    }

    [Fact]
    public void Of_a_smooth_function_the_estimate_is_near_to_the_true_error()
    {
        // E exp(aX) = exp(aμ + a²σ²/2); E of the half-normal |Z|⁸ = 105 as of the normal one.
        double truth = Math.Exp(0.75 + 0.5);
        double value = FourWithError.ExpectationWithError(0.75, 1.0, Math.Exp, out double error);
        Assert.InRange(error / Math.Abs(value - truth), 0.8, 1.25);
        Assert.InRange(error, 1e-5, 1e-1);

        value = RollWithError.ExpectationWithError(1.0, x => Math.Pow(x, 8), out error);
        Assert.Equal(105.0 - value, error, 1e-11);

        value = PendulumWithError.ExpectationWithError(x => Math.Exp(0.5 * x), out error);
        truth = Pendulum.Expectation(x => Math.Exp(0.5 * x));
        Assert.InRange(error / Math.Abs(value - truth), 0.8, 1.25);
    }

    [Fact]
    public void What_is_integrated_exactly_has_no_error_but_rounding()
    {
        _ = FourWithError.ExpectationWithError(1.0, 0.5, x => x * x * x, out double error);
        Assert.InRange(error, 0.0, 1e-14);
        _ = RollWithError.ExpectationWithError(0.5, x => Math.Pow(x, 7), out error);
        Assert.InRange(error, 0.0, 1e-14);
        _ = Nine.ExpectationWithError(1.0, 0.5, x => Math.Pow(x, 5), out error);
        Assert.InRange(error, 0.0, 1e-13);
    }

    [Fact]
    public void The_value_is_that_of_the_expectation_and_the_estimate_is_never_negative_in_both_forms() => Gen
        .Select(Gen.Double[-3, 3], Gen.Double[0, 2], Gen.Double[-1, 1].Array[12])
        .Sample((mean, deviation, coefficients) =>
        {
            Polynomial polynomial = new(coefficients);
            Func<double, double> function = polynomial.Evaluate;
            Func<float, float> single = polynomial.Evaluate;
            return FourWithError.ExpectationWithError(mean, deviation, polynomial, out double first) == FourWithError.Expectation(mean, deviation, polynomial)
                && FourWithError.ExpectationWithError(mean, deviation, function, out double second) == FourWithError.Expectation(mean, deviation, function)
                && RollWithError.ExpectationWithError(deviation, polynomial, out double third) == RollWithError.Expectation(deviation, polynomial)
                && RollWithError.ExpectationWithError(deviation, function, out double fourth) == RollWithError.Expectation(deviation, function)
                && PendulumWithError.ExpectationWithError(polynomial, out double fifth) == PendulumWithError.Expectation(polynomial)
                && PendulumWithError.ExpectationWithError(function, out double sixth) == PendulumWithError.Expectation(function)
                && FivePhysicistWithError.ExpectationWithError((float)mean, (float)deviation, single, out float seventh)
                    == FivePhysicistWithError.Expectation((float)mean, (float)deviation, polynomial)
                && first >= 0.0 && first == second && third >= 0.0 && third == fourth && fifth >= 0.0 && fifth == sixth && seventh >= 0.0f;
        });

    [Fact]
    public void The_estimate_is_half_the_distance_to_the_companions_sum()
    {
        double value = PendulumWithError.ExpectationWithError(Math.Cos, out double error);
        double companion = 0.0;
        for (int i = 0; i < PendulumWithError.CompanionNodes.Length; i++)
        {
            companion += PendulumWithError.CompanionWeights[i] * Math.Cos(PendulumWithError.CompanionNodes[i]);
        }

        Assert.Equal(PendulumWithError.PointCount + 1, PendulumWithError.CompanionNodes.Length);
        Assert.Equal(0.5 * Math.Abs(companion - value), error, 1e-15);
    }

    [Fact]
    public void Nested_rules_contain_the_rule_below()
    {
        Assert.Equal((1, 9, 35), (Mean.PointCount, Nine.PointCount, ThirtyFive.PointCount));
        Assert.Equal((1, 15, 51), (Mean.DegreeOfExactness, Nine.DegreeOfExactness, ThirtyFive.DegreeOfExactness));
        Assert.Subset(Nine.Nodes.ToArray().ToHashSet(), Nine.CompanionNodes.ToArray().ToHashSet());
        Assert.Subset(ThirtyFive.Nodes.ToArray().ToHashSet(), Nine.Nodes.ToArray().ToHashSet());
        Assert.Equal(3, Nine.CompanionNodes.Length);

        // The rule with 3 points gives E Z⁶ = 9 instead of 15; the one with 35 points is exact to degree 51: E Z⁵⁰ = 49!!.
        Assert.Equal(15.0, Nine.ExpectationWithError(0.0, 1.0, x => Math.Pow(x, 6), out double error), 1e-13);
        Assert.Equal(6.0, error, 1e-12);
        double moment = SmallRules.StandardMoment(50);
        Assert.InRange(ThirtyFive.Expectation(0.0, 1.0, x => Math.Pow(x, 50)), moment * (1.0 - 1e-12), moment * (1.0 + 1e-12));

        // One point has the companion ±√2: E Z² = 1, the rule gives 0, the companion 2.
        Assert.Equal(0.0, Mean.ExpectationWithError(0.0, 1.0, x => x * x, out error));
        Assert.Equal(1.0, error, 1e-15);
    }

    [Fact]
    public void Without_noise_there_is_no_error()
    {
        Assert.Equal(Math.Exp(0.3), FourWithError.ExpectationWithError(0.3, 0.0, Math.Exp, out double error));
        Assert.Equal(0.0, error);
        Assert.Equal(1.0, RollWithError.ExpectationWithError(0.0, Math.Exp, out error));
        Assert.Equal(0.0, error);
        Assert.Equal(MathF.Exp(0.3f), FivePhysicistWithError.ExpectationWithError(0.3f, 0.0f, MathF.Exp, out float singleError));
        Assert.Equal(0.0f, singleError);
    }

    [Fact]
    public void What_is_no_number_or_no_function_is_refused_before_the_function_is_called()
    {
        List<double> points = [];
        Recorder recorder = new(points);
        Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => FourWithError.ExpectationWithError(0.0, -1.0, recorder, out _));
        Assert.Throws<ArgumentOutOfRangeException>("scale", () => RollWithError.ExpectationWithError(double.NaN, recorder, out _));
        Assert.Throws<ArgumentNullException>("integrand", () => FourWithError.ExpectationWithError(0.0, 1.0, null!, out _));
        Assert.Throws<ArgumentNullException>("integrand", () => RollWithError.ExpectationWithError(1.0, null!, out _));
        Assert.Throws<ArgumentNullException>("integrand", () => PendulumWithError.ExpectationWithError(null!, out _));
        Assert.Empty(points);
    }

    [Fact]
    public void The_function_is_called_once_for_each_node_of_both_rules()
    {
        List<double> points = [];
        _ = PendulumWithError.ExpectationWithError(new Recorder(points), out _);
        Assert.Equal([.. PendulumWithError.Nodes.ToArray().Concat(PendulumWithError.CompanionNodes.ToArray()).Order()], points.Order());
    }
}
