using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Tests.Fixtures;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Tool.Tests.Baselines;

/// <summary>A baseline as a reviewer and a build server meet it.</summary>
public sealed class BaselineTests : IDisposable
{
    private const string Header =
        "# gaussgen baseline 1: one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>\n";

    private static readonly byte[] Boat = FixtureCompiler.Generate(Sources.Small);

    private readonly Folder _folder = new();

    private string File => _folder.Below("gaussgen.baseline");

    [Fact]
    public async Task The_file_is_small_sorted_text_with_digests_that_anyone_can_compute()
    {
        const string Source = """
            using GaussGen;
            namespace SurveyBoat
            {
                [NormalMoments(1.5, 0.25, MaximumOrder = 1, Format = NumberFormat.Binary32)] static partial class Wind { }
                static partial class Outer { [GaussHermite(2)] internal static partial class Two { public const int Unrelated = 7; } }
            }
            """;
        await WriteAsync(_folder.Add("Boat.dll", FixtureCompiler.Generate(Source)));

        // 1, 1.5, 0.25·√(2/π) = 0.19947114; the last one rounds to 0x3E4C42294 (recomputed with exact fractions and 40 digits of π).
        string two = Digest(
            "DegreeOfExactness int32 00000003", "Nodes[0] binary64 bff0000000000000", "Nodes[1] binary64 3ff0000000000000",
            "PointCount int32 00000002", "Weights[0] binary64 3fe0000000000000", "Weights[1] binary64 3fe0000000000000");
        string wind = Digest(
            "Absolute[0] binary32 3f800000", "Absolute[1] binary32 " + Odd(), "Absolute0 binary32 3f800000", "Absolute1 binary32 " + Odd(),
            "Central[0] binary32 3f800000", "Central[1] binary32 00000000", "Central0 binary32 3f800000", "Central1 binary32 00000000",
            "Raw[0] binary32 3f800000", "Raw[1] binary32 3fc00000", "Raw0 binary32 3f800000", "Raw1 binary32 3fc00000");
        Assert.Equal(
            Header
            + $"Boat | SurveyBoat.Outer.Two | GaussHermite | Gauss–Hermite rule with 2 points, standard normal density | binary64 | {two}\n"
            + $"Boat | SurveyBoat.Wind | NormalMoments | Moments to order 1 of the normal distribution with mean 1.5 and standard deviation 0.25 | binary32 | {wind}\n",
            Encoding.UTF8.GetString(await System.IO.File.ReadAllBytesAsync(File)));

        static string Odd() => BitConverter.SingleToUInt32Bits((float)(0.25 * Math.Sqrt(2 / Math.PI))).ToString("x8", CultureInfo.InvariantCulture);
        static string Digest(params string[] lines) =>
            "sha256:" + Convert.ToHexString(SHA256.HashData(Encoding.ASCII.GetBytes(string.Join('\n', lines) + "\n"))).ToLowerInvariant();
    }

    [Fact]
    public async Task Neither_framework_nor_optimization_nor_place_nor_order_changes_it()
    {
        string source = Sources.Small;
        string[] tables = [.. source.Split('\n').Where(line => line.Contains("partial", StringComparison.Ordinal) && line.EndsWith('}')).Reverse()];
        string six = Assert.Single(tables, table => table.Contains("Six", StringComparison.Ordinal));
        string reversed = $"using GaussGen; namespace SurveyBoat {{ partial class Outer {{ {six} }} {string.Concat(tables.Where(table => table != six))} }}";
        await WriteAsync(_folder.Add("a/Boat.dll", FixtureCompiler.Generate(source)));
        byte[] first = await System.IO.File.ReadAllBytesAsync(File);
        string[] others =
        [
            _folder.Add("b/Boat.dll", FixtureCompiler.Generate(reversed, Framework.NetStandard2)),
            _folder.Add("c/Renamed.dll", FixtureCompiler.Generate(source, Framework.Net8, OptimizationLevel.Debug)),
            _folder.Add("d/Boat.exe", FixtureCompiler.Generate(source, Framework.NetStandard2, OptimizationLevel.Debug)),
        ];
        foreach (string other in others)
        {
            await WriteAsync(other);
            Assert.Equal(first, await System.IO.File.ReadAllBytesAsync(File));
        }

        await WriteAsync(_folder.Path);
        Assert.Equal(first, await System.IO.File.ReadAllBytesAsync(File));
        Assert.Equal(new Run(0, $"As in {File}: 14 tables.\n", ""), await CheckAsync(_folder.Path));
    }

