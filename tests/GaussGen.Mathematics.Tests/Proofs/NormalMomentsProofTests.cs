using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

public class NormalMomentsProofTests
{
    private static readonly string[] Spans = ["Raw", "Central", "Absolute"];

    public static TheoryData<double, double, int> SmallTables => new()
    {
        { 0.0, 1.0, 0 },
        { 0.0, 1.0, 5 },
        { 1.5, 0.25, 6 },
        { -0.1, 0.3, 4 },
        { 1e-20, 1e-21, 3 },
    };

    public static TheoryData<double, double, int, string> OtherTables => new()
    {
        { 1.5, 0.25, 200, "binary64" },
        { -0.1, 0.3, 200, "binary64" },
        { 0.5, 0.25, 90, "binary32" },
        { 1e-300, 1e-300, 200, "binary64" },
        { double.Epsilon, double.Epsilon, 200, "binary64" },
        { -1e300, 1e-300, 1, "binary64" },
        { 0.0, 1e300, 1, "binary64" },
        { double.MaxValue, double.Epsilon, 1, "binary64" },
        { 1e-3, 1e-40, 200, "binary32" },
    };

    [Theory]
    [MemberData(nameof(OtherTables))]
    public void Constructed_tables_are_proven(double mean, double standardDeviation, int order, string format)
    {
        var claim = new NormalMomentsClaim(
            mean, standardDeviation, order, format == "binary64" ? BinaryFormat.Binary64 : BinaryFormat.Binary32);
        TableProof proof = claim.Prove(ProofData.Of(claim));
        Assert.True(proof.IsProven, proof.FirstFailure + string.Join(" ", proof.Faults));
        Assert.Equal(6 * (order + 1), proof.ProvenCount);
        Assert.InRange(proof.WorstDistanceInUlp, 0, 0.5);
    }

    [Fact]
    public void Tables_of_arbitrary_parameters_are_proven_or_too_large()
    {
        Gen<double> finite = Gen.OneOf(
            Gen.Double[-4, 4],
            Gen.ULong.Select(bits => BitConverter.UInt64BitsToDouble(bits)).Where(double.IsFinite));
        Gen.Select(finite, finite.Select(Math.Abs).Where(value => value > 0), Gen.Int[0, 12], Gen.Bool).Sample(
            (mean, standardDeviation, order, isDouble) =>
            {
                BinaryFormat format = isDouble ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
                var claim = new NormalMomentsClaim(mean, standardDeviation, order, format);
                TableProof proof = claim.Prove(ProofData.Of(claim));
                Assert.All(proof.Entries, entry => Assert.Equal(entry.Found, entry.Expected));
                Assert.All(proof.Entries, entry => Assert.Equal(format.IsInfinity(entry.Found), entry.Verdict == Verdict.Wrong));
            },
            iter: 300);
    }

