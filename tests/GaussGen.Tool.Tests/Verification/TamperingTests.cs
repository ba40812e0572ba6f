using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using GaussGen.Tool.Verification;
using Xunit;

namespace GaussGen.Tool.Tests.Verification;

/// <summary>Changes to the compiled file itself: each one is caught, and the untouched file is proven.</summary>
public class TamperingTests
{
    private const int SampledFlips = 2_000;

    public static TheoryData<string, string> WrongClaims => new()
    {
        { "[GaussHermite(5)]", "[GaussHermite(6)]" },
        { "[GaussHermite(5)]", "[GaussHermite(4)]" },
        { "[GaussHermite(5)]", "[GaussHermite(5, Convention = HermiteConvention.Physicist)]" },
        { "[GaussHermite(5)]", "[GaussHermite(5, Format = NumberFormat.Binary32)]" },
        { "[GaussHermite(5)]", "[NormalMoments(0, 1)]" },
        { "[GaussHermite(64, Format = NumberFormat.Binary32)]", "[GaussHermite(64, Format = NumberFormat.Binary32, DropZeroWeights = true)]" },
        { "[GaussHermite(64, Format = NumberFormat.Binary32, DropZeroWeights = true)]", "[GaussHermite(64, Format = NumberFormat.Binary32)]" },
        { "[NormalMoments(1.5, 0.25)]", "[NormalMoments(1.5, 0.25000000000000006)]" },
        { "[NormalMoments(1.5, 0.25)]", "[NormalMoments(1.5000000000000002, 0.25)]" },
        { "[NormalMoments(1.5, 0.25)]", "[NormalMoments(1.5, 0.25, MaximumOrder = 5)]" },
        { "[NormalMoments(1.5, 0.25)]", "[NormalMoments(1.5, 0.25, MaximumOrder = 3)]" },
        { "[NormalMoments(1.5, 0.25)]", "[GaussHermite(5)]" },
        { "[GaussHermite(5)]", "[GaussHermite(5, ErrorEstimate = true)]" },
        { "[GaussHalfRangeHermite(4)]", "[GaussHalfRangeHermite(4, ErrorEstimate = true)]" },
        { "[GaussTruncatedNormal(4, -1, 2)]", "[GaussTruncatedNormal(4, -1, 2.00000001)]" },
        { "[GaussTruncatedNormal(4, -1, 2)]", "[GaussTruncatedNormal(4, -2, 2)]" },
        { "[GaussGeneralizedHermite(4, 0.25)]", "[GaussGeneralizedHermite(4, 0.25000000001)]" },
        { "[GaussGeneralizedHermite(4, 0)]", "[GaussHermite(4, Convention = HermiteConvention.Physicist)]" },
        { "[GaussLogNormal(4, 0.1, 0.4)]", "[GaussLogNormal(4, 0.1, 0.4000000000000001)]" },
        { "[GaussLogNormal(4, 0.1, 0.4)]", "[GaussLogNormal(4, 0.4, 0.1)]" },
        { "[GaussNormalMixture(4, new[] { 0.5, 0.5 }, new double[] { -1, 1 }, new double[] { 1, 2 })]", "[GaussNormalMixture(4, new[] { 0.5, 0.5 }, new double[] { -1, 1 }, new double[] { 2, 1 })]" },
        { "[GaussNormalMixture(4, new[] { 0.5, 0.5 }, new double[] { -1, 1 }, new double[] { 1, 2 })]", "[GaussNormalMixture(4, new[] { 0.5, 0.25 }, new double[] { -1, 1 }, new double[] { 1, 2 })]" },
        { "[GaussEvenExponential(4, -1, 0.25)]", "[GaussEvenExponential(4, 1, 0.25)]" },
        { "[GaussEvenExponential(4, -1, 0.25)]", "[GaussEvenExponential(4, -1, 0.25, 0.0001)]" },
        { "[NestedHermite(2)]", "[NestedHermite(3)]" },
        { "[NestedHermite(1)]", "[NestedHermite(1, ErrorEstimate = true)]" },
        { "[NestedHermite(2)]", "[GaussHermite(9)]" },
        { "[TruncatedNormalMoments(0, 1, -1, 2)]", "[TruncatedNormalMoments(0, 1, -1, 2.00000001)]" },
        { "[TruncatedNormalMoments(0, 1, -1, 2)]", "[NormalMoments(0, 1)]" },
        { "[HalfNormalMoments(1.5)]", "[HalfNormalMoments(1.5000000000000002)]" },
        { "[LogNormalMoments(0.1, 0.4)]", "[LogNormalMoments(0.1, 0.4000000000000001)]" },
        { "[EvenExponentialMoments(1, 0.5)]", "[EvenExponentialMoments(0.5, 1)]" },
        { "[EvenExponentialMoments(1, 0.5)]", "[EvenExponentialMoments(1, 0.5, MaximumOrder = 5)]" },
        { "[HalfIntegerGamma(3)]", "[HalfIntegerGamma(4)]" },
        { "[HalfIntegerGamma(3)]", "[HalfIntegerGamma(2)]" },
        { "[OscillatorMatrixElements(3, 2)]", "[OscillatorMatrixElements(3, 4)]" },
        { "[OscillatorMatrixElements(4, 2)]", "[OscillatorMatrixElements(2, 2)]" },
        { "[OscillatorMatrixElements(3, 2)]", "[HalfIntegerGamma(8)]" },
    };

