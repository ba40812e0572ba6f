using System;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>Sizes and leading bits of integers, without allocation where the integer has fewer than 1024 bits.</summary>
/// <remarks>
/// The conversion of a <see cref="BigInteger"/> to <see cref="double"/> serves as a look at its leading bits. Hosts round that
/// conversion differently, so its significand is trusted to one unit only, and where one unit could change the answer the
/// answer is found from the integer itself.
/// </remarks>
internal static class Magnitude
{
    private const ulong FractionMask = (1UL << 52) - 1;

    /// <summary>The number of bits of |value|; 0 for zero.</summary>
    internal static int BitLength(BigInteger value)
    {
        if (value.IsZero)
        {
            return 0;
        }

        ulong pattern = (ulong)BitConverter.DoubleToInt64Bits((double)value);
        int length = (int)((pattern >> 52) & 0x7ff) - 1022;
        ulong fraction = pattern & FractionMask;
        // Integers of 53 bits are converted exactly. Beyond, a fraction of zero may be a value just below the power of two, one of all ones a value at or above it.
        bool decided = length <= 53 || (length < 1024 && fraction != 0 && fraction != FractionMask);
        return decided ? length : ExactBitLength(value);
    }

    /// <summary>The number of bits of <paramref name="value"/>; 0 for zero.</summary>
    internal static int BitLength(ulong value)
    {
        int length = 0;
        for (int step = 32; step > 0; step >>= 1)
        {
            if (value >> step != 0)
            {
                length += step;
                value >>= step;
            }
        }

        return length + (int)value;
    }

    /// <summary>An upper bound top·2^shift of |value| &gt; 0, with top at most 2³² and not below 2³¹.</summary>
    internal static ulong LeadingAbove(BigInteger value, out int shift)
    {
        ulong significand = LeadingBits(value, out shift, out ulong slack);
        shift += 21;
        return (significand + slack + ((1UL << 21) - 1)) >> 21;
    }

    /// <summary>A lower bound top·2^shift of |value| &gt; 0, with top below 2³² and not below 2³¹ − 1.</summary>
    internal static uint LeadingBelow(BigInteger value, out int shift)
    {
        ulong significand = LeadingBits(value, out shift, out ulong slack);
        shift += 21;
        return (uint)((significand - slack) >> 21);
    }

    /// <summary>
    /// Significand s with 53 bits and shift with (s − slack)·2^shift ≤ |value| ≤ (s + slack)·2^shift, slack at most 1.
    /// </summary>
    private static ulong LeadingBits(BigInteger value, out int shift, out ulong slack)
    {
        ulong pattern = (ulong)BitConverter.DoubleToInt64Bits((double)value);
        int exponent = (int)((pattern >> 52) & 0x7ff);
        if (exponent != 0x7ff)
        {
            shift = exponent - 1075;
            // Integers below 2^53 are converted exactly.
            slack = shift > 0 ? 1UL : 0UL;
            return (pattern & FractionMask) | (1UL << 52);
        }

        shift = ExactBitLength(value) - 53;
        slack = 1;
        return (ulong)(BigInteger.Abs(value) >> shift);
    }

    private static int ExactBitLength(BigInteger value)
    {
        // Two's complement of a positive number: the top byte is zero where the one below it is full and holds no sign.
        byte[] bytes = BigInteger.Abs(value).ToByteArray();
        int top = bytes.Length - 1;
        return (top * 8) + BitLength(bytes[top]);
    }
}
