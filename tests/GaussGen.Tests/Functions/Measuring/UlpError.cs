using System;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Functions.Measuring;

/// <summary>The distance of a value from the truth in units in the last place of the truth.</summary>
internal static class UlpError
{
    /// <summary>The largest that the distance can be, given the enclosure; 0 where both are beyond the largest number on one side.</summary>
    internal static double Of(Ball truth, double found, BinaryFormat format)
    {
        ulong nearest = format.Round(truth.Center);
        if (double.IsNaN(found) || format.IsInfinity(nearest) || double.IsInfinity(found))
        {
            bool isSameEnd = format.IsInfinity(nearest) && double.IsInfinity(found) && (truth.Midpoint.Sign < 0) == (found < 0.0);
            return isSameEnd ? 0.0 : double.PositiveInfinity;
        }

        Dyadic distance = Dyadic.Abs(truth.Center - Exact.Dyadic(found)) + truth.Radius.ToDyadic();
        Dyadic units = distance.ScaleByPowerOfTwo(-format.UnitExponent(nearest));
        return BitConverter.UInt64BitsToDouble(BinaryFormat.Binary64.Round(units));
    }
}
