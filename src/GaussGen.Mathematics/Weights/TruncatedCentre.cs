using System;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// Where to put the centre of the moments of a truncated normal distribution. Chebyshev's algorithm loses about
/// log₂(∫ (x − c)²ᵏ w / hₖ) bits, and hₖ does not depend on c, so the best centre makes the last moment smallest. Estimates in
/// binary64: they decide how long it takes and nothing else.
/// </summary>
internal static class TruncatedCentre
{
    /// <summary>A centre for rules of about so many points.</summary>
    internal static Dyadic Choose(Dyadic? lower, Dyadic? upper, int points)
    {
        if (lower is { } low && upper is { } high && IsNarrow(low, high))
        {
            return (low + high).ScaleByPowerOfTwo(-1).Reduce();
        }

        (double a, double b) = EffectiveEnds(lower, upper, points);
        double left = a, right = b;
        for (int i = 0; i < 60; i++)
        {
            double first = left + ((right - left) * 0.4), second = left + ((right - left) * 0.6);
            (left, right) = LogOfLastMoment(a, b, first, points) < LogOfLastMoment(a, b, second, points) ? (left, second) : (first, right);
        }

        // A sixty-fourth of the extent is near enough, and short numbers cost less.
        Dyadic centre = Approximation.FromDouble(left);
        int grid = Approximation.FloorLog2(Approximation.FromDouble(b - a)) - 6;
        return centre.Exponent >= grid ? centre : new Dyadic(centre.Mantissa >> (grid - centre.Exponent), grid).Reduce();
    }

    /// <summary>
    /// About how many bits Chebyshev's algorithm loses (measured): least where the density hardly varies over the interval, some four more for
    /// each power of e that it varies by, up to what a half-line costs.
    /// </summary>
    internal static int ExpectedLoss(Dyadic? lower, Dyadic? upper, bool isEven, int count)
    {
        double log = Math.Log(Math.Max(count, 2), 2), flat = count * ((0.8 * log) + 0.55);
        (double a, double b) = EffectiveEnds(lower, upper, count);
        double mode = Math.Max(a, Math.Min(b, 0));
        double variation = isEven ? 0 : (Math.Max(a * a, b * b) - (mode * mode)) / 2;
        return (int)(flat + Math.Min(4 * variation, 0.55 * count * log));
    }

    /// <summary>Whether the density varies by less than a factor of about e over the interval.</summary>
    private static bool IsNarrow(Dyadic low, Dyadic high)
    {
        Dyadic far = Dyadic.Abs(low) > Dyadic.Abs(high) ? Dyadic.Abs(low) : Dyadic.Abs(high);
        return far * (high - low) < new Dyadic(1, 0);
    }

    /// <summary>The part of the interval where x²ᵏ w for k up to the number of points is not negligible.</summary>
    private static (double A, double B) EffectiveEnds(Dyadic? lower, Dyadic? upper, int points)
    {
        double a = lower is { } low ? Approximation.ToDouble(low) : double.NegativeInfinity;
        double b = upper is { } high ? Approximation.ToDouble(high) : double.PositiveInfinity;
        double mode = Math.Max(a, Math.Min(b, 0));
        double reach = Math.Sqrt((mode * mode) + (16 * points) + 64);
        return (Math.Max(a, -reach), Math.Min(b, reach));
    }

    private static double LogOfLastMoment(double a, double b, double c, int points)
    {
        double best = double.NegativeInfinity, root = Math.Sqrt((c * c) + (8.0 * points));
        foreach (double candidate in new[] { a, b, (c + root) / 2, (c - root) / 2 })
        {
            double x = Math.Max(a, Math.Min(b, candidate));
            best = Math.Max(best, (2 * points * Math.Log(Math.Abs(x - c) + 1e-300)) - (x * x / 2));
        }

        return best;
    }
}
