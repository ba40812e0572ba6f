using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Numerics;
using GaussGen.Functions.Measuring;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>The functions against values of mpmath (Data/error-functions.py), which share nothing with the enclosures.</summary>
public sealed class FunctionReferenceTests
{
    [Fact]
    public void The_functions_agree_with_mpmath()
    {
        int count = 0;
        foreach (string[] fields in Lines())
        {
            MeasuredFunction function = MeasuredFunction.All.Single(candidate => candidate.Name == fields[0]);
            double argument = ParseHexadecimal(fields[1]);
            Ball truth = Parse(fields[2]);
            double error = UlpError.Of(truth, function.Binary64(argument, 0.0), BinaryFormat.Binary64);
            Assert.True(error <= Math.Min(function.Limit, 1.0), $"{fields[0]}({argument:R}): {error} units");
            count++;
        }

        Assert.Equal(271, count);
    }

    private static IEnumerable<string[]> Lines()
    {
        using Stream stream = typeof(FunctionReferenceTests).Assembly.GetManifestResourceStream("error-functions.csv")!;
        using var reader = new StreamReader(stream);
        while (reader.ReadLine() is { } line)
        {
            yield return line.Split(',');
        }
    }

    /// <summary>A number such as -0x1.8p+3, exactly.</summary>
    private static double ParseHexadecimal(string text)
    {
        bool isNegative = text[0] == '-';
        string[] parts = text[(isNegative ? 3 : 2)..].Split('p');
        string digits = parts[0].Replace(".", string.Empty, StringComparison.Ordinal);
        double value = Math.ScaleB(
            ulong.Parse(digits, NumberStyles.HexNumber, CultureInfo.InvariantCulture),
            int.Parse(parts[1], CultureInfo.InvariantCulture) - (4 * (digits.Length - 1)));
        return isNegative ? -value : value;
    }

    /// <summary>The printed number with half a unit of its last digit as radius.</summary>
    private static Ball Parse(string text)
    {
        string[] parts = text.Split('e');
        int point = parts[0].IndexOf('.', StringComparison.Ordinal);
        var digits = BigInteger.Parse(parts[0].Replace(".", string.Empty, StringComparison.Ordinal), CultureInfo.InvariantCulture);
        int exponent = (parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0) - (parts[0].Length - point - 1);
        Ball scale = Ball.Pow(Ball.FromInteger(10), exponent, 200);
        return Ball.Multiply(new Ball(digits, 0, Bound.FromParts(1, 0)), scale, 200);
    }
}
