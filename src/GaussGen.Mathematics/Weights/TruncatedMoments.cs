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
    /// <param name="centre">c; a ball's radius should be far below what is asked for.</param>
    /// <param name="count">How many.</param>
    /// <param name="precision">The bits to which moments of even order are known at least, as far as the centre allows.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    /// <exception cref="RuleConstructionException">The precision is not reached within the limit.</exception>
    internal static Ball[] About(
        Dyadic? lower, Dyadic? upper, Ball centre, int count, int precision, CancellationToken cancellation)
    {
        var plan = TruncatedPlan.For(lower, upper, centre, count, precision);
        int working = plan.WorkingPrecision;
        while (working <= MaximumPrecision)
        {
            Ball[] moments = plan.IsDownward
                ? Downward(lower!.Value, upper!.Value, centre, count, plan.StepsDown(working), working, cancellation)
                : Upward(lower, upper, centre, count, working, cancellation);
            int missing = MissingBits(moments, centre, precision);
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
                "The moments of the interval need more than {0} bits; choose a wider interval or fewer points.",
                MaximumPrecision));
    }

    /// <summary>How many bits the even moments lack; a centre that is a ball itself is not blamed on the working precision.</summary>
    private static int MissingBits(Ball[] moments, Ball centre, int precision)
    {
        int wanted = Math.Min(precision, centre.IsExact ? precision : centre.RelativeAccuracyBits / 2);
        int missing = int.MinValue;
        for (int k = 0; k < moments.Length; k += 2)
        {
            bool isPositive = moments[k].IsPositive == Trilean.True;
            missing = Math.Max(missing, wanted - (isPositive ? moments[k].RelativeAccuracyBits : 0));
        }

        return missing;
    }

    private static Ball[] Upward(
        Dyadic? lower, Dyadic? upper, Ball centre, int count, int working, CancellationToken cancellation)
    {
        Boundary left = Boundary.At(lower, centre, working, cancellation);
        Boundary right = Boundary.At(upper, centre, working, cancellation);
        var moments = new Ball[count];
        moments[0] = NormalIntegral.Between(lower, upper, working, cancellation);
        for (int k = 0; k + 1 < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball next = Ball.Subtract(left.Term, right.Term, working);
            next = Ball.Subtract(next, Ball.Multiply(centre, moments[k], working), working);
            moments[k + 1] = k == 0 ? next : Ball.Add(next, Ball.Multiply(moments[k - 1], Ball.FromInteger(k), working), working);
            left.Advance(working);
            right.Advance(working);
        }

        return moments;
    }

    private static Ball[] Downward(
        Dyadic lower, Dyadic upper, Ball centre, int count, int steps, int working, CancellationToken cancellation)
    {
        // Moments in units of ρᵏ, ρ a power of two not below |A| and |B|, so that all are of one size.
        Ball left = Ball.Subtract(Ball.FromDyadic(lower), centre, working), right = Ball.Subtract(Ball.FromDyadic(upper), centre, working);
        int power = Math.Max(Approximation.CeilingLog2(left), Approximation.CeilingLog2(right));
        Boundary[] ends = [Boundary.At(lower, centre, working, cancellation), Boundary.At(upper, centre, working, cancellation)];
        Ball[] differences = ScaledDifferences(ends[0], ends[1], power, steps, working, cancellation);
        Ball scaledCentre = centre.ScaleByPowerOfTwo(power);
        Bound start = Bound.FromDyadic(upper - lower) * LargestDensity(lower, upper, ends);
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

    private static Bound LargestDensity(Dyadic lower, Dyadic upper, Boundary[] ends) => lower.Sign <= 0 && upper.Sign >= 0
        ? Bound.PowerOfTwo(0)
        : Approximation.Magnitude(lower.Sign > 0 ? ends[0].Density : ends[1].Density);

    /// <summary>(end − c)ᵏ φ(end) as k grows; zero for an infinite end.</summary>
    private sealed class Boundary
    {
        private Ball _distance;

        internal Ball Density { get; private set; }

        internal Ball Term { get; private set; }

        internal static Boundary At(Dyadic? end, Ball centre, int working, CancellationToken cancellation)
        {
            if (end is not { } x)
            {
                return new Boundary();
            }

            Ball density = Elementary.Exp(Ball.FromDyadic(-(x * x).ScaleByPowerOfTwo(-1).Reduce()), working, cancellation);
            return new Boundary
            {
                _distance = Ball.Subtract(Ball.FromDyadic(x), centre, working),
                Density = density,
                Term = density,
            };
        }

        internal void Advance(int working) => Term = Ball.Multiply(Term, _distance, working);
    }
}
