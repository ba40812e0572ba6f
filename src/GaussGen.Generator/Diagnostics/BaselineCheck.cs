using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Sequences;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace GaussGen.Generator.Diagnostics;

/// <summary>Whether a table is the one that was reviewed. The digest is that of the table as it will stand in the assembly.</summary>
internal static class BaselineCheck
{
    /// <summary>Compares a table that can be made with the baselines, if its type can have it.</summary>
    public static void Report(
        SymbolAnalysisContext context, INamedTypeSymbol type, DeclaredFamily declared, TableRequest request, BaselineSet baselines)
    {
        if (baselines.IsSilent || request.Claim is not { } claim || type.IsGenericType || TargetType.Of(type) is not { } target)
        {
            return;
        }

        BaselineEntry entry = BaselineEntry.Of(
            context.Compilation.Assembly.Name,
            target.MetadataName.Replace('+', '.'),
            declared.Family.Name,
            claim,
            request.Format.Name,
            TableDigest.Of(MembersOf(request, context.CancellationToken)));
        if (baselines.Compare(entry) is { } difference)
        {
            context.ReportDiagnostic(Diagnostic.Create(
                DiagnosticDescriptors.NotAsReviewed,
                AttributePlace.Of(declared.Attribute, context.CancellationToken),
                DisplayName.Of(type),
                difference.File,
                difference.What));
        }
    }

    private static IEnumerable<DigestedMember> MembersOf(TableRequest request, CancellationToken cancellation)
    {
        switch (request)
        {
            case RuleRequest rule:
                return MembersOf(TableMemo.Get(rule, cancellation));
            case MomentRequest moments:
                return MembersOf(TableMemo.Get(moments, cancellation));
            case SequenceRequest sequences:
                return MembersOf(TableMemo.Get(sequences, cancellation));
            default:
                throw new ArgumentException("A request asks for a rule, for moments or for sequences.", nameof(request));
        }
    }

    private static IEnumerable<DigestedMember> MembersOf(RoundedRule rule)
    {
        yield return List("Nodes", rule.Format, rule.Nodes);
        yield return List("Weights", rule.Format, rule.Weights);
        yield return DigestedMember.Number("PointCount", null, (ulong)rule.Nodes.Count);
        yield return DigestedMember.Number("DegreeOfExactness", null, (ulong)rule.Table.DegreeOfExactness);
        for (int i = 0; i < rule.Constants.Count; i++)
        {
            yield return DigestedMember.Number(rule.Table.Constants[i].Name, rule.Format, rule.Constants[i].Bits);
        }

        if (rule.Companion is { } companion)
        {
            yield return List("CompanionNodes", rule.Format, companion.Nodes);
            yield return List("CompanionWeights", rule.Format, companion.Weights);
        }
    }

    private static IEnumerable<DigestedMember> MembersOf(RoundedSequences sequences) => sequences.Table.Sequences.Select((sequence, index) =>
        List(sequence.Name, sequences.Format, sequences.Values[index]));

    private static IEnumerable<DigestedMember> MembersOf(RoundedMoments moments)
    {
        DigestedMember[] lists =
        {
            List("Raw", moments.Format, moments.Raw),
            List("Central", moments.Format, moments.Central),
            List("Absolute", moments.Format, moments.Absolute),
        };
        return lists.Concat(lists.SelectMany(list => list.Bits.Select((bits, index) =>
            DigestedMember.Number(DigestedMember.ConstantName(list.Name, index), list.Format, bits))));
    }

    private static DigestedMember List(string name, BinaryFormat format, IReadOnlyList<RoundedValue> values) =>
        DigestedMember.List(name, format, values.Select(value => value.Bits).ToArray());
}
