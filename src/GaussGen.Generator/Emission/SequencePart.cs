using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Sequences;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>The generated part of a table of named lists: one span for each.</summary>
internal static class SequencePart
{
    /// <summary>The lists as a part of a type; no entry may be too large for the format.</summary>
    public static TablePart Of(RoundedSequences sequences, TargetCapabilities target)
    {
        NumberType type = NumberType.Of(sequences.Format);
        return new TablePart(
            Documentation.Escape(sequences.Table.Description.Title + "."), Remarks(sequences, type, target), Members(sequences, type, target).ToArray());
    }

    private static List<string> Remarks(RoundedSequences sequences, NumberType type, TargetCapabilities target)
    {
        SequenceDescription description = sequences.Table.Description;
        string arrays = sequences.Values.Count == 1 ? "an array, filled before it is" : "arrays, filled before they are";
        return new List<string>
        {
            Documentation.Escape(
                $"Every entry is the {type.Format.Name} value nearest to the true one ({Text(type.Format.Precision)} bits; proven: "
                + $"{description.Method}; {Widths(sequences.Values.SelectMany(values => values))})."),
            $"{Text(sequences.Values.Sum(values => values.Count) * type.Bytes)} bytes of data"
                + (target.KeepsSpansInImage ? " in the image; nothing runs before the first call." : $" in {arrays} first read."),
            Documentation.Escape($"Source: {description.Sources}."),
        };
    }

    private static IEnumerable<GeneratedMember> Members(RoundedSequences sequences, NumberType type, TargetCapabilities target) => sequences.Table.Sequences
        .Zip(sequences.Values, (sequence, values) => Span(
            sequence.Name,
            type,
            target,
            writer =>
            {
                writer.Summary(Documentation.Escape(sequence.Summary));
                writer.Remarks(EntryRemark(values, type));
            },
            () => Literals(values, type)))
        .SelectMany(members => members);
}
