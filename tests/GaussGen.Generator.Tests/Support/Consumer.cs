using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.IO;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Text;

namespace GaussGen.Generator.Tests.Support;

/// <summary>A project that uses the generator: its sources and its settings. Warnings are errors.</summary>
public sealed record Consumer(params string[] Sources)
{
    public Framework Framework { get; init; } = Framework.Net80;

    public LanguageVersion LanguageVersion { get; init; } = LanguageVersion.Latest;

    public NullableContextOptions Nullable { get; init; } = NullableContextOptions.Enable;

    public bool AllowUnsafe { get; init; }

    public string AssemblyName { get; init; } = Framework.DefaultAssemblyName;

    public ImmutableArray<MetadataReference> OtherReferences { get; init; } = [];

    /// <summary>Diagnose is what a project gets that writes a documentation file.</summary>
    public DocumentationMode Documentation { get; init; } = DocumentationMode.Parse;

    public CSharpParseOptions ParseOptions => new(LanguageVersion, Documentation);

    public CSharpCompilation Compile() => Framework.Empty
        .WithAssemblyName(AssemblyName)
        .AddReferences(OtherReferences)
        .WithOptions(new CSharpCompilationOptions(
            OutputKind.DynamicallyLinkedLibrary,
            generalDiagnosticOption: ReportDiagnostic.Error,
            warningLevel: 9999,
            allowUnsafe: AllowUnsafe,
            nullableContextOptions: LanguageVersion.MapSpecifiedToEffectiveVersion() >= LanguageVersion.CSharp8
                ? Nullable
                : NullableContextOptions.Disable))
        .AddSyntaxTrees(Sources.Select((text, index) => Parse(text, $"Source{index}.cs")).ToArray());

    public SyntaxTree Parse(string text, string path) =>
        CSharpSyntaxTree.ParseText(SourceText.From(text, System.Text.Encoding.UTF8), ParseOptions, path);

    /// <summary>Runs the generator.</summary>
    public Outcome Run() => Run(new TableGenerator());

    /// <summary>Runs a generator.</summary>
    public Outcome Run(IIncrementalGenerator generator) => Run(generator, Compile(), ParseOptions);

    /// <summary>Runs a generator on a compilation.</summary>
    public static Outcome Run(IIncrementalGenerator generator, CSharpCompilation compilation, CSharpParseOptions parseOptions)
    {
        GeneratorDriver driver = CSharpGeneratorDriver
            .Create([generator.AsSourceGenerator()], parseOptions: parseOptions)
            .RunGeneratorsAndUpdateCompilation(compilation, out Compilation updated, out ImmutableArray<Diagnostic> diagnostics);
        return new Outcome(driver.GetRunResult(), (CSharpCompilation)updated, diagnostics);
    }
}

/// <summary>What came out of a run of the generator.</summary>
public sealed record Outcome(GeneratorDriverRunResult Result, CSharpCompilation Compilation, ImmutableArray<Diagnostic> GeneratorDiagnostics)
{
    /// <summary>The generated texts by hint name.</summary>
    public ImmutableSortedDictionary<string, string> Texts => Result.Results
        .SelectMany(result => result.GeneratedSources)
        .ToImmutableSortedDictionary(source => source.HintName, source => source.SourceText.ToString(), StringComparer.Ordinal);

    /// <summary>The text of the only generated file.</summary>
    public string Text => Texts.Single().Value;

    /// <summary>Everything that the compiler and the generator report above the level of a hint.</summary>
    public IEnumerable<Diagnostic> CompilerDiagnostics => Compilation.GetDiagnostics()
        .Concat(GeneratorDiagnostics)
        .Where(diagnostic => diagnostic.Severity >= DiagnosticSeverity.Info);

    /// <summary>Everything that the analyzer reports.</summary>
    public Task<ImmutableArray<Diagnostic>> AnalyzerDiagnostics(DiagnosticAnalyzer? analyzer = null) => Compilation
        .WithAnalyzers([analyzer ?? new DeclarationAnalyzer()])
        .GetAnalyzerDiagnosticsAsync(CancellationToken.None);

    /// <summary>Everything that the analyzer reports beside additional files.</summary>
    public Task<ImmutableArray<Diagnostic>> AnalyzerDiagnosticsBeside(params AdditionalText[] files) => Compilation
        .WithAnalyzers([new DeclarationAnalyzer()], new AnalyzerOptions([.. files]))
        .GetAnalyzerDiagnosticsAsync(CancellationToken.None);

    /// <summary>The same; an exception that the analyzer throws is thrown.</summary>
    public async Task<ImmutableArray<Diagnostic>> AnalyzerDiagnosticsOrThrow()
    {
        ConcurrentQueue<Exception> exceptions = new();
        CompilationWithAnalyzersOptions options = new(
            new AnalyzerOptions([]),
            onAnalyzerException: (exception, _, _) => exceptions.Enqueue(exception),
            concurrentAnalysis: true,
            logAnalyzerExecutionTime: false);
        ImmutableArray<Diagnostic> diagnostics = await Compilation
            .WithAnalyzers([new DeclarationAnalyzer()], options)
            .GetAnalyzerDiagnosticsAsync(CancellationToken.None);
        return exceptions.IsEmpty ? diagnostics : throw new AggregateException(exceptions);
    }

    /// <summary>The compiled assembly.</summary>
    public byte[] Emit()
    {
        using MemoryStream stream = new();
        Microsoft.CodeAnalysis.Emit.EmitResult emitted = Compilation.Emit(stream);
        return emitted.Success ? stream.ToArray() : throw new InvalidOperationException(string.Join('\n', emitted.Diagnostics));
    }
}
