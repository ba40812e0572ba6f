using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>What became of one declared table.</summary>
/// <param name="Type">The type that declares it, with all data found there.</param>
/// <param name="Attribute">The declaring attribute without its suffix; "?" where there is none.</param>
/// <param name="Claim">What the declaration promises; null if that could not be read.</param>
/// <param name="Proof">The proof; null if none could be tried.</param>
/// <param name="Entries">How many entries were found.</param>
/// <param name="Findings">What is to be said of it; empty exactly if all is proven.</param>
internal sealed record TableResult(
    FoundType Type, string Attribute, TableClaim? Claim, TableProof? Proof, int Entries, IReadOnlyList<Finding> Findings)
{
    /// <summary>The claim in words.</summary>
    public string What => Claim?.Title ?? $"[{Attribute}]";

    /// <summary>The number format's name; "?" where no claim could be read.</summary>
    public string Format => Claim?.Format.Name ?? "?";

    /// <summary>The digest of the table's data, as baselines name it; null where the table could not be read.</summary>
    public string? Digest { get; init; }

    /// <summary>How many entries are proven.</summary>
    public int Proven => Proof?.ProvenCount ?? 0;

    /// <summary>The largest distance of an entry from its true value, in ulp; null without a proof.</summary>
    public double? WorstDistanceInUlp => Proof is { Entries.Count: > 0 } ? Proof.WorstDistanceInUlp : null;

    /// <summary>The verdict on the whole table.</summary>
    public Verdict Verdict =>
        Findings.Any(finding => finding.Kind is FindingKind.WrongEntry or FindingKind.WrongShape) ? Verdict.Wrong
        : Findings.Count > 0 ? Verdict.Unproven
        : Verdict.Proven;
}

/// <summary>What became of one file.</summary>
/// <param name="Path">The path as it is shown: as given, or below the folder as given.</param>
/// <param name="IsNamed">Whether the path itself was given, and not a folder above it.</param>
/// <param name="Assembly">What was found; null if the file could not be read.</param>
/// <param name="Error">Why it could not be read; null if it was.</param>
/// <param name="Tables">The results of its tables.</param>
internal sealed record FileResult(
    string Path, bool IsNamed, FoundAssembly? Assembly, UnreadableException? Error, IReadOnlyList<TableResult> Tables)
{
    /// <summary>Whether the file was passed by: usual in a folder and of no interest to a search for tables.</summary>
    public bool IsSkipped => Error is { IsUsualInFolders: true } && !IsNamed;

    /// <summary>Whether the file is one that should have been read and was not.</summary>
    public bool IsUnreadable => Error is not null && !IsSkipped;
}
