using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>What there is to see of each table; folded, so that two hundred of them are still a page to read.</summary>
internal static class DetailSection
{
    /// <summary>Writes the section, if there is any table. A single table is not folded.</summary>
    public static void Write(MarkupWriter markup, List<ReportedFile> files)
    {
        if (files.Count == 0)
        {
            return;
        }

        bool isOnlyOne = files.Sum(file => file.Tables.Count) == 1;
        markup.Begin("section", ("id", "details"), ("aria-labelledby", "details-title"));
        markup.Line("h2", "Plots", ("id", "details-title"));
        foreach (ReportedFile file in files)
        {
            markup.Line("h3", file.Name);
            foreach (ReportedTable table in file.Tables)
            {
                markup.Begin("details", isOnlyOne ? [("open", "open")] : []);
                markup.Line("summary", $"{table.Table.Type.Name}: {table.Table.What}, {table.Table.Format}");

                // A link to something inside opens what is folded around it; a link to the fold itself would not.
                markup.Begin("div", ("class", "inside"), ("id", table.Id), ("tabindex", "-1"));
                WriteFacts(markup, table.Table);
                WritePlots(markup, table);
                markup.End();
                markup.End();
            }
        }

        markup.End();
    }

    private static void WriteFacts(MarkupWriter markup, TableResult table)
    {
        markup.Begin("dl");
        foreach ((string name, string text) in Facts(table))
        {
            markup.Line("dt", name);
            markup.Line("dd", text);
        }

        markup.End();
    }

    private static IEnumerable<(string Name, string Text)> Facts(TableResult table)
    {
        yield return ("Verdict", $"{OutcomeText.Of(table.Verdict)}, {table.Proven} of {Counted.Of(table.Entries, "entry", "entries")}");
        yield return ("Declared by", $"[{table.Attribute}]");
        if (table.Digest is { } digest)
        {
            yield return ("Digest", digest);
        }

        if (table.Proof is not { } proof)
        {
            yield break;
        }

        foreach (EntryProof integer in proof.Entries.Where(entry => entry.IsInteger))
        {
            yield return (integer.Name, ((int)integer.Found).ToString(CultureInfo.InvariantCulture));
        }

        foreach (EntryProof constant in proof.Entries.Where(entry => entry is { IsInteger: false, Index: null } && ClaimTable.Find(table.Attribute)!.Constants.Contains(entry.Member)))
        {
            yield return (constant.Name, EncodingText.Of(constant.Found, proof.Claim.Format));
        }

        if (proof.MomentEquations.Count > 0)
        {
            yield return ("Moment equations", Equations(proof.MomentEquations));
        }
    }

    private static string Equations(IReadOnlyList<MomentEquation> equations)
    {
        MomentEquation tightest = equations.MaxBy(equation => equation.Allowance > 0 ? equation.Residual / equation.Allowance : 0)!;
        string which = equations.Count == 1
            ? $"the equation of degree {equations[0].Degree} {(equations[0].Holds ? "holds" : "does not hold")}"
            : $"those of degrees {string.Join(", ", equations.Select(equation => equation.Degree).Distinct())} {(equations.All(equation => equation.Holds) ? "hold" : "do not all hold")}";
        return $"{which} for the entries; the relative residual of degree {tightest.Degree}, the one nearest to its limit, is at most "
            + $"{PlotNumbers.Label(tightest.Residual)}, and {PlotNumbers.Label(tightest.Allowance)} is allowed";
    }

    private static void WritePlots(MarkupWriter markup, ReportedTable table)
    {
        StemPlot? stems = StemPlot.Of(table.Table.Proof);
        ErrorPlot? errors = ErrorPlot.Of(table.Table.Proof);
        if (stems is null && errors is null)
        {
            markup.Line("p", "There is nothing to draw: no proof could be tried.");
            return;
        }

        markup.Begin("div", ("class", "plots"));
        if (stems is not null)
        {
            Begin(markup, "Nodes and weights of " + table.Table.Type.Name);
            stems.Write(markup, table.Id + "-stems");
            End(markup, "Nodes and weights, as found"
                + (stems.OnAxis == 0 ? "" : $"; {Counted.Of(stems.OnAxis, "zero weight is", "zero weights are")} marked on the axis")
                + (stems.Undrawn == 0 ? "" : $"; {Counted.Of(stems.Undrawn, "pair is", "pairs are")} not finite and not drawn"));
        }

        if (errors is not null)
        {
            Begin(markup, "Errors of " + table.Table.Type.Name);
            errors.Write(markup, table.Id + "-errors");
            End(markup, "Distance of each entry from its true value, in units in the last place");
        }

        markup.End();
    }

    private static void Begin(MarkupWriter markup, string label)
    {
        markup.Begin("figure");
        markup.Begin("div", ("class", "scroll"), ("tabindex", "0"), ("role", "region"), ("aria-label", label));
    }

    private static void End(MarkupWriter markup, string caption)
    {
        markup.End();
        markup.Line("figcaption", caption);
        markup.End();
    }
}
