using System;
using System.Globalization;
using System.Linq;
using GaussGen.Functions.Measuring;
using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Benchmarks;

/// <summary>
/// The error functions against enclosures of 128 bits: the share of results that are the nearest number, the largest error, the five
/// worst points with MathNet's error at each, and MathNet's largest error on the same points.
/// </summary>
internal static class FunctionAccuracy
{
    private const int Worst = 5;

    internal static void Run(int count, string[] names)
    {
        var reference = new NormalReference(128);
        foreach (MeasuredFunction function in MeasuredFunction.All.Where(function => names.Length == 0 || names.Contains(function.Name)))
        {
            Func<double, double>? other = ReferenceFunctions.Find(function.Name);
            var found = Points.For(function, count).AsParallel().Select(point => Measure(reference, function, other, point)).ToList();
            double nearest = 100.0 * found.Count(entry => entry.Error <= 0.5) / found.Count;
            Write("{0}: {1} points, {2:F2} % nearest, largest error {3:F3}", function.Name, found.Count, nearest, found.Max(entry => entry.Error));
            if (other is not null)
            {
                Entry bad = found.MaxBy(entry => double.IsNaN(entry.Other) ? double.PositiveInfinity : entry.Other);
                Write("   MathNet's largest error {0:G4} at {1:R}", bad.Other, bad.First);
            }

            foreach (Entry entry in found.OrderByDescending(entry => entry.Error).Take(Worst))
            {
                Write("   {0:F3} at {1:R} {2} MathNet {3:G4}", entry.Error, entry.First,
                    function.Domain == Domain.Interval ? entry.Second.ToString("R", CultureInfo.InvariantCulture) : string.Empty, entry.Other);
            }

            double single = Points.For(function, count / 4).AsParallel().Max(point => MeasureSingle(reference, function, point));
            Write("   binary32: largest error {0:F4} at {1} points", single, count / 4);
        }
    }

    private static Entry Measure(
        NormalReference reference, MeasuredFunction function, Func<double, double>? other, (double First, double Second) point)
    {
        double value = function.Binary64(point.First, point.Second);
        Ball truth = function.Truth(reference, point.First, point.Second, value);
        double otherError = other is null ? double.NaN : UlpError.Of(truth, other(point.First), BinaryFormat.Binary64);
        return new(UlpError.Of(truth, value, BinaryFormat.Binary64), point.First, point.Second, otherError);
    }

    private static double MeasureSingle(NormalReference reference, MeasuredFunction function, (double First, double Second) point) =>
        SingleError.Of(reference, function, (float)point.First, (float)point.Second);

    private static void Write(string format, params object?[] values) =>
        Console.WriteLine(string.Format(CultureInfo.InvariantCulture, format, values));

    private readonly record struct Entry(double Error, double First, double Second, double Other);
}
