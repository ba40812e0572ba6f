using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

public class GaussHermiteProofTests
{
    public static TheoryData<int, HermiteWeight, string, bool> LargeTables => new()
    {
        { 200, HermiteWeight.StandardNormalDensity, "binary64", false },
        { 200, HermiteWeight.ExponentialOfMinusSquare, "binary32", false },
        { 256, HermiteWeight.ExponentialOfMinusSquare, "binary64", true },
        { 377, HermiteWeight.StandardNormalDensity, "binary32", true },
        { 500, HermiteWeight.StandardNormalDensity, "binary64", true },
        { 500, HermiteWeight.ExponentialOfMinusSquare, "binary32", false },
        { 777, HermiteWeight.ExponentialOfMinusSquare, "binary32", true },
        { 1000, HermiteWeight.StandardNormalDensity, "binary64", false },
        { 1000, HermiteWeight.ExponentialOfMinusSquare, "binary64", true },
    };

    [Fact]
    public void Every_constructed_rule_up_to_64_points_is_proven()
    {
        foreach (HermiteWeight weight in ProofData.Weights)
        {
            foreach (BinaryFormat format in ProofData.Formats)
            {
                for (int points = 1; points <= 64; points++)
                {
                    AssertProven(new GaussHermiteClaim(points, weight, format, dropZeroWeights: points % 2 == 0));
                }
            }
        }
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(9)]
    [InlineData(30)]
    public void A_format_with_few_bits_is_proven_too(int points)
    {
        AssertProven(new GaussHermiteClaim(points, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary16, dropZeroWeights: false));
        AssertProven(new GaussHermiteClaim(points, HermiteWeight.ExponentialOfMinusSquare, BinaryFormat.Binary16, dropZeroWeights: true));
    }

    [Theory]
    [MemberData(nameof(LargeTables))]
    public void Large_constructed_rules_are_proven(int points, HermiteWeight weight, string format, bool dropZeroWeights) =>
        AssertProven(new GaussHermiteClaim(
            points, weight, format == "binary64" ? BinaryFormat.Binary64 : BinaryFormat.Binary32, dropZeroWeights));

    [Fact]
    public void The_entries_that_are_expected_are_those_of_other_software()
    {
        int compared = 0;
        foreach (IGrouping<(int Points, HermiteWeight Weight), HermiteReference> rule in HermiteReference.All)
        {
            foreach (BinaryFormat format in ProofData.Formats)
            {
                var claim = new GaussHermiteClaim(rule.Key.Points, rule.Key.Weight, format, dropZeroWeights: false);
                TableProof proof = claim.Prove(Zeros(claim));
                List<ulong> nodes = Expected(proof, "Nodes");
                List<ulong> weights = Expected(proof, "Weights");
                int index = claim.Points / 2;
                foreach (HermiteReference entry in rule)
                {
                    Assert.Equal(format.Round(entry.Node), nodes[index]);
                    Assert.Equal(format.Negate(format.Round(entry.Node)), nodes[claim.Points - 1 - index]);
                    Assert.Equal(format.Round(entry.WeightValue), weights[index]);
                    Assert.Equal(format.Round(entry.WeightValue), weights[claim.Points - 1 - index]);
                    index++;
                    compared++;
                }

                Assert.Equal(claim.Points, index);
            }
        }

        Assert.True(compared > 500);
    }

    [Fact]
    public void Printed_tables_agree()
    {
        // CRC Standard Mathematical Tables, 28th ed. (Beyer 1987), p. 464, n = 2, 3, 4, 5 for exp(−x²): six digits.
        (double Node, double Weight)[][] printed =
        [
            [(0.707107, 0.886227)],
            [(0, 1.18164), (1.22474, 0.295409)],
            [(0.524648, 0.804914), (1.65068, 0.0813128)],
            [(0, 0.945309), (0.958572, 0.393619), (2.02018, 0.0199532)],
        ];
        for (int points = 2; points <= 5; points++)
        {
            var claim = new GaussHermiteClaim(points, HermiteWeight.ExponentialOfMinusSquare, BinaryFormat.Binary64, dropZeroWeights: false);
            TableProof proof = claim.Prove(Zeros(claim));
            List<ulong> nodes = Expected(proof, "Nodes");
            List<ulong> weights = Expected(proof, "Weights");
            int index = points / 2;
            foreach ((double node, double weight) in printed[points - 2])
            {
                Assert.Equal(node, BitConverter.UInt64BitsToDouble(nodes[index]), 5e-6 * Math.Max(node, 0.1));
                Assert.Equal(weight, BitConverter.UInt64BitsToDouble(weights[index]), 5e-6 * weight);
                index++;
            }
        }
    }

