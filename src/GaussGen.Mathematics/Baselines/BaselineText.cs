using System;
using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Mathematics.Baselines;

/// <summary>Why a text is no baseline.</summary>
/// <param name="Line">The number of the line, from 1.</param>
/// <param name="What">What is wrong and what to do, to be read after "the line".</param>
public sealed record BaselineFlaw(int Line, string What);

/// <summary>What the lines of a baseline say.</summary>
/// <remarks>
/// The first line says what the file is and carries the number of its format, which grows when a line changes its meaning: also
/// when a digest covers something else, or a claim is worded anew.
/// </remarks>
public sealed class BaselineText
{
    /// <summary>The first line.</summary>
    public const string Header = Title + FormatNumber
        + ": one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>";

    private const string Title = "# gaussgen baseline ";
    private const string FormatNumber = "1";

    private readonly Dictionary<(string, string, string), BaselineEntry> _entries;

    private BaselineText(Dictionary<(string, string, string), BaselineEntry> entries, BaselineFlaw? flaw)
    {
        _entries = entries;
        Flaw = flaw;
    }

    /// <summary>The tables, of which no two have the same identity; those before the flaw, if there is one.</summary>
    public IEnumerable<BaselineEntry> Entries => _entries.Values;

    /// <summary>The first thing that is wrong; <c>null</c> if nothing is.</summary>
    public BaselineFlaw? Flaw { get; }

    /// <summary>Reads lines up to the first that is wrong.</summary>
    /// <param name="lines">
    /// The text between the line feeds, at least one; a byte order mark before the first and a carriage return after each, which
    /// editors and checkouts put there, are no part of it.
    /// </param>
    public static BaselineText Parse(IEnumerable<string> lines)
    {
        Dictionary<(string, string, string), BaselineEntry> entries = new();
        Dictionary<(string, string, string), int> numbers = new();
        int number = 0;
        foreach (string each in lines)
        {
            number++;
            string line = (number == 1 ? each.TrimStart('\uFEFF') : each).TrimEnd('\r');
            if (number == 1)
            {
                if (line != Header)
                {
                    return Flawed(FlawOfHeader(line));
                }
            }
            else if (line.Length > 0)
            {
                if (!BaselineEntry.TryParse(line, out BaselineEntry? entry))
                {
                    return Flawed($"is not as a line of a baseline is ({BaselineEntry.Columns}); mend it, or delete the file and write it again");
                }

                if (numbers.TryGetValue(entry.Identity, out int first))
                {
                    return Flawed($"names {entry.Type} again, after line {first}; keep the line that was reviewed");
                }

                numbers.Add(entry.Identity, number);
                entries.Add(entry.Identity, entry);
            }
        }

        return new BaselineText(entries, null);

        BaselineText Flawed(string what) => new(entries, new BaselineFlaw(number, what));
    }

    /// <summary>The entry of the same table, whatever it promises or holds; <c>null</c> if there is none.</summary>
    public BaselineEntry? Find(BaselineEntry table) => _entries.TryGetValue(table.Identity, out BaselineEntry? entry) ? entry : null;

    private static string FlawOfHeader(string line)
    {
        string rest = line.StartsWith(Title, StringComparison.Ordinal) ? line.Substring(Title.Length) : string.Empty;
        string number = rest.Split(':')[0];
        return number.Length == 0 || !number.All(digit => digit is >= '0' and <= '9')
            ? "does not begin a baseline; name another file, or delete this one and write it again"
            : number == FormatNumber
                ? "is not the first line of a baseline any more; restore it, or delete the file and write it again"
                : $"says format {number} and this version knows {FormatNumber}; use the version that wrote it, or delete the file and write it again";
    }
}
