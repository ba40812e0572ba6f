using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using System.Xml;
using System.Xml.Linq;
using GaussGen.Tool.Tests.Fixtures;
using StbImageSharp;
using Xunit;

namespace GaussGen.Tool.Tests.Reports;

/// <summary>The report in a real browser.</summary>
public sealed class HtmlReportBrowserTests : IDisposable
{
    private const string Rules = """
        using GaussGen;
        namespace SurveyBoat { [GaussHermite(64)] public static partial class NoiseOfTheEchoSounderInShallowWaterOverSandAndGravel { } }
        """;

    private readonly Folder _folder = new();

    [ChromiumFact]
    public async Task Follows_the_light_and_the_dark_mode_and_draws_the_plots_in_both()
    {
        string report = await ReportAsync(Rules);
        foreach ((bool isDark, int paper, int mark) in new[] { (false, 0xFBFAF6, 0x0B6475), (true, 0x10191E, 0x67C7D8) })
        {
            ImageResult picture = await Chromium.PictureAsync(report, _folder, 1280, 1400, isDark);
            int[] pixels = [.. picture.Data.Chunk(3).Select(pixel => (pixel[0] << 16) | (pixel[1] << 8) | pixel[2])];
            Assert.Equal(paper, pixels[0]);

            // 64 stems of some pixels' width and their dots, far more than the links have of that colour.
            Assert.InRange(pixels.Count(pixel => pixel == mark), 3_000, pixels.Length / 10);
        }
    }

    [ChromiumFact]
    public async Task Is_understood_as_it_was_meant()
    {
        string report = await ReportAsync(Sources.Small);
        string seen = await Chromium.DocumentAsync(report, _folder, 1280);
        XElement document = XElement.Parse(Regex.Replace(Regex.Replace(seen, "^<!DOCTYPE[^>]*>", ""), "<meta([^>]*)>", "<meta$1/>"));
        using XmlReader reader = XmlReader.Create(report, new XmlReaderSettings { DtdProcessing = DtdProcessing.Ignore });
        Assert.Equal(Names(XDocument.Load(reader).Root!), Names(document));

        static string[] Names(XElement root) => [.. root.DescendantsAndSelf().Select(element => $"{element.Parent?.Name.LocalName}/{element.Name.LocalName}")];
    }

    [ChromiumFact]
    public async Task Is_no_wider_than_a_narrow_window()
    {
        string report = await ReportAsync(Rules);

        // A copy with a script that measures it; the report itself forbids scripts.
        string measured = Regex.Replace(await File.ReadAllTextAsync(report), "<meta http-equiv[^>]*>", "").Replace(
            "</body>",
            "<script>document.title = document.documentElement.scrollWidth + ' in ' + window.innerWidth</script></body>",
            StringComparison.Ordinal);
        string page = _folder.Below("measured.html");
        await File.WriteAllTextAsync(page, measured);
        Match widths = Regex.Match(await Chromium.DocumentAsync(page, _folder, 520), "<title>([0-9]+) in ([0-9]+)</title>");
        Assert.True(widths.Success);
        int window = int.Parse(widths.Groups[2].Value, CultureInfo.InvariantCulture);
        Assert.InRange(window, 300, 520);
        Assert.Equal(window, int.Parse(widths.Groups[1].Value, CultureInfo.InvariantCulture));
    }

    public void Dispose() => _folder.Dispose();

    private async Task<string> ReportAsync(string rules)
    {
        string report = _folder.Below("report.html");
        Assert.Equal(0, (await CommandLine.RunAsync("verify", _folder.Add("Boat.dll", FixtureCompiler.Generate(rules)), "--report", report)).ExitCode);
        return report;
    }
}
