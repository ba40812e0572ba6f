using System;
using System.Threading;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// Guesses of the zeros of Heₙ in double arithmetic. Nothing that is published depends on them: a guess only chooses the exact
/// point near a zero from which the enclosures start, and a bad one is refused there.
/// </summary>
internal static class HermiteGuess
{
    private const int TaylorTerms = 10;
    private const double Large = 1e100;

    private static readonly double[] Reciprocals =
        [0, 1, 1.0 / 2, 1.0 / 3, 1.0 / 4, 1.0 / 5, 1.0 / 6, 1.0 / 7, 1.0 / 8, 1.0 / 9, 1.0 / 10];

    /// <summary>The ⌊n/2⌋ positive zeros of Heₙ, ascending, to about half the digits of a double or better.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    internal static double[] PositiveZeros(int points, CancellationToken cancellation)
    {
        double[] zeros = Start(points);
        var growth = new double[points];
        var damping = new double[points];
        for (int k = 0; k < points; k++)
        {
            growth[k] = 1 / Math.Sqrt(k + 1.0);
            damping[k] = Math.Sqrt(k / (k + 1.0));
        }

        // Four at a time keep the processor busy; what is missing to four is filled up with the last one.
        for (int i = 0; i < zeros.Length; i += 4)
        {
            cancellation.ThrowIfCancellationRequested();
            Improve(zeros, i, growth, damping);
        }

        return zeros;
    }

    /// <summary>
    /// The asymptotic zeros of Tricomi, "Sugli zeri delle funzioni di cui si conosce una rappresentazione asintotica" (1947),
    /// with ν = 2n + 1: t − sin t = (4j − 1)π/ν for the j-th zero from the outermost, σ = cos²(t/2), and
    /// y² = νσ − (5/(4(1−σ)²) − 1/(1−σ) − 1/4)/(3ν) for the zero y = x/√2 of Hₙ.
    /// </summary>
    private static double[] Start(int points)
    {
        var zeros = new double[points / 2];
        double nu = (2.0 * points) + 1;
        double t = 0;
        for (int j = 1; j <= zeros.Length; j++)
        {
            double b = ((4.0 * j) - 1) * Math.PI / nu;
            // Each solution is a good start for the next one; the first is small, where t − sin t is about t³/6.
            t = j == 1 ? Math.Pow(6 * b, 1.0 / 3.0) : t + (4 * Math.PI / nu / (1 - Math.Cos(t)));
            t = Math.Min(t, Math.PI);
            for (int step = 0; step < 5; step++)
            {
                double change = (t - Math.Sin(t) - b) / (1 - Math.Cos(t));
                t -= change;
                if (Math.Abs(change) < 1e-6)
                {
                    break;
                }
            }

            double half = Math.Cos(t / 2);
            double sigma = half * half;
            double q = 1 - sigma;
            double square = (nu * sigma) - (((5 / (4 * q * q)) - (1 / q) - 0.25) / (3 * nu));
            zeros[zeros.Length - j] = Math.Sqrt(2 * square);
        }

        return zeros;
    }

    /// <summary>One sweep of the orthonormal recurrence over four guesses, then the Taylor series at each.</summary>
    private static void Improve(double[] zeros, int first, double[] growth, double[] damping)
    {
        int last = zeros.Length - 1;
        int i1 = Math.Min(first + 1, last), i2 = Math.Min(first + 2, last), i3 = Math.Min(first + 3, last);
        double a = zeros[first], b = zeros[i1], c = zeros[i2], d = zeros[i3];
        double a1 = 1, a0 = 0, b1 = 1, b0 = 0, c1 = 1, c0 = 0, d1 = 1, d0 = 0;
        for (int k = 0; k < growth.Length; k++)
        {
            double p = growth[k], q = damping[k];
            double an = (a * p * a1) - (q * a0), bn = (b * p * b1) - (q * b0);
            double cn = (c * p * c1) - (q * c0), dn = (d * p * d1) - (q * d0);
            a0 = a1;
            a1 = an;
            b0 = b1;
            b1 = bn;
            c0 = c1;
            c1 = cn;
            d0 = d1;
            d1 = dn;
            if ((k & 7) == 7)
            {
                Rescale(ref a1, ref a0);
                Rescale(ref b1, ref b0);
                Rescale(ref c1, ref c0);
                Rescale(ref d1, ref d0);
            }
        }

        int points = growth.Length;
        double root = Math.Sqrt(points);
        zeros[first] = a + Offset(points, a, a1 / (root * a0));
        zeros[i1] = b + Offset(points, b, b1 / (root * b0));
        zeros[i2] = c + Offset(points, c, c1 / (root * c0));
        zeros[i3] = d + Offset(points, d, d1 / (root * d0));
    }

    private static void Rescale(ref double current, ref double previous)
    {
        if (Math.Abs(current) > Large)
        {
            current /= Large;
            previous /= Large;
        }
    }

    /// <summary>
    /// The zero h of the Taylor series of f(x + h)/f′(x), f = Heₙ, from u = f(x)/f′(x), by Newton's method.
    /// The differential equation f″ = x f′ − n f gives all further terms.
    /// </summary>
    internal static double Offset(int points, double x, double u)
    {
        double h = -u;
        for (int step = 0; step < 6; step++)
        {
            // Terms t_j = f^(j)(x) h^j / (j! f′(x)): t_{j+2} = x h t_{j+1}/(j+2) − (n−j) h² t_j/((j+1)(j+2)).
            double before = u, term = h, sum = u + h, slope = h;
            for (int j = 0; j + 2 < TaylorTerms; j++)
            {
                double next = h * ((x * term) - ((points - j) * h * before * Reciprocals[j + 1])) * Reciprocals[j + 2];
                before = term;
                term = next;
                sum += term;
                slope += (j + 2) * term;
            }

            double change = h == 0 ? u : h * sum / slope;
            h -= change;
            // The digits double with each step; half of them are enough for the next road.
            if (Math.Abs(change) <= 1e-6 * Math.Abs(h))
            {
                break;
            }
        }

        return h;
    }
}
