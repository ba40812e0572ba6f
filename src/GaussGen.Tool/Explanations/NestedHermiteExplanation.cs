using System.Collections.Generic;
using GaussGen.Mathematics.Proofs;
using static GaussGen.Tool.Explanations.Explanation;

namespace GaussGen.Tool.Explanations;

/// <summary>Nested rules for the standard normal density in words (Genz and Keister 1996).</summary>
internal static class NestedHermiteExplanation
{
    private static readonly int[] Points = [1, 3, 9, 19, 35];
    private static readonly int[] Degrees = [1, 5, 15, 29, 51];

    /// <summary>What there is to say of a rule.</summary>
    public static Explanation Of(NestedHermiteClaim claim) => new(
        [
            "Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx over the real line,",
            "w(x) = exp(−x²/2)/√(2π), the standard normal density.",
            $"The {Text(Points[claim.Level])} {(claim.Level == 0 ? "node is" : "nodes are")} among those of every higher level: the levels 0 to 4 have 1, 3, 9, 19 and 35 nodes, "
                + "so that a finer sum uses all values of the coarser one.",
            "The added nodes are the zeros of the polynomial that gives the largest degree of exactness; the weights are those of the "
                + "interpolating polynomial, and some may be negative.",
            "For a normal variable X with mean m and standard deviation s: E f(X) ≈ Σ wᵢ f(m + s xᵢ).",
            .. Companion(claim),
        ],
        [$"Exact for every polynomial up to degree {Text(Degrees[claim.Level])}, apart from rounding."],
        RuleWords.Members,
        RuleWords.CautionOf(claim.HasErrorEstimate),
        "Genz and Keister, Fully symmetric interpolatory rules for multiple integrals over infinite regions with Gaussian weight (1996)"
            + RuleWords.AntiGaussianSource(claim is { HasErrorEstimate: true, Level: 0 }))
    {
        Plot = PlottedMembers.Rule,
    };

    private static IEnumerable<string> Companion(NestedHermiteClaim claim) => claim is { HasErrorEstimate: true, Level: > 0 }
        ? [$"The companion is the rule of level {Text(claim.Level - 1)}. The error is estimated by |Σ companion − Σ rule|."]
        : RuleWords.AntiGaussian(claim.HasErrorEstimate, Degrees[0]);
}
