using System.Collections.Generic;
using System.Linq;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace GaussGen.Generator.Tests.Support;

/// <summary>A generated text, read by the compiler's parser.</summary>
internal static class GeneratedText
{
    /// <summary>The members of the innermost type.</summary>
    public static SyntaxList<MemberDeclarationSyntax> MembersOf(string text) => CSharpSyntaxTree
        .ParseText(text, new CSharpParseOptions(documentationMode: DocumentationMode.Diagnose))
        .GetRoot()
        .DescendantNodes()
        .OfType<TypeDeclarationSyntax>()
        .Last()
        .Members;

    public static IEnumerable<string> NamesIn(string text) => MembersOf(text).SelectMany(NamesOf);

    /// <summary>What code that uses the public members sees of them: kind, type, name and parameters.</summary>
    public static IEnumerable<string> SurfaceOf(string text) => MembersOf(text)
        .Where(member => member.Modifiers.Any(SyntaxKind.PublicKeyword))
        .Select(member => member switch
        {
            FieldDeclarationSyntax field => $"{field.Modifiers} {field.Declaration.Type} {field.Declaration.Variables.Single().Identifier}",
            PropertyDeclarationSyntax property => $"{property.Modifiers} {property.Type} {property.Identifier}",
            MethodDeclarationSyntax method =>
                $"{method.Modifiers} {method.ReturnType} {method.Identifier}{method.TypeParameterList}{method.ParameterList} {method.ConstraintClauses}",
            _ => member.ToString(),
        });

    private static IEnumerable<string> NamesOf(MemberDeclarationSyntax member) => member switch
    {
        FieldDeclarationSyntax field => field.Declaration.Variables.Select(variable => variable.Identifier.ValueText),
        PropertyDeclarationSyntax property => [property.Identifier.ValueText],
        MethodDeclarationSyntax method => [method.Identifier.ValueText],
        _ => [member.ToString()],
    };
}
