using System;

namespace GaussGen;

/// <content>The inverse of the cumulative distribution function.</content>
public static partial class NormalDistribution
{
    /// <summary>Up to this distance from one half a series in the distance is used; beyond it, the probability of the tail.</summary>
    private const double CentralHalfWidth = 0.1875;

    /// <summary>The quantile function, the inverse of <see cref="Cumulative(double)"/>: the x with Φ(x) = p.</summary>
    /// <param name="p">
    /// A probability from 0 to 1, or NaN. For a probability near 1 only the distance from 1 counts, and binary64 holds it coarsely:
    /// pass the probability of the upper tail instead, and change the result's sign.
    /// </param>
    /// <returns>The number, never falling: −∞ for 0, +0 for 1/2, +∞ for 1, NaN for NaN. Accurate to 0.65 units.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="p"/> is below 0 or above 1.</exception>
    public static double Quantile(double p)
    {
        // Exact from 1/4 on; below it only its size counts.
        double u = p - 0.5;
        if (Math.Abs(u) <= CentralHalfWidth)
        {
            return CentralQuantile(u);
        }

        double tail = u < 0.0 ? p : 1.0 - p;
        if (tail > 0.0)
        {
            double value = NormalTail.Quantile(tail, out double rest) + rest;
            return Exponential.WithSign(value, u);
        }

        return EndOfQuantile(p);
    }

    /// <summary>The quantile function in binary32; see <see cref="Quantile(double)"/>.</summary>
    /// <param name="p">A probability from 0 to 1, or NaN.</param>
    /// <returns>The number; −∞ for 0, +∞ for 1, NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="p"/> is below 0 or above 1.</exception>
    public static float Quantile(float p) => (float)Quantile((double)p);

    /// <summary>For |u| up to 3/16: 2u + u/2 exactly in two numbers, and the rest of the series.</summary>
    private static double CentralQuantile(double u)
    {
        double half = 0.5 * u;
        double twice = 2.0 * u;
        double sum = twice + half;
        return sum + (((twice - sum) + half) + (u * Polynomial.OfFourteen(FunctionTables.QuantileSeries, u * u)));
    }

    private static double EndOfQuantile(double p)
    {
        if (p < 0.0 || p > 1.0)
        {
            throw new ArgumentOutOfRangeException(nameof(p), p, "A probability is from 0 to 1; give one of these.");
        }

        return p == 0.0 ? double.NegativeInfinity : p == 1.0 ? double.PositiveInfinity : p;
    }
}
