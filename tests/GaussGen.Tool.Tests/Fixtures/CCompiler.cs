using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using Xunit;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>A test that needs a C compiler; where there is none it is skipped, and says so.</summary>
public sealed class CFactAttribute : FactAttribute
{
    public CFactAttribute()
    {
        if (CCompiler.Path is null)
        {
            Skip = "gcc is not on the PATH, so the exported header cannot be compiled here.";
        }
    }
}

/// <summary>The system's C compiler.</summary>
internal static class CCompiler
{
    private static readonly string[] Strict = ["-std=c99", "-pedantic", "-Wall", "-Wextra", "-Werror", "-Wundef", "-Wshadow"];

    public static string? Path { get; } = (Environment.GetEnvironmentVariable("PATH") ?? "")
        .Split(System.IO.Path.PathSeparator)
        .Select(folder => System.IO.Path.Combine(folder, "gcc"))
        .FirstOrDefault(File.Exists);

    /// <summary>Compiles files as strict C99; what the compiler says.</summary>
    public static async Task<(int ExitCode, string Text)> CompileAsync(string output, params string[] arguments) =>
        await RunAsync(Path!, [.. Strict, "-o", output, .. arguments]);

    public static async Task<(int ExitCode, string Text)> RunAsync(string program, IEnumerable<string> arguments)
    {
        using Process process = Process.Start(new ProcessStartInfo(program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> errors = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();
        return (process.ExitCode, await output + await errors);
    }
}
