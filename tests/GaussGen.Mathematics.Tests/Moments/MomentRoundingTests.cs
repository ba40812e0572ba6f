using System;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class MomentRoundingTests
{
    private static readonly MomentDescription Words = new("a distribution", "a method", "a source");

    [Fact]
    public void Entries_are_the_nearest_values_in_their_lists()
    {
        RoundedMoments moments = MomentRounding.Round(
            new MomentTable(Words, Exact(1, new(1, 3)), Exact(1, 0, new(2, 3)), Exact(1)), BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal([1.0, 1 / 3.0], moments.Raw.Select(Value));
        Assert.Equal([1.0, 0.0, 2 / 3.0], moments.Central.Select(Value));
        Assert.Equal([1.0], moments.Absolute.Select(Value));
        Assert.Null(moments.FirstOverflow);
    }

    [Theory]
    [InlineData(2, 9, 9, 2)]
    [InlineData(9, 1, 9, 1)]
    [InlineData(9, 9, 3, 3)]
    [InlineData(3, 2, 2, 2)]
    [InlineData(9, 9, 9, null)]
    public void The_first_overflow_is_the_lowest_order_in_any_list(int raw, int central, int absolute, int? expected)
    {
        RoundedMoments moments = MomentRounding.Round(
            new MomentTable(Words, Beyond(raw), Beyond(central), Beyond(absolute)), BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal(expected, moments.FirstOverflow);
    }

    [Fact]
    public void A_number_that_stands_in_several_lists_is_enclosed_once()
    {
        int count = 0;
        RealNumber shared = RealNumber.FromEnclosures((precision, token) =>
        {
            count++;
            return Constants.Pi(precision, token);
        });
        RoundedMoments moments = MomentRounding.Round(
            new MomentTable(Words, [shared], [shared], [shared]), BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal(1, count);
        Assert.All([moments.Raw[0], moments.Central[0], moments.Absolute[0]], value => Assert.Equal(Math.PI, Value(value)));
    }

    [Fact]
    public void A_cancelled_token_stops_the_work() => Assert.Throws<OperationCanceledException>(() => MomentRounding.Round(
        new MomentTable(Words, Exact(1), [], []), BinaryFormat.Binary64, new CancellationToken(canceled: true)));

    /// <summary>Five moments, negative ones too, that are too large for binary64 from an order on.</summary>
    private static RealNumber[] Beyond(int order) =>
        Exact([.. Enumerable.Range(0, 5).Select(i => (Rational)(i < order ? -i : -(BigInteger.One << 1024)))]);

    private static RealNumber[] Exact(params Rational[] values) => [.. values.Select(RealNumber.Exact)];

    private static double Value(RoundedValue value) => BitConverter.UInt64BitsToDouble(value.Bits);
}
