using System;
using System.ComponentModel;

namespace GaussGen;

/// <summary>What generated code asks of its arguments. It is public for generated code alone.</summary>
[EditorBrowsable(EditorBrowsableState.Never)]
public static class Require
{
    private const string StandardDeviationMessage =
        "A standard deviation must be finite and not negative. Pass 0 for a value that is known exactly, and the square root of a variance.";

    /// <summary>Lets a standard deviation pass that is zero or positive, and finite.</summary>
    /// <param name="standardDeviation">The standard deviation.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is negative, NaN or infinite.</exception>
    public static void StandardDeviation(double standardDeviation)
    {
        // Written so that NaN, which no comparison accepts, is refused too.
        if (!(standardDeviation >= 0.0 && standardDeviation <= double.MaxValue))
        {
            RefuseStandardDeviation(standardDeviation);
        }
    }

    /// <summary>Lets a standard deviation pass that is zero or positive, and finite.</summary>
    /// <param name="standardDeviation">The standard deviation.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is negative, NaN or infinite.</exception>
    public static void StandardDeviation(float standardDeviation)
    {
        if (!(standardDeviation >= 0.0f && standardDeviation <= float.MaxValue))
        {
            RefuseStandardDeviation(standardDeviation);
        }
    }

    // The throw sits in a method of its own, so that the check itself is small enough to be inlined.
    private static void RefuseStandardDeviation(object standardDeviation) =>
        throw new ArgumentOutOfRangeException(nameof(standardDeviation), standardDeviation, StandardDeviationMessage);
}
