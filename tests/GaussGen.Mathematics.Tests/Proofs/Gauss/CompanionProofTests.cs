using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>The companions that estimate errors are proven beside their rules, and spoiled ones found out.</summary>
public class CompanionProofTests
{
    private static readonly string[] Spans = ["CompanionNodes", "CompanionWeights"];

    public static TheoryData<string> Families => RuleProofTests.Families;

    [Theory]
    [MemberData(nameof(Families))]
    public void Companions_are_proven_where_there_are_any(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        foreach (BinaryFormat format in new[] { BinaryFormat.Binary32, BinaryFormat.Binary64 })
        {
            foreach (int points in new[] { 1, 2, 3, 6, 11 })
            {
                TableClaim claim = family.Claim(points, format, false, true);
                if (TryData(family, points, format) is { } data)
                {
                    TableProof proof = RuleProofTests.AssertProven(claim, data);
                    Assert.Equal((4 * points) + 2, proof.Entries.Count(entry => entry.Index is not null));
                    continue;
                }

                // Where the construction says that a node leaves the interval, so does the proof.
                TableData empty = family.Data(points, format) with { };
                empty = empty with
                {
                    Spans = [.. empty.Spans, new DataSpan(Spans[0], format, new ulong[points + 1]), new DataSpan(Spans[1], format, new ulong[points + 1])],
                };
                Assert.Contains(claim.Prove(empty).Faults, fault => fault.Contains("outside the interval", StringComparison.Ordinal));
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Spoiled_companions_are_found(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        BinaryFormat format = BinaryFormat.Binary64;
        if (TryData(family, 2, format) is not { } data)
        {
            return;
        }

        TableClaim claim = family.Claim(2, format, false, true);
        foreach (string span in Spans)
        {
            for (int index = 0; index < 3; index++)
            {
                ulong right = data.Entries(span)[index];
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, format.Next(right));
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, format.Previous(right));
                RuleTamperingTests.AssertOneWrong(claim, data, span, index, right ^ format.SignBit);
            }

            Assert.Contains(
                span + " is missing.", claim.Prove(data with { Spans = data.Spans.Where(old => old.Name != span).ToList() }).Faults);
            Assert.Equal(Verdict.Wrong, claim.Prove(data.With(span, old => old.Skip(1))).Verdict);
        }

        TableData factor = data with { Constants = [.. data.Constants.Where(constant => constant.Name != "ErrorFactor"), new("ErrorFactor", format, Half)] };
        Assert.True(claim.Prove(factor).IsProven);
        Assert.Equal("ErrorFactor", claim.Prove(factor.WithConstant("ErrorFactor", Half + 1)).FirstFailure?.Member);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(5)]
    [InlineData(12)]
    [InlineData(64)]
    public void Companions_of_Hermite_rules_are_proven(int points)
    {
        foreach (HermiteWeight weight in ProofData.Weights)
        {
            foreach (BinaryFormat format in ProofData.Formats)
            {
                foreach (bool drop in new[] { false, true })
                {
                    TableData data = HermiteData(points, weight, format, drop);
                    var claim = new GaussHermiteClaim(points, weight, format, drop, hasErrorEstimate: true);
                    TableProof proof = RuleProofTests.AssertProven(claim, data);
                    Assert.True(proof.MomentEquations.Count(equation => equation.Degree == 0) == 2);
                }
            }
        }
    }

    [Fact]
    public void A_large_companion_of_a_Hermite_rule_is_proven() => RuleProofTests.AssertProven(
        new GaussHermiteClaim(200, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, true, hasErrorEstimate: true),
        HermiteData(200, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, true));

    [Fact]
    public void Spoiled_companions_of_Hermite_rules_are_found()
    {
        foreach (HermiteWeight weight in ProofData.Weights)
        {
            var claim = new GaussHermiteClaim(4, weight, BinaryFormat.Binary64, false, hasErrorEstimate: true);
            TableData data = HermiteData(4, weight, BinaryFormat.Binary64, false);
            foreach (string span in Spans)
            {
                for (int index = 0; index < 5; index++)
                {
                    ulong right = data.Entries(span)[index];
                    RuleTamperingTests.AssertOneWrong(claim, data, span, index, claim.Format.Next(right));
                    RuleTamperingTests.AssertOneWrong(claim, data, span, index, claim.Format.Previous(right));
                    RuleTamperingTests.AssertOneWrong(claim, data, span, index, right ^ claim.Format.SignBit);
                }
            }

            Assert.Contains(
                "CompanionNodes is missing.",
                claim.Prove(data with { Spans = data.Spans.Where(old => old.Name != "CompanionNodes").ToList() }).Faults);
        }
    }

    [Fact]
    public void The_mean_of_rule_and_companion_is_exact_to_two_degrees_more()
    {
        // Laurie 1996: the companion's error is the rule's with the opposite sign up to degree 2n + 1.
        foreach (string name in new[] { "mixture", "generalized", "even exponential, double well" })
        {
            RuleFamily family = RuleFamily.Named(name);
            TableData data = TryData(family, 4, BinaryFormat.Binary64)!;
            TableData exact = family.Data(7, BinaryFormat.Binary64);
            Assert.True(family.Claim(4, BinaryFormat.Binary64, false, true).Prove(data).IsProven);
            for (int degree = 0; degree <= 9; degree++)
            {
                double right = Sum(exact, "Nodes", "Weights", degree), size = Sum(exact, "Nodes", "Weights", degree & ~1);
                double mean = (Sum(data, "Nodes", "Weights", degree) + Sum(data, Spans[0], Spans[1], degree)) / 2;
                Assert.Equal(right, mean, 1e-12 * Math.Max(Math.Abs(right), size));
            }
        }
    }

    [Fact]
    public void A_claim_to_the_estimate_of_a_larger_rule_is_refused()
    {
        Assert.Equal("points", Assert.Throws<ArgumentOutOfRangeException>(
            () => new GaussHermiteClaim(201, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, false, true)).ParamName);
        Assert.Equal(
            "Gauss–Hermite rule with 3 points, standard normal density, with error estimate",
            new GaussHermiteClaim(3, HermiteWeight.StandardNormalDensity, BinaryFormat.Binary64, false, true).Title);
    }

    private static ulong Half => BitConverter.DoubleToUInt64Bits(0.5);

    private static TableData? TryData(RuleFamily family, int points, BinaryFormat format)
    {
        try
        {
            return family.Data(points, format, estimate: true);
        }
        catch (RuleConstructionException refused) when (refused.Failure == RuleFailure.CompanionOutsideInterval)
        {
            return null;
        }
    }

    private static TableData HermiteData(int points, HermiteWeight weight, BinaryFormat format, bool drop)
    {
        HermiteConvention convention = weight == HermiteWeight.StandardNormalDensity ? HermiteConvention.Probabilist : HermiteConvention.Physicist;
        var request = new GaussHermiteRequest(points, convention, format, drop);
        return RuleFamily.Data(request with { ErrorEstimate = true });
    }

    private static double Sum(TableData data, string nodes, string weights, int degree)
    {
        IReadOnlyList<ulong> w = data.Entries(weights);
        return data.Entries(nodes)
            .Select((bits, index) => BitConverter.UInt64BitsToDouble(w[index]) * Math.Pow(BitConverter.UInt64BitsToDouble(bits), degree))
            .Sum();
    }
}
