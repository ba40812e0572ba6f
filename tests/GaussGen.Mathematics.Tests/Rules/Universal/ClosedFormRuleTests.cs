using System;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>Rules of few nodes beside their closed forms, which are evaluated here in binary64.</summary>
public class ClosedFormRuleTests
{
    private const double Tolerance = 2e-15;

    [Theory]
    [InlineData(-0.4375)]
    [InlineData(0)]
    [InlineData(0.25)]
    [InlineData(20)]
    public void Generalized_Hermite_rules_of_two_and_three_nodes(double exponent)
    {
        // b₁ = μ + ½ and b₂ = 1 (Chihara 1978, V.2.46; recalled): nodes ±√b₁, and 0, ±√(b₁ + b₂) with b₁/(2(b₁ + b₂)) outside.
        string family = FormattableString.Invariant($"generalized-hermite {exponent}");
        double first = exponent + 0.5, sum = first + 1;

        AssertRule(family, [-Math.Sqrt(first), Math.Sqrt(first)], [0.5, 0.5]);
        AssertRule(family, [-Math.Sqrt(sum), 0, Math.Sqrt(sum)], [first / (2 * sum), 1 / sum, first / (2 * sum)]);
    }

    [Theory]
    [InlineData(0.1, 0.4)]
    [InlineData(0, 1)]
    public void Log_normal_rules_of_one_and_two_nodes(double logMean, double logDeviation)
    {
        // From E Xᵏ = exp(km + k²s²/2) (Aitchison and Brown 1957, 2.3; recalled): with the mean M and Q = exp(s²), the nodes z M solve
        // z² − Q(Q + 1) z + Q² = 0, and the weights make E Z = 1.
        string family = FormattableString.Invariant($"log-normal {logMean} {logDeviation}");
        double mean = Math.Exp(logMean + (logDeviation * logDeviation / 2)), q = Math.Exp(logDeviation * logDeviation);
        double half = q * (q + 1) / 2, root = Math.Sqrt((half * half) - (q * q));
        double below = half - root, above = half + root;

        AssertRule(family, [mean], [1]);
        AssertRule(family, [mean * below, mean * above], [(above - 1) / (above - below), (1 - below) / (above - below)]);
    }

    [Fact]
    public void The_one_node_of_a_truncated_rule_is_the_truncated_mean()
    {
        // The inverse Mills ratio φ(8)/(1 − Φ(8)) (Tallis 1961; recalled), by mpmath; and between −2 and 2, by symmetry, 0 with the variance
        // 1 − 4φ(2)/(2Φ(2) − 1) as the square of the two nodes.
        AssertRule("truncated 8 inf", [8.1213681122361127], [1]);
        double spread = Math.Sqrt(0.77374130354992325);
        AssertRule("truncated -2 2", [-spread, spread], [0.5, 0.5]);
    }

    [Fact]
    public void Mixture_rules_of_one_and_two_nodes()
    {
        // Weights 0.3 and 0.7, means −1 and 2, standard deviations 0.5 and 1.5: mean 1.1, variance 3.54, third central moment 1.512.
        // The two nodes are mean + t with t² − (third/variance) t − variance = 0.
        const double Mean = 1.1, Variance = 3.54, Third = 1.512;
        double half = Third / Variance / 2, root = Math.Sqrt((half * half) + Variance);

        AssertRule("mixture", [Mean], [1]);
        AssertRule("mixture", [Mean + half - root, Mean + half + root], [(half + root) / (2 * root), (root - half) / (2 * root)]);
    }

    private static void AssertRule(string family, double[] nodes, double[] weights)
    {
        RoundedRule rule = RuleRounding.Round(
            Families.Request(family, nodes.Length, BinaryFormat.Binary64).Construct(default), BinaryFormat.Binary64, false, default);
        for (int i = 0; i < nodes.Length; i++)
        {
            AssertNear(nodes[i], rule.Nodes[i]);
            AssertNear(weights[i], rule.Weights[i]);
        }
    }

    private static void AssertNear(double expected, RoundedValue actual) =>
        Assert.Equal(expected, BitConverter.UInt64BitsToDouble(actual.Bits), Math.Max(Math.Abs(expected), 1e-3) * Tolerance * 8);
}
