using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Baselines;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>Compares all tables that are found with a baseline.</summary>
internal sealed class BaselineCheckCommand : AsyncCommand<BaselineSettings>
{
    /// <inheritdoc/>
    public override async Task<int> ExecuteAsync(CommandContext context, BaselineSettings settings, CancellationToken cancellationToken)
    {
        Terminal terminal = (Terminal)context.Data!;
        Baseline baseline = BaselineFile.Read(settings.File);
        VerificationProgress progress = new();
        BaselineSurvey survey = await ProgressDisplay.RunAsync(
            terminal,
            settings.IsQuiet,
            progress,
            () => BaselineSurvey.Of(settings.Paths, settings.AllowEmpty, progress, cancellationToken),
            cancellationToken).ConfigureAwait(false);

        // A table that is in a file which could not be read is not gone.
        IReadOnlyList<BaselineChange> changes =
        [
            .. BaselineChange.Between(baseline, survey.Tables).Where(change => !change.IsRemoved || !survey.HasUnread),
        ];
        BaselineScreen.ShowProblems(survey, terminal);
        BaselineScreen.ShowChanges(settings.File, changes, survey, terminal);
        if (!settings.IsQuiet)
        {
            BaselineScreen.ShowSum(settings.File, baseline, changes, survey, terminal);
        }

        return changes.Count > 0 ? ExitCode.NotAllProven
            : survey.IsIncomplete ? ExitCode.NotRead
            : ExitCode.AllProven;
    }
}
