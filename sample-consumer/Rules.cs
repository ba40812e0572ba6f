using GaussGen;

namespace SurveyBoat;

/// <summary>Sixteen nodes in double precision: for functions as smooth as the echo.</summary>
[GaussHermite(16)]
internal static partial class Sixteen
{
}

/// <summary>Thirty-two nodes in single precision, the number type of the boat's controller: for steep functions.</summary>
[GaussHermite(32, Format = NumberFormat.Binary32)]
internal static partial class ThirtyTwo
{
}

/// <summary>The speed at which the boat drifts with the current, in metres a second.</summary>
[NormalMoments(mean: 0.6, standardDeviation: 0.15, MaximumOrder = 4)]
internal static partial class DriftSpeed
{
    public const double Mean = 0.6;
    public const double StandardDeviation = 0.15;
}
