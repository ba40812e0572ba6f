using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Plots;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;
using Spectre.Console;

namespace GaussGen.Tool.Explanations;

/// <summary>A line of a page.</summary>
/// <param name="Text">The text.</param>
/// <param name="Style">How it looks; null for plain.</param>
internal sealed record PageLine(string Text, Style? Style = null);

/// <summary>What a reviewer wants to know of one table, on one page of 80 columns.</summary>
/// <param name="Result">The table and its proof.</param>
/// <param name="Assembly">The assembly that holds it.</param>
/// <param name="IsUnicode">Whether more than ASCII can be shown.</param>
/// <param name="ShowsAll">Whether every entry is shown, however many there are.</param>
internal sealed record ExplanationPage(TableResult Result, FoundAssembly Assembly, bool IsUnicode, bool ShowsAll)
{
    private const int Width = 80;
    private const int Indent = 13;
    private const int PlotHeight = 10;
    private const int ShownFindings = 5;

    private static readonly Style Heading = new(decoration: Decoration.Bold);
    private static readonly Style Good = new(Color.Green);
    private static readonly Style Bad = new(Color.Red);

    /// <summary>The lines of the page, from a table of which a proof was made.</summary>
    public IEnumerable<PageLine> Lines()
    {
        TableProof proof = Result.Proof!;
        Explanation explanation = Explanation.Of(proof.Claim);
        IEnumerable<PageLine> parts =
        [
            new($"{Result.Type.Name}, in {Assembly.Name} {Assembly.Version}", Heading),
            .. TextLayout.Wrap(proof.Claim.Title, Width).Select(line => new PageLine(line)),
            new(""),
            .. Labelled("Definition", explanation.Definition),
            .. Labelled("Exactness", explanation.Exactness),
            .. Labelled("Format", [FormatText(proof.Claim.Format)]),
            .. Labelled("SHA-256", [TableDigest.Digits(Result.Digest!)]),
            .. Verdicts(proof),
            .. Labelled("Proof", [proof.Claim.Method]),
            .. Labelled("Sources", [explanation.Sources + "."]),
            .. Labelled("Caution", [explanation.Caution]),
            new(""),
            .. new EntryTable(proof, ShowsAll).Lines(),
            .. Equations(proof),
            .. Plot(proof),
        ];
        return parts.Select(line => line with { Text = IsUnicode ? line.Text : AsciiText.Of(line.Text) });
    }

    private IEnumerable<PageLine> Labelled(string label, IReadOnlyList<string> paragraphs, Style? style = null)
    {
        string first = label;
        foreach (string paragraph in paragraphs)
        {
            // Broken where it will be printed: ASCII is wider.
            foreach (string line in TextLayout.Wrap(IsUnicode ? paragraph : AsciiText.Of(paragraph), Width - Indent))
            {
                yield return new PageLine(first.PadRight(Indent) + line, style);
                first = "";
            }
        }
    }

    private static string FormatText(BinaryFormat format) =>
        $"{format.Name} (IEEE 754): {format.Precision.ToString(CultureInfo.InvariantCulture)} significant bits of "
        + $"{format.StorageBits.ToString(CultureInfo.InvariantCulture)}; every number also as C99 writes it, exactly.";

    private IEnumerable<PageLine> Verdicts(TableProof proof)
    {
        string counts = $"{proof.ProvenCount} of {proof.Entries.Count} entries";
        if (Result.Verdict == Verdict.Proven)
        {
            string text = $"Proven: {counts} are what the declaration promises, each number the nearest one; none is further than "
                + $"{UlpText.Of(proof.WorstDistanceInUlp)} ulp from its true value.";
            return Labelled("Verdict", [text], Good);
        }

        string[] findings = [.. Result.Findings.Take(ShownFindings).Select(finding => PlainText.OneLine(finding.Message) + ".")];
        string rest = Result.Findings.Count > ShownFindings
            ? $"And {Result.Findings.Count - ShownFindings} more; gaussgen verify lists them all."
            : "";
        string verdict = Result.Verdict == Verdict.Wrong ? "WRONG" : "NOT PROVEN";
        return Labelled("Verdict", [$"{verdict}: {counts} are proven.", .. findings, .. rest.Length > 0 ? [rest] : System.Array.Empty<string>()], Bad);
    }

    private static IEnumerable<PageLine> Equations(TableProof proof)
    {
        if (proof.MomentEquations.Count == 0)
        {
            yield break;
        }

        yield return new PageLine("");
        yield return new PageLine("Moment equations Σ wᵢ xᵢᵏ = ∫ xᵏ w(x) dx; odd k hold by symmetry", Heading);
        yield return new PageLine("   k   relative residual at most   allowed by rounding");
        foreach (MomentEquation equation in proof.MomentEquations)
        {
            yield return new PageLine(
                $"{equation.Degree,4}   {Residual(equation.Residual),-25}   {Residual(equation.Allowance),-19}   {(equation.Holds ? "holds" : "DOES NOT HOLD")}",
                equation.Holds ? default(Style?) : Bad);
        }
    }

    private static string Residual(double value) => value == 0 ? "0" : value.ToString("0.00E+0", CultureInfo.InvariantCulture);

    private IEnumerable<PageLine> Plot(TableProof proof)
    {
        bool isRule = proof.Entries.Any(entry => entry.Member == "Weights");
        BinaryFormat format = proof.Claim.Format;
        double[] values = [.. Values(proof, isRule ? "Weights" : "Absolute", format)];
        double[] abscissas = isRule ? [.. Values(proof, "Nodes", format)] : [.. Enumerable.Range(0, values.Length).Select(order => (double)order)];
        TerminalStemPlot plot = new([.. abscissas.Zip(values).Where(point => double.IsFinite(point.First))], Width, PlotHeight);
        IReadOnlyList<string> lines = plot.Draw(IsUnicode);
        if (lines.Count == 0)
        {
            return [];
        }

        string title = (isRule ? "Weights over their nodes" : "Absolute moments by order") + (plot.IsLogarithmic ? ", on a logarithmic scale" : "");
        return [new PageLine(""), new PageLine(title, Heading), .. lines.Select(line => new PageLine(line))];
    }

    private static IEnumerable<double> Values(TableProof proof, string member, BinaryFormat format) => proof.Entries
        .Where(entry => entry.Member == member && entry.Index is not null)
        .Select(entry => format == BinaryFormat.Binary32
            ? System.BitConverter.UInt32BitsToSingle((uint)entry.Found)
            : System.BitConverter.UInt64BitsToDouble(entry.Found));
}
