using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>Declarations for the real generator: every family, every format, and the shapes that differ.</summary>
internal static class Sources
{
    public const string Small = """
        using GaussGen;
        namespace SurveyBoat
        {
            [GaussHermite(1)] public static partial class One { }
            [GaussHermite(2)] public static partial class Two { }
            [GaussHermite(5)] public static partial class Five { }
            [GaussHermite(4, Convention = HermiteConvention.Physicist)] public static partial class Four { }
            [GaussHermite(7, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32)] public partial struct Seven { }
            [GaussHermite(8)] public static partial class Eight { }
            [GaussHermite(9)] public static partial class Nine { }
            [GaussHermite(10, Convention = HermiteConvention.Physicist)] public static partial class Ten { }
            [GaussHermite(11)] public static partial class Eleven { }
            [GaussHermite(12, Convention = HermiteConvention.Physicist)] public static partial class Twelve { }
            public partial class Outer
            {
                [GaussHermite(6, Format = NumberFormat.Binary32)] internal static partial class Six { }
            }
            [NormalMoments(1.5, 0.25)] public static partial class Wind { }
            [NormalMoments(-0.5, 3, MaximumOrder = 6, Format = NumberFormat.Binary32)] public static partial class Drift { }
            [NormalMoments(0, 1, MaximumOrder = 0)] public static partial class Nothing { }
        }
        """;

    /// <summary>The families beside the two oldest, in tables small enough to change every bit of them.</summary>
    public const string Families = """
        using GaussGen;
        namespace SurveyBoat
        {
            [GaussHalfRangeHermite(3)] public static partial class Noise { }
            [GaussHalfRangeHermite(2, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class Noise32 { }
            [GaussTruncatedNormal(2, -1, 2, ErrorEstimate = true)] public static partial class Clipped { }
            [GaussTruncatedNormal(3, 8, double.PositiveInfinity, Format = NumberFormat.Binary32)] public static partial class Tail { }
            [GaussGeneralizedHermite(3, 0.25)] public static partial class Rough { }
            [GaussGeneralizedHermite(2, -0.25, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class Rough32 { }
            [GaussLogNormal(2, 0.1, 0.4, ErrorEstimate = true)] public static partial class Fading { }
            [GaussNormalMixture(3, new[] { 0.3, 0.9 }, new[] { -1, 0.5 }, new[] { 0.5, 1.25 })] public static partial class TwoModes { }
            [GaussNormalMixture(1, new double[] { 1 }, new double[] { 2 }, new double[] { 3 }, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class OneMode { }
            [GaussEvenExponential(3, -1, 0.25)] public static partial class Well { }
            [GaussEvenExponential(2, 0.5, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class Well32 { }
            [NestedHermite(1)] public static partial class Coarse { }
            [NestedHermite(0, ErrorEstimate = true)] public static partial class Coarsest { }
            [NestedHermite(2, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class Finer { }
            [GaussHermite(2, ErrorEstimate = true)] public static partial class Estimated { }
            [GaussHermite(3, Convention = HermiteConvention.Physicist, ErrorEstimate = true, Format = NumberFormat.Binary32)] public static partial class Estimated32 { }
            [TruncatedNormalMoments(0.5, 1, -1, 2, MaximumOrder = 3)] public static partial class ClippedMoments { }
            [HalfNormalMoments(1.5, MaximumOrder = 3, Format = NumberFormat.Binary32)] public static partial class NoiseMoments { }
            [LogNormalMoments(0.1, 0.4, MaximumOrder = 2)] public static partial class FadingMoments { }
            [EvenExponentialMoments(1, 0.5, MaximumOrder = 2)] public static partial class WellMoments { }
            [HalfIntegerGamma(3)] public static partial class Gammas { }
            [HalfIntegerGamma(2, Format = NumberFormat.Binary32)] public static partial class Gammas32 { }
            [OscillatorMatrixElements(3, 2)] public static partial class Oscillator { }
            [OscillatorMatrixElements(2, 3, Format = NumberFormat.Binary32)] public static partial class Oscillator32 { }
        }
        """;

    public const string Large = """
        using GaussGen;
        [GaussHermite(64)] public static partial class SixtyFour { }
        [GaussHermite(63, Convention = HermiteConvention.Physicist)] public static partial class SixtyThree { }
        [GaussHermite(50, Format = NumberFormat.Binary32)] public static partial class Fifty { }
        [GaussHermite(100, Format = NumberFormat.Binary32, DropZeroWeights = true)] public static partial class Dropped { }
        [NormalMoments(0.1, 1.7, MaximumOrder = 60)] public static partial class Wind { }
        """;

    /// <summary>All declarations of small tables in one text.</summary>
    public static string All => Small + Families.Replace("using GaussGen;", "", System.StringComparison.Ordinal);

    /// <summary>The types of a text, by the names that they have in C#, without those that only hold others.</summary>
    public static IEnumerable<string> TypesOf(string source) => source.Split('\n')
        .Where(line => line.Contains('[') && line.Contains("partial ", System.StringComparison.Ordinal))
        .Select(line => line.Split("partial ")[^1].Split(' ')[1]);
}
