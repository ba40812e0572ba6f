using System.Collections.Generic;

namespace GaussGen.Tool.Output;

/// <summary>Breaks text into lines.</summary>
internal static class TextLayout
{
    /// <summary>Lines of at most the given width, broken at spaces; a longer word stays whole. At least one line.</summary>
    public static IEnumerable<string> Wrap(string text, int width)
    {
        string rest = text;
        while (rest.Length > width)
        {
            int end = rest.LastIndexOf(' ', width);
            if (end <= 0)
            {
                end = rest.IndexOf(' ', width);
            }

            if (end <= 0)
            {
                break;
            }

            yield return rest[..end];
            rest = rest[(end + 1)..];
        }

        yield return rest;
    }
}
