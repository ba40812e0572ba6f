using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Baselines;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>Writes the baseline of all tables that are found, unless something could not be read.</summary>
internal sealed class BaselineWriteCommand : AsyncCommand<BaselineSettings>
{
    /// <inheritdoc/>
    public override async Task<int> ExecuteAsync(CommandContext context, BaselineSettings settings, CancellationToken cancellationToken)
    {
        Terminal terminal = (Terminal)context.Data!;

        // A file that is no baseline, or a damaged one, is not written over: something in it may be wanted.
        Baseline? old = BaselineFile.ReadIfPresent(settings.File);
        VerificationProgress progress = new();
        BaselineSurvey survey = await ProgressDisplay.RunAsync(
            terminal,
            settings.IsQuiet,
            progress,
            () => BaselineSurvey.Of(settings.Paths, settings.AllowEmpty, progress, cancellationToken),
            cancellationToken).ConfigureAwait(false);

        BaselineScreen.ShowProblems(survey, terminal);
        foreach (IReadOnlyList<SurveyedTable> copies in survey.Conflicts)
        {
            terminal.WriteError(
                $"{copies[0].Entry.Type} of {copies[0].Entry.Assembly} is not the same in {copies[0].Path} and in {copies[1].Path}; build both again, or name one of them");
        }

        if (survey.IsIncomplete || survey.Conflicts.Any())
        {
            terminal.WriteError($"{settings.File} was not written");
            return ExitCode.NotRead;
        }

        Baseline baseline = new(survey.Tables.Select(table => table.Entry));
        WholeFile.Write(settings.File, baseline.Write, cancellationToken);
        if (!settings.IsQuiet)
        {
            BaselineScreen.ShowWritten(settings.File, old, survey, terminal);
        }

        return ExitCode.AllProven;
    }
}
