using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Explanations;
using GaussGen.Tool.Output;
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
        FileResult file = await ProgressDisplay.RunAsync(
            terminal, settings.IsQuiet, progress, () => Prove(settings, progress, cancellationToken), cancellationToken).ConfigureAwait(false);

        bool isFirst = true;
        foreach (TableResult table in file.Tables)
        {
            if (table.Proof is null)
            {
                Terminal.WriteLine(terminal.Results, FindingLine.Of(file, table, table.Findings[0]), new Style(Color.Red));
                continue;
            }

            ExplanationPage page = new(table, file.Assembly!, terminal.Results.Profile.Capabilities.Unicode, settings.ShowsAll);
            IEnumerable<PageLine> lines = isFirst ? page.Lines() : page.Lines().Prepend(new PageLine(""));
            foreach (PageLine line in lines)
            {
                Terminal.WriteLine(terminal.Results, line.Text, line.Style);
            }

            isFirst = false;
        }

        return file.Tables.All(table => table.Verdict == Verdict.Proven) ? ExitCode.AllProven : ExitCode.NotAllProven;
    }

    private static FileResult Prove(ExplainSettings settings, VerificationProgress progress, CancellationToken cancellation)
    {
        FileResult file = TableChoice.Open(settings.Assembly, progress, cancellation);
        IReadOnlyList<DeclaredTable> tables = TableChoice.ChooseOneType(file, settings.Type);
        return file with { Tables = Verifier.Prove(tables, progress, cancellation) };
    }
}
