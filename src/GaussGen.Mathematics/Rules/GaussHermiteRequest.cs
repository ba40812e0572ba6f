using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;

namespace GaussGen.Mathematics.Rules;

/// <summary>A request for a Gauss–Hermite rule.</summary>
/// <param name="Points">
/// The number of nodes, from <see cref="GaussHermite.MinimumPoints"/> to <see cref="GaussHermite.MaximumPoints"/>.
/// </param>
/// <param name="Convention">The weight function.</param>
/// <param name="Format">The number format of every entry.</param>
/// <param name="DropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
public sealed record GaussHermiteRequest(int Points, HermiteConvention Convention, BinaryFormat Format, bool DropZeroWeights)
    : RuleRequest(Format, DropZeroWeights)
{
    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussHermite(Points, Convention == HermiteConvention.Physicist, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="System.ArgumentOutOfRangeException"><see cref="Points"/> is out of range.</exception>
    public override RuleTable Construct(CancellationToken cancellation) => GaussHermite.Construct(Points, Convention, cancellation);
}
