using System;
using System.IO;
using System.Linq;
using Xunit;

namespace GaussGen.Package.Tests;

/// <summary>The verification in a stranger's build, with the tool installed as the documentation says.</summary>
[Collection(SharedPackage.Name)]
public sealed class VerifyOnBuildTests(PackedLibrary package)
{
    private const string Properties = "<TargetFramework>net10.0</TargetFramework><GaussGenVerifyOnBuild>true</GaussGenVerifyOnBuild>";

    // Without the generator, a table by hand takes its place.
    private const string WithoutGenerator =
        Properties + """
        </PropertyGroup>
        <Target Name="WithoutGenerator" BeforeTargets="CoreCompile"><ItemGroup><Analyzer Remove="@(Analyzer)" /></ItemGroup></Target>
        <PropertyGroup>
        """;

    private const string ByHand = """
        namespace Sounder
        {
            /// <summary>Noise of the echo sounder.</summary>
            [GaussGen.GaussHermite(2)]
            public static class RangeNoise
            {
                /// <summary>Points.</summary>
                public const int PointCount = 2;

                /// <summary>Degree.</summary>
                public const int DegreeOfExactness = 3;

                /// <summary>Nodes.</summary>
                public static System.ReadOnlySpan<double> Nodes => new double[] { -1.0, 1.0 };

                /// <summary>Weights.</summary>
                public static System.ReadOnlySpan<double> Weights => new double[] { 0.5, 0.5 };
            }
        }
        """;

    [Fact]
    public void Without_the_tool_the_error_says_how_to_get_it()
    {
        Stranger stranger = new(package, "verify-without-tool");
        string project = stranger.AddProject("Sounder", WithoutGenerator, ByHand);
        string[] errors = Errors(stranger.Dotnet("build", project));
        Assert.Contains("error GAUSS905: The verifier could not be run", Assert.Single(errors), StringComparison.Ordinal);
        Assert.Contains("dotnet tool install GaussGen.Tool", errors[0], StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_not_proven_fails_the_build_and_what_is_proven_is_not_proven_again()
    {
        package.PackTool();
        Stranger stranger = new(package, "verify-on-build");
        stranger.Dotnet("new", "tool-manifest").RequireSuccess();
        stranger.Dotnet("tool", "install", "GaussGen.Tool", "--version", package.Version).RequireSuccess();

        string project = stranger.AddProject("Sounder", WithoutGenerator, ByHand.Replace("-1.0, 1.0 }", "-1.0, 1.0000000000000002 }", StringComparison.Ordinal));
        string assembly = stranger.PathOf(project, "bin", "Debug", "net10.0", "Sounder.dll");
        string[] errors = Errors(stranger.Dotnet("build", project));
        Assert.Equal(2, errors.Length);
        Assert.Contains(errors, error => error.Contains("Sounder.dll : error GAUSS901: Sounder.RangeNoise.Nodes[1]: expected 0x3FF0000000000000", StringComparison.Ordinal));
        Assert.Contains(errors, error => error.Contains("error GAUSS905: Not every table of Sounder.dll is proven", StringComparison.Ordinal));
        Assert.False(File.Exists(assembly));

        File.WriteAllText(stranger.PathOf(project, "Source.cs"), ByHand);
        stranger.Dotnet("build", project, "--no-restore").RequireSuccess();
        Assert.True(File.Exists(assembly));

        // With no tool to start, a build that would verify fails; one of an unchanged assembly does not verify.
        stranger.Dotnet("build", project, "--no-restore", "-p:GaussGenToolCommand=no-such-tool").RequireSuccess();
        File.AppendAllText(stranger.PathOf(project, "Source.cs"), "// changed\ninternal static class Keel { }\n");
        Assert.Single(Errors(stranger.Dotnet("build", project, "--no-restore", "-p:GaussGenToolCommand=no-such-tool")));
    }

    [Fact]
    public void It_is_off_by_default()
    {
        Stranger stranger = new(package, "verify-off");
        string project = stranger.AddProject(
            "Sounder", WithoutGenerator.Replace("<GaussGenVerifyOnBuild>true</GaussGenVerifyOnBuild>", "", StringComparison.Ordinal),
            ByHand.Replace("-1.0, 1.0 }", "-1.0, 2.0 }", StringComparison.Ordinal));
        stranger.Dotnet("build", project).RequireSuccess();
    }

    private static string[] Errors(CommandResult build)
    {
        Assert.NotEqual(0, build.ExitCode);

        // The build prints each error when it meets it and again in its summary.
        return [.. build.Output.Split('\n').Where(text => text.Contains("error GAUSS", StringComparison.Ordinal)).Select(text => text.Trim()).Distinct()];
    }
}
