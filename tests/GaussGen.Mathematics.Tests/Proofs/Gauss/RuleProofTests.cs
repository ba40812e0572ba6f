using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Gauss;

/// <summary>Tables that the constructions make are proven by the other road, entry by entry.</summary>
public class RuleProofTests
{
    private static readonly BinaryFormat[] Formats = [BinaryFormat.Binary16, BinaryFormat.Binary32, BinaryFormat.Binary64];

    public static TheoryData<string> Families => [.. RuleFamily.All.Select(family => family.Name)];

    [Theory]
    [MemberData(nameof(Families))]
    public void Small_rules_are_proven_in_every_format(string name)
    {
        foreach (BinaryFormat format in Formats)
        {
            foreach (int points in new[] { 1, 2, 3, 5, 12 })
            {
                AssertProven(RuleFamily.Named(name), points, format);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Larger_rules_are_proven(string name) => AssertProven(RuleFamily.Named(name), 32, BinaryFormat.Binary64);

    [Theory]
    [MemberData(nameof(Families))]
    public void A_proof_without_hints_finds_the_same_rule(string name)
    {
        // Every found value is NaN: the zeros are told apart by counts alone.
        RuleFamily family = RuleFamily.Named(name);
        foreach (int points in new[] { 1, 2, 7 })
        {
            TableData data = family.Data(points, BinaryFormat.Binary32);
            TableClaim claim = family.Claim(points, BinaryFormat.Binary32, false, false);
            TableProof proof = claim.Prove(data.With("Nodes", old => old.Select(_ => 0x7fc00000UL)));
            Assert.Equal(points, proof.WrongCount);
            Assert.Equal(0, proof.UnprovenCount);
            Assert.Equal(data.Entries("Nodes"), Expected(proof, "Nodes"));
            Assert.All(proof.Entries.Where(entry => entry.Member == "Nodes"), entry => Assert.Equal(double.PositiveInfinity, entry.DistanceInUlp));
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void A_claim_has_the_title_of_its_request(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        foreach (bool drop in new[] { false, true })
        {
            foreach (bool estimate in new[] { false, true })
            {
                Assert.Equal(
                    (family.Request(3, BinaryFormat.Binary64, drop) with { ErrorEstimate = estimate }).Claim,
                    family.Claim(3, BinaryFormat.Binary64, drop, estimate).Title);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Claims_are_equal_by_value_and_refuse_impossible_points(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        Assert.Equal(family.Claim(3, BinaryFormat.Binary64, false, true), family.Claim(3, BinaryFormat.Binary64, false, true));
        Assert.NotEqual(family.Claim(3, BinaryFormat.Binary64, false, true), family.Claim(3, BinaryFormat.Binary64, false, false));
        Assert.NotEqual(family.Claim(3, BinaryFormat.Binary64, false, true), family.Claim(4, BinaryFormat.Binary64, false, true));
        foreach (int points in new[] { 0, -1, 65 })
        {
            Assert.Equal("points", Assert.Throws<ArgumentOutOfRangeException>(
                () => family.Claim(points, BinaryFormat.Binary64, false, false)).ParamName);
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void Progress_rises_to_one_and_cancellation_is_heard(string name)
    {
        RuleFamily family = RuleFamily.Named(name);
        TableData data = family.Data(9, BinaryFormat.Binary64);
        TableClaim claim = family.Claim(9, BinaryFormat.Binary64, false, false);
        var progress = new ProgressRecorder();
        Assert.True(claim.Prove(data, progress, CancellationToken.None).IsProven);
        Assert.Equal(progress.Values.Order(), progress.Values);
        Assert.Equal(1.0, progress.Values[^1]);

        using var source = new CancellationTokenSource();
        var stopping = new ProgressRecorder(source.Cancel);
        Assert.ThrowsAny<OperationCanceledException>(() => claim.Prove(data, stopping, source.Token));
        Assert.Single(stopping.Values);
    }

    internal static TableProof AssertProven(RuleFamily family, int points, BinaryFormat format)
    {
        TableData data = family.Data(points, format);
        return AssertProven(family.Claim(points, format, false, false), data);
    }

    internal static TableProof AssertProven(TableClaim claim, TableData data)
    {
        TableProof proof = claim.Prove(data);
        Assert.True(proof.IsProven, claim.Title + ": " + proof.FirstFailure + string.Join(" ", proof.Faults) + string.Join(" ", proof.MomentEquations));
        Assert.Equal(data.Spans.Sum(span => span.Bits.Count) + data.Constants.Count, proof.ProvenCount);
        Assert.InRange(proof.WorstDistanceInUlp, 0, 0.5);
        Assert.NotEmpty(proof.MomentEquations);
        Assert.All(proof.MomentEquations, equation => Assert.True(equation.Holds));
        return proof;
    }

    internal static List<ulong> Expected(TableProof proof, string member) =>
        proof.Entries.Where(entry => entry.Member == member).Select(entry => entry.Expected!.Value).ToList();
}
