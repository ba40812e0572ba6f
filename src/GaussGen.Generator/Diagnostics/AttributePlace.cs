using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace GaussGen.Generator.Diagnostics;

/// <summary>Where an attribute, or one of its arguments, stands in the source.</summary>
internal static class AttributePlace
{
    public static Location Of(AttributeData attribute, CancellationToken cancellation) =>
        attribute.ApplicationSyntaxReference?.GetSyntax(cancellation).GetLocation() ?? Location.None;

    /// <summary>The value that is given for a parameter or property; the whole attribute if none is.</summary>
    public static Location Of(AttributeData attribute, string argument, CancellationToken cancellation)
    {
        if (attribute.ApplicationSyntaxReference?.GetSyntax(cancellation) is AttributeSyntax { ArgumentList.Arguments: var arguments })
        {
            for (int i = 0; i < arguments.Count; i++)
            {
                if (NameOf(arguments[i], i, attribute) == argument)
                {
                    return arguments[i].Expression.GetLocation();
                }
            }
        }

        return Of(attribute, cancellation);
    }

    /// <summary>What is at fault in an argument; where that is not written out, the whole argument.</summary>
    public static Location Of(AttributeData attribute, Mistake mistake, CancellationToken cancellation)
    {
        if (mistake.Element is { } element
            && attribute.ApplicationSyntaxReference?.GetSyntax(cancellation) is AttributeSyntax { ArgumentList.Arguments: var arguments }
            && ElementOf(arguments, mistake.Argument, element, attribute) is { } place)
        {
            return place.GetLocation();
        }

        return Of(attribute, mistake.Argument, cancellation);
    }

    /// <summary>The part of a type that an attribute stands on, or one of the types around it.</summary>
    /// <param name="attribute">The attribute.</param>
    /// <param name="depth">How many types further out.</param>
    /// <param name="cancellation">Passed on.</param>
    public static TypeDeclarationSyntax? PartAround(AttributeData attribute, int depth, CancellationToken cancellation) =>
        attribute.ApplicationSyntaxReference?.GetSyntax(cancellation)
            .Ancestors()
            .OfType<TypeDeclarationSyntax>()
            .ElementAtOrDefault(depth);

    /// <summary>One value of a list: of an array that is written out, or among the last arguments.</summary>
    private static ExpressionSyntax? ElementOf(
        SeparatedSyntaxList<AttributeArgumentSyntax> arguments, string name, int element, AttributeData attribute)
    {
        for (int i = 0; i < arguments.Count; i++)
        {
            if (NameOf(arguments[i], i, attribute) != name)
            {
                continue;
            }

            InitializerExpressionSyntax? values = arguments[i].Expression switch
            {
                ArrayCreationExpressionSyntax array => array.Initializer,
                ImplicitArrayCreationExpressionSyntax array => array.Initializer,
                _ => null,
            };
            return values is not null ? values.Expressions.ElementAtOrDefault(element)
                : arguments[i].NameColon is null ? arguments.ElementAtOrDefault(i + element)?.Expression
                : null;
        }

        return null;
    }

    private static string? NameOf(AttributeArgumentSyntax argument, int position, AttributeData attribute)
    {
        if ((argument.NameEquals?.Name ?? argument.NameColon?.Name) is { } name)
        {
            return name.Identifier.ValueText;
        }

        return attribute.AttributeConstructor is { } constructor && position < constructor.Parameters.Length
            ? constructor.Parameters[position].Name
            : null;
    }
}
