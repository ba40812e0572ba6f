using System.IO;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>What a run of the tool ended with.</summary>
internal sealed record Run(int ExitCode, string Results, string Messages);

/// <summary>Runs the tool in this process, with writers in the place of its streams.</summary>
internal static class CommandLine
{
    public static Task<Run> RunAsync(params string[] arguments) => RunAsync(CancellationToken.None, arguments);

    public static async Task<Run> RunAsync(CancellationToken cancellation, params string[] arguments)
    {
        using StringWriter results = new();
        using StringWriter messages = new();
        int code = await Application.RunAsync(arguments, Terminal.Of(results, messages), cancellation);
        return new Run(code, results.ToString(), messages.ToString());
    }
}
