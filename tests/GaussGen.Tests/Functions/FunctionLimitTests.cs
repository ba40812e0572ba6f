using System;
using GaussGen.Functions.Measuring;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>Infinities, NaN, signed zeros, symmetry, and arguments outside a function's domain.</summary>
public sealed class FunctionLimitTests
{
    private const double Infinity = double.PositiveInfinity;

    [Fact]
    public void The_ends_have_the_limits()
    {
        AssertEnds(ErrorFunction.Erf, ErrorFunction.Erf, -1.0, 1.0);
        AssertEnds(ErrorFunction.Erfc, ErrorFunction.Erfc, 2.0, 0.0);
        AssertEnds(ErrorFunction.ErfcScaled, ErrorFunction.ErfcScaled, Infinity, 0.0);
        AssertEnds(NormalDistribution.Density, NormalDistribution.Density, 0.0, 0.0);
        AssertEnds(NormalDistribution.LogDensity, NormalDistribution.LogDensity, -Infinity, -Infinity);
        AssertEnds(NormalDistribution.Cumulative, NormalDistribution.Cumulative, 0.0, 1.0);
        AssertEnds(NormalDistribution.UpperTail, NormalDistribution.UpperTail, 1.0, 0.0);
        AssertEnds(NormalDistribution.LogCumulative, NormalDistribution.LogCumulative, -Infinity, 0.0);
        Assert.True(double.IsNaN(ErrorFunction.Inverse(double.NaN)) && float.IsNaN(ErrorFunction.Inverse(float.NaN)));
        Assert.True(double.IsNaN(NormalDistribution.Quantile(double.NaN)) && float.IsNaN(NormalDistribution.Quantile(float.NaN)));
    }

    [Fact]
    public void The_inverses_end_in_infinities_and_refuse_what_lies_beyond()
    {
        Assert.Equal(-Infinity, NormalDistribution.Quantile(0.0));
        Assert.Equal(-Infinity, NormalDistribution.Quantile(-0.0));
        Assert.Equal(Infinity, NormalDistribution.Quantile(1.0));
        Assert.Equal(float.NegativeInfinity, NormalDistribution.Quantile(0.0f));
        Assert.Equal(float.PositiveInfinity, NormalDistribution.Quantile(1.0f));
        Assert.Equal(Infinity, ErrorFunction.Inverse(1.0));
        Assert.Equal(-Infinity, ErrorFunction.Inverse(-1.0));
        Assert.Equal(float.PositiveInfinity, ErrorFunction.Inverse(1.0f));
        foreach (double p in new[] { -double.Epsilon, Math.BitIncrement(1.0), -1.0, 2.0, Infinity, -Infinity })
        {
            Assert.Equal("p", Assert.Throws<ArgumentOutOfRangeException>(() => NormalDistribution.Quantile(p)).ParamName);
        }

        foreach (double y in new[] { Math.BitDecrement(-1.0), Math.BitIncrement(1.0), Infinity, -Infinity })
        {
            Assert.Equal("y", Assert.Throws<ArgumentOutOfRangeException>(() => ErrorFunction.Inverse(y)).ParamName);
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => NormalDistribution.Quantile(1.0000001f));
        Assert.Throws<ArgumentOutOfRangeException>(() => ErrorFunction.Inverse(-1.0000001f));
    }

    [Fact]
    public void Zero_keeps_its_sign_where_the_function_is_odd()
    {
        AssertBits(0.0, ErrorFunction.Erf(0.0));
        AssertBits(-0.0, ErrorFunction.Erf(-0.0));
        AssertBits(0.0, ErrorFunction.Inverse(0.0));
        AssertBits(-0.0, ErrorFunction.Inverse(-0.0));
        AssertBits(0.0, NormalDistribution.Quantile(0.5));
        foreach (double zero in new[] { 0.0, -0.0 })
        {
            AssertBits(1.0, ErrorFunction.Erfc(zero));
            AssertBits(1.0, ErrorFunction.ErfcScaled(zero));
            AssertBits(0.5, NormalDistribution.Cumulative(zero));
            AssertBits(0.5, NormalDistribution.UpperTail(zero));
        }
    }

