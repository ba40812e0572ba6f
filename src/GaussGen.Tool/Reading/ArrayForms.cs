using System;
using System.Buffers.Binary;
using System.Reflection.Metadata;

namespace GaussGen.Tool.Reading;

/// <summary>An array as code builds it: the element type that the code names, and the bytes.</summary>
internal readonly record struct BuiltArray(ElementType Element, byte[] Data);

/// <summary>The instruction sequences with which compilers build an array of constants.</summary>
internal sealed class ArrayForms(MetadataNames names, MappedData data)
{
    /// <summary>
    /// Takes a new array with its contents: copied from data in the image, stored element by element (few elements, or mostly
    /// zeros), or empty. Null if the code at the cursor is none of these.
    /// </summary>
    public BuiltArray? TakeNewArray(InstructionCursor cursor)
    {
        if (cursor.Take(ILOpCode.Call) is { } call)
        {
            return names.GenericMethodArgument(call, "System", "Array", "Empty") is { } empty ? new BuiltArray(empty, []) : null;
        }

        if (cursor.TakeInt32() is not { } count || cursor.Take(ILOpCode.Newarr) is not { } type || names.Primitive(type) is not { } element)
        {
            return null;
        }

        byte[]? bytes = cursor.Peek(1)?.Code == ILOpCode.Ldtoken
            ? TakeCopiedData(cursor, element, count)
            : TakeStoredElements(cursor, element, count);
        return bytes is null ? null : new BuiltArray(element, bytes);
    }

    private byte[]? TakeCopiedData(InstructionCursor cursor, ElementType element, int count)
    {
        if (!cursor.Skip(ILOpCode.Dup)
            || cursor.Take(ILOpCode.Ldtoken) is not { } token
            || cursor.Take(ILOpCode.Call) is not { } call
            || !names.IsMethod(call, "System.Runtime.CompilerServices", "RuntimeHelpers", "InitializeArray")
            || MetadataNames.Field(token) is not { } field)
        {
            return null;
        }

        byte[]? bytes = data.Read(field);
        return bytes?.Length == (long)count * element.Size() ? bytes : null;
    }

    private byte[]? TakeStoredElements(InstructionCursor cursor, ElementType element, int count)
    {
        int size = element.Size();
        byte[] bytes = data.Allocate((long)count * size);
        while (cursor.Peek()?.Code == ILOpCode.Dup && cursor.Peek(1)?.PushedInt32 is { } index)
        {
            _ = cursor.Skip(ILOpCode.Dup);
            _ = cursor.TakeInt32();
            if (TakeConstant(cursor, element) is not { } bits || !cursor.Skip(StoreCode(element)) || index < 0 || index >= count)
            {
                return null;
            }

            Write(bytes.AsSpan(index * size, size), bits);
        }

        return bytes;
    }

    private static ulong? TakeConstant(InstructionCursor cursor, ElementType element)
    {
        switch (element)
        {
            case ElementType.Double:
                return (ulong?)cursor.Take(ILOpCode.Ldc_r8);
            case ElementType.Single:
                return (uint?)(int?)cursor.Take(ILOpCode.Ldc_r4);
            case ElementType.Int64 or ElementType.UInt64:
                if (cursor.Take(ILOpCode.Ldc_i8) is { } wide)
                {
                    return (ulong)wide;
                }

                int? narrow = cursor.TakeInt32();
                return cursor.Skip(ILOpCode.Conv_i8) ? (ulong?)(long?)narrow : cursor.Skip(ILOpCode.Conv_u8) ? (uint?)narrow : null;
            default:
                return (uint?)cursor.TakeInt32();
        }
    }

    private static ILOpCode StoreCode(ElementType element) => element switch
    {
        ElementType.Double => ILOpCode.Stelem_r8,
        ElementType.Single => ILOpCode.Stelem_r4,
        ElementType.Int64 or ElementType.UInt64 => ILOpCode.Stelem_i8,
        ElementType.Int32 or ElementType.UInt32 => ILOpCode.Stelem_i4,
        ElementType.Int16 or ElementType.UInt16 => ILOpCode.Stelem_i2,
        _ => ILOpCode.Stelem_i1,
    };

    private static void Write(Span<byte> element, ulong bits)
    {
        switch (element.Length)
        {
            case 1:
                element[0] = (byte)bits;
                break;
            case 2:
                BinaryPrimitives.WriteUInt16LittleEndian(element, (ushort)bits);
                break;
            case 4:
                BinaryPrimitives.WriteUInt32LittleEndian(element, (uint)bits);
                break;
            default:
                BinaryPrimitives.WriteUInt64LittleEndian(element, bits);
                break;
        }
    }
}
