using System;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using System.Xml.Linq;
using GaussGen.Tool.Tests.Fixtures;
using Json.Schema;
using Xunit;

namespace GaussGen.Tool.Tests.Reports;

/// <summary>The files for other programs, each read as such a program would.</summary>
public sealed class ReportTests : IDisposable
{
    private const string Wrong = """
        using System; using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(2)] static class Two
            {
                public const int PointCount = 2;
                public const int DegreeOfExactness = 3;
                public static ReadOnlySpan<double> Nodes => new double[] { -1.0, 1.0000000000000002 };
                public static ReadOnlySpan<double> Weights => new double[] { 0.5, 0.5, 0.5 };
            }
            [GaussHermite(2)] static class Computed { public static ReadOnlySpan<double> Nodes => new double[] { -1, Math.Sqrt(1) }; }
        }
        """;

    private readonly Folder _folder = new();

    [Fact]
    public async Task Sarif_is_valid_against_the_published_schema()
    {
        JsonNode log = await WriteAsync("--sarif", "proofs.sarif");
        EvaluationResults outcome = Schema().Evaluate(JsonSerializer.SerializeToElement(log), new EvaluationOptions { OutputFormat = OutputFormat.List });
        Assert.True(outcome.IsValid, string.Join('\n', outcome.Details.Where(detail => detail.HasErrors).SelectMany(detail => detail.Errors!.Values)));

        JsonArray results = log["runs"]![0]!["results"]!.AsArray();
        Assert.Equal(
            ["GAUSS902", "GAUSS901", "GAUSS903", "GAUSS904"],
            results.Select(result => result!["ruleId"]!.GetValue<string>()));
        JsonNode wrong = results[1]!;
        Assert.Equal("error", wrong["level"]!.GetValue<string>());
        Assert.Contains("0x3FF0000000000001", wrong["message"]!["text"]!.GetValue<string>(), StringComparison.Ordinal);
        JsonNode location = wrong["locations"]![0]!;
        Assert.Equal("SurveyBoat.Two.Nodes[1]", location["logicalLocations"]![0]!["fullyQualifiedName"]!.GetValue<string>());
        Uri uri = new(location["physicalLocation"]!["artifactLocation"]!["uri"]!.GetValue<string>());
        Assert.Equal(_folder.Below("Wrong.dll"), uri.LocalPath);
        foreach (JsonNode? result in results)
        {
            string id = log["runs"]![0]!["tool"]!["driver"]!["rules"]![result!["ruleIndex"]!.GetValue<int>()]!["id"]!.GetValue<string>();
            Assert.Equal(result["ruleId"]!.GetValue<string>(), id);
        }
    }

    [Fact]
    public async Task The_schema_would_notice_a_mistake()
    {
        JsonNode log = await WriteAsync("--sarif", "proofs.sarif");
        log["runs"]![0]!["results"]![0]!.AsObject().Remove("message");
        Assert.False(Schema().Evaluate(JsonSerializer.SerializeToElement(log)).IsValid);
    }

    [Fact]
    public async Task JUnit_counts_what_is_there()
    {
        await RunAsync("--junit", "proofs.xml");
        XElement suites = XDocument.Load(_folder.Below("proofs.xml")).Root!;
        Assert.Equal("testsuites", suites.Name);
        foreach (XElement level in suites.Elements("testsuite").Append(suites))
        {
            Assert.Equal(level.Descendants("testcase").Count(), (int)level.Attribute("tests")!);
            Assert.Equal(level.Descendants("failure").Count(), (int)level.Attribute("failures")!);
            Assert.Equal(level.Descendants("error").Count(), (int)level.Attribute("errors")!);
        }

        Assert.Equal([14, 2, 1], suites.Elements("testsuite").Select(suite => suite.Elements("testcase").Count()));
        XElement failure = Assert.Single(suites.Descendants("failure"));
        Assert.Equal("SurveyBoat.Two", (string)failure.Parent!.Attribute("classname")!);
        Assert.Contains("0x3FF0000000000001", failure.Value, StringComparison.Ordinal);
        Assert.Equal(2, suites.Descendants("error").Count());
    }

