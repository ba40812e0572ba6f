using GaussGen.Mathematics.Proofs;
using static GaussGen.Tool.Explanations.Explanation;

namespace GaussGen.Tool.Explanations;

/// <summary>Gauss rules for the densities that are not the whole normal one, in words.</summary>
/// <remarks>
/// Nodes, weights and remainder are those of every Gauss rule (NIST DLMF 3.5(v)); a family has its density and what is to be known of it.
/// </remarks>
internal static class GaussRuleExplanation
{
    /// <summary>The half-normal density.</summary>
    public static Explanation Of(GaussHalfRangeHermiteClaim claim) => Rule(
        claim.Points,
        claim.HasErrorEstimate,
        "[0, ∞)",
        [
            "w(x) = √(2/π) exp(−x²/2), the half-normal density.",
            "For X = s |Z| with a standard normal Z and a scale s: E f(X) ≈ Σ wᵢ f(s xᵢ).",
        ],
        "Steen, Byrne and Gelbard, Mathematics of Computation 23 (1969)");

    /// <summary>The normal density on an interval.</summary>
    public static Explanation Of(GaussTruncatedNormalClaim claim) => Rule(
        claim.Points,
        claim.HasErrorEstimate,
        Interval(claim.Lower, claim.Upper),
        [
            "w(x) = exp(−x²/2)/∫ exp(−t²/2) dt, the integral over the same interval.",
            $"Lower end {Exactly(claim.Lower)}; upper end {Exactly(claim.Upper)}.",
            "For a normal variable with mean m and standard deviation s that is known to lie between a and b, the ends are (a − m)/s and "
                + "(b − m)/s, and E f(X) ≈ Σ wᵢ f(m + s xᵢ).",
        ],
        "Tallis, The moment generating function of the truncated multi-normal distribution (1961)");

    /// <summary>A power of |x| times exp(−x²).</summary>
    public static Explanation Of(GaussGeneralizedHermiteClaim claim) => Rule(
        claim.Points,
        claim.HasErrorEstimate,
        "the real line",
        [
            "w(x) = |x|^(2μ) exp(−x²)/Γ(μ + ½),",
            $"μ = {Exactly(claim.Exponent)}.",
            "Its monic orthogonal polynomials: p₀ = 1, p₁ = x, pₖ₊₁ = x pₖ − bₖ pₖ₋₁ with bₖ = k/2 for even k and k/2 + μ for odd k.",
        ],
        "Szegő, Orthogonal Polynomials (1939), problem 25; Chihara, An Introduction to Orthogonal Polynomials (1978), V.2");

    /// <summary>The log-normal density, which its moments do not determine (Heyde 1963).</summary>
    public static Explanation Of(GaussLogNormalClaim claim)
    {
        Explanation explanation = Rule(
            claim.Points,
            claim.HasErrorEstimate,
            "(0, ∞)",
            [
                "w(x) = exp(−(ln x − m)²/(2s²))/(x s √(2π)), the density of exp(Y) for a normal variable Y with mean m and standard deviation s:",
                $"m = {Exactly(claim.LogMean)}; s = {Exactly(claim.LogStandardDeviation)}.",
                "Its moments are E Xᵏ = exp(k m + k² s²/2).",
            ],
            "Wigert, Sur les polynomes orthogonaux et l'approximation des fonctions continues (1923); Heyde, On a property of the lognormal "
                + "distribution (1963)");
        return explanation with
        {
            Caution = explanation.Caution + " No moments determine a log-normal distribution: for a function that is no polynomial, sums of more and "
                + "more points need not tend to its expectation.",
        };
    }

    /// <summary>A mixture of normal densities.</summary>
    public static Explanation Of(GaussNormalMixtureClaim claim) => Rule(
        claim.Points,
        claim.HasErrorEstimate,
        "the real line",
        [
            "w(x) = Σ vⱼ φ((x − mⱼ)/sⱼ)/sⱼ with the standard normal density φ; the vⱼ are the given weights, divided by their exact sum.",
            $"Given weights: {List(claim.Weights)}.",
            $"Means m: {List(claim.Means)}.",
            $"Standard deviations s: {List(claim.StandardDeviations)}.",
            "Each of these numbers means the exact value of a binary64 number.",
        ],
        "Stein, Estimation of the mean of a multivariate normal distribution (1981), for the moments");

    /// <summary>An exponential of an even polynomial.</summary>
    public static Explanation Of(GaussEvenExponentialClaim claim) => Rule(
        claim.Points,
        claim.HasErrorEstimate,
        "the real line",
        [
            $"w(x) = exp(−({EvenPolynomial(claim.Coefficients.Count)}))/Z, Z the integral of the exponential itself (NormalizingIntegral).",
            $"c: {List(claim.Coefficients)}.",
            "Each of these numbers means the exact value of a binary64 number.",
        ],
        "Chihara, An Introduction to Orthogonal Polynomials (1978), I");

    private static Explanation Rule(int points, bool hasErrorEstimate, string range, string[] density, string sources) => new(
        [
            $"Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx over {range},",
            .. density,
            $"The n = {Text(points)} nodes xᵢ are the zeros of the polynomial pₙ of degree n that is orthogonal, with respect to w, to all of lower degree.",
            "The weights are wᵢ = 1/Σ qₖ(xᵢ)² over 0 ≤ k < n, with the orthonormal polynomials qₖ; their sum is 1.",
            .. RuleWords.AntiGaussian(hasErrorEstimate, (2 * points) - 1),
        ],
        [
            $"Exact for every polynomial up to degree {Text((2 * points) - 1)}, apart from rounding;",
            "otherwise off by f⁽²ⁿ⁾(ξ)/(2n)! ∫ pₙ(x)² w(x) dx for some ξ, with pₙ monic.",
        ],
        RuleWords.Members,
        RuleWords.CautionOf(hasErrorEstimate),
        "NIST DLMF 3.5(v); " + sources + RuleWords.AntiGaussianSource(hasErrorEstimate))
    {
        Plot = PlottedMembers.Rule,
    };

    private static string Interval(double lower, double upper) =>
        (double.IsInfinity(lower) ? "(" : "[") + End(lower) + ", " + End(upper) + (double.IsInfinity(upper) ? ")" : "]");
}
