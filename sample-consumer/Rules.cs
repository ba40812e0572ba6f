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

/// <summary>
/// What is left of a normal reading in units of its deviation once the gate has shut: from 1 below the mean to 2.5 above it. Half a
/// gate is half a bell: a rule for the whole line would need hundreds of nodes to find its edges, this one has them in its weight function.
/// </summary>
[GaussTruncatedNormal(12, GateBelow, GateAbove)]
internal static partial class Gate
{
    public const double GateBelow = -1.0;
    public const double GateAbove = 2.5;
}

/// <summary>
/// The current across the survey line, in metres a second: slack water for three tenths of the time, a running tide otherwise. One normal
/// distribution has no two humps; with the mixture as the weight function, one table serves both states at once.
/// </summary>
[GaussNormalMixture(
    10,
    new[] { 0.3, 0.7 },
    new[] { SlackSpeed, TideSpeed },
    new[] { SlackDeviation, TideDeviation },
    ErrorEstimate = true)]
internal static partial class Tide
{
    public const double SlackShare = 0.3;
    public const double SlackSpeed = 0.1;
    public const double SlackDeviation = 0.05;
    public const double TideSpeed = 0.8;
    public const double TideDeviation = 0.15;
}
