using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>One normal distribution of a mixture.</summary>
/// <param name="Weight">Its weight, above zero; the weights of a mixture need not sum to 1.</param>
/// <param name="Mean">Its mean.</param>
/// <param name="StandardDeviation">Its standard deviation, above zero.</param>
internal readonly record struct NormalComponent(Dyadic Weight, Dyadic Mean, Dyadic StandardDeviation);

/// <summary>
/// A finite mixture of normal distributions. About a centre c a component has the moments y₀ = 1, y₁ = m − c,
/// yₖ₊₁ = (m − c) yₖ + k s² yₖ₋₁ (Stein 1981): all terms of one sign. All dyadic, and so is any finite recurrence rational.
/// </summary>
internal sealed class NormalMixtureWeight : MomentWeight
{
    /// <summary>Up to so many nodes the recurrence is also kept exactly; its integers grow with the square of the number.</summary>
    private const int MostExactPoints = 6;

    private readonly NormalComponent[] _components;
    private readonly Dyadic _centre;

    /// <summary>The mixture of the given components, at least one.</summary>
    internal NormalMixtureWeight(IReadOnlyList<NormalComponent> components)
    {
        Dyadic? centre = CentreOfSymmetry(components);
        IsEven = centre is not null;
        _centre = centre ?? NearMean(components);
        _components = [.. components];
    }

    /// <inheritdoc/>
    internal override bool IsEven { get; }

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        int working = precision + 16;
        var moments = new Ball[count];
        foreach (NormalComponent component in _components)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball mean = Ball.FromDyadic(component.Mean - _centre).Trim(working);
            Ball variance = Ball.FromDyadic(component.StandardDeviation * component.StandardDeviation);
            Ball before = default, current = Ball.FromDyadic(component.Weight);
            for (int k = 0; k < count; k++)
            {
                moments[k] = IsEven && (k & 1) != 0 ? default : Ball.Add(moments[k], current, working);
                Ball next = Ball.Multiply(mean, current, working);
                next = Ball.Add(next, Ball.Multiply(Ball.Multiply(variance, before, working), Ball.FromInteger(k), working), working);
                before = current;
                current = next;
            }
        }

        return moments;
    }

    /// <inheritdoc/>
    internal override RationalRecurrence? ExactRecurrence(int count) =>
        count <= MostExactPoints ? RationalChebyshev.Run(ExactMoments(2 * count), count, IsEven) : null;

    /// <inheritdoc/>
    internal override Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation) =>
        Ball.Add(coordinate, Ball.FromDyadic(_centre), int.MaxValue);

    /// <inheritdoc/>
    internal override Rational? ToLineExactly(Rational coordinate) => coordinate + _centre.ToRational();

    /// <inheritdoc/>
    protected override int ExpectedLoss(int count) => (int)(4 + (count * (Math.Log(Math.Max(count, 2), 2) - 0.2)));

    private Rational[] ExactMoments(int count)
    {
        var moments = new Dyadic[count];
        foreach (NormalComponent component in _components)
        {
            Dyadic mean = component.Mean - _centre, variance = component.StandardDeviation * component.StandardDeviation;
            Dyadic before = Dyadic.Zero, current = component.Weight;
            for (int k = 0; k < count; k++)
            {
                moments[k] += current;
                Dyadic next = (mean * current) + (variance * before * new Dyadic(k, 0));
                before = current;
                current = next.Reduce();
            }
        }

        return Array.ConvertAll(moments, moment => moment.ToRational());
    }

    /// <summary>The centre about which the components lie in mirrored pairs, exactly; <c>null</c> if there is none.</summary>
    private static Dyadic? CentreOfSymmetry(IReadOnlyList<NormalComponent> components)
    {
        NormalComponent[] upward = [.. components.OrderBy(c => c.Mean).ThenBy(c => c.StandardDeviation).ThenBy(c => c.Weight)];
        NormalComponent[] downward = [.. components.OrderByDescending(c => c.Mean).ThenBy(c => c.StandardDeviation).ThenBy(c => c.Weight)];
        Dyadic twice = upward[0].Mean + downward[0].Mean;
        for (int i = 0; i < upward.Length; i++)
        {
            if (upward[i].Mean + downward[i].Mean != twice || upward[i].Weight != downward[i].Weight
                || upward[i].StandardDeviation != downward[i].StandardDeviation)
            {
                return null;
            }
        }

        return twice.ScaleByPowerOfTwo(-1).Reduce();
    }

    /// <summary>A number of few bits near the mean: any centre serves, and short ones cost less.</summary>
    private static Dyadic NearMean(IReadOnlyList<NormalComponent> components)
    {
        Ball total = default, mean = default, square = default;
        foreach (NormalComponent component in components)
        {
            Ball weight = Ball.FromDyadic(component.Weight);
            Ball weighted = Ball.Multiply(weight, Ball.FromDyadic(component.Mean), 128);
            total = Ball.Add(total, weight, 128);
            mean = Ball.Add(mean, weighted, 128);
            square = Ball.Add(square, Ball.Multiply(weighted, Ball.FromDyadic(component.Mean), 128), 128);
            square = Ball.Add(
                square, Ball.Multiply(weight, Ball.FromDyadic(component.StandardDeviation * component.StandardDeviation), 128), 128);
        }

        mean = Ball.Divide(mean, total, 128);
        Ball variance = Ball.Subtract(Ball.Divide(square, total, 128), Ball.Square(mean, 128), 128);
        // A sixteenth of the standard deviation is near enough.
        int grid = (Approximation.FloorLog2(variance) / 2) - 4;
        Dyadic centre = mean.Center;
        return centre.Exponent >= grid ? centre : new Dyadic(centre.Mantissa >> (grid - centre.Exponent), grid);
    }
}
