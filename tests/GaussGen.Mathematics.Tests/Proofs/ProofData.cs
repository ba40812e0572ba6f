using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>Right data for claims, made by the constructions, and ways to spoil it.</summary>
internal static class ProofData
{
    public static readonly BinaryFormat[] Formats = [BinaryFormat.Binary64, BinaryFormat.Binary32];

    public static readonly HermiteWeight[] Weights = [HermiteWeight.StandardNormalDensity, HermiteWeight.ExponentialOfMinusSquare];

    public static TableData Of(GaussHermiteClaim claim)
    {
        HermiteConvention convention = claim.Weight == HermiteWeight.StandardNormalDensity
            ? HermiteConvention.Probabilist
            : HermiteConvention.Physicist;
        var request = new GaussHermiteRequest(claim.Points, convention, claim.Format, claim.DropZeroWeights);
        RuleTable table = request.Construct(CancellationToken.None);
        RoundedRule rule = RuleRounding.Round(table, claim.Format, claim.DropZeroWeights, CancellationToken.None);
        return new TableData(
            [Span("Nodes", claim.Format, rule.Nodes), Span("Weights", claim.Format, rule.Weights)],
            [Integer("PointCount", rule.Nodes.Count), Integer("DegreeOfExactness", table.DegreeOfExactness)]);
    }

    public static TableData Of(NormalMomentsClaim claim)
    {
        var request = new NormalMomentsRequest(claim.Mean, claim.StandardDeviation, claim.MaximumOrder, claim.Format);
        RoundedMoments moments = MomentRounding.Round(request.Construct(CancellationToken.None), claim.Format, CancellationToken.None);
        DataSpan[] spans =
        [
            Span("Raw", claim.Format, moments.Raw),
            Span("Central", claim.Format, moments.Central),
            Span("Absolute", claim.Format, moments.Absolute),
        ];
        IEnumerable<DataConstant> constants = spans.SelectMany(span => span.Bits.Select((bits, order) =>
            new DataConstant(span.Name + order.ToString(CultureInfo.InvariantCulture), claim.Format, bits)));
        return new TableData(spans, constants.ToList());
    }

    public static DataConstant Integer(string name, int value) => new(name, null, (uint)value);

    /// <summary>The same data with one entry of a span replaced.</summary>
    public static TableData With(this TableData data, string span, int index, ulong bits) =>
        data.With(span, entries => entries.Select((old, i) => i == index ? bits : old));

    /// <summary>The same data with the entries of a span changed.</summary>
    public static TableData With(this TableData data, string span, Func<IReadOnlyList<ulong>, IEnumerable<ulong>> change) =>
        data with { Spans = data.Spans.Select(old => old.Name == span ? old with { Bits = change(old.Bits).ToList() } : old).ToList() };

    /// <summary>The same data with the bits of a constant replaced.</summary>
    public static TableData WithConstant(this TableData data, string name, ulong bits) =>
        data with { Constants = data.Constants.Select(old => old.Name == name ? old with { Bits = bits } : old).ToList() };

    public static IReadOnlyList<ulong> Entries(this TableData data, string span) => data.Spans.Single(old => old.Name == span).Bits;

    public static TableProof Prove(this TableClaim claim, TableData data) => claim.Prove(data, null, CancellationToken.None);

    private static DataSpan Span(string name, BinaryFormat format, IReadOnlyList<RoundedValue> values) =>
        new(name, format, values.Select(value => value.Bits).ToList());
}

/// <summary>Remembers what it is told, and does something then.</summary>
internal sealed class ProgressRecorder(Action? then = null) : IProgress<double>
{
    public List<double> Values { get; } = [];

    public void Report(double value)
    {
        Values.Add(value);
        then?.Invoke();
    }
}
