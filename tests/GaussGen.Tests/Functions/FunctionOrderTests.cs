using System;
using System.Linq;
using GaussGen.Functions.Measuring;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>A function that never falls must not fall by a last place either.</summary>
public sealed class FunctionOrderTests
{
    private const int Steps = 80;

    public static TheoryData<string> Names =>
        [.. MeasuredFunction.All.Where(function => function.Domain != Domain.Interval).Select(function => function.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public void Consecutive_numbers_keep_the_order(string name)
    {
        MeasuredFunction function = MeasuredFunction.All.Single(candidate => candidate.Name == name);

        // Every branch, every end of a row, and random places.
        foreach ((double start, _) in Points.For(function, 12_000))
        {
            double x = start;
            double value = function.Binary64(x, 0.0);
            for (int i = 0; i < Steps; i++)
            {
                double next = Math.BitIncrement(x);
                if (double.IsInfinity(next) || !IsInside(function.Domain, next))
                {
                    break;
                }

                double nextValue = function.Binary64(next, 0.0);
                AssertOrder(function, x, value, next, nextValue);
                (x, value) = (next, nextValue);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Sorted_points_keep_the_order(string name)
    {
        MeasuredFunction function = MeasuredFunction.All.Single(candidate => candidate.Name == name);
        double[] sorted = [.. Points.For(function, 60_000).Select(point => point.First).Order()];
        for (int i = 1; i < sorted.Length; i++)
        {
            AssertOrder(function, sorted[i - 1], function.Binary64(sorted[i - 1], 0.0), sorted[i], function.Binary64(sorted[i], 0.0));
        }
    }

    private static void AssertOrder(MeasuredFunction function, double x, double value, double next, double nextValue)
    {
        bool isEven = function.Name is "Density" or "LogDensity";
        if (isEven && x < 0.0 && next > 0.0)
        {
            return;
        }

        bool isFalling = isEven ? x >= 0.0 : function.Name is "Erfc" or "ErfcScaled" or "UpperTail";
        Assert.True(
            isFalling ? nextValue <= value : nextValue >= value,
            $"{function.Name}: {value:R} at {x:R}, {nextValue:R} at {next:R}");
    }

    private static bool IsInside(Domain domain, double x) => domain switch
    {
        Domain.Unit => x is >= 0.0 and <= 1.0,
        Domain.SignedUnit => x is >= -1.0 and <= 1.0,
        _ => true,
    };
}
