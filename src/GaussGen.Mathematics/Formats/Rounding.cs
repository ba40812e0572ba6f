using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Formats;

/// <summary>
/// Correct rounding with proof by the strategy of Ziv, "Fast evaluation of elementary mathematical functions with correctly
/// rounded last bit" (1991): the precision of an enclosure is raised until the enclosure decides.
/// </summary>
public static class Rounding
{
    /// <summary>The working precision of the first big enclosure, in bits.</summary>
    public const int FirstPrecision = 128;

    /// <summary>The working precision, in bits, after which the loop gives up.</summary>
    public const int LargestPrecision = 1 << 16;

    /// <summary>
    /// The representable value nearest to a number, ties to even. A number that is known exactly is rounded directly; of others
    /// the fixed-size enclosure is tried first, then balls at 128 bits, doubled up to <see cref="LargestPrecision"/>.
    /// </summary>
    /// <param name="value">The number.</param>
    /// <param name="format">The number format.</param>
    /// <param name="cancellation">Looked at before each enclosure, and passed on.</param>
    /// <exception cref="InvalidOperationException">
    /// No enclosure up to the largest precision decides: the number is half-way between two representable ones, or as good as.
    /// Such a number must be given exactly.
    /// </exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedValue Nearest(RealNumber value, BinaryFormat format, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        if (value.ExactValue is { } exact)
        {
            return new RoundedValue(format.Round(exact), int.MinValue);
        }

        if (value.FirstEnclosure is { } first && format.TryRound(in first, out ulong bits, out int widthLog2))
        {
            return new RoundedValue(bits, widthLog2);
        }

        for (int precision = FirstPrecision; precision <= LargestPrecision; precision *= 2)
        {
            cancellation.ThrowIfCancellationRequested();
            if (format.TryRound(value.Enclose(precision, cancellation), out bits, out widthLog2))
            {
                return new RoundedValue(bits, widthLog2);
            }
        }

        throw new InvalidOperationException(string.Format(
            CultureInfo.InvariantCulture,
            "An enclosure at {0} bits does not decide the rounding to {1}. A number that may lie half-way between two representable ones must be given exactly.",
            LargestPrecision,
            format.Name));
    }
}
