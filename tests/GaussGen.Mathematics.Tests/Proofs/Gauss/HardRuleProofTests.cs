using System;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>Rules at the ends of the ranges: extreme parameters, numbers half-way between two others, nodes that round alike, zero weights.</summary>
public class HardRuleProofTests
{
    private static readonly BinaryFormat Format = BinaryFormat.Binary64;

    [Theory]
    [InlineData(-40, 40, 16)]
    [InlineData(36, 38, 16)]
    [InlineData(8, 8.0009765625, 16)]
    [InlineData(8, 8.0009765625, 64)]
    [InlineData(-20, double.PositiveInfinity, 16)]
    [InlineData(double.NegativeInfinity, -30, 16)]
    [InlineData(0, 30, 16)]
    [InlineData(1, 1.000000000001, 16)]
    [InlineData(1e-200, 3e-200, 5)]
    [InlineData(-1e10, 1, 16)]
    [InlineData(-1, 2, 64)]
    public void Wide_far_and_narrow_intervals_are_proven(double lower, double upper, int points) => RuleProofTests.AssertProven(
        new GaussTruncatedNormalClaim(points, lower, upper, Format, false, false),
        RuleFamily.Data(new GaussTruncatedNormalRequest(points, lower, upper, Format, false)));

    [Theory]
    [InlineData(0, 1, 16)]
    [InlineData(0.1, 0.4, 32)]
    [InlineData(0, 0.25, 64)]
    [InlineData(-1, 1e-6, 16)]
    [InlineData(300, 1e-12, 5)]
    public void Graded_and_narrow_log_normals_are_proven(double mean, double deviation, int points) => RuleProofTests.AssertProven(
        new GaussLogNormalClaim(points, mean, deviation, Format, false, false),
        RuleFamily.Data(new GaussLogNormalRequest(points, mean, deviation, Format, false)));

    [Theory]
    [InlineData(64, -10.0, 1.0)]
    [InlineData(16, 0.5, 1e-6)]
    [InlineData(16, 1e100, 1e200)]
    [InlineData(12, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 1.0)]
    public void Deep_wells_and_extreme_coefficients_are_proven(int points, params double[] coefficients) => RuleProofTests.AssertProven(
        new GaussEvenExponentialClaim(points, coefficients, Format, false, false),
        RuleFamily.Data(new GaussEvenExponentialRequest(points, new ValueList(coefficients), Format, false)));

    [Theory]
    [InlineData(-0.4999999999999999)]
    [InlineData(0)]
    [InlineData(1e6)]
    public void Generalized_rules_are_proven_over_the_whole_range(double exponent) => RuleProofTests.AssertProven(
        new GaussGeneralizedHermiteClaim(33, exponent, Format, false, false),
        RuleFamily.Data(new GaussGeneralizedHermiteRequest(33, exponent, Format, false)));

    [Fact]
    public void Mixtures_of_unlike_components_are_proven()
    {
        foreach ((double[] weights, double[] means, double[] deviations, int points) in new (double[], double[], double[], int)[]
            {
                ([0.5, 0.25, 0.25], [0, 100, -37], [1, 1, 0.125], 64),
                ([1, 2], [1e-3, 1e6], [1e-5, 1e4], 16),
                ([0, 1, 0], [5, 1.5, -5], [1, 0.25, 1], 7),
            })
        {
            RuleProofTests.AssertProven(
                new GaussNormalMixtureClaim(points, weights, means, deviations, Format, false, false),
                RuleFamily.Data(new GaussNormalMixtureRequest(
                    points, new ValueList(weights), new ValueList(means), new ValueList(deviations), Format, false)));
        }
    }

    [Fact]
    public void A_mean_that_is_half_way_goes_to_the_even_number()
    {
        // 1 + 2⁻¹¹ lies half-way between 1 and 1 + 2⁻¹⁰ of binary16; 1 + 3·2⁻¹¹ between 1 + 2⁻¹⁰ and 1 + 2⁻⁹.
        foreach ((double mean, ulong right) in new[] { (1 + (1.0 / 2048), 0x3c00UL), (1 + (3.0 / 2048), 0x3c02UL) })
        {
            double[] weights = [1, 1], means = [mean - 0.5, mean + 0.5], deviations = [1, 2];
            var request = new GaussNormalMixtureRequest(
                1, new ValueList(weights), new ValueList(means), new ValueList(deviations), BinaryFormat.Binary16, false);
            var claim = new GaussNormalMixtureClaim(1, weights, means, deviations, BinaryFormat.Binary16, false, false);
            TableData data = RuleFamily.Data(request);
            Assert.Equal(right, data.Entries("Nodes")[0]);
            RuleProofTests.AssertProven(claim, data);
            RuleTamperingTests.AssertOneWrong(claim, data, "Nodes", 0, right + 1);
            RuleTamperingTests.AssertOneWrong(claim, data, "Nodes", 0, right - 1);
        }
    }

