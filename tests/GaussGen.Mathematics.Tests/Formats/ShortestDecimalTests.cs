using System;
using System.Globalization;
using System.Numerics;
using System.Text.RegularExpressions;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Tests.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Formats;

public partial class ShortestDecimalTests
{
    private static readonly BinaryFormat Double = BinaryFormat.Binary64;

    public static TheoryData<BinaryFormat> Formats => BinaryFormatTests.Formats;

    [Theory]
    [InlineData(0.0, "0.0")]
    [InlineData(-0.0, "-0.0")]
    [InlineData(1.0, "1.0")]
    [InlineData(-2.0, "-2.0")]
    [InlineData(0.1, "0.1")]
    [InlineData(1e-4, "0.0001")]
    [InlineData(1e-5, "1E-5")]
    [InlineData(-1.25e-5, "-1.25E-5")]
    [InlineData(123456.789, "123456.789")]
    [InlineData(1e15, "1000000000000000.0")]
    [InlineData(1e16, "1E+16")]
    [InlineData(1.5e300, "1.5E+300")]
    [InlineData(1.7320508075688772, "1.7320508075688772")]
    [InlineData(9007199254740993e3, "9.007199254740993E+18")]
    [InlineData(double.MaxValue, "1.7976931348623157E+308")]
    [InlineData(double.MinValue, "-1.7976931348623157E+308")]
    [InlineData(2.2250738585072014E-308, "2.2250738585072014E-308")]
    [InlineData(double.Epsilon, "5E-324")]
    public void Numbers_are_written_as_literals(double value, string expected) =>
        Assert.Equal(expected, ShortestDecimal.Write(BitConverter.DoubleToUInt64Bits(value), Double));

    /// <summary>
    /// 2⁻²⁵ = 2.98023223876953125E-8 lies in the very middle of two 17-digit decimals, and no 16-digit one reads back as it,
    /// because the numbers below a power of two lie closer.
    /// </summary>
    [Fact]
    public void Below_a_power_of_two_the_interval_is_narrower_and_a_tie_goes_to_the_even_digit()
    {
        Assert.Equal("2.9802322387695312E-8", ShortestDecimal.Write(BitConverter.DoubleToUInt64Bits(Math.ScaleB(1, -25)), Double));
        Assert.NotEqual(Math.ScaleB(1, -25), double.Parse("2.980232238769531E-8", CultureInfo.InvariantCulture));
    }

    [Theory]
    [MemberData(nameof(Formats))]
    public void Text_is_a_literal_that_reads_back_exactly_and_nothing_shorter_does(BinaryFormat format) =>
        Numbers.Encoding(format).Sample(bits => AssertShortest(bits, format), iter: 5_000);

    [Fact]
    public void Every_half_precision_number_is_shortest()
    {
        for (ulong bits = 0; bits < BinaryFormat.Binary16.Infinity; bits++)
        {
            AssertShortest(bits, BinaryFormat.Binary16);
        }
    }

    /// <summary>
    /// The host's shortest text (.NET Core 3.0 and later) has the same digits wherever it reads back as the number; for a few
    /// powers of two it does not.
    /// </summary>
    [Fact]
    public void Digits_are_the_hosts_digits_for_powers_of_two_and_ten_and_their_neighbours()
    {
        int deviations = 0;
        for (int exponent = -1074; exponent <= 1023; exponent++)
        {
            double power = Math.ScaleB(1, exponent);
            deviations += AgreesWithHost(power) ? 0 : 1;
            Assert.True(AgreesWithHost(Math.BitIncrement(power)) && AgreesWithHost(Math.BitDecrement(power)));
            Assert.True(AgreesWithHost(3 * Math.ScaleB(power, -2)));
        }

        Assert.True(deviations <= 2, $"{deviations} powers of two have other digits.");
        for (int exponent = -324; exponent <= 308; exponent++)
        {
            double power = double.Parse("1E" + exponent.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
            Assert.True(AgreesWithHost(power) && AgreesWithHost(Math.BitIncrement(power)) && AgreesWithHost(-power));
        }
    }

    [Fact]
    public void Digits_are_the_hosts_digits_for_random_numbers() =>
        Gen.Select(Numbers.Encoding(Double), Numbers.Encoding(BinaryFormat.Binary32), Gen.Int[-100_000, 100_000]).Sample(
            (bits, single, thousandths) =>
            {
                double value = BitConverter.UInt64BitsToDouble(bits);
                bool isPowerOfTwo = (bits & ((1UL << 52) - 1)) == 0;
                Assert.True(AgreesWithHost(value) || isPowerOfTwo);
                Assert.True(AgreesWithHost(thousandths / 1000.0));
                float narrow = BitConverter.UInt32BitsToSingle((uint)single);
                string text = ShortestDecimal.Write(single, BinaryFormat.Binary32);
                Assert.True(Parse(text) == Parse(narrow.ToString("R", CultureInfo.InvariantCulture)) || (single & 0x7fffff) == 0);
            },
            iter: 20_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void What_is_not_finite_is_refused(BinaryFormat format)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => ShortestDecimal.Write(format.Infinity, format));
        Assert.Throws<ArgumentOutOfRangeException>(() => ShortestDecimal.Write(format.Infinity + 1, format));
        Assert.Throws<ArgumentOutOfRangeException>(() => ShortestDecimal.Write(format.Infinity | format.SignBit, format));
    }

