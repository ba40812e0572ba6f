using System;
using System.Buffers.Binary;
using System.Collections.Generic;

namespace GaussGen.Tool.Reading;

/// <summary>A table attribute as the metadata holds it.</summary>
/// <param name="Name">The attribute's name without its namespace and without "Attribute": "GaussHermite".</param>
/// <param name="Arguments">The constructor's arguments in order; enumeration values as <see cref="int"/>, arrays as object arrays.</param>
/// <param name="Named">The named arguments.</param>
internal sealed record Declaration(string Name, IReadOnlyList<object?> Arguments, IReadOnlyDictionary<string, object?> Named);

/// <summary>The data behind a property that returns a read-only span, in the image's own byte order (always little-endian).</summary>
/// <param name="Name">The property's name.</param>
/// <param name="Element">The C# type of an element.</param>
/// <param name="Data">The raw bytes of all elements.</param>
internal sealed record FoundSpan(string Name, ElementType Element, ReadOnlyMemory<byte> Data)
{
    /// <summary>The number of elements.</summary>
    public int Count => Data.Length / Element.Size();

    /// <summary>The bits of one element, zero-extended.</summary>
    public ulong Bits(int index)
    {
        int size = Element.Size();
        ReadOnlySpan<byte> element = Data.Span.Slice(index * size, size);
        return size switch
        {
            1 => element[0],
            2 => BinaryPrimitives.ReadUInt16LittleEndian(element),
            4 => BinaryPrimitives.ReadUInt32LittleEndian(element),
            _ => BinaryPrimitives.ReadUInt64LittleEndian(element),
        };
    }

    /// <summary>The bits of all elements.</summary>
    public ulong[] AllBits()
    {
        ulong[] bits = new ulong[Count];
        for (int i = 0; i < bits.Length; i++)
        {
            bits[i] = Bits(i);
        }

        return bits;
    }
}

/// <summary>A constant of a type, from the metadata.</summary>
/// <param name="Name">The field's name.</param>
/// <param name="Element">Its type.</param>
/// <param name="Bits">Its bits, zero-extended.</param>
internal sealed record FoundConstant(string Name, ElementType Element, ulong Bits);

/// <summary>A generated method, and the floating-point constants that its code holds.</summary>
/// <param name="Name">The method's name; its overloads have the same.</param>
/// <param name="Literals">The constants, as often and in the order in which the code has them.</param>
internal sealed record FoundMethod(string Name, IReadOnlyList<FoundConstant> Literals);

/// <summary>
/// A type that declares one table or more, with all the data it was found to hold. What could not be read is named with the
/// reason, so that nothing is passed over.
/// </summary>
/// <param name="Name">The type's full name, as C# writes it: "SurveyBoat.Outer.Sixteen".</param>
/// <param name="Declarations">The table attributes on it, in metadata order.</param>
/// <param name="Spans">Data by property name.</param>
/// <param name="Constants">Constants by name.</param>
/// <param name="Methods">The generated methods.</param>
/// <param name="UnreadSpans">By property name, why its data could not be read.</param>
/// <param name="UnreadDeclarations">By attribute name, why its arguments could not be read; "?" where the attribute is gone.</param>
internal sealed record FoundType(
    string Name,
    IReadOnlyList<Declaration> Declarations,
    IReadOnlyDictionary<string, FoundSpan> Spans,
    IReadOnlyDictionary<string, FoundConstant> Constants,
    IReadOnlyList<FoundMethod> Methods,
    IReadOnlyDictionary<string, string> UnreadSpans,
    IReadOnlyDictionary<string, string> UnreadDeclarations);

/// <summary>All that was found in one assembly.</summary>
/// <param name="Name">The assembly's simple name.</param>
/// <param name="Version">Its version.</param>
/// <param name="Digest">The SHA-256 digest of the file, in hexadecimal digits.</param>
/// <param name="Types">The types with a table, in metadata order.</param>
internal sealed record FoundAssembly(string Name, Version Version, string Digest, IReadOnlyList<FoundType> Types);
