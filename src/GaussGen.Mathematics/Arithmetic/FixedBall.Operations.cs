using System;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <content>Arithmetic. Results have the leading bit of their mantissa set; integers decide every bit of them.</content>
public readonly partial struct FixedBall
{
    private const ulong LeadingBit = 1UL << 63;
    private const ulong LargestRadius = 1UL << 62;

    /// <summary>Whether the leading bit of the mantissa is set, as operands of a product or quotient need it.</summary>
    public bool IsNormalized => High >= LeadingBit;

    /// <summary>The integer itself, normalized.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The integer is zero.</exception>
    public static FixedBall FromInteger(ulong value) => new FixedBall(value, 0, -64, false, 0).Normalize();

    /// <summary>The product of two normalized enclosures.</summary>
    /// <exception cref="OverflowException">The radius does not fit.</exception>
    public static FixedBall Multiply(in FixedBall left, in FixedBall right)
    {
        ulong high = WideProduct.Multiply(left.High, left.Low, right.High, right.Low, out ulong low, out ulong below);
        // In units of the product's 128-bit mantissa, 2^128 of the units of the exact product M·N:
        // ((M + r)(N + s) − MN) / 2^128 ≤ r + s + 1, as M and N are below 2^128 and r·s too; and one unit that is cut off.
        ulong radius = checked(left.RadiusUnits + right.RadiusUnits + 1);
        int exponent = checked(left.Exponent + right.Exponent + 128);
        if (high < LeadingBit)
        {
            // Both mantissas are at least 2^127, so that one place is missing at most.
            high = (high << 1) | (low >> 63);
            low = (low << 1) | (below >> 63);
            radius = checked(2 * radius);
            exponent--;
        }

        bool isExact = left.RadiusUnits == 0 && right.RadiusUnits == 0;
        return new FixedBall(high, low, exponent, left.IsNegative != right.IsNegative, isExact ? 1 : checked(radius + 1));
    }

    /// <summary>A normalized enclosure times a small factor.</summary>
    /// <param name="left">The enclosure.</param>
    /// <param name="factor">The factor, above zero.</param>
    /// <exception cref="OverflowException">The radius does not fit.</exception>
    public static FixedBall Multiply(in FixedBall left, uint factor)
    {
        ulong digit0 = (left.Low & uint.MaxValue) * factor;
        ulong digit1 = ((left.Low >> 32) * factor) + (digit0 >> 32);
        ulong digit2 = ((left.High & uint.MaxValue) * factor) + (digit1 >> 32);
        ulong digit3 = ((left.High >> 32) * factor) + (digit2 >> 32);
        ulong top = digit3 >> 32;
        ulong high = (digit3 << 32) | (uint)digit2;
        ulong low = (digit1 << 32) | (uint)digit0;
        if (top == 0)
        {
            return new FixedBall(high, low, left.Exponent, left.IsNegative, checked(left.RadiusUnits * factor));
        }

        // The mantissa is at least 2^127 · factor, so that a shift by the bits of the top digit leaves the leading bit set.
        int shift = 64 - WideProduct.LeadingZeros(top);
        bool isExact = low << (64 - shift) == 0;
        ulong radius = left.RadiusUnits == 0 ? 0 : ((checked(left.RadiusUnits * factor) - 1) >> shift) + 1;
        return new FixedBall(
            (top << (64 - shift)) | (high >> shift),
            (high << (64 - shift)) | (low >> shift),
            checked(left.Exponent + shift),
            left.IsNegative,
            isExact ? radius : checked(radius + 1));
    }

    /// <summary>The quotient of two normalized enclosures.</summary>
    /// <exception cref="ArgumentException">An enclosure is not normalized, or its radius is above 2⁶² units.</exception>
    /// <remarks>
    /// Quotient digits of 43 bits are guessed in <see cref="double"/>; the remainder is an exact integer, and the quotient is
    /// corrected until that lies between zero and the divisor, so that a wrong guess can cost time only.
    /// </remarks>
    /// <exception cref="OverflowException">The radius does not fit.</exception>
    public static FixedBall Divide(in FixedBall left, in FixedBall right)
    {
        if (!left.IsNormalized || !right.IsNormalized || left.RadiusUnits > LargestRadius || right.RadiusUnits > LargestRadius)
        {
            throw new ArgumentException("The leading bit of both mantissas must be set, and both radii at most 2^62 units.");
        }

        bool isBelow = left.High < right.High || (left.High == right.High && left.Low < right.Low);
        // ⌊M · 2^shift / N⌋ with its leading bit set.
        int shift = isBelow ? 128 : 127;
        FixedDivision.Quotient(
            left.High, left.Low, shift, right.High, right.Low, out ulong high, out ulong low, out bool isExact);
        // In units of the quotient Q = 2^shift·M/N: ((M + r)/(N − s) − M/N)·2^shift = 2^shift·(r + (M/N)s)/(N − s), where
        // 2^shift/N ≤ 2 and M/N < 1 for shift 128, 2^shift/N ≤ 1 and M/N < 2 for 127; so at most 2(r + s)·N/(N − s),
        // and N/(N − s) ≤ 1 + 2^−64 for s ≤ 2^62, which adds one unit at most.
        ulong slack = left.RadiusUnits == 0 && right.RadiusUnits == 0 ? 0UL : 1UL;
        ulong radius = checked((2 * (left.RadiusUnits + right.RadiusUnits)) + slack + (isExact ? 0UL : 1UL));
        int exponent = checked(left.Exponent - right.Exponent - shift);
        return new FixedBall(high, low, exponent, left.IsNegative != right.IsNegative, radius);
    }

    /// <summary>The opposite numbers.</summary>
    public FixedBall Negate() => new(High, Low, Exponent, !IsNegative, RadiusUnits);

    /// <summary>The numbers times 2^<paramref name="power"/>, exactly.</summary>
    public FixedBall ScaleByPowerOfTwo(int power) => new(High, Low, checked(Exponent + power), IsNegative, RadiusUnits);

    /// <summary>The same enclosure with the leading bit of its mantissa set.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The mantissa is zero.</exception>
    /// <exception cref="OverflowException">The radius does not fit.</exception>
    public FixedBall Normalize()
    {
        if (High == 0 && Low == 0)
        {
            throw new ArgumentOutOfRangeException(nameof(High), "Zero has no leading bit.");
        }

        int shift = High != 0 ? WideProduct.LeadingZeros(High) : 64 + WideProduct.LeadingZeros(Low);
        ulong high = shift >= 64 ? Low << (shift - 64) : shift == 0 ? High : (High << shift) | (Low >> (64 - shift));
        ulong low = shift >= 64 ? 0 : Low << shift;
        if (RadiusUnits != 0 && (shift >= 64 || RadiusUnits > ulong.MaxValue >> shift))
        {
            throw new OverflowException("The radius does not fit into 64 bits once the leading bit of the mantissa is set.");
        }

        ulong radius = RadiusUnits == 0 ? 0 : RadiusUnits << shift;
        return new FixedBall(high, low, checked(Exponent - shift), IsNegative, radius);
    }

    /// <summary>
    /// The same enclosure, widened to a radius that does not depend on how it was found; <c>null</c> where it is wider than that.
    /// </summary>
    /// <param name="radiusUnits">The radius in units of the mantissa's last place.</param>
    public FixedBall? WidenTo(ulong radiusUnits) =>
        RadiusUnits <= radiusUnits ? new FixedBall(High, Low, Exponent, IsNegative, radiusUnits) : null;

    /// <summary>The enclosure as a ball.</summary>
    public Ball ToBall()
    {
        BigInteger mantissa = ((BigInteger)High << 64) | Low;
        return new Ball(IsNegative ? -mantissa : mantissa, Exponent, Bound.FromParts(RadiusUnits, Exponent));
    }
}
