using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// A rule's polynomial with rational coefficients: what decides numbers that lie exactly half-way between two representable ones, which
/// no enclosure ever does.
/// </summary>
internal sealed class ExactRule
{
    /// <summary>The largest degree, in the rule's coordinate, that is worth the long fractions.</summary>
    public const int LargestDegree = 16;

    private readonly RuleSource _source;
    private readonly Rational[] _coefficients;
    private readonly Rational[] _moments;

    /// <summary>The rule with the given polynomial.</summary>
    /// <param name="source">Where it comes from.</param>
    /// <param name="coefficients">The coefficients in the rule's coordinate, ascending, the last one 1.</param>
    /// <param name="moments">The weight's moments up to a common factor.</param>
    public ExactRule(RuleSource source, Rational[] coefficients, Dyadic[] moments)
    {
        _source = source;
        _coefficients = coefficients;
        Rational total = moments[0].ToRational();
        _moments = System.Array.ConvertAll(moments, moment => moment.ToRational() / total);
    }

    /// <summary>The weight of the node c.</summary>
    public Rational CenterWeight
    {
        get
        {
            Rational sum = Rational.Zero;
            for (int k = 0; k < _coefficients.Length; k++)
            {
                sum += _coefficients[k] * _moments[2 * k];
            }

            return sum / _coefficients[0];
        }
    }

    /// <summary>
    /// The zero between two numbers, if it is the simplest rational number between them. The interval is known to hold one zero, so a
    /// rational number in it at which the polynomial vanishes is that zero; one that is not the simplest has a longer denominator
    /// than the interval's width tells apart, and is found once the interval is narrower.
    /// </summary>
    public Rational? ZeroIn(Dyadic low, Dyadic high)
    {
        Rational candidate = _coefficients.Length == 2
            ? -_coefficients[0]
            : Simplest(low.ToRational(), high.ToRational());
        return candidate >= low.ToRational() && candidate <= high.ToRational() && Horner(candidate).IsZero ? candidate : null;
    }

    /// <summary>The weight of the node, or of either of the two nodes, that a zero stands for.</summary>
    public Rational Weight(Rational zero)
    {
        int degree = _coefficients.Length - 1;
        int parity = _source.Moments.IsEven ? _source.Parity : 0;
        int step = _source.Moments.IsEven ? 2 : 1;
        Rational numerator = Rational.Zero, slope = Rational.Zero;
        for (int i = degree - 1; i >= 0; i--)
        {
            Rational sum = Rational.Zero;
            for (int k = i + 1; k <= degree; k++)
            {
                sum += _coefficients[k] * _moments[step * (k - 1 - i + parity)];
            }

            numerator = (numerator * zero) + sum;
            slope = (slope * zero) + ((i + 1) * _coefficients[i + 1]);
        }

        return numerator / (_source.Moments.IsEven ? 2 * zero.Pow(parity) * slope : slope);
    }

    /// <summary>The root of a rational number, where it is rational.</summary>
    public static Rational? Root(Rational value)
    {
        BigInteger numerator = IntegerRoot.Floor(value.Numerator, out BigInteger above);
        BigInteger denominator = IntegerRoot.Floor(value.Denominator, out BigInteger below);
        return above.IsZero && below.IsZero ? new Rational(numerator, denominator) : null;
    }

    private Rational Horner(Rational y)
    {
        Rational value = Rational.Zero;
        for (int k = _coefficients.Length - 1; k >= 0; k--)
        {
            value = (value * y) + _coefficients[k];
        }

        return value;
    }

    /// <summary>The rational number with the smallest denominator in a closed interval: the continued fraction that both ends share.</summary>
    private static Rational Simplest(Rational low, Rational high)
    {
        if (low.Sign <= 0 && high.Sign >= 0)
        {
            return Rational.Zero;
        }

        if (high.Sign < 0)
        {
            return -Simplest(-high, -low);
        }

        BigInteger whole = BigInteger.Divide(low.Numerator, low.Denominator);
        if (low.IsInteger)
        {
            return low;
        }

        if (Rational.FromInteger(whole + 1) <= high)
        {
            return Rational.FromInteger(whole + 1);
        }

        Rational shift = Rational.FromInteger(whole);
        return shift + (Rational.One / Simplest(Rational.One / (high - shift), Rational.One / (low - shift)));
    }
}
