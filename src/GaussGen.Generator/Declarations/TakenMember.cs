using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Text.RegularExpressions;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>A name that a type already uses, and what uses it.</summary>
/// <param name="Name">The name.</param>
/// <param name="Holder">A member of the type, a member of a base type, or the type itself.</param>
internal readonly record struct TakenMember(TakenName Name, ISymbol Holder)
{
    private const string Getter = "get_";

    private const string ArrayPrefix = "GaussGen";

    /// <summary>
    /// The names that generated members of a shape can have beside the family's own; all that is asked for here is that none is missing.
    /// </summary>
    private static readonly ImmutableDictionary<TableShape, Regex> GeneratedNames = ImmutableDictionary<TableShape, Regex>.Empty
        .Add(TableShape.Rule, new Regex(
            "^(PointCount|DegreeOfExactness|Expectation|ExpectationWithError|Integral|(GaussGen)?(Companion)?(Nodes|Weights))$",
            RegexOptions.CultureInvariant))
        .Add(TableShape.Moments, new Regex("^(GaussGen)?(Raw|Central|Absolute)[0-9]*$", RegexOptions.CultureInvariant));

    /// <summary>Whether a generated member of a family might have a name.</summary>
    public static bool MightBeGenerated(Family family, string name) =>
        (GeneratedNames.TryGetValue(family.Shape, out Regex? pattern) && pattern.IsMatch(name))
        || family.OwnNames.Any(own => name == own || name == ArrayPrefix + own);

    /// <summary>
    /// The names in use that generated members of a family might have: the type's own name, its other members, and members that it
    /// inherits, which the generated ones would hide.
    /// </summary>
    public static IEnumerable<TakenMember> FindIn(
        INamedTypeSymbol type, Family family, ImmutableArray<Family> families, Compilation compilation)
    {
        if (MightBeGenerated(family, type.Name))
        {
            yield return new TakenMember(new TakenName(type.Name, null), type);
        }

        foreach (TakenMember own in MembersOf(type, family)
            .GroupBy(own => own.Holder.DeclaringSyntaxReferences.FirstOrDefault()?.SyntaxTree)
            .Where(file => !IsGenerated(file.First().Holder))
            .SelectMany(file => file))
        {
            yield return own;
        }

        for (INamedTypeSymbol? ancestor = type.BaseType; ancestor is not null; ancestor = ancestor.BaseType)
        {
            foreach (TakenMember inherited in MembersOf(ancestor, family))
            {
                if (compilation.IsSymbolAccessibleWithin(inherited.Holder, type))
                {
                    yield return inherited;
                }
            }

            // While the generator runs, what it writes for the ancestor is not there yet.
            foreach (Family other in families)
            {
                if (family.NameSharedWith(other) is { } shared && other.FindOn(ancestor) is not null)
                {
                    yield return new TakenMember(new TakenName(shared, null), ancestor);
                    break;
                }
            }
        }
    }

    private static IEnumerable<TakenMember> MembersOf(INamedTypeSymbol type, Family family)
    {
        foreach (ISymbol member in type.GetMembers())
        {
            if (MightBeGenerated(family, member.Name))
            {
                string? signature = member is IMethodSymbol method ? MethodSignature.Of(method) : null;
                yield return new TakenMember(new TakenName(member.Name, signature), member);
            }
            else if (member is IMethodSymbol { MethodKind: MethodKind.Ordinary } accessor
                && accessor.Name.StartsWith(Getter, System.StringComparison.Ordinal)
                && MightBeGenerated(family, accessor.Name.Substring(Getter.Length)))
            {
                yield return new TakenMember(new TakenName(accessor.Name.Substring(Getter.Length), null), accessor);
            }
        }
    }

    /// <summary>Whether a member is one of those that are generated here; they are in files of their own.</summary>
    private static bool IsGenerated(ISymbol member) => member.GetAttributes().Any(attribute =>
        attribute.AttributeClass?.Name == "GeneratedCodeAttribute"
        && attribute.ConstructorArguments.Length > 0
        && attribute.ConstructorArguments[0].Value as string == GeneratorIdentity.Name);
}
