using System.Linq;
using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>
/// Tables beside a baseline. The digests are those of the two-point rule and of the moments to order 0, whose entries are ±1 and ½,
/// and 1: computed from the definition of the digest with another SHA-256 (that of Python).
/// </summary>
public sealed class BaselineTests
{
    private const string Header =
        "# gaussgen baseline 1: one line a reviewed table; renew it after a review with: gaussgen baseline write <assembly or folder> --file <this file>\n";

    private const string TwoPoints = "GaussHermite | Gauss–Hermite rule with 2 points, standard normal density | binary64 | sha256:fded99fdb3bf988690bdcdf832219f7d8cb08fbbdfcea4f2c1248431ca148f11";

    private const string OrderZero =
        "NormalMoments | Moments to order 0 of the normal distribution with mean 0.0 and standard deviation 0.5 | binary32 | sha256:fa705f391d6d61098c6b3d8ca6db33ba765f9eb15eae1cbc2f8d0cac6c5ec0fd";

    private const string Reviewed = Header + "TestProject | Survey.Boat.Echo | " + TwoPoints + "\nTestProject | Survey.Noise | " + OrderZero + "\n";

    private const string Clean =
        """
        using GaussGen;

        namespace Survey
        {
            internal partial class Boat
            {
                [GaussHermite(2)]
                internal static partial class Echo { private const int Nodes9 = 9; }
            }

            [NormalMoments(-0.0, 0.5, MaximumOrder = 0, Format = NumberFormat.Binary32)]
            internal static partial class Noise { private const float Raw9 = 9; }
        }
        """;

    [Theory]
    [InlineData("gaussgen.baseline", Reviewed)]
    [InlineData("/boat/Bench.gaussgen.baseline", Reviewed)]
    [InlineData("/boat/GaussGen.Baseline", "\uFEFF" + Reviewed)]
    [InlineData("gaussgen.baseline", Reviewed + "Elsewhere | T | " + TwoPoints + "\r\n\r\n")]
    [InlineData("notes.txt", Header)]
    [InlineData("mygaussgen.baseline", "no baseline")]
    public Task What_was_reviewed_is_not_told(string path, string baseline) => DeclarationTest.ReportBeside([(path, baseline)], Clean);

    [Fact]
    public Task Without_a_file_nothing_is_told() => DeclarationTest.Report(Clean);

    [Fact]
    public Task A_table_may_be_in_any_of_the_files() => DeclarationTest.ReportBeside(
        [
            ("gaussgen.baseline", Header + "TestProject | Survey.Boat.Echo | " + TwoPoints),
            ("bench.gaussgen.baseline", Header + "TestProject | Survey.Noise | " + OrderZero),
            ("old.gaussgen.baseline", Header + "TestProject | Survey.Noise | " + OrderZero.Replace("order 0", "order 1", System.StringComparison.Ordinal)),
        ],
        Clean);

    [Fact]
    public Task Each_table_that_differs_is_told_at_its_attribute() => DeclarationTest.ReportBeside(
        [("gaussgen.baseline", Reviewed
            + "TestProject | Survey.Depth | " + TwoPoints
            + "\nTestProject | Survey.Single | " + TwoPoints
            + "\nOther | Survey.Missing | " + TwoPoints)],
        """
        using GaussGen;

        namespace Survey
        {
            internal partial class Boat
            {
                [System.Obsolete, GaussHermite(2)]
                internal static partial class Echo { }
            }

            [NormalMoments(0, 0.5, MaximumOrder = 0, Format = NumberFormat.Binary32)]
            internal static partial class Noise { }

            [{|GAUSS014:GaussHermite(3)|}]
            internal static partial class Depth { }

            [{|GAUSS014:GaussHermite(2, Format = NumberFormat.Binary32)|}]
            internal static partial class Single { }

            [{|GAUSS014:GaussHermite(2)|}]
            internal static partial class Missing { }

            // These have no table, and another report.
            [GaussHermite({|GAUSS004:0|})]
            internal static partial class None { }

            [GaussHermite(2)]
            internal static class {|GAUSS001:Closed|} { }

            [NormalMoments(0, 1e200, MaximumOrder = {|GAUSS011:4|})]
            internal static partial class Huge { }
        }
        """);

    [Fact]
    public async Task The_message_says_what_differs_and_how_to_renew()
    {
        string[] messages = await MessagesAsync(
            Reviewed.Replace("2 points", "3 points", System.StringComparison.Ordinal)
                .Replace("sha256:fa705f39", "sha256:00000000", System.StringComparison.Ordinal),
            Clean + "[GaussGen.GaussHermite(2)] internal static partial class New { }");
        Assert.Equal(
            [
                Message("Boat.Echo", "claim \"Gauss–Hermite rule with 3 points, standard normal density\" is now \"Gauss–Hermite rule with 2 points, standard normal density\""),
                Message("New", "the table is not in it"),
                Message("Noise", "data sha256:000000001d6d… is now sha256:fa705f391d6d…"),
            ],
            messages.Order(System.StringComparer.Ordinal));

        static string Message(string type, string what) =>
            $"GAUSS014: Review the table of '{type}' and renew gaussgen.baseline with 'gaussgen baseline write <assembly> --file gaussgen.baseline', or restore the declaration: {what}";
    }

    [Theory]
    [InlineData("{|GAUSS015:|}")]
    [InlineData("{|GAUSS015:# Notes|}\n")]
    [InlineData("{|GAUSS015:# gaussgen baseline 2: more|}\r\nmore")]
    [InlineData(Header + "{|GAUSS015:<<<<<<< HEAD|}\r\nTestProject | T | " + TwoPoints)]
    [InlineData(Header + "\nTestProject | T | " + TwoPoints + "\n{|GAUSS015:TestProject | T | " + TwoPoints + "|}\nmore wrong")]
    public Task What_is_no_baseline_is_told_once_at_its_line_and_tables_are_not(string baseline) =>
        DeclarationTest.ReportBeside([("gaussgen.baseline", baseline), ("other.gaussgen.baseline", Header)], Clean);

    [Fact]
    public async Task The_message_names_the_line_and_the_file() => Assert.Equal(
        ["GAUSS015: Tables are not compared with gaussgen.baseline, for line 2 is not as a line of a baseline is (assembly | type | attribute | claim | format | sha256:digest); mend it, or delete the file and write it again"],
        await MessagesAsync(Header + "a | b", Clean));

    private static async Task<string[]> MessagesAsync(string baseline, string source)
    {
        Consumer consumer = new(source) { AssemblyName = "TestProject" };
        var diagnostics = await consumer.Run().AnalyzerDiagnosticsBeside(new MemoryText("/boat/gaussgen.baseline", baseline));
        return [.. diagnostics.Select(each => $"{each.Id}: {each.GetMessage(System.Globalization.CultureInfo.InvariantCulture)}")];
    }
}
