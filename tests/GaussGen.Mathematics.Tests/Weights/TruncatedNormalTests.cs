using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Weights;

public class TruncatedNormalTests
{
    private const double Infinity = double.PositiveInfinity;

    public static IEnumerable<object[]> Intervals() => new (double, double)[]
    {
        (0, Infinity), (8, Infinity), (37, Infinity), (-Infinity, -8), (-Infinity, 2), (-1, Infinity), (-6, Infinity), (-20, Infinity), (-1, 2),
        (-3, -2.5), (36, 38), (-40, 40), (-2, 2), (0, 30), (8, 8 + Math.ScaleB(1, -10)), (-2, 8), (8, 20), (4, 6), (30, 30.5), (1, Math.BitIncrement(1)),
        (1e-300, 1e300), (-1e300, 1e-5), (0, 1e-307), (-0.1, 0.1), (-1e-5, 3),
    }.Select(ends => new object[] { ends.Item1, ends.Item2 });

    [Theory]
    [MemberData(nameof(Intervals))]
    public void Moments_about_different_centres_agree_and_are_as_narrow_as_was_asked(double a, double b)
    {
        // M₂ about c + d from the moments about c by the binomial theorem, and the same for M₁₀.
        const int Count = 12, Precision = 150;
        Dyadic? lower = End(a), upper = End(b);
        Dyadic first = TruncatedCentre.Choose(lower, upper, 5), second = TruncatedCentre.Choose(lower, upper, 40);
        Ball[] here = TruncatedMoments.About(lower, upper, first, Count, Precision, default);
        Ball[] there = TruncatedMoments.About(lower, upper, second, Count, Precision, default);
        Ball shift = Ball.FromDyadic(first - second);
        for (int k = 0; k < Count; k++)
        {
            Ball sum = default;
            long binomial = 1;
            for (int j = 0; j <= k; j++)
            {
                Ball term = Ball.Multiply(here[k - j], Ball.Pow(shift, j, 600), 600);
                sum = Ball.Add(sum, Ball.Multiply(term, Ball.FromInteger(binomial), 600), 600);
                binomial = binomial * (k - j) / (j + 1);
            }

            Assert.True(Ball.Subtract(sum, there[k], 600).ContainsZero, $"moment {k} on [{a}, {b}]");
            Assert.True((k & 1) != 0 || there[k].RelativeAccuracyBits >= Precision, $"{there[k].RelativeAccuracyBits} bits of moment {k} on [{a}, {b}]");
        }
    }

    [Fact]
    public void Both_ways_of_the_recurrence_agree()
    {
        // Finite intervals in which neither way is hopeless: the plan picks one, a mass of a ball about the end the other.
        foreach ((double a, double b) in new[] { (-1.0, 2.0), (0.5, 3), (-4, 4), (1, 9) })
        {
            Ball[] whole = TruncatedMoments.About(End(a), End(b), new Dyadic(1, 0), 30, 128, default);
            Ball[] left = TruncatedMoments.About(End(a), End(b / 2), new Dyadic(1, 0), 30, 128, default);
            Ball[] right = TruncatedMoments.About(End(b / 2), null, new Dyadic(1, 0), 30, 128, default);
            Ball[] beyond = TruncatedMoments.About(End(b), null, new Dyadic(1, 0), 30, 128, default);
            for (int k = 0; k < 30; k++)
            {
                Ball sum = Ball.Subtract(Ball.Add(left[k], right[k], 400), beyond[k], 400);
                Assert.True(Ball.Subtract(sum, whole[k], 400).ContainsZero, $"moment {k} on [{a}, {b}]");
            }
        }
    }

    [Theory]
    [InlineData(0.0, "0")]
    [InlineData(1.0, "0.855624391892148803173304620280045061226414285091")]
    [InlineData(-1.0, "-0.855624391892148803173304620280045061226414285091")]
    [InlineData(8.0, "1.25331413731549869184431555896949339613696315113719")]
    [InlineData(50.0, "1.253314137315500251207882642405522626503493370304969158")]
    public void The_normal_integral_is_that_of_mpmath(double x, string value)
    {
        // √(π/2) erf(x/√2) by mpmath at 60 digits.
        foreach (int precision in new[] { 64, 128, 1000 })
        {
            Ball ball = NormalIntegral.FromZero(Approximation.FromDouble(x), precision, default);
            (Rational low, Rational high) = DecimalText.Interval(value);
            Assert.True(ball.Lower.ToRational() <= high && low <= ball.Upper.ToRational(), ball + " is not " + value);
            Assert.True(ball.RelativeAccuracyBits >= precision - 2);
        }
    }

    [Theory]
    [MemberData(nameof(Intervals))]
    public void Nodes_lie_in_the_interval_and_weights_sum_to_one(double a, double b)
    {
        foreach (int points in new[] { 1, 2, 6, 17 })
        {
            var request = new GaussTruncatedNormalRequest(points, a, b, BinaryFormat.Binary64, false);
            RoundedRule rule = RuleRounding.Round(request.Construct(default), request.Format, false, default);
            double[] nodes = [.. rule.Nodes.Select(v => BitConverter.UInt64BitsToDouble(v.Bits))];

            Assert.All(nodes, node => Assert.InRange(node, a, b));
            Assert.All(Enumerable.Range(1, points - 1), i => Assert.True(nodes[i - 1] <= nodes[i]));
            Assert.Equal(1, rule.Weights.Sum(v => BitConverter.UInt64BitsToDouble(v.Bits)), 1e-14);
        }
    }

