using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>A signed integer of five 32-bit digits; the four lower ones are not negative, the top one carries the sign.</summary>
internal readonly struct HermiteDigits(long digit0, long digit1, long digit2, long digit3, long digit4)
{
    private const double Base = 4294967296.0;

    internal long Digit0 { get; } = digit0;

    internal long Digit1 { get; } = digit1;

    internal long Digit2 { get; } = digit2;

    internal long Digit3 { get; } = digit3;

    internal long Digit4 { get; } = digit4;

    internal bool IsNegative => Digit4 < 0;

    /// <summary>The integer with a relative error below 2⁻⁵⁰, for error bounds and seeds.</summary>
    internal double ToDouble() => (((((Digit4 * Base) + Digit3) * Base) + Digit2) * Base * Base) + (Digit1 * Base) + Digit0;

    internal BigInteger ToBigInteger() =>
        ((((((((BigInteger)Digit4 << 32) + Digit3) << 32) + Digit2) << 32) + Digit1) << 32) + Digit0;

    /// <summary>The magnitude in the 128 bits high·2⁶⁴ + low, times 2^shift, rounded down where shift is above zero.</summary>
    internal int Magnitude(out ulong high, out ulong low)
    {
        // Two's complement in three words; the top word holds 32 bits.
        long sign = Digit4 >> 63;
        ulong word0 = (ulong)((Digit1 << 32) | Digit0) ^ (ulong)sign;
        ulong word1 = (ulong)((Digit3 << 32) | Digit2) ^ (ulong)sign;
        ulong word2 = (ulong)(Digit4 ^ sign);
        if (sign != 0 && ++word0 == 0 && ++word1 == 0)
        {
            word2++;
        }

        int shift = 64 - WideProduct.LeadingZeros(word2);
        high = shift == 0 ? word1 : (word2 << (64 - shift)) | (word1 >> shift);
        low = shift == 0 ? word0 : (word1 << (64 - shift)) | (word0 >> shift);
        return shift;
    }
}

/// <summary>Two neighbours of the recurrence, Mₖ and Mₖ₋₁ for Heₖ = Mₖ·2^(7k−S) with S = 158 + 32·Moves, and the error.</summary>
internal struct HermiteValues
{
    /// <summary>Mₖ.</summary>
    internal HermiteDigits Current;

    /// <summary>Mₖ₋₁.</summary>
    internal HermiteDigits Previous;

    /// <summary>How often the digits moved up.</summary>
    internal int Moves;

    /// <summary>
    /// The bound of theorem 3 in units of Mₖ: the error of Mₖ is at most this, the error of Mₖ₋₁ at most 2⁷/√k of this, where
    /// k is above the turn.
    /// </summary>
    internal double Error;

    /// <summary>M₁ and M₀ for x = point/2²⁵: both exact.</summary>
    internal HermiteValues(uint point)
    {
        Current = new HermiteDigits(0, 0, 0, (uint)((ulong)point << 30), point >> 2);
        Previous = new HermiteDigits(0, 0, 0, 0, 1L << 30);
        Moves = 0;
        Error = 0;
    }
}
