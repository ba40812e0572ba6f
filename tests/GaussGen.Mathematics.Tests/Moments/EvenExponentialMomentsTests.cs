using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class EvenExponentialMomentsTests
{
    private const int Precision = 220;

    [Theory]
    [InlineData(0.0)]
    [InlineData(1.0)]
    [InlineData(-2.0)]
    [InlineData(-3.5)]
    [InlineData(4.0)]
    public void Moments_of_a_quartic_are_the_power_series_in_the_quadratic_coefficient(double a)
    {
        // ∫ |x|^k exp(−ax² − x⁴) dx = ½ Σ (−a)ⁿ/n! Γ((2n + k + 1)/4), term by term from ∫₀^∞ t^(z−1) e^−t dt = Γ(z) (NIST DLMF 5.2.1); for a < 0 a
        // double well. With a = 0 and k = 0 it is 2Γ(5/4).
        const int Order = 8;
        MomentTable table = Construct(Order, a, 1);
        Ball mass = Series(a, 0);
        for (int k = 1; k <= Order; k++)
        {
            Ball expected = Ball.Divide(Series(a, k), mass, Precision);
            Ball moment = table.Absolute[k].ExactValue is { } exact ? Ball.FromRational(exact, 200) : table.Absolute[k].Enclose(160, default);
            Assert.True(Ball.Subtract(expected, moment, Precision).ContainsZero, $"order {k}: {moment} is not {expected}");
            Assert.True(expected.RelativeAccuracyBits > 120 && moment.RelativeAccuracyBits >= 155);
        }
    }

    public static TheoryData<double[]> Weights() =>
    [
        [0, 1], [-2, 0.5], [1, 0, 0.1], [-10, 1], [0.1, 0.2, 0.3, 0.4], [3, -2, 0.3], [1, 1e-12], [1e10, 1e-300], [-40, 1], [1e-300, 1e300],
        [1, 1, 1, 1, 1, 1, 1, 1], [-1, 2, -3, 4, -5, 6, -7, 8], [0.5], [1e300], [-1e-3, 0, 0, 1e-9],
    ];

    [Theory]
    [MemberData(nameof(Weights))]
    public void Moments_satisfy_integration_by_parts(double[] c)
    {
        // ∫₀^∞ (xᵏ⁺¹ e^−p)′ dx = 0 for k ≥ 0: (k+1) E|X|ᵏ = Σ 2j cⱼ E|X|ᵏ⁺²ʲ. For k = −1 the left side is what e^−p is at 0, over half the
        // normalising integral: Σ 2j cⱼ E|X|²ʲ⁻¹ ∫ e^−p = 2.
        const int Order = 40;
        MomentTable table = Construct(Order, c);
        var rule = new GaussEvenExponentialRequest(1, new ValueList(c), BinaryFormat.Binary64, false);
        Ball integral = rule.Construct(default).Constants[0].Value.Enclose(300, default);
        for (int k = -1; k + (2 * c.Length) <= Order; k++)
        {
            Ball sum = k < 0
                ? Ball.Divide(Ball.FromInteger(-2), integral, 400)
                : Ball.Multiply(Value(table, k), Ball.FromInteger(-(k + 1)), 400);
            for (int j = 1; j <= c.Length; j++)
            {
                Ball factor = Ball.FromRational(2 * j * Rational.FromDouble(c[j - 1]), 400);
                sum = Ball.Add(sum, Ball.Multiply(factor, Value(table, k + (2 * j)), 400), 400);
            }

            Assert.True(sum.ContainsZero, $"order {k}: {sum}");
            Assert.True(k < 0 || Value(table, k).RelativeAccuracyBits >= 300);
        }
    }

    [Theory]
    [MemberData(nameof(Weights))]
    public void The_highest_order_is_reached(double[] c)
    {
        RoundedMoments moments = MomentRounding.Round(Construct(EvenExponentialMomentsRequest.LargestOrder, c), BinaryFormat.Binary64, default);
        double[] absolute = [.. moments.Absolute.Select(value => BitConverter.UInt64BitsToDouble(value.Bits))];
        Assert.Equal(101, absolute.Length);
        Assert.Equal(1, absolute[0]);
        // Log-convex (Lyapunov 1901), as far as both products are in range.
        for (int k = 1; k < 100; k++)
        {
            double left = 2 * Math.Log(absolute[k]), right = Math.Log(absolute[k - 1]) + Math.Log(absolute[k + 1]);
            Assert.True(left <= right + 1e-9 || absolute[k + 1] < 1e-307, $"order {k}");
        }
    }

    [Fact]
    public void Rational_moments_are_known_exactly()
    {
        // p = c x⁴: E X⁴ = 1/(4c), E X⁸ = 5/(16c²); p = 2x⁶: E X⁶ = 1/12, E X¹² = 7/144; E X² = Γ(3/4)/Γ(1/4) and the like are not rational.
        MomentTable quartic = Construct(12, 0, 0.5);
        Assert.Equal([1, null, 0.5, null, 1.25, null, 5.625], Even(quartic));
        Assert.Equal([1.0, null, null, 1 / 12.0, null, null, 7 / 144.0], Even(Construct(12, 0, 0, 2)));
        // One coefficient is a normal distribution, of variance 1/(2c).
        Assert.Equal([1.0, 0.25, 3 / 16.0, 15 / 64.0], Even(Construct(6, 2)));
        // With a second coefficient nothing but the order 0 is rational.
        Assert.Equal([1.0, null, null, null, null], Even(Construct(8, -1, 0.5)));
        MomentTable table = Construct(9, -1, 0.5);
        Assert.Same(table.Raw, table.Central);
        Assert.All(Enumerable.Range(0, 5), i => Assert.Equal(Rational.Zero, table.Central[(2 * i) + 1].ExactValue));
    }

    [Theory]
    [InlineData(-1e8, 1e-6)]
    [InlineData(-1e300, 1e-300)]
    [InlineData(-1e300, 0.0, 1e300)]
    [InlineData(-1e-3, 0.0, 0.0, 1e-200)]
    public void Wells_that_are_too_deep_are_refused_with_a_reason(params double[] c)
    {
        var failure = Assert.Throws<RuleConstructionException>(() => Construct(4, c));
        Assert.Equal(RuleFailure.RecurrenceNotDetermined, failure.Failure);
        Assert.Contains("shallower wells", failure.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Parameters_outside_their_range_are_refused()
    {
        foreach (double[] c in new double[][] { [], [0], [1, 0], [1, -1], [double.NaN, 1], [1, double.PositiveInfinity], [1, 1, 1, 1, 1, 1, 1, 1, 1] })
        {
            Assert.False(EvenExponentialMomentsRequest.AreCoefficients(new ValueList(c)));
            Assert.Equal("coefficients", Assert.Throws<ArgumentOutOfRangeException>(() => Construct(4, c)).ParamName);
        }

        Assert.Equal("maximumOrder", Assert.Throws<ArgumentOutOfRangeException>(() => Construct(-1, 1, 1)).ParamName);
        Assert.Equal("maximumOrder", Assert.Throws<ArgumentOutOfRangeException>(() => Construct(101, 1, 1)).ParamName);
    }

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new EvenExponentialMomentsRequest(new ValueList([-0.0, 1.5]), 4, BinaryFormat.Binary64);
        Assert.Equal(request, new EvenExponentialMomentsRequest(new ValueList([0, 1.5]), 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new EvenExponentialMomentsRequest(new ValueList([0, 2.5]), 4, BinaryFormat.Binary64));
        Assert.Equal("Moments to order 4 of the even exponential density with coefficients 0.0, 1.5", request.Claim);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));
        Assert.Single(new EvenExponentialMomentsRequest(new ValueList([1, 1]), 0, BinaryFormat.Binary64).Construct(default).Raw);
    }

    /// <summary>½ Σ (−a)ⁿ/n! Γ((2n + k + 1)/4).</summary>
    private static Ball Series(double a, int k)
    {
        // Γ(1/4) and Γ(3/4) with 70 digits, by mpmath; the others of a class modulo 1 follow by Γ(z + 1) = z Γ(z).
        Ball[] start =
        [
            Ball.FromInteger(1),
            Decimal("3.62560990822190831193068515586767200299516768288006546743337799956991924"),
            Constants.SqrtPi(Precision),
            Decimal("1.22541670246517764512909830336289052685123924810807061123011893828982289"),
        ];
        Ball sum = default, power = Ball.FromInteger(1);
        for (int n = 0; n < 400; n++)
        {
            int quarters = (2 * n) + k + 1;
            Ball gamma = start[quarters & 3];
            for (int q = (quarters & 3) == 0 ? 4 : quarters & 3; q < quarters; q += 4)
            {
                gamma = Ball.Multiply(gamma, Ball.FromRational(new Rational(q, 4), Precision), Precision);
            }

            sum = Ball.Add(sum, Ball.Multiply(power, gamma, Precision), Precision);
            power = Ball.Divide(Ball.Multiply(power, Ball.FromRational(-Rational.FromDouble(a), Precision), Precision), Ball.FromInteger(n + 1), Precision);
        }

        // The ratio of two terms is about a/√(n/2); beyond 400 terms all are below 2^−1000.
        return sum.Enlarge(Bound.PowerOfTwo(-1000)).ScaleByPowerOfTwo(-1);
    }

    private static Ball Decimal(string value)
    {
        (Rational low, Rational high) = DecimalText.Interval(value);
        return Ball.Hull(Ball.FromRational(low, Precision), Ball.FromRational(high, Precision), Precision);
    }

    private static double?[] Even(MomentTable table) => [.. table.Raw
        .Where((_, k) => (k & 1) == 0)
        .Select(value => value.ExactValue is { } exact ? (double?)BitConverter.UInt64BitsToDouble(BinaryFormat.Binary64.Round(exact)) : null)];

    private static Ball Value(MomentTable table, int order) => table.Absolute[order].ExactValue is { } exact
        ? Ball.FromRational(exact, 400)
        : table.Absolute[order].Enclose(300, default);

    private static MomentTable Construct(int order, params double[] c) =>
        new EvenExponentialMomentsRequest(new ValueList(c), order, BinaryFormat.Binary64).Construct(default);
}
