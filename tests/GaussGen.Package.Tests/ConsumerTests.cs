using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Runtime.InteropServices;
using Xunit;
using Xunit.Abstractions;

namespace GaussGen.Package.Tests;

/// <summary>What a stranger's program computes with the package, on each of the frameworks that it is for.</summary>
[Collection(SharedPackage.Name)]
public sealed class ConsumerTests(PackedLibrary package, ITestOutputHelper log)
{
    // A gateway on a survey boat: noise of an echo sounder, drift in knots. It prints bits, so that nothing hides in decimals.
    private const string Gateway = """
        using System;
        using GaussGen;

        Print("runtime", Environment.Version.ToString());
        Print("rangeNoise.pointCount", RangeNoise.PointCount.ToString());
        Print("rangeNoise.degree", RangeNoise.DegreeOfExactness.ToString());
        for (int i = 0; i < RangeNoise.PointCount; i++)
        {
            Print($"rangeNoise.node{i}", Bits(RangeNoise.Nodes[i]));
            Print($"rangeNoise.weight{i}", Bits(RangeNoise.Weights[i]));
        }

        for (int i = 0; i < WaveSlap.PointCount; i++)
        {
            Print($"waveSlap.node{i}", BitConverter.SingleToInt32Bits(WaveSlap.Nodes[i]).ToString("x8"));
            Print($"waveSlap.weight{i}", BitConverter.SingleToInt32Bits(WaveSlap.Weights[i]).ToString("x8"));
        }

        Print("meanSquare.struct", Bits(RangeNoise.Expectation(1.5, 0.25, new Square())));
        Print("meanSquare.delegate", Bits(RangeNoise.Expectation(1.5, 0.25, x => x * x)));
        const double thirdMoment = Drift.Raw3;
        Print("drift.raw3", Bits(thirdMoment));
        Print("drift.central4", Bits(Drift.Central[4]));
        Print("drift.absolute1", Bits(Drift.Absolute1));
        Print("drift.orders", Drift.Raw.Length.ToString());
        Type[] tables = { typeof(RangeNoise), typeof(WaveSlap), typeof(Drift) };
        Print("typeInitializers", Array.FindAll(tables, table => table.TypeInitializer is not null).Length.ToString());

        static string Bits(double value) => BitConverter.DoubleToInt64Bits(value).ToString("x16");
        static void Print(string name, string value) => Console.WriteLine($"{name} = {value}");

        /// <summary>Noise of the echo sounder.</summary>
        [GaussHermite(3)]
        public static partial class RangeNoise { }

        [GaussHermite(2, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32)]
        internal static partial class WaveSlap { }

        /// <summary>Drift through the water.</summary>
        [NormalMoments(mean: 1.5, standardDeviation: 0.25, MaximumOrder = 4)]
        public static partial class Drift { }

        internal readonly struct Square : IIntegrand<double>
        {
            public double Evaluate(double x) => x * x;
        }
        """;

    private const string SounderLibrary = """
        namespace Sounder
        {
            using GaussGen;

            /// <summary>Depth from an echo.</summary>
            public static class Depth
            {
                /// <summary>The expected square of a depth.</summary>
                public static double MeanSquare(double mean, double standardDeviation)
                {
                    return Rule.Expectation(mean, standardDeviation, x => x * x);
                }

                /// <summary>The sum of the weights.</summary>
                public static double TotalWeight()
                {
                    double total = 0;
                    foreach (double weight in Rule.Weights)
                    {
                        total += weight;
                    }

                    return total;
                }
            }

            [GaussHermite(7)]
            internal static partial class Rule { }
        }
        """;

    private const string SounderProgram = """
        System.Console.WriteLine("meanSquare = " + Sounder.Depth.MeanSquare(4, 0.5).ToString("R"));
        System.Console.WriteLine("totalWeight = " + Sounder.Depth.TotalWeight().ToString("R"));
        """;

    [Fact]
    public void A_program_for_net10_gets_its_constants()
    {
        Stranger stranger = new(package, "gateway-net10");
        string project = stranger.AddProject("Gateway", ProgramFor("net10.0"), Gateway);
        stranger.Dotnet("build", project, "--configuration", "Release").RequireSuccess();
        CheckGateway(stranger.Dotnet("Gateway/bin/Release/net10.0/Gateway.dll"), runtime: "10.");
        Assert.Equal(
            ["Gateway.dll", "GaussGen.dll"], stranger.FilesOf("Gateway", "bin", "Release", "net10.0").Where(IsAssembly).Order());
    }

    [Fact]
    public void A_program_for_net8_gets_the_same_constants()
    {
        Stranger stranger = new(package, "gateway-net8");
        string project = stranger.AddProject("Gateway", ProgramFor("net8.0"), Gateway);
        if (OperatingSystem.IsLinux() && RuntimeInformation.OSArchitecture == Architecture.X64)
        {
            stranger.Dotnet("publish", project, "--runtime", "linux-x64", "--self-contained", "--output", "published")
                .RequireSuccess();
            CheckGateway(stranger.Run(stranger.PathOf("published", "Gateway")), runtime: "8.");
        }
        else
        {
            log.WriteLine("Not on linux-x64: the program for net8.0 ran on whichever newer runtime is installed.");
            stranger.Dotnet("build", project, "--configuration", "Release").RequireSuccess();
            CheckGateway(
                stranger.Dotnet("exec", "--roll-forward", "Major", "Gateway/bin/Release/net8.0/Gateway.dll"), runtime: "");
        }
    }

