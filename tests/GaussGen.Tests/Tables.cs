namespace GaussGen.Tests;

[GaussHermite(1)]
internal static partial class One;

[GaussHermite(6)]
internal static partial class Six;

[GaussHermite(7)]
internal static partial class Seven;

[GaussHermite(16, Convention = HermiteConvention.Physicist)]
internal static partial class SixteenPhysicist;

[GaussHermite(7, Format = NumberFormat.Binary32)]
internal readonly partial struct SevenSingle;

[GaussHermite(20, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32, DropZeroWeights = true)]
internal sealed partial record TwentySingle;

[NormalMoments(mean: 1.5, standardDeviation: 0.25, MaximumOrder = 8)]
internal static partial class Wind;

[NormalMoments(mean: -0.5, standardDeviation: 2.0, MaximumOrder = 3, Format = NumberFormat.Binary32)]
internal static partial class DriftSingle;
