using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>One zero of a rule's polynomial, between two points at which the polynomial has opposite signs.</summary>
/// <param name="low">The lower point.</param>
/// <param name="high">The upper point.</param>
/// <param name="signAbove">The polynomial's sign at the upper point.</param>
internal sealed class RuleZero(Dyadic low, Dyadic high, int signAbove)
{
    // The first guess of how many bits a step of Newton's method gains.
    private int _gain = 32;

    /// <summary>The lower point.</summary>
    public Dyadic Low { get; private set; } = low;

    /// <summary>The upper point.</summary>
    public Dyadic High { get; private set; } = high;

    /// <summary>An enclosure of the zero.</summary>
    public Ball Enclosure => Ball.FromEndpoints(Low, High, int.MaxValue);

    /// <summary>
    /// Moves the points nearer to each other. Newton's method proposes where the zero is, and the signs at two points around that prove it;
    /// where they do not, the interval is halved.
    /// </summary>
    /// <returns>False if the polynomial's enclosure does not tell its sign where it would have to.</returns>
    public bool Narrow(NodePolynomial polynomial, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        Dyadic width = High - Low;
        int widthLog2 = width.BitLength + width.Exponent;
        Dyadic middle = Low + width.ScaleByPowerOfTwo(-1);
        Ball value = polynomial.Value(Ball.FromDyadic(middle));
        if (value.ContainsZero)
        {
            return HalveBeside(polynomial, width);
        }

        bool isAbove = value.Midpoint.Sign == signAbove;
        Ball slope = polynomial.Slope(Ball.FromDyadic(middle));
        if (!slope.ContainsZero && Try(polynomial, middle, Ball.Divide(value, slope, 2 * _gain).Center, widthLog2))
        {
            return true;
        }

        (Low, High) = isAbove ? (Low, middle.Reduce()) : (middle.Reduce(), High);
        return true;
    }

    /// <summary>Tries the interval of 2^−gain of the width around the point that Newton's method gives.</summary>
    private bool Try(NodePolynomial polynomial, Dyadic middle, Dyadic offset, int widthLog2)
    {
        int unit = widthLog2 - _gain - 3;
        Dyadic guess = Cut(middle - offset, unit);
        var radius = new Dyadic(BigInteger.One, widthLog2 - _gain);
        Dyadic low = guess - radius, high = guess + radius;
        bool isInside = low > Low && high < High;
        if (isInside && polynomial.Sign(low) == -signAbove && polynomial.Sign(high) == signAbove)
        {
            Low = low.Reduce();
            High = high.Reduce();
            _gain = Math.Min(2 * _gain, 1 << 12);
            return true;
        }

        _gain = Math.Max(_gain / 2, 4);
        return false;
    }

    /// <summary>The middle may be the zero itself: halves the interval, nearly, at another point.</summary>
    private bool HalveBeside(NodePolynomial polynomial, Dyadic width)
    {
        Dyadic lower = (Low + (width * new Dyadic(7, -4))).Reduce(), upper = (Low + (width * new Dyadic(9, -4))).Reduce();
        int? signLow = polynomial.Sign(lower), signHigh = polynomial.Sign(upper);
        if (signLow is null || signHigh is null)
        {
            return false;
        }

        Dyadic low = signLow == signAbove ? Low : signHigh == signAbove ? lower : upper;
        High = signLow == signAbove ? lower : signHigh == signAbove ? upper : High;
        Low = low;
        return true;
    }

    /// <summary>The number without what is below a unit.</summary>
    private static Dyadic Cut(Dyadic value, int unit) =>
        value.Exponent >= unit ? value : new Dyadic(value.Mantissa >> (unit - value.Exponent), unit);
}
