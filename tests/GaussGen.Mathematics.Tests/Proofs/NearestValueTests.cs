using System;
using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

public class NearestValueTests
{
    private static readonly BinaryFormat[] Formats = [BinaryFormat.Binary16, BinaryFormat.Binary32, BinaryFormat.Binary64];

    private static readonly Dyadic Tiny = new(BigInteger.One, -3000);

    [Fact]
    public void Midpoints_belong_to_the_even_neighbor()
    {
        Gen.Select(Gen.Int[0, 2], Gen.ULong).Sample((which, random) =>
        {
            BinaryFormat format = Formats[which];
            ulong bits = random % format.Largest;
            ulong next = bits + 1;
            Dyadic middle = (format.ValueOf(bits) + format.ValueOf(next)).ScaleByPowerOfTwo(-1);
            Assert.Equal((bits & 1) == 0 ? Trilean.True : Trilean.False, Is(format, bits, middle, middle));
            Assert.Equal((next & 1) == 0 ? Trilean.True : Trilean.False, Is(format, next, middle, middle));
            Assert.Equal(Trilean.True, Is(format, bits, middle - Tiny, middle - Tiny));
            Assert.Equal(Trilean.False, Is(format, bits, middle + Tiny, middle + Tiny));
            Assert.Equal(Trilean.True, Is(format, next, middle + Tiny, middle + Tiny));
            Assert.Equal(Trilean.Unknown, Is(format, bits, middle - Tiny, middle + Tiny));
            Assert.Equal(Trilean.Unknown, Is(format, next, middle - Tiny, middle + Tiny));
            if (bits != 0)
            {
                Assert.Equal(Trilean.True, Is(format, format.Negate(bits), Tiny - middle, Tiny - middle));
            }
        });
    }

    [Fact]
    public void Encodings_that_are_no_numbers_are_never_right()
    {
        foreach (BinaryFormat format in Formats)
        {
            Dyadic huge = new(BigInteger.One, 5000);
            Assert.Equal(Trilean.False, Is(format, format.Infinity, huge, huge));
            Assert.Equal(Trilean.False, Is(format, format.Infinity + 1, Dyadic.Zero, Dyadic.Zero));
            Assert.Equal(Trilean.False, Is(format, format.SignBit, Dyadic.Zero, Dyadic.Zero));
            Assert.Equal(Trilean.False, Is(format, format.SignBit | format.Infinity, -huge, -huge));
            Assert.Equal(Trilean.True, Is(format, 0, Dyadic.Zero, Dyadic.Zero));
            Assert.Equal(Trilean.True, Is(format, 0, -Tiny, Tiny));
        }

        Assert.Equal(Trilean.False, Is(BinaryFormat.Binary32, 1UL << 32, Dyadic.Zero, Dyadic.Zero));
        Assert.Null(NearestValue.Of(BinaryFormat.Binary64, Ball.WholeLine));
    }

    [Fact]
    public void Bounds_in_binary64_are_above_and_near()
    {
        Gen.Select(Gen.ULong, Gen.ULong, Gen.Int[-900, 700]).Sample((high, low, exponent) =>
        {
            var value = new Dyadic(((BigInteger)high << 64) + low, exponent);
            double bound = NearestValue.ToDoubleUpward(value);
            Assert.True(Rational.FromDouble(bound) >= value.ToRational());
            Assert.True(value.IsZero || Rational.FromDouble(Math.BitDecrement(bound)) < value.ToRational());
        });
        Assert.Equal(0, NearestValue.ToDoubleUpward(Dyadic.Zero));
        Assert.Equal(double.PositiveInfinity, NearestValue.ToDoubleUpward(new Dyadic(BigInteger.One, 1100)));
        Assert.True(NearestValue.ToDoubleUpward(Tiny) is > 0 and < 1e-290);
        Assert.Equal(0.375, NearestValue.ToDoubleUpward(new Dyadic(3, -3)));
    }

    private static Trilean Is(BinaryFormat format, ulong bits, Dyadic lower, Dyadic upper) => NearestValue.Is(format, bits, lower, upper);
}
