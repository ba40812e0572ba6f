using System;
using System.Linq;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Hermite;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>Guesses may be as wrong as they like: they are refused, or the table is the same.</summary>
public class HermiteGuessTests
{
    private static readonly Gen<int> PointCount = Gen.OneOf(Gen.Int[3, 12], Gen.Int[13, 90]);

    private static readonly Gen<double> Relative = Gen.Double[-14, Math.Log10(0.3)].Select(Gen.Bool, (power, isDown) => (isDown ? -1 : 1) * Math.Pow(10, power));

    [Fact]
    public void A_wrong_guess_gives_the_same_table()
    {
        int refused = 0, proven = 0;
        Gen.Select(PointCount, Relative, Gen.Int[0, 1000], Gen.Bool, Gen.Int[0, 1]).Sample(
            (points, error, which, isOne, convention) =>
            {
                double[] guesses = HermiteGuess.PositiveZeros(points, CancellationToken.None);
                for (int i = 0; i < guesses.Length; i++)
                {
                    guesses[i] *= isOne && i != which % guesses.Length ? 1 : 1 + error;
                }

                bool isProven = AssertSameTable(points, (HermiteConvention)convention, guesses);
                _ = isProven ? Interlocked.Increment(ref proven) : Interlocked.Increment(ref refused);
            },
            iter: 400,
            seed: "0000KOIkZAB3");
        // The sample must have seen both ends.
        Assert.True(proven > 40 && refused > 40, $"{proven} proven, {refused} refused");
    }

    [Theory]
    [InlineData(200, 1e-9)]
    [InlineData(1000, 1e-12)]
    [InlineData(1000, 1e-10)]
    [InlineData(1000, 1e-3)]
    public void A_wrong_guess_gives_the_same_large_table(int points, double error)
    {
        double[] guesses = HermiteGuess.PositiveZeros(points, CancellationToken.None);
        _ = AssertSameTable(points, HermiteConvention.Physicist, guesses.Select((guess, i) => guess * (1 + (i % 2 == 0 ? error : -error))).ToArray());
    }

    [Fact]
    public void Nonsense_is_refused_and_gives_the_same_table()
    {
        const int Points = 11;
        double[] good = HermiteGuess.PositiveZeros(Points, CancellationToken.None);
        double[][] nonsense =
        [
            [.. good.Select(_ => double.NaN)],
            [.. good.Select(_ => double.PositiveInfinity)],
            [.. good.Select(guess => -guess)],
            [.. good.Select(_ => 0.0)],
            [.. good.Select(_ => good[0])],
            [.. good.Reverse()],
            [good[0], good[1], good[1], good[3], good[4]],
            [good[0], good[1], good[2], good[3]],
            [good[0], good[1], good[2], good[3], good[4], good[4] + 1],
            [good[0], good[1], good[2], good[3], 1e300],
            [5e-324, good[1], good[2], good[3], good[4]],
            [good[0], good[1], good[2], good[3], 64],
        ];
        foreach (double[] guesses in nonsense)
        {
            Assert.False(AssertSameTable(Points, HermiteConvention.Probabilist, guesses));
        }

        Assert.True(AssertSameTable(Points, HermiteConvention.Probabilist, good));
    }

    [Fact]
    public void Guesses_without_elementary_functions_are_proven_for_every_size()
    {
        foreach (int points in Enumerable.Range(1, 130).Concat([256, 601, 1000]))
        {
            double[] guesses = HermiteIsolation.PositiveZeros(points, CancellationToken.None);
            Assert.NotNull(HermiteZeros.TryProve(points, HermiteConvention.Probabilist, guesses, CancellationToken.None));
        }
    }

    [Fact]
    public void The_slow_road_gives_the_bits_of_the_fast_one()
    {
        foreach (int points in new[] { 1, 2, 3, 4, 5, 10, 31, 64, 150, 377, 1000 })
        {
            foreach (HermiteConvention convention in HermiteOracle.Conventions)
            {
                RuleTable table = GaussHermite.Construct(points, convention, CancellationToken.None);
                int stride = points > 400 ? 5 : 1;
                foreach (BinaryFormat format in HermiteOracle.Formats)
                {
                    for (int i = points / 2; i < points; i += stride)
                    {
                        AssertSameBits(table.Nodes[i], format);
                        AssertSameBits(table.Weights[i], format);
                    }
                }
            }
        }
    }

    [Fact]
    public void Width_of_an_enclosure_does_not_depend_on_the_guess()
    {
        double[] guesses = HermiteGuess.PositiveZeros(40, CancellationToken.None);
        RuleTable table = GaussHermite.Construct(40, HermiteConvention.Physicist, guesses, CancellationToken.None);
        RuleTable other = GaussHermite.Construct(40, HermiteConvention.Physicist, guesses.Select(x => x + 2e-8).ToArray(), CancellationToken.None);
        for (int i = 0; i < 40; i++)
        {
            foreach ((RealNumber one, RealNumber two) in new[] { (table.Nodes[i], other.Nodes[i]), (table.Weights[i], other.Weights[i]) })
            {
                Assert.Equal(one.FirstEnclosure!.Value.RadiusUnits, two.FirstEnclosure!.Value.RadiusUnits);
                Assert.Equal(one.Enclose(200, CancellationToken.None).Radius, two.Enclose(200, CancellationToken.None).Radius);
            }
        }
    }

    private static void AssertSameBits(RealNumber value, BinaryFormat format)
    {
        ulong fast = Rounding.Nearest(value, format, CancellationToken.None).Bits;
        RealNumber slow = RealNumber.FromEnclosures(value.Enclose);
        Assert.Equal(fast, Rounding.Nearest(slow, format, CancellationToken.None).Bits);
    }

    /// <summary>Compares with the table from the good guesses; tells whether the given ones were proven at once.</summary>
    private static bool AssertSameTable(int points, HermiteConvention convention, double[] guesses)
    {
        RuleTable expected = GaussHermite.Construct(points, convention, CancellationToken.None);
        RuleTable table = GaussHermite.Construct(points, convention, guesses, CancellationToken.None);
        RoundedRule expectedRule = RuleRounding.Round(expected, BinaryFormat.Binary64, false, CancellationToken.None);
        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary64, false, CancellationToken.None);
        Assert.Equal(expectedRule.Nodes, rule.Nodes);
        Assert.Equal(expectedRule.Weights, rule.Weights);
        return HermiteZeros.TryProve(points, convention, guesses, CancellationToken.None) is not null;
    }
}