    [Fact]
    public void The_entries_that_are_expected_are_those_of_other_software()
    {
        // normal-moments.py: mpmath, by quadrature and hypergeometric functions.
        foreach (IGrouping<(string, string), string[]> group in ReferenceData.Read("normal-moments.csv").GroupBy(line => (line[0], line[1])))
        {
            foreach (BinaryFormat format in ProofData.Formats)
            {
                var claim = new NormalMomentsClaim(
                    double.Parse(group.Key.Item1, CultureInfo.InvariantCulture),
                    double.Parse(group.Key.Item2, CultureInfo.InvariantCulture),
                    25,
                    format);
                TableProof proof = claim.Prove(Spoiled(ProofData.Of(claim)));
                foreach (string[] line in group)
                {
                    EntryProof entry = proof.Entries.Single(entry => entry.Name == line[3] + "[" + line[2] + "]");
                    string bits = line[format == BinaryFormat.Binary64 ? 4 : 5];
                    Assert.Equal(ulong.Parse(bits, NumberStyles.HexNumber, CultureInfo.InvariantCulture), entry.Expected);
                    Assert.Equal(Verdict.Wrong, entry.Verdict);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(SmallTables))]
    public void Every_flipped_bit_is_found(double mean, double standardDeviation, int order)
    {
        foreach (BinaryFormat format in ProofData.Formats)
        {
            var claim = new NormalMomentsClaim(mean, standardDeviation, order, format);
            TableData data = ProofData.Of(claim);
            foreach (string span in Spans)
            {
                for (int index = 0; index <= order; index++)
                {
                    ulong right = data.Entries(span)[index];
                    string constant = span + index.ToString(CultureInfo.InvariantCulture);
                    for (int bit = 0; bit < format.StorageBits; bit++)
                    {
                        ulong flipped = right ^ (1UL << bit);
                        AssertOneWrong(claim, data.With(span, index, flipped), span + "[" + index + "]", right);
                        AssertOneWrong(claim, data.WithConstant(constant, flipped), constant, right);
                    }
                }
            }
        }
    }

    [Fact]
    public void Flipped_bits_of_a_long_table_are_found()
    {
        var claim = new NormalMomentsClaim(1.5, 0.75, 120, BinaryFormat.Binary64);
        TableData data = ProofData.Of(claim);
        var random = new Random(7);
        for (int sample = 0; sample < 100; sample++)
        {
            string span = Spans[random.Next(3)];
            int index = random.Next(121);
            ulong right = data.Entries(span)[index];
            AssertOneWrong(claim, data.With(span, index, right ^ (1UL << random.Next(64))), span + "[" + index + "]", right);
        }
    }

    [Fact]
    public void Tables_of_other_parameters_are_found()
    {
        var claim = new NormalMomentsClaim(1.5, 0.25, 4, BinaryFormat.Binary64);
        NormalMomentsClaim[] others =
        [
            new(-1.5, 0.25, 4, BinaryFormat.Binary64),
            new(1.5, 0.5, 4, BinaryFormat.Binary64),
            new(Math.BitIncrement(1.5), 0.25, 4, BinaryFormat.Binary64),
            new(1.5, Math.BitDecrement(0.25), 4, BinaryFormat.Binary64),
            new(1.5, 0.25, 3, BinaryFormat.Binary64),
            new(1.5, 0.25, 5, BinaryFormat.Binary64),
            new(1.5, 0.25, 4, BinaryFormat.Binary32),
        ];
        Assert.All(others, other => Assert.Equal(Verdict.Wrong, claim.Prove(ProofData.Of(other)).Verdict));
        Assert.All(others, other => Assert.Equal(
            other.MaximumOrder == 3, other.Prove(ProofData.Of(claim)).Faults.Count == 3 && other.Format == claim.Format));
    }

    [Fact]
    public void Swapped_cut_missing_and_retyped_members_are_found()
    {
        var claim = new NormalMomentsClaim(1.5, 0.25, 4, BinaryFormat.Binary64);
        TableData data = ProofData.Of(claim);
        foreach (string span in Spans)
        {
            IReadOnlyList<ulong> entries = data.Entries(span);
            Assert.Equal(2, claim.Prove(data.With(span, 2, entries[4]).With(span, 4, entries[2])).WrongCount);
            AssertFault(claim, data.With(span, old => old.Take(4)), span + " has 4 entries; the claim promises 5.");
            AssertFault(claim, data with { Spans = data.Spans.Where(old => old.Name != span).ToList() }, span + " is missing.");
            AssertFault(claim, data with { Constants = data.Constants.Where(old => old.Name != span + "3").ToList() }, span + "3 is missing.");
            AssertFault(
                claim,
                data with { Constants = data.Constants.Select(old => old.Name == span + "3" ? old with { Format = null } : old).ToList() },
                span + "3 holds numbers of another type; the claim promises binary64.");
        }
    }

    [Fact]
    public void Distances_are_in_units_of_the_right_entry()
    {
        var claim = new NormalMomentsClaim(0, 1, 4, BinaryFormat.Binary64);
        TableData data = ProofData.Of(claim);
        double Distance(double found) => claim.Prove(data.With("Raw", 4, BitConverter.DoubleToUInt64Bits(found))).FirstFailure!.DistanceInUlp;
        Assert.Equal(1, Distance(Math.BitIncrement(3.0)));
        Assert.Equal(3, Distance(3 - (3 * Math.Pow(2, -51))));
        Assert.Equal(6 * Math.Pow(2, 51), Distance(-3));
        Assert.Equal(double.PositiveInfinity, Distance(double.NaN));
        Assert.Equal(double.PositiveInfinity, Distance(double.NegativeInfinity));
        Assert.Equal(0, claim.Prove(data).Entries.Where(entry => entry.Member == "Central").Max(entry => entry.DistanceInUlp));
    }

    [Fact]
    public void A_moment_too_large_for_the_format_is_never_proven()
    {
        var claim = new NormalMomentsClaim(0, 1e200, 2, BinaryFormat.Binary64);
        TableProof proof = claim.Prove(ProofData.Of(claim));
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Equal(("Raw[2]", "The true value is too large for binary64."), (proof.FirstFailure?.Name, proof.FirstFailure?.Reason));
    }

    [Fact]
    public void Progress_rises_to_one_and_cancellation_is_heard()
    {
        var claim = new NormalMomentsClaim(1, 1, 9, BinaryFormat.Binary64);
        TableData data = ProofData.Of(claim);
        var progress = new ProgressRecorder();
        Assert.True(claim.Prove(data, progress, CancellationToken.None).IsProven);
        Assert.Equal(Enumerable.Range(1, 10).Select(k => k / 10.0), progress.Values);
        using var source = new CancellationTokenSource();
        Assert.ThrowsAny<OperationCanceledException>(() => claim.Prove(data, new ProgressRecorder(source.Cancel), source.Token));
    }

    [Theory]
    [InlineData(double.NaN, 1.0, 4, "mean")]
    [InlineData(double.PositiveInfinity, 1.0, 4, "mean")]
    [InlineData(0.0, 0.0, 4, "standardDeviation")]
    [InlineData(0.0, double.NaN, 4, "standardDeviation")]
    [InlineData(0.0, double.PositiveInfinity, 4, "standardDeviation")]
    [InlineData(0.0, 1.0, -1, "maximumOrder")]
    [InlineData(0.0, 1.0, 201, "maximumOrder")]
    public void Impossible_claims_are_refused(double mean, double standardDeviation, int order, string parameter) =>
        Assert.Equal(parameter, Assert.Throws<ArgumentOutOfRangeException>(
            () => new NormalMomentsClaim(mean, standardDeviation, order, BinaryFormat.Binary64)).ParamName);

    [Fact]
    public void The_title_says_what_is_claimed() => Assert.Equal(
        "Moments to order 8 of the normal distribution with mean 1.5 and standard deviation 0.1",
        new NormalMomentsClaim(1.5, 0.1, 8, BinaryFormat.Binary64).Title);

    private static void AssertOneWrong(NormalMomentsClaim claim, TableData data, string name, ulong right)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal((1, 0, 0), (proof.WrongCount, proof.UnprovenCount, proof.Faults.Count));
        Assert.Equal((name, right, Verdict.Wrong), (proof.FirstFailure?.Name, proof.FirstFailure?.Expected, proof.Verdict));
    }

    private static void AssertFault(NormalMomentsClaim claim, TableData data, string fault)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Contains(fault, proof.Faults);
    }

    /// <summary>Data in which every entry is wrong, so that a verdict cannot be taken from it.</summary>
    private static TableData Spoiled(TableData data) =>
        data with { Spans = data.Spans.Select(span => span with { Bits = span.Bits.Select(bits => bits ^ 1).ToList() }).ToList() };
}
