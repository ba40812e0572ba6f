using System;

namespace SurveyBoat;

/// <summary>An expectation beside a simulation of it.</summary>
/// <param name="Label">What it is.</param>
/// <param name="AtTheMean">The function's value at the mean: what one gets by forgetting the noise.</param>
/// <param name="Calculated">The expectation, from generated constants.</param>
/// <param name="Simulated">The mean over draws.</param>
internal sealed record Comparison(string Label, double AtTheMean, double Calculated, SimulatedMean Simulated)
{
    private const double Limit = 5.0;

    /// <summary>How far the two are apart, in standard errors of the simulation.</summary>
    public double StandardErrorsApart =>
        Calculated == Simulated.Value ? 0.0 : (Calculated - Simulated.Value) / Simulated.StandardError;

    /// <summary>Whether they agree within five standard errors.</summary>
    public bool Agrees => Math.Abs(StandardErrorsApart) <= Limit;
}
