using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;
using Spectre.Console;
using Spectre.Console.Rendering;

namespace GaussGen.Tool.Output;

/// <summary>A verification on the terminal: a table an assembly, a line a failure, a line for what could not be read, and the sum.</summary>
internal static class VerificationScreen
{
    private const int WidthForAllColumns = 120;
    private const int Gap = 2;

    private static readonly Style Good = new(Color.Green);
    private static readonly Style Bad = new(Color.Red);

    /// <summary>Shows a result; the tables and the sum are left out where the user wants to be told of failures only.</summary>
    public static void Show(VerificationResult result, Terminal terminal, bool isQuiet)
    {
        foreach (FileResult file in result.Files.Where(file => file.Tables.Count > 0 && !isQuiet))
        {
            ShowTable(file, terminal.Results);
        }

        ShowFindings(result, terminal);
        ShowUnread(result, terminal);
        if (!isQuiet)
        {
            ShowSum(result, terminal.Results);
        }
    }

    /// <summary>One line for each finding about a table.</summary>
    public static void ShowFindings(VerificationResult result, Terminal terminal)
    {
        foreach (FileResult file in result.Files)
        {
            foreach (TableResult table in file.Tables)
            {
                foreach (Finding finding in table.Findings)
                {
                    Terminal.WriteLine(terminal.Results, FindingLine.Of(file, table, finding), Bad);
                }
            }
        }
    }

    /// <summary>One line for each file that could not be read, and for finding nothing where something should be.</summary>
    public static void ShowUnread(VerificationResult result, Terminal terminal)
    {
        foreach (FileResult file in result.Unreadable)
        {
            Terminal.WriteLine(terminal.Messages, FindingLine.Of(file), Bad);
        }

        foreach (FileResult file in result.NamedWithoutTable)
        {
            terminal.WriteError($"{file.Path} holds no table; name an assembly with a table attribute, or add --allow-empty");
        }

        if (result.IsEmpty && !result.NamedWithoutTable.Any() && !result.Unreadable.Any())
        {
            terminal.WriteError("no table was found; name the folder of a build that has one, or add --allow-empty");
        }
    }

    private static void ShowTable(FileResult file, IAnsiConsole console)
    {
        Terminal.WriteLine(console, file.Path, new Style(decoration: Decoration.Bold));
        bool isNarrow = console.Profile.Width < WidthForAllColumns;
        Table table = new() { Border = TableBorder.Simple };
        foreach (string text in isNarrow ? ["Type"] : new[] { "Type", "What" })
        {
            _ = table.AddColumn(new TableColumn(text).Padding(0, 0, Gap, 0));
        }

        _ = table.AddColumn(new TableColumn("Format").NoWrap().Padding(0, 0, Gap, 0));
        foreach (string number in new[] { "Entries", "Proven", "Worst ulp" })
        {
            _ = table.AddColumn(new TableColumn(number).RightAligned().NoWrap().Padding(0, 0, Gap, 0));
        }

        foreach (TableResult result in file.Tables)
        {
            Text type = new(PlainText.OneLine(result.Type.Name));
            Text what = new(PlainText.OneLine(result.What));
            IRenderable[] names = isNarrow ? [new Rows(type, new Padder(what, new Padding(2, 0, 0, 0)))] : [type, what];
            _ = table.AddRow([.. names, .. Numbers(result)]);
        }

        console.Write(table);
    }

    private static IEnumerable<IRenderable> Numbers(TableResult result)
    {
        bool isProven = result.Verdict == Verdict.Proven;
        yield return new Text(result.Format);
        yield return new Text($"{result.Entries}");
        yield return new Text(isProven ? $"{result.Proven}" : $"{result.Proven} !", isProven ? Good : Bad);
        yield return new Text(result.WorstDistanceInUlp is { } distance ? UlpText.Of(distance) : "?");
    }

    private static void ShowSum(VerificationResult result, IAnsiConsole console)
    {
        List<TableResult> tables = [.. result.Tables];
        if (tables.Count > 0)
        {
            bool isGood = result.ExitCode == ExitCode.AllProven;
            Terminal.WriteLine(
                console,
                (isGood ? "All proven: " : "Not all proven: ")
                + $"{tables.Count(table => table.Verdict == Verdict.Proven)} of {Count(tables.Count, "table")} and "
                + $"{tables.Sum(table => table.Proven)} of {Count(tables.Sum(table => table.Entries), "entry", "entries")} "
                + $"in {Count(result.Files.Count(file => file.Tables.Count > 0), "assembly", "assemblies")}.",
                isGood ? Good : Bad);
        }
        else
        {
            Terminal.WriteLine(console, "No table found, so nothing was proven.");
        }

        List<string> rest = [];
        AddCount(rest, tables.Count(table => table.Verdict == Verdict.Wrong), "wrong", "table");
        AddCount(rest, tables.Count(table => table.Verdict == Verdict.Unproven), "unproven", "table");
        AddCount(rest, result.Unreadable.Count(), "unreadable", "file");
        AddCount(rest, result.Skipped(UnreadableReason.NativeImage), "native", "image", " passed by");
        AddCount(rest, result.Skipped(UnreadableReason.ReferenceAssembly), "reference", "assembly", " passed by", "assemblies");
        AddCount(rest, result.Files.Count(file => file is { Assembly: not null, Tables.Count: 0 }), "other", "assembly", " without a table", "assemblies");
        if (rest.Count > 0)
        {
            Terminal.WriteLine(console, "Also: " + string.Join(", ", rest) + ".");
        }
    }

    private static void AddCount(List<string> list, int count, string adjective, string noun, string after = "", string? plural = null)
    {
        if (count > 0)
        {
            list.Add($"{count} {adjective} {(count == 1 ? noun : plural ?? noun + "s")}{after}");
        }
    }

    private static string Count(int number, string noun, string? plural = null) => $"{number} {(number == 1 ? noun : plural ?? noun + "s")}";
}
