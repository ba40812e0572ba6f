using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>A number of a table as a proof knows it: enclosed, and rounded where the enclosure decides.</summary>
/// <param name="Lower">The lower end of the enclosure.</param>
/// <param name="Upper">The upper end.</param>
/// <param name="Bits">The nearest representable value, proven; <c>null</c> if it is not known.</param>
internal sealed record KnownNumber(Dyadic Lower, Dyadic Upper, ulong? Bits);

/// <summary>Collects verdicts by putting found data beside known numbers.</summary>
internal sealed class ProofReport(TableClaim claim, TableData data)
{
    private readonly List<EntryProof> _entries = [];
    private readonly List<string> _faults = [];

    /// <summary>Whether every verdict so far is good.</summary>
    public bool IsClean => _faults.Count == 0 && _entries.All(entry => entry.Verdict == Verdict.Proven);

    /// <summary>The bits of a span; empty, with a fault, if it is missing or of another type.</summary>
    public IReadOnlyList<ulong> Span(string member)
    {
        DataSpan? span = data.Spans.FirstOrDefault(candidate => candidate.Name == member);
        if (span is null)
        {
            _faults.Add(member + " is missing.");
            return [];
        }

        if (span.Format != claim.Format)
        {
            _faults.Add(WrongType(member, span.Format?.Name));
            return [];
        }

        return span.Bits;
    }

    /// <summary>Judges an integer constant.</summary>
    public void Integer(string member, int expected)
    {
        DataConstant? constant = data.Constants.FirstOrDefault(candidate => candidate.Name == member);
        if (constant is null)
        {
            _faults.Add(member + " is missing.");
        }
        else if (constant.Format is not null)
        {
            _faults.Add(member + " is a " + constant.Format.Name + " number; the claim promises a 32-bit integer.");
        }
        else
        {
            var bits = (ulong)(uint)expected;
            Verdict verdict = constant.Bits == bits ? Verdict.Proven : Verdict.Wrong;
            _entries.Add(new EntryProof(member, null, IsInteger: true, verdict, constant.Bits, bits, 0, null));
        }
    }

    /// <summary>Judges a constant of the claim's format, wherever there is one of that name.</summary>
    /// <param name="member">Its name.</param>
    /// <param name="known">The true value.</param>
    /// <param name="isRequired">Whether it is a fault if the constant is missing.</param>
    public void Constant(string member, KnownNumber known, bool isRequired)
    {
        List<DataConstant> constants = [.. data.Constants.Where(candidate => candidate.Name == member)];
        if (constants.Count == 0 && isRequired)
        {
            _faults.Add(member + " is missing.");
        }

        foreach (DataConstant constant in constants)
        {
            if (constant.Format != claim.Format)
            {
                _faults.Add(WrongType(member, constant.Format?.Name));
            }
            else
            {
                Judge(member, null, constant.Bits, known);
            }
        }
    }

    /// <summary>Judges the entries of a span, and its length.</summary>
    public void Entries(string member, IReadOnlyList<ulong> found, IReadOnlyList<KnownNumber> known)
    {
        if (found.Count != known.Count)
        {
            _faults.Add(string.Format(
                CultureInfo.InvariantCulture, "{0} has {1} entries; the claim promises {2}.", member, found.Count, known.Count));
        }

        for (int index = 0; index < found.Count && index < known.Count; index++)
        {
            Judge(member, index, found[index], known[index]);
        }
    }

    /// <summary>Leaves the entries of a span without a verdict.</summary>
    public void Undecided(string member, IReadOnlyList<ulong> found, string reason)
    {
        for (int index = 0; index < found.Count; index++)
        {
            _entries.Add(new EntryProof(member, index, IsInteger: false, Verdict.Unproven, found[index], null, 0, reason));
        }
    }

    /// <summary>Notes a way in which the data breaks the promise that no single entry shows.</summary>
    public void Fault(string sentence) => _faults.Add(sentence);

    /// <summary>The proof, with everything that was collected.</summary>
    public TableProof Finish(IReadOnlyList<MomentEquation> equations) => new(claim, _entries, _faults, equations);

    private void Judge(string member, int? index, ulong found, KnownNumber known)
    {
        BinaryFormat format = claim.Format;
        if (known.Bits is not ulong expected)
        {
            string reason = "The true value could not be enclosed closely enough to decide its rounding.";
            _entries.Add(new EntryProof(member, index, IsInteger: false, Verdict.Unproven, found, null, 0, reason));
            return;
        }

        bool isTooLarge = !format.IsFinite(expected);
        Verdict verdict = found == expected && !isTooLarge ? Verdict.Proven : Verdict.Wrong;
        double distance = isTooLarge
            ? double.PositiveInfinity
            : NearestValue.DistanceInUlp(format, found, expected, known.Lower, known.Upper);
        // The enclosure may be wide; that the entry is the nearest value says more.
        distance = verdict == Verdict.Proven ? Math.Min(distance, 0.5) : distance;
        _entries.Add(new EntryProof(member, index, IsInteger: false, verdict, found, expected, distance, isTooLarge
            ? "The true value is too large for " + format.Name + "."
            : null));
    }

    private string WrongType(string member, string? found) =>
        member + " holds " + (found ?? "numbers of another type") + "; the claim promises " + claim.Format.Name + ".";
}
