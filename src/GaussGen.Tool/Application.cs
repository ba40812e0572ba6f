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
    private const string BaselineVerb = "baseline";

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
            _ = configuration.AddCommand<VerifyCommand>("verify")
                .WithDescription(
                    "Prove every table of compiled assemblies, without running them. "
                    + "The exit code is 0 if all is proven, 1 if something is wrong or could not be proven, "
                    + "2 if something could not be read, no table was found, or the command line is wrong.")
                .WithExample("verify", "bin/Release/net8.0/SurveyBoat.dll")
                .WithExample("verify", "bin/Release", "--sarif", "proofs.sarif", "--junit", "proofs.xml")
                .WithExample("verify", "bin/Release", "--report", "proofs.html")
                .WithData(terminal);
            _ = configuration.AddBranch(BaselineVerb, branch =>
            {
                branch.SetDescription("Pin the tables that were reviewed in a small text file, and notice when they drift.");
                branch.AddExample(BaselineVerb, "write", "bin/Release", "--file", "gaussgen.baseline");
                branch.AddExample(BaselineVerb, "check", "bin/Release", "--file", "gaussgen.baseline");
                _ = branch.AddCommand<BaselineWriteCommand>("write")
                    .WithDescription("Write down every table: its identity, its claim and the digest of its data.")
                    .WithExample(BaselineVerb, "write", "bin/Release/net8.0/SurveyBoat.dll")
                    .WithData(terminal);
                _ = branch.AddCommand<BaselineCheckCommand>("check")
                    .WithDescription("Say which tables were added, removed or changed since; end with 1 if any was.")
                    .WithExample(BaselineVerb, "check", "bin/Release/net8.0/SurveyBoat.dll")
                    .WithData(terminal);
            });
            _ = configuration.AddCommand<ExportCommand>("export")
                .WithDescription("Write proven tables for other programs: as a C header, CSV or JSON.")
                .WithExample("export", "SurveyBoat.dll", "SurveyBoat.Sixteen", "--output", "sixteen.h", "--prefix", "boat_")
                .WithExample("export", "SurveyBoat.dll", "--as", "csv")
                .WithExample("export", "--rule", "gauss-hermite", "--points", "16", "--format", "binary32")
                .WithExample("export", "--moments", "normal", "--mean", "1.5", "--standard-deviation", "0.25", "--as", "json")
                .WithData(terminal);
            _ = configuration.AddCommand<ExplainCommand>("explain")
                .WithDescription("Show a reviewer one table on a page: definition, entries, residuals, plot, proof.")
                .WithExample("explain", "SurveyBoat.dll", "SurveyBoat.Sixteen")
                .WithData(terminal);
        });

        try
        {
            if (arguments is [] or [BaselineVerb])
            {
                _ = await application.RunAsync([.. arguments, "--help"], cancellation).ConfigureAwait(false);
                return ExitCode.NotRead;
            }

            return await application.RunAsync(arguments, cancellation).ConfigureAwait(false);
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
