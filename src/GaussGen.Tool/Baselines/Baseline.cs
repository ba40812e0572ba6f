using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Baselines;

/// <summary>The tables that were reviewed, one a line in ordinal order, so that a code review shows what changes about them.</summary>
/// <remarks>
/// The first line says what the file is and carries the number of its format, which grows when a line changes its meaning: also
/// when a digest covers something else, or a claim is worded anew.
/// </remarks>
internal sealed class Baseline
{
    /// <summary>The file that is meant where none is named.</summary>
    public const string DefaultFile = "gaussgen.baseline";

    private const string Title = "# gaussgen baseline ";
    private const string FormatNumber = "1";
    private const string Header = Title + FormatNumber
        + ": one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>";

    private const string Columns = "assembly | type | attribute | claim | format | sha256:digest";

    /// <summary>A baseline of these entries, of which no two have the same identity.</summary>
    public Baseline(IEnumerable<BaselineEntry> entries) =>
        Entries = [.. entries.OrderBy(entry => entry.Line, StringComparer.Ordinal)];

    /// <summary>The tables in the order of their lines.</summary>
    public IReadOnlyList<BaselineEntry> Entries { get; }

    /// <summary>Reads the content of a file.</summary>
    /// <param name="content">All bytes.</param>
    /// <param name="path">The path, for messages.</param>
    /// <exception cref="InputException">It is no baseline; the message names the line.</exception>
    public static Baseline Parse(ReadOnlySpan<byte> content, string path)
    {
        Dictionary<(string, string, string), int> lines = [];
        List<BaselineEntry> entries = [];
        int number = 0;
        foreach (Range range in Split(content))
        {
            number++;
            string line = Decode(content[range], path, number);
            if (number == 1)
            {
                RequireHeader(line, path);
            }
            else if (line.Length > 0)
            {
                BaselineEntry entry = BaselineEntry.TryParse(line, out BaselineEntry? parsed)
                    ? parsed
                    : throw Malformed(path, number, $"is not as a line of a baseline is ({Columns}); mend it, or delete the file and write it again");
                if (!lines.TryAdd(entry.Identity, number))
                {
                    throw Malformed(path, number, $"names {entry.Type} again, after line {lines[entry.Identity]}; keep the line that was reviewed");
                }

                entries.Add(entry);
            }
        }

        return new Baseline(entries);
    }

    /// <summary>Writes the file: UTF-8, one line feed after each line.</summary>
    public void Write(Stream stream)
    {
        using StreamWriter writer = new(stream, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false)) { NewLine = "\n" };
        writer.WriteLine(Header);
        foreach (BaselineEntry entry in Entries)
        {
            writer.WriteLine(entry.Line);
        }
    }

    private static void RequireHeader(string line, string path)
    {
        if (line == Header)
        {
            return;
        }

        string rest = line.StartsWith(Title, StringComparison.Ordinal) ? line[Title.Length..] : "";
        string number = rest.Split(':')[0];
        throw number.Length == 0 || !number.All(char.IsAsciiDigit)
            ? Malformed(path, 1, "does not begin a baseline; name another file with --file, or delete this one and write it again")
            : number == FormatNumber
                ? Malformed(path, 1, "is not the first line of a baseline any more; restore it, or delete the file and write it again")
                : Malformed(path, 1, $"says format {number} and this version of the tool knows {FormatNumber}; use the version that wrote it, or delete the file and write it again");
    }

    /// <summary>A line without the carriage return that some checkouts put at its end.</summary>
    private static string Decode(ReadOnlySpan<byte> bytes, string path, int number)
    {
        try
        {
            string line = new UTF8Encoding(false, throwOnInvalidBytes: true).GetString(bytes);
            return (number == 1 ? line.TrimStart('\uFEFF') : line).TrimEnd('\r');
        }
        catch (DecoderFallbackException)
        {
            throw Malformed(path, number, "is not UTF-8 text; save the file as UTF-8, or delete it and write it again");
        }
    }

    private static List<Range> Split(ReadOnlySpan<byte> content)
    {
        List<Range> lines = [];
        int start = 0;
        for (int i = 0; i < content.Length; i++)
        {
            if (content[i] == '\n')
            {
                lines.Add(start..i);
                start = i + 1;
            }
        }

        if (start < content.Length || lines.Count == 0)
        {
            lines.Add(start..content.Length);
        }

        return lines;
    }

    private static InputException Malformed(string path, int line, string what) => new($"{path}({line}): the line {what}");
}
