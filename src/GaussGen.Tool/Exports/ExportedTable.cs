using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;

namespace GaussGen.Tool.Exports;

/// <summary>A list of numbers, or one constant, of a table that is exported.</summary>
/// <param name="Name">The member's name in C#.</param>
/// <param name="IsSpan">Whether it is a list.</param>
/// <param name="Format">The number format; null for an integer.</param>
/// <param name="Entries">The entries, in order; one for a constant.</param>
internal sealed record ExportedMember(string Name, bool IsSpan, BinaryFormat? Format, IReadOnlyList<EntryProof> Entries);

/// <summary>A table that is exported. What is written comes from the proof: nothing else of a type reaches a file.</summary>
/// <param name="Name">The name of the declaring type, or of the table where none declares it.</param>
/// <param name="AssemblyName">The assembly's simple name; null where no assembly holds the table.</param>
/// <param name="AssemblyVersion">Its version; null likewise.</param>
/// <param name="Family">The family.</param>
/// <param name="Proof">Every entry with its verdict.</param>
/// <param name="Digest">The digest of the data.</param>
internal sealed record ExportedTable(
    string Name, string? AssemblyName, string? AssemblyVersion, ClaimFamily Family, TableProof Proof, string Digest)
{
    /// <summary>What is promised.</summary>
    public TableClaim Claim => Proof.Claim;

    /// <summary>The members in the order of the proof, without those that repeat an entry of a list or only say that a sum is taken as it stands.</summary>
    public IReadOnlyList<ExportedMember> Members { get; } =
    [
        .. Proof.Entries
            .Where(entry => entry.Index is not null || !(Family.IsEntry(entry.Member) || SumForm.IsTrivial(entry.Member)))
            .GroupBy(entry => entry.Member)
            .Select(group => Member(group.First(), [.. group], Proof.Claim.Format)),
    ];

    private static ExportedMember Member(EntryProof first, IReadOnlyList<EntryProof> entries, BinaryFormat format) => first.Index is null
        ? new ExportedMember(first.Member, false, first.IsInteger ? null : format, [first])
        : new ExportedMember(first.Member, true, format, entries);
}
