using System.Collections.Generic;
using System.Linq;
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

    /// <summary>What there is to say of a claim. A family has a line here.</summary>
    /// <exception cref="System.NotSupportedException">The claim is of a family without a line.</exception>
    public static Explanation Of(TableClaim claim) => claim switch
    {
        GaussHermiteClaim hermite => HermiteExplanation.Of(hermite),
        NormalMomentsClaim moments => NormalMomentsExplanation.Of(moments),
        _ => throw new System.NotSupportedException("A family without an explanation: " + claim.Title),
    };

    /// <summary>A number below the line: "₁₆".</summary>
    public static string Subscript(int number) =>
        string.Concat(number.ToString(System.Globalization.CultureInfo.InvariantCulture).Select(digit => Lowered[digit - '0']));
}
