using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Explanations;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reports;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Exports;

/// <summary>
/// A header in C99 (ISO/IEC 9899:1999): constants in hexadecimal, so that every compiler reads exactly the bits that were proven. It
/// is plain ASCII, includes only float.h, and does not compile where the target's types are other number formats.
/// </summary>
/// <param name="prefix">What stands before the last part of each table's name; null for the table's whole name.</param>
internal sealed class CHeaderWriter(string? prefix) : ITableWriter
{
    private const int Width = 80;

    /// <inheritdoc/>
    public void Write(IReadOnlyList<ExportedTable> tables, Stream stream)
    {
        List<(ExportedTable Table, string Name)> named = [.. tables.Select(table => (table, NameOf(table)))];
        RequireDistinct(named);
        string guard = "GAUSSGEN_" + (named.Count == 1 ? named[0].Name : (prefix ?? "") + CName.Of(tables[0].AssemblyName ?? "") + "_tables").ToUpperInvariant() + "_H";
        using StreamWriter writer = new(stream, Encoding.ASCII, leaveOpen: true) { NewLine = "\n" };
        Comment(writer, $"Written by {ToolIdentity.Name} {ToolIdentity.Version}. Do not edit it; export it again.");
        writer.WriteLine($"#ifndef {guard}");
        writer.WriteLine($"#define {guard}");
        writer.WriteLine();
        writer.WriteLine("#include <float.h>");
        WriteTargetCheck(writer, tables);
        foreach ((ExportedTable table, string name) in named)
        {
            WriteTable(writer, table, name);
        }

        writer.WriteLine();
        writer.WriteLine("#endif");
    }

    private string NameOf(ExportedTable table) =>
        prefix is null ? CName.Of(table.Name) : prefix + CName.Of(table.Name[(table.Name.LastIndexOf('.') + 1)..]);

    private static void RequireDistinct(List<(ExportedTable Table, string Name)> named)
    {
        foreach (IGrouping<string, (ExportedTable Table, string Name)> same in named.GroupBy(table => table.Name).Where(group => group.Count() > 1))
        {
            string[] types = [.. same.Select(table => table.Table.Name).Distinct()];
            throw new InputException(types.Length > 1
                ? $"{types[0]} and {types[1]} would both be {same.Key} in C; export them one at a time, with --prefix"
                : $"{types[0]} declares several tables that would all be {same.Key} in C; export it as CSV or JSON");
        }
    }

    /// <summary>C leaves the formats of its types open; some small targets have a double of 32 bits.</summary>
    private static void WriteTargetCheck(StreamWriter writer, IReadOnlyList<ExportedTable> tables)
    {
        foreach (BinaryFormat format in tables.Select(table => table.Claim.Format).Distinct().OrderBy(format => format.StorageBits))
        {
            string macro = CType(format) == "float" ? "FLT" : "DBL";
            writer.WriteLine();
            writer.WriteLine(
                $"#if FLT_RADIX != 2 || {macro}_MANT_DIG != {Text(format.Precision)} || {macro}_MAX_EXP != {Text(format.MaximumExponent + 1)}");
            writer.WriteLine($"#error \"{CType(format)} is not {format.Name} on this target; use a table of another format\"");
            writer.WriteLine("#endif");
        }
    }

