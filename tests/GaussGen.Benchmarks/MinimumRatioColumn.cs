using System.Globalization;
using System.Linq;
using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Reports;
using BenchmarkDotNet.Running;

namespace GaussGen.Benchmarks;

/// <summary>
/// The smallest time over the smallest time of the baseline. Whatever else a machine does makes a loop slower and never faster,
/// so the smallest of many short iterations is what comes closest to the loop itself.
/// </summary>
internal sealed class MinimumRatioColumn : IColumn
{
    public string Id => nameof(MinimumRatioColumn);

    public string ColumnName => "Min ratio";

    public bool AlwaysShow => true;

    public ColumnCategory Category => ColumnCategory.Baseline;

    public int PriorityInCategory => 0;

    public bool IsNumeric => true;

    public UnitType UnitType => UnitType.Dimensionless;

    public string Legend => "Min over the baseline's Min";

    public string GetValue(Summary summary, BenchmarkCase benchmarkCase)
    {
        // By type and parameters, so that it means the same in the one table that --join makes.
        BenchmarkCase? baseline = summary.BenchmarksCases.FirstOrDefault(other =>
            other.Descriptor.Baseline
            && other.Descriptor.Type == benchmarkCase.Descriptor.Type
            && other.Parameters.ValueInfo == benchmarkCase.Parameters.ValueInfo);
        return baseline is not null
            && summary[baseline]?.ResultStatistics is { } reference
            && summary[benchmarkCase]?.ResultStatistics is { } own
            ? (own.Min / reference.Min).ToString("F3", CultureInfo.InvariantCulture)
            : "?";
    }

    public string GetValue(Summary summary, BenchmarkCase benchmarkCase, SummaryStyle style) => GetValue(summary, benchmarkCase);

    public bool IsAvailable(Summary summary) => true;

    public bool IsDefault(Summary summary, BenchmarkCase benchmarkCase) => false;
}
