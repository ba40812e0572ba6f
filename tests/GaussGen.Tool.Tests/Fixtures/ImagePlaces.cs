using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.Metadata.Ecma335;
using System.Reflection.PortableExecutable;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>A run of bytes in a file.</summary>
internal readonly record struct Place(int Offset, int Length);

/// <summary>
/// Where a compiled file keeps its tables, found through the tables of the metadata alone (ECMA-335, II.22): nothing of the reader
/// under test is used.
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

    /// <summary>The addresses of mapped data.</summary>
    public IReadOnlyList<Place> DataAddresses { get; }

    /// <summary>The stated sizes of the structures that give mapped data its length.</summary>
    public IReadOnlyList<Place> DataSizes { get; }

    private static Place[] Rows(MetadataReader metadata, int start, TableIndex table, int column, int length) =>
    [
        .. Enumerable.Range(0, metadata.GetTableRowCount(table))
            .Select(row => new Place(start + metadata.GetTableMetadataOffset(table) + (row * metadata.GetTableRowSize(table)) + column, length)),
    ];

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
