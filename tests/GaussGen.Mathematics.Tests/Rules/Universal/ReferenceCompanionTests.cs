using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>Anti-Gaussian companions against those that mpmath finds from their moments; see Data/companion-rules.py.</summary>
public class ReferenceCompanionTests
{
    private static readonly ILookup<(string Family, int Points), (string Node, string Weight)> Reference =
        ReferenceData.Read("companion-rules.csv").ToLookup(
            line => (line[0], int.Parse(line[1], CultureInfo.InvariantCulture)), line => (line[3], line[4]));

    public static IEnumerable<object[]> Rules() => Reference.Select(rule => new object[] { rule.Key.Family, rule.Key.Points });

    public static IEnumerable<object[]> HermiteSizes() =>
        Reference.Where(rule => rule.Key.Family == "hermite").Select(rule => new object[] { rule.Key.Points });

    [Theory]
    [MemberData(nameof(Rules))]
    public void Every_entry_is_the_nearest_number_in_each_format(string family, int points)
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary64, BinaryFormat.Binary32 })
        {
            RoundedCompanion companion = TableMemo.Get(Request(family, points, format), default).Companion!;

            Assert.Equal(points + 1, companion.Nodes.Count);
            Assert.Equal(Reference[(family, points)].Select(e => format.Round(DecimalText.Parse(e.Node))), companion.Nodes.Select(v => v.Bits));
            Assert.Equal(Reference[(family, points)].Select(e => format.Round(DecimalText.Parse(e.Weight))), companion.Weights.Select(v => v.Bits));
        }
    }

    [Theory]
    [MemberData(nameof(Rules))]
    public void Every_enclosure_contains_the_true_number(string family, int points)
    {
        CompanionRule companion = Request(family, points, BinaryFormat.Binary64).Construct(default).Companion!;
        (string Node, string Weight)[] reference = [.. Reference[(family, points)]];
        foreach (int precision in new[] { 64, 160 })
        {
            for (int i = 0; i <= points; i++)
            {
                AssertContains(companion.Nodes[i].Enclose(precision, default), reference[i].Node);
                AssertContains(companion.Weights[i].Enclose(precision, default), reference[i].Weight);
            }
        }
    }

    [Theory]
    [MemberData(nameof(HermiteSizes))]
    public void The_physicists_companion_is_the_same_in_its_own_units(int points)
    {
        RuleRequest request = new GaussHermiteRequest(points, HermiteConvention.Physicist, BinaryFormat.Binary64, false) { ErrorEstimate = true };
        CompanionRule companion = request.Construct(default).Companion!;
        (string Node, string Weight)[] reference = [.. Reference[("hermite", points)]];
        for (int i = 0; i <= points; i++)
        {
            Ball node = Ball.Multiply(companion.Nodes[i].Enclose(160, default), Constants.Sqrt2(160), 160);
            AssertContains(node, reference[i].Node);
            AssertContains(Ball.Divide(companion.Weights[i].Enclose(160, default), Constants.SqrtPi(160), 160), reference[i].Weight);
            Assert.True(node.RelativeAccuracyBits > 100);
        }
    }

    private static RuleRequest Request(string family, int points, BinaryFormat format) =>
        (family == "hermite" ? new GaussHermiteRequest(points, HermiteConvention.Probabilist, format, false) : Families.Request(family, points, format))
            with
        { ErrorEstimate = true };

    private static void AssertContains(Ball ball, string value)
    {
        (Rational low, Rational high) = DecimalText.Interval(value);
        Assert.True(ball.Lower.ToRational() <= high && low <= ball.Upper.ToRational(), ball + " does not contain " + value);
    }
}
