using System.Collections.Generic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Sequences;

/// <summary>Where a list has an entry that is too large for the number format.</summary>
/// <param name="Name">The list.</param>
/// <param name="Index">The lowest index of such an entry.</param>
public sealed record SequenceOverflow(string Name, int Index);

/// <summary>Named lists in one number format; every entry is proven to be the nearest representable value.</summary>
/// <param name="Table">The lists before rounding.</param>
/// <param name="Format">The number format.</param>
/// <param name="Values">The entries of each list, in the order of <see cref="SequenceTable.Sequences"/>.</param>
/// <param name="FirstOverflow">The first entry that is too large for the format; <c>null</c> if none is.</param>
public sealed record RoundedSequences(
    SequenceTable Table,
    BinaryFormat Format,
    IReadOnlyList<IReadOnlyList<RoundedValue>> Values,
    SequenceOverflow? FirstOverflow);