    [Fact]
    public void The_culture_has_no_say()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            var odd = (CultureInfo)CultureInfo.InvariantCulture.Clone();
            odd.NumberFormat.NegativeSign = "~";
            odd.NumberFormat.NumberDecimalSeparator = ",";
            odd.NumberFormat.PositiveSign = "#";
            CultureInfo.CurrentCulture = odd;
            Assert.Equal("-1.5E-300", ShortestDecimal.Write(BitConverter.DoubleToUInt64Bits(-1.5e-300), Double));
            Assert.Equal("-0x1.8p-3", HexadecimalFloat.Write(BitConverter.DoubleToUInt64Bits(-0.1875), Double));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    private static void AssertShortest(ulong bits, BinaryFormat format)
    {
        string text = ShortestDecimal.Write(bits, format);
        Assert.Matches(Literal(), text);
        Assert.True(text.Contains('.') || text.Contains('E'));
        (BigInteger digits, int exponent) = Decimal(text);
        Rational place = new Rational(10, 1).Pow(exponent);
        Rational written = digits * place;
        Assert.Equal(bits, format.Round(written));
        if (written.IsZero)
        {
            return;
        }

        // Of as many digits, the neighbours are not closer, unless they do not read back.
        Rational value = format.ValueOf(bits).ToRational();
        Rational distance = (written - value).Abs();
        foreach (Rational neighbour in new[] { written - place, written + place })
        {
            Assert.True(distance <= (neighbour - value).Abs() || format.Round(neighbour) != bits);
        }

        // Of one digit fewer, and so of any fewer, none reads back.
        BigInteger tens = BigInteger.Divide(digits, 10);
        Assert.NotEqual(tens * 10, digits);
        foreach (BigInteger shorter in new[] { tens - 1, tens, tens + 1 })
        {
            Assert.NotEqual(bits, format.Round(shorter * 10 * place));
        }
    }

    private static bool AgreesWithHost(double value)
    {
        string host = value.ToString("R", CultureInfo.InvariantCulture);
        Rational ours = Parse(ShortestDecimal.Write(BitConverter.DoubleToUInt64Bits(value), Double));
        bool agrees = ours == Parse(host);
        Assert.True(agrees || Double.Round(Parse(host)) != BitConverter.DoubleToUInt64Bits(value), $"{host} reads back, too.");
        return agrees;
    }

    /// <summary>The exact value of a decimal text, found without the host's conversions to floating point.</summary>
    private static Rational Parse(string text)
    {
        (BigInteger digits, int exponent) = Decimal(text);
        return digits * new Rational(10, 1).Pow(exponent);
    }

    /// <summary>The digits of a decimal text as an integer without trailing zeros, and the power of ten of its last place.</summary>
    private static (BigInteger Digits, int Exponent) Decimal(string text)
    {
        string[] parts = text.Split('E');
        int point = parts[0].IndexOf('.', StringComparison.Ordinal);
        int fraction = point < 0 ? 0 : parts[0].Length - point - 1;
        var digits = BigInteger.Parse(parts[0].Replace(".", string.Empty, StringComparison.Ordinal), CultureInfo.InvariantCulture);
        int exponent = (parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0) - fraction;
        while (!digits.IsZero && (digits % 10).IsZero)
        {
            digits /= 10;
            exponent++;
        }

        return (digits, exponent);
    }

    [GeneratedRegex(@"^-?(0|[1-9][0-9]*)(\.[0-9]+)?(E[+-][1-9][0-9]*)?$")]
    private static partial Regex Literal();
}
