using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

public class GaussHermiteWeightTests
{
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Every_weight_is_nearest_to_the_reciprocal_sum_of_squares_at_its_node(int parity)
    {
        foreach (int points in HermiteOracle.Sizes.Where(points => points % 2 == parity))
        {
            RuleTable table = GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None);
            RoundedRule[] rules = (from convention in HermiteOracle.Conventions
                                   from format in HermiteOracle.Formats
                                   select HermiteOracle.Round(points, convention, format)).ToArray();
            // Plain ball arithmetic loses up to 1.3 bits a step; the signs at the ends of the node's ball need as much again.
            int nodePrecision = 100 + (27 * points / 20), precision = 64 + (2 * nodePrecision);
            int stride = points > 500 ? 25 : 1;
            for (int i = points / 2; i < points; i++)
            {
                if (i % stride != 0 && i < points - 3)
                {
                    continue;
                }

                Ball node = table.Nodes[i].Enclose(nodePrecision, CancellationToken.None);
                (Ball weight, bool isProven) = HermiteOracle.Weight(points, node, precision);
                Assert.True(isProven || node.IsExact, $"node {i} of {points}: no change of sign across its ball");
                Ball physicists = Ball.Multiply(weight, Constants.SqrtPi(precision), precision);
                foreach (RoundedRule rule in rules)
                {
                    AssertRounds(ReferenceEquals(rule, rules[0]) || ReferenceEquals(rule, rules[1]) ? weight : physicists, rule, i);
                }
            }
        }
    }

    [Theory]
    [InlineData(HermiteConvention.Probabilist, 1000)]
    [InlineData(HermiteConvention.Physicist, 1000)]
    [InlineData(HermiteConvention.Probabilist, 377)]
    public void Weights_below_the_smallest_number_are_zero_and_the_last_ones_above_are_not(HermiteConvention convention, int points)
    {
        RoundedRule rule = HermiteOracle.Round(points, convention, BinaryFormat.Binary64);
        int subnormal = 0, zero = 0;
        Dyadic half = new(1, -1075);
        for (int i = points / 2; i < points; i++)
        {
            Ball weight = rule.Table.Weights[i].Enclose(64, CancellationToken.None);
            Assert.Equal(weight.Upper < half, rule.Weights[i].Bits == 0);
            zero += rule.Weights[i].Bits == 0 ? 1 : 0;
            subnormal += rule.Weights[i].Bits is > 0 and < 1UL << 52 ? 1 : 0;
        }

        Assert.Equal(2 * zero, rule.ZeroWeights);
        Assert.True(points < 1000 || (subnormal > 0 && zero > 100), $"{subnormal} subnormal and {zero} zero weights");
    }

    [Fact]
    public void Moments_are_exact_up_to_degree_2n_minus_1_and_not_beyond()
    {
        // Σ w x^(2k) is (2k−1)!! for the normal density: Isserlis 1918. At degree 2n the rule falls short by n!, the squared norm
        // of the monic Heₙ (DLMF 18.3).
        foreach (int points in new[] { 1, 2, 3, 4, 5, 8, 13, 20, 31, 64, 101 })
        {
            RuleTable table = GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None);
            Assert.Equal((2 * points) - 1, table.DegreeOfExactness);
            BigInteger moment = BigInteger.One, factorial = BigInteger.One;
            for (int k = 0; k <= points; k++)
            {
                Ball sum = Moment(table, 2 * k, 1200);
                BigInteger expected = k == points ? moment - factorial : moment;
                Assert.True(sum.Contains((Rational)expected), $"degree {2 * k} of {points} points");
                Assert.True(sum.RelativeAccuracyBits > 200 || sum.IsExact || expected.IsZero);
                moment *= (2 * k) + 1;
                factorial *= k + 1;
            }
        }
    }

    [Fact]
    public void Physicists_weights_have_the_moments_of_their_own_weight_function()
    {
        // ∫ x^(2k) exp(−x²) dx = Γ(k + ½): DLMF 5.9.1.
        foreach (int points in new[] { 1, 2, 3, 7, 20, 45 })
        {
            RuleTable table = GaussHermite.Construct(points, HermiteConvention.Physicist, CancellationToken.None);
            for (int k = 0; k < points; k++)
            {
                Ball difference = Ball.Subtract(Moment(table, 2 * k, 800), HalfIntegerGamma.Value(k, 800), 800);
                Assert.True(difference.ContainsZero, $"degree {2 * k} of {points} points");
                Assert.True(difference.Upper < new Dyadic(1, -200));
            }
        }
    }

    private static Ball Moment(RuleTable table, int degree, int precision)
    {
        Ball sum = default;
        for (int i = 0; i < table.Nodes.Count; i++)
        {
            Ball power = Ball.Pow(table.Nodes[i].Enclose(precision, CancellationToken.None), degree, precision);
            Ball weight = table.Weights[i].Enclose(precision, CancellationToken.None);
            sum = Ball.Add(sum, Ball.Multiply(weight, power, precision), precision);
        }

        return sum;
    }

    private static void AssertRounds(Ball weight, RoundedRule rule, int i)
    {
        Assert.True(rule.Format.TryRound(weight, out ulong bits, out _), "the oracle is too wide");
        Assert.True(
            bits == rule.Weights[i].Bits && bits == rule.Weights[rule.Weights.Count - 1 - i].Bits,
            $"weight {i} of {rule.Weights.Count} in {rule.Format.Name}: {rule.Weights[i].Bits:x} instead of {bits:x}");
    }
}
