using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using MathNet.Numerics.LinearAlgebra;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>The theorems that the proofs of rules stand on, each put to numbers that were come by otherwise.</summary>
public class HermiteRoadsTests
{
    [Fact]
    public void Zeros_are_counted_as_the_eigenvalues_of_the_Jacobi_matrix()
    {
        // Golub & Welsch 1969: the zeros of Pₙ are the eigenvalues of the matrix with √(c k) beside the diagonal.
        Gen.Select(Gen.Int[1, 40], Gen.Int[1, 2], Gen.Int[0, 20 * 1024]).Sample(
            (degree, variance, numerator) =>
            {
                double point = numerator / 1024.0;
                double[] zeros = Eigenvalues(degree, variance);
                if (zeros.Any(zero => Math.Abs(zero - point) < 1e-9))
                {
                    return;
                }

                Assert.Equal(zeros.Count(zero => zero > point), Count(degree, variance, new Dyadic(numerator, -10)));
            },
            iter: 2000);
    }

    [Fact]
    public void A_zero_at_the_point_is_not_counted()
    {
        // He₂ = x² − 1, H₂ = 4x² − 2 = u² − 2, He₃ = x³ − 3x and H₁ have the zeros ±1, none dyadic, 0 and 0.
        Assert.Equal(0, Count(2, 1, new Dyadic(1, 0)));
        Assert.Equal(0, Count(2, 1, new Dyadic(1 << 20, -20)));
        Assert.Equal(1, Count(2, 1, new Dyadic((1 << 20) - 1, -20)));
        Assert.Equal(1, Count(3, 1, Dyadic.Zero));
        Assert.Equal(0, Count(1, 2, Dyadic.Zero));
        Assert.Equal(0, Count(1, 2, new Dyadic(5, 3)));
        Assert.Equal(2, Count(4, 2, Dyadic.Zero));
    }

