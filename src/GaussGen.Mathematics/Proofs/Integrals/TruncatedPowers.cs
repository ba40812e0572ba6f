using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Integrals;

/// <summary>
/// Integrals of powers times a normal density on a part of the line, up to the density's value at one point: with y = x − c,
/// exp(−x²/2) = exp(−c²/2) exp(−cy − y²/2).
/// </summary>
/// <remarks>
/// <para>
/// On a finite length L the exponential is its Taylor series in τ = y/L (<see cref="ExponentialSeries"/>), integrated term by term. No
/// integral is found from another, and no end value of the density is needed. The series' alternation is paid for in bits.
/// </para>
/// <para>
/// What lies beyond a reach R is bounded: yᵏ exp(−cy − y²/2) has the logarithmic derivative k/y − c − y, which falls, so that beyond R
/// the function is at most its value there times exp(−d(y − R)) with d = c + R − k/R, and the integral at most that value over d, for d > 0.
/// </para>
/// <para>
/// The series is summed at the midpoints of c and L, for its cancellation would blow up their radii. Where c is off by at most r, the integral
/// is off by at most r exp(rL) times that of the next power, because |exp(−δy) − 1| ≤ |δ| y exp(|δ|y); where L is, by at most the radius
/// times the largest value of the integrand near L.
/// </para>
/// </remarks>
internal static class TruncatedPowers
{
    private const int MaximumAttempts = 4;

    /// <summary>∫ (x − c)ᵏ exp((c² − x²)/2) dx from c − below to c + above, for k = 0, …, count − 1.</summary>
    /// <param name="center">c.</param>
    /// <param name="below">The distance from the lower end to c, not negative; <c>null</c> for −∞.</param>
    /// <param name="above">The distance from c to the upper end, not negative; <c>null</c> for +∞.</param>
    /// <param name="count">The number of integrals.</param>
    /// <param name="precision">The relative accuracy in bits that the integral of each side is to have.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    public static Ball[] About(Ball center, Ball? below, Ball? above, int count, int precision, CancellationToken cancellation)
    {
        Ball[] left = OneSided(Ball.Negate(center), below, count, precision, cancellation);
        Ball[] right = OneSided(center, above, count, precision, cancellation);
        for (int k = 0; k < count; k++)
        {
            right[k] = Ball.Add(right[k], (k & 1) == 0 ? left[k] : Ball.Negate(left[k]), precision + 32);
        }

        return right;
    }

    /// <summary>∫ yᵏ exp(−cy − y²/2) dy from 0 to the length, for k = 0, …, count − 1.</summary>
    /// <param name="slope">c, of either sign.</param>
    /// <param name="length">The length, not negative; <c>null</c> for ∞.</param>
    /// <param name="count">The number of integrals.</param>
    /// <param name="precision">The relative accuracy in bits that each integral is to have, as far as that of c and the length allows.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    public static Ball[] OneSided(Ball slope, Ball? length, int count, int precision, CancellationToken cancellation)
    {
        int aim = precision + 40;
        int before = int.MinValue;
        for (int attempt = 1; ; attempt++)
        {
            Ball[] integrals = OnceOneSided(slope, length, count, aim, cancellation);
            int accuracy = LeastAccuracy(integrals);
            if (accuracy >= precision || attempt == MaximumAttempts || accuracy <= before)
            {
                return integrals;
            }

            before = accuracy;

            aim = checked(aim + Math.Min(precision - accuracy, 2 * aim) + 8);
        }
    }

    private static Ball[] OnceOneSided(Ball slope, Ball? length, int count, int aim, CancellationToken cancellation)
    {
        var plan = SidePlan.For(Estimate.Of(slope), length is { } given ? Estimate.Of(given) : double.PositiveInfinity, count - 1, aim);
        var integrals = new Ball[count];
        if (plan is null)
        {
            for (int k = 0; k < count; k++)
            {
                integrals[k] = Ball.WholeLine;
            }

            return integrals;
        }

        int bits = plan.Bits;
        bool isCut = plan.IsCut || length is null;
        Ball end = Ball.FromDyadic(isCut ? Estimate.Exactly(plan.Reach) : length!.Value.Center);
        Ball first = Ball.Multiply(Ball.FromDyadic(slope.Center), end, bits + 16);
        Ball second = Ball.Square(end, bits + 16).ScaleByPowerOfTwo(-1);
        var series = new ExponentialSeries([first, second], bits, cancellation);

        // The density at the end, for every argument in the balls.
        Ball edge = isCut ? end : length!.Value;
        Ball exponent = Ball.Add(Ball.Multiply(slope, edge, 64), Ball.Square(edge, 64).ScaleByPowerOfTwo(-1), 64);
        Bound last = Above(Elementary.Exp(Ball.Negate(exponent), 64, cancellation));
        Bound vague = slope.Radius * Growth(slope.Radius, end.Center, cancellation);
        Bound furthest = Bound.PowerOfTwo(0);
        Ball power = end;
        Ball value = Ball.Multiply(power, series.FromZero(0), aim + 32);
        for (int k = 0; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball above = Ball.Multiply(power = Ball.Multiply(power, end, aim + 32), series.FromZero(k + 1), aim + 32);
            Bound missing = isCut ? Beyond(slope, end, Above(end) * furthest, last, k) : edge.Radius * furthest * last;
            integrals[k] = value.Enlarge((vague * Above(above)) + missing);
            furthest *= Above(edge);
            value = above;
        }

        return integrals;
    }

