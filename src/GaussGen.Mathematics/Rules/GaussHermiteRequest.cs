using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Hermite;

namespace GaussGen.Mathematics.Rules;

/// <summary>A request for a Gauss–Hermite rule.</summary>
/// <param name="Points">
/// The number of nodes, from <see cref="GaussHermite.MinimumPoints"/> to <see cref="GaussHermite.MaximumPoints"/>; with an error estimate up
/// to <see cref="LargestErrorEstimatePoints"/>.
/// </param>
/// <param name="Convention">The weight function.</param>
/// <param name="Format">The number format of every entry.</param>
/// <param name="DropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
public sealed record GaussHermiteRequest(int Points, HermiteConvention Convention, BinaryFormat Format, bool DropZeroWeights)
    : RuleRequest(Format, DropZeroWeights)
{
    /// <summary>The largest number of nodes of a rule with an error estimate, whose companion has no fast road.</summary>
    public const int LargestErrorEstimatePoints = 200;

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussHermite(Points, Convention == HermiteConvention.Physicist, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="System.ArgumentOutOfRangeException"><see cref="Points"/> is out of range.</exception>
    /// <exception cref="RuleConstructionException">
    /// An error estimate is asked for with more than <see cref="LargestErrorEstimatePoints"/> nodes.
    /// </exception>
    public override RuleTable Construct(CancellationToken cancellation)
    {
        if (ErrorEstimate && Points is > LargestErrorEstimatePoints and <= GaussHermite.MaximumPoints)
        {
            throw new RuleConstructionException(RuleFailure.NoCompanion, string.Format(
                CultureInfo.InvariantCulture,
                "A Gauss–Hermite rule with an error estimate has at most {0} nodes; ask for fewer points, or for no error estimate.",
                LargestErrorEstimatePoints));
        }

        RuleTable table = GaussHermite.Construct(Points, Convention, cancellation);
        return ErrorEstimate ? table with { Companion = HermiteCompanion.Construct(table, Convention, cancellation) } : table;
    }
}
