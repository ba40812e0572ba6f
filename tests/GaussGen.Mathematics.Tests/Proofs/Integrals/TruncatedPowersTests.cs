using System;
using System.Numerics;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Integrals;

public class TruncatedPowersTests
{
    /// <summary>∫ yᵏ exp(−cy − y²/2) dy from 0 to the length, by mpmath's quadrature at 60 digits; a length of 0 stands for ∞.</summary>
    public static TheoryData<double, double, int, string> ByQuadrature => new()
    {
        { 0, 0, 0, "1.253314137315500251207882642405522626503" },
        { 8, 0, 0, "0.1231319632579322962821807435171990762806" },
        { 8, 0, 5, "0.0003404925092829068743003982975087286965721" },
        { -3, 0, 2, "2256.348962203491205793972827414729586228" },
        { 38, 0, 1, "0.0006910869783873536518035845911733232097505" },
        { 2.5, 0.75, 3, "0.01581166532593097035780773151743408284742" },
        { -1.5, 4, 20, "47136802492.15108086854655126216724315969" },
        // By thirteen terms of the Taylor series; quadrature has too few digits here.
        { 5, 1.0 / (1L << 40), 4, "1.244603055567511841908599389115719592475e-61" },
    };

    [Theory]
    [MemberData(nameof(ByQuadrature))]
    public void Integrals_are_those_of_quadrature(double slope, double length, int power, string expected)
    {
        Ball? end = length == 0 ? null : Exactly(length);
        foreach (int precision in new[] { 64, 100, 400 })
        {
            Ball value = TruncatedPowers.OneSided(Exactly(slope), end, power + 1, precision, default)[power];
            (Rational low, Rational high) = DecimalText.Interval(expected);
            Assert.True(value.Lower.ToRational() <= high && low <= value.Upper.ToRational(), value + " at " + precision);
            Assert.InRange(value.RelativeAccuracyBits, precision, int.MaxValue);
        }
    }

    [Fact]
    public void The_half_line_has_the_gamma_functions_values()
    {
        // ∫ x^(2j+1) exp(−x²/2) dx = 2ʲ j! from 0 to ∞, DLMF 5.9.1.
        Ball[] values = TruncatedPowers.OneSided(default, null, 202, 128, default);
        BigInteger expected = 1;
        for (int j = 0; j <= 100; j++)
        {
            Assert.True(values[(2 * j) + 1].Contains(new Dyadic(expected, 0)));
            Assert.InRange(values[(2 * j) + 1].RelativeAccuracyBits, 128, 1000);
            expected *= 2 * (j + 1);
        }
    }

    [Fact]
    public void Integration_by_parts_holds()
    {
        // (k+1) I_k = L^(k+1) exp(−cL − L²/2) + c I_(k+1) + I_(k+2), a relation that the method does not use.
        Gen.Select(Gen.Double[-12, 40], Gen.Double[0.001, 30], Gen.Int[0, 40]).Sample(
            (slope, length, k) =>
            {
                Ball c = Exactly(slope), end = Exactly(length);
                Ball[] values = TruncatedPowers.OneSided(c, end, k + 3, 90, default);
                Ball exponent = Ball.Add(Ball.Multiply(c, end, 200), Ball.Square(end, 200).ScaleByPowerOfTwo(-1), 200);
                Ball edge = Ball.Multiply(Ball.Pow(end, k + 1, 200), Elementary.Exp(Ball.Negate(exponent), 200), 200);
                Ball right = Ball.Add(Ball.Add(edge, values[k + 2], 200), Ball.Multiply(c, values[k + 1], 200), 200);
                Ball difference = Ball.Subtract(Ball.Multiply(Ball.FromInteger(k + 1), values[k], 200), right, 200);
                Assert.True(difference.ContainsZero);
                Assert.All(values, value => Assert.InRange(value.RelativeAccuracyBits, 90, 1000));
            },
            iter: 60);
    }

    [Fact]
    public void Both_sides_together_are_the_whole_line()
    {
        // ∫ (x − c)ᵏ exp((c² − x²)/2) dx over the line is exp(c²/2) √(2π) E (Z − c)ᵏ: with c = 3 and k = 2, 10 exp(9/2) √(2π).
        Ball value = TruncatedPowers.About(Ball.FromInteger(3), null, null, 3, 128, default)[2];
        Ball factor = Ball.Multiply(Constants.SqrtPi(200), Constants.Sqrt2(200), 200);
        Ball expected = Ball.Multiply(
            Elementary.Exp(Ball.FromDyadic(new Dyadic(9, -1)), 200), Ball.Multiply(Ball.FromInteger(10), factor, 200), 200);
        Assert.True(value.Contains(expected));
        Assert.InRange(value.RelativeAccuracyBits, 120, 1000);

        Ball[] odd = TruncatedPowers.About(default, Ball.FromInteger(2), Ball.FromInteger(2), 6, 128, default);
        Assert.True(odd[5].ContainsZero && odd[5].Radius < Bound.PowerOfTwo(-100));
    }

    [Fact]
    public void An_empty_side_gives_zero_and_an_uncertain_argument_an_uncertain_value()
    {
        Assert.All(TruncatedPowers.OneSided(Ball.FromInteger(7), default(Ball), 4, 64, default), value => Assert.True(value.IsZero == Trilean.True));
        Ball vague = Ball.FromInteger(2).Enlarge(Bound.PowerOfTwo(-20));
        Ball value = TruncatedPowers.OneSided(vague, null, 1, 128, default)[0];
        foreach (double slope in new[] { 2 - Math.Pow(2, -20), 2 + Math.Pow(2, -20) })
        {
            Assert.True(value.Contains(TruncatedPowers.OneSided(Exactly(slope), null, 1, 128, default)[0]));
        }
    }

    [Theory]
    [InlineData(1e300)]
    [InlineData(1e10)]
    public void A_steep_density_is_an_exponential_one(double slope)
    {
        // ∫ y exp(−cy − y²/2) dy = c⁻² (1 − 6/c² …) for large c, by the asymptotic series of DLMF 7.12.1.
        Ball value = Ball.Multiply(
            TruncatedPowers.OneSided(Exactly(slope), null, 2, 128, default)[1], Ball.Square(Exactly(slope), 200), 200);
        Assert.InRange(value.RelativeAccuracyBits, 100, 1000);
        Assert.True(Ball.Subtract(value, Ball.FromInteger(1), 200).Upper <= Dyadic.Zero + new Dyadic(1, -100));
        Assert.True(Dyadic.Abs(Ball.Subtract(value, Ball.FromInteger(1), 200).Lower) < new Dyadic(1, -60));
    }

    [Fact]
    public void Cancellation_is_heard()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();
        Assert.ThrowsAny<OperationCanceledException>(() => TruncatedPowers.OneSided(default, null, 2, 64, source.Token));
    }

    private static Ball Exactly(double value) => Ball.FromDyadic(Estimate.Exactly(value));
}
