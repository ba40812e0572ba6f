using System;
using System.Globalization;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>An exact number mantissa · 2^exponent. Equal numbers may have different mantissas. The default value is zero.</summary>
/// <param name="mantissa">Any integer; it carries the sign.</param>
/// <param name="exponent">The power of two.</param>
public readonly struct Dyadic(BigInteger mantissa, int exponent) : IEquatable<Dyadic>, IComparable<Dyadic>
{
    /// <summary>The number 0.</summary>
    public static Dyadic Zero => default;

    /// <summary>The integer that is scaled; it carries the sign.</summary>
    public BigInteger Mantissa { get; } = mantissa;

    /// <summary>The power of two that the mantissa is scaled by.</summary>
    public int Exponent { get; } = exponent;

    /// <summary>−1, 0 or 1.</summary>
    public int Sign => Mantissa.Sign;

    /// <summary>Whether the number is 0.</summary>
    public bool IsZero => Mantissa.IsZero;

    /// <summary>The number of bits of the mantissa's magnitude; 0 for zero.</summary>
    public int BitLength => Magnitude.BitLength(Mantissa);

    /// <summary>Whether both are the same number.</summary>
    public static bool operator ==(Dyadic left, Dyadic right) => left.Equals(right);

    /// <summary>Whether the numbers differ.</summary>
    public static bool operator !=(Dyadic left, Dyadic right) => !left.Equals(right);

    /// <summary>Whether <paramref name="left"/> is the smaller one.</summary>
    public static bool operator <(Dyadic left, Dyadic right) => left.CompareTo(right) < 0;

    /// <summary>Whether <paramref name="left"/> is the larger one.</summary>
    public static bool operator >(Dyadic left, Dyadic right) => left.CompareTo(right) > 0;

    /// <summary>Whether <paramref name="left"/> is not the larger one.</summary>
    public static bool operator <=(Dyadic left, Dyadic right) => left.CompareTo(right) <= 0;

    /// <summary>Whether <paramref name="left"/> is not the smaller one.</summary>
    public static bool operator >=(Dyadic left, Dyadic right) => left.CompareTo(right) >= 0;

    /// <summary>The sum, exactly.</summary>
    public static Dyadic operator +(Dyadic left, Dyadic right) => Add(left, right);

    /// <summary>The difference, exactly.</summary>
    public static Dyadic operator -(Dyadic left, Dyadic right) => Subtract(left, right);

    /// <summary>The product, exactly.</summary>
    public static Dyadic operator *(Dyadic left, Dyadic right) => Multiply(left, right);

    /// <summary>The opposite number.</summary>
    public static Dyadic operator -(Dyadic value) => Negate(value);

    /// <summary>The sum, exactly.</summary>
    public static Dyadic Add(Dyadic left, Dyadic right)
    {
        if (left.IsZero)
        {
            return right;
        }

        if (right.IsZero)
        {
            return left;
        }

        int exponent = Math.Min(left.Exponent, right.Exponent);
        return new Dyadic(left.MantissaAt(exponent) + right.MantissaAt(exponent), exponent);
    }

    /// <summary>The difference, exactly.</summary>
    public static Dyadic Subtract(Dyadic left, Dyadic right) => Add(left, Negate(right));

    /// <summary>The product, exactly.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public static Dyadic Multiply(Dyadic left, Dyadic right) =>
        new(left.Mantissa * right.Mantissa, checked(left.Exponent + right.Exponent));

    /// <summary>The opposite number.</summary>
    public static Dyadic Negate(Dyadic value) => new(-value.Mantissa, value.Exponent);

    /// <summary>The magnitude.</summary>
    public static Dyadic Abs(Dyadic value) => value.Sign < 0 ? Negate(value) : value;

    /// <summary>The number times 2^<paramref name="power"/>.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public Dyadic ScaleByPowerOfTwo(int power) => IsZero ? default : new Dyadic(Mantissa, checked(Exponent + power));

    /// <summary>The number as a quotient of integers, exactly.</summary>
    public Rational ToRational() => Exponent >= 0
        ? Rational.FromInteger(Mantissa << Exponent)
        : Rational.FromReduced(Reduce());

    /// <summary>The same number with an odd mantissa; zero as the default value.</summary>
    public Dyadic Reduce()
    {
        if (!Mantissa.IsEven)
        {
            return this;
        }

        // m & −m is the lowest bit that is set.
        int zeros = Magnitude.BitLength(Mantissa & -Mantissa) - 1;
        return IsZero ? default : new Dyadic(Mantissa >> zeros, checked(Exponent + zeros));
    }

    /// <inheritdoc/>
    public int CompareTo(Dyadic other)
    {
        int sign = Sign;
        if (sign != other.Sign || sign == 0)
        {
            return sign.CompareTo(other.Sign);
        }

        // The positions of the leading bits decide most comparisons without aligning the mantissas.
        long top = (long)BitLength + Exponent;
        long otherTop = (long)other.BitLength + other.Exponent;
        if (top != otherTop)
        {
            return top > otherTop ? sign : -sign;
        }

        int exponent = Math.Min(Exponent, other.Exponent);
        return MantissaAt(exponent).CompareTo(other.MantissaAt(exponent));
    }

    /// <inheritdoc/>
    public bool Equals(Dyadic other) => CompareTo(other) == 0;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Dyadic other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => ToRational().GetHashCode();

    /// <summary>The number as mantissa and power of two: "3*2^-1".</summary>
    public override string ToString() =>
        Mantissa.ToString(CultureInfo.InvariantCulture) + "*2^" + Exponent.ToString(CultureInfo.InvariantCulture);

    private BigInteger MantissaAt(int exponent) => exponent == Exponent ? Mantissa : Mantissa << checked(Exponent - exponent);
}
