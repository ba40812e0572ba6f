using System;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class TruncatedNormalMomentsTests
{
    private const double Infinity = double.PositiveInfinity;

    // The inverse Mills ratio φ(a)/(1 − Φ(a)), the mean above a (Tallis 1961; recalled), by mpmath at 60 digits.
    [Theory]
    [InlineData(0.0, "0.797884560802865355879892119868763736951717262329869315331852")]
    [InlineData(1.0, "1.52513527616098120908909053639057871330711636492060333554631")]
    [InlineData(8.0, "8.12136811223611268065352023890551465386151957325492911766945")]
    [InlineData(30.0, "30.0332596674336770370711241000122514746395604087876157517489")]
    public void The_mean_above_an_end_is_the_inverse_Mills_ratio(double end, string value)
    {
        (Rational low, Rational high) = DecimalText.Interval(value);
        Ball mean = Construct(0, 1, end, Infinity, 1).Raw[1].Enclose(160, default);
        Assert.True(mean.Lower.ToRational() <= high && low <= mean.Upper.ToRational(), mean + " is not " + value);
        Ball below = Construct(0, 1, -Infinity, -end, 1).Raw[1].Enclose(160, default);
        Assert.True(below.Lower.ToRational() <= -low && -high <= below.Upper.ToRational());
    }

    [Theory]
    [InlineData(0.0, 1.0, -1.0, 2.0)]
    [InlineData(0.0, 1.0, 30.0, Infinity)]
    [InlineData(0.1, 0.3, 8.1, 8.1009765625)]
    [InlineData(2.0, 5.0, -Infinity, 3.0)]
    public void Raw_moments_satisfy_the_recurrence_of_integration_by_parts(double m, double s, double a, double b)
    {
        // With both ends (Tallis 1961; here from ∫ (x^(k−1) (x − a)(x − b) φ)′ = 0, in which no density at an end is left):
        // E (k−1) X^(k−2) q + X^(k−1) q′ = E X^(k−1) q (X − m)/s² for q = (X − a)(X − b); q = X − a, X − b with one end.
        const int Order = 24;
        MomentTable table = Construct(m, s, a, b, Order);
        Ball[] raw = [.. table.Raw.Select(value => value.Enclose(2000, default))];
        Rational[] q = double.IsInfinity(a) ? [-Rational.FromDouble(b), 1]
            : double.IsInfinity(b) ? [-Rational.FromDouble(a), 1]
            : [Rational.FromDouble(a) * Rational.FromDouble(b), -Rational.FromDouble(a) - Rational.FromDouble(b), 1];
        for (int k = 1; k + q.Length < Order; k++)
        {
            Ball sum = default;
            for (int j = 0; j < q.Length; j++)
            {
                Rational precise = Rational.One / Rational.FromDouble(s).Pow(2);
                Add(ref sum, raw[k + j], -q[j] * precise);
                Add(ref sum, raw[k + j - 1], q[j] * precise * Rational.FromDouble(m));
                Add(ref sum, k + j >= 2 ? raw[k + j - 2] : default, q[j] * (k - 1 + j));
            }

            Assert.True(sum.ContainsZero, $"order {k}: {sum}");
            Assert.True(raw[k].RelativeAccuracyBits > 1500);
        }
    }

    [Theory]
    [InlineData(0.0, 1.0, -1.0, 2.0)]
    [InlineData(0.0, 1.0, 8.0, Infinity)]
    [InlineData(1.5, 0.25, -Infinity, 1.75)]
    [InlineData(0.0, 1.0, 1.0, 1.0000000000000002)]
    public void Central_moments_are_the_binomial_sums_of_the_raw_ones(double m, double s, double a, double b)
    {
        const int Order = 20, Precision = 4000;
        MomentTable table = Construct(m, s, a, b, Order);
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
            Assert.True(Ball.Subtract(sum, central, Precision).ContainsZero, $"order {k}");
            Assert.True((k & 1) != 0 || central.RelativeAccuracyBits >= 200);
        }
    }

    [Theory]
    [InlineData(0.0, 1.0, -1.0, 2.0)]
    [InlineData(0.0, 1.0, -3.0, Infinity)]
    [InlineData(0.0, 1.0, 30.0, 30.5)]
    [InlineData(4.0, 3.0, -50.0, 5.0)]
    public void Absolute_moments_are_log_convex_and_above_the_central_ones(double m, double s, double a, double b)
    {
        // Lyapunov 1901: E |Y|^k is log-convex in k; strictly for what is not a single value.
        MomentTable table = Construct(m, s, a, b, 30);
        Ball[] absolute = [.. table.Absolute.Select(value => value.Enclose(256, default))];
        for (int k = 1; k < 30; k++)
        {
            Assert.Equal(Trilean.True, Ball.IsLess(Ball.Square(absolute[k], 512), Ball.Multiply(absolute[k - 1], absolute[k + 1], 512)));
            Assert.True((k & 1) == 0 || Ball.IsLess(table.Central[k].Enclose(256, default).Abs(), absolute[k]) == Trilean.True);
        }
    }

    [Theory]
    [InlineData(0.0, 1.0, -1.0, 2.0)]
    [InlineData(1.5, 0.25, 1.0, Infinity)]
    [InlineData(0.0, 1.0, 8.0, 9.0)]
    public void A_mirrored_distribution_has_the_mirrored_moments(double m, double s, double a, double b)
    {
        RoundedMoments one = Round(Construct(m, s, a, b, 12)), other = Round(Construct(-m, s, -b, -a, 12));
        for (int k = 0; k <= 12; k++)
        {
            bool isOdd = (k & 1) != 0;
            Assert.Equal(isOdd ? BinaryFormat.Binary64.Negate(one.Raw[k].Bits) : one.Raw[k].Bits, other.Raw[k].Bits);
            Assert.Equal(isOdd ? BinaryFormat.Binary64.Negate(one.Central[k].Bits) : one.Central[k].Bits, other.Central[k].Bits);
            Assert.Equal(one.Absolute[k].Bits, other.Absolute[k].Bits);
        }
    }

    [Fact]
    public void Rational_moments_are_known_exactly()
    {
        // An interval symmetric about the mean: E X = m, odd central moments 0.
        MomentTable symmetric = Construct(1.1, 0.7, 1.1 - 1, 1.1 + 1, 9);
        Assert.Equal(Rational.FromDouble(1.1), symmetric.Raw[1].ExactValue);
        // About zero all odd raw moments are 0 too.
        MomentTable even = Construct(0, 3, -2, 2, 9);
        for (int k = 1; k <= 9; k++)
        {
            Assert.Equal((k & 1) != 0 ? Rational.Zero : null, symmetric.Central[k].ExactValue);
            Assert.Equal((k & 1) != 0 ? Rational.Zero : null, even.Raw[k].ExactValue);
        }

        // From the mean 0 on, even moments are those of the whole line, 0 aside.
        MomentTable half = Construct(0, 3, 0, Infinity, 6);
        Assert.Equal([Rational.One, null, 9, null, 243, null, 10935], half.Raw.Select(value => value.ExactValue));
        // ∫ x² φ from −m to ∞ has no part with the density at the end: E X² = m² + s².
        MomentTable chance = Construct(1.5, 0.5, -1.5, Infinity, 3);
        Assert.Equal(new Rational(5, 2), chance.Raw[2].ExactValue);
        Assert.Null(chance.Raw[1].ExactValue);
        Assert.Null(chance.Raw[3].ExactValue);
        Assert.Equal(2.5, BitConverter.UInt64BitsToDouble(Round(chance).Raw[2].Bits));
    }

    [Fact]
    public void A_half_line_from_the_mean_is_the_half_normal_distribution()
    {
        MomentTable line = Construct(0, 0.3, 0, Infinity, 40);
        MomentTable half = new HalfNormalMomentsRequest(0.3, 40, BinaryFormat.Binary64).Construct(default);
        RoundedMoments first = Round(line), second = Round(half);
        Assert.Equal(second.Raw.Select(v => v.Bits), first.Raw.Select(v => v.Bits));
        Assert.Equal(second.Central, first.Central);
        Assert.Equal(second.Absolute, first.Absolute);
    }

    [Fact]
    public void A_vast_interval_has_the_moments_of_the_whole_line()
    {
        RoundedMoments vast = Round(Construct(1.5, 0.25, -1e10, 1e20, 12));
        RoundedMoments line = Round(new NormalMomentsRequest(1.5, 0.25, 12, BinaryFormat.Binary64).Construct(default));
        Assert.Equal(line.Raw.Select(v => v.Bits), vast.Raw.Select(v => v.Bits));
        Assert.Equal(line.Absolute.Select(v => v.Bits), vast.Absolute.Select(v => v.Bits));
        // The odd central ones are not zero, but far below the smallest number.
        Assert.Equal(line.Central.Select(v => v.Bits), vast.Central.Select(v => v.Bits));
    }

    [Theory]
    [InlineData(0.0, 1.0, 37.5, Infinity)]
    [InlineData(0.0, 1.0, -Infinity, -37.5)]
    [InlineData(0.0, 1.0, 36.0, 40.0)]
    [InlineData(0.0, 1.0, -40.0, 41.0)]
    [InlineData(0.0, 1e300, -1e300, 1.5e300)]
    [InlineData(1e300, 1e-300, -Infinity, 1e300)]
    [InlineData(1e-300, 5e-324, 0.0, 1e300)]
    [InlineData(0.0, 1.0, 0.0, 1e-300)]
    [InlineData(-3.0, 1e-10, -3.0000000001, -2.9999999998)]
    [InlineData(0.0, 1.0, -1e-5, 3.0)]
    public void The_highest_order_is_reached_at_the_ends_of_the_ranges(double m, double s, double a, double b)
    {
        RoundedMoments moments = Round(Construct(m, s, a, b, TruncatedNormalMomentsRequest.LargestOrder));
        Assert.Equal(101, moments.Absolute.Count);
        double mean = BitConverter.UInt64BitsToDouble(moments.Raw[1].Bits);
        Assert.InRange(mean, a, b);
        for (int k = 2; k <= 100; k += 2)
        {
            Assert.False(BinaryFormat.Binary64.IsNegative(moments.Raw[k].Bits) || BinaryFormat.Binary64.IsNegative(moments.Central[k].Bits));
        }
    }

    [Theory]
    [InlineData(0.0, 1.0, 37.51, Infinity, true)]
    [InlineData(0.0, 1.0, 37.52, Infinity, false)]
    [InlineData(10.0, 2.0, -Infinity, -65.04, false)]
    [InlineData(10.0, 2.0, -Infinity, -65.02, true)]
    [InlineData(0.0, 1.0, 0.0, 5e-324, false)]
    [InlineData(0.0, 1e-300, 1.0, 2.0, false)]
    [InlineData(1e300, 1.0, -1.0, 1.0, false)]
    public void An_interval_without_enough_probability_is_refused(double m, double s, double a, double b, bool isEnough)
    {
        // Q(37.52) < 2^−1022 < Q(37.51), as for the rules.
        if (isEnough)
        {
            Assert.Equal(3, Construct(m, s, a, b, 2).Raw.Count);
            return;
        }

        var failure = Assert.Throws<RuleConstructionException>(() => Construct(m, s, a, b, 2));
        Assert.Equal(RuleFailure.MassTooSmall, failure.Failure);
        Assert.Contains("wider or nearer", failure.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN, 1.0, 0.0, 1.0, 4, "mean")]
    [InlineData(Infinity, 1.0, 0.0, 1.0, 4, "mean")]
    [InlineData(0.0, 0.0, 0.0, 1.0, 4, "standardDeviation")]
    [InlineData(0.0, -1.0, 0.0, 1.0, 4, "standardDeviation")]
    [InlineData(0.0, Infinity, 0.0, 1.0, 4, "standardDeviation")]
    [InlineData(0.0, 1.0, 1.0, 1.0, 4, "upper")]
    [InlineData(0.0, 1.0, 2.0, 1.0, 4, "upper")]
    [InlineData(0.0, 1.0, 0.0, -0.0, 4, "upper")]
    [InlineData(0.0, 1.0, double.NaN, 1.0, 4, "upper")]
    [InlineData(0.0, 1.0, double.NegativeInfinity, Infinity, 4, "upper")]
    [InlineData(0.0, 1.0, 0.0, 1.0, -1, "maximumOrder")]
    [InlineData(0.0, 1.0, 0.0, 1.0, 101, "maximumOrder")]
    public void Parameters_outside_their_range_are_refused(double m, double s, double a, double b, int order, string parameter) =>
        Assert.Equal(parameter, Assert.Throws<ArgumentOutOfRangeException>(
            () => new TruncatedNormalMomentsRequest(m, s, a, b, order, BinaryFormat.Binary64)).ParamName);

    [Fact]
    public void The_whole_line_is_pointed_to_the_normal_moments() => Assert.Contains(
        "use NormalMoments",
        Assert.Throws<ArgumentOutOfRangeException>(
            () => new TruncatedNormalMomentsRequest(0, 1, -Infinity, Infinity, 4, BinaryFormat.Binary64)).Message,
        StringComparison.Ordinal);

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new TruncatedNormalMomentsRequest(0.0, 2.0, 0.0, Infinity, 4, BinaryFormat.Binary64);
        Assert.Equal(request, new TruncatedNormalMomentsRequest(-0.0, 2.0, -0.0, Infinity, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new TruncatedNormalMomentsRequest(0.0, 2.0, 0.0, 7.0, 4, BinaryFormat.Binary64));
        Assert.Equal(
            "Moments to order 4 of the normal distribution with mean 0.0 and standard deviation 2.0 truncated to between 0.0 and ∞", request.Claim);
    }

    [Fact]
    public void A_cancelled_token_stops_the_work()
    {
        var cancelled = new CancellationToken(canceled: true);
        MomentTable table = Construct(0, 1, 8, Infinity, 10);
        foreach (RealNumber number in new[] { table.Raw[3], table.Central[3], table.Absolute[3] })
        {
            Assert.ThrowsAny<OperationCanceledException>(() => number.Enclose(128, cancelled));
        }

        MomentRequest request = new TruncatedNormalMomentsRequest(0, 1, 8, Infinity, 4, BinaryFormat.Binary64);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(cancelled));
    }

    private static void Add(ref Ball sum, Ball value, Rational factor) =>
        sum = Ball.Add(sum, Ball.Multiply(value, Ball.FromRational(factor, 2000), 2000), 2000);

    private static MomentTable Construct(double m, double s, double a, double b, int order) =>
        new TruncatedNormalMomentsRequest(m, s, a, b, order, BinaryFormat.Binary64).Construct(default);

    private static RoundedMoments Round(MomentTable table) => MomentRounding.Round(table, BinaryFormat.Binary64, default);
}
