using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The outcome of proving one claim.</summary>
/// <param name="Claim">What was promised.</param>
/// <param name="Entries">A verdict on each entry that the claim speaks of and that was found, in the order of the members.</param>
/// <param name="Faults">
/// Sentences, one for each way in which the shape of the data breaks the promise: a member that is missing, of another type or of
/// another length.
/// </param>
/// <param name="MomentEquations">
/// For a rule, how well the found entries meet the moment equations that define it; empty for other tables, and where an entry
/// is not proven.
/// </param>
public sealed record TableProof(
    TableClaim Claim,
    IReadOnlyList<EntryProof> Entries,
    IReadOnlyList<string> Faults,
    IReadOnlyList<MomentEquation> MomentEquations)
{
    /// <summary>The number of proven entries.</summary>
    public int ProvenCount { get; } = Count(Entries, Verdict.Proven);

    /// <summary>The number of entries that are proven to be wrong.</summary>
    public int WrongCount { get; } = Count(Entries, Verdict.Wrong);

    /// <summary>The number of entries on which there is no verdict.</summary>
    public int UnprovenCount { get; } = Count(Entries, Verdict.Unproven);

    /// <summary>Whether every entry is proven and the shape is as promised.</summary>
    public bool IsProven => Verdict == Verdict.Proven;

    /// <summary>
    /// The table's verdict: wrong with one wrong entry or fault, else unproven with one unproven entry, else proven. Where every
    /// entry is proven and a moment equation does not hold, the proof contradicts itself, and proves nothing.
    /// </summary>
    public Verdict Verdict =>
        WrongCount > 0 || Faults.Count > 0 ? Verdict.Wrong
        : UnprovenCount > 0 || MomentEquations.Any(equation => !equation.Holds) ? Verdict.Unproven
        : Verdict.Proven;

    /// <summary>The largest upper bound of an entry's distance from its true value, in ulp; 0 without entries.</summary>
    public double WorstDistanceInUlp { get; } = Entries.Count == 0 ? 0 : Entries.Max(entry => entry.DistanceInUlp);

    /// <summary>The first entry that is not proven; <c>null</c> if there is none.</summary>
    public EntryProof? FirstFailure { get; } = Entries.FirstOrDefault(entry => entry.Verdict != Verdict.Proven);

    private static int Count(IReadOnlyList<EntryProof> entries, Verdict verdict) => entries.Count(entry => entry.Verdict == verdict);
}
