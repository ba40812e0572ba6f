using System.Collections.Generic;
using GaussGen.Mathematics.Proofs;
using static GaussGen.Tool.Explanations.Explanation;

namespace GaussGen.Tool.Explanations;

/// <summary>Moments in words.</summary>
internal static class MomentsExplanation
{
    private static readonly Dictionary<string, string> Members = new()
    {
        ["Raw"] = "The raw moments by order.",
        ["Central"] = "The central moments by order.",
        ["Absolute"] = "The absolute moments about the mean by order.",
    };

    /// <summary>The normal distribution; the formulas are those of the claim's proof.</summary>
    public static Explanation Of(NormalMomentsClaim claim) => Moments(
        [
            "X is a normal variable with mean m and standard deviation s:",
            $"m = {Exactly(claim.Mean)}; s = {Exactly(claim.StandardDeviation)}.",
            "Raw: E Xᵏ = Σ k!/((k−2j)! j! 2ʲ) mᵏ⁻²ʲ s²ʲ over 0 ≤ 2j ≤ k.",
            "Central: E (X − m)ᵏ = k!/(2ʲ j!) sᵏ for k = 2j, and 0 for odd k.",
            "Absolute: E |X − m|ᵏ = sᵏ 2^(k/2) Γ((k+1)/2)/√π.",
        ],
        "Winkelbauer, Moments and absolute moments of the normal distribution (2012); NIST DLMF 5.4, 5.5");

    private static Explanation Moments(string[] definition, string sources) => new(
        [.. definition, "Entry k is the moment of order k, in the unit of X to the power k."],
        [],
        Members,
        "That the constants are right says nothing about how well the distribution describes what was measured.",
        sources)
    {
        Plot = PlottedMembers.Moments,
    };
}
