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
using GaussGen.Mathematics.Sequences;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Exports;

/// <summary>What may be chosen of every rule.</summary>
/// <param name="Format">The number format.</param>
/// <param name="DropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
/// <param name="ErrorEstimate">Whether a companion estimates the rule's error.</param>
internal sealed record RuleChoices(BinaryFormat Format, bool DropZeroWeights, bool ErrorEstimate);

/// <summary>
/// A table that no assembly declares. It is constructed as the generator would, and then proven as if it had been found in an
/// assembly. This is the only place of the tool that constructs anything; nothing of verification comes by here.
/// </summary>
/// <remarks>The makers throw <see cref="ArgumentException"/> for a parameter that cannot be, with the parameter's name.</remarks>
/// <param name="Name">The table's name.</param>
/// <param name="Attribute">The family, by the attribute that would declare it.</param>
/// <param name="Request">What is wanted, for the construction.</param>
/// <param name="Claim">The same as a promise, for the proof.</param>
internal sealed record AdHocTable(string Name, string Attribute, TableRequest Request, TableClaim Claim)
{
    /// <summary>A Gauss–Hermite rule.</summary>
    public static AdHocTable GaussHermite(int points, bool isPhysicist, RuleChoices choices) => Rule(
        "gauss_hermite",
        points,
        "GaussHermite",
        new GaussHermiteRequest(
            points, isPhysicist ? HermiteConvention.Physicist : HermiteConvention.Probabilist, choices.Format, choices.DropZeroWeights),
        new GaussHermiteClaim(
            points,
            isPhysicist ? HermiteWeight.ExponentialOfMinusSquare : HermiteWeight.StandardNormalDensity,
            choices.Format,
            choices.DropZeroWeights,
            choices.ErrorEstimate),
        choices);

