using System.Globalization;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Tool.Verification;

/// <summary>An encoding as text: all its bits, and the number they stand for.</summary>
internal static class EncodingText
{
    /// <summary>"0x3FF8000000000000 (1.5)".</summary>
    public static string Of(ulong bits, BinaryFormat format) => $"0x{Bits(bits, format)} ({Number(bits, format)})";

    /// <summary>The bits as hexadecimal digits, as many as the format has.</summary>
    public static string Bits(ulong bits, BinaryFormat format) =>
        bits.ToString("X" + (format.StorageBits / 4).ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    /// <summary>The shortest decimal that stands for the number.</summary>
    public static string Number(ulong bits, BinaryFormat format) =>
        format.IsFinite(bits) ? (format.IsZero(bits) && format.IsNegative(bits) ? "-0" : ShortestDecimal.Write(bits, format))
        : !format.IsInfinity(bits) ? "NaN"
        : format.IsNegative(bits) ? "-infinity" : "infinity";
}

/// <summary>A distance in units in the last place as text.</summary>
internal static class UlpText
{
    /// <summary>Four decimals where that says something, an order of magnitude beyond.</summary>
    public static string Of(double distance) =>
        double.IsPositiveInfinity(distance) ? "infinitely many"
        : distance < 1e4 ? distance.ToString("0.0000", CultureInfo.InvariantCulture)
        : distance.ToString("0.##E+0", CultureInfo.InvariantCulture);
}
