using System;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>The integer square root.</summary>
internal static class IntegerRoot
{
    /// <summary>The largest s with s² ≤ value, and the remainder value − s².</summary>
    /// <remarks>
    /// The recursive square root with remainder of Zimmermann, "Karatsuba Square Root" (1999), here in bits: the root of the upper
    /// half gives the upper half of the root, one division the lower half, and at most one correction is due.
    /// </remarks>
    internal static BigInteger Floor(BigInteger value, out BigInteger remainder)
    {
        int length = Magnitude.BitLength(value);
        if (length <= 62)
        {
            ulong small = (ulong)value;
            ulong smallRoot = Floor(small);
            remainder = small - (smallRoot * smallRoot);
            return smallRoot;
        }

        // The upper part has at least 2·quarter bits, so its root has at least quarter bits.
        int quarter = length / 4;
        BigInteger mask = (BigInteger.One << quarter) - 1;
        BigInteger upper = Floor(value >> (2 * quarter), out BigInteger upperRemainder);
        BigInteger dividend = (upperRemainder << quarter) + ((value >> quarter) & mask);
        BigInteger lower = BigInteger.DivRem(dividend, upper << 1, out BigInteger rest);
        BigInteger root = (upper << quarter) + lower;
        remainder = (rest << quarter) + (value & mask) - (lower * lower);
        while (remainder.Sign < 0)
        {
            remainder += (root << 1) - 1;
            root -= 1;
        }

        return root;
    }

    private static ulong Floor(ulong value)
    {
        // A guess from double arithmetic, made right with integers.
        ulong root = (ulong)Math.Sqrt(value);
        while (root * root > value)
        {
            root--;
        }

        while ((root + 1) * (root + 1) <= value)
        {
            root++;
        }

        return root;
    }
}
