using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Tells the zeros of a rule's polynomial apart.</summary>
internal static class ZeroIsolation
{
    /// <summary>All zeros, ascending; <c>null</c> where the enclosures at this working precision do not tell them apart.</summary>
    public static List<RuleZero>? Find(
        RuleLevel level,
        RuleSource source,
        NodeCoordinate coordinate,
        BinaryFormat format,
        IReadOnlyList<ulong> hints,
        CancellationToken cancellation)
    {
        List<(Dyadic Low, Dyadic High)>? intervals = SignChanges(level.Polynomial, coordinate, format, hints, cancellation);
        if (intervals.Count != source.Zeros)
        {
            intervals = level.Count is null
                ? source.Grid(level.Polynomial, cancellation)
                : level.Count.Isolate(cancellation);
        }

        return intervals is null || intervals.Count != source.Zeros ? null : [.. intervals.Select((interval, index) =>
            new RuleZero(interval.Low, interval.High, (source.Zeros - 1 - index) % 2 == 0 ? 1 : -1))];
    }

    /// <summary>The rounding intervals of found values over which the polynomial changes its sign, ascending and disjoint.</summary>
    private static List<(Dyadic Low, Dyadic High)> SignChanges(
        NodePolynomial polynomial,
        NodeCoordinate coordinate,
        BinaryFormat format,
        IReadOnlyList<ulong> hints,
        CancellationToken cancellation)
    {
        var found = new List<(Dyadic Low, Dyadic High)>();
        if (polynomial.Degree == 0)
        {
            return found;
        }

        // More values than a rule can have say nothing more.
        foreach (ulong hint in hints.Take((2 * polynomial.Degree) + 1))
        {
            cancellation.ThrowIfCancellationRequested();
            if (coordinate.RoundingInterval(format, hint) is not var (low, high)
                || found.Any(other => low < other.High && other.Low < high))
            {
                continue;
            }

            if (polynomial.Sign(low) is int below && polynomial.Sign(high) is int above && below != above)
            {
                found.Add((low, high));
            }
        }

        found.Sort((left, right) => left.Low.CompareTo(right.Low));
        return found;
    }
}
