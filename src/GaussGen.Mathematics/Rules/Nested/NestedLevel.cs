using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>One level of the nested rules, and the way to the next: README.md.</summary>
internal sealed class NestedLevel
{
    private static readonly RealNumber Centre = RealNumber.Exact(0);

    // F, whose zeros are the squares of the nodes beside 0.
    private readonly IntegerPolynomial _nodePolynomial;
    private readonly IntegerPolynomial _derivative;
    private readonly IntegerPolynomial _numerator;

    private NestedLevel(IntegerPolynomial nodePolynomial, NestedNode[] pairs)
    {
        _nodePolynomial = nodePolynomial;
        _derivative = pairs.Length == 0 ? nodePolynomial : nodePolynomial.Derivative();
        _numerator = Numerator(nodePolynomial);
        Pairs = pairs;
        Nodes = [.. Enumerable.Reverse(pairs).Select(pair => pair.Negative), Centre, .. pairs.Select(pair => pair.Positive)];
        RealNumber[] weights = [.. pairs.Select(Weight)];
        Weights = [.. Enumerable.Reverse(weights), RealNumber.Exact(CentreWeight()), .. weights];
    }

    /// <summary>The nodes beside 0, by t ascending.</summary>
    internal NestedNode[] Pairs { get; }

    /// <summary>The nodes, ascending.</summary>
    internal RealNumber[] Nodes { get; }

    /// <summary>The weights, in the order of the nodes; some of them are below zero.</summary>
    internal RealNumber[] Weights { get; }

    /// <summary>The rule with the node 0 alone.</summary>
    internal static NestedLevel First() => new(new IntegerPolynomial(BigInteger.One), []);

    /// <summary>The rule with so many more pairs of nodes.</summary>
    /// <exception cref="InvalidOperationException">There is no such rule.</exception>
    internal NestedLevel Extend(int pairs, CancellationToken cancellation)
    {
        var extension = NormalExtension.Of(_nodePolynomial, pairs, cancellation);
        IEnumerable<NestedNode> added = PositiveZero.AllOf(extension, cancellation).Select(zero => new NestedNode(zero));
        return new NestedLevel(_nodePolynomial.Times(extension), Order(Pairs.Concat(added), cancellation));
    }

    /// <summary>The pairs by t, ascending; the enclosures show that they are all different.</summary>
    private static NestedNode[] Order(IEnumerable<NestedNode> pairs, CancellationToken cancellation)
    {
        // At the precision that is wanted again later.
        const int Precision = Formats.Rounding.FirstPrecision + NestedNode.Reserve;
        (NestedNode Pair, Ball Enclosure)[] ordered =
            [.. pairs.Select(pair => (Pair: pair, Enclosure: pair.Square.Enclose(Precision, cancellation))).OrderBy(p => p.Enclosure.Center)];
        for (int i = 1; i < ordered.Length; i++)
        {
            if (Ball.IsLess(ordered[i - 1].Enclosure, ordered[i].Enclosure) != Trilean.True)
            {
                throw new InvalidOperationException("Two nodes of a nested rule cannot be told apart.");
            }
        }

        return Array.ConvertAll(ordered, p => p.Pair);
    }

    /// <summary>∫ F φ / F(0) for the node 0.</summary>
    private Rational CentreWeight()
    {
        BigInteger integral = BigInteger.Zero;
        for (int r = 0; r <= _nodePolynomial.Degree; r++)
        {
            integral += _nodePolynomial[r] * NormalExtension.Moment(r);
        }

        return new Rational(integral, _nodePolynomial[0]);
    }

    private RealNumber Weight(NestedNode pair) => pair.Square.ExactValue is { } exact
        ? RealNumber.Exact(_numerator.At(exact) / (2 * exact * _derivative.At(exact)))
        : new RememberedNumber(null, (precision, cancellation) => Weight(pair, precision, cancellation));

    /// <summary>N(t) / (2 t F′(t)).</summary>
    private Ball Weight(NestedNode pair, int precision, CancellationToken cancellation)
    {
        int working = precision + NestedNode.Reserve;
        Ball t = pair.Square.Enclose(working, cancellation);
        Ball denominator = Ball.Multiply(t, _derivative.At(t, working), working).ScaleByPowerOfTwo(1);
        return Ball.Divide(_numerator.At(t, working), denominator, working);
    }

    /// <summary>
    /// N with N(tᵢ) = ∫ t F(t)/(t − tᵢ) φ: as F(t)/(t − tᵢ) = Σ fⱼ Σ tʳ tᵢ^(j−1−r) over r &lt; j, N(tᵢ) = Σ fⱼ Σ (2r+1)!! tᵢ^(j−1−r).
    /// </summary>
    private static IntegerPolynomial Numerator(IntegerPolynomial nodePolynomial)
    {
        var coefficients = new BigInteger[nodePolynomial.Degree];
        for (int r = 0; r < nodePolynomial.Degree; r++)
        {
            BigInteger moment = NormalExtension.Moment(r + 1);
            for (int j = r + 1; j <= nodePolynomial.Degree; j++)
            {
                coefficients[j - 1 - r] += nodePolynomial[j] * moment;
            }
        }

        return new IntegerPolynomial(coefficients);
    }
}
