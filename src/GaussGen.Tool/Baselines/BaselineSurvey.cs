using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Baselines;

/// <summary>A table as it was found, and in which file.</summary>
/// <param name="Entry">The table.</param>
/// <param name="Path">The first file that holds it so.</param>
internal sealed record SurveyedTable(BaselineEntry Entry, string Path);

/// <summary>All tables of files and folders, none of them proven: a baseline says what was reviewed, not what is right.</summary>
/// <param name="Files">The files; each result holds its tables, and a finding where one could not be read.</param>
/// <param name="Tables">The tables that could be read, each once however many copies there are, in ordinal order.</param>
/// <param name="AllowsEmpty">Whether having found no table at all is in order.</param>
internal sealed record BaselineSurvey(IReadOnlyList<FileResult> Files, IReadOnlyList<SurveyedTable> Tables, bool AllowsEmpty)
{
    /// <summary>What could not be read, in the terms of a verification.</summary>
    public VerificationResult Result => new(Files, AllowsEmpty);

    /// <summary>Whether there is a file, a folder or a table that should have been read and was not.</summary>
    public bool HasUnread => Result.Unreadable.Any() || Result.Tables.Any(table => table.Findings.Count > 0);

    /// <summary>Whether something was not read, or was not there to be read.</summary>
    public bool IsIncomplete => HasUnread || Result.NamedWithoutTable.Any() || Result.IsEmpty;

    /// <summary>Whether an assembly of this name, as a baseline writes it, was read.</summary>
    public bool HasAssembly(string name) => Files.Any(file => file.Assembly is not null && BaselineEntry.Escape(file.Assembly.Name) == name);

    /// <summary>The tables of which there are copies that differ.</summary>
    public IEnumerable<IReadOnlyList<SurveyedTable>> Conflicts =>
        Tables.GroupBy(table => table.Entry.Identity).Select(group => group.ToList()).Where(group => group.Count > 1);

    /// <summary>Reads all tables.</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public static BaselineSurvey Of(IReadOnlyList<string> paths, bool allowsEmpty, VerificationProgress progress, CancellationToken cancellation)
    {
        List<FileResult> files = [];
        Dictionary<BaselineEntry, SurveyedTable> tables = [];
        foreach (FileResult file in Verifier.Read(paths, progress, cancellation))
        {
            List<TableResult> results = [];
            foreach (ReadTable table in (file.Assembly?.Types ?? []).SelectMany(DeclaredTable.Of).Select(ReadTable.Of))
            {
                cancellation.ThrowIfCancellationRequested();
                string? reason = Reason(table);
                results.Add(ResultOf(table, reason));
                if (reason is null)
                {
                    BaselineEntry entry = EntryOf(file.Assembly!, table);
                    _ = tables.TryAdd(entry, new SurveyedTable(entry, file.Path));
                }
            }

            files.Add(file with { Tables = results });
        }

        return new BaselineSurvey(files, [.. tables.Values.OrderBy(table => table.Entry.Line, System.StringComparer.Ordinal)], allowsEmpty);
    }

    private static BaselineEntry EntryOf(FoundAssembly assembly, ReadTable table) => BaselineEntry.Of(
        assembly.Name,
        table.Declared.Type.Name,
        table.Declared.Attribute,
        table.Claim!.Title,
        table.Claim.Format.Name,
        FoundDigest.Of(table.Data!, table.Family!));

    private static string? Reason(ReadTable table)
    {
        string? missing = table.Data is null ? null : table.Family!.Spans.FirstOrDefault(span => table.Data.Spans.All(found => found.Name != span));
        return missing is null ? table.Reason : $"{missing} is missing; build again with the package's generator";
    }

    private static TableResult ResultOf(ReadTable table, string? reason) => new(
        table.Declared.Type,
        table.Declared.Attribute,
        table.Claim,
        null,
        table.Declared.Size,
        reason is null ? [] : [new Finding(FindingKind.NotProven, null, reason)]);
}
