using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>Anti-Gaussian companions by what Laurie (1996) says of them; against other software in <see cref="ReferenceCompanionTests"/>.</summary>
public class AntiGaussianTests
{
    public static TheoryData<string> Several =>
        ["half-range", "mixture", "symmetric-mixture", "double-well", "truncated -1 2", "truncated 8 inf", "truncated -2 2", "generalized-hermite 0.25", "log-normal 0.1 0.4"];

    [Theory]
    [MemberData(nameof(Several))]
    public void The_mean_of_both_rules_is_exact_two_degrees_further(string family)
    {
        foreach (int points in new[] { 1, 2, 5, 11 })
        {
            RuleTable table = Estimating(family, points).Construct(default);
            RuleTable exact = Families.Request(family, points + 1, BinaryFormat.Binary64).Construct(default);
            for (int k = 0; k <= (2 * points) + 1; k++)
            {
                // A Gauss rule with one more point has the degree of exactness 2n + 1.
                Ball integral = Sum(exact.Nodes, exact.Weights, k);
                Ball error = Ball.Subtract(Sum(table.Nodes, table.Weights, k), integral, 300);
                Ball opposite = Ball.Subtract(Sum(table.Companion!.Nodes, table.Companion.Weights, k), integral, 300);

                Assert.True(Ball.Add(error, opposite, 300).ContainsZero, $"{points} points, order {k}");
                Assert.True(k >= 2 * points || (error.ContainsZero && opposite.ContainsZero), $"{points} points, order {k}");
                // The even order of the error is a squared norm: the first rule gives too little.
                Assert.True(k != 2 * points || (error.IsNegative == Trilean.True && opposite.IsPositive == Trilean.True), $"{points} points");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Several))]
    public void The_nodes_of_the_rule_lie_between_those_of_its_companion(string family)
    {
        foreach (int points in new[] { 1, 4, 17 })
        {
            RuleTable table = Estimating(family, points).Construct(default);
            Ball[] inner = [.. table.Nodes.Select(node => node.Enclose(128, default))];
            Ball[] outer = [.. table.Companion!.Nodes.Select(node => node.Enclose(128, default))];

            Assert.Equal(points + 1, outer.Length);
            for (int i = 0; i < points; i++)
            {
                Assert.Equal(Trilean.True, Ball.IsLess(outer[i], inner[i]));
                Assert.Equal(Trilean.True, Ball.IsLess(inner[i], outer[i + 1]));
            }

            Assert.All(table.Companion.Weights, weight => Assert.Equal(Trilean.True, weight.Enclose(128, default).IsPositive));
        }
    }

    [Fact]
    public void A_companion_tells_what_it_is_and_leaves_the_rule_as_it_was()
    {
        RoundedRule plain = TableMemo.Get(Families.Request("half-range", 6, BinaryFormat.Binary64), default);
        RoundedRule rule = TableMemo.Get(Estimating("half-range", 6), default);
        CompanionRule companion = rule.Table.Companion!;

        Assert.Equal(plain.Nodes, rule.Nodes);
        Assert.Equal(plain.Weights, rule.Weights);
        Assert.Equal(plain.Table.Description, rule.Table.Description);
        Assert.Null(plain.Companion);
        Assert.Equal(("anti-Gaussian rule", new Rational(1, 2), false), (companion.Title, companion.Factor, companion.IsSymmetric));
        Assert.StartsWith(
            "7 disjoint root intervals; residuals of the moments of order 0 to 11, and of the mean of both rules to 13, at most 2^-", companion.Method, StringComparison.Ordinal);
        Assert.EndsWith(" of their size", companion.Method, StringComparison.Ordinal);
        Assert.Contains("Laurie", companion.Sources, StringComparison.Ordinal);
        Assert.Equal((7, 0.5), (rule.Companion!.Nodes.Count, Value(rule.Companion.Factor)));
        Assert.True(Estimating("quartic", 3).Construct(default).Companion!.IsSymmetric);
        Assert.False(Estimating("symmetric-mixture", 3).Construct(default).Companion!.IsSymmetric);
    }

