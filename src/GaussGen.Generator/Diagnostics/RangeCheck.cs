using System;
using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Emission;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Sequences;

namespace GaussGen.Generator.Diagnostics;

/// <summary>Whether a number format can hold a table.</summary>
internal static class RangeCheck
{
    /// <summary>What is too large or too small for the format, or <c>null</c>; weights that round to zero are a warning.</summary>
    /// <exception cref="RuleConstructionException">The table cannot be constructed.</exception>
    public static Mistake? Find(TableRequest request, Family family, CancellationToken cancellation) => request switch
    {
        RuleRequest rule => Find(TableMemo.Get(rule, cancellation), family),
        MomentRequest moments => Find(TableMemo.Get(moments, cancellation)),
        SequenceRequest sequences => Find(TableMemo.Get(sequences, cancellation), family),
        _ => null,
    };

    private static Mistake? Find(RoundedRule rule, Family family)
    {
        for (int i = 0; i < rule.Constants.Count; i++)
        {
            if (RulePart.IsOutOfRange(rule, i))
            {
                bool isLarge = rule.Format.IsInfinity(rule.Constants[i].Bits);
                return new Mistake(
                    DiagnosticDescriptors.ConstantOutOfRange,
                    string.Empty,
                    rule.Table.Constants[i].Name,
                    isLarge ? "large" : "small",
                    rule.Format.Name);
            }
        }

        if (rule.Nodes.Count < rule.Table.Nodes.Count)
        {
            return null;
        }

        if (rule.FirstZeroWeightNode is { } first)
        {
            return ZeroWeights(rule, family, rule.ZeroWeights, rule.Table.Nodes.Count, first);
        }

        // A companion has a point more, so that its weights can round to zero where the rule's just do not.
        RoundedValue[] lost = rule.Companion is { } companion
            ? companion.Nodes.Where((_, i) => rule.Format.IsZero(companion.Weights[i].Bits)).ToArray()
            : Array.Empty<RoundedValue>();
        return lost.Length == 0 ? null : ZeroWeights(rule, family, lost.Length, rule.Companion!.Nodes.Count, Innermost(lost, rule.Format));
    }

    private static Mistake ZeroWeights(RoundedRule rule, Family family, int lost, int all, RoundedValue first) => new(
        DiagnosticDescriptors.ZeroWeights, family.SizeArgument, lost, all, rule.Format.Name, NumberType.Of(rule.Format).Literal(first));

    private static RoundedValue Innermost(RoundedValue[] nodes, BinaryFormat format) => nodes
        .Select(node => node with { Bits = format.Abs(node.Bits) })
        .OrderBy(node => node.Bits)
        .First();

    private static Mistake? Find(RoundedMoments moments) => moments.FirstOverflow is { } order
        ? new Mistake(DiagnosticDescriptors.MomentOverflow, ArgumentReader.MaximumOrderArgument, order - 1, order, moments.Format.Name)
        : null;

    private static Mistake? Find(RoundedSequences sequences, Family family) => sequences.FirstOverflow is { } overflow
        ? new Mistake(
            DiagnosticDescriptors.EntryOverflow, family.SizeArgument, family.SizeArgument, overflow.Index, overflow.Name, sequences.Format.Name)
        : null;
}
