using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>The rules against what others printed or computed.</summary>
public class GaussHermitePublishedTests
{
    /// <summary>Abscissa and weight for exp(−x²), from the centre outward, as printed.</summary>
    public static TheoryData<string, int, string> PrintedTables() => new()
    {
        // CRC Standard Mathematical Tables, 28th ed., Beyer 1987, p. 464 (recalled, recomputed).
        { "CRC", 2, "0.707107 0.886227" },
        { "CRC", 3, "0.00000 1.18164 1.22474 0.295409" },
        { "CRC", 4, "0.524648 0.804914 1.65068 0.0813128" },
        { "CRC", 5, "0.000000 0.945309 0.958572 0.393619 2.02018 0.0199532" },
        // Abramowitz & Stegun 1964, table 25.10 (recalled, recomputed).
        { "A&S 25.10", 5, "0.000000000000000 9.453087204829e-1 0.958572464613819 3.936193231522e-1 2.020182870456086 1.995324205905e-2" },
        {
            "A&S 25.10", 10, "0.342901327223705 6.108626337353e-1 1.036610829789514 2.401386110823e-1 1.756683649299882 3.387439445548e-2 " +
            "2.532731674232790 1.343645746781e-3 3.436159118837738 7.640432855233e-6"
        },
        {
            "A&S 25.10", 20, "0.2453407083009 4.622436696006e-1 0.7374737285454 2.866755053628e-1 1.2340762153953 1.090172060200e-1 " +
            "1.7385377121166 2.481052088746e-2 2.2549740020893 3.243773342238e-3 2.7888060584281 2.283386360163e-4 " +
            "3.3478545673832 7.802556478532e-6 3.9447640401156 1.086069370769e-7 4.6036824495507 4.399340992273e-10 " +
            "5.3874808900112 2.229393645534e-13"
        },
        // NIST DLMF 3.5(v), the table for n = 15 (recalled, recomputed).
        {
            "DLMF 3.5(v)", 15, "0.000000000000000 0.564100308726418 0.565069583255576 0.412028687498899 1.136115585210921 0.158488915795936 " +
            "1.719992575186489 0.307800338725461e-1 2.325732486173858 0.277806884291277e-2 2.967166927905603 0.100004441232500e-3 " +
            "3.669950373404453 0.105911554771107e-5 4.499990707309392 0.152247580425352e-8"
        },
    };

    [Theory]
    [MemberData(nameof(PrintedTables))]
    public void Printed_values_agree_to_one_unit_of_their_last_digit(string source, int points, string printed)
    {
        RuleTable table = GaussHermite.Construct(points, HermiteConvention.Physicist, CancellationToken.None);
        string[] numbers = printed.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(points + (points & 1), numbers.Length);
        for (int i = 0; i < numbers.Length; i++)
        {
            IReadOnlyList<RealNumber> list = i % 2 == 0 ? table.Nodes : table.Weights;
            Ball ours = list[(points / 2) + (i / 2)].Enclose(128, CancellationToken.None);
            Ball difference = Ball.Subtract(ours, Ball.FromRational(HermiteOracle.Parse(numbers[i]), 128), 128).Abs();
            Assert.True(difference.Upper.ToRational() <= LastDigit(numbers[i]), $"{source}, n = {points}: {numbers[i]}");
        }
    }

    [Fact]
    public void Sixty_digits_of_another_program_round_to_the_same_bits_and_lie_in_the_enclosures()
    {
        // Data/hermite-reference.py, mpmath 1.3.
        foreach (IGrouping<(int Points, string Convention), string[]> rule in ReferenceRules())
        {
            var convention = Enum.Parse<HermiteConvention>(rule.Key.Convention);
            RuleTable table = GaussHermite.Construct(rule.Key.Points, convention, CancellationToken.None);
            string[][] lines = rule.ToArray();
            Assert.Equal((rule.Key.Points + 1) / 2, lines.Length);
            for (int i = 0; i < lines.Length; i++)
            {
                int index = (rule.Key.Points / 2) + i;
                AssertAgrees(HermiteOracle.Parse(lines[i][2]), table.Nodes[index]);
                AssertAgrees(HermiteOracle.Parse(lines[i][3]), table.Weights[index]);
            }
        }
    }

