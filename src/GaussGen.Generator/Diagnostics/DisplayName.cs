using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Diagnostics;

/// <summary>How messages name types and members.</summary>
internal static class DisplayName
{
    public static string Of(ISymbol symbol) => symbol.ToDisplayString(SymbolDisplayFormat.CSharpShortErrorMessageFormat);
}
