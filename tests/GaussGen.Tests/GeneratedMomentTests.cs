using System;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Moments that were generated while this project was compiled.</summary>
public sealed class GeneratedMomentTests
{
    [Fact]
    public void Moments_that_are_binary_fractions_are_those_fractions()
    {
        // E Xᵏ by the recurrence m(k+1) = μ m(k) + k σ² m(k−1): for μ = 3/2 and σ² = 1/16 it is exact up to order 8.
        double[] raw = new double[9];
        raw[0] = 1.0;
        raw[1] = 1.5;
        for (int k = 1; k < 8; k++)
        {
            raw[k + 1] = (1.5 * raw[k]) + (k * 0.0625 * raw[k - 1]);
        }

        Assert.Equal(raw, Wind.Raw.ToArray());
        Assert.Equal([1.0, 0.0, 0.0625, 0.0, 3.0 / 256.0, 0.0, 15.0 / 4096.0, 0.0, 105.0 / 65536.0], Wind.Central.ToArray());
        for (int order = 0; order <= 8; order += 2)
        {
            Assert.Equal(Wind.Central[order], Wind.Absolute[order]);
        }
    }

    [Fact]
    public void Odd_absolute_moments_are_those_of_the_half_normal_distribution()
    {
        // E |X − μ|ᵏ = σᵏ √(2/π) (k − 1)!! for odd k.
        double unit = Math.Sqrt(2.0 / Math.PI);
        double[] doubleFactorials = [1.0, 2.0, 8.0, 48.0];
        for (int i = 0; i < doubleFactorials.Length; i++)
        {
            int order = (2 * i) + 1;
            double expected = Math.Pow(0.25, order) * unit * doubleFactorials[i];
            Assert.InRange(Wind.Absolute[order], expected * (1.0 - 1e-15), expected * (1.0 + 1e-15));
        }
    }

    [Fact]
    public void The_constants_are_the_entries_of_the_spans()
    {
        Assert.Equal([Wind.Raw0, Wind.Raw1, Wind.Raw2, Wind.Raw3, Wind.Raw4], Wind.Raw[..5].ToArray());
        Assert.Equal([Wind.Raw5, Wind.Raw6, Wind.Raw7, Wind.Raw8], Wind.Raw[5..].ToArray());
        Assert.Equal((Wind.Central2, Wind.Central8), (Wind.Central[2], Wind.Central[8]));
        Assert.Equal((Wind.Absolute1, Wind.Absolute7), (Wind.Absolute[1], Wind.Absolute[7]));
        const double known = Wind.Raw2;
        Assert.Equal(2.3125, known);
    }

    [Fact]
    public void Single_precision_moments_are_the_nearest_floats()
    {
        // μ = −1/2, σ = 2: 1, −1/2, 17/4, −49/8.
        Assert.Equal([1.0f, -0.5f, 4.25f, -6.125f], DriftSingle.Raw.ToArray());
        Assert.Equal([1.0f, 0.0f, 4.0f, 0.0f], DriftSingle.Central.ToArray());
        double unit = Math.Sqrt(2.0 / Math.PI);
        Assert.Equal([1.0f, (float)(2.0 * unit), 4.0f, (float)(16.0 * unit)], DriftSingle.Absolute.ToArray());
        Assert.Equal(0, BitConverter.SingleToInt32Bits(DriftSingle.Central3));
    }

    [Fact]
    public void A_rule_and_the_moments_of_the_same_distribution_agree()
    {
        for (int order = 0; order <= 8; order++)
        {
            int power = order;
            double expected = Wind.Raw[order];
            Assert.Equal(expected, Seven.Expectation(1.5, 0.25, x => Math.Pow(x, power)), 4e-15 * expected);
        }
    }
}
