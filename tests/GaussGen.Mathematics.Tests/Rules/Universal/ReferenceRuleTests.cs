using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>Nodes and weights against those that mpmath finds from the moments at several hundred digits; see Data/gauss-rules.py.</summary>
public class ReferenceRuleTests
{
    private static readonly ILookup<(string Family, int Points), (string Node, string Weight)> Reference =
        ReferenceData.Read("gauss-rules.csv").ToLookup(
            line => (line[0], int.Parse(line[1], CultureInfo.InvariantCulture)), line => (line[3], line[4]));

    public static IEnumerable<object[]> Rules() => Reference.Select(rule => new object[] { rule.Key.Family, rule.Key.Points });

    [Theory]
    [MemberData(nameof(Rules))]
    public void Every_entry_is_the_nearest_number_in_each_format(string family, int points)
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary64, BinaryFormat.Binary32 })
        {
            RuleRequest request = Families.Request(family, points, format);
            RoundedRule rule = RuleRounding.Round(request.Construct(default), format, false, default);

            Assert.Equal(Reference[(family, points)].Select(e => format.Round(DecimalText.Parse(e.Node))), rule.Nodes.Select(v => v.Bits));
            Assert.Equal(Reference[(family, points)].Select(e => format.Round(DecimalText.Parse(e.Weight))), rule.Weights.Select(v => v.Bits));
        }
    }

    [Theory]
    [MemberData(nameof(Rules))]
    public void Every_enclosure_contains_the_true_number_at_several_precisions(string family, int points)
    {
        RuleTable table = Families.Request(family, points, BinaryFormat.Binary64).Construct(default);
        (string Node, string Weight)[] reference = [.. Reference[(family, points)]];
        foreach (int precision in new[] { 64, 128, 160 })
        {
            for (int i = 0; i < points; i++)
            {
                AssertContains(table.Nodes[i].Enclose(precision, default), reference[i].Node);
                AssertContains(table.Weights[i].Enclose(precision, default), reference[i].Weight);
            }
        }
    }

    private static void AssertContains(Ball ball, string value)
    {
        (Rational low, Rational high) = DecimalText.Interval(value);
        Assert.True(ball.Lower.ToRational() <= high && low <= ball.Upper.ToRational(), ball + " does not contain " + value);
    }
}
