using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Requests;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>From an attribute on a type to a declaration. Symbols go in and do not come out.</summary>
internal static class DeclarationReader
{
    /// <summary>
    /// Reads the declaration of a family at a type, or returns <c>null</c> where no part can be generated or another attribute
    /// already gives the type the same members.
    /// </summary>
    public static Declaration? Read(
        GeneratorAttributeSyntaxContext site, Family family, ImmutableArray<Family> families, CancellationToken cancellation)
    {
        if (site.TargetSymbol is not INamedTypeSymbol { TypeKind: TypeKind.Class or TypeKind.Struct } type
            || family.FindOn(type) is not { } attribute
            || !IsWrittenAt(attribute, site.TargetNode)
            || TargetType.Of(type) is not { } target)
        {
            return null;
        }

        ImmutableArray<Family> colliding = families.Where(each => family.NameSharedWith(each) is not null && each.FindOn(type) is not null).ToImmutableArray();
        if (colliding[0] != family)
        {
            return null;
        }

        cancellation.ThrowIfCancellationRequested();
        ArgumentReader arguments = new(attribute);
        TableRequest request = family.ReadRequest(arguments);
        bool isSound = !arguments.IsRefusedByCompiler && arguments.Mistakes.Count == 0 && colliding.Length == 1
            && target.Chain.All(header => header.TypeParameters.Length == 0);
        ImmutableArray<TakenName> taken = TakenMember.FindIn(type, family, families, site.SemanticModel.Compilation)
            .Select(member => member.Name)
            .Distinct()
            .OrderBy(name => name)
            .ToImmutableArray();
        return new Declaration(
            target, family.Name, request, family.OwnNames, arguments.OrderAsWritten, isSound, new EquatableArray<TakenName>(taken));
    }

    // The compiler refuses a second attribute of the same family, here or on another part of the type; the first one counts.
    private static bool IsWrittenAt(AttributeData attribute, SyntaxNode part) =>
        attribute.ApplicationSyntaxReference is { } place
        && place.SyntaxTree == part.SyntaxTree
        && part.Span.Contains(place.Span);
}
