using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>
/// One of the zeros of a polynomial all of whose zeros are above zero and simple, by exact signs at its two sides: README.md, section 2.
/// Thread-safe.
/// </summary>
internal sealed class PositiveZero
{
    // Steps from 4 to 1/16, up to 8192: the extensions are done with the first one.
    private const int MaximumScans = 7;

    /// <summary>Halvings of an interval from the grid before Newton's method takes over.</summary>
    private const int Halvings = 12;

    private readonly IntegerPolynomial _polynomial;
    private readonly IntegerPolynomial _derivative;
    private readonly Dyadic _low;
    private readonly Dyadic _high;
    private readonly int _signBelow;

    private PositiveZero(IntegerPolynomial polynomial, IntegerPolynomial derivative, Dyadic low, Dyadic high, int signBelow)
    {
        _polynomial = polynomial;
        _derivative = derivative;
        _low = low;
        _high = high;
        _signBelow = signBelow;
    }

    /// <summary>The zero, where the polynomial is linear; else <c>null</c>.</summary>
    internal Rational? ExactValue =>
        _polynomial.Degree == 1 ? new Rational(-_polynomial[0], _polynomial[1]) : null;

    /// <summary>
    /// All zeros of a polynomial, ascending. The signs at points of an ever finer and longer grid are looked at, until as many changes
    /// as the degree are found: then each interval has one zero, and there are no others.
    /// </summary>
    /// <exception cref="InvalidOperationException">The polynomial seems to have zeros that are not positive and simple.</exception>
    internal static PositiveZero[] AllOf(IntegerPolynomial polynomial, CancellationToken cancellation)
    {
        IntegerPolynomial derivative = polynomial.Derivative();
        for (int scan = 0; scan < MaximumScans; scan++)
        {
            var zeros = new List<PositiveZero>();
            Dyadic before = Dyadic.Zero;
            int sign = polynomial[0].Sign;
            for (int j = 1; j <= 32 << (2 * scan); j++)
            {
                cancellation.ThrowIfCancellationRequested();
                var point = new Dyadic(j, 2 - scan);
                int next = polynomial.At(point).Sign;
                if (next != 0 && next != sign)
                {
                    (Dyadic low, Dyadic high) = Halve(polynomial, before, point, sign, Halvings, cancellation);
                    zeros.Add(new PositiveZero(polynomial, derivative, low, high, sign));
                }

                (before, sign) = next != 0 ? (point, next) : (before, sign);
            }

            if (zeros.Count == polynomial.Degree)
            {
                return [.. zeros];
            }
        }

        throw new InvalidOperationException("A polynomial that extends a rule has zeros that are not positive and simple.");
    }

    /// <summary>A ball around the zero with a relative radius of at most 2^−precision.</summary>
    internal Ball Enclose(int precision, CancellationToken cancellation)
    {
        if (ExactValue is { } exact)
        {
            return Ball.FromRational(exact, precision + 2);
        }

        (Dyadic low, Dyadic high) = (_low, _high);
        for (int halvings = Halvings; ; halvings *= 2)
        {
            Dyadic point = Newton(Middle(low, high), precision, cancellation);
            var radius = new Dyadic(1, Approximation.FloorLog2(point) - precision - 2);
            if (IsBetween(point - radius, point + radius))
            {
                return Ball.FromEndpoints(point - radius, point + radius, precision + 32);
            }

            // By halving alone the interval becomes as narrow as it must be.
            if (Approximation.FloorLog2(high - low) < Approximation.FloorLog2(high) - precision - 4)
            {
                return Ball.FromEndpoints(low, high, precision + 32);
            }

            (low, high) = Halve(_polynomial, low, high, _signBelow, halvings, cancellation);
        }
    }

    /// <summary>The part of an isolating interval that has the zero; its upper end has not the sign below it, and may be the zero.</summary>
    private static (Dyadic Low, Dyadic High) Halve(
        IntegerPolynomial polynomial, Dyadic low, Dyadic high, int signBelow, int times, CancellationToken cancellation)
    {
        for (int i = 0; i < times; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic middle = Middle(low, high);
            (low, high) = polynomial.At(middle).Sign == signBelow ? (middle, high) : (low, middle);
        }

        return (low, high);
    }

    /// <summary>Whether the zero surely lies between two points.</summary>
    private bool IsBetween(Dyadic low, Dyadic high) => low >= _low && high <= _high
        && _polynomial.At(low).Sign == _signBelow && _polynomial.At(high).Sign == -_signBelow;

    /// <summary>Newton's method with twice as many bits in each step. Nothing is proven here.</summary>
    private Dyadic Newton(Dyadic point, int precision, CancellationToken cancellation)
    {
        for (int bits = 8; bits < precision + 16;)
        {
            cancellation.ThrowIfCancellationRequested();
            bits *= 2;
            Dyadic slope = _derivative.At(point);
            if (slope.IsZero)
            {
                return point;
            }

            Ball step = Ball.Divide(Ball.FromDyadic(_polynomial.At(point)), Ball.FromDyadic(slope), bits + 8);
            Dyadic next = point - step.Center;
            int drop = Math.Max(0, next.BitLength - bits - 16);
            point = new Dyadic(next.Mantissa >> drop, next.Exponent + drop);
        }

        return point;
    }

    private static Dyadic Middle(Dyadic low, Dyadic high) => (low + high).ScaleByPowerOfTwo(-1).Reduce();
}
