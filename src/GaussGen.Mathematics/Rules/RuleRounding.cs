using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Rules;

/// <summary>Carries a rule to a number format.</summary>
public static class RuleRounding
{
    /// <summary>
    /// Rounds every node and weight to the nearest representable value, with proof. Of a symmetric rule one half is rounded and
    /// the other is its mirror image. A weight that rounds to zero is +0; its node stays unless it is to be dropped.
    /// </summary>
    /// <param name="table">The rule.</param>
    /// <param name="format">The number format.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <param name="cancellation">Looked at before each entry, and passed on.</param>
    /// <exception cref="RuleConstructionException">A node is too large for the format, or an entry's rounding stays open.</exception>
    /// <exception cref="InvalidOperationException">No enclosure decides an entry; see <see cref="Rounding.Nearest"/>.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedRule Round(
        RuleTable table, BinaryFormat format, bool dropZeroWeights, CancellationToken cancellation)
    {
        RoundedValue[] weights = RoundAll(table.Weights, table.IsSymmetric, negated: false, format, cancellation);
        RoundedValue[] nodes = RoundAll(table.Nodes, table.IsSymmetric, negated: true, format, cancellation);
        RequireFinite(nodes, format, "the rule", "; ask for fewer points, or for a weight of a smaller extent.");
        int zeroWeights = CountZeros(nodes, weights, format, out RoundedValue? first);
        if (dropZeroWeights && zeroWeights > 0)
        {
            (nodes, weights) = DropZeros(nodes, weights, format);
        }

        LocationScale? family = table.LocationScale;
        return new RoundedRule(
            table,
            format,
            nodes,
            weights,
            zeroWeights,
            first,
            family is null ? null : Rounding.Nearest(family.NodeScale, format, cancellation),
            family is null ? null : Rounding.Nearest(Reciprocal(family.TotalWeight), format, cancellation))
        {
            Companion = table.Companion is { } companion ? Round(companion, format, dropZeroWeights, cancellation) : null,
            Constants = [.. table.Constants.Select(constant => Rounding.Nearest(constant.Value, format, cancellation))],
        };
    }

    private static RoundedCompanion Round(
        CompanionRule table, BinaryFormat format, bool dropZeroWeights, CancellationToken cancellation)
    {
        RoundedValue[] weights = RoundAll(table.Weights, table.IsSymmetric, negated: false, format, cancellation);
        RoundedValue[] nodes = RoundAll(table.Nodes, table.IsSymmetric, negated: true, format, cancellation);
        RequireFinite(
            nodes, format, "the error estimate's companion rule", "; ask for fewer points, for a weight of a smaller extent, or for no error estimate.");
        if (dropZeroWeights)
        {
            (nodes, weights) = DropZeros(nodes, weights, format);
        }

        return new RoundedCompanion(table, nodes, weights, Rounding.Nearest(RealNumber.Exact(table.Factor), format, cancellation));
    }

    private static void RequireFinite(RoundedValue[] nodes, BinaryFormat format, string rule, string advice)
    {
        if (Array.Exists(nodes, node => format.IsInfinity(node.Bits)))
        {
            throw new RuleConstructionException(
                RuleFailure.NodeNotRepresentable, "A node of " + rule + " is too large for " + format.Name + advice);
        }
    }

    private static RoundedValue[] RoundAll(
        IReadOnlyList<RealNumber> values, bool isSymmetric, bool negated, BinaryFormat format, CancellationToken cancellation)
    {
        int count = values.Count;
        var rounded = new RoundedValue[count];
        for (int i = isSymmetric ? count / 2 : 0; i < count; i++)
        {
            rounded[i] = Rounding.Nearest(values[i], format, cancellation);
        }

        for (int i = 0; isSymmetric && i < count / 2; i++)
        {
            RoundedValue mirrored = rounded[count - 1 - i];
            rounded[i] = negated ? mirrored with { Bits = format.Negate(mirrored.Bits) } : mirrored;
        }

        return rounded;
    }

    private static int CountZeros(
        RoundedValue[] nodes, RoundedValue[] weights, BinaryFormat format, out RoundedValue? first)
    {
        int zeros = 0;
        first = null;
        for (int i = 0; i < weights.Length; i++)
        {
            if (!format.IsZero(weights[i].Bits))
            {
                continue;
            }

            zeros++;
            ulong magnitude = format.Abs(nodes[i].Bits);
            if (first is null || magnitude < first.Value.Bits)
            {
                first = nodes[i] with { Bits = magnitude };
            }
        }

        return zeros;
    }

    private static (RoundedValue[] Nodes, RoundedValue[] Weights) DropZeros(
        RoundedValue[] nodes, RoundedValue[] weights, BinaryFormat format)
    {
        var keptNodes = new List<RoundedValue>(nodes.Length);
        var keptWeights = new List<RoundedValue>(weights.Length);
        for (int i = 0; i < weights.Length; i++)
        {
            if (!format.IsZero(weights[i].Bits))
            {
                keptNodes.Add(nodes[i]);
                keptWeights.Add(weights[i]);
            }
        }

        return (keptNodes.ToArray(), keptWeights.ToArray());
    }

    private static RealNumber Reciprocal(RealNumber value) => value.ExactValue is { } exact
        ? RealNumber.Exact(Rational.One / exact)
        : RealNumber.FromEnclosures((precision, cancellation) =>
            Ball.Divide(Ball.FromInteger(1), value.Enclose(precision, cancellation), precision));
}
