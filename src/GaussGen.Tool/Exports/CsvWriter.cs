using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Exports;

/// <summary>
/// Comma-separated values (RFC 4180, with the line feed alone between records): one record an entry, with the shortest decimal that
/// reads back as the number, and all its bits.
/// </summary>
internal sealed class CsvWriter : ITableWriter
{
    private static readonly char[] Special = ['"', ',', '\r', '\n'];

    /// <inheritdoc/>
    public void Write(IReadOnlyList<ExportedTable> tables, Stream stream)
    {
        using StreamWriter writer = new(stream, new UTF8Encoding(false), leaveOpen: true) { NewLine = "\n" };
        writer.WriteLine("table,member,index,format,value,bits,verdict");
        foreach (ExportedTable table in tables)
        {
            foreach (ExportedMember member in table.Members)
            {
                foreach (EntryProof entry in member.Entries)
                {
                    writer.WriteLine(string.Join(',', Fields(table, member, entry)));
                }
            }
        }
    }

    private static IEnumerable<string> Fields(ExportedTable table, ExportedMember member, EntryProof entry)
    {
        yield return Quote(PlainText.OneLine(table.Name));
        yield return member.Name;
        yield return entry.Index?.ToString(CultureInfo.InvariantCulture) ?? "";
        yield return member.Format?.Name ?? "int32";
        yield return member.Format is null ? ((int)entry.Found).ToString(CultureInfo.InvariantCulture) : EncodingText.Number(entry.Found, member.Format);
        yield return "0x" + (member.Format is null ? entry.Found.ToString("X8", CultureInfo.InvariantCulture) : EncodingText.Bits(entry.Found, member.Format));
        yield return VerdictText.Of(entry.Verdict);
    }

    private static string Quote(string text) =>
        text.IndexOfAny(Special) < 0 ? text : $"\"{text.Replace("\"", "\"\"", System.StringComparison.Ordinal)}\"";
}
