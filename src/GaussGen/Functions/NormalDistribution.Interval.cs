using System;

namespace GaussGen;

/// <content>The probability of an interval.</content>
public static partial class NormalDistribution
{
    /// <summary>The probability of a value between two numbers, without cancellation in either tail or for a narrow interval.</summary>
    /// <param name="lower">The lower end; −∞ is allowed.</param>
    /// <param name="upper">The upper end, not below the lower one; +∞ is allowed.</param>
    /// <returns>A number from 0 to 1: 0 where the ends are equal, NaN where one is NaN. Accurate to 1.4 units.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="upper"/> is below <paramref name="lower"/>.</exception>
    public static double IntervalProbability(double lower, double upper)
    {
        if (!(lower < upper))
        {
            return EmptyInterval(lower, upper);
        }

        // Mirrored, where most of it lies below zero: then the end with the larger magnitude is the upper one.
        if (-lower > upper)
        {
            (lower, upper) = (-upper, -lower);
        }

        if (lower >= NormalTail.End)
        {
            return 0.0;
        }

        if ((upper - lower) * Math.Max(1.0, upper) <= 0.25)
        {
            return Narrow(lower, upper);
        }

        return lower >= 0.5 ? BetweenTails(lower, upper) : BetweenIntegrals(lower, upper);
    }

    /// <summary>The probability of an interval in binary32; see <see cref="IntervalProbability(double, double)"/>.</summary>
    /// <param name="lower">The lower end; −∞ is allowed.</param>
    /// <param name="upper">The upper end, not below the lower one; +∞ is allowed.</param>
    /// <returns>A number from 0 to 1; NaN where one end is NaN. Accurate to 0.5001 units of binary32.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="upper"/> is below <paramref name="lower"/>.</exception>
    public static float IntervalProbability(float lower, float upper) => (float)IntervalProbability((double)lower, (double)upper);

    private static double EmptyInterval(double lower, double upper) => lower == upper ? 0.0
        : lower > upper
            ? throw new ArgumentOutOfRangeException(nameof(upper), upper, "The upper end must not be below the lower end; exchange them.")
            : double.NaN;

    /// <summary>The difference of two tails; both are multiples of the power of two of the larger.</summary>
    private static double BetweenTails(double lower, double upper)
    {
        double larger = NormalTail.Pair(lower, out double largerLow, out int k);
        if (upper >= NormalTail.End)
        {
            return Exponential.Scale(larger + largerLow, k);
        }

        double smaller = NormalTail.Pair(upper, out double smallerLow, out int smallerPower);
        double scale = smallerPower - k < -200 ? 0.0 : Exponential.PowerOfTwo(smallerPower - k);
        double difference = Sum(larger, -(smaller * scale), out double lost);
        return Exponential.Scale(difference + (lost + (largerLow - (smallerLow * scale))), k);
    }

    /// <summary>The integral from zero to the upper end, less or with that to the lower one; |lower| is at most upper, lower below 1/2.</summary>
    private static double BetweenIntegrals(double lower, double upper)
    {
        double above = NormalTail.FromZeroPair(upper, out double aboveLow);
        double below = NormalTail.FromZeroPair(Math.Abs(lower), out double belowLow);
        if (lower > 0.0)
        {
            (below, belowLow) = (-below, -belowLow);
        }

        double sum = Sum(above, below, out double lost);
        return sum + (lost + (aboveLow + belowLow));
    }

    /// <summary>
    /// About the middle m of a width w: φ(m) w Σ He₂ₖ(m) (w/2)^2k/(2k + 1)!, Taylor's series with the derivatives of the density
    /// (NIST DLMF 18.5.5 in the form for He, as 18.7.12). With w·max(1, m) up to 1/4, six terms leave less than 2^−60.
    /// </summary>
    private static double Narrow(double lower, double upper)
    {
        double width = Sum(upper, -lower, out double widthLost);
        double twiceMiddle = Sum(upper, lower, out double middleLost);
        double middle = 0.5 * twiceMiddle;
        int power = 0;
        if (width < 1E-250)
        {
            // Scaled up, for the parts of a tiny product would be lost.
            width *= Exponential.PowerOfTwo(600);
            widthLost *= Exponential.PowerOfTwo(600);
            power = -600;
        }

        double correction = power != 0 ? 0.0 : NarrowCorrection(middle, width);
        double head = Exponential.Head(width);
        double tail = (width - head) + widthLost;
        double product = head * FunctionTables.PeakDensityHead;
        double rest = (head * FunctionTables.PeakDensityTail)
            + (tail * (FunctionTables.PeakDensityHead + FunctionTables.PeakDensityTail));
        rest += (product + rest) * correction;
        double productHead = Exponential.Head(product);
        rest += product - productHead;

        double square = Exponential.Square(middle, out double small);
        small += middle * middleLost;
        double high = Exponential.Product(0.5 * square, 0.5 * small, productHead, rest, out double low, out int k);
        return Exponential.Scale(high + low, k + power);
    }

    /// <summary>Σ from k = 1 to 5 of He₂ₖ(m) (w/2)^2k/(2k + 1)!, in p = (mw/2)² and q = (w/2)², which are both small.</summary>
    private static double NarrowCorrection(double middle, double width)
    {
        double half = 0.5 * width;
        double q = half * half;
        double root = middle * half;
        double p = root * root;
        double second = p - q;
        double fourth = (p * (p - (6.0 * q))) + (3.0 * q * q);
        double sixth = (p * ((p * (p - (15.0 * q))) + (45.0 * q * q))) - (15.0 * q * q * q);
        double eighth = (p * ((p * ((p * (p - (28.0 * q))) + (210.0 * q * q))) - (420.0 * q * q * q))) + (105.0 * q * q * q * q);
        double tenth = (p * ((p * ((p * ((p * (p - (45.0 * q))) + (630.0 * q * q))) - (3150.0 * q * q * q))) + (4725.0 * q * q * q * q)))
            - (945.0 * q * q * q * q * q);
        return (second / 6.0) + (fourth / 120.0) + (sixth / 5040.0) + (eighth / 362880.0) + (tenth / 39916800.0);
    }
}
