using System;
using System.Collections.Generic;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Commands;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reports;
using GaussGen.Tool.Verification;
using Spectre.Console.Cli;

namespace GaussGen.Tool;

/// <summary>The command line: its verbs, and what becomes of what goes wrong.</summary>
internal static class Application
{
    /// <summary>Runs one command line and returns the exit code.</summary>
    public static async Task<int> RunAsync(IReadOnlyList<string> arguments, Terminal terminal, CancellationToken cancellation)
    {
        CommandApp application = new();
        application.Configure(configuration =>
        {
            _ = configuration
                .SetApplicationName(ToolIdentity.Name)
                .SetApplicationVersion(ToolIdentity.Version)
                .ConfigureConsole(terminal.Results)
                .UseStrictParsing()
                .PropagateExceptions();
            configuration.Settings.HelpProviderStyles = HelpStyle.Create();
            Verbs.Add(configuration, terminal);
        });

        try
        {
            if (arguments is [] or [Verbs.Baseline])
            {
                _ = await application.RunAsync([.. arguments, "--help"], cancellation).ConfigureAwait(false);
                return ExitCode.NotRead;
            }

            return await application.RunAsync(NegativeValues.Join(arguments), cancellation).ConfigureAwait(false);
        }
        catch (OperationCanceledException)
        {
            terminal.WriteError("interrupted");
            return ExitCode.Interrupted;
        }
        catch (CommandAppException error)
        {
            terminal.WriteError($"{error.Message.TrimEnd('.')}; see gaussgen --help");
            return ExitCode.NotRead;
        }
        catch (Exception error) when (error is UnwritableException or InputException)
        {
            terminal.WriteError(error.Message);
            return ExitCode.NotRead;
        }
        catch (Exception error)
        {
            // Nothing is known to lead here; whatever does must not look like a proof, nor like a failed one.
            terminal.WriteError($"this is a defect of gaussgen ({error.GetType().Name}: {error.Message}); report it with the command line");
            return ExitCode.NotRead;
        }
    }
}
