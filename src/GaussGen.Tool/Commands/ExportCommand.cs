using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>Writes tables for programs that are not .NET, after proving every entry of them.</summary>
internal sealed class ExportCommand : AsyncCommand<ExportSettings>
{
    /// <inheritdoc/>
    public override async Task<int> ExecuteAsync(CommandContext context, ExportSettings settings, CancellationToken cancellationToken)
    {
        Terminal terminal = (Terminal)context.Data!;
        VerificationProgress progress = new();
        (FileResult? file, IReadOnlyList<ExportedTable> tables) = await ProgressDisplay.RunAsync(
            terminal,
            settings.IsQuiet,
            progress,
            () => AdHocOptions.Read(settings) is { } adHoc
                ? (null, [adHoc.Construct(progress, cancellationToken)])
                : Declared(settings, progress, cancellationToken),
            cancellationToken).ConfigureAwait(false);

        int unproven = (file?.Tables.Count ?? tables.Count) - tables.Count(table => table.Proof.IsProven);
        if (unproven > 0)
        {
            ShowUnproven(file, terminal);
            if (!settings.AllowUnproven || tables.Count < file?.Tables.Count)
            {
                terminal.WriteError(settings.AllowUnproven
                    ? "nothing was exported: a table has not the members that its declaration promises; build it again with the package's generator"
                    : $"nothing was exported: {(unproven == 1 ? "a table is" : $"{unproven} tables are")} not proven; look into it, or add --allow-unproven");
                return ExitCode.NotAllProven;
            }
        }

        Write(settings, tables, terminal, cancellationToken);
        return ExitCode.AllProven;
    }

    /// <summary>The tables of an assembly, proven; those of which no entry can be told are left out.</summary>
    private static (FileResult? File, IReadOnlyList<ExportedTable> Tables) Declared(
        ExportSettings settings, VerificationProgress progress, CancellationToken cancellation)
    {
        FileResult file = TableChoice.Open(settings.Assembly!, progress, cancellation);
        TableResult[] results = Verifier.Prove(TableChoice.Choose(file, settings.Types), progress, cancellation);
        IEnumerable<ExportedTable> tables = results
            .Where(result => result.Proof is { Faults.Count: 0 })
            .Select(result => new ExportedTable(
                result.Type.Name,
                file.Assembly!.Name,
                file.Assembly.Version.ToString(),
                ClaimTable.Find(result.Attribute)!,
                result.Proof!,
                result.Digest!));
        return (file with { Tables = results }, [.. tables]);
    }

    /// <summary>A line a failure, on the stream for messages: the other one may be the exported file.</summary>
    private static void ShowUnproven(FileResult? file, Terminal terminal)
    {
        foreach (TableResult table in file?.Tables ?? [])
        {
            foreach (Finding finding in table.Findings)
            {
                Terminal.WriteLine(terminal.Messages, FindingLine.Of(file!, table, finding), new Style(Color.Red));
            }
        }
    }

    private static void Write(ExportSettings settings, IReadOnlyList<ExportedTable> tables, Terminal terminal, CancellationToken cancellation)
    {
        ITableWriter writer = settings.CreateWriter();
        if (settings.Output is null)
        {
            using MemoryStream content = new();
            writer.Write(tables, content);
            cancellation.ThrowIfCancellationRequested();
            terminal.WriteFile(Encoding.UTF8.GetString(content.ToArray()));
            return;
        }

        WholeFile.Write(settings.Output, stream => writer.Write(tables, stream), cancellation);
        if (!settings.IsQuiet)
        {
            int entries = tables.Sum(table => table.Members.Sum(member => member.Entries.Count));
            bool isProven = tables.All(table => table.Proof.Verdict == Verdict.Proven);
            Terminal.WriteLine(
                terminal.Results,
                $"Wrote {settings.Output}: {tables.Count} {(tables.Count == 1 ? "table" : "tables")}, {entries} {(entries == 1 ? "entry" : "entries")}, "
                    + (isProven ? "all proven." : "not all proven."),
                new Style(isProven ? Color.Green : Color.Red));
        }
    }
}
