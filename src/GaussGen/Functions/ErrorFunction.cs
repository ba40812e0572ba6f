using System;
using System.Runtime.CompilerServices;

namespace GaussGen;

/// <summary>The error function, its complement, the scaled complement and the inverse.</summary>
/// <remarks>
/// <para>
/// Every function is accurate over its whole range, the far tails included, allocates nothing on modern targets and does nothing before its
/// first call. "Accurate to 0.75 units" says that no larger error was found, in units in the last place of the true value, at
/// a million points against enclosures in ball arithmetic; that is a measurement and not a proof. The overloads for
/// <see cref="float"/> work in binary64 and round once, to within 0.5001 units of binary32.
/// </para>
/// <para>
/// No function of the host's mathematical library is used but the square root, and no fused product, so that hosts that evaluate
/// binary64 strictly give the same bits. (A host that keeps extended precision, or fuses products, does not.)
/// </para>
/// <para>
/// For netstandard2.0, where a compiler cannot give a span of numbers in place, each of the tables is copied once from the image
/// into an array at its first use.
/// </para>
/// <para>
/// Sources: definitions NIST DLMF 7.2; piecewise Chebyshev interpolation (Trefethen 2013); the square in two parts, one of them
/// exact, after Cody 1969, "Rational Chebyshev approximations for the error function".
/// </para>
/// </remarks>
public static partial class ErrorFunction
{
    /// <summary>Below this magnitude numbers are scaled up, so that no part of them is lost below the smallest one.</summary>
    private const double Tiny = 1E-150;

    /// <summary>The error function, (2/√π) ∫ exp(−t²) dt from 0 to x.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>
    /// A number from −1 to 1, odd in x and never falling: ±0 for ±0, ±1 for ±∞, NaN for NaN. Accurate to 0.75 units.
    /// </returns>
    public static double Erf(double x)
    {
        double magnitude = Math.Abs(x);
        if (magnitude < 0.5)
        {
            return magnitude < Tiny ? ErfOfTiny(x) : Central(x);
        }

        if (magnitude < 6.0)
        {
            return Exponential.WithSign(Rows(magnitude, out double head) + head, x);
        }

        return magnitude >= 6.0 ? (x < 0.0 ? -1.0 : 1.0) : x;
    }

    /// <summary>The error function in binary32; see <see cref="Erf(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from −1 to 1; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float Erf(float x) => (float)Erf((double)x);

    /// <summary>The complementary error function, 1 − erf x, without cancellation in the upper tail.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>
    /// A number from 0 to 2, never rising: 2 for −∞, 0 for +∞, NaN for NaN. Accurate to 0.75 units; the most where the result
    /// is subnormal (x above 26.54) and rounded a second time. Above 27.23 it is 0.
    /// </returns>
    public static double Erfc(double x)
    {
        if (x >= 0.5)
        {
            return x < 28.0 ? UpperErfc(x) : 0.0;
        }

        if (x > -0.5)
        {
            return CentralComplement(x, out double rest) + rest;
        }

        return x > -6.0 ? LowerErfc(x) : x <= -6.0 ? 2.0 : x;
    }

    /// <summary>The complementary error function in binary32; see <see cref="Erfc(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 2; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float Erfc(float x) => (float)Erfc((double)x);

    /// <summary>The scaled complementary error function, exp(x²) erfc x, which neither underflows nor overflows for positive x.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>
    /// A number from 0 on, never rising: +∞ for −∞ and below about −26.63, 0 for +∞, NaN for NaN. Accurate to 0.75 units.
    /// </returns>
    public static double ErfcScaled(double x)
    {
        if (x >= 0.5)
        {
            return x < 32.0 ? Scaled(x, out double head) + head : FarScaled(x);
        }

        return x > -0.5 ? CentralScaled(x) : x > -27.0 ? LowerScaled(x) : x <= -27.0 ? double.PositiveInfinity : x;
    }

    /// <summary>The scaled complementary error function in binary32; see <see cref="ErfcScaled(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 on; +∞ below about −9.38, NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float ErfcScaled(float x) => (float)ErfcScaled((double)x);

