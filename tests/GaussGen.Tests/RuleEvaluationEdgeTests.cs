using System;
using System.Collections.Generic;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Scale zero, values that are not finite, and arguments that are refused.</summary>
public sealed class RuleEvaluationEdgeTests
{
    public static TheoryData<int, double> ZeroScales { get; } = new()
    {
        { 1, 0.0 }, { 2, 0.0 }, { 3, 0.0 }, { 4, 0.0 }, { 5, 0.0 }, { 4, -0.0 }, { 5, -0.0 },
    };

    [Theory]
    [MemberData(nameof(ZeroScales))]
    public void At_scale_zero_the_result_is_the_value_at_the_mean_evaluated_once(int points, double zero)
    {
        (double[] nodes, double[] weights) = SmallRules.Get(points);
        (float[] singleNodes, float[] singleWeights) = SmallRules.GetSingle(points);
        foreach (double mean in new[] { 0.1, -1.0 / 3.0, 1e-310, 1e300, double.PositiveInfinity, -0.0 })
        {
            List<double> evaluations = [];
            Recorder recorder = new(evaluations);
            Func<double, double> function = recorder.Evaluate;
            AssertBits(mean, RuleEvaluation.Symmetric(nodes, weights, mean, zero, recorder));
            AssertBits(mean, RuleEvaluation.Symmetric(nodes, weights, mean, zero, 0.5, recorder));
            AssertBits(mean, RuleEvaluation.Symmetric(nodes, weights, mean, zero, function));
            AssertBits(mean, RuleEvaluation.Symmetric(nodes, weights, mean, zero, 0.5, function));
            AssertBits(mean, RuleEvaluation.General(nodes, weights, mean, zero, recorder));
            AssertBits(mean, RuleEvaluation.General(nodes, weights, mean, zero, 0.5, recorder));
            AssertBits(mean, RuleEvaluation.General(nodes, weights, mean, zero, function));
            AssertBits(mean, RuleEvaluation.General(nodes, weights, mean, zero, 0.5, function));

            float single = (float)mean;
            Func<float, float> singleFunction = recorder.Evaluate;
            AssertBits(single, RuleEvaluation.Symmetric(singleNodes, singleWeights, single, (float)zero, 0.5f, recorder));
            AssertBits(single, RuleEvaluation.Symmetric(singleNodes, singleWeights, single, (float)zero, singleFunction));
            AssertBits(single, RuleEvaluation.General(singleNodes, singleWeights, single, (float)zero, 0.5f, recorder));
            AssertBits(single, RuleEvaluation.General(singleNodes, singleWeights, single, (float)zero, singleFunction));
            Assert.Equal(12, evaluations.Count);
        }
    }

    [Fact]
    public void The_smallest_scale_is_not_zero()
    {
        // Both points round to the mean, but the sum has the rule's weights in it and the factor is applied.
        (double[] nodes, double[] weights) = SmallRules.Get(2);
        Assert.Equal(0.75, RuleEvaluation.Symmetric(nodes, weights, 1.5, double.Epsilon, 0.5, new Identity()));
        Assert.Equal(0.75, RuleEvaluation.General(nodes, weights, 1.5, double.Epsilon, 0.5, new Identity()));
    }

    [Fact]
    public void A_mean_that_is_not_finite_reaches_the_integrand()
    {
        (double[] nodes, double[] weights) = SmallRules.Get(5);
        (float[] singleNodes, float[] singleWeights) = SmallRules.GetSingle(5);
        Assert.True(double.IsNaN(RuleEvaluation.Symmetric(nodes, weights, double.NaN, 1.0, new Identity())));
        Assert.True(double.IsNaN(RuleEvaluation.General(nodes, weights, double.NaN, 1.0, new Identity())));
        const double infinity = double.PositiveInfinity;
        Assert.Equal(infinity, RuleEvaluation.Symmetric(nodes, weights, infinity, 1.0, new Identity()));
        Assert.Equal(-infinity, RuleEvaluation.General(nodes, weights, -infinity, 1.0, new Identity()));
        Assert.True(float.IsNaN(RuleEvaluation.Symmetric(singleNodes, singleWeights, float.NaN, 1.0f, new Identity())));

        // A function that is bounded at infinity has an expectation there.
        Assert.Equal(0.0, RuleEvaluation.Symmetric(nodes, weights, infinity, 1.0, new Echo(1.0, 1.0)));
    }

