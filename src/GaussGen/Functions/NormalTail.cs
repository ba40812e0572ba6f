using System;
using System.Runtime.CompilerServices;

namespace GaussGen;

/// <summary>The upper tail of the standard normal distribution as pairs of numbers, and its inverse.</summary>
internal static class NormalTail
{
    /// <summary>From here on the tail is below half of the smallest subnormal number.</summary>
    internal const double End = 40.0;

    /// <summary>The probability above x = (result + low)·2^k, for x from 1/2 to below <see cref="End"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Pair(double x, out double low, out int k)
    {
        long bits = BitConverter.DoubleToInt64Bits(x);
        double rest = Polynomial.Row(
            FunctionTables.ScaledTailRows, Polynomial.RowFromHalf(bits), Polynomial.DistanceFromMiddle(x, bits), out double head);
        double square = Exponential.Square(x, out double small);
        return Exponential.Product(0.5 * square, 0.5 * small, head, rest, out low, out k);
    }

    /// <summary>(Φ(x) − 1/2)/x − 1/2 for |x| up to 1/2.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double CentralSlope(double x)
    {
        ReadOnlySpan<double> series = FunctionTables.CumulativeSeries;
        double square = x * x;
        return series[0] + (square * Polynomial.BeyondConstant(series, square));
    }

    /// <summary>The probability between 0 and x = result + low, for x from 0 on.</summary>
    internal static double FromZeroPair(double x, out double low)
    {
        if (x < 0.5)
        {
            low = x * CentralSlope(x);
            return 0.5 * x;
        }

        if (x > 12.0)
        {
            low = 0.0;
            return 0.5;
        }

        double tail = Pair(x, out double tailLow, out int k);
        double scale = Exponential.PowerOfTwo(k);
        tail *= scale;
        double difference = 0.5 - tail;
        low = ((0.5 - difference) - tail) - (tailLow * scale);
        return difference;
    }

    /// <summary>The number with the probability t above it = result + rest, for t above 0 and below 5/16.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Quantile(double t, out double rest)
    {
        if (t >= 1.0 / 256.0)
        {
            long bits = BitConverter.DoubleToInt64Bits(t);
            rest = Polynomial.Row(
                FunctionTables.QuantileRows, (int)(bits >> 48) - (0x3F7 << 4), Polynomial.DistanceFromMiddle(t, bits), out double head);
            return head;
        }

        return FarQuantile(t, out rest);
    }

    /// <summary>The same far out, by w = √(−2 ln t): the quantile less w is smooth in w.</summary>
    private static double FarQuantile(double t, out double rest)
    {
        double high = -2.0 * Logarithm.Pair(t, out double low);
        low *= -2.0;
        double w = Math.Sqrt(high + low);

        // What the rounded root lacks, from a square that is exact in three parts. The polynomial does not wait for it: its slope
        // carries the rest over.
        double reciprocal = 0.5 / w;
        double head = Exponential.Head(w);
        double tail = w - head;
        double missing = ((((high - (head * head)) - (2.0 * head * tail)) - (tail * tail)) + low) * reciprocal;
        long bits = BitConverter.DoubleToInt64Bits(w);
        double below = Polynomial.Row(
            FunctionTables.QuantileTailRows,
            (int)(bits >> 48) - (0x400 << 4) - 10,
            Polynomial.DistanceFromMiddle(w, bits),
            out double offset,
            out double slope);

        // The offset is negative and smaller than w.
        double sum = w + offset;
        rest = ((w - sum) + offset) + (below + (missing * (1.0 + slope)));
        return sum;
    }
}