    [Fact]
    public void Two_rules_whose_errors_are_not_opposite_are_found_out()
    {
        var weight = new HalfRangeWeight();
        Ball[] moments = weight.Moments(12, 128, default);
        MomentResiduals Of(GaussRule rule) => MomentResiduals.Of(rule.At(128, default), moments, 10, isEven: false, 128, default);
        MomentResiduals residuals = Of(GaussRule.Of(weight, 5));

        Assert.True(residuals.MeanWith(Of(AntiGaussian.Of(weight, 5)), 128).Bits >= 60);
        Assert.Throws<InvalidOperationException>(() => residuals.MeanWith(Of(GaussRule.Of(weight, 6)), 128));
        Assert.Throws<InvalidOperationException>(() => residuals.MeanWith(residuals, 128));
    }

    [Fact]
    public void What_symmetry_makes_rational_is_exact()
    {
        CompanionRule two = Estimating("quartic", 1).Construct(default).Companion!;
        CompanionRule three = Estimating("symmetric-mixture", 2).Construct(default).Companion!;

        Assert.All(two.Weights, weight => Assert.Equal(new Rational(1, 2), weight.ExactValue));
        Assert.Equal(Rational.One, three.Nodes[1].ExactValue);
        Assert.NotNull(three.Weights[1].ExactValue);
    }

    [Fact]
    public void A_companion_node_that_is_a_tie_in_binary32_is_recognised()
    {
        // One point of a mixture about 0 with the variance v: companion nodes ±√(2v), here ±(2²⁴ + 9) = ±5u, half-way between two numbers.
        const double unit = 3355445;
        // 2v = 2(m² + s²) = 25u² with m = u/2 and s = 7u/2.
        RuleRequest request = Families.Mixture(1, BinaryFormat.Binary32, [1, 1], [-unit / 2, unit / 2], [3.5 * unit, 3.5 * unit]);
        RoundedRule rule = TableMemo.Get(request with { ErrorEstimate = true }, default);

        Assert.Equal(BitConverter.SingleToUInt32Bits(16777224f), rule.Companion!.Nodes[1].Bits);
        Assert.Equal(int.MinValue, rule.Companion.Nodes[1].EnclosureWidthLog2);
    }

    [Fact]
    public void A_companion_node_outside_the_interval_is_refused_and_says_what_to_change()
    {
        // The companion of one point has the nodes ±√(2 b₁) = ±√(4/3), beyond ±1.
        var words = new FamilyWords("Gauss rule", "a weight with strong ends", "none");
        var exception = Assert.Throws<RuleConstructionException>(
            () => UniversalRule.Construct(new StrongEnds(), 1, words, hasErrorEstimate: true, default));

        Assert.Equal(RuleFailure.CompanionOutsideInterval, exception.Failure);
        Assert.Contains("ask for another number of points, or for no error estimate", exception.Message, StringComparison.Ordinal);
        Assert.Null(UniversalRule.Construct(new StrongEnds(), 1, words, hasErrorEstimate: false, default).Companion);
    }

    [Fact]
    public void Companions_of_the_families_on_an_interval_stay_inside()
    {
        foreach (string family in new[] { "half-range", "truncated -1 2", "truncated 8 inf", "truncated -inf 2", "truncated 8 8+2^-10", "log-normal 0.1 0.4" })
        {
            foreach (int points in new[] { 1, 2, 3, 7, 24 })
            {
                Assert.Equal(points + 1, Estimating(family, points).Construct(default).Companion!.Nodes.Count);
            }
        }
    }

