using System.Runtime.CompilerServices;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>Division of 128-bit integers.</summary>
internal static class FixedDivision
{
    private const double TwoTo64 = 18446744073709551616.0;

    /// <summary>
    /// The quotient ⌊M · 2^shift / N⌋ of 128-bit numbers M and N with their leading bits set, where it has 128 bits: for
    /// M &lt; N and shift 128, or M ≥ N and shift 127.
    /// </summary>
    internal static void Quotient(
        ulong high,
        ulong low,
        int shift,
        ulong divisorHigh,
        ulong divisorLow,
        out ulong quotientHigh,
        out ulong quotientLow,
        out bool isExact)
    {
        double reciprocal = 1.0 / divisorHigh;
        var remainder = new Remainder(high, low);
        // What stands before the point is 0 or 1. The digits behind it are remainder · 2^bits / divisor rounded towards zero, as far
        // as double tells, and bear the sign of the remainder.
        long whole = 128 - shift;
        remainder.AddMultiple(-whole, divisorHigh, divisorLow);
        long digit1 = remainder.TakeDigit(43, reciprocal, divisorHigh, divisorLow);
        long digit2 = remainder.TakeDigit(43, reciprocal, divisorHigh, divisorLow);
        int last = shift - 86;
        long digit3 = remainder.TakeDigit(last, reciprocal, divisorHigh, divisorLow);

        // ((whole·2^43 + digit1)·2^43 + digit2)·2^last + digit3, modulo 2^128; the true value fits.
        long upper = (whole << 43) + digit1;
        ulong sumHigh = (ulong)(upper >> 21);
        ulong sumLow = (ulong)upper << 43;
        Add(ref sumHigh, ref sumLow, digit2);
        sumHigh = (sumHigh << last) | (sumLow >> (64 - last));
        sumLow <<= last;
        Add(ref sumHigh, ref sumLow, digit3);

        while (remainder.IsNegative)
        {
            Add(ref sumHigh, ref sumLow, -1);
            remainder.AddMultiple(1, divisorHigh, divisorLow);
        }

        while (remainder.IsAtLeast(divisorHigh, divisorLow))
        {
            Add(ref sumHigh, ref sumLow, 1);
            remainder.AddMultiple(-1, divisorHigh, divisorLow);
        }

        quotientHigh = sumHigh;
        quotientLow = sumLow;
        isExact = remainder.IsZero;
    }

    private static void Add(ref ulong high, ref ulong low, long addend)
    {
        low += (ulong)addend;
        high += (ulong)(addend >> 63) + (low < (ulong)addend ? 1UL : 0UL);
    }

    /// <summary>A signed integer of 192 bits.</summary>
    private struct Remainder(ulong middle, ulong low)
    {
        private long _high;
        private ulong _middle = middle;
        private ulong _low = low;

        internal readonly bool IsNegative => _high < 0;

        internal readonly bool IsZero => (_high | (long)_middle | (long)_low) == 0;

        internal readonly bool IsAtLeast(ulong high, ulong low) =>
            _high > 0 || (_high == 0 && (_middle > high || (_middle == high && _low >= low)));

        /// <summary>Shifts left by less than 64, and takes off so many divisors that about one is left at most.</summary>
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        internal long TakeDigit(int shift, double reciprocal, ulong divisorHigh, ulong divisorLow)
        {
            _high = (_high << shift) | (long)(_middle >> (64 - shift));
            _middle = (_middle << shift) | (_low >> (64 - shift));
            _low <<= shift;
            // The lowest bits of the middle word are far below what a double holds of the sum.
            double quotient = ((_high * TwoTo64) + ((long)(_middle >> 1) * 2.0)) * reciprocal;
            var digit = (long)quotient;
            AddMultiple(-digit, divisorHigh, divisorLow);
            return digit;
        }

        /// <summary>Adds a multiple of the divisor, modulo 2^192.</summary>
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        internal void AddMultiple(long factor, ulong high, ulong low)
        {
            // factor + 2^64·[factor < 0] as unsigned; the multiple of 2^64 is taken off again, one word up.
            ulong carry = WideProduct.Multiply(low, (ulong)factor, out ulong word0);
            ulong word2 = WideProduct.Multiply(high, (ulong)factor, out ulong word1);
            word2 += WideProduct.Add(ref word1, carry);
            var sign = (ulong)(factor >> 63);
            ulong borrow = word1 < (low & sign) ? 1UL : 0UL;
            word1 -= low & sign;
            word2 -= (high & sign) + borrow;
            carry = WideProduct.Add(ref _low, word0);
            carry = WideProduct.Add(ref _middle, carry) + WideProduct.Add(ref _middle, word1);
            _high += (long)(word2 + carry);
        }
    }
}
