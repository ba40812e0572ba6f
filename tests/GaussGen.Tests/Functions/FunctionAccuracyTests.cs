using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Functions.Measuring;
using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>
/// The error functions against enclosures: neighbours of every branch and of every row's ends, hard cases, and random points in
/// all ranges. A million points are measured by a command of the benchmarks.
/// </summary>
public sealed class FunctionAccuracyTests
{
    private const int Count = 20_000;

    // 128 bits leave more than 40 for the error of a binary64 number; preparing takes a moment and is shared.
    private static readonly Lazy<NormalReference> Reference = new(() => new NormalReference(128));

    public static TheoryData<string> Names => [.. MeasuredFunction.All.Select(function => function.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public void The_error_is_below_the_limit(string name)
    {
        MeasuredFunction function = Find(name);
        List<(double First, double Second)> points = Points.For(function, Count);
        Assert.Equal(Count, points.Count);
        int nearest = 0;
        foreach ((double first, double second) in points)
        {
            double value = function.Binary64(first, second);
            Ball truth = function.Truth(Reference.Value, first, second, value);
            double error = UlpError.Of(truth, value, BinaryFormat.Binary64);
            Assert.True(error <= function.Limit, $"{name}({first:R}, {second:R}) = {value:R}: {error} units");
            nearest += error <= 0.5 ? 1 : 0;
        }

        // A limit of 2 units would let half of the bits of a wrong coefficient pass; nearly all results are the nearest number.
        Assert.True(nearest > 0.96 * Count, $"{nearest} nearest");
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void The_binary32_overloads_are_nearly_always_the_nearest_number(string name)
    {
        MeasuredFunction function = Find(name);
        foreach ((double first, double second) in Points.For(function, Count))
        {
            double error = SingleError.Of(Reference.Value, function, (float)first, (float)second);
            Assert.True(error <= 0.5001, $"{name}({(float)first:R}, {(float)second:R}): {error} units");
        }
    }

    [Fact]
    public void A_neighbour_of_the_result_would_be_seen()
    {
        Ball truth = Reference.Value.Cumulative(Exact.Of(-3.0));
        double value = NormalDistribution.Cumulative(-3.0);
        Assert.True(UlpError.Of(truth, value, BinaryFormat.Binary64) <= 0.5);
        Assert.InRange(UlpError.Of(truth, Math.BitIncrement(Math.BitIncrement(value)), BinaryFormat.Binary64), 1.5, 2.5);
        Assert.Equal(double.PositiveInfinity, UlpError.Of(truth, double.NaN, BinaryFormat.Binary64));
    }

    private static MeasuredFunction Find(string name) => MeasuredFunction.All.Single(function => function.Name == name);
}
