using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Text.RegularExpressions;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Reads the machine code that the JIT makes of the loops, in the listing that the runtime's settings offer.</summary>
public sealed partial class CompiledCodeTests
{
    private const string BoundsCheck = "RNGCHKFAIL";

    [ReleaseFact]
    public void No_bounds_check_is_left_in_the_loops()
    {
        Dictionary<string, string> listings = Listings();
        Assert.Contains(BoundsCheck, listings[nameof(CompiledCodeProbes.Unprotected)], StringComparison.Ordinal);
        string[] probes =
        [
            nameof(CompiledCodeProbes.EvenSymmetric),
            nameof(CompiledCodeProbes.EvenGeneral),
            nameof(CompiledCodeProbes.OddSymmetric),
            nameof(CompiledCodeProbes.OddGeneral),
            nameof(CompiledCodeProbes.GeneratedEven),
            nameof(CompiledCodeProbes.GeneratedOdd),
            nameof(CompiledCodeProbes.GeneratedSingle),
        ];
        foreach (string probe in probes)
        {
            Assert.DoesNotContain(BoundsCheck, listings[probe], StringComparison.Ordinal);

            // The loop is in the listing, and not in something that the listing calls.
            Assert.DoesNotContain("RuleEvaluation:Symmetric", listings[probe], StringComparison.Ordinal);
            Assert.DoesNotContain("RuleEvaluation:General", listings[probe], StringComparison.Ordinal);
            Assert.DoesNotContain(":Expectation", listings[probe], StringComparison.Ordinal);
        }
    }

    /// <summary>Runs the probes in a process of their own and returns the listing of each, by the name of the method.</summary>
    private static Dictionary<string, string> Listings()
    {
        string file = Path.GetTempFileName();
        try
        {
            ProcessStartInfo start = new(HostPath(), ["exec", typeof(Program).Assembly.Location, "probe"])
            {
                RedirectStandardError = true,
            };
            start.Environment["DOTNET_TieredCompilation"] = "0";
            start.Environment["DOTNET_JitDisasm"] = typeof(CompiledCodeProbes).FullName + ":*";
            start.Environment["DOTNET_JitStdOutFile"] = file;
            using Process process = Process.Start(start)!;
            string errors = process.StandardError.ReadToEnd();
            process.WaitForExit();
            Assert.Equal((0, string.Empty), (process.ExitCode, errors));

            Dictionary<string, string> listings = [];
            string text = File.ReadAllText(file);
            foreach (string listing in text.Split("; Assembly listing for method ", StringSplitOptions.RemoveEmptyEntries))
            {
                Match name = MethodName().Match(listing);
                listings[name.Groups[1].Value] = listing;
            }

            return listings;
        }
        finally
        {
            File.Delete(file);
        }
    }

    private static string HostPath()
    {
        string runtime = Path.GetDirectoryName(typeof(object).Assembly.Location)!;
        string host = OperatingSystem.IsWindows() ? "dotnet.exe" : "dotnet";
        return Path.GetFullPath(Path.Combine(runtime, "..", "..", "..", host));
    }

    [GeneratedRegex(@"^\S*:(\w+)\(")]
    private static partial Regex MethodName();
}
