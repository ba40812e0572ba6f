using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// A signed fixed-point number of 128 bits with 120 of them behind the point, for the few terms of the Taylor series at a node.
/// One unit is 2⁻¹²⁰. Sums are exact; products are rounded towards zero, off by less than one unit.
/// </summary>
internal readonly struct TaylorFixed(long high, ulong low)
{
    internal const int FractionBits = 120;

    /// <summary>2⁻¹²⁰.</summary>
    internal const double Unit = 1.0 / (1L << 60) / (1L << 60);

    internal long High { get; } = high;

    internal ulong Low { get; } = low;

    internal static TaylorFixed One => new(1L << (FractionBits - 64), 0);

    internal bool IsNegative => High < 0;

    public static TaylorFixed operator +(TaylorFixed left, TaylorFixed right)
    {
        ulong low = left.Low + right.Low;
        return new TaylorFixed(left.High + right.High + (low < right.Low ? 1 : 0), low);
    }

    public static TaylorFixed operator -(TaylorFixed left, TaylorFixed right)
    {
        ulong low = left.Low - right.Low;
        return new TaylorFixed(left.High - right.High - (left.Low < right.Low ? 1 : 0), low);
    }

    public static TaylorFixed operator -(TaylorFixed value) => new TaylorFixed(0, 0) - value;

    /// <summary>The product, where it is below 2⁶ in magnitude.</summary>
    public static TaylorFixed operator *(TaylorFixed left, TaylorFixed right)
    {
        left.Magnitude(out ulong leftHigh, out ulong leftLow);
        right.Magnitude(out ulong rightHigh, out ulong rightLow);
        ulong high = WideProduct.Multiply(leftHigh, leftLow, rightHigh, rightLow, out ulong low, out ulong below);
        // The product has 240 bits behind the point, so its upper 128 bits have 112.
        var product = new TaylorFixed((long)((high << 8) | (low >> 56)), (low << 8) | (below >> 56));
        return left.IsNegative != right.IsNegative ? -product : product;
    }

    /// <summary>The product with factor/2⁶², |factor| at most 2⁶³ − 1.</summary>
    internal TaylorFixed Times62(long factor)
    {
        Magnitude(out ulong high, out ulong low);
        var magnitude = (ulong)(factor < 0 ? -factor : factor);
        ulong carry = WideProduct.Multiply(low, magnitude, out ulong word0);
        ulong word2 = WideProduct.Multiply(high, magnitude, out ulong word1);
        word2 += WideProduct.Add(ref word1, carry);
        var product = new TaylorFixed((long)((word2 << 2) | (word1 >> 62)), (word1 << 2) | (word0 >> 62));
        return IsNegative != factor < 0 ? -product : product;
    }

    /// <summary>The exact product with a small factor, where it stays below 2⁷ in magnitude.</summary>
    internal TaylorFixed Times(uint factor)
    {
        ulong carry = WideProduct.Multiply(Low, factor, out ulong low);
        return new TaylorFixed((High * factor) + (long)carry, low);
    }

    /// <summary>units · factor/2⁶², rounded towards zero.</summary>
    internal static long Times62(long units, long factor)
    {
        var left = (ulong)(units < 0 ? -units : units);
        ulong high = WideProduct.Multiply(left, (ulong)(factor < 0 ? -factor : factor), out ulong low);
        var product = (long)((high << 2) | (low >> 62));
        return units < 0 != factor < 0 ? -product : product;
    }

    /// <summary>So many units.</summary>
    internal static TaylorFixed FromUnits(long units) => new(units >> 63, (ulong)units);

    /// <summary>The number times 2^power, for 0 &lt; power &lt; 64 and where it stays below 2⁷ in magnitude.</summary>
    internal TaylorFixed ShiftLeft(int power) => new((High << power) | (long)(Low >> (64 - power)), Low << power);

    /// <summary>The number in units, where it has at most 63 bits.</summary>
    internal long ToUnits() => (long)Low;

    /// <summary>The number over 2^power rounded down, for 0 &lt; power &lt; 64.</summary>
    internal TaylorFixed ShiftRight(int power) => new(High >> power, ((ulong)High << (64 - power)) | (Low >> power));

    /// <summary>The magnitude in units.</summary>
    internal void Magnitude(out ulong high, out ulong low)
    {
        var sign = (ulong)(High >> 63);
        low = (Low ^ sign) - sign;
        high = ((ulong)High ^ sign) + (sign != 0 && Low == 0 ? 1UL : 0UL);
    }

    /// <summary>The number as a double, for a seed or an error bound only.</summary>
    internal double ToDouble()
    {
        Magnitude(out ulong high, out ulong low);
        double magnitude = ((high * 18446744073709551616.0) + low) * Unit;
        return IsNegative ? -magnitude : magnitude;
    }
}