    [Fact]
    public void An_infinite_value_where_the_weight_is_zero_makes_the_result_NaN()
    {
        double[] nodes = [-1.0, 0.0, 1.0];
        double[] weights = [0.0, 1.0, 0.0];
        static double Pole(double x) => x == 0.0 ? 1.0 : double.PositiveInfinity;
        Assert.True(double.IsNaN(RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, Pole)));
    }

    [Fact]
    public void Spans_of_different_lengths_are_refused_before_anything_is_evaluated()
    {
        double[] two = [-1.0, 1.0];
        double[] three = [0.25, 0.5, 0.25];
        float[] singleTwo = [-1.0f, 1.0f];
        float[] singleThree = [0.25f, 0.5f, 0.25f];
        List<double> points = [];
        Recorder recorder = new(points);
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.Symmetric(two, three, 0.0, 1.0, recorder));
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.Symmetric(three, two, 0.0, 0.0, recorder));
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.General(two, three, 0.0, 1.0, recorder));
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.General(three, two, 0.0, 0.0, recorder));
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.Symmetric(singleTwo, singleThree, 0.0f, 1.0f, recorder));
        Assert.Throws<ArgumentException>("weights", () => RuleEvaluation.General(singleThree, singleTwo, 0.0f, 1.0f, recorder));
        Assert.Empty(points);
    }

    [Fact]
    public void A_missing_function_is_refused_even_where_nothing_would_be_summed()
    {
        (double[] nodes, double[] weights) = SmallRules.Get(3);
        (float[] singleNodes, float[] singleWeights) = SmallRules.GetSingle(3);
        Func<double, double> function = null!;
        Func<float, float> singleFunction = null!;
        Assert.Throws<ArgumentNullException>("integrand", () => RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, function));
        Assert.Throws<ArgumentNullException>(
            "integrand", () => RuleEvaluation.Symmetric(nodes, weights, 0.0, 0.0, 2.0, function));
        Assert.Throws<ArgumentNullException>("integrand", () => RuleEvaluation.General(nodes, weights, 0.0, 1.0, function));
        Assert.Throws<ArgumentNullException>("integrand", () => RuleEvaluation.General([], [], 0.0, 1.0, 2.0, function));
        Assert.Throws<ArgumentNullException>(
            "integrand", () => RuleEvaluation.Symmetric(singleNodes, singleWeights, 0.0f, 1.0f, singleFunction));
        Assert.Throws<ArgumentNullException>(
            "integrand", () => RuleEvaluation.General(singleNodes, singleWeights, 0.0f, 1.0f, singleFunction));
    }

    [Fact]
    public void What_the_integrand_throws_reaches_the_caller()
    {
        (double[] nodes, double[] weights) = SmallRules.Get(4);
        InvalidTimeZoneException thrown = new();
        InvalidTimeZoneException caught = Assert.Throws<InvalidTimeZoneException>(
            () => RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, new Func<double, double>(_ => throw thrown)));
        Assert.Same(thrown, caught);
    }

    private static void AssertBits(double expected, double actual) =>
        Assert.Equal(BitConverter.DoubleToInt64Bits(expected), BitConverter.DoubleToInt64Bits(actual));

    private static void AssertBits(float expected, float actual) =>
        Assert.Equal(BitConverter.SingleToInt32Bits(expected), BitConverter.SingleToInt32Bits(actual));
}
