using System;

namespace SurveyBoat;

/// <summary>
/// Whether a wave slaps the bow: the higher it rises above the clearance, the surer it does. The flare of the hull makes the
/// step a smooth one. Computed in single precision, as the boat's controller does.
/// </summary>
internal static class WaveSlap
{
    private const float BowClearance = 0.45f;   // metres
    private const float Softness = 0.14f;       // metres

    /// <summary>The probability of a slap at a station, from the rule and from draws.</summary>
    public static Comparison At(Sounding sounding, Simulation simulation) => new(
        sounding.Station,
        ChanceAt(0.0f),
        ThirtyTwo.Expectation(0.0f, (float)sounding.WaveDeviation, ChanceAt),
        simulation.Mean(0.0, sounding.WaveDeviation, height => ChanceAt((float)height)));

    /// <summary>The chance of a slap when the wave has a given height at the bow.</summary>
    private static float ChanceAt(float height) => 1.0f / (1.0f + MathF.Exp((BowClearance - height) / Softness));
}
