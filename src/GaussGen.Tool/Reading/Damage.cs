using System;
using System.Collections.Generic;

namespace GaussGen.Tool.Reading;

/// <summary>
/// The border between files of unknown origin and this program. The metadata reader checks every access against the bounds
/// of the image, and answers a broken file with one of several exceptions; here they all become one.
/// </summary>
internal static class Damage
{
    private const string Advice = "is damaged or cut short; build it again";

    /// <summary>Runs a reading step.</summary>
    /// <exception cref="UnreadableException">The image is not as its format says.</exception>
    public static T Guard<T>(Func<T> read)
    {
        try
        {
            return read();
        }
        catch (Exception error) when (IsDamage(error))
        {
            throw new UnreadableException(UnreadableReason.Damaged, Advice, error);
        }
    }

    /// <summary>Whether an exception is one with which a reader of headers, metadata or blobs answers broken input.</summary>
    public static bool IsDamage(Exception error) => error
        is BadImageFormatException
        or InvalidOperationException
        or ArgumentException
        or IndexOutOfRangeException
        or OverflowException
        or InvalidCastException
        or NotSupportedException
        or KeyNotFoundException;
}
