using System;
using System.Collections.Generic;

namespace SurveyBoat;

/// <summary>What the drift costs: powers of a normal speed, whose means are moments and need no rule.</summary>
internal static class Drift
{
    private const double Mass = 38.0;            // kilograms
    private const double Drag = 21.0;            // newtons for each (metre a second) squared
    private const double SecondsPerHour = 3600.0;

    private const double MeanEnergy = 0.5 * Mass * DriftSpeed.Raw2;

    public static IEnumerable<Comparison> Compare(Simulation simulation)
    {
        yield return Result("kinetic energy, J", MeanEnergy, Energy);
        yield return Result(
            "its variance, J^2",
            0.25 * Mass * Mass * (DriftSpeed.Raw4 - (DriftSpeed.Raw2 * DriftSpeed.Raw2)),
            speed => Square(Energy(speed) - MeanEnergy));
        yield return Result("power against drag, W", Drag * DriftSpeed.Raw3, speed => Drag * speed * speed * speed);
        yield return Result(
            "miss after an hour, m",
            SecondsPerHour * DriftSpeed.Absolute1,
            speed => SecondsPerHour * Math.Abs(speed - DriftSpeed.Mean));

        Comparison Result(string label, double calculated, Func<double, double> function) => new(
            label,
            function(DriftSpeed.Mean),
            calculated,
            simulation.Mean(DriftSpeed.Mean, DriftSpeed.StandardDeviation, function));
    }

    private static double Energy(double speed) => 0.5 * Mass * Square(speed);

    private static double Square(double value) => value * value;
}