    /// <summary>exp(rL) or more.</summary>
    private static Bound Growth(Bound radius, Dyadic end, CancellationToken cancellation)
    {
        if (radius.IsZero)
        {
            return Bound.PowerOfTwo(0);
        }

        Dyadic exponent = radius.ToDyadic() * end;
        return exponent > new Dyadic(1, 20)
            ? Bound.Infinite
            : Above(Elementary.Exp(Ball.FromDyadic(exponent), 64, cancellation));
    }

    /// <summary>R^(k+1) exp(−cR − R²/2) / (R(c + R) − k), or no bound where the divisor may not be above zero.</summary>
    private static Bound Beyond(Ball slope, Ball end, Bound power, Bound last, int k)
    {
        Ball divisor = Ball.Subtract(Ball.Multiply(end, Ball.Add(slope, end, 64), 64), Ball.FromInteger(k), 64);
        return divisor.IsPositive == Trilean.True ? Bound.DivideByAtLeast(power * last, divisor.Lower) : Bound.Infinite;
    }

    private static Bound Above(Ball value) => Bound.FromMagnitude(value.Midpoint, value.Exponent) + value.Radius;

    private static int LeastAccuracy(Ball[] values)
    {
        int least = int.MaxValue;
        foreach (Ball value in values)
        {
            least = Math.Min(least, value.IsFinite ? value.RelativeAccuracyBits : 0);
        }

        return least;
    }

    /// <summary>How far to integrate, and with how many bits; chosen by estimates, which may be wrong.</summary>
    private sealed record SidePlan(bool IsCut, double Reach, int Bits)
    {
        // Beyond this the sizes do not matter any more.
        private const double MostBits = 1 << 22;

        private const int MaximumSteps = 200;

        public static SidePlan? For(double slope, double length, int power, int aim)
        {
            if (double.IsNaN(slope) || double.IsInfinity(slope) || double.IsNaN(length))
            {
                return null;
            }

            // The integrand of the highest power is largest at the peak; from there on it must fall by so many bits.
            double fall = (aim + (power * Estimate.Log2Error)) / Estimate.BitsPerUnit;
            double root = Root(slope, 4.0 * power);
            double peak = slope > 0 ? 2.0 * power / (slope + root) : (root - slope) / 2;
            double reach = peak + (2 * fall / (Math.Max(slope, 0) + Root(slope, 2 * fall)));
            double Lost(double y) => y <= 0 ? 0 : (slope * y) + (y * y / 2) - (power * Estimate.Log2(y) / Estimate.BitsPerUnit);
            for (int step = 0; step < MaximumSteps && reach < length && Lost(reach) - Lost(peak) < fall; step++)
            {
                reach += reach / 16;
            }

            bool isCut = reach < length;
            double end = isCut ? reach : length;
            double top = Math.Min(peak, end);
            double terms = (Math.Abs(slope) * end) + (end * end / 2);
            double value = top <= 0 ? 0 : (slope * top) + (top * top / 2);
            double rise = top <= 0 || power == 0 ? 0 : power * (Estimate.Log2(end / top) + Estimate.Log2Error);
            double bits = aim + (Estimate.BitsPerUnit * (terms + value)) + rise;
            return bits < MostBits && reach > 0 && !double.IsInfinity(reach) ? new SidePlan(isCut, reach, (int)bits) : null;
        }

        /// <summary>√(slope² + addend), without overflow.</summary>
        private static double Root(double slope, double addend) =>
            Math.Abs(slope) > 1e150 ? Math.Abs(slope) : Math.Sqrt((slope * slope) + addend);
    }
}
