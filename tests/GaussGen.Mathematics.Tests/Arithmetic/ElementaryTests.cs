using System;
using System.Linq;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>The elementary functions against mpmath, and against one another.</summary>
public class ElementaryTests
{
    private static readonly int[] Precisions = [1, 2, 24, 32, 53, 64, 100, 128, 192, 256, 512, 1000, 1100];

    private static readonly Gen<Ball> Arguments = Gen.Select(Gen.Long[1, long.MaxValue], Gen.Int[-80, 4], Gen.Int[-200, -1], Gen.Bool)
        .Select((mantissa, size, radius, negative) => new Ball(negative ? -mantissa : mantissa, size - 63, Bound.PowerOfTwo(size + radius)));

    [Fact]
    public void The_reference_file_is_whole()
    {
        Assert.True(ReferenceValue.Of("exp").Count() >= 40);
        Assert.True(ReferenceValue.Of("log").Count() >= 40);
    }

    [Fact]
    public void Exponentials_contain_the_reference_values_and_are_as_narrow_as_stated()
    {
        foreach (ReferenceValue reference in ReferenceValue.Of("exp"))
        {
            foreach (int precision in Precisions)
            {
                Ball ball = Elementary.Exp(Ball.FromDyadic(reference.Argument), precision);
                reference.AssertInside(ball);
                Assert.True(ball.RelativeAccuracyBits >= precision - 3);
            }
        }
    }

    [Fact]
    public void Logarithms_contain_the_reference_values_and_are_as_narrow_as_stated()
    {
        foreach (ReferenceValue reference in ReferenceValue.Of("log"))
        {
            foreach (int precision in Precisions)
            {
                Ball ball = Elementary.Log(Ball.FromDyadic(reference.Argument), precision);
                reference.AssertInside(ball);
                Assert.True(ball.RelativeAccuracyBits >= precision - 3, $"{reference.Argument} at {precision}: {ball.RelativeAccuracyBits}");
            }
        }
    }

    /// <summary>The reference argument at the very end of a ball, on either side.</summary>
    [Theory]
    [InlineData(-300)]
    [InlineData(-60)]
    [InlineData(-10)]
    [InlineData(-1)]
    [InlineData(2)]
    public void Balls_with_a_radius_give_the_value_at_their_ends(int size)
    {
        foreach (ReferenceValue reference in ReferenceValue.All.Where(value => value.Function is "exp" or "log"))
        {
            Dyadic offset = Dyadic.Abs(reference.Argument) * new Dyadic(5, size - 2);
            foreach (Dyadic center in new[] { reference.Argument - offset, reference.Argument + offset })
            {
                var argument = new Ball(center.Mantissa, center.Exponent, Bound.FromDyadic(offset));
                if (reference.Function == "exp")
                {
                    reference.AssertInside(Elementary.Exp(argument, 200));
                }
                else if (argument.IsPositive != Trilean.False)
                {
                    Ball logarithm = Elementary.Log(argument, 200);
                    Assert.Equal(!argument.ContainsZero, logarithm.IsFinite);
                    if (logarithm.IsFinite)
                    {
                        reference.AssertInside(logarithm);
                    }
                }
            }
        }
    }

    [Fact]
    public void A_small_radius_grows_by_the_derivative_alone() =>
        Gen.Select(Arguments, Gen.Int[100, 300]).Sample((x, precision) =>
        {
            // exp: r·exp x; log: r/x; each with the rounding of the midpoint and some slack.
            Ball exponential = Elementary.Exp(x, precision);
            int accuracy = Math.Min(precision, -x.Radius.CeilingLog2) - 4;
            Assert.True(exponential.RelativeAccuracyBits >= accuracy || x.Radius.CeilingLog2 > -4);
            Ball positive = x.Abs();
            Ball logarithm = Elementary.Log(positive, precision);
            int lost = Math.Min(x.RelativeAccuracyBits, precision) - 8;
            Assert.True(logarithm.Radius.CeilingLog2 <= -lost || lost < 0);
        });

    [Fact]
    public void The_exponential_of_a_sum_is_the_product_of_exponentials() =>
        Gen.Select(Arguments, Arguments, Gen.Int[32, 300]).Sample((x, y, precision) =>
        {
            Ball sum = Elementary.Exp(Ball.Add(x, y, 1000), precision);
            Ball product = Ball.Multiply(Elementary.Exp(x, precision + 9), Elementary.Exp(y, precision + 7), precision);
            Assert.True(Ball.Subtract(sum, product, 1000).ContainsZero);
        });

    [Fact]
    public void The_logarithm_undoes_the_exponential() =>
        Gen.Select(Arguments, Gen.Int[32, 300]).Sample((x, precision) =>
        {
            Ball back = Elementary.Log(Elementary.Exp(x, precision + 40), precision);
            Assert.True(!back.IsFinite || back.Contains(x.Center));
        });

    [Fact]
    public void The_logarithm_of_a_product_is_the_sum_of_logarithms() =>
        Gen.Select(Arguments, Arguments, Gen.Int[32, 300]).Sample((x, y, precision) =>
        {
            (x, y) = (Ball.FromDyadic(x.Abs().Center), Ball.FromDyadic(y.Abs().Center));
            Ball product = Elementary.Log(Ball.Multiply(x, y, 1000), precision);
            Ball sum = Ball.Add(Elementary.Log(x, precision + 3), Elementary.Log(y, precision + 5), precision);
            Assert.True(Ball.Subtract(product, sum, 1000).ContainsZero);
        });

    [Fact]
    public void What_is_exact_stays_exact()
    {
        Assert.Equal(Dyadic.Zero, Elementary.Log(Ball.FromInteger(1), 128).Center);
        Assert.True(Elementary.Log(Ball.FromInteger(1), 128).IsExact);
        Assert.Equal(new Dyadic(1, 0), Elementary.Exp(Ball.FromInteger(0), 128).Center);
        Assert.True(Elementary.Exp(default, 128).IsExact);
    }

    [Fact]
    public void Arguments_out_of_range_are_refused_or_enclosed()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.Log(Ball.FromInteger(0), 64));
        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.Log(Ball.FromInteger(-1), 64));
        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.Log(new Ball(-1, 0, Bound.PowerOfTwo(0)), 64));
        Assert.False(Elementary.Log(new Ball(1, 0, Bound.PowerOfTwo(0)), 64).IsFinite);
        Assert.Throws<OverflowException>(() => Elementary.Exp(Ball.FromDyadic(new Dyadic(1, 40)), 64));

        // Smaller than anything, but still above zero.
        Ball tiny = Elementary.Exp(Ball.FromDyadic(new Dyadic(-1, 40)), 64);
        Assert.True(tiny.Upper.Sign > 0 && tiny.Lower.Sign <= 0 && tiny.Radius.CeilingLog2 < -1_000_000);
    }

    [Fact]
    public void A_cancelled_token_stops_the_work()
    {
        var cancelled = new CancellationToken(canceled: true);
        Assert.Throws<OperationCanceledException>(() => Elementary.Exp(Ball.FromInteger(3), 128, cancelled));
        Assert.Throws<OperationCanceledException>(() => Elementary.Log(Ball.FromInteger(3), 128, cancelled));
        Assert.Throws<OperationCanceledException>(() => Constants.Pi(10_000, cancelled));
    }
}
