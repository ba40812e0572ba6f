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

    /// <summary>The normal distribution on an interval.</summary>
    public static Explanation Of(TruncatedNormalMomentsClaim claim) => Moments(
        [
            $"X is a normal variable with mean m and standard deviation s that is known to lie between {End(claim.Lower)} and {End(claim.Upper)}:",
            $"m = {Exactly(claim.Mean)}; s = {Exactly(claim.StandardDeviation)};",
            $"lower end {Exactly(claim.Lower)}; upper end {Exactly(claim.Upper)}.",
            "Its density is exp(−(x − m)²/(2s²)) there, divided by the integral of that.",
            "Raw: E Xᵏ. Central: E (X − E X)ᵏ. Absolute: E |X − E X|ᵏ. E X is the mean of the truncated distribution, not m.",
        ],
        "Tallis, The moment generating function of the truncated multi-normal distribution (1961)");

    /// <summary>The half-normal distribution.</summary>
    public static Explanation Of(HalfNormalMomentsClaim claim) => Moments(
        [
            "X = s |Z| with a standard normal variable Z:",
            $"s = {Exactly(claim.Scale)}.",
            "Raw: E Xᵏ = sᵏ 2^(k/2) Γ((k+1)/2)/√π; the mean is E X = s √(2/π).",
            "Central: E (X − E X)ᵏ. Absolute: E |X − E X|ᵏ.",
        ],
        "Winkelbauer, Moments and absolute moments of the normal distribution (2012); NIST DLMF 5.4, 5.5, 7.18");

    /// <summary>The log-normal distribution.</summary>
    public static Explanation Of(LogNormalMomentsClaim claim) => Moments(
        [
            "X = exp(Y) with a normal variable Y of mean m and standard deviation s:",
            $"m = {Exactly(claim.LogMean)}; s = {Exactly(claim.LogStandardDeviation)}.",
            "Raw: E Xᵏ = exp(k m + k² s²/2).",
            "Central: E (X − E X)ᵏ. Absolute: E |X − E X|ᵏ.",
        ],
        "Aitchison and Brown, The Lognormal Distribution (1957)");

    /// <summary>The distribution with an exponential of an even polynomial for its density.</summary>
    public static Explanation Of(EvenExponentialMomentsClaim claim) => Moments(
        [
            $"X has the density exp(−({EvenPolynomial(claim.Coefficients.Count)})), divided by its integral over the real line.",
            $"c: {List(claim.Coefficients)}.",
            "Each of these numbers means the exact value of a binary64 number.",
            "The mean is 0: Raw and Central are E Xᵏ, which is 0 for odd k, and Absolute is E |X|ᵏ.",
        ],
        "The definition; by parts, E of the derivative of xᵏ⁺¹ exp(−p(x)) over exp(−p(x)) is 0, which joins the moments to each other");

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
