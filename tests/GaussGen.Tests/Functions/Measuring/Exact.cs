using System;
using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Functions.Measuring;

/// <summary>Binary64 numbers as exact ones, and the inverse functions by one certified step from what was found.</summary>
internal static class Exact
{
    internal static Ball Of(double x) => Ball.FromDyadic(Dyadic(x));

    internal static Dyadic Dyadic(double x) => BinaryFormat.Binary64.ValueOf(BitConverter.DoubleToUInt64Bits(x));

    internal static Ball Quantile(NormalReference reference, double p, double found) =>
        FromHalf(reference, Dyadic(p) - new Dyadic(1, -1), Of(found));

    internal static Ball InverseErf(NormalReference reference, double y, double found)
    {
        int precision = reference.ErrorFunctions.Precision;
        Ball root = Constants.Sqrt2(precision + 8);
        Ball quantile = FromHalf(reference, Dyadic(y).ScaleByPowerOfTwo(-1), Ball.Multiply(Of(found), root, precision));
        return Ball.Divide(quantile, root, precision);
    }

    /// <summary>The x with Φ(x) = 1/2 + u. Far from zero the tail is compared, near it the integral from zero.</summary>
    private static Ball FromHalf(NormalReference reference, Dyadic u, Ball near)
    {
        int precision = reference.ErrorFunctions.Precision;
        if (u.Sign < 0)
        {
            return FromHalf(reference, -u, near.Negate()).Negate();
        }

        Ball difference = u < new Dyadic(1, -2)
            ? Ball.Subtract(Ball.FromDyadic(u), reference.FromZero(near), precision)
            : Ball.Subtract(reference.UpperTail(near), Ball.FromDyadic(new Dyadic(1, -1) - u), precision);
        return reference.Refine(near, Ball.Divide(difference, reference.Density(near), precision));
    }
}
