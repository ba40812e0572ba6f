using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Verification;
using Spectre.Console;

namespace GaussGen.Tool.Explanations;

/// <summary>Lists of one length side by side: two lines an index, the shortest decimals and below them the exact numbers.</summary>
/// <remarks>
/// Of a symmetric rule one half says all. A page has room for <see cref="ShownRows"/> indices; of more, those at both ends are shown.
/// </remarks>
internal sealed class EntryTable
{
    private const int ShownRows = 6;
    private const int IndexWidth = 4;
    private const int ColumnWidth = 25;
    private const string Companion = "Companion";

    private readonly (string Name, EntryProof[] Entries)[] _columns;
    private readonly BinaryFormat _format;
    private readonly bool _isHalf;
    private readonly bool _showsAll;

    private EntryTable((string Name, EntryProof[] Entries)[] columns, BinaryFormat format, bool showsAll)
    {
        _format = format;
        _showsAll = showsAll;
        _columns = columns;
        _isHalf = !showsAll && Count > 1 && columns is [("Nodes" or "CompanionNodes", var nodes), (_, var weights)] && IsSymmetric(nodes, weights);
    }

    /// <summary>The tables of a proof's lists: those of a companion have one of their own.</summary>
    public static IEnumerable<EntryTable> Of(TableProof proof, bool showsAll)
    {
        List<(string Name, EntryProof[] Entries)> columns =
        [
            .. proof.Entries.Where(entry => entry.Index is not null).GroupBy(entry => entry.Member).Select(group => (group.Key, group.ToArray())),
        ];
        return columns
            .GroupBy(column => column.Name.StartsWith(Companion, StringComparison.Ordinal))
            .Select(block => new EntryTable([.. block], proof.Claim.Format, showsAll));
    }

    private int Count => _columns.Length == 0 ? 0 : _columns.Max(column => column.Entries.Length);

    /// <summary>The lines.</summary>
    public IEnumerable<PageLine> Lines()
    {
        if (Count == 0)
        {
            yield break;
        }

        yield return new PageLine(
            ("   i".PadRight(IndexWidth + 1) + string.Concat(_columns.Select(column => column.Name.PadRight(ColumnWidth)))).TrimEnd(),
            new Style(decoration: Decoration.Bold));
        int first = _isHalf ? Count / 2 : 0;
        int rows = Count - first;
        bool isCut = !_showsAll && rows > ShownRows;
        for (int row = 0; row < rows; row++)
        {
            if (isCut && row == ShownRows / 2)
            {
                row = rows - (ShownRows / 2);
                yield return new PageLine($"     … {rows - ShownRows} more; --all shows them");
            }

            foreach (PageLine line in Row(first + row))
            {
                yield return line;
            }
        }

        if (_isHalf)
        {
            yield return new PageLine("     The nodes below 0 are the opposites of these, with the same weights.");
        }
    }

    private IEnumerable<PageLine> Row(int index)
    {
        EntryProof?[] entries = [.. _columns.Select(column => index < column.Entries.Length ? column.Entries[index] : null)];
        Style? style = entries.Any(entry => entry is not null && entry.Verdict != Verdict.Proven) ? new Style(Color.Red) : default(Style?);
        string label = index.ToString(CultureInfo.InvariantCulture).PadLeft(IndexWidth);
        yield return new PageLine((label + " " + Cells(entries, Decimal)).TrimEnd(), style);
        yield return new PageLine((new string(' ', IndexWidth + 1) + Cells(entries, Exact)).TrimEnd(), style);
    }

    private static string Cells(EntryProof?[] entries, Func<EntryProof, string> write) =>
        string.Concat(entries.Select(entry => (entry is null ? "" : write(entry)).PadRight(ColumnWidth)));

    private string Decimal(EntryProof entry) => EncodingText.Number(entry.Found, _format);

    private string Exact(EntryProof entry) => ExactText.Of(entry, _format);

    private bool IsSymmetric(EntryProof[] nodes, EntryProof[] weights) =>
        nodes.Length == weights.Length
        && nodes.Zip(Enumerable.Reverse(nodes)).All(pair => pair.First.Found == _format.Negate(pair.Second.Found))
        && weights.Zip(Enumerable.Reverse(weights)).All(pair => pair.First.Found == pair.Second.Found);
}
