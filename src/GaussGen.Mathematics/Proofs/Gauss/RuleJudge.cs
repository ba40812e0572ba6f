using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Puts the found nodes and weights of a rule beside those that a proof finds.</summary>
/// <param name="report">Where the verdicts go.</param>
/// <param name="format">The format of all entries.</param>
/// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
internal sealed class RuleJudge(ProofReport report, BinaryFormat format, bool dropZeroWeights)
{
    private const string ZerosNotToldApart =
        "The moments of the weight function, at the largest working precision of the proof, do not tell the nodes apart.";

    /// <summary>Judges one rule.</summary>
    /// <param name="source">The rule.</param>
    /// <param name="nodesMember">The span of its nodes.</param>
    /// <param name="weightsMember">The span of its weights.</param>
    /// <param name="countMember">The constant that counts them; <c>null</c> if there is none.</param>
    /// <param name="progress">Told the finished fraction.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    public FoundRule Judge(
        RuleSource source, string nodesMember, string weightsMember, string? countMember, Action<double> progress, CancellationToken cancellation)
    {
        IReadOnlyList<ulong> foundNodes = report.Span(nodesMember), foundWeights = report.Span(weightsMember);
        List<KnownEntry>? entries = Search(source, foundNodes, progress, cancellation);
        if (entries is null || (dropZeroWeights && entries.Exists(entry => entry.Weight.Bits is null)))
        {
            report.Undecided(nodesMember, foundNodes, ZerosNotToldApart);
            report.Undecided(weightsMember, foundWeights, ZerosNotToldApart);
            return new FoundRule(source, foundNodes, foundWeights, []);
        }

        List<KnownEntry> kept = dropZeroWeights ? entries.FindAll(entry => entry.Weight.Bits != 0) : entries;
        List<KnownNumber> dropped = [.. entries.Where(entry => dropZeroWeights && entry.Weight.Bits == 0).Select(entry => entry.Node)];
        if (countMember is not null)
        {
            report.Integer(countMember, kept.Count);
        }

        report.Entries(nodesMember, foundNodes, kept.ConvertAll(entry => entry.Node));
        report.Entries(weightsMember, foundWeights, kept.ConvertAll(entry => entry.Weight));
        if (entries.Exists(entry => IsOutside(entry.Node, source.Moments)))
        {
            report.Fault(nodesMember + " has a node outside the interval that carries the weight; there is no such rule.");
        }

        return new FoundRule(source, foundNodes, foundWeights, dropped);
    }

    /// <summary>The moment equations of a rule whose entries are all proven.</summary>
    public IReadOnlyList<MomentEquation> Equations(FoundRule rule, int degree, CancellationToken cancellation) =>
        new RuleMomentEquations(rule.Source, format, degree).Check(rule.Nodes, rule.Weights, rule.Dropped, cancellation);

    private List<KnownEntry>? Search(
        RuleSource source, IReadOnlyList<ulong> hints, Action<double> progress, CancellationToken cancellation)
    {
        try
        {
            return new RuleSearch(source, format).Find(hints, progress, cancellation);
        }
        catch (OverflowException)
        {
            // Parameters so large that powers of them leave the range of an exponent.
            return null;
        }
    }

    private static bool IsOutside(KnownNumber node, WeightMoments moments) =>
        node.Bits is not null
        && ((moments.Lower is { } lower && node.Upper < lower) || (moments.Upper is { } upper && node.Lower > upper));
}

/// <summary>The entries of a rule as they were found.</summary>
/// <param name="Source">The rule.</param>
/// <param name="Nodes">The nodes.</param>
/// <param name="Weights">The weights.</param>
/// <param name="Dropped">The nodes that were left out because their weight rounds to zero.</param>
internal sealed record FoundRule(
    RuleSource Source, IReadOnlyList<ulong> Nodes, IReadOnlyList<ulong> Weights, IReadOnlyList<KnownNumber> Dropped);
