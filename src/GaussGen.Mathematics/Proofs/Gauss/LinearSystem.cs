using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Systems of linear equations by Gaussian elimination in balls.</summary>
internal static class LinearSystem
{
    /// <summary>Solves a system in place.</summary>
    /// <param name="rows">The coefficients of each equation, and behind them its right side.</param>
    /// <param name="precision">Working precision in bits.</param>
    /// <param name="cancellation">Looked at once a row.</param>
    /// <returns>The only solution; <c>null</c> where the balls do not show that there is just one.</returns>
    public static Ball[]? Solve(Ball[][] rows, int precision, CancellationToken cancellation)
    {
        int size = rows.Length;
        for (int column = 0; column < size; column++)
        {
            int pivot = column;
            for (int row = column + 1; row < size; row++)
            {
                pivot = Size(rows[row][column]) > Size(rows[pivot][column]) ? row : pivot;
            }

            (rows[column], rows[pivot]) = (rows[pivot], rows[column]);
            if (rows[column][column].ContainsZero)
            {
                return null;
            }

            for (int row = column + 1; row < size; row++)
            {
                cancellation.ThrowIfCancellationRequested();
                Ball factor = Ball.Divide(rows[row][column], rows[column][column], precision);
                for (int k = column + 1; k <= size; k++)
                {
                    rows[row][k] = Ball.Subtract(rows[row][k], Ball.Multiply(factor, rows[column][k], precision), precision);
                }
            }
        }

        var solution = new Ball[size];
        for (int row = size - 1; row >= 0; row--)
        {
            Ball sum = rows[row][size];
            for (int k = row + 1; k < size; k++)
            {
                sum = Ball.Subtract(sum, Ball.Multiply(rows[row][k], solution[k], precision), precision);
            }

            solution[row] = Ball.Divide(sum, rows[row][row], precision);
        }

        return solution;
    }

    private static Dyadic Size(Ball value) => Dyadic.Abs(value.Center);
}