    [Fact]
    public void Zero_is_positive_where_a_result_vanishes()
    {
        AssertBits(0.0, ErrorFunction.Erfc(30.0));
        AssertBits(0.0, NormalDistribution.Density(-50.0));
        AssertBits(0.0, NormalDistribution.Cumulative(-50.0));
        AssertBits(0.0, NormalDistribution.LogCumulative(38.7));
        AssertBits(0.0, NormalDistribution.LogCumulative(Infinity));
        AssertBits(0.0, NormalDistribution.IntervalProbability(1.0, 1.0));
        AssertBits(0.0, NormalDistribution.IntervalProbability(60.0, 70.0));
    }

    [Fact]
    public void Mirrored_arguments_give_mirrored_results_bit_for_bit()
    {
        var random = new Sequence(3);
        for (int i = 0; i < 20_000; i++)
        {
            double x = 40.0 * random.Next() * random.Next();
            double y = x + (3.0 * random.Next());
            double p = random.Next();
            AssertBits(-ErrorFunction.Erf(x), ErrorFunction.Erf(-x));
            AssertBits(-ErrorFunction.Inverse(p), ErrorFunction.Inverse(-p));
            AssertBits(NormalDistribution.Density(x), NormalDistribution.Density(-x));
            AssertBits(NormalDistribution.LogDensity(x), NormalDistribution.LogDensity(-x));
            AssertBits(NormalDistribution.Cumulative(x), NormalDistribution.UpperTail(-x));
            AssertBits(NormalDistribution.IntervalProbability(x, y), NormalDistribution.IntervalProbability(-y, -x));
        }
    }

    [Fact]
    public void An_interval_may_be_infinite_or_empty_but_not_upside_down()
    {
        AssertBits(1.0, NormalDistribution.IntervalProbability(-Infinity, Infinity));
        AssertBits(0.0, NormalDistribution.IntervalProbability(Infinity, Infinity));
        AssertBits(0.0, NormalDistribution.IntervalProbability(-Infinity, -Infinity));
        for (double x = -37.0; x < 37.0; x += 0.37)
        {
            Assert.InRange(NormalDistribution.IntervalProbability(-Infinity, x) / NormalDistribution.Cumulative(x), 1 - 5E-16, 1 + 5E-16);
            Assert.InRange(NormalDistribution.IntervalProbability(x, Infinity) / NormalDistribution.UpperTail(x), 1 - 5E-16, 1 + 5E-16);
        }

        Assert.True(double.IsNaN(NormalDistribution.IntervalProbability(double.NaN, 1.0)));
        Assert.True(double.IsNaN(NormalDistribution.IntervalProbability(1.0, double.NaN)));
        Assert.True(float.IsNaN(NormalDistribution.IntervalProbability(float.NaN, float.NaN)));
        Assert.Equal(
            "upper", Assert.Throws<ArgumentOutOfRangeException>(() => NormalDistribution.IntervalProbability(1.0, Math.BitDecrement(1.0))).ParamName);
        Assert.Throws<ArgumentOutOfRangeException>(() => NormalDistribution.IntervalProbability(Infinity, -Infinity));
        Assert.Throws<ArgumentOutOfRangeException>(() => NormalDistribution.IntervalProbability(1.0f, 0.0f));
    }

    private static void AssertEnds(Func<double, double> function, Func<float, float> single, double atMinus, double atPlus)
    {
        AssertBits(atMinus, function(-Infinity));
        AssertBits(atPlus, function(Infinity));
        AssertBits(atMinus, single(float.NegativeInfinity));
        AssertBits(atPlus, single(float.PositiveInfinity));
        Assert.True(double.IsNaN(function(double.NaN)));
        Assert.True(float.IsNaN(single(float.NaN)));
    }

    private static void AssertBits(double expected, double actual) =>
        Assert.Equal(BitConverter.DoubleToInt64Bits(expected), BitConverter.DoubleToInt64Bits(actual));
}
