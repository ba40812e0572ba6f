using System.Collections.Generic;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>The head of a table of the report.</summary>
internal static class Rows
{
    /// <summary>Writes one row of column names.</summary>
    public static void Head(MarkupWriter markup, params string[] names)
    {
        markup.Begin("thead");
        markup.Begin("tr");
        foreach (string name in names)
        {
            bool isNumber = name is "Entries" or "Proven" or "Worst ulp";
            markup.Line("th", name, isNumber ? [("scope", "col"), ("class", "number")] : [("scope", "col")]);
        }

        markup.End();
        markup.End();
    }
}

/// <summary>A row a table, assembly by assembly.</summary>
internal static class TableSection
{
    /// <summary>Writes the section, if there is any table.</summary>
    public static void Write(MarkupWriter markup, List<ReportedFile> files)
    {
        if (files.Count == 0)
        {
            return;
        }

        markup.Begin("section", ("id", "tables"), ("aria-labelledby", "tables-title"));
        markup.Line("h2", "Tables", ("id", "tables-title"));
        foreach (ReportedFile file in files)
        {
            markup.Line("h3", file.Name);
            markup.Begin("div", ("class", "scroll"), ("tabindex", "0"), ("role", "region"), ("aria-label", "Tables of " + file.Name));
            markup.Begin("table");
            markup.Line("caption", file.File.Path);
            Rows.Head(markup, "Type", "Verdict", "What", "Format", "Entries", "Proven", "Worst ulp");
            markup.Begin("tbody");
            foreach (ReportedTable table in file.Tables)
            {
                WriteRow(markup, table);
            }

            markup.End();
            markup.End();
            markup.End();
        }

        markup.End();
    }

    private static void WriteRow(MarkupWriter markup, ReportedTable row)
    {
        TableResult table = row.Table;
        markup.Begin("tr");
        markup.Begin("th", ("scope", "row"));
        markup.Line("a", table.Type.Name, ("href", "#" + row.Id));
        markup.End();
        markup.Line("td", OutcomeText.Of(table.Verdict), ("class", table.Verdict == Verdict.Proven ? "verdict good" : "verdict bad"));
        markup.Line("td", table.What, ("class", "text"));
        markup.Line("td", table.Format);
        markup.Line("td", $"{table.Entries}", ("class", "number"));
        markup.Line("td", $"{table.Proven}", ("class", "number"));
        markup.Line("td", table.WorstDistanceInUlp is { } distance ? UlpText.Of(distance) : "?", ("class", "number"));
        markup.End();
    }
}
