using System.Globalization;

namespace GaussGen.Mathematics.Formats;

/// <summary>
/// Writes a number exactly, as a hexadecimal floating constant of C (ISO/IEC 9899:1999, 6.4.4.2; IEEE 754-2019, 5.12.3).
/// </summary>
public static class HexadecimalFloat
{
    /// <summary>
    /// The number as "-0x1.bb67ae8584caap+0": hidden bit, fraction in lower case without trailing zeros but with one digit at least,
    /// and the power of two in decimal. Subnormal numbers keep the least exponent: "0x0.0000000000001p-1022". Zero is "0x0.0p+0".
    /// </summary>
    /// <param name="bits">The number's encoding.</param>
    /// <param name="format">Its number format.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">The encoding is not of a finite number.</exception>
    public static string Write(ulong bits, BinaryFormat format)
    {
        format.Decompose(bits, out ulong significand, out int unit);
        int fractionBits = format.Precision - 1;
        int exponent = significand == 0 ? 0 : unit + fractionBits;

        // Whole hexadecimal digits: the fraction is padded on the right.
        int count = (fractionBits + 3) / 4;
        ulong fraction = (significand & ((1UL << fractionBits) - 1)) << ((4 * count) - fractionBits);
        string digits = fraction.ToString("x" + count.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        string kept = digits.TrimEnd('0');
        return (format.IsNegative(bits) ? "-0x" : "0x")
            + (significand >> fractionBits).ToString(CultureInfo.InvariantCulture)
            + "." + (kept.Length == 0 ? "0" : kept)
            + (exponent < 0 ? "p" : "p+") + exponent.ToString(CultureInfo.InvariantCulture);
    }
}