    [Fact]
    public void A_mirrored_interval_has_the_mirrored_rule()
    {
        foreach ((double a, double b) in new[] { (8, Infinity), (-1, 2.0), (-3, Infinity), (36, 38) })
        {
            RuleTable rule = new GaussTruncatedNormalRequest(7, a, b, BinaryFormat.Binary64, false).Construct(default);
            RuleTable mirrored = new GaussTruncatedNormalRequest(7, -b, -a, BinaryFormat.Binary64, false).Construct(default);
            RoundedRule first = RuleRounding.Round(rule, BinaryFormat.Binary64, false, default);
            RoundedRule second = RuleRounding.Round(mirrored, BinaryFormat.Binary64, false, default);

            Assert.Equal(first.Nodes.Select(v => BinaryFormat.Binary64.Negate(v.Bits)).Reverse(), second.Nodes.Select(v => v.Bits));
            Assert.Equal(first.Weights.Select(v => v.Bits).Reverse(), second.Weights.Select(v => v.Bits));
        }
    }

    [Fact]
    public void The_half_line_from_zero_is_the_half_range_rule_and_a_vast_interval_the_whole_line()
    {
        AssertSame(new GaussTruncatedNormalRequest(20, 0, Infinity, BinaryFormat.Binary64, false), new GaussHalfRangeHermiteRequest(20, BinaryFormat.Binary64, false));
        AssertSame(
            new GaussTruncatedNormalRequest(20, -1e10, 1e10, BinaryFormat.Binary64, false),
            new GaussHermiteRequest(20, HermiteConvention.Probabilist, BinaryFormat.Binary64, false));
    }

    [Fact]
    public void A_node_far_below_all_others_is_rounded_with_proof()
    {
        // On [−20, ∞) the rule with five nodes has one at about 10^−87: the moments miss those of the whole line by so much.
        RuleTable table = new GaussTruncatedNormalRequest(5, -20, Infinity, BinaryFormat.Binary64, false).Construct(default);
        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary64, false, default);

        Assert.InRange(BitConverter.UInt64BitsToDouble(rule.Nodes[2].Bits), 1e-88, 1e-78);
        Assert.True(rule.Nodes[2].EnclosureWidthLog2 < 0);
    }

    // Q(37.52) = 2.17e-308 and Q(37.51) = 3.16e-308 on the two sides of 2^−1022 = 2.225e-308 (mpmath); 5e-324/√(2π) and 1e-307/√(2π) likewise.
    [Theory]
    [InlineData(37.51, Infinity, true)]
    [InlineData(37.52, Infinity, false)]
    [InlineData(-Infinity, -37.51, true)]
    [InlineData(-Infinity, -38, false)]
    [InlineData(39.5, Infinity, false)]
    [InlineData(1e300, Infinity, false)]
    [InlineData(1e300, 1e301, false)]
    [InlineData(-1e300, -40, false)]
    [InlineData(0, 5e-324, false)]
    [InlineData(0, 1e-307, true)]
    [InlineData(30, 30.000000000000004, true)]
    public void An_interval_without_enough_probability_is_refused(double a, double b, bool isEnough)
    {
        var request = new GaussTruncatedNormalRequest(2, a, b, BinaryFormat.Binary64, false);
        if (isEnough)
        {
            Assert.Equal(2, request.Construct(default).Nodes.Count);
        }
        else
        {
            Assert.Equal(RuleFailure.MassTooSmall, Assert.Throws<RuleConstructionException>(() => request.Construct(default)).Failure);
        }
    }

    [Theory]
    [InlineData(1, 1)]
    [InlineData(2, 1)]
    [InlineData(0, -0.0)]
    [InlineData(double.NaN, 1)]
    [InlineData(1, double.NaN)]
    [InlineData(-Infinity, Infinity)]
    [InlineData(Infinity, Infinity)]
    [InlineData(Infinity, -Infinity)]
    public void What_is_no_interval_is_refused(double a, double b)
    {
        Assert.False(GaussTruncatedNormalRequest.IsInterval(a, b));
        Assert.Throws<ArgumentOutOfRangeException>(() => new GaussTruncatedNormalRequest(5, a, b, BinaryFormat.Binary64, false));
    }

    private static Dyadic? End(double value) => double.IsInfinity(value) ? null : Approximation.FromDouble(value);

    private static void AssertSame(GaussGen.Mathematics.Requests.RuleRequest left, GaussGen.Mathematics.Requests.RuleRequest right)
    {
        RoundedRule first = RuleRounding.Round(left.Construct(default), left.Format, false, default);
        RoundedRule second = RuleRounding.Round(right.Construct(default), right.Format, false, default);
        Assert.Equal(second.Nodes.Select(v => v.Bits), first.Nodes.Select(v => v.Bits));
        Assert.Equal(second.Weights.Select(v => v.Bits), first.Weights.Select(v => v.Bits));
    }
}
