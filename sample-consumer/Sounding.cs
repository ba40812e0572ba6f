namespace SurveyBoat;

/// <summary>One reading of the echo sounder; lengths in metres.</summary>
/// <param name="Station">Where it was taken.</param>
/// <param name="Range">The measured range to the bottom.</param>
/// <param name="RangeDeviation">Its standard deviation.</param>
/// <param name="WaveDeviation">The standard deviation of the wave height at the bow.</param>
internal sealed record Sounding(string Station, double Range, double RangeDeviation, double WaveDeviation);
