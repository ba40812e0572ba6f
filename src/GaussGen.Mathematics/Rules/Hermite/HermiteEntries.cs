using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>A node beside the centre.</summary>
internal sealed class HermiteNode(HermiteZero zero, bool isNegative) : RealNumber
{
    public override FixedBall? FirstEnclosure => isNegative ? zero.Node?.Negate() : zero.Node;

    public override Ball Enclose(int precision, CancellationToken cancellation)
    {
        Ball node = zero.EncloseNode(precision, cancellation);
        return isNegative ? Ball.Negate(node) : node;
    }
}

/// <summary>The weight of a node and of its mirror image.</summary>
internal sealed class HermiteWeight(HermiteZero zero) : RealNumber
{
    public override FixedBall? FirstEnclosure => zero.Weight;

    public override Ball Enclose(int precision, CancellationToken cancellation) => zero.EncloseWeight(precision, cancellation);
}

/// <summary>
/// The weight at 0 for odd n: (n−1)!/(n·Heₙ₋₁(0)²) = (n−1)!!/n!!, as Heₙ₋₁(0) = ±(n−2)!!; times √π in the physicists' convention.
/// </summary>
internal sealed class HermiteCentreWeight(int points, HermiteConvention convention) : RealNumber
{
    private Rational? _ratio;

    public override Rational? ExactValue => convention == HermiteConvention.Probabilist ? Ratio : null;

    public override FixedBall? FirstEnclosure
    {
        get
        {
            FixedBall numerator = FixedBall.FromInteger(1), denominator = numerator;
            for (int k = 2; k < points; k += 2)
            {
                numerator = FixedBall.Multiply(in numerator, (uint)k);
                denominator = FixedBall.Multiply(in denominator, (uint)k + 1);
            }

            FixedBall weight = FixedBall.Divide(in numerator, in denominator);
            if (convention == HermiteConvention.Physicist)
            {
                weight = FixedBall.Multiply(in weight, FixedConstants.SqrtPi);
            }

            return weight.WidenTo(HermiteEnclosure.WeightRadius);
        }
    }

    private Rational Ratio => _ratio ??= Exactly(points);

    public override Ball Enclose(int precision, CancellationToken cancellation)
    {
        Ball ratio = Ball.FromRational(Ratio, precision + 8);
        return convention == HermiteConvention.Probabilist
            ? ratio
            : Ball.Multiply(ratio, Constants.SqrtPi(precision + 8, cancellation), precision + 8);
    }

    private static Rational Exactly(int points)
    {
        BigInteger numerator = BigInteger.One, denominator = BigInteger.One;
        for (int k = 2; k < points; k += 2)
        {
            numerator *= k;
            denominator *= k + 1;
        }

        return new Rational(numerator, denominator);
    }
}
