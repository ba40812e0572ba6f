using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;

namespace GaussGen.Tool.Verification;

/// <summary>What there is to say of a proof, a line each.</summary>
internal static class ProofFindings
{
    /// <summary>The findings; empty exactly if all is proven.</summary>
    public static IReadOnlyList<Finding> Of(TableProof proof)
    {
        List<Finding> findings = [];
        findings.AddRange(proof.Faults.Select(fault => new Finding(FindingKind.WrongShape, null, fault.TrimEnd('.'))));
        findings.AddRange(proof.Entries.Where(entry => entry.Verdict != Verdict.Proven).Select(entry => Describe(entry, proof.Claim.Format)));
        if (findings.Count == 0 && proof.Verdict != Verdict.Proven)
        {
            MomentEquation broken = proof.MomentEquations.First(equation => !equation.Holds);
            findings.Add(new Finding(
                FindingKind.NotProven, null, $"every entry is proven, and yet the moment equation of degree {broken.Degree} does not hold; report this contradiction"));
        }

        return findings;
    }

    private static Finding Describe(EntryProof entry, BinaryFormat format)
    {
        string found = Text(entry.Found, entry, format);
        string? expected = entry.Expected is { } bits ? Text(bits, entry, format) : null;
        if (entry.Verdict == Verdict.Unproven)
        {
            string why = entry.Reason is null ? "" : ": " + entry.Reason.TrimEnd('.');
            return new Finding(FindingKind.NotProven, entry.Name, $"{entry.Name} is not proven, found {found}{why}", expected, found);
        }

        string distance = entry.IsInteger ? "" : $", {UlpText.Of(entry.DistanceInUlp)} ulp from the true value";
        string reason = entry.Reason is null ? "" : "; " + entry.Reason.TrimEnd('.');
        return new Finding(FindingKind.WrongEntry, entry.Name, $"{entry.Name}: expected {expected}, found {found}{distance}{reason}", expected, found);
    }

    private static string Text(ulong bits, EntryProof entry, BinaryFormat format) =>
        entry.IsInteger ? ((int)bits).ToString(CultureInfo.InvariantCulture) : EncodingText.Of(bits, format);
}
