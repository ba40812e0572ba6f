using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Moments about a point from those about zero.</summary>
internal static class ShiftedMoments
{
    /// <summary>The most bits that are spent on what cancels.</summary>
    private const int LargestPrecision = 1 << 16;

    /// <summary>
    /// ∫ (x − c)ᵏ w from ∫ xᵏ w: with T(i, k) = ∫ xᵏ (x − c)ⁱ w, T(i+1, k) = T(i, k+1) − c T(i, k).
    /// </summary>
    /// <param name="about">The moments about zero, by their working precision.</param>
    /// <param name="center">c.</param>
    /// <param name="precision">How many right bits each moment of even order is to have.</param>
    /// <param name="cancellation">Looked at once a moment.</param>
    /// <returns>The moments; where so many bits would be too many, with what they have.</returns>
    public static Ball[] Of(Func<int, CancellationToken, Ball[]> about, Dyadic center, int precision, CancellationToken cancellation)
    {
        for (int bits = center.IsZero ? precision + 16 : 2 * precision; ; bits *= 2)
        {
            Ball[] moments = about(bits, cancellation);
            Ball[] shifted = center.IsZero ? moments : Shift(moments, Ball.FromDyadic(center), bits, cancellation);
            int accuracy = int.MaxValue;
            for (int k = 0; k < shifted.Length; k += 2)
            {
                accuracy = Math.Min(accuracy, shifted[k].RelativeAccuracyBits);
            }

            if (accuracy >= precision || bits >= LargestPrecision)
            {
                return Array.ConvertAll(shifted, moment => moment.Trim(precision));
            }
        }
    }

    private static Ball[] Shift(Ball[] row, Ball center, int bits, CancellationToken cancellation)
    {
        int count = row.Length;
        var shifted = new Ball[count];
        for (int i = 0; i < count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            shifted[i] = row[0];
            for (int k = 0; k + 1 < count - i; k++)
            {
                row[k] = Ball.Subtract(row[k + 1], Ball.Multiply(center, row[k], bits), bits);
            }
        }

        return shifted;
    }
}
