using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;
using Xunit;

namespace GaussGen.Mathematics.Tests.Arithmetic;

/// <summary>A line of Data/elementary-values.txt, which mpmath computed: f(argument) within a known error.</summary>
/// <param name="Function">The function's name.</param>
/// <param name="Argument">Its argument, exactly.</param>
/// <param name="Value">Its value, rounded to many digits.</param>
/// <param name="Error">A bound of the value's error.</param>
public sealed record ReferenceValue(string Function, Dyadic Argument, Rational Value, Rational Error)
{
    internal static IReadOnlyList<ReferenceValue> All { get; } = Read();

    internal static IEnumerable<ReferenceValue> Of(string function) => All.Where(value => value.Function == function);

    /// <summary>Whether the true value lies in the ball for all that the reference tells; a wrong ball is found out.</summary>
    internal void AssertInside(Ball ball)
    {
        Assert.True(
            ball.Lower.ToRational() - Error <= Value && Value <= ball.Upper.ToRational() + Error,
            $"{Function}({Argument}) is not in {ball}.");
    }

    private static List<ReferenceValue> Read()
    {
        var values = new List<ReferenceValue>();
        foreach (string[] parts in ReferenceData.Words("elementary-values.txt"))
        {
            var digits = BigInteger.Parse(parts[3], CultureInfo.InvariantCulture);
            Rational scale = new Rational(10, 1).Pow(int.Parse(parts[4], CultureInfo.InvariantCulture));
            var argument = new Dyadic(BigInteger.Parse(parts[1], CultureInfo.InvariantCulture), int.Parse(parts[2], CultureInfo.InvariantCulture));
            values.Add(new ReferenceValue(parts[0], argument, digits * scale, scale));
        }

        return values;
    }
}
