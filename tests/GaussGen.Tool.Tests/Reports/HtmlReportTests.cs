using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using System.Xml;
using System.Xml.Linq;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Reports;

/// <summary>The report for people, read by a general-purpose XML reader.</summary>
public sealed class HtmlReportTests : IDisposable
{
    private const string Wrong = """
        using System; using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(3)] static class Three
            {
                public const int PointCount = 3;
                public const int DegreeOfExactness = 5;
                public static ReadOnlySpan<double> Nodes => new double[] { -1.7320508075688772, 0.0, double.NaN };
                public static ReadOnlySpan<double> Weights => new double[] { 0.16666666666666666, 0.6666666666666666, 0.16666666666666666 };
            }
            [GaussHermite(2)] static class Computed { public static ReadOnlySpan<double> Nodes => new double[] { -1, Math.Sqrt(1) }; }
        }
        """;

    private static readonly XNamespace Graphics = "http://www.w3.org/2000/svg";

    private readonly Folder _folder = new();

    [Fact]
    public async Task Has_a_row_and_a_detail_for_each_table_and_the_digest_of_each_file()
    {
        byte[] boat = FixtureCompiler.Generate(Sources.Small);
        XElement report = await ReportAsync(0, ("Boat.dll", boat));
        Assert.Equal(14, Rows(report, "tables").Count());
        Assert.Equal(14, Section(report, "details").Elements("details").Count());
        Assert.All(Section(report, "details").Elements("details"), details => Assert.Null(details.Attribute("open")));
        Assert.Equal("All proven", Section(report, "outcome").Element("h2")!.Value);
        Assert.DoesNotContain(report.Descendants("section"), section => (string?)section.Attribute("id") == "failures");

        string digest = Convert.ToHexString(System.Security.Cryptography.SHA256.HashData(boat));
        Assert.Equal(digest, Assert.Single(Rows(report, "versions")).Descendants("code").Single().Value, ignoreCase: true);
        Assert.Equal(2, Section(report, "method").Elements("p").Count(p => p.Value.StartsWith("Gauss–Hermite rules:", StringComparison.Ordinal)
            || p.Value.StartsWith("Moments of a normal distribution:", StringComparison.Ordinal)));
    }

    [Fact]
    public async Task Each_table_has_the_digest_that_a_baseline_pins()
    {
        XElement report = await ReportAsync(0, ("Boat.dll", FixtureCompiler.Generate(Sources.Small)));
        string baseline = _folder.Below("gaussgen.baseline");
        Assert.Equal(0, (await CommandLine.RunAsync("baseline", "write", _folder.Below("Boat.dll"), "--file", baseline)).ExitCode);
        string[] pinned = [.. (await File.ReadAllLinesAsync(baseline)).Skip(1).Select(line => line.Split(" | ")[5]).Order(StringComparer.Ordinal)];
        string[] shown =
        [
            .. Section(report, "details").Descendants("dt").Where(term => term.Value == "Digest")
                .Select(term => term.ElementsAfterSelf("dd").First().Value).Order(StringComparer.Ordinal),
        ];
        Assert.Equal(14, shown.Length);
        Assert.Equal(pinned, shown);
    }

    [Fact]
    public async Task Every_link_and_label_leads_somewhere_and_no_identity_is_used_twice()
    {
        XElement report = await ReportAsync(1, ("Boat.dll", FixtureCompiler.Generate(Sources.Small)), ("Wrong.dll", FixtureCompiler.Compile(Wrong)));
        string[] identities = [.. report.DescendantsAndSelf().Attributes("id").Select(id => id.Value)];
        Assert.Equal(identities.Distinct(), identities);
        XAttribute[] links = [.. report.Descendants().Attributes("href")];
        Assert.True(links.Length > 20);
        Assert.All(links, link => Assert.Contains(link.Value.TrimStart('#'), identities));
        Assert.All(report.Descendants().Attributes("aria-labelledby"), label => Assert.Contains(label.Value, identities));
        Assert.All(report.Descendants().Attributes("aria-describedby"), label => Assert.Contains(label.Value, identities));
        Assert.Equal(["h1", "h2", "h3"], report.Descendants().Select(element => element.Name.LocalName).Where(name => Regex.IsMatch(name, "^h[1-6]$")).Distinct());
    }

