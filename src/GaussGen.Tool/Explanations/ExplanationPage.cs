using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Plots;
using GaussGen.Tool.Verification;
using Spectre.Console;

namespace GaussGen.Tool.Explanations;

/// <summary>A line of a page.</summary>
/// <param name="Text">The text.</param>
/// <param name="Style">How it looks; null for plain.</param>
internal sealed record PageLine(string Text, Style? Style = null);

/// <summary>What a reviewer wants to know of one table, on one page of 80 columns.</summary>
/// <param name="Name">What the table is called, and where it is.</param>
/// <param name="Proof">Its proof.</param>
/// <param name="Digest">The digest of its data.</param>
/// <param name="IsUnicode">Whether more than ASCII can be shown.</param>
/// <param name="ShowsAll">Whether every entry is shown, however many there are.</param>
internal sealed record ExplanationPage(string Name, TableProof Proof, string Digest, bool IsUnicode, bool ShowsAll)
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
        Explanation explanation = Explanation.Of(Proof.Claim);
        IEnumerable<PageLine> parts =
        [
            .. TextLayout.Wrap(Name, Width).Select(line => new PageLine(line, Heading)),
            .. TextLayout.Wrap(Proof.Claim.Title, Width).Select(line => new PageLine(line)),
            new(""),
            .. Labelled("Definition", explanation.Definition),
            .. Labelled("Exactness", explanation.Exactness),
            .. Labelled("Constants", [.. Constants()]),
            .. Labelled("Format", [FormatText(Proof.Claim.Format)]),
            .. Labelled("SHA-256", [TableDigest.Digits(Digest)]),
            .. Verdicts(),
            .. Labelled("Proof", [Proof.Claim.Method]),
            .. Labelled("Sources", [explanation.Sources + "."]),
            .. Labelled("Caution", [explanation.Caution]),
            .. Entries(explanation),
            .. Equations(),
            .. Plot(explanation),
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

    /// <summary>Numbers beside the lists that a user can see.</summary>
    private IEnumerable<string> Constants() => Proof.Entries
        .Where(entry => entry is { Index: null, IsInteger: false, Member: "NormalizingIntegral" })
        .Select(entry => $"{entry.Member} = {EncodingText.Number(entry.Found, Proof.Claim.Format)}, exactly {ExactText.Of(entry, Proof.Claim.Format)}");

    private IEnumerable<PageLine> Entries(Explanation explanation) => explanation.MatrixSize is { } size
        ? new MatrixTable(Proof, size, ShowsAll).Lines().Prepend(new PageLine(""))
        : EntryTable.Of(Proof, ShowsAll).SelectMany(table => table.Lines().Prepend(new PageLine("")));

    private IEnumerable<PageLine> Verdicts()
    {
        string counts = $"{Proof.ProvenCount} of {Proof.Entries.Count} entries";
        if (Proof.IsProven)
        {
            string text = $"Proven: {counts} are what the declaration promises, each number the nearest one; none is further than "
                + $"{UlpText.Of(Proof.WorstDistanceInUlp)} ulp from its true value.";
            return Labelled("Verdict", [text], Good);
        }

        IReadOnlyList<Finding> all = ProofFindings.Of(Proof);
        string[] findings = [.. all.Take(ShownFindings).Select(finding => PlainText.OneLine(finding.Message) + ".")];
        string rest = all.Count > ShownFindings ? $"And {all.Count - ShownFindings} more; gaussgen verify lists them all." : "";
        string verdict = Proof.Verdict == Verdict.Wrong ? "WRONG" : "NOT PROVEN";
        return Labelled("Verdict", [$"{verdict}: {counts} are proven.", .. findings, .. rest.Length > 0 ? [rest] : System.Array.Empty<string>()], Bad);
    }

    private IEnumerable<PageLine> Equations()
    {
        if (Proof.MomentEquations.Count == 0)
        {
            yield break;
        }

        bool isEven = Proof.MomentEquations.All(equation => equation.Degree % 2 == 0);
        yield return new PageLine("");
        yield return new PageLine("Moment equations Σ wᵢ xᵢᵏ = ∫ xᵏ w(x) dx" + (isEven ? "; odd k hold by symmetry" : ""), Heading);
        yield return new PageLine("   k   relative residual at most   allowed by rounding");
        int last = -1;
        foreach (MomentEquation equation in Proof.MomentEquations)
        {
            // The companion's equations follow those of the rule, from the lowest degree on.
            if (equation.Degree <= last)
            {
                yield return new PageLine("     of the companion:");
            }

            last = equation.Degree;
            yield return new PageLine(
                $"{equation.Degree,4}   {Residual(equation.Residual),-25}   {Residual(equation.Allowance),-19}   {(equation.Holds ? "holds" : "DOES NOT HOLD")}",
                equation.Holds ? default(Style?) : Bad);
        }
    }

    private static string Residual(double value) => value == 0 ? "0" : value.ToString("0.00E+0", CultureInfo.InvariantCulture);

    private IEnumerable<PageLine> Plot(Explanation explanation)
    {
        if (explanation.Plot is not { } wanted)
        {
            return [];
        }

        double[] values = [.. Values(wanted.Values)];
        double[] abscissas = wanted.Abscissas is { } member ? [.. Values(member)] : [.. Enumerable.Range(0, values.Length).Select(order => (double)order)];
        TerminalStemPlot plot = new([.. abscissas.Zip(values).Where(point => double.IsFinite(point.First))], Width, PlotHeight);
        IReadOnlyList<string> lines = plot.Draw(IsUnicode);
        int below = values.Count(value => value < 0);
        return lines.Count == 0 ? []
            : [
                new PageLine(""),
                new PageLine(wanted.Title + (plot.IsLogarithmic ? ", on a logarithmic scale" : ""), Heading),
                .. lines.Select(line => new PageLine(line)),
                .. below == 0 ? [] : new[] { new PageLine($"Without a stem: {below.ToString(CultureInfo.InvariantCulture)} below zero.") },
            ];
    }

    private IEnumerable<double> Values(string member) => Proof.Entries
        .Where(entry => entry.Member == member && entry.Index is not null)
        .Select(entry => Proof.Claim.Format == BinaryFormat.Binary32
            ? System.BitConverter.UInt32BitsToSingle((uint)entry.Found)
            : System.BitConverter.UInt64BitsToDouble(entry.Found));
}
