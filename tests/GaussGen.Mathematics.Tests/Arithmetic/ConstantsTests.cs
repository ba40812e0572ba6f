using System;
using System.Linq;
using System.Threading.Tasks;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

public class ConstantsTests
{
    public static TheoryData<string> Names => new("pi", "ln2", "sqrtpi", "sqrt2");

    [Theory]
    [MemberData(nameof(Names))]
    public void A_constant_contains_the_reference_value_and_is_as_narrow_as_stated(string name)
    {
        ReferenceValue reference = ReferenceValue.Of(name).Single();
        foreach (int precision in new[] { 1, 32, 53, 64, 111, 112, 113, 128, 176, 177, 200, 256, 500, 1000, 2048, 4200 })
        {
            Ball value = Value(name, precision);
            reference.AssertInside(value);
            Assert.True(value.Radius <= Bound.PowerOfTwo(3 - precision), $"{name} at {precision}: {value.Radius}");
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Bits_do_not_depend_on_history_or_threads(string name)
    {
        Ball[] values = new Ball[64];
        Parallel.For(0, values.Length, i => values[i] = Value(name, i % 2 == 0 ? 777 : 300 + (40 * i)));
        Assert.Single(values.Where((_, i) => i % 2 == 0).Select(ball => (ball.Midpoint, ball.Exponent, ball.Radius)).Distinct());
    }

    [Fact]
    public void Half_integer_gammas_contain_the_reference_values_and_are_as_narrow_as_stated()
    {
        foreach (ReferenceValue reference in ReferenceValue.Of("gamma"))
        {
            int k = (int)((reference.Argument.Mantissa - 1) / 2);
            foreach (int precision in new[] { 32, 64, 128, 500, 1000 })
            {
                Ball value = HalfIntegerGamma.Value(k, precision);
                reference.AssertInside(value);
                Assert.True(value.RelativeAccuracyBits >= precision - 5);
            }
        }
    }

    /// <summary>Γ(z + 1) = z Γ(z) and Γ(½ + k) Γ(½ − k) = (−1)^k π: NIST DLMF 5.5.1 and 5.5.3.</summary>
    [Fact]
    public void Half_integer_gammas_obey_recurrence_and_reflection()
    {
        Assert.Equal(Rational.One, HalfIntegerGamma.OverSqrtPi(0));
        for (int k = -120; k <= 120; k++)
        {
            Assert.Equal(new Rational((2 * k) + 1, 2) * HalfIntegerGamma.OverSqrtPi(k), HalfIntegerGamma.OverSqrtPi(k + 1));
            Assert.Equal(k % 2 == 0 ? 1 : -1, HalfIntegerGamma.OverSqrtPi(k) * HalfIntegerGamma.OverSqrtPi(-k));
        }
    }

    private static Ball Value(string name, int precision) => name switch
    {
        "pi" => Constants.Pi(precision),
        "ln2" => Constants.Ln2(precision),
        "sqrtpi" => Constants.SqrtPi(precision),
        "sqrt2" => Constants.Sqrt2(precision),
        _ => throw new ArgumentOutOfRangeException(nameof(name)),
    };
}
