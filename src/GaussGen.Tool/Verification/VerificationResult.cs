using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>What a run ends with, for the shell that started it.</summary>
internal static class ExitCode
{
    /// <summary>Everything is proven.</summary>
    public const int AllProven = 0;

    /// <summary>Something is wrong, or not proven.</summary>
    public const int NotAllProven = 1;

    /// <summary>Something could not be read, there was nothing to prove, or the command line is wrong.</summary>
    public const int NotRead = 2;

    /// <summary>The run was interrupted (128 and the number of the interrupt signal).</summary>
    public const int Interrupted = 130;
}

/// <summary>The outcome of a verification.</summary>
/// <param name="Files">A result a file, in the order of the search.</param>
/// <param name="AllowsEmpty">Whether having found no table at all is in order.</param>
internal sealed record VerificationResult(IReadOnlyList<FileResult> Files, bool AllowsEmpty)
{
    /// <summary>All tables of all files.</summary>
    public IEnumerable<TableResult> Tables => Files.SelectMany(file => file.Tables);

    /// <summary>The files that should have been read and were not.</summary>
    public IEnumerable<FileResult> Unreadable => Files.Where(file => file.IsUnreadable);

    /// <summary>The files that were named, were read, and hold no table.</summary>
    public IEnumerable<FileResult> NamedWithoutTable =>
        AllowsEmpty ? [] : Files.Where(file => file is { IsNamed: true, Assembly: not null, Tables.Count: 0 });

    /// <summary>Whether no table was found anywhere although there should be one.</summary>
    public bool IsEmpty => !AllowsEmpty && !Tables.Any();

    /// <summary>The number of files passed by for a reason.</summary>
    public int Skipped(UnreadableReason reason) => Files.Count(file => file.IsSkipped && file.Error!.Reason == reason);

    /// <summary>
    /// The exit code. What is wrong goes before what could not be read: it is known, and hiding it behind an unreadable file
    /// would be worse.
    /// </summary>
    public int ExitCode =>
        Tables.Any(table => table.Verdict != Verdict.Proven) ? Verification.ExitCode.NotAllProven
        : Unreadable.Any() || NamedWithoutTable.Any() || IsEmpty ? Verification.ExitCode.NotRead
        : Verification.ExitCode.AllProven;
}
