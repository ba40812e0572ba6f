using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>Every operation rounds up, and by little.</summary>
public class BoundTests
{
    private static readonly Rational Slack = 1 + new Rational(1, BigInteger.One << 29);

    [Fact]
    public void Sums_and_products_are_rounded_up_by_little() =>
        Gen.Select(Numbers.Bound, Numbers.Bound).Sample(
            (a, b) =>
            {
                AssertJustAbove(Value(a) + Value(b), a + b);
                AssertJustAbove(Value(a) * Value(b), a * b);
            },
            iter: 20_000);

    [Fact]
    public void Magnitudes_and_parts_are_rounded_up_by_little() =>
        Gen.Select(Numbers.Integer, Gen.ULong, Gen.Int[-2000, 2000]).Sample(
            (mantissa, parts, exponent) =>
            {
                AssertJustAbove(new Dyadic(mantissa, exponent).ToRational().Abs(), Bound.FromMagnitude(mantissa, exponent));
                AssertJustAbove(new Dyadic(parts, exponent).ToRational(), Bound.FromParts(parts, exponent));
            },
            iter: 20_000);

    [Fact]
    public void Magnitudes_beyond_the_range_of_double_are_rounded_up_by_little() =>
        Gen.Select(Gen.Int[1000, 3000], Gen.Int[-3, 3], Numbers.Integer).Sample((bits, d, low) =>
        {
            foreach (BigInteger mantissa in new[] { (BigInteger.One << bits) + d, (low << bits) + d })
            {
                AssertJustAbove(Rational.FromInteger(mantissa).Abs(), Bound.FromMagnitude(mantissa, 0));
            }
        });

    [Fact]
    public void Quotients_are_rounded_up_by_little() =>
        Gen.Select(Numbers.Bound, Numbers.Dyadic).Sample(
            (a, b) =>
            {
                Bound quotient = Bound.DivideByAtLeast(a, b);
                if (b.IsZero)
                {
                    Assert.False(quotient.IsFinite);
                }
                else
                {
                    AssertJustAbove(Value(a) / b.ToRational().Abs(), quotient);
                }
            },
            iter: 20_000);

    [Fact]
    public void Small_integers_and_powers_of_two_are_exact()
    {
        Gen.Select(Gen.UInt, Gen.Int[-500, 500]).Sample((mantissa, exponent) =>
        {
            var exact = new Dyadic(mantissa, exponent);
            Assert.Equal(exact, Bound.FromParts(mantissa, exponent).ToDyadic());
            Assert.Equal(exact, Bound.FromDyadic(-exact).ToDyadic());
            Assert.Equal(new Dyadic(1, exponent), Bound.PowerOfTwo(exponent).ToDyadic());
            Assert.Equal(exact.ScaleByPowerOfTwo(7), Bound.FromDyadic(exact).ScaleByPowerOfTwo(7).ToDyadic());
        });
    }

    [Fact]
    public void The_order_is_that_of_the_values() =>
        Gen.Select(Numbers.Bound, Numbers.Bound, Gen.Bool).Sample((a, b, same) =>
        {
            b = same ? a : b;
            int sign = (Value(a) - Value(b)).Sign;
            Assert.Equal(sign, Math.Sign(a.CompareTo(b)));
            Assert.Equal((sign < 0, sign <= 0, sign == 0, sign != 0, sign >= 0, sign > 0), (a < b, a <= b, a == b, a != b, a >= b, a > b));
            Assert.Equal(sign >= 0 ? a : b, Bound.Max(a, b));
        });

    [Fact]
    public void The_logarithm_is_the_least_power_of_two_above() =>
        Numbers.Bound.Sample(a =>
        {
            if (!a.IsZero)
            {
                Assert.True(a.ToDyadic() <= new Dyadic(1, a.CeilingLog2));
                Assert.True(a.ToDyadic() > new Dyadic(1, a.CeilingLog2 - 1));
            }
        });

    [Fact]
    public void Infinite_stays_infinite()
    {
        Bound one = Bound.PowerOfTwo(0);
        foreach (Bound bound in new[] { Bound.Infinite + one, one + Bound.Infinite, Bound.Infinite * one, Bound.Zero * Bound.Infinite, Bound.Infinite.ScaleByPowerOfTwo(-5) })
        {
            Assert.False(bound.IsFinite);
        }

        Assert.True(Bound.Infinite > Bound.PowerOfTwo(1_000_000));
        Assert.Throws<InvalidOperationException>(() => Bound.Infinite.ToDyadic());
        Assert.Throws<OverflowException>(() => Bound.PowerOfTwo(2_000_000_000) * Bound.PowerOfTwo(2_000_000_000));
        Assert.Throws<OverflowException>(() => Bound.PowerOfTwo(int.MaxValue));
    }

    private static Rational Value(Bound bound) => bound.ToDyadic().ToRational();

    private static void AssertJustAbove(Rational exact, Bound bound)
    {
        Assert.True(bound.IsZero || bound.Mantissa >= 1U << 31, "The top bit of the mantissa must be set.");
        Assert.True(Value(bound) >= exact, $"{bound} is below {exact}.");
        Assert.True(Value(bound) <= exact * Slack, $"{bound} is far above {exact}.");
    }
}