    [Fact]
    public void Rational_nodes_that_are_half_way_go_to_the_even_number()
    {
        // Two equal components at ±1233 with deviation 1644 have the second moment 2055², and 2055 lies half-way between 2054 and 2056.
        double[] weights = [1, 1], means = [-1233, 1233], deviations = [1644, 1644];
        var claim = new GaussNormalMixtureClaim(2, weights, means, deviations, BinaryFormat.Binary16, false, false);
        TableData data = RuleFamily.Data(new GaussNormalMixtureRequest(
            2, new ValueList(weights), new ValueList(means), new ValueList(deviations), BinaryFormat.Binary16, false));
        Assert.Equal(BinaryFormat.Binary16.Round(new GaussGen.Mathematics.Arithmetic.Dyadic(2056, 0)), data.Entries("Nodes")[1]);
        RuleProofTests.AssertProven(claim, data);
        RuleTamperingTests.AssertOneWrong(claim, data, "Nodes", 1, data.Entries("Nodes")[1] - 1);
    }

    [Fact]
    public void A_rational_weight_that_is_half_way_goes_to_the_even_number()
    {
        // Three points: the outer weights are (μ+½)/(2(μ+3/2)), with μ + 3/2 = 2¹² half-way between ½ − 2⁻¹² and ½ of binary16.
        var claim = new GaussGeneralizedHermiteClaim(3, 4094.5, BinaryFormat.Binary16, false, false);
        TableData data = RuleFamily.Data(new GaussGeneralizedHermiteRequest(3, 4094.5, BinaryFormat.Binary16, false));
        Assert.Equal([0x3800UL, 0x0c00UL, 0x3800UL], data.Entries("Weights"));
        RuleProofTests.AssertProven(claim, data);
        RuleTamperingTests.AssertOneWrong(claim, data, "Weights", 2, 0x37ff);
    }

    [Fact]
    public void Nodes_that_round_to_one_number_are_told_apart()
    {
        var claim = new GaussTruncatedNormalClaim(5, 8, 8.0009765625, BinaryFormat.Binary16, false, false);
        TableData data = RuleFamily.Data(new GaussTruncatedNormalRequest(5, 8, 8.0009765625, BinaryFormat.Binary16, false));
        Assert.Single(data.Entries("Nodes").Distinct());
        RuleProofTests.AssertProven(claim, data);
        RuleTamperingTests.AssertOneWrong(claim, data, "Nodes", 3, data.Entries("Nodes")[3] + 1);
        RuleTamperingTests.AssertOneWrong(claim, data, "Weights", 3, data.Entries("Weights")[3] + 1);
    }

    [Fact]
    public void Zero_weights_are_kept_or_dropped_as_claimed()
    {
        foreach (string name in new[] { "half-range", "generalized", "mixture", "truncated, far tail", "even exponential, quartic" })
        {
            RuleFamily family = RuleFamily.Named(name);
            TableData kept = family.Data(24, BinaryFormat.Binary16);
            TableData dropped = family.Data(24, BinaryFormat.Binary16, drop: true);
            Assert.True(dropped.Entries("Nodes").Count < 24);
            RuleProofTests.AssertProven(family.Claim(24, BinaryFormat.Binary16, false, false), kept);
            TableClaim claim = family.Claim(24, BinaryFormat.Binary16, true, false);
            RuleProofTests.AssertProven(claim, dropped);
            Assert.Equal(Verdict.Wrong, claim.Prove(kept).Verdict);
            Assert.Equal(Verdict.Wrong, family.Claim(24, BinaryFormat.Binary16, false, false).Prove(dropped).Verdict);
            Assert.Equal(Verdict.Wrong, claim.Prove(dropped.WithConstant("PointCount", 24)).Verdict);
            TableData shorter = dropped.With("Nodes", old => old.Skip(1)).With("Weights", old => old.Skip(1));
            Assert.Equal(Verdict.Wrong, claim.Prove(shorter.WithConstant("PointCount", (uint)shorter.Entries("Nodes").Count)).Verdict);
        }
    }

