using System;
using System.Globalization;
using System.IO;
using System.Threading;
using BenchmarkDotNet.Running;
using GaussGen.Benchmarks;
using GaussGen.Mathematics.Approximations;

if (args is ["construction"])
{
    ConstructionComparison.Run();
    return;
}

if (args is ["accuracy"])
{
    AccuracyComparison.Run();
    return;
}

if (args is ["families"])
{
    FamilyTimes.Run();
    return;
}

if (args is ["functions", ..])
{
    // A number of points and names of functions may follow.
    FunctionAccuracy.Run(args.Length > 1 ? int.Parse(args[1], CultureInfo.InvariantCulture) : 1_000_000, args.AsSpan(Math.Min(2, args.Length)).ToArray());
    return;
}

if (args is ["function-speed"])
{
    FunctionSpeed.Run();
    return;
}

if (args is ["function-tables", string path])
{
    // UTF-8 without a mark, as every file here.
    File.WriteAllText(path, FunctionTableText.Write(CancellationToken.None));
    return;
}

BenchmarkSwitcher.FromAssembly(typeof(ConstructionBenchmarks).Assembly).Run(args);
