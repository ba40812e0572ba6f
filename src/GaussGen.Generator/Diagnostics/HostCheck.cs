using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using GaussGen.Generator.Declarations;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace GaussGen.Generator.Diagnostics;

/// <summary>
/// Whether another file can add a part to a type that carries a table, and to each type that contains one. A type is asked
/// once, however many tables are inside it.
/// </summary>
internal static class HostCheck
{
    public static void Report(SymbolAnalysisContext context, INamedTypeSymbol type, ImmutableArray<Family> families)
    {
        TableInside? first = TablesIn(type, families, 0).OrderBy(table => SourceOrder.Of(table.Declared.Attribute)).FirstOrDefault();
        if (first is null || AttributePlace.PartAround(first.Declared.Attribute, first.Depth, context.CancellationToken) is not { } part)
        {
            return;
        }

        if (!TargetType.IsPartial(type))
        {
            Report(DiagnosticDescriptors.NotPartial, part.Identifier.GetLocation());
        }

        if (part.TypeParameterList is { } parameters)
        {
            Report(DiagnosticDescriptors.Generic, parameters.GetLocation());
        }

        if (TargetType.IsFileLocal(type))
        {
            Report(DiagnosticDescriptors.FileLocal, part.Identifier.GetLocation());
        }

        void Report(DiagnosticDescriptor rule, Location place) => context.ReportDiagnostic(
            Diagnostic.Create(rule, place, DisplayName.Of(type), first.Declared.Family.Name, DisplayName.Of(first.Type)));
    }

    private static IEnumerable<TableInside> TablesIn(INamedTypeSymbol type, ImmutableArray<Family> families, int depth) => families
        .AllOn(type)
        .Select(declared => new TableInside(type, declared, depth))
        .Concat(type.GetTypeMembers().SelectMany(member => TablesIn(member, families, depth + 1)));

    /// <summary>A table on a type or inside it.</summary>
    /// <param name="Type">What carries it.</param>
    /// <param name="Declared">Which it is.</param>
    /// <param name="Depth">How deep inside.</param>
    private sealed record TableInside(INamedTypeSymbol Type, DeclaredFamily Declared, int Depth);
}