    [Fact]
    public async Task Json_has_everything()
    {
        JsonNode json = await WriteAsync("--json", "proofs.json");
        Assert.Equal(1, json["exitCode"]!.GetValue<int>());
        JsonNode summary = json["summary"]!;
        Assert.Equal(16, summary["tables"]!.GetValue<int>());
        Assert.Equal(14, summary["tablesProven"]!.GetValue<int>());
        Assert.Equal(1, summary["tablesWrong"]!.GetValue<int>());
        Assert.Equal(1, summary["tablesUnproven"]!.GetValue<int>());
        Assert.Equal(1, summary["filesUnreadable"]!.GetValue<int>());
        JsonArray files = json["files"]!.AsArray();
        Assert.Equal(3, files.Count);
        byte[] hash = System.Security.Cryptography.SHA256.HashData(await File.ReadAllBytesAsync(_folder.Below("Boat.dll")));
        Assert.Equal(Convert.ToHexString(hash), files[0]!["sha256"]!.GetValue<string>(), ignoreCase: true);
        Assert.All(files[0]!["tables"]!.AsArray(), table =>
        {
            Assert.Equal("proven", table!["verdict"]!.GetValue<string>());
            Assert.Equal(table["entries"]!.GetValue<int>(), table["proven"]!.GetValue<int>());
            Assert.InRange(table["worstDistanceInUlp"]!.GetValue<double>(), 0, 0.5000001);
        });
    }

    [Fact]
    public async Task All_at_once_and_again_over_the_old_files_with_the_same_bytes()
    {
        string[] names = ["a.json", "b.sarif", "c.xml"];
        string[] options = ["--json", "a.json", "--sarif", "b.sarif", "--junit", "c.xml"];
        await RunAsync(options);
        string[] first = [.. names.Select(name => File.ReadAllText(_folder.Below(name)))];
        await RunAsync(options);
        Assert.Equal(first, names.Select(name => File.ReadAllText(_folder.Below(name))));
        Assert.Equal(names.Concat(["Boat.dll", "Cut.dll", "Wrong.dll"]).Order(), Directory.GetFiles(_folder.Path).Select(Path.GetFileName).Order());
    }

    [Fact]
    public async Task A_report_that_cannot_be_written_is_one_line()
    {
        Run run = await CommandLine.RunAsync("verify", _folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Small)), "--json", _folder.Below("none/out.json"));
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("cannot be written", Assert.Single(run.Messages.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    public void Dispose() => _folder.Dispose();

    /// <summary>
    /// The schema is of JSON Schema draft 4. The evaluator begins at draft 6; of what changed between them, the schema uses only
    /// the word for its own identity.
    /// </summary>
    private static JsonSchema Schema()
    {
        using StreamReader reader = new(typeof(ReportTests).Assembly.GetManifestResourceStream("sarif.json")!);
        JsonObject schema = JsonNode.Parse(reader.ReadToEnd())!.AsObject();
        schema["$schema"] = "http://json-schema.org/draft-07/schema#";
        schema["$id"] = schema["id"]!.DeepClone();
        _ = schema.Remove("id");
        return JsonSchema.FromText(schema.ToJsonString());
    }

    private async Task<JsonNode> WriteAsync(string option, string name)
    {
        await RunAsync(option, name);
        return JsonNode.Parse(await File.ReadAllTextAsync(_folder.Below(name)))!;
    }

    private async Task RunAsync(params string[] reports)
    {
        byte[] boat = FixtureCompiler.Generate(Sources.Small);
        string[] files =
        [
            _folder.Add("Boat.dll", boat),
            _folder.Add("Wrong.dll", FixtureCompiler.Compile(Wrong)),
            _folder.Add("Cut.dll", boat[..2000]),
        ];
        string[] options = [.. reports.Select((word, index) => index % 2 == 0 ? word : _folder.Below(word))];
        Assert.Equal(1, (await CommandLine.RunAsync(["verify", .. files, .. options])).ExitCode);
    }
}
