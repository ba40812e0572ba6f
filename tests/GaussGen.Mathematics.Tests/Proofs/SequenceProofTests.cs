using System;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Sequences;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

public class SequenceProofTests
{
    public static TheoryData<int, int> Sizes => new() { { 1, 0 }, { 1, 6 }, { 5, 0 }, { 6, 3 }, { 12, 4 }, { 20, 7 }, { 64, 64 } };

    [Fact]
    public void Constructed_gamma_values_are_proven()
    {
        foreach ((BinaryFormat format, int order) in new[] { (BinaryFormat.Binary64, 0), (BinaryFormat.Binary64, 171), (BinaryFormat.Binary32, 34) })
        {
            TableProof proof = new HalfIntegerGammaClaim(order, format).Prove(Of(new HalfIntegerGammaRequest(order, format)));
            Assert.True(proof.IsProven, proof.FirstFailure + string.Join(" ", proof.Faults));
            Assert.Equal(2 * (order + 1), proof.ProvenCount);
        }
    }

    [Fact]
    public void Gamma_values_are_those_of_the_published_ones()
    {
        // DLMF 5.4.6, Γ(½) = √π = 1.77245 38509 05516 02729 8…, and Γ(3/2) = √π/2.
        TableProof proof = new HalfIntegerGammaClaim(1, BinaryFormat.Binary64).Prove(Of(new HalfIntegerGammaRequest(1, BinaryFormat.Binary64)));
        Assert.Equal(BitConverter.DoubleToUInt64Bits(1.7724538509055160273), proof.Entries.Single(entry => entry.Name == "Gamma[0]").Expected);
        Assert.Equal(BitConverter.DoubleToUInt64Bits(0.88622692545275801365), proof.Entries.Single(entry => entry.Name == "Gamma[1]").Expected);
        Assert.Equal(BitConverter.DoubleToUInt64Bits(0.56418958354775628695), proof.Entries.Single(entry => entry.Name == "Reciprocal[0]").Expected);
    }

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Constructed_matrix_elements_are_proven(int size, int power)
    {
        foreach (BinaryFormat format in power < 64 ? ProofData.Formats : [BinaryFormat.Binary64])
        {
            TableProof proof = new OscillatorMatrixElementsClaim(size, power, format).Prove(Of(new OscillatorMatrixElementsRequest(size, power, format)));
            Assert.True(proof.IsProven, proof.FirstFailure + string.Join(" ", proof.Faults));
            Assert.Equal(size * size, proof.ProvenCount);
        }
    }

    [Theory]
    [InlineData(4, 0.75)]
    [InlineData(6, 1.875)]
    public void The_ground_states_moments_are_exact(int power, double expected)
    {
        // ⟨0|x⁴|0⟩ = 3/4 and ⟨0|x⁶|0⟩ = 15/8, in any textbook of quantum mechanics.
        TableData data = new([new DataSpan("Elements", BinaryFormat.Binary64, [BitConverter.DoubleToUInt64Bits(expected)])], []);
        TableProof proof = new OscillatorMatrixElementsClaim(1, power, BinaryFormat.Binary64).Prove(data);
        Assert.True(proof.IsProven);
        Assert.Equal(0, proof.WorstDistanceInUlp);
    }

    [Fact]
    public void Spoiled_sequences_are_found()
    {
        AssertTamperingIsFound(new HalfIntegerGammaClaim(5, BinaryFormat.Binary64), Of(new HalfIntegerGammaRequest(5, BinaryFormat.Binary64)));
        AssertTamperingIsFound(
            new OscillatorMatrixElementsClaim(3, 3, BinaryFormat.Binary32), Of(new OscillatorMatrixElementsRequest(3, 3, BinaryFormat.Binary32)));
        TableData data = Of(new HalfIntegerGammaRequest(5, BinaryFormat.Binary64));
        TableData swapped = data with { Spans = [data.Spans[0] with { Bits = data.Spans[1].Bits }, data.Spans[1] with { Bits = data.Spans[0].Bits }] };
        Assert.Equal(12, new HalfIntegerGammaClaim(5, BinaryFormat.Binary64).Prove(swapped).WrongCount);
        Assert.Equal(Verdict.Wrong, new HalfIntegerGammaClaim(5, BinaryFormat.Binary32).Prove(data).Verdict);
    }

    [Fact]
    public void Impossible_claims_are_refused()
    {
        BinaryFormat format = BinaryFormat.Binary64;
        Assert.Equal("maximumOrder", Assert.Throws<ArgumentOutOfRangeException>(() => new HalfIntegerGammaClaim(-1, format)).ParamName);
        Assert.Equal("maximumOrder", Assert.Throws<ArgumentOutOfRangeException>(() => new HalfIntegerGammaClaim(201, format)).ParamName);
        Assert.Equal("size", Assert.Throws<ArgumentOutOfRangeException>(() => new OscillatorMatrixElementsClaim(0, 1, format)).ParamName);
        Assert.Equal("power", Assert.Throws<ArgumentOutOfRangeException>(() => new OscillatorMatrixElementsClaim(1, 65, format)).ParamName);
    }

    private static void AssertTamperingIsFound(TableClaim claim, TableData data)
    {
        foreach (DataSpan span in data.Spans)
        {
            for (int index = 0; index < span.Bits.Count; index++)
            {
                ulong right = span.Bits[index];
                foreach (ulong other in new[] { claim.Format.Next(right), claim.Format.Previous(right), right ^ claim.Format.SignBit })
                {
                    TableProof proof = claim.Prove(data.With(span.Name, index, other));
                    Assert.Equal((1, Verdict.Wrong, right), (proof.WrongCount, proof.Verdict, proof.FirstFailure?.Expected));
                }
            }

            Assert.Contains(span.Name + " is missing.", claim.Prove(data with { Spans = data.Spans.Where(old => old != span).ToList() }).Faults);
            Assert.Single(claim.Prove(data.With(span.Name, old => old.Skip(1))).Faults);
        }
    }

    private static TableData Of(SequenceRequest request)
    {
        RoundedSequences rounded = SequenceRounding.Round(request.Construct(default), request.Format, default);
        return new TableData(
            [.. rounded.Table.Sequences.Select((sequence, i) => new DataSpan(sequence.Name, request.Format, [.. rounded.Values[i].Select(value => value.Bits)]))], []);
    }
}
