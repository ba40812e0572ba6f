using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Baselines;

/// <summary>A member of a table that its digest covers.</summary>
/// <param name="Name">The member's name.</param>
/// <param name="Format">The number format; <c>null</c> for a 32-bit integer.</param>
/// <param name="Bits">The encoding of each entry, in the low bits.</param>
/// <param name="IsList">Whether the entries have indices; a member without has one entry.</param>
public sealed record DigestedMember(string Name, BinaryFormat? Format, IReadOnlyList<ulong> Bits, bool IsList)
{
    /// <summary>A list of numbers.</summary>
    public static DigestedMember List(string name, BinaryFormat? format, IReadOnlyList<ulong> bits) => new(name, format, bits, IsList: true);

    /// <summary>One number.</summary>
    public static DigestedMember Number(string name, BinaryFormat? format, ulong bits) => new(name, format, new[] { bits }, IsList: false);

    /// <summary>The name of the constant that repeats an entry of a list of moments: "Raw3".</summary>
    public static string ConstantName(string list, int index) => list + index.ToString(CultureInfo.InvariantCulture);
}

/// <summary>
/// The digest by which people and baselines know a table: the same wherever and however the table was compiled, and easy to
/// compute by other means.
/// </summary>
/// <remarks>
/// It is the SHA-256 digest of lines of ASCII text, each ended by a line feed: "Nodes[0] binary64 bff0000000000000", the member,
/// its format and the bits in as many lower-case digits as the format has; "PointCount int32 00000002" for an integer. Members are
/// in ordinal order, the entries of one in the order of their indices. Covered are Nodes, Weights, PointCount and
/// DegreeOfExactness of a rule, CompanionNodes and CompanionWeights where it has an estimate of its error, and
/// NormalizingIntegral of an even exponential; of moments Raw, Central, Absolute and the constants that repeat their entries; and
/// the lists of a table that is neither. Constants that are only in the code of a sum follow from these and are left to the proof.
/// </remarks>
public static class TableDigest
{
    private const string Algorithm = "sha256:";
    private const int DigitCount = 64;

    /// <summary>The digest with the name of its algorithm in front: "sha256:0a1b…".</summary>
    public static string Of(IEnumerable<DigestedMember> members)
    {
        StringBuilder text = new();
        foreach (DigestedMember member in members.OrderBy(member => member.Name, StringComparer.Ordinal))
        {
            for (int i = 0; i < member.Bits.Count; i++)
            {
                Append(text, member, i);
            }
        }

        using SHA256 algorithm = SHA256.Create();
        byte[] digest = algorithm.ComputeHash(Encoding.ASCII.GetBytes(text.ToString()));
        return Algorithm + string.Concat(digest.Select(value => value.ToString("x2", CultureInfo.InvariantCulture)));
    }

    /// <summary>Whether a text is such a digest.</summary>
    public static bool IsDigest(string text) =>
        text.Length == Algorithm.Length + DigitCount
        && text.StartsWith(Algorithm, StringComparison.Ordinal)
        && text.Skip(Algorithm.Length).All(digit => digit is (>= '0' and <= '9') or (>= 'a' and <= 'f'));

    /// <summary>The digits of a digest.</summary>
    public static string Digits(string digest) => digest.Substring(Algorithm.Length);

    /// <summary>The beginning of a digest, which is enough to tell two from each other by eye.</summary>
    public static string Abbreviate(string digest) => digest.Substring(0, Algorithm.Length + 12) + "…";

    private static void Append(StringBuilder text, DigestedMember member, int index)
    {
        const int IntegerBits = 32;
        string width = "x" + ((member.Format?.StorageBits ?? IntegerBits) / 4).ToString(CultureInfo.InvariantCulture);
        _ = text.Append(member.Name);
        if (member.IsList)
        {
            _ = text.Append('[').Append(index.ToString(CultureInfo.InvariantCulture)).Append(']');
        }

        _ = text.Append(' ').Append(member.Format?.Name ?? "int32").Append(' ')
            .Append(member.Bits[index].ToString(width, CultureInfo.InvariantCulture)).Append('\n');
    }
}
