using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Sequences;
using Xunit;

namespace GaussGen.Mathematics.Tests.Sequences;

public class OscillatorMatrixElementsTests
{
    // Any textbook on quantum mechanics, in the dimensionless x: ⟨0|x²|0⟩ = ½, ⟨0|x⁴|0⟩ = 3/4, ⟨0|x⁶|0⟩ = 15/8; ⟨n|x²|n⟩ = n + ½;
    // ⟨n|x⁴|n⟩ = (3/4)(2n² + 2n + 1) (recalled, recomputed: 3/4·25 = 75/4 for n = 3).
    [Theory]
    [InlineData(2, 0, 0, 1, 2)]
    [InlineData(4, 0, 0, 3, 4)]
    [InlineData(6, 0, 0, 15, 8)]
    [InlineData(2, 5, 5, 11, 2)]
    [InlineData(4, 3, 3, 75, 4)]
    [InlineData(0, 2, 2, 1, 1)]
    [InlineData(0, 2, 1, 0, 1)]
    [InlineData(1, 7, 8, 2, 1)]
    [InlineData(3, 1, 2, 3, 1)]
    public void Published_elements_are_known_exactly(int power, int row, int column, int numerator, int denominator)
    {
        IReadOnlyList<RealNumber> elements = Construct(10, power);
        Assert.Equal(new Rational(numerator, denominator), elements[(row * 10) + column].ExactValue);
    }

    [Theory]
    [InlineData(12, 1)]
    [InlineData(12, 2)]
    [InlineData(9, 7)]
    [InlineData(6, 20)]
    [InlineData(40, 33)]
    public void Elements_are_powers_of_the_ladder_matrix(int size, int power)
    {
        // With |n) = √n! |n⟩ the ladder has integers: √2 x|n) = n|n−1) + |n+1). Applied again and again, with states enough that none is cut
        // off, it gives √2ᵖ xᵖ|n) = Σ cₘ|m), and ⟨m|xᵖ|n⟩ = cₘ √(m!/n!)/√2ᵖ.
        IReadOnlyList<RealNumber> elements = Construct(size, power);
        for (int n = 0; n < size; n++)
        {
            var column = new BigInteger[size + power + 2];
            column[n] = 1;
            for (int step = 0; step < power; step++)
            {
                var next = new BigInteger[column.Length];
                for (int k = 0; k < column.Length - 1; k++)
                {
                    next[k + 1] += column[k];
                    next[Math.Max(k - 1, 0)] += k * column[k];
                }

                column = next;
            }

            for (int m = 0; m < size; m++)
            {
                // The square of ⟨m|x^p|n⟩ is column² m!/n!/2^p.
                Rational square = new Rational(column[m] * column[m] * Factorial(m), Factorial(n) * BigInteger.Pow(2, power));
                Ball element = elements[(m * size) + n].Enclose(128, default);
                Assert.True(Ball.Square(element, 400).Contains(square), $"⟨{m}|x^{power}|{n}⟩");
                Assert.True(square.IsZero ? elements[(m * size) + n].ExactValue == Rational.Zero : element.IsPositive == Trilean.True);
                Assert.True(element.IsExact || element.RelativeAccuracyBits > 120);
            }
        }
    }

    [Fact]
    public void Elements_are_integrals_over_the_wave_functions()
    {
        // ⟨m|x^p|n⟩ = ∫ H_m H_n x^p exp(−x²) dx/(√π √(2^(m+n) m! n!)), each monomial by Γ(k + ½): NIST DLMF 18.3, 5.9.1.
        foreach ((int m, int n, int power) in new[] { (0, 3, 5), (4, 2, 6), (7, 6, 3), (5, 5, 10) })
        {
            BigInteger[] left = Hermite(m), right = Hermite(n);
            Rational sum = Rational.Zero;
            for (int i = 0; i <= m; i++)
            {
                for (int j = 0; j <= n; j++)
                {
                    int k = i + j + power;
                    sum += (k & 1) != 0 ? Rational.Zero : left[i] * right[j] * HalfIntegerGamma.OverSqrtPi(k / 2);
                }
            }

            Rational square = sum * sum / (Factorial(m) * Factorial(n) * BigInteger.Pow(2, m + n));
            Assert.True(Ball.Square(Construct(8, power)[(m * 8) + n].Enclose(128, default), 400).Contains(square));
        }
    }

