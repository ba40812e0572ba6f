using System;
using System.Globalization;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Tests.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Formats;

/// <summary>IEEE 754-2019: formats of 3.4 and table 3.5, roundTiesToEven and overflow of 4.3.1, neighbours of 5.3.1.</summary>
public class BinaryFormatTests
{
    public static TheoryData<BinaryFormat> Formats => new(BinaryFormat.Binary16, BinaryFormat.Binary32, BinaryFormat.Binary64);

    [Theory]
    [InlineData(16, "binary16", 11, -24, 15, 0x7c00UL)]
    [InlineData(32, "binary32", 24, -149, 127, 0x7f800000UL)]
    [InlineData(64, "binary64", 53, -1074, 1023, 0x7ff0000000000000UL)]
    public void The_parameters_are_those_of_table_3_5(
        int storage, string name, int precision, int minimumExponent, int maximumExponent, ulong infinity)
    {
        BinaryFormat format = storage switch { 16 => BinaryFormat.Binary16, 32 => BinaryFormat.Binary32, _ => BinaryFormat.Binary64 };
        Assert.Equal(
            (storage, name, precision, minimumExponent, maximumExponent, infinity, name),
            (format.StorageBits, format.Name, format.Precision, format.MinimumExponent, format.MaximumExponent, format.Infinity, format.ToString()));
    }

