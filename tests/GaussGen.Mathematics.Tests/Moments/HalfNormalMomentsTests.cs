using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class HalfNormalMomentsTests
{
    [Fact]
    public void Low_moments_are_the_published_ones()
    {
        // Leone, Nelson and Nottingham 1961, "The folded normal distribution" (recalled, recomputed): mean √(2/π), variance 1 − 2/π,
        // third central moment √(2/π)(4/π − 1), fourth 3 − 4/π − 12/π², for scale 1.
        MomentTable table = new HalfNormalMomentsRequest(1, 4, BinaryFormat.Binary64).Construct(default);
        Ball inverse = Ball.Divide(Ball.FromInteger(1), Constants.Pi(400), 400);
        Ball root = Ball.Sqrt(inverse.ScaleByPowerOfTwo(1), 400);
        AssertSame(root, table.Raw[1]);
        AssertSame(Sum((1, Ball.FromInteger(1)), (-2, inverse)), table.Central[2]);
        AssertSame(Ball.Multiply(root, Sum((4, inverse), (-1, Ball.FromInteger(1))), 400), table.Central[3]);
        AssertSame(Sum((3, Ball.FromInteger(1)), (-4, inverse), (-12, Ball.Square(inverse, 400))), table.Central[4]);
    }

    [Fact]
    public void Even_raw_moments_are_exact_and_odd_ones_are_not()
    {
        MomentTable table = new HalfNormalMomentsRequest(0.5, HalfNormalMomentsRequest.LargestOrder, BinaryFormat.Binary64).Construct(default);
        MomentTable normal = new NormalMomentsRequest(0, 0.5, HalfNormalMomentsRequest.LargestOrder, BinaryFormat.Binary64).Construct(default);
        for (int k = 0; k <= HalfNormalMomentsRequest.LargestOrder; k++)
        {
            Assert.Equal((k & 1) == 0 ? normal.Raw[k].ExactValue : null, table.Raw[k].ExactValue);
        }
    }

    [Theory]
    [InlineData(5e-324)]
    [InlineData(1.0)]
    [InlineData(1e300)]
    public void The_highest_order_is_reached(double scale)
    {
        MomentTable table = new HalfNormalMomentsRequest(scale, HalfNormalMomentsRequest.LargestOrder, BinaryFormat.Binary64).Construct(default);
        RoundedMoments rounded = MomentRounding.Round(table, BinaryFormat.Binary64, default);
        Assert.Equal(201, rounded.Central.Count);
        // 199!! = 6.7e186; (1e300)² is too large.
        Assert.Equal(scale == 1e300 ? 2 : null, rounded.FirstOverflow);
        Assert.Equal(scale < 1 ? 0.0 : scale > 1 ? double.PositiveInfinity : 6.6663086700729537e186, BitConverter.UInt64BitsToDouble(rounded.Raw[200].Bits));
    }

    [Theory]
    [InlineData(0.0, 4, "scale")]
    [InlineData(-1.0, 4, "scale")]
    [InlineData(double.NaN, 4, "scale")]
    [InlineData(double.PositiveInfinity, 4, "scale")]
    [InlineData(1.0, -1, "maximumOrder")]
    [InlineData(1.0, 201, "maximumOrder")]
    public void Parameters_outside_their_range_are_refused(double scale, int order, string parameter) => Assert.Equal(
        parameter, Assert.Throws<ArgumentOutOfRangeException>(() => new HalfNormalMomentsRequest(scale, order, BinaryFormat.Binary64)).ParamName);

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new HalfNormalMomentsRequest(0.25, 4, BinaryFormat.Binary64);
        Assert.Equal(request, new HalfNormalMomentsRequest(0.25, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new HalfNormalMomentsRequest(0.25, 4, BinaryFormat.Binary32));
        Assert.Equal("Moments to order 4 of the half-normal distribution with scale 0.25", request.Claim);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));
    }

    private static Ball Sum(params (int Factor, Ball Value)[] terms)
    {
        Ball sum = default;
        foreach ((int factor, Ball value) in terms)
        {
            sum = Ball.Add(sum, Ball.Multiply(value, Ball.FromInteger(factor), 400), 400);
        }

        return sum;
    }

    private static void AssertSame(Ball expected, RealNumber actual)
    {
        Ball ball = actual.Enclose(200, default);
        Assert.True(Ball.Subtract(expected, ball, 400).ContainsZero, ball + " is not " + expected);
        Assert.True(ball.RelativeAccuracyBits > 190);
    }
}
