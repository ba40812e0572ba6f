using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Linq;
using System.Text;

namespace GaussGen.Package.Tests;

/// <summary>What a finished command printed (both streams, as they came) and its exit code.</summary>
internal sealed record CommandResult(string CommandLine, int ExitCode, string Output)
{
    /// <summary>This result if the command succeeded; otherwise an exception that carries everything it printed.</summary>
    public CommandResult RequireSuccess() =>
        ExitCode == 0 ? this : throw new InvalidOperationException($"{CommandLine}\nended with exit code {ExitCode}:\n{Output}");
}

/// <summary>Runs a command to its end, with a time limit, as a person's shell would: not as a child of a test host.</summary>
internal static class Command
{
    private static readonly TimeSpan Limit = TimeSpan.FromMinutes(5);

    // What the test host's own dotnet process has set for itself; a second SDK process would take it for its own settings.
    private static readonly string[] HostVariables = ["MSBUILD", "VSTEST", "COREHOST"];

    // No process may outlive the test: neither a build node nor a compiler server, which would keep our pipes open.
    private static readonly Dictionary<string, string> OwnVariables = new()
    {
        ["MSBUILDDISABLENODEREUSE"] = "1",
        ["UseSharedCompilation"] = "false",
        ["DOTNET_CLI_USE_MSBUILD_SERVER"] = "0",
        ["DOTNET_CLI_TELEMETRY_OPTOUT"] = "1",
        ["DOTNET_CLI_UI_LANGUAGE"] = "en",
        ["DOTNET_NOLOGO"] = "1",
    };

    public static CommandResult Dotnet(
        string folder, IReadOnlyDictionary<string, string> environment, params string[] arguments) =>
        Run(Environment.GetEnvironmentVariable("DOTNET_HOST_PATH") ?? "dotnet", folder, environment, arguments);

    public static CommandResult Run(
        string program, string folder, IReadOnlyDictionary<string, string> environment, params string[] arguments)
    {
        ProcessStartInfo start = new(program, arguments)
        {
            WorkingDirectory = folder,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        SetEnvironment(start.Environment, environment);
        string commandLine = $"{folder}$ {program} {string.Join(' ', arguments)}";

        StringBuilder output = new();
        void Keep(object sender, DataReceivedEventArgs line)
        {
            lock (output)
            {
                output.AppendLine(line.Data);
            }
        }

        using Process process = new() { StartInfo = start };
        process.OutputDataReceived += Keep;
        process.ErrorDataReceived += Keep;
        process.Start();
        process.StandardInput.Close();
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        if (!process.WaitForExit(Limit))
        {
            process.Kill(entireProcessTree: true);
            lock (output)
            {
                throw new TimeoutException($"{commandLine}\nwas not done after {Limit}:\n{output}");
            }
        }

        process.WaitForExit(); // for the last lines of both streams
        return new CommandResult(commandLine, process.ExitCode, output.ToString());
    }

    private static void SetEnvironment(IDictionary<string, string?> variables, IReadOnlyDictionary<string, string> wanted)
    {
        List<string> inherited = [.. variables.Keys.Where(name =>
            HostVariables.Any(prefix => name.StartsWith(prefix, StringComparison.OrdinalIgnoreCase)))];
        foreach (string name in inherited)
        {
            variables.Remove(name);
        }

        foreach ((string name, string value) in OwnVariables.Concat(wanted))
        {
            variables[name] = value;
        }
    }
}