    [Theory]
    [InlineData(18, 1, true)]
    [InlineData(19, 1, false)]
    [InlineData(9, 2, true)]
    [InlineData(10, 2, false)]
    [InlineData(1, 15, true)]
    [InlineData(1, 16, false)]
    public void Log_normal_companions_out_of_range_are_refused_with_the_reason(int points, double deviation, bool isRepresentable)
    {
        RuleRequest request = new GaussLogNormalRequest(points, 0, deviation, BinaryFormat.Binary64, false) with { ErrorEstimate = true };
        // The rule itself is representable in all these cases.
        Assert.Equal(points, (request with { ErrorEstimate = false }).Construct(default).Nodes.Count);
        if (isRepresentable)
        {
            Assert.Equal(points + 1, request.Construct(default).Companion!.Nodes.Count);
            return;
        }

        var exception = Assert.Throws<RuleConstructionException>(() => request.Construct(default));
        Assert.Equal(RuleFailure.WeightNotRepresentable, exception.Failure);
        Assert.Contains("no error estimate", exception.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_companion_node_beyond_the_format_is_refused()
    {
        // Four points reach to 2.3 standard deviations, their companion to 3.4.
        RuleRequest request = Families.Mixture(4, BinaryFormat.Binary32, [1], [0], [1.35e38]);

        Assert.Equal(4, TableMemo.Get(request, default).Nodes.Count);
        var exception = Assert.Throws<RuleConstructionException>(() => TableMemo.Get(request with { ErrorEstimate = true }, default));
        Assert.Equal(RuleFailure.NodeNotRepresentable, exception.Failure);
        Assert.Contains("no error estimate", exception.Message, StringComparison.Ordinal);
    }

    [Theory]
    [MemberData(nameof(Several))]
    public void A_cancelled_construction_stops(string family) => Assert.Throws<OperationCanceledException>(
        () => Estimating(family, 30).Construct(new CancellationToken(canceled: true)));

    internal static RuleRequest Estimating(string family, int points) =>
        Families.Request(family, points, BinaryFormat.Binary64) with { ErrorEstimate = true };

    private static Ball Sum(IReadOnlyList<RealNumber> nodes, IReadOnlyList<RealNumber> weights, int power)
    {
        Ball sum = default;
        for (int i = 0; i < nodes.Count; i++)
        {
            Ball term = Ball.Multiply(Ball.Pow(nodes[i].Enclose(256, default), power, 300), weights[i].Enclose(256, default), 300);
            sum = Ball.Add(sum, term, 300);
        }

        return sum;
    }

    private static double Value(RoundedValue value) => BitConverter.UInt64BitsToDouble(value.Bits);

    /// <summary>
    /// The weight proportional to (1 − x²)^(−3/4) on (−1, 1): bₖ = k (k + 2λ − 1)/(4 (k + λ)(k + λ − 1)) with λ = −1/4 (NIST DLMF 18.9.1, 18.9.2), and
    /// m₂ₖ₊₂ = m₂ₖ (2k + 1)/(2k + 2 + 2λ).
    /// </summary>
    private sealed class StrongEnds : WeightFunction
    {
        private static readonly Rational Lambda = new(-1, 4);

        internal override bool IsEven => true;

        internal override RealNumber Lower => RealNumber.Exact(-1);

        internal override RealNumber Upper => RealNumber.Exact(1);

        internal override RationalRecurrence ExactRecurrence(int count)
        {
            var squares = new Rational[count];
            for (int k = 1; k < count; k++)
            {
                squares[k] = k * (k - 1 + (2 * Lambda)) / (4 * (k + Lambda) * (k - 1 + Lambda));
            }

            return new RationalRecurrence(new Rational[count], squares, isEven: true);
        }

        internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation) =>
            Mathematics.Rules.Universal.Recurrence.FromRationals(ExactRecurrence(count), accuracy + 8, cancellation);

        internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
        {
            var moments = new Ball[count];
            Rational moment = Rational.One;
            for (int k = 0; k < count; k += 2)
            {
                moments[k] = Ball.FromRational(moment, precision);
                moment *= (k + 1) / (k + 2 + (2 * Lambda));
            }

            return moments;
        }
    }
}
