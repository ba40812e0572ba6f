using System;
using System.Globalization;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Tests.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Formats;

/// <summary>ISO/IEC 9899:1999, 6.4.4.2: hexadecimal floating constants.</summary>
public class HexadecimalFloatTests
{
    public static TheoryData<BinaryFormat> Formats => BinaryFormatTests.Formats;

    /// <summary>The last three are DBL_MAX, DBL_MIN and the smallest subnormal number (recalled, recomputed by reading back).</summary>
    [Theory]
    [InlineData(0.0, "0x0.0p+0")]
    [InlineData(-0.0, "-0x0.0p+0")]
    [InlineData(1.0, "0x1.0p+0")]
    [InlineData(-0.1875, "-0x1.8p-3")]
    [InlineData(0.1, "0x1.999999999999ap-4")]
    [InlineData(-1.7320508075688772, "-0x1.bb67ae8584caap+0")]
    [InlineData(double.MaxValue, "0x1.fffffffffffffp+1023")]
    [InlineData(2.2250738585072014E-308, "0x1.0p-1022")]
    [InlineData(double.Epsilon, "0x0.0000000000001p-1022")]
    public void Doubles_are_written_as_constants_of_C(double value, string expected) =>
        Assert.Equal(expected, HexadecimalFloat.Write(BitConverter.DoubleToUInt64Bits(value), BinaryFormat.Binary64));

    /// <summary>FLT_MAX is 0x1.fffffep+127.</summary>
    [Theory]
    [InlineData(0.1f, "0x1.99999ap-4")]
    [InlineData(float.MaxValue, "0x1.fffffep+127")]
    [InlineData(float.Epsilon, "0x0.000002p-126")]
    public void Floats_are_padded_to_whole_digits(float value, string expected) =>
        Assert.Equal(expected, HexadecimalFloat.Write(BitConverter.SingleToUInt32Bits(value), BinaryFormat.Binary32));

    [Theory]
    [MemberData(nameof(Formats))]
    public void Text_reads_back_exactly(BinaryFormat format) => Numbers.Encoding(format).Sample(
        bits =>
        {
            string text = HexadecimalFloat.Write(bits, format);
            Assert.Equal(format.ValueOf(bits).ToRational(), Parse(text));
            Assert.Equal(format.IsNegative(bits), text[0] == '-');
            Assert.False(text.Contains("0p", StringComparison.Ordinal) && !text.Contains(".0p", StringComparison.Ordinal));
        },
        iter: 10_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void What_is_not_finite_is_refused(BinaryFormat format)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => HexadecimalFloat.Write(format.Infinity, format));
        Assert.Throws<ArgumentOutOfRangeException>(() => HexadecimalFloat.Write(format.Infinity + 1, format));
    }

    private static Rational Parse(string text)
    {
        bool negative = text[0] == '-';
        string body = negative ? text[1..] : text;
        Assert.StartsWith("0x", body, StringComparison.Ordinal);
        string[] parts = body[2..].Split('p');
        string[] digits = parts[0].Split('.');
        var magnitude = BigInteger.Parse("0" + digits[0] + digits[1], NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture);
        int exponent = int.Parse(parts[1], CultureInfo.InvariantCulture) - (4 * digits[1].Length);
        return (negative ? -1 : 1) * new Dyadic(magnitude, exponent).ToRational();
    }
}
