using System;
using System.Globalization;
using System.Text;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Hermite;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// Gauss–Hermite rules: the n nodes are the zeros of the Hermite polynomial Heₙ, proven to be all of them, and the weights are the
/// Christoffel numbers, so that polynomials up to degree 2n − 1 are integrated exactly.
/// </summary>
public static class GaussHermite
{
    /// <summary>The smallest number of nodes.</summary>
    public const int MinimumPoints = 1;

    /// <summary>The largest number of nodes.</summary>
    public const int MaximumPoints = 1000;

    private const string Sources = "NIST DLMF 3.5(v), 18.3, 18.9; Szegő, Orthogonal Polynomials (1939), 3.4 and 6.2";

    /// <summary>Constructs the rule. Every entry can be enclosed as tightly as anyone asks.</summary>
    /// <param name="points">The number n of nodes.</param>
    /// <param name="convention">The weight function.</param>
    /// <param name="cancellation">Looked at before each node.</param>
    /// <exception cref="ArgumentOutOfRangeException">
    /// The number of nodes is below <see cref="MinimumPoints"/> or above <see cref="MaximumPoints"/>.
    /// </exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RuleTable Construct(int points, HermiteConvention convention, CancellationToken cancellation)
    {
        if (points is < MinimumPoints or > MaximumPoints)
        {
            throw new ArgumentOutOfRangeException(
                nameof(points),
                points,
                string.Format(
                    CultureInfo.InvariantCulture,
                    "A Gauss–Hermite rule has from {0} to {1} nodes; choose a number in that range.",
                    MinimumPoints,
                    MaximumPoints));
        }

        return Construct(points, convention, HermiteGuess.PositiveZeros(points, cancellation), cancellation);
    }

    /// <summary>The same from given guesses of the positive zeros, ascending.</summary>
    internal static RuleTable Construct(int points, HermiteConvention convention, double[] guesses, CancellationToken cancellation)
    {
        var nodes = new RealNumber[points];
        var weights = new RealNumber[points];
        if (points == 2)
        {
            FillTwo(nodes, weights, convention);
        }
        else
        {
            HermiteZero[] zeros = HermiteZeros.Find(points, convention, guesses, cancellation);
            Fill(nodes, weights, zeros, convention);
        }

        bool isProbabilist = convention == HermiteConvention.Probabilist;
        return new RuleTable(
            Describe(points, isProbabilist),
            nodes,
            weights,
            (2 * points) - 1,
            IsSymmetric: true,
            isProbabilist ? new LocationScale(RealNumber.Exact(1), RealNumber.Exact(1)) : new LocationScale(Sqrt2(), SqrtPi()));
    }

    private static void Fill(RealNumber[] nodes, RealNumber[] weights, HermiteZero[] zeros, HermiteConvention convention)
    {
        int points = nodes.Length;
        if (points % 2 != 0)
        {
            nodes[points / 2] = RealNumber.Exact(0);
            weights[points / 2] = new HermiteCentreWeight(points, convention);
        }

        for (int i = 0; i < zeros.Length; i++)
        {
            int right = points - zeros.Length + i, left = zeros.Length - 1 - i;
            nodes[right] = new HermiteNode(zeros[i], isNegative: false);
            nodes[left] = new HermiteNode(zeros[i], isNegative: true);
            weights[left] = weights[right] = new HermiteWeight(zeros[i]);
        }
    }

    /// <summary>He₂(x) = x² − 1: the only rule with a rational node beside 0, and an enclosure never tells that a number is one.</summary>
    private static void FillTwo(RealNumber[] nodes, RealNumber[] weights, HermiteConvention convention)
    {
        bool isProbabilist = convention == HermiteConvention.Probabilist;
        nodes[0] = isProbabilist ? RealNumber.Exact(-1) : Scaled(FixedConstants.Sqrt2, Sqrt2Ball, -1, isNegative: true);
        nodes[1] = isProbabilist ? RealNumber.Exact(1) : Scaled(FixedConstants.Sqrt2, Sqrt2Ball, -1, isNegative: false);
        weights[0] = weights[1] = isProbabilist
            ? RealNumber.Exact(new Rational(1, 2))
            : Scaled(FixedConstants.SqrtPi, Constants.SqrtPi, -1, isNegative: false);
    }

    private static RealNumber Sqrt2() => Scaled(FixedConstants.Sqrt2, Sqrt2Ball, 0, isNegative: false);

    private static RealNumber SqrtPi() => Scaled(FixedConstants.SqrtPi, Constants.SqrtPi, 0, isNegative: false);

    private static Ball Sqrt2Ball(int precision, CancellationToken cancellation) => Constants.Sqrt2(precision);

    private static RealNumber Scaled(FixedBall first, Func<int, CancellationToken, Ball> enclose, int power, bool isNegative)
    {
        FixedBall scaled = first.ScaleByPowerOfTwo(power);
        return FixedConstants.ToRealNumber(
            isNegative ? scaled.Negate() : scaled,
            (precision, cancellation) =>
            {
                Ball ball = enclose(precision, cancellation).ScaleByPowerOfTwo(power);
                return isNegative ? Ball.Negate(ball) : ball;
            });
    }

    private static RuleDescription Describe(int points, bool isProbabilist)
    {
        string count = points.ToString(CultureInfo.InvariantCulture);
        var degree = new StringBuilder();
        foreach (char digit in count)
        {
            _ = degree.Append((char)('₀' + (digit - '0')));
        }

        return new RuleDescription(
            "Gauss–Hermite rule",
            isProbabilist ? "the standard normal density" : "exp(−x²)",
            "the zeros of the Hermite polynomial " + (isProbabilist ? "He" : "H") + degree,
            count + (points == 1 ? " root interval" : " disjoint root intervals"),
            Sources)
        {
            Variable = "a normal variable",
        };
    }
}
