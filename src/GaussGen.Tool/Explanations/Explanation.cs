using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;

namespace GaussGen.Tool.Explanations;

/// <summary>A claim in words and formulas, for a person who reviews its table. All texts are without markup.</summary>
/// <param name="Definition">What the table is, one formula or sentence each.</param>
/// <param name="Exactness">What a rule integrates exactly, and how far it is off otherwise; empty for other tables.</param>
/// <param name="Members">What each member is, by its name.</param>
/// <param name="Caution">What the proof says nothing about.</param>
/// <param name="Sources">Where the formulas come from.</param>
internal sealed record Explanation(
    IReadOnlyList<string> Definition,
    IReadOnlyList<string> Exactness,
    IReadOnlyDictionary<string, string> Members,
    string Caution,
    string Sources)
{
    private const string Lowered = "₀₁₂₃₄₅₆₇₈₉";

    /// <summary>What is drawn of the table; null for nothing.</summary>
    public PlottedMembers? Plot { get; init; }

    /// <summary>The number of rows of the square matrix that the table's only list holds row by row; null if it holds none.</summary>
    public int? MatrixSize { get; init; }

    /// <summary>What there is to say of a claim. A family has a line here.</summary>
    /// <exception cref="NotSupportedException">The claim is of a family without a line.</exception>
    public static Explanation Of(TableClaim claim) => claim switch
    {
        GaussHermiteClaim hermite => HermiteExplanation.Of(hermite),
        GaussHalfRangeHermiteClaim half => GaussRuleExplanation.Of(half),
        GaussTruncatedNormalClaim truncated => GaussRuleExplanation.Of(truncated),
        GaussGeneralizedHermiteClaim generalized => GaussRuleExplanation.Of(generalized),
        GaussLogNormalClaim logNormal => GaussRuleExplanation.Of(logNormal),
        GaussNormalMixtureClaim mixture => GaussRuleExplanation.Of(mixture),
        GaussEvenExponentialClaim even => GaussRuleExplanation.Of(even),
        NestedHermiteClaim nested => NestedHermiteExplanation.Of(nested),
        NormalMomentsClaim moments => MomentsExplanation.Of(moments),
        TruncatedNormalMomentsClaim moments => MomentsExplanation.Of(moments),
        HalfNormalMomentsClaim moments => MomentsExplanation.Of(moments),
        LogNormalMomentsClaim moments => MomentsExplanation.Of(moments),
        EvenExponentialMomentsClaim moments => MomentsExplanation.Of(moments),
        HalfIntegerGammaClaim gamma => SequencesExplanation.Of(gamma),
        OscillatorMatrixElementsClaim oscillator => SequencesExplanation.Of(oscillator),
        _ => throw new NotSupportedException("A family without an explanation: " + claim.Title),
    };

    /// <summary>A number as text.</summary>
    public static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);

    /// <summary>A number below the line: "₁₆".</summary>
    public static string Subscript(int number) => string.Concat(Text(number).Select(digit => Lowered[digit - '0']));

    /// <summary>A parameter, which means the exact value of a binary64 number: "0.1, exactly 0x1.999999999999ap-4".</summary>
    public static string Exactly(double value)
    {
        ulong bits = Bits(value);
        return double.IsFinite(value) ? $"{ShortestDecimal.Write(bits, BinaryFormat.Binary64)}, exactly {HexadecimalFloat.Write(bits, BinaryFormat.Binary64)}" : End(value);
    }

    /// <summary>An end of an interval: "-1.0", "∞".</summary>
    public static string End(double value) => double.IsPositiveInfinity(value) ? "∞"
        : double.IsNegativeInfinity(value) ? "−∞"
        : ShortestDecimal.Write(Bits(value), BinaryFormat.Binary64);

    /// <summary>Parameters, one after the other.</summary>
    public static string List(IEnumerable<double> values) => string.Join(", ", values.Select(End));

    /// <summary>"x² + 0.5 x⁴" with the given coefficients as letters: "c₁x² + c₂x⁴", up to their number.</summary>
    public static string EvenPolynomial(int coefficients) => string.Join(
        " + ", Enumerable.Range(1, coefficients).Select(k => $"c{Subscript(k)} x^{Text(2 * k)}"));

    private static ulong Bits(double value) => BitConverter.DoubleToUInt64Bits(value == 0 ? 0.0 : value);
}

/// <summary>Which members of a table are drawn.</summary>
/// <param name="Title">What the plot shows.</param>
/// <param name="Values">The list whose entries are the heights.</param>
/// <param name="Abscissas">The list over which they stand; null for their indices.</param>
internal sealed record PlottedMembers(string Title, string Values, string? Abscissas = null)
{
    /// <summary>The plot of a rule.</summary>
    public static PlottedMembers Rule { get; } = new("Weights over their nodes", "Weights", "Nodes");

    /// <summary>The plot of moments.</summary>
    public static PlottedMembers Moments { get; } = new("Absolute moments by order", "Absolute");
}
