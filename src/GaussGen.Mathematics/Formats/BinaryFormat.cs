using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Formats;

/// <summary>
/// A binary interchange format of IEEE 754-2019 (3.4, table 3.5). Numbers of the format travel as their encodings, in the low bits
/// of a <see cref="ulong"/>. Rounding is roundTiesToEven (4.3.1) with gradual underflow and overflow to infinity, done in
/// integers; a zero is always +0. There is one instance a format.
/// </summary>
public sealed partial class BinaryFormat
{
    private BinaryFormat(int storageBits, int precision)
    {
        StorageBits = storageBits;
        Precision = precision;
        MaximumExponent = (1 << (storageBits - precision - 1)) - 1;
        MinimumExponent = 2 - MaximumExponent - precision;
        SignBit = 1UL << (storageBits - 1);
        Infinity = ((1UL << (storageBits - precision)) - 1) << (precision - 1);
    }

    /// <summary>Half precision: 11 bits, C# <c>System.Half</c>.</summary>
    public static BinaryFormat Binary16 { get; } = new(16, 11);

    /// <summary>Single precision: 24 bits, C# <c>float</c>.</summary>
    public static BinaryFormat Binary32 { get; } = new(32, 24);

    /// <summary>Double precision: 53 bits, C# <c>double</c>.</summary>
    public static BinaryFormat Binary64 { get; } = new(64, 53);

    /// <summary>The standard's name: "binary64".</summary>
    public string Name => StorageBits switch { 16 => "binary16", 32 => "binary32", _ => "binary64" };

    /// <summary>The size of an encoding in bits.</summary>
    public int StorageBits { get; }

    /// <summary>The bits of a normal significand, the hidden one included.</summary>
    public int Precision { get; }

    /// <summary>The power of two that is the smallest number above zero: −1074 for binary64.</summary>
    public int MinimumExponent { get; }

    /// <summary>The power of two of the largest binade: 1023 for binary64.</summary>
    public int MaximumExponent { get; }

    /// <summary>The encoding of +∞.</summary>
    public ulong Infinity { get; }

    /// <summary>The bit that carries the sign.</summary>
    public ulong SignBit { get; }

    /// <summary>The encoding of the largest finite number.</summary>
    public ulong Largest => Infinity - 1;

    /// <summary>Whether the encoding is of an infinity.</summary>
    public bool IsInfinity(ulong bits) => Unsigned(bits) == Infinity;

    /// <summary>Whether the encoding is of a finite number.</summary>
    public bool IsFinite(ulong bits) => Unsigned(bits) < Infinity;

    /// <summary>Whether the encoding is of +0 or −0.</summary>
    public bool IsZero(ulong bits) => Unsigned(bits) == 0;

    /// <summary>Whether the sign bit is set.</summary>
    public bool IsNegative(ulong bits) => (bits & SignBit) != 0;

    /// <summary>The encoding of the opposite number; a zero stays +0.</summary>
    public ulong Negate(ulong bits) => IsZero(bits) ? 0 : bits ^ SignBit;

    /// <summary>The encoding of the magnitude.</summary>
    public ulong Abs(ulong bits) => bits & ~SignBit;

    /// <summary>The number that an encoding stands for.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The encoding is of an infinity or NaN, or has bits beyond the format.</exception>
    public Dyadic ValueOf(ulong bits)
    {
        Decompose(bits, out ulong significand, out int exponent);
        BigInteger mantissa = significand;
        return new Dyadic(IsNegative(bits) ? -mantissa : mantissa, exponent);
    }

    /// <summary>The next number towards +∞ (nextUp of 5.3.1); below zero's predecessor it is +0, and +∞ is its own.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The encoding is of NaN, or has bits beyond the format.</exception>
    public ulong Next(ulong bits)
    {
        RequireNumber(bits);
        return IsZero(bits) ? 1UL
            : !IsNegative(bits) ? Math.Min(bits + 1, Infinity)
            : bits == (SignBit | 1) ? 0UL : bits - 1;
    }

    /// <summary>The next number towards −∞ (nextDown of 5.3.1); above zero's successor it is +0, and −∞ is its own.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The encoding is of NaN, or has bits beyond the format.</exception>
    public ulong Previous(ulong bits)
    {
        RequireNumber(bits);
        return IsZero(bits) ? SignBit | 1 : Negate(Next(bits ^ SignBit));
    }

    /// <summary>
    /// The ends of the interval of numbers that round to the given one: half-way to its neighbours; for the largest finite
    /// number, half-way to where the next binade would begin. The ends themselves round to it where its significand is even.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">The encoding is not of a finite number.</exception>
    public (Dyadic Lower, Dyadic Upper) RoundingInterval(ulong bits)
    {
        Dyadic value = ValueOf(bits);
        Dyadic magnitude = Dyadic.Abs(value);
        if (magnitude.IsZero)
        {
            var half = new Dyadic(1, MinimumExponent - 1);
            return (-half, half);
        }

        // Below a power of two, unless it is the smallest normal number, the numbers lie twice as close.
        bool narrow = (bits & (((1UL << (Precision - 1)) - 1))) == 0 && Unsigned(bits) > 1UL << (Precision - 1);
        Dyadic outer = magnitude + new Dyadic(1, magnitude.Exponent - 1);
        Dyadic inner = magnitude - new Dyadic(1, magnitude.Exponent - (narrow ? 2 : 1));
        return value.Sign > 0 ? (inner, outer) : (-outer, -inner);
    }

    /// <summary>The power of two that is one unit in the last place of the number; of the largest one for an infinity.</summary>
    public int UnitExponent(ulong bits)
    {
        Decompose(IsInfinity(bits) ? Largest : bits, out _, out int exponent);
        return exponent;
    }

    /// <summary>The format's name.</summary>
    public override string ToString() => Name;

    /// <summary>Splits a finite number's encoding: |number| = significand · 2^exponent, the exponent of its last place.</summary>
    internal void Decompose(ulong bits, out ulong significand, out int exponent)
    {
        RequireNumber(bits);
        ulong magnitude = Unsigned(bits);
        if (magnitude >= Infinity)
        {
            throw new ArgumentOutOfRangeException(nameof(bits), "An infinity has no value; look at IsInfinity first.");
        }

        ulong hidden = 1UL << (Precision - 1);
        int biased = (int)(magnitude >> (Precision - 1));
        significand = biased == 0 ? magnitude : (magnitude & (hidden - 1)) | hidden;
        exponent = MinimumExponent + Math.Max(biased - 1, 0);
    }

    private ulong Unsigned(ulong bits) => bits & ~SignBit;

    private void RequireNumber(ulong bits)
    {
        if (Unsigned(bits) > Infinity)
        {
            throw new ArgumentOutOfRangeException(nameof(bits), "The encoding is not of a number in " + Name + ".");
        }
    }
}
