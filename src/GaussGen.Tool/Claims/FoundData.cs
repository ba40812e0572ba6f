using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>What was read of a type, in the terms of the proofs.</summary>
internal static class FoundData
{
    /// <summary>The spans of a family, the constants of a type, and those in the code of its sums.</summary>
    /// <exception cref="ClaimException">The code holds other constants than a sum has.</exception>
    public static TableData Of(FoundType type, ClaimFamily family)
    {
        IEnumerable<DataSpan> spans = family.Spans
            .Where(type.Spans.ContainsKey)
            .Select(name => type.Spans[name])
            .Select(span => new DataSpan(span.Name, Format(span.Element), span.AllBits()));

        // A constant of a type that no table has is of no table, whatever its name; the claim then misses it.
        IEnumerable<DataConstant> constants = type.Constants.Values
            .Where(constant => !SumForm.IsInCode(constant.Name))
            .Where(constant => constant.Element == ElementType.Int32 || Format(constant.Element) is not null)
            .Select(constant => new DataConstant(constant.Name, Format(constant.Element), constant.Bits));
        return new TableData([.. spans], [.. constants, .. CodeConstants(type, family)]);
    }

    /// <summary>The constants in the code of the sums, each value once: if the forms of a sum differ, both are judged.</summary>
    private static IEnumerable<DataConstant> CodeConstants(FoundType type, ClaimFamily family) => family.Sums is not { } sums ? [] : type.Methods
        .SelectMany(sums.Read)
        .Select(each => each.Literal is { } literal
            ? new DataConstant(each.Constant.Name, Format(literal.Element), literal.Bits)
            : Number(each.Constant.Name, each.Constant.Without, type))
        .Distinct();

    private static DataConstant Number(string name, double value, FoundType type) =>
        type.Spans.Values.Any(span => span.Element == ElementType.Single)
            ? new DataConstant(name, BinaryFormat.Binary32, BitConverter.SingleToUInt32Bits((float)value))
            : new DataConstant(name, BinaryFormat.Binary64, BitConverter.DoubleToUInt64Bits(value));

    private static BinaryFormat? Format(ElementType element) => element switch
    {
        ElementType.Double => BinaryFormat.Binary64,
        ElementType.Single => BinaryFormat.Binary32,
        _ => null,
    };
}
