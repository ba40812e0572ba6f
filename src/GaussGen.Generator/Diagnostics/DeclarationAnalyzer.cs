using System;
using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Emission;
using GaussGen.Mathematics.Baselines;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace GaussGen.Generator.Diagnostics;

/// <summary>
/// Tells what is wrong with the declarations of tables, each mistake once, at the place where it is to be mended; and which tables
/// are not as a baseline has them.
/// </summary>
[DiagnosticAnalyzer(LanguageNames.CSharp)]
public sealed class DeclarationAnalyzer : DiagnosticAnalyzer
{
    // The host remembers what was read of a text for as long as the text is the same.
    private static readonly SourceTextValueProvider<BaselineText> BaselineReader =
        new(text => BaselineText.Parse(text.ToString().Split('\n')));

    private readonly ImmutableArray<Family> _families;

    /// <summary>An analyzer for every family in the declaration table.</summary>
    public DeclarationAnalyzer()
        : this(DeclarationTable.Families)
    {
    }

    internal DeclarationAnalyzer(ImmutableArray<Family> families) => _families = families;

    /// <inheritdoc/>
    public override ImmutableArray<DiagnosticDescriptor> SupportedDiagnostics => DiagnosticDescriptors.All;

    /// <inheritdoc/>
    public override void Initialize(AnalysisContext context)
    {
        context.ConfigureGeneratedCodeAnalysis(GeneratedCodeAnalysisFlags.None);
        context.EnableConcurrentExecution();
        context.RegisterCompilationStartAction(Start);
    }

    private void Start(CompilationStartAnalysisContext context)
    {
        if (_families.All(family => context.Compilation.GetTypesByMetadataName(family.AttributeName).IsEmpty))
        {
            return;
        }

        TargetCapabilities target = TargetCapabilities.Of(context.Compilation, context.CancellationToken);
        if (target.HasLanguage)
        {
            BaselineSet baselines = BaselineSet.Of(
                context.Options.AdditionalFiles,
                text => context.TryGetValue(text, BaselineReader, out BaselineText? content) ? content : null,
                context.CancellationToken);
            context.RegisterSymbolAction(symbol => CheckType(symbol, target, baselines), SymbolKind.NamedType);
            context.RegisterAdditionalFileAction(baselines.ReportFlaw);
            return;
        }

        Lazy<INamedTypeSymbol?> first = new(() => LanguageCheck.FirstDeclared(context.Compilation, _families), LazyThreadSafetyMode.PublicationOnly);
        context.RegisterSymbolAction(symbol => LanguageCheck.Report(symbol, first, _families), SymbolKind.NamedType);
    }

    private void CheckType(SymbolAnalysisContext context, TargetCapabilities target, BaselineSet baselines)
    {
        INamedTypeSymbol type = (INamedTypeSymbol)context.Symbol;
        HostCheck.Report(context, type, _families);
        if (type.TypeKind is TypeKind.Class or TypeKind.Struct)
        {
            TableCheck.Report(context, type, _families, target, baselines);
        }
    }
}