    // One method a branch: a method that holds them all grows beyond what the JIT optimises well.
    private static double UpperErfc(double x)
    {
        double rest = Scaled(x, out double head);
        double square = Exponential.Square(x, out double small);
        return Exponential.Times(square, small, head, rest);
    }

    private static double LowerErfc(double x)
    {
        double rest = Rows(-x, out double head);
        return (1.0 + head) + rest;
    }

    private static double CentralScaled(double x)
    {
        double near = CentralComplement(x, out double rest);
        double head = Exponential.Head(near);
        double square = Exponential.Square(x, out double small);
        return Exponential.Times(-square, -small, head, rest + (near - head));
    }

    private static double LowerScaled(double x)
    {
        double head = 1.0;
        double rest = x > -6.0 ? Rows(-x, out head) : 0.0;
        double square = Exponential.Square(x, out double small);
        return Exponential.Times(-square, -small, 1.0 + head, rest);
    }

    /// <summary>erf x for |x| below 1/2: x + x/8 exactly in two numbers, and the small rest of the series.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double Central(double x)
    {
        double eighth = 0.125 * x;
        double sum = x + eighth;
        return sum + (((x - sum) + eighth) + (x * CentralSlope(x)));
    }

    private static double ErfOfTiny(double x) => x == 0.0 ? x : Central(x * Exponential.PowerOfTwo(300)) * Exponential.PowerOfTwo(-300);

    /// <summary>erfc x = result + rest for |x| below 1/2: 1 − x − x/8 exactly in two numbers, and the small rest of the series.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double CentralComplement(double x, out double rest)
    {
        double eighth = 0.125 * x;
        double first = 1.0 - x;
        double second = first - eighth;
        rest = ((1.0 - first) - x) + ((first - second) - eighth);
        rest -= x * CentralSlope(x);
        return second;
    }

    /// <summary>(erf x)/x − 9/8 for |x| up to 1/2.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double CentralSlope(double x)
    {
        ReadOnlySpan<double> series = FunctionTables.ErfSeries;
        double square = x * x;
        return series[0] + (square * Polynomial.BeyondConstant(series, square));
    }

    /// <summary>erf x = head + result for x from 1/2 to below 6.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double Rows(double x, out double head)
    {
        long bits = BitConverter.DoubleToInt64Bits(x);
        return Polynomial.Row(
            FunctionTables.ErfRows, Polynomial.RowFromHalf(bits), Polynomial.DistanceFromMiddle(x, bits), out head);
    }

    /// <summary>exp(x²) erfc x = head + result for x from 1/2 to below 32.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double Scaled(double x, out double head)
    {
        long bits = BitConverter.DoubleToInt64Bits(x);
        return Polynomial.Row(
            FunctionTables.ScaledErfcRows, Polynomial.RowFromHalf(bits), Polynomial.DistanceFromMiddle(x, bits), out head);
    }

    /// <summary>The asymptotic series from 32 on (NIST DLMF 7.12.1): (1 − 1/(2x²) + 3/(2x²)² − …)/(x√π).</summary>
    private static double FarScaled(double x)
    {
        if (x > 1E150)
        {
            // Scaled down, for the parts of a quotient that is nearly subnormal would be lost.
            return x <= double.MaxValue ? FarScaled(x * Exponential.PowerOfTwo(-300)) * Exponential.PowerOfTwo(-300) : 0.0;
        }

        double v = 0.5 / (x * x);
        double series = -v * (1.0 - (v * (3.0 - (v * (15.0 - (v * (105.0 - (v * (945.0 - (v * 10395.0))))))))));

        // The quotient of the constant's head, and exactly what it leaves.
        double quotient = FunctionTables.InverseSqrtPiHead / x;
        double q = Exponential.Head(quotient);
        double d = Exponential.Head(x);
        double left = ((FunctionTables.InverseSqrtPiHead - (q * d)) - (q * (x - d))) - ((quotient - q) * x);
        return quotient + ((left + (FunctionTables.InverseSqrtPiTail
            + ((FunctionTables.InverseSqrtPiHead + FunctionTables.InverseSqrtPiTail) * series))) / x);
    }
}
