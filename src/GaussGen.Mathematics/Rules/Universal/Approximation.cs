using System;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Sizes of numbers, for starting points and for choosing precisions. What is a bound says so; nothing printed depends on the rest.
/// </summary>
internal static class Approximation
{
    /// <summary>The least integer k with |x| &lt; 2^k for all x in the ball: an upper bound of log₂|x|; very negative for zero.</summary>
    internal static int CeilingLog2(Ball ball) => Magnitude(ball).CeilingLog2;

    /// <summary>An upper bound of |x| for all x in the ball.</summary>
    internal static Bound Magnitude(Ball ball) => Bound.FromMagnitude(ball.Midpoint, ball.Exponent) + ball.Radius;

    /// <summary>About log₂|midpoint|, rounded down; very negative for zero.</summary>
    internal static int FloorLog2(Ball ball) => FloorLog2(ball.Center);

    /// <summary>log₂|value|, rounded down; very negative for zero.</summary>
    internal static int FloorLog2(Dyadic value) => value.IsZero ? int.MinValue / 4 : value.BitLength - 1 + value.Exponent;

    /// <summary>About log₂|midpoint|, to ten digits; very negative for zero.</summary>
    internal static double Log2(Ball ball) => Log2(ball.Center);

    /// <summary>About log₂|value|, to ten digits; very negative for zero.</summary>
    internal static double Log2(Dyadic value)
    {
        if (value.IsZero)
        {
            return -1e9;
        }

        int shift = value.BitLength - 64;
        double leading = (double)(shift > 0 ? BigInteger.Abs(value.Mantissa) >> shift : BigInteger.Abs(value.Mantissa) << -shift);
        return (Math.Log(leading) / Math.Log(2)) + shift + value.Exponent;
    }

    /// <summary>A binary64 number near the midpoint; ±∞ or 0 beyond the range.</summary>
    internal static double ToDouble(Ball ball) => ToDouble(ball.Center);

    /// <summary>A binary64 number near the value; ±∞ or 0 beyond the range.</summary>
    internal static double ToDouble(Dyadic value)
    {
        int shift = Math.Max(0, value.BitLength - 64);
        double leading = (double)(value.Mantissa >> shift);
        int exponent = value.Exponent + shift;
        // In two steps, so that a number in the range is reached though its leading bits or the power alone are not in it.
        int half = Math.Max(-2000, Math.Min(2000, exponent)) / 2;
        return leading * PowerOfTwo(half) * PowerOfTwo(Math.Max(-2000, Math.Min(2000, exponent)) - half);
    }

    /// <summary>The value of a finite binary64 number.</summary>
    internal static Dyadic FromDouble(double value)
    {
        Rational exact = Rational.FromDouble(value);
        // The denominator is a power of two.
        return new Dyadic(exact.Numerator, 1 - new Dyadic(exact.Denominator, 0).BitLength);
    }

    private static double PowerOfTwo(int exponent) =>
        exponent < -1022 ? 0 : BitConverter.Int64BitsToDouble((long)(exponent + 1023) << 52);
}
