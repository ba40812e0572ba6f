using System;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>A place in the source that orders by file name and position, whatever the order in which files are compiled.</summary>
internal readonly record struct SourceOrder(string Path, int Position) : IComparable<SourceOrder>
{
    public static SourceOrder Of(AttributeData attribute) => attribute.ApplicationSyntaxReference is { } reference
        ? new SourceOrder(reference.SyntaxTree.FilePath, reference.Span.Start)
        : new SourceOrder(string.Empty, 0);

    public static SourceOrder Of(Location place) => new(place.SourceTree?.FilePath ?? string.Empty, place.SourceSpan.Start);

    public int CompareTo(SourceOrder other)
    {
        int byPath = string.CompareOrdinal(Path, other.Path);
        return byPath != 0 ? byPath : Position.CompareTo(other.Position);
    }
}
