using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Numerics;
using System.Threading;
using CsCheck;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using Xunit;

namespace GaussGen.Mathematics.Tests.Moments;

public class NormalMomentsTests
{
    private static readonly double[] Corners =
        [0.0, -0.0, 1.0, -1.0, 0.1, 1.5, double.Epsilon, double.MaxValue, double.MinValue, 1e-300, 1e300, 2.2250738585072014e-308];

    /// <summary>Numbers of every size, with a bias to the ends of the range, to short and to long significands.</summary>
    private static readonly Gen<double> Finite = Gen.OneOf(
        Gen.Int[0, Corners.Length - 1].Select(index => Corners[index]),
        Gen.Double[-10, 10],
        Gen.Int[-2000, 2000].Select(k => k / 16.0),
        Gen.ULong.Select(bits => BitConverter.UInt64BitsToDouble(bits)).Where(double.IsFinite));

    private static readonly Gen<double> Positive = Finite.Select(Math.Abs).Where(value => value > 0);

    [Fact]
    public void Even_moments_of_the_standard_distribution_are_double_factorials()
    {
        // E X^2j = (2j−1)!! = (2j)!/(2^j j!): Isserlis 1918; here from factorials, which the construction does not form.
        MomentTable table = Construct(0, 1, NormalMomentsRequest.LargestOrder);
        for (int order = 0; order <= NormalMomentsRequest.LargestOrder; order++)
        {
            Rational expected = order % 2 == 0
                ? new Rational(Factorial(order), BigInteger.Pow(2, order / 2) * Factorial(order / 2))
                : Rational.Zero;
            Assert.Equal(expected, table.Raw[order].ExactValue);
            Assert.Equal(expected, table.Central[order].ExactValue);
            if (order % 2 == 0)
            {
                Assert.Equal(expected, table.Absolute[order].ExactValue);
            }
        }
    }

    [Fact]
    public void Absolute_moments_are_gamma_values()
    {
        // E |X|^k = 2^(k/2) Γ((k+1)/2)/√π: Winkelbauer 2012 (recalled, recomputed). For odd k = 2j + 1 put to the duplication
        // formula, DLMF 5.5.5: Γ(j+1) Γ(j+½) = 2^(−2j) √π (2j)!, so that E |X|^k Γ(j+½) = √2 2^(−j) (2j)!.
        MomentTable table = Construct(0, 1, NormalMomentsRequest.LargestOrder);
        for (int j = 0; j <= NormalMomentsRequest.LargestOrder / 2; j++)
        {
            Assert.Equal(HalfIntegerGamma.OverSqrtPi(j) * new Rational(BigInteger.Pow(2, j), 1), table.Absolute[2 * j].ExactValue);
            if (2 * j < NormalMomentsRequest.LargestOrder)
            {
                Assert.Null(table.Absolute[(2 * j) + 1].ExactValue);
                Ball moment = table.Absolute[(2 * j) + 1].Enclose(256, CancellationToken.None);
                Ball product = Ball.Multiply(moment, HalfIntegerGamma.Value(j, 256), 256);
                Ball squared = Ball.Square(product, 256).ScaleByPowerOfTwo((2 * j) - 1);
                Assert.True(squared.Contains(new Rational(BigInteger.Pow(Factorial(2 * j), 2), 1)));
                Assert.True(squared.RelativeAccuracyBits > 240);
            }
        }
    }

    [Fact]
    public void Low_raw_moments_are_the_textbook_polynomials()
    {
        // E X³ = m³ + 3 m s², E X⁴ = m⁴ + 6 m² s² + 3 s⁴, E X⁵ = m⁵ + 10 m³ s² + 15 m s⁴: any textbook (recalled, recomputed).
        Rational m = Rational.FromDouble(0.1);
        Rational s = Rational.FromDouble(0.7);
        Rational v = s * s;
        MomentTable table = Construct(0.1, 0.7, 5);
        Assert.Equal(Rational.One, table.Raw[0].ExactValue);
        Assert.Equal(m, table.Raw[1].ExactValue);
        Assert.Equal((m * m) + v, table.Raw[2].ExactValue);
        Assert.Equal(m.Pow(3) + (3 * m * v), table.Raw[3].ExactValue);
        Assert.Equal(m.Pow(4) + (6 * m.Pow(2) * v) + (3 * v * v), table.Raw[4].ExactValue);
        Assert.Equal(m.Pow(5) + (10 * m.Pow(3) * v) + (15 * m * v * v), table.Raw[5].ExactValue);
    }

    [Fact]
    public void Raw_moments_are_binomial_sums_of_central_ones()
    {
        Gen.Select(Finite, Positive, Gen.Int[0, 9]).Sample(
            (mean, standardDeviation, order) =>
            {
                MomentTable table = Construct(mean, standardDeviation, order);
                Rational m = Rational.FromDouble(mean);
                Rational sum = Rational.Zero;
                for (int j = 0; j <= order; j++)
                {
                    BigInteger binomial = Factorial(order) / (Factorial(j) * Factorial(order - j));
                    sum += binomial * m.Pow(order - j) * table.Central[j].ExactValue!.Value;
                }

                Assert.Equal(sum, table.Raw[order].ExactValue);
            },
            iter: 200);
    }

