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
    [InlineData("name an assembly, or describe a table with --rule, --moments or --sequence")]
    [InlineData("name an assembly, or describe", "")]
    [InlineData("not both", "x.dll", "--rule", "gauss-hermite", "--points", "3")]
    [InlineData("--rule and --moments describe different tables; give one of them", "--rule", "gauss-hermite", "--moments", "normal")]
    [InlineData("--moments and --sequence describe different tables; give one of them", "--moments", "normal", "--sequence", "half-integer-gamma")]
    [InlineData("--rule gauss is unknown; choose gauss-even-exponential, gauss-generalized-hermite, gauss-half-range-hermite, gauss-hermite, gauss-log-normal, gauss-normal-mixture, gauss-truncated-normal or nested-hermite", "--rule", "gauss", "--points", "3")]
    [InlineData("--moments gamma is unknown; choose even-exponential, half-normal, log-normal, normal or truncated-normal", "--moments", "gamma")]
    [InlineData("--sequence gamma is unknown; choose half-integer-gamma or oscillator-matrix-elements", "--sequence", "gamma")]
    [InlineData("--rule gauss-hermite needs --points, a whole number", "--rule", "gauss-hermite")]
    [InlineData("--points 0: a Gauss–Hermite rule must have from 1 to 1000 points", "--rule", "gauss-hermite", "--points", "0")]
    [InlineData("--points 1001: a Gauss–Hermite rule must have from 1 to 1000 points", "--rule", "gauss-hermite", "--points", "1001")]
    [InlineData("--points must be a whole number, not 2.5", "--rule", "gauss-hermite", "--points", "2.5")]
    [InlineData("--points must be a whole number, not 99999999999", "--rule", "gauss-hermite", "--points", "99999999999")]
    [InlineData("--convention other is unknown; choose probabilist or physicist", "--rule", "gauss-hermite", "--points", "3", "--convention", "other")]
    [InlineData("--format binary16 is unknown; choose binary64 or binary32", "--rule", "gauss-hermite", "--points", "3", "--format", "binary16")]
    [InlineData("--mean is no option of --rule gauss-hermite, which has --points, --convention, --drop-zero-weights, --error-estimate, --format; leave it out", "--rule", "gauss-hermite", "--points", "3", "--mean", "1")]
    [InlineData("--drop-zero-weights describes a table that is made with --rule, --moments or --sequence; name one, or leave --drop-zero-weights out", "x.dll", "--drop-zero-weights")]
    [InlineData("--format describes a table that is made with --rule, --moments or --sequence", "x.dll", "--format", "binary32")]
    [InlineData("--moments normal needs --standard-deviation, a number", "--moments", "normal", "--mean", "1")]
    [InlineData("--moments normal needs --mean, a number", "--moments", "normal", "--standard-deviation", "1")]
    [InlineData("--standard-deviation 0: the standard deviation must be finite and above zero", "--moments", "normal", "--mean", "1", "--standard-deviation", "0")]
    [InlineData("--mean must be a finite number such as 0.25 or 1.5e-3, not 1,5", "--moments", "normal", "--mean", "1,5", "--standard-deviation", "1")]
    [InlineData("--mean must be a finite number", "--moments", "normal", "--mean", "1e999", "--standard-deviation", "1")]
    [InlineData("--mean must be a finite number such as 0.25 or 1.5e-3, not -infinity", "--moments", "normal", "--mean", "-infinity", "--standard-deviation", "1")]
    [InlineData("--maximum-order 201: the highest order must be from 0 to 200", "--moments", "normal", "--mean", "1", "--standard-deviation", "1", "--maximum-order", "201")]
    [InlineData("--points 65: the number of points must be from 1 to 64", "--rule", "gauss-half-range-hermite", "--points", "65")]
    [InlineData("--upper -1: the lower end must be below the upper end", "--rule", "gauss-truncated-normal", "--points", "5", "--lower", "2", "--upper", "-1")]
    [InlineData("the lower end must be below the upper end, and one of them finite", "--rule", "gauss-truncated-normal", "--points", "5")]
    [InlineData("--lower must be a number such as -0.25 or 1.5e-3, or left out where there is no end, not 1e999", "--rule", "gauss-truncated-normal", "--points", "5", "--lower", "1e999")]
    [InlineData("The interval has a probability below 2^-1022; choose one that is wider or nearer to the mean", "--rule", "gauss-truncated-normal", "--points", "5", "--lower", "40")]
    [InlineData("--exponent -0.5: the exponent must be above -0.5", "--rule", "gauss-generalized-hermite", "--points", "5", "--exponent", "-0.5")]
    [InlineData("--rule gauss-log-normal needs --log-mean, a number", "--rule", "gauss-log-normal", "--points", "5")]
    [InlineData("--log-standard-deviation -1: the standard deviation of the logarithm must be finite and above zero", "--rule", "gauss-log-normal", "--points", "5", "--log-mean", "0", "--log-standard-deviation", "-1")]
    [InlineData("ask for fewer points or a smaller log-standard-deviation", "--rule", "gauss-log-normal", "--points", "64", "--log-mean", "0", "--log-standard-deviation", "1")]
    [InlineData("--rule gauss-normal-mixture needs --weights, numbers with commas between them", "--rule", "gauss-normal-mixture", "--points", "5")]
    [InlineData("--weights must be finite numbers with commas between them, such as 0.25,-1.5e-3,2, not 0.5;0.5", "--rule", "gauss-normal-mixture", "--points", "5", "--weights", "0.5;0.5")]
    [InlineData("--weights must be finite numbers with commas between them, such as 0.25,-1.5e-3,2, not 0.5,", "--rule", "gauss-normal-mixture", "--points", "5", "--weights", "0.5,")]
    [InlineData("--weights 1,-1: the weights must be finite and not negative, and at least one of them above zero", "--rule", "gauss-normal-mixture", "--points", "5", "--weights", "1,-1", "--means", "0,1", "--standard-deviations", "1,1")]
    [InlineData("must be as many as each other", "--rule", "gauss-normal-mixture", "--points", "5", "--weights", "1,1", "--means", "0", "--standard-deviations", "1,1")]
    [InlineData("--coefficients 1,-1: give from 1 to 8 finite coefficients, the last one above zero", "--rule", "gauss-even-exponential", "--points", "5", "--coefficients", "1,-1")]
    [InlineData("--level 5: ", "--rule", "nested-hermite", "--level", "5")]
    [InlineData("--scale 0: ", "--moments", "half-normal", "--scale", "0")]
    [InlineData("--upper 1: ", "--moments", "truncated-normal", "--mean", "0", "--standard-deviation", "1", "--lower", "1", "--upper", "1")]
    [InlineData("--maximum-order 101: ", "--moments", "log-normal", "--log-mean", "0", "--log-standard-deviation", "0.1", "--maximum-order", "101")]
    [InlineData("--coefficients 0: ", "--moments", "even-exponential", "--coefficients", "0")]
    [InlineData("--sequence half-integer-gamma needs --maximum-order, a whole number", "--sequence", "half-integer-gamma")]
    [InlineData("--maximum-order -1: ", "--sequence", "half-integer-gamma", "--maximum-order", "-1")]
    [InlineData("is too large for binary32; ask for less, or choose another --format", "--sequence", "half-integer-gamma", "--maximum-order", "60", "--format", "binary32")]
    [InlineData("--size 0: the number of states must be from 1 to 64", "--sequence", "oscillator-matrix-elements", "--size", "0", "--power", "1")]
    [InlineData("--power -1: the power must be from 0 to 64", "--sequence", "oscillator-matrix-elements", "--size", "3", "--power", "-1")]
    [InlineData("--error-estimate is no option of --sequence half-integer-gamma, which has --maximum-order, --format; leave it out", "--sequence", "half-integer-gamma", "--maximum-order", "3", "--error-estimate")]
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
