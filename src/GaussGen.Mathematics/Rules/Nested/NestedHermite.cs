using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Hermite;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>
/// The nested rules of Genz and Keister (1996) for the standard normal density, in one variable: each level has the nodes of the one below.
/// Everything is computed from the extensions' degrees; README.md says why the enclosures hold.
/// </summary>
internal static class NestedHermite
{
    /// <summary>How many nodes each level has.</summary>
    internal static readonly int[] Points = [1, 3, 9, 19, 35];

    /// <summary>The degree up to which each level is exact.</summary>
    internal static readonly int[] Degrees = [1, 5, 15, 29, 51];

    private const string Sources =
        "Genz and Keister, Fully symmetric interpolatory rules for multiple integrals over infinite regions with Gaussian weight, "
        + "J. Comput. Appl. Math. 71 (1996) 299–309; Patterson 1968 for the extension; Bareiss 1968 for the elimination";

    private static NestedLevel[]? Known;

    /// <summary>Constructs the rule of a level. Nodes that two levels share are the same objects.</summary>
    /// <param name="level">The level, with an entry in <see cref="Points"/>.</param>
    /// <param name="hasErrorEstimate">
    /// Whether the rule has a companion: the rule of the level below, or at level 0 the anti-Gaussian rule.
    /// </param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    /// <exception cref="InvalidOperationException">A rule is not of its degree of exactness: the construction is wrong.</exception>
    internal static RuleTable Construct(int level, bool hasErrorEstimate, CancellationToken cancellation)
    {
        NestedLevel rule = At(level, cancellation);
        string count = Text(Points[level] - (level == 0 ? 0 : Points[level - 1]));
        var table = new RuleTable(
            new RuleDescription(
                "Nested Hermite rule of level " + Text(level),
                "the standard normal density",
                level == 0
                    ? "the zero of the Hermite polynomial He₁"
                    : "the nodes of level " + Text(level - 1) + " and the " + count + " zeros of the polynomial that extends them",
                Method(level, cancellation),
                Sources)
            {
                Variable = "a normal variable",
            },
            rule.Nodes,
            rule.Weights,
            Degrees[level],
            IsSymmetric: true,
            new LocationScale(RealNumber.Exact(1), RealNumber.Exact(1)));
        return hasErrorEstimate ? table with { Companion = Companion(level, table, cancellation) } : table;
    }

    /// <summary>The rule of a level, from all levels, which are constructed together.</summary>
    internal static NestedLevel At(int level, CancellationToken cancellation)
    {
        NestedLevel[]? known = Volatile.Read(ref Known);
        if (known is null)
        {
            NestedLevel[] constructed = ConstructAll(cancellation);
            // Where two threads construct, one set of objects is everybody's.
            known = Interlocked.CompareExchange(ref Known, constructed, null) ?? constructed;
        }

        return known[level];
    }

    private static NestedLevel[] ConstructAll(CancellationToken cancellation)
    {
        var levels = new NestedLevel[Points.Length];
        levels[0] = NestedLevel.First();
        for (int level = 1; level < levels.Length; level++)
        {
            levels[level] = levels[level - 1].Extend((Points[level] - Points[level - 1]) / 2, cancellation);
        }

        return levels;
    }

    private static CompanionRule Companion(int level, RuleTable table, CancellationToken cancellation)
    {
        if (level == 0)
        {
            return HermiteCompanion.Construct(table, HermiteConvention.Probabilist, cancellation);
        }

        NestedLevel below = At(level - 1, cancellation);
        return new CompanionRule(
            "nested rule of level " + Text(level - 1),
            below.Nodes,
            below.Weights,
            IsSymmetric: true,
            Rational.One,
            Method(level - 1, cancellation),
            Sources);
    }

    /// <summary>
    /// What is proven of a level, once it is: the residuals of all moments up to the degree of exactness can vanish, and the next one of
    /// even order cannot.
    /// </summary>
    private static string Method(int level, CancellationToken cancellation)
    {
        const int Precision = Formats.Rounding.FirstPrecision;
        NestedLevel rule = At(level, cancellation);
        int degree = Degrees[level];
        var enclosures = new GaussEnclosures(
            Array.ConvertAll(rule.Nodes, node => node.Enclose(Precision, cancellation)),
            Array.ConvertAll(rule.Weights, weight => weight.Enclose(Precision, cancellation)));
        Ball[] moments = new NormalWeight(Rational.One).Moments(degree + 2, Precision, cancellation);
        var residuals = MomentResiduals.Of(enclosures, moments, degree + 1, isEven: true, Precision, cancellation);
        if (residuals.Residuals[degree + 1].ContainsZero)
        {
            throw new InvalidOperationException("A nested rule seems to be of a higher degree of exactness than it is said to be.");
        }

        return string.Format(
            CultureInfo.InvariantCulture,
            "{0} {1}; residuals of the moments of order 0 to {2} at most 2^-{3} of their size, and that of order {4} not zero",
            Points[level],
            level == 0 ? "root interval" : "disjoint root intervals",
            degree,
            Math.Min(residuals.Bits, Precision),
            degree + 1);
    }

    private static string Text(int value) => value.ToString(CultureInfo.InvariantCulture);
}
