using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

public class RationalTests
{
    [Fact]
    public void Every_result_is_in_lowest_terms_over_a_positive_denominator() =>
        Gen.Select(Numbers.Rational, Numbers.Rational).Sample((a, b) =>
        {
            foreach (Rational value in new[] { a + b, a - b, a * b, -a, a.Abs(), a.Pow(3), b.IsZero ? a : a / b })
            {
                Assert.True(value.Denominator.Sign > 0);
                Assert.True(BigInteger.GreatestCommonDivisor(value.Numerator, value.Denominator).IsOne);
            }
        });

    [Fact]
    public void The_laws_of_a_field_hold() =>
        Gen.Select(Numbers.Rational, Numbers.Rational, Numbers.Rational).Sample((a, b, c) =>
        {
            Assert.Equal(a + b, b + a);
            Assert.Equal(a * b, b * a);
            Assert.Equal(a + b + c, a + (b + c));
            Assert.Equal(a * b * c, a * (b * c));
            Assert.Equal(a * (b + c), (a * b) + (a * c));
            Assert.Equal(Rational.Zero, a - a);
            Assert.Equal(a, a + Rational.Zero);
            Assert.Equal(a, a * Rational.One);
            if (!b.IsZero)
            {
                Assert.Equal(a, a / b * b);
            }
        });

    [Fact]
    public void The_order_is_that_of_the_difference() =>
        Gen.Select(Numbers.Rational, Numbers.Rational).Sample((a, b) =>
        {
            int sign = (a - b).Sign;
            Assert.Equal(sign, Math.Sign(Rational.Compare(a, b)));
            Assert.Equal(sign, Math.Sign(a.CompareTo(b)));
            Assert.Equal((sign < 0, sign <= 0, sign == 0, sign != 0, sign >= 0, sign > 0), (a < b, a <= b, a == b, a != b, a >= b, a > b));
            Assert.Equal(a.Sign, a.CompareTo(Rational.Zero));
        });

    [Fact]
    public void Equal_numbers_have_equal_hash_codes() =>
        Gen.Select(Numbers.Rational, Numbers.PositiveInteger).Sample((a, factor) =>
        {
            var same = new Rational(a.Numerator * -factor, a.Denominator * -factor);
            Assert.Equal(a, same);
            Assert.Equal(a.GetHashCode(), same.GetHashCode());
        });

    [Fact]
    public void The_default_value_is_zero()
    {
        Rational zero = default;
        Assert.True(zero.IsZero && zero.IsInteger);
        Assert.Equal(BigInteger.One, zero.Denominator);
        Assert.Equal(Rational.Zero, zero);
        Assert.Equal(new Rational(0, -7), zero);
        Assert.Equal(new Rational(0, -7).GetHashCode(), zero.GetHashCode());
        Assert.Equal(5, zero + 5);
    }

    [Theory]
    [InlineData(2, 3, 4, "16/81")]
    [InlineData(-2, 3, 3, "-8/27")]
    [InlineData(-2, 3, -3, "-27/8")]
    [InlineData(5, 1, 0, "1")]
    [InlineData(0, 1, 0, "1")]
    [InlineData(0, 1, 5, "0")]
    [InlineData(-3, 6, 1, "-1/2")]
    public void A_power_is_a_repeated_product(int numerator, int denominator, int exponent, string expected) =>
        Assert.Equal(expected, new Rational(numerator, denominator).Pow(exponent).ToString());

    [Fact]
    public void A_double_is_its_exact_binary_value()
    {
        Assert.Equal("3602879701896397/36028797018963968", Rational.FromDouble(0.1).ToString());
        Assert.Equal(Rational.Zero, Rational.FromDouble(-0.0));
        Assert.Equal(new Rational(1, BigInteger.One << 1074), Rational.FromDouble(double.Epsilon));
        Assert.Equal((BigInteger.One << 1024) - (BigInteger.One << 971), Rational.FromDouble(double.MaxValue));

        Gen.Int.Sample(i => Assert.Equal(new Rational(i, 1024), Rational.FromDouble(i / 1024.0)));
    }

    [Fact]
    public void What_has_no_value_is_refused()
    {
        Assert.Throws<DivideByZeroException>(() => new Rational(1, 0));
        Assert.Throws<DivideByZeroException>(() => Rational.One / Rational.Zero);
        Assert.Throws<DivideByZeroException>(() => Rational.Zero.Pow(-1));
        foreach (double value in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
        {
            Assert.Equal("value", Assert.Throws<ArgumentOutOfRangeException>(() => Rational.FromDouble(value)).ParamName);
        }
    }
}
