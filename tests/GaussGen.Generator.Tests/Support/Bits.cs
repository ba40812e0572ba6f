using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Generator.Tests.Support;

/// <summary>Numbers of either format as their encodings.</summary>
internal static class Bits
{
    public static IEnumerable<ulong> Of(Array values) => values.Cast<object>().Select(Of);

    public static ulong Of(object value) => value is float single
        ? BitConverter.SingleToUInt32Bits(single)
        : BitConverter.DoubleToUInt64Bits((double)value);

    public static BinaryFormat FormatOf(NumberFormat format) =>
        format == NumberFormat.Binary32 ? BinaryFormat.Binary32 : BinaryFormat.Binary64;
}
