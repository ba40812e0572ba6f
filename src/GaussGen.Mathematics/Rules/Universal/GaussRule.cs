using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// The Gauss rule of a weight function with n nodes, enclosed at whatever precision is asked for; all nodes and weights share the work.
/// </summary>
internal sealed class GaussRule
{
    /// <summary>The largest working precision in bits; a rounding that is not decided there is given up.</summary>
    internal const int MaximumPrecision = 1 << 13;

    private readonly SharedByPrecision<GaussEnclosures> _enclosures;

    /// <summary>The rule of a recurrence, which need not be a weight function's own.</summary>
    /// <param name="weight">The weight function, for its coordinate.</param>
    /// <param name="recurrences">The recurrence by its accuracy; exactly n coefficients aₖ.</param>
    /// <param name="exact">The same recurrence, where its coefficients are rational; else <c>null</c>.</param>
    /// <param name="points">The number n of nodes.</param>
    internal GaussRule(WeightFunction weight, SharedByPrecision<Recurrence> recurrences, RationalRecurrence? exact, int points)
    {
        Weight = weight;
        Points = points;
        Exact = exact;
        Recurrences = recurrences;
        _enclosures = new SharedByPrecision<GaussEnclosures>((precision, cancellation) => precision > MaximumPrecision
            ? throw new RuleConstructionException(
                RuleFailure.RoundingNotDecided,
                "A node or weight is as good as half-way between two representable numbers at "
                + MaximumPrecision.ToString(CultureInfo.InvariantCulture) + " bits; change a parameter by a unit in its last place.")
            : GaussConstruction.Construct(recurrences.At, weight.IsGraded, precision, cancellation));
    }

    /// <summary>The weight function.</summary>
    internal WeightFunction Weight { get; }

    /// <summary>The number n of nodes.</summary>
    internal int Points { get; }

    /// <summary>The recurrence exactly, where it is rational.</summary>
    internal RationalRecurrence? Exact { get; }

    /// <summary>The recurrence by its accuracy in bits.</summary>
    internal SharedByPrecision<Recurrence> Recurrences { get; }

    /// <summary>The rule of a weight function.</summary>
    internal static GaussRule Of(WeightFunction weight, int points) => new(
        weight,
        new SharedByPrecision<Recurrence>((accuracy, cancellation) => weight.Recurrence(points, accuracy, cancellation)),
        weight.ExactRecurrence(points),
        points);

    /// <summary>All nodes, in the weight function's coordinate, and weights.</summary>
    internal GaussEnclosures At(int precision, CancellationToken cancellation) => _enclosures.At(precision, cancellation);

    /// <summary>The nodes on the line, ascending.</summary>
    internal RealNumber[] Nodes()
    {
        var nodes = new RealNumber[Points];
        for (int i = 0; i < Points; i++)
        {
            nodes[i] = new Node(this, i);
        }

        return nodes;
    }

    /// <summary>The weights, in the order of the nodes.</summary>
    internal RealNumber[] Weights()
    {
        var weights = new RealNumber[Points];
        for (int i = 0; i < Points; i++)
        {
            weights[i] = new ChristoffelNumber(this, i);
        }

        return weights;
    }

    private sealed class Node(GaussRule rule, int index) : RealNumber
    {
        private ExactValues? _exact;

        public override Rational? ExactValue => (_exact ??= ExactValues.Of(rule, index)).Node;

        public override Ball Enclose(int precision, CancellationToken cancellation) =>
            rule.Weight.ToLine(rule.At(precision, cancellation).Nodes[index], precision, cancellation);
    }

    private sealed class ChristoffelNumber(GaussRule rule, int index) : RealNumber
    {
        private ExactValues? _exact;

        public override Rational? ExactValue => (_exact ??= ExactValues.Of(rule, index)).Weight;

        public override Ball Enclose(int precision, CancellationToken cancellation) => rule.At(precision, cancellation).Weights[index];
    }
}