    [Fact]
    public void Scaling_constants_are_judged_where_they_are_found()
    {
        // 1/√π = 0.564189583547756286948… (OEIS A087197, recalled, recomputed).
        AssertScalingJudged(
            BinaryFormat.Binary64, BitConverter.DoubleToUInt64Bits(Math.Sqrt(2)), BitConverter.DoubleToUInt64Bits(0.564189583547756286948));
        AssertScalingJudged(
            BinaryFormat.Binary32, BitConverter.SingleToUInt32Bits(MathF.Sqrt(2)), BitConverter.SingleToUInt32Bits(0.564189583547756286948f));
    }

    [Fact]
    public void Progress_rises_to_one_and_cancellation_is_heard()
    {
        var claim = new GaussHermiteClaim(31, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, dropZeroWeights: false);
        TableData data = ProofData.Of(claim);
        var progress = new ProgressRecorder();
        Assert.True(claim.Prove(data, progress, CancellationToken.None).IsProven);
        Assert.Equal(16, progress.Values.Count);
        Assert.Equal(progress.Values.Order(), progress.Values);
        Assert.Equal(1.0, progress.Values[^1]);

        using var source = new CancellationTokenSource();
        var stopping = new ProgressRecorder(source.Cancel);
        Assert.ThrowsAny<OperationCanceledException>(() => claim.Prove(data, stopping, source.Token));
        Assert.Single(stopping.Values);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-1)]
    [InlineData(1001)]
    public void A_claim_to_an_impossible_number_of_points_is_refused(int points) =>
        Assert.Equal("points", Assert.Throws<ArgumentOutOfRangeException>(
            () => new GaussHermiteClaim(points, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, false)).ParamName);

    [Fact]
    public void A_claim_to_an_unknown_weight_is_refused() =>
        Assert.Equal("weight", Assert.Throws<ArgumentOutOfRangeException>(
            () => new GaussHermiteClaim(3, (HermiteWeight)7, BinaryFormat.Binary64, false)).ParamName);

    [Fact]
    public void Titles_say_what_is_claimed()
    {
        Assert.Equal(
            "Gauss–Hermite rule with 1 point, standard normal density",
            new GaussHermiteClaim(1, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, false).Title);
        Assert.Equal(
            "Gauss–Hermite rule with 20 points, weight exp(−x²), without zero weights",
            new GaussHermiteClaim(20, HermiteWeight.ExponentialOfMinusSquare, BinaryFormat.Binary64, true).Title);
    }

    private static void AssertProven(GaussHermiteClaim claim)
    {
        TableData data = ProofData.Of(claim);
        TableProof proof = claim.Prove(data);
        Assert.True(proof.IsProven, claim + ": " + proof.FirstFailure + string.Join(" ", proof.Faults));
        Assert.Equal(2 + data.Entries("Nodes").Count + data.Entries("Weights").Count, proof.ProvenCount);
        Assert.Empty(proof.Faults);
        Assert.Null(proof.FirstFailure);
        Assert.InRange(proof.WorstDistanceInUlp, 0, 0.5);
        Assert.Equal(Math.Min(claim.Points, 5), proof.MomentEquations.Count);
        Assert.All(proof.MomentEquations, equation => Assert.True(equation.Holds && equation.Residual <= equation.Allowance));
    }

    private static void AssertScalingJudged(BinaryFormat format, ulong rootOfTwo, ulong reciprocal)
    {
        var claim = new GaussHermiteClaim(4, HermiteWeight.ExponentialOfMinusSquare, format, dropZeroWeights: false);
        TableData data = ProofData.Of(claim);
        data = data with
        {
            Constants =
            [
                .. data.Constants,
                new DataConstant("NodeScale", format, rootOfTwo),
                new DataConstant("ReciprocalTotalWeight", format, reciprocal),
            ],
        };
        Assert.True(claim.Prove(data).IsProven);
        Assert.Equal(12, claim.Prove(data).ProvenCount);
        Assert.Equal("NodeScale", claim.Prove(data.WithConstant("NodeScale", rootOfTwo ^ 1)).FirstFailure?.Name);
        Assert.Equal(reciprocal, claim.Prove(data.WithConstant("ReciprocalTotalWeight", reciprocal + 1)).FirstFailure?.Expected);
    }

    /// <summary>Data of the right shape in which every number is zero.</summary>
    private static TableData Zeros(GaussHermiteClaim claim) => new(
        [new DataSpan("Nodes", claim.Format, new ulong[claim.Points]), new DataSpan("Weights", claim.Format, new ulong[claim.Points])],
        [ProofData.Integer("PointCount", claim.Points), ProofData.Integer("DegreeOfExactness", (2 * claim.Points) - 1)]);

    private static List<ulong> Expected(TableProof proof, string member) =>
        proof.Entries.Where(entry => entry.Member == member).Select(entry => entry.Expected!.Value).ToList();
}
