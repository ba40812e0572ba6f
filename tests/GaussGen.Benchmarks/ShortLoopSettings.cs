using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Diagnosers;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Order;
using BenchmarkDotNet.Toolchains.InProcess.Emit;
using Perfolizer.Horology;

namespace GaussGen.Benchmarks;

/// <summary>
/// For loops of nanoseconds: in one process, so that all forms of a group run within seconds of each other; many iterations, so
/// short that some run undisturbed on a busy machine, and the ratio of the smallest; and the bytes that are allocated.
/// </summary>
internal sealed class ShortLoopSettings : ManualConfig
{
    public ShortLoopSettings()
    {
        _ = AddJob(Job.Default
            .WithToolchain(InProcessEmitToolchain.Instance)
            .WithWarmupCount(30)
            .WithIterationCount(150)
            .WithIterationTime(TimeInterval.FromMilliseconds(8)));
        _ = AddDiagnoser(MemoryDiagnoser.Default);
        _ = WithOrderer(new DefaultOrderer(SummaryOrderPolicy.Declared, MethodOrderPolicy.Declared));
        _ = AddColumn(StatisticColumn.Min, new MinimumRatioColumn());
        _ = HideColumns(Column.Error, Column.StdDev, Column.Ratio, Column.RatioSD, Column.AllocRatio);
    }
}
