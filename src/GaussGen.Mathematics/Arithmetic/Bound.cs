using System;
using System.Globalization;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// An upper bound of a magnitude: mantissa · 2^exponent with a mantissa of 32 bits, or infinite. Every operation rounds up, by
/// less than one part in 2²⁹, and works on integers only. The default value is zero.
/// </summary>
public readonly struct Bound : IEquatable<Bound>, IComparable<Bound>
{
    private const int InfiniteExponent = int.MaxValue;

    private Bound(uint mantissa, int exponent)
    {
        Mantissa = mantissa;
        Exponent = exponent;
    }

    /// <summary>The bound 0: the value is exact.</summary>
    public static Bound Zero => default;

    /// <summary>No bound at all.</summary>
    public static Bound Infinite => new(1U << 31, InfiniteExponent);

    /// <summary>The leading 32 bits, the top one set; 0 for zero.</summary>
    public uint Mantissa { get; }

    /// <summary>The power of two that the mantissa is scaled by.</summary>
    public int Exponent { get; }

    /// <summary>Whether the bound is 0.</summary>
    public bool IsZero => Mantissa == 0;

    /// <summary>Whether the bound says anything.</summary>
    public bool IsFinite => Exponent != InfiniteExponent;

    /// <summary>The least integer k with bound ≤ 2^k; <see cref="int.MinValue"/> for zero, <see cref="int.MaxValue"/> for infinite.</summary>
    public int CeilingLog2 => !IsFinite ? int.MaxValue
        : IsZero ? int.MinValue
        : Mantissa == 1U << 31 ? Exponent + 31 : Exponent + 32;

    /// <summary>A bound of the sum.</summary>
    public static Bound operator +(Bound left, Bound right) => Add(left, right);

    /// <summary>A bound of the product.</summary>
    public static Bound operator *(Bound left, Bound right) => Multiply(left, right);

    /// <summary>Whether both bounds are the same.</summary>
    public static bool operator ==(Bound left, Bound right) => left.Equals(right);

    /// <summary>Whether the bounds differ.</summary>
    public static bool operator !=(Bound left, Bound right) => !left.Equals(right);

    /// <summary>Whether <paramref name="left"/> is the tighter one.</summary>
    public static bool operator <(Bound left, Bound right) => left.CompareTo(right) < 0;

    /// <summary>Whether <paramref name="left"/> is the wider one.</summary>
    public static bool operator >(Bound left, Bound right) => left.CompareTo(right) > 0;

    /// <summary>Whether <paramref name="left"/> is not the wider one.</summary>
    public static bool operator <=(Bound left, Bound right) => left.CompareTo(right) <= 0;

    /// <summary>Whether <paramref name="left"/> is not the tighter one.</summary>
    public static bool operator >=(Bound left, Bound right) => left.CompareTo(right) >= 0;

    /// <summary>The bound mantissa · 2^exponent, rounded up to 32 bits.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public static Bound FromParts(ulong mantissa, int exponent)
    {
        if (mantissa == 0)
        {
            return default;
        }

        int shift = Magnitude.BitLength(mantissa) - 32;
        if (shift <= 0)
        {
            return new Bound((uint)(mantissa << -shift), Finite(exponent + (long)shift));
        }

        ulong top = mantissa >> shift;
        if (top << shift != mantissa && ++top == 1UL << 32)
        {
            top >>= 1;
            shift++;
        }

        return new Bound((uint)top, Finite(exponent + (long)shift));
    }

    /// <summary>The bound 2^exponent, exactly.</summary>
    public static Bound PowerOfTwo(int exponent) => FromParts(1, exponent);

    /// <summary>A bound of |value|.</summary>
    public static Bound FromDyadic(Dyadic value) => FromMagnitude(value.Mantissa, value.Exponent);

    /// <summary>A bound of |mantissa| · 2^exponent.</summary>
    public static Bound FromMagnitude(BigInteger mantissa, int exponent)
    {
        if (mantissa.IsZero)
        {
            return default;
        }

        ulong top = Magnitude.LeadingAbove(mantissa, out int shift);
        return FromParts(top, checked(exponent + shift));
    }

    /// <summary>A bound of the sum.</summary>
    public static Bound Add(Bound left, Bound right)
    {
        if (left.IsZero)
        {
            return right;
        }

        if (right.IsZero)
        {
            return left;
        }

        if (!left.IsFinite || !right.IsFinite)
        {
            return Infinite;
        }

        if (left.Exponent < right.Exponent)
        {
            (left, right) = (right, left);
        }

        // The larger one with 31 more bits below, and the smaller one aligned to it, rounded up.
        long distance = (long)left.Exponent - right.Exponent;
        ulong aligned = (ulong)right.Mantissa << 30;
        ulong added = distance >= 62 ? 1UL : CeilingShift(aligned, (int)distance);
        return FromParts(((ulong)left.Mantissa << 30) + added, Finite(left.Exponent - 30L));
    }

    /// <summary>A bound of the product. Zero times infinite is infinite.</summary>
    public static Bound Multiply(Bound left, Bound right) => !left.IsFinite || !right.IsFinite
        ? Infinite
        : left.IsZero || right.IsZero
            ? default
            : FromParts((ulong)left.Mantissa * right.Mantissa, Finite((long)left.Exponent + right.Exponent));

    /// <summary>A bound of the quotient by any number whose magnitude is at least |divisor|; infinite where that is zero.</summary>
    public static Bound DivideByAtLeast(Bound numerator, Dyadic divisor)
    {
        if (divisor.IsZero || !numerator.IsFinite)
        {
            return Infinite;
        }

        if (numerator.IsZero)
        {
            return default;
        }

        uint below = Magnitude.LeadingBelow(divisor.Mantissa, out int shift);
        ulong quotient = (((ulong)numerator.Mantissa << 32) / below) + 1;
        return FromParts(quotient, Finite(numerator.Exponent - 32L - divisor.Exponent - shift));
    }

    /// <summary>The wider of the two.</summary>
    public static Bound Max(Bound left, Bound right) => left.CompareTo(right) >= 0 ? left : right;

    /// <summary>The bound times 2^<paramref name="power"/>, exactly.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public Bound ScaleByPowerOfTwo(int power) => IsZero || !IsFinite ? this : new Bound(Mantissa, Finite((long)Exponent + power));

    /// <summary>The bound as an exact number.</summary>
    /// <exception cref="InvalidOperationException">The bound is infinite.</exception>
    public Dyadic ToDyadic() => IsFinite
        ? new Dyadic(Mantissa, Exponent)
        : throw new InvalidOperationException("An infinite bound has no value; look at IsFinite first.");

    /// <inheritdoc/>
    public int CompareTo(Bound other) => IsZero || other.IsZero || Exponent == other.Exponent
        ? Mantissa.CompareTo(other.Mantissa)
        : Exponent.CompareTo(other.Exponent);

    /// <inheritdoc/>
    public bool Equals(Bound other) => Mantissa == other.Mantissa && (Mantissa == 0 || Exponent == other.Exponent);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Bound other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => IsZero ? 0 : unchecked(((int)Mantissa * 397) ^ Exponent);

    /// <summary>The bound as mantissa and power of two: "2147483648*2^-31", or "infinite".</summary>
    public override string ToString() => !IsFinite
        ? "infinite"
        : Mantissa.ToString(CultureInfo.InvariantCulture) + "*2^" + Exponent.ToString(CultureInfo.InvariantCulture);

    private static ulong CeilingShift(ulong value, int shift)
    {
        ulong shifted = value >> shift;
        return shifted << shift == value ? shifted : shifted + 1;
    }

    private static int Finite(long exponent) => exponent is > int.MinValue and < InfiniteExponent - 64
        ? (int)exponent
        : throw new OverflowException("The exponent of an error bound leaves the range of a 32-bit integer.");
}
