using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

public class FamilyMomentsProofTests
{
    private const double Infinity = double.PositiveInfinity;

    private static readonly string[] Spans = ["Raw", "Central", "Absolute"];

    private static readonly ILookup<(string Family, string Parameters), (int Order, string List, string Value)> Reference =
        ReferenceData.Read("family-moments.csv").ToLookup(
            line => (line[0], line[1]), line => (int.Parse(line[2], CultureInfo.InvariantCulture), line[3], line[4]));

    public static IEnumerable<object[]> Tables() => Reference.Select(table => new object[] { table.Key.Family, table.Key.Parameters });

    public static TheoryData<string, string> SmallTables => new()
    {
        { "truncated", "0 1 8 inf" },
        { "truncated", "1.5 0.25 1 2" },
        { "half-normal", "0.3" },
        { "log-normal", "0.1 0.125" },
        { "even-exponential", "-2 0.5" },
        { "even-exponential", "0.5" },
    };

    [Theory]
    [MemberData(nameof(Tables))]
    public void The_entries_that_are_expected_are_those_of_other_software(string family, string parameters)
    {
        // family-moments.py: mpmath, by quadrature at more than 100 digits.
        foreach (BinaryFormat format in family == "log-normal" ? [BinaryFormat.Binary64] : ProofData.Formats)
        {
            int order = Reference[(family, parameters)].Max(entry => entry.Order);
            TableClaim claim = Claim(family, parameters, order, format);
            TableProof proof = claim.Prove(Nonsense(format, order));
            foreach ((int k, string list, string value) in Reference[(family, parameters)])
            {
                EntryProof entry = proof.Entries.Single(entry => entry.Member == list && entry.Index == k);
                Assert.Equal((entry.Name, format.Round(DecimalText.Parse(value))), (entry.Name, entry.Expected!.Value));
            }
        }
    }

    [Theory]
    [MemberData(nameof(SmallTables))]
    public void Right_data_is_proven_and_each_spoiled_entry_is_found(string family, string parameters)
    {
        foreach (BinaryFormat format in ProofData.Formats)
        {
            TableClaim claim = Claim(family, parameters, 4, format);
            TableData data = Right(claim, 4);
            TableProof right = claim.Prove(data);
            Assert.True(right.IsProven, right.FirstFailure + string.Join(" ", right.Faults));
            Assert.Equal(30, right.ProvenCount);
            Assert.InRange(right.WorstDistanceInUlp, 0, 0.5);
            foreach (string span in Spans)
            {
                for (int k = 0; k <= 4; k++)
                {
                    ulong bits = data.Entries(span)[k];
                    ulong[] others = [format.Next(bits), format.Previous(bits), bits ^ format.SignBit, format.Infinity, format.Infinity + 1];
                    ulong other = others[(k + span.Length) % others.Length];
                    AssertOneWrong(claim, data.With(span, k, other), span + "[" + k + "]", bits);
                    string constant = span + k.ToString(CultureInfo.InvariantCulture);
                    AssertOneWrong(claim, data.WithConstant(constant, other), constant, bits);
                }
            }
        }
    }

    [Theory]
    [MemberData(nameof(SmallTables))]
    public void Swapped_cut_missing_and_retyped_members_are_found(string family, string parameters)
    {
        TableClaim claim = Claim(family, parameters, 4, BinaryFormat.Binary64);
        TableData data = Right(claim, 4);
        foreach (string span in Spans)
        {
            IReadOnlyList<ulong> entries = data.Entries(span);
            Assert.Equal(2, claim.Prove(data.With(span, 2, entries[4]).With(span, 4, entries[2])).WrongCount);
            AssertFault(claim, data.With(span, old => old.Take(4)), span + " has 4 entries; the claim promises 5.");
            AssertFault(claim, data with { Spans = data.Spans.Where(old => old.Name != span).ToList() }, span + " is missing.");
            AssertFault(claim, data with { Constants = data.Constants.Where(old => old.Name != span + "3").ToList() }, span + "3 is missing.");
        }

        TableClaim other = Claim(family, parameters, 4, BinaryFormat.Binary32);
        AssertFault(other, data, "Raw holds binary64; the claim promises binary32.");
    }

