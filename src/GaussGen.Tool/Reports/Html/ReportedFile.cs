using System.Collections.Generic;
using System.Linq;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>A table and the name that links within the report know it by.</summary>
/// <param name="Id">The identity: "table-1-12". Nothing of an assembly is in it.</param>
/// <param name="Table">The table.</param>
internal sealed record ReportedTable(string Id, TableResult Table);

/// <summary>A file with tables.</summary>
/// <param name="File">The file.</param>
/// <param name="Tables">Its tables.</param>
internal sealed record ReportedFile(FileResult File, IReadOnlyList<ReportedTable> Tables)
{
    /// <summary>What a person knows the file by.</summary>
    public string Name => File.Assembly is { } assembly ? $"{assembly.Name} {assembly.Version}" : File.Path;

    /// <summary>The files with tables, in the order of the search.</summary>
    public static List<ReportedFile> Of(VerificationResult result) =>
    [
        .. result.Files.Where(file => file.Tables.Count > 0).Select((file, number) => new ReportedFile(
            file, [.. file.Tables.Select((table, index) => new ReportedTable($"table-{number + 1}-{index + 1}", table))])),
    ];
}
