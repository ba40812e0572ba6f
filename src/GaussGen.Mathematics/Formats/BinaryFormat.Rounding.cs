using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Formats;

/// <content>Rounding to the format.</content>
public sealed partial class BinaryFormat
{
    /// <summary>The encoding of the number nearest to a rational one.</summary>
    public ulong Round(Rational value)
    {
        if (value.IsZero)
        {
            return 0;
        }

        BigInteger numerator = BigInteger.Abs(value.Numerator);
        BigInteger denominator = value.Denominator;
        // The quotient gets at least Precision + 2 bits; what it leaves out is remembered as one sticky bit.
        int shift = Magnitude.BitLength(denominator) - Magnitude.BitLength(numerator) + Precision + 2;
        if (shift > 0)
        {
            numerator <<= shift;
        }
        else
        {
            denominator <<= -shift;
        }

        BigInteger quotient = BigInteger.DivRem(numerator, denominator, out BigInteger remainder);
        return RoundMagnitude((quotient << 1) + (remainder.IsZero ? 0 : 1), -shift - 1, value.Sign < 0);
    }

    /// <summary>The encoding of the number nearest to a dyadic one.</summary>
    public ulong Round(Dyadic value) =>
        value.IsZero ? 0 : RoundMagnitude(BigInteger.Abs(value.Mantissa), value.Exponent, value.Sign < 0);

    /// <summary>The encoding of the number that is nearest to every number in a ball, where there is one.</summary>
    /// <param name="value">The ball.</param>
    /// <param name="bits">The encoding; zero where the ball does not decide.</param>
    /// <param name="widthLog2">
    /// log₂ of the ball's width in units in the last place of the result, rounded up; <see cref="int.MinValue"/> for a single number.
    /// </param>
    /// <returns>Whether all numbers in the ball round alike.</returns>
    public bool TryRound(Ball value, out ulong bits, out int widthLog2)
    {
        bits = 0;
        widthLog2 = int.MinValue;
        if (!value.IsFinite)
        {
            return false;
        }

        // Rounding is monotonic: what both ends round to, everything between them rounds to.
        ulong lower = Round(value.Lower);
        if (!value.IsExact)
        {
            if (Round(value.Upper) != lower)
            {
                return false;
            }

            widthLog2 = checked(value.Radius.CeilingLog2 + 1 - UnitExponent(lower));
        }

        bits = lower;
        return true;
    }

    /// <summary>The same for an enclosure in fixed-size integers, without big ones.</summary>
    /// <param name="value">The enclosure.</param>
    /// <param name="bits">The encoding; zero where the enclosure does not decide.</param>
    /// <param name="widthLog2">
    /// log₂ of the enclosure's width in units in the last place of the result, rounded up; <see cref="int.MinValue"/> for a single number.
    /// </param>
    /// <returns>Whether all numbers in the enclosure round alike.</returns>
    public bool TryRound(in FixedBall value, out ulong bits, out int widthLog2)
    {
        bits = 0;
        widthLog2 = int.MinValue;

        // The lower end in magnitude, negative where the enclosure reaches across zero.
        ulong low = value.Low - value.RadiusUnits;
        bool borrow = value.Low < value.RadiusUnits;
        bool across = borrow && value.High == 0;
        ulong inner = across
            ? RoundMagnitude(0, value.RadiusUnits - value.Low, value.Exponent, !value.IsNegative)
            : RoundMagnitude(borrow ? value.High - 1 : value.High, low, value.Exponent, value.IsNegative);

        // The upper end in magnitude; a carry out of 128 bits is taken in by halving, rounded outward.
        ulong highSum = value.High;
        ulong lowSum = value.Low + value.RadiusUnits;
        int exponent = value.Exponent;
        if (lowSum < value.RadiusUnits && ++highSum == 0)
        {
            lowSum = (lowSum >> 1) + (lowSum & 1);
            highSum = 1UL << 63;
            exponent++;
        }

        if (RoundMagnitude(highSum, lowSum, exponent, value.IsNegative) != inner)
        {
            return false;
        }

        bits = inner;
        if (value.RadiusUnits != 0)
        {
            widthLog2 = checked(Magnitude.BitLength(value.RadiusUnits - 1) + 1 + value.Exponent - UnitExponent(bits));
        }

        return true;
    }

