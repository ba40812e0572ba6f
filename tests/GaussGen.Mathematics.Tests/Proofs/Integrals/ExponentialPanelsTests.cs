using System;
using System.Linq;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs.Integrals;

public class ExponentialPanelsTests
{
    /// <summary>∫ xᵏ exp(−Σ cⱼ x²ʲ) dx from 0 to ∞.</summary>
    public static TheoryData<double[], int, string> Known => new()
    {
        // 2Γ(5/4) and the Bessel-function form of the double well, halved; see the rules' outside checks for their sources.
        { [0, 1], 0, "0.9064024770554770779826712889669180007488" },
        { [-2, 0.5], 0, "7.37182004903760471961248429672651562545" },
        // mpmath's quadrature at 60 digits.
        { [1], 3, "0.5000000000000000000000000000000000000000" },
        { [-10, 1], 0, "28762182547.4720637064112300903691888806" },
        { [-10, 1], 9, "44716735900532.75019888292153003947043301" },
        { [-40, 1], 0, "1.035206025728344980428315792079519967791e+173" },
        { [1, 0, 0.1], 64, "279724465723839.1692512271043305907656316" },
        { [0, 1], 200, "4.036191178103110293981109433733930422109e+62" },
    };

    [Theory]
    [MemberData(nameof(Known))]
    public void Integrals_have_their_known_values(double[] coefficients, int order, string expected)
    {
        foreach (int precision in new[] { 64, 128, 300 })
        {
            Ball value = Enclose(coefficients, [order], precision)[0];
            (Rational low, Rational high) = DecimalText.Interval(expected);
            Assert.True(value.Lower.ToRational() <= high && low <= value.Upper.ToRational(), value + " at " + precision);
            Assert.InRange(value.RelativeAccuracyBits, precision, int.MaxValue);
        }
    }

    [Fact]
    public void Integration_by_parts_holds()
    {
        // (k+1) I_k = Σ 2j cⱼ I_(k+2j), a relation that the method does not use.
        Gen.Select(Gen.Double[-30, 30], Gen.Double[-8, 8], Gen.Double[0.01, 4], Gen.Int[0, 25]).Sample(
            (first, second, third, k) =>
            {
                double[] coefficients = [first, second, third];
                Ball[] values = Enclose(coefficients, [k, k + 2, k + 4, k + 6], 80);
                Ball sum = Ball.Multiply(Ball.FromInteger(-(k + 1)), values[0], 200);
                for (int j = 1; j <= 3; j++)
                {
                    Ball factor = Ball.Multiply(Ball.FromInteger(2 * j), Exactly(coefficients[j - 1]), 200);
                    sum = Ball.Add(sum, Ball.Multiply(factor, values[j], 200), 200);
                }

                Assert.True(sum.ContainsZero);
                Assert.All(values, value => Assert.InRange(value.RelativeAccuracyBits, 80, 1000));
            },
            iter: 30);
    }

    [Fact]
    public void Widely_different_coefficients_are_no_hindrance()
    {
        // Without the quartic part the integral is √π/2 · c^(−1/2); with it, less by one part in 10^900 or so.
        Ball narrow = Enclose([1e300, 1e-300], [0], 100)[0];
        Ball expected = Ball.Divide(Constants.SqrtPi(200), Ball.Sqrt(Exactly(1e300), 200), 200).ScaleByPowerOfTwo(-1);
        Assert.True(narrow.Contains(expected));
        Assert.InRange(narrow.RelativeAccuracyBits, 100, 1000);

        // Scaled by x → 2^100 x, the double well's integral is 2^−100 times as large.
        Ball scaled = Enclose([-2 * Math.Pow(2, 200), 0.5 * Math.Pow(2, 400)], [0], 100)[0].ScaleByPowerOfTwo(100);
        Ball plain = Enclose([-2, 0.5], [0], 100)[0];
        Assert.True(Ball.Subtract(scaled, plain, 200).ContainsZero);
        Assert.InRange(scaled.RelativeAccuracyBits, 100, 1000);
    }

    [Fact]
    public void A_well_too_deep_for_the_method_is_left_open() =>
        Assert.All(Enclose([-1e30, 1], [0, 3], 64), value => Assert.False(value.IsFinite));

    [Fact]
    public void Cancellation_is_heard()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();
        Assert.ThrowsAny<OperationCanceledException>(
            () => ExponentialPanels.Enclose([new Dyadic(1, 0)], [0], 64, source.Token));
    }

    private static Ball[] Enclose(double[] coefficients, int[] orders, int precision) =>
        ExponentialPanels.Enclose([.. coefficients.Select(Estimate.Exactly)], orders, precision, CancellationToken.None);

    private static Ball Exactly(double value) => Ball.FromDyadic(Estimate.Exactly(value));
}
