using System;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Weights;

/// <summary>Weights with a recurrence in closed form: it must be that of their moments.</summary>
public class ClosedRecurrenceTests
{
    [Theory]
    [InlineData(0.0)]
    [InlineData(0.25)]
    [InlineData(-0.4375)]
    [InlineData(1000.0)]
    public void The_generalized_Hermite_recurrence_is_that_of_the_moments(double exponent) =>
        AssertSame(new GeneralizedHermiteWeight(Approximation.FromDouble(exponent)), 12, (_, ball) => ball);

    [Theory]
    [InlineData(0.1, 0.4, 9)]
    [InlineData(0, 1, 7)]
    [InlineData(-3, 0.03125, 6)]
    public void The_log_normal_recurrence_is_that_of_the_moments(double mean, double deviation, int points)
    {
        var weight = new LogNormalWeight(Approximation.FromDouble(mean), Approximation.FromDouble(deviation), points);
        // The moments are those of z = 1 + 2^−j y, the recurrence that of y.
        int power = weight.IsGraded ? 0 : -Approximation.FloorLog2(Approximation.FromDouble(deviation));
        AssertSame(weight, points, (isDiagonal, ball) => !isDiagonal
            ? ball.ScaleByPowerOfTwo(2 * power)
            : power == 0 ? ball : Ball.Subtract(ball, Ball.FromInteger(1), 2000).ScaleByPowerOfTwo(power));
    }

