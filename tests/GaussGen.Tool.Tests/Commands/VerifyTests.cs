using System;
using System.Diagnostics;
using System.IO;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Tool.Tests.Commands;

/// <summary>The verb as a user meets it: what it prints, where, and what it ends with.</summary>
public class VerifyTests
{
    private static readonly byte[] Boat = FixtureCompiler.Generate(Sources.Small);

    [Theory]
    [InlineData(Framework.Net8, OptimizationLevel.Release)]
    [InlineData(Framework.Net8, OptimizationLevel.Debug)]
    [InlineData(Framework.NetStandard2, OptimizationLevel.Release)]
    [InlineData(Framework.NetStandard2, OptimizationLevel.Debug)]
    public async Task What_the_generator_made_is_proven(Framework framework, OptimizationLevel optimization)
    {
        using Folder folder = new();
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Small + Sources.Large.Replace("using GaussGen;", "", StringComparison.Ordinal), framework, optimization)));
        Assert.Equal("", run.Messages);
        Assert.Contains("All proven: 19 of 19 tables", run.Results, StringComparison.Ordinal);
        Assert.Contains("SurveyBoat.Outer.Six", run.Results, StringComparison.Ordinal);
        Assert.Contains("binary32", run.Results, StringComparison.Ordinal);
        Assert.DoesNotContain("error", run.Results, StringComparison.Ordinal);
        Assert.Equal(0, run.ExitCode);
    }

    [Theory]
    [InlineData(Framework.Net8, OptimizationLevel.Release)]
    [InlineData(Framework.Net8, OptimizationLevel.Debug)]
    [InlineData(Framework.NetStandard2, OptimizationLevel.Release)]
    [InlineData(Framework.NetStandard2, OptimizationLevel.Debug)]
    public async Task Every_family_is_proven(Framework framework, OptimizationLevel optimization)
    {
        using Folder folder = new();
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Families, framework, optimization)));
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        int tables = Sources.TypesOf(Sources.Families).Count();
        Assert.Contains($"All proven: {tables} of {tables} tables", run.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_wrong_entry_is_one_line_with_both_values()
    {
        using Folder folder = new();
        string path = folder.Add("Boat.dll", FixtureCompiler.Compile(ThreePoints("0.6666666666666665")));
        Run run = await CommandLine.RunAsync("verify", path);
        Assert.Equal(1, run.ExitCode);
        string line = Assert.Single(run.Results.Split('\n'), line => line.Contains("GAUSS901", StringComparison.Ordinal));
        Assert.StartsWith(path + " : error GAUSS901: SurveyBoat.Three.Weights[1]: expected 0x3FE5555555555555 (0.6666666666666666), "
            + "found 0x3FE5555555555554 (0.6666666666666665), 1.33", line, StringComparison.Ordinal);
        Assert.Contains("Not all proven: 0 of 1 table and 7 of 8 entries in 1 assembly.", run.Results, StringComparison.Ordinal);
        Assert.Equal("", run.Messages);
    }

    [Theory]
    [InlineData("PointCount = 4", "GAUSS901")]
    [InlineData("PointCountOf = 3", "GAUSS902")]
    public async Task A_wrong_or_missing_constant_is_found(string constant, string code)
    {
        using Folder folder = new();
        string source = ThreePoints("0.6666666666666666").Replace("PointCount = 3", constant, StringComparison.Ordinal);
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", FixtureCompiler.Compile(source)));
        Assert.Equal(1, run.ExitCode);
        Assert.Contains(code, run.Results, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("[GaussHermite(3)] class T { public static ReadOnlySpan<double> Nodes => new[] { Math.Sqrt(3) }; }", "Nodes cannot be read")]
    [InlineData("[GaussHermite(0)] class T { }", "from 1 to 1000")]
    [InlineData("[GaussHermite(3, Format = (NumberFormat)77)] class T { }", "Format 77")]
    [InlineData("[GaussHermite(3, Convention = (HermiteConvention)7)] class T { }", "Convention 7")]
    [InlineData("[NormalMoments(double.NaN, 1)] class T { }", "asks for what cannot be: The mean must be finite\n")]
    [InlineData("[GaussNormalMixture(3, null, new double[] { 1 }, new double[] { 1 })] class T { }", "argument 2 of [GaussNormalMixture] is null where a list of numbers is expected; give the numbers")]
    [InlineData("[GaussNormalMixture(3, new double[] { 1 }, new double[] { 1, 2 }, new double[] { 1 })] class T { }", "must be as many as each other")]
    [InlineData("[GaussNormalMixture(3, new double[0], new double[0], new double[0])] class T { }", "[GaussNormalMixture] asks for what cannot be")]
    [InlineData("[GaussEvenExponential(3)] class T { }", "[GaussEvenExponential] asks for what cannot be")]
    [InlineData("[GaussEvenExponential(3, null)] class T { }", "argument 2 of [GaussEvenExponential] is null where a list of numbers is expected")]
    [InlineData("[EvenExponentialMoments(1, -1)] class T { }", "[EvenExponentialMoments] asks for what cannot be")]
    [InlineData("[GaussTruncatedNormal(3, 2, 1)] class T { }", "[GaussTruncatedNormal] asks for what cannot be")]
    [InlineData("[NestedHermite(5)] class T { }", "[NestedHermite] asks for what cannot be")]
    [InlineData("[OscillatorMatrixElements(0, 1)] class T { }", "[OscillatorMatrixElements] asks for what cannot be")]
    [InlineData("class T { [System.CodeDom.Compiler.GeneratedCode(\"GaussGen\", \"0.1.0\")] static ReadOnlySpan<double> Nodes => new double[] { 1 }; }", "attribute that says which one is gone")]
    public async Task What_cannot_be_proven_is_counted_and_said(string type, string reason)
    {
        using Folder folder = new();
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", FixtureCompiler.Compile("using System; using GaussGen; " + type)));
        Assert.Equal(1, run.ExitCode);
        string line = Assert.Single(run.Results.Split('\n'), line => line.Contains("GAUSS903", StringComparison.Ordinal));
        Assert.Contains(reason, line + "\n", StringComparison.Ordinal);
        Assert.Contains("1 unproven table", run.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task An_attribute_of_a_newer_version_is_said()
    {
        using Folder folder = new();
        byte[] image = FixtureCompiler.CompileAgainst(
            "namespace GaussGen { public class GaussFutureAttribute : System.Attribute { } public class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int points) { } public int Twist { get; set; } } }",
            "GaussGen",
            "using GaussGen; [GaussFuture] class A { } [GaussHermite(3, Twist = 2)] class B { [GaussFuture] void Method() { } }");
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", image));
        Assert.Equal(1, run.ExitCode);
        Assert.Contains("A: [GaussFuture] is unknown", run.Results, StringComparison.Ordinal);
        Assert.Contains("B: Twist of [GaussHermite] is unknown", run.Results, StringComparison.Ordinal);
        Assert.Contains("B.Method: [GaussFuture] is unknown", run.Results, StringComparison.Ordinal);
        Assert.Contains("3 unproven tables", run.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_mixed_folder()
    {
        using Folder folder = new();
        _ = folder.Add("bin/Boat.dll", Boat);
        _ = folder.Add("bin/Empty.exe", FixtureCompiler.Compile("class T { }"));
        _ = folder.Add("bin/notes.txt", [1, 2, 3]);
        _ = folder.Add("bin/ref/Boat.dll", Images.Reference("public class T { }"));
        _ = folder.Add("native/Native.DLL", Images.Native());
        Run run = await CommandLine.RunAsync("verify", folder.Path);
        Assert.Equal("", run.Messages);
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("1 native image passed by", run.Results, StringComparison.Ordinal);
        Assert.Contains("1 reference assembly passed by", run.Results, StringComparison.Ordinal);
        Assert.Contains("1 other assembly without a table", run.Results, StringComparison.Ordinal);

        _ = folder.Add("bin/Cut.dll", Boat[..(Boat.Length / 2)]);
        _ = folder.Add("bin/Text.dll", [1, 2, 3]);
        run = await CommandLine.RunAsync("verify", folder.Path);
        Assert.Equal(2, run.ExitCode);
        Assert.Equal(2, run.Messages.Split('\n', StringSplitOptions.RemoveEmptyEntries).Length);
        Assert.Contains("2 unreadable files", run.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_native_image_or_a_reference_assembly_that_is_named_is_an_error()
    {
        using Folder folder = new();
        await AssertOneLine("machine code", "verify", folder.Add("N.dll", Images.Native()));
        await AssertOneLine("reference assembly", "verify", folder.Add("R.dll", Images.Reference("public class T { }")));
    }

    [Fact]
    public async Task Files_that_are_not_there_or_not_assemblies()
    {
        using Folder folder = new();
        await AssertOneLine("does not exist", "verify", folder.Below("none.dll"));
        await AssertOneLine("does not exist", "verify", folder.Below("none/none.dll"));
        await AssertOneLine("no executable image", "verify", folder.Add("text.dll", [65, 66]));
        await AssertOneLine("is empty", "verify", folder.Add("empty.dll", []));
        await AssertOneLine("damaged", "verify", folder.Add("cut.dll", Boat[..1000]));
    }

    /// <summary>Permissions do not stop the super-user; a folder that vanished stands for what the system refuses.</summary>
    [Fact]
    public async Task What_the_system_refuses_is_one_line()
    {
        using Folder folder = new();
        if (OperatingSystem.IsWindows() || Environment.IsPrivilegedProcess)
        {
            await AssertOneLine("does not exist", "verify", folder.Below("a.dll/b.dll"));
            return;
        }

        string file = folder.Add("a.dll", Boat);
        File.SetUnixFileMode(file, UnixFileMode.None);
        await AssertOneLine("may not be read", "verify", file);
        string closed = Directory.CreateDirectory(folder.Below("closed"), UnixFileMode.None).FullName;
        File.Delete(file);
        await AssertOneLine("may not be searched", "verify", folder.Path);
        Directory.Delete(closed);
    }

    [Fact]
    public async Task A_pipe_without_a_writer_is_not_waited_for()
    {
        using Folder folder = new();
        if (!OperatingSystem.IsWindows())
        {
            using Process make = Process.Start("mkfifo", [folder.Below("pipe.dll")]);
            await make.WaitForExitAsync();
            await AssertOneLine("no regular file", "verify", folder.Path);
        }
    }

    [Fact]
    public async Task A_file_of_500_MB_is_refused_by_its_size()
    {
        using Folder folder = new();
        string path = folder.Add("huge.dll", Boat);
        using (FileStream file = File.OpenWrite(path))
        {
            file.SetLength(500L << 20);
        }

        await AssertOneLine("500 MiB", "verify", path);
        long before = GC.GetAllocatedBytesForCurrentThread();
        Assert.Equal(UnreadableReason.TooLarge, Assert.Throws<UnreadableException>(() => AssemblyImage.Open(path, CancellationToken.None)).Reason);
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 1L << 20);
    }

    [Fact]
    public async Task No_table_is_an_error_unless_allowed()
    {
        using Folder folder = new();
        string path = folder.Add("Empty.dll", FixtureCompiler.Compile("class T { }"));
        await AssertOneLine("holds no table", "verify", path);
        await AssertOneLine("no table was found", "verify", folder.Path);
        Assert.Equal(0, (await CommandLine.RunAsync("verify", path, "--allow-empty")).ExitCode);
        Assert.Equal(0, (await CommandLine.RunAsync("verify", folder.Path, "--allow-empty")).ExitCode);

        // A named assembly without a table is not hidden by another one that has some.
        Assert.Equal(2, (await CommandLine.RunAsync("verify", path, folder.Add("Boat.dll", Boat))).ExitCode);
    }

    [Theory]
    [InlineData]
    [InlineData("verify")]
    [InlineData("verify", "")]
    [InlineData("verify", "x.dll", "--nonsense")]
    [InlineData("verify", "x.dll", "--json")]
    [InlineData("verify", "x.dll", "--json", "a", "--sarif", "a")]
    [InlineData("nonsense")]
    public async Task Bad_usage_is_one_line(params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(arguments);
        Assert.Equal(2, run.ExitCode);
        if (arguments.Length > 0)
        {
            Assert.Single(run.Messages.TrimEnd().Split('\n'));
        }
    }

    [Fact]
    public async Task Help_has_an_example_for_each_verb()
    {
        Run all = await CommandLine.RunAsync("--help");
        Assert.Equal(0, all.ExitCode);
        string[] verbs = [.. all.Results.Split("COMMANDS:")[1].Split('\n').Where(line => line.StartsWith("    ", StringComparison.Ordinal)).Select(line => line.Trim().Split(' ')[0])];
        Assert.Contains("verify", verbs);
        foreach (string verb in verbs)
        {
            Run help = await CommandLine.RunAsync(verb, "--help");
            Assert.Equal(0, help.ExitCode);
            Assert.Contains("EXAMPLES:", help.Results, StringComparison.Ordinal);
            Assert.Contains($"    gaussgen {verb} ", help.Results, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task Quiet_says_nothing_but_what_is_wrong()
    {
        using Folder folder = new();
        Run good = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", Boat), "--quiet");
        Assert.Equal(new Run(0, "", ""), good);
        Run bad = await CommandLine.RunAsync("verify", folder.Add("Bad.dll", FixtureCompiler.Compile(ThreePoints("0.5"))), "-q");
        Assert.Equal(1, bad.ExitCode);
        Assert.Contains("GAUSS901", Assert.Single(bad.Results.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_same_input_gives_the_same_output()
    {
        using Folder folder = new();
        for (int i = 0; i < 8; i++)
        {
            _ = folder.Add($"{i}/Boat.dll", Boat);
        }

        Run first = await CommandLine.RunAsync("verify", folder.Path);
        Assert.Equal(first, await CommandLine.RunAsync("verify", folder.Path));
        int[] places = [.. Enumerable.Range(0, 8).Select(i => first.Results.IndexOf(folder.Below($"{i}/Boat.dll"), StringComparison.Ordinal))];
        Assert.DoesNotContain(-1, places);
        Assert.Equal(places.Order(), places);
    }

    [Fact]
    public async Task Output_that_is_no_terminal_has_no_escapes_and_keeps_lines_whole()
    {
        using Folder folder = new();
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", Boat));
        Assert.DoesNotContain('\u001b', run.Results);
        Assert.Contains(run.Results.Split('\n'), line =>
            line.Contains("SurveyBoat.Seven", StringComparison.Ordinal) && line.Contains("7 points, weight exp(−x²)", StringComparison.Ordinal)
            && line.Contains("binary32", StringComparison.Ordinal));
    }

    [Fact]
    public async Task Names_cannot_reach_the_terminal_as_control_sequences()
    {
        using Folder folder = new();
        Run run = await CommandLine.RunAsync("verify", folder.Add("Boat.dll", FixtureCompiler.Compile("class T { }")), folder.Below("no\u001b[31m\nsuch.dll"));
        Assert.DoesNotContain('\u001b', run.Messages);
        Assert.Equal(2, run.Messages.TrimEnd().Split('\n').Length);
    }

    [Fact]
    public async Task An_interrupted_run_says_so_and_leaves_no_file()
    {
        using Folder folder = new();
        string path = folder.Add("Boat.dll", Boat);
        using CancellationTokenSource interruption = new();
        await interruption.CancelAsync();
        Run run = await CommandLine.RunAsync(interruption.Token, "verify", path, "--json", folder.Below("out.json"));
        Assert.Equal(130, run.ExitCode);
        Assert.Single(run.Messages.TrimEnd().Split('\n'));
        Assert.Equal([path], Directory.GetFiles(folder.Path));
    }

    private static string ThreePoints(string middleWeight) => $$"""
        using System; using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(3)] static class Three
            {
                public const int PointCount = 3;
                public const int DegreeOfExactness = 5;
                public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, 1.7320508075688772 };
                public static ReadOnlySpan<double> Weights => new double[] { 0.16666666666666666, {{middleWeight}}, 0.16666666666666666 };
            }
        }
        """;

    private static async Task AssertOneLine(string contained, params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(arguments);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains(contained, Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }
}
