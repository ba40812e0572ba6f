namespace GaussGen.Generator.Emission;

/// <summary>XML documentation comments: the text is markup already, and is broken into lines that a reviewer can read.</summary>
internal static class Documentation
{
    private const string Prefix = "/// ";
    private const int LineWidth = 130;

    /// <summary>Text as it stands between tags.</summary>
    public static string Escape(string text) => text.Replace("&", "&amp;").Replace("<", "&lt;").Replace(">", "&gt;");

    public static void Summary(this SourceWriter writer, string text) => writer.Element("summary", "summary", text);

    public static void Parameter(this SourceWriter writer, string name, string text) =>
        writer.Element($"param name=\"{name}\"", "param", text);

    public static void TypeParameter(this SourceWriter writer, string name, string text) =>
        writer.Element($"typeparam name=\"{name}\"", "typeparam", text);

    public static void Returns(this SourceWriter writer, string text) => writer.Element("returns", "returns", text);

    public static void Throws(this SourceWriter writer, string exception, string text) =>
        writer.Element($"exception cref=\"{exception}\"", "exception", text);

    public static void Remarks(this SourceWriter writer, params string[] paragraphs)
    {
        writer.Line(Prefix + "<remarks>");
        foreach (string paragraph in paragraphs)
        {
            writer.Element("para", "para", paragraph);
        }

        writer.Line(Prefix + "</remarks>");
    }

    private static void Element(this SourceWriter writer, string opening, string closing, string text)
    {
        int width = LineWidth - writer.Column - Prefix.Length;
        string rest = $"<{opening}>{text}</{closing}>";
        while (rest.Length > width)
        {
            int end = LastBreak(rest, width);
            if (end < 0)
            {
                break;
            }

            writer.Line(Prefix + rest.Substring(0, end));
            rest = rest.Substring(end + 1);
        }

        writer.Line(Prefix + rest);
    }

    // A space inside a tag is no place to break; and what comes after the tag's name must stay with it.
    private static int LastBreak(string text, int width)
    {
        int last = -1;
        bool isInTag = false;
        for (int i = 0; i < text.Length && (i <= width || last < 0); i++)
        {
            isInTag = text[i] == '<' || (isInTag && text[i] != '>');
            if (text[i] == ' ' && !isInTag)
            {
                last = i;
            }
        }

        return last;
    }
}
