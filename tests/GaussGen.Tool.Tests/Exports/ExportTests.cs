using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json.Nodes;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Exports;

/// <summary>Tables for programs that are not .NET, each compared with what the compiled assembly itself hands out.</summary>
public sealed class ExportTests : IDisposable
{
    private static readonly byte[] Boat = FixtureCompiler.Generate(Sources.Small);

    private static readonly (string Type, string ReflectionName, string[] Members)[] Tables =
    [
        .. new[] { "One", "Two", "Five", "Four", "Seven", "Eight", "Nine", "Ten", "Eleven", "Twelve" }
            .Select(name => ($"SurveyBoat.{name}", $"SurveyBoat.{name}", new[] { "Nodes", "Weights" })),
        ("SurveyBoat.Outer.Six", "SurveyBoat.Outer+Six", ["Nodes", "Weights"]),
        .. new[] { "Wind", "Drift", "Nothing" }.Select(name => ($"SurveyBoat.{name}", $"SurveyBoat.{name}", new[] { "Raw", "Central", "Absolute" })),
    ];

    private readonly Folder _folder = new();

    private string Assembly => _folder.Add("Boat.dll", Boat);

    [Fact]
    public async Task Csv_has_every_bit()
    {
        Run run = await CommandLine.RunAsync("export", Assembly, "--as", "csv");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        string[] lines = run.Results.TrimEnd('\n').Split('\n');
        Assert.Equal("table,member,index,format,value,bits,verdict", lines[0]);
        string[][] records = [.. lines[1..].Select(line => line.Split(','))];
        Assert.All(records, record => Assert.Equal(("proven", 7), (record[6], record.Length)));
        using RunningTables running = new(Boat);
        foreach ((string type, string reflection, string[] members) in Tables)
        {
            foreach (string member in members)
            {
                string[][] entries = [.. records.Where(record => record[0] == type && record[1] == member)];
                Assert.Equal(Enumerable.Range(0, entries.Length).Select(index => index.ToString(CultureInfo.InvariantCulture)), entries.Select(entry => entry[2]));
                Assert.Equal(running.Bits(reflection, member), entries.Select(entry => Convert.ToUInt64(entry[5], 16)));
                Assert.Equal(running.Bits(reflection, member), entries.Select(entry => Bits(entry[4], entry[3])));
            }
        }

        Assert.Contains("SurveyBoat.Seven,PointCount,,int32,7,0x00000007,proven", lines);
        Assert.Contains("SurveyBoat.Two,Nodes,0,binary64,-1.0,0xBFF0000000000000,proven", lines);
        Assert.DoesNotContain(records, record => record[1] is "Raw0" or "IntegralScale");
    }

    [Fact]
    public async Task Json_has_every_bit()
    {
        Run run = await CommandLine.RunAsync("export", Assembly, "--output", _folder.Below("tables.json"));
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        Assert.Matches($"^Wrote .*tables.json: 14 tables, [0-9]+ entries, all proven.\n$", run.Results);
        JsonArray tables = JsonNode.Parse(await File.ReadAllTextAsync(_folder.Below("tables.json")))!["tables"]!.AsArray();
        Assert.Equal(Tables.Select(table => table.Type).Order(StringComparer.Ordinal), tables.Select(table => table!["name"]!.GetValue<string>()));
        using RunningTables running = new(Boat);
        foreach ((string type, string reflection, string[] members) in Tables)
        {
            JsonNode table = Assert.Single(tables, table => table!["name"]!.GetValue<string>() == type)!;
            Assert.Equal(("Boat", "0.0.0.0", "proven"), (table["assembly"]!.GetValue<string>(), table["version"]!.GetValue<string>(), table["verdict"]!.GetValue<string>()));
            foreach (string member in members)
            {
                JsonArray entries = table["members"]![member]!.AsArray();
                Assert.Equal(running.Bits(reflection, member), entries.Select(entry => Convert.ToUInt64(entry!["bits"]!.GetValue<string>(), 16)));
                Assert.Equal(
                    running.Bits(reflection, member),
                    entries.Select(entry => Bits(entry!["value"]!.ToJsonString(), table["format"]!.GetValue<string>())));
            }
        }
    }

