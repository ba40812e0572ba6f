using System;
using System.Linq;
using System.Text;
using System.Threading.Tasks;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Baselines;

/// <summary>Files in the place of a baseline that are none, or no longer: each is named with its line, and none is written over.</summary>
public sealed class BaselineFormatTests : IDisposable
{
    private const string Header =
        "# gaussgen baseline 1: one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>\n";

    private const string Line =
        "Boat | A | GaussHermite | c | binary64 | sha256:0123456789abcdef0123456789abcdef0123456789abcdef0123456789abcdef\n";

    private static readonly byte[] Boat = FixtureCompiler.Generate("[GaussGen.GaussHermite(2)] static partial class A { }");

    private readonly Folder _folder = new();

    private string File => _folder.Below("gaussgen.baseline");

    [Theory]
    [InlineData("# Notes\n", 1, "does not begin a baseline")]
    [InlineData("# gaussgen baseline one\n", 1, "does not begin a baseline")]
    [InlineData("# gaussgen baseline 2: more\n", 1, "says format 2 and this version knows 1")]
    [InlineData("# gaussgen baseline 1: hand-made\n", 1, "is not the first line of a baseline any more")]
    [InlineData(Header + "<<<<<<< HEAD\n" + Line, 2, "is not as a line of a baseline is")]
    [InlineData(Header + Line + "# a remark\n", 3, "is not as a line of a baseline is")]
    [InlineData(Header + "Boat | A | GaussHermite | c | binary64\n", 2, "is not as a line of a baseline is")]
    [InlineData(Header + "Boat |  | GaussHermite | c | binary64 | sha256:0123456789abcdef0123456789abcdef0123456789abcdef0123456789abcdef\n", 2, "is not as a line of a baseline is")]
    [InlineData(Header + "Boat | A | GaussHermite | c | binary64 | sha256:0123\n", 2, "is not as a line of a baseline is")]
    [InlineData(Header + "Boat | A | GaussHermite | c | binary64 | sha256:0123456789ABCDEF0123456789abcdef0123456789abcdef0123456789abcdef\n", 2, "is not as a line of a baseline is")]
    [InlineData(Header + "\n" + Line + Line, 4, "names A again, after line 3")]
    public async Task A_malformed_file_is_named_with_its_line_and_kept(string content, int line, string reason)
    {
        _ = _folder.Add("gaussgen.baseline", Encoding.UTF8.GetBytes(content));
        foreach (string verb in new[] { "check", "write" })
        {
            Run run = await CommandLine.RunAsync("baseline", verb, _folder.Add("Boat.dll", Boat), "--file", File);
            Assert.Equal(2, run.ExitCode);
            string message = Assert.Single(run.Messages.TrimEnd().Split('\n'));
            Assert.StartsWith($"gaussgen: error: {File}({line}): the line {reason}", message, StringComparison.Ordinal);
            Assert.Equal(content, await System.IO.File.ReadAllTextAsync(File));
        }
    }

    [Fact]
    public async Task Bytes_that_are_no_text_are_named_with_their_line()
    {
        _ = _folder.Add("gaussgen.baseline", [.. Encoding.UTF8.GetBytes(Header + Line), 0x42, 0xFF, 0x0A]);
        Run run = await CommandLine.RunAsync("baseline", "check", _folder.Add("Boat.dll", Boat), "--file", File);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("(3): the line is not UTF-8 text", run.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task An_empty_file_is_an_error_and_kept()
    {
        _ = _folder.Add("gaussgen.baseline", []);
        foreach (string verb in new[] { "check", "write" })
        {
            Run run = await CommandLine.RunAsync("baseline", verb, _folder.Add("Boat.dll", Boat), "--file", File);
            Assert.Equal(2, run.ExitCode);
            Assert.Contains(" is empty, or no regular file", Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
            Assert.Empty(await System.IO.File.ReadAllBytesAsync(File));
        }
    }

    [Fact]
    public async Task A_folder_in_the_place_of_the_file_is_an_error()
    {
        Run run = await CommandLine.RunAsync("baseline", "check", _folder.Add("Boat.dll", Boat), "--file", _folder.Path);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("is a folder", Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public async Task What_checkouts_and_editors_do_to_a_text_file_changes_nothing()
    {
        string path = _folder.Add("Boat.dll", Boat);
        Assert.Equal(0, (await CommandLine.RunAsync("baseline", "write", path, "--file", File)).ExitCode);
        string text = await System.IO.File.ReadAllTextAsync(File);
        Assert.DoesNotContain('\r', text);
        string[] variants =
        [
            text.Replace("\n", "\r\n", StringComparison.Ordinal),
            text.TrimEnd(),
            "\uFEFF" + text,
            text + "\n\n",
        ];
        foreach (string variant in variants)
        {
            await System.IO.File.WriteAllTextAsync(File, variant);
            Run run = await CommandLine.RunAsync("baseline", "check", path, "--file", File);
            Assert.True(run.ExitCode == 0, run.Messages + run.Results);
        }
    }

    [Fact]
    public void Hostile_text_is_refused_and_not_crashed_on()
    {
        byte[] good = Encoding.UTF8.GetBytes(Header + Line + Line.Replace("| A |", "| B |", StringComparison.Ordinal));
        Random random = new(314159);
        int refused = 0;
        for (int i = 0; i < 5_000; i++)
        {
            byte[] bad = [.. good.Take(i % 2 == 0 ? good.Length : random.Next(good.Length))];
            for (int flips = random.Next(4); flips >= 0 && bad.Length > 0; flips--)
            {
                bad[random.Next(bad.Length)] ^= (byte)(1 << random.Next(8));
            }

            try
            {
                _ = GaussGen.Tool.Baselines.Baseline.Parse(bad, "x");
            }
            catch (GaussGen.Tool.Output.InputException error)
            {
                refused++;
                Assert.DoesNotContain('\n', error.Message);
            }
        }

        Assert.InRange(refused, 4_000, 5_000);
    }

    public void Dispose() => _folder.Dispose();
}
