using BenchmarkDotNet.Running;
using GaussGen.Benchmarks;

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

BenchmarkSwitcher.FromAssembly(typeof(ConstructionBenchmarks).Assembly).Run(args);
