using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>
/// Nodes from the centre outward, and their weights, to 60 digits: hermite-reference.csv, made by mpmath with bisection of the explicit
/// polynomial, which has nothing in common with a construction or a proof here.
/// </summary>
internal sealed record HermiteReference(int Points, HermiteWeight Weight, Rational Node, Rational WeightValue)
{
    /// <summary>The rules, each with its entries at and above the centre.</summary>
    public static IEnumerable<IGrouping<(int Points, HermiteWeight Weight), HermiteReference>> All =>
        ReferenceData.Read("hermite-reference.csv")
            .Select(fields => new HermiteReference(
                int.Parse(fields[0], CultureInfo.InvariantCulture),
                fields[1] == "Physicist" ? HermiteWeight.ExponentialOfMinusSquare : HermiteWeight.StandardNormalDensity,
                Parse(fields[2]),
                Parse(fields[3])))
            .GroupBy(entry => (entry.Points, entry.Weight));

    private static Rational Parse(string text)
    {
        string[] parts = text.Split('e');
        int exponent = parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0;
        int point = parts[0].IndexOf('.');
        string digits = parts[0].Replace(".", string.Empty);
        exponent -= point < 0 ? 0 : parts[0].Length - 1 - point;
        return BigInteger.Parse(digits, CultureInfo.InvariantCulture) * Rational.Pow(10, exponent);
    }
}