    [Fact]
    public void Equal_elements_are_one_number()
    {
        IReadOnlyList<RealNumber> elements = Construct(6, 3);
        for (int m = 0; m < 6; m++)
        {
            for (int n = 0; n < 6; n++)
            {
                Assert.Same(elements[(m * 6) + n], elements[(n * 6) + m]);
                Assert.True(((m + n) & 1) != 0 && Math.Abs(m - n) <= 3 || elements[(m * 6) + n].ExactValue == Rational.Zero);
            }
        }
    }

    [Fact]
    public void The_largest_matrix_is_below_the_stated_bound()
    {
        SequenceTable table = new OscillatorMatrixElementsRequest(64, 64, BinaryFormat.Binary64).Construct(default);
        RoundedSequences rounded = SequenceRounding.Round(table, BinaryFormat.Binary64, default);
        Assert.Equal("Elements", table.Sequences[0].Name);
        Assert.Equal(4096, rounded.Values[0].Count);
        Assert.Null(rounded.FirstOverflow);
        Assert.All(rounded.Values[0], value => Assert.InRange(BitConverter.UInt64BitsToDouble(value.Bits), 0, Math.ScaleB(1, 224)));
        Assert.Equal("Elements", SequenceRounding.Round(table, BinaryFormat.Binary32, default).FirstOverflow?.Name);
    }

    [Theory]
    [InlineData(0, 2, "size", "from 1 to 64")]
    [InlineData(65, 2, "size", "from 1 to 64")]
    [InlineData(3, -1, "power", "from 0 to 64")]
    [InlineData(3, 65, "power", "from 0 to 64")]
    public void Parameters_out_of_range_are_refused(int size, int power, string parameter, string range)
    {
        Assert.False(OscillatorMatrixElementsRequest.IsSize(size) && OscillatorMatrixElementsRequest.IsPower(power));
        var exception = Assert.Throws<ArgumentOutOfRangeException>(() => new OscillatorMatrixElementsRequest(size, power, BinaryFormat.Binary64));
        Assert.Equal(parameter, exception.ParamName);
        Assert.Contains(range, exception.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_request_is_a_key_and_says_what_it_claims()
    {
        var request = new OscillatorMatrixElementsRequest(5, 4, BinaryFormat.Binary64);
        Assert.Equal(request, new OscillatorMatrixElementsRequest(5, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new OscillatorMatrixElementsRequest(4, 4, BinaryFormat.Binary64));
        Assert.Equal("Matrix elements of x^4 between the first 5 states of the harmonic oscillator", request.Claim);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(new CancellationToken(canceled: true)));
    }

    private static IReadOnlyList<RealNumber> Construct(int size, int power) =>
        new OscillatorMatrixElementsRequest(size, power, BinaryFormat.Binary64).Construct(default).Sequences[0].Values;

    /// <summary>The coefficients of H_n, by H_(n+1) = 2x H_n − 2n H_(n−1).</summary>
    private static BigInteger[] Hermite(int n)
    {
        var before = new BigInteger[n + 2];
        var current = new BigInteger[n + 2];
        current[0] = 1;
        for (int k = 0; k < n; k++)
        {
            var next = new BigInteger[n + 2];
            for (int i = 0; i <= n; i++)
            {
                next[i] += -2 * k * before[i];
                next[i + 1] += 2 * current[i];
            }

            (before, current) = (current, next);
        }

        return current;
    }

    private static BigInteger Factorial(int n)
    {
        BigInteger product = BigInteger.One;
        for (int k = 2; k <= n; k++)
        {
            product *= k;
        }

        return product;
    }
}
