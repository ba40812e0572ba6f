using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reports;
using GaussGen.Tool.Verification;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>Proves every table of compiled assemblies again, by a road that shares nothing with the one that made them.</summary>
internal sealed class VerifyCommand : AsyncCommand<VerifySettings>
{
    /// <inheritdoc/>
    public override async Task<int> ExecuteAsync(CommandContext context, VerifySettings settings, CancellationToken cancellationToken)
    {
        Terminal terminal = (Terminal)context.Data!;
        VerificationProgress progress = new();
        VerificationResult result = await ProgressDisplay.RunAsync(
            terminal,
            settings.IsQuiet,
            progress,
            () => Verifier.Run(settings.Paths, settings.AllowEmpty, progress, cancellationToken),
            cancellationToken).ConfigureAwait(false);

        VerificationScreen.Show(result, terminal, settings.IsQuiet);
        foreach ((string path, IReportWriter writer) in settings.Reports)
        {
            WholeFile.Write(path, stream => writer.Write(result, stream), cancellationToken);
        }

        return result.ExitCode;
    }
}
