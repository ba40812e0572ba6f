using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Exports;

/// <summary>
/// A table that no assembly declares. It is constructed as the generator would, and then proven as if it had been found in an
/// assembly. This is the only place of the tool that constructs anything; nothing of verification comes by here.
/// </summary>
/// <param name="Name">The table's name.</param>
/// <param name="Attribute">The family, by the attribute that would declare it.</param>
/// <param name="Request">What is wanted, for the construction.</param>
/// <param name="Claim">The same as a promise, for the proof.</param>
internal sealed record AdHocTable(string Name, string Attribute, TableRequest Request, TableClaim Claim)
{
    /// <summary>A Gauss–Hermite rule.</summary>
    /// <param name="points">The number of nodes, in the range of <see cref="GaussHermiteClaim"/>.</param>
    /// <param name="isPhysicist">Whether the weight function is exp(−x²) and not the standard normal density.</param>
    /// <param name="format">The number format.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    public static AdHocTable GaussHermite(int points, bool isPhysicist, BinaryFormat format, bool dropZeroWeights) => new(
        "gauss_hermite_" + points.ToString(CultureInfo.InvariantCulture),
        "GaussHermite",
        new GaussHermiteRequest(points, isPhysicist ? HermiteConvention.Physicist : HermiteConvention.Probabilist, format, dropZeroWeights),
        new GaussHermiteClaim(points, isPhysicist ? HermiteWeight.ExponentialOfMinusSquare : HermiteWeight.StandardNormalDensity, format, dropZeroWeights));

    /// <summary>Moments of a normal distribution; the parameters are in the ranges of <see cref="NormalMomentsClaim"/>.</summary>
    public static AdHocTable NormalMoments(double mean, double standardDeviation, int maximumOrder, BinaryFormat format) => new(
        "normal_moments",
        "NormalMoments",
        new NormalMomentsRequest(mean, standardDeviation, maximumOrder, format),
        new NormalMomentsClaim(mean, standardDeviation, maximumOrder, format));

    /// <summary>Constructs and proves the table.</summary>
    /// <exception cref="InputException">An entry is too large for the number format.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public ExportedTable Construct(VerificationProgress progress, CancellationToken cancellation)
    {
        progress.BeginProving([1]);
        TableData data = Request switch
        {
            RuleRequest rule => Data(TableMemo.Get(rule, cancellation)),
            MomentRequest moments => Data(TableMemo.Get(moments, cancellation)),
            _ => throw new NotSupportedException("A request that is neither for a rule nor for moments."),
        };
        ClaimFamily family = ClaimTable.Find(Attribute)!;
        TableProof proof = Claim.Prove(data, progress.OfTable(0), cancellation);
        progress.EndTable(0);
        return new ExportedTable(Name, null, null, family, proof, FoundDigest.Of(data, family));
    }

    private static TableData Data(RoundedRule rule)
    {
        List<DataConstant> constants =
        [
            new("PointCount", null, (ulong)rule.Nodes.Count),
            new("DegreeOfExactness", null, (ulong)rule.Table.DegreeOfExactness),
        ];
        if (rule is { NodeScale: { } scale, ReciprocalTotalWeight: { } reciprocal })
        {
            constants.Add(new DataConstant("NodeScale", rule.Format, scale.Bits));
            constants.Add(new DataConstant("ReciprocalTotalWeight", rule.Format, reciprocal.Bits));
        }

        return new TableData([Span("Nodes", rule.Format, rule.Nodes), Span("Weights", rule.Format, rule.Weights)], constants);
    }

    private static TableData Data(RoundedMoments moments)
    {
        if (moments.FirstOverflow is { } order)
        {
            throw new InputException(
                $"a moment of order {order} is too large for {moments.Format.Name}; choose a --maximum-order below {order}, or another --format");
        }

        DataSpan[] spans =
        [
            Span("Raw", moments.Format, moments.Raw),
            Span("Central", moments.Format, moments.Central),
            Span("Absolute", moments.Format, moments.Absolute),
        ];
        IEnumerable<DataConstant> constants = spans.SelectMany(span => span.Bits.Select((bits, index) =>
            new DataConstant(span.Name + index.ToString(CultureInfo.InvariantCulture), span.Format, bits)));
        return new TableData(spans, [.. constants]);
    }

    private static DataSpan Span(string name, BinaryFormat format, IReadOnlyList<RoundedValue> values) =>
        new(name, format, [.. values.Select(value => value.Bits)]);
}
