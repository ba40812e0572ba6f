using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// The anti-Gaussian companion of a Gauss–Hermite rule: by the pipeline for any weight, whose polynomials need not be Hermite's.
/// </summary>
internal static class HermiteCompanion
{
    /// <summary>The companion of a rule, in the rule's convention.</summary>
    /// <param name="rule">The rule.</param>
    /// <param name="convention">Its convention.</param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    internal static CompanionRule Construct(RuleTable rule, HermiteConvention convention, CancellationToken cancellation)
    {
        const int Precision = Formats.Rounding.FirstPrecision;
        bool isProbabilist = convention == HermiteConvention.Probabilist;
        var weight = new NormalWeight(isProbabilist ? 1 : new Rational(1, 2));
        int points = rule.Nodes.Count;
        Ball[] nodes = EncloseAll(rule.Nodes, cancellation), weights = EncloseAll(rule.Weights, cancellation);
        if (!isProbabilist)
        {
            Ball root = Constants.SqrtPi(Precision, cancellation);
            weights = Array.ConvertAll(weights, value => Ball.Divide(value, root, Precision));
        }

        Ball[] moments = weight.Moments((2 * points) + 2, Precision, cancellation);
        var residuals = MomentResiduals.Of(
            new GaussEnclosures(nodes, weights), moments, 2 * points, isEven: true, Precision, cancellation);
        CompanionRule companion = AntiGaussian.Describe(AntiGaussian.Of(weight, points), moments, residuals, cancellation);
        return isProbabilist ? companion : companion with { Weights = [.. companion.Weights.Select(TimesSqrtPi)] };
    }

    /// <summary>The enclosures that the construction has at hand, or else newly made ones.</summary>
    private static Ball[] EncloseAll(IReadOnlyList<RealNumber> values, CancellationToken cancellation) =>
        [.. values.Select(value => value.FirstEnclosure?.ToBall() ?? value.Enclose(Formats.Rounding.FirstPrecision, cancellation))];

    private static RealNumber TimesSqrtPi(RealNumber weight) => RealNumber.FromEnclosures((precision, cancellation) => Ball.Multiply(
        weight.Enclose(precision, cancellation), Constants.SqrtPi(precision + 8, cancellation), precision + 8));
}
