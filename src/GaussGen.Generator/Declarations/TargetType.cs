using System.Collections.Generic;
using System.Linq;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace GaussGen.Generator.Declarations;

/// <summary>How one type of the chain from the outermost to the one with the table is opened in a generated file.</summary>
/// <param name="Keywords">Modifiers and kind: "static partial class".</param>
/// <param name="Name">The name, escaped where it is a keyword.</param>
/// <param name="TypeParameters">"&lt;T&gt;", or nothing.</param>
internal sealed record TypeHeader(string Keywords, string Name, string TypeParameters);

/// <summary>The type that is to have a generated part.</summary>
/// <param name="Namespace">Its namespace, escaped; empty for the global one.</param>
/// <param name="Chain">The types that contain it, the outermost first, and itself at the end.</param>
/// <param name="MetadataName">The full name in metadata: "Namespace.Outer+Inner".</param>
internal sealed record TargetType(string Namespace, EquatableArray<TypeHeader> Chain, string MetadataName)
{
    /// <summary>Describes a type, or returns <c>null</c> if no other file can add a part to it.</summary>
    public static TargetType? Of(INamedTypeSymbol type)
    {
        List<INamedTypeSymbol> chain = new();
        for (INamedTypeSymbol? each = type; each is not null; each = each.ContainingType)
        {
            if (!IsPartial(each) || IsFileLocal(each))
            {
                return null;
            }

            chain.Insert(0, each);
        }

        string inside = string.Join("+", chain.Select(each => each.MetadataName));
        string outside = string.Join(".", Namespaces(type).Select(each => each.Name));
        return new TargetType(
            string.Join(".", Namespaces(type).Select(each => Identifier.Escape(each.Name))),
            new EquatableArray<TypeHeader>(chain.Select(HeaderOf)),
            outside.Length == 0 ? inside : outside + "." + inside);
    }

    public static bool IsPartial(INamedTypeSymbol type) =>
        Declarations(type).Any(declaration => declaration.Modifiers.Any(SyntaxKind.PartialKeyword));

    // By its text: the compiler that this is built against knows no 'file' types, the one that it runs in may.
    public static bool IsFileLocal(INamedTypeSymbol type) =>
        Declarations(type).Any(declaration => declaration.Modifiers.Any(modifier => modifier.ValueText == "file"));

    public static IEnumerable<TypeDeclarationSyntax> Declarations(INamedTypeSymbol type) =>
        type.DeclaringSyntaxReferences.Select(reference => reference.GetSyntax()).OfType<TypeDeclarationSyntax>();

    private static Stack<INamespaceSymbol> Namespaces(INamedTypeSymbol type)
    {
        Stack<INamespaceSymbol> outermostFirst = new();
        for (INamespaceSymbol each = type.ContainingNamespace; !each.IsGlobalNamespace; each = each.ContainingNamespace)
        {
            outermostFirst.Push(each);
        }

        return outermostFirst;
    }

    private static TypeHeader HeaderOf(INamedTypeSymbol type)
    {
        string kind = type.TypeKind switch
        {
            TypeKind.Interface => "interface",
            TypeKind.Struct => type.IsRecord ? "record struct" : "struct",
            _ => type.IsRecord ? "record" : "class",
        };
        string parameters = string.Join(", ", type.TypeParameters.Select(parameter => Identifier.Escape(parameter.Name)));
        return new TypeHeader(
            (type.IsStatic ? "static partial " : "partial ") + kind,
            Identifier.Escape(type.Name),
            parameters.Length == 0 ? string.Empty : "<" + parameters + ">");
    }
}
