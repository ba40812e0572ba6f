using System.Collections.Generic;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

public class GaussHermiteNodeTests
{
    public static TheoryData<HermiteConvention, string> Tables()
    {
        var data = new TheoryData<HermiteConvention, string>();
        foreach (HermiteConvention convention in HermiteOracle.Conventions)
        {
            foreach (BinaryFormat format in HermiteOracle.Formats)
            {
                data.Add(convention, format.Name);
            }
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Tables))]
    public void The_polynomial_changes_sign_between_the_ends_of_every_rounding_interval(HermiteConvention convention, string formatName)
    {
        BinaryFormat format = formatName == "binary64" ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
        foreach (int points in HermiteOracle.Sizes)
        {
            IReadOnlyList<RoundedValue> nodes = HermiteOracle.Round(points, convention, format).Nodes;
            Assert.Equal(points, nodes.Count);
            // Above 500 nodes a sign costs milliseconds: every 25th, and the outermost ones. Otherwise n/2 changes of sign on
            // disjoint intervals prove every node of the rule.
            int stride = points > 500 ? 25 : 1;
            ulong before = 0;
            for (int i = (points + 1) / 2; i < points; i++)
            {
                ulong bits = nodes[i].Bits;
                Assert.True(bits > before && format.IsFinite(bits), $"node {i} of {points} is not above the one before");
                before = bits;
                if (i % stride == 0 || i >= points - 3)
                {
                    AssertNearest(points, convention, format, bits);
                }

                Assert.Equal(format.Negate(bits), nodes[points - 1 - i].Bits);
            }

            Assert.True(points % 2 == 0 || nodes[points / 2].Bits == 0, "the centre node must be +0");
        }
    }

    [Fact]
    public void The_exact_signs_refuse_a_neighbour_of_the_nearest_number()
    {
        // The check above must be able to fail: one unit off and there is no change of sign.
        foreach (int points in new[] { 3, 8, 51, 200 })
        {
            ulong bits = HermiteOracle.Round(points, HermiteConvention.Physicist, BinaryFormat.Binary64).Nodes[points - 1].Bits;
            foreach (ulong other in new[] { bits - 1, bits + 1 })
            {
                (Dyadic lower, Dyadic upper) = BinaryFormat.Binary64.RoundingInterval(other);
                Assert.True(HermiteOracle.Sign(points, HermiteConvention.Physicist, lower)
                    * HermiteOracle.Sign(points, HermiteConvention.Physicist, upper) > 0);
            }
        }
    }

    private static void AssertNearest(int points, HermiteConvention convention, BinaryFormat format, ulong bits)
    {
        (Dyadic lower, Dyadic upper) = format.RoundingInterval(bits);
        int below = HermiteOracle.Sign(points, convention, lower), above = HermiteOracle.Sign(points, convention, upper);
        if (below * above < 0)
        {
            return;
        }

        // He₂ has the zero 1 itself, which no interval needs to straddle.
        Assert.True(
            HermiteOracle.Sign(points, convention, format.ValueOf(bits)) == 0,
            $"{HermiteOracle.ToDouble(bits):R} is not the {format.Name} nearest to a zero, n = {points}, {convention}");
    }
}
