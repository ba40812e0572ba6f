using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Tests.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Formats;

/// <summary>An enclosure decides exactly when both its ends round alike; then it tells its width.</summary>
public class EnclosureRoundingTests
{
    public static TheoryData<BinaryFormat> Formats => BinaryFormatTests.Formats;

    [Theory]
    [MemberData(nameof(Formats))]
    public void Balls(BinaryFormat format) =>
        Gen.Select(Numbers.Encoding(format), Gen.Int[-3, 90], Gen.ULong, Gen.Int[-100, 100]).Sample(
            (bits, distance, mantissa, offset) =>
            {
                // Around a number of the format or a middle between two, with a radius of about as much as the distance.
                Dyadic unit = new(1, format.UnitExponent(bits) - distance);
                Dyadic center = format.ValueOf(bits) + (unit * new Dyadic(offset, -6)) + new Dyadic(offset & 1, format.UnitExponent(bits) - 1);
                var ball = new Ball(center.Mantissa, center.Exponent, Bound.FromParts(mantissa, unit.Exponent - 63));
                AssertDecides(format, ball.Lower, ball.Upper, format.TryRound(ball, out ulong rounded, out int width), rounded, width);
            },
            iter: 20_000);

    [Theory]
    [MemberData(nameof(Formats))]
    public void Fixed_size_enclosures(BinaryFormat format)
    {
        int top = format.MaximumExponent;
        int bottom = format.MinimumExponent;
        Gen<int> exponent = Gen.Frequency((2, Gen.Int[-140, -50]), (2, Gen.Int[bottom - 140, bottom + 40]), (1, Gen.Int[top - 140, top + 3]));
        Gen<ulong> word = Gen.Frequency(
            (2, Gen.ULong),
            (1, Gen.Const(0UL)),
            (1, Gen.Const(ulong.MaxValue)),
            (1, Gen.Select(Gen.Int[0, 63], Gen.Int[-1, 1], (bit, d) => unchecked((1UL << bit) + (ulong)d))));
        Gen<ulong> radius = Gen.Frequency((1, Gen.ULong[0, 3]), (1, word), (1, Gen.ULong[0, 1000]));
        Gen.Select(word, word, exponent, Gen.Bool, radius).Sample(
            (high, low, power, negative, units) =>
            {
                var enclosure = new FixedBall(high, low, power, negative, units);
                var middle = new Dyadic(((System.Numerics.BigInteger)high << 64) + low, power);
                middle = negative ? -middle : middle;
                var distance = new Dyadic(units, power);
                bool decided = format.TryRound(in enclosure, out ulong rounded, out int width);
                AssertDecides(format, middle - distance, middle + distance, decided, rounded, width);
            },
            iter: 50_000);
    }

    [Fact]
    public void The_whole_line_decides_nothing()
    {
        Assert.False(BinaryFormat.Binary64.TryRound(Ball.WholeLine, out ulong bits, out int _));
        Assert.Equal(0UL, bits);
    }

    private static void AssertDecides(BinaryFormat format, Dyadic lower, Dyadic upper, bool decided, ulong bits, int widthLog2)
    {
        Assert.Equal(format.Round(lower) == format.Round(upper), decided);
        Assert.Equal(decided ? format.Round(lower) : 0UL, bits);
        if (decided && lower == upper)
        {
            Assert.Equal(int.MinValue, widthLog2);
        }
        else if (decided)
        {
            // The width in units in the last place, rounded up to a power of two; a radius is itself rounded up in 32 bits.
            Dyadic width = (upper - lower).ScaleByPowerOfTwo(-format.UnitExponent(bits));
            Assert.True(width <= new Dyadic(1, widthLog2));
            Assert.True(width > new Dyadic(1, widthLog2 - 1));
        }
    }
}
