using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Proves the table of a rule entry by entry; how, is said at <see cref="RuleSearch"/>.</summary>
internal sealed class GaussProof(TableClaim claim, TableData data, RulePromise promise)
{
    private const string ZerosNotToldApart =
        "The moments of the weight function, at the largest working precision of the proof, do not tell the nodes apart.";

    private readonly ProofReport _report = new(claim, data);

    /// <summary>Judges everything that the claim speaks of.</summary>
    /// <param name="judgeConstants">Judges constants beyond those of every rule.</param>
    /// <param name="progress">Told the finished fraction.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    public TableProof Run(Action<ProofReport>? judgeConstants, IProgress<double>? progress, CancellationToken cancellation)
    {
        double share = promise.Companion is null ? 1 : 0.5;
        FoundRule rule = Judge(promise.Rule, "Nodes", "Weights", "PointCount", part => progress?.Report(part * share), cancellation);
        _report.Integer("DegreeOfExactness", promise.DegreeOfExactness);
        FoundRule? companion = promise.Companion is null ? null : Judge(
            promise.Companion, "CompanionNodes", "CompanionWeights", null, part => progress?.Report(share + (part * share)), cancellation);
        JudgeScaling();
        judgeConstants?.Invoke(_report);
        if (!_report.IsClean)
        {
            return _report.Finish([]);
        }

        List<MomentEquation> equations = [.. Equations(rule, promise.Rule, promise.DegreeOfExactness, cancellation)];
        if (companion is not null)
        {
            // Both companions are exact at least to one degree less than they have nodes.
            equations.AddRange(Equations(companion, promise.Companion!, promise.Companion!.Points - 1, cancellation));
        }

        return _report.Finish(equations);
    }

    private FoundRule Judge(
        RuleSource source, string nodesMember, string weightsMember, string? countMember, Action<double> progress, CancellationToken cancellation)
    {
        IReadOnlyList<ulong> foundNodes = _report.Span(nodesMember), foundWeights = _report.Span(weightsMember);
        List<KnownEntry>? entries = Search(source, foundNodes, progress, cancellation);
        if (entries is null || (promise.DropZeroWeights && entries.Exists(entry => entry.Weight.Bits is null)))
        {
            _report.Undecided(nodesMember, foundNodes, ZerosNotToldApart);
            _report.Undecided(weightsMember, foundWeights, ZerosNotToldApart);
            return new FoundRule(foundNodes, foundWeights, []);
        }

        List<KnownEntry> kept = promise.DropZeroWeights ? entries.FindAll(entry => entry.Weight.Bits != 0) : entries;
        List<KnownNumber> dropped = [.. entries.Where(entry => promise.DropZeroWeights && entry.Weight.Bits == 0).Select(entry => entry.Node)];
        if (countMember is not null)
        {
            _report.Integer(countMember, kept.Count);
        }

        _report.Entries(nodesMember, foundNodes, kept.ConvertAll(entry => entry.Node));
        _report.Entries(weightsMember, foundWeights, kept.ConvertAll(entry => entry.Weight));
        if (entries.Exists(entry => IsOutside(entry.Node, source.Moments)))
        {
            _report.Fault(nodesMember + " has a node outside the interval that carries the weight; there is no such rule.");
        }

        return new FoundRule(foundNodes, foundWeights, dropped);
    }

    private List<KnownEntry>? Search(
        RuleSource source, IReadOnlyList<ulong> hints, Action<double> progress, CancellationToken cancellation)
    {
        try
        {
            return new RuleSearch(source, claim.Format).Find(hints, progress, cancellation);
        }
        catch (OverflowException)
        {
            // Parameters so large that powers of them leave the range of an exponent.
            return null;
        }
    }

    /// <summary>
    /// What carries the rule to a distribution with a location and a scale, E f = Σ wᵢ f(location + scale·NodeScale·xᵢ), and what the
    /// difference of the two sums is multiplied by.
    /// </summary>
    private void JudgeScaling()
    {
        _report.Constant("NodeScale", Known(Rational.One), isRequired: false);
        _report.Constant("ReciprocalTotalWeight", Known(Rational.One), isRequired: false);
        _report.Constant("ExpectationLocation", Known(Rational.Zero), isRequired: false);
        _report.Constant("ExpectationScale", Known(Rational.One), isRequired: false);
        if (promise.Companion is not null)
        {
            _report.Constant("ErrorFactor", Known(promise.ErrorFactor), isRequired: false);
        }
    }

    private KnownNumber Known(Rational value)
    {
        Ball enclosure = Ball.FromRational(value, 64);
        return new KnownNumber(enclosure.Lower, enclosure.Upper, claim.Format.Round(value));
    }

    private IReadOnlyList<MomentEquation> Equations(FoundRule rule, RuleSource source, int degree, CancellationToken cancellation) =>
        new RuleMomentEquations(source.Moments, claim.Format, degree).Check(rule.Nodes, rule.Weights, rule.Dropped, cancellation);

    private static bool IsOutside(KnownNumber node, WeightMoments moments) =>
        node.Bits is not null
        && ((moments.Lower is { } lower && node.Upper < lower) || (moments.Upper is { } upper && node.Lower > upper));

    private sealed record FoundRule(IReadOnlyList<ulong> Nodes, IReadOnlyList<ulong> Weights, IReadOnlyList<KnownNumber> Dropped);
}
