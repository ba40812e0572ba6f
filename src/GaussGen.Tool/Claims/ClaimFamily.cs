using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>What kind of members a family's tables have.</summary>
internal enum TableShape
{
    /// <summary>Nodes and weights, with sums over them.</summary>
    Rule,

    /// <summary>Moments by order, each with a constant of its own.</summary>
    Moments,

    /// <summary>Named lists and nothing else.</summary>
    Sequences,
}

/// <summary>A family of tables as the verifier knows it.</summary>
/// <param name="Attribute">The attribute's name without its suffix.</param>
/// <param name="Shape">What kind of members its tables have.</param>
/// <param name="Spans">The spans that hold the family's entries.</param>
/// <param name="ReadClaim">Makes the claim of a declaration's arguments.</param>
internal sealed record ClaimFamily(string Attribute, TableShape Shape, IReadOnlyList<string> Spans, Func<ClaimArguments, TableClaim> ReadClaim)
{
    /// <summary>The named argument by which a rule is given a companion.</summary>
    public const string ErrorEstimate = "ErrorEstimate";

    /// <summary>The integers that tell a rule's size and quality; other tables have none.</summary>
    private static readonly string[] RuleIntegers = ["PointCount", "DegreeOfExactness"];

    private static readonly string[] RuleSpans = ["Nodes", "Weights"];
    private static readonly string[] CompanionSpans = ["CompanionNodes", "CompanionWeights"];
    private static readonly string[] MomentSpans = ["Raw", "Central", "Absolute"];

    /// <summary>What the code of the sums over a rule carries its nodes to; null where there are no sums.</summary>
    public SumForm? Sums { get; init; }

    /// <summary>Numbers beside the spans that belong to the table.</summary>
    public IReadOnlyList<string> Constants { get; init; } = [];

    /// <summary>Whether each entry of a span has a constant of its own.</summary>
    public bool HasEntryConstants => Shape == TableShape.Moments;

    /// <summary>A family of rules.</summary>
    public static ClaimFamily Rule(string attribute, SumForm sums, Func<ClaimArguments, TableClaim> readClaim) =>
        new(attribute, TableShape.Rule, RuleSpans, readClaim) { Sums = sums };

    /// <summary>A family of moments.</summary>
    public static ClaimFamily Moments(string attribute, Func<ClaimArguments, TableClaim> readClaim) =>
        new(attribute, TableShape.Moments, MomentSpans, readClaim);

    /// <summary>A family of named lists.</summary>
    public static ClaimFamily Sequences(string attribute, IReadOnlyList<string> spans, Func<ClaimArguments, TableClaim> readClaim) =>
        new(attribute, TableShape.Sequences, spans, readClaim);

    /// <summary>The family with the spans that a declaration asks for: a companion's too, if it wants an estimate of the error.</summary>
    public ClaimFamily As(Declaration declaration) =>
        declaration.Named.TryGetValue(ErrorEstimate, out object? value) && value is true ? WithCompanion() : this;

    /// <summary>The family with the spans of a companion.</summary>
    public ClaimFamily WithCompanion() => this with { Spans = [.. RuleSpans, .. CompanionSpans] };

    /// <summary>Whether a constant is one that the table's digest covers.</summary>
    public bool IsDigested(string constant) => (Shape == TableShape.Rule && RuleIntegers.Contains(constant)) || Constants.Contains(constant);

    /// <summary>Whether a constant repeats an entry of a span, as "Raw3" does.</summary>
    public bool IsEntry(string constant) => Spans.Any(span =>
        constant.Length > span.Length && constant.StartsWith(span, StringComparison.Ordinal) && constant.Skip(span.Length).All(char.IsAsciiDigit));
}
