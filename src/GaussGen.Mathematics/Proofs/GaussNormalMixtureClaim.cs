using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be a correctly rounded Gauss rule for a finite mixture of normal densities, the weights of the components divided by their
/// exact sum.
/// </summary>
public sealed record GaussNormalMixtureClaim : GaussRuleClaim
{
    /// <summary>The largest number of components.</summary>
    public const int LargestComponentCount = 64;

    /// <summary>A claim with the given promises; each number stands for its exact value, and the three lists have one length.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="GaussRuleClaim.LargestPointCount"/>.</param>
    /// <param name="weights">The weights of the components: finite, none negative, at least one above zero.</param>
    /// <param name="means">Their means; finite.</param>
    /// <param name="standardDeviations">Their standard deviations; finite and above zero.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentNullException">A list is <c>null</c>.</exception>
    /// <exception cref="ArgumentException">The lists differ in length.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public GaussNormalMixtureClaim(
        int points,
        IReadOnlyList<double> weights,
        IReadOnlyList<double> means,
        IReadOnlyList<double> standardDeviations,
        BinaryFormat format,
        bool dropZeroWeights,
        bool hasErrorEstimate)
        : base(points, format, dropZeroWeights, hasErrorEstimate)
    {
        Weights = new ClaimValues(weights);
        Means = new ClaimValues(means);
        StandardDeviations = new ClaimValues(standardDeviations);
        if (Weights.Count is < 1 or > LargestComponentCount)
        {
            string message = string.Format(CultureInfo.InvariantCulture, "Give from 1 to {0} components.", LargestComponentCount);
            throw new ArgumentOutOfRangeException(nameof(weights), message);
        }

        if (Means.Count != Weights.Count || StandardDeviations.Count != Weights.Count)
        {
            throw new ArgumentException("Weights, means and standard deviations must be as many as each other.", nameof(means));
        }

        if (!Weights.All(weight => weight >= 0 && ClaimNumbers.IsFinite(weight)) || !Weights.Any(weight => weight > 0))
        {
            throw new ArgumentOutOfRangeException(
                nameof(weights), "The weights must be finite and not negative, and at least one of them above zero.");
        }

        if (!Means.All(ClaimNumbers.IsFinite))
        {
            throw new ArgumentOutOfRangeException(nameof(means), "The means must be finite.");
        }

        if (!StandardDeviations.All(ClaimNumbers.IsPositive))
        {
            throw new ArgumentOutOfRangeException(
                nameof(standardDeviations), "The standard deviations must be finite and above zero.");
        }
    }

    /// <summary>The weights of the components, not necessarily with sum 1.</summary>
    public ClaimValues Weights { get; }

    /// <summary>The means of the components.</summary>
    public ClaimValues Means { get; }

    /// <summary>The standard deviations of the components.</summary>
    public ClaimValues StandardDeviations { get; }

    /// <inheritdoc/>
    public override string Title =>
        ClaimTitle.GaussNormalMixture(Points, Weights, Means, StandardDeviations, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    private protected override string MomentsInWords =>
        "Gauss rules for mixtures of normal densities: the moments are finite sums of binary fractions, about the middle of the outer means.";

    private protected override WeightMoments Moments() => new NormalMixtureMoments(Enumerable.Range(0, Weights.Count)
        .Where(i => Weights[i] > 0)
        .Select(i => new MixtureComponent(
            ClaimNumbers.ValueOf(Weights[i]), ClaimNumbers.ValueOf(Means[i]), ClaimNumbers.ValueOf(StandardDeviations[i]))));
}
