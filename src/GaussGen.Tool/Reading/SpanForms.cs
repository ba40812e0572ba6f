using System.Collections.Generic;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace GaussGen.Tool.Reading;

/// <summary>
/// Reads the data behind a property that returns a read-only span of constants. The getter's instructions must match one of
/// the known forms from the first to the last; a getter that does anything else has no data that could be known without
/// running it. Compilers and target frameworks differ, so there are several: data in the image handed out as a span, an array
/// that is cached, one that is built on each call, a static read-only one, and the empty span.
/// </summary>
internal sealed class SpanForms(
    PEReader executable, MetadataReader metadata, MetadataNames names, MappedData data, ArrayForms arrays, StaticArrays statics, InstructionDecoder decoder)
{
    private const string CompilerServices = "System.Runtime.CompilerServices";
    private const string CompilerMadeType = "<PrivateImplementationDetails>";

    /// <summary>The bytes behind a getter, or null if its code is of no known form.</summary>
    public byte[]? Read(MethodDefinitionHandle getter, ElementType element)
    {
        MethodDefinition method = metadata.GetMethodDefinition(getter);
        if (method.RelativeVirtualAddress == 0)
        {
            return null;
        }

        List<Instruction> body = decoder.Decode(executable.GetMethodBody(method.RelativeVirtualAddress).GetILReader());
        InstructionCursor cursor = new(body);
        byte[]? bytes = TakeSpan(cursor, element);
        return bytes is not null && TakeReturn(cursor) && cursor.IsAtEnd && bytes.Length % element.Size() == 0 ? bytes : null;
    }

    private byte[]? TakeSpan(InstructionCursor cursor, ElementType element) => cursor.Peek()?.Code switch
    {
        ILOpCode.Ldtoken => TakeSharedData(cursor, element),
        ILOpCode.Ldsflda => TakeSharedBytes(cursor, element),
        ILOpCode.Ldloca_s or ILOpCode.Ldloca => TakeDefault(cursor, element),
        _ => TakeArray(cursor) is { } array && array.Element == element && TakeConversion(cursor, element) ? array.Data : null,
    };

    /// <summary>RuntimeHelpers.CreateSpan over a field with data.</summary>
    private byte[]? TakeSharedData(InstructionCursor cursor, ElementType element)
    {
        long? token = cursor.Take(ILOpCode.Ldtoken);
        return cursor.Take(ILOpCode.Call) is { } call
            && names.GenericMethodArgument(call, CompilerServices, "RuntimeHelpers", "CreateSpan") == element
            && MetadataNames.Field(token!.Value) is { } field
            ? data.Read(field)
            : null;
    }

    /// <summary>A span over the address of a field with data, which compilers use for elements of one byte.</summary>
    private byte[]? TakeSharedBytes(InstructionCursor cursor, ElementType element)
    {
        long? token = cursor.Take(ILOpCode.Ldsflda);
        if (cursor.TakeInt32() is not { } count
            || cursor.Take(ILOpCode.Newobj) is not { } constructor
            || names.SpanMethodElement(constructor, ".ctor", 2) != element
            || MetadataNames.Field(token!.Value) is not { } field)
        {
            return null;
        }

        byte[]? bytes = data.Read(field);
        return bytes?.Length == (long)count * element.Size() ? bytes : null;
    }

    private byte[]? TakeDefault(InstructionCursor cursor, ElementType element)
    {
        long? local = cursor.Take(ILOpCode.Ldloca_s) ?? cursor.Take(ILOpCode.Ldloca);
        return cursor.Take(ILOpCode.Initobj) is { } type && names.SpanElement(type) == element && cursor.TakeLoadedLocal() == local ? [] : null;
    }

    private BuiltArray? TakeArray(InstructionCursor cursor)
    {
        if (cursor.Take(ILOpCode.Ldsfld) is not { } token)
        {
            return arrays.TakeNewArray(cursor);
        }

        if (MetadataNames.Field(token) is not { } field)
        {
            return null;
        }

        return cursor.Skip(ILOpCode.Dup) ? TakeCachedArray(cursor, field, token) : statics.Read(field);
    }

    /// <summary>A compiler-made cache: on the first call the array is built and stored, later ones hand it out.</summary>
    private BuiltArray? TakeCachedArray(InstructionCursor cursor, FieldDefinitionHandle cache, long token)
    {
        TypeDefinition owner = metadata.GetTypeDefinition(metadata.GetFieldDefinition(cache).GetDeclaringType());
        long? rejoin = cursor.Take(ILOpCode.Brtrue_s) ?? cursor.Take(ILOpCode.Brtrue);
        BuiltArray? array = cursor.Skip(ILOpCode.Pop) ? arrays.TakeNewArray(cursor) : null;
        return metadata.StringComparer.Equals(owner.Name, CompilerMadeType)
            && cursor.Skip(ILOpCode.Dup) && cursor.Take(ILOpCode.Stsfld) == token && cursor.Offset == rejoin
            ? array
            : null;
    }

    private bool TakeConversion(InstructionCursor cursor, ElementType element) =>
        cursor.Take(ILOpCode.Newobj) is { } constructor
            ? names.SpanMethodElement(constructor, ".ctor", 1) == element
            : cursor.Take(ILOpCode.Call) is { } call && names.SpanMethodElement(call, "op_Implicit", 1) == element;

    /// <summary>The end of a getter; without optimisation the value takes a detour through a local variable.</summary>
    private static bool TakeReturn(InstructionCursor cursor)
    {
        if (cursor.TakeStoredLocal() is { } local)
        {
            long? target = cursor.Take(ILOpCode.Br_s) ?? cursor.Take(ILOpCode.Br);
            if (target != cursor.Offset || cursor.TakeLoadedLocal() != local)
            {
                return false;
            }
        }

        return cursor.Skip(ILOpCode.Ret);
    }
}
