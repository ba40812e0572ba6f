using System.Globalization;

namespace GaussGen.Mathematics.Proofs;

/// <summary>What became of an entry.</summary>
public enum Verdict
{
    /// <summary>The entry is proven to be what the claim promises.</summary>
    Proven,

    /// <summary>The entry is proven to be something else.</summary>
    Wrong,

    /// <summary>Neither was proven; the reason is given.</summary>
    Unproven,
}

/// <summary>The verdict on one entry of a table.</summary>
/// <param name="Member">The span or constant it belongs to: "Nodes", "PointCount".</param>
/// <param name="Index">The position in a span; <c>null</c> for a constant.</param>
/// <param name="IsInteger">Whether the entry is an integer and not a number of the claim's format.</param>
/// <param name="Verdict">What became of it.</param>
/// <param name="Found">The bits that were found.</param>
/// <param name="Expected">The right bits, where they are known.</param>
/// <param name="DistanceInUlp">
/// An upper bound of the distance between the entry and the true value, in units in the last place of the right entry; at
/// most ½ for a proven one, infinite for NaN and the infinities, 0 for integers and where
/// <paramref name="Verdict"/> is <see cref="Verdict.Unproven"/>.
/// </param>
/// <param name="Reason">Why the entry is wrong or unproven, where the bits do not say it; else <c>null</c>.</param>
public sealed record EntryProof(
    string Member,
    int? Index,
    bool IsInteger,
    Verdict Verdict,
    ulong Found,
    ulong? Expected,
    double DistanceInUlp,
    string? Reason)
{
    /// <summary>The entry as C# writes it: "Nodes[3]", "PointCount".</summary>
    public string Name => Index is int index ? Member + "[" + index.ToString(CultureInfo.InvariantCulture) + "]" : Member;
}
