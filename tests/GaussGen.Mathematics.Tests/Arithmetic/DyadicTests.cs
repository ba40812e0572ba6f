using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

public class DyadicTests
{
    [Fact]
    public void Arithmetic_and_order_are_those_of_rational_numbers() =>
        Gen.Select(Numbers.Dyadic, Numbers.Dyadic).Sample((a, b) =>
        {
            (Rational x, Rational y) = (a.ToRational(), b.ToRational());
            Assert.Equal(x + y, (a + b).ToRational());
            Assert.Equal(x - y, (a - b).ToRational());
            Assert.Equal(x * y, (a * b).ToRational());
            Assert.Equal(-x, (-a).ToRational());
            Assert.Equal(x.Abs(), Dyadic.Abs(a).ToRational());
            int sign = (x - y).Sign;
            Assert.Equal(sign, Math.Sign(a.CompareTo(b)));
            Assert.Equal((sign < 0, sign <= 0, sign == 0, sign != 0, sign >= 0, sign > 0), (a < b, a <= b, a == b, a != b, a >= b, a > b));
        });

    [Fact]
    public void Equal_numbers_with_different_mantissas_are_equal() =>
        Gen.Select(Numbers.Dyadic, Gen.Int[0, 300]).Sample((a, shift) =>
        {
            var same = new Dyadic(a.Mantissa << shift, a.Exponent - shift);
            Assert.Equal(a, same);
            Assert.Equal(a.GetHashCode(), same.GetHashCode());
            Assert.Equal(a, a.ScaleByPowerOfTwo(shift).ScaleByPowerOfTwo(-shift));
        });

    [Fact]
    public void The_bit_length_is_that_of_the_binary_digits()
    {
        Numbers.Integer.Sample(value => Assert.Equal(Digits(value), new Dyadic(value, 0).BitLength));

        // Where a conversion to double rounds up to the next power of two, and where it overflows.
        foreach (int bits in new[] { 1, 52, 53, 54, 55, 63, 64, 65, 127, 128, 1022, 1023, 1024, 1025, 1026, 2047, 5000 })
        {
            BigInteger power = BigInteger.One << bits;
            foreach (BigInteger value in new[] { power, power - 1, power + 1, power - (BigInteger.One << (bits * 2 / 3)) })
            {
                Assert.Equal(Digits(value), new Dyadic(value, 0).BitLength);
                Assert.Equal(Digits(value), new Dyadic(-value, 0).BitLength);
            }
        }
    }

    private static int Digits(BigInteger value) => value.IsZero ? 0 : BigInteger.Abs(value).ToString("b").TrimStart('0').Length;
}