    /// <summary>A rule for the half-normal density.</summary>
    public static AdHocTable GaussHalfRangeHermite(int points, RuleChoices choices) => Rule(
        "gauss_half_range_hermite",
        points,
        "GaussHalfRangeHermite",
        new GaussHalfRangeHermiteRequest(points, choices.Format, choices.DropZeroWeights),
        new GaussHalfRangeHermiteClaim(points, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A rule for the standard normal density on an interval.</summary>
    public static AdHocTable GaussTruncatedNormal(int points, double lower, double upper, RuleChoices choices) => Rule(
        "gauss_truncated_normal",
        points,
        "GaussTruncatedNormal",
        new GaussTruncatedNormalRequest(points, lower, upper, choices.Format, choices.DropZeroWeights),
        new GaussTruncatedNormalClaim(points, lower, upper, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A rule for |x|^(2μ) exp(−x²).</summary>
    public static AdHocTable GaussGeneralizedHermite(int points, double exponent, RuleChoices choices) => Rule(
        "gauss_generalized_hermite",
        points,
        "GaussGeneralizedHermite",
        new GaussGeneralizedHermiteRequest(points, exponent, choices.Format, choices.DropZeroWeights),
        new GaussGeneralizedHermiteClaim(points, exponent, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A rule for a log-normal density.</summary>
    public static AdHocTable GaussLogNormal(int points, double logMean, double logStandardDeviation, RuleChoices choices) => Rule(
        "gauss_log_normal",
        points,
        "GaussLogNormal",
        new GaussLogNormalRequest(points, logMean, logStandardDeviation, choices.Format, choices.DropZeroWeights),
        new GaussLogNormalClaim(points, logMean, logStandardDeviation, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A rule for a mixture of normal densities.</summary>
    public static AdHocTable GaussNormalMixture(
        int points, IReadOnlyList<double> weights, IReadOnlyList<double> means, IReadOnlyList<double> standardDeviations, RuleChoices choices) => Rule(
        "gauss_normal_mixture",
        points,
        "GaussNormalMixture",
        new GaussNormalMixtureRequest(
            points, new ValueList(weights), new ValueList(means), new ValueList(standardDeviations), choices.Format, choices.DropZeroWeights),
        new GaussNormalMixtureClaim(
            points, weights, means, standardDeviations, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A rule for the density proportional to exp(−(c₁x² + c₂x⁴ + …)).</summary>
    public static AdHocTable GaussEvenExponential(int points, IReadOnlyList<double> coefficients, RuleChoices choices) => Rule(
        "gauss_even_exponential",
        points,
        "GaussEvenExponential",
        new GaussEvenExponentialRequest(points, new ValueList(coefficients), choices.Format, choices.DropZeroWeights),
        new GaussEvenExponentialClaim(points, coefficients, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>A nested rule for the standard normal density.</summary>
    public static AdHocTable NestedHermite(int level, RuleChoices choices) => Rule(
        "nested_hermite",
        level,
        "NestedHermite",
        new NestedHermiteRequest(level, choices.Format, choices.DropZeroWeights),
        new NestedHermiteClaim(level, choices.Format, choices.DropZeroWeights, choices.ErrorEstimate),
        choices);

    /// <summary>Moments of a normal distribution.</summary>
    public static AdHocTable NormalMoments(double mean, double standardDeviation, int maximumOrder, BinaryFormat format) => new(
        "normal_moments",
        "NormalMoments",
        new NormalMomentsRequest(mean, standardDeviation, maximumOrder, format),
        new NormalMomentsClaim(mean, standardDeviation, maximumOrder, format));

    /// <summary>Moments of a normal distribution on an interval.</summary>
    public static AdHocTable TruncatedNormalMoments(
        double mean, double standardDeviation, double lower, double upper, int maximumOrder, BinaryFormat format) => new(
        "truncated_normal_moments",
        "TruncatedNormalMoments",
        new TruncatedNormalMomentsRequest(mean, standardDeviation, lower, upper, maximumOrder, format),
        new TruncatedNormalMomentsClaim(mean, standardDeviation, lower, upper, maximumOrder, format));

    /// <summary>Moments of a half-normal distribution.</summary>
    public static AdHocTable HalfNormalMoments(double scale, int maximumOrder, BinaryFormat format) => new(
        "half_normal_moments",
        "HalfNormalMoments",
        new HalfNormalMomentsRequest(scale, maximumOrder, format),
        new HalfNormalMomentsClaim(scale, maximumOrder, format));

    /// <summary>Moments of a log-normal distribution.</summary>
    public static AdHocTable LogNormalMoments(double logMean, double logStandardDeviation, int maximumOrder, BinaryFormat format) => new(
        "log_normal_moments",
        "LogNormalMoments",
        new LogNormalMomentsRequest(logMean, logStandardDeviation, maximumOrder, format),
        new LogNormalMomentsClaim(logMean, logStandardDeviation, maximumOrder, format));

    /// <summary>Moments of the density proportional to exp(−(c₁x² + c₂x⁴ + …)).</summary>
    public static AdHocTable EvenExponentialMoments(IReadOnlyList<double> coefficients, int maximumOrder, BinaryFormat format) => new(
        "even_exponential_moments",
        "EvenExponentialMoments",
        new EvenExponentialMomentsRequest(new ValueList(coefficients), maximumOrder, format),
        new EvenExponentialMomentsClaim(coefficients, maximumOrder, format));

    /// <summary>The gamma function at half-integers.</summary>
    public static AdHocTable HalfIntegerGamma(int maximumOrder, BinaryFormat format) => new(
        "half_integer_gamma",
        "HalfIntegerGamma",
        new HalfIntegerGammaRequest(maximumOrder, format),
        new HalfIntegerGammaClaim(maximumOrder, format));

    /// <summary>Matrix elements of a power of x between states of the harmonic oscillator.</summary>
    public static AdHocTable OscillatorMatrixElements(int size, int power, BinaryFormat format) => new(
        "oscillator_matrix_elements",
        "OscillatorMatrixElements",
        new OscillatorMatrixElementsRequest(size, power, format),
        new OscillatorMatrixElementsClaim(size, power, format));

    /// <summary>Constructs and proves the table.</summary>
    /// <exception cref="InputException">The table cannot be constructed, or an entry is too large for the number format.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public ExportedTable Construct(VerificationProgress progress, CancellationToken cancellation)
    {
        progress.BeginProving([1]);
        TableData data = Data(cancellation);
        ClaimFamily family = ClaimTable.Find(Attribute)!;
        family = Request is RuleRequest { ErrorEstimate: true } ? family.WithCompanion() : family;
        TableProof proof = Claim.Prove(data, progress.OfTable(0), cancellation);
        progress.EndTable(0);
        return new ExportedTable(Name, null, null, family, proof, FoundDigest.Of(data, family));
    }

    private static AdHocTable Rule(string name, int size, string attribute, RuleRequest request, TableClaim claim, RuleChoices choices) => new(
        name + "_" + size.ToString(CultureInfo.InvariantCulture), attribute, request with { ErrorEstimate = choices.ErrorEstimate }, claim);

    private TableData Data(CancellationToken cancellation)
    {
        try
        {
            return Request switch
            {
                RuleRequest rule => Data(TableMemo.Get(rule, cancellation)),
                MomentRequest moments => Data(TableMemo.Get(moments, cancellation)),
                SequenceRequest sequences => Data(TableMemo.Get(sequences, cancellation)),
                _ => throw new NotSupportedException("A request that is for no rule, for no moments and for no sequences."),
            };
        }
        catch (Exception error) when (error is RuleConstructionException or InvalidOperationException)
        {
            throw new InputException($"{Claim.Title} cannot be made: {error.Message.TrimEnd('.')}");
        }
    }

    private static TableData Data(RoundedRule rule)
    {
        List<DataSpan> spans = [Span("Nodes", rule.Format, rule.Nodes), Span("Weights", rule.Format, rule.Weights)];
        List<DataConstant> constants =
        [
            new("PointCount", null, (ulong)rule.Nodes.Count),
            new("DegreeOfExactness", null, (ulong)rule.Table.DegreeOfExactness),
            .. rule.Table.Constants.Zip(rule.Constants, (named, value) => new DataConstant(named.Name, rule.Format, value.Bits)),
        ];
        if (rule is { NodeScale: { } scale, ReciprocalTotalWeight: { } reciprocal, Table.LocationScale.HasLocation: true })
        {
            constants.Add(new DataConstant("NodeScale", rule.Format, scale.Bits));
            constants.Add(new DataConstant("ReciprocalTotalWeight", rule.Format, reciprocal.Bits));
        }

        if (rule.Companion is { } companion)
        {
            spans.Add(Span("CompanionNodes", rule.Format, companion.Nodes));
            spans.Add(Span("CompanionWeights", rule.Format, companion.Weights));
            constants.Add(new DataConstant(SumForm.ErrorFactor, rule.Format, companion.Factor.Bits));
        }

        return new TableData(spans, constants);
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

    private static TableData Data(RoundedSequences sequences)
    {
        if (sequences.FirstOverflow is { } overflow)
        {
            throw new InputException(
                $"{overflow.Name}[{overflow.Index}] is too large for {sequences.Format.Name}; ask for less, or choose another --format");
        }

        return new TableData(
            [.. sequences.Table.Sequences.Zip(sequences.Values, (sequence, values) => Span(sequence.Name, sequences.Format, values))], []);
    }

    private static DataSpan Span(string name, BinaryFormat format, IReadOnlyList<RoundedValue> values) =>
        new(name, format, [.. values.Select(value => value.Bits)]);
}
