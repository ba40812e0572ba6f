using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Tests.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Formats;

/// <summary>Ziv's loop: numbers next to the middle of two neighbours, what never enters the loop, and where it ends.</summary>
public class RoundingTests
{
    public static TheoryData<BinaryFormat> Formats => BinaryFormatTests.Formats;

    [Theory]
    [MemberData(nameof(Formats))]
    public void A_number_next_to_a_middle_is_decided_at_the_precision_that_it_needs(BinaryFormat format) =>
        Gen.Select(Numbers.Encoding(format), Gen.Int[1, 3000], Gen.Bool, Gen.Bool).Sample(
            (bits, depth, above, thirds) =>
            {
                (Dyadic lower, Dyadic upper) = format.RoundingInterval(bits);

                // Inside the interval by its width times 2^−depth/3 or /5, as a number that no ball holds exactly.
                Rational distance = (upper - lower).ToRational() / ((thirds ? 3 : 5) * (BigInteger.One << depth));
                Rational value = above ? lower.ToRational() + distance : upper.ToRational() - distance;
                var asked = new List<int>();
                RealNumber number = RealNumber.FromEnclosures((precision, _) =>
                {
                    asked.Add(precision);
                    return Ball.FromRational(value, precision);
                });
                RoundedValue rounded = Rounding.Nearest(number, format, CancellationToken.None);
                Assert.Equal(bits, rounded.Bits);

                // Doubled from 128, and no further than is needed.
                for (int i = 0; i < asked.Count; i++)
                {
                    Assert.Equal(128 << i, asked[i]);
                }

                Assert.True(asked[^1] == 128 || asked[^1] < 2 * (depth + format.Precision + 8));

                // A ball that reaches to the middle itself and no further decides for the even neighbour.
                Assert.True(asked[^1] >= depth - 4 || (bits & 1) == 0);
            },
            iter: 1_000);

    [Fact]
    public void A_middle_that_is_not_known_exactly_ends_with_an_error_that_names_the_limit()
    {
        // 1 + 2⁻⁵³, which lies half-way between 1 and its neighbour.
        var middle = new Ball((BigInteger.One << 53) + 1, -53, Bound.Zero);
        var asked = new List<int>();
        RealNumber number = RealNumber.FromEnclosures((precision, _) =>
        {
            asked.Add(precision);
            return middle.Enlarge(Bound.PowerOfTwo(-precision));
        });
        InvalidOperationException error = Assert.Throws<InvalidOperationException>(
            () => Rounding.Nearest(number, BinaryFormat.Binary64, CancellationToken.None));
        Assert.Contains("65536", error.Message, StringComparison.Ordinal);
        Assert.Contains("binary64", error.Message, StringComparison.Ordinal);
        Assert.Equal([128, 256, 512, 1024, 2048, 4096, 8192, 16384, 32768, 65536], asked);

        // The same number known exactly goes to the even neighbour.
        Assert.Equal(0x3ff0000000000000UL, Rounding.Nearest(RealNumber.Exact(middle.Center.ToRational()), BinaryFormat.Binary64, CancellationToken.None).Bits);
    }

    [Fact]
    public void An_exact_number_is_never_enclosed()
    {
        var number = new Given(exact: new Rational(1, 3), first: null, enclosure: null);
        RoundedValue rounded = Rounding.Nearest(number, BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal(BitConverter.DoubleToUInt64Bits(1.0 / 3.0), rounded.Bits);
        Assert.Equal(int.MinValue, rounded.EnclosureWidthLog2);
    }

    [Fact]
    public void A_fixed_size_enclosure_that_decides_is_taken_and_one_that_does_not_is_passed_over()
    {
        // 1 ± 2^−100, and 1 + 2⁻⁵³ ± 2^−127 with the number just above the middle.
        var clear = new FixedBall(1UL << 63, 0, -127, false, 1UL << 27);
        RoundedValue one = Rounding.Nearest(new Given(null, clear, null), BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal((0x3ff0000000000000UL, -47), (one.Bits, one.EnclosureWidthLog2));

        var unclear = new FixedBall((1UL << 63) + (1UL << 10), 0, -127, false, 1);
        var above = new Ball((((BigInteger.One << 53) + 1) << 100) + 1, -153, Bound.PowerOfTwo(-200));
        RoundedValue next = Rounding.Nearest(new Given(null, unclear, above), BinaryFormat.Binary64, CancellationToken.None);
        Assert.Equal((0x3ff0000000000001UL, -147), (next.Bits, next.EnclosureWidthLog2));
    }

    [Fact]
    public void A_cancelled_token_stops_the_loop()
    {
        using var source = new CancellationTokenSource();
        int count = 0;
        RealNumber number = RealNumber.FromEnclosures((_, token) =>
        {
            Assert.Equal(source.Token, token);
            count++;
            source.Cancel();
            return Ball.WholeLine;
        });
        Assert.Throws<OperationCanceledException>(() => Rounding.Nearest(number, BinaryFormat.Binary64, source.Token));
        Assert.Equal(1, count);
        Assert.Throws<OperationCanceledException>(() => Rounding.Nearest(RealNumber.Exact(1), BinaryFormat.Binary64, source.Token));
    }

    private sealed class Given(Rational? exact, FixedBall? first, Ball? enclosure) : RealNumber
    {
        public override Rational? ExactValue => exact;

        public override FixedBall? FirstEnclosure => first;

        public override Ball Enclose(int precision, CancellationToken cancellation) =>
            enclosure ?? throw new InvalidOperationException("No ball was needed.");
    }
}
