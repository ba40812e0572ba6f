using System.Collections.Generic;
using System.Linq;
using GaussGen.Generator.Declarations;

namespace GaussGen.Generator.Emission;

/// <summary>A way to pass a function to a generated sum; each sum has one overload for either.</summary>
/// <param name="Type">The type of the parameter.</param>
/// <param name="TypeParameters">The type parameters of the method, with their brackets.</param>
/// <param name="Constraint">The constraint on them.</param>
internal sealed record IntegrandForm(string Type, string TypeParameters, string Constraint)
{
    private const string TypeParameter = "TIntegrand";

    public bool IsGeneric => TypeParameters.Length > 0;

    /// <summary>As a delegate, and as a struct that is compiled into the loop.</summary>
    public static IEnumerable<IntegrandForm> Both(NumberType type) => new[]
    {
        new IntegrandForm($"global::System.Func<{type.Keyword}, {type.Keyword}>", string.Empty, string.Empty),
        new IntegrandForm(
            TypeParameter, $"<{TypeParameter}>", $"where {TypeParameter} : struct, global::GaussGen.IIntegrand<{type.Keyword}>"),
    };

    /// <summary>The signature of a method whose last parameter is the function.</summary>
    public string SignatureAfter(IEnumerable<string> parameterTypes) =>
        MethodSignature.Of(IsGeneric ? 1 : 0, parameterTypes.Append(IsGeneric ? "!0" : Type));

    /// <summary>Writes the lines before the body of a method whose last parameter is the function.</summary>
    /// <param name="writer">Where to.</param>
    /// <param name="name">The method's name.</param>
    /// <param name="parameters">The parameters before, each with a comma after it.</param>
    /// <param name="type">What it returns.</param>
    public void WriteHeader(SourceWriter writer, string name, string parameters, NumberType type)
    {
        writer.Line(TableText.GeneratedCodeAttribute);
        writer.Line($"public static {type.Keyword} {name}{TypeParameters}({parameters}{Type} integrand)");
        if (IsGeneric)
        {
            writer.Line("    " + Constraint);
        }
    }
}