    [Fact]
    public async Task What_was_added_removed_or_changed_is_one_line_each()
    {
        string path = _folder.Add("Boat.dll", Boat);
        await WriteAsync(path);
        string changed = Sources.Small
            .Replace("[GaussHermite(1)] public static partial class One { }", "", StringComparison.Ordinal)
            .Replace("[GaussHermite(5)]", "[GaussHermite(6)]", StringComparison.Ordinal)
            .Replace("[GaussHermite(9)]", "[GaussHermite(9, Format = NumberFormat.Binary32)]", StringComparison.Ordinal)
            + "[GaussHermite(3)] static partial class Three { }";
        _ = _folder.Add("Boat.dll", FixtureCompiler.Generate(changed));
        Run run = await CheckAsync(path);
        Assert.Equal(1, run.ExitCode);
        Assert.Equal("", run.Messages);
        string[] lines = run.Results.TrimEnd().Split('\n');
        Assert.Equal(5, lines.Length);
        Assert.StartsWith($"{path}: changed SurveyBoat.Five: claim \"Gauss–Hermite rule with 5 points, standard normal density\" is now \"Gauss–Hermite rule with 6 points, standard normal density\"; data sha256:", lines[0], StringComparison.Ordinal);
        Assert.StartsWith($"{path}: changed SurveyBoat.Nine: format binary64 is now binary32; data sha256:", lines[1], StringComparison.Ordinal);
        Assert.Equal($"{File}: removed SurveyBoat.One of Boat: Gauss–Hermite rule with 1 point, standard normal density, binary64", lines[2]);
        Assert.Equal($"{path}: added Three: Gauss–Hermite rule with 3 points, standard normal density, binary64", lines[3]);
        Assert.Equal($"Not as in {File}: 1 added, 1 removed, 2 changed. After a review, renew it with gaussgen baseline write.", lines[4]);

        Run quiet = await CommandLine.RunAsync("baseline", "check", path, "--file", File, "-q");
        Assert.Equal(new Run(1, string.Join('\n', lines[..4]) + "\n", ""), quiet);

        Run renewed = await CommandLine.RunAsync("baseline", "write", path, "--file", File);
        Assert.Equal(0, renewed.ExitCode);
        Assert.EndsWith($"Wrote {File}: 14 tables, 1 added, 1 removed, 2 changed.\n", renewed.Results, StringComparison.Ordinal);
        Assert.Equal(0, (await CheckAsync(path)).ExitCode);
    }