    [Fact]
    public async Task A_table_that_no_assembly_declares_has_the_same_entries_and_digest()
    {
        (string Type, string[] Options)[] twins =
        [
            ("Twelve", ["--rule", "gauss-hermite", "--points", "12", "--convention", "physicist"]),
            ("Seven", ["--rule", "gauss-hermite", "--points", "7", "--convention", "physicist", "--format", "binary32"]),
            ("Five", ["--rule", "gauss-hermite", "--points", "5", "--convention", "probabilist", "--format", "binary64"]),
            ("Wind", ["--moments", "normal", "--mean", "1.5", "--standard-deviation", "0.25"]),
            ("Drift", ["--moments", "normal", "--mean=-0.5", "--standard-deviation", "3", "--maximum-order", "6", "--format", "binary32"]),
        ];
        await AssertTwinsAsync(Assembly, twins);
    }

    [Fact]
    public async Task Every_family_can_be_made_without_an_assembly()
    {
        (string Type, string[] Options)[] twins =
        [
            ("Noise", ["--rule", "gauss-half-range-hermite", "--points", "3"]),
            ("Noise32", ["--rule", "gauss-half-range-hermite", "--points", "2", "--error-estimate", "--format", "binary32"]),
            ("Clipped", ["--rule", "gauss-truncated-normal", "--points", "2", "--lower", "-1", "--upper", "2", "--error-estimate"]),
            ("Tail", ["--rule", "gauss-truncated-normal", "--points", "3", "--lower", "8", "--format", "binary32"]),
            ("Tail", ["--rule", "gauss-truncated-normal", "--points", "3", "--lower", "8", "--upper", "infinity", "--format", "binary32"]),
            ("Rough", ["--rule", "gauss-generalized-hermite", "--points", "3", "--exponent", "0.25"]),
            ("Rough32", ["--rule", "gauss-generalized-hermite", "--points", "2", "--exponent", "-.25", "--error-estimate", "--format", "binary32"]),
            ("Fading", ["--rule", "gauss-log-normal", "--points", "2", "--log-mean", "0.1", "--log-standard-deviation", "0.4", "--error-estimate"]),
            ("TwoModes", ["--rule", "gauss-normal-mixture", "--points", "3", "--weights", "0.3,0.9", "--means", "-1,0.5", "--standard-deviations", "0.5,1.25"]),
            ("TwoModes", ["--rule", "gauss-normal-mixture", "--points", "3", "--weights=0.3, 0.9", "--means=-1.0, +5e-1", "--standard-deviations", "0.5, 1.25"]),
            ("OneMode", ["--rule", "gauss-normal-mixture", "--points", "1", "--weights", "1", "--means", "2", "--standard-deviations", "3", "--error-estimate", "--format", "binary32"]),
            ("Well", ["--rule", "gauss-even-exponential", "--points", "3", "--coefficients", "-1,0.25"]),
            ("Well32", ["--rule", "gauss-even-exponential", "--points", "2", "--coefficients", "0.5", "--error-estimate", "--format", "binary32"]),
            ("Coarse", ["--rule", "nested-hermite", "--level", "1"]),
            ("Coarsest", ["--rule", "nested-hermite", "--level", "0", "--error-estimate"]),
            ("Finer", ["--rule", "nested-hermite", "--level", "2", "--error-estimate", "--format", "binary32"]),
            ("Estimated", ["--rule", "gauss-hermite", "--points", "2", "--error-estimate"]),
            ("Estimated32", ["--rule", "gauss-hermite", "--points", "3", "--convention", "physicist", "--error-estimate", "--format", "binary32"]),
            ("ClippedMoments", ["--moments", "truncated-normal", "--mean", "0.5", "--standard-deviation", "1", "--lower", "-1", "--upper", "2", "--maximum-order", "3"]),
            ("NoiseMoments", ["--moments", "half-normal", "--scale", "1.5", "--maximum-order", "3", "--format", "binary32"]),
            ("FadingMoments", ["--moments", "log-normal", "--log-mean", "0.1", "--log-standard-deviation", "0.4", "--maximum-order", "2"]),
            ("WellMoments", ["--moments", "even-exponential", "--coefficients", "1,0.5", "--maximum-order", "2"]),
            ("Gammas", ["--sequence", "half-integer-gamma", "--maximum-order", "3"]),
            ("Gammas32", ["--sequence", "half-integer-gamma", "--maximum-order", "2", "--format", "binary32"]),
            ("Oscillator", ["--sequence", "oscillator-matrix-elements", "--size", "3", "--power", "2"]),
            ("Oscillator32", ["--sequence", "oscillator-matrix-elements", "--size", "2", "--power", "3", "--format", "binary32"]),
        ];
        Assert.Empty(Sources.TypesOf(Sources.Families).Except(twins.Select(twin => twin.Type)));
        await AssertTwinsAsync(_folder.Add("Families.dll", FixtureCompiler.Generate(Sources.Families)), twins);
    }

