using System;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace GaussGen.Tool.Reading;

/// <summary>Reads the data that compilers put into the image behind a field (ECMA-335, II.22.18).</summary>
internal sealed class MappedData(PEReader executable, MetadataReader metadata)
{
    private const long Budget = 64 << 20;

    private long _left = Budget;

    /// <summary>The bytes behind a field, or null if the field has none.</summary>
    /// <exception cref="BadImageFormatException">
    /// The data lies outside the image, or an assembly's fields name more data than any has.
    /// </exception>
    public byte[]? Read(FieldDefinitionHandle handle)
    {
        FieldDefinition field = metadata.GetFieldDefinition(handle);
        if ((field.Attributes & FieldAttributes.HasFieldRVA) == 0)
        {
            return null;
        }

        int size = Size(field);
        PEMemoryBlock section = executable.GetSectionData(field.GetRelativeVirtualAddress());
        if (size < 0 || size > section.Length)
        {
            throw new BadImageFormatException();
        }

        byte[] data = Allocate(size);
        section.GetReader(0, size).ReadBytes(size, data, 0);
        return data;
    }

    /// <summary>Room for a table, out of what one assembly may have.</summary>
    /// <exception cref="BadImageFormatException">No assembly has that much.</exception>
    public byte[] Allocate(long size) => size >= 0 && (_left -= size) >= 0 ? new byte[size] : throw new BadImageFormatException();

    /// <summary>A field's size: that of a primitive, or the one that its compiler-made structure states.</summary>
    private int Size(FieldDefinition field)
    {
        BlobReader signature = metadata.GetBlobReader(field.Signature);
        if (signature.ReadSignatureHeader().Kind != SignatureKind.Field)
        {
            throw new BadImageFormatException();
        }

        SignatureTypeCode code = signature.ReadSignatureTypeCode();
        if (code != SignatureTypeCode.TypeHandle)
        {
            return ElementTypes.FromSignature(code)?.Size() ?? throw new BadImageFormatException();
        }

        EntityHandle type = signature.ReadTypeHandle();
        return type.Kind == HandleKind.TypeDefinition
            ? metadata.GetTypeDefinition((TypeDefinitionHandle)type).GetLayout().Size
            : throw new BadImageFormatException();
    }
}
