using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using Xunit;

namespace GaussGen.Tests;

/// <summary>What the sum is: its value, its order, its rounding, and what happens at its edges.</summary>
public sealed class RuleEvaluationTests
{
    public static TheoryData<int> Sizes { get; } = [1, 2, 3, 4, 5];

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Moments_up_to_the_degree_of_exactness_are_those_of_the_normal_distribution(int points)
    {
        (double[] nodes, double[] weights) = SmallRules.Get(points);
        for (int order = 0; order <= (2 * points) - 1; order++)
        {
            int power = order;
            double moment = RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, x => Math.Pow(x, power));
            double general = RuleEvaluation.General(nodes, weights, 0.0, 1.0, x => Math.Pow(x, power));
            double expected = SmallRules.StandardMoment(order);
            Assert.Equal(expected, moment, 1e-14 * Math.Max(1.0, expected));
            Assert.Equal(expected, general, 1e-14 * Math.Max(1.0, expected));
        }
    }

    [Theory]
    [MemberData(nameof(Sizes))]
    public void The_first_moment_beyond_the_degree_of_exactness_is_short_by_the_factorial_of_the_size(int points)
    {
        // E He_n² = n!, which the n-node rule takes for 0 (Abramowitz & Stegun 1964, 22.2.15): the check can tell n from n + 1.
        (double[] nodes, double[] weights) = SmallRules.Get(points);
        double moment = RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, x => Math.Pow(x, 2 * points));
        double factorial = Enumerable.Range(1, points).Aggregate(1.0, (product, factor) => product * factor);
        Assert.Equal(SmallRules.StandardMoment(2 * points) - factorial, moment, 1e-11);
    }

    [Fact]
    public void A_cubic_has_the_expectation_of_its_closed_form()
    {
        // E (a v³ + b v² + c v + d) = a(μ³ + 3μσ²) + b(μ² + σ²) + cμ + d.
        var distributions = Gen.Select(Gen.Double[-50, 50], Gen.Double[0, 20], Gen.Double[-2, 2].Array[4], Gen.Int[2, 5]);
        distributions.Sample((mean, deviation, c, points) =>
        {
            (double[] nodes, double[] weights) = SmallRules.Get(points);
            double variance = deviation * deviation;
            double expected = (c[0] * mean * ((mean * mean) + (3.0 * variance))) + (c[1] * ((mean * mean) + variance))
                + (c[2] * mean) + c[3];
            double actual = RuleEvaluation.Symmetric(nodes, weights, mean, deviation, new Polynomial(c));
            double size = 8.0 * Math.Pow(Math.Abs(mean) + deviation + 1.0, 3.0);
            return Math.Abs(actual - expected) <= 1e-14 * size;
        });
    }

    [Fact]
    public void All_four_forms_agree()
    {
        Gen.Select(Gen.Double[-3, 3], Gen.Double[0, 2], Gen.Double[0.1, 4], Gen.Int[1, 5]).Sample((mean, scale, factor, points) =>
        {
            (double[] nodes, double[] weights) = SmallRules.Get(points);
            Echo echo = new(2.0, 0.3);
            double value = RuleEvaluation.Symmetric(nodes, weights, mean, scale, factor, echo);
            double general = RuleEvaluation.General(nodes, weights, mean, scale, factor, echo);
            return value.Equals(RuleEvaluation.Symmetric(nodes, weights, mean, scale, factor, echo.Evaluate))
                && general.Equals(RuleEvaluation.General(nodes, weights, mean, scale, factor, echo.Evaluate))
                && Math.Abs(value - general) <= 1e-14 * factor
                && (scale == 0.0
                    || value.Equals(factor * RuleEvaluation.Symmetric(nodes, weights, mean, scale, echo)));
        });
    }

    [Fact]
    public void Single_precision_agrees_with_double_precision_to_its_own_accuracy()
    {
        Gen.Select(Gen.Single[-3, 3], Gen.Single[0, 2], Gen.Int[1, 5]).Sample((mean, scale, points) =>
        {
            (double[] nodes, double[] weights) = SmallRules.Get(points);
            (float[] singleNodes, float[] singleWeights) = SmallRules.GetSingle(points);
            Echo echo = new(2.0, 0.25);
            Func<float, float> function = echo.Evaluate;
            double expected = RuleEvaluation.Symmetric(nodes, weights, mean, scale, echo);
            float symmetric = RuleEvaluation.Symmetric(singleNodes, singleWeights, mean, scale, echo);
            float general = RuleEvaluation.General(singleNodes, singleWeights, mean, scale, echo);
            return Math.Abs(symmetric - expected) <= 3e-6
                && Math.Abs(general - expected) <= 3e-6
                && symmetric.Equals(RuleEvaluation.Symmetric(singleNodes, singleWeights, mean, scale, function))
                && general.Equals(RuleEvaluation.General(singleNodes, singleWeights, mean, scale, function));
        });
    }

    [Fact]
    public void An_asymmetric_table_is_summed_as_it_stands()
    {
        double[] nodes = [0.5, 1.5, 4.0, 7.0];
        double[] weights = [0.125, 0.5, 0.25, 2.0];
        Polynomial square = new(1.0, 0.0, 0.0);
        double value = RuleEvaluation.General(nodes, weights, 1.0, 2.0, square);
        Assert.Equal((0.125 * 4.0) + (0.5 * 16.0) + (0.25 * 81.0) + (2.0 * 225.0), value);
        float single = RuleEvaluation.General([0.5f, 1.5f, 4.0f], [0.125f, 0.5f, 0.25f], 1.0f, 2.0f, square);
        Assert.Equal((0.125f * 4.0f) + (0.5f * 16.0f) + (0.25f * 81.0f), single);
    }

    [Fact]
    public void An_empty_table_sums_to_zero()
    {
        Assert.Equal(0.0, RuleEvaluation.Symmetric([], [], 1.0, 1.0, new Identity()));
        Assert.Equal(0.0, RuleEvaluation.General([], [], 1.0, 1.0, new Identity()));
        Assert.Equal(0.0f, RuleEvaluation.Symmetric([], [], 1.0f, 1.0f, new Identity()));
        Assert.Equal(0.0f, RuleEvaluation.General([], [], 1.0f, 1.0f, new Identity()));
    }

    [Fact]
    public void The_integrand_is_evaluated_once_a_node_from_the_ends_inwards()
    {
        double[] nodes = [-4.0, -2.0, 0.0, 2.0, 4.0];
        double[] weights = [0.0625, 0.25, 0.375, 0.25, 0.0625];
        List<double> symmetric = [];
        List<double> general = [];
        _ = RuleEvaluation.Symmetric(nodes, weights, 10.0, 0.5, new Recorder(symmetric));
        _ = RuleEvaluation.General(nodes, weights, 10.0, 0.5, new Recorder(general));
        Assert.Equal([8.0, 12.0, 9.0, 11.0, 10.0], symmetric);
        Assert.Equal([8.0, 9.0, 12.0, 11.0, 10.0], general);
    }

    [Fact]
    public void Small_weights_are_not_lost_against_a_large_partial_sum()
    {
        // Eight weights of 2^−54 are 2^−51 together, but each is less than half a unit in the last place of 1.
        double tiny = Math.ScaleB(1.0, -54);
        double[] nodes = [-4.0, -3.0, -2.0, -1.0, 0.0, 1.0, 2.0, 3.0, 4.0];
        double[] weights = [tiny, tiny, tiny, tiny, 1.0, tiny, tiny, tiny, tiny];
        Assert.Equal(1.0 + Math.ScaleB(1.0, -51), RuleEvaluation.Symmetric(nodes, weights, 0.0, 1.0, new Constant(1.0)));
        Assert.Equal(1.0 + Math.ScaleB(1.0, -51), RuleEvaluation.General(nodes, weights, 0.0, 1.0, new Constant(1.0)));

        float small = MathF.ScaleB(1.0f, -25);
        float[] singleNodes = Array.ConvertAll(nodes, x => (float)x);
        float[] singleWeights = [small, small, small, small, 1.0f, small, small, small, small];
        float expected = 1.0f + MathF.ScaleB(1.0f, -22);
        Assert.Equal(expected, RuleEvaluation.Symmetric(singleNodes, singleWeights, 0.0f, 1.0f, new Constant(1.0)));
        Assert.Equal(expected, RuleEvaluation.General(singleNodes, singleWeights, 0.0f, 1.0f, new Constant(1.0)));
    }

    [Fact]
    public void Products_and_sums_are_rounded_separately()
    {
        // (1 + 2^−30)² rounds to 1 + 2^−29; a fused multiply-add would keep the 2^−60 that the product loses.
        double scale = 1.0 + Math.ScaleB(1.0, -30);
        double mean = -(1.0 + Math.ScaleB(1.0, -29));
        double[] nodes = [-scale, scale];
        double[] weights = [1.0, 1.0];
        List<double> points = [];
        _ = RuleEvaluation.Symmetric(nodes, weights, mean, scale, new Recorder(points));
        _ = RuleEvaluation.General(nodes, weights, mean, scale, new Recorder(points));
        Assert.Equal([2.0 * mean, 0.0, 2.0 * mean, 0.0], points);
    }
}
