using System;
using System.Collections.Generic;

namespace SurveyBoat;

/// <summary>
/// The boat holds its speed along a survey line while a current pushes across: how far it must point upstream, and what that costs. Both are
/// curved functions of the current, and the current has two humps.
/// </summary>
internal static class Crabbing
{
    private const double SpeedAlongLine = 1.6;   // metres a second
    private const double DegreesPerRadian = 180.0 / Math.PI;

    private const double MeanCurrent = (Tide.SlackShare * Tide.SlackSpeed) + ((1.0 - Tide.SlackShare) * Tide.TideSpeed);

    public static IEnumerable<Comparison> Compare(Simulation simulation)
    {
        yield return Result("crab angle, degrees", Angle);
        yield return Result("extra power, %", ExtraPower);

        Comparison Result(string label, Func<double, double> function) => new(
            label, function(MeanCurrent), Tide.Expectation(function), simulation.Mean(() => Current(simulation), function));
    }

    /// <summary>What the rule itself says of its error in the crab angle, in degrees: an estimate and no bound.</summary>
    public static double EstimatedError()
    {
        _ = Tide.ExpectationWithError(Angle, out double error);
        return error;
    }

    private static double Angle(double current) => DegreesPerRadian * Math.Atan(current / SpeedAlongLine);

    /// <summary>Power grows with the cube of the speed through the water, which is √(v² + u²).</summary>
    private static double ExtraPower(double current)
    {
        double ratio = current / SpeedAlongLine;
        return 100.0 * (Math.Pow(1.0 + (ratio * ratio), 1.5) - 1.0);
    }

    private static double Current(Simulation simulation) => simulation.Uniform() < Tide.SlackShare
        ? simulation.Normal(Tide.SlackSpeed, Tide.SlackDeviation)
        : simulation.Normal(Tide.TideSpeed, Tide.TideDeviation);
}