    [Fact]
    public void Eigenvalues_of_the_recurrence_matrix_agree_within_their_own_error()
    {
        // The method of Golub and Welsch (1969) with the symmetric eigenvalue decomposition of MathNet.Numerics; our error is measured beside it.
        foreach (IGrouping<(int Points, string Convention), string[]> rule in ReferenceRules().Where(rule => rule.Key.Convention == "Probabilist"))
        {
            int points = rule.Key.Points;
            RoundedRule ours = HermiteOracle.Round(points, HermiteConvention.Probabilist, BinaryFormat.Binary64);
            (double[] nodes, double[] weights) = GolubWelsch(points);
            string[][] lines = rule.ToArray();
            double ourWorst = 0, theirWorst = 0;
            for (int i = 0; i < lines.Length; i++)
            {
                int index = (points / 2) + i;
                Rational node = HermiteOracle.Parse(lines[i][2]), weight = HermiteOracle.Parse(lines[i][3]);
                ourWorst = Math.Max(ourWorst, Math.Max(UlpError(ours.Nodes[index].Bits, node), UlpError(ours.Weights[index].Bits, weight)));
                theirWorst = Math.Max(theirWorst, UlpError(BitConverter.DoubleToUInt64Bits(nodes[index]), node));
                // Backward stable: errors of some ulps of the largest eigenvalue, and of some ulps of 1 in the squared vector components.
                Assert.True(Math.Abs(nodes[index] - HermiteOracle.ToDouble(ours.Nodes[index].Bits)) < 1e-13 * Math.Sqrt(points));
                Assert.True(Math.Abs(weights[index] - HermiteOracle.ToDouble(ours.Weights[index].Bits)) < 1e-14);
            }

            Assert.True(ourWorst <= 0.5, $"n = {points}: {ourWorst} ulp");
            Assert.True(theirWorst > ourWorst, $"n = {points}: the eigenvalues are off by {theirWorst} ulp, we by {ourWorst}");
        }
    }

    private static IEnumerable<IGrouping<(int Points, string Convention), string[]>> ReferenceRules() =>
        ReferenceData.Read("hermite-reference.csv").GroupBy(line => (int.Parse(line[0], CultureInfo.InvariantCulture), line[1]));

    private static void AssertAgrees(Rational reference, RealNumber ours)
    {
        foreach (BinaryFormat format in HermiteOracle.Formats)
        {
            Assert.Equal(format.Round(reference), Rounding.Nearest(ours, format, CancellationToken.None).Bits);
        }

        if (ours.ExactValue is null)
        {
            // 60 digits are 199 bits; both differ from the true value by their own radius only.
            Ball ball = ours.Enclose(250, CancellationToken.None);
            Ball difference = Ball.Subtract(ball, Ball.FromRational(reference, 300), 300).Abs();
            Assert.True(difference.Upper.ToRational() <= reference.Abs() * Rational.Pow(10, -58));
            Assert.True(ours.FirstEnclosure!.Value.ToBall().Contains(ball));
        }
    }

    private static (double[] Nodes, double[] Weights) GolubWelsch(int points)
    {
        Matrix<double> jacobi = Matrix<double>.Build.Dense(points, points);
        for (int k = 1; k < points; k++)
        {
            jacobi[k - 1, k] = jacobi[k, k - 1] = Math.Sqrt(k);
        }

        Evd<double> decomposition = jacobi.Evd(Symmetricity.Symmetric);
        var pairs = Enumerable.Range(0, points)
            .Select(i => (Node: decomposition.EigenValues[i].Real, Weight: Math.Pow(decomposition.EigenVectors[0, i], 2)))
            .OrderBy(pair => pair.Node)
            .ToArray();
        return (pairs.Select(pair => pair.Node).ToArray(), pairs.Select(pair => pair.Weight).ToArray());
    }

    private static double UlpError(ulong bits, Rational reference)
    {
        if (reference.IsZero)
        {
            return 0;
        }

        Rational unit = new Dyadic(1, BinaryFormat.Binary64.UnitExponent(BinaryFormat.Binary64.Round(reference))).ToRational();
        Rational error = ((BinaryFormat.Binary64.ValueOf(bits).ToRational() - reference) / unit).Abs();
        return HermiteOracle.ToDouble(BinaryFormat.Binary64.Round(error));
    }

    private static Rational LastDigit(string printed)
    {
        string[] parts = printed.Split('e');
        int decimals = parts[0].Length - 1 - parts[0].IndexOf('.');
        int exponent = parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0;
        return Rational.Pow(10, exponent - decimals);
    }
}
