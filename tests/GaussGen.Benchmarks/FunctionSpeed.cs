using System;
using System.Diagnostics;
using System.Globalization;
using System.Linq;
using GaussGen.Functions.Measuring;

namespace GaussGen.Benchmarks;

/// <summary>
/// What a call costs beside MathNet's, in one run: rounds alternate, so that a busy machine slows both alike, and the shortest
/// times are compared. Both are called through a delegate of the same kind, a lambda: one of a static method is slower by itself.
/// </summary>
internal static class FunctionSpeed
{
    private const int Calls = 4096;
    private const int Rounds = 200;

    internal static void Run()
    {
        Console.WriteLine("function             arguments            ns   MathNet ns   ratio");
        var random = new Sequence(7);
        foreach (MeasuredFunction function in MeasuredFunction.All.Where(function => function.Domain != Domain.Interval))
        {
            Func<double, double> ours = Single(function.Name);
            Func<double, double>? other = ReferenceFunctions.Find(function.Name);
            foreach ((string name, Func<double, double> argument) in Arguments(function.Domain))
            {
                double[] arguments = Enumerable.Range(0, Calls).Select(_ => argument(random.Next())).ToArray();
                (double own, double others) = Compare(ours, other ?? ours, arguments);
                Console.WriteLine(string.Format(
                    CultureInfo.InvariantCulture, "{0,-20} {1,-15} {2,7:F1} {3,12} {4,7}", function.Name, name, own,
                    other is null ? "-" : others.ToString("F1", CultureInfo.InvariantCulture),
                    other is null ? "-" : (others / own).ToString("F2", CultureInfo.InvariantCulture)));
            }
        }
    }

    private static Func<double, double> Single(string name) => name switch
    {
        "Erf" => x => ErrorFunction.Erf(x),
        "Erfc" => x => ErrorFunction.Erfc(x),
        "ErfcScaled" => x => ErrorFunction.ErfcScaled(x),
        "Inverse" => x => ErrorFunction.Inverse(x),
        "Density" => x => NormalDistribution.Density(x),
        "LogDensity" => x => NormalDistribution.LogDensity(x),
        "Cumulative" => x => NormalDistribution.Cumulative(x),
        "UpperTail" => x => NormalDistribution.UpperTail(x),
        "LogCumulative" => x => NormalDistribution.LogCumulative(x),
        _ => x => NormalDistribution.Quantile(x),
    };

    private static (string Name, Func<double, double> Argument)[] Arguments(Domain domain) => domain switch
    {
        Domain.Unit => [("0 to 1", u => u), ("1E-300 to 1", u => Math.Pow(10.0, -300.0 * u))],
        Domain.SignedUnit => [("-1 to 1", u => (2.0 * u) - 1.0), ("1 - 1E-15 to 0", u => 1.0 - Math.Pow(10.0, -15.0 * u))],
        Domain.Scaled => [("-3 to 3", u => (6.0 * u) - 3.0), ("-6 to 60", u => (66.0 * u) - 6.0)],
        _ => [("-3 to 3", u => (6.0 * u) - 3.0), ("-26 to 26", u => (52.0 * u) - 26.0)],
    };

    private static (double Own, double Others) Compare(Func<double, double> own, Func<double, double> other, double[] arguments)
    {
        // Long enough that both run as optimised code; the compiler works in the background.
        var warmUp = Stopwatch.StartNew();
        while (warmUp.ElapsedMilliseconds < 1500)
        {
            _ = Time(own, arguments) + Time(other, arguments);
        }

        double ownBest = double.MaxValue, otherBest = double.MaxValue;
        for (int round = 0; round < Rounds; round++)
        {
            ownBest = Math.Min(ownBest, Time(own, arguments));
            otherBest = Math.Min(otherBest, Time(other, arguments));
        }

        return (ownBest, otherBest);
    }

    private static double Time(Func<double, double> function, double[] arguments)
    {
        double sum = 0.0;
        long start = Stopwatch.GetTimestamp();
        foreach (double x in arguments)
        {
            sum += function(x);
        }

        double time = Stopwatch.GetElapsedTime(start).TotalNanoseconds / arguments.Length;
        GC.KeepAlive(sum);
        return time;
    }
}
