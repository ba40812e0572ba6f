using System;
using System.Linq;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Nested;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Nested;

public class PolynomialZeroTests
{
    [Fact]
    public void The_second_extension_needs_an_exchange_of_rows_and_solves_its_equations()
    {
        // G₁ = ∫ (t − 3) t φ = 3 − 3.
        var nodes = new IntegerPolynomial(-3, 1);
        IntegerPolynomial extension = NormalExtension.Of(nodes, 3, default);
        IntegerPolynomial product = nodes.Times(extension);

        Assert.Equal(3, extension.Degree);
        for (int s = 1; s <= 3; s++)
        {
            Assert.Equal(BigInteger.Zero, Integral(product, s));
        }

        Assert.NotEqual(BigInteger.Zero, Integral(product, 4));
        Assert.Equal(BigInteger.One, Enumerable.Range(0, 4).Aggregate(BigInteger.Zero, (d, i) => BigInteger.GreatestCommonDivisor(d, extension[i])));
        Assert.True(extension[3].Sign > 0);
    }

    [Fact]
    public void Nodes_without_a_unique_extension_are_an_error_and_no_table() =>
        // With F = (t − 3)(t² − 10t + 15)·…: a multiple of He₅'s polynomial has no integral against any low power, so that nothing is determined.
        Assert.Throws<InvalidOperationException>(() => NormalExtension.Of(new IntegerPolynomial(15, -10, 1), 1, default));

    [Fact]
    public void Close_and_far_zeros_are_found()
    {
        // (t − 1)(10 t − 13)(t − 900)(10⁶ t − 1).
        IntegerPolynomial polynomial = new IntegerPolynomial(-1, 1).Times(new IntegerPolynomial(-13, 10))
            .Times(new IntegerPolynomial(-900, 1)).Times(new IntegerPolynomial(-1, 1_000_000));
        PositiveZero[] zeros = PositiveZero.AllOf(polynomial, default);

        Rational[] expected = [new Rational(1, 1_000_000), Rational.One, new Rational(13, 10), 900];
        Assert.Equal(expected.Length, zeros.Length);
        foreach (int precision in new[] { 10, 53, 300 })
        {
            for (int i = 0; i < zeros.Length; i++)
            {
                Ball ball = zeros[i].Enclose(precision, default);
                Assert.True(ball.Contains(expected[i]));
                Assert.True(ball.RelativeAccuracyBits >= precision);
            }
        }
    }

    [Theory]
    [InlineData(1, 0, 1)]
    [InlineData(1, 2, 1)]
    [InlineData(1, -2, 1)]
    public void Zeros_that_are_not_positive_and_simple_are_an_error(int constant, int linear, int square) =>
        Assert.Throws<InvalidOperationException>(() => PositiveZero.AllOf(new IntegerPolynomial(constant, linear, square), default));

    [Fact]
    public void Values_of_polynomials_agree_in_all_arithmetics()
    {
        var polynomial = new IntegerPolynomial(7, -5, 0, 3);

        Assert.Equal(new Rational(7, 1) - new Rational(15, 2) + new Rational(81, 8), polynomial.At(new Rational(3, 2)));
        Assert.Equal(polynomial.At(new Rational(3, 2)), polynomial.At(new Dyadic(3, -1)).ToRational());
        Assert.True(polynomial.At(Ball.FromRational(new Rational(3, 2), 50), 50).Contains(polynomial.At(new Rational(3, 2))));
        Assert.Equal(new Rational(-5, 1) + (9 * new Rational(9, 4)), polynomial.Derivative().At(new Rational(3, 2)));
    }

    private static BigInteger Integral(IntegerPolynomial polynomial, int power)
    {
        BigInteger sum = BigInteger.Zero;
        for (int i = 0; i <= polynomial.Degree; i++)
        {
            sum += polynomial[i] * NormalExtension.Moment(i + power);
        }

        return sum;
    }
}
