using System.IO;
using System.Linq;
using System.Text.Json;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports;

/// <summary>The whole outcome for programs: every file that was looked at, every table, every finding.</summary>
/// <remarks>
/// The member "formatVersion" grows when a member changes its meaning or goes away; new members may come at any time.
/// Verdicts are "proven", "wrong" and "unproven".
/// </remarks>
internal sealed class JsonReport : IReportWriter
{
    private const int FormatVersion = 1;

    /// <inheritdoc/>
    public void Write(VerificationResult result, Stream stream)
    {
        using Utf8JsonWriter json = JsonOutput.Open(stream);
        json.WriteStartObject();
        json.WriteNumber("formatVersion", FormatVersion);
        json.WriteStartObject("tool");
        json.WriteString("name", ToolIdentity.Name);
        json.WriteString("version", ToolIdentity.Version);
        json.WriteEndObject();
        json.WriteNumber("exitCode", result.ExitCode);
        WriteSummary(json, result);
        json.WriteStartArray("files");
        foreach (FileResult file in result.Files)
        {
            WriteFile(json, file);
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteSummary(Utf8JsonWriter json, VerificationResult result)
    {
        json.WriteStartObject("summary");
        json.WriteNumber("tables", result.Tables.Count());
        json.WriteNumber("tablesProven", result.Tables.Count(table => table.Verdict == Verdict.Proven));
        json.WriteNumber("tablesWrong", result.Tables.Count(table => table.Verdict == Verdict.Wrong));
        json.WriteNumber("tablesUnproven", result.Tables.Count(table => table.Verdict == Verdict.Unproven));
        json.WriteNumber("entries", result.Tables.Sum(table => table.Entries));
        json.WriteNumber("entriesProven", result.Tables.Sum(table => table.Proven));
        json.WriteNumber("filesUnreadable", result.Unreadable.Count());
        json.WriteNumber("filesPassedBy", result.Files.Count(file => file.IsSkipped));
        json.WriteEndObject();
    }

    private static void WriteFile(Utf8JsonWriter json, FileResult file)
    {
        json.WriteStartObject();
        json.WriteString("path", PlainText.OneLine(file.Path));
        if (file.Error is not null)
        {
            json.WriteString(file.IsSkipped ? "passedBy" : "unreadable", PlainText.OneLine(file.Error.Message));
        }

        if (file.Assembly is not null)
        {
            json.WriteString("assembly", PlainText.OneLine(file.Assembly.Name));
            json.WriteString("version", file.Assembly.Version.ToString());
            json.WriteString("sha256", file.Assembly.Digest);
            json.WriteStartArray("tables");
            foreach (TableResult table in file.Tables)
            {
                WriteTable(json, table);
            }

            json.WriteEndArray();
        }

        json.WriteEndObject();
    }

    private static void WriteTable(Utf8JsonWriter json, TableResult table)
    {
        json.WriteStartObject();
        json.WriteString("type", PlainText.OneLine(table.Type.Name));
        json.WriteString("attribute", table.Attribute);
        json.WriteString("what", table.What);
        json.WriteString("format", table.Format);
        json.WriteNumber("entries", table.Entries);
        json.WriteNumber("proven", table.Proven);
        if (table.WorstDistanceInUlp is { } distance && double.IsFinite(distance))
        {
            json.WriteNumber("worstDistanceInUlp", distance);
        }

        json.WriteString("verdict", VerdictText.Of(table.Verdict));
        WriteIfKnown(json, "digest", table.Digest);
        json.WriteStartArray("findings");
        foreach (Finding finding in table.Findings)
        {
            json.WriteStartObject();
            json.WriteString("code", finding.Kind.Code());
            WriteIfKnown(json, "member", finding.Member);
            json.WriteString("message", PlainText.OneLine(finding.Message));
            WriteIfKnown(json, "expected", finding.Expected);
            WriteIfKnown(json, "found", finding.Found);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteIfKnown(Utf8JsonWriter json, string name, string? value)
    {
        if (value is not null)
        {
            json.WriteString(name, value);
        }
    }
}