    [Theory]
    [MemberData(nameof(Formats))]
    public void A_number_of_the_format_rounds_to_itself(BinaryFormat format) => Numbers.Encoding(format).Sample(
        bits =>
        {
            Dyadic value = format.ValueOf(bits);
            Assert.Equal(HostValue(format, bits), value.ToRational());
            Assert.Equal(bits, format.Round(value));
            Assert.Equal(bits, format.Round(value.ToRational()));
            Assert.Equal(bits, format.Round(new Dyadic(value.Mantissa << 200, value.Exponent - 200)));
        },
        iter: 10_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void The_middle_of_two_neighbours_goes_to_the_even_one_and_what_is_beside_it_to_the_nearer(BinaryFormat format) =>
        Gen.Select(Numbers.Encoding(format), Gen.Int[1, 3000]).Sample(
            (bits, distance) =>
            {
                ulong low = format.Abs(bits);
                if (low == format.Largest)
                {
                    return;
                }

                // Neighbours in magnitude, and their middle: IEEE 754-2019, 4.3.1.
                ulong even = (low & 1) == 0 ? low : low + 1;
                Dyadic middle = (format.ValueOf(low) + format.ValueOf(low + 1)).ScaleByPowerOfTwo(-1);
                Dyadic bit = new(1, format.MinimumExponent - 1 - distance);
                AssertRounds(format, bits, middle, even);
                AssertRounds(format, bits, middle - bit, low);
                AssertRounds(format, bits, middle + bit, low + 1);
                Rational third = new Rational(1, 3) * bit.ToRational();
                Assert.Equal(low, format.Round(middle.ToRational() - third));
                Assert.Equal(low + 1, format.Round(middle.ToRational() + third));
            },
            iter: 10_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void Overflow_begins_half_a_unit_above_the_largest_number(BinaryFormat format)
    {
        // b^emax · (b − ½ b^(1−p)): IEEE 754-2019, 4.3.1.
        int p = format.Precision;
        var threshold = new Dyadic((BigInteger.One << (p + 1)) - 1, format.MaximumExponent - p);
        var bit = new Dyadic(1, -2000);
        foreach (ulong sign in new[] { 0UL, format.SignBit })
        {
            AssertRounds(format, sign, threshold, format.Infinity);
            AssertRounds(format, sign, threshold + bit, format.Infinity);
            AssertRounds(format, sign, threshold - bit, format.Largest);
            AssertRounds(format, sign, new Dyadic(1, 1_000_000), format.Infinity);
        }

        Assert.Equal(threshold, format.RoundingInterval(format.Largest).Upper);
    }

    [Theory]
    [MemberData(nameof(Formats))]
    public void Zero_is_positive_whatever_underflows_to_it(BinaryFormat format)
    {
        var half = new Dyadic(1, format.MinimumExponent - 1);
        var bit = new Dyadic(1, -5000);
        foreach (ulong sign in new[] { 0UL, format.SignBit })
        {
            AssertRounds(format, sign, half, 0);
            AssertRounds(format, sign, half - bit, 0);
            AssertRounds(format, sign, half + bit, 1);
            AssertRounds(format, sign, new Dyadic(1, -1_000_000), 0);
        }

        Assert.Equal(0UL, format.Round(Rational.Zero));
        Assert.Equal(0UL, format.Round(Dyadic.Zero));
        Assert.Equal(0UL, format.Round(new Rational(-1, BigInteger.One << 5000)));
        Assert.Equal(0UL, format.Negate(0));
        Assert.True(format.TryRound(new Ball(0, 0, Bound.PowerOfTwo(-5000)), out ulong bits, out int _));
        Assert.Equal(0UL, bits);
    }

    /// <summary>The host's conversions from decimal text are correctly rounded (.NET Core 3.0 and later).</summary>
    [Fact]
    public void Rational_numbers_round_like_the_hosts_decimal_conversion() =>
        Gen.Select(Numbers.Integer, Gen.Int[-400, 320]).Sample(
            (digits, power) =>
            {
                Rational value = digits * new Rational(10, 1).Pow(power);
                string text = digits.ToString(CultureInfo.InvariantCulture) + "E" + power.ToString(CultureInfo.InvariantCulture);
                Assert.Equal(Plus(BinaryFormat.Binary64, BitConverter.DoubleToUInt64Bits(double.Parse(text, CultureInfo.InvariantCulture))), BinaryFormat.Binary64.Round(value));
                Assert.Equal(Plus(BinaryFormat.Binary32, BitConverter.SingleToUInt32Bits(float.Parse(text, CultureInfo.InvariantCulture))), BinaryFormat.Binary32.Round(value));
            },
            iter: 5_000);

    [Fact]
    public void Doubles_round_to_narrower_formats_like_the_hosts_conversion() =>
        Gen.Select(Gen.ULong, Gen.Int[-160, 140]).Sample(
            (pattern, power) =>
            {
                double value = Math.ScaleB((double)(long)pattern, power - 64);
                Rational exact = Rational.FromDouble(value);
                Assert.Equal(Plus(BinaryFormat.Binary32, BitConverter.SingleToUInt32Bits((float)value)), BinaryFormat.Binary32.Round(exact));
                Assert.Equal(Plus(BinaryFormat.Binary16, BitConverter.HalfToUInt16Bits((Half)value)), BinaryFormat.Binary16.Round(exact));
            },
            iter: 20_000);

    [Fact]
    public void Integers_of_64_bits_round_like_the_hosts_conversion() =>
        Gen.ULong.Sample(value => Assert.Equal(BitConverter.DoubleToUInt64Bits((double)value), BinaryFormat.Binary64.Round(new Dyadic(value, 0))));

    [Fact]
    public void Neighbours_are_the_hosts_neighbours() => Numbers.Encoding(BinaryFormat.Binary64).Sample(bits =>
    {
        double value = BitConverter.UInt64BitsToDouble(bits);
        Assert.Equal(Plus(BinaryFormat.Binary64, BitConverter.DoubleToUInt64Bits(Math.BitIncrement(value))), BinaryFormat.Binary64.Next(bits));
        Assert.Equal(Plus(BinaryFormat.Binary64, BitConverter.DoubleToUInt64Bits(Math.BitDecrement(value))), BinaryFormat.Binary64.Previous(bits));
    });

    [Theory]
    [MemberData(nameof(Formats))]
    public void Zero_has_the_smallest_numbers_for_neighbours_and_is_positive_as_their_neighbour(BinaryFormat format)
    {
        ulong below = format.SignBit | 1;
        Assert.Equal((1UL, below), (format.Next(0), format.Previous(0)));
        Assert.Equal((1UL, below), (format.Next(format.SignBit), format.Previous(format.SignBit)));
        Assert.Equal((0UL, 0UL), (format.Next(below), format.Previous(1)));
    }

    [Theory]
    [MemberData(nameof(Formats))]
    public void The_rounding_interval_is_where_a_number_is_the_nearest(BinaryFormat format) =>
        Gen.Select(Numbers.Encoding(format), Gen.Int[1, 2000]).Sample(
            (bits, distance) =>
            {
                (Dyadic lower, Dyadic upper) = format.RoundingInterval(bits);
                var bit = new Dyadic(1, format.MinimumExponent - 1 - distance);
                Assert.Equal(bits, format.Round(lower + bit));
                Assert.Equal(bits, format.Round(upper - bit));
                Assert.Equal(format.Previous(bits), format.Round(lower - bit));
                Assert.Equal(format.Next(bits), format.Round(upper + bit));
                Assert.Equal((bits & 1) == 0, format.Round(lower) == bits);
                Assert.Equal((bits & 1) == 0, format.Round(upper) == bits);
            },
            iter: 10_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void Encodings_that_are_no_numbers_are_refused(BinaryFormat format)
    {
        foreach (ulong nan in new[] { format.Infinity + 1, format.SignBit | (format.Infinity + 1) })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => format.ValueOf(nan));
            Assert.Throws<ArgumentOutOfRangeException>(() => format.Next(nan));
            Assert.Throws<ArgumentOutOfRangeException>(() => format.Previous(nan));
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => format.ValueOf(format.Infinity));
        Assert.Throws<ArgumentOutOfRangeException>(() => format.RoundingInterval(format.Infinity | format.SignBit));
        Assert.True(format.IsInfinity(format.Infinity | format.SignBit) && !format.IsFinite(format.Infinity) && format.IsFinite(format.Largest));
        Assert.Equal(format.Infinity, format.Next(format.Infinity));
        Assert.Equal(format.Largest, format.Previous(format.Infinity));
        Assert.Equal(format.UnitExponent(format.Largest), format.UnitExponent(format.Infinity));
    }

    private static void AssertRounds(BinaryFormat format, ulong sign, Dyadic magnitude, ulong expected)
    {
        bool negative = format.IsNegative(sign);
        expected = negative ? format.Negate(expected) : expected;
        Dyadic value = negative ? -magnitude : magnitude;
        Assert.Equal(expected, format.Round(value));
        Assert.Equal(expected, format.Round(value.ToRational()));
    }

    /// <summary>The host keeps the sign of a zero; the formats here do not.</summary>
    private static ulong Plus(BinaryFormat format, ulong bits) => format.IsZero(bits) ? 0 : bits;

    private static Rational HostValue(BinaryFormat format, ulong bits) => Rational.FromDouble(format.StorageBits switch
    {
        16 => (double)BitConverter.UInt16BitsToHalf((ushort)bits),
        32 => BitConverter.UInt32BitsToSingle((uint)bits),
        _ => BitConverter.UInt64BitsToDouble(bits),
    });
}
