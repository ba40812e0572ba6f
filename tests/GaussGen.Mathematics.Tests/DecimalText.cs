using System;
using System.Globalization;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Tests;

/// <summary>Reads decimals of any length exactly.</summary>
internal static class DecimalText
{
    /// <summary>The exact value of a text such as "-1.25e-3".</summary>
    public static Rational Parse(string text)
    {
        string[] parts = text.Split('e', 'E');
        int exponent = parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0;
        int point = parts[0].IndexOf('.', StringComparison.Ordinal);
        string digits = parts[0].Replace(".", string.Empty, StringComparison.Ordinal);
        exponent -= point < 0 ? 0 : parts[0].Length - point - 1;
        var mantissa = BigInteger.Parse(digits, CultureInfo.InvariantCulture);
        return exponent >= 0
            ? mantissa * BigInteger.Pow(10, exponent)
            : new Rational(mantissa, BigInteger.Pow(10, -exponent));
    }

    /// <summary>The interval of numbers that a text with rounded last digit stands for, twice as wide for good measure.</summary>
    public static (Rational Low, Rational High) Interval(string text)
    {
        Rational value = Parse(text);
        string mantissa = text.Split('e', 'E')[0];
        int point = mantissa.IndexOf('.', StringComparison.Ordinal);
        int decimals = point < 0 ? 0 : mantissa.Length - point - 1;
        int exponent = text.Contains('e', StringComparison.Ordinal)
            ? int.Parse(text.Split('e')[1], CultureInfo.InvariantCulture)
            : 0;
        Rational unit = Rational.Pow(10, exponent - decimals);
        return (value - unit, value + unit);
    }
}
