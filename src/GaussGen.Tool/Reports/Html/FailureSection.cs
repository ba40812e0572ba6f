using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>Everything that is wrong, not proven or not read, with expected and found bits.</summary>
internal static class FailureSection
{
    // More than these are folded away; their number stays.
    private const int OpenCount = 12;

    /// <summary>Whether there is anything to say.</summary>
    public static bool IsNeeded(VerificationResult result) => result.ExitCode != ExitCode.AllProven;

    /// <summary>Writes the section, if there is anything to say.</summary>
    public static void Write(MarkupWriter markup, VerificationResult result, List<ReportedFile> files)
    {
        if (!IsNeeded(result))
        {
            return;
        }

        markup.Begin("section", ("id", "failures"), ("aria-labelledby", "failures-title"));
        markup.Line("h2", "What is not proven", ("id", "failures-title"));
        WriteFiles(markup, result);
        foreach (ReportedFile file in files)
        {
            foreach (ReportedTable table in file.Tables.Where(table => table.Table.Findings.Count > 0))
            {
                WriteTable(markup, file, table);
            }
        }

        markup.End();
    }

    private static void WriteFiles(MarkupWriter markup, VerificationResult result)
    {
        List<string> lines =
        [
            .. result.Unreadable.Select(file => $"{file.Path}: {FindingKind.NotRead.Code()}: {file.Error!.Message}."),
            .. result.NamedWithoutTable.Select(file => $"{file.Path} was named and holds no table."),
        ];
        if (result.IsEmpty)
        {
            lines.Add("No table was found anywhere.");
        }

        if (lines.Count > 0)
        {
            markup.Begin("ul");
            lines.ForEach(line => markup.Line("li", line));
            markup.End();
        }
    }

    private static void WriteTable(MarkupWriter markup, ReportedFile file, ReportedTable table)
    {
        IReadOnlyList<Finding> findings = table.Table.Findings;
        markup.Begin("details", findings.Count <= OpenCount ? [("open", "open")] : []);
        markup.Line("summary", $"{table.Table.Type.Name}: {Counted.Of(findings.Count, "finding", "findings")}");
        markup.Begin("div", ("class", "inside"));
        markup.Begin("p");
        markup.Text($"{table.Table.What} in {file.Name}. ");
        markup.Line("a", "To its plots", ("href", "#" + table.Id));
        markup.End();
        markup.Begin("div", ("class", "scroll"), ("tabindex", "0"), ("role", "region"), ("aria-label", "Findings on " + table.Table.Type.Name));
        markup.Begin("table");
        Rows.Head(markup, "Member", "Code", "Expected", "Found", "Remark");
        markup.Begin("tbody");
        foreach (Finding finding in findings)
        {
            WriteFinding(markup, finding);
        }

        markup.End();
        markup.End();
        markup.End();
        markup.End();
        markup.End();
    }

    private static void WriteFinding(MarkupWriter markup, Finding finding)
    {
        markup.Begin("tr");
        markup.Line("th", finding.Member ?? "whole table", ("scope", "row"));
        markup.Line("td", finding.Kind.Code());
        foreach (string? value in new[] { finding.Expected, finding.Found })
        {
            markup.Begin("td", ("class", "text"));
            markup.Line("code", value ?? "");
            markup.End();
        }

        markup.Line("td", Remark(finding), ("class", "text"));
        markup.End();
    }

    /// <summary>What the message says beyond the values, which have columns of their own.</summary>
    private static string Remark(Finding finding)
    {
        string found = "found " + finding.Found;
        int place = finding.Found is null ? -1 : finding.Message.LastIndexOf(found, StringComparison.Ordinal);
        string rest = place < 0 ? finding.Message : finding.Message[(place + found.Length)..].TrimStart(',', ';', ':', ' ');
        return rest.Length == 0 ? finding.Kind.Meaning() : rest;
    }
}
