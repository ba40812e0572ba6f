using System;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

public class UniversalRuleTests
{
    // Steen, Byrne and Gelbard, "Gaussian quadratures for the integrals ∫ exp(−x²) f(x) dx over [0, ∞) and [0, b]" (1969), table for
    // n = 2 and 3 (recalled, recomputed): nodes and weights for exp(−x²) on [0, ∞).
    [Theory]
    [InlineData(2, new[] { 0.300193931060839, 1.25242104533372 }, new[] { 0.640529179684379, 0.245697745768379 })]
    [InlineData(
        3,
        new[] { 0.190554149798192, 0.848251867544577, 1.79977657841573 },
        new[] { 0.446029770466658, 0.396468266998335, 0.0437288879877644 })]
    public void Half_range_rules_are_those_of_Steen_Byrne_and_Gelbard(int points, double[] nodes, double[] weights)
    {
        RoundedRule rule = Round(Families.Request("half-range", points, BinaryFormat.Binary64));

        for (int i = 0; i < points; i++)
        {
            // The density here is √(2/π) exp(−x²/2).
            Assert.Equal(nodes[i], Value(rule.Nodes[i]) / Math.Sqrt(2), 2e-15 * nodes[i] * 4);
            Assert.Equal(weights[i], Value(rule.Weights[i]) * Math.Sqrt(Math.PI) / 2, 2e-15);
        }
    }

    [Theory]
    [InlineData("half-range")]
    [InlineData("mixture")]
    [InlineData("double-well")]
    [InlineData("sextic")]
    [InlineData("symmetric-mixture")]
    public void Rules_of_every_size_are_ascending_positive_and_sum_to_one(string family)
    {
        foreach (int points in new[] { 1, 2, 3, 4, 9, 33, 64 })
        {
            RoundedRule rule = Round(Families.Request(family, points, BinaryFormat.Binary64));
            double[] nodes = [.. rule.Nodes.Select(Value)], weights = [.. rule.Weights.Select(Value)];

            Assert.Equal(points, nodes.Length);
            Assert.Equal((2 * points) - 1, rule.Table.DegreeOfExactness);
            Assert.All(Enumerable.Range(1, points - 1), i => Assert.True(nodes[i - 1] < nodes[i]));
            Assert.All(weights, weight => Assert.True(weight > 0));
            Assert.Equal(1, weights.Sum(), 1e-14);
            Assert.DoesNotContain(rule.Nodes, node => node.Bits == BinaryFormat.Binary64.SignBit);
        }
    }

    [Fact]
    public void Gauss_Hermite_comes_out_of_the_pipeline_as_from_its_fast_road()
    {
        foreach (int points in new[] { 1, 2, 5, 20, 64 })
        {
            RoundedRule expected = Round(new GaussHermiteRequest(points, HermiteConvention.Probabilist, BinaryFormat.Binary64, false));
            RoundedRule byRecurrence = Round(Families.EvenExponential(points, BinaryFormat.Binary64, 0.5));
            RoundedRule byMoments = Round(Families.Mixture(points, BinaryFormat.Binary64, [3], [0], [1]));

            foreach (RoundedRule rule in new[] { byRecurrence, byMoments })
            {
                Assert.Equal(expected.Nodes.Select(v => v.Bits), rule.Nodes.Select(v => v.Bits));
                Assert.Equal(expected.Weights.Select(v => v.Bits), rule.Weights.Select(v => v.Bits));
            }
        }
    }

    [Fact]
    public void Starting_points_by_sign_counts_serve_as_well_as_those_from_doubles()
    {
        WeightFunction weight = new HalfRangeWeight();
        Recurrence recurrence = weight.Recurrence(12, 128, default);
        Dyadic[] slow = StartingNodes.FromSignCounts(recurrence, 128, default)!;
        Dyadic[] fast = StartingNodes.FromDoubles(recurrence, isGraded: false, default)!;

        Assert.All(slow.Zip(fast), pair => Assert.Equal(Approximation.ToDouble(pair.Second), Approximation.ToDouble(pair.First), 1e-4));
    }

