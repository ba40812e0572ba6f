using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Sequences;

/// <summary>Carries named lists to a number format.</summary>
public static class SequenceRounding
{
    /// <summary>
    /// Rounds every entry to the nearest representable value, with proof. A number that stands in several places, as one object, is
    /// rounded once.
    /// </summary>
    /// <param name="table">The lists.</param>
    /// <param name="format">The number format.</param>
    /// <param name="cancellation">Looked at before each entry, and passed on.</param>
    /// <exception cref="InvalidOperationException">No enclosure decides an entry; see <see cref="Rounding.Nearest"/>.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedSequences Round(SequenceTable table, BinaryFormat format, CancellationToken cancellation)
    {
        var known = new Dictionary<RealNumber, RoundedValue>();
        var values = new List<IReadOnlyList<RoundedValue>>(table.Sequences.Count);
        SequenceOverflow? overflow = null;
        foreach (NamedSequence sequence in table.Sequences)
        {
            var rounded = new RoundedValue[sequence.Values.Count];
            for (int i = 0; i < rounded.Length; i++)
            {
                if (!known.TryGetValue(sequence.Values[i], out rounded[i]))
                {
                    rounded[i] = Rounding.Nearest(sequence.Values[i], format, cancellation);
                    known.Add(sequence.Values[i], rounded[i]);
                }
            }

            int infinite = Array.FindIndex(rounded, value => format.IsInfinity(value.Bits));
            overflow ??= infinite < 0 ? null : new SequenceOverflow(sequence.Name, infinite);
            values.Add(rounded);
        }

        return new RoundedSequences(table, format, values, overflow);
    }
}