    [Fact]
    public async Task Every_family_has_every_bit()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Families);
        Run run = await CommandLine.RunAsync("export", _folder.Add("Families.dll", image), "--as", "csv");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        string[][] records = [.. run.Results.TrimEnd('\n').Split('\n')[1..].Select(line => line.Split(','))];
        Assert.Equal(Sources.TypesOf(Sources.Families).Order(StringComparer.Ordinal), records.Select(record => record[0]["SurveyBoat.".Length..]).Distinct());
        using RunningTables running = new(image);
        foreach (IGrouping<(string Type, string Member), string[]> span in records.Where(record => record[2].Length > 0).GroupBy(record => (record[0], record[1])))
        {
            Assert.Equal(running.Bits(span.Key.Type, span.Key.Member), span.Select(entry => Convert.ToUInt64(entry[5], 16)));
        }

        foreach (string member in new[] { "CompanionNodes", "CompanionWeights", "ErrorFactor", "NormalizingIntegral", "Gamma", "Reciprocal", "Elements", "Absolute" })
        {
            Assert.Contains(records, record => record[1] == member);
        }

        // The integral of exp(−x²/2) over the line is √(2π) = 2.5066282746… (DLMF 7.2).
        Assert.Contains("SurveyBoat.Well32,NormalizingIntegral,,binary32,2.5066283,0x40206C99,proven", run.Results, StringComparison.Ordinal);
        Assert.Contains("SurveyBoat.Well32,ErrorFactor,,binary32,0.5,0x3F000000,proven", run.Results, StringComparison.Ordinal);
        Assert.DoesNotContain(records, record => record[1] is "Raw0" or "IntegralScale" or "ExpectationLocation" or "ExpectationScale");
    }

    private static async Task AssertTwinsAsync(string assembly, (string Type, string[] Options)[] twins)
    {
        foreach ((string type, string[] options) in twins)
        {
            JsonNode declared = await JsonAsync(assembly, type);
            JsonNode adHoc = await JsonAsync(options);
            Assert.Equal(declared["members"]!.ToJsonString(), adHoc["members"]!.ToJsonString());
            Assert.Equal(declared["claim"]!.GetValue<string>(), adHoc["claim"]!.GetValue<string>());
            Assert.Equal(declared["digest"]!.GetValue<string>(), adHoc["digest"]!.GetValue<string>());
            Assert.Equal("proven", adHoc["verdict"]!.GetValue<string>());
        }

        async Task<JsonNode> JsonAsync(params string[] arguments)
        {
            Run run = await CommandLine.RunAsync(["export", .. arguments, "--as", "json"]);
            Assert.Equal((0, ""), (run.ExitCode, run.Messages));
            return JsonNode.Parse(run.Results)!["tables"]![0]!;
        }
    }

    [Fact]
    public async Task Zero_weights_stay_or_go_as_one_says()
    {
        string[] options = ["export", "--rule", "gauss-hermite", "--points", "100", "--format", "binary32", "--as", "csv"];
        string[] kept = (await CommandLine.RunAsync(options)).Results.Split('\n');
        string[] dropped = (await CommandLine.RunAsync([.. options, "--drop-zero-weights"])).Results.Split('\n');
        Assert.Equal(100, kept.Count(line => line.Contains(",Nodes,", StringComparison.Ordinal)));
        Assert.Contains(kept, line => line.EndsWith(",0.0,0x00000000,proven", StringComparison.Ordinal));
        Assert.InRange(dropped.Count(line => line.Contains(",Nodes,", StringComparison.Ordinal)), 20, 98);
        Assert.DoesNotContain(dropped, line => line.EndsWith(",0.0,0x00000000,proven", StringComparison.Ordinal));
    }

    [Fact]
    public async Task What_is_not_proven_is_refused_unless_one_insists()
    {
        string path = _folder.Add("Bad.dll", FixtureCompiler.Compile(Three("0.5")));
        string output = _folder.Below("three.json");
        Run refused = await CommandLine.RunAsync("export", path, "--output", output);
        Assert.Equal((1, ""), (refused.ExitCode, refused.Results));
        string[] messages = refused.Messages.TrimEnd().Split('\n');
        Assert.Contains("GAUSS901: Three.Weights[1]", messages[0], StringComparison.Ordinal);
        Assert.Equal("gaussgen: error: nothing was exported: a table is not proven; look into it, or add --allow-unproven", messages[1]);
        Assert.False(File.Exists(output));

        Run forced = await CommandLine.RunAsync("export", path, "--output", output, "--allow-unproven");
        Assert.Equal(0, forced.ExitCode);
        Assert.EndsWith("not all proven.\n", forced.Results, StringComparison.Ordinal);
        JsonNode table = JsonNode.Parse(await File.ReadAllTextAsync(output))!["tables"]![0]!;
        Assert.Equal("wrong", table["verdict"]!.GetValue<string>());
        Assert.Equal("wrong", table["members"]!["Weights"]![1]!["verdict"]!.GetValue<string>());
        Assert.Equal(0.5, table["members"]!["Weights"]![1]!["value"]!.GetValue<double>());
        Assert.Null(table["members"]!["Weights"]![0]!["verdict"]);
        Assert.Contains(",0.5,0x3FE0000000000000,wrong\n", (await CommandLine.RunAsync("export", path, "--as", "csv", "--allow-unproven")).Results, StringComparison.Ordinal);
        Assert.Contains("NOT PROVEN: 7 of 8 entries", (await CommandLine.RunAsync("export", path, "--allow-unproven")).Results, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("double.NaN", "NaN")]
    [InlineData("double.NegativeInfinity", "-infinity")]
    public async Task What_C_has_no_constant_for_goes_to_other_formats(string weight, string text)
    {
        string path = _folder.Add("Bad.dll", FixtureCompiler.Compile(Three(weight)));
        Run c = await CommandLine.RunAsync("export", path, "--allow-unproven", "--output", _folder.Below("three.h"));
        Assert.Equal(2, c.ExitCode);
        Assert.Contains($"Weights[1] of Three is {text}, for which C99 has no constant", c.Messages, StringComparison.Ordinal);
        Assert.Equal([path], Directory.GetFiles(_folder.Path));
        Run json = await CommandLine.RunAsync("export", path, "--allow-unproven", "--as", "json");
        Assert.Null(JsonNode.Parse(json.Results)!["tables"]![0]!["members"]!["Weights"]![1]!["value"]);
    }

    [Fact]
    public async Task A_table_without_the_promised_members_is_not_exported_at_all()
    {
        string path = _folder.Add("Bad.dll", FixtureCompiler.Compile("using System; using GaussGen; [GaussHermite(3)] class T { public static ReadOnlySpan<double> Nodes => new double[] { 0 }; }"));
        Run run = await CommandLine.RunAsync("export", path, "--allow-unproven");
        Assert.Equal((1, ""), (run.ExitCode, run.Results));
        Assert.Contains("has not the members that its declaration promises", run.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Types_are_found_by_the_end_of_their_names()
    {
        foreach (string name in new[] { "SurveyBoat.Outer.Six", "SurveyBoat.Outer+Six", "Outer.Six", "Six" })
        {
            Run run = await CommandLine.RunAsync("export", Assembly, name, "Wind", "--as", "csv", "-q");
            Assert.Equal(0, run.ExitCode);
            Assert.Equal(["SurveyBoat.Outer.Six", "SurveyBoat.Wind"], run.Results.Split('\n')[1..^1].Select(line => line.Split(',')[0]).Distinct());
        }

        await AssertOneLine("has no type ix with a table; it has SurveyBoat.Drift, SurveyBoat.Eight, SurveyBoat.Eleven, SurveyBoat.Five, SurveyBoat.Four and 9 more", "export", Assembly, "ix");
        string two = _folder.Add("Two.dll", FixtureCompiler.Generate("using GaussGen; namespace A { [GaussHermite(1)] static partial class X { } } namespace B { [GaussHermite(1)] static partial class X { } }"));
        await AssertOneLine("X may be A.X, B.X; give the whole name", "export", two, "X");
    }

    [Fact]
    public async Task Quiet_says_nothing_and_the_same_command_writes_the_same_bytes()
    {
        foreach (string name in new[] { "t.h", "t.csv", "t.json" })
        {
            string output = _folder.Below(name);
            Assert.Equal(new Run(0, "", ""), await CommandLine.RunAsync("export", Assembly, "-o", output, "--quiet"));
            byte[] first = await File.ReadAllBytesAsync(output);
            Assert.DoesNotContain((byte)'\r', first);
            Assert.Equal((byte)'\n', first[^1]);
            Assert.Equal(new Run(0, "", ""), await CommandLine.RunAsync("export", Assembly, "-o", output, "--quiet"));
            Assert.Equal(first, await File.ReadAllBytesAsync(output));
            Run shown = await CommandLine.RunAsync("export", Assembly, "--as", name == "t.h" ? "c" : name[2..]);
            Assert.Equal(System.Text.Encoding.UTF8.GetString(first), shown.Results);
        }
    }

    [Fact]
    public async Task An_interrupted_run_leaves_no_file()
    {
        string path = Assembly;
        using CancellationTokenSource interruption = new();
        await interruption.CancelAsync();
        Assert.Equal(130, (await CommandLine.RunAsync(interruption.Token, "export", path, "-o", _folder.Below("t.h"))).ExitCode);
        Assert.Equal(130, (await CommandLine.RunAsync(interruption.Token, "export", "--rule", "gauss-hermite", "--points", "500", "-o", _folder.Below("t.h"))).ExitCode);

        // In the middle of the work: the largest rule takes seconds.
        using CancellationTokenSource later = new();
        Task<Run> run = CommandLine.RunAsync(later.Token, "export", "--rule", "gauss-hermite", "--points", "1000", "-o", _folder.Below("t.h"));
        later.CancelAfter(TimeSpan.FromMilliseconds(300));
        Assert.Equal(new Run(130, "", "gaussgen: error: interrupted\n"), await run);
        Assert.Equal([path], Directory.GetFiles(_folder.Path));
    }

    public void Dispose() => _folder.Dispose();

    private static ulong Bits(string value, string format) => format switch
    {
        "binary32" => BitConverter.SingleToUInt32Bits(float.Parse(value, CultureInfo.InvariantCulture)),
        "binary64" => BitConverter.DoubleToUInt64Bits(double.Parse(value, CultureInfo.InvariantCulture)),
        _ => ulong.Parse(value, CultureInfo.InvariantCulture),
    };

    private static string Three(string middleWeight) => $$"""
        using System; using GaussGen;
        [GaussHermite(3)] static class Three
        {
            public const int PointCount = 3;
            public const int DegreeOfExactness = 5;
            public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, 1.7320508075688772 };
            public static ReadOnlySpan<double> Weights => new double[] { 0.16666666666666666, {{middleWeight}}, 0.16666666666666666 };
        }
        """;

    private static async Task AssertOneLine(string contained, params string[] arguments)
    {
        Run run = await CommandLine.RunAsync(arguments);
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        Assert.Contains(contained, Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }
}
