using System.Collections.Generic;
using System.IO;
using System.Text.Json;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reports;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Exports;

/// <summary>Tables for programs: each entry as the shortest decimal that reads back as the number, exactly in hexadecimal, and as bits.</summary>
/// <remarks>
/// The member "formatVersion" grows when a member changes its meaning or goes away; new members may come at any time. The bits
/// decide; a value that is not finite is null. Entries have a verdict where they are not proven.
/// </remarks>
internal sealed class JsonWriter : ITableWriter
{
    private const int FormatVersion = 1;

    /// <inheritdoc/>
    public void Write(IReadOnlyList<ExportedTable> tables, Stream stream)
    {
        using Utf8JsonWriter json = JsonOutput.Open(stream);
        json.WriteStartObject();
        json.WriteNumber("formatVersion", FormatVersion);
        json.WriteStartObject("tool");
        json.WriteString("name", ToolIdentity.Name);
        json.WriteString("version", ToolIdentity.Version);
        json.WriteEndObject();
        json.WriteStartArray("tables");
        foreach (ExportedTable table in tables)
        {
            WriteTable(json, table);
        }

        json.WriteEndArray();
        json.WriteEndObject();
        json.Flush();
        stream.WriteByte((byte)'\n');
    }

    private static void WriteTable(Utf8JsonWriter json, ExportedTable table)
    {
        json.WriteStartObject();
        json.WriteString("name", PlainText.OneLine(table.Name));
        if (table.AssemblyName is not null)
        {
            json.WriteString("assembly", PlainText.OneLine(table.AssemblyName));
            json.WriteString("version", table.AssemblyVersion);
        }

        json.WriteString("claim", table.Claim.Title);
        json.WriteString("format", table.Claim.Format.Name);
        json.WriteString("verdict", VerdictText.Of(table.Proof.Verdict));
        json.WriteString("digest", table.Digest);
        json.WriteStartObject("members");
        foreach (ExportedMember member in table.Members)
        {
            json.WritePropertyName(member.Name);
            WriteMember(json, member);
        }

        json.WriteEndObject();
        json.WriteEndObject();
    }

    private static void WriteMember(Utf8JsonWriter json, ExportedMember member)
    {
        if (member.Format is null)
        {
            json.WriteNumberValue((int)member.Entries[0].Found);
            return;
        }

        if (!member.IsSpan)
        {
            WriteEntry(json, member.Entries[0], member.Format);
            return;
        }

        json.WriteStartArray();
        foreach (EntryProof entry in member.Entries)
        {
            WriteEntry(json, entry, member.Format);
        }

        json.WriteEndArray();
    }

    private static void WriteEntry(Utf8JsonWriter json, EntryProof entry, BinaryFormat format)
    {
        json.WriteStartObject();
        json.WritePropertyName("value");
        if (format.IsFinite(entry.Found))
        {
            json.WriteRawValue(ShortestDecimal.Write(entry.Found, format));
            json.WriteString("hexadecimal", HexadecimalFloat.Write(entry.Found, format));
        }
        else
        {
            json.WriteNullValue();
        }

        json.WriteString("bits", "0x" + EncodingText.Bits(entry.Found, format));
        if (entry.Verdict != Verdict.Proven)
        {
            json.WriteString("verdict", VerdictText.Of(entry.Verdict));
        }

        json.WriteEndObject();
    }
}
