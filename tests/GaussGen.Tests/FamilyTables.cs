namespace GaussGen.Tests;

[GaussHalfRangeHermite(8)]
internal static partial class Roll;

[GaussHalfRangeHermite(8, Format = NumberFormat.Binary32)]
internal static partial class RollSingle;

[GaussTruncatedNormal(10, lower: -2.0, upper: double.PositiveInfinity)]
internal static partial class Shallow;

[GaussTruncatedNormal(6, lower: 8.0, upper: double.PositiveInfinity)]
internal static partial class FarTail;

[GaussGeneralizedHermite(12, exponent: 0.5)]
internal static partial class Miss;

[GaussLogNormal(6, logMean: 0.0, logStandardDeviation: 0.25)]
internal static partial class Fading;

[GaussNormalMixture(12, new[] { 0.75, 0.25 }, new[] { 4.0, 3.25 }, new[] { 0.125, 0.5 })]
internal static partial class Quay;

[GaussEvenExponential(16, 0.0, 1.0)]
internal static partial class QuarticWell;

[GaussEvenExponential(16, -2.0, 1.0)]
internal static partial class Pendulum;

[GaussEvenExponential(5, -2.0, 1.0, Format = NumberFormat.Binary32)]
internal static partial class PendulumSingle;

[LogNormalMoments(logMean: 0.0, logStandardDeviation: 0.25, MaximumOrder = 6)]
internal static partial class FadingMoments;

[HalfIntegerGamma(171)]
internal static partial class HalfGamma;

[HalfIntegerGamma(34, Format = NumberFormat.Binary32)]
internal static partial class HalfGammaSingle;

[OscillatorMatrixElements(size: 4, power: 4)]
internal static partial class QuarticSpring;

[OscillatorMatrixElements(size: 3, power: 6)]
internal static partial class SexticSpring;

[GaussHermite(4, ErrorEstimate = true)]
internal static partial class FourWithError;

[GaussHermite(5, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32, ErrorEstimate = true)]
internal static partial class FivePhysicistWithError;

[GaussHalfRangeHermite(4, ErrorEstimate = true)]
internal static partial class RollWithError;

[GaussEvenExponential(4, -2.0, 1.0, ErrorEstimate = true)]
internal static partial class PendulumWithError;

[NestedHermite(2, ErrorEstimate = true)]
internal static partial class Nine;

[NestedHermite(0, ErrorEstimate = true)]
internal static partial class Mean;

[NestedHermite(4)]
internal static partial class ThirtyFive;

[TruncatedNormalMoments(mean: 1.5, standardDeviation: 0.5, lower: 0.5, upper: double.PositiveInfinity, MaximumOrder = 6)]
internal static partial class Depth;

[HalfNormalMoments(scale: 0.75, MaximumOrder = 9)]
internal static partial class RollMoments;

[EvenExponentialMoments(-2.0, 1.0, MaximumOrder = 8)]
internal static partial class PendulumMoments;
