using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>Spoiled rules are found out, and what is right in them is still proven.</summary>
public class HermiteTamperingTests
{
    private static readonly string[] Spans = ["Nodes", "Weights"];

    public static TheoryData<int> SmallRules => [1, 2, 3, 4, 5, 6, 8];

    [Theory]
    [MemberData(nameof(SmallRules))]
    public void Every_flipped_bit_of_a_small_rule_is_found(int points)
    {
        int flips = 0;
        foreach (GaussHermiteClaim claim in Claims(points))
        {
            TableData data = ProofData.Of(claim);
            foreach (string span in Spans)
            {
                for (int index = 0; index < points; index++)
                {
                    for (int bit = 0; bit < claim.Format.StorageBits; bit++, flips++)
                    {
                        AssertOneWrong(claim, data, span, index, data.Entries(span)[index] ^ (1UL << bit));
                    }
                }
            }
        }

        Assert.Equal(4 * points * (64 + 32), flips);
    }

    [Theory]
    [MemberData(nameof(SmallRules))]
    public void The_neighbors_of_a_right_entry_are_found(int points)
    {
        foreach (GaussHermiteClaim claim in Claims(points))
        {
            TableData data = ProofData.Of(claim);
            foreach (string span in Spans)
            {
                for (int index = 0; index < points; index++)
                {
                    ulong right = data.Entries(span)[index];
                    foreach (ulong neighbor in new[] { claim.Format.Next(right), claim.Format.Previous(right) })
                    {
                        EntryProof wrong = AssertOneWrong(claim, data, span, index, neighbor);
                        // The next number is one unit from the right one, half of one where the right one is a power of two.
                        Assert.InRange(wrong.DistanceInUlp, 0.5 * (1 - 1e-6), 1.5 * (1 + 1e-6));
                    }
                }
            }
        }
    }

    [Theory]
    [InlineData(33, 60)]
    [InlineData(64, 60)]
    [InlineData(201, 8)]
    [InlineData(400, 2)]
    public void Flipped_bits_of_a_large_rule_are_found(int points, int samples)
    {
        var random = new Random(points);
        foreach (GaussHermiteClaim claim in Claims(points))
        {
            TableData data = ProofData.Of(claim);
            for (int sample = 0; sample < samples; sample++)
            {
                string span = Spans[random.Next(2)];
                int index = random.Next(points);
                ulong flipped = data.Entries(span)[index] ^ (1UL << random.Next(claim.Format.StorageBits));
                AssertOneWrong(claim, data, span, index, flipped);
            }
        }
    }

    [Fact]
    public void A_node_and_its_mirror_image_that_are_wrong_alike_are_both_found()
    {
        foreach (GaussHermiteClaim claim in Claims(12))
        {
            TableData data = ProofData.Of(claim);
            for (int bit = 0; bit < claim.Format.StorageBits; bit++)
            {
                ulong flip = 1UL << bit;
                TableProof proof = claim.Prove(data.With("Nodes", old => old.Select((bits, i) => i is 2 or 9 ? bits ^ flip : bits)));
                Assert.Equal(2, proof.WrongCount);
                Assert.Equal(data.Entries("Nodes")[2], proof.FirstFailure?.Expected);
            }
        }
    }

    [Fact]
    public void Swapped_entries_are_found()
    {
        foreach (GaussHermiteClaim claim in Claims(11))
        {
            TableData data = ProofData.Of(claim);
            foreach (string span in Spans)
            {
                IReadOnlyList<ulong> entries = data.Entries(span);
                for (int first = 0; first < entries.Count; first++)
                {
                    for (int second = first + 1; second < entries.Count; second++)
                    {
                        if (entries[first] == entries[second])
                        {
                            continue;
                        }

                        TableData swapped = data.With(span, first, entries[second]).With(span, second, entries[first]);
                        TableProof proof = claim.Prove(swapped);
                        Assert.Equal(2, proof.WrongCount);
                        Assert.Equal(0, proof.UnprovenCount);
                        Assert.Equal(span + "[" + first + "]", proof.FirstFailure?.Name);
                    }
                }
            }
        }
    }

    [Fact]
    public void Rules_that_are_cut_or_extended_are_found()
    {
        foreach (GaussHermiteClaim claim in Claims(9))
        {
            TableData data = ProofData.Of(claim);
            foreach (Func<IReadOnlyList<ulong>, IEnumerable<ulong>> change in new Func<IReadOnlyList<ulong>, IEnumerable<ulong>>[]
                {
                    old => old.Take(8), old => old.Skip(1), old => old.Skip(1).Take(7), old => old.Append(0UL), old => old.Concat(old), old => [],
                })
            {
                AssertWrong(claim, data.With("Nodes", change));
                AssertWrong(claim, data.With("Weights", change));
                TableData both = data.With("Nodes", change).With("Weights", change);
                AssertWrong(claim, both);
                AssertWrong(claim, both.WithConstant("PointCount", (uint)both.Entries("Nodes").Count));
            }

            TableProof cut = claim.Prove(data.With("Weights", old => old.Take(8)));
            Assert.Equal(["Weights has 8 entries; the claim promises 9."], cut.Faults);
            Assert.Equal(2 + 9 + 8, cut.ProvenCount);
        }
    }

