using System;

namespace SurveyBoat;

/// <summary>A mean over draws, and the standard error of that mean.</summary>
internal readonly record struct SimulatedMean(double Value, double StandardError);

/// <summary>Draws from normal distributions. The seed is fixed, so that every run sees the same ones.</summary>
internal sealed class Simulation(int draws, int seed)
{
    private readonly Random _random = new(seed);

    /// <summary>How many draws make a mean.</summary>
    public int Draws => draws;

    /// <summary>The mean of a function of a normal variable.</summary>
    public SimulatedMean Mean(double mean, double standardDeviation, Func<double, double> function) =>
        Mean(() => Normal(mean, standardDeviation), function);

    /// <summary>The mean of a function of what a source draws, with its standard error (running variance: Welford 1962).</summary>
    public SimulatedMean Mean(Func<double> source, Func<double, double> function)
    {
        double average = 0.0;
        double squares = 0.0;
        for (int count = 1; count <= draws; count++)
        {
            double value = function(source());
            double difference = value - average;
            average += difference / count;
            squares += difference * (value - average);
        }

        return new SimulatedMean(average, Math.Sqrt(squares / (draws - 1.0) / draws));
    }

    /// <summary>A number between 0 and 1, 1 excluded.</summary>
    public double Uniform() => _random.NextDouble();

    /// <summary>A normal number.</summary>
    public double Normal(double mean, double standardDeviation) => mean + (standardDeviation * StandardNormal());

    /// <summary>A standard normal number (Box and Muller 1958); the logarithm's argument is never zero.</summary>
    private double StandardNormal() =>
        Math.Sqrt(-2.0 * Math.Log(1.0 - _random.NextDouble())) * Math.Cos(2.0 * Math.PI * _random.NextDouble());
}
