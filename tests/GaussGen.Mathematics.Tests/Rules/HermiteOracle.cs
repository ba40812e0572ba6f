using System.Globalization;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>Independent mathematics for the tests of the Gauss–Hermite rules: exact integers, and balls by other formulas.</summary>
internal static class HermiteOracle
{
    /// <summary>Small rules, every one; and a few of the sizes at which something else may go wrong.</summary>
    internal static readonly int[] Sizes = Enumerable.Range(1, 200).Concat([256, 377, 500, 777, 1000]).ToArray();

    internal static readonly HermiteConvention[] Conventions = [HermiteConvention.Probabilist, HermiteConvention.Physicist];

    internal static readonly BinaryFormat[] Formats = [BinaryFormat.Binary64, BinaryFormat.Binary32];

    internal static RoundedRule Round(int points, HermiteConvention convention, BinaryFormat format) =>
        RuleRounding.Round(GaussHermite.Construct(points, convention, CancellationToken.None), format, false, CancellationToken.None);

    /// <summary>
    /// The sign at a positive dyadic number of the Hermite polynomial of the convention, in exact integers without any error
    /// analysis: He_{k+2} = (t − (2k+1)) He_k − k(k−1) He_{k−2} with t = x², where t = 2y² for Hₙ(y) = 2^{n/2} Heₙ(√2 y).
    /// </summary>
    internal static int Sign(int points, HermiteConvention convention, Dyadic at)
    {
        Dyadic t = at * at;
        if (convention == HermiteConvention.Physicist)
        {
            t = t.ScaleByPowerOfTwo(1);
        }

        // Everything times powers of 2^e, so that all numbers are integers.
        int e = System.Math.Max(0, -t.Exponent);
        BigInteger square = t.Mantissa << (t.Exponent + e);
        BigInteger one = BigInteger.One << e;
        int parity = points & 1;
        BigInteger before = BigInteger.One, current = square - (((2 * parity) + 1) * one);
        if (points < 2)
        {
            return 1;
        }

        for (int k = 2 + parity; k + 2 <= points; k += 2)
        {
            BigInteger next = ((square - (((2 * k) + 1) * one)) * current) - (((BigInteger)((long)k * (k - 1)) * before) << (2 * e));
            before = current;
            current = next;
        }

        return current.Sign;
    }

    /// <summary>
    /// The weight for the normal density of a node given by a ball: 1/Σ Heₖ(x)²/k! (k below n), the Christoffel number as in
    /// Szegő 3.4.8, by plain ball arithmetic; and whether Heₙ changes sign across the ball, so that the ball does contain a node.
    /// </summary>
    internal static (Ball Weight, bool IsProven) Weight(int points, Ball x, int precision)
    {
        Ball before = default, current = Ball.FromInteger(1), sum = Ball.FromInteger(1);
        BigInteger factorial = BigInteger.One;
        for (int k = 1; k < points; k++)
        {
            (before, current) = (current, Next(x, before, current, k - 1, precision));
            // k! times the sum up to k.
            sum = Ball.Add(Ball.Multiply(sum, Ball.FromInteger(k), precision), Ball.Square(current, precision), precision);
            factorial *= k;
        }

        Trilean lower = IsPositive(points, Ball.FromDyadic(x.Lower), precision);
        Trilean upper = IsPositive(points, Ball.FromDyadic(x.Upper), precision);
        return (
            Ball.Divide(Ball.FromInteger(factorial), sum, precision),
            lower != Trilean.Unknown && upper != Trilean.Unknown && lower != upper);
    }

    /// <summary>A decimal number such as "1.5e-7" as a rational one, exactly.</summary>
    internal static Rational Parse(string text)
    {
        int exponentAt = text.IndexOf('e');
        string digits = exponentAt < 0 ? text : text[..exponentAt];
        int exponent = exponentAt < 0 ? 0 : int.Parse(text[(exponentAt + 1)..], CultureInfo.InvariantCulture);
        int point = digits.IndexOf('.');
        exponent -= point < 0 ? 0 : digits.Length - 1 - point;
        var value = new Rational(BigInteger.Parse(digits.Replace(".", string.Empty), CultureInfo.InvariantCulture), 1);
        return value * Rational.Pow(10, exponent);
    }

    internal static double ToDouble(ulong bits) => System.BitConverter.UInt64BitsToDouble(bits);

    private static Trilean IsPositive(int points, Ball x, int precision)
    {
        Ball before = default, current = Ball.FromInteger(1);
        for (int k = 0; k < points; k++)
        {
            (before, current) = (current, Next(x, before, current, k, precision));
        }

        return current.IsPositive;
    }

    private static Ball Next(Ball x, Ball before, Ball current, int k, int precision) => Ball.Subtract(
        Ball.Multiply(x, current, precision), Ball.Multiply(Ball.FromInteger(k), before, precision), precision);
}
