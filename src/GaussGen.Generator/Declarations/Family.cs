using System;
using System.Collections.Generic;
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

    /// <summary>Lists of numbers under names that are the family's own.</summary>
    Sequences,
}

/// <summary>A family of tables: the attribute that asks for one, and how its arguments become a request.</summary>
internal sealed class Family
{
    private const string AttributeNamespace = "GaussGen";

    private readonly string _attributeTypeName;

    private Family(
        string name, TableShape shape, string sizeArgument, IEnumerable<string> ownNames, Func<ArgumentReader, TableRequest> readRequest)
    {
        Name = name;
        Shape = shape;
        SizeArgument = sizeArgument;
        OwnNames = new EquatableArray<string>(ownNames);
        ReadRequest = readRequest;
        _attributeTypeName = name + "Attribute";
    }

    /// <summary>The name as it stands between the brackets of an attribute.</summary>
    public string Name { get; }

    public TableShape Shape { get; }

    /// <summary>The argument that says how large a table is: what to change where a large one cannot be made.</summary>
    public string SizeArgument { get; }

    /// <summary>
    /// The members that no other family of the shape need have: constants of a rule, and the lists of a family of sequences.
    /// </summary>
    public EquatableArray<string> OwnNames { get; }

    /// <summary>
    /// Makes the request. Arguments out of range are noted by the reader and replaced by the nearest that are allowed, so that
    /// a request comes out of every attribute.
    /// </summary>
    public Func<ArgumentReader, TableRequest> ReadRequest { get; }

    /// <summary>The attribute's full name in metadata.</summary>
    public string AttributeName => AttributeNamespace + "." + _attributeTypeName;

    public static Family OfRules(
        string name,
        Func<ArgumentReader, RuleRequest> readRequest,
        string sizeArgument = ArgumentReader.PointsArgument,
        params string[] constants) =>
        new(name, TableShape.Rule, sizeArgument, constants, read => readRequest(read) with { ErrorEstimate = read.ErrorEstimate() });

    public static Family OfMoments(string name, Func<ArgumentReader, MomentRequest> readRequest) =>
        new(name, TableShape.Moments, ArgumentReader.MaximumOrderArgument, Array.Empty<string>(), readRequest);

    public static Family OfSequences(
        string name, Func<ArgumentReader, SequenceRequest> readRequest, string sizeArgument, params string[] lists) =>
        new(name, TableShape.Sequences, sizeArgument, lists, readRequest);

    /// <summary>A name that members of tables of both families have, so that no type can have both; <c>null</c> if there is none.</summary>
    public string? NameSharedWith(Family other) => Shape != other.Shape ? null : Shape switch
    {
        TableShape.Rule => "Nodes",
        TableShape.Moments => "Raw",
        _ => OwnNames.Intersect(other.OwnNames).FirstOrDefault(),
    };

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
