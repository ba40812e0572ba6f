using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>
/// Inclusion: the exact result on exact numbers inside the operands, their ends above all, lies in the ball. And the ball is
/// not much wider than it has to be.
/// </summary>
public class BallTests
{
    private const int Iterations = 20_000;

    // What a radius may exceed the least one by: rounding up in 32 bits, and midpoint bits dropped far below the radius.
    private static readonly Rational Slack = 1 + new Rational(1, 1 << 20);

    private static readonly Gen<(Ball A, Ball B, Rational S, Rational T, int Precision)> Pairs =
        Gen.Select(Numbers.Ball, Numbers.Ball, Numbers.Place, Numbers.Place, Numbers.Precision);

    private static readonly Gen<(Ball A, Rational S, int Precision)> Singles =
        Gen.Select(Numbers.Ball, Numbers.Place, Numbers.Precision);

    [Fact]
    public void Sums_contain_the_exact_sums_and_are_narrow() => Pairs.Sample(
        (a, b, s, t, precision) =>
        {
            Ball sum = Ball.Add(a, b, precision);
            AssertContains(Numbers.At(a, s) + Numbers.At(b, t), sum);
            AssertNarrow(Radius(a) + Radius(b), Middle(a) + Middle(b), sum, precision);
            Ball difference = Ball.Subtract(a, b, precision);
            AssertContains(Numbers.At(a, s) - Numbers.At(b, t), difference);
            AssertNarrow(Radius(a) + Radius(b), Middle(a) - Middle(b), difference, precision);
        },
        iter: Iterations);

    [Fact]
    public void Products_contain_the_exact_products_and_are_narrow() => Pairs.Sample(
        (a, b, s, t, precision) =>
        {
            Ball product = Ball.Multiply(a, b, precision);
            AssertContains(Numbers.At(a, s) * Numbers.At(b, t), product);
            Rational least = (Middle(a).Abs() * Radius(b)) + (Middle(b).Abs() * Radius(a)) + (Radius(a) * Radius(b));
            AssertNarrow(least, Middle(a) * Middle(b), product, precision);
        },
        iter: Iterations);

    [Fact]
    public void Quotients_contain_the_exact_quotients_and_are_narrow() => Pairs.Sample(
        (a, b, s, t, precision) =>
        {
            if (b.IsZero == Trilean.True)
            {
                Assert.Throws<DivideByZeroException>(() => Ball.Divide(a, b, precision));
                return;
            }

            Ball quotient = Ball.Divide(a, b, precision);
            if (b.ContainsZero)
            {
                Assert.False(quotient.IsFinite);
                return;
            }

            AssertContains(Numbers.At(a, s) / Numbers.At(b, t), quotient);
            Rational exact = Middle(a) / Middle(b);
            Rational least = (Radius(a) + (exact.Abs() * Radius(b))) / (Middle(b).Abs() - Radius(b));
            AssertNarrow(least, exact, quotient, precision);
        },
        iter: Iterations);

    [Fact]
    public void Squares_contain_the_exact_squares_and_are_narrow() => Singles.Sample(
        (a, s, precision) =>
        {
            Ball square = Ball.Square(a, precision);
            AssertContains(Numbers.At(a, s).Pow(2), square);
            AssertNarrow(Radius(a) * ((2 * Middle(a).Abs()) + Radius(a)), Middle(a).Pow(2), square, precision);
        },
        iter: Iterations);

    [Fact]
    public void Square_roots_contain_the_exact_roots_and_are_narrow() => Singles.Sample(
        (a, s, precision) =>
        {
            if (a.IsNegative == Trilean.True)
            {
                Assert.Throws<ArgumentOutOfRangeException>(() => Ball.Sqrt(a, precision));
                return;
            }

            // lower ≤ √x ≤ upper, told by squares.
            Ball root = Ball.Sqrt(a, precision);
            Rational x = Numbers.At(a, s);
            Rational lower = root.Lower.ToRational();
            Rational upper = root.Upper.ToRational();
            Assert.True(x.Sign < 0 || (upper.Sign >= 0 && upper.Pow(2) >= x && (lower.Sign <= 0 || lower.Pow(2) <= x)));

            // |√x − √m| ≤ r/√m, and about half of it where r is far below m.
            if (a.IsZero == Trilean.True)
            {
                Assert.Equal(Trilean.True, root.IsZero);
            }
            else if (!a.ContainsZero)
            {
                Rational half = a.RelativeAccuracyBits >= 4 ? new Rational(16, 31) : Rational.One;
                AssertNarrow(half * Radius(a) / Middle(root), upper, root, precision);
            }
            else
            {
                Assert.True(upper.Pow(2) <= a.Upper.ToRational() * Slack);
            }
        },
        iter: Iterations);

    [Fact]
    public void The_root_of_a_square_is_exact() => Gen.Select(Numbers.Integer, Gen.Int[-300, 300]).Sample((value, exponent) =>
    {
        Ball root = Ball.Sqrt(Ball.FromDyadic(new Dyadic(value * value, 2 * exponent)), 500);
        Assert.True(root.IsExact);
        Assert.Equal(new Dyadic(BigInteger.Abs(value), exponent), root.Center);
    });

