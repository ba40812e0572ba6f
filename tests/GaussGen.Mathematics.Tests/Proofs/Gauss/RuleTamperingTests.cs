using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>Spoiled rules are found out, and what is right in them is still proven.</summary>
public class RuleTamperingTests
{
    private static readonly string[] Spans = ["Nodes", "Weights"];

    private static readonly BinaryFormat[] Formats = [BinaryFormat.Binary32, BinaryFormat.Binary64];

    public static TheoryData<string> Families => RuleProofTests.Families;

    [Theory]
    [MemberData(nameof(Families))]
    public void Flipped_bits_and_neighbors_of_right_entries_are_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        foreach (BinaryFormat format in Formats)
        {
            foreach (int points in new[] { 1, 2, 3 })
            {
                TableData data = family.Data(points, format);
                TableClaim claim = family.Claim(points, format, false, false);
                foreach (string span in Spans)
                {
                    for (int index = 0; index < points; index++)
                    {
                        ulong right = data.Entries(span)[index];
                        AssertOneWrong(claim, data, span, index, format.Next(right));
                        AssertOneWrong(claim, data, span, index, format.Previous(right));
                        for (int bit = index; bit < format.StorageBits; bit += 9)
                        {
                            AssertOneWrong(claim, data, span, index, right ^ (1UL << bit));
                        }
                    }
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Swapped_entries_are_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        TableData data = family.Data(5, BinaryFormat.Binary64);
        TableClaim claim = family.Claim(5, BinaryFormat.Binary64, false, false);
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

                    TableProof proof = claim.Prove(data.With(span, first, entries[second]).With(span, second, entries[first]));
                    Assert.Equal(2, proof.WrongCount);
                    Assert.Equal(0, proof.UnprovenCount);
                    Assert.Equal(span + "[" + first + "]", proof.FirstFailure?.Name);
                    Assert.Equal(entries[first], proof.FirstFailure?.Expected);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Rules_of_another_shape_are_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        TableData data = family.Data(4, BinaryFormat.Binary64);
        TableClaim claim = family.Claim(4, BinaryFormat.Binary64, false, false);
        foreach (Func<IReadOnlyList<ulong>, IEnumerable<ulong>> change in new Func<IReadOnlyList<ulong>, IEnumerable<ulong>>[]
            {
                old => old.Take(3), old => old.Skip(1), old => old.Append(0UL), old => old.Concat(old), old => [],
            })
        {
            AssertWrong(claim, data.With("Nodes", change));
            AssertWrong(claim, data.With("Weights", change));
            TableData both = data.With("Nodes", change).With("Weights", change);
            AssertWrong(claim, both.WithConstant("PointCount", (uint)both.Entries("Nodes").Count));
        }

        foreach (string member in Spans)
        {
            AssertFault(claim, data with { Spans = data.Spans.Where(span => span.Name != member).ToList() }, member + " is missing.");
            AssertFault(claim, Retyped(data, member), member + " holds binary32; the claim promises binary64.");
        }

        AssertWrong(claim, data.WithConstant("PointCount", 5));
        AssertWrong(claim, data.WithConstant("DegreeOfExactness", 9));
        AssertWrong(claim, family.Data(5, BinaryFormat.Binary64));
        AssertWrong(family.Claim(5, BinaryFormat.Binary64, false, false), data);
        AssertFault(family.Claim(4, BinaryFormat.Binary64, false, true), data, "CompanionNodes is missing.");
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void The_table_of_another_family_is_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        foreach (RuleFamily other in RuleFamily.All.Where(other => other.Name != name))
        {
            AssertWrong(family.Claim(3, BinaryFormat.Binary32, false, false), other.Data(3, BinaryFormat.Binary32));
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Scaling_constants_are_judged_where_they_are_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        TableClaim claim = family.Claim(2, BinaryFormat.Binary64, false, false);
        TableData data = family.Data(2, BinaryFormat.Binary64);
        ulong one = BitConverter.DoubleToUInt64Bits(1);
        foreach ((string member, ulong right) in new[]
            {
                ("NodeScale", one), ("ReciprocalTotalWeight", one), ("ExpectationScale", one), ("ExpectationLocation", 0UL),
            })
        {
            TableData with = data with { Constants = [.. data.Constants, new DataConstant(member, BinaryFormat.Binary64, right)] };
            Assert.True(claim.Prove(with).IsProven);
            foreach (ulong wrong in new[] { right ^ 1, right ^ (1UL << 63), right ^ (1UL << 52) })
            {
                Assert.Equal((member, right), Failure(claim.Prove(with.WithConstant(member, wrong))));
            }
        }
    }

    [Fact]
    public void The_normalizing_integral_is_judged()
    {
        RuleFamily family = RuleFamily.Named("even exponential, quartic");
        TableClaim claim = family.Claim(2, BinaryFormat.Binary64, false, false);
        TableData data = family.Data(2, BinaryFormat.Binary64);
        // ∫ exp(−x⁴) dx = 2Γ(5/4) = 1.81280495411095415596… (recalled; Γ(1/4)/2, OEIS A068466 halved).
        ulong right = BitConverter.DoubleToUInt64Bits(1.81280495411095415596);
        Assert.Equal(right, data.Constants.Single(constant => constant.Name == "NormalizingIntegral").Bits);
        foreach (ulong wrong in new[] { right + 1, right - 1, right ^ (1UL << 63), right ^ (1UL << 50), 0UL })
        {
            Assert.Equal(("NormalizingIntegral", right), Failure(claim.Prove(data.WithConstant("NormalizingIntegral", wrong))));
        }

        AssertFault(
            claim,
            data with { Constants = data.Constants.Where(constant => constant.Name != "NormalizingIntegral").ToList() },
            "NormalizingIntegral is missing.");
    }

    internal static void AssertOneWrong(TableClaim claim, TableData data, string span, int index, ulong bits)
    {
        TableProof proof = claim.Prove(data.With(span, index, bits));
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Equal(1, proof.WrongCount);
        Assert.Equal(0, proof.UnprovenCount);
        Assert.Empty(proof.Faults);
        Assert.Empty(proof.MomentEquations);
        EntryProof wrong = proof.Entries.Single(entry => entry.Verdict == Verdict.Wrong);
        Assert.Equal((span, index, bits), (wrong.Member, wrong.Index, wrong.Found));
        Assert.Equal(data.Entries(span)[index], wrong.Expected);
    }

    private static (string? Member, ulong? Expected) Failure(TableProof proof) => (proof.FirstFailure?.Member, proof.FirstFailure?.Expected);

    private static void AssertWrong(TableClaim claim, TableData data) => Assert.Equal(Verdict.Wrong, claim.Prove(data).Verdict);

    private static void AssertFault(TableClaim claim, TableData data, string fault)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Contains(fault, proof.Faults);
    }

    private static TableData Retyped(TableData data, string member) => data with
    {
        Spans = data.Spans.Select(old => old.Name == member ? old with { Format = BinaryFormat.Binary32 } : old).ToList(),
    };
}
