using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>Finds, reads and proves, on all cores; what comes out is in the order of the search whatever the cores do.</summary>
internal static class Verifier
{
    /// <summary>Verifies every table in the files and folders.</summary>
    /// <param name="paths">Assemblies and folders.</param>
    /// <param name="allowEmpty">Whether having found no table is in order.</param>
    /// <param name="progress">Told how far the work is.</param>
    /// <param name="cancellation">Ends the work early.</param>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static VerificationResult Run(
        IReadOnlyList<string> paths, bool allowEmpty, VerificationProgress progress, CancellationToken cancellation)
    {
        IReadOnlyList<FileResult> files = Read(paths, progress, cancellation);
        (int File, DeclaredTable Table)[] tables =
        [
            .. files.SelectMany((file, index) =>
                (file.Assembly?.Types ?? []).SelectMany(DeclaredTable.Of).Select(table => (index, table))),
        ];
        TableResult[] results = Prove([.. tables.Select(table => table.Table)], progress, cancellation);
        ILookup<int, TableResult> byFile = tables.Zip(results).ToLookup(pair => pair.First.File, pair => pair.Second);
        return new VerificationResult([.. files.Select((file, index) => file with { Tables = [.. byFile[index]] })], allowEmpty);
    }

    /// <summary>Finds and reads files; none of their tables is proven, and the results have none.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static IReadOnlyList<FileResult> Read(IReadOnlyList<string> paths, VerificationProgress progress, CancellationToken cancellation)
    {
        IReadOnlyList<SearchedFile> files = AssemblySearch.Find(paths, cancellation);
        FileResult[] read = new FileResult[files.Count];
        progress.BeginReading(files.Count);
        InParallel(Enumerable.Range(0, files.Count), index =>
        {
            read[index] = Read(files[index], cancellation);
            progress.EndFile();
        }, cancellation);
        return read;
    }

    /// <summary>Proves tables; the results are in the order of the tables.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static TableResult[] Prove(IReadOnlyList<DeclaredTable> tables, VerificationProgress progress, CancellationToken cancellation)
    {
        TableVerifier verifier = new();
        TableResult[] results = new TableResult[tables.Count];
        progress.BeginProving([.. tables.Select(table => table.Size)]);

        // The largest first, so that no core is left with one of them at the end.
        IEnumerable<int> order = Enumerable.Range(0, tables.Count).OrderByDescending(index => tables[index].Size);
        InParallel(order, index =>
        {
            results[index] = verifier.Verify(tables[index], progress.OfTable(index), cancellation);
            progress.EndTable(index);
        }, cancellation);
        return results;
    }

    private static FileResult Read(SearchedFile file, CancellationToken cancellation)
    {
        if (file.Error is not null)
        {
            return new FileResult(file.Path, file.IsNamed, null, file.Error, []);
        }

        try
        {
            using AssemblyImage image = AssemblyImage.Open(file.Path, cancellation);
            return new FileResult(file.Path, file.IsNamed, AssemblyReader.Read(image, cancellation), null, []);
        }
        catch (UnreadableException error)
        {
            return new FileResult(file.Path, file.IsNamed, null, error, []);
        }
    }

    private static void InParallel(IEnumerable<int> indices, Action<int> work, CancellationToken cancellation)
    {
        ParallelOptions options = new() { CancellationToken = cancellation, MaxDegreeOfParallelism = Environment.ProcessorCount };
        try
        {
            _ = Parallel.ForEach(Partitioner.Create(indices, EnumerablePartitionerOptions.NoBuffering), options, work);
        }
        catch (AggregateException error) when (cancellation.IsCancellationRequested)
        {
            throw new OperationCanceledException("The verification was interrupted.", error, cancellation);
        }
    }
}
