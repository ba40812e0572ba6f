using System.Collections.Generic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Rules;

/// <summary>A rule in one number format; every entry is proven to be the nearest representable value.</summary>
/// <param name="Table">The rule before rounding, of which this one keeps all nodes or those with a weight above zero.</param>
/// <param name="Format">The number format.</param>
/// <param name="Nodes">The kept nodes, ascending.</param>
/// <param name="Weights">Their weights.</param>
/// <param name="ZeroWeights">How many weights of the whole rule round to zero in this format.</param>
/// <param name="FirstZeroWeightNode">
/// The magnitude of the node, nearest to the centre of the rule, whose weight rounds to zero; <c>null</c> if there is none.
/// </param>
/// <param name="NodeScale">The rounded factor of the nodes; <c>null</c> without location and scale.</param>
/// <param name="ReciprocalTotalWeight">One over the sum of the weights, rounded; <c>null</c> without location and scale.</param>
public sealed record RoundedRule(
    RuleTable Table,
    BinaryFormat Format,
    IReadOnlyList<RoundedValue> Nodes,
    IReadOnlyList<RoundedValue> Weights,
    int ZeroWeights,
    RoundedValue? FirstZeroWeightNode,
    RoundedValue? NodeScale,
    RoundedValue? ReciprocalTotalWeight)
{
    /// <summary>The rounded values of <see cref="RuleTable.Constants"/>, in their order.</summary>
    public IReadOnlyList<RoundedValue> Constants { get; init; } = [];

    /// <summary>The rounded <see cref="RuleTable.Companion"/>; <c>null</c> where there is none.</summary>
    public RoundedCompanion? Companion { get; init; }
}

/// <summary>A companion rule in one number format; every entry is proven to be the nearest representable value.</summary>
/// <param name="Table">The companion before rounding.</param>
/// <param name="Nodes">The kept nodes, ascending; those with a weight that rounds to zero are left out if the rule's are.</param>
/// <param name="Weights">Their weights.</param>
/// <param name="Factor">The rounded <see cref="CompanionRule.Factor"/>.</param>
public sealed record RoundedCompanion(
    CompanionRule Table,
    IReadOnlyList<RoundedValue> Nodes,
    IReadOnlyList<RoundedValue> Weights,
    RoundedValue Factor);
