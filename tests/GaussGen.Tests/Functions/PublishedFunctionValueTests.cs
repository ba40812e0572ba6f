using System;
using System.Globalization;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>
/// Printed tables. The values were recalled from memory and recomputed with mpmath at 40 digits; each is compared to
/// the digits that are given.
/// </summary>
public sealed class PublishedFunctionValueTests
{
    /// <summary>Abramowitz and Stegun 1964, table 7.1, error function to ten places.</summary>
    [Theory]
    [InlineData(0.1, "0.1124629160")]
    [InlineData(0.5, "0.5204998778")]
    [InlineData(1.0, "0.8427007929")]
    [InlineData(1.5, "0.9661051465")]
    [InlineData(2.0, "0.9953222650")]
    public void Error_function(double x, string printed) => AssertDigits(printed, ErrorFunction.Erf(x));

    /// <summary>Abramowitz and Stegun 1964, table 26.1, normal probability function to fifteen places.</summary>
    [Theory]
    [InlineData(0.5, "0.691462461274013")]
    [InlineData(1.0, "0.841344746068543")]
    [InlineData(2.0, "0.977249868051821")]
    [InlineData(3.0, "0.998650101968370")]
    public void Normal_probability(double x, string printed) => AssertDigits(printed, NormalDistribution.Cumulative(x));

    /// <summary>The same table's density.</summary>
    [Theory]
    [InlineData(0.0, "0.398942280401433")]
    [InlineData(1.0, "0.241970724519143")]
    [InlineData(2.0, "0.053990966513188")]
    public void Normal_density(double x, string printed) => AssertDigits(printed, NormalDistribution.Density(x));

    /// <summary>Percentage points as in Abramowitz and Stegun 1964, table 26.5 and 26.6.</summary>
    [Theory]
    [InlineData(0.975, "1.95996398")]
    [InlineData(0.95, "1.64485363")]
    [InlineData(0.995, "2.57582930")]
    [InlineData(0.999, "3.09023231")]
    public void Percentage_points(double p, string printed) => AssertDigits(printed, NormalDistribution.Quantile(p));

    /// <summary>NIST DLMF 7.4: erf and erfc of opposite numbers; DLMF 7.17.2: the inverse's first terms.</summary>
    [Fact]
    public void Identities()
    {
        for (double x = -5.0; x <= 5.0; x += 0.0625)
        {
            Assert.Equal(2.0, ErrorFunction.Erfc(x) + ErrorFunction.Erfc(-x), 1E-15);
            Assert.Equal(1.0, ErrorFunction.Erf(x) + ErrorFunction.Erfc(x), 1E-15);
        }

        // t + t^3/3 + 7 t^5/30 + 127 t^7/630 with t = √π y/2.
        double y = 0.01;
        double t = 0.5 * Math.Sqrt(Math.PI) * y;
        double series = t + (Math.Pow(t, 3) / 3) + (7 * Math.Pow(t, 5) / 30) + (127 * Math.Pow(t, 7) / 630);
        Assert.Equal(series, ErrorFunction.Inverse(y), 1E-17);
    }

    private static void AssertDigits(string printed, double actual)
    {
        double half = 0.5000001 * Math.Pow(10.0, -(printed.Length - printed.IndexOf('.', StringComparison.Ordinal) - 1));
        Assert.InRange(actual - double.Parse(printed, CultureInfo.InvariantCulture), -half, half);
    }
}
