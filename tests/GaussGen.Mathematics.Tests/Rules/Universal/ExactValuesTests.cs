using System;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

public class ExactValuesTests
{
    [Fact]
    public void One_point_is_the_mean_with_weight_one()
    {
        RuleTable table = Families.Mixture(1, BinaryFormat.Binary64, [1, 3], [-2, 5], [1, 0.5]).Construct(default);

        Assert.Equal(new Rational(13, 4), table.Nodes[0].ExactValue);
        Assert.Equal(Rational.One, table.Weights[0].ExactValue);
    }

    [Fact]
    public void The_centre_of_a_symmetric_rule_is_exact()
    {
        RuleTable mixture = Families.Mixture(5, BinaryFormat.Binary64, [1, 1], [1, 2], [0.5, 0.5]).Construct(default);
        RuleTable quartic = Families.EvenExponential(7, BinaryFormat.Binary64, 0, 1).Construct(default);

        Assert.Equal(new Rational(3, 2), mixture.Nodes[2].ExactValue);
        Assert.NotNull(mixture.Weights[2].ExactValue);
        Assert.Equal(Rational.Zero, quartic.Nodes[3].ExactValue);
        Assert.Null(quartic.Weights[3].ExactValue);
    }

    [Fact]
    public void Two_symmetric_points_have_weight_one_half_exactly()
    {
        RuleTable table = Families.EvenExponential(2, BinaryFormat.Binary64, 0, 1).Construct(default);

        Assert.All(table.Weights, weight => Assert.Equal(new Rational(1, 2), weight.ExactValue));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(-1)]
    public void A_node_half_way_between_two_numbers_goes_to_the_even_one(int sign)
    {
        // m ± s with m = 1 and s = 2^−53: the upper node is half-way between 1 and its successor, and the tie goes to 1.
        double deviation = Math.ScaleB(1, -53);
        RoundedRule rule = Round(Families.Mixture(2, BinaryFormat.Binary64, [1], [sign], [deviation]));
        int tie = sign > 0 ? 1 : 0;

        Assert.Equal(BitConverter.DoubleToUInt64Bits(sign), rule.Nodes[tie].Bits);
        Assert.Equal(int.MinValue, rule.Nodes[tie].EnclosureWidthLog2);
        Assert.Equal(BitConverter.DoubleToUInt64Bits(sign * (1 - deviation)), rule.Nodes[1 - tie].Bits);
    }

    [Fact]
    public void A_weight_half_way_between_two_numbers_goes_to_the_even_one()
    {
        // Three points of N(0, 1): weights 1/6, 2/3, 1/6 and nodes ±√3: rational weights that no format has, found or enclosed alike.
        RoundedRule rule = Round(Families.Mixture(3, BinaryFormat.Binary64, [2], [0], [1]));

        Assert.Equal(new[] { 1.0 / 6, 2.0 / 3, 1.0 / 6 }, rule.Weights.Select(w => BitConverter.UInt64BitsToDouble(w.Bits)));
        Assert.Equal(Math.Sqrt(3), BitConverter.UInt64BitsToDouble(rule.Nodes[2].Bits));
    }

    [Fact]
    public void A_node_of_a_mixture_that_is_a_tie_in_binary32_is_recognised()
    {
        // A symmetric mixture of two components about 0 has nodes ±√(m² + s²): with 3-4-5 scaled so that the root has 25 bits.
        const double unit = 3355445; // 5 · 3355445 = 2²⁴ + 9
        RoundedRule rule = Round(Families.Mixture(2, BinaryFormat.Binary32, [1, 1], [-3 * unit, 3 * unit], [4 * unit, 4 * unit]));

        Assert.Equal(BitConverter.SingleToUInt32Bits(16777224f), rule.Nodes[1].Bits);
        Assert.Equal(int.MinValue, rule.Nodes[1].EnclosureWidthLog2);
    }

    private static RoundedRule Round(RuleRequest request) =>
        RuleRounding.Round(request.Construct(default), request.Format, request.DropZeroWeights, default);
}
