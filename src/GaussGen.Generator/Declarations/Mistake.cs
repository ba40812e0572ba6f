using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>What is wrong with an argument of an attribute.</summary>
/// <param name="Rule">The diagnostic that tells the user.</param>
/// <param name="Argument">The name of the parameter or property whose argument is at fault.</param>
/// <param name="Values">What fills the places in the message.</param>
internal sealed record Mistake(DiagnosticDescriptor Rule, string Argument, params object[] Values)
{
    /// <summary>Which of the values of an argument that is a list is at fault, from 0; <c>null</c> for the whole argument.</summary>
    public int? Element { get; init; }
}
