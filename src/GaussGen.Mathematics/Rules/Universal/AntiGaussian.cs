using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// The anti-Gaussian companion of a Gauss rule Gₙ: the rule with n + 1 nodes whose error is the opposite of that of Gₙ for all
/// polynomials up to degree 2n + 1 (Laurie 1996). It is the Gauss rule of the recurrence a₀ … aₙ, b₁ … bₙ₋₁, 2bₙ.
/// </summary>
/// <remarks>
/// Half the difference of the two sums estimates the error of Gₙ, as their mean is exact up to degree 2n + 1. Its weights are above
/// zero always; its outermost nodes may lie outside the interval of the weight, where the integrand may not be defined.
/// </remarks>
internal static class AntiGaussian
{
    private const string Title = "anti-Gaussian rule";
    private const string Sources =
        "Laurie, Anti-Gaussian quadrature formulas, Math. Comp. 65 (1996) 739–747, section 2; Golub and Welsch 1969; Parlett, "
        + "The Symmetric Eigenvalue Problem (1980), 4.5 and 10.3";

    /// <summary>Beyond this precision a node that seems to lie at an end of the interval is taken to be outside.</summary>
    private const int LargestPrecision = 1 << 10;

    /// <summary>The companion of the Gauss rule with the given number of nodes.</summary>
    internal static GaussRule Of(WeightFunction weight, int points) => Of(
        weight,
        new SharedByPrecision<Recurrence>((accuracy, cancellation) => weight.Recurrence(points + 1, accuracy, cancellation)),
        points);

    /// <summary>The Gauss rule and its companion, which share the work on the recurrence.</summary>
    internal static (GaussRule Rule, GaussRule Companion) WithRule(WeightFunction weight, int points)
    {
        var recurrences = new SharedByPrecision<Recurrence>(
            (accuracy, cancellation) => weight.Recurrence(points + 1, accuracy, cancellation));
        var shorter = new SharedByPrecision<Recurrence>((accuracy, cancellation) => recurrences.At(accuracy, cancellation).Take(points));
        return (new GaussRule(weight, shorter, weight.ExactRecurrence(points), points), Of(weight, recurrences, points));
    }

    /// <summary>The companion, once it is shown to be one.</summary>
    /// <param name="companion">The companion, with n + 1 nodes.</param>
    /// <param name="moments">The moments of the weight function of order 0 to 2n + 1.</param>
    /// <param name="residuals">The residuals of the Gauss rule for the same orders.</param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    /// <exception cref="RuleConstructionException">
    /// A node is not surely inside the interval of the weight, or a weight is too small to be represented.
    /// </exception>
    /// <exception cref="InvalidOperationException">The errors are surely not opposite: a construction is wrong.</exception>
    internal static CompanionRule Describe(
        GaussRule companion, Ball[] moments, MomentResiduals residuals, CancellationToken cancellation)
    {
        const int Precision = Formats.Rounding.FirstPrecision;
        WeightFunction weight = companion.Weight;
        GaussEnclosures enclosures = companion.At(Precision, cancellation);
        RequireInside(companion, cancellation);
        UniversalRule.RequireRepresentable(
            enclosures, "A weight of the error estimate's companion rule is below 2^-1022, the smallest normal binary64 number; "
            + "ask for fewer points, or for no error estimate.");
        MomentResiduals own = MomentResiduals.Of(
            enclosures.ForMomentsOf(weight), moments, moments.Length - 2, weight.IsEven, Precision, cancellation);
        MomentResiduals mean = own.MeanWith(residuals, Precision);
        return new CompanionRule(
            Title,
            companion.Nodes(),
            companion.Weights(),
            weight.IsSymmetricOnLine,
            new Rational(1, 2),
            string.Format(
                CultureInfo.InvariantCulture,
                "{0} disjoint root intervals; residuals of the moments of order 0 to {1}, and of the mean of both rules to {2}, at most 2^-{3} of "
                    + "their size",
                companion.Points,
                moments.Length - 3,
                moments.Length - 1,
                Math.Min(Math.Min(own.Bits, mean.Bits), Precision)),
            Sources);
    }

    private static GaussRule Of(WeightFunction weight, SharedByPrecision<Recurrence> recurrences, int points) => new(
        weight,
        new SharedByPrecision<Recurrence>((accuracy, cancellation) => recurrences.At(accuracy, cancellation).DoubleLastSquare()),
        weight.ExactRecurrence(points + 1)?.DoubleLastSquare(),
        points + 1);

    private static void RequireInside(GaussRule companion, CancellationToken cancellation)
    {
        RealNumber? lower = companion.Weight.Lower, upper = companion.Weight.Upper;
        for (int precision = Formats.Rounding.FirstPrecision; precision <= LargestPrecision; precision *= 2)
        {
            Ball[] nodes = companion.At(precision, cancellation).Nodes;
            Trilean isAbove = lower is null ? Trilean.True : Ball.IsLess(lower.Enclose(precision, cancellation), nodes[0]);
            Trilean isBelow = upper is null ? Trilean.True : Ball.IsLess(nodes[nodes.Length - 1], upper.Enclose(precision, cancellation));
            if (isAbove == Trilean.True && isBelow == Trilean.True)
            {
                return;
            }

            if (isAbove == Trilean.False || isBelow == Trilean.False)
            {
                break;
            }
        }

        throw new RuleConstructionException(
            RuleFailure.CompanionOutsideInterval,
            "A node of the error estimate's companion rule is not inside the interval of the weight function, and beyond it an integrand need not be "
            + "defined; ask for another number of points, or for no error estimate.");
    }
}
