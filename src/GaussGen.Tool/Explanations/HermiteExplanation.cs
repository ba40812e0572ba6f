using GaussGen.Mathematics.Proofs;

namespace GaussGen.Tool.Explanations;

/// <summary>Gauss–Hermite rules in words.</summary>
/// <remarks>
/// Weights and remainder are those of every Gauss rule (NIST DLMF 3.5(v); Szegő, Orthogonal Polynomials (1939), 3.4), with the
/// recurrence (DLMF 18.9) and the norm of the monic polynomial: n! for the density, n! √π/2ⁿ for exp(−x²).
/// </remarks>
internal static class HermiteExplanation
{
    /// <summary>What there is to say of a rule.</summary>
    public static Explanation Of(GaussHermiteClaim claim)
    {
        bool isDensity = claim.Weight == HermiteWeight.StandardNormalDensity;
        int degree = (2 * claim.Points) - 1;
        string polynomial = (isDensity ? "He" : "H") + Explanation.Subscript(claim.Points);
        return new Explanation(
            [
                "Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx over the real line,",
                isDensity ? "w(x) = exp(−x²/2)/√(2π), the standard normal density (probabilists' convention)." : "w(x) = exp(−x²) (physicists' convention).",
                $"The n = {Explanation.Text(claim.Points)} nodes xᵢ are the zeros of the Hermite polynomial {polynomial},",
                isDensity ? "He₀ = 1, He₁ = x, Heₖ₊₁ = x Heₖ − k Heₖ₋₁." : "H₀ = 1, H₁ = 2x, Hₖ₊₁ = 2x Hₖ − 2k Hₖ₋₁.",
                isDensity ? "The weights are wᵢ = n!/(n Heₙ₋₁(xᵢ))²." : "The weights are wᵢ = 2ⁿ⁻¹ n! √π/(n Hₙ₋₁(xᵢ))².",
                "For a normal variable X with mean m and standard deviation s:",
                isDensity ? "E f(X) ≈ Σ wᵢ f(m + s xᵢ)." : "E f(X) ≈ (1/√π) Σ wᵢ f(m + √2 s xᵢ).",
                .. RuleWords.AntiGaussian(claim.HasErrorEstimate, degree),
            ],
            [
                $"Exact for every polynomial up to degree {Explanation.Text(degree)}, apart from rounding;",
                isDensity ? "otherwise off by n!/(2n)! f⁽²ⁿ⁾(ξ) for some ξ." : "otherwise off by n! √π/(2ⁿ (2n)!) f⁽²ⁿ⁾(ξ) for some ξ.",
            ],
            RuleWords.Members,
            RuleWords.CautionOf(claim.HasErrorEstimate),
            "NIST DLMF 3.5(v), 18.9; Szegő, Orthogonal Polynomials (1939), 3.4" + RuleWords.AntiGaussianSource(claim.HasErrorEstimate))
        {
            Plot = PlottedMembers.Rule,
        };
    }
}
