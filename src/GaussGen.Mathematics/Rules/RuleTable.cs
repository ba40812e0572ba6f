using System.Collections.Generic;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules;

/// <summary>The words that documentation needs about a rule; each is a sentence or a phrase without markup.</summary>
/// <param name="Title">What the rule is, as a noun phrase: "Gauss–Hermite rule".</param>
/// <param name="Weight">The weight function it belongs to: "the standard normal density".</param>
/// <param name="Nodes">What the nodes are: "the zeros of the Hermite polynomial He₃".</param>
/// <param name="Method">How the entries were enclosed, for the remarks on the proof.</param>
/// <param name="Sources">Where the formulas come from: author, year or publication, number.</param>
public sealed record RuleDescription(string Title, string Weight, string Nodes, string Method, string Sources)
{
    /// <summary>The variable whose expectations the rule gives, as a noun phrase: "a normal variable".</summary>
    public string Variable { get; init; } = "a variable with " + Weight;
}

/// <summary>
/// How a rule's weight function is carried to a distribution with a location and a scale:
/// E f = factor · Σ wᵢ f(mean + scale · standardDeviation · xᵢ).
/// </summary>
/// <param name="NodeScale">What a node is multiplied by besides the standard deviation: 1, or √2.</param>
/// <param name="TotalWeight">The sum of the weights, ∫ of the weight function: 1, or √π; the factor is its reciprocal.</param>
public sealed record LocationScale(RealNumber NodeScale, RealNumber TotalWeight)
{
    /// <summary>
    /// Whether the family has a location: E f = factor · Σ wᵢ f(mean + …). Without one it has a scale only, as the half-normal
    /// distributions do: E f = factor · Σ wᵢ f(scale · xᵢ).
    /// </summary>
    public bool HasLocation { get; init; } = true;
}

/// <summary>A number beside the nodes and weights that a rule's user is given.</summary>
/// <param name="Name">Its name as a member: "NormalizingIntegral".</param>
/// <param name="Value">Its value.</param>
/// <param name="Summary">What it is, as a sentence without markup.</param>
public sealed record NamedConstant(string Name, RealNumber Value, string Summary);

/// <summary>
/// A second rule for the same weight function, by which the error of the first is estimated: |companion sum − rule's sum| · factor.
/// </summary>
/// <param name="Title">What it is, as a noun phrase: "anti-Gaussian rule".</param>
/// <param name="Nodes">Its nodes, ascending.</param>
/// <param name="Weights">Its weights, in the order of the nodes, with the same sum as the rule's own.</param>
/// <param name="IsSymmetric">See <see cref="RuleTable.IsSymmetric"/>.</param>
/// <param name="Factor">What the difference is multiplied by: ½ for an anti-Gaussian rule, 1 for a rule of a lower degree.</param>
/// <param name="Method">How its entries were enclosed, as <see cref="RuleDescription.Method"/>.</param>
/// <param name="Sources">Where the formulas come from: author, year or publication, number.</param>
public sealed record CompanionRule(
    string Title,
    IReadOnlyList<RealNumber> Nodes,
    IReadOnlyList<RealNumber> Weights,
    bool IsSymmetric,
    Rational Factor,
    string Method,
    string Sources);

/// <summary>A rule before a number format is chosen: Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx.</summary>
/// <param name="Description">The words for the documentation.</param>
/// <param name="Nodes">The nodes, ascending.</param>
/// <param name="Weights">The weights, in the order of the nodes.</param>
/// <param name="DegreeOfExactness">The largest degree up to which every polynomial is integrated exactly.</param>
/// <param name="IsSymmetric">Whether node i and node n−1−i are opposite and their weights equal.</param>
/// <param name="LocationScale">How the rule serves a whole family of distributions; <c>null</c> if the weight has no free parameter.</param>
public sealed record RuleTable(
    RuleDescription Description,
    IReadOnlyList<RealNumber> Nodes,
    IReadOnlyList<RealNumber> Weights,
    int DegreeOfExactness,
    bool IsSymmetric,
    LocationScale? LocationScale)
{
    /// <summary>Numbers beside the nodes and weights that belong to the rule.</summary>
    public IReadOnlyList<NamedConstant> Constants { get; init; } = [];

    /// <summary>The rule by which the error is estimated; <c>null</c> where no estimate was asked for.</summary>
    public CompanionRule? Companion { get; init; }
}
