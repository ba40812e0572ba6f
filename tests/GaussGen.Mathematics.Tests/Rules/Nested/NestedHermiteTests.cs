using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Nested;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Nested;

/// <summary>The nested rules against those of Data/nested-rules.py, which finds them in floating point at several hundred digits.</summary>
public class NestedHermiteTests
{
    // Genz and Keister 1996: points and degrees of the rules that start from the mean.
    private static readonly int[] Points = [1, 3, 9, 19, 35];
    private static readonly int[] Degrees = [1, 5, 15, 29, 51];

    private static readonly ILookup<int, (string Node, string Weight)> Reference = ReferenceData.Read("nested-rules.csv")
        .ToLookup(line => int.Parse(line[0], CultureInfo.InvariantCulture), line => (line[2], line[3]));

    public static TheoryData<int> Levels => [0, 1, 2, 3, 4];

    [Theory]
    [MemberData(nameof(Levels))]
    public void Every_entry_is_the_nearest_number_in_each_format(int level)
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary64, BinaryFormat.Binary32, BinaryFormat.Binary16 })
        {
            RoundedRule rule = TableMemo.Get(new NestedHermiteRequest(level, format, false), default);

            Assert.Equal(Reference[level].Select(e => format.Round(DecimalText.Parse(e.Node))), rule.Nodes.Select(v => v.Bits));
            Assert.Equal(Reference[level].Select(e => format.Round(DecimalText.Parse(e.Weight))), rule.Weights.Select(v => v.Bits));
        }
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void Every_enclosure_contains_the_true_number_and_is_as_narrow_as_asked_for(int level)
    {
        RuleTable table = Construct(level);
        (string Node, string Weight)[] reference = [.. Reference[level]];
        foreach (int precision in new[] { 32, 64, 128, 190, 1000 })
        {
            for (int i = 0; i < reference.Length; i++)
            {
                AssertContains(table.Nodes[i].Enclose(precision, default), reference[i].Node, precision);
                AssertContains(table.Weights[i].Enclose(precision, default), reference[i].Weight, precision);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void Moments_are_exact_up_to_the_degree_and_not_beyond(int level)
    {
        RuleTable table = Construct(level);
        Assert.Equal((Points[level], Degrees[level]), (table.Nodes.Count, table.DegreeOfExactness));

        // Σ w xᵏ − (k−1)!!, by a road of its own: the enclosures at 400 bits, term by term.
        Rational moment = Rational.One;
        for (int k = 0; k <= Degrees[level] + 1; k += 2)
        {
            Ball residual = Ball.FromRational(-moment, 400);
            for (int i = 0; i < table.Nodes.Count; i++)
            {
                Ball power = Ball.Pow(table.Nodes[i].Enclose(400, default), k, 400);
                residual = Ball.Add(residual, Ball.Multiply(power, table.Weights[i].Enclose(400, default), 400), 400);
            }

            Assert.Equal(k <= Degrees[level], residual.ContainsZero);
            Assert.True(k > Degrees[level] || residual.Radius.CeilingLog2 < -100);
            moment *= k + 1;
        }
    }

    [Fact]
    public void Every_level_keeps_the_nodes_of_the_one_before()
    {
        for (int level = 1; level < Points.Length; level++)
        {
            var nodes = new HashSet<RealNumber>(Construct(level).Nodes, ReferenceEqualityComparer.Instance);
            Assert.Subset(nodes, new HashSet<RealNumber>(Construct(level - 1).Nodes, ReferenceEqualityComparer.Instance));
            foreach (BinaryFormat format in new[] { BinaryFormat.Binary64, BinaryFormat.Binary32 })
            {
                RoundedRule below = TableMemo.Get(new NestedHermiteRequest(level - 1, format, false), default);
                RoundedRule rule = TableMemo.Get(new NestedHermiteRequest(level, format, false), default);
                Assert.Subset(rule.Nodes.Select(v => v.Bits).ToHashSet(), below.Nodes.Select(v => v.Bits).ToHashSet());
            }
        }
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void Nodes_ascend_and_mirror_each_other(int level)
    {
        RuleTable table = Construct(level);
        Ball[] nodes = [.. table.Nodes.Select(node => node.Enclose(128, default))];
        for (int i = 0; i < nodes.Length; i++)
        {
            Assert.True(i == 0 || Ball.IsLess(nodes[i - 1], nodes[i]) == Trilean.True);
            Assert.Equal(nodes[i].Center, -nodes[nodes.Length - 1 - i].Center);
            Assert.Same(table.Weights[i], table.Weights[nodes.Length - 1 - i]);
        }

        Assert.True(table.IsSymmetric);
        Assert.Equal(Rational.Zero, table.Nodes[nodes.Length / 2].ExactValue);
        Assert.NotNull(table.Weights[nodes.Length / 2].ExactValue);
    }

    [Fact]
    public void The_low_levels_are_the_mean_and_the_rule_of_three_points()
    {
        Assert.Equal(Rational.One, Assert.Single(Construct(0).Weights).ExactValue);
        Assert.Equal(
            new Rational?[] { new Rational(1, 6), new Rational(2, 3), new Rational(1, 6) }, Construct(1).Weights.Select(weight => weight.ExactValue));
        Assert.Equal(Math.Sqrt(3), Value(TableMemo.Get(new NestedHermiteRequest(1, BinaryFormat.Binary64, false), default).Nodes[2]));
    }

    [Fact]
    public void Some_weights_of_level_three_are_negative_and_no_others() => Assert.Equal(
        [0, 0, 0, 2, 0],
        Enumerable.Range(0, 5).Select(level => Construct(level).Weights.Count(w => w.Enclose(128, default).IsNegative == Trilean.True)));

    [Fact]
    public void A_weight_that_rounds_to_zero_is_plus_zero_or_dropped()
    {
        RoundedRule rule = TableMemo.Get(new NestedHermiteRequest(4, BinaryFormat.Binary16, false), default);
        RoundedRule dropped = TableMemo.Get(new NestedHermiteRequest(4, BinaryFormat.Binary16, true), default);

        // Those below 2^−25, five on each side.
        Assert.Equal(10, rule.ZeroWeights);
        Assert.All(rule.Weights.Take(5), weight => Assert.Equal(0UL, weight.Bits));
        Assert.Equal(35 - 10, dropped.Nodes.Count);
    }

    [Fact]
    public void A_table_tells_what_it_is()
    {
        RuleDescription description = Construct(3).Description;

        Assert.Equal("Nested Hermite rule of level 3", description.Title);
        Assert.Equal("the standard normal density", description.Weight);
        Assert.Equal("the nodes of level 2 and the 10 zeros of the polynomial that extends them", description.Nodes);
        Assert.StartsWith("19 disjoint root intervals; residuals of the moments of order 0 to 29 at most 2^-", description.Method, StringComparison.Ordinal);
        Assert.EndsWith(" of their size, and that of order 30 not zero", description.Method, StringComparison.Ordinal);
        Assert.Contains("Genz and Keister", description.Sources, StringComparison.Ordinal);
        LocationScale family = Construct(3).LocationScale!;
        Assert.Equal((Rational.One, Rational.One, true), (family.NodeScale.ExactValue, family.TotalWeight.ExactValue, family.HasLocation));
    }

    [Fact]
    public void The_error_is_estimated_by_the_level_below_or_by_the_anti_Gaussian_rule()
    {
        for (int level = 1; level < Points.Length; level++)
        {
            CompanionRule companion = Companion(level);
            Assert.Equal("nested rule of level " + (level - 1).ToString(CultureInfo.InvariantCulture), companion.Title);
            Assert.Equal(Rational.One, companion.Factor);
            Assert.Equal(Construct(level - 1).Nodes, companion.Nodes);
            Assert.Equal(Construct(level - 1).Weights, companion.Weights);
            Assert.Equal(Construct(level - 1).Description.Method, companion.Method);
            Assert.True(companion.IsSymmetric);
        }

        // x² − 2 with weights ½.
        CompanionRule first = Companion(0);
        Assert.Equal(("anti-Gaussian rule", new Rational(1, 2)), (first.Title, first.Factor));
        Assert.Equal(Math.Sqrt(2), Value(Rounding.Nearest(first.Nodes[1], BinaryFormat.Binary64, default)));
        Assert.All(first.Weights, weight => Assert.Equal(new Rational(1, 2), weight.ExactValue));
        Assert.Null(Construct(2).Companion);
    }

    [Theory]
    [InlineData(int.MinValue)]
    [InlineData(-1)]
    [InlineData(5)]
    [InlineData(int.MaxValue)]
    public void A_level_that_does_not_exist_is_refused_with_the_range(int level)
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => new NestedHermiteRequest(level, BinaryFormat.Binary64, false));

        Assert.Contains("The level of a nested rule must be from 0 to 4.", error.Message, StringComparison.Ordinal);
        Assert.False(NestedHermiteRequest.IsLevel(level));
    }

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new NestedHermiteRequest(2, BinaryFormat.Binary64, false);

        Assert.Equal(request, new NestedHermiteRequest(2, BinaryFormat.Binary64, false));
        Assert.NotEqual(request, new NestedHermiteRequest(3, BinaryFormat.Binary64, false));
        Assert.NotEqual<RuleRequest>(request, request with { ErrorEstimate = true });
        Assert.Equal("Nested Hermite rule of level 2 with 9 points, standard normal density", request.Claim);
        Assert.Equal(
            "Nested Hermite rule of level 2 with 9 points, standard normal density, without zero weights, with error estimate",
            (request with { DropZeroWeights = true, ErrorEstimate = true }).Claim);
        Assert.All(Enumerable.Range(0, 5), level => Assert.Equal(Points[level], new NestedHermiteRequest(level, BinaryFormat.Binary64, false).Points));
    }

    [Fact]
    public void A_cancelled_construction_stops()
    {
        var cancelled = new CancellationToken(canceled: true);
        Assert.Throws<OperationCanceledException>(() => new NestedHermiteRequest(4, BinaryFormat.Binary64, false).Construct(cancelled));
        Assert.Throws<OperationCanceledException>(() => NormalExtension.Of(new IntegerPolynomial(-3, 1), 3, cancelled));
        Assert.Throws<OperationCanceledException>(() => PositiveZero.AllOf(new IntegerPolynomial(-3, 1), cancelled));
        Assert.Throws<OperationCanceledException>(() => Construct(4).Weights[0].Enclose(5000, cancelled));
    }

    private static RuleTable Construct(int level) => new NestedHermiteRequest(level, BinaryFormat.Binary64, false).Construct(default);

    private static CompanionRule Companion(int level) =>
        (new NestedHermiteRequest(level, BinaryFormat.Binary64, false) with { ErrorEstimate = true }).Construct(default).Companion!;

    private static double Value(RoundedValue value) => BitConverter.UInt64BitsToDouble(value.Bits);

    private static void AssertContains(Ball ball, string value, int precision)
    {
        (Rational low, Rational high) = DecimalText.Interval(value);
        Assert.True(ball.Lower.ToRational() <= high && low <= ball.Upper.ToRational(), ball + " does not contain " + value);
        Assert.True(ball.RelativeAccuracyBits >= precision - 4, ball.RelativeAccuracyBits + " bits at " + precision);
    }
}
