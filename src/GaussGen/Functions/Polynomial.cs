using System;
using System.Runtime.CompilerServices;

namespace GaussGen;

/// <summary>Polynomials from the tables, in Estrin's order, which lets a processor work on several terms at once.</summary>
internal static class Polynomial
{
    /// <summary>Numbers in a row: head and tail of the constant, nine coefficients.</summary>
    private const int RowLength = 11;

    private const long RowMask = 0xFFFFFFFFFFFF;
    private const long RowMiddle = 0x800000000000;

    /// <summary>
    /// The number of the row that holds a positive argument, from the row of the argument 1/2 on: exponent and four leading bits.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static int RowFromHalf(long bits) => (int)(bits >> 48) - (0x3FE << 4);

    /// <summary>The distance of a positive argument from the middle of its row; exact.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double DistanceFromMiddle(double x, long bits) =>
        x - BitConverter.Int64BitsToDouble((bits & ~RowMask) | RowMiddle);

    /// <summary>What a row adds to its head: the function is head + result.</summary>
    /// <param name="table">The table.</param>
    /// <param name="row">The row's number.</param>
    /// <param name="distance">The distance from the row's middle.</param>
    /// <param name="head">The head of the constant.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Row(ReadOnlySpan<double> table, int row, double distance, out double head) =>
        Row(table, row, distance, out head, out _);

    /// <summary>The same, with the slope at the row's middle.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Row(ReadOnlySpan<double> table, int row, double distance, out double head, out double slope)
    {
        ReadOnlySpan<double> c = table.Slice(row * RowLength, RowLength);
        head = c[0];
        slope = c[2];
        double square = distance * distance;
        double fourth = square * square;
        double low = (c[2] + (c[3] * distance)) + ((c[4] + (c[5] * distance)) * square);
        double high = (c[6] + (c[7] * distance)) + ((c[8] + (c[9] * distance)) * square) + (c[10] * fourth);
        return c[1] + (distance * (low + (high * fourth)));
    }

    /// <summary>The ten coefficients' polynomial without its constant, divided by v.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double BeyondConstant(ReadOnlySpan<double> coefficients, double v)
    {
        ReadOnlySpan<double> c = coefficients.Slice(0, 10);
        double square = v * v;
        double fourth = square * square;
        double low = (c[1] + (c[2] * v)) + ((c[3] + (c[4] * v)) * square);
        double high = (c[5] + (c[6] * v)) + ((c[7] + (c[8] * v)) * square) + (c[9] * fourth);
        return low + (high * fourth);
    }

    /// <summary>The polynomial with 14 coefficients.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double OfFourteen(ReadOnlySpan<double> coefficients, double v)
    {
        ReadOnlySpan<double> c = coefficients.Slice(0, 14);
        double square = v * v;
        double fourth = square * square;
        double high = (c[8] + (c[9] * v)) + ((c[10] + (c[11] * v)) * square) + ((c[12] + (c[13] * v)) * fourth);
        return OfEight(c, v, square, fourth) + (high * (fourth * fourth));
    }

    /// <summary>The polynomial with 17 coefficients.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double OfSeventeen(ReadOnlySpan<double> coefficients, double v)
    {
        ReadOnlySpan<double> c = coefficients.Slice(0, 17);
        double square = v * v;
        double fourth = square * square;
        double eighth = fourth * fourth;
        double high = OfEight(c.Slice(8, 8), v, square, fourth) + (c[16] * eighth);
        return OfEight(c, v, square, fourth) + (high * eighth);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double OfEight(ReadOnlySpan<double> c, double v, double square, double fourth) =>
        ((c[0] + (c[1] * v)) + ((c[2] + (c[3] * v)) * square))
        + (((c[4] + (c[5] * v)) + ((c[6] + (c[7] * v)) * square)) * fourth);
}
