using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>What the nodes and weights of one rule have in common. Thread-safe.</summary>
/// <param name="points">n.</param>
/// <param name="convention">The weight function.</param>
/// <param name="roots">√k at index k, from 0 to n.</param>
internal sealed class HermiteRule(int points, HermiteConvention convention, double[] roots)
{
    private Boxed? _factorial;

    internal int Points { get; } = points;

    internal HermiteConvention Convention { get; } = convention;

    internal double[] Roots { get; } = roots;

    /// <summary>(n−1)!, computed when it is first asked for.</summary>
    internal BigInteger Factorial => (_factorial ??= new Boxed(Product(Points - 1))).Value;

    private static BigInteger Product(int last)
    {
        BigInteger product = BigInteger.One;
        for (int k = 2; k <= last; k++)
        {
            product *= k;
        }

        return product;
    }

    private sealed record Boxed(BigInteger Value);
}

/// <summary>A positive zero of Heₙ with its weight, both in the rule's convention. Thread-safe.</summary>
/// <param name="rule">The rule.</param>
/// <param name="point">X, where the zero was proven to lie beside x = X/2²⁵.</param>
/// <param name="node">The node in fixed-size integers, if it is narrow enough.</param>
/// <param name="weight">The weight in fixed-size integers, if it is narrow enough.</param>
internal sealed class HermiteZero(HermiteRule rule, uint point, FixedBall? node, FixedBall? weight)
{
    // The last enclosure, as node and weight are asked for in turn at the same precision.
    private Enclosure? _last;

    internal FixedBall? Node { get; } = node;

    internal FixedBall? Weight { get; } = weight;

    /// <summary>A ball around the node, of the relative radius 2^−precision.</summary>
    internal Ball EncloseNode(int precision, CancellationToken cancellation) => Enclose(precision, cancellation).Node;

    /// <summary>A ball around the weight, of the relative radius 2^−precision.</summary>
    internal Ball EncloseWeight(int precision, CancellationToken cancellation) => Enclose(precision, cancellation).Weight;

    private Enclosure Enclose(int precision, CancellationToken cancellation)
    {
        Enclosure? last = _last;
        if (last is null || last.Precision != precision)
        {
            _last = last = Compute(precision, cancellation);
        }

        return last;
    }

    private Enclosure Compute(int precision, CancellationToken cancellation)
    {
        for (int asked = precision + 8; ; asked += 64)
        {
            (Ball node, Ball weight) = HermiteBigEnclosure.Enclose(rule, point, asked, cancellation);
            if (rule.Convention == HermiteConvention.Physicist)
            {
                node = Ball.Divide(node, Constants.Sqrt2(asked + 8), asked + 8);
                weight = Ball.Multiply(weight, Constants.SqrtPi(asked + 8, cancellation), asked + 8);
            }

            if (node.RelativeAccuracyBits > precision && weight.RelativeAccuracyBits > precision)
            {
                return new Enclosure(precision, Widen(node, precision), Widen(weight, precision));
            }
        }
    }

    /// <summary>The ball with the radius 2^−precision of its leading bit, so that its width does not depend on how it was found.</summary>
    private static Ball Widen(Ball ball, int precision)
    {
        int top = checked(ball.Center.BitLength - 1 + ball.Exponent);
        return new Ball(ball.Midpoint, ball.Exponent, Bound.PowerOfTwo(top - precision));
    }

    private sealed record Enclosure(int Precision, Ball Node, Ball Weight);
}
