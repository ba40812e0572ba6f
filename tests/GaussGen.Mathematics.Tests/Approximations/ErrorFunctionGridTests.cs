using System;
using System.Threading;
using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Approximations;

public sealed class ErrorFunctionGridTests
{
    private static readonly NormalReference Normal = new(200);

    private static ErrorFunctionGrid Grid => Normal.ErrorFunctions;

    [Fact]
    public void The_chain_of_points_from_28_down_ends_at_one()
    {
        Ball one = Grid.Erfc(Ball.FromInteger(0));
        Assert.True(one.Contains(new Dyadic(1, 0)));
        Assert.InRange(one.RelativeAccuracyBits, 180, int.MaxValue);
    }

    /// <summary>∫ exp(−t²/2) from 0 by the series with positive terms, another method in another room.</summary>
    [Theory]
    [InlineData(1, -40)]
    [InlineData(1, -3)]
    [InlineData(1, 0)]
    [InlineData(355, -7)]
    [InlineData(1001, -7)]
    public void Erf_agrees_with_another_series(int mantissa, int exponent)
    {
        var x = new Dyadic(mantissa, exponent);
        Ball integral = NormalIntegral.FromZero(x, 200, CancellationToken.None);
        Ball other = Ball.Multiply(integral, Normal.Density(Ball.FromInteger(0)), 200);
        AssertOverlap(other, Normal.FromZero(Ball.FromDyadic(x)));
    }

    [Fact]
    public void Forms_of_the_same_value_overlap()
    {
        for (int i = 1; i < 40; i += 3)
        {
            Ball x = Ball.FromDyadic(new Dyadic((57 * i) + 1, -6));
            AssertOverlap(Grid.Erfc(x), Ball.Subtract(Ball.FromInteger(1), Grid.Erf(x), 200));
            AssertOverlap(Ball.Subtract(Ball.FromInteger(2), Grid.Erfc(x), 200), Grid.Erfc(x.Negate()));
            AssertOverlap(Normal.LogCumulative(x.Negate()), Elementary.Log(Normal.Cumulative(x.Negate()), 200));
            AssertOverlap(Normal.UpperTail(x), Ball.Multiply(
                Normal.ScaledTail(x), Elementary.Exp(Ball.Square(x, 400).ScaleByPowerOfTwo(-1).Negate(), 200), 200));
            Assert.InRange(Grid.Erfc(x).RelativeAccuracyBits, 160, int.MaxValue);
        }
    }

    [Fact]
    public void A_quantile_leads_back_to_its_probability()
    {
        Ball tail = Ball.FromDyadic(new Dyadic(3, -9));
        Ball x = Normal.UpperQuantile(tail, new Dyadic(1, -1));
        AssertOverlap(tail, Normal.UpperTail(x));
        Assert.InRange(x.RelativeAccuracyBits, 150, int.MaxValue);
        Assert.Throws<InvalidOperationException>(() => Normal.Refine(Ball.FromInteger(3), Ball.FromInteger(1)));
    }

    [Fact]
    public void Precision_width_and_cancellation_are_looked_at()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => new ErrorFunctionGrid(63));
        Assert.Throws<ArgumentOutOfRangeException>(() => new ErrorFunctionGrid(1001));
        Assert.Throws<ArgumentOutOfRangeException>(() => Grid.Erf(new Ball(1, 0, Bound.PowerOfTwo(-4))));
        using var source = new CancellationTokenSource();
        source.Cancel();
        Assert.Throws<OperationCanceledException>(() => new ErrorFunctionGrid(100, source.Token));
    }

    private static void AssertOverlap(Ball left, Ball right) =>
        Assert.True(Ball.Subtract(left, right, 400).ContainsZero, left + " and " + right);
}
