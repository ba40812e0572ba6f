using System;
using System.Collections.Generic;
using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Functions.Measuring;

/// <summary>A function of the library beside its enclosure.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Domain">What kind of arguments it takes.</param>
/// <param name="Limit">The most that an error may be, in units in the last place.</param>
/// <param name="Binary64">The function; the second argument is used for intervals alone.</param>
/// <param name="Binary32">The overload for <see cref="float"/>.</param>
/// <param name="Truth">An enclosure of the value; the third argument is what was found, for an inverse to start from.</param>
/// <param name="Branches">Where the function's implementation goes from one form to another.</param>
internal sealed record MeasuredFunction(
    string Name,
    Domain Domain,
    double Limit,
    Func<double, double, double> Binary64,
    Func<float, float, float> Binary32,
    Func<NormalReference, double, double, double, Ball> Truth,
    double[] Branches)
{
    internal static IReadOnlyList<MeasuredFunction> All { get; } =
    [
        new("Erf", Domain.Line, 1.0, (x, _) => ErrorFunction.Erf(x), (x, _) => ErrorFunction.Erf(x),
            (r, x, _, _) => r.ErrorFunctions.Erf(Exact.Of(x)), [-6, -0.5, -1E-150, 0, 1E-150, 0.5, 5.925, 6]),
        new("Erfc", Domain.Line, 1.0, (x, _) => ErrorFunction.Erfc(x), (x, _) => ErrorFunction.Erfc(x),
            (r, x, _, _) => r.ErrorFunctions.Erfc(Exact.Of(x)), [-6, -0.5, 0, 0.5, 26.543, 27.226, 28]),
        new("ErfcScaled", Domain.Scaled, 1.0, (x, _) => ErrorFunction.ErfcScaled(x), (x, _) => ErrorFunction.ErfcScaled(x),
            (r, x, _, _) => r.ErrorFunctions.ErfcScaled(Exact.Of(x)), [-26.628, -6, -0.5, 0, 0.5, 32, 1E150]),
        new("Inverse", Domain.SignedUnit, 2.0, (y, _) => ErrorFunction.Inverse(y), (y, _) => ErrorFunction.Inverse(y),
            (r, y, _, found) => Exact.InverseErf(r, y, found), [-0.9921875, -0.5, -1E-150, 0, 1E-150, 0.5, 0.9921875]),
        new("Density", Domain.Line, 1.0, (x, _) => NormalDistribution.Density(x), (x, _) => NormalDistribution.Density(x),
            (r, x, _, _) => r.Density(Exact.Of(x)), [-40, -38.6, -37.6, 0, 37.6, 38.6, 40]),
        new("LogDensity", Domain.WideLine, 2.0, (x, _) => NormalDistribution.LogDensity(x), (x, _) => NormalDistribution.LogDensity(x),
            (r, x, _, _) => r.LogDensity(Exact.Of(x)), [-1073741824, 0, 1073741824, 1.8E154]),
        new("Cumulative", Domain.Line, 1.0, (x, _) => NormalDistribution.Cumulative(x), (x, _) => NormalDistribution.Cumulative(x),
            (r, x, _, _) => r.Cumulative(Exact.Of(x)), [-40, -38.4, -37.5, -0.5, 0, 0.5, 8.3, 9]),
        new("UpperTail", Domain.Line, 1.0, (x, _) => NormalDistribution.UpperTail(x), (x, _) => NormalDistribution.UpperTail(x),
            (r, x, _, _) => r.UpperTail(Exact.Of(x)), [-9, -8.3, -0.5, 0, 0.5, 37.5, 38.4, 40]),
        new("LogCumulative", Domain.WideLine, 2.0, (x, _) => NormalDistribution.LogCumulative(x), (x, _) => NormalDistribution.LogCumulative(x),
            (r, x, _, _) => r.LogCumulative(Exact.Of(x)), [-1.8E154, -8589934592, -64, -1, 0, 2, 9.2, 37.5, 40]),
        new("Quantile", Domain.Unit, 2.0, (p, _) => NormalDistribution.Quantile(p), (p, _) => NormalDistribution.Quantile(p),
            (r, p, _, found) => Exact.Quantile(r, p, found),
            [0.00390625, 0.25, 0.3125, 0.5, 0.6875, 0.75, 0.99609375, 2.2250738585072014E-308]),
        new("IntervalProbability", Domain.Interval, 2.0, NormalDistribution.IntervalProbability, NormalDistribution.IntervalProbability,
            (r, a, b, _) => r.IntervalProbability(Exact.Of(a), Exact.Of(b)), [-40, -0.5, 0, 0.5, 12, 40]),
    ];
}
