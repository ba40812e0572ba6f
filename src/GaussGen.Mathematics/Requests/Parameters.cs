using System;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Requests;

/// <summary>Checks and texts of the parameters of requests. A binary64 parameter means its exact value.</summary>
internal static class Parameters
{
    internal static bool IsFinite(double value) => !double.IsNaN(value) && !double.IsInfinity(value);

    internal static bool IsPositive(double value) => value > 0 && !double.IsInfinity(value);

    /// <summary>The value exactly.</summary>
    internal static Dyadic ValueOf(double value) => BinaryFormat.Binary64.ValueOf(BitsOf(value)).Reduce();

    /// <summary>The value as documentation shows it.</summary>
    internal static string Write(double value) => double.IsPositiveInfinity(value) ? "∞"
        : double.IsNegativeInfinity(value) ? "−∞"
        : ShortestDecimal.Write(BitsOf(value), BinaryFormat.Binary64);

    /// <summary>The values as documentation shows them.</summary>
    internal static string Write(ValueList values) => string.Join(", ", values.Select(Write));

    /// <summary>The number itself.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is out of range.</exception>
    internal static int RequireCount(int value, int minimum, int maximum, string what, string name) => value >= minimum && value <= maximum
        ? value
        : throw new ArgumentOutOfRangeException(
            name, value, string.Format(CultureInfo.InvariantCulture, "{0} must be from {1} to {2}.", what, minimum, maximum));

    private static ulong BitsOf(double value) => (ulong)BitConverter.DoubleToInt64Bits(value);
}
