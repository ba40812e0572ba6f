using System;
using System.Collections.Immutable;
using System.Text;
using System.Threading;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Diagnostics;
using GaussGen.Generator.Emission;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Text;

namespace GaussGen.Generator;

/// <summary>
/// Writes the other part of every type that carries a table attribute. It is silent: what is wrong with a declaration is told
/// by <see cref="DeclarationAnalyzer"/>, and the part is then a stand-in that compiles.
/// </summary>
[Generator(LanguageNames.CSharp)]
public sealed class TableGenerator : IIncrementalGenerator
{
    // Without a byte order mark, as editors and version control like it.
    private static readonly Encoding FileEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);

    private readonly ImmutableArray<Family> _families;

    /// <summary>A generator for every family in the declaration table.</summary>
    public TableGenerator()
        : this(DeclarationTable.Families)
    {
    }

    internal TableGenerator(ImmutableArray<Family> families) => _families = families;

    /// <inheritdoc/>
    public void Initialize(IncrementalGeneratorInitializationContext context)
    {
        IncrementalValueProvider<TargetCapabilities> target = context.CompilationProvider
            .Select(TargetCapabilities.Of)
            .WithTrackingName(TrackingNames.Target);

        foreach (Family family in _families)
        {
            IncrementalValuesProvider<Declaration> declarations = context.SyntaxProvider
                .ForAttributeWithMetadataName(family.AttributeName, CanCarryTable, ReadDeclaration(family))
                .Where(static declaration => declaration is not null)
                .Select(static (declaration, _) => declaration!)
                .WithTrackingName(TrackingNames.Declarations);

            IncrementalValueProvider<EquatableArray<string>> caseTwins = declarations
                .Select(static (declaration, _) => HintName.Plain(declaration))
                .Collect()
                .Select(HintName.CaseTwins)
                .WithTrackingName(TrackingNames.CaseTwins);

            IncrementalValuesProvider<GeneratedFile> files = declarations
                .Combine(target)
                .Combine(caseTwins)
                .Select(static (step, cancellation) => Write(step.Left.Left, step.Left.Right, step.Right, cancellation))
                .WithTrackingName(TrackingNames.Files);

            context.RegisterSourceOutput(files, AddToCompilation);
        }
    }

    private static bool CanCarryTable(SyntaxNode node, CancellationToken cancellation) => node is TypeDeclarationSyntax;

    private Func<GeneratorAttributeSyntaxContext, CancellationToken, Declaration?> ReadDeclaration(Family family) =>
        (site, cancellation) => DeclarationReader.Read(site, family, _families, cancellation);

    private static GeneratedFile Write(
        Declaration declaration, TargetCapabilities target, EquatableArray<string> caseTwins, CancellationToken cancellation) =>
        new(HintName.Of(declaration, caseTwins), FilePrinter.Print(declaration, target, cancellation));

    private static void AddToCompilation(SourceProductionContext context, GeneratedFile file) =>
        context.AddSource(file.HintName, SourceText.From(file.Text, FileEncoding));
}
