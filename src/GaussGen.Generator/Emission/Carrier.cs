using System;
using System.Collections.Generic;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Generator.Emission;

/// <summary>
/// How a sum's user carries the nodes to a distribution: by a mean and a standard deviation, by a scale alone, or not at all.
/// </summary>
internal sealed class Carrier
{
    /// <summary>Nodes as they stand.</summary>
    public static readonly Carrier Fixed = new(null, Array.Empty<string>());

    /// <summary>The numbers of a sum with a location and a scale.</summary>
    public static readonly string[] Location = { "mean", "standardDeviation" };

    /// <summary>The number of a sum with a scale alone.</summary>
    public static readonly string[] Scale = { "scale" };

    private readonly RoundedRule? _rule;

    private Carrier(RoundedRule? rule, IReadOnlyList<string> parameters)
    {
        _rule = rule;
        Parameters = parameters;
    }

    /// <summary>The names of the numbers that a sum takes before the function; the last one is the scale.</summary>
    public IReadOnlyList<string> Parameters { get; }

    public bool IsFixed => Parameters.Count == 0;

    /// <summary>What a sum gives where the last number is 0, as a sentence.</summary>
    public string AtZero => HasLocation
        ? "At standard deviation 0 it is the value of the function at the mean."
        : "At scale 0 it is the value of the function at 0.";

    private bool HasLocation => Parameters.Count == 2;

    public static Carrier Of(RoundedRule rule) => rule.Table.LocationScale switch
    {
        null => Fixed,
        { HasLocation: true } => new Carrier(rule, Location),
        _ => new Carrier(rule, Scale),
    };

    public void DocumentParameters(SourceWriter writer)
    {
        if (HasLocation)
        {
            writer.Parameter("mean", "The mean of the variable.");
            writer.Parameter("standardDeviation", "Its standard deviation, in the units of the mean; finite, and 0 or above.");
        }
        else if (!IsFixed)
        {
            writer.Parameter("scale", "The scale of the variable, in its own units: what a node is multiplied by; finite, and 0 or above.");
        }
    }

    public void DocumentRefusal(SourceWriter writer)
    {
        if (!IsFixed)
        {
            writer.Throws(
                "global::System.ArgumentOutOfRangeException",
                $"The {(HasLocation ? "standard deviation" : "scale")} is negative, NaN or infinite.");
        }
    }

    public void WriteCheck(SourceWriter writer)
    {
        if (!IsFixed)
        {
            writer.Line(HasLocation
                ? "global::GaussGen.Require.StandardDeviation(standardDeviation);"
                : "global::GaussGen.Require.Scale(scale);");
        }
    }

    /// <summary>Writes the statements of a sum. The order of the numbers in them is what a verifier reads from the compiled code.</summary>
    /// <param name="writer">Where to.</param>
    /// <param name="type">The type of the numbers.</param>
    /// <param name="receiver">What stands before the call that gives the sum.</param>
    /// <param name="isSymmetric">Whether the nodes are.</param>
    /// <param name="prefix">What the names of nodes and weights begin with.</param>
    public void WriteSum(SourceWriter writer, NumberType type, string receiver, bool isSymmetric, string prefix)
    {
        string scale = IsFixed ? type.One : Parameters[Parameters.Count - 1];
        string factor = string.Empty;
        if (_rule?.Table.LocationScale is { } family)
        {
            if (_rule.NodeScale is { } nodeScale && !RuleSums.IsOne(family.NodeScale))
            {
                writer.Line($"{type.Keyword} nodeScale = {type.Literal(nodeScale)} * {scale}; // {type.Hexadecimal(nodeScale)}");
                scale = "nodeScale";
            }

            if (_rule.ReciprocalTotalWeight is { } reciprocal && !RuleSums.IsOne(family.TotalWeight))
            {
                writer.Line($"const {type.Keyword} reciprocalTotalWeight = {type.Literal(reciprocal)}; // {type.Hexadecimal(reciprocal)}");
                factor = "reciprocalTotalWeight, ";
            }
        }

        string evaluation = isSymmetric ? "Symmetric" : "General";
        string location = HasLocation ? Parameters[0] : type.Zero;
        writer.Line(
            $"{receiver}global::GaussGen.RuleEvaluation.{evaluation}({prefix}Nodes, {prefix}Weights, {location}, {scale}, {factor}integrand);");
    }
}
