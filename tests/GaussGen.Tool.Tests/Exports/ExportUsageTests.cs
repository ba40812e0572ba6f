using System;
using System.Threading.Tasks;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Exports;

/// <summary>Every mistake on the command line of the export is one line that says what to do.</summary>
public sealed class ExportUsageTests : IDisposable
{
    private readonly Folder _folder = new();

    [Theory]
    [InlineData("name an assembly, or describe a table with --rule or --moments")]
    [InlineData("name an assembly, or describe", "")]
    [InlineData("not both", "x.dll", "--rule", "gauss-hermite", "--points", "3")]
    [InlineData("give one of them", "--rule", "gauss-hermite", "--moments", "normal")]
    [InlineData("--rule gauss is unknown; choose gauss-hermite", "--rule", "gauss", "--points", "3")]
    [InlineData("--moments gamma is unknown; choose normal", "--moments", "gamma")]
    [InlineData("--rule gauss-hermite needs --points, a whole number from 1 to 1000", "--rule", "gauss-hermite")]
    [InlineData("--points must be a whole number from 1 to 1000, not 0", "--rule", "gauss-hermite", "--points", "0")]
    [InlineData("--points must be a whole number from 1 to 1000, not 1001", "--rule", "gauss-hermite", "--points", "1001")]
    [InlineData("--points must be a whole number from 1 to 1000, not 2.5", "--rule", "gauss-hermite", "--points", "2.5")]
    [InlineData("--points must be a whole number from 1 to 1000, not 99999999999", "--rule", "gauss-hermite", "--points", "99999999999")]
    [InlineData("--convention other is unknown; choose probabilist or physicist", "--rule", "gauss-hermite", "--points", "3", "--convention", "other")]
    [InlineData("--format binary16 is unknown; choose binary64 or binary32", "--rule", "gauss-hermite", "--points", "3", "--format", "binary16")]
    [InlineData("--mean belongs to --moments normal; leave it out", "--rule", "gauss-hermite", "--points", "3", "--mean", "1")]
    [InlineData("--drop-zero-weights belongs to --rule gauss-hermite; leave it out", "x.dll", "--drop-zero-weights")]
    [InlineData("--format belongs to --rule and --moments; leave it out", "x.dll", "--format", "binary32")]
    [InlineData("--moments normal needs --standard-deviation, a number", "--moments", "normal", "--mean", "1")]
    [InlineData("--moments normal needs --mean, a number", "--moments", "normal", "--standard-deviation", "1")]
    [InlineData("--standard-deviation must be above zero, not 0", "--moments", "normal", "--mean", "1", "--standard-deviation", "0")]
    [InlineData("--mean must be a finite number such as 0.25 or 1.5e-3, not 1,5", "--moments", "normal", "--mean", "1,5", "--standard-deviation", "1")]
    [InlineData("--mean must be a finite number", "--moments", "normal", "--mean", "1e999", "--standard-deviation", "1")]
    [InlineData("--maximum-order must be a whole number from 0 to 200, not 201", "--moments", "normal", "--mean", "1", "--standard-deviation", "1", "--maximum-order", "201")]
    [InlineData("a moment of order 37 is too large for binary32; choose a --maximum-order below 37, or another --format", "--moments", "normal", "--mean", "10", "--standard-deviation", "1", "--maximum-order", "60", "--format", "binary32")]
    [InlineData("--as xml is unknown; choose c, csv or json", "x.dll", "--as", "xml")]
    [InlineData("the ending of tables.txt is none of .h, .csv and .json; say what to write with --as", "x.dll", "--output", "tables.txt")]
    [InlineData("name a file after --output, or leave it out", "x.dll", "--output", "")]
    [InlineData("--prefix must be a letter and then letters, digits and underscores", "x.dll", "--prefix", "_boat")]
    [InlineData("--prefix must be a letter", "x.dll", "--prefix", "bo-at")]
    [InlineData("--prefix is for C names; leave it out, or add --as c", "x.dll", "--prefix", "boat_", "--as", "csv")]
    [InlineData("name a type after the assembly, or leave it out for all", "x.dll", "")]
    [InlineData("x.dll does not exist; check the path, or build first", "x.dll")]
    public async Task A_mistake_is_one_line(string line, params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(["export", .. arguments]);
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        string message = Assert.Single(run.Messages.TrimEnd().Split('\n'));
        Assert.Contains(line, message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Files_that_are_no_assembly_or_have_no_table()
    {
        await AssertOneLine(" is a folder; name one assembly", _folder.Path);
        await AssertOneLine(" is no executable image; name a .NET assembly", _folder.Add("text.dll", [65, 66, 67]));
        await AssertOneLine(" holds no table; name an assembly with a table attribute", _folder.Add("none.dll", FixtureCompiler.Compile("class T { }")));
        await AssertOneLine("cannot be written", _folder.Add("one.dll", FixtureCompiler.Generate("[GaussGen.GaussHermite(1)] partial class T { }")), "-o", _folder.Below("none/t.h"));
    }

    public void Dispose() => _folder.Dispose();

    private static async Task AssertOneLine(string contained, params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(["export", .. arguments]);
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        Assert.Contains(contained, Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }
}
