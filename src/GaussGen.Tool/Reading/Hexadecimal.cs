using System;

namespace GaussGen.Tool.Reading;

/// <summary>Digits of digests and encodings.</summary>
internal static class Hexadecimal
{
    /// <summary>Two lower-case digits a byte.</summary>
    public static string Lower(ReadOnlySpan<byte> bytes) =>
        string.Create(bytes.Length * 2, bytes.ToArray(), static (text, source) =>
        {
            const string Digits = "0123456789abcdef";
            for (int i = 0; i < source.Length; i++)
            {
                text[2 * i] = Digits[source[i] >> 4];
                text[2 * i + 1] = Digits[source[i] & 15];
            }
        });
}
