using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Linq;
using System.Text;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Baselines;

/// <summary>One table in a baseline. The texts are free of the separator and of control characters.</summary>
/// <param name="Assembly">The simple name of the assembly.</param>
/// <param name="Type">The full name of the type.</param>
/// <param name="Attribute">The declaring attribute without its suffix; a type has each at most once.</param>
/// <param name="Claim">What the declaration promises, in words.</param>
/// <param name="Format">The number format.</param>
/// <param name="Digest">The digest of the data.</param>
internal sealed record BaselineEntry(string Assembly, string Type, string Attribute, string Claim, string Format, string Digest)
{
    private const string Separator = " | ";

    /// <summary>What tells a table from all others, whatever it promises or holds.</summary>
    public (string Assembly, string Type, string Attribute) Identity => (Assembly, Type, Attribute);

    /// <summary>The line of the file.</summary>
    public string Line => string.Join(Separator, Assembly, Type, Attribute, Claim, Format, Digest);

    /// <summary>The entry of a table that was read.</summary>
    public static BaselineEntry Of(FoundAssembly assembly, ReadTable table) => new(
        Escape(assembly.Name),
        Escape(table.Declared.Type.Name),
        Escape(table.Declared.Attribute),
        Escape(table.Claim!.Title),
        table.Claim.Format.Name,
        TableDigest.Of(table.Data!, table.Family!));

    /// <summary>The entry that a line stands for; whether it stands for one.</summary>
    public static bool TryParse(string line, [NotNullWhen(true)] out BaselineEntry? entry)
    {
        string[] texts = line.Split(Separator);
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
            _ = isUnfit ? text.Append(CultureInfo.InvariantCulture, $"\\u{(int)letter:x4}") : text.Append(letter);
        }

        return text.ToString();
    }
}
