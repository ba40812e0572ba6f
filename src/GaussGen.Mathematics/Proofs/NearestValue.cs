using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// Whether found bits are the representable value nearest to a number, decided by comparing the number with the two midpoints
/// around the found value; nothing is rounded on this road.
/// </summary>
internal static class NearestValue
{
    /// <summary>
    /// Whether the bits are the nearest value, ties to even, of every number from <paramref name="lower"/> to
    /// <paramref name="upper"/>; false if of none of them. The encodings of NaN, of the infinities and of −0 are never right.
    /// </summary>
    public static Trilean Is(BinaryFormat format, ulong bits, Dyadic lower, Dyadic upper)
    {
        if (!format.IsFinite(bits) || bits == format.SignBit)
        {
            return Trilean.False;
        }

        (Dyadic from, Dyadic to) = format.RoundingInterval(bits);
        bool endsBelong = (bits & 1) == 0;
        if (endsBelong ? from <= lower && upper <= to : from < lower && upper < to)
        {
            return Trilean.True;
        }

        bool apart = endsBelong ? upper < from || to < lower : upper <= from || to <= lower;
        return apart ? Trilean.False : Trilean.Unknown;
    }

    /// <summary>
    /// The bits that are the nearest value of every number in a ball; <c>null</c> where the ball does not decide. Rounding proposes
    /// the bits, and <see cref="Is"/> has the last word on them.
    /// </summary>
    public static ulong? Of(BinaryFormat format, Ball value)
    {
        if (!format.TryRound(value, out ulong bits, out _))
        {
            return null;
        }

        return format.IsInfinity(bits) || Is(format, bits, value.Lower, value.Upper) == Trilean.True ? bits : null;
    }

    /// <summary>
    /// An upper bound of the distance between the found value and every number from <paramref name="lower"/> to
    /// <paramref name="upper"/>, in units in the last place of the right value; infinite if the found bits are no number.
    /// </summary>
    public static double DistanceInUlp(BinaryFormat format, ulong found, ulong right, Dyadic lower, Dyadic upper)
    {
        if (!format.IsFinite(found))
        {
            return double.PositiveInfinity;
        }

        Dyadic value = format.ValueOf(found);
        Dyadic below = Dyadic.Abs(value - lower);
        Dyadic above = Dyadic.Abs(value - upper);
        return ToDoubleUpward((below > above ? below : above).ScaleByPowerOfTwo(-format.UnitExponent(right)));
    }

    /// <summary>A binary64 number that is not below the given one, which is not negative, and above it by one part in 2⁵² at most
    /// unless that is below 2^−1000.</summary>
    public static double ToDoubleUpward(Dyadic value)
    {
        if (value.Sign <= 0)
        {
            return 0;
        }

        int shift = Math.Max(0, value.BitLength - 53);
        BigInteger significand = value.Mantissa >> shift;
        if (significand << shift != value.Mantissa)
        {
            significand += BigInteger.One;
        }

        long exponent = (long)value.Exponent + shift;
        if (exponent > 1023 - 54)
        {
            return double.PositiveInfinity;
        }

        // At most 2^53, so the conversion is exact; so is each doubling and halving above the subnormal numbers.
        double result = (ulong)significand;
        if (exponent < -1000)
        {
            exponent = -1000;
        }

        for (; exponent > 0; exponent--)
        {
            result *= 2;
        }

        for (; exponent < 0; exponent++)
        {
            result /= 2;
        }

        return result;
    }
}
