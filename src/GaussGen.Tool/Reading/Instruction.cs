using System;
using System.Collections.Frozen;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using System.Reflection.Emit;
using System.Reflection.Metadata;

namespace GaussGen.Tool.Reading;

/// <summary>One instruction of intermediate language.</summary>
/// <param name="Code">The operation.</param>
/// <param name="Offset">Where it starts in the body.</param>
/// <param name="Operand">
/// A token, an integer, or the bits of a floating-point number; for a branch the offset it leads to.
/// </param>
internal readonly record struct Instruction(ILOpCode Code, int Offset, long Operand)
{
    /// <summary>Whether control may go on elsewhere than at the next instruction.</summary>
    public bool IsBranch => Code.IsBranch() || Code == ILOpCode.Switch;

    /// <summary>The integer that the instruction pushes, if it pushes a 32-bit constant.</summary>
    public int? PushedInt32 => Code switch
    {
        ILOpCode.Ldc_i4_m1 => -1,
        >= ILOpCode.Ldc_i4_0 and <= ILOpCode.Ldc_i4_8 => Code - ILOpCode.Ldc_i4_0,
        ILOpCode.Ldc_i4_s or ILOpCode.Ldc_i4 => (int)Operand,
        _ => null,
    };

    /// <summary>The local variable that the instruction stores to, if it does.</summary>
    public int? StoredLocal => Code switch
    {
        >= ILOpCode.Stloc_0 and <= ILOpCode.Stloc_3 => Code - ILOpCode.Stloc_0,
        ILOpCode.Stloc_s or ILOpCode.Stloc => (int)Operand,
        _ => null,
    };

    /// <summary>The local variable that the instruction loads, if it does.</summary>
    public int? LoadedLocal => Code switch
    {
        >= ILOpCode.Ldloc_0 and <= ILOpCode.Ldloc_3 => Code - ILOpCode.Ldloc_0,
        ILOpCode.Ldloc_s or ILOpCode.Ldloc => (int)Operand,
        _ => null,
    };
}

/// <summary>Decodes method bodies (ECMA-335, III).</summary>
/// <remarks>One decoder serves one assembly and stops after a fixed number of instructions, so that no file keeps it busy.</remarks>
internal sealed class InstructionDecoder
{
    private const int Budget = 20_000_000;

    private static readonly FrozenDictionary<ILOpCode, OperandType> Operands = typeof(OpCodes)
        .GetFields(BindingFlags.Public | BindingFlags.Static)
        .Select(field => (OpCode)field.GetValue(null)!)
        .ToFrozenDictionary(code => (ILOpCode)(ushort)code.Value, code => code.OperandType);

    private int _left = Budget;

    /// <summary>The instructions of a body, without those that do nothing; a multi-way branch gives one entry a target.</summary>
    /// <exception cref="BadImageFormatException">The bytes are no instructions, or there are more than any assembly needs.</exception>
    public List<Instruction> Decode(BlobReader body)
    {
        List<Instruction> instructions = [];
        while (body.RemainingBytes > 0)
        {
            int offset = body.Offset;
            int first = body.ReadByte();
            ILOpCode code = (ILOpCode)(first == 0xFE ? 0xFE00 | body.ReadByte() : first);
            if (--_left < 0 || !Operands.TryGetValue(code, out OperandType kind))
            {
                throw new BadImageFormatException();
            }

            if (kind == OperandType.InlineSwitch)
            {
                DecodeSwitch(ref body, code, offset, instructions);
                continue;
            }

            long operand = ReadOperand(ref body, kind);
            if (code != ILOpCode.Nop)
            {
                instructions.Add(new Instruction(code, offset, code.IsBranch() ? body.Offset + operand : operand));
            }
        }

        return instructions;
    }

    private void DecodeSwitch(ref BlobReader body, ILOpCode code, int offset, List<Instruction> instructions)
    {
        uint count = body.ReadUInt32();
        if (count > body.RemainingBytes / 4 || (_left -= (int)count) < 0)
        {
            throw new BadImageFormatException();
        }

        long next = body.Offset + 4L * count;
        for (; count > 0; count--)
        {
            instructions.Add(new Instruction(code, offset, next + body.ReadInt32()));
        }
    }

    private static long ReadOperand(ref BlobReader body, OperandType kind) => kind switch
    {
        OperandType.InlineNone => 0,
        OperandType.ShortInlineBrTarget or OperandType.ShortInlineI => body.ReadSByte(),
        OperandType.ShortInlineVar => body.ReadByte(),
        OperandType.InlineVar => body.ReadUInt16(),
        OperandType.InlineI8 or OperandType.InlineR => body.ReadInt64(),
        _ => body.ReadInt32(),
    };
}
