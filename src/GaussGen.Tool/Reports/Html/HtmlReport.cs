using System.Collections.Generic;
using System.IO;
using System.Linq;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>
/// The report for people: one file that needs no script and nothing from elsewhere, for a screen in light or dark mode, for paper,
/// the keyboard and a screen reader. It holds no time and no name of a machine, so that the same outcome is the same file.
/// </summary>
internal sealed class HtmlReport : IReportWriter
{
    private const string Nothing = "default-src 'none'; style-src 'unsafe-inline'";

    /// <inheritdoc/>
    public void Write(VerificationResult result, Stream stream)
    {
        using MarkupWriter markup = new(stream);
        List<ReportedFile> files = ReportedFile.Of(result);
        markup.Begin("html", ("lang", "en"));
        WriteHead(markup, result);
        markup.Begin("body");
        markup.Line("a", "Skip to the outcome", ("class", "skip"), ("href", "#outcome"));
        WriteHeader(markup, result, files);
        markup.Begin("main");
        WriteOutcome(markup, result);
        FailureSection.Write(markup, result, files);
        TableSection.Write(markup, files);
        DetailSection.Write(markup, files);
        WriteMethod(markup, result);
        WriteVersions(markup, result);
        markup.End();
        markup.End();
        markup.End();
    }

    private static void WriteHead(MarkupWriter markup, VerificationResult result)
    {
        markup.Begin("head");
        markup.Void("meta", ("charset", "utf-8"));
        markup.Void("meta", ("name", "viewport"), ("content", "width=device-width, initial-scale=1"));
        markup.Void("meta", ("http-equiv", "Content-Security-Policy"), ("content", Nothing));
        markup.Line("title", $"{OutcomeText.Headline(result)} · {ToolIdentity.Name} verify");
        markup.Style(Sheet());
        markup.End();
    }

    private static void WriteHeader(MarkupWriter markup, VerificationResult result, List<ReportedFile> files)
    {
        markup.Begin("header");
        markup.Line("h1", "Verification of generated tables");
        markup.Line("p", $"{ToolIdentity.Name} {ToolIdentity.Version}", ("class", "quiet"));
        markup.Begin("nav", ("aria-label", "Contents"));
        markup.Begin("ul");
        List<(string Target, string Text)> contents = [("outcome", "Outcome")];
        contents.AddRange(FailureSection.IsNeeded(result) ? [("failures", "What is not proven")] : []);
        contents.AddRange(files.Count > 0 ? [("tables", "Tables"), ("details", "Plots"), ("method", "Method")] : []);
        contents.Add(("versions", "Versions and digests"));
        foreach ((string target, string text) in contents)
        {
            markup.Begin("li");
            markup.Line("a", text, ("href", "#" + target));
            markup.End();
        }

        markup.End();
        markup.End();
        markup.End();
    }

    private static void WriteOutcome(MarkupWriter markup, VerificationResult result)
    {
        bool isGood = result.ExitCode == ExitCode.AllProven;
        markup.Begin("section", ("id", "outcome"), ("class", isGood ? "outcome fine" : "outcome"), ("aria-labelledby", "outcome-title"), ("tabindex", "-1"));
        markup.Line("h2", OutcomeText.Headline(result), ("id", "outcome-title"), ("class", isGood ? "good" : "bad"));
        markup.Begin("dl");
        foreach ((string name, string text) in OutcomeText.Counts(result))
        {
            markup.Line("dt", name);
            markup.Line("dd", text);
        }

        markup.End();
        markup.End();
    }

    private static void WriteMethod(MarkupWriter markup, VerificationResult result)
    {
        if (!result.Tables.Any())
        {
            return;
        }

        markup.Begin("section", ("id", "method"), ("aria-labelledby", "method-title"));
        markup.Line("h2", "Method", ("id", "method-title"));
        markup.Line("p", "Tables and the attributes that declare them were read from the metadata, the intermediate language and the mapped data "
            + "of each assembly. No code of an assembly was run. The proofs share no construction with the generator, only integers, exact "
            + "fractions and enclosures; an entry counts as proven if it is the representable number nearest to the true value.");
        foreach (string method in result.Tables.Select(table => table.Claim?.Method).OfType<string>().Distinct())
        {
            markup.Line("p", method);
        }

        markup.Line("p", "An ulp is a unit in the last place of the right entry; distances are upper bounds. A nearest value is at most "
            + "½ ulp from the true one.");
        markup.Line("p", "What this does not show: that a rule of this size, or a normal distribution, describes the quantity it is used for. "
            + "Right constants say nothing about the model.");
        markup.End();
    }

    private static void WriteVersions(MarkupWriter markup, VerificationResult result)
    {
        markup.Begin("section", ("id", "versions"), ("aria-labelledby", "versions-title"));
        markup.Line("h2", "Versions and digests", ("id", "versions-title"));
        markup.Line("p", $"Written by {ToolIdentity.Name} {ToolIdentity.Version}. Digests here are SHA-256 over the whole file; "
            + "the digest of each table's data, the one that a baseline pins, is beside its plots.");
        markup.Begin("div", ("class", "scroll"), ("tabindex", "0"), ("role", "region"), ("aria-label", "Files that were read"));
        markup.Begin("table");
        Rows.Head(markup, "Assembly", "Version", "File", "SHA-256");
        markup.Begin("tbody");
        foreach (FileResult file in result.Files)
        {
            if (file.Assembly is { } assembly)
            {
                WriteVersion(markup, file, assembly);
            }
        }

        markup.End();
        markup.End();
        markup.End();
        markup.End();
    }

    private static void WriteVersion(MarkupWriter markup, FileResult file, FoundAssembly assembly)
    {
        markup.Begin("tr");
        markup.Line("th", assembly.Name, ("scope", "row"));
        markup.Line("td", assembly.Version.ToString());
        markup.Line("td", file.Path, ("class", "text"));
        markup.Begin("td", ("class", "text"));
        markup.Line("code", assembly.Digest);
        markup.End();
        markup.End();
    }

    private static string Sheet()
    {
        using StreamReader reader = new(typeof(HtmlReport).Assembly.GetManifestResourceStream("report.css")!);
        return reader.ReadToEnd();
    }
}
