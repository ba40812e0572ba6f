using System;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Hermite;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>The bounds of Derivation.md against exact integers.</summary>
public class HermiteErrorBoundTests
{
    private static readonly int[] Sizes = [3, 4, 5, 6, 7, 9, 12, 16, 25, 33, 64, 100, 151, 200, 333, 500, 750, 999, 1000];

    [Fact]
    public void The_recurrence_never_leaves_its_bound_and_the_bound_says_something()
    {
        double worst = 0;
        foreach (int points in Sizes)
        {
            double[] roots = Roots(points);
            foreach (uint point in Points(points))
            {
                HermiteValues values = HermiteRecurrence.Evaluate(points, point, roots);
                int scale = HermiteRecurrence.FirstScale + (32 * values.Moves);
                (BigInteger exact, BigInteger exactBefore) = Exact(points, point);
                // M·2^(32n−S) is to be 2^(25n)·He, and one degree below likewise.
                double error = Distance(values.Current.ToBigInteger(), (32 * points) - scale, exact);
                double errorBefore = Distance(values.Previous.ToBigInteger(), (32 * (points - 1)) - scale, exactBefore);
                double bound = HermiteErrorBound.AtEnd(values.Error), boundBefore = HermiteErrorBound.BeforeEnd(values.Error, roots[points]);
                Assert.True(error <= bound, $"n = {points}, X = {point}: {error} against {bound} units");
                Assert.True(errorBefore <= boundBefore, $"n = {points}, X = {point}: {errorBefore} against {boundBefore} units, one degree below");
                worst = Math.Max(worst, Math.Max(error / bound, errorBefore / boundBefore));
                double size = Math.Max(Math.Abs(values.Current.ToDouble()), Math.Abs(values.Previous.ToDouble()));
                Assert.True(bound / size < Math.Pow(2, -85), $"n = {points}, X = {point}: the bound is only {bound / size:E1} of the value");
            }
        }

        // A bound that nothing comes near would hide a mistake in what is compared.
        Assert.True(worst > 0.02, $"the largest error is {worst} of its bound");
    }

    [Theory]
    [InlineData(40)]
    [InlineData(64)]
    [InlineData(200)]
    [InlineData(2000)]
    public void The_big_recurrence_contains_the_exact_values(int precision)
    {
        foreach (int points in Sizes.Where(points => points <= 500))
        {
            double[] roots = Roots(points);
            foreach (uint point in Points(points))
            {
                (Ball value, Ball lower) = HermiteBigRecurrence.Evaluate(points, point, roots, precision, CancellationToken.None);
                (BigInteger exact, BigInteger exactBefore) = Exact(points, point);
                Assert.True(value.Contains(new Dyadic(exact, -25 * points)), $"n = {points}, X = {point}");
                Assert.True(lower.Contains(new Dyadic(exactBefore, -25 * (points - 1))), $"n = {points}, X = {point}");
                Bound size = Bound.FromDyadic(Dyadic.Abs(value.Center) + Dyadic.Abs(lower.Center));
                Assert.True(value.Radius.CeilingLog2 < size.CeilingLog2 - precision + 45, $"n = {points}, X = {point}: too wide");
            }
        }
    }

    [Fact]
    public void The_fixed_enclosures_contain_the_narrow_balls()
    {
        foreach (int points in Sizes)
        {
            foreach (HermiteConvention convention in HermiteOracle.Conventions)
            {
                RuleTable table = GaussHermite.Construct(points, convention, CancellationToken.None);
                int stride = Math.Max(1, points / 23);
                for (int i = 0; i < points; i += stride)
                {
                    AssertContains(table.Nodes[i], points, i);
                    AssertContains(table.Weights[i], points, i);
                }
            }
        }
    }

