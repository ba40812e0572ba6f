using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Sequences;
using Xunit;

namespace GaussGen.Mathematics.Tests.Sequences;

public class HalfIntegerGammaTests
{
    // NIST DLMF 5.4.6: Γ(½) = √π = 1.77245 38509 05516 02729 81674 83341 14518 27975…; the others from it by 5.5.1 (recalled, recomputed), with 60 digits (mpmath).
    [Theory]
    [InlineData(0, "1.77245385090551602729816748334114518279754945612238712821381")]
    [InlineData(1, "0.88622692545275801364908374167057259139877472806119356410690")]
    [InlineData(2, "1.32934038817913702047362561250585888709816209209179034616036")]
    [InlineData(3, "3.32335097044784255118406403126464721774540523022947586540089")]
    public void Published_values_are_met(int k, string value)
    {
        SequenceTable table = Construct(3);
        (Rational low, Rational high) = DecimalText.Interval(value);
        Ball gamma = table.Sequences[0].Values[k].Enclose(160, default), reciprocal = table.Sequences[1].Values[k].Enclose(160, default);
        Assert.True(gamma.Lower.ToRational() <= high && low <= gamma.Upper.ToRational());
        Assert.True(Ball.Multiply(gamma, reciprocal, 300).Contains(Rational.One));
        Assert.True(gamma.RelativeAccuracyBits > 150 && reciprocal.RelativeAccuracyBits > 150);
    }

    [Fact]
    public void The_lists_have_their_names_and_lengths()
    {
        SequenceTable table = Construct(20);
        Assert.Equal(["Gamma", "Reciprocal"], table.Sequences.Select(sequence => sequence.Name));
        Assert.All(table.Sequences, sequence => Assert.Equal(21, sequence.Values.Count));
        Assert.All(Construct(0).Sequences, sequence => Assert.Single(sequence.Values));
    }

    [Fact]
    public void Values_obey_the_duplication_formula()
    {
        // Γ(k + ½) = (2k)! √π/(4^k k!): NIST DLMF 5.5.5 at z = k + ½; the construction forms no factorial.
        SequenceTable table = Construct(HalfIntegerGammaRequest.LargestOrder);
        Rational ratio = Rational.One;
        for (int k = 0; k <= HalfIntegerGammaRequest.LargestOrder; k++)
        {
            Ball expected = Ball.Multiply(Ball.FromRational(ratio, 300), Constants.SqrtPi(300), 300);
            Assert.True(Ball.Subtract(expected, table.Sequences[0].Values[k].Enclose(128, default), 300).ContainsZero);
            Assert.True(Ball.Multiply(expected, table.Sequences[1].Values[k].Enclose(128, default), 300).Contains(Rational.One));
            ratio *= new Rational(((2 * k) + 1) * ((2 * k) + 2), 4 * (k + 1));
        }
    }

    [Theory]
    [InlineData("binary64", 171, null)]
    [InlineData("binary64", 172, 172)]
    [InlineData("binary32", 34, null)]
    [InlineData("binary32", 200, 35)]
    public void The_first_value_that_is_too_large_is_told(string name, int order, int? expected)
    {
        BinaryFormat format = name == "binary64" ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
        RoundedSequences rounded = SequenceRounding.Round(Construct(order), format, default);
        Assert.Equal(expected is null ? null : new SequenceOverflow("Gamma", expected.Value), rounded.FirstOverflow);
        // The reciprocals become zero instead: 1/Γ(200.5) < 10^−373.
        Assert.Equal(order == 200, format.IsZero(rounded.Values[1][order].Bits));
    }

    [Theory]
    [InlineData(-1)]
    [InlineData(201)]
    public void An_order_out_of_range_is_refused(int order)
    {
        Assert.False(HalfIntegerGammaRequest.IsMaximumOrder(order));
        var exception = Assert.Throws<ArgumentOutOfRangeException>(() => new HalfIntegerGammaRequest(order, BinaryFormat.Binary64));
        Assert.Equal("maximumOrder", exception.ParamName);
        Assert.Contains("from 0 to 200", exception.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new HalfIntegerGammaRequest(7, BinaryFormat.Binary32);
        Assert.Equal(request, new HalfIntegerGammaRequest(7, BinaryFormat.Binary32));
        Assert.NotEqual(request, new HalfIntegerGammaRequest(8, BinaryFormat.Binary32));
        Assert.Equal("Γ(k + ½) and 1/Γ(k + ½) for k from 0 to 7", request.Claim);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));
    }

    private static SequenceTable Construct(int order) => new HalfIntegerGammaRequest(order, BinaryFormat.Binary64).Construct(default);
}
