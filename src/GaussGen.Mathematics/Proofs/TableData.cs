using System.Collections.Generic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The values of one span of a table, as they were found.</summary>
/// <param name="Name">The member's name: "Nodes".</param>
/// <param name="Format">The number format of the elements; <c>null</c> if they are of a type that is none.</param>
/// <param name="Bits">The interchange encoding of each element, in the low bits.</param>
public sealed record DataSpan(string Name, BinaryFormat? Format, IReadOnlyList<ulong> Bits);

/// <summary>One constant of a table, as it was found.</summary>
/// <param name="Name">The member's name: "PointCount", "Raw3".</param>
/// <param name="Format">The number format; <c>null</c> for a 32-bit integer.</param>
/// <param name="Bits">The encoding in the low bits; for an integer its two's complement, zero-extended.</param>
public sealed record DataConstant(string Name, BinaryFormat? Format, ulong Bits);

/// <summary>All data that was found for one claim. Members that the claim does not speak of are no part of the proof.</summary>
/// <param name="Spans">The spans.</param>
/// <param name="Constants">The constants.</param>
public sealed record TableData(IReadOnlyList<DataSpan> Spans, IReadOnlyList<DataConstant> Constants);
