using System;

namespace GaussGen;

/// <content>The logarithm of the cumulative distribution function.</content>
public static partial class NormalDistribution
{
    /// <summary>The natural logarithm of the cumulative distribution function, ln Φ(x), right in both tails.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>
    /// A number from −∞ to 0, never falling: −∞ for −∞ and where −x²/2 overflows (below −1.8E154), 0 for +∞ and above about 38.5, NaN
    /// for NaN. Accurate to 0.75 units.
    /// </returns>
    public static double LogCumulative(double x)
    {
        if (x < -1.0)
        {
            return x > -64.0 ? LogTail(-x) : FarLogTail(-x);
        }

        if (x < 2.0)
        {
            double shifted = (16.0 * x) + Exponential.NearestInteger;
            double sixteenths = shifted - Exponential.NearestInteger;
            double rest = Polynomial.Row(
                FunctionTables.LogCumulativeRows, (int)BitConverter.DoubleToInt64Bits(shifted) + 16, x - (0.0625 * sixteenths), out double head);
            return head + rest;
        }

        return x < NormalTail.End ? LogOfNearlyOne(x) : x >= NormalTail.End ? 0.0 : x;
    }

    /// <summary>The logarithm of the cumulative distribution function in binary32; see <see cref="LogCumulative(double)"/>.</summary>
    /// <param name="x">Any number.</param>
    /// <returns>A number from −∞ to 0; NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    public static float LogCumulative(float x) => (float)LogCumulative((double)x);

    /// <summary>−y²/2 and the logarithm of the scaled tail, for y from 1 to 64.</summary>
    private static double LogTail(double y)
    {
        long bits = BitConverter.DoubleToInt64Bits(y);
        double rest = Polynomial.Row(
            FunctionTables.LogTailRows, Polynomial.RowFromHalf(bits) - 16, Polynomial.DistanceFromMiddle(y, bits), out double head);
        double square = -0.5 * Exponential.Square(y, out double small);
        double sum = Sum(square, head, out double lost);
        return sum + (lost + (rest - (0.5 * small)));
    }

    /// <summary>
    /// −y²/2 − ln(y√(2π)) − 1/y² + 5/(2y⁴) − 37/(3y⁶) + 353/(4y⁸): the logarithm of the asymptotic series NIST DLMF 7.12.1.
    /// </summary>
    private static double FarLogTail(double y)
    {
        if (!(y < 8589934592.0))
        {
            // From 2^33 on the logarithm is far below the last place.
            return -(0.5 * y) * y;
        }

        double v = 1.0 / (y * y);
        double series = -v * (1.0 - (v * (2.5 - (v * ((37.0 / 3.0) - (v * 88.25))))));
        double square = -0.5 * Exponential.Square(y, out double small);
        double logarithm = Logarithm.Pair(y, out double low);
        double sum = Sum(square, -logarithm, out double lost);
        return sum + (lost + (FunctionTables.LogPeakDensityHead
            + (FunctionTables.LogPeakDensityTail + (series - low - (0.5 * small)))));
    }

    /// <summary>ln(1 − q) = −(q + q²/2 + q³/3 + …) for the tail q above x, which is below 0.023.</summary>
    private static double LogOfNearlyOne(double x)
    {
        double high = NormalTail.Pair(x, out double low, out int k);
        if (k < -64)
        {
            return 0.0 - Exponential.Scale(high + low, k);
        }

        double scale = Exponential.PowerOfTwo(k);
        high *= scale;
        low *= scale;
        double q = high + low;
        double sum = 1.0 / 12.0;
        sum = (sum * q) + (1.0 / 11.0);
        sum = (sum * q) + 0.1;
        sum = (sum * q) + (1.0 / 9.0);
        sum = (sum * q) + 0.125;
        sum = (sum * q) + (1.0 / 7.0);
        sum = (sum * q) + (1.0 / 6.0);
        sum = (sum * q) + 0.2;
        sum = (sum * q) + 0.25;
        sum = (sum * q) + (1.0 / 3.0);
        sum = (sum * q) + 0.5;
        return -(high + (low + (q * q * sum)));
    }
}