    [Fact]
    public async Task Each_single_bit_of_a_table_is_noticed()
    {
        string path = _folder.Add("Boat.dll", Boat);
        await WriteAsync(path);
        ImagePlaces places = new(Boat);
        Place[] all = [.. places.Data, .. places.Constants];
        Random random = new(271828);
        Assert.NotEmpty(all);
        foreach (Place place in all)
        {
            byte[] flipped = [.. Boat];
            int bit = random.Next(8 * place.Length);
            flipped[place.Offset + (bit / 8)] ^= (byte)(1 << (bit % 8));
            Run run = await CheckAsync(_folder.Add("Boat.dll", flipped));
            Assert.True(run.ExitCode == 1, $"bit {bit} at {place} went unnoticed: {run}");
            Assert.Contains("changed", run.Results, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task A_table_of_an_assembly_that_was_not_looked_at_is_said_to_be_so()
    {
        string boat = _folder.Add("Boat.dll", Boat);
        string bench = _folder.Add("Bench.dll", FixtureCompiler.Compile(Three("0.5"), name: "Bench"));
        await WriteAsync(boat, bench);
        Run run = await CheckAsync(boat);
        Assert.Equal(1, run.ExitCode);
        Assert.StartsWith($"{File}: removed SurveyBoat.Three of Bench: ", run.Results, StringComparison.Ordinal);
        Assert.Contains("; no assembly Bench was looked at\n", run.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Copies_that_differ_are_not_written_and_are_not_missed()
    {
        string one = _folder.Add("a/Boat.dll", FixtureCompiler.Compile(Three("0.5")));
        await WriteAsync(one);
        string other = _folder.Add("b/Boat.dll", FixtureCompiler.Compile(Three("0.6")));
        Run write = await CommandLine.RunAsync("baseline", "write", _folder.Path, "--file", File);
        Assert.Equal(2, write.ExitCode);
        Assert.Contains($"is not the same in {one} and in {other}", write.Messages, StringComparison.Ordinal);
        Run check = await CheckAsync(_folder.Path);
        Assert.Equal(1, check.ExitCode);
        Assert.StartsWith($"{other}: changed SurveyBoat.Three: data ", check.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task What_cannot_be_read_is_not_taken_for_removed_and_nothing_is_written()
    {
        string path = _folder.Add("Boat.dll", Boat);
        await WriteAsync(path);
        byte[] before = await System.IO.File.ReadAllBytesAsync(File);
        _ = _folder.Add("Boat.dll", Boat[..1000]);
        Run check = await CheckAsync(path);
        Assert.Equal(2, check.ExitCode);
        Assert.Equal("", check.Results);
        Assert.Single(check.Messages.TrimEnd().Split('\n'));
        Run write = await CommandLine.RunAsync("baseline", "write", path, "--file", File);
        Assert.Equal(2, write.ExitCode);
        Assert.Contains("was not written", write.Messages, StringComparison.Ordinal);
        Assert.Equal(before, await System.IO.File.ReadAllBytesAsync(File));
    }

    [Theory]
    [InlineData("[GaussHermite(3)] class T { public static ReadOnlySpan<double> Nodes => new[] { Math.Sqrt(3) }; }", "Nodes cannot be read")]
    [InlineData("[GaussHermite(3)] class T { public static ReadOnlySpan<double> Nodes => new double[] { 0 }; }", "Weights is missing")]
    [InlineData("[GaussHermite(0)] class T { }", "from 1 to 1000")]
    [InlineData("class T { }", "holds no table")]
    public async Task A_table_that_cannot_be_read_is_said(string type, string reason)
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Compile("using System; using GaussGen; " + type));
        Run run = await CommandLine.RunAsync("baseline", "write", path, "--file", File);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains(reason, run.Results + run.Messages, StringComparison.Ordinal);
        Assert.False(System.IO.File.Exists(File));
    }

    [Fact]
    public async Task Nothing_can_be_a_baseline_if_one_says_so()
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Compile("class T { }"));
        Run run = await CommandLine.RunAsync("baseline", "write", path, "--file", File, "--allow-empty");
        Assert.Equal(new Run(0, $"Wrote {File}: 0 tables.\n", ""), run);
        Assert.Equal(Header, await System.IO.File.ReadAllTextAsync(File));
        Assert.Equal(2, (await CheckAsync(path)).ExitCode);
        Assert.Equal(0, (await CommandLine.RunAsync("baseline", "check", path, "--file", File, "--allow-empty")).ExitCode);
    }

    [Fact]
    public async Task Without_a_name_the_file_is_gaussgen_baseline_where_one_stands()
    {
        Run run = await CommandLine.RunAsync("baseline", "check", _folder.Add("Boat.dll", Boat));
        Assert.Equal(2, run.ExitCode);
        Assert.Equal("gaussgen: error: gaussgen.baseline does not exist; name the baseline with --file, or write it with gaussgen baseline write\n", run.Messages);
    }

    [Fact]
    public async Task Names_cannot_break_the_lines_or_the_columns()
    {
        byte[] image = FixtureCompiler.Compile(Three("0.5"), name: "Boat | x\u001b[31m\u2028 Größe");
        await WriteAsync(_folder.Add("Boat.dll", image));
        string line = (await System.IO.File.ReadAllLinesAsync(File))[1];
        Assert.StartsWith("Boat \\u007c x\\u001b[31m\\u2028 Größe | SurveyBoat.Three | ", line, StringComparison.Ordinal);
        Assert.Equal(0, (await CheckAsync(_folder.Below("Boat.dll"))).ExitCode);
    }

    [Fact]
    public async Task An_interrupted_run_leaves_the_old_file()
    {
        string path = _folder.Add("Boat.dll", Boat);
        await System.IO.File.WriteAllTextAsync(File, Header);
        using CancellationTokenSource interruption = new();
        await interruption.CancelAsync();
        Assert.Equal(130, (await CommandLine.RunAsync(interruption.Token, "baseline", "write", path, "--file", File)).ExitCode);
        Assert.Equal(Header, await System.IO.File.ReadAllTextAsync(File));
        Assert.Equal(2, Directory.GetFiles(_folder.Path).Length);
    }

    [Theory]
    [InlineData("baseline")]
    [InlineData("baseline", "write")]
    [InlineData("baseline", "check", "")]
    [InlineData("baseline", "check", "x.dll", "--file", "")]
    [InlineData("baseline", "check", "x.dll", "--file")]
    [InlineData("baseline", "mend", "x.dll")]
    public async Task Bad_usage_ends_with_2(params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(arguments);
        Assert.Equal(2, run.ExitCode);
        Assert.True(run.Messages.Length == 0 || run.Messages.TrimEnd().Split('\n').Length == 1, run.Messages);
    }

    public void Dispose() => _folder.Dispose();

    private static string Three(string middleWeight) => $$"""
        using System; using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(3)] static class Three
            {
                public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, 1.7320508075688772 };
                public static ReadOnlySpan<double> Weights => new double[] { 0.16666666666666666, {{middleWeight}}, 0.16666666666666666 };
            }
        }
        """;

    private Task<Run> CheckAsync(params string[] paths) => CommandLine.RunAsync(["baseline", "check", .. paths, "--file", File]);

    private async Task WriteAsync(params string[] paths)
    {
        Run run = await CommandLine.RunAsync(["baseline", "write", .. paths, "--file", File]);
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.Contains($"Wrote {File}: ", run.Results, StringComparison.Ordinal);
    }
}