    [Fact]
    public void Extremes_are_decided()
    {
        BinaryFormat format = BinaryFormat.Binary64;
        (TableClaim Claim, int Order)[] claims =
        [
            (new TruncatedNormalMomentsClaim(0, 1, 38, Infinity, 12, format), 12),
            (new TruncatedNormalMomentsClaim(0, 1, 8, Math.BitIncrement(8.0), 12, format), 12),
            (new TruncatedNormalMomentsClaim(0, 1e-3, -1, 2, 4, format), 4),
            (new TruncatedNormalMomentsClaim(1e300, 1e290, -1, Infinity, 1, format), 1),
            (new TruncatedNormalMomentsClaim(0, 1, -1, 2, 100, format), 100),
            (new HalfNormalMomentsClaim(double.Epsilon, 20, format), 20),
            (new LogNormalMomentsClaim(0, 1e-300, 20, format), 20),
            (new LogNormalMomentsClaim(-1e6, 1400, 2, format), 2),
            (new LogNormalMomentsClaim(1e308, 1e150, 3, format), 3),
            (new EvenExponentialMomentsClaim([-100, 1], 20, format), 20),
            (new EvenExponentialMomentsClaim([1e300, 1e-300], 4, format), 4),
        ];
        Assert.All(claims, claim => Assert.Equal(0, claim.Claim.Prove(Nonsense(format, claim.Order)).UnprovenCount));
    }

    [Fact]
    public void Ties_and_exact_values_are_judged_exactly()
    {
        // E x⁴ for exp(−x⁴) is ¼, by integration by parts.
        TableProof quartic = Claim("even-exponential", "0 1", 4, BinaryFormat.Binary64).Prove(Nonsense(BinaryFormat.Binary64, 4));
        Assert.Equal(BitConverter.DoubleToUInt64Bits(0.25), quartic.Entries.Single(entry => entry.Name == "Raw[4]").Expected);

        // The half-normal second moment with the scale 1 + 2⁻¹² in binary32 is 1 + 2⁻¹¹ + 2⁻²⁴, a tie, whose even neighbour is 1 + 2⁻¹¹.
        double scale = 1 + Math.Pow(2, -12);
        TableProof half = new HalfNormalMomentsClaim(scale, 2, BinaryFormat.Binary32).Prove(Nonsense(BinaryFormat.Binary32, 2));
        Assert.Equal(BitConverter.SingleToUInt32Bits((float)(1 + Math.Pow(2, -11))), half.Entries.Single(entry => entry.Name == "Raw[2]").Expected);

        // exp(2m + 2s²) is exactly 1 for m = −1, s = 1.
        TableProof logNormal = new LogNormalMomentsClaim(-1, 1, 2, BinaryFormat.Binary64).Prove(Nonsense(BinaryFormat.Binary64, 2));
        Assert.Equal(BitConverter.DoubleToUInt64Bits(1), logNormal.Entries.Single(entry => entry.Name == "Raw[2]").Expected);
    }

    [Fact]
    public void Cancellation_is_heard_and_progress_ends_at_one()
    {
        TableClaim claim = Claim("half-normal", "1", 3, BinaryFormat.Binary64);
        var progress = new ProgressRecorder();
        _ = claim.Prove(Nonsense(BinaryFormat.Binary64, 3), progress, CancellationToken.None);
        Assert.Equal(1, progress.Values.Last());
        using var source = new CancellationTokenSource();
        source.Cancel();
        foreach ((string family, string parameters) in new[] { ("truncated", "0 1 0 1"), ("half-normal", "1"), ("log-normal", "0 1"), ("even-exponential", "1") })
        {
            TableClaim stopped = Claim(family, parameters, 3, BinaryFormat.Binary64);
            Assert.ThrowsAny<OperationCanceledException>(() => stopped.Prove(Nonsense(BinaryFormat.Binary64, 3), null, source.Token));
        }
    }

