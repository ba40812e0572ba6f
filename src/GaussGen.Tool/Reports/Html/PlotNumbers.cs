using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Tool.Reports.Html;

/// <summary>Numbers of plots: as coordinates, as labels, and where an axis has its ticks.</summary>
internal static class PlotNumbers
{
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    /// <summary>The number that an encoding stands for; only for drawing.</summary>
    public static double Value(ulong bits, BinaryFormat format) => format.StorageBits switch
    {
        16 => (double)BitConverter.UInt16BitsToHalf((ushort)bits),
        32 => BitConverter.UInt32BitsToSingle((uint)bits),
        _ => BitConverter.UInt64BitsToDouble(bits),
    };

    /// <summary>A coordinate with the decimals that an eye can tell apart.</summary>
    public static string Coordinate(double value) => value.ToString("0.#", CultureInfo.InvariantCulture);

    /// <summary>A number for people, with four digits and a proper minus sign.</summary>
    public static string Label(double value) => value.ToString("G4", CultureInfo.InvariantCulture).Replace('-', '−');

    /// <summary>A power of ten: "10⁻¹²".</summary>
    public static string PowerOfTen(int exponent)
    {
        string digits = string.Concat(Math.Abs(exponent).ToString(CultureInfo.InvariantCulture).Select(digit => Superscripts[digit - '0']));
        return exponent switch { 0 => "1", 1 => "10", < 0 => "10⁻" + digits, _ => "10" + digits };
    }

    /// <summary>Round numbers between two ends, about as many as asked for: multiples of 1, 2 or 5 times a power of ten.</summary>
    public static IEnumerable<double> Ticks(double low, double high, int count)
    {
        double raw = (high / count) - (low / count);
        if (!(raw > 0) || !double.IsFinite(raw))
        {
            return [low];
        }

        double power = Math.Pow(10, Math.Floor(Math.Log10(raw)));
        double step = power * (raw / power < 1.5 ? 1 : raw / power < 3.5 ? 2 : raw / power < 7.5 ? 5 : 10);
        if (!(step > 0) || !double.IsFinite(step))
        {
            return [low, high];
        }

        double first = Math.Ceiling((low / step) - 1e-9);
        double last = Math.Floor((high / step) + 1e-9);
        return last - first > 4 * count ? [low, high] : Enumerable.Range(0, (int)(last - first) + 1).Select(index => (first + index) * step);
    }
}

/// <summary>Carries a range of values to a range of coordinates.</summary>
/// <param name="Low">The value at the start.</param>
/// <param name="High">The value at the end, above <paramref name="Low"/>.</param>
/// <param name="Start">The coordinate of <paramref name="Low"/>.</param>
/// <param name="End">The coordinate of <paramref name="High"/>.</param>
internal readonly record struct PlotScale(double Low, double High, double Start, double End)
{
    /// <summary>The coordinate of a value. The halves keep the difference of the largest numbers finite.</summary>
    public double At(double value) => Start + ((End - Start) * (((value / 2) - (Low / 2)) / ((High / 2) - (Low / 2))));
}
