using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Xml;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports;

/// <summary>
/// The XML that test runners and build servers exchange: a suite an assembly, a case a table. A wrong table is a failure, one that
/// is not proven and a file that could not be read is an error.
/// </summary>
internal sealed class JUnitReport : IReportWriter
{
    /// <inheritdoc/>
    public void Write(VerificationResult result, Stream stream)
    {
        XmlWriterSettings settings = new() { Encoding = new UTF8Encoding(false), Indent = true, NewLineChars = "\n" };
        using XmlWriter xml = XmlWriter.Create(stream, settings);
        List<FileResult> files = [.. result.Files.Where(file => file.Tables.Count > 0 || file.IsUnreadable)];
        xml.WriteStartElement("testsuites");
        WriteAttribute(xml, "name", "gaussgen verify");
        WriteCounts(xml, files);
        foreach (FileResult file in files)
        {
            WriteSuite(xml, file);
        }

        xml.WriteEndElement();
    }

    private static void WriteSuite(XmlWriter xml, FileResult file)
    {
        xml.WriteStartElement("testsuite");
        WriteAttribute(xml, "name", file.Path);
        WriteCounts(xml, [file]);
        if (file.IsUnreadable)
        {
            xml.WriteStartElement("testcase");
            WriteAttribute(xml, "classname", file.Path);
            WriteAttribute(xml, "name", "read");
            WriteProblem(xml, "error", file.Error!.Message, FindingKind.NotRead.Code(), FindingLine.Of(file));
            xml.WriteEndElement();
        }

        foreach (TableResult table in file.Tables)
        {
            WriteCase(xml, file, table);
        }

        xml.WriteEndElement();
    }

    private static void WriteCase(XmlWriter xml, FileResult file, TableResult table)
    {
        xml.WriteStartElement("testcase");
        WriteAttribute(xml, "classname", table.Type.Name);
        WriteAttribute(xml, "name", $"{table.What}, {table.Format}");
        if (table.Findings.Count > 0)
        {
            WriteProblem(
                xml,
                table.Verdict == Verdict.Wrong ? "failure" : "error",
                $"{table.Proven} of {table.Entries} entries proven; {table.Findings[0].Message}",
                table.Findings[0].Kind.Code(),
                string.Join('\n', table.Findings.Select(finding => FindingLine.Of(file, table, finding))));
        }

        xml.WriteEndElement();
    }

    private static void WriteProblem(XmlWriter xml, string element, string message, string type, string text)
    {
        xml.WriteStartElement(element);
        WriteAttribute(xml, "message", message);
        WriteAttribute(xml, "type", type);
        xml.WriteString(text);
        xml.WriteEndElement();
    }

    private static void WriteCounts(XmlWriter xml, IReadOnlyList<FileResult> files)
    {
        List<TableResult> tables = [.. files.SelectMany(file => file.Tables)];
        int unreadable = files.Count(file => file.IsUnreadable);
        WriteAttribute(xml, "tests", Text(tables.Count + unreadable));
        WriteAttribute(xml, "failures", Text(tables.Count(table => table.Verdict == Verdict.Wrong)));
        WriteAttribute(xml, "errors", Text(tables.Count(table => table.Verdict == Verdict.Unproven) + unreadable));
        WriteAttribute(xml, "skipped", "0");
    }

    private static void WriteAttribute(XmlWriter xml, string name, string value) => xml.WriteAttributeString(name, PlainText.OneLine(value));

    private static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);
}