    [Fact]
    public void A_library_for_netstandard_in_CSharp_9_serves_a_program_that_does_not_know_the_package()
    {
        Stranger stranger = new(package, "sounder");
        string library = stranger.AddProject(
            "Sounder", "<TargetFramework>netstandard2.0</TargetFramework><LangVersion>9</LangVersion>", SounderLibrary);
        string program = stranger.AddProject("SounderProgram", ProgramFor("net10.0"), SounderProgram, library);
        stranger.Dotnet("build", program, "--configuration", "Release").RequireSuccess();
        CommandResult run = stranger.Dotnet("SounderProgram/bin/Release/net10.0/SounderProgram.dll");
        Dictionary<string, string> values = Stranger.Values(run);
        AssertWithinFourUlps(4 * 4 + 0.5 * 0.5, double.Parse(values["meanSquare"], CultureInfo.InvariantCulture));
        AssertWithinFourUlps(1, double.Parse(values["totalWeight"], CultureInfo.InvariantCulture));
    }

    [Theory]
    [InlineData("7.3", "[GaussHermite(7)]", "GAUSS013")]
    [InlineData("9", "[GaussHermite(0)]", "GAUSS004")]
    [InlineData("latest", "[GaussHermite(1001)]", "GAUSS004")]
    public void One_mistake_gives_one_error(string language, string attribute, string expected)
    {
        Stranger stranger = new(package, $"mistake-{language}");
        string source = SounderLibrary.Replace("[GaussHermite(7)]", attribute, StringComparison.Ordinal);
        string library = stranger.AddProject(
            "Sounder", $"<TargetFramework>netstandard2.0</TargetFramework><LangVersion>{language}</LangVersion>", source);
        CommandResult build = stranger.Dotnet("build", library);
        Assert.NotEqual(0, build.ExitCode);
        // The build prints each error when it meets it and again in its summary.
        int line = source[..source.IndexOf(attribute, StringComparison.Ordinal)].Count(character => character == '\n') + 1;
        string[] errors = [.. build.Output.Split('\n')
            .Where(text => text.Contains(": error ", StringComparison.Ordinal))
            .Distinct()];
        Assert.True(
            errors.Length == 1
            && errors[0].Contains($"Source.cs({line},", StringComparison.Ordinal)
            && errors[0].Contains($": error {expected}: ", StringComparison.Ordinal),
            build.Output);
    }

    private static string ProgramFor(string framework) =>
        $"<OutputType>Exe</OutputType><TargetFramework>{framework}</TargetFramework><Nullable>enable</Nullable>";

    private static bool IsAssembly(string file) => file.EndsWith(".dll", StringComparison.Ordinal);

    private static void CheckGateway(CommandResult run, string runtime)
    {
        Dictionary<string, string> values = Stranger.Values(run);
        Assert.StartsWith(runtime, values["runtime"], StringComparison.Ordinal);

        // Three nodes for the standard normal density: 0 and ±√3 with 2/3 and 1/6 (Hildebrand 1956, 8.7, by x → √2 x).
        // √ and ÷ of IEEE 754 are correctly rounded, so these expected values need no table.
        Assert.Equal("3", values["rangeNoise.pointCount"]);
        Assert.Equal("5", values["rangeNoise.degree"]);
        double[] nodes = [-Math.Sqrt(3), 0, Math.Sqrt(3)];
        double[] weights = [1.0 / 6, 2.0 / 3, 1.0 / 6];
        for (int i = 0; i < 3; i++)
        {
            Assert.Equal(Bits(nodes[i]), values[$"rangeNoise.node{i}"]);
            Assert.Equal(Bits(weights[i]), values[$"rangeNoise.weight{i}"]);
        }

        // CRC Standard Mathematical Tables, 28th ed., p. 464: ±0.707107 and 0.886227; here 1/√2 and √π/2 to 20 digits.
        Assert.Equal(Bits(-0.70710678118654752440f), values["waveSlap.node0"]);
        Assert.Equal(Bits(0.70710678118654752440f), values["waveSlap.node1"]);
        Assert.Equal(Bits(0.88622692545275801365f), values["waveSlap.weight0"]);
        Assert.Equal(Bits(0.88622692545275801365f), values["waveSlap.weight1"]);

        // E X² = μ² + σ², which the rule integrates exactly: what is left is the rounding of a few operations.
        AssertWithinFourUlps(1.5 * 1.5 + 0.25 * 0.25, Value(values["meanSquare.struct"]));
        Assert.Equal(values["meanSquare.struct"], values["meanSquare.delegate"]);

        // Nothing runs before the first call.
        Assert.Equal("0", values["typeInitializers"]);

        // E X³ = μ³ + 3μσ² and E (X − μ)⁴ = 3σ⁴ are binary fractions here; E |X − μ| = σ√(2/π) to 20 digits.
        Assert.Equal("5", values["drift.orders"]);
        Assert.Equal(Bits(3.65625), values["drift.raw3"]);
        Assert.Equal(Bits(0.01171875), values["drift.central4"]);
        Assert.Equal(Bits(0.19947114020071633897), values["drift.absolute1"]);
    }

    private static string Bits(double value) =>
        BitConverter.DoubleToInt64Bits(value).ToString("x16", CultureInfo.InvariantCulture);

    private static string Bits(float value) =>
        BitConverter.SingleToInt32Bits(value).ToString("x8", CultureInfo.InvariantCulture);

    private static double Value(string bits) =>
        BitConverter.Int64BitsToDouble(long.Parse(bits, NumberStyles.HexNumber, CultureInfo.InvariantCulture));

    private static void AssertWithinFourUlps(double expected, double actual)
    {
        double tolerance = 4 * (Math.BitIncrement(expected) - expected);
        Assert.InRange(actual, expected - tolerance, expected + tolerance);
    }
}
