using System;

namespace GaussGen;

/// <content>The inverse.</content>
public static partial class ErrorFunction
{
    /// <summary>The inverse of the error function: the x with erf x = y.</summary>
    /// <param name="y">A number from −1 to 1, or NaN.</param>
    /// <returns>
    /// The number, odd in y and never falling: ±0 for ±0, ±∞ for ±1, NaN for NaN. Accurate to 0.77 units. Near ±1 a unit in the
    /// last place of y moves the result by far more than a unit; ask for the quantile of a small probability there
    /// (<see cref="NormalDistribution.Quantile(double)"/>).
    /// </returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="y"/> is below −1 or above 1.</exception>
    public static double Inverse(double y)
    {
        double magnitude = Math.Abs(y);
        if (magnitude < 0.5)
        {
            return magnitude < Tiny ? InverseOfTiny(y) : CentralInverse(y);
        }

        if (magnitude < 1.0)
        {
            return Exponential.WithSign(OuterInverse(0.5 * (1.0 - magnitude)), y);
        }

        return EndOfInverse(y);
    }

    /// <summary>The inverse of the error function in binary32; see <see cref="Inverse(double)"/>.</summary>
    /// <param name="y">A number from −1 to 1, or NaN.</param>
    /// <returns>The number; ±∞ for ±1, NaN for NaN. Accurate to 0.5001 units of binary32.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="y"/> is below −1 or above 1.</exception>
    public static float Inverse(float y) => (float)Inverse((double)y);

    /// <summary>The quantile of the upper tail t, divided by √2 in two parts.</summary>
    private static double OuterInverse(double t)
    {
        double quantile = NormalTail.Quantile(t, out double rest);
        double head = Exponential.Head(quantile);
        rest += quantile - head;
        return (head * FunctionTables.InverseSqrt2Head)
            + ((head * FunctionTables.InverseSqrt2Tail) + (rest * (FunctionTables.InverseSqrt2Head + FunctionTables.InverseSqrt2Tail)));
    }

    /// <summary>For |y| below 1/2: y − y/8 exactly in two numbers, and the rest of the series.</summary>
    private static double CentralInverse(double y)
    {
        double eighth = -0.125 * y;
        double sum = y + eighth;
        return sum + (((y - sum) + eighth) + (y * Polynomial.OfSeventeen(FunctionTables.InverseSeries, y * y)));
    }

    private static double InverseOfTiny(double y) =>
        y == 0.0 ? y : CentralInverse(y * Exponential.PowerOfTwo(300)) * Exponential.PowerOfTwo(-300);

    private static double EndOfInverse(double y)
    {
        if (Math.Abs(y) > 1.0)
        {
            throw new ArgumentOutOfRangeException(nameof(y), y, "The error function takes values from -1 to 1 only; give one of these.");
        }

        return y == 1.0 ? double.PositiveInfinity : y == -1.0 ? double.NegativeInfinity : y;
    }
}
