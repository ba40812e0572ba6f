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

    private static string Summary(RoundedRule rule) =>
        Documentation.Escape($"{rule.Table.Description.Title} with {Count(rule.Table.Nodes.Count, "node")} for {rule.Table.Description.Weight}.");

    private static List<string> Remarks(RoundedRule rule, NumberType type, TargetCapabilities target)
    {
        RuleDescription description = rule.Table.Description;
        List<string> paragraphs = new()
        {
            Documentation.Escape(
                $"Exact for polynomials up to degree {Text(rule.Table.DegreeOfExactness)}. Every node and weight is the {type.Format.Name} value "
                + $"nearest to the true one ({Text(type.Format.Precision)} bits; proven: {description.Method}; {Widths(rule.Nodes.Concat(rule.Weights))})."),
        };
        if (rule.FirstZeroWeightNode is { } first)
        {
            paragraphs.Add(ZeroWeights(rule, type, first));
        }

        paragraphs.Add(
            $"{Text(2 * rule.Nodes.Count * type.Bytes)} bytes of data"
            + (target.KeepsSpansInImage ? " in the image; nothing runs before the first call." : " in two arrays, filled before they are first read."));
        paragraphs.Add(
            "Caution: that the constants are right says nothing about an integrand that is not such a polynomial; compare with a rule of more "
            + "points before a result matters.");
        paragraphs.Add(Documentation.Escape($"Source: {description.Sources}."));
        return paragraphs;
    }

    private static string ZeroWeights(RoundedRule rule, NumberType type, RoundedValue first)
    {
        string which = $"{Text(rule.ZeroWeights)} of {Count(rule.Table.Nodes.Count, "weight")}, those of the nodes of magnitude {type.Literal(first)} and more";
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

        IEnumerable<GeneratedMember> tables = Span("Nodes", type, target, writer => DocumentNodes(writer, rule, type), () => Literals(rule.Nodes, type))
            .Concat(Span("Weights", type, target, writer => DocumentWeights(writer, rule, type), () => Literals(rule.Weights, type)));
        foreach (GeneratedMember table in tables)
        {
            yield return table;
        }

        foreach (GeneratedMember sum in RuleSums.Of(rule, type))
        {
            yield return sum;
        }
    }

    private static GeneratedMember Constant(string name, int value, string summary) => new(name, null, writer =>
    {
        writer.Summary(summary);
        writer.Line(GeneratedCodeAttribute);
        writer.Line($"public const int {name} = {Text(value)};");
    });

    private static void DocumentNodes(SourceWriter writer, RoundedRule rule, NumberType type)
    {
        writer.Summary(Documentation.Escape($"The nodes, ascending: {rule.Table.Description.Nodes}."));
        writer.Remarks(EntryRemark(rule.Nodes, type));
    }

    private static void DocumentWeights(SourceWriter writer, RoundedRule rule, NumberType type)
    {
        writer.Summary(Documentation.Escape($"The weights, in the order of the nodes; the weight function is {rule.Table.Description.Weight}."));
        writer.Remarks(EntryRemark(rule.Weights, type));
    }

    private static string EntryRemark(IReadOnlyList<RoundedValue> values, NumberType type) =>
        $"Each is the {type.Format.Name} value nearest to the true one ({Widths(values)}). {Text(values.Count * type.Bytes)} bytes.";

    private static string Count(int number, string noun) => Text(number) + " " + noun + (number == 1 ? string.Empty : "s");
}
