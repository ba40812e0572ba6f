using System;
using System.Collections.Immutable;
using System.Linq;
using GaussGen.Mathematics.Requests;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>What a table looks like to the code that uses it.</summary>
internal enum TableShape
{
    /// <summary>Nodes, weights and expectations.</summary>
    Rule,

    /// <summary>Raw, central and absolute moments by order.</summary>
    Moments,
}

/// <summary>A family of tables: the attribute that asks for one, and how its arguments become a request.</summary>
internal sealed class Family
{
    private const string AttributeNamespace = "GaussGen";

    private readonly string _attributeTypeName;

    private Family(string name, TableShape shape, Func<ArgumentReader, TableRequest> readRequest)
    {
        Name = name;
        Shape = shape;
        ReadRequest = readRequest;
        _attributeTypeName = name + "Attribute";
    }

    /// <summary>The name as it stands between the brackets of an attribute.</summary>
    public string Name { get; }

    public TableShape Shape { get; }

    /// <summary>
    /// Makes the request. Arguments out of range are noted by the reader and replaced by the nearest that are allowed, so that
    /// a request comes out of every attribute.
    /// </summary>
    public Func<ArgumentReader, TableRequest> ReadRequest { get; }

    /// <summary>The attribute's full name in metadata.</summary>
    public string AttributeName => AttributeNamespace + "." + _attributeTypeName;

    public static Family OfRules(string name, Func<ArgumentReader, RuleRequest> readRequest) =>
        new(name, TableShape.Rule, readRequest);

    public static Family OfMoments(string name, Func<ArgumentReader, MomentRequest> readRequest) =>
        new(name, TableShape.Moments, readRequest);

    /// <summary>The attribute of this family on a type, or <c>null</c>; the first in the source, if there are more.</summary>
    public AttributeData? FindOn(INamedTypeSymbol type)
    {
        ImmutableArray<AttributeData> attributes = type.GetAttributes();
        return attributes.Where(IsDeclaration).OrderBy(SourceOrder.Of).FirstOrDefault();
    }

    // Compared by name: where an assembly is seen twice, through a friend say, there is more than one symbol for the attribute.
    private bool IsDeclaration(AttributeData attribute) =>
        attribute.AttributeClass is { } type
        && type.Name == _attributeTypeName
        && type.ContainingType is null
        && type.ContainingNamespace is { Name: AttributeNamespace, ContainingNamespace.IsGlobalNamespace: true };
}
