using System;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Generator.Emission;

/// <summary>A number format as C# knows it.</summary>
/// <param name="Format">The format.</param>
/// <param name="Keyword">The type.</param>
/// <param name="Suffix">What ends a literal of the type.</param>
internal sealed record NumberType(BinaryFormat Format, string Keyword, string Suffix)
{
    public int Bytes => Format.StorageBits / 8;

    public string Span => $"global::System.ReadOnlySpan<{Keyword}>";

    public string Zero => "0.0" + Suffix;

    public string One => "1.0" + Suffix;

    public static NumberType Of(BinaryFormat format) =>
        format == BinaryFormat.Binary64 ? new NumberType(format, "double", string.Empty)
        : format == BinaryFormat.Binary32 ? new NumberType(format, "float", "F")
        : throw new ArgumentException($"C# has no type for the format {format.Name}.", nameof(format));

    /// <summary>The shortest literal that the compiler reads as the value.</summary>
    public string Literal(RoundedValue value) => ShortestDecimal.Write(value.Bits, Format) + Suffix;

    /// <summary>The value in hexadecimal, which shows every bit.</summary>
    public string Hexadecimal(RoundedValue value) => HexadecimalFloat.Write(value.Bits, Format);
}
