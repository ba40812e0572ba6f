namespace GaussGen.Tests;

[GaussHermite(20, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32, DropZeroWeights = true)]
internal static partial class TwentySingle;

[NormalMoments(mean: 1.5, standardDeviation: 0.25, MaximumOrder = 8)]
internal static partial class Wind;
