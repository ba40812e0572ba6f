using System;
using GaussGen;

namespace SurveyBoat;

/// <summary>
/// How strong an echo comes back from a range, relative to one metre without loss: it spreads over a surface that grows with
/// the square of the range, and the water absorbs it on the way there and back. The range is noisy and the function is curved, so
/// the mean echo is not the echo of the mean range.
/// </summary>
internal readonly struct Echo(double absorptionPerMetre) : IIntegrand<double>
{
    public double Evaluate(double range) => Math.Exp(-2.0 * absorptionPerMetre * range) / (range * range);

    /// <summary>The mean echo at a station, from the rule and from draws.</summary>
    public static Comparison At(Sounding sounding, Simulation simulation)
    {
        Echo echo = new(absorptionPerMetre: 0.05);
        return new Comparison(
            sounding.Station,
            echo.Evaluate(sounding.Range),
            Sixteen.Expectation(sounding.Range, sounding.RangeDeviation, echo),
            simulation.Mean(sounding.Range, sounding.RangeDeviation, echo.Evaluate));
    }
}
