using System;
using System.IO;
using System.Linq;
using System.Text.Json;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports;

/// <summary>The static analysis results interchange format (OASIS SARIF 2.1.0), which code hosts and editors show.</summary>
internal sealed class SarifReport : IReportWriter
{
    private const string Schema = "https://docs.oasis-open.org/sarif/sarif/v2.1.0/os/schemas/sarif-schema-2.1.0.json";

    private static readonly FindingKind[] Rules = Enum.GetValues<FindingKind>();

    /// <inheritdoc/>
    public void Write(VerificationResult result, Stream stream)
    {
        using Utf8JsonWriter json = JsonOutput.Open(stream);
        json.WriteStartObject();
        json.WriteString("$schema", Schema);
        json.WriteString("version", "2.1.0");
        json.WriteStartArray("runs");
        json.WriteStartObject();
        WriteTool(json);
        WriteInvocation(json, result);
        json.WriteString("columnKind", "utf16CodeUnits");
        json.WriteStartArray("results");
        foreach (FileResult file in result.Files)
        {
            WriteResults(json, file);
        }

        json.WriteEndArray();
        json.WriteEndObject();
        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteTool(Utf8JsonWriter json)
    {
        json.WriteStartObject("tool");
        json.WriteStartObject("driver");
        json.WriteString("name", ToolIdentity.Name);
        json.WriteString("semanticVersion", ToolIdentity.Version);
        json.WriteStartArray("rules");
        foreach (FindingKind kind in Rules)
        {
            json.WriteStartObject();
            json.WriteString("id", kind.Code());
            json.WriteString("name", kind.ToString());
            json.WriteStartObject("shortDescription");
            json.WriteString("text", kind.Meaning());
            json.WriteEndObject();
            json.WriteStartObject("defaultConfiguration");
            json.WriteString("level", "error");
            json.WriteEndObject();
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
        json.WriteEndObject();
    }

    /// <summary>An invocation is successful if the tool could do its work, whatever it found.</summary>
    private static void WriteInvocation(Utf8JsonWriter json, VerificationResult result)
    {
        json.WriteStartArray("invocations");
        json.WriteStartObject();
        json.WriteBoolean("executionSuccessful", !result.Unreadable.Any() && !result.IsEmpty && !result.NamedWithoutTable.Any());
        json.WriteNumber("exitCode", result.ExitCode);
        json.WriteEndObject();
        json.WriteEndArray();
    }

    private static void WriteResults(Utf8JsonWriter json, FileResult file)
    {
        if (file.IsUnreadable)
        {
            WriteResult(json, file, FindingKind.NotRead, "The file " + file.Error!.Message + ".", () => { });
        }

        foreach (TableResult table in file.Tables)
        {
            foreach (Finding finding in table.Findings)
            {
                string name = table.Type.Name + (finding.Member is null ? "" : "." + finding.Member);
                WriteResult(json, file, finding.Kind, $"{table.Type.Name}, {table.What}: {finding.Message}.", () => WriteLogicalLocation(json, name));
            }
        }
    }

    private static void WriteResult(Utf8JsonWriter json, FileResult file, FindingKind kind, string message, Action writeLogicalLocation)
    {
        json.WriteStartObject();
        json.WriteString("ruleId", kind.Code());
        json.WriteNumber("ruleIndex", Array.IndexOf(Rules, kind));
        json.WriteString("level", "error");
        json.WriteStartObject("message");
        json.WriteString("text", PlainText.OneLine(message));
        json.WriteEndObject();
        json.WriteStartArray("locations");
        json.WriteStartObject();
        json.WriteStartObject("physicalLocation");
        json.WriteStartObject("artifactLocation");
        json.WriteString("uri", UriReference(file.Path));
        json.WriteEndObject();
        json.WriteEndObject();
        writeLogicalLocation();
        json.WriteEndObject();
        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteLogicalLocation(Utf8JsonWriter json, string name)
    {
        json.WriteStartArray("logicalLocations");
        json.WriteStartObject();
        json.WriteString("fullyQualifiedName", PlainText.OneLine(name));
        json.WriteString("kind", "member");
        json.WriteEndObject();
        json.WriteEndArray();
    }

    /// <summary>A path as a URI (RFC 3986): an absolute one with its scheme, a relative one as a relative reference.</summary>
    private static string UriReference(string path)
    {
        string slashed = path.Replace(Path.DirectorySeparatorChar, '/');
        string escaped = string.Join('/', slashed.Split('/').Select(Uri.EscapeDataString));
        return !Path.IsPathRooted(path) ? escaped : "file://" + (escaped.StartsWith('/') ? "" : "/") + escaped;
    }
}