    [Fact]
    public void A_point_below_zero_is_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => Count(3, 1, new Dyadic(-1, 0)));

    [Fact]
    public void Enclosures_contain_zero_and_weight_from_wherever_they_are_seen()
    {
        // Points at random distances, often at the ends of what is allowed, innermost and outermost zeros, and precisions down to
        // far too few bits.
        var rules = HermiteReference.All.ToList();
        Gen<double> places = Gen.OneOf(Gen.Const(0.0), Gen.Const(1.0), Gen.Double[0, 1]);
        Gen<int> sides = Gen.OneOf(Gen.Const(-1000), Gen.Const(1000), Gen.Int[-1000, 1000]);
        Gen.Select(Gen.Int[0, rules.Count - 1], places, Gen.Int[0, 40], sides, Gen.Int[20, 400]).Sample(
            (which, place, closeness, side, precision) =>
            {
                List<HermiteReference> entries = [.. rules[which]];
                HermiteReference entry = entries[(int)(place * (entries.Count - 1))];
                int variance = entry.Weight == HermiteWeight.StandardNormalDensity ? 1 : 2;
                Rational zero = entry.Node * variance;

                // The zero is within 1000/1024 of the distance from the point, on either side.
                var distance = new Dyadic(BigInteger.One, -14 - closeness);
                Dyadic point = Floor(zero + (new Rational(side, 1024) * distance.ToRational()), -14 - closeness - 12);
                if (point.Sign < 0)
                {
                    return;
                }

                var enclosure = new HermiteZeroEnclosure(entry.Points, variance);
                (Ball offset, Ball weight) = enclosure.At(point, distance, precision);
                Ball total = variance == 1 ? Ball.FromInteger(1) : Constants.SqrtPi(256);
                Assert.True(Overlap(offset, Around(zero - point.ToRational())));
                Assert.True(!weight.IsFinite || Overlap(Ball.Multiply(weight, total, 256), Around(entry.WeightValue)));
            },
            iter: 1500);
    }

    [Fact]
    public void Enclosures_narrow_quadratically()
    {
        // With n = 64 and δ = 2^−53 the remarks promise a weight within n δ² and an offset within about n δ².
        HermiteReference entry = HermiteReference.All.First(rule => rule.Key is (64, HermiteWeight.StandardNormalDensity)).ElementAt(10);
        Dyadic distance = new(BigInteger.One, -53);
        (Ball offset, Ball weight) = new HermiteZeroEnclosure(64, 1).At(Floor(entry.Node, -53), distance, 300);
        Assert.InRange(offset.Radius.CeilingLog2, -120, -98);
        Assert.InRange(weight.RelativeAccuracyBits, 98, 120);
    }

    [Fact]
    public void A_zero_that_is_too_far_away_is_refused()
    {
        var enclosure = new HermiteZeroEnclosure(10, 1);
        Assert.Throws<ArgumentException>(() => enclosure.At(new Dyadic(1, 0), new Dyadic(1, -4), 100));
        Assert.False(enclosure.IsNearEnough(new Dyadic(1, 0), new Dyadic(1, -4)));
        Assert.True(enclosure.IsNearEnough(new Dyadic(1, 0), new Dyadic(1, -7)));
    }

    [Fact]
    public void A_moment_equation_fails_where_a_weight_is_wrong_by_more_than_all_roundings()
    {
        var claim = new GaussHermiteClaim(7, HermiteWeight.ExponentialOfMinusSquare, BinaryFormat.Binary64, dropZeroWeights: false);
        TableData data = ProofData.Of(claim);
        IReadOnlyList<ulong> nodes = data.Entries("Nodes");
        IReadOnlyList<ulong> weights = data.Entries("Weights");
        var equations = new HermiteMomentEquations(claim);
        Assert.All(Check(weights, nodes), equation => Assert.True(equation.Holds));
        Assert.Equal([0, 2, 4, 6, 8], Check(weights, nodes).Select(equation => equation.Degree));
        Assert.All(Check([.. weights.Select((bits, i) => i == 3 ? bits + 8 : bits)], nodes).Take(1), equation => Assert.False(equation.Holds));
        Assert.All(Check([.. weights.Select((bits, i) => i == 2 ? bits + 8 : bits)], nodes).Take(2), equation => Assert.False(equation.Holds));
        Assert.All(Check(weights, [.. nodes.Select((bits, i) => i == 1 ? bits - 16 : bits)]).Skip(1), equation => Assert.False(equation.Holds));

        IReadOnlyList<MomentEquation> Check(IReadOnlyList<ulong> weights, IReadOnlyList<ulong> nodes) =>
            equations.Check(nodes, weights, 0, Dyadic.Zero, CancellationToken.None);
    }

    [Fact]
    public void A_proof_that_contradicts_a_moment_equation_proves_nothing()
    {
        var claim = new GaussHermiteClaim(3, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, dropZeroWeights: false);
        TableProof proof = claim.Prove(ProofData.Of(claim));
        Assert.Equal(Verdict.Proven, proof.Verdict);
        Assert.Equal(Verdict.Unproven, (proof with { MomentEquations = [new MomentEquation(0, 1, 0.5, Holds: false)] }).Verdict);
    }

    private static int Count(int degree, int variance, Dyadic point) =>
        HermiteZeroCount.Above(degree, variance, point, CancellationToken.None);

    private static double[] Eigenvalues(int degree, int variance)
    {
        Matrix<double> jacobi = Matrix<double>.Build.Dense(
            degree, degree, (row, column) => Math.Abs(row - column) == 1 ? Math.Sqrt(variance * Math.Max(row, column)) : 0);
        return [.. jacobi.Evd(Symmetricity.Symmetric).EigenValues.Select(value => value.Real)];
    }

    /// <summary>The number to the 60 digits that the reference has, relative.</summary>
    private static Ball Around(Rational value) => Ball.FromRational(value, 300).Enlarge(
        Bound.FromDyadic(Ball.FromRational(value, 64).Upper).ScaleByPowerOfTwo(-150) + Bound.PowerOfTwo(-190));

    private static bool Overlap(Ball left, Ball right) => left.Lower <= right.Upper && right.Lower <= left.Upper;

    private static Dyadic Floor(Rational value, int exponent)
    {
        Rational scaled = value * Rational.Pow(2, -exponent);
        BigInteger quotient = BigInteger.DivRem(scaled.Numerator, scaled.Denominator, out BigInteger remainder);
        return new Dyadic(remainder.Sign < 0 ? quotient - 1 : quotient, exponent);
    }
}
