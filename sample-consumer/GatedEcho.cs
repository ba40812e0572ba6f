using GaussGen;

namespace SurveyBoat;

/// <summary>
/// The echo again, of those readings alone that the sounder's gate lets pass: it discards what is more than one deviation nearer than
/// expected (fish and bubbles) or two and a half farther (the second echo). The readings that pass are normal no longer.
/// </summary>
internal readonly struct GatedEcho(Sounding sounding, Echo echo) : IIntegrand<double>
{
    /// <param name="x">The reading's distance from the expected range in units of its deviation.</param>
    public double Evaluate(double x) => echo.Evaluate(sounding.Range + (sounding.RangeDeviation * x));

    /// <summary>The mean echo of the readings that pass at a station, from the rule and from draws.</summary>
    public static Comparison At(Sounding sounding, Simulation simulation)
    {
        GatedEcho gated = new(sounding, new Echo(absorptionPerMetre: 0.05));
        return new Comparison(
            sounding.Station, gated.Evaluate(0.0), Gate.Expectation(gated), simulation.Mean(() => Passing(simulation), gated.Evaluate));
    }

    /// <summary>The next reading that passes.</summary>
    private static double Passing(Simulation simulation)
    {
        double x;
        do
        {
            x = simulation.Normal(0.0, 1.0);
        }
        while (x is < Gate.GateBelow or > Gate.GateAbove);

        return x;
    }
}