    [Fact]
    public void Impossible_claims_are_refused()
    {
        BinaryFormat format = BinaryFormat.Binary64;
        (string Parameter, Action Make)[] claims =
        [
            ("mean", () => _ = new TruncatedNormalMomentsClaim(double.NaN, 1, 0, 1, 1, format)),
            ("standardDeviation", () => _ = new TruncatedNormalMomentsClaim(0, 0, 0, 1, 1, format)),
            ("upper", () => _ = new TruncatedNormalMomentsClaim(0, 1, 1, 1, 1, format)),
            ("upper", () => _ = new TruncatedNormalMomentsClaim(0, 1, -Infinity, Infinity, 1, format)),
            ("upper", () => _ = new TruncatedNormalMomentsClaim(0, 1, double.NaN, 1, 1, format)),
            ("maximumOrder", () => _ = new TruncatedNormalMomentsClaim(0, 1, 0, 1, 101, format)),
            ("scale", () => _ = new HalfNormalMomentsClaim(-1, 1, format)),
            ("maximumOrder", () => _ = new HalfNormalMomentsClaim(1, 201, format)),
            ("logMean", () => _ = new LogNormalMomentsClaim(Infinity, 1, 1, format)),
            ("logStandardDeviation", () => _ = new LogNormalMomentsClaim(0, double.NaN, 1, format)),
            ("maximumOrder", () => _ = new LogNormalMomentsClaim(0, 1, -1, format)),
            ("coefficients", () => _ = new EvenExponentialMomentsClaim([], 1, format)),
            ("coefficients", () => _ = new EvenExponentialMomentsClaim([1, 0], 1, format)),
            ("coefficients", () => _ = new EvenExponentialMomentsClaim([double.NaN, 1], 1, format)),
            ("maximumOrder", () => _ = new EvenExponentialMomentsClaim([1], 101, format)),
        ];
        Assert.All(claims, claim => Assert.Equal(claim.Parameter, Assert.ThrowsAny<ArgumentException>(claim.Make).ParamName));
    }

    [Fact]
    public void Claims_compare_by_value() => Assert.Equal(
        new EvenExponentialMomentsClaim([-0.0, 1], 3, BinaryFormat.Binary64), new EvenExponentialMomentsClaim([0.0, 1], 3, BinaryFormat.Binary64));

    private static TableClaim Claim(string family, string parameters, int order, BinaryFormat format)
    {
        double[] p = [.. parameters.Split(' ').Select(text => text switch
        {
            "inf" => Infinity,
            "-inf" => -Infinity,
            _ => double.Parse(text, CultureInfo.InvariantCulture),
        })];
        return family switch
        {
            "truncated" => new TruncatedNormalMomentsClaim(p[0], p[1], p[2], p[3], order, format),
            "half-normal" => new HalfNormalMomentsClaim(p[0], order, format),
            "log-normal" => new LogNormalMomentsClaim(p[0], p[1], order, format),
            _ => new EvenExponentialMomentsClaim(p, order, format),
        };
    }

    /// <summary>Data of the right shape in which no entry is right.</summary>
    private static TableData Nonsense(BinaryFormat format, int order) =>
        Data(format, Spans.ToDictionary(span => span, _ => (IReadOnlyList<ulong>)Enumerable.Repeat(3UL, order + 1).ToList()));

    /// <summary>What the proof expects; the test against other software says that this is right.</summary>
    private static TableData Right(TableClaim claim, int order)
    {
        TableProof proof = claim.Prove(Nonsense(claim.Format, order));
        return Data(claim.Format, Spans.ToDictionary(span => span, span => (IReadOnlyList<ulong>)proof.Entries
            .Where(entry => entry.Member == span && entry.Index is not null)
            .Select(entry => entry.Expected!.Value)
            .ToList()));
    }

    private static TableData Data(BinaryFormat format, Dictionary<string, IReadOnlyList<ulong>> entries) => new(
        [.. entries.Select(span => new DataSpan(span.Key, format, span.Value))],
        [.. entries.SelectMany(span => span.Value.Select((bits, k) =>
            new DataConstant(span.Key + k.ToString(CultureInfo.InvariantCulture), format, bits)))]);

    private static void AssertOneWrong(TableClaim claim, TableData data, string name, ulong right)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal((1, 0, 0), (proof.WrongCount, proof.UnprovenCount, proof.Faults.Count));
        Assert.Equal((name, right, Verdict.Wrong), (proof.FirstFailure?.Name, proof.FirstFailure?.Expected, proof.Verdict));
    }

    private static void AssertFault(TableClaim claim, TableData data, string fault)
    {
        TableProof proof = claim.Prove(data);
        Assert.Equal(Verdict.Wrong, proof.Verdict);
        Assert.Contains(fault, proof.Faults);
    }
}