    [Fact]
    public void Residuals_of_all_moments_up_to_the_degree_of_exactness_are_enclosed()
    {
        foreach ((WeightFunction weight, int points) in new (WeightFunction, int)[]
        {
            (new HalfRangeWeight(), 12), (new HalfRangeWeight(), 64), (new EvenExponentialWeight([new Dyadic(-2, 0), new Dyadic(1, -1)]), 31),
        })
        {
            GaussEnclosures rule = GaussRule.Of(weight, points).At(128, default).ForMomentsOf(weight);
            var residuals = MomentResiduals.Of(rule, weight.Moments(2 * points, 128, default), 2 * points, weight.IsEven, 128, default);
            Assert.Equal(2 * points, residuals.Residuals.Length);
            Assert.All(residuals.Residuals, residual => Assert.True(residual.ContainsZero));
            Assert.True(residuals.Bits >= 50, residuals.Bits + " bits");
        }
    }

    [Fact]
    public void A_rule_with_a_wrong_weight_fails_the_residuals()
    {
        var weight = new HalfRangeWeight();
        GaussEnclosures enclosures = GaussRule.Of(weight, 5).At(128, default);
        var tampered = (Ball[])enclosures.Weights.Clone();
        tampered[2] = Ball.Add(tampered[2], Ball.FromDyadic(new Dyadic(1, -60)), 128);

        Assert.Throws<InvalidOperationException>(() => MomentResiduals.Of(
            enclosures with { Weights = tampered }, weight.Moments(10, 128, default), 10, isEven: false, 128, default));
    }

    [Fact]
    public void One_degree_more_is_not_integrated_exactly()
    {
        var weight = new HalfRangeWeight();
        GaussEnclosures enclosures = GaussRule.Of(weight, 5).At(128, default);

        Assert.Throws<InvalidOperationException>(() => MomentResiduals.Of(
            enclosures, weight.Moments(11, 128, default), 11, isEven: false, 128, default));
    }

    [Fact]
    public void The_half_range_rule_has_a_scale_and_no_location_and_the_well_its_integral()
    {
        RuleTable half = Families.Request("half-range", 4, BinaryFormat.Binary64).Construct(default);
        RoundedRule well = Round(Families.EvenExponential(4, BinaryFormat.Binary64, 0, 1));

        Assert.False(half.LocationScale!.HasLocation);
        Assert.Null(well.Table.LocationScale);
        Assert.Equal("NormalizingIntegral", Assert.Single(well.Table.Constants).Name);
        // 2Γ(5/4).
        Assert.Equal(1.8128049541109541, Value(Assert.Single(well.Constants)));
    }

    [Fact]
    public void Requests_that_mean_the_same_are_equal()
    {
        Assert.Equal(
            Families.Mixture(5, BinaryFormat.Binary64, [1, 2], [0, 1], [1, 1]),
            Families.Mixture(5, BinaryFormat.Binary64, [1, 2], [-0.0, 1], [1, 1]));
        Assert.NotEqual(
            Families.Mixture(5, BinaryFormat.Binary64, [1, 2], [0, 1], [1, 1]),
            Families.Mixture(5, BinaryFormat.Binary64, [1, 2], [0, 1], [1, 2]));
        Assert.Equal(
            Families.EvenExponential(5, BinaryFormat.Binary32, -1, 1).GetHashCode(),
            Families.EvenExponential(5, BinaryFormat.Binary32, -1, 1).GetHashCode());
    }

