using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>What documentation says of a family: phrases without markup, and the sources of its moments or recurrence.</summary>
/// <param name="Title">See <see cref="RuleDescription.Title"/>.</param>
/// <param name="Weight">See <see cref="RuleDescription.Weight"/>.</param>
/// <param name="Sources">Sources beside those of the pipeline.</param>
internal sealed record FamilyWords(string Title, string Weight, string Sources)
{
    /// <summary>See <see cref="RuleDescription.Variable"/>; <c>null</c> for what follows from the weight.</summary>
    internal string? Variable { get; init; }
}

/// <summary>From a weight function to a rule's table: the one pipeline of all families without a fast road of their own.</summary>
internal static class UniversalRule
{
    private const string Sources =
        "Golub and Welsch 1969; Gautschi, Orthogonal Polynomials (2004), 1.3 and 2.1.7; Parlett, The Symmetric Eigenvalue Problem (1980), 4.5 and 10.3";

    /// <summary>The Gauss rule of a weight function.</summary>
    /// <param name="weight">The weight function.</param>
    /// <param name="points">The number of nodes, at least 1.</param>
    /// <param name="words">The words for the documentation.</param>
    /// <param name="hasErrorEstimate">Whether the rule is to have its anti-Gaussian companion.</param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    /// <exception cref="RuleConstructionException">The rule or its companion cannot be constructed; the exception says why.</exception>
    internal static RuleTable Construct(
        WeightFunction weight, int points, FamilyWords words, bool hasErrorEstimate, CancellationToken cancellation)
    {
        const int Precision = Formats.Rounding.FirstPrecision;
        (GaussRule rule, GaussRule? companion) = hasErrorEstimate
            ? AntiGaussian.WithRule(weight, points)
            : (GaussRule.Of(weight, points), (GaussRule?)null);
        GaussEnclosures enclosures = rule.At(Precision, cancellation);
        RequireRepresentable(
            enclosures, "A weight of the rule is below 2^-1022, the smallest normal binary64 number; ask for fewer points.");
        Ball[] moments = weight.Moments((2 * points) + (hasErrorEstimate ? 2 : 0), Precision, cancellation);
        MomentResiduals residuals = MomentResiduals.Of(
            enclosures.ForMomentsOf(weight), moments, 2 * points, weight.IsEven, Precision, cancellation);
        return new RuleTable(
            Describe(points, residuals, words),
            rule.Nodes(),
            rule.Weights(),
            (2 * points) - 1,
            weight.IsSymmetricOnLine,
            LocationScale: null)
        {
            Companion = companion is null ? null : AntiGaussian.Describe(companion, moments, residuals, cancellation),
        };
    }

    /// <summary>Throws where a weight is surely below the smallest normal binary64 number.</summary>
    internal static void RequireRepresentable(GaussEnclosures enclosures, string message)
    {
        var least = new Dyadic(1, -1022);
        foreach (Ball weight in enclosures.Weights)
        {
            if (weight.Upper < least)
            {
                throw new RuleConstructionException(RuleFailure.WeightNotRepresentable, message);
            }
        }
    }

    private static RuleDescription Describe(int points, MomentResiduals residuals, FamilyWords words)
    {
        string count = points.ToString(CultureInfo.InvariantCulture);
        var description = new RuleDescription(
            words.Title,
            words.Weight,
            "the zeros of the orthogonal polynomial of degree " + count + " for this weight",
            string.Format(
                CultureInfo.InvariantCulture,
                "{0} {1}; residuals of the moments of order 0 to {2} at most 2^-{3} of their size",
                count,
                points == 1 ? "root interval" : "disjoint root intervals",
                (2 * points) - 1,
                System.Math.Min(residuals.Bits, Formats.Rounding.FirstPrecision)),
            words.Sources + "; " + Sources);
        return words.Variable is null ? description : description with { Variable = words.Variable };
    }
}
