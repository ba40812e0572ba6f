using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class LogNormalMomentsTests
{
    // Aitchison and Brown 1957, 2.3 (recalled, recomputed): E X = e^(m+s²/2), variance (e^s² − 1) e^(2m+s²),
    // third central moment (e^s² + 2)(e^s² − 1)^2 e^(3m+3s²/2), fourth (q − 1)^2 (q⁴ + 2q³ + 3q² − 3) e^(4m+2s²).
    [Theory]
    [InlineData(0.0, 1.0)]
    [InlineData(-1.25, 0.375)]
    [InlineData(3.0, 0.001)]
    [InlineData(0.0, 8.0)]
    public void Low_moments_are_the_published_ones(double logMean, double logStandardDeviation)
    {
        MomentTable table = Construct(logMean, logStandardDeviation, 4);
        Ball square = Ball.FromRational(Rational.FromDouble(logStandardDeviation).Pow(2), 400);
        Ball q = Elementary.Exp(square, 400);
        Ball mean = Elementary.Exp(Ball.Add(Ball.FromRational(Rational.FromDouble(logMean), 400), square.ScaleByPowerOfTwo(-1), 400), 400);
        Ball less = Ball.Subtract(q, Ball.FromInteger(1), 400);
        Ball fourth = Ball.Subtract(
            Ball.Add(Ball.Add(q.Pow(4, 400), Times(q.Pow(3, 400), 2), 400), Times(q.Pow(2, 400), 3), 400), Ball.FromInteger(3), 400);
        AssertSame(mean, table.Raw[1]);
        AssertSame(Ball.Multiply(less, mean.Pow(2, 400), 400), table.Central[2]);
        AssertSame(
            Ball.Multiply(Ball.Multiply(Ball.Add(q, Ball.FromInteger(2), 400), less.Pow(2, 400), 400), mean.Pow(3, 400), 400), table.Central[3]);
        AssertSame(Ball.Multiply(Ball.Multiply(fourth, less.Pow(2, 400), 400), mean.Pow(4, 400), 400), table.Central[4]);
    }

    [Theory]
    [InlineData(5e-324)]
    [InlineData(1e-200)]
    [InlineData(1e-18)]
    [InlineData(1e-6)]
    public void With_a_small_deviation_the_moments_are_those_of_the_normal_distribution(double s)
    {
        // X = e^(sZ): E (X − M)^k / s^k → (k−1)!! for even k, E |X − M|^k / s^k → 2^j j! √(2/π) for k = 2j + 1, E (X − M)³ / s⁴ → 3.
        MomentTable table = Construct(0, s, 9);
        Rational unit = Rational.FromDouble(s);
        Ball root = Ball.Sqrt(Ball.Divide(Ball.FromInteger(2), Constants.Pi(200), 200), 200);
        AssertNear(table.Central[2], Ball.FromInteger(1), unit.Pow(2), s);
        AssertNear(table.Central[3], Ball.FromInteger(3), unit.Pow(4), s);
        AssertNear(table.Central[8], Ball.FromInteger(105), unit.Pow(8), s);
        AssertNear(table.Absolute[1], root, unit, s);
        AssertNear(table.Absolute[9], Times(root, 384), unit.Pow(9), s);
    }

    [Fact]
    public void The_two_ways_to_the_absolute_moments_agree()
    {
        // Order 2 takes the series at s = 1 and order 3 the differences; between them they share the odd moment of order 1. Longer lists likewise.
        foreach ((double s, int few, int many) in new[] { (1.0, 1, 3), (0.125, 15, 19), (0.0625, 31, 35), (0.04, 49, 53) })
        {
            Assert.True(s * few <= 2 && s * many > 2);
            MomentTable series = Construct(0.5, s, few), differences = Construct(0.5, s, many);
            for (int k = 1; k <= few; k += 2)
            {
                Ball left = series.Absolute[k].Enclose(200, default), right = differences.Absolute[k].Enclose(200, default);
                Assert.True(Ball.Subtract(left, right, 400).ContainsZero, $"order {k} of s = {s}: {left} and {right}");
                Assert.True(left.RelativeAccuracyBits > 190 && right.RelativeAccuracyBits > 190);
            }
        }
    }

    [Fact]
    public void Central_moments_are_the_binomial_sums_of_the_raw_ones()
    {
        const int Order = 30, Precision = 700;
        MomentTable table = Construct(-0.25, 0.03125, Order);
        Ball mean = table.Raw[1].Enclose(Precision, default);
        for (int k = 2; k <= Order; k++)
        {
            Ball sum = default;
            BigInteger binomial = 1;
            for (int j = 0; j <= k; j++)
            {
                Ball term = Ball.Multiply(table.Raw[j].Enclose(Precision, default), Ball.Negate(mean).Pow(k - j, Precision), Precision);
                sum = Ball.Add(sum, Ball.Multiply(term, Ball.FromInteger(binomial), Precision), Precision);
                binomial = binomial * (k - j) / (j + 1);
            }

            Ball central = table.Central[k].Enclose(200, default);
            Assert.True(Ball.Subtract(sum, central, Precision).ContainsZero);
            Assert.True(central.RelativeAccuracyBits > 190);
        }
    }

    [Fact]
    public void A_raw_moment_that_is_one_is_known_exactly()
    {
        // m = −s²/2 makes E X = 1; E X² = exp(s²) is not rational.
        MomentTable table = Construct(-0.125, 0.5, 2);
        Assert.Equal(Rational.One, table.Raw[1].ExactValue);
        Assert.Null(table.Raw[2].ExactValue);
    }

    [Theory]
    [InlineData(0.0, 1.0, 100, 38)]
    [InlineData(0.0, 0.37, 100, null)]
    [InlineData(709.0, 0.5, 2, 2)]
    [InlineData(0.0, 50.0, 3, 1)]
    [InlineData(-1e300, 1e-300, 100, null)]
    [InlineData(-1e6, 1.0, 100, null)]
    public void Overflow_is_found_and_underflow_is_zero(double logMean, double logStandardDeviation, int order, int? expected)
    {
        // exp(k²/2) exceeds 2^1024 from k = 38 on: 38² > 2·709.79; 1.37·10^3/2 < 709 for k s = 37.
        RoundedMoments rounded = MomentRounding.Round(Construct(logMean, logStandardDeviation, order), BinaryFormat.Binary64, default);
        Assert.Equal(expected, rounded.FirstOverflow);
        Assert.True(logMean > -1e5 || rounded.Raw[order].Bits == 0);
    }

    [Theory]
    [InlineData(0.0, 1e10, 2)]
    [InlineData(1e300, 1.0, 1)]
    [InlineData(0.0, 1e300, 100)]
    [InlineData(-1e300, 1e200, 2)]
    public void What_no_format_could_hold_is_refused(double logMean, double logStandardDeviation, int order)
    {
        var failure = Assert.Throws<RuleConstructionException>(() => Construct(logMean, logStandardDeviation, order));
        Assert.Equal(RuleFailure.MomentNotRepresentable, failure.Failure);
        Assert.Contains("lower order", failure.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN, 1.0, 4, "logMean")]
    [InlineData(double.PositiveInfinity, 1.0, 4, "logMean")]
    [InlineData(0.0, 0.0, 4, "logStandardDeviation")]
    [InlineData(0.0, -1.0, 4, "logStandardDeviation")]
    [InlineData(0.0, double.NaN, 4, "logStandardDeviation")]
    [InlineData(0.0, double.PositiveInfinity, 4, "logStandardDeviation")]
    [InlineData(0.0, 1.0, -1, "maximumOrder")]
    [InlineData(0.0, 1.0, 101, "maximumOrder")]
    public void Parameters_outside_their_range_are_refused(double logMean, double logStandardDeviation, int order, string parameter) =>
        Assert.Equal(parameter, Assert.Throws<ArgumentOutOfRangeException>(
            () => new LogNormalMomentsRequest(logMean, logStandardDeviation, order, BinaryFormat.Binary64)).ParamName);

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new LogNormalMomentsRequest(0.0, 0.5, 4, BinaryFormat.Binary64);
        Assert.Equal(request, new LogNormalMomentsRequest(-0.0, 0.5, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new LogNormalMomentsRequest(0.0, 0.5, 5, BinaryFormat.Binary64));
        Assert.Equal("Moments to order 4 of the log-normal distribution with log-mean 0.0 and log-standard-deviation 0.5", request.Claim);
    }

    [Fact]
    public void A_cancelled_token_stops_the_work()
    {
        var cancelled = new CancellationToken(canceled: true);
        MomentTable table = Construct(0, 0.5, 10);
        Assert.ThrowsAny<OperationCanceledException>(() => table.Central[5].Enclose(128, cancelled));
        Assert.ThrowsAny<OperationCanceledException>(() => table.Absolute[5].Enclose(128, cancelled));
        Assert.ThrowsAny<OperationCanceledException>(() => new LogNormalMomentsRequest(0, 1, 3, BinaryFormat.Binary64).Construct(cancelled));
    }

    private static MomentTable Construct(double logMean, double logStandardDeviation, int order) =>
        new LogNormalMomentsRequest(logMean, logStandardDeviation, order, BinaryFormat.Binary64).Construct(default);

    private static Ball Times(Ball value, int factor) => Ball.Multiply(value, Ball.FromInteger(factor), 400);

    private static void AssertSame(Ball expected, RealNumber actual)
    {
        Ball ball = actual.Enclose(200, default);
        Assert.True(Ball.Subtract(expected, ball, 400).ContainsZero, ball + " is not " + expected);
        Assert.True(ball.RelativeAccuracyBits > 190);
    }

    /// <summary>That a moment is a limit times a power of s, but for a few times s relative to it.</summary>
    private static void AssertNear(RealNumber moment, Ball limit, Rational power, double s)
    {
        Ball ratio = Ball.Divide(moment.Enclose(200, default), Ball.Multiply(limit, Ball.FromRational(power, 200), 200), 200);
        Rational distance = Rational.FromDouble(s) * 100 + Rational.Pow(2, -150);
        Assert.True(ratio.Lower.ToRational() > 1 - distance && ratio.Upper.ToRational() < 1 + distance, ratio.ToString());
    }
}