    [Fact]
    public void The_opposite_mean_gives_opposite_odd_moments()
    {
        Gen.Select(Finite, Positive).Sample(
            (mean, standardDeviation) =>
            {
                RoundedMoments one = Round(mean, standardDeviation, 7, BinaryFormat.Binary64);
                RoundedMoments other = Round(-mean, standardDeviation, 7, BinaryFormat.Binary64);
                for (int order = 0; order <= 7; order++)
                {
                    ulong bits = one.Raw[order].Bits;
                    Assert.Equal(order % 2 == 0 ? bits : BinaryFormat.Binary64.Negate(bits), other.Raw[order].Bits);
                    Assert.Equal(one.Central[order], other.Central[order]);
                    Assert.Equal(one.Absolute[order], other.Absolute[order]);
                }
            },
            iter: 100);
    }

    [Fact]
    public void Rounded_moments_equal_those_of_other_software()
    {
        // normal-moments.py: quadrature and hypergeometric functions at 60 digits.
        IReadOnlyList<string[]> lines = ReferenceData.Read("normal-moments.csv");
        Assert.True(lines.Count > 300);
        foreach (IGrouping<(string, string), string[]> group in lines.GroupBy(line => (line[0], line[1])))
        {
            double mean = double.Parse(group.Key.Item1, CultureInfo.InvariantCulture);
            double standardDeviation = double.Parse(group.Key.Item2, CultureInfo.InvariantCulture);
            RoundedMoments binary64 = Round(mean, standardDeviation, 25, BinaryFormat.Binary64);
            RoundedMoments binary32 = Round(mean, standardDeviation, 25, BinaryFormat.Binary32);
            foreach (string[] line in group)
            {
                int order = int.Parse(line[2], CultureInfo.InvariantCulture);
                Assert.Equal(line[4], ListOf(binary64, line[3])[order].Bits.ToString("x16", CultureInfo.InvariantCulture));
                Assert.Equal(line[5], ListOf(binary32, line[3])[order].Bits.ToString("x8", CultureInfo.InvariantCulture));
            }
        }
    }

    [Theory]
    [InlineData(0.0, 1.0, "binary64", 200, null)]
    [InlineData(0.0, 1e10, "binary32", 200, 4)]
    [InlineData(1e30, 1e-10, "binary32", 200, 2)]
    [InlineData(0.0, 6e12, "binary32", 200, 3)]
    [InlineData(0.0, 5.9e12, "binary32", 200, 4)]
    [InlineData(1e300, 5e-324, "binary64", 200, 2)]
    [InlineData(1e300, 5e-324, "binary64", 1, null)]
    [InlineData(1e39, 1.0, "binary32", 0, null)]
    [InlineData(1e39, 1.0, "binary32", 1, 1)]
    [InlineData(5e-324, 5e-324, "binary64", 200, null)]
    public void The_lowest_order_that_overflows_is_found(
        double mean, double standardDeviation, string format, int maximumOrder, int? expected)
    {
        // Largest binary32 number 3.4028e38. 0.79788·2·(6e12)³ = 3.447e38, 0.79788·2·(5.9e12)³ = 3.277e38, 3·(5.9e12)⁴ is beyond.
        BinaryFormat target = format == "binary64" ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
        Assert.Equal(expected, Round(mean, standardDeviation, maximumOrder, target).FirstOverflow);
    }

    [Fact]
    public void Every_rounded_moment_is_the_nearest_number_and_says_how_it_is_known()
    {
        Gen.Select(Finite, Positive, Gen.Int[0, 12], Gen.Bool).Sample(
            (mean, standardDeviation, maximumOrder, isDouble) =>
            {
                BinaryFormat format = isDouble ? BinaryFormat.Binary64 : BinaryFormat.Binary32;
                RoundedMoments moments = Round(mean, standardDeviation, maximumOrder, format);
                for (int order = 0; order <= maximumOrder; order++)
                {
                    AssertNearest(moments.Table.Raw[order], moments.Raw[order], format);
                    AssertNearest(moments.Table.Central[order], moments.Central[order], format);
                    AssertNearest(moments.Table.Absolute[order], moments.Absolute[order], format);
                    Assert.Equal(order % 2 == 0, moments.Absolute[order].EnclosureWidthLog2 == int.MinValue);
                    Assert.True(order % 2 == 0 || moments.Central[order].Bits == 0);
                }
            },
            iter: 300);
    }

