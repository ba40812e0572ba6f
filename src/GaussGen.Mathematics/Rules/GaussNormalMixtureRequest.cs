using System;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// A request for a Gauss rule for a finite mixture of normal distributions. Each parameter is the exact value of a binary64 number; the weights
/// are divided by their exact sum.
/// </summary>
public sealed record GaussNormalMixtureRequest : UniversalRuleRequest
{
    /// <summary>The largest number of components.</summary>
    public const int MaximumComponents = 64;

    /// <summary>A request with the given parameters; the three lists have one length.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="weights">The weights of the components: finite, none negative, at least one above zero.</param>
    /// <param name="means">Their means; finite.</param>
    /// <param name="standardDeviations">Their standard deviations; finite and above zero.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="ArgumentException">The lists differ in length.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public GaussNormalMixtureRequest(
        int points, ValueList weights, ValueList means, ValueList standardDeviations, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
        _ = Parameters.RequireCount(weights.Count, 1, MaximumComponents, "The number of components", nameof(weights));
        if (means.Count != weights.Count || standardDeviations.Count != weights.Count)
        {
            throw new ArgumentException("Weights, means and standard deviations must be as many as each other.", nameof(means));
        }

        Weights = AreWeights(weights) ? weights : throw new ArgumentOutOfRangeException(
            nameof(weights), "The weights must be finite and not negative, and at least one of them above zero.");
        Means = means.All(Parameters.IsFinite) ? means : throw new ArgumentOutOfRangeException(
            nameof(means), "The means must be finite.");
        StandardDeviations = standardDeviations.All(Parameters.IsPositive) ? standardDeviations : throw new ArgumentOutOfRangeException(
            nameof(standardDeviations), "The standard deviations must be finite and above zero.");
    }

    /// <summary>The weights of the components, not necessarily with sum 1.</summary>
    public ValueList Weights { get; }

    /// <summary>The means of the components.</summary>
    public ValueList Means { get; }

    /// <summary>The standard deviations of the components.</summary>
    public ValueList StandardDeviations { get; }

    /// <summary>Whether numbers can be the weights of a mixture.</summary>
    public static bool AreWeights(ValueList values) => values.All(value => value >= 0 && Parameters.IsFinite(value)) && values.Any(value => value > 0);

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussNormalMixture(
        Points, Weights, Means, StandardDeviations, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">The rule cannot be constructed; the exception says why.</exception>
    public override RuleTable Construct(CancellationToken cancellation)
    {
        NormalComponent[] components = Enumerable.Range(0, Weights.Count)
            .Where(i => Weights[i] > 0)
            .Select(i => new NormalComponent(
                Parameters.ValueOf(Weights[i]), Parameters.ValueOf(Means[i]), Parameters.ValueOf(StandardDeviations[i])))
            .ToArray();
        string density = string.Format(
            CultureInfo.InvariantCulture,
            "the mixture of normal densities with weights {0}, means {1} and standard deviations {2}",
            Parameters.Write(Weights),
            Parameters.Write(Means),
            Parameters.Write(StandardDeviations));
        return UniversalRule.Construct(
            new NormalMixtureWeight(components), Points, new FamilyWords("Gauss rule", density, "Stein 1981"), ErrorEstimate, cancellation);
    }
}
