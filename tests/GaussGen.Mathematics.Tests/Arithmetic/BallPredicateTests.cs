using System;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>Three-valued answers: decided ones are right, and undecided ones have witnesses for both sides.</summary>
public class BallPredicateTests
{
    [Fact]
    public void Signs_are_those_of_the_ends() => Numbers.Ball.Sample(
        ball =>
        {
            int lower = ball.Lower.Sign;
            int upper = ball.Upper.Sign;
            Assert.Equal(lower > 0 ? Trilean.True : upper <= 0 ? Trilean.False : Trilean.Unknown, ball.IsPositive);
            Assert.Equal(upper < 0 ? Trilean.True : lower >= 0 ? Trilean.False : Trilean.Unknown, ball.IsNegative);
            Assert.Equal(lower <= 0 && upper >= 0, ball.ContainsZero);
            Assert.Equal(lower > 0 || upper < 0 ? Trilean.False : ball.IsExact ? Trilean.True : Trilean.Unknown, ball.IsZero);
        },
        iter: 20_000);

    [Fact]
    public void Order_is_that_of_the_ends() =>
        Gen.Select(Numbers.Ball, Numbers.Ball, Gen.Int[0, 3]).Sample(
            (a, b, kind) =>
            {
                // Touching balls: b begins where a ends, or the other way about.
                if (kind == 0)
                {
                    Dyadic shift = a.Upper - b.Lower + b.Center;
                    b = new Ball(shift.Mantissa, shift.Exponent, b.Radius);
                }

                Trilean expected = a.Upper < b.Lower ? Trilean.True : a.Lower >= b.Upper ? Trilean.False : Trilean.Unknown;
                Assert.Equal(expected, Ball.IsLess(a, b));
            },
            iter: 20_000);

    [Fact]
    public void A_ball_contains_what_lies_between_its_ends() =>
        Gen.Select(Numbers.Ball, Numbers.Place).Sample((ball, place) =>
        {
            Rational inside = Numbers.At(ball, place);
            Assert.True(ball.Contains(inside));
            Dyadic beyond = ball.Upper + new Dyadic(1, -5000);
            Assert.False(ball.Contains(beyond));
            Assert.False(ball.Contains(beyond.ToRational()));
            Assert.False(ball.Contains(ball.Enlarge(Bound.PowerOfTwo(ball.IsExact ? 0 : ball.Radius.Exponent))));
            Assert.True(ball.Contains(ball) && ball.Contains(ball.Lower) && ball.Contains(ball.Upper));
        });

    [Fact]
    public void The_relative_accuracy_is_a_lower_estimate_within_two_bits() => Numbers.Ball.Sample(ball =>
    {
        if (ball.IsExact)
        {
            Assert.Equal(int.MaxValue, ball.RelativeAccuracyBits);
            return;
        }

        if (!ball.Midpoint.IsZero)
        {
            // 2^bits ≤ |m|/r < 2^(bits+2).
            Rational ratio = (ball.Center.ToRational() / ball.Radius.ToDyadic().ToRational()).Abs();
            Rational power = new Rational(2, 1).Pow(ball.RelativeAccuracyBits);
            Assert.True(power <= ratio && ratio < 4 * power);
        }
        else
        {
            Assert.True(ball.RelativeAccuracyBits <= 0);
        }
    });

    [Fact]
    public void The_default_ball_is_zero()
    {
        Ball zero = default;
        Assert.Equal((Trilean.True, Trilean.False, Trilean.False, true, true), (zero.IsZero, zero.IsPositive, zero.IsNegative, zero.IsExact, zero.IsFinite));
        Assert.Equal(Dyadic.Zero, Ball.Add(zero, zero, 64).Center);
        Assert.Equal((Trilean.Unknown, Trilean.Unknown, Trilean.Unknown), (Ball.WholeLine.IsZero, Ball.WholeLine.IsPositive, Ball.WholeLine.IsNegative));
        Assert.Throws<InvalidOperationException>(() => Ball.WholeLine.Lower);
    }
}
