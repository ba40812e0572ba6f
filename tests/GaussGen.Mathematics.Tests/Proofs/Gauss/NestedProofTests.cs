using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>The nested rules of Genz and Keister are proven, with and without companion, and spoiled ones found out.</summary>
public class NestedProofTests
{
    public static TheoryData<int> Levels => [0, 1, 2, 3, 4];

    [Theory]
    [MemberData(nameof(Levels))]
    public void Nested_rules_are_proven(int level)
    {
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary16, BinaryFormat.Binary32, BinaryFormat.Binary64 })
        {
            foreach (bool drop in new[] { false, true })
            {
                foreach (bool estimate in new[] { false, true })
                {
                    NestedHermiteRequest request = new NestedHermiteRequest(level, format, drop) with { ErrorEstimate = estimate };
                    var claim = new NestedHermiteClaim(level, format, drop, estimate);
                    Assert.Equal(request.Claim, claim.Title);
                    TableData data = RuleFamily.Data(request);
                    RuleProofTests.AssertProven(claim, data);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void A_proof_without_hints_finds_the_same_rule(int level)
    {
        TableData data = Data(level);
        TableProof proof = new NestedHermiteClaim(level, BinaryFormat.Binary64, false, false)
            .Prove(data.With("Nodes", old => old.Select(_ => ulong.MaxValue >> 1)));
        Assert.Equal(data.Entries("Nodes").Count, proof.WrongCount);
        Assert.Equal(data.Entries("Nodes"), RuleProofTests.Expected(proof, "Nodes"));
        Assert.Equal(0, proof.UnprovenCount);
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void Spoiled_nested_rules_are_found(int level)
    {
        BinaryFormat format = BinaryFormat.Binary64;
        var claim = new NestedHermiteClaim(level, format, false, false);
        TableData data = Data(level);
        int count = data.Entries("Nodes").Count;
        for (int index = 0; index < count; index += Math.Max(1, count / 4))
        {
            foreach (string span in new[] { "Nodes", "Weights" })
            {
                ulong right = data.Entries(span)[index];
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, format.Next(right));
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, format.Previous(right));
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, right ^ format.SignBit);
            }
        }

        Assert.Equal("DegreeOfExactness", claim.Prove(data.WithConstant("DegreeOfExactness", 3)).FirstFailure?.Member);
        Assert.Equal(Verdict.Wrong, new NestedHermiteClaim((level + 1) % 5, format, false, false).Prove(data).Verdict);
    }

    [Fact]
    public void The_proof_itself_knows_degrees_and_containment()
    {
        // Genz and Keister 1996: 1, 3, 9, 19, 35 points with degrees 1, 5, 15, 29, 51.
        (int Points, int Degree)[] published = [(1, 1), (3, 5), (9, 15), (19, 29), (35, 51)];
        IReadOnlyList<ulong> before = [];
        for (int level = 0; level < published.Length; level++)
        {
            (int points, int degree) = published[level];
            var nothing = new TableData(
                [new("Nodes", BinaryFormat.Binary64, new ulong[points]), new("Weights", BinaryFormat.Binary64, new ulong[points])],
                [ProofData.Integer("PointCount", 0), ProofData.Integer("DegreeOfExactness", 0)]);
            TableProof proof = new NestedHermiteClaim(level, BinaryFormat.Binary64, false, false).Prove(nothing);
            Assert.Equal((uint)points, proof.Entries.Single(entry => entry.Member == "PointCount").Expected);
            Assert.Equal((uint)degree, proof.Entries.Single(entry => entry.Member == "DegreeOfExactness").Expected);
            List<ulong> nodes = RuleProofTests.Expected(proof, "Nodes");
            Assert.Empty(before.Except(nodes));
            before = nodes;
        }
    }

    [Theory]
    [InlineData(-1)]
    [InlineData(5)]
    public void A_claim_to_a_level_that_does_not_exist_is_refused(int level) =>
        Assert.Equal("level", Assert.Throws<ArgumentOutOfRangeException>(
            () => new NestedHermiteClaim(level, BinaryFormat.Binary64, false, false)).ParamName);

    private static TableData Data(int level) => RuleFamily.Data(new NestedHermiteRequest(level, BinaryFormat.Binary64, false));
}
