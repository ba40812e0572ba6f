using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Linq;
using System.Text;

namespace GaussGen.Mathematics.Baselines;

/// <summary>One table in a baseline. The texts are free of the separator and of control characters.</summary>
/// <param name="Assembly">The simple name of the assembly.</param>
/// <param name="Type">The full name of the type, with dots between nested types.</param>
/// <param name="Attribute">The declaring attribute without its suffix; a type has each at most once.</param>
/// <param name="Claim">What the declaration promises, in the words of <see cref="ClaimTitle"/>.</param>
/// <param name="Format">The name of the number format.</param>
/// <param name="Digest">The digest of the data; see <see cref="TableDigest"/>.</param>
public sealed record BaselineEntry(string Assembly, string Type, string Attribute, string Claim, string Format, string Digest)
{
    /// <summary>The columns of a line, for messages.</summary>
    public const string Columns = "assembly | type | attribute | claim | format | sha256:digest";

    private const string Separator = " | ";

    /// <summary>What tells a table from all others, whatever it promises or holds.</summary>
    public (string Assembly, string Type, string Attribute) Identity => (Assembly, Type, Attribute);

    /// <summary>The line of the file.</summary>
    public string Line => string.Join(Separator, Assembly, Type, Attribute, Claim, Format, Digest);

    /// <summary>The entry of a table, its names escaped.</summary>
    /// <param name="assembly">The simple name of the assembly, as it is.</param>
    /// <param name="type">The full name of the type, as it is, with dots between nested types.</param>
    /// <param name="attribute">The declaring attribute without its suffix.</param>
    /// <param name="claim">What the declaration promises.</param>
    /// <param name="format">The name of the number format.</param>
    /// <param name="digest">The digest of the data.</param>
    public static BaselineEntry Of(string assembly, string type, string attribute, string claim, string format, string digest) =>
        new(Escape(assembly), Escape(type), Escape(attribute), claim, format, digest);

    /// <summary>The entry that a line stands for; whether it stands for one.</summary>
    public static bool TryParse(string line, [NotNullWhen(true)] out BaselineEntry? entry)
    {
        string[] texts = line.Split(new[] { Separator }, StringSplitOptions.None);
        entry = texts.Length == 6 && texts.All(text => text.Length > 0) && TableDigest.IsDigest(texts[5])
            ? new BaselineEntry(texts[0], texts[1], texts[2], texts[3], texts[4], texts[5])
            : null;
        return entry is not null;
    }

    /// <summary>A name with what would break the line or the columns written as "\u007c"; other names stay as they are.</summary>
    public static string Escape(string name)
    {
        StringBuilder text = new(name.Length);
        foreach (char letter in name)
        {
            bool isUnfit = letter is '|' or '\\' || char.IsControl(letter) || char.IsSurrogate(letter)
                || char.GetUnicodeCategory(letter) is UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator or UnicodeCategory.Format;
            _ = isUnfit ? text.AppendFormat(CultureInfo.InvariantCulture, "\\u{0:x4}", (int)letter) : text.Append(letter);
        }

        return text.ToString();
    }

    /// <summary>How a table of the same identity differs from this one, a phrase each; none if it does not.</summary>
    public IEnumerable<string> DifferencesTo(BaselineEntry found)
    {
        if (Claim != found.Claim)
        {
            yield return $"claim \"{Claim}\" is now \"{found.Claim}\"";
        }

        if (Format != found.Format)
        {
            yield return $"format {Format} is now {found.Format}";
        }

        if (Digest != found.Digest)
        {
            yield return $"data {TableDigest.Abbreviate(Digest)} is now {TableDigest.Abbreviate(found.Digest)}";
        }
    }
}
