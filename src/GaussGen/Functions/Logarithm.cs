using System;

namespace GaussGen;

/// <summary>
/// The natural logarithm as a pair of numbers: ln(2^e m) = e ln 2 + ln m_j + ln(1 + r), with m_j the middle of the 128th of [1, 2)
/// that holds m (Tang 1990, "Table-driven implementation of the logarithm function in IEEE floating-point arithmetic").
/// </summary>
internal static class Logarithm
{
    /// <summary>ln x = result + low, to about 2^−60, for a positive finite number.</summary>
    internal static double Pair(double x, out double low)
    {
        long bits = BitConverter.DoubleToInt64Bits(x);
        int exponent = -1023;
        if (bits < 0x10000000000000)
        {
            // Subnormal: 2^54 makes it normal.
            bits = BitConverter.DoubleToInt64Bits(x * 18014398509481984.0);
            exponent -= 54;
        }

        exponent += (int)(bits >> 52);
        double significand = BitConverter.Int64BitsToDouble((bits & 0xFFFFFFFFFFFFF) | 0x3FF0000000000000);
        int j = (int)(bits >> 45) & 127;
        double middle = 1.0 + (((2 * j) + 1) * (1.0 / 256.0));
        ReadOnlySpan<double> entry = FunctionTables.Logarithms.Slice(j * 3, 3);
        double r = (significand - middle) * entry[2];
        double square = r * r;
        double beyond = square * ((-0.5 + (r * (1.0 / 3.0))) + (square * ((-0.25 + (r * 0.2)) + (square * ((-1.0 / 6.0) + (r * (1.0 / 7.0)))))));

        // Multiples of 2^-40 below 2^11: their sum is exact.
        low = r + (beyond + ((exponent * FunctionTables.Ln2Tail) + entry[1]));
        return (exponent * FunctionTables.Ln2Head) + entry[0];
    }
}
