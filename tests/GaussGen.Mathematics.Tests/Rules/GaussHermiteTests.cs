using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

public class GaussHermiteTests
{
    [Theory]
    [InlineData(int.MinValue)]
    [InlineData(-1)]
    [InlineData(0)]
    [InlineData(1001)]
    [InlineData(int.MaxValue)]
    public void A_number_of_nodes_out_of_range_is_refused_with_the_range(int points)
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(
            () => GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None));
        Assert.Contains("from 1 to 1000 nodes", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_rational_is_exact()
    {
        RuleTable one = GaussHermite.Construct(1, HermiteConvention.Probabilist, CancellationToken.None);
        Assert.Equal(Rational.Zero, one.Nodes[0].ExactValue);
        Assert.Equal(Rational.One, one.Weights[0].ExactValue);
        RuleTable two = GaussHermite.Construct(2, HermiteConvention.Probabilist, CancellationToken.None);
        Assert.Equal(new Rational?[] { -1, 1 }, two.Nodes.Select(node => node.ExactValue));
        Assert.All(two.Weights, weight => Assert.Equal(new Rational(1, 2), weight.ExactValue));
        // The centre weights 2/3, 8/15, 16/35, 128/315: (n−1)!!/n!!.
        foreach ((int points, Rational weight) in new[] { (3, new Rational(2, 3)), (5, new Rational(8, 15)), (7, new Rational(16, 35)), (9, new Rational(128, 315)) })
        {
            RuleTable table = GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None);
            Assert.Equal(weight, table.Weights[points / 2].ExactValue);
            Assert.Equal(Rational.Zero, table.Nodes[points / 2].ExactValue);
            Assert.Null(GaussHermite.Construct(points, HermiteConvention.Physicist, CancellationToken.None).Weights[points / 2].ExactValue);
        }
    }

    [Fact]
    public void The_rules_with_one_two_and_three_nodes_are_those_of_the_textbooks()
    {
        // exp(−x²): √π at 0; √π/2 at ±1/√2; √π/6 at ±√(3/2) and 2√π/3 at 0.
        double rootPi = Math.Sqrt(Math.PI);
        AssertRule(1, [0], [rootPi]);
        AssertRule(2, [-Math.Sqrt(0.5), Math.Sqrt(0.5)], [rootPi / 2, rootPi / 2]);
        AssertRule(3, [-Math.Sqrt(1.5), 0, Math.Sqrt(1.5)], [rootPi / 6, 2 * rootPi / 3, rootPi / 6]);
    }

    [Fact]
    public void A_table_tells_what_it_is()
    {
        RuleTable table = GaussHermite.Construct(120, HermiteConvention.Probabilist, CancellationToken.None);
        Assert.Equal("Gauss–Hermite rule", table.Description.Title);
        Assert.Equal("the standard normal density", table.Description.Weight);
        Assert.Equal("the zeros of the Hermite polynomial He₁₂₀", table.Description.Nodes);
        Assert.Equal("120 disjoint root intervals", table.Description.Method);
        Assert.Equal(239, table.DegreeOfExactness);
        Assert.True(table.IsSymmetric);
        Assert.Equal(Rational.One, table.LocationScale!.NodeScale.ExactValue);
        Assert.Equal(Rational.One, table.LocationScale.TotalWeight.ExactValue);

        RuleTable other = GaussHermite.Construct(3, HermiteConvention.Physicist, CancellationToken.None);
        Assert.Equal("exp(−x²)", other.Description.Weight);
        Assert.Equal("the zeros of the Hermite polynomial H₃", other.Description.Nodes);
        Assert.Equal(Math.Sqrt(2), Nearest(other.LocationScale!.NodeScale));
        Assert.Equal(1.772453850905516, Nearest(other.LocationScale.TotalWeight));
    }

    [Fact]
    public void Requests_are_equal_when_they_ask_for_the_same_and_construct_the_rule()
    {
        var request = new GaussHermiteRequest(7, HermiteConvention.Physicist, BinaryFormat.Binary32, false);
        Assert.Equal(request, new GaussHermiteRequest(7, HermiteConvention.Physicist, BinaryFormat.Binary32, false));
        Assert.NotEqual(request, request with { Points = 8 });
        Assert.NotEqual(request, request with { Convention = HermiteConvention.Probabilist });
        Assert.NotEqual(request, request with { Format = BinaryFormat.Binary64 });
        Assert.NotEqual(request, request with { DropZeroWeights = true });
        Assert.Equal(7, request.Construct(CancellationToken.None).Nodes.Count);
    }

    [Theory]
    [InlineData(3)]
    [InlineData(1000)]
    public void A_cancelled_construction_stops(int points)
    {
        var cancelled = new CancellationToken(canceled: true);
        Assert.Throws<OperationCanceledException>(() => GaussHermite.Construct(points, HermiteConvention.Probabilist, cancelled));
        RuleTable table = GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None);
        Assert.Throws<OperationCanceledException>(() => table.Nodes[points - 1].Enclose(200, cancelled));
        Assert.Throws<OperationCanceledException>(() => table.Weights[0].Enclose(100_000, cancelled));
    }

    private static double Nearest(RealNumber value) =>
        HermiteOracle.ToDouble(Rounding.Nearest(value, BinaryFormat.Binary64, CancellationToken.None).Bits);

    private static void AssertRule(int points, double[] nodes, double[] weights)
    {
        RoundedRule rule = HermiteOracle.Round(points, HermiteConvention.Physicist, BinaryFormat.Binary64);
        for (int i = 0; i < points; i++)
        {
            Assert.Equal(nodes[i], HermiteOracle.ToDouble(rule.Nodes[i].Bits), 1e-15);
            Assert.Equal(weights[i], HermiteOracle.ToDouble(rule.Weights[i].Bits), 1e-15);
        }
    }
}
