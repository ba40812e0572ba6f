using System;
using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// An enclosure of a real number: every x with |x − Midpoint·2^Exponent| ≤ Radius. The result of an operation contains every
/// value that the operation takes on the numbers in its operands. The default value is the number 0.
/// </summary>
/// <remarks>
/// Operations take a precision: the result's midpoint keeps about so many bits (never fewer, unless its radius makes them
/// meaningless), and its radius includes everything that was dropped. Integers only: no host's floating point is trusted.
/// The arithmetic is midpoint-radius arithmetic as in van der Hoeven, "Ball arithmetic" (2009).
/// </remarks>
public readonly partial struct Ball
{
    // Bits kept below the leading bit of the radius; what is finer costs time and says nothing.
    private const int BitsBelowRadius = 32;

    /// <summary>The ball with the given midpoint and radius, unrounded.</summary>
    /// <param name="midpoint">The midpoint's mantissa.</param>
    /// <param name="exponent">The power of two that the mantissa is scaled by.</param>
    /// <param name="radius">The absolute radius.</param>
    public Ball(BigInteger midpoint, int exponent, Bound radius)
    {
        Midpoint = midpoint;
        Exponent = exponent;
        Radius = radius;
    }

    /// <summary>The whole real line: what an operation returns that is unbounded on its operands.</summary>
    public static Ball WholeLine => new(BigInteger.Zero, 0, Bound.Infinite);

    /// <summary>The mantissa of the midpoint.</summary>
    public BigInteger Midpoint { get; }

    /// <summary>The power of two that the mantissa is scaled by.</summary>
    public int Exponent { get; }

    /// <summary>The absolute radius.</summary>
    public Bound Radius { get; }

    /// <summary>Whether the ball is a single number.</summary>
    public bool IsExact => Radius.IsZero;

    /// <summary>Whether the radius is finite.</summary>
    public bool IsFinite => Radius.IsFinite;

    /// <summary>The midpoint as an exact number.</summary>
    public Dyadic Center => new(Midpoint, Exponent);

    /// <summary>The lower end, exactly.</summary>
    /// <exception cref="InvalidOperationException">The ball is the whole line.</exception>
    public Dyadic Lower => Center - Radius.ToDyadic();

    /// <summary>The upper end, exactly.</summary>
    /// <exception cref="InvalidOperationException">The ball is the whole line.</exception>
    public Dyadic Upper => Center + Radius.ToDyadic();

    /// <summary>Whether the numbers in the ball are above zero.</summary>
    public Trilean IsPositive => SignQuestion(1);

    /// <summary>Whether the numbers in the ball are below zero.</summary>
    public Trilean IsNegative => SignQuestion(-1);

    /// <summary>Whether the numbers in the ball are zero.</summary>
    public Trilean IsZero => !ContainsZero ? Trilean.False : IsExact ? Trilean.True : Trilean.Unknown;

    /// <summary>Whether zero is one of the numbers in the ball; this is always decided.</summary>
    public bool ContainsZero => CompareCenterToRadius() <= 0;

    /// <summary>
    /// How many leading bits of the midpoint the radius leaves meaningful: a lower estimate of log₂(|midpoint| / radius),
    /// <see cref="int.MaxValue"/> for a single number, negative or zero where the sign is not even known.
    /// </summary>
    public int RelativeAccuracyBits
    {
        get
        {
            if (IsExact || !IsFinite)
            {
                return IsExact ? int.MaxValue : int.MinValue;
            }

            long top = Midpoint.IsZero ? Exponent : (long)Magnitude.BitLength(Midpoint) - 1 + Exponent;
            long bits = Midpoint.IsZero ? Math.Min(0, top - Radius.CeilingLog2) : top - Radius.CeilingLog2;
            return (int)Math.Max(int.MinValue, Math.Min(int.MaxValue - 1L, bits));
        }
    }

    /// <summary>The integer itself.</summary>
    public static Ball FromInteger(BigInteger value) => new(value, 0, Bound.Zero);

    /// <summary>The number itself.</summary>
    public static Ball FromDyadic(Dyadic value) => new(value.Mantissa, value.Exponent, Bound.Zero);

    /// <summary>A ball around a rational number; exact where the number is an integer.</summary>
    public static Ball FromRational(Rational value, int precision) => value.IsInteger
        ? FromInteger(value.Numerator)
        : Divide(FromInteger(value.Numerator), FromInteger(value.Denominator), precision);

    /// <summary>A ball that contains all numbers between two ends.</summary>
    /// <exception cref="ArgumentException">The ends are in the wrong order.</exception>
    public static Ball FromEndpoints(Dyadic lower, Dyadic upper, int precision)
    {
        if (lower > upper)
        {
            throw new ArgumentException("The lower end must not be above the upper end.", nameof(lower));
        }

        Dyadic middle = (lower + upper).ScaleByPowerOfTwo(-1);
        Bound half = Bound.FromDyadic((upper - lower).ScaleByPowerOfTwo(-1));
        return Rounded(middle.Mantissa, middle.Exponent, half, precision);
    }

    /// <summary>A ball that contains both balls.</summary>
    public static Ball Hull(Ball left, Ball right, int precision)
    {
        if (!left.IsFinite || !right.IsFinite)
        {
            return WholeLine;
        }

        Dyadic lower = left.Lower < right.Lower ? left.Lower : right.Lower;
        Dyadic upper = left.Upper > right.Upper ? left.Upper : right.Upper;
        return FromEndpoints(lower, upper, precision);
    }

    /// <summary>Whether every number in the first ball is below every number in the second.</summary>
    public static Trilean IsLess(Ball left, Ball right) => !left.IsFinite || !right.IsFinite ? Trilean.Unknown
        : left.Upper < right.Lower ? Trilean.True
        : left.Lower >= right.Upper ? Trilean.False
        : Trilean.Unknown;

    /// <summary>Whether the number is in the ball.</summary>
    public bool Contains(Dyadic value) => !IsFinite || (Lower <= value && value <= Upper);

    /// <summary>Whether the number is in the ball.</summary>
    public bool Contains(Rational value) => !IsFinite || (Lower.ToRational() <= value && value <= Upper.ToRational());

    /// <summary>Whether every number of the other ball is in this one.</summary>
    public bool Contains(Ball other) => !IsFinite || (other.IsFinite && Lower <= other.Lower && other.Upper <= Upper);

    /// <summary>The same ball, wider by the given radius.</summary>
    public Ball Enlarge(Bound additional) => new(Midpoint, Exponent, Radius + additional);

    /// <summary>A ball around this one whose midpoint keeps about <paramref name="precision"/> bits.</summary>
    public Ball Trim(int precision) => Rounded(Midpoint, Exponent, Radius, precision);

    /// <summary>The midpoint and radius, for a debugger.</summary>
    public override string ToString() => "[" + Center + " +/- " + Radius + "]";

    /// <summary>Drops what is beyond the precision, or far below the radius, and accounts for it.</summary>
    private static Ball Rounded(BigInteger midpoint, int exponent, Bound radius, int precision) =>
        Rounded(midpoint, exponent, radius, precision, Magnitude.BitLength(midpoint));

    /// <summary>The same for a midpoint whose bit length, or one less, is known.</summary>
    private static Ball Rounded(BigInteger midpoint, int exponent, Bound radius, int precision, int length)
    {
        if (!radius.IsFinite)
        {
            return WholeLine;
        }

        long shift = (long)length - Math.Max(precision, 1);
        if (!radius.IsZero)
        {
            long meaningless = (long)radius.Exponent + 32 - BitsBelowRadius - exponent;
            shift = Math.Max(shift, Math.Min(meaningless, length));
        }

        // A shift by a few bits saves no memory and is not worth the copy.
        if (shift < 32 && (shift <= 0 || length > 64))
        {
            return new Ball(midpoint, exponent, radius);
        }

        // A right shift of a BigInteger rounds down, so less than one unit is lost.
        int dropped = (int)shift;
        int roundedExponent = checked(exponent + dropped);
        return new Ball(midpoint >> dropped, roundedExponent, radius + Bound.PowerOfTwo(roundedExponent));
    }

    private Trilean SignQuestion(int wanted)
    {
        int comparison = CompareCenterToRadius();
        if (comparison > 0)
        {
            return Midpoint.Sign == wanted ? Trilean.True : Trilean.False;
        }

        // A single zero, or a ball that only touches zero from the other side, has no number of the wanted sign.
        return IsExact || (comparison == 0 && Midpoint.Sign == -wanted) ? Trilean.False : Trilean.Unknown;
    }

    /// <summary>The sign of |midpoint| − radius.</summary>
    private int CompareCenterToRadius()
    {
        if (!IsFinite)
        {
            return -1;
        }

        if (IsExact || Midpoint.IsZero)
        {
            return Midpoint.IsZero ? (IsExact ? 0 : -1) : 1;
        }

        long top = (long)Magnitude.BitLength(Midpoint) + Exponent;
        long radiusTop = (long)Radius.Exponent + 32;
        return top != radiusTop ? top.CompareTo(radiusTop) : Dyadic.Abs(Center).CompareTo(Radius.ToDyadic());
    }
}