    [Theory]
    [InlineData(0.1, 0.4, 44)]
    [InlineData(0, 0.5, 36)]
    [InlineData(0, 1, 19)]
    [InlineData(0, 0.25, 64)]
    [InlineData(0, 2, 9)]
    [InlineData(2, 5, 4)]
    [InlineData(-700, 1e-3, 64)]
    [InlineData(0, 1e-150, 9)]
    [InlineData(1, 1e-300, 33)]
    public void Log_normal_nodes_are_symmetric_in_the_logarithm(double mean, double deviation, int points)
    {
        RuleTable table = new GaussLogNormalRequest(points, mean, deviation, BinaryFormat.Binary64, false).Construct(default);
        Ball scale = Elementary.Exp(Ball.FromRational(
            2 * (Rational.FromDouble(mean) + (Rational.FromDouble(deviation).Pow(2) * new Rational((2 * points) - 1, 2))), 4000), 3000);
        for (int i = 0; i < points; i++)
        {
            Ball product = Ball.Multiply(table.Nodes[i].Enclose(256, default), table.Nodes[points - 1 - i].Enclose(256, default), 3000);
            Assert.True(Ball.Subtract(product, scale, 3000).ContainsZero, $"nodes {i} of {points}");
            Assert.True(product.RelativeAccuracyBits > 80);
        }

        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary64, false, default);
        Assert.Equal(1, rule.Weights.Sum(v => BitConverter.UInt64BitsToDouble(v.Bits)), 1e-14);
    }

    [Fact]
    public void A_middle_node_of_one_is_exact()
    {
        // m + (n − ½) s² = 0 for s = ½: m = −(n − ½)/4.
        foreach (int points in new[] { 1, 3, 9 })
        {
            RuleTable table = new GaussLogNormalRequest(points, -(points - 0.5) / 4, 0.5, BinaryFormat.Binary64, false).Construct(default);
            Assert.Equal(Rational.One, table.Nodes[points / 2].ExactValue);
        }
    }

    [Theory]
    [InlineData(64, 0.1, 0.4, RuleFailure.WeightNotRepresentable)]
    [InlineData(46, 0.1, 0.4, RuleFailure.WeightNotRepresentable)]
    [InlineData(20, 0, 1, RuleFailure.WeightNotRepresentable)]
    [InlineData(2, 0, 1e300, RuleFailure.WeightNotRepresentable)]
    [InlineData(1, 0, 1e300, RuleFailure.NodeNotRepresentable)]
    [InlineData(5, 710, 0.1, RuleFailure.NodeNotRepresentable)]
    [InlineData(5, 709.5, 0.1, RuleFailure.NodeNotRepresentable)]
    [InlineData(5, -709, 0.1, RuleFailure.NodeNotRepresentable)]
    [InlineData(5, -1e308, 0.1, RuleFailure.NodeNotRepresentable)]
    [InlineData(5, 1e308, 0.1, RuleFailure.NodeNotRepresentable)]
    public void Log_normal_rules_out_of_range_are_refused_with_the_reason(int points, double mean, double deviation, RuleFailure failure)
    {
        var request = new GaussLogNormalRequest(points, mean, deviation, BinaryFormat.Binary64, false);
        var exception = Assert.Throws<RuleConstructionException>(
            () => RuleRounding.Round(request.Construct(default), request.Format, false, default));

        Assert.Equal(failure, exception.Failure);
    }

    [Fact]
    public void One_point_of_a_very_wide_log_normal_distribution_is_its_mean()
    {
        // m + s²/2 = 1/2 with s = 2^400, whose square no binary64 product could tell from m.
        RuleTable table = new GaussLogNormalRequest(1, -Math.ScaleB(1, 799), Math.ScaleB(1, 400), BinaryFormat.Binary64, false).Construct(default);
        Assert.Equal(Rational.One, table.Nodes[0].ExactValue);
    }

    [Theory]
    [InlineData(2.5)]
    [InlineData(0.5)]
    [InlineData(1e6)]
    [InlineData(-0.49999999999999994)]
    public void Generalized_Hermite_rules_of_every_size_hold(double exponent)
    {
        foreach (int points in new[] { 1, 2, 3, 4, 15, 64 })
        {
            var request = new GaussGeneralizedHermiteRequest(points, exponent, BinaryFormat.Binary64, false);
            RoundedRule rule = RuleRounding.Round(request.Construct(default), request.Format, false, default);
            double[] nodes = [.. rule.Nodes.Select(v => BitConverter.UInt64BitsToDouble(v.Bits))];
            double[] weights = [.. rule.Weights.Select(v => BitConverter.UInt64BitsToDouble(v.Bits))];

            Assert.Equal(1, weights.Sum(), 1e-14);
            // E x² = μ + ½.
            Assert.True(points == 1 || Math.Abs(nodes.Zip(weights, (x, w) => x * x * w).Sum() - (exponent + 0.5)) <= 1e-12 * (exponent + 0.5) + 1e-30);
        }
    }

    [Fact]
    public void Rational_nodes_and_weights_of_four_points_are_right_though_no_enclosure_tells()
    {
        // μ = 5/2: nodes ±√2, ±√6, weights 3/8 and 1/8.
        var request = new GaussGeneralizedHermiteRequest(4, 2.5, BinaryFormat.Binary64, false);
        RoundedRule rule = RuleRounding.Round(request.Construct(default), request.Format, false, default);

        Assert.Equal([0.125, 0.375, 0.375, 0.125], rule.Weights.Select(v => BitConverter.UInt64BitsToDouble(v.Bits)));
        Assert.Equal([-Math.Sqrt(6), -Math.Sqrt(2), Math.Sqrt(2), Math.Sqrt(6)], rule.Nodes.Select(v => BitConverter.UInt64BitsToDouble(v.Bits)));
    }

    [Fact]
    public void A_node_and_its_weights_that_are_ties_in_binary32_are_recognised()
    {
        // μ + ½ = r² with r = 1 + 2^−24: the nodes of two points are ±r, half-way between two binary32 numbers.
        double r = 1 + Math.ScaleB(1, -24);
        var request = new GaussGeneralizedHermiteRequest(2, (r * r) - 0.5, BinaryFormat.Binary32, false);
        RoundedRule rule = RuleRounding.Round(request.Construct(default), request.Format, false, default);

        Assert.Equal(BitConverter.SingleToUInt32Bits(1f), rule.Nodes[1].Bits);
        Assert.Equal(int.MinValue, rule.Nodes[1].EnclosureWidthLog2);
    }

    [Fact]
    public void Parameters_out_of_range_are_refused()
    {
        BinaryFormat format = BinaryFormat.Binary64;
        foreach (double exponent in new[] { -0.5, -1, double.NaN, double.PositiveInfinity, double.NegativeInfinity, 1e6 + 1 })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussGeneralizedHermiteRequest(5, exponent, format, false));
        }

        foreach (double deviation in new[] { 0, -1, double.NaN, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussLogNormalRequest(5, 0, deviation, format, false));
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => new GaussLogNormalRequest(5, double.NaN, 1, format, false));
        foreach (int points in new[] { 0, 65 })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussLogNormalRequest(points, 0, 1, format, false));
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussGeneralizedHermiteRequest(points, 0, format, false));
            Assert.Throws<ArgumentOutOfRangeException>(() => new GaussTruncatedNormalRequest(points, 0, 1, format, false));
        }

        RuleRequest positive = new GaussGeneralizedHermiteRequest(5, 0.0, format, false);
        Assert.Equal(positive, new GaussGeneralizedHermiteRequest(5, -0.0, format, false));
    }

    private static void AssertSame(WeightFunction weight, int count, Func<bool, Ball, Ball> toCoordinate)
    {
        Recurrence closed = weight.Recurrence(count, 128, default);
        Assert.True(closed.AccuracyBits() >= 128);
        Recurrence? fromMoments = ChebyshevAlgorithm.TryRun(weight.Moments(2 * count, 2000, default), count, weight.IsEven, 2000, default, out _);
        for (int k = 0; k < count; k++)
        {
            Ball diagonal = toCoordinate(true, fromMoments!.Diagonal(k));
            Assert.True(Ball.Subtract(diagonal, closed.Diagonal(k), 2000).ContainsZero, $"a{k}");
            Assert.True(k == 0 || Ball.Subtract(toCoordinate(false, fromMoments.Square(k)), closed.Square(k), 2000).ContainsZero, $"b{k}");
        }
    }
}