    [Fact]
    public async Task Needs_no_script_and_nothing_from_elsewhere()
    {
        XElement report = await ReportAsync(0, ("Boat.dll", FixtureCompiler.Generate(Sources.Small)));
        string[] active = ["script", "link", "img", "iframe", "object", "embed", "base", "form", "use", "image"];
        Assert.DoesNotContain(report.Descendants(), element => active.Contains(element.Name.LocalName));
        Assert.DoesNotContain(report.Descendants().Attributes(), attribute => attribute.Name.LocalName is "src" or "style" || attribute.Name.LocalName.StartsWith("on", StringComparison.Ordinal));
        string sheet = report.Descendants("style").Single().Value;
        Assert.DoesNotContain("url(", sheet, StringComparison.Ordinal);
        Assert.DoesNotContain("@import", sheet, StringComparison.Ordinal);
        foreach (string part in new[] { "prefers-color-scheme: dark", "@media print", ":focus-visible", ".skip:focus" })
        {
            Assert.Contains(part, sheet, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task Plots_show_every_entry_and_tell_it_in_words()
    {
        const string rules = """
            using GaussGen;
            [GaussHermite(100, Format = NumberFormat.Binary32)] public static partial class Singles { }
            [GaussHermite(5)] public static partial class Five { }
            [NormalMoments(1.5, 0.25)] public static partial class Wind { }
            """;
        XElement report = await ReportAsync(0, ("Boat.dll", FixtureCompiler.Generate(rules)));
        XElement[] plots = [.. report.Descendants(Graphics + "svg")];
        Assert.Equal(5, plots.Length);
        Assert.All(plots, plot =>
        {
            Assert.Equal("img", (string?)plot.Attribute("role"));
            Assert.NotEmpty(plot.Element(Graphics + "title")!.Value);
            Assert.Matches("^[0-9]+ (nodes|entries) ", plot.Element(Graphics + "desc")!.Value);
            Assert.Equal(2, plot.Elements(Graphics + "text").Count(text => (string?)text.Attribute("class") == "name"));
            Assert.DoesNotContain("NaN", string.Concat(plot.Descendants().Attributes().Select(attribute => attribute.Value)), StringComparison.Ordinal);
        });

        // In binary32, weights below 2⁻¹⁵⁰ are zero, and the others span more than forty powers of ten.
        int zeros = Marks(plots[0], "zero");
        Assert.InRange(zeros, 2, 98);
        Assert.Equal(100 - zeros, Marks(plots[0], "stem"));
        Assert.Equal(100, Marks(plots[0], "dot") + zeros);
        Assert.Contains($"on a logarithmic scale. {zeros} weights are zero", plots[0].Element(Graphics + "desc")!.Value, StringComparison.Ordinal);
        Assert.Contains("10⁻", string.Concat(plots[0].Elements(Graphics + "text").Select(text => text.Value)), StringComparison.Ordinal);
        Assert.Equal((5, 5, 0), (Marks(plots[2], "stem"), Marks(plots[2], "dot"), Marks(plots[2], "cross")));
        Assert.Contains("on a linear scale.", plots[2].Element(Graphics + "desc")!.Value, StringComparison.Ordinal);
        Assert.Equal(30, Marks(plots[4], "dot"));
    }

    [Fact]
    public async Task What_is_wrong_has_its_bits_and_its_mark()
    {
        XElement report = await ReportAsync(
            1, ("Wrong.dll", FixtureCompiler.Compile(Wrong)), ("Cut.dll", FixtureCompiler.Generate(Sources.Small)[..2000]));
        XElement failures = Section(report, "failures");
        Assert.Contains("GAUSS904", Assert.Single(failures.Elements("ul").Elements("li")).Value, StringComparison.Ordinal);
        XElement row = failures.Descendants("tr").Single(candidate => candidate.Element("th")!.Value == "Nodes[2]");
        Assert.Equal(
            ["GAUSS901", "0x3FFBB67AE8584CAA (1.7320508075688772)", "0xFFF8000000000000 (NaN)"],
            row.Elements("td").Take(3).Select(cell => cell.Value));
        Assert.Equal("Not all proven", Section(report, "outcome").Element("h2")!.Value);

        XElement[] plots = [.. report.Descendants(Graphics + "svg")];
        Assert.Equal(2, plots.Length);
        Assert.Equal((2, 0), (Marks(plots[0], "dot"), Marks(plots[0], "cross")));
        Assert.Contains("1 pair is not finite", plots[0].Ancestors("figure").Single().Element("figcaption")!.Value, StringComparison.Ordinal);
        Assert.Equal(1, Marks(plots[1], "cross"));
        Assert.Contains("1 entry is wrong", plots[1].Element(Graphics + "desc")!.Value, StringComparison.Ordinal);
        Assert.Equal(["✗ wrong", "? not proven"], Rows(report, "tables").Select(table => table.Elements("td").First().Value));
    }

    [Theory]
    [InlineData("<script>alert(1)</script>")]
    [InlineData("\"><img src=x onerror='a()'>")]
    [InlineData("--></style></title>&lt;&#0;]]>")]
    [InlineData("\uFFFE\uFFFF\u202Ex")]
    public async Task A_hostile_name_is_only_text(string name)
    {
        byte[] honest = Encoding.UTF8.GetBytes(new string('Q', Encoding.UTF8.GetByteCount(name)));
        string source = $"[GaussGen.GaussHermite(1)] static class {Encoding.UTF8.GetString(honest)} {{ }}";
        byte[] image = FixtureCompiler.Compile(source);
        Encoding.UTF8.GetBytes(name).CopyTo(image, image.AsSpan().IndexOf(honest));

        XElement report = await ReportAsync(1, ("Boat.dll", image));
        string shown = string.Concat(name.Select(letter => letter is '\uFFFE' or '\uFFFF' or '\u202E' ? '\uFFFD' : letter));
        Assert.Equal(shown, Assert.Single(Rows(report, "tables")).Element("th")!.Value);
        Assert.DoesNotContain(report.Descendants(), element => element.Name.LocalName is "script" or "img");
        Assert.Single(report.Descendants("style"));
    }

    [Fact]
    public async Task No_table_is_said_and_not_praised()
    {
        XElement report = await ReportAsync(2, ("Empty.dll", FixtureCompiler.Compile("class Hull { }")));
        Assert.Equal("No table found, nothing proven", Section(report, "outcome").Element("h2")!.Value);
        Assert.Contains("Empty.dll was named and holds no table", Section(report, "failures").Value, StringComparison.Ordinal);
        Assert.Empty(report.Descendants("details"));
    }

    [Fact]
    public async Task The_same_outcome_is_the_same_file()
    {
        byte[] boat = FixtureCompiler.Generate(Sources.Small);
        _ = await ReportAsync(0, ("Boat.dll", boat));
        byte[] first = await File.ReadAllBytesAsync(_folder.Below("report.html"));
        _ = await ReportAsync(0, ("Boat.dll", boat));
        Assert.Equal(first, await File.ReadAllBytesAsync(_folder.Below("report.html")));
        Assert.StartsWith("<!DOCTYPE html", Encoding.UTF8.GetString(first), StringComparison.Ordinal);
    }

    public void Dispose() => _folder.Dispose();

    private static XElement Section(XElement report, string id) => report.Descendants("section").Single(section => (string?)section.Attribute("id") == id);

    private static IEnumerable<XElement> Rows(XElement report, string section) => Section(report, section).Descendants("tbody").Elements("tr");

    /// <summary>How many marks the paths of a kind draw: each begins with a move.</summary>
    private static int Marks(XElement plot, string kind) => plot.Elements(Graphics + "path")
        .Where(path => ((string?)path.Attribute("class") ?? "").Split(' ')[0] == kind)
        .Sum(path => ((string?)path.Attribute("d"))!.Count(letter => letter == 'M'));

    private async Task<XElement> ReportAsync(int exitCode, params (string Name, byte[] Image)[] files)
    {
        string report = _folder.Below("report.html");
        string[] paths = [.. files.Select(file => _folder.Add(file.Name, file.Image))];
        Run run = await CommandLine.RunAsync(["verify", .. paths, "--report", report]);
        Assert.True(run.ExitCode == exitCode, run.Results + run.Messages);
        using XmlReader reader = XmlReader.Create(report, new XmlReaderSettings { DtdProcessing = DtdProcessing.Ignore });
        return XDocument.Load(reader).Root!;
    }
}
