using System.Globalization;
using System.Linq;
using System.Text;

namespace GaussGen.Tool.Exports;

/// <summary>Names for C: lower case with underscores, valid and not reserved (ISO/IEC 9899:1999, 6.4.2.1 and 7.1.3).</summary>
internal static class CName
{
    /// <summary>
    /// A C# name in C's manner: "SurveyBoat.Outer.SixNodes" is "survey_boat_outer_six_nodes". Letters beyond ASCII are written
    /// with their code: "größe" is "gru00f6u00dfe".
    /// </summary>
    public static string Of(string name)
    {
        StringBuilder text = new();
        for (int i = 0; i < name.Length; i++)
        {
            char letter = name[i];
            if (letter > '~')
            {
                _ = text.Append(CultureInfo.InvariantCulture, $"u{(int)letter:x4}");
                continue;
            }

            if (!char.IsAsciiLetterOrDigit(letter))
            {
                Separate(text);
                continue;
            }

            // A capital begins a word after a small letter or a digit, and where it is the last of several and a small one follows.
            bool isBegin = char.IsAsciiLetterUpper(letter) && i > 0
                && (char.IsAsciiLetterLower(name[i - 1]) || char.IsAsciiDigit(name[i - 1])
                    || (char.IsAsciiLetterUpper(name[i - 1]) && i + 1 < name.Length && char.IsAsciiLetterLower(name[i + 1])));
            if (isBegin)
            {
                Separate(text);
            }

            _ = text.Append(char.ToLowerInvariant(letter));
        }

        string trimmed = text.ToString().Trim('_');
        return trimmed.Length == 0 || char.IsAsciiDigit(trimmed[0]) ? "table_" + trimmed : trimmed;
    }

    /// <summary>Whether a text can begin a name: letters, digits and underscores, a letter first.</summary>
    public static bool IsPrefix(string text) =>
        text.Length > 0 && char.IsAsciiLetter(text[0]) && text.All(letter => char.IsAsciiLetterOrDigit(letter) || letter == '_');

    private static void Separate(StringBuilder text)
    {
        if (text.Length > 0 && text[^1] != '_')
        {
            _ = text.Append('_');
        }
    }
}
