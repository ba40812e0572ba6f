using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// The rational ones among nodes and weights. An enclosure never tells that a number lies exactly half-way between two
/// representable ones, so such numbers must be recognised: those that symmetry makes rational always, others of a rational recurrence
/// where an enclosure leaves a rounding open.
/// </summary>
/// <param name="node">The node on the line, where it is rational.</param>
/// <param name="weight">The weight, where it is rational.</param>
internal sealed class ExactValues(Rational? node, Rational? weight)
{
    // Enough to tell a quotient of two 100-bit integers from other numbers.
    private const int RecognitionPrecision = 512;
    private const int LargestDenominatorBits = 160;

    internal Rational? Node => node;

    internal Rational? Weight => weight;

    /// <summary>What is rational of the node and weight with an index.</summary>
    internal static ExactValues Of(GaussRule rule, int index)
    {
        int n = rule.Points;
        if (n == 1)
        {
            Rational? mean = rule.Weight.IsEven ? Rational.Zero : rule.Exact?.Diagonal(0);
            return new ExactValues(
                mean is null ? rule.Weight.ExactNode(n, index) : rule.Weight.ToLineExactly(mean.Value), Rational.One);
        }

        if (rule.Weight.IsEven && (2 * index) + 1 == n)
        {
            return new ExactValues(
                rule.Weight.ToLineExactly(Rational.Zero), rule.Exact is null ? null : Values(rule.Exact, Rational.Zero).Weight);
        }

        Rational? half = rule.Weight.IsEven && n == 2 ? new Rational(1, 2) : null;
        if (rule.Exact is null || IsDecided(rule, index))
        {
            return new ExactValues(rule.Weight.ExactNode(n, index), half);
        }

        return Recognise(rule, rule.Exact, index) ?? new ExactValues(null, half);
    }

    private static bool IsDecided(GaussRule rule, int index)
    {
        GaussEnclosures enclosures = rule.At(Rounding.FirstPrecision, CancellationToken.None);
        Ball node = rule.Weight.ToLine(enclosures.Nodes[index], Rounding.FirstPrecision, CancellationToken.None);
        return Decides(BinaryFormat.Binary16, node, enclosures.Weights[index])
            && Decides(BinaryFormat.Binary32, node, enclosures.Weights[index])
            && Decides(BinaryFormat.Binary64, node, enclosures.Weights[index]);
    }

    private static bool Decides(BinaryFormat format, Ball node, Ball weight) =>
        format.TryRound(node, out _, out _) && format.TryRound(weight, out _, out _);

    /// <summary>
    /// The simplest rational number in the enclosure of a node, or of its square for an even weight, proven to be the node if πₙ
    /// vanishes there: the enclosure holds no other zero of πₙ.
    /// </summary>
    private static ExactValues? Recognise(GaussRule rule, RationalRecurrence exact, int index)
    {
        Ball node = rule.At(RecognitionPrecision, CancellationToken.None).Nodes[index];
        Ball argument = exact.IsEven ? Ball.Square(node, RecognitionPrecision) : node;
        Rational candidate = SimplestBetween(argument.Lower.ToRational(), argument.Upper.ToRational());
        if (Magnitude.BitLength(candidate.Denominator) > LargestDenominatorBits)
        {
            return null;
        }

        (Rational value, Rational weight) = Values(exact, candidate);
        if (!value.IsZero)
        {
            return null;
        }

        Rational? coordinate = exact.IsEven ? Root(candidate) : candidate;
        coordinate = coordinate is { } root && node.Midpoint.Sign < 0 && exact.IsEven ? -root : coordinate;
        return new ExactValues(coordinate is null ? null : rule.Weight.ToLineExactly(coordinate.Value), weight);
    }

    /// <summary>
    /// πₙ and 1/Σ πₖ²/hₖ over k &lt; n at a rational point y; for an even weight at the point with y² = argument, and πₙ without its
    /// factor y for odd n.
    /// </summary>
    private static (Rational Value, Rational Weight) Values(RationalRecurrence recurrence, Rational argument)
    {
        Rational before = Rational.Zero, current = Rational.One, norm = Rational.One, sum = Rational.Zero;
        for (int k = 0; k < recurrence.Count; k++)
        {
            bool hasFactor = recurrence.IsEven && (k & 1) != 0;
            norm = k == 0 ? norm : norm * recurrence.Square(k);
            sum += current * current * (hasFactor ? argument : Rational.One) / norm;
            Rational factor = !recurrence.IsEven ? argument - recurrence.Diagonal(k) : hasFactor ? argument : Rational.One;
            Rational next = (factor * current) - (k == 0 ? Rational.Zero : recurrence.Square(k) * before);
            before = current;
            current = next;
        }

        return (current, Rational.One / sum);
    }

    /// <summary>The rational number with the smallest denominator between two, by their common continued fraction.</summary>
    private static Rational SimplestBetween(Rational low, Rational high)
    {
        if (low.Sign <= 0 && high.Sign >= 0)
        {
            return Rational.Zero;
        }

        if (high.Sign < 0)
        {
            return -SimplestBetween(-high, -low);
        }

        BigInteger floor = BigInteger.Divide(low.Numerator, low.Denominator);
        if (low.IsInteger)
        {
            return floor;
        }

        return floor < BigInteger.Divide(high.Numerator, high.Denominator)
            ? floor + 1
            : floor + (Rational.One / SimplestBetween(Rational.One / (high - floor), Rational.One / (low - floor)));
    }

    private static Rational? Root(Rational value)
    {
        BigInteger numerator = IntegerRoot.Floor(value.Numerator, out BigInteger remainder);
        BigInteger denominator = IntegerRoot.Floor(value.Denominator, out BigInteger other);
        return remainder.IsZero && other.IsZero ? new Rational(numerator, denominator) : null;
    }
}
