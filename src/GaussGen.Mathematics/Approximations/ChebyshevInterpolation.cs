using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Approximations;

/// <summary>
/// The polynomial that equals a function at the zeros of a Chebyshev polynomial, as coefficients of powers of the distance from the
/// interval's middle (Trefethen 2013, "Approximation Theory and Approximation Practice", chapters 3 and 4).
/// </summary>
internal static class ChebyshevInterpolation
{
    /// <summary>Interpolates.</summary>
    /// <param name="function">The function, of a number of the interval.</param>
    /// <param name="middle">The middle of the interval.</param>
    /// <param name="halfWidth">Half its width.</param>
    /// <param name="degree">The degree of the polynomial.</param>
    /// <param name="precision">The working precision; divided differences lose about two bits a degree.</param>
    /// <param name="cancellation">Looked at for each value of the function.</param>
    /// <returns>The degree + 1 coefficients, the constant first.</returns>
    internal static Ball[] Interpolate(
        Func<Dyadic, Ball> function,
        Dyadic middle,
        Dyadic halfWidth,
        int degree,
        int precision,
        CancellationToken cancellation)
    {
        int count = degree + 1;
        var offsets = new Ball[count];
        var differences = new Ball[count];
        for (int i = 0; i < count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic offset = (halfWidth * Cosine((2 * i) + 1, 2 * count, cancellation)).Reduce();
            offsets[i] = Ball.FromDyadic(offset);
            differences[i] = function((middle + offset).Reduce());
        }

        // Newton's divided differences, then Horner's scheme from Newton's form to powers.
        for (int order = 1; order < count; order++)
        {
            for (int i = count - 1; i >= order; i--)
            {
                differences[i] = Ball.Divide(
                    Ball.Subtract(differences[i], differences[i - 1], precision),
                    Ball.Subtract(offsets[i], offsets[i - order], precision),
                    precision);
            }
        }

        var coefficients = new Ball[count];
        for (int i = count - 1; i >= 0; i--)
        {
            for (int k = count - 1; k > 0; k--)
            {
                coefficients[k] = Ball.Subtract(
                    coefficients[k - 1], Ball.Multiply(coefficients[k], offsets[i], precision), precision);
            }

            coefficients[0] = Ball.Subtract(
                differences[i], Ball.Multiply(coefficients[0], offsets[i], precision), precision);
        }

        return coefficients;
    }

    /// <summary>cos(π·numerator/denominator) to about 60 bits; where exactly a node lies does not matter, that it is always there does.</summary>
    private static Dyadic Cosine(int numerator, int denominator, CancellationToken cancellation)
    {
        const int bits = 80;
        Ball pi = Constants.Pi(bits + 16, cancellation);
        BigInteger angle = (pi.Exponent + bits >= 0 ? pi.Midpoint << (pi.Exponent + bits) : pi.Midpoint >> -(pi.Exponent + bits))
            * numerator / denominator;
        BigInteger term = BigInteger.One << bits, sum = BigInteger.Zero;
        for (int k = 1; !term.IsZero; k += 2)
        {
            sum += term;
            term = -(((((term * angle) >> bits) * angle) >> bits) / (k * (k + 1)));
        }

        return new Dyadic(sum >> (bits - 60), -60);
    }
}
