using System;
using System.IO;
using System.Linq;
using Xunit;

namespace GaussGen.Package.Tests;

/// <summary>A baseline in the folder of a stranger's project: the build compares with it, with nothing to set.</summary>
[Collection(SharedPackage.Name)]
public sealed class BaselineInBuildTests(PackedLibrary package)
{
    private const string Source = """
        namespace Sounder
        {
            /// <summary>Noise of the echo sounder.</summary>
            [GaussGen.GaussHermite(2)]
            public static partial class RangeNoise { }
        }
        """;

    // The digest of the nodes ±1 and the weights ½, computed from its definition with another SHA-256 (that of Python).
    private const string Reviewed =
        "# gaussgen baseline 1: one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>\n"
        + "Sounder | Sounder.RangeNoise | GaussHermite | Gauss–Hermite rule with 2 points, standard normal density | binary64 | "
        + "sha256:fded99fdb3bf988690bdcdf832219f7d8cb08fbbdfcea4f2c1248431ca148f11\n";

    [Fact]
    public void What_was_reviewed_builds_and_what_was_not_is_told_where_it_stands()
    {
        Stranger stranger = new(package, "baseline");
        string project = stranger.AddProject("Sounder", "<TargetFramework>net10.0</TargetFramework>", Source);
        string baseline = stranger.PathOf(project, "gaussgen.baseline");
        File.WriteAllText(baseline, Reviewed);
        stranger.Dotnet("build", project).RequireSuccess();

        File.WriteAllText(stranger.PathOf(project, "Source.cs"), Source.Replace("(2)", "(3)", StringComparison.Ordinal));
        Assert.Contains("Source.cs(4,6): error GAUSS014: ", OnlyError(stranger.Dotnet("build", project, "--no-restore")), StringComparison.Ordinal);

        File.WriteAllText(baseline, Reviewed + "<<<<<<< HEAD\n");
        Assert.Contains("gaussgen.baseline(3,1): error GAUSS015: ", OnlyError(stranger.Dotnet("build", project, "--no-restore")), StringComparison.Ordinal);

        File.Delete(baseline);
        stranger.Dotnet("build", project, "--no-restore").RequireSuccess();
    }

    private static string OnlyError(CommandResult build)
    {
        Assert.NotEqual(0, build.ExitCode);

        // The build prints each error when it meets it and again in its summary.
        return Assert.Single(build.Output.Split('\n').Where(text => text.Contains(": error ", StringComparison.Ordinal)).Select(text => text.Trim()).Distinct());
    }
}
