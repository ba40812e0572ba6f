using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>The generated part of a table of moments: three lists by order, and a constant for each entry.</summary>
internal static class MomentPart
{
    /// <summary>The moments as a part of a type; none of them may be too large for the format.</summary>
    public static TablePart Of(RoundedMoments moments, TargetCapabilities target)
    {
        NumberType type = NumberType.Of(moments.Format);
        MomentList[] lists =
        {
            new("Raw", "raw", "E X", moments.Raw),
            new("Central", "central", "E (X − E X)", moments.Central),
            new("Absolute", "absolute", "E |X − E X|", moments.Absolute),
        };
        return new TablePart(Summary(moments), Remarks(moments, lists, type, target), Members(lists, type, target).ToArray());
    }

    /// <summary>The name of the constant for an entry.</summary>
    public static string ConstantName(string list, int order) => list + Text(order);

    private static string Summary(RoundedMoments moments) => Documentation.Escape(
        $"Moments of {moments.Table.Description.Distribution}, for the orders 0 to {Text(moments.Raw.Count - 1)}.");

    private static List<string> Remarks(RoundedMoments moments, MomentList[] lists, NumberType type, TargetCapabilities target) => new()
    {
        Documentation.Escape(
            $"Every moment is the {type.Format.Name} value nearest to the true one ({Text(type.Format.Precision)} bits; proven: {moments.Table.Description.Method}; "
            + $"{Widths(lists.SelectMany(list => list.Values))}). The moment of order k is in the variable's unit to the power k; parameters mean their exact binary64 values."),
        $"{Text(lists.Sum(list => list.Values.Count) * type.Bytes)} bytes of data"
            + (target.KeepsSpansInImage ? " in the image; nothing runs before the first call." : " in three arrays, filled before they are first read."),
        "Caution: that the constants are right says nothing about how well the distribution describes what was measured.",
        Documentation.Escape($"Source: {moments.Table.Description.Sources}."),
    };

    private static IEnumerable<GeneratedMember> Members(MomentList[] lists, NumberType type, TargetCapabilities target)
    {
        foreach (MomentList list in lists)
        {
            int last = list.Values.Count - 1;
            foreach (GeneratedMember member in Span(list.Name, type, target, writer => DocumentList(writer, list, last), () => Entries(list)))
            {
                yield return member;
            }
        }

        foreach (MomentList list in lists)
        {
            for (int order = 0; order < list.Values.Count; order++)
            {
                yield return Constant(list, order, type);
            }
        }
    }

    private static string[] Entries(MomentList list) => list.Values.Select((_, order) => ConstantName(list.Name, order) + ",").ToArray();

    private static void DocumentList(SourceWriter writer, MomentList list, int last) =>
        writer.Summary($"The {list.Adjective} moments by order, from 0 to {Text(last)}: entry k is {list.Formula}ᵏ.");

    private static GeneratedMember Constant(MomentList list, int order, NumberType type)
    {
        string name = ConstantName(list.Name, order);
        RoundedValue value = list.Values[order];
        return new GeneratedMember(name, null, writer =>
        {
            writer.Summary($"The {list.Adjective} moment of order {Text(order)}, {list.Formula}{Superscript(order)}.");
            writer.Line(GeneratedCodeAttribute);
            writer.Line($"public const {type.Keyword} {name} = {type.Literal(value)}; // {type.Hexadecimal(value)}");
        });
    }

    private static string Superscript(int number) => string.Concat(Text(number).Select(digit => "⁰¹²³⁴⁵⁶⁷⁸⁹"[digit - '0']));

    /// <summary>One of the three lists.</summary>
    /// <param name="Name">Its name in the generated part.</param>
    /// <param name="Adjective">Which moments they are.</param>
    /// <param name="Formula">Its definition, up to the exponent.</param>
    /// <param name="Values">The entries by order.</param>
    private sealed record MomentList(string Name, string Adjective, string Formula, IReadOnlyList<RoundedValue> Values);
}
