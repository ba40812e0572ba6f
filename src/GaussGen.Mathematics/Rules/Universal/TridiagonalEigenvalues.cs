using System;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Eigenvalues of the Jacobi matrix in binary64: starting points only, which nothing printed depends on.
/// </summary>
internal static class TridiagonalEigenvalues
{
    private const int MaximumSweeps = 60;

    /// <summary>
    /// The eigenvalues, ascending, by the implicit QL method (Dubrulle, Martin and Wilkinson 1968); <c>null</c> where it fails, as it
    /// does with numbers out of range.
    /// </summary>
    /// <param name="diagonal">The diagonal.</param>
    /// <param name="squares">The squares of the entries beside it; the entry at 0 is not used.</param>
    internal static double[]? ByImplicitQl(double[] diagonal, double[] squares)
    {
        int n = diagonal.Length;
        var d = (double[])diagonal.Clone();
        var e = new double[n];
        for (int i = 1; i < n; i++)
        {
            e[i - 1] = Math.Sqrt(squares[i]);
        }

        for (int l = 0; l < n; l++)
        {
            int sweeps = 0;
            for (int m = Split(d, e, l); m != l; m = Split(d, e, l))
            {
                if (sweeps++ == MaximumSweeps)
                {
                    return null;
                }

                Sweep(d, e, l, m);
            }
        }

        Array.Sort(d);
        return AreAscending(d) ? d : null;
    }

    /// <summary>
    /// The eigenvalues, ascending and each with high relative accuracy, of a positive definite matrix L D Lᵀ that is given by the pivots
    /// q₀ … and the quotients eₖ = bₖ/qₖ₋₁: bisection on the counts of the differential stationary quotient-difference
    /// transformation (Fernando and Parlett 1994).
    /// </summary>
    internal static double[]? ByQuotientDifferences(double[] pivots, double[] quotients)
    {
        int n = pivots.Length;
        double top = 0;
        for (int k = 0; k < n; k++)
        {
            top = Math.Max(top, pivots[k] + (k + 1 < n ? 2 * quotients[k + 1] : 0));
        }

        var eigenvalues = new double[n];
        double least = Math.Log(1e-300), greatest = Math.Log(4 * top);
        for (int i = 0; i < n; i++)
        {
            double low = i == 0 ? least : Math.Log(eigenvalues[i - 1]), high = greatest;
            for (int step = 0; step < 64; step++)
            {
                double middle = low + ((high - low) / 2);
                (low, high) = CountBelow(pivots, quotients, Math.Exp(middle)) <= i ? (middle, high) : (low, middle);
            }

            eigenvalues[i] = Math.Exp(low + ((high - low) / 2));
        }

        return AreAscending(eigenvalues) ? eigenvalues : null;
    }

    private static int CountBelow(double[] pivots, double[] quotients, double x)
    {
        double s = -x;
        int count = 0;
        for (int k = 0; k < pivots.Length; k++)
        {
            double pivot = s + pivots[k];
            pivot = pivot == 0 ? 1e-300 : pivot;
            count += pivot < 0 ? 1 : 0;
            s = k + 1 < pivots.Length ? (quotients[k + 1] / pivot * s) - x : s;
        }

        return count;
    }

    private static int Split(double[] d, double[] e, int l)
    {
        int m = l;
        while (m < d.Length - 1 && Math.Abs(e[m]) > 1.1e-16 * (Math.Abs(d[m]) + Math.Abs(d[m + 1])))
        {
            m++;
        }

        return m;
    }

    private static void Sweep(double[] d, double[] e, int l, int m)
    {
        double g = (d[l + 1] - d[l]) / (2 * e[l]);
        double r = Math.Sqrt((g * g) + 1);
        g = d[m] - d[l] + (e[l] / (g + (g >= 0 ? r : -r)));
        double sine = 1, cosine = 1, p = 0;
        for (int i = m - 1; i >= l; i--)
        {
            double f = sine * e[i], b = cosine * e[i];
            r = Math.Sqrt((f * f) + (g * g));
            e[i + 1] = r;
            if (r == 0)
            {
                d[i + 1] -= p;
                e[m] = 0;
                return;
            }

            sine = f / r;
            cosine = g / r;
            g = d[i + 1] - p;
            r = ((d[i] - g) * sine) + (2 * cosine * b);
            p = sine * r;
            d[i + 1] = g + p;
            g = (cosine * r) - b;
        }

        d[l] -= p;
        e[l] = g;
        e[m] = 0;
    }

    private static bool AreAscending(double[] values)
    {
        for (int i = 0; i < values.Length; i++)
        {
            if (double.IsNaN(values[i]) || double.IsInfinity(values[i]) || (i > 0 && values[i] <= values[i - 1]))
            {
                return false;
            }
        }

        return true;
    }
}
