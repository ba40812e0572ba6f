using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.Metadata.Ecma335;
using System.Reflection.PortableExecutable;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>A run of bytes in a file.</summary>
internal readonly record struct Place(int Offset, int Length);

/// <summary>
/// Where a compiled file keeps its tables, found through the tables of the metadata (ECMA-335, II.22) and by looking at every
/// method's code; which of it belongs to what is the business of the reader under test.
/// </summary>
internal sealed class ImagePlaces
{
    private const int RvaSize = 4;
    private const int PackingSize = 2;

    public ImagePlaces(byte[] image)
    {
        using PEReader executable = new(ImmutableArray.Create(image));
        MetadataReader metadata = executable.GetMetadataReader();
        int start = executable.PEHeaders.MetadataStartOffset;

        Data =
        [
            .. metadata.FieldDefinitions.Select(metadata.GetFieldDefinition)
                .Where(field => (field.Attributes & FieldAttributes.HasFieldRVA) != 0)
                .Select(field => new Place(Offset(executable.PEHeaders, field.GetRelativeVirtualAddress()), Size(metadata, field)))
                .Distinct(),
        ];
        Constants =
        [
            .. metadata.FieldDefinitions.Select(metadata.GetFieldDefinition)
                .Where(field => !field.GetDefaultValue().IsNil)
                .Select(field => metadata.GetConstant(field.GetDefaultValue()).Value)
                .Select(blob => new Place(
                    start + metadata.GetHeapMetadataOffset(HeapIndex.Blob) + metadata.GetHeapOffset(blob) + 1, metadata.GetBlobReader(blob).Length))
                .Distinct(),
        ];
        CodeConstants =
        [
            .. metadata.MethodDefinitions.Select(metadata.GetMethodDefinition)
                .Where(method => method.RelativeVirtualAddress != 0)
                .SelectMany(method => Operands(image, executable, method)),
        ];
        DataAddresses = Rows(metadata, start, TableIndex.FieldRva, 0, RvaSize);

        // The rows of this table are in the order of the types that have one; the user's structs are among them.
        TypeDefinition[] withLayout = [.. metadata.TypeDefinitions.Select(metadata.GetTypeDefinition).Where(type => !type.GetLayout().IsDefault)];
        DataSizes =
        [
            .. Rows(metadata, start, TableIndex.ClassLayout, PackingSize, sizeof(int))
                .Where((_, row) => metadata.GetString(withLayout[row].Name).StartsWith("__StaticArrayInitTypeSize", StringComparison.Ordinal)),
        ];
    }

    /// <summary>The data that fields are mapped to.</summary>
    public IReadOnlyList<Place> Data { get; }

    /// <summary>The values of constants.</summary>
    public IReadOnlyList<Place> Constants { get; }

    /// <summary>The floating-point constants in code.</summary>
    public IReadOnlyList<Place> CodeConstants { get; }

    /// <summary>The addresses of mapped data.</summary>
    public IReadOnlyList<Place> DataAddresses { get; }

    /// <summary>The stated sizes of the structures that give mapped data its length.</summary>
    public IReadOnlyList<Place> DataSizes { get; }

    private static Place[] Rows(MetadataReader metadata, int start, TableIndex table, int column, int length) =>
    [
        .. Enumerable.Range(0, metadata.GetTableRowCount(table))
            .Select(row => new Place(start + metadata.GetTableMetadataOffset(table) + (row * metadata.GetTableRowSize(table)) + column, length)),
    ];

    private static IEnumerable<Place> Operands(byte[] image, PEReader executable, MethodDefinition method)
    {
        const byte TinyHeader = 2;
        int header = Offset(executable.PEHeaders, method.RelativeVirtualAddress);
        int code = header + ((image[header] & 3) == TinyHeader ? 1 : 12);
        return new InstructionDecoder().Decode(executable.GetMethodBody(method.RelativeVirtualAddress).GetILReader())
            .Where(instruction => instruction.Code is ILOpCode.Ldc_r8 or ILOpCode.Ldc_r4)
            .Select(instruction => new Place(code + instruction.Offset + 1, instruction.Code == ILOpCode.Ldc_r8 ? 8 : 4));
    }

    private static int Offset(PEHeaders headers, int address)
    {
        SectionHeader section = headers.SectionHeaders[headers.GetContainingSectionIndex(address)];
        return address - section.VirtualAddress + section.PointerToRawData;
    }

    private static int Size(MetadataReader metadata, FieldDefinition field)
    {
        BlobReader signature = metadata.GetBlobReader(field.Signature);
        _ = signature.ReadSignatureHeader();
        return signature.ReadSignatureTypeCode() == SignatureTypeCode.TypeHandle
            ? metadata.GetTypeDefinition((TypeDefinitionHandle)signature.ReadTypeHandle()).GetLayout().Size
            : sizeof(long);
    }
}
