using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// Mₖ = ∫ (x − c)ᵏ exp(−x²/2) dx over an interval from a to b, one end or both finite, about any centre c.
/// </summary>
/// <remarks>
/// Integration by parts gives, with A = a − c, B = b − c and φ(x) = exp(−x²/2),
/// Mₖ₊₁ + c Mₖ = k Mₖ₋₁ + Aᵏ φ(a) − Bᵏ φ(b), a term with an infinite end being 0. Upward it starts from M₀ (<see cref="NormalIntegral"/>)
/// and loses bits where Mₖ grows more slowly than the recurrence's own solutions: in narrow intervals and far out. Downward
/// it needs no integral at all: |Mₖ| ≤ ρᵏ (b − a) max φ with ρ = max(|A|, |B|) starts it far enough up, and errors die out, fast in narrow
/// intervals. Which way is cheaper is estimated in binary64; the balls say whether the result is good enough, and a bad estimate
/// costs another run.
/// </remarks>
internal static class TruncatedMoments
{
    private const int MaximumPrecision = 1 << 16;

    /// <summary>The moments with k = 0 … count − 1.</summary>
    /// <param name="lower">a; <c>null</c> for −∞.</param>
    /// <param name="upper">b; <c>null</c> for +∞.</param>
    /// <param name="centre">c.</param>
    /// <param name="count">How many.</param>
    /// <param name="precision">The bits to which moments of even order are known at least.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    /// <exception cref="RuleConstructionException">The precision is not reached within the limit.</exception>
    internal static Ball[] About(
        Dyadic? lower, Dyadic? upper, Dyadic centre, int count, int precision, CancellationToken cancellation)
    {
        var interval = TruncatedInterval.FromExact(lower, upper, centre);
        return About((_, _) => interval, count, precision, cancellation);
    }

    /// <summary>The same for an interval and a centre that are known as balls at any precision.</summary>
    /// <param name="enclose">From a working precision to the interval: the relative radii of its distances fall with it.</param>
    /// <param name="count">How many.</param>
    /// <param name="precision">The bits to which moments of even order are known at least.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    /// <exception cref="RuleConstructionException">The precision is not reached within the limit.</exception>
    internal static Ball[] About(
        Func<int, CancellationToken, TruncatedInterval> enclose, int count, int precision, CancellationToken cancellation)
    {
        var plan = TruncatedPlan.For(enclose(64, cancellation), count, precision);
        int working = plan.WorkingPrecision;
        while (working <= MaximumPrecision)
        {
            TruncatedInterval interval = enclose(working, cancellation);
            Ball[] moments = plan.IsDownward
                ? Downward(interval, count, plan.StepsDown(working), working, cancellation)
                : Upward(interval, count, working, cancellation);
            int missing = MissingBits(moments, precision);
            if (missing <= 0)
            {
                return moments;
            }

            working += missing + 32;
        }

        throw new RuleConstructionException(
            RuleFailure.RecurrenceNotDetermined,
            string.Format(
                CultureInfo.InvariantCulture,
                "The moments of the interval need more than {0} bits; choose a wider interval or a smaller table.",
                MaximumPrecision));
    }

    /// <summary>How many bits the even moments lack.</summary>
    private static int MissingBits(Ball[] moments, int precision)
    {
        int missing = int.MinValue;
        for (int k = 0; k < moments.Length; k += 2)
        {
            bool isPositive = moments[k].IsPositive == Trilean.True;
            missing = Math.Max(missing, precision - (isPositive ? moments[k].RelativeAccuracyBits : 0));
        }

        return missing;
    }

    private static Ball[] Upward(TruncatedInterval interval, int count, int working, CancellationToken cancellation)
    {
        var left = Boundary.At(interval.Lower, interval.LowerDistance, working, cancellation);
        var right = Boundary.At(interval.Upper, interval.UpperDistance, working, cancellation);
        var moments = new Ball[count];
        moments[0] = NormalIntegral.Between(interval.Lower, interval.Upper, working, cancellation);
        for (int k = 0; k + 1 < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball next = Ball.Subtract(left.Term, right.Term, working);
            next = Ball.Subtract(next, Ball.Multiply(interval.Centre, moments[k], working), working);
            moments[k + 1] = k == 0 ? next : Ball.Add(next, Ball.Multiply(moments[k - 1], Ball.FromInteger(k), working), working);
            left.Advance(working);
            right.Advance(working);
        }

        return moments;
    }

    private static Ball[] Downward(
        TruncatedInterval interval, int count, int steps, int working, CancellationToken cancellation)
    {
        // Moments in units of ρᵏ, ρ a power of two not below |A| and |B|, so that all are of one size.
        Ball left = interval.LowerDistance!.Value, right = interval.UpperDistance!.Value;
        int power = Math.Max(Approximation.CeilingLog2(left), Approximation.CeilingLog2(right));
        Boundary[] ends =
        [
            Boundary.At(interval.Lower, left, working, cancellation),
            Boundary.At(interval.Upper, right, working, cancellation),
        ];
        Bound start = Approximation.Magnitude(Ball.Subtract(right, left, working)) * LargestDensity(interval, ends);
        Ball[] differences = ScaledDifferences(ends[0], ends[1], power, steps, working, cancellation);
        Ball scaledCentre = interval.Centre.ScaleByPowerOfTwo(power);
        Ball above = default(Ball).Enlarge(start), current = above;
        var moments = new Ball[count];
        for (int k = steps; k >= 1; k--)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = Ball.Add(above.ScaleByPowerOfTwo(2 * power), Ball.Multiply(scaledCentre, current, working), working);
            sum = Ball.Add(sum, differences[k], working);
            (above, current) = (current, Ball.Divide(sum, Ball.FromInteger(k), working));
            if (k <= count)
            {
                moments[k - 1] = current.ScaleByPowerOfTwo(power * (k - 1));
            }
        }

        return moments;
    }

    /// <summary>ρ (Bᵏ φ(b) − Aᵏ φ(a))/ρᵏ for k = 0 … steps.</summary>
    private static Ball[] ScaledDifferences(
        Boundary left, Boundary right, int power, int steps, int working, CancellationToken cancellation)
    {
        var differences = new Ball[steps + 1];
        for (int k = 0; k <= steps; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            differences[k] = Ball.Subtract(right.Term, left.Term, working).ScaleByPowerOfTwo(power * (1 - k));
            left.Advance(working);
            right.Advance(working);
        }

        return differences;
    }

    /// <summary>A bound of the density over the interval; 1 where the interval may contain 0.</summary>
    private static Bound LargestDensity(TruncatedInterval interval, Boundary[] ends) =>
        interval.Lower!.Value.IsPositive == Trilean.True ? Approximation.Magnitude(ends[0].Density)
        : interval.Upper!.Value.IsNegative == Trilean.True ? Approximation.Magnitude(ends[1].Density)
        : Bound.PowerOfTwo(0);

    /// <summary>(end − c)ᵏ φ(end) as k grows; zero for an infinite end.</summary>
    private sealed class Boundary
    {
        private Ball _distance;

        internal Ball Density { get; private set; }

        internal Ball Term { get; private set; }

        internal static Boundary At(Ball? end, Ball? distance, int working, CancellationToken cancellation)
        {
            if (end is not { } x)
            {
                return new Boundary();
            }

            Ball density = Elementary.Exp(Ball.Square(x, working).Negate().ScaleByPowerOfTwo(-1), working, cancellation);
            return new Boundary { _distance = distance!.Value, Density = density, Term = density };
        }

        internal void Advance(int working) => Term = Ball.Multiply(Term, _distance, working);
    }
}