    [Fact]
    public void Parameters_out_of_range_are_refused()
    {
        BinaryFormat format = BinaryFormat.Binary64;
        foreach (int points in new[] { int.MinValue, -1, 0, 65, int.MaxValue })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussHalfRangeHermiteRequest(points, format, false));
            Assert.Throws<ArgumentOutOfRangeException>(() => Families.EvenExponential(points, format, 1));
            Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(points, format, [1], [0], [1]));
        }

        foreach (double[] coefficients in new double[][] { [], [0], [-1], [1, 0], [1, -0.0], [double.NaN, 1], [1, double.PositiveInfinity], new double[9] })
        {
            Assert.False(GaussEvenExponentialRequest.AreCoefficients(new ValueList(coefficients)));
            Assert.Throws<ArgumentOutOfRangeException>(() => Families.EvenExponential(5, format, coefficients));
        }

        foreach (double[] weights in new double[][] { [0, 0], [-1, 2], [double.NaN, 1], [double.PositiveInfinity, 1] })
        {
            Assert.False(GaussNormalMixtureRequest.AreWeights(new ValueList(weights)));
            Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(5, format, weights, [0, 1], [1, 1]));
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(5, format, [], [], []));
        Assert.Throws<ArgumentException>(() => Families.Mixture(5, format, [1, 1], [0], [1, 1]));
        Assert.Throws<ArgumentException>(() => Families.Mixture(5, format, [1, 1], [0, 1], [1]));
        Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(5, format, [1, 1], [0, double.NaN], [1, 1]));
        Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(5, format, [1, 1], [0, 1], [1, 0]));
        Assert.Throws<ArgumentOutOfRangeException>(() => Families.Mixture(5, format, [1, 1], [0, 1], [1, -1]));
    }

    [Fact]
    public void A_weight_below_the_normal_numbers_and_components_too_far_apart_are_refused_with_their_reasons()
    {
        RuleRequest light = Families.Mixture(8, BinaryFormat.Binary64, [1, 1e-308], [0, 1e40], [1, 1]);
        RuleRequest apart = Families.Mixture(40, BinaryFormat.Binary64, [1, 1], [0, 1e300], [1, 1e-300]);

        Assert.Equal(
            RuleFailure.WeightNotRepresentable, Assert.Throws<RuleConstructionException>(() => light.Construct(default)).Failure);
        Assert.Equal(
            RuleFailure.RecurrenceNotDetermined, Assert.Throws<RuleConstructionException>(() => apart.Construct(default)).Failure);
    }

    [Fact]
    public void A_node_beyond_the_format_is_refused()
    {
        RuleRequest request = Families.Mixture(3, BinaryFormat.Binary32, [1], [1e38], [3e38]);

        Assert.Equal(RuleFailure.NodeNotRepresentable, Assert.Throws<RuleConstructionException>(() => Round(request)).Failure);
        Assert.All(Round(Families.Mixture(3, BinaryFormat.Binary64, [1], [1e38], [3e38])).Nodes, node => Assert.True(Math.Abs(Value(node)) < 1e39));
    }

    [Fact]
    public async Task Constructions_can_be_cancelled()
    {
        foreach (string family in new[] { "half-range", "mixture", "double-well" })
        {
            RuleRequest request = Families.Request(family, 64, BinaryFormat.Binary64);
            Assert.Throws<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));

            using var source = new CancellationTokenSource();
            Task task = Task.Run(() =>
            {
                while (true)
                {
                    _ = request.Construct(source.Token);
                }
            });
            await source.CancelAsync();
            await Assert.ThrowsAnyAsync<OperationCanceledException>(() => task);
        }
    }

    [Fact]
    public async Task Threads_that_share_a_table_get_the_same_entries()
    {
        RuleTable table = Families.Request("mixture", 16, BinaryFormat.Binary64).Construct(default);
        RoundedRule[] rules = await Task.WhenAll(Enumerable.Range(0, 8)
            .Select(_ => Task.Run(() => RuleRounding.Round(table, BinaryFormat.Binary64, false, default))));

        Assert.All(rules, rule => Assert.Equal(rules[0].Nodes, rule.Nodes));
        Assert.All(rules, rule => Assert.Equal(rules[0].Weights, rule.Weights));
    }

    private static double Value(RoundedValue value) => BitConverter.UInt64BitsToDouble(value.Bits);

    private static RoundedRule Round(RuleRequest request) =>
        RuleRounding.Round(request.Construct(default), request.Format, request.DropZeroWeights, default);
}
