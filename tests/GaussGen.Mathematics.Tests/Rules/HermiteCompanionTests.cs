using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>Error estimates of Gauss–Hermite rules; their values are compared with other software in ReferenceCompanionTests.</summary>
public class HermiteCompanionTests
{
    [Fact]
    public void The_companions_of_one_and_two_points_are_known()
    {
        // Recurrences 0, 2·1 and 0, 1, 2·2: x² − 2 and x³ − 5x. E x² = 1 gives the weights 1/10, 4/5, 1/10.
        CompanionRule one = Construct(1, HermiteConvention.Probabilist), two = Construct(2, HermiteConvention.Probabilist);

        Assert.Equal([-Math.Sqrt(2), Math.Sqrt(2)], one.Nodes.Select(Nearest));
        Assert.All(one.Weights, weight => Assert.Equal(new Rational(1, 2), weight.ExactValue));
        Assert.Equal([-Math.Sqrt(5), 0, Math.Sqrt(5)], two.Nodes.Select(Nearest));
        Assert.Equal([0.1, 0.8, 0.1], two.Weights.Select(Nearest));
        Assert.Equal(Rational.Zero, two.Nodes[1].ExactValue);
        Assert.Equal(new Rational(4, 5), two.Weights[1].ExactValue);
    }

    [Fact]
    public void The_physicists_weights_sum_to_the_root_of_pi()
    {
        foreach (int points in new[] { 1, 2, 7, 40 })
        {
            CompanionRule companion = Construct(points, HermiteConvention.Physicist);

            Assert.Equal(Math.Sqrt(Math.PI), companion.Weights.Sum(Nearest), 1e-14);
            // ∫ x² exp(−x²) dx, which the companion of one point, with the rule at 0, has twice.
            double second = companion.Nodes.Zip(companion.Weights, (x, w) => Nearest(x) * Nearest(x) * Nearest(w)).Sum();
            Assert.Equal((points == 1 ? 2 : 1) * Math.Sqrt(Math.PI) / 2, second, 1e-14);
            Assert.True(companion.IsSymmetric);
            Assert.Equal(new Rational(1, 2), companion.Factor);
        }
    }

    [Theory]
    [InlineData(HermiteConvention.Probabilist)]
    [InlineData(HermiteConvention.Physicist)]
    public void The_largest_estimate_is_constructed_and_a_larger_one_refused_with_the_limit(HermiteConvention convention)
    {
        Assert.Equal(200, GaussHermiteRequest.LargestErrorEstimatePoints);
        GaussHermiteRequest request = new(200, convention, BinaryFormat.Binary64, false) { ErrorEstimate = true };
        RoundedRule rule = RuleRounding.Round(request.Construct(default), request.Format, false, default);

        Assert.Equal(201, rule.Companion!.Nodes.Count);
        Assert.All(rule.Companion.Weights, weight => Assert.True(BitConverter.UInt64BitsToDouble(weight.Bits) > 0));
        var exception = Assert.Throws<RuleConstructionException>(() => (request with { Points = 201 }).Construct(default));
        Assert.Equal(RuleFailure.NoCompanion, exception.Failure);
        Assert.Contains("at most 200 nodes", exception.Message, StringComparison.Ordinal);
        Assert.Throws<ArgumentOutOfRangeException>(() => (request with { Points = 1001 }).Construct(default));
        Assert.Equal(201, (request with { Points = 201, ErrorEstimate = false }).Construct(default).Nodes.Count);
    }

    [Fact]
    public void The_rule_itself_is_as_without_an_estimate()
    {
        GaussHermiteRequest request = new(12, HermiteConvention.Physicist, BinaryFormat.Binary32, false);
        RoundedRule plain = TableMemo.Get(request, default), rule = TableMemo.Get(request with { ErrorEstimate = true }, default);

        Assert.Equal(plain.Nodes, rule.Nodes);
        Assert.Equal(plain.Weights, rule.Weights);
        Assert.Equal(plain.Table.Description, rule.Table.Description);
        Assert.Null(plain.Companion);
        Assert.Equal(13, rule.Companion!.Nodes.Count);
    }

    [Fact]
    public void Companion_weights_that_round_to_zero_are_dropped_with_the_rules()
    {
        GaussHermiteRequest request = new(100, HermiteConvention.Probabilist, BinaryFormat.Binary32, true) { ErrorEstimate = true };
        RoundedRule rule = TableMemo.Get(request, default);

        Assert.InRange(rule.Companion!.Nodes.Count, rule.Nodes.Count - 2, 100);
        Assert.All(rule.Companion.Weights, weight => Assert.NotEqual(0UL, weight.Bits));
        Assert.True(TableMemo.Get(request with { DropZeroWeights = false }, default).Companion!.Nodes.Count == 101);
    }

    [Fact]
    public void A_cancelled_construction_stops()
    {
        GaussHermiteRequest request = new(100, HermiteConvention.Probabilist, BinaryFormat.Binary64, false) { ErrorEstimate = true };

        Assert.Throws<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));
    }

    private static CompanionRule Construct(int points, HermiteConvention convention) =>
        (new GaussHermiteRequest(points, convention, BinaryFormat.Binary64, false) { ErrorEstimate = true }).Construct(default).Companion!;

    private static double Nearest(RealNumber value) =>
        BitConverter.UInt64BitsToDouble(Rounding.Nearest(value, BinaryFormat.Binary64, default).Bits);
}
