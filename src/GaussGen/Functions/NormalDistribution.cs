using System;

namespace GaussGen;

/// <summary>
/// The standard normal distribution. Every function takes the standardised variable: (value − mean) / standard deviation; a
/// density is then still to be divided by the standard deviation.
/// </summary>
/// <remarks>
/// Accuracy, allocation, equal bits and sources are as for <see cref="ErrorFunction"/>; the tail has a table of its own, so that
/// x/√2, whose rounding would cost hundreds of units far out, is never formed. Notation as in Abramowitz and Stegun 26.2.
/// </remarks>
public static partial class NormalDistribution
{
    /// <summary>The density, exp(−x²/2)/√(2π).</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 0.3989…, even in x: 0 for ±∞, NaN for NaN. Accurate to 0.75 units, the most where it is subnormal.</returns>
    public static double Density(double x)
    {
        double square = Exponential.Square(x, out double small);
        if (square < 1600.0)
        {
            return Exponential.TimesPeakDensity(0.5 * square, 0.5 * small);
        }

        return square >= 1600.0 ? 0.0 : x;
    }

    /// <summary>The density in binary32; see <see cref="Density(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 0.3989…; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float Density(float x) => (float)Density((double)x);

    /// <summary>The natural logarithm of the density, −x²/2 − ln √(2π).</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from −∞ to −0.9189…, even in x: −∞ for ±∞, NaN for NaN. Accurate to 0.51 units.</returns>
    public static double LogDensity(double x)
    {
        double magnitude = Math.Abs(x);
        if (!(magnitude < 1073741824.0))
        {
            // From 2^30 on the constant is far below the last place.
            return -(0.5 * magnitude) * magnitude;
        }

        double square = -0.5 * Exponential.Square(x, out double small);
        double sum = Sum(square, FunctionTables.LogPeakDensityHead, out double lost);
        return sum + (lost + (FunctionTables.LogPeakDensityTail - (0.5 * small)));
    }

    /// <summary>The logarithm of the density in binary32; see <see cref="LogDensity(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from −∞ to −0.9189…; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float LogDensity(float x) => (float)LogDensity((double)x);

    /// <summary>The cumulative distribution function Φ: the probability of a value below x.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>
    /// A number from 0 to 1, never falling: 0 for −∞, 1 for +∞, NaN for NaN. Accurate to 0.75 units, the most where the result is
    /// subnormal (x below −37.5). Below −38.47 it is 0.
    /// </returns>
    public static double Cumulative(double x) => UpperTail(-x);

    /// <summary>The cumulative distribution function in binary32; see <see cref="Cumulative(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 1; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float Cumulative(float x) => (float)UpperTail(-(double)x);

    /// <summary>The probability of a value above x, 1 − Φ(x), without cancellation in the upper tail.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 1, never rising: 1 for −∞, 0 for +∞, NaN for NaN. Accurate to 0.75 units, the most where it is subnormal.</returns>
    public static double UpperTail(double x)
    {
        if (x >= 0.5)
        {
            if (x >= NormalTail.End)
            {
                return 0.0;
            }

            double high = NormalTail.Pair(x, out double low, out int k);
            return Exponential.Scale(high + low, k);
        }

        if (x > -0.5)
        {
            double half = 0.5 * x;
            double near = 0.5 - half;
            return near + (((0.5 - near) - half) - (x * NormalTail.CentralSlope(x)));
        }

        if (x > -9.0)
        {
            double high = NormalTail.Pair(-x, out double low, out int k);
            double scale = Exponential.PowerOfTwo(k);
            high *= scale;
            double near = 1.0 - high;
            return near + (((1.0 - near) - high) - (low * scale));
        }

        return x <= -9.0 ? 1.0 : x;
    }

    /// <summary>The probability above x in binary32; see <see cref="UpperTail(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from 0 to 1; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float UpperTail(float x) => (float)UpperTail((double)x);

    /// <summary>The exact sum of two numbers as result and rest (Knuth 1997, "The Art of Computer Programming" 2, 4.2.2).</summary>
    private static double Sum(double a, double b, out double rest)
    {
        double sum = a + b;
        double second = sum - a;
        rest = (a - (sum - second)) + (b - second);
        return sum;
    }
}
