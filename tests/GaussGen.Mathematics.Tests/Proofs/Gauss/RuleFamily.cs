using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>A weight function, as a claim and as the request for the construction that the claim is to be proven for.</summary>
public sealed record RuleFamily(
    string Name,
    Func<int, BinaryFormat, bool, bool, TableClaim> Claim,
    Func<int, BinaryFormat, bool, RuleRequest> Request)
{
    /// <summary>One of each kind of weight, and those of each kind that proofs treat in another way.</summary>
    public static IReadOnlyList<RuleFamily> All { get; } =
    [
        Generalized("generalized", 0.75),
        Generalized("generalized, near the limit", -0.49999999),
        LogNormal("log-normal", 0.1, 0.4),
        LogNormal("log-normal, narrow", -1, 1e-3),
        Mixture("mixture", [0.7, 0.2, 0.1], [0, 1.5, -3], [1, 0.25, 2]),
        Mixture("mixture, symmetric about 1.5", [1, 3, 1], [-0.5, 1.5, 3.5], [0.5, 1, 0.5]),
        Mixture("mixture, far apart", [0.5, 0.25], [0, 100], [1, 1]),
        Truncated("truncated", -1, 2),
        Truncated("truncated, symmetric", -1.5, 1.5),
        Truncated("truncated, far tail", 8, double.PositiveInfinity),
        EvenExponential("even exponential, normal", 0.75),
        EvenExponential("even exponential, quartic", 0, 1),
        EvenExponential("even exponential, double well", -3, 0.5),
        new(
            "half-range",
            (points, format, drop, estimate) => new GaussHalfRangeHermiteClaim(points, format, drop, estimate),
            (points, format, drop) => new GaussHalfRangeHermiteRequest(points, format, drop)),
    ];

    public static RuleFamily Named(string name) => All.Single(family => family.Name == name);

    /// <summary>The data that the construction makes.</summary>
    public TableData Data(int points, BinaryFormat format, bool drop = false, bool estimate = false) =>
        Data(Request(points, format, drop) with { ErrorEstimate = estimate });

    public static TableData Data(RuleRequest request)
    {
        BinaryFormat format = request.Format;
        RoundedRule rule = RuleRounding.Round(request.Construct(CancellationToken.None), format, request.DropZeroWeights, CancellationToken.None);
        List<DataSpan> spans = [Span("Nodes", format, rule.Nodes), Span("Weights", format, rule.Weights)];
        List<DataConstant> constants =
        [
            ProofData.Integer("PointCount", rule.Nodes.Count),
            ProofData.Integer("DegreeOfExactness", rule.Table.DegreeOfExactness),
            .. rule.Table.Constants.Select((constant, index) => new DataConstant(constant.Name, format, rule.Constants[index].Bits)),
        ];
        if (rule.Companion is { } companion)
        {
            spans.Add(Span("CompanionNodes", format, companion.Nodes));
            spans.Add(Span("CompanionWeights", format, companion.Weights));
            constants.Add(new DataConstant("ErrorFactor", format, companion.Factor.Bits));
        }

        return new TableData(spans, constants);
    }

    public override string ToString() => Name;

    private static RuleFamily Generalized(string name, double exponent) => new(
        name,
        (points, format, drop, estimate) => new GaussGeneralizedHermiteClaim(points, exponent, format, drop, estimate),
        (points, format, drop) => new GaussGeneralizedHermiteRequest(points, exponent, format, drop));

    private static RuleFamily Truncated(string name, double lower, double upper) => new(
        name,
        (points, format, drop, estimate) => new GaussTruncatedNormalClaim(points, lower, upper, format, drop, estimate),
        (points, format, drop) => new GaussTruncatedNormalRequest(points, lower, upper, format, drop));

    private static RuleFamily EvenExponential(string name, params double[] coefficients) => new(
        name,
        (points, format, drop, estimate) => new GaussEvenExponentialClaim(points, coefficients, format, drop, estimate),
        (points, format, drop) => new GaussEvenExponentialRequest(points, new ValueList(coefficients), format, drop));

    private static RuleFamily LogNormal(string name, double mean, double deviation) => new(
        name,
        (points, format, drop, estimate) => new GaussLogNormalClaim(points, mean, deviation, format, drop, estimate),
        (points, format, drop) => new GaussLogNormalRequest(points, mean, deviation, format, drop));

    private static RuleFamily Mixture(string name, double[] weights, double[] means, double[] deviations) => new(
        name,
        (points, format, drop, estimate) => new GaussNormalMixtureClaim(points, weights, means, deviations, format, drop, estimate),
        (points, format, drop) => new GaussNormalMixtureRequest(
            points, new ValueList(weights), new ValueList(means), new ValueList(deviations), format, drop));

    private static DataSpan Span(string name, BinaryFormat format, IReadOnlyList<RoundedValue> values) =>
        new(name, format, values.Select(value => value.Bits).ToList());
}
