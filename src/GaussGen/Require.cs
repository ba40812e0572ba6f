using System;
using System.ComponentModel;
using System.Runtime.CompilerServices;

namespace GaussGen;

/// <summary>What generated code asks of its arguments. It is public for generated code alone.</summary>
[EditorBrowsable(EditorBrowsableState.Never)]
public static class Require
{
    private const string StandardDeviationMessage =
        "A standard deviation must be finite and not negative. Pass 0 for a value that is known exactly, "
        + "and the square root of a variance.";

    private const string ScaleMessage =
        "A scale must be finite and not negative. Pass 0 for a value that is known exactly.";

    /// <summary>Lets a standard deviation pass that is zero or positive, and finite.</summary>
    /// <param name="standardDeviation">The standard deviation.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is negative, NaN or infinite.</exception>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
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
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void StandardDeviation(float standardDeviation)
    {
        if (!(standardDeviation >= 0.0f && standardDeviation <= float.MaxValue))
        {
            RefuseStandardDeviation(standardDeviation);
        }
    }

    /// <summary>Lets a scale pass that is zero or positive, and finite.</summary>
    /// <param name="scale">The scale.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is negative, NaN or infinite.</exception>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Scale(double scale)
    {
        if (!(scale >= 0.0 && scale <= double.MaxValue))
        {
            RefuseScale(scale);
        }
    }

    /// <summary>Lets a scale pass that is zero or positive, and finite.</summary>
    /// <param name="scale">The scale.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is negative, NaN or infinite.</exception>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Scale(float scale)
    {
        if (!(scale >= 0.0f && scale <= float.MaxValue))
        {
            RefuseScale(scale);
        }
    }

    // The throw sits in methods of their own that never return: the check is then small enough to be inlined, and the JIT keeps
    // nothing alive across the call.
    private static void RefuseStandardDeviation(double standardDeviation) =>
        throw new ArgumentOutOfRangeException(nameof(standardDeviation), standardDeviation, StandardDeviationMessage);

    private static void RefuseStandardDeviation(float standardDeviation) =>
        throw new ArgumentOutOfRangeException(nameof(standardDeviation), standardDeviation, StandardDeviationMessage);

    private static void RefuseScale(double scale) => throw new ArgumentOutOfRangeException(nameof(scale), scale, ScaleMessage);

    private static void RefuseScale(float scale) => throw new ArgumentOutOfRangeException(nameof(scale), scale, ScaleMessage);
}
