using System;
using System.Collections.Generic;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace GaussGen.Tool.Reading;

/// <summary>
/// The static read-only arrays of a type, as its type initializer fills them. The initializer may hold other code too (the
/// user's own static fields), so each array is accepted only if its sequence is run exactly once whatever that code does:
/// no branch leads into it, out of it or over it, nothing returns before it, and its field is named nowhere else.
/// </summary>
internal sealed class StaticArrays(PEReader executable, MetadataReader metadata, MetadataNames names, ArrayForms forms, InstructionDecoder decoder)
{
    private readonly Dictionary<TypeDefinitionHandle, Dictionary<FieldDefinitionHandle, BuiltArray>> _byType = [];

    /// <summary>The contents of a static read-only array, or null if they cannot be known from the type initializer.</summary>
    public BuiltArray? Read(FieldDefinitionHandle handle)
    {
        FieldDefinition field = metadata.GetFieldDefinition(handle);
        if (!MetadataNames.IsStaticReadOnly(field) || names.ArrayElement(field) is not { } element)
        {
            return null;
        }

        TypeDefinitionHandle type = field.GetDeclaringType();
        if (!_byType.TryGetValue(type, out Dictionary<FieldDefinitionHandle, BuiltArray>? arrays))
        {
            _byType[type] = arrays = ReadInitializer(type);
        }

        return arrays.TryGetValue(handle, out BuiltArray array) && array.Element == element ? array : null;
    }

    private Dictionary<FieldDefinitionHandle, BuiltArray> ReadInitializer(TypeDefinitionHandle type)
    {
        Dictionary<FieldDefinitionHandle, BuiltArray> arrays = [];
        if (InitializerBody(type) is not { } instructions)
        {
            return arrays;
        }

        int[] crossings = CountCrossedInstructions(instructions);
        Dictionary<FieldDefinitionHandle, int> mentions = CountMentions(instructions);
        for (int i = 0; i < instructions.Count && instructions[i].Code != ILOpCode.Ret; i++)
        {
            InstructionCursor cursor = new(instructions, i);
            bool isCandidate = instructions[i].Code == ILOpCode.Call || cursor.Peek(1)?.Code == ILOpCode.Newarr;
            if (isCandidate && forms.TakeNewArray(cursor) is { } array
                && cursor.Take(ILOpCode.Stsfld) is { } token && MetadataNames.Field(token) is { } field
                && mentions[field] == 1 && crossings[cursor.Position] == crossings[i])
            {
                arrays.Add(field, array);
                i = cursor.Position - 1;
            }
        }

        return arrays;
    }

    private List<Instruction>? InitializerBody(TypeDefinitionHandle type)
    {
        foreach (MethodDefinitionHandle handle in metadata.GetTypeDefinition(type).GetMethods())
        {
            MethodDefinition method = metadata.GetMethodDefinition(handle);
            if (metadata.StringComparer.Equals(method.Name, ".cctor") && method.RelativeVirtualAddress != 0)
            {
                return decoder.Decode(executable.GetMethodBody(method.RelativeVirtualAddress).GetILReader());
            }
        }

        return null;
    }

    /// <summary>
    /// At index i, how many of the first i instructions lie between a branch and where it leads. A run of instructions is
    /// crossed by no branch exactly if the count is the same at both its ends.
    /// </summary>
    private static int[] CountCrossedInstructions(List<Instruction> instructions)
    {
        int[] opened = new int[instructions.Count + 1];
        for (int i = 0; i < instructions.Count; i++)
        {
            if (instructions[i].IsBranch)
            {
                int target = IndexAt(instructions, instructions[i].Operand);
                opened[Math.Min(i, target)]++;
                opened[Math.Max(i, target)]--;
            }
        }

        int[] crossed = new int[instructions.Count + 1];
        for (int i = 0, open = 0; i < instructions.Count; i++)
        {
            open += opened[i];
            crossed[i + 1] = crossed[i] + (open > 0 ? 1 : 0);
        }

        return crossed;
    }

    private static int IndexAt(List<Instruction> instructions, long offset)
    {
        int low = 0;
        for (int high = instructions.Count; low < high;)
        {
            int middle = (low + high) / 2;
            (low, high) = instructions[middle].Offset < offset ? (middle + 1, high) : (low, middle);
        }

        return low;
    }

    private static Dictionary<FieldDefinitionHandle, int> CountMentions(List<Instruction> instructions)
    {
        Dictionary<FieldDefinitionHandle, int> mentions = [];
        foreach (Instruction instruction in instructions)
        {
            bool namesField = instruction.Code is ILOpCode.Stsfld or ILOpCode.Ldsfld or ILOpCode.Ldsflda or ILOpCode.Ldtoken;
            if (namesField && MetadataNames.Field(instruction.Operand) is { } field)
            {
                mentions[field] = mentions.GetValueOrDefault(field) + 1;
            }
        }

        return mentions;
    }
}
