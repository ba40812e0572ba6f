using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>
/// The digest by which people and baselines know a table: the same wherever and however the table was compiled, and easy to
/// compute by other means.
/// </summary>
/// <remarks>
/// It is the SHA-256 digest of lines of ASCII text, each ended by a line feed: "Nodes[0] binary64 bff0000000000000", the member,
/// its format and the bits in as many lower-case digits as the format has; "PointCount int32 00000002" for an integer. Members are
/// in ordinal order, the entries of one in the order of their indices. Covered are the spans, the constants that repeat an
/// entry, and the integers of a rule. Constants that are only in the code of a sum follow from these and are left to the proof.
/// </remarks>
internal static class TableDigest
{
    private const string Algorithm = "sha256:";
    private const int DigitCount = 64;

    /// <summary>The digest with the name of its algorithm in front: "sha256:0a1b…".</summary>
    public static string Of(TableData data, ClaimFamily family)
    {
        IEnumerable<(string Name, string Text)> spans = data.Spans.Select(span => (
            span.Name,
            string.Concat(span.Bits.Select((bits, index) => Line($"{span.Name}[{Text(index)}]", span.Format, bits)))));
        IEnumerable<(string Name, string Text)> constants = data.Constants
            .Where(constant => family.IsInteger(constant.Name) || family.IsEntry(constant.Name))
            .Select(constant => (constant.Name, Line(constant.Name, constant.Format, constant.Bits)));
        string text = string.Concat(spans.Concat(constants).OrderBy(member => member.Name, StringComparer.Ordinal).Select(member => member.Text));
        return Algorithm + Hexadecimal.Lower(SHA256.HashData(Encoding.ASCII.GetBytes(text)));
    }

    /// <summary>Whether a text is such a digest.</summary>
    public static bool IsDigest(string text) =>
        text.Length == Algorithm.Length + DigitCount
        && text.StartsWith(Algorithm, StringComparison.Ordinal)
        && text.Skip(Algorithm.Length).All(char.IsAsciiHexDigitLower);

    /// <summary>The digits of a digest.</summary>
    public static string Digits(string digest) => digest[Algorithm.Length..];

    /// <summary>The beginning of a digest, which is enough to tell two from each other by eye.</summary>
    public static string Short(string digest) => digest[..(Algorithm.Length + 12)] + "…";

    private static string Line(string member, BinaryFormat? format, ulong bits)
    {
        const int IntegerBits = 32;
        string digits = Text((format?.StorageBits ?? IntegerBits) / 4);
        return $"{member} {format?.Name ?? "int32"} {bits.ToString("x" + digits, CultureInfo.InvariantCulture)}\n";
    }

    private static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);
}
