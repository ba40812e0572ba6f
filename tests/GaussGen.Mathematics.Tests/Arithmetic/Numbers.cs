using System.Numerics;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>Generators of numbers, biased to where arithmetic goes wrong: zeros, powers of two and their neighbours.</summary>
internal static class Numbers
{
    /// <summary>Integers of up to 400 bits: random, next to a power of two, of one long run of ones, or small.</summary>
    internal static Gen<BigInteger> Integer { get; } = Gen.Frequency(
        (4, Gen.Select(Gen.Int[1, 400], Gen.ULong.Array[7], (bits, words) => Random(bits, words))),
        (2, Gen.Select(Gen.Int[0, 400], Gen.Int[-2, 2], (bits, d) => (BigInteger.One << bits) + d)),
        (1, Gen.Select(Gen.Int[1, 200], Gen.Int[0, 200], (ones, zeros) => ((BigInteger.One << ones) - 1) << zeros)),
        (2, Gen.Int[-3, 3].Select(i => (BigInteger)i)))
        .SelectMany(value => Gen.Bool.Select(negative => negative ? -value : value));

    internal static Gen<BigInteger> PositiveInteger { get; } =
        Integer.Select(value => value.IsZero ? BigInteger.One : BigInteger.Abs(value));

    internal static Gen<Rational> Rational { get; } =
        Gen.Select(Integer, PositiveInteger, (numerator, denominator) => new Rational(numerator, denominator));

    internal static Gen<Dyadic> Dyadic { get; } =
        Gen.Select(Integer, Gen.Int[-500, 200], (mantissa, exponent) => new Dyadic(mantissa, exponent));

    internal static Gen<Bound> Bound { get; } = Gen.Frequency(
        (1, Gen.Const(GaussGen.Mathematics.Arithmetic.Bound.Zero)),
        (6, Gen.Select(Mantissa(), Gen.Int[-500, 200], GaussGen.Mathematics.Arithmetic.Bound.FromParts)));

    /// <summary>Exact, narrow and wide balls; some contain zero or touch it.</summary>
    internal static Gen<Ball> Ball { get; } = Gen.Frequency(
        (2, Dyadic.Select(GaussGen.Mathematics.Arithmetic.Ball.FromDyadic)),
        (6, Gen.Select(Dyadic, Mantissa(), Gen.Int[-300, 8], WithRelativeRadius)),
        (1, Gen.Select(Dyadic, Bound, (center, radius) => new Ball(center.Mantissa, center.Exponent, radius))),
        (1, Gen.Select(Mantissa(), Gen.Int[-300, 100], Gen.Bool, Touching)));

    internal static Gen<int> Precision { get; } = Gen.Frequency(
        (1, Gen.Int[1, 8]), (4, Gen.Int[16, 300]), (1, Gen.Int[400, 1100]));

    /// <summary>A place in a ball: −1 and 1 are its ends.</summary>
    internal static Gen<Rational> Place { get; } = Gen.Frequency(
        (2, Gen.Int[-1, 1].Select(i => (Rational)i)),
        (1, Gen.Int[-1000, 1000].Select(i => new Rational(i, 1000))));

    /// <summary>Encodings of finite numbers in a format, biased to zero, subnormal numbers, powers of two and the largest one.</summary>
    internal static Gen<ulong> Encoding(GaussGen.Mathematics.Formats.BinaryFormat format)
    {
        ulong hidden = 1UL << (format.Precision - 1);
        ulong magnitudes = format.Infinity;
        return Gen.Frequency(
                (4, Gen.ULong[0, magnitudes - 1]),
                (1, Gen.ULong[0, 4]),
                (1, Gen.ULong[hidden - 3, hidden + 3]),
                (1, Gen.ULong[0, hidden - 1]),
                (1, Gen.ULong[magnitudes - 4, magnitudes - 1]),
                (2, Gen.Select(Gen.ULong[1, (magnitudes / hidden) - 1], Gen.Int[-1, 1], (e, d) => (e * hidden) + (ulong)(long)d)))
            .SelectMany(bits => Gen.Bool.Select(negative => negative && bits != 0 ? bits | format.SignBit : bits));
    }

    internal static Rational At(Ball ball, Rational place) =>
        ball.Center.ToRational() + (place * ball.Radius.ToDyadic().ToRational());

    private static Gen<ulong> Mantissa() => Gen.Frequency(
        (3, Gen.ULong), (1, Gen.ULong[1, 5]), (1, Gen.ULong[(1UL << 32) - 3, (1UL << 32) + 3]), (1, Gen.Const(ulong.MaxValue)))
        .Select(mantissa => mantissa == 0 ? 1UL : mantissa);

    private static BigInteger Random(int bits, ulong[] words)
    {
        BigInteger value = BigInteger.Zero;
        foreach (ulong word in words)
        {
            value = (value << 64) + word;
        }

        return (value & ((BigInteger.One << bits) - 1)) | (BigInteger.One << (bits - 1));
    }

    private static Ball WithRelativeRadius(Dyadic center, ulong mantissa, int log2)
    {
        int exponent = center.Exponent + center.BitLength + log2 - 64;
        return new Ball(center.Mantissa, center.Exponent, GaussGen.Mathematics.Arithmetic.Bound.FromParts(mantissa, exponent));
    }

    private static Ball Touching(ulong mantissa, int exponent, bool negative)
    {
        Bound radius = GaussGen.Mathematics.Arithmetic.Bound.FromParts(mantissa, exponent);
        Dyadic center = radius.ToDyadic();
        return new Ball(negative ? -center.Mantissa : center.Mantissa, center.Exponent, radius);
    }
}
