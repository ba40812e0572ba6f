using System;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Verification;
using Spectre.Console;

namespace GaussGen.Tool.Output;

/// <summary>Shows how far the work is, once it has taken half a second, if someone is looking.</summary>
internal static class ProgressDisplay
{
    private static readonly TimeSpan Patience = TimeSpan.FromMilliseconds(500);
    private static readonly TimeSpan Interval = TimeSpan.FromMilliseconds(100);

    /// <summary>Runs the work, which must end by itself when the token is cancelled.</summary>
    public static async Task<T> RunAsync<T>(
        Terminal terminal, bool isQuiet, VerificationProgress progress, Func<T> work, CancellationToken cancellation)
    {
        Task<T> running = Task.Factory.StartNew(work, CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);
        bool isShown = !isQuiet && terminal.Messages.Profile.Capabilities is { Ansi: true, Interactive: true };
        if (isShown && await Task.WhenAny(running, Task.Delay(Patience, CancellationToken.None)).ConfigureAwait(false) != running)
        {
            await terminal.Messages.Progress()
                .AutoClear(true)
                .Columns(new TaskDescriptionColumn { Alignment = Justify.Left }, new ProgressBarColumn { Width = 24, CompletedStyle = Style.Plain, FinishedStyle = Style.Plain, RemainingStyle = new Style(Color.Grey) }, new PercentageColumn(), new ElapsedTimeColumn())
                .StartAsync(context => FollowAsync(context, running, progress))
                .ConfigureAwait(false);
        }

        return await running.ConfigureAwait(false);
    }

    private static async Task FollowAsync(ProgressContext context, Task running, VerificationProgress progress)
    {
        ProgressTask task = context.AddTask(Markup.Escape(progress.Text), maxValue: 1);
        while (!running.IsCompleted)
        {
            task.Description = Markup.Escape(progress.Text);
            task.Value = progress.Fraction;
            _ = await Task.WhenAny(running, Task.Delay(Interval)).ConfigureAwait(false);
        }
    }
}
