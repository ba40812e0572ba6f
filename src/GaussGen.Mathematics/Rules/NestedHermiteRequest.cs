using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Nested;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// A request for a nested rule for the standard normal density (Genz and Keister 1996): the nodes of each level contain those of the
/// one below, so that their difference is an error estimate that costs no further values of the integrand.
/// </summary>
public sealed record NestedHermiteRequest : RuleRequest
{
    /// <summary>The lowest level: the mean alone, exact for polynomials of degree 1.</summary>
    public const int MinimumLevel = 0;

    /// <summary>The highest level: 35 points, exact for polynomials up to degree 51. The extensions of these rules end there.</summary>
    public const int MaximumLevel = 4;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="level">The level, from <see cref="MinimumLevel"/> to <see cref="MaximumLevel"/>; see <see cref="Points"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">There is no such level.</exception>
    public NestedHermiteRequest(int level, BinaryFormat format, bool dropZeroWeights)
        : base(format, dropZeroWeights) =>
        Level = Parameters.RequireCount(level, MinimumLevel, MaximumLevel, "The level of a nested rule", nameof(level));

    /// <summary>The level.</summary>
    public int Level { get; }

    /// <summary>The number of nodes: 1, 3, 9, 19 and 35 at the levels 0 to 4.</summary>
    public int Points => NestedHermite.Points[Level];

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.NestedHermite(Level, Points, DropZeroWeights, ErrorEstimate);

    /// <summary>Whether there is such a level.</summary>
    public static bool IsLevel(int value) => value is >= MinimumLevel and <= MaximumLevel;

    /// <inheritdoc/>
    public override RuleTable Construct(CancellationToken cancellation) => NestedHermite.Construct(Level, ErrorEstimate, cancellation);
}
