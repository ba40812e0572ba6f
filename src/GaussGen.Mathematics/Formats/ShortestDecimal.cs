using System;
using System.Globalization;
using System.Numerics;

namespace GaussGen.Mathematics.Formats;

/// <summary>
/// Writes a number with the fewest decimal digits that read back as the same number, and of those the digits closest to it:
/// the criterion of Steele and White, "How to print floating-point numbers accurately" (1990). Exact integers decide, never the
/// host's formatting, so the text is the same on every host.
/// </summary>
/// <remarks>
/// With w the width of the interval that reads back as the number and 10^k ≤ w &lt; 10^(k+1), the interval contains at least one
/// multiple of 10^k and at most one of 10^(k+1). The latter, where there is one, has the fewest digits (everything shorter is one
/// too); else it is the multiple of 10^k closest to the number. That two decades suffice is due to Giulietti, "The Schubfach
/// way to render doubles" (2020).
/// </remarks>
public static class ShortestDecimal
{
    // The decimal point is written in place where that takes few zeros.
    private const int LeastPoint = -3;
    private const int GreatestPoint = 16;

    /// <summary>
    /// The body of a C# literal of type <c>double</c>, a minus sign first where the number is negative: "0.1", "-2.0", "1E-5",
    /// "1.5E+300". There is always a point or an exponent, so that it is never an integer literal. A suffix such as <c>f</c> may follow.
    /// </summary>
    /// <param name="bits">The number's encoding. −0 is written "-0.0".</param>
    /// <param name="format">The number format that the text is read in.</param>
    /// <exception cref="ArgumentOutOfRangeException">The encoding is not of a finite number.</exception>
    public static string Write(ulong bits, BinaryFormat format)
    {
        string sign = format.IsNegative(bits) ? "-" : string.Empty;
        if (format.IsZero(bits))
        {
            return sign + "0.0";
        }

        ulong digits = Digits(bits, format, out int exponent);
        return sign + Layout(digits.ToString(CultureInfo.InvariantCulture), exponent);
    }

    /// <summary>The magnitude is about digits · 10^exponent, digits without a trailing zero.</summary>
    private static ulong Digits(ulong bits, BinaryFormat format, out int exponent)
    {
        // In quarters of a unit in the last place: the number is 4f, the interval reaches from 4f − down to 4f + 2.
        format.Decompose(bits, out ulong significand, out int unit);
        ulong hidden = 1UL << (format.Precision - 1);
        bool isNarrow = significand == hidden && unit > format.MinimumExponent;
        int down = isNarrow ? 1 : 2;
        int decade = ScaleToDecade(isNarrow ? 3 : 4, unit - 2, out BigInteger step, out BigInteger divisor);
        var whole = (ulong)BigInteger.DivRem((significand << 2) * step, divisor, out BigInteger above);

        // An end reads back as the number where ties go to it.
        int closed = (significand & 1) == 0 ? 0 : -1;
        exponent = decade;
        ulong digits = Choose(whole, above, divisor, down * step, 2 * step, closed);
        while (digits % 10 == 0)
        {
            digits /= 10;
            exponent++;
        }

        return digits;
    }

    /// <summary>
    /// The shortest and closest multiple in the interval around (whole + above/divisor), which reaches down and up by the given
    /// parts of the divisor.
    /// </summary>
    private static ulong Choose(
        ulong whole, BigInteger above, BigInteger divisor, BigInteger down, BigInteger up, int closed)
    {
        ulong last = whole % 10;
        if (whole > last && (above + (last * divisor)).CompareTo(down) <= closed)
        {
            return whole - last;
        }

        if ((((10 - last) * divisor) - above).CompareTo(up) <= closed)
        {
            return whole + (10 - last);
        }

        BigInteger below = divisor - above;
        bool isWholeInside = above.CompareTo(down) <= closed;
        bool isNextInside = below.CompareTo(up) <= closed;
        int closer = above.CompareTo(below);
        bool isWholeCloser = closer < 0 || (closer == 0 && (whole & 1) == 0);
        return isWholeInside && (isWholeCloser || !isNextInside) ? whole : whole + 1;
    }

    /// <summary>
    /// The greatest k with 10^k ≤ factor · 2^power, factor 3 or 4, and 2^power as step/divisor multiples of 10^k.
    /// </summary>
    private static int ScaleToDecade(int factor, int power, out BigInteger step, out BigInteger divisor)
    {
        // A guess from below, with ½ log₁₀ 2 = 161614249.6…/2³⁰, log₂ 3 > 3/2 and 2⁻¹⁰ to spare, is made right with integers.
        int decade = (int)((((2L * power) + factor) * 161614249L - (1L << 20)) >> 30);
        while (true)
        {
            int twos = power - decade;
            step = BigInteger.Pow(5, Math.Max(-decade, 0)) << Math.Max(twos, 0);
            divisor = BigInteger.Pow(5, Math.Max(decade, 0)) << Math.Max(-twos, 0);
            if (factor * step < 10 * divisor)
            {
                return decade;
            }

            decade++;
        }
    }

    private static string Layout(string digits, int exponent)
    {
        // The value is 0.digits · 10^point.
        int point = digits.Length + exponent;
        if (point is < LeastPoint or > GreatestPoint)
        {
            string fraction = digits.Length > 1 ? "." + digits.Substring(1) : string.Empty;
            int power = point - 1;
            return digits.Substring(0, 1) + fraction + (power < 0 ? "E" : "E+") + power.ToString(CultureInfo.InvariantCulture);
        }

        return point <= 0 ? "0." + new string('0', -point) + digits
            : point >= digits.Length ? digits + new string('0', point - digits.Length) + ".0"
            : digits.Substring(0, point) + "." + digits.Substring(point);
    }
}
