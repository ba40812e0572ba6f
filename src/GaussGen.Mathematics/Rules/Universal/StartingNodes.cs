using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Where the search for the nodes starts: near the eigenvalues of the Jacobi matrix (Golub and Welsch 1969). Nothing here is a
/// bound, and nothing printed depends on it.
/// </summary>
internal static class StartingNodes
{
    /// <summary>Points near all n nodes, ascending, from binary64 arithmetic; <c>null</c> where that is not accurate enough.</summary>
    internal static Dyadic[]? FromDoubles(Recurrence recurrence, bool isGraded, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        // A graded matrix comes with nodes that lie about 1, and has no bits of range to spare.
        int power = isGraded ? 0 : ScaleOf(recurrence);
        double[]? nodes = isGraded ? Graded(recurrence, power) : Ordinary(recurrence, power);
        return nodes is null
            ? null
            : Array.ConvertAll(nodes, node => Approximation.FromDouble(node).ScaleByPowerOfTwo(power));
    }

    /// <summary>The same by bisection on sign counts (Sturm) at a given precision: slow, for nodes that binary64 cannot tell apart.</summary>
    internal static Dyadic[]? FromSignCounts(Recurrence recurrence, int precision, CancellationToken cancellation)
    {
        var bisection = new SignCountBisection(recurrence, precision, cancellation);
        return bisection.Separate(new Dyadic(1, ScaleOf(recurrence) + 3));
    }

    /// <summary>An exponent e such that the matrix entries are about 2^e at most.</summary>
    private static int ScaleOf(Recurrence recurrence)
    {
        int power = int.MinValue / 4;
        for (int k = 0; k < recurrence.Count; k++)
        {
            power = Math.Max(power, Approximation.FloorLog2(recurrence.Diagonal(k)) + 1);
            power = k == 0 ? power : Math.Max(power, (Approximation.FloorLog2(recurrence.Square(k)) / 2) + 1);
        }

        return power;
    }

    private static double[]? Ordinary(Recurrence recurrence, int power)
    {
        var diagonal = new double[recurrence.Count];
        var squares = new double[recurrence.Count];
        for (int k = 0; k < diagonal.Length; k++)
        {
            diagonal[k] = Approximation.ToDouble(recurrence.Diagonal(k).ScaleByPowerOfTwo(-power));
            squares[k] = Approximation.ToDouble(recurrence.Square(k).ScaleByPowerOfTwo(-2 * power));
        }

        return TridiagonalEigenvalues.ByImplicitQl(diagonal, squares);
    }

    private static double[]? Graded(Recurrence recurrence, int power)
    {
        const int Precision = 128;
        var pivots = new double[recurrence.Count];
        var quotients = new double[recurrence.Count];
        Ball pivot = default;
        for (int k = 0; k < pivots.Length; k++)
        {
            Ball quotient = k == 0 ? default : Ball.Divide(recurrence.Square(k), pivot, Precision);
            pivot = Ball.Subtract(recurrence.Diagonal(k), quotient, Precision);
            if (pivot.IsPositive != Trilean.True)
            {
                return null;
            }

            pivots[k] = Approximation.ToDouble(pivot.ScaleByPowerOfTwo(-power));
            quotients[k] = Approximation.ToDouble(quotient.ScaleByPowerOfTwo(-power));
        }

        return TridiagonalEigenvalues.ByQuotientDifferences(pivots, quotients);
    }
}