    [Theory]
    [InlineData(1e300, 1e-300)]
    [InlineData(1e-300, 1e300)]
    [InlineData(double.Epsilon, double.MaxValue)]
    [InlineData(double.MaxValue, double.Epsilon)]
    public void The_most_distant_parameters_stay_exact_at_the_highest_order(double mean, double standardDeviation)
    {
        const int Order = NormalMomentsRequest.LargestOrder;
        MomentTable table = Construct(mean, standardDeviation, Order);
        Rational m = Rational.FromDouble(mean);
        Rational s = Rational.FromDouble(standardDeviation);
        Rational central = s.Pow(Order) * new Rational(Factorial(Order), BigInteger.Pow(2, Order / 2) * Factorial(Order / 2));
        Assert.Equal(central, table.Central[Order].ExactValue);

        // The lowest and the highest power of the mean bound the sum, whose terms are all positive, by the number of terms.
        Rational raw = table.Raw[Order].ExactValue!.Value;
        Assert.True(raw > central && raw > m.Pow(Order));
        Assert.True(raw < Rational.FromInteger(BigInteger.Pow(4, Order)) * (central + m.Pow(Order)));
    }

    [Fact]
    public void Cancellation_is_heard()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();
        var request = new NormalMomentsRequest(1, 1, 8, BinaryFormat.Binary64);
        Assert.ThrowsAny<OperationCanceledException>(() => request.Construct(source.Token));
    }

    [Theory]
    [InlineData(double.NaN, 1.0, 4, "mean")]
    [InlineData(double.PositiveInfinity, 1.0, 4, "mean")]
    [InlineData(double.NegativeInfinity, 1.0, 4, "mean")]
    [InlineData(0.0, 0.0, 4, "standardDeviation")]
    [InlineData(0.0, -1.0, 4, "standardDeviation")]
    [InlineData(0.0, double.NaN, 4, "standardDeviation")]
    [InlineData(0.0, double.PositiveInfinity, 4, "standardDeviation")]
    [InlineData(0.0, 1.0, -1, "maximumOrder")]
    [InlineData(0.0, 1.0, 201, "maximumOrder")]
    public void Parameters_outside_their_range_are_refused(double mean, double standardDeviation, int maximumOrder, string parameter)
    {
        var exception = Assert.Throws<ArgumentOutOfRangeException>(
            () => new NormalMomentsRequest(mean, standardDeviation, maximumOrder, BinaryFormat.Binary64));
        Assert.Equal(parameter, exception.ParamName);
    }

    [Fact]
    public void Equal_parameters_are_one_request()
    {
        var request = new NormalMomentsRequest(0.0, 0.25, 4, BinaryFormat.Binary64);
        Assert.Equal(request, new NormalMomentsRequest(-0.0, 0.25, 4, BinaryFormat.Binary64));
        Assert.Equal(request.GetHashCode(), new NormalMomentsRequest(-0.0, 0.25, 4, BinaryFormat.Binary64).GetHashCode());
        Assert.NotEqual(request, new NormalMomentsRequest(0.5, 0.25, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new NormalMomentsRequest(0.0, 0.5, 4, BinaryFormat.Binary64));
        Assert.NotEqual(request, new NormalMomentsRequest(0.0, 0.25, 5, BinaryFormat.Binary64));
        Assert.NotEqual(request, new NormalMomentsRequest(0.0, 0.25, 4, BinaryFormat.Binary32));
    }

    [Fact]
    public void The_description_names_the_distribution()
    {
        MomentDescription description = Construct(-1.5, 0.1, 1).Description;
        Assert.Equal("the normal distribution with mean -1.5 and standard deviation 0.1", description.Distribution);
    }

    private static void AssertNearest(RealNumber value, RoundedValue rounded, BinaryFormat format)
    {
        if (format.IsInfinity(rounded.Bits))
        {
            (_, Dyadic threshold) = format.RoundingInterval(format.Largest);
            Ball magnitude = (value.ExactValue is { } large ? Ball.FromRational(large, 256) : value.Enclose(256, CancellationToken.None)).Abs();
            Assert.True(magnitude.Lower >= threshold);
            return;
        }

        (Dyadic lower, Dyadic upper) = format.RoundingInterval(rounded.Bits);
        if (value.ExactValue is { } exact)
        {
            Assert.True(lower.ToRational() <= exact && exact <= upper.ToRational());
            return;
        }

        // More bits than the rounding asked for.
        Ball ball = value.Enclose(512, CancellationToken.None);
        Assert.True(lower < ball.Lower && ball.Upper < upper);
    }

    private static IReadOnlyList<RoundedValue> ListOf(RoundedMoments moments, string name) => name switch
    {
        "Raw" => moments.Raw,
        "Central" => moments.Central,
        "Absolute" => moments.Absolute,
        _ => throw new ArgumentException("There is no list " + name + ".", nameof(name)),
    };

    private static MomentTable Construct(double mean, double standardDeviation, int maximumOrder) =>
        new NormalMomentsRequest(mean, standardDeviation, maximumOrder, BinaryFormat.Binary64).Construct(CancellationToken.None);

    private static RoundedMoments Round(double mean, double standardDeviation, int maximumOrder, BinaryFormat format) =>
        MomentRounding.Round(Construct(mean, standardDeviation, maximumOrder), format, CancellationToken.None);

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