    /// <summary>The encoding nearest to ±magnitude · 2^exponent, magnitude above zero.</summary>
    private ulong RoundMagnitude(BigInteger magnitude, int exponent, bool isNegative)
    {
        long top = (long)Magnitude.BitLength(magnitude) + exponent;
        if (IsOutOfRange(top, isNegative, out ulong bits))
        {
            return bits;
        }

        // The exponent of the last place: that of the binade, or of the subnormal numbers.
        int unit = (int)Math.Max(top - Precision, MinimumExponent);
        int shift = checked(unit - exponent);
        if (shift <= 0)
        {
            return Encode((ulong)(magnitude << -shift), unit, isNegative);
        }

        // Kept bits, the one below them, and whether anything is below that.
        var withHalf = (ulong)(magnitude >> (shift - 1));
        bool isSticky = shift > 1 && (magnitude & ((BigInteger.One << (shift - 1)) - 1)).Sign != 0;
        return Encode(RoundHalf(withHalf, isSticky), unit, isNegative);
    }

    /// <summary>The same for a magnitude of 128 bits, zero included.</summary>
    private ulong RoundMagnitude(ulong high, ulong low, int exponent, bool isNegative)
    {
        if (high == 0 && low == 0)
        {
            return 0;
        }

        long top = (high != 0 ? 64L + Magnitude.BitLength(high) : Magnitude.BitLength(low)) + exponent;
        if (IsOutOfRange(top, isNegative, out ulong bits))
        {
            return bits;
        }

        int unit = (int)Math.Max(top - Precision, MinimumExponent);
        int shift = checked(unit - exponent);
        if (shift <= 0)
        {
            // The number has at most Precision bits, so the upper half is empty.
            return Encode(low << -shift, unit, isNegative);
        }

        int below = shift - 1;
        ulong withHalf = below >= 128 ? 0 : below >= 64 ? high >> (below - 64) : Join(high, low, below);
        bool isSticky = below >= 128 || (below >= 64
            ? low != 0 || (high & LowBits(below - 64)) != 0
            : (low & LowBits(below)) != 0);
        return Encode(RoundHalf(withHalf, isSticky), unit, isNegative);
    }

    /// <summary>What is certain from the leading bit alone: beyond the largest binade, or below half the smallest number.</summary>
    private bool IsOutOfRange(long top, bool isNegative, out ulong bits)
    {
        bits = top - 1 > MaximumExponent ? Infinity | (isNegative ? SignBit : 0) : 0;
        return bits != 0 || top < MinimumExponent;
    }

    /// <summary>The encoding of significand · 2^unit. A significand rounded up to a power of two carries into the exponent.</summary>
    private ulong Encode(ulong significand, int unit, bool isNegative)
    {
        ulong magnitude = significand + ((ulong)(unit - MinimumExponent) << (Precision - 1));
        return magnitude == 0 ? 0 : magnitude | (isNegative ? SignBit : 0);
    }

    private static ulong RoundHalf(ulong withHalf, bool isSticky)
    {
        ulong kept = withHalf >> 1;
        bool isUp = (withHalf & 1) != 0 && (isSticky || (kept & 1) != 0);
        return isUp ? kept + 1 : kept;
    }

    private static ulong Join(ulong high, ulong low, int shift) => shift == 0 ? low : (high << (64 - shift)) | (low >> shift);

    private static ulong LowBits(int count) => count == 0 ? 0 : ulong.MaxValue >> (64 - count);
}
