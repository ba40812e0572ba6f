using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>The normal distribution with mean m and standard deviation s on an interval, one end or both finite; all are dyadic.</summary>
/// <param name="mean">m.</param>
/// <param name="deviation">s.</param>
/// <param name="lower">The lower end; <c>null</c> for −∞.</param>
/// <param name="upper">The upper end; <c>null</c> for +∞.</param>
internal sealed class TruncatedNormalDistribution(Dyadic mean, Dyadic deviation, Dyadic? lower, Dyadic? upper)
{
    internal Dyadic Mean => mean;

    internal Dyadic Deviation => deviation;

    internal Dyadic? Lower => lower;

    internal Dyadic? Upper => upper;

    /// <summary>Whether the interval is symmetric about m.</summary>
    internal bool IsSymmetric => lower is { } low && upper is { } high && low + high == mean.ScaleByPowerOfTwo(1);

    /// <summary>Whether one end is more than so many standard deviations away from m, with the whole interval beyond it.</summary>
    internal bool IsBeyond(int deviations)
    {
        Dyadic far = deviation * new Dyadic(deviations, 0);
        return (lower is { } low && low - mean > far) || (upper is { } high && mean - high > far);
    }

    /// <summary>
    /// The interval and a centre c in standard deviations from m. Each difference is formed exactly before it is divided, so that all are known
    /// to the working precision relative to themselves.
    /// </summary>
    internal TruncatedInterval About(Dyadic centre, int working) => new(
        InDeviations(lower - mean, working),
        InDeviations(upper - mean, working),
        InDeviations(lower - centre, working),
        InDeviations(upper - centre, working),
        InDeviations(centre - mean, working)!.Value);

    /// <summary>A dyadic number close to the mean of the truncated distribution: m where that is the mean itself. No bound.</summary>
    internal Dyadic ChooseCentre(CancellationToken cancellation)
    {
        if (IsSymmetric)
        {
            return mean;
        }

        // From the mode: moments about it determine the distance to the mean.
        Dyadic mode = lower is { } low && low > mean ? low : upper is { } high && high < mean ? high : mean;
        Ball[] moments = TruncatedMoments.About((working, _) => About(mode, working), 3, 64, cancellation);
        Ball distance = Ball.Multiply(Ball.Divide(moments[1], moments[0], 64), Ball.FromDyadic(deviation), 64);
        Dyadic step = distance.Center;
        int surplus = Math.Max(0, step.BitLength - CentreBits);
        return (mode + new Dyadic(step.Mantissa >> surplus, step.Exponent + surplus)).Reduce();
    }

    // About so many bits of the distance from the mode; what is left is removed by the binomial theorem and costs nothing.
    private const int CentreBits = 30;

    private Ball? InDeviations(Dyadic? difference, int working)
    {
        if (difference is not { } exact)
        {
            return null;
        }

        Ball value = Ball.FromDyadic(exact.Reduce());
        Dyadic unit = deviation.Reduce();
        return unit.Mantissa.IsOne
            ? value.ScaleByPowerOfTwo(-unit.Exponent).Trim(working)
            : Ball.Divide(value, Ball.FromDyadic(unit), working);
    }
}
