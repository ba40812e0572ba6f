using System;
using System.Diagnostics;
using System.Globalization;

namespace GaussGen.Benchmarks;

/// <summary>
/// The two constructions side by side in one run of a minute, where the full benchmark takes many: rounds alternate, so that a busy
/// machine slows both alike, and medians are compared.
/// </summary>
internal static class ConstructionComparison
{
    internal static void Run()
    {
        Console.WriteLine("n      eigenvalues µs   certified µs   ratio   wanted");
        foreach ((int points, int rounds, int wanted) in new[] { (5, 301, 0), (20, 301, 0), (64, 301, 10), (200, 31, 0), (1000, 5, 100) })
        {
            var benchmark = new ConstructionBenchmarks { Points = points };
            // Long enough that both run as compiled and optimised code; the compiler works in the background.
            var warmUp = Stopwatch.StartNew();
            while (warmUp.ElapsedMilliseconds < 2000)
            {
                _ = benchmark.Certified();
                _ = points <= 200 ? benchmark.Eigenvalues() : 0;
            }

            double[] eigenvalues = new double[rounds], certified = new double[rounds];
            for (int round = 0; round < rounds; round++)
            {
                eigenvalues[round] = Time(() => benchmark.Eigenvalues());
                certified[round] = Time(() => benchmark.Certified());
            }

            Array.Sort(eigenvalues);
            Array.Sort(certified);
            double slow = eigenvalues[rounds / 2], fast = certified[rounds / 2];
            string line = string.Format(
                CultureInfo.InvariantCulture, "{0,-6} {1,14:F1} {2,14:F1} {3,7:F0}   {4}", points, slow, fast, slow / fast, wanted > 0 ? wanted : string.Empty);
            Console.WriteLine(line);
        }
    }

    private static double Time(Action action)
    {
        long start = Stopwatch.GetTimestamp();
        action();
        return Stopwatch.GetElapsedTime(start).TotalMicroseconds;
    }
}
