using System.Collections.Generic;
using System.Linq;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>What tells a method from its overloads, as text: the number of type parameters and the types of the parameters.</summary>
internal static class MethodSignature
{
    /// <summary>The signature of a method that is to be generated.</summary>
    /// <param name="typeParameterCount">How many type parameters it has.</param>
    /// <param name="parameterTypes">The types in full; "!0" for the first type parameter of the method.</param>
    public static string Of(int typeParameterCount, IEnumerable<string> parameterTypes) =>
        "`" + (char)('0' + typeParameterCount) + "(" + string.Join(", ", parameterTypes) + ")";

    /// <summary>The signature of a method in the source.</summary>
    public static string Of(IMethodSymbol method) => Of(method.Arity, method.Parameters.Select(TypeOf));

    private static string TypeOf(IParameterSymbol parameter)
    {
        string type = parameter.Type is ITypeParameterSymbol { TypeParameterKind: TypeParameterKind.Method } own
            ? "!" + (char)('0' + own.Ordinal)
            : parameter.Type.ToDisplayString(SymbolDisplayFormat.FullyQualifiedFormat);
        return parameter.RefKind == RefKind.None ? type : "ref " + type;
    }
}
