using System;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Output;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Explanations;

/// <summary>One table on a page, as a reviewer sees it.</summary>
public sealed class ExplainTests : IDisposable
{
    private static readonly byte[] Boat = FixtureCompiler.Generate(Sources.Small);

    private readonly Folder _folder = new();

    [Fact]
    public async Task A_rule()
    {
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Boat.dll", Boat), "Five");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.StartsWith("SurveyBoat.Five, in Boat 0.0.0.0\nGauss–Hermite rule with 5 points, standard normal density\n\nDefinition   Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx", run.Results, StringComparison.Ordinal);
        Assert.Contains("\n             The n = 5 nodes xᵢ are the zeros of the Hermite polynomial He₅,\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("\nExactness    Exact for every polynomial up to degree 9, apart from rounding;\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("\nVerdict      Proven: 14 of 14 entries", run.Results, StringComparison.Ordinal);

        // The positive zeros of x⁵ − 10x³ + 15x and 8/15 (Abramowitz & Stegun 22.5.18 with table 22.12; weights and zeros recomputed from √(5 ± √10) at 40 digits).
        Assert.Contains("""

               i Nodes                    Weights
               2 0.0                      0.5333333333333333
                 0x0.0p+0                 0x1.1111111111111p-1
               3 1.355626179974266        0.22207592200561266
            """, run.Results, StringComparison.Ordinal);
        Assert.Contains("\n   4 2.8569700138728056       0.01125741132772069\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("\n     The nodes below 0 are the opposites of these, with the same weights.\n", run.Results, StringComparison.Ordinal);
        string[] equations = [.. run.Results.Split('\n').Where(line => line.EndsWith("  holds", StringComparison.Ordinal))];
        Assert.Equal(["   0", "   2", "   4", "   6", "   8"], equations.Select(line => line[..4]));
        Assert.Contains("\nWeights over their nodes\n", run.Results, StringComparison.Ordinal);
        Assert.Equal(5, run.Results.Count(letter => letter == '●'));
        AssertFits(run.Results);
    }

    [Fact]
    public async Task Moments()
    {
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Boat.dll", Boat), "SurveyBoat.Wind");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.Contains("m = 1.5, exactly 0x1.8p+0; s = 0.25, exactly 0x1.0p-2.\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("""

               i Raw                      Central                  Absolute
               0 1.0                      1.0                      1.0
                 0x1.0p+0                 0x1.0p+0                 0x1.0p+0
               1 1.5                      0.0                      0.19947114020071635
            """, run.Results, StringComparison.Ordinal);
        Assert.Contains("\nAbsolute moments by order, on a logarithmic scale\n", run.Results, StringComparison.Ordinal);
        Assert.DoesNotContain("Moment equations", run.Results, StringComparison.Ordinal);
        AssertFits(run.Results);
    }

    [Fact]
    public async Task Every_table_fits_on_a_page_of_80_columns()
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Small + Sources.Large.Replace("using GaussGen;", "", StringComparison.Ordinal)));
        string[] types = ["One", "Two", "Four", "Seven", "Nothing", "Drift", "SixtyFour", "SixtyThree", "Dropped"];
        foreach (string type in types)
        {
            Run run = await CommandLine.RunAsync("explain", path, type);
            Assert.Equal((0, ""), (run.ExitCode, run.Messages));
            AssertFits(run.Results);
            Assert.InRange(run.Results.Split('\n').Length, 30, 85);
        }
    }

    [Fact]
    public async Task A_terminal_that_knows_no_more_gets_ASCII()
    {
        using MemoryStream output = new();
        using StreamWriter results = new(output, Encoding.Latin1) { NewLine = "\n" };
        using StringWriter messages = new();
        Terminal terminal = Terminal.Of(results, messages);
        terminal.Results.Profile.Capabilities.Unicode = false;
        foreach (string type in new[] { "Five", "Seven", "Wind" })
        {
            Assert.Equal(0, await Application.RunAsync(["explain", _folder.Add("Boat.dll", Boat), type], terminal, CancellationToken.None));
        }

        await results.FlushAsync();
        string page = Encoding.Latin1.GetString(output.ToArray());
        Assert.All(page.Replace("\n", "", StringComparison.Ordinal), letter => Assert.InRange(letter, ' ', '~'));
        Assert.DoesNotContain('?', page);
        Assert.Contains("The n = 5 nodes x_i are the zeros of the Hermite polynomial He_5,", page, StringComparison.Ordinal);
        Assert.Contains("E f(X) ~ (1/sqrt(pi)) sum w_i f(m + sqrt(2) s x_i).", page, StringComparison.Ordinal);
        Assert.Contains("E X^k = sum k!/((k-2j)! j! 2^j) m^(k-2j) s^(2j) over 0 <= 2j\n             <= k.\n", page, StringComparison.Ordinal);
        AssertFits(page);
    }

    [Fact]
    public async Task A_long_table_is_cut_unless_one_wants_all()
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Large));
        Run cut = await CommandLine.RunAsync("explain", path, "SixtyFour");
        Assert.Contains("\n     … 26 more; --all shows them\n", cut.Results, StringComparison.Ordinal);
        Assert.Equal(["32", "33", "34", "61", "62", "63"], Indices(cut.Results));
        Run all = await CommandLine.RunAsync("explain", path, "SixtyFour", "--all");
        Assert.DoesNotContain("more", all.Results.Split("Moment equations")[0].Split("Nodes  ")[1], StringComparison.Ordinal);
        Assert.Equal(Enumerable.Range(0, 64).Select(index => $"{index}"), Indices(all.Results));

        static string[] Indices(string page) =>
            [.. page.Split("Nodes  ")[1].Split("Moment equations")[0].Split('\n').Select(line => line.Length > 4 ? line[..4].Trim() : "").Where(index => index.Length > 0)];
    }

    [Fact]
    public async Task What_is_not_proven_is_shown_with_what_is_wrong()
    {
        const string Bad = """
            using System; using GaussGen;
            [GaussHermite(3)] static class Three
            {
                public const int PointCount = 3;
                public const int DegreeOfExactness = 5;
                public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, 1.7320508075688774 };
                public static ReadOnlySpan<double> Weights => new double[] { 0.16666666666666666, double.NaN, 0.16666666666666666 };
            }
            """;
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Bad.dll", FixtureCompiler.Compile(Bad)));
        Assert.Equal((1, ""), (run.ExitCode, run.Messages));
        Assert.Contains("\nVerdict      WRONG: 6 of 8 entries are proven.\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("\n             Nodes[2]: expected 0x3FFBB67AE8584CAA (1.7320508075688772), found", run.Results, StringComparison.Ordinal);
        Assert.Contains(" 0x1.bb67ae8584cabp+0 !", run.Results, StringComparison.Ordinal);
        Assert.Contains(" NaN\n", run.Results, StringComparison.Ordinal);
        Assert.DoesNotContain("opposites", run.Results, StringComparison.Ordinal);
        AssertFits(run.Results);
    }

    [Fact]
    public async Task A_table_that_cannot_be_read_is_one_line()
    {
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Bad.dll", FixtureCompiler.Compile("[GaussGen.GaussHermite(0)] class T { }")));
        Assert.Equal((1, ""), (run.ExitCode, run.Messages));
        Assert.Contains("GAUSS903: T: ", Assert.Single(run.Results.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Two_tables_of_one_type_are_two_pages()
    {
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Boat.dll", FixtureCompiler.Generate("using GaussGen; [GaussHermite(3), NormalMoments(0, 1)] static partial class Both { }")));
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.Equal(2, run.Results.Split('\n').Count(line => line == "Both, in Boat 0.0.0.0"));
        Assert.Contains("\nGauss–Hermite rule with 3 points", run.Results, StringComparison.Ordinal);
        Assert.Contains("\nMoments to order 4", run.Results, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("name an assembly", "")]
    [InlineData("name a type after the assembly", "x.dll", "")]
    [InlineData("x.dll does not exist; check the path, or build first", "x.dll", "T")]
    [InlineData("or describe a table with --rule, --moments or --sequence", null)]
    [InlineData("not both", "x.dll", "--rule", "gauss-hermite", "--points", "3")]
    [InlineData("--points 0: ", "--rule", "gauss-hermite", "--points", "0")]
    public async Task A_mistake_is_one_line(string line, params string[]? arguments)
    {
        Run run = await CommandLine.RunAsync(["explain", .. arguments ?? []]);
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        Assert.Contains(line, Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public async Task One_of_several_tables_must_be_named()
    {
        Run run = await CommandLine.RunAsync("explain", _folder.Add("Boat.dll", Boat));
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        Assert.Contains("has several tables; name one of SurveyBoat.Drift, SurveyBoat.Eight, ", run.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Every_family_has_its_words()
    {
        string path = _folder.Add("All.dll", FixtureCompiler.Generate(Sources.All));
        Run json = await CommandLine.RunAsync("verify", path, "--json", _folder.Below("out.json"));
        Assert.Equal(0, json.ExitCode);
        string text = await File.ReadAllTextAsync(_folder.Below("out.json"));
        Assert.All(ClaimTable.Attributes, family => Assert.Contains($"\"attribute\": \"{family}\"", text, StringComparison.Ordinal));
        foreach (string type in Sources.TypesOf(Sources.All))
        {
            Run run = await CommandLine.RunAsync("explain", path, type);
            Assert.Equal((0, ""), (run.ExitCode, run.Messages));
            AssertFits(run.Results);
            Assert.Contains("\nVerdict      Proven: ", run.Results, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task Every_family_in_ASCII()
    {
        using MemoryStream output = new();
        using StreamWriter results = new(output, Encoding.Latin1) { NewLine = "\n" };
        using StringWriter messages = new();
        Terminal terminal = Terminal.Of(results, messages);
        terminal.Results.Profile.Capabilities.Unicode = false;
        string path = _folder.Add("All.dll", FixtureCompiler.Generate(Sources.Families));
        foreach (string type in Sources.TypesOf(Sources.Families))
        {
            Assert.Equal(0, await Application.RunAsync(["explain", path, type], terminal, CancellationToken.None));
        }

        await results.FlushAsync();
        string page = Encoding.Latin1.GetString(output.ToArray());
        Assert.All(page.Replace("\n", "", StringComparison.Ordinal), letter => Assert.InRange(letter, ' ', '~'));
        Assert.DoesNotContain('?', page);
        AssertFits(page);

        // A letter without a spelling would be an underscore where none belongs: not before a subscript.
        Assert.DoesNotMatch("(^|[ (])_|__", page);
    }

    [Fact]
    public async Task A_table_without_an_assembly()
    {
        Run run = await CommandLine.RunAsync("explain", "--moments", "normal", "--mean", "-0.5", "--standard-deviation", "3");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.StartsWith("normal_moments, in no assembly\nMoments to order 4 of the normal distribution with mean -0.5 and standard\ndeviation 3.0\n", run.Results, StringComparison.Ordinal);
        Assert.Contains("\n             m = -0.5, exactly -0x1.0p-1; s = 3.0, exactly 0x1.8p+1.\n", run.Results, StringComparison.Ordinal);
        AssertFits(run.Results);
    }

    public void Dispose() => _folder.Dispose();

    private static void AssertFits(string page) => Assert.All(page.Split('\n'), line => Assert.InRange(line.Length, 0, 80));
}