    [Fact]
    public void Parameters_beyond_all_tables_end_without_a_proof()
    {
        var nothing = new TableData([new DataSpan("Nodes", Format, new ulong[2]), new DataSpan("Weights", Format, new ulong[2])], []);
        foreach (TableClaim claim in new TableClaim[]
            {
                new GaussTruncatedNormalClaim(2, 1e200, double.PositiveInfinity, Format, false, false),
                new GaussTruncatedNormalClaim(2, 1e300, 1e301, Format, false, false),
                new GaussLogNormalClaim(2, 0, 1e300, Format, false, false),
                new GaussLogNormalClaim(2, 1e300, 1, Format, false, false),
                new GaussEvenExponentialClaim(2, [-1e300, 1e-300], Format, false, false),
            })
        {
            TableProof proof = claim.Prove(nothing);
            Assert.False(proof.IsProven);
            Assert.Equal(0, proof.ProvenCount);
            Assert.All(proof.Entries, entry => Assert.NotNull(entry.Reason));
        }
    }

    [Fact]
    public void Impossible_parameters_are_refused()
    {
        AssertRefused("upper", () => new GaussTruncatedNormalClaim(2, 1, 1, Format, false, false));
        AssertRefused("upper", () => new GaussTruncatedNormalClaim(2, double.NaN, 1, Format, false, false));
        AssertRefused("upper", () => new GaussTruncatedNormalClaim(2, double.NegativeInfinity, double.PositiveInfinity, Format, false, false));
        AssertRefused("exponent", () => new GaussGeneralizedHermiteClaim(2, -0.5, Format, false, false));
        AssertRefused("exponent", () => new GaussGeneralizedHermiteClaim(2, 1000001, Format, false, false));
        AssertRefused("exponent", () => new GaussGeneralizedHermiteClaim(2, double.NaN, Format, false, false));
        AssertRefused("logMean", () => new GaussLogNormalClaim(2, double.NaN, 1, Format, false, false));
        AssertRefused("logStandardDeviation", () => new GaussLogNormalClaim(2, 0, 0, Format, false, false));
        AssertRefused("coefficients", () => new GaussEvenExponentialClaim(2, [1, -1], Format, false, false));
        AssertRefused("coefficients", () => new GaussEvenExponentialClaim(2, [], Format, false, false));
        AssertRefused("coefficients", () => new GaussEvenExponentialClaim(2, new double[8].Append(1).ToArray(), Format, false, false));
        AssertRefused("weights", () => new GaussNormalMixtureClaim(2, [], [], [], Format, false, false));
        AssertRefused("weights", () => new GaussNormalMixtureClaim(2, [0, 0], [1, 2], [1, 1], Format, false, false));
        AssertRefused("weights", () => new GaussNormalMixtureClaim(2, [1, -1], [1, 2], [1, 1], Format, false, false));
        AssertRefused("means", () => new GaussNormalMixtureClaim(2, [1], [double.NaN], [1], Format, false, false));
        AssertRefused("means", () => new GaussNormalMixtureClaim(2, [1, 1], [0], [1, 1], Format, false, false));
        AssertRefused("standardDeviations", () => new GaussNormalMixtureClaim(2, [1], [0], [0], Format, false, false));
    }

    [Fact]
    public void Lists_in_claims_are_equal_by_value()
    {
        Assert.Equal(
            new GaussEvenExponentialClaim(2, [-0.0, 1], Format, false, false), new GaussEvenExponentialClaim(2, [0.0, 1], Format, false, false));
        Assert.NotEqual(
            new GaussEvenExponentialClaim(2, [0.5, 1], Format, false, false), new GaussEvenExponentialClaim(2, [0.0, 1], Format, false, false));
        Assert.Equal(
            new GaussNormalMixtureClaim(2, [1], [0], [1], Format, false, false).GetHashCode(),
            new GaussNormalMixtureClaim(2, [1], [0], [1], Format, false, false).GetHashCode());
        Assert.NotEqual(
            new GaussNormalMixtureClaim(2, [1], [0], [1], Format, false, false),
            new GaussNormalMixtureClaim(2, [1], [0], [2], Format, false, false));
    }

    private static void AssertRefused(string parameter, Func<TableClaim> make)
    {
        ArgumentException refused = Assert.ThrowsAny<ArgumentException>(make);
        Assert.Equal(parameter, refused.ParamName);
        Assert.NotEmpty(refused.Message);
    }
}
