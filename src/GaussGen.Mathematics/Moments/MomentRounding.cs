using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Moments;

/// <summary>Carries moments to a number format.</summary>
public static class MomentRounding
{
    /// <summary>
    /// Rounds every moment to the nearest representable value, with proof. A number that stands in several lists of one order (an
    /// even central moment is the absolute one) is rounded once.
    /// </summary>
    /// <param name="table">The moments.</param>
    /// <param name="format">The number format.</param>
    /// <param name="cancellation">Looked at before each entry, and passed on.</param>
    /// <exception cref="System.InvalidOperationException">No enclosure decides an entry; see <see cref="Rounding.Nearest"/>.</exception>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public static RoundedMoments Round(MomentTable table, BinaryFormat format, CancellationToken cancellation)
    {
        var known = new Dictionary<RealNumber, RoundedValue>();
        RoundedValue[] raw = RoundAll(table.Raw, known, format, cancellation);
        RoundedValue[] central = RoundAll(table.Central, known, format, cancellation);
        RoundedValue[] absolute = RoundAll(table.Absolute, known, format, cancellation);
        int? overflow = Lowest(
            FirstInfinity(raw, format), Lowest(FirstInfinity(central, format), FirstInfinity(absolute, format)));
        return new RoundedMoments(table, format, raw, central, absolute, overflow);
    }

    private static RoundedValue[] RoundAll(
        IReadOnlyList<RealNumber> values,
        Dictionary<RealNumber, RoundedValue> known,
        BinaryFormat format,
        CancellationToken cancellation)
    {
        var rounded = new RoundedValue[values.Count];
        for (int i = 0; i < rounded.Length; i++)
        {
            // The key is the object: one that stands in two lists is the same number.
            if (!known.TryGetValue(values[i], out rounded[i]))
            {
                rounded[i] = Rounding.Nearest(values[i], format, cancellation);
                known.Add(values[i], rounded[i]);
            }
        }

        return rounded;
    }

    private static int? FirstInfinity(RoundedValue[] values, BinaryFormat format)
    {
        for (int i = 0; i < values.Length; i++)
        {
            if (format.IsInfinity(values[i].Bits))
            {
                return i;
            }
        }

        return null;
    }

    private static int? Lowest(int? left, int? right) =>
        left is null || right is null ? left ?? right : System.Math.Min(left.Value, right.Value);
}
