using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>From exact and enclosed values to numbers whose rounding is known.</summary>
internal static class KnownNumbers
{
    private const int FirstPrecision = 128;

    private const int LargestPrecision = 1 << 13;

    /// <summary>A number that is known exactly, a tie included.</summary>
    public static KnownNumber Exact(BinaryFormat format, Rational value)
    {
        BigInteger denominator = value.Denominator;
        if ((denominator & (denominator - 1)).IsZero)
        {
            return Exact(format, new Dyadic(value.Numerator, 1 - Magnitude.BitLength(denominator)));
        }

        // A midpoint between representable numbers is dyadic and this number is not, so that some enclosure decides.
        for (int precision = FirstPrecision; ; precision *= 2)
        {
            Ball ball = Ball.FromRational(value, precision);
            if (NearestValue.Of(format, ball) is ulong bits)
            {
                return new KnownNumber(ball.Lower, ball.Upper, bits);
            }
        }
    }

    /// <summary>A number that is known exactly, a tie included.</summary>
    public static KnownNumber Exact(BinaryFormat format, Dyadic value) =>
        new(value, value, NearestValue.Of(format, Ball.FromDyadic(value)));

    /// <summary>A number that is known to be beyond every format, and not enclosed.</summary>
    public static KnownNumber TooLarge(BinaryFormat format) => new(Dyadic.Zero, Dyadic.Zero, format.Infinity);

    /// <summary>
    /// Encloses numbers at growing precision until each lies between the midpoints around one representable value, or the precision
    /// is at its end.
    /// </summary>
    /// <param name="format">The number format.</param>
    /// <param name="given">Those that are known already; <c>null</c> for each that is to be enclosed.</param>
    /// <param name="enclose">From a precision in bits to enclosures of all numbers, those included that are known already.</param>
    /// <param name="cancellation">Looked at before each round.</param>
    public static KnownNumber[] Decide(
        BinaryFormat format, IReadOnlyList<KnownNumber?> given, Func<int, IReadOnlyList<Ball>> enclose, CancellationToken cancellation)
    {
        KnownNumber?[] known = [.. given];
        for (int precision = FirstPrecision; Array.Exists(known, number => number?.Bits is null); precision *= 2)
        {
            cancellation.ThrowIfCancellationRequested();
            IReadOnlyList<Ball> balls = enclose(precision);
            for (int i = 0; i < known.Length; i++)
            {
                if (known[i]?.Bits is null)
                {
                    known[i] = balls[i].IsFinite
                        ? new KnownNumber(balls[i].Lower, balls[i].Upper, NearestValue.Of(format, balls[i]))
                        : new KnownNumber(Dyadic.Zero, Dyadic.Zero, null);
                }
            }

            if (precision >= LargestPrecision)
            {
                break;
            }
        }

        return [.. known.Select(number => number!)];
    }
}
