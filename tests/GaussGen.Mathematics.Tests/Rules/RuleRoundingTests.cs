using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

public class RuleRoundingTests
{
    private static readonly BinaryFormat Format = BinaryFormat.Binary64;
    private static readonly RuleDescription Words = new("a rule", "a weight", "nodes", "a method", "a source");

    [Fact]
    public void Entries_are_the_nearest_values_and_the_other_half_is_the_mirror_image()
    {
        var asked = new List<int>();
        RoundedRule rule = RuleRounding.Round(
            Symmetric([-2, -1, 0, 1, 2], [0.125, 0.25, 0.5, 0.25, 0.125], asked), Format, dropZeroWeights: false, CancellationToken.None);
        Assert.Equal([-2 / 3.0, -1 / 3.0, 0.0, 1 / 3.0, 2 / 3.0], Values(rule.Nodes));
        Assert.Equal([0.125 / 3, 0.25 / 3, 0.5 / 3, 0.25 / 3, 0.125 / 3], Values(rule.Weights));
        Assert.Equal((0, null), (rule.ZeroWeights, rule.FirstZeroWeightNode));

        // Of five entries, three are enclosed: once each for the nodes and the weights.
        Assert.Equal([2, 2, 3, 3, 4, 4], asked.Order());
        Assert.Equal(0UL, rule.Nodes[2].Bits);
    }

    [Fact]
    public void A_rule_that_is_not_symmetric_is_rounded_entry_by_entry()
    {
        RuleTable table = Symmetric([1, 2, 4, 7], [0.5, 0.25, 0.125, 0.0625], []) with { IsSymmetric = false };
        RoundedRule rule = RuleRounding.Round(table, Format, dropZeroWeights: false, CancellationToken.None);
        Assert.Equal([1 / 3.0, 2 / 3.0, 4 / 3.0, 7 / 3.0], Values(rule.Nodes));
        Assert.Equal([0.5 / 3, 0.25 / 3, 0.125 / 3, 0.0625 / 3], Values(rule.Weights));
        Assert.Same(table, rule.Table);
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void A_weight_that_rounds_to_zero_stays_as_plus_zero_unless_it_is_to_be_dropped(bool drop)
    {
        // binary16 begins at 2⁻²⁴; half of that is a tie that goes to zero.
        double tiny = Math.ScaleB(1, -26);
        RuleTable table = Symmetric([-9, -6, -3, 3, 6, 9], [tiny, tiny, 3, 3, tiny, tiny], []);
        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary16, drop, CancellationToken.None);
        Half[] nodes = rule.Nodes.Select(value => BitConverter.UInt16BitsToHalf((ushort)value.Bits)).ToArray();
        Assert.Equal(drop ? [(Half)(-1), (Half)1] : [(Half)(-3), (Half)(-2), (Half)(-1), (Half)1, (Half)2, (Half)3], nodes);
        ulong one = BitConverter.HalfToUInt16Bits((Half)1);
        Assert.Equal(drop ? [one, one] : [0UL, 0UL, one, one, 0UL, 0UL], rule.Weights.Select(value => value.Bits));

        // The magnitude of the innermost such node: 2.
        Assert.Equal(4, rule.ZeroWeights);
        Assert.Equal((ulong)BitConverter.HalfToUInt16Bits((Half)2), rule.FirstZeroWeightNode!.Value.Bits);
    }

    [Fact]
    public void The_mirror_image_of_a_node_that_rounds_to_zero_is_plus_zero()
    {
        double tiny = Math.ScaleB(1, -30);
        RuleTable table = Symmetric([-tiny, tiny], [3, 3], []);
        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary16, dropZeroWeights: false, CancellationToken.None);
        Assert.Equal([0UL, 0UL], rule.Nodes.Select(value => value.Bits));
    }

    [Fact]
    public void Location_and_scale_are_rounded_with_the_reciprocal_of_the_total()
    {
        RuleTable table = Symmetric([-1, 1], [1, 1], []);
        RoundedRule plain = RuleRounding.Round(table, Format, false, CancellationToken.None);
        Assert.Equal((null, null), (plain.NodeScale, plain.ReciprocalTotalWeight));

        RealNumber sqrtTwo = RealNumber.FromEnclosures((precision, _) => Constants.Sqrt2(precision));
        RealNumber sqrtPi = RealNumber.FromEnclosures((precision, token) => Constants.SqrtPi(precision, token));
        RoundedRule scaled = RuleRounding.Round(table with { LocationScale = new LocationScale(sqrtTwo, sqrtPi) }, Format, false, CancellationToken.None);
        Assert.Equal(Math.Sqrt(2), Value(scaled.NodeScale!.Value));

        // 1/√π = 0.56418958354775628694807945156… (NIST DLMF 7.1 uses 2/√π; recalled, recomputed with mpmath).
        Assert.Equal(0.5641895835477563, Value(scaled.ReciprocalTotalWeight!.Value));

        RoundedRule exact = RuleRounding.Round(table with { LocationScale = new LocationScale(RealNumber.Exact(1), RealNumber.Exact(3)) }, Format, false, CancellationToken.None);
        Assert.Equal((1.0, 1 / 3.0), (Value(exact.NodeScale!.Value), Value(exact.ReciprocalTotalWeight!.Value)));
        Assert.Equal(int.MinValue, exact.ReciprocalTotalWeight!.Value.EnclosureWidthLog2);
    }

    [Fact]
    public void A_cancelled_token_stops_the_work() => Assert.Throws<OperationCanceledException>(
        () => RuleRounding.Round(Symmetric([-1, 1], [1, 1], []), Format, false, new CancellationToken(canceled: true)));

    /// <summary>Nodes and weights that are a third of the given numbers, known by enclosures only but for zero.</summary>
    private static RuleTable Symmetric(double[] nodes, double[] weights, List<int> asked) => new(
        Words, Thirds(nodes, asked), Thirds(weights, asked), 1, IsSymmetric: true, LocationScale: null);

    private static RealNumber[] Thirds(double[] values, List<int> asked) => [.. values.Select((value, i) =>
        RealNumber.FromEnclosures((precision, _) =>
        {
            asked.Add(i);
            return Ball.FromRational(Rational.FromDouble(value) / 3, precision);
        }))];

    private static double[] Values(IEnumerable<RoundedValue> values) => [.. values.Select(Value)];

    private static double Value(RoundedValue value) => BitConverter.UInt64BitsToDouble(value.Bits);
}
