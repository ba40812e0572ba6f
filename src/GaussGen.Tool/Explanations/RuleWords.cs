using System.Collections.Generic;

namespace GaussGen.Tool.Explanations;

/// <summary>What all rules have in common, in words.</summary>
internal static class RuleWords
{
    /// <summary>What is to be said of any rule whose constants are right.</summary>
    public const string Caution = "That the constants are right says nothing about an integrand that is no such polynomial; compare with a rule of more points "
        + "before a result matters.";

    private const string EstimateCaution = " An estimate of the error is no bound of it.";

    /// <summary>What each member is.</summary>
    public static IReadOnlyDictionary<string, string> Members { get; } = new Dictionary<string, string>
    {
        ["PointCount"] = "The number of nodes.",
        ["DegreeOfExactness"] = "The largest degree up to which every polynomial is integrated exactly, apart from rounding.",
        ["Nodes"] = "The nodes, ascending.",
        ["Weights"] = "The weights, in the order of the nodes.",
        ["NodeScale"] = "What a node is multiplied by besides the standard deviation.",
        ["ReciprocalTotalWeight"] = "One over the sum of all weights: the factor of the sum in an expectation.",
        ["NormalizingIntegral"] = "The integral of the exponential itself, by which the density is normalised.",
        ["CompanionNodes"] = "The nodes of the companion, ascending.",
        ["CompanionWeights"] = "The weights of the companion, in the order of its nodes.",
        ["ErrorFactor"] = "What the distance of both sums is multiplied by to estimate the error.",
    };

    /// <summary>The caution that belongs to a rule.</summary>
    public static string CautionOf(bool hasErrorEstimate) => hasErrorEstimate ? Caution + EstimateCaution : Caution;

    /// <summary>What an anti-Gaussian companion is (Laurie, Anti-Gaussian quadrature formulas (1996)); nothing without one.</summary>
    public static IEnumerable<string> AntiGaussian(bool hasErrorEstimate, int degree) => !hasErrorEstimate ? []
        :
        [
            $"The companion is the anti-Gaussian rule with n + 1 points: up to degree {Explanation.Text(degree + 2)} its error is the opposite of the rule's. "
                + "The error is estimated by ½ |Σ companion − Σ rule|.",
        ];

    /// <summary>The source of that, to be added to others.</summary>
    public static string AntiGaussianSource(bool hasErrorEstimate) =>
        hasErrorEstimate ? "; Laurie, Anti-Gaussian quadrature formulas (1996)" : "";
}
