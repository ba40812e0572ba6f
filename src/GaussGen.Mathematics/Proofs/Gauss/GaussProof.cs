using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Proves the table of a rule entry by entry; how, is said at <see cref="RuleSearch"/>.</summary>
internal sealed class GaussProof(TableClaim claim, TableData data, RulePromise promise)
{
    private readonly ProofReport _report = new(claim, data);

    /// <summary>Judges everything that the claim speaks of.</summary>
    /// <param name="judgeConstants">Judges constants beyond those of every rule.</param>
    /// <param name="progress">Told the finished fraction.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    public TableProof Run(Action<ProofReport>? judgeConstants, IProgress<double>? progress, CancellationToken cancellation)
    {
        var judge = new RuleJudge(_report, claim.Format, promise.DropZeroWeights);
        double share = promise.Companion is null ? 1 : 0.5;
        FoundRule rule = judge.Judge(
            promise.Rule, "Nodes", "Weights", "PointCount", part => progress?.Report(part * share), cancellation);
        _report.Integer("DegreeOfExactness", promise.DegreeOfExactness);
        FoundRule? companion = promise.Companion is null ? null : judge.Judge(
            promise.Companion, "CompanionNodes", "CompanionWeights", null, part => progress?.Report(share + (part * share)), cancellation);
        JudgeScaling();
        judgeConstants?.Invoke(_report);
        if (!_report.IsClean)
        {
            return _report.Finish([]);
        }

        List<MomentEquation> equations = [.. judge.Equations(rule, promise.DegreeOfExactness, cancellation)];
        if (companion is not null)
        {
            // Every companion is exact at least to one degree less than it has nodes.
            equations.AddRange(judge.Equations(companion, companion.Source.Points - 1, cancellation));
        }

        return _report.Finish(equations);
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
}
