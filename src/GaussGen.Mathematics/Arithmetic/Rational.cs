using System;
using System.Globalization;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>An exact rational number in lowest terms. The default value is zero.</summary>
public readonly struct Rational : IEquatable<Rational>, IComparable<Rational>
{
    // Zero stands for one, so that the default value is the number zero.
    private readonly BigInteger _denominator;

    /// <summary>The quotient of two integers, reduced to lowest terms.</summary>
    /// <param name="numerator">Any integer.</param>
    /// <param name="denominator">Any integer but zero.</param>
    /// <exception cref="DivideByZeroException">The denominator is zero.</exception>
    public Rational(BigInteger numerator, BigInteger denominator)
    {
        if (denominator.IsZero)
        {
            throw new DivideByZeroException("The denominator of a rational number must not be zero.");
        }

        BigInteger divisor = denominator.IsOne ? BigInteger.One : BigInteger.GreatestCommonDivisor(numerator, denominator);
        if (denominator.Sign < 0)
        {
            divisor = -divisor;
        }

        Numerator = divisor.IsOne ? numerator : numerator / divisor;
        _denominator = divisor.IsOne ? denominator : denominator / divisor;
    }

    private Rational(BigInteger numerator, BigInteger denominator, bool reduced)
    {
        _ = reduced;
        Numerator = numerator;
        _denominator = denominator;
    }

    /// <summary>The number 0.</summary>
    public static Rational Zero => default;

    /// <summary>The number 1.</summary>
    public static Rational One => new(BigInteger.One, BigInteger.One, reduced: true);

    /// <summary>The numerator in lowest terms; it carries the sign.</summary>
    public BigInteger Numerator { get; }

    /// <summary>The denominator in lowest terms, above zero.</summary>
    public BigInteger Denominator => _denominator.IsZero ? BigInteger.One : _denominator;

    /// <summary>−1, 0 or 1.</summary>
    public int Sign => Numerator.Sign;

    /// <summary>Whether the number is 0.</summary>
    public bool IsZero => Numerator.IsZero;

    /// <summary>Whether the number is an integer.</summary>
    public bool IsInteger => Denominator.IsOne;

    /// <summary>The integer itself.</summary>
    public static implicit operator Rational(int value) => FromInteger(value);

    /// <summary>The integer itself.</summary>
    public static implicit operator Rational(long value) => FromInteger(value);

    /// <summary>The integer itself.</summary>
    public static implicit operator Rational(BigInteger value) => FromInteger(value);

    /// <summary>The sum, exactly.</summary>
    public static Rational operator +(Rational left, Rational right) => Add(left, right);

    /// <summary>The difference, exactly.</summary>
    public static Rational operator -(Rational left, Rational right) => Add(left, Negate(right));

    /// <summary>The opposite number.</summary>
    public static Rational operator -(Rational value) => Negate(value);

    /// <summary>The product, exactly.</summary>
    public static Rational operator *(Rational left, Rational right) => Multiply(left, right);

    /// <summary>The quotient, exactly.</summary>
    /// <exception cref="DivideByZeroException"><paramref name="right"/> is zero.</exception>
    public static Rational operator /(Rational left, Rational right) => Divide(left, right);

    /// <summary>Whether both are the same number.</summary>
    public static bool operator ==(Rational left, Rational right) => left.Equals(right);

    /// <summary>Whether the numbers differ.</summary>
    public static bool operator !=(Rational left, Rational right) => !left.Equals(right);

    /// <summary>Whether <paramref name="left"/> is the smaller one.</summary>
    public static bool operator <(Rational left, Rational right) => Compare(left, right) < 0;

    /// <summary>Whether <paramref name="left"/> is the larger one.</summary>
    public static bool operator >(Rational left, Rational right) => Compare(left, right) > 0;

    /// <summary>Whether <paramref name="left"/> is not the larger one.</summary>
    public static bool operator <=(Rational left, Rational right) => Compare(left, right) <= 0;

    /// <summary>Whether <paramref name="left"/> is not the smaller one.</summary>
    public static bool operator >=(Rational left, Rational right) => Compare(left, right) >= 0;

    /// <summary>The integer itself.</summary>
    public static Rational FromInteger(BigInteger value) => new(value, BigInteger.One, reduced: true);

    /// <summary>A dyadic number with an odd mantissa: no common divisor has to be sought, which is slow for long mantissas.</summary>
    internal static Rational FromReduced(Dyadic value) => value.Exponent >= 0
        ? FromInteger(value.Mantissa << value.Exponent)
        : new Rational(value.Mantissa, BigInteger.One << -value.Exponent, reduced: true);

    /// <summary>The exact value of a binary64 number: 0.1 is 3602879701896397/2⁵⁵, not 1/10.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN or infinite.</exception>
    public static Rational FromDouble(double value)
    {
        ulong pattern = (ulong)BitConverter.DoubleToInt64Bits(value);
        int biased = (int)((pattern >> 52) & 0x7ff);
        if (biased == 0x7ff)
        {
            throw new ArgumentOutOfRangeException(nameof(value), value, "The value must be finite: neither NaN nor infinite.");
        }

        ulong significand = pattern & ((1UL << 52) - 1);
        if (biased == 0)
        {
            biased = 1;
        }
        else
        {
            significand |= 1UL << 52;
        }

        BigInteger mantissa = significand;
        return new Dyadic(pattern >> 63 == 0 ? mantissa : -mantissa, biased - 1075).ToRational();
    }

    /// <summary>The sum, exactly.</summary>
    public static Rational Add(Rational left, Rational right) => left.IsInteger && right.IsInteger
        ? FromInteger(left.Numerator + right.Numerator)
        : new Rational(
            (left.Numerator * right.Denominator) + (right.Numerator * left.Denominator),
            left.Denominator * right.Denominator);

    /// <summary>The difference, exactly.</summary>
    public static Rational Subtract(Rational left, Rational right) => Add(left, Negate(right));

    /// <summary>The opposite number.</summary>
    public static Rational Negate(Rational value) => new(-value.Numerator, value.Denominator, reduced: true);

    /// <summary>The product, exactly.</summary>
    public static Rational Multiply(Rational left, Rational right) => left.IsInteger && right.IsInteger
        ? FromInteger(left.Numerator * right.Numerator)
        : new Rational(left.Numerator * right.Numerator, left.Denominator * right.Denominator);

    /// <summary>The quotient, exactly.</summary>
    /// <exception cref="DivideByZeroException"><paramref name="right"/> is zero.</exception>
    public static Rational Divide(Rational left, Rational right) =>
        new(left.Numerator * right.Denominator, left.Denominator * right.Numerator);

    /// <summary>The magnitude.</summary>
    public static Rational Abs(Rational value) => value.Sign < 0 ? Negate(value) : value;

    /// <summary>A power with an integer exponent; the power 0 of every number, 0 too, is 1.</summary>
    /// <exception cref="DivideByZeroException">Zero to a negative power.</exception>
    public static Rational Pow(Rational value, int exponent)
    {
        if (exponent < 0)
        {
            return One / Pow(value, checked(-exponent));
        }

        // Powers of coprime integers are coprime.
        return new Rational(
            BigInteger.Pow(value.Numerator, exponent), BigInteger.Pow(value.Denominator, exponent), reduced: true);
    }

    /// <summary>Below zero, zero or above zero as <paramref name="left"/> is below, equal to or above <paramref name="right"/>.</summary>
    public static int Compare(Rational left, Rational right) => left.Sign != right.Sign
        ? left.Sign.CompareTo(right.Sign)
        : (left.Numerator * right.Denominator).CompareTo(right.Numerator * left.Denominator);

    /// <summary>The magnitude.</summary>
    public Rational Abs() => Abs(this);

    /// <summary>A power with an integer exponent; see <see cref="Pow(Rational, int)"/>.</summary>
    /// <exception cref="DivideByZeroException">Zero to a negative power.</exception>
    public Rational Pow(int exponent) => Pow(this, exponent);

    /// <inheritdoc/>
    public int CompareTo(Rational other) => Compare(this, other);

    /// <inheritdoc/>
    public bool Equals(Rational other) => Numerator == other.Numerator && Denominator == other.Denominator;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Rational other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => unchecked((Numerator.GetHashCode() * 397) ^ Denominator.GetHashCode());

    /// <summary>The number as "7" or "−7/3" with an ASCII minus sign, in lowest terms.</summary>
    public override string ToString() => IsInteger
        ? Numerator.ToString(CultureInfo.InvariantCulture)
        : Numerator.ToString(CultureInfo.InvariantCulture) + "/" + Denominator.ToString(CultureInfo.InvariantCulture);
}
