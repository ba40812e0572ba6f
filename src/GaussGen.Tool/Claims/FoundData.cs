using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>What was read of a type, in the terms of the proofs.</summary>
internal static class FoundData
{
    /// <summary>The spans of a family and all constants of a type.</summary>
    public static TableData Of(FoundType type, ClaimFamily family)
    {
        IEnumerable<DataSpan> spans = family.Spans
            .Where(type.Spans.ContainsKey)
            .Select(name => type.Spans[name])
            .Select(span => new DataSpan(span.Name, Format(span.Element), span.AllBits()));

        // A constant of a type that no table has is of no table, whatever its name; the claim then misses it.
        IEnumerable<DataConstant> constants = type.Constants.Values
            .Where(constant => constant.Element == ElementType.Int32 || Format(constant.Element) is not null)
            .Select(constant => new DataConstant(constant.Name, Format(constant.Element), constant.Bits));
        return new TableData([.. spans], [.. constants]);
    }

    private static BinaryFormat? Format(ElementType element) => element switch
    {
        ElementType.Double => BinaryFormat.Binary64,
        ElementType.Single => BinaryFormat.Binary32,
        _ => null,
    };
}
