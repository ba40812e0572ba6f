using System.Collections.Generic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Moments;

/// <summary>Moments in one number format; every entry is proven to be the nearest representable value.</summary>
/// <param name="Table">The moments before rounding.</param>
/// <param name="Format">The number format.</param>
/// <param name="Raw">Raw moments by order.</param>
/// <param name="Central">Central moments by order.</param>
/// <param name="Absolute">Absolute moments about the mean by order.</param>
/// <param name="FirstOverflow">The lowest order at which a moment is too large for the format; <c>null</c> if none is.</param>
public sealed record RoundedMoments(
    MomentTable Table,
    BinaryFormat Format,
    IReadOnlyList<RoundedValue> Raw,
    IReadOnlyList<RoundedValue> Central,
    IReadOnlyList<RoundedValue> Absolute,
    int? FirstOverflow);
