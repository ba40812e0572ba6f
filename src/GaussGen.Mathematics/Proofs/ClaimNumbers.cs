using System;
using System.Globalization;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Binary64 parameters of claims, which stand for their exact values.</summary>
internal static class ClaimNumbers
{
    /// <summary>Whether the number is neither NaN nor infinite.</summary>
    public static bool IsFinite(double value) => !double.IsNaN(value) && !double.IsInfinity(value);

    /// <summary>Whether the number is finite and above zero.</summary>
    public static bool IsPositive(double value) => value > 0 && !double.IsInfinity(value);

    /// <summary>The exact value of a finite number.</summary>
    public static Dyadic ValueOf(double value) =>
        BinaryFormat.Binary64.ValueOf((ulong)BitConverter.DoubleToInt64Bits(value)).Reduce();

    /// <summary>The highest order of a table of moments itself.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is below 0 or above the largest.</exception>
    public static int RequireOrder(int maximumOrder, int largest) => maximumOrder >= 0 && maximumOrder <= largest
        ? maximumOrder
        : throw new ArgumentOutOfRangeException(
            nameof(maximumOrder),
            maximumOrder,
            string.Format(CultureInfo.InvariantCulture, "The highest order must be from 0 to {0}.", largest));
}