    /// <summary>Together with the constants these are more than twenty thousand flips.</summary>
    [Theory]
    [InlineData(Framework.Net8)]
    [InlineData(Framework.NetStandard2)]
    public void Every_single_bit_of_small_tables(Framework framework)
    {
        byte[] image = FixtureCompiler.Generate(Sources.Small, framework);
        ImagePlaces places = new(image);
        (int Offset, int Bit)[] flips = [.. places.Data.Concat(places.Constants).Concat(places.CodeConstants).SelectMany(Bits)];
        Assert.InRange(flips.Length, 10_000, 30_000);
        AssertCaught(image, flips);
    }

    /// <summary>Every member of every family is among them: spans, companions, constants, and the numbers in the code of sums.</summary>
    [Fact]
    public void Sampled_bits_of_every_family()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Families);
        ImagePlaces places = new(image);
        (int Offset, int Bit)[] flips = [.. places.Data.Concat(places.Constants).Concat(places.CodeConstants).SelectMany(Bits)];
        Assert.InRange(flips.Length, 8_000, 30_000);
        new Random(2).Shuffle(flips);
        AssertCaught(image, flips[..SampledFlips]);
    }

    /// <summary>One bit of every list, constant and number in code.</summary>
    [Fact]
    public void Every_member_that_a_family_has_is_named_where_it_is_changed()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Families);
        ImagePlaces places = new(image);
        HashSet<string> named = [];
        foreach (Place place in places.Data.Concat(places.Constants).Concat(places.CodeConstants))
        {
            byte[] changed = [.. image];
            changed[place.Offset] ^= 4;
            named.UnionWith(Verify(Touched(image, changed)!).SelectMany(result => result.Findings).Select(finding => finding.Member).OfType<string>());
        }

        string[] expected =
        [
            "Nodes[0]", "Weights[0]", "CompanionNodes[0]", "CompanionWeights[0]", "PointCount", "DegreeOfExactness", "NormalizingIntegral",
            "NodeScale", "ReciprocalTotalWeight", "IntegralLocation", "IntegralScale", "ExpectationLocation", "ExpectationScale", "ErrorFactor",
            "Raw[0]", "Central[0]", "Absolute[0]", "Raw3", "Central2", "Absolute1", "Gamma[0]", "Reciprocal[0]", "Elements[0]",
        ];
        Assert.Empty(expected.Except(named));
    }

    [Fact]
    public void Sampled_bits_of_large_tables()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Large);
        ImagePlaces places = new(image);
        (int Offset, int Bit)[] flips = [.. places.Data.SelectMany(Bits)];
        new Random(1).Shuffle(flips);
        AssertCaught(image, flips[..SampledFlips]);
    }

    [Fact]
    public void Swapped_entries()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Small);
        int swaps = 0;
        foreach (FoundSpan span in Read(image).SelectMany(type => type.Spans.Values).Where(span => span.Count > 1))
        {
            int size = span.Element.Size();
            int place = image.AsSpan().IndexOf(span.Data.Span);
            for (int i = 0; i + 1 < span.Count; i++)
            {
                byte[] changed = [.. image];
                changed.AsSpan(place + (i * size), 2 * size).Reverse();
                changed.AsSpan(place + (i * size), size).Reverse();
                changed.AsSpan(place + ((i + 1) * size), size).Reverse();
                if (!changed.AsSpan().SequenceEqual(image))
                {
                    swaps++;
                    AssertSomethingWrong(image, changed);
                }
            }
        }

        Assert.InRange(swaps, 50, 1000);
    }

    /// <summary>The stated length of the data changed by an entry or a byte, either way.</summary>
    [Theory]
    [InlineData(-8)]
    [InlineData(-4)]
    [InlineData(-1)]
    [InlineData(1)]
    [InlineData(4)]
    [InlineData(8)]
    public void Truncated_and_extended_tables(int bytes)
    {
        byte[] image = FixtureCompiler.Generate(Sources.Small);
        foreach (Place size in new ImagePlaces(image).DataSizes)
        {
            byte[] changed = [.. image];
            int length = BitConverter.ToInt32(image, size.Offset);
            Assert.True(BitConverter.TryWriteBytes(changed.AsSpan(size.Offset), length + bytes));
            Assert.True(TryRead(changed) is not { } found || Verify(found).Any(result => result.Verdict != Verdict.Proven));
        }
    }

    [Fact]
    public void Another_rules_table()
    {
        byte[] image = FixtureCompiler.Generate(Sources.Small);
        ImagePlaces places = new(image);
        Assert.Equal(places.Data.Count, places.DataAddresses.Count);
        for (int i = 0; i < places.Data.Count; i++)
        {
            for (int j = 0; j < places.Data.Count; j++)
            {
                (Place table, Place other) = (places.Data[i], places.Data[j]);
                if (!image.AsSpan(table.Offset, table.Length).SequenceEqual(image.AsSpan(other.Offset, table.Length)))
                {
                    byte[] changed = [.. image];
                    image.AsSpan(places.DataAddresses[j].Offset, places.DataAddresses[j].Length).CopyTo(changed.AsSpan(places.DataAddresses[i].Offset));
                    AssertSomethingWrong(image, changed);
                }
            }
        }
    }

    /// <summary>The data of one declaration under another: as if an attribute had been changed after the fact.</summary>
    [Theory]
    [MemberData(nameof(WrongClaims))]
    public void A_wrong_claim(string made, string claimed)
    {
        string source = $"using GaussGen; {made} public static partial class T {{ }}";
        TableResult result = Assert.Single(Verify(Read(FixtureCompiler.GenerateAs(source, made, claimed))));
        Assert.Equal(Verdict.Wrong, result.Verdict);
        Assert.Equal(Verdict.Proven, Assert.Single(Verify(Read(FixtureCompiler.GenerateAs(source, made, made)))).Verdict);
    }

    private static void AssertCaught(byte[] image, (int Offset, int Bit)[] flips)
    {
        Assert.All(Verify(Read(image)), result => Assert.Equal(Verdict.Proven, result.Verdict));
        _ = Parallel.ForEach(flips, flip =>
        {
            byte[] changed = [.. image];
            changed[flip.Offset] ^= (byte)(1 << flip.Bit);
            AssertSomethingWrong(image, changed);
        });
    }

    /// <summary>The tables that a change has touched are not all right, or the file is refused as damaged. What was changed is named.</summary>
    private static void AssertSomethingWrong(byte[] image, byte[] changed)
    {
        if (Touched(image, changed) is not { } touched)
        {
            return;
        }

        TableResult[] results = Verify(touched);
        Assert.Contains(results, result => result.Verdict == Verdict.Wrong);
        IReadOnlyList<FoundType> before = Read(image);
        foreach (FoundType type in touched)
        {
            FoundType old = before.Single(other => other.Name == type.Name);
            foreach (FoundSpan span in type.Spans.Values.Where(span => old.Spans.TryGetValue(span.Name, out FoundSpan? other) && other.Count == span.Count))
            {
                foreach (int index in Enumerable.Range(0, span.Count).Where(index => span.Bits(index) != old.Spans[span.Name].Bits(index)))
                {
                    Assert.Contains(results.SelectMany(result => result.Findings), finding => finding.Member == $"{span.Name}[{index}]");
                }
            }

            foreach (FoundConstant constant in type.Constants.Values.Where(constant => old.Constants.TryGetValue(constant.Name, out FoundConstant? other) && other != constant))
            {
                Assert.Contains(results.SelectMany(result => result.Findings), finding => finding.Member == constant.Name);
            }
        }
    }

    /// <summary>The types that a change has touched; null if the file is refused. Those that it has not touched are not proven again.</summary>
    private static FoundType[]? Touched(byte[] image, byte[] changed)
    {
        IReadOnlyList<FoundType> before = Read(image);
        if (TryRead(changed) is not { } after)
        {
            return null;
        }

        Assert.Equal(before.Count, after.Count);
        return [.. after.Where((type, index) => !IsSame(type, before[index]))];
    }

    private static bool IsSame(FoundType a, FoundType b) =>
        a.Spans.Count == b.Spans.Count
        && a.Spans.All(span => b.Spans.TryGetValue(span.Key, out FoundSpan? other) && span.Value.Data.Span.SequenceEqual(other.Data.Span))
        && a.Constants.OrderBy(constant => constant.Key).SequenceEqual(b.Constants.OrderBy(constant => constant.Key))
        && a.Methods.SelectMany(method => method.Literals).SequenceEqual(b.Methods.SelectMany(method => method.Literals));

    private static IReadOnlyList<FoundType>? TryRead(byte[] bytes)
    {
        try
        {
            return Read(bytes);
        }
        catch (UnreadableException)
        {
            return null;
        }
    }

    private static IReadOnlyList<FoundType> Read(byte[] bytes)
    {
        using AssemblyImage image = AssemblyImage.FromBytes(bytes);
        return AssemblyReader.Read(image, CancellationToken.None).Types;
    }

    private static TableResult[] Verify(IEnumerable<FoundType> types) =>
        [.. types.SelectMany(DeclaredTable.Of).Select(table => new TableVerifier().Verify(table, null, CancellationToken.None))];

    private static IEnumerable<(int Offset, int Bit)> Bits(Place place) =>
        Enumerable.Range(0, place.Length * 8).Select(bit => (place.Offset + (bit / 8), bit % 8));
}
