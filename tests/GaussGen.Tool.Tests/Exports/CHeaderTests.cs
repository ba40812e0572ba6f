using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Threading.Tasks;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Exports;

/// <summary>The C header, compiled by a strict compiler and run: its bits are those that the assembly hands out when it runs.</summary>
public sealed class CHeaderTests : IDisposable
{
    private const string Extreme = """
        using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(400)] public static partial class SmallestNumbers { }
            [GaussHermite(60, Format = NumberFormat.Binary32)] public static partial class ZeroWeights { }
            [NormalMoments(0.1, 1e-160, MaximumOrder = 3)] public static partial class Échelle2Größe { }
        }
        """;

    private readonly Folder _folder = new();

    [CFact]
    public async Task The_compiled_header_has_the_bits_of_the_assembly()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Small + Extreme.Replace("using GaussGen;", "", StringComparison.Ordinal));
        Run run = await CommandLine.RunAsync("export", _folder.Add("Boat.dll", image), "--output", _folder.Below("tables.h"), "--prefix", "boat_");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));

        (string Type, string Array, string Member, string CType)[] lists =
        [
            ("SurveyBoat.One", "boat_one_nodes", "Nodes", "double"),
            ("SurveyBoat.Twelve", "boat_twelve_nodes", "Nodes", "double"),
            ("SurveyBoat.Twelve", "boat_twelve_weights", "Weights", "double"),
            ("SurveyBoat.Seven", "boat_seven_nodes", "Nodes", "float"),
            ("SurveyBoat.Seven", "boat_seven_weights", "Weights", "float"),
            ("SurveyBoat.Outer+Six", "boat_six_weights", "Weights", "float"),
            ("SurveyBoat.Wind", "boat_wind_absolute", "Absolute", "double"),
            ("SurveyBoat.Drift", "boat_drift_raw", "Raw", "float"),
            ("SurveyBoat.Nothing", "boat_nothing_central", "Central", "double"),
            ("SurveyBoat.SmallestNumbers", "boat_smallest_numbers_nodes", "Nodes", "double"),
            ("SurveyBoat.SmallestNumbers", "boat_smallest_numbers_weights", "Weights", "double"),
            ("SurveyBoat.ZeroWeights", "boat_zero_weights_weights", "Weights", "float"),
            ("SurveyBoat.Échelle2Größe", "boat_u00c9chelle2_gru00f6u00dfe_absolute", "Absolute", "double"),
        ];
        string[] lines = await CompileAndRunAsync("tables.h", lists.Select(list => (list.Array, list.CType)));
        using RunningTables running = new(image);
        List<string> expected = [];
        foreach ((string type, string array, string member, _) in lists)
        {
            expected.AddRange(running.Bits(type, member).Select(bits => $"{array} {bits:x16}"));
        }

        Assert.Equal(expected, lines);
        Assert.Contains(lines, line => line.StartsWith("boat_smallest_numbers_weights 00000", StringComparison.Ordinal));
        Assert.Contains(lines, line => line == "boat_zero_weights_weights 0000000000000000");
    }

    [CFact]
    public async Task Every_family_is_C()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Families);
        Run run = await CommandLine.RunAsync("export", _folder.Add("Boat.dll", image), "--output", _folder.Below("tables.h"), "--prefix", "boat_");
        Assert.Equal((0, ""), (run.ExitCode, run.Messages));
        string header = await File.ReadAllTextAsync(_folder.Below("tables.h"));
        Assert.All(header.Split('\n'), line => Assert.InRange(line.Length, 0, 100));
        Assert.DoesNotMatch("(^|[ (])_", header);

        (string Type, string Array, string Member, string CType)[] lists =
        [
            ("SurveyBoat.Noise", "boat_noise_nodes", "Nodes", "double"),
            ("SurveyBoat.Noise32", "boat_noise32_companion_nodes", "CompanionNodes", "float"),
            ("SurveyBoat.Clipped", "boat_clipped_companion_weights", "CompanionWeights", "double"),
            ("SurveyBoat.Finer", "boat_finer_companion_weights", "CompanionWeights", "float"),
            ("SurveyBoat.ClippedMoments", "boat_clipped_moments_central", "Central", "double"),
            ("SurveyBoat.Gammas", "boat_gammas_gamma", "Gamma", "double"),
            ("SurveyBoat.Gammas32", "boat_gammas32_reciprocal", "Reciprocal", "float"),
            ("SurveyBoat.Oscillator", "boat_oscillator_elements", "Elements", "double"),
        ];
        string[] lines = await CompileAndRunAsync("tables.h", lists.Select(list => (list.Array, list.CType)));
        using RunningTables running = new(image);
        Assert.Equal(lists.SelectMany(list => running.Bits(list.Type, list.Member).Select(bits => $"{list.Array} {bits:x16}")), lines);

        string main = Write("constants.c", """
            #include "tables.h"
            int main(void)
            {
                int bad = boat_well32_normalizing_integral != 0x1.40d932p+1f || boat_well32_error_factor != 0.5f;
                bad |= sizeof boat_oscillator_elements != 9 * sizeof(double) || boat_finer_point_count != 9;
                return bad;
            }
            """);
        (int code, string text) = await CCompiler.CompileAsync(_folder.Below("constants"), main);
        Assert.True(code == 0, text);
        Assert.Equal(0, (await CCompiler.RunAsync(_folder.Below("constants"), [])).ExitCode);
    }

    [CFact]
    public async Task Each_header_stands_alone_and_beside_the_others()
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Generate(Sources.Small));
        Assert.Equal(0, (await CommandLine.RunAsync("export", path, "SurveyBoat.Five", "-o", _folder.Below("five.h"))).ExitCode);
        Assert.Equal(0, (await CommandLine.RunAsync("export", path, "Seven", "-o", _folder.Below("seven.h"))).ExitCode);
        Assert.Equal(0, (await CommandLine.RunAsync("export", "--rule", "gauss-hermite", "--points", "5", "-o", _folder.Below("own.h"))).ExitCode);
        Assert.Equal(0, (await CommandLine.RunAsync("export", "--moments", "normal", "--mean", "0", "--standard-deviation", "1", "-o", _folder.Below("moments.h"))).ExitCode);
        string main = Write("main.c", """
            #include "five.h"
            #include "seven.h"
            #include "own.h"
            #include "moments.h"
            #include "five.h"
            #include <string.h>
            static double buffer[survey_boat_five_point_count];
            int main(void)
            {
                int bad = survey_boat_five_degree_of_exactness != 9 || gauss_hermite_5_point_count != 5;
                bad |= memcmp(survey_boat_five_nodes, gauss_hermite_5_nodes, sizeof buffer) != 0;
                bad |= sizeof survey_boat_seven_weights != survey_boat_seven_point_count * sizeof(float);
                bad |= normal_moments_raw[4] != 3.0 || normal_moments_central[1] != 0.0;
                return bad;
            }
            """);
        string other = Write("other.c", "#include \"five.h\"\nint other(void);\nint other(void) { return 0; }\n");
        (int code, string text) = await CCompiler.CompileAsync(_folder.Below("main"), main, other);
        Assert.True(code == 0, text);
        Assert.Equal("", text);
        Assert.Equal(0, (await CCompiler.RunAsync(_folder.Below("main"), [])).ExitCode);
    }

    [CFact]
    public async Task A_target_with_another_double_is_refused_by_the_header_itself()
    {
        Assert.Equal(0, (await CommandLine.RunAsync("export", "--rule", "gauss-hermite", "--points", "2", "-o", _folder.Below("two.h"))).ExitCode);
        string main = Write("main.c", "#include <float.h>\n#undef DBL_MANT_DIG\n#define DBL_MANT_DIG 24\n#include \"two.h\"\nint main(void) { return 0; }\n");
        (int code, string text) = await CCompiler.CompileAsync(_folder.Below("main"), main);
        Assert.NotEqual(0, code);
        Assert.Contains("double is not binary64 on this target", text, StringComparison.Ordinal);
    }

    [CFact]
    public async Task Hostile_names_cannot_leave_the_comment()
    {
        byte[] image = FixtureCompiler.Compile(
            "using System; using GaussGen; [GaussHermite(1)] class T { public const int PointCount = 1; public const int DegreeOfExactness = 1; "
            + "public static ReadOnlySpan<double> Nodes => new double[] { 0 }; public static ReadOnlySpan<double> Weights => new double[] { 1 }; }",
            name: "x *?? \u001b ?\u2028 \"$(id)\"");
        Assert.Equal(0, (await CommandLine.RunAsync("export", _folder.Add("Boat.dll", image), "-o", _folder.Below("t.h"))).ExitCode);
        byte[] header = await File.ReadAllBytesAsync(_folder.Below("t.h"));
        Assert.All(header, letter => Assert.True(letter is (byte)'\n' or (>= 32 and < 127)));
        (int code, string text) = await CCompiler.CompileAsync(_folder.Below("main"), Write("main.c", "#include \"t.h\"\nint main(void) { return t_point_count - 1; }\n"));
        Assert.True(code == 0, text);
    }

    [Fact]
    public async Task The_header_is_readable_at_80_columns()
    {
        string header = (await CommandLine.RunAsync("export", "--rule", "gauss-hermite", "--points", "3", "--convention", "physicist", "--format", "binary32")).Results;
        Assert.All(header.Split('\n'), line => Assert.InRange(line.Length, 0, 80));
        Assert.Contains("""
            static const float gauss_hermite_3_nodes[3] =
            {
                -0x1.3988e2p+0f, /* -1.2247449 */
                0x0.0p+0f,       /* 0.0 */
                0x1.3988e2p+0f   /* 1.2247449 */
            };
            """, header, StringComparison.Ordinal);
        Assert.Contains("besides the standard deviation: 1.4142135. */\nstatic const float gauss_hermite_3_node_scale = 0x1.6a09e6p+0f;\n", header, StringComparison.Ordinal);
        Assert.Contains(" * E f(X) ~ (1/sqrt(pi)) sum w_i f(m + sqrt(2) s x_i).\n", header, StringComparison.Ordinal);
        Assert.Contains("#ifndef GAUSSGEN_GAUSS_HERMITE_3_H\n", header, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Names_that_would_be_the_same_in_C_are_refused()
    {
        string path = _folder.Add("Boat.dll", FixtureCompiler.Generate("using GaussGen; namespace A { [GaussHermite(1)] static partial class SixNodes { } [GaussHermite(2)] static partial class Six_Nodes { } }"));
        Run run = await CommandLine.RunAsync("export", path);
        Assert.Equal((2, ""), (run.ExitCode, run.Results));
        Assert.Contains("A.SixNodes and A.Six_Nodes would both be a_six_nodes in C; export them one at a time, with --prefix", run.Messages, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("SurveyBoat.Outer.SixNodes", "survey_boat_outer_six_nodes")]
    [InlineData("HTTPServer2Rule", "http_server2_rule")]
    [InlineData("_x__y_", "x_y")]
    [InlineData("A1", "a1")]
    [InlineData("9", "table_9")]
    [InlineData("", "table_")]
    [InlineData("Box`1", "box_1")]
    [InlineData("größe", "gru00f6u00dfe")]
    public void C_names(string name, string expected) => Assert.Equal(expected, CName.Of(name));

    public void Dispose() => _folder.Dispose();

    private string Write(string name, string text) => _folder.Add(name, Encoding.UTF8.GetBytes(text));

    private async Task<string[]> CompileAndRunAsync(string header, IEnumerable<(string Array, string Type)> arrays)
    {
        StringBuilder source = new($$"""
            #include "{{header}}"
            #include <inttypes.h>
            #include <stddef.h>
            #include <stdio.h>
            #include <string.h>
            static void print_double(const char *name, const double *values, size_t count)
            {
                size_t i;
                for (i = 0; i < count; i++)
                {
                    uint64_t bits;
                    memcpy(&bits, &values[i], sizeof bits);
                    printf("%s %016" PRIx64 "\n", name, bits);
                }
            }
            static void print_float(const char *name, const float *values, size_t count)
            {
                size_t i;
                for (i = 0; i < count; i++)
                {
                    uint32_t bits;
                    memcpy(&bits, &values[i], sizeof bits);
                    printf("%s %016" PRIx64 "\n", name, (uint64_t)bits);
                }
            }
            int main(void)
            {

            """);
        foreach ((string array, string type) in arrays)
        {
            _ = source.Append(CultureInfo.InvariantCulture, $"    print_{type}(\"{array}\", {array}, sizeof {array} / sizeof {array}[0]);\n");
        }

        _ = source.Append("    return 0;\n}\n");
        (int code, string text) = await CCompiler.CompileAsync(_folder.Below("main"), Write("main.c", source.ToString()));
        Assert.True(code == 0, text);
        Assert.Equal("", text);
        (code, text) = await CCompiler.RunAsync(_folder.Below("main"), []);
        Assert.Equal(0, code);
        return text.TrimEnd('\n').Split('\n');
    }
}