    private static void WriteTable(StreamWriter writer, ExportedTable table, string name)
    {
        Explanation explanation = Explanation.Of(table.Claim);
        writer.WriteLine();
        Comment(
            writer,
            [
                $"{table.Claim.Title}, {table.Claim.Format.Name}.",
                table.AssemblyName is null ? "" : $"Table {Harmless(table.Name)} of {Harmless(table.AssemblyName)}.",
                ProofText(table),
                "Data: " + table.Digest,
                "",
                .. explanation.Definition,
                .. explanation.Exactness,
                "Sources: " + explanation.Sources + ".",
                "",
                "Caution: " + explanation.Caution,
            ]);

        ExportedMember[] integers = [.. table.Members.Where(member => member.Format is null)];
        if (integers.Length > 0)
        {
            writer.WriteLine("enum");
            writer.WriteLine("{");
            IEnumerable<string> lines = integers.Select(member => $"    {name}_{CName.Of(member.Name)} = {Text((int)member.Entries[0].Found)}");
            writer.WriteLine(string.Join(",\n", lines));
            writer.WriteLine("};");
        }

        foreach (ExportedMember member in table.Members.Where(member => member.Format is not null))
        {
            writer.WriteLine();
            string remark = explanation.Members.GetValueOrDefault(member.Name, member.Name + ".");
            Comment(writer, member.IsSpan ? remark : $"{remark.TrimEnd('.')}: {Remark(member.Entries[0], member.Format!)}.");
            WriteMember(writer, table, member, $"static const {CType(member.Format!)} {name}_{CName.Of(member.Name)}");
        }
    }

    private static void WriteMember(StreamWriter writer, ExportedTable table, ExportedMember member, string declaration)
    {
        BinaryFormat format = member.Format!;
        string[] constants = [.. member.Entries.Select(entry => Constant(table, entry, format))];
        if (!member.IsSpan)
        {
            writer.WriteLine($"{declaration} = {constants[0]};");
            return;
        }

        int width = constants.Max(constant => constant.Length) + 1;
        writer.WriteLine($"{declaration}[{Text(constants.Length)}] =");
        writer.WriteLine("{");
        for (int i = 0; i < constants.Length; i++)
        {
            string comma = i + 1 < constants.Length ? "," : "";
            writer.WriteLine($"    {(constants[i] + comma).PadRight(width)} /* {Remark(member.Entries[i], format)} */");
        }

        writer.WriteLine("};");
    }

    private static string Remark(EntryProof entry, BinaryFormat format) =>
        EncodingText.Number(entry.Found, format) + (entry.Verdict == Verdict.Proven ? "" : ", not proven");

    private static string Constant(ExportedTable table, EntryProof entry, BinaryFormat format) => format.IsFinite(entry.Found)
        ? HexadecimalFloat.Write(entry.Found, format) + (CType(format) == "float" ? "f" : "")
        : throw new InputException($"{entry.Name} of {table.Name} is {EncodingText.Number(entry.Found, format)}, for which C99 has no constant; export the table as CSV or JSON");

    private static string ProofText(ExportedTable table) => table.Proof.Verdict == Verdict.Proven
        ? $"Every entry is proven to be the {table.Claim.Format.Name} number nearest to the true value."
        : $"NOT PROVEN: {Text(table.Proof.ProvenCount)} of {Text(table.Proof.Entries.Count)} entries are proven.";

    private static string CType(BinaryFormat format) => format == BinaryFormat.Binary32 ? "float" : "double";

    private static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);

    /// <summary>A name from outside, fit for a comment: nothing in it can end the comment or join lines.</summary>
    private static string Harmless(string name) =>
        string.Concat(PlainText.OneLine(name).Select(letter => char.IsAsciiLetterOrDigit(letter) || letter is '.' or ' ' or '_' or '`' or '-' ? letter : '_'));

    private static void Comment(StreamWriter writer, string text)
    {
        string[] lines = [.. TextLayout.Wrap(AsciiText.Of(text), Width - 6)];
        writer.WriteLine(lines.Length == 1 ? $"/* {lines[0]} */" : "/* " + string.Join("\n   ", lines) + " */");
    }

    private static void Comment(StreamWriter writer, IReadOnlyList<string> paragraphs)
    {
        IEnumerable<string> lines = paragraphs
            .Where((text, index) => text.Length > 0 || (index > 0 && paragraphs[index - 1].Length > 0))
            .SelectMany(text => text.Length == 0 ? [""] : TextLayout.Wrap(AsciiText.Of(text), Width - 3));
        writer.WriteLine("/*");
        foreach (string line in lines)
        {
            writer.WriteLine((" * " + line).TrimEnd());
        }

        writer.WriteLine(" */");
    }
}