    [Fact]
    public void Powers_contain_the_exact_powers() =>
        Gen.Select(Numbers.Ball, Numbers.Place, Gen.Int[-7, 12], Numbers.Precision).Sample(
            (a, s, exponent, precision) =>
            {
                if (exponent < 0 && a.IsZero == Trilean.True)
                {
                    Assert.Throws<DivideByZeroException>(() => a.Pow(exponent, precision));
                    return;
                }

                Ball power = a.Pow(exponent, precision);
                Rational x = Numbers.At(a, s);
                if (exponent >= 0 || !x.IsZero)
                {
                    AssertContains(x.Pow(exponent), power);
                }

                if (a.IsExact)
                {
                    Assert.True(power.RelativeAccuracyBits >= precision - 4 || power.IsZero == Trilean.True);
                }
            },
            iter: 5_000);

    [Fact]
    public void Signs_magnitudes_and_scales_are_exact() => Singles.Sample((a, s, precision) =>
    {
        Rational x = Numbers.At(a, s);
        Assert.Equal(-a.Lower, a.Negate().Upper);
        Assert.Equal(-a.Upper, a.Negate().Lower);
        Assert.Equal(a.Lower.ScaleByPowerOfTwo(-9), a.ScaleByPowerOfTwo(-9).Lower);
        Assert.Equal(a.Upper.ScaleByPowerOfTwo(300), a.ScaleByPowerOfTwo(300).Upper);
        Ball magnitude = a.Abs();
        AssertContains(x.Abs(), magnitude);
        Rational largest = a.Lower.ToRational().Abs() > a.Upper.ToRational().Abs() ? a.Lower.ToRational().Abs() : a.Upper.ToRational().Abs();
        Assert.True(magnitude.Upper.ToRational() <= largest * Slack);
        Assert.True(magnitude.Lower.ToRational() >= -largest * (Slack - 1));
        Ball trimmed = a.Trim(precision);
        Assert.True(trimmed.Contains(a));
        AssertNarrow(Radius(a), Middle(a), trimmed, precision);
        Assert.True(new Dyadic(trimmed.Midpoint, 0).BitLength <= Math.Max(precision + 32, 64));
    });

    [Fact]
    public void A_ball_from_endpoints_and_a_hull_contain_what_they_are_made_of() => Pairs.Sample((a, b, s, t, precision) =>
    {
        Ball hull = Ball.Hull(a, b, precision);
        Assert.True(hull.Contains(a) && hull.Contains(b));
        (Dyadic lower, Dyadic upper) = a.Center < b.Center ? (a.Center, b.Center) : (b.Center, a.Center);
        Ball between = Ball.FromEndpoints(lower, upper, precision);
        Assert.True(between.Contains(lower) && between.Contains(upper));
        AssertNarrow((upper - lower).ToRational() / 2, (upper + lower).ToRational() / 2, between, precision);
        if (lower != upper)
        {
            Assert.Throws<ArgumentException>(() => Ball.FromEndpoints(upper, lower, precision));
        }
    });

    [Fact]
    public void A_ball_from_a_rational_number_contains_it_closely() =>
        Gen.Select(Numbers.Rational, Numbers.Precision).Sample((value, precision) =>
        {
            Ball ball = Ball.FromRational(value, precision);
            AssertContains(value, ball);
            AssertNarrow(Rational.Zero, value, ball, precision);
        });

    [Fact]
    public void Sums_of_far_apart_numbers_cost_no_long_integers()
    {
        var huge = new Ball(3, 1_000_000, Bound.PowerOfTwo(900_000));
        var tiny = new Ball(-5, -1_000_000, Bound.PowerOfTwo(-1_100_000));
        foreach (Ball sum in new[] { Ball.Add(huge, tiny, 100), Ball.Add(tiny, huge, 100) })
        {
            Assert.True(sum.Contains(huge.Lower + tiny.Lower) && sum.Contains(huge.Upper + tiny.Upper));
            Assert.True(new Dyadic(sum.Midpoint, 0).BitLength < 200);
        }
    }

    [Fact]
    public void The_whole_line_stays_the_whole_line()
    {
        Ball line = Ball.WholeLine;
        Ball one = Ball.FromInteger(1);
        foreach (Ball ball in new[] { Ball.Add(line, one, 64), Ball.Multiply(one, line, 64), Ball.Divide(line, one, 64), Ball.Divide(one, line, 64), Ball.Square(line, 64), Ball.Sqrt(line, 64), line.Abs(), line.Negate(), line.Trim(64), Ball.Hull(one, line, 64), line.Pow(3, 64), Elementary.Exp(line, 64), Elementary.Log(line, 64) })
        {
            Assert.False(ball.IsFinite);
            Assert.True(ball.Contains(Rational.FromInteger(-7)) && ball.Contains(one) && ball.Contains(line));
        }

        Assert.False(one.Contains(line));
        Assert.Equal(Trilean.True, Ball.Multiply(line, Ball.FromInteger(0), 64).IsZero);
        Assert.Equal(int.MinValue, line.RelativeAccuracyBits);
    }

    private static Rational Middle(Ball ball) => ball.Center.ToRational();

    private static Rational Radius(Ball ball) => ball.Radius.ToDyadic().ToRational();

    private static void AssertContains(Rational exact, Ball ball) => Assert.True(ball.Contains(exact), $"{exact} is not in {ball}.");

    /// <summary>The radius is the least possible one, but for a little slack and units in the last place that is kept.</summary>
    private static void AssertNarrow(Rational least, Rational middle, Ball ball, int precision)
    {
        Rational unit = middle.Abs() * new Rational(4, BigInteger.One << precision);
        Rational slack = Slack + new Rational(4, BigInteger.One << precision);
        Assert.True(Radius(ball) <= (least * slack) + unit, $"{ball} is wider than {least} + {unit}.");
    }
}
