using GaussGen.Mathematics.Approximations;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Functions.Measuring;

/// <summary>The error of the overloads for <see cref="float"/>.</summary>
internal static class SingleError
{
    /// <summary>The error in units of binary32; 0 where rounding took the point out of the function's domain.</summary>
    internal static double Of(NormalReference reference, MeasuredFunction function, float first, float second)
    {
        bool isInside = function.Domain switch
        {
            Domain.Unit => first is > 0.0f and < 1.0f,
            Domain.SignedUnit => first is > -1.0f and < 1.0f,
            Domain.Interval => second > first && second <= float.MaxValue,
            _ => first is >= float.MinValue and <= float.MaxValue,
        };
        if (!isInside)
        {
            return 0.0;
        }

        // An inverse's enclosure starts from the binary64 value: a step from a rounded one would be too long.
        float value = function.Binary32(first, second);
        double start = function.Binary64(first, second);
        return UlpError.Of(function.Truth(reference, first, second, start), value, BinaryFormat.Binary32);
    }
}