    [Fact]
    public void The_table_of_another_rule_is_found()
    {
        for (int points = 1; points <= 24; points++)
        {
            foreach (GaussHermiteClaim claim in Claims(points))
            {
                foreach (GaussHermiteClaim other in Claims(points).Concat(Claims(points + 1)).Where(other => other != claim))
                {
                    AssertWrong(claim, ProofData.Of(other));
                    AssertWrong(other, ProofData.Of(claim));
                }
            }
        }
    }

    [Fact]
    public void Missing_members_and_members_of_another_type_are_faults()
    {
        GaussHermiteClaim claim = Claims(3).First();
        TableData data = ProofData.Of(claim);
        foreach (string member in Spans)
        {
            AssertFault(claim, data with { Spans = data.Spans.Where(span => span.Name != member).ToList() }, member + " is missing.");
            AssertFault(claim, Retyped(data, member, BinaryFormat.Binary32), member + " holds binary32; the claim promises binary64.");
            AssertFault(claim, Retyped(data, member, null), member + " holds numbers of another type; the claim promises binary64.");
        }

        foreach (string member in new[] { "PointCount", "DegreeOfExactness" })
        {
            AssertFault(claim, data with { Constants = data.Constants.Where(old => old.Name != member).ToList() }, member + " is missing.");
            AssertFault(
                claim,
                data with { Constants = data.Constants.Select(old => old.Name == member ? old with { Format = claim.Format } : old).ToList() },
                member + " is a binary64 number; the claim promises a 32-bit integer.");
        }
    }

    [Fact]
    public void Every_flipped_bit_of_the_integer_constants_is_found()
    {
        GaussHermiteClaim claim = Claims(7).First();
        TableData data = ProofData.Of(claim);
        for (int bit = 0; bit < 32; bit++)
        {
            EntryProof? count = claim.Prove(data.WithConstant("PointCount", 7UL ^ (1UL << bit))).FirstFailure;
            Assert.Equal(("PointCount", 7UL, Verdict.Wrong, true), (count?.Name, count?.Expected, count?.Verdict, count?.IsInteger));
            EntryProof? degree = claim.Prove(data.WithConstant("DegreeOfExactness", 13UL ^ (1UL << bit))).FirstFailure;
            Assert.Equal(("DegreeOfExactness", 13UL, Verdict.Wrong, true), (degree?.Name, degree?.Expected, degree?.Verdict, degree?.IsInteger));
        }
    }

    [Fact]
    public void Arbitrary_entries_are_wrong_and_stop_nothing()
    {
        Gen.Select(Gen.ULong.Array[0, 12], Gen.ULong.Array[0, 12], Gen.Int[1, 6], Gen.Bool).Sample(
            (nodes, weights, points, isDouble) =>
            {
                BinaryFormat format = isDouble ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
                var claim = new GaussHermiteClaim(points, HermiteWeight.ExponentialOfMinusSquare, format, dropZeroWeights: points % 2 == 0);
                TableProof proof = claim.Prove(new TableData(
                    [new DataSpan("Nodes", format, nodes), new DataSpan("Weights", format, weights)],
                    [ProofData.Integer("PointCount", points), ProofData.Integer("DegreeOfExactness", (2 * points) - 1)]));
                Assert.Equal(Verdict.Wrong, proof.Verdict);
                Assert.Equal(0, proof.UnprovenCount);
            },
            iter: 1000);
    }

    private static IEnumerable<GaussHermiteClaim> Claims(int points) =>
        from format in ProofData.Formats
        from weight in ProofData.Weights
        select new GaussHermiteClaim(points, weight, format, dropZeroWeights: false);

    private static EntryProof AssertOneWrong(GaussHermiteClaim claim, TableData data, string span, int index, ulong bits)
    {
        TableProof proof = claim.Prove(data.With(span, index, bits));
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Equal(1, proof.WrongCount);
        Assert.Equal(0, proof.UnprovenCount);
        Assert.Empty(proof.Faults);
        Assert.Empty(proof.MomentEquations);
        EntryProof wrong = proof.Entries.Single(entry => entry.Verdict == Verdict.Wrong);
        Assert.Same(wrong, proof.FirstFailure);
        Assert.Equal((span, index, bits), (wrong.Member, wrong.Index, wrong.Found));
        Assert.Equal(data.Entries(span)[index], wrong.Expected);
        return wrong;
    }

    private static void AssertWrong(GaussHermiteClaim claim, TableData data) => Assert.Equal(Verdict.Wrong, claim.Prove(data).Verdict);

    private static void AssertFault(GaussHermiteClaim claim, TableData data, string fault)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Contains(fault, proof.Faults);
    }

    private static TableData Retyped(TableData data, string member, BinaryFormat? format) =>
        data with { Spans = data.Spans.Select(old => old.Name == member ? old with { Format = format } : old).ToList() };
}
