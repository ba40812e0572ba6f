using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Integrals;

/// <summary>
/// Rough sizes, by which a proof chooses precisions and panels. Nothing rests on them: what they choose badly costs time or leaves an
/// enclosure wide. Additions, multiplications and divisions only, so that every host chooses alike.
/// </summary>
internal static class Estimate
{
    /// <summary>log₂ e.</summary>
    public const double BitsPerUnit = 1.4426950408889634;

    /// <summary>How far <see cref="Log2(double)"/> may be from the logarithm.</summary>
    public const double Log2Error = 0.09;

    /// <summary>A binary64 number near the given one; infinite or zero where that is out of range.</summary>
    public static double Of(Dyadic value)
    {
        int shift = Math.Max(0, value.BitLength - 53);
        double result = (double)(long)(value.Mantissa >> shift);
        long exponent = (long)value.Exponent + shift;
        while (exponent != 0 && result != 0 && !double.IsInfinity(result))
        {
            int step = (int)Math.Max(-512, Math.Min(512, exponent));
            result *= PowerOfTwo(step);
            exponent -= step;
        }

        return result;
    }

    /// <summary>A binary64 number near the ball's midpoint; NaN for the whole line.</summary>
    public static double Of(Ball value) => value.IsFinite ? Of(value.Center) : double.NaN;

    /// <summary>log₂ of a number above zero, too small by less than <see cref="Log2Error"/>; −∞ for zero.</summary>
    public static double Log2(double value)
    {
        if (!(value > 0) || double.IsInfinity(value))
        {
            return value > 0 ? double.PositiveInfinity : double.NegativeInfinity;
        }

        int correction = 0;
        if (value < PowerOfTwo(-1000))
        {
            value *= PowerOfTwo(512);
            correction = -512;
        }

        long bits = BitConverter.DoubleToInt64Bits(value);
        double significand = BitConverter.Int64BitsToDouble((bits & ((1L << 52) - 1)) | (1023L << 52));
        return (bits >> 52) - 1023 + correction + (significand - 1);
    }

    /// <summary>The given number, which must be finite, exactly.</summary>
    public static Dyadic Exactly(double value)
    {
        long bits = BitConverter.DoubleToInt64Bits(value);
        int biased = (int)((bits >> 52) & 0x7ff);
        BigInteger significand = (bits & ((1L << 52) - 1)) | (biased == 0 ? 0 : 1L << 52);
        return new Dyadic(value < 0 ? -significand : significand, Math.Max(biased, 1) - 1075).Reduce();
    }

    private static double PowerOfTwo(int exponent) => BitConverter.Int64BitsToDouble((exponent + 1023L) << 52);
}
