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
    // The sums of a located rule: the names under which claims know the constants in the code, in the order in which it has them,
    // and what the code does without them. An expectation that multiplies by nothing multiplies by one.
    private static readonly (string Method, (string Name, double Without)[] Constants)[] Sums =
    [
        ("Expectation", [("NodeScale", 1), ("ReciprocalTotalWeight", 1)]),
        ("Integral", [("IntegralLocation", 0), ("IntegralScale", 1)]),
    ];

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
            .Where(constant => !IsInCode(constant.Name))
            .Where(constant => constant.Element == ElementType.Int32 || Format(constant.Element) is not null)
            .Select(constant => new DataConstant(constant.Name, Format(constant.Element), constant.Bits));
        return new TableData([.. spans], [.. constants, .. family.IsLocated ? CodeConstants(type) : []]);
    }

    private static bool IsInCode(string name) => Sums.Any(sum => sum.Constants.Any(constant => constant.Name == name));

    /// <summary>The constants in the code of the sums, each value once: if the forms of a sum differ, both are judged.</summary>
    private static IEnumerable<DataConstant> CodeConstants(FoundType type)
    {
        List<DataConstant> found = [];
        foreach ((string sum, (string Name, double Without)[] constants) in Sums)
        {
            foreach (FoundMethod method in type.Methods.Where(method => method.Name == sum))
            {
                if (method.Literals.Count != 0 && method.Literals.Count != constants.Length)
                {
                    throw new ClaimException(
                        $"the code of {sum} holds {method.Literals.Count} constants where none or {constants.Length} are expected; use the tool's version of the package");
                }

                found.AddRange(method.Literals.Count == 0
                    ? constants.Select(constant => Number(constant.Name, constant.Without, type))
                    : method.Literals.Zip(constants, (literal, constant) => new DataConstant(constant.Name, Format(literal.Element), literal.Bits)));
            }
        }

        return found.Distinct();
    }

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
