using System.Collections.Generic;
using System.Reflection.Metadata;

namespace GaussGen.Tool.Reading;

/// <summary>A place in a list of instructions from which known sequences are taken one by one.</summary>
internal sealed class InstructionCursor(IReadOnlyList<Instruction> instructions, int position = 0)
{
    /// <summary>The index of the next instruction.</summary>
    public int Position { get; private set; } = position;

    /// <summary>Whether all has been taken.</summary>
    public bool IsAtEnd => Position == instructions.Count;

    /// <summary>The offset in the body of the next instruction, −1 at the end.</summary>
    public int Offset => Peek()?.Offset ?? -1;

    /// <summary>An instruction further on, not taken.</summary>
    public Instruction? Peek(int ahead = 0) =>
        Position + ahead < instructions.Count ? instructions[Position + ahead] : null;

    /// <summary>Whether the next instruction is this one; if so it is taken.</summary>
    public bool Skip(ILOpCode code) => Take(code) is not null;

    /// <summary>Takes the next instruction if it is this one, and gives its operand.</summary>
    public long? Take(ILOpCode code)
    {
        if (Peek() is not { } next || next.Code != code)
        {
            return null;
        }

        Position++;
        return next.Operand;
    }

    /// <summary>Takes the next instruction if it pushes a 32-bit constant, and gives that.</summary>
    public int? TakeInt32() => TakeIf(Peek()?.PushedInt32);

    /// <summary>Takes the next instruction if it stores to a local variable, and gives its number.</summary>
    public int? TakeStoredLocal() => TakeIf(Peek()?.StoredLocal);

    /// <summary>Takes the next instruction if it loads a local variable, and gives its number.</summary>
    public int? TakeLoadedLocal() => TakeIf(Peek()?.LoadedLocal);

    private int? TakeIf(int? value)
    {
        Position += value is null ? 0 : 1;
        return value;
    }
}