    [Fact]
    public void The_proven_radii_before_widening_contain_the_narrow_balls()
    {
        // The published radii are wider than what is proven; the proof itself must hold too, with points well beside the zero.
        foreach (int points in Sizes)
        {
            double[] zeros = HermiteGuess.PositiveZeros(points, CancellationToken.None), roots = Roots(points);
            RuleTable table = GaussHermite.Construct(points, HermiteConvention.Probabilist, CancellationToken.None);
            FixedBall factor = FixedBall.FromInteger(1);
            for (int k = 2; k < points; k++)
            {
                factor = FixedBall.Multiply(in factor, (uint)k);
            }

            factor = FixedBall.Divide(in factor, FixedBall.FromInteger((ulong)points));
            int stride = Math.Max(1, zeros.Length / 17), enclosed = 0;
            for (int i = 0; i < zeros.Length; i += stride)
            {
                foreach (double offset in new[] { -1.4, -0.9, -0.5, 0.0, 0.3, 0.9, 1.4 })
                {
                    var point = (uint)((zeros[i] * (1 << 25)) + 0.5 + offset);
                    if (HermiteEnclosure.TryEnclose(points, point, roots, in factor, out FixedBall node, out FixedBall weight))
                    {
                        enclosed++;
                        int index = points - zeros.Length + i;
                        Assert.True(node.ToBall().Contains(table.Nodes[index].Enclose(220, CancellationToken.None)), $"node {i} of {points}, {offset}");
                        Assert.True(weight.ToBall().Contains(table.Weights[index].Enclose(220, CancellationToken.None)), $"weight {i} of {points}, {offset}");
                    }
                }
            }

            Assert.True(enclosed >= 3 * ((zeros.Length + stride - 1) / stride), $"{points} points: {enclosed} enclosed");
        }
    }

    [Fact]
    public void Every_rule_has_first_enclosures_that_are_narrow_enough()
    {
        foreach (HermiteConvention convention in HermiteOracle.Conventions)
        {
            for (int points = GaussHermite.MinimumPoints; points <= GaussHermite.MaximumPoints; points++)
            {
                double[] guesses = HermiteGuess.PositiveZeros(points, CancellationToken.None);
                HermiteZero[]? zeros = HermiteZeros.TryProve(points, convention, guesses, CancellationToken.None);
                Assert.True(zeros is not null, $"the guesses for {points} points were refused");
                Assert.All(zeros, zero => Assert.True(zero.Node is not null && zero.Weight is not null, $"{points} points, {convention}"));
            }
        }
    }

    private static void AssertContains(RealNumber value, int points, int index)
    {
        Ball narrow = value.Enclose(300, CancellationToken.None);
        if (value.FirstEnclosure is { } first)
        {
            Assert.True(first.ToBall().Contains(narrow), $"entry {index} of {points}");
            Assert.True(value.Enclose(40, CancellationToken.None).Contains(narrow), $"entry {index} of {points}, 40 bits");
        }

        Assert.True(narrow.RelativeAccuracyBits >= 296, $"entry {index} of {points}: {narrow.RelativeAccuracyBits} bits");
    }

    /// <summary>Points next to zeros, and others over the whole range that the bound covers.</summary>
    private static uint[] Points(int points)
    {
        var random = new Random(points);
        double[] zeros = HermiteGuess.PositiveZeros(points, CancellationToken.None);
        int stride = Math.Max(1, zeros.Length / 9);
        var near = zeros.Where((_, i) => i % stride == 0 || i >= zeros.Length - 2).Select(zero => (uint)((zero * (1 << 25)) + 0.5));
        double end = 2 * Math.Sqrt(points - 1) * (1 << 25);
        var others = Enumerable.Range(0, 12).Select(_ => (uint)(random.NextDouble() * end));
        // Where x²/4 is just above or below an integer the two parts of the bound meet.
        var corners = Enumerable.Range(1, 6).Select(i => (uint)(2 * Math.Sqrt(Math.Max(1, i * (points - 2) / 6)) * (1 << 25)));
        return near.Concat(others).Concat(corners).Concat(corners.Select(corner => corner + 1)).Concat([1U, 2U, 3U])
            .Where(point => HermiteRecurrence.IsCovered(points, point)).ToArray();
    }

    private static double[] Roots(int points) => Enumerable.Range(0, points + 1).Select(k => Math.Sqrt(k)).ToArray();

    /// <summary>2^(25n)·Heₙ(X/2²⁵) and 2^(25(n−1))·Heₙ₋₁, exactly.</summary>
    private static (BigInteger Value, BigInteger Before) Exact(int points, uint point)
    {
        BigInteger before = BigInteger.One, current = point;
        for (int k = 1; k < points; k++)
        {
            (before, current) = (current, (point * current) - ((k * before) << 50));
        }

        return (current, before);
    }

    /// <summary>|mantissa − exact/2^power| in units of the mantissa.</summary>
    private static double Distance(BigInteger mantissa, int power, BigInteger exact)
    {
        Dyadic difference = new Dyadic(mantissa, 0) - new Dyadic(exact, -power);
        BigInteger scaled = difference.Exponent >= -40 ? difference.Mantissa << (difference.Exponent + 40) : difference.Mantissa >> (-40 - difference.Exponent);
        return (double)BigInteger.Abs(scaled) / (1L << 40);
    }
}
