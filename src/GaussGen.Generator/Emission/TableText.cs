using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Generator.Emission;

/// <summary>Lists of constants as members of a type, and the words about them.</summary>
internal static class TableText
{
    public static readonly string GeneratedCodeAttribute =
        $"[global::System.CodeDom.Compiler.GeneratedCode(\"{GeneratorIdentity.Name}\", \"{GeneratorIdentity.Version}\")]";

    /// <summary>
    /// A span property over constants: data in the image where the target can, otherwise a private array and the property.
    /// </summary>
    /// <param name="name">The property's name.</param>
    /// <param name="type">The type of the entries.</param>
    /// <param name="target">What the consumer's compiler can do.</param>
    /// <param name="document">Writes the property's documentation.</param>
    /// <param name="entries">Makes the lines between the braces.</param>
    public static IEnumerable<GeneratedMember> Span(
        string name, NumberType type, TargetCapabilities target, Action<SourceWriter> document, Func<IReadOnlyList<string>> entries)
    {
        string array = "GaussGen" + name;
        if (!target.KeepsSpansInImage)
        {
            yield return new GeneratedMember(array, null, writer =>
            {
                writer.Line(GeneratedCodeAttribute);
                writer.Entries($"private static readonly {type.Keyword}[] {array} = new {type.Keyword}[]", entries());
            });
        }

        yield return new GeneratedMember(name, null, writer =>
        {
            document(writer);
            writer.Line(GeneratedCodeAttribute);
            string property = $"public static {type.Span} {name} => ";
            if (target.KeepsSpansInImage)
            {
                writer.Entries($"{property}new {type.Keyword}[]", entries());
            }
            else
            {
                writer.Line($"{property}{array};");
            }
        });
    }

    /// <summary>One line an entry: the literal, and the same value in hexadecimal beside it, in columns.</summary>
    public static IReadOnlyList<string> Literals(IReadOnlyList<RoundedValue> values, NumberType type)
    {
        string[] literals = values.Select(value => type.Literal(value) + ",").ToArray();
        string[] hexadecimals = values.Select(type.Hexadecimal).ToArray();
        int width = literals.Max(literal => literal.Length);
        bool hasSigns = hexadecimals.Any(IsNegative);
        return literals
            .Zip(hexadecimals, (literal, hexadecimal) =>
                literal.PadRight(width) + " // " + (hasSigns && !IsNegative(hexadecimal) ? " " : string.Empty) + hexadecimal)
            .ToArray();
    }

    /// <summary>How tight the enclosures were that decided the rounding: "no enclosure is wider than 2^-60 ulp".</summary>
    public static string Widths(IEnumerable<RoundedValue> values)
    {
        int[] widths = values.Select(value => value.EnclosureWidthLog2).Where(width => width != int.MinValue).ToArray();
        return widths.Length == 0
            ? "every value is known exactly"
            : $"no enclosure is wider than 2^{Text(widths.Max())} ulp";
    }

    /// <summary>"1 node", "2 nodes".</summary>
    public static string Count(int number, string noun) => Text(number) + " " + noun + (number == 1 ? string.Empty : "s");

    /// <summary>How exact the entries of a list are and what they take: a remark on the list.</summary>
    public static string EntryRemark(IReadOnlyList<RoundedValue> values, NumberType type) =>
        $"Each is the {type.Format.Name} value nearest to the true one ({Widths(values)}). {Text(values.Count * type.Bytes)} bytes.";

    public static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);

    private static bool IsNegative(string number) => number[0] == '-';

    private static void Entries(this SourceWriter writer, string header, IReadOnlyList<string> entries)
    {
        writer.Line(header);
        using (writer.Block("};"))
        {
            foreach (string entry in entries)
            {
                writer.Line(entry);
            }
        }
    }
}
