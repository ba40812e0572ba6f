using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules;

/// <summary>A request for a Gauss rule for the half-normal density √(2/π) exp(−x²/2) on [0, ∞).</summary>
public sealed record GaussHalfRangeHermiteRequest : UniversalRuleRequest
{
    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">The number of nodes is out of range.</exception>
    public GaussHalfRangeHermiteRequest(int points, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
    }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussHalfRangeHermite(Points, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">The rule cannot be constructed; the exception says why.</exception>
    public override RuleTable Construct(CancellationToken cancellation) => UniversalRule.Construct(
        new HalfRangeWeight(),
        Points,
        new FamilyWords("Half-range Gauss–Hermite rule", "the half-normal density on [0, ∞)", "Steen, Byrne and Gelbard 1969")
        {
            Variable = "a half-normal variable",
        },
        ErrorEstimate,
        cancellation) with
    {
        LocationScale = new LocationScale(RealNumber.Exact(1), RealNumber.Exact(1)) { HasLocation = false },
    };
}
