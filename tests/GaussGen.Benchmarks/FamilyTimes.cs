using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Benchmarks;

/// <summary>
/// How long the construction of a rule takes by family and number of points, from nothing to the last correctly rounded and proven binary64
/// value, in one run of a few minutes: medians of warm rounds, and the same with an error estimate.
/// </summary>
internal static class FamilyTimes
{
    private const int FirstWarmUpMilliseconds = 4000;
    private const int WarmUpMilliseconds = 400;
    private const int LeastRounds = 9;
    private const int RoundsMilliseconds = 300;

    private static readonly int[] Sizes = [5, 16, 32, 64];

    private static readonly (string Name, Func<int, RuleRequest> Request)[] Families =
    [
        ("Hermite", n => new GaussHermiteRequest(n, Mathematics.Rules.HermiteConvention.Probabilist, BinaryFormat.Binary64, false)),
        ("half-range", n => new GaussHalfRangeHermiteRequest(n, BinaryFormat.Binary64, false)),
        ("truncated (-1, 2)", n => Truncated(n, -1, 2)),
        ("truncated (0, inf)", n => Truncated(n, 0, double.PositiveInfinity)),
        ("truncated (8, inf)", n => Truncated(n, 8, double.PositiveInfinity)),
        ("truncated (-6, inf)", n => Truncated(n, -6, double.PositiveInfinity)),
        ("truncated (-40, 40)", n => Truncated(n, -40, 40)),
        ("truncated (0, 30)", n => Truncated(n, 0, 30)),
        ("truncated (36, 38)", n => Truncated(n, 36, 38)),
        ("generalized Hermite 0.25", n => new GaussGeneralizedHermiteRequest(n, 0.25, BinaryFormat.Binary64, false)),
        ("log-normal (0, 0.25)", n => new GaussLogNormalRequest(n, 0, 0.25, BinaryFormat.Binary64, false)),
        ("log-normal (0, 1)", n => new GaussLogNormalRequest(n, 0, 1, BinaryFormat.Binary64, false)),
        ("mixture of 2", n => new GaussNormalMixtureRequest(n, new([0.3, 0.7]), new([-1, 2]), new([0.5, 1.5]), BinaryFormat.Binary64, false)),
        ("mixture of 64", n => new GaussNormalMixtureRequest(
            n, Ramp(1, 1), Ramp(-3, 0.1), Ramp(0.5, 0.01), BinaryFormat.Binary64, false)),
        ("quartic", n => Even(n, 0, 1)),
        ("double well", n => Even(n, -2, 0.5)),
        ("sextic", n => Even(n, 1, 0, 0.1)),
    ];

    internal static void Run()
    {
        // The pipeline is the same for all families, and the compiler works in the background.
        _ = Times(Families[1].Request(32) with { ErrorEstimate = true }, FirstWarmUpMilliseconds, 1);
        Console.WriteLine("Median of warm constructions in ms (with error estimate)");
        Console.WriteLine(Row("family", Sizes.Select(n => "n = " + n.ToString(CultureInfo.InvariantCulture))));
        foreach ((string name, Func<int, RuleRequest> request) in Families)
        {
            Console.WriteLine(Row(name, Sizes.Select(n => Cell(request(n)))));
        }
    }

    private static string Cell(RuleRequest request) => Median(request) + " (" + Median(request with { ErrorEstimate = true }) + ")";

    private static string Median(RuleRequest request)
    {
        try
        {
            _ = Times(request, WarmUpMilliseconds, 1);
        }
        catch (RuleConstructionException)
        {
            return "refused";
        }

        List<double> times = Times(request, RoundsMilliseconds, LeastRounds);
        times.Sort();
        return times[times.Count / 2].ToString("F3", CultureInfo.InvariantCulture);
    }

    private static List<double> Times(RuleRequest request, int milliseconds, int least)
    {
        var times = new List<double>();
        var all = Stopwatch.StartNew();
        while (all.ElapsedMilliseconds < milliseconds || times.Count < least)
        {
            long start = Stopwatch.GetTimestamp();
            _ = RuleRounding.Round(request.Construct(CancellationToken.None), request.Format, request.DropZeroWeights, CancellationToken.None);
            times.Add(Stopwatch.GetElapsedTime(start).TotalMilliseconds);
        }

        return times;
    }

    private static string Row(string name, IEnumerable<string> cells) =>
        name.PadRight(26) + string.Concat(cells.Select(cell => cell.PadLeft(20)));

    private static GaussTruncatedNormalRequest Truncated(int points, double lower, double upper) =>
        new(points, lower, upper, BinaryFormat.Binary64, false);

    private static GaussEvenExponentialRequest Even(int points, params double[] coefficients) =>
        new(points, new ValueList(coefficients), BinaryFormat.Binary64, false);

    private static ValueList Ramp(double first, double step) => new(Enumerable.Range(0, 64).Select(i => first + (step * i)));
}
