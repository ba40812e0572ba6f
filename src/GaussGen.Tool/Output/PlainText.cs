using System.Linq;
using System.Text;

namespace GaussGen.Tool.Output;

/// <summary>Text from outside (names in a file's metadata, paths, messages of the system) made fit for one line of a terminal.</summary>
internal static class PlainText
{
    private const int Longest = 1024;

    /// <summary>
    /// The text without control characters, which could move the cursor, change colours or break the line, without halves of
    /// surrogate pairs and noncharacters, which no XML may hold, and cut if no honest name is that long.
    /// </summary>
    public static string OneLine(string text)
    {
        string cut = text.Length <= Longest ? text : text[..Longest] + "…";
        return cut.All(letter => !char.IsSurrogate(letter) && !IsUnfit(letter)) ? cut : Replace(cut);
    }

    private static string Replace(string text)
    {
        StringBuilder fit = new(text.Length);

        // The enumeration gives a replacement character for half a pair.
        foreach (Rune rune in text.EnumerateRunes())
        {
            _ = fit.Append(rune.IsBmp && IsUnfit((char)rune.Value) ? "\uFFFD" : rune.ToString());
        }

        return fit.ToString();
    }

    private static bool IsUnfit(char letter) =>
        char.IsControl(letter)
        || letter is '\u2028' or '\u2029' or (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069') or '\uFFFE' or '\uFFFF';
}
