using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Explanations;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>Shows a reviewer one table: what it is, what it holds, how good it is, and that it is proven.</summary>
internal sealed class ExplainCommand : AsyncCommand<ExplainSettings>
{
    /// <inheritdoc/>
    public override async Task<int> ExecuteAsync(CommandContext context, ExplainSettings settings, CancellationToken cancellationToken)
    {
        Terminal terminal = (Terminal)context.Data!;
        VerificationProgress progress = new();
        return AdHocOptions.Read(settings) is { } adHoc
            ? Show(
                [PageOf(await RunAsync(() => adHoc.Construct(progress, cancellationToken)).ConfigureAwait(false), terminal, settings)], terminal)
            : Show(await RunAsync(() => Prove(settings, progress, cancellationToken)).ConfigureAwait(false), terminal, settings);

        Task<T> RunAsync<T>(Func<T> work) => ProgressDisplay.RunAsync(terminal, settings.IsQuiet, progress, work, cancellationToken);
    }

    private static FileResult Prove(ExplainSettings settings, VerificationProgress progress, CancellationToken cancellation)
    {
        FileResult file = TableChoice.Open(settings.Assembly!, progress, cancellation);
        IReadOnlyList<DeclaredTable> tables = TableChoice.ChooseOneType(file, settings.Type);
        return file with { Tables = Verifier.Prove(tables, progress, cancellation) };
    }

    private static int Show(FileResult file, Terminal terminal, ExplainSettings settings)
    {
        foreach (TableResult table in file.Tables.Where(table => table.Proof is null))
        {
            Terminal.WriteLine(terminal.Results, FindingLine.Of(file, table, table.Findings[0]), new Style(Color.Red));
        }

        int shown = Show([.. file.Tables.Where(table => table.Proof is not null).Select(table => PageOf(table, file.Assembly!, terminal, settings))], terminal);
        return file.Tables.All(table => table.Proof is not null) ? shown : ExitCode.NotAllProven;
    }

    private static int Show(IReadOnlyList<ExplanationPage> pages, Terminal terminal)
    {
        foreach (ExplanationPage page in pages)
        {
            IEnumerable<PageLine> lines = page == pages[0] ? page.Lines() : page.Lines().Prepend(new PageLine(""));
            foreach (PageLine line in lines)
            {
                Terminal.WriteLine(terminal.Results, line.Text, line.Style);
            }
        }

        return pages.All(page => page.Proof.IsProven) ? ExitCode.AllProven : ExitCode.NotAllProven;
    }

    private static ExplanationPage PageOf(TableResult table, FoundAssembly assembly, Terminal terminal, ExplainSettings settings) => new(
        $"{table.Type.Name}, in {assembly.Name} {assembly.Version}",
        table.Proof!,
        table.Digest!,
        terminal.Results.Profile.Capabilities.Unicode,
        settings.ShowsAll);

    private static ExplanationPage PageOf(ExportedTable table, Terminal terminal, ExplainSettings settings) => new(
        $"{table.Name}, in no assembly", table.Proof, table.Digest, terminal.Results.Profile.Capabilities.Unicode, settings.ShowsAll);
}
