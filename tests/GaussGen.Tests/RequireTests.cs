using System;
using Xunit;

namespace GaussGen.Tests;

public sealed class RequireTests
{
    [Theory]
    [InlineData(0.0)]
    [InlineData(double.Epsilon)]
    [InlineData(2.2250738585072014E-308)]
    [InlineData(1.0)]
    [InlineData(double.MaxValue)]
    public void A_finite_standard_deviation_that_is_not_negative_passes(double value) => Require.StandardDeviation(value);

    [Theory]
    [InlineData(0.0f)]
    [InlineData(float.Epsilon)]
    [InlineData(1.0f)]
    [InlineData(float.MaxValue)]
    public void The_same_holds_for_single_precision(float value) => Require.StandardDeviation(value);

    [Fact]
    public void Minus_zero_is_zero()
    {
        Require.StandardDeviation(-0.0);
        Require.StandardDeviation(-0.0f);
        Require.Scale(-0.0);
        Require.Scale(-0.0f);
    }

    [Theory]
    [InlineData(-double.Epsilon)]
    [InlineData(-1.0)]
    [InlineData(double.MinValue)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void Anything_else_is_refused_with_advice(double value)
    {
        ArgumentOutOfRangeException refusal =
            Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => Require.StandardDeviation(value));
        Assert.Equal(value, refusal.ActualValue);
        Assert.Contains("must be finite and not negative. Pass 0 for", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(-float.Epsilon)]
    [InlineData(-1.0f)]
    [InlineData(float.MinValue)]
    [InlineData(float.NaN)]
    [InlineData(float.PositiveInfinity)]
    [InlineData(float.NegativeInfinity)]
    public void Anything_else_is_refused_in_single_precision(float value)
    {
        ArgumentOutOfRangeException refusal =
            Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => Require.StandardDeviation(value));
        Assert.Equal(value, refusal.ActualValue);
        Assert.Contains("must be finite and not negative. Pass 0 for", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(double.Epsilon)]
    [InlineData(double.MaxValue)]
    public void A_finite_scale_that_is_not_negative_passes(double value)
    {
        Require.Scale(value);
        Require.Scale(value > 1.0 ? float.MaxValue : (float)value);
    }

    [Theory]
    [InlineData(-double.Epsilon)]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void Any_other_scale_is_refused_with_advice(double value)
    {
        ArgumentOutOfRangeException refusal = Assert.Throws<ArgumentOutOfRangeException>("scale", () => Require.Scale(value));
        Assert.Equal(value, refusal.ActualValue);
        Assert.Contains("must be finite and not negative. Pass 0 for", refusal.Message, StringComparison.Ordinal);
        float single = value > -1.0 && value < 0.0 ? -float.Epsilon : (float)value;
        refusal = Assert.Throws<ArgumentOutOfRangeException>("scale", () => Require.Scale(single));
        Assert.Equal(single, refusal.ActualValue);
    }

    [Fact]
    public void A_NaN_with_any_payload_is_refused()
    {
        double signalling = BitConverter.Int64BitsToDouble(0x7FF0_0000_0000_0001);
        double negative = BitConverter.Int64BitsToDouble(unchecked((long)0xFFF8_0000_0000_0007));
        Assert.Throws<ArgumentOutOfRangeException>(() => Require.StandardDeviation(signalling));
        Assert.Throws<ArgumentOutOfRangeException>(() => Require.StandardDeviation(negative));
    }
}
