using System.Collections.Generic;
using System.Collections.Immutable;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>A family and its attribute on some type.</summary>
internal readonly record struct DeclaredFamily(Family Family, AttributeData Attribute);

/// <summary>Which families a type carries.</summary>
internal static class DeclaredFamilies
{
    public static IEnumerable<DeclaredFamily> AllOn(this ImmutableArray<Family> families, INamedTypeSymbol type)
    {
        foreach (Family family in families)
        {
            if (family.FindOn(type) is { } attribute)
            {
                yield return new DeclaredFamily(family, attribute);
            }
        }
    }

    /// <summary>The first by the order of the families, or <c>null</c> if there is none.</summary>
    public static DeclaredFamily? FirstOn(this ImmutableArray<Family> families, INamedTypeSymbol type)
    {
        foreach (DeclaredFamily declared in families.AllOn(type))
        {
            return declared;
        }

        return null;
    }
}
