using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>The generated part of a rule: nodes, weights, and the sums over them.</summary>
internal static class RulePart
{
    public static TablePart Of(RoundedRule rule, TargetCapabilities target)
    {
        NumberType type = NumberType.Of(rule.Format);
        return new TablePart(Summary(rule), Remarks(rule, type, target), Members(rule, type, target).ToArray());
    }

    /// <summary>Whether a constant of a rule is too large for its format, or so small that it rounds to zero.</summary>
    /// <param name="rule">The rule.</param>
    /// <param name="index">Which constant.</param>
    public static bool IsOutOfRange(RoundedRule rule, int index)
    {
        ulong bits = rule.Constants[index].Bits;
        return rule.Format.IsInfinity(bits)
            || (rule.Format.IsZero(bits) && rule.Table.Constants[index].Value.ExactValue is not { IsZero: true });
    }

    private static string Summary(RoundedRule rule) =>
        Documentation.Escape($"{rule.Table.Description.Title} with {Count(rule.Table.Nodes.Count, "node")} for {rule.Table.Description.Weight}.");

    private static List<string> Remarks(RoundedRule rule, NumberType type, TargetCapabilities target)
    {
        RuleDescription description = rule.Table.Description;
        List<string> paragraphs = new()
        {
            Documentation.Escape(
                $"Exact for polynomials up to degree {Text(rule.Table.DegreeOfExactness)}. Every {Entries(rule)} is the {type.Format.Name} value "
                + $"nearest to the true one ({Text(type.Format.Precision)} bits; proven: {description.Method}; {Widths(AllOf(rule))})."),
        };
        if (rule.Companion is { } companion)
        {
            paragraphs.Add(Documentation.Escape(
                $"The error is estimated by the {companion.Table.Title} with {Count(companion.Table.Nodes.Count, "node")}, whose entries are such "
                + $"values too (proven: {companion.Table.Method}; {Widths(companion.Nodes.Concat(companion.Weights))})."));
        }

        if (rule.FirstZeroWeightNode is { } first)
        {
            paragraphs.Add(ZeroWeights(rule, type, first));
        }

        string arrays = rule.Companion is null ? "two" : "four";
        paragraphs.Add(
            $"{Text(2 * (rule.Nodes.Count + (rule.Companion?.Nodes.Count ?? 0)) * type.Bytes)} bytes of data"
            + (target.KeepsSpansInImage ? " in the image; nothing runs before the first call." : $" in {arrays} arrays, filled before they are first read."));
        paragraphs.Add(
            "Caution: that the constants are right says nothing about an integrand that is not such a polynomial; compare with a rule of more "
            + "points before a result matters.");
        string companionSources = rule.Companion?.Table.Sources is { } sources && sources != description.Sources
            ? "; of the companion: " + sources
            : string.Empty;
        paragraphs.Add(Documentation.Escape($"Source: {description.Sources}{companionSources}."));
        return paragraphs;
    }

    private static string Entries(RoundedRule rule) => rule.Constants.Count == 0 ? "node and weight" : "node, weight and constant";

    private static IEnumerable<RoundedValue> AllOf(RoundedRule rule) => rule.Nodes.Concat(rule.Weights).Concat(rule.Constants);

    private static string ZeroWeights(RoundedRule rule, NumberType type, RoundedValue first)
    {
        string which = $"{Text(rule.ZeroWeights)} of {Count(rule.Table.Nodes.Count, "weight")}, those of nodes of magnitude {type.Literal(first)} and more";
        return rule.Nodes.Count < rule.Table.Nodes.Count
            ? $"Nodes whose weight rounds to zero in {type.Format.Name} are left out: {which}."
            : $"Some weights round to zero in {type.Format.Name}: {which}.";
    }

    private static IEnumerable<GeneratedMember> Members(RoundedRule rule, NumberType type, TargetCapabilities target)
    {
        yield return Constant("PointCount", rule.Nodes.Count, rule.Nodes.Count < rule.Table.Nodes.Count
            ? $"The number of nodes that are kept, of {Text(rule.Table.Nodes.Count)}."
            : "The number of nodes.");
        yield return Constant(
            "DegreeOfExactness",
            rule.Table.DegreeOfExactness,
            "The largest degree up to which the rule integrates every polynomial exactly, apart from rounding.");

        for (int i = 0; i < rule.Constants.Count; i++)
        {
            yield return Constant(rule.Table.Constants[i], rule.Constants[i], type);
        }

        string nodes = $"The nodes, ascending: {rule.Table.Description.Nodes}.";
        string weights = $"The weights, in the order of the nodes; the weight function is {rule.Table.Description.Weight}.";
        IEnumerable<GeneratedMember> tables = Table("Nodes", nodes, rule.Nodes, type, target).Concat(Table("Weights", weights, rule.Weights, type, target));
        if (rule.Companion is { } companion)
        {
            string companionNodes = $"The nodes of the companion, ascending: those of the {companion.Table.Title}.";
            tables = tables
                .Concat(Table(ErrorSum.CompanionPrefix + "Nodes", companionNodes, companion.Nodes, type, target))
                .Concat(Table(
                    ErrorSum.CompanionPrefix + "Weights", "The weights of the companion, in the order of its nodes.", companion.Weights, type, target));
        }

        foreach (GeneratedMember member in tables.Concat(RuleSums.Of(rule, type)))
        {
            yield return member;
        }
    }

    private static IEnumerable<GeneratedMember> Table(
        string name, string summary, IReadOnlyList<RoundedValue> values, NumberType type, TargetCapabilities target) =>
        Span(name, type, target, writer => DocumentTable(writer, summary, values, type), () => Literals(values, type));

    private static GeneratedMember Constant(string name, int value, string summary) => new(name, null, writer =>
    {
        writer.Summary(summary);
        writer.Line(GeneratedCodeAttribute);
        writer.Line($"public const int {name} = {Text(value)};");
    });

    private static GeneratedMember Constant(NamedConstant constant, RoundedValue value, NumberType type) => new(constant.Name, null, writer =>
    {
        writer.Summary(Documentation.Escape(constant.Summary));
        writer.Remarks($"It is the {type.Format.Name} value nearest to the true one ({Widths(new[] { value })}).");
        writer.Line(GeneratedCodeAttribute);
        writer.Line($"public const {type.Keyword} {constant.Name} = {type.Literal(value)}; // {type.Hexadecimal(value)}");
    });

    private static void DocumentTable(SourceWriter writer, string summary, IReadOnlyList<RoundedValue> values, NumberType type)
    {
        writer.Summary(Documentation.Escape(summary));
        writer.Remarks(EntryRemark(values, type));
    }
}
