using System.Collections.Generic;
using System.Linq;
using GaussGen.Generator.Declarations;

namespace GaussGen.Generator.Emission;

/// <summary>What a generated sum is called and takes, beside the function.</summary>
/// <param name="Name">The method's name.</param>
/// <param name="Parameters">The names of the numbers before the function.</param>
/// <param name="HasError">Whether an estimate of the error comes out after the function.</param>
internal sealed record SumHead(string Name, IReadOnlyList<string> Parameters, bool HasError = false);

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

    /// <summary>The signature of a sum.</summary>
    public string SignatureOf(SumHead head, NumberType type)
    {
        IEnumerable<string> types = head.Parameters.Select(_ => type.Keyword).Append(IsGeneric ? "!0" : Type);
        return MethodSignature.Of(IsGeneric ? 1 : 0, head.HasError ? types.Append("ref " + type.Keyword) : types);
    }

    /// <summary>Writes the lines before the body of a sum.</summary>
    /// <param name="writer">Where to.</param>
    /// <param name="head">The sum.</param>
    /// <param name="type">The type of its numbers.</param>
    public void WriteHeader(SourceWriter writer, SumHead head, NumberType type)
    {
        string before = string.Concat(head.Parameters.Select(parameter => $"{type.Keyword} {parameter}, "));
        string after = head.HasError ? $", out {type.Keyword} error" : string.Empty;
        writer.Line(TableText.GeneratedCodeAttribute);
        writer.Line($"public static {type.Keyword} {head.Name}{TypeParameters}({before}{Type} integrand{after})");
        if (IsGeneric)
        {
            writer.Line("    " + Constraint);
        }
    }
}
