using System;
using System.Runtime.CompilerServices;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>Products of machine words that are wider than a machine word; the target framework has none of its own.</summary>
internal static class WideProduct
{
    /// <summary>The upper half of the 128-bit product, and the lower half.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static ulong Multiply(ulong left, ulong right, out ulong low)
    {
        ulong left0 = (uint)left, left1 = left >> 32, right0 = (uint)right, right1 = right >> 32;
        ulong low0 = left0 * right0;
        ulong cross = (left1 * right0) + (low0 >> 32);
        ulong middle = (left0 * right1) + (uint)cross;
        low = (middle << 32) | (uint)low0;
        return (left1 * right1) + (cross >> 32) + (middle >> 32);
    }

    /// <summary>The upper half of the 128-bit product.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static ulong High(ulong left, ulong right) => Multiply(left, right, out _);

    /// <summary>
    /// The upper 128 bits of the 256-bit product of two 128-bit numbers, rounded down, and the 64 bits below them.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static ulong Multiply(
        ulong leftHigh, ulong leftLow, ulong rightHigh, ulong rightLow, out ulong low, out ulong below)
    {
        ulong high = Multiply(leftHigh, rightHigh, out low);
        ulong firstHigh = Multiply(leftHigh, rightLow, out ulong firstLow);
        ulong secondHigh = Multiply(leftLow, rightHigh, out ulong secondLow);
        below = High(leftLow, rightLow);
        ulong carry = Add(ref below, firstLow);
        carry += Add(ref below, secondLow);
        high += Add(ref low, firstHigh);
        high += Add(ref low, secondHigh);
        high += Add(ref low, carry);
        return high;
    }

    /// <summary>Adds to a word and tells the carry.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static ulong Add(ref ulong word, ulong addend)
    {
        word += addend;
        return word < addend ? 1UL : 0UL;
    }

    /// <summary>The number of zero bits above the leading bit; 64 for zero.</summary>
    internal static int LeadingZeros(ulong value)
    {
        var upper = (uint)(value >> 32);
        uint word = upper != 0 ? upper : (uint)value;
        if (word == 0)
        {
            return 64;
        }

        // A double holds 32 bits exactly, so that its exponent is that of the leading bit.
        int exponent = (int)(BitConverter.DoubleToInt64Bits(word) >> 52) - 1023;
        return (upper != 0 ? 31 : 63) - exponent;
    }
}
