using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

public class FixedBallTests
{
    private static readonly ulong[] Corners =
        [0, 1, ulong.MaxValue, ulong.MaxValue - 1, 1UL << 63, (1UL << 63) - 1, (1UL << 63) + 1, 1UL << 32, (1UL << 32) - 1];

    private static readonly Gen<ulong> Word = Gen.OneOf(
        Gen.ULong,
        Gen.Int[0, Corners.Length - 1].Select(index => Corners[index]));

    private static readonly Gen<ulong> RadiusUnits = Gen.OneOf(Gen.Const(0UL), Gen.ULong[0, 5], Gen.ULong[0, 1UL << 61]);

    private static readonly Gen<FixedBall> Normalized = Gen.Select(Word, Word, Gen.Int[-1200, 1200], Gen.Bool, RadiusUnits)
        .Select((high, low, exponent, isNegative, radius) => new FixedBall(high | (1UL << 63), low, exponent, isNegative, radius));

    [Fact]
    public void A_product_contains_all_products_and_is_not_much_wider() => Gen.Select(Normalized, Normalized).Sample((left, right) =>
        AssertOperation(left, right, FixedBall.Multiply(in left, in right), Rational.Multiply));

    [Fact]
    public void A_quotient_contains_all_quotients_and_is_not_much_wider() => Gen.Select(Normalized, Normalized).Sample((left, right) =>
        AssertOperation(left, right, FixedBall.Divide(in left, in right), Rational.Divide));

    [Fact]
    public void Quotients_of_neighbours_and_of_equal_mantissas_are_right()
    {
        // Digits of all ones and remainders next to zero are where a division goes wrong.
        ulong[] words = [1UL << 63, (1UL << 63) + 1, ulong.MaxValue, ulong.MaxValue - 1, 0xaaaaaaaaaaaaaaaa];
        ulong[] lows = [0, 1, ulong.MaxValue, ulong.MaxValue - 1, 1UL << 63];
        foreach (ulong leftHigh in words)
        {
            foreach (ulong leftLow in lows)
            {
                foreach (ulong rightHigh in words)
                {
                    foreach (ulong rightLow in lows)
                    {
                        var left = new FixedBall(leftHigh, leftLow, 0, false, 0);
                        var right = new FixedBall(rightHigh, rightLow, 0, false, 0);
                        AssertOperation(left, right, FixedBall.Divide(in left, in right), Rational.Divide);
                    }
                }
            }
        }
    }

    [Fact]
    public void A_product_with_a_small_factor_contains_all_products() =>
        Gen.Select(Normalized, Gen.OneOf(Gen.UInt[1, 1000], Gen.UInt[1, uint.MaxValue])).Sample((left, factor) =>
        {
            if ((BigInteger)left.RadiusUnits * factor <= ulong.MaxValue)
            {
                AssertOperation(left, FixedBall.FromInteger(factor), FixedBall.Multiply(in left, factor), Rational.Multiply);
            }
        });

    [Fact]
    public void Normalizing_and_scaling_change_no_end() =>
        Gen.Select(Word, Word, Gen.Int[0, 127], Gen.ULong[0, 3], Gen.Bool).Sample((high, low, shift, radius, isNegative) =>
        {
            BigInteger mantissa = (((BigInteger)high << 64) + low) >> shift;
            if (mantissa.IsZero || shift > 60)
            {
                return;
            }

            var ball = new FixedBall((ulong)(mantissa >> 64), (ulong)(mantissa & ulong.MaxValue), -7, isNegative, radius);
            int zeros = 128 - (int)mantissa.GetBitLength();
            if (zeros > 61)
            {
                return;
            }

            FixedBall normalized = ball.Normalize();
            Assert.True(normalized.IsNormalized);
            Assert.Equal(ball.ToBall().Lower, normalized.ToBall().Lower);
            Assert.Equal(ball.ToBall().Upper, normalized.ToBall().Upper);
            Assert.Equal(-normalized.ToBall().Upper, normalized.Negate().ToBall().Lower);
            Assert.Equal(normalized.ToBall().Upper.ScaleByPowerOfTwo(3), normalized.ScaleByPowerOfTwo(3).ToBall().Upper);
        });

    [Fact]
    public void What_does_not_fit_is_refused()
    {
        Assert.Throws<OverflowException>(() => new FixedBall(0, 1, 0, false, 2).Normalize());
        Assert.Throws<OverflowException>(() => new FixedBall(1, 0, 0, false, 1UL << 63).Normalize());
        Assert.Throws<ArgumentOutOfRangeException>(() => new FixedBall(0, 0, 0, false, 0).Normalize());
        Assert.Throws<ArgumentOutOfRangeException>(() => FixedBall.FromInteger(0));
        var one = FixedBall.FromInteger(1);
        var wide = new FixedBall(1UL << 63, 0, 0, false, ulong.MaxValue);
        var low = new FixedBall(1, 0, 0, false, 0);
        Assert.Throws<OverflowException>(() => FixedBall.Multiply(in wide, in wide));
        Assert.Throws<ArgumentException>(() => FixedBall.Divide(in one, in wide));
        Assert.Throws<ArgumentException>(() => FixedBall.Divide(in wide, in one));
        Assert.Throws<ArgumentException>(() => FixedBall.Divide(in one, in low));
        Assert.Null(new FixedBall(1UL << 63, 0, 0, false, 9).WidenTo(8));
        Assert.Equal(9UL, new FixedBall(1UL << 63, 0, 0, false, 8).WidenTo(9)!.Value.RadiusUnits);
    }

    [Fact]
    public void The_constants_are_those_of_any_precision()
    {
        Assert.True(FixedConstants.SqrtPi.ToBall().Contains(Constants.SqrtPi(300)));
        Assert.True(FixedConstants.Sqrt2.ToBall().Contains(Constants.Sqrt2(300)));
        Assert.True(FixedConstants.InverseSqrt2.ToBall().Contains(Ball.Divide(Ball.FromInteger(1), Constants.Sqrt2(300), 300)));
    }

    private static void AssertOperation(FixedBall left, FixedBall right, FixedBall result, Func<Rational, Rational, Rational> operation)
    {
        Assert.True(result.IsNormalized);
        Rational[] lefts = Ends(left), rights = Ends(right), results = Ends(result);
        // Products and quotients are monotonic in each operand, so that the four corners decide.
        Rational lowest = operation(lefts[0], rights[0]), highest = lowest;
        foreach (Rational one in lefts)
        {
            foreach (Rational two in rights)
            {
                Rational corner = operation(one, two);
                lowest = corner < lowest ? corner : lowest;
                highest = corner > highest ? corner : highest;
            }
        }

        Assert.True(results[0] <= lowest && highest <= results[1]);
        // At most four times as wide, and a few units.
        Rational unit = new Dyadic(1, result.Exponent).ToRational();
        Rational width = results[1] - results[0];
        Assert.True(width <= (4 * (highest - lowest)) + (8 * unit), $"{width / unit} units for {(highest - lowest) / unit}");
    }

    /// <summary>The ends, without a conversion to a ball, whose radius has 32 bits only.</summary>
    private static Rational[] Ends(FixedBall ball)
    {
        BigInteger mantissa = ((BigInteger)ball.High << 64) + ball.Low;
        mantissa = ball.IsNegative ? -mantissa : mantissa;
        return [new Dyadic(mantissa - ball.RadiusUnits, ball.Exponent).ToRational(), new Dyadic(mantissa + ball.RadiusUnits, ball.Exponent).ToRational()];
    }
}
