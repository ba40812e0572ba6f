using System.Linq;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace GaussGen.Tool.Reading;

/// <summary>Reads the floating-point constants in a method's code; such a constant is as much part of a result as a table's entry.</summary>
internal sealed class MethodLiterals(PEReader executable, MetadataReader metadata, InstructionDecoder decoder)
{
    /// <summary>A method's constants.</summary>
    public FoundMethod Read(MethodDefinitionHandle handle)
    {
        MethodDefinition method = metadata.GetMethodDefinition(handle);
        string name = metadata.GetString(method.Name);
        FoundConstant[] literals = method.RelativeVirtualAddress == 0
            ? []
            : [
                .. decoder.Decode(executable.GetMethodBody(method.RelativeVirtualAddress).GetILReader())
                    .Where(instruction => instruction.Code is ILOpCode.Ldc_r8 or ILOpCode.Ldc_r4)
                    .Select(instruction => instruction.Code == ILOpCode.Ldc_r8
                        ? new FoundConstant(name, ElementType.Double, (ulong)instruction.Operand)
                        : new FoundConstant(name, ElementType.Single, (uint)instruction.Operand)),
            ];
        return new FoundMethod(name, literals);
    }
}
