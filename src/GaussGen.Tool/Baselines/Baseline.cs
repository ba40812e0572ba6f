using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.IO;
using System.Linq;
using System.Text;
using GaussGen.Mathematics.Baselines;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Baselines;

/// <summary>The tables that were reviewed, one a line in ordinal order, so that a code review shows what changes about them.</summary>
internal sealed class Baseline
{
    /// <summary>The file that is meant where none is named.</summary>
    public const string DefaultFile = "gaussgen.baseline";

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
        List<string> lines = [];
        string? undecodable = null;
        foreach (Range range in Split(content))
        {
            if (!TryDecode(content[range], out string? line))
            {
                undecodable = "is not UTF-8 text; save the file as UTF-8, or delete it and write it again";
                break;
            }

            lines.Add(line);
        }

        // What is wrong before the bytes that are no text is told first.
        BaselineText text = BaselineText.Parse(lines);
        BaselineFlaw? flaw = text.Flaw ?? (undecodable is null ? null : new BaselineFlaw(lines.Count + 1, undecodable));
        return flaw is null
            ? new Baseline(text.Entries)
            : throw new InputException($"{path}({flaw.Line}): the line {flaw.What}");
    }

    /// <summary>Writes the file: UTF-8, one line feed after each line.</summary>
    public void Write(Stream stream)
    {
        using StreamWriter writer = new(stream, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false)) { NewLine = "\n" };
        writer.WriteLine(BaselineText.Header);
        foreach (BaselineEntry entry in Entries)
        {
            writer.WriteLine(entry.Line);
        }
    }

    private static bool TryDecode(ReadOnlySpan<byte> bytes, [NotNullWhen(true)] out string? line)
    {
        try
        {
            line = new UTF8Encoding(false, throwOnInvalidBytes: true).GetString(bytes);
            return true;
        }
        catch (DecoderFallbackException)
        {
            line = null;
            return false;
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
}
