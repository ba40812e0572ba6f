using System;
using System.Collections.Generic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;

namespace GaussGen.Tool.Explanations;

/// <summary>Moments of normal distributions in words; the formulas are those of <see cref="NormalMomentsClaim"/>'s proof.</summary>
internal static class NormalMomentsExplanation
{
    private static readonly Dictionary<string, string> Members = new()
    {
        ["Raw"] = "The raw moments by order.",
        ["Central"] = "The central moments by order.",
        ["Absolute"] = "The absolute moments about the mean by order.",
    };

    /// <summary>What there is to say of a table of moments.</summary>
    public static Explanation Of(NormalMomentsClaim claim) => new(
        [
            "X is a normal variable with mean m and standard deviation s:",
            $"m = {Exactly(claim.Mean)}; s = {Exactly(claim.StandardDeviation)}.",
            "Raw: E Xᵏ = Σ k!/((k−2j)! j! 2ʲ) mᵏ⁻²ʲ s²ʲ over 0 ≤ 2j ≤ k.",
            "Central: E (X − m)ᵏ = k!/(2ʲ j!) sᵏ for k = 2j, and 0 for odd k.",
            "Absolute: E |X − m|ᵏ = sᵏ 2^(k/2) Γ((k+1)/2)/√π.",
            "Entry k is the moment of order k, in the unit of X to the power k.",
        ],
        [],
        Members,
        "That the constants are right says nothing about how well the distribution describes what was measured.",
        "Winkelbauer, Moments and absolute moments of the normal distribution (2012); NIST DLMF 5.4, 5.5");

    /// <summary>A parameter means the exact value of a binary64 number.</summary>
    private static string Exactly(double value)
    {
        ulong bits = BitConverter.DoubleToUInt64Bits(value);
        return $"{ShortestDecimal.Write(bits, BinaryFormat.Binary64)}, exactly {HexadecimalFloat.Write(bits, BinaryFormat.Binary64)}";
    }
}
