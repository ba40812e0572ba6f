using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using GaussGen.Generator.Declarations;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;

namespace GaussGen.Generator.Diagnostics;

/// <summary>
/// Whether the project's language version is one that tables can be written in. That is one mistake, however many declarations
/// there are: it is told at the first of them.
/// </summary>
internal static class LanguageCheck
{
    public static void Report(SymbolAnalysisContext context, Lazy<INamedTypeSymbol?> first, ImmutableArray<Family> families)
    {
        if (SymbolEqualityComparer.Default.Equals(context.Symbol, first.Value) && families.FirstOn(first.Value!) is { } declared)
        {
            string version = ((CSharpCompilation)context.Compilation).LanguageVersion.ToDisplayString();
            context.ReportDiagnostic(Diagnostic.Create(
                DiagnosticDescriptors.LanguageVersion,
                AttributePlace.Of(declared.Attribute, context.CancellationToken),
                version,
                declared.Family.Name));
        }
    }

    /// <summary>The type in the compilation whose attribute stands first, by file name and position.</summary>
    public static INamedTypeSymbol? FirstDeclared(Compilation compilation, ImmutableArray<Family> families) =>
        TypesIn(compilation.Assembly.GlobalNamespace)
            .Select(type => (Type: type, Declared: families.FirstOn(type)))
            .Where(each => each.Declared is not null)
            .OrderBy(each => SourceOrder.Of(each.Declared!.Value.Attribute))
            .Select(each => each.Type)
            .FirstOrDefault();

    private static IEnumerable<INamedTypeSymbol> TypesIn(INamespaceOrTypeSymbol container) => container.GetMembers()
        .OfType<INamespaceOrTypeSymbol>()
        .SelectMany(member => member is INamedTypeSymbol type ? TypesIn(type).Prepend(type) : TypesIn(member));
}
