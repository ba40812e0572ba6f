using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

/// <summary>Moments against those that mpmath finds by quadrature at more than 100 digits; see Data/family-moments.py.</summary>
public class FamilyReferenceTests
{
    private static readonly ILookup<(string Family, string Parameters), (int Order, string List, string Value)> Reference =
        ReferenceData.Read("family-moments.csv").ToLookup(
            line => (line[0], line[1]), line => (int.Parse(line[2], CultureInfo.InvariantCulture), line[3], line[4]));

    private static readonly Dictionary<string, Func<double[], int, BinaryFormat, MomentRequest>> Requests = new()
    {
        ["truncated"] = (p, order, format) => new TruncatedNormalMomentsRequest(p[0], p[1], p[2], p[3], order, format),
        ["half-normal"] = (p, order, format) => new HalfNormalMomentsRequest(p[0], order, format),
        ["even-exponential"] = (p, order, format) => new EvenExponentialMomentsRequest(new ValueList(p), order, format),
        ["log-normal"] = (p, order, format) => new LogNormalMomentsRequest(p[0], p[1], order, format),
    };

    public static IEnumerable<object[]> Tables() => Reference
        .Select(table => new object[] { table.Key.Family, table.Key.Parameters });

    [Theory]
    [MemberData(nameof(Tables))]
    public void Every_moment_is_the_nearest_number_in_each_format(string family, string parameters)
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary64, BinaryFormat.Binary32 })
        {
            RoundedMoments moments = Round(family, parameters, format);
            Assert.All(Reference[(family, parameters)], entry => Assert.Equal(
                (entry.Order, entry.List, format.Round(DecimalText.Parse(entry.Value))),
                (entry.Order, entry.List, Values(moments, entry.List)[entry.Order].Bits)));
        }
    }

    [Theory]
    [MemberData(nameof(Tables))]
    public void Every_enclosure_contains_the_moment_and_becomes_narrow(string family, string parameters)
    {
        MomentTable table = Request(family, parameters, BinaryFormat.Binary64).Construct(default);
        foreach ((int order, string list, string value) in Reference[(family, parameters)])
        {
            (Rational low, Rational high) = DecimalText.Interval(value);
            foreach (int precision in new[] { 64, 128, 200 })
            {
                Ball ball = Values(table, list)[order].Enclose(precision, default);
                Assert.True(ball.Lower.ToRational() <= high && low <= ball.Upper.ToRational(), $"{list} {order} at {precision} bits: {ball} is not {value}");
                Assert.True(ball.RelativeAccuracyBits >= precision / 2, $"{list} {order}: {ball.RelativeAccuracyBits} bits at {precision}");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Tables))]
    public void Orders_zero_and_one_are_what_they_must_be(string family, string parameters)
    {
        MomentTable table = Request(family, parameters, BinaryFormat.Binary64).Construct(default);
        Assert.Equal(Rational.One, table.Raw[0].ExactValue);
        Assert.Equal(Rational.One, table.Central[0].ExactValue);
        Assert.Equal(Rational.One, table.Absolute[0].ExactValue);
        Assert.Equal(Rational.Zero, table.Central[1].ExactValue);
        Assert.Equal(Reference[(family, parameters)].Max(entry => entry.Order) + 1, table.Raw.Count);
        Assert.All(Enumerable.Range(0, table.Raw.Count / 2), half => Assert.Same(table.Central[2 * half], table.Absolute[2 * half]));
    }

    private static MomentRequest Request(string family, string parameters, BinaryFormat format)
    {
        double[] values = [.. parameters.Split(' ').Select(Number)];
        int order = Reference[(family, parameters)].Max(entry => entry.Order);
        return Requests[family](values, order, format);
    }

    private static RoundedMoments Round(string family, string parameters, BinaryFormat format) =>
        MomentRounding.Round(Request(family, parameters, format).Construct(default), format, default);

    private static double Number(string text) => text switch
    {
        "inf" => double.PositiveInfinity,
        "-inf" => double.NegativeInfinity,
        _ => double.Parse(text, CultureInfo.InvariantCulture),
    };

    private static IReadOnlyList<RealNumber> Values(MomentTable table, string list) =>
        list == "Raw" ? table.Raw : list == "Central" ? table.Central : table.Absolute;

    private static IReadOnlyList<RoundedValue> Values(RoundedMoments table, string list) =>
        list == "Raw" ? table.Raw : list == "Central" ? table.Central : table.Absolute;
}
