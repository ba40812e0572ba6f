using System;

namespace GaussGen.Benchmarks;

/// <summary>A generated rule as a type argument, so that one benchmark serves all rules without a call in between.</summary>
public interface ITable
{
    static abstract int PointCount { get; }

    static abstract ReadOnlySpan<double> Nodes { get; }

    static abstract ReadOnlySpan<double> Weights { get; }

    static abstract double Expectation<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>;

    static abstract double Expectation(double mean, double standardDeviation, Func<double, double> integrand);
}

[GaussHermite(7)]
internal static partial class Seven
{
}

[GaussHermite(16)]
internal static partial class Sixteen
{
}

[GaussHermite(32)]
internal static partial class ThirtyTwo
{
}

/// <inheritdoc/>
public readonly struct SevenPoints : ITable
{
    public static int PointCount => Seven.PointCount;

    public static ReadOnlySpan<double> Nodes => Seven.Nodes;

    public static ReadOnlySpan<double> Weights => Seven.Weights;

    public static double Expectation<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double> =>
        Seven.Expectation(mean, standardDeviation, integrand);

    public static double Expectation(double mean, double standardDeviation, Func<double, double> integrand) =>
        Seven.Expectation(mean, standardDeviation, integrand);
}

/// <inheritdoc/>
public readonly struct SixteenPoints : ITable
{
    public static int PointCount => Sixteen.PointCount;

    public static ReadOnlySpan<double> Nodes => Sixteen.Nodes;

    public static ReadOnlySpan<double> Weights => Sixteen.Weights;

    public static double Expectation<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double> =>
        Sixteen.Expectation(mean, standardDeviation, integrand);

    public static double Expectation(double mean, double standardDeviation, Func<double, double> integrand) =>
        Sixteen.Expectation(mean, standardDeviation, integrand);
}

/// <inheritdoc/>
public readonly struct ThirtyTwoPoints : ITable
{
    public static int PointCount => ThirtyTwo.PointCount;

    public static ReadOnlySpan<double> Nodes => ThirtyTwo.Nodes;

    public static ReadOnlySpan<double> Weights => ThirtyTwo.Weights;

    public static double Expectation<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double> =>
        ThirtyTwo.Expectation(mean, standardDeviation, integrand);

    public static double Expectation(double mean, double standardDeviation, Func<double, double> integrand) =>
        ThirtyTwo.Expectation(mean, standardDeviation, integrand);
}
