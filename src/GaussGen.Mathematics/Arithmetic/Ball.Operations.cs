using System;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <content>Arithmetic.</content>
public readonly partial struct Ball
{
    /// <summary>The opposite numbers.</summary>
    public static Ball Negate(Ball value) => new(-value.Midpoint, value.Exponent, value.Radius);

    /// <summary>The sum.</summary>
    public static Ball Add(Ball left, Ball right, int precision)
    {
        Bound radius = left.Radius + right.Radius;
        if (!radius.IsFinite)
        {
            return WholeLine;
        }

        if (left.Midpoint.IsZero || right.Midpoint.IsZero)
        {
            Ball other = left.Midpoint.IsZero ? right : left;
            return Rounded(other.Midpoint, other.Exponent, radius, precision);
        }

        if (left.Exponent < right.Exponent)
        {
            (left, right) = (right, left);
        }

        int distance = checked(left.Exponent - right.Exponent);
        // Where one number lies wholly below the bits that are kept of the other, aligning them would only build zeros.
        if (distance > 64 && IsFarBelow(right, left, precision))
        {
            Ball kept = Rounded(left.Midpoint, left.Exponent, radius, precision);
            return kept.Enlarge(Bound.FromMagnitude(right.Midpoint, right.Exponent));
        }

        BigInteger aligned = distance == 0 ? left.Midpoint : left.Midpoint << distance;
        return Rounded(aligned + right.Midpoint, right.Exponent, radius, precision);
    }

    /// <summary>The difference.</summary>
    public static Ball Subtract(Ball left, Ball right, int precision) => Add(left, Negate(right), precision);

    /// <summary>The product.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public static Ball Multiply(Ball left, Ball right, int precision)
    {
        if (!left.IsFinite || !right.IsFinite)
        {
            bool isZero = (left.IsExact && left.Midpoint.IsZero) || (right.IsExact && right.Midpoint.IsZero);
            return isZero ? default : WholeLine;
        }

        // |ab − mₐm_b| ≤ |mₐ| r_b + (|m_b| + r_b) rₐ for a = mₐ ± rₐ, b = m_b ± r_b.
        Bound radius = default;
        if (!right.Radius.IsZero)
        {
            radius = Bound.FromMagnitude(left.Midpoint, left.Exponent) * right.Radius;
        }

        if (!left.Radius.IsZero)
        {
            radius += (Bound.FromMagnitude(right.Midpoint, right.Exponent) + right.Radius) * left.Radius;
        }

        if (left.Midpoint.IsZero || right.Midpoint.IsZero)
        {
            return new Ball(BigInteger.Zero, 0, radius);
        }

        int length = Magnitude.BitLength(left.Midpoint) + Magnitude.BitLength(right.Midpoint) - 1;
        return Rounded(left.Midpoint * right.Midpoint, checked(left.Exponent + right.Exponent), radius, precision, length);
    }

    /// <summary>The square; tighter and cheaper than the product of a ball with itself.</summary>
    public static Ball Square(Ball value, int precision)
    {
        if (!value.IsFinite)
        {
            return WholeLine;
        }

        // |x² − m²| ≤ r (2|m| + r).
        Bound radius = value.Radius.IsZero
            ? default
            : (Bound.FromMagnitude(value.Midpoint, checked(value.Exponent + 1)) + value.Radius) * value.Radius;
        int length = Math.Max(0, (2 * Magnitude.BitLength(value.Midpoint)) - 1);
        return Rounded(value.Midpoint * value.Midpoint, checked(2 * value.Exponent), radius, precision, length);
    }

    /// <summary>The quotient; the whole line where the divisor's ball contains zero.</summary>
    /// <exception cref="DivideByZeroException">The divisor is exactly zero.</exception>
    public static Ball Divide(Ball left, Ball right, int precision)
    {
        if (right.ContainsZero)
        {
            return right.IsExact
                ? throw new DivideByZeroException("The divisor is exactly zero.")
                : WholeLine;
        }

        if (!left.IsFinite || (left.Midpoint.IsZero && left.IsExact))
        {
            return left.IsFinite ? default : WholeLine;
        }

        int wanted = Magnitude.BitLength(right.Midpoint) - Magnitude.BitLength(left.Midpoint) + Math.Max(precision, 1) + 1;
        int shift = left.Midpoint.IsZero ? 0 : Math.Max(0, wanted);
        int exponent = checked(left.Exponent - right.Exponent - shift);
        BigInteger quotient = BigInteger.DivRem(left.Midpoint << shift, right.Midpoint, out BigInteger remainder);
        Bound radius = remainder.IsZero ? default : Bound.PowerOfTwo(exponent);
        if (!left.IsExact || !right.IsExact)
        {
            // |a/b − q| ≤ (rₐ + |q| r_b) / (|m_b| − r_b) with q = mₐ/m_b.
            Bound numerator = left.Radius + ((Bound.FromMagnitude(quotient, exponent) + radius) * right.Radius);
            radius += Bound.DivideByAtLeast(numerator, right.LeastMagnitude());
        }

        return Rounded(quotient, exponent, radius, precision);
    }

    /// <summary>
    /// The square root of the numbers in the ball that have one: where the ball reaches below zero, of its non-negative part.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Every number in the ball is negative.</exception>
    public static Ball Sqrt(Ball value, int precision)
    {
        if (value.IsNegative == Trilean.True)
        {
            throw new ArgumentOutOfRangeException(nameof(value), "The square root needs a ball that reaches zero or above.");
        }

        if (!value.IsFinite || (value.IsExact && value.Midpoint.IsZero))
        {
            return value;
        }

        if (value.ContainsZero)
        {
            int working = Math.Max(precision, 32);
            Ball top = Sqrt(FromDyadic(value.Upper), working);
            return FromEndpoints(Dyadic.Zero, top.Upper, working);
        }

        // An even exponent, and enough bits that the root has the precision.
        int shift = Math.Max(0, (2 * Math.Max(precision, 1)) + 1 - Magnitude.BitLength(value.Midpoint));
        shift += (value.Exponent - shift) & 1;
        int exponent = checked(value.Exponent - shift) / 2;
        BigInteger root = IntegerRoot.Floor(value.Midpoint << shift, out BigInteger remainder);
        Bound radius = remainder.IsZero ? default : Bound.PowerOfTwo(exponent);
        if (!value.IsExact)
        {
            radius += SqrtRadius(value, new Dyadic(root, exponent));
        }

        return Rounded(root, exponent, radius, precision);
    }

    /// <summary>A power with an integer exponent; the power 0 is 1.</summary>
    /// <exception cref="DivideByZeroException">Zero to a negative power.</exception>
    public static Ball Pow(Ball value, int exponent, int precision)
    {
        if (exponent < 0)
        {
            return Divide(FromInteger(1), Pow(value, checked(-exponent), precision + 2), precision);
        }

        // Each of the up to 2·log₂(exponent) steps doubles the relative error at most.
        int working = checked(precision + (2 * Magnitude.BitLength((ulong)exponent)) + 2);
        Ball result = FromInteger(1);
        for (int bit = Magnitude.BitLength((ulong)exponent) - 1; bit >= 0; bit--)
        {
            result = Square(result, working);
            if (((exponent >> bit) & 1) != 0)
            {
                result = Multiply(result, value, working);
            }
        }

        return result.Trim(precision);
    }

    /// <summary>The power with an integer exponent; see <see cref="Pow(Ball, int, int)"/>.</summary>
    /// <exception cref="DivideByZeroException">Zero to a negative power.</exception>
    public Ball Pow(int exponent, int precision) => Pow(this, exponent, precision);

    /// <summary>The opposite numbers.</summary>
    public Ball Negate() => Negate(this);

    /// <summary>The magnitudes.</summary>
    public Ball Abs()
    {
        if (Midpoint.Sign >= 0 && (IsExact || !ContainsZero))
        {
            return this;
        }

        if (!IsFinite || !ContainsZero)
        {
            return IsFinite ? Negate(this) : this;
        }

        Dyadic upper = Dyadic.Abs(Center) + Radius.ToDyadic();
        return FromEndpoints(Dyadic.Zero, upper, Math.Max(64, Magnitude.BitLength(Midpoint)));
    }

    /// <summary>The numbers times 2^<paramref name="power"/>, exactly.</summary>
    /// <exception cref="OverflowException">The exponent leaves the range of <see cref="int"/>.</exception>
    public Ball ScaleByPowerOfTwo(int power) => new(Midpoint, checked(Exponent + power), Radius.ScaleByPowerOfTwo(power));

    /// <summary>For x in the ball and s at most the root of its midpoint m: a bound of |√x − √m|.</summary>
    private static Bound SqrtRadius(Ball value, Dyadic rootBelow)
    {
        // |√x − √m| = |x − m| / (√x + √m) ≤ r / s always, and for r ≤ m/16 also ≤ r / (s (1 + √(15/16))) < r / (1.9375 s),
        // as √(15/16) > 0.968.
        bool narrow = value.RelativeAccuracyBits >= 4;
        Dyadic divisor = narrow ? new Dyadic(rootBelow.Mantissa * 31, checked(rootBelow.Exponent - 4)) : rootBelow;
        return Bound.DivideByAtLeast(value.Radius, divisor);
    }

    /// <summary>Whether the first number lies more than the precision below the leading bit of the second.</summary>
    private static bool IsFarBelow(Ball small, Ball large, int precision)
    {
        long smallTop = (long)Magnitude.BitLength(small.Midpoint) + small.Exponent;
        long largeTop = (long)Magnitude.BitLength(large.Midpoint) + large.Exponent;
        return largeTop - smallTop > (long)precision + 32;
    }

    /// <summary>A lower bound of |x| over a ball without zero, above zero.</summary>
    private Dyadic LeastMagnitude()
    {
        if (RelativeAccuracyBits < 40)
        {
            return Dyadic.Abs(Center) - Radius.ToDyadic();
        }

        // The radius is below 2^−40 of the midpoint, so that one unit of its leading bits covers it.
        uint leading = Magnitude.LeadingBelow(Midpoint, out int shift);
        return new Dyadic(leading - 1, checked(Exponent + shift));
    }
}
