using System.Collections.Generic;
using GaussGen.Mathematics.Proofs;
using static GaussGen.Tool.Explanations.Explanation;

namespace GaussGen.Tool.Explanations;

/// <summary>Lists that are neither a rule nor moments, in words.</summary>
internal static class SequencesExplanation
{
    private static readonly Dictionary<string, string> Gamma = new()
    {
        ["Gamma"] = "The gamma function at k + ½, by k.",
        ["Reciprocal"] = "One over that, by k.",
    };

    private static readonly Dictionary<string, string> Elements = new()
    {
        ["Elements"] = "The matrix row by row: the element of row m and column n has the index m times the number of states, plus n.",
    };

    /// <summary>The gamma function at half-integers.</summary>
    public static Explanation Of(HalfIntegerGammaClaim claim) => new(
        [
            "Gamma: Γ(k + ½) = (2k)! √π/(4ᵏ k!) in entry k.",
            "Reciprocal: 1/Γ(k + ½) in entry k, rounded from its own value and not from that of Gamma.",
            $"k goes from 0 to {Text(claim.MaximumOrder)}.",
        ],
        [],
        Gamma,
        "That the constants are right says nothing about the formula they are used in; a product of both lists is not exactly 1.",
        "NIST DLMF 5.4, 5.5")
    {
        Plot = new PlottedMembers("Γ(k + ½) by k", "Gamma"),
    };

    /// <summary>Matrix elements of a power of the coordinate.</summary>
    public static Explanation Of(OscillatorMatrixElementsClaim claim) => new(
        [
            $"⟨m|xᵖ|n⟩ = ∫ ψₘ(x) xᵖ ψₙ(x) dx over the real line, p = {Text(claim.Power)}, for m and n from 0 to {Text(claim.Size - 1)},",
            "with the stationary states of the harmonic oscillator ψₙ(x) = Hₙ(x) exp(−x²/2)/√(2ⁿ n! √π) and the Hermite polynomials Hₙ; x is "
                + "dimensionless, the length in units of √(ħ/(mass · angular frequency)).",
            "The element is 0 unless m + n + p is even and |m − n| ≤ p.",
            $"Elements holds the matrix row by row: ⟨m|xᵖ|n⟩ has the index {Text(claim.Size)} m + n.",
        ],
        [],
        Elements,
        "That the constants are right says nothing about a matrix of so many states: products of such matrices lack the states that were left out.",
        "NIST DLMF 18.3, 18.9, 18.39(i)")
    {
        MatrixSize = claim.Size,
    };
}
