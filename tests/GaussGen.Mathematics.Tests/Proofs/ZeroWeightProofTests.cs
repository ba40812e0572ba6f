using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>Rules with weights that round to zero, kept and left out: binary32 with about a hundred points.</summary>
public class ZeroWeightProofTests
{
    private const int Points = 101;

    private static readonly GaussHermiteClaim Whole =
        new(Points, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary32, dropZeroWeights: false);

    private static readonly GaussHermiteClaim Kept =
        new(Points, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary32, dropZeroWeights: true);

    private static readonly TableData WholeData = ProofData.Of(Whole);

    private static readonly TableData KeptData = ProofData.Of(Kept);

    [Fact]
    public void The_example_has_zero_and_subnormal_weights()
    {
        IReadOnlyList<ulong> weights = WholeData.Entries("Weights");
        Assert.True(weights.Count(bits => bits == 0) >= 4);
        Assert.Contains(weights, bits => bits is > 0 and < (1UL << 23));
        Assert.Equal(weights.Count(bits => bits != 0), KeptData.Entries("Nodes").Count);
        Assert.True(Whole.Prove(WholeData).IsProven);
        Assert.True(Kept.Prove(KeptData).IsProven);
    }

    [Fact]
    public void A_claim_to_keep_does_not_fit_a_rule_that_drops_and_the_other_way_round()
    {
        Assert.Equal(Verdict.Wrong, Whole.Prove(KeptData).Verdict);
        Assert.Equal(Verdict.Wrong, Kept.Prove(WholeData).Verdict);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public void Dropping_too_many_is_found(int excess)
    {
        TableData data = Change(KeptData, old => old.Skip(excess).SkipLast(excess));
        TableProof proof = Kept.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        int kept = KeptData.Entries("Nodes").Count;
        Assert.Equal((ulong)kept, proof.Entries.Single(entry => entry.Member == "PointCount").Expected);
        Assert.Contains($"Nodes has {kept - (2 * excess)} entries; the claim promises {kept}.", proof.Faults);
    }

    [Fact]
    public void Dropping_too_few_is_found()
    {
        int dropped = (Points - KeptData.Entries("Nodes").Count) / 2;
        TableData data = Change(WholeData, old => old.Skip(dropped - 1).SkipLast(dropped - 1));
        Assert.Equal(0UL, data.Entries("Weights")[0]);
        TableProof proof = Kept.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Equal("PointCount", proof.FirstFailure?.Name);
    }

    [Fact]
    public void Dropping_on_one_side_is_found()
    {
        TableData data = Change(KeptData, old => old.Skip(1));
        Assert.Equal(Verdict.Wrong, Kept.Prove(data).Verdict);
        Assert.Equal(Verdict.Wrong, Kept.Prove(data.WithConstant("PointCount", (uint)KeptData.Entries("Nodes").Count)).Verdict);
    }

    [Fact]
    public void A_zero_weight_that_is_not_zero_and_a_subnormal_one_that_is_are_found()
    {
        IReadOnlyList<ulong> weights = WholeData.Entries("Weights");
        int first = weights.TakeWhile(bits => bits == 0).Count();
        EntryProof? raised = Whole.Prove(WholeData.With("Weights", first - 1, 1)).FirstFailure;
        Assert.Equal(($"Weights[{first - 1}]", 0UL), (raised?.Name, raised?.Expected));
        EntryProof? lowered = Whole.Prove(WholeData.With("Weights", first, 0)).FirstFailure;
        Assert.Equal(($"Weights[{first}]", weights[first]), (lowered?.Name, lowered?.Expected));
        EntryProof? negative = Whole.Prove(WholeData.With("Weights", 0, 1UL << 31)).FirstFailure;
        Assert.Equal(("Weights[0]", 0UL), (negative?.Name, negative?.Expected));
    }

    [Fact]
    public void A_flipped_bit_of_a_node_without_weight_is_found()
    {
        for (int bit = 0; bit < 32; bit++)
        {
            ulong right = WholeData.Entries("Nodes")[Points - 1];
            EntryProof? wrong = Whole.Prove(WholeData.With("Nodes", Points - 1, right ^ (1UL << bit))).FirstFailure;
            Assert.Equal(($"Nodes[{Points - 1}]", right), (wrong?.Name, wrong?.Expected));
        }
    }

    [Fact]
    public void Every_weight_below_the_smallest_number_is_known_to_be_zero_in_the_other_convention_too()
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary16, BinaryFormat.Binary32 })
        {
            foreach (int points in new[] { 16, 90, 120 })
            {
                var claim = new GaussHermiteClaim(points, HermiteWeight.ExponentialOfMinusSquare, format, dropZeroWeights: true);
                Assert.True(claim.Prove(ProofData.Of(claim)).IsProven);
            }
        }
    }

    private static TableData Change(TableData data, System.Func<IReadOnlyList<ulong>, IEnumerable<ulong>> change)
    {
        TableData changed = data.With("Nodes", change).With("Weights", change);
        return changed.WithConstant("PointCount", (uint)changed.Entries("Nodes").Count);
    }
}
