using System.Collections.Generic;
using System.Linq;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Testing;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Testing;
using Microsoft.CodeAnalysis.Text;

namespace GaussGen.Generator.Tests.Support;

/// <summary>
/// Compiles sources with the generator and the analyzer, and compares all that compiler and analyzer report with the marks in
/// the sources: {|ID:text|} at the place of each, and nothing else.
/// </summary>
internal sealed class DeclarationTest : CSharpSourceGeneratorTest<TableGenerator, DefaultVerifier>
{
    private readonly LanguageVersion _languageVersion;

    private DeclarationTest(LanguageVersion languageVersion, IEnumerable<string> sources)
    {
        _languageVersion = languageVersion;
        ReferenceAssemblies = new ReferenceAssemblies("none");
        TestState.AdditionalReferences.AddRange(Framework.Net80.References);
        TestBehaviors |= TestBehaviors.SkipGeneratedSourcesCheck;
        CompilerDiagnostics = CompilerDiagnostics.Warnings;
        foreach ((string source, int index) in sources.Select((source, index) => (source, index)))
        {
            TestState.Sources.Add(($"Source{index}.cs", source));
        }
    }

    /// <summary>Checks that the marks are all there is.</summary>
    public static Task Report(params string[] sources) => Report(LanguageVersion.Latest, sources);

    public static Task Report(LanguageVersion languageVersion, params string[] sources) =>
        new DeclarationTest(languageVersion, sources).RunAsync(CancellationToken.None);

    /// <summary>The same beside additional files, which have marks as well.</summary>
    public static Task ReportBeside((string Path, string Text)[] files, params string[] sources)
    {
        DeclarationTest test = new(LanguageVersion.Latest, sources);
        test.TestState.AdditionalFiles.AddRange(files.Select(file => (file.Path, SourceText.From(file.Text, Encoding.UTF8))));
        return test.RunAsync(CancellationToken.None);
    }

    protected override ParseOptions CreateParseOptions() => new CSharpParseOptions(_languageVersion, DocumentationMode.Diagnose);

    protected override CompilationOptions CreateCompilationOptions() =>
        new CSharpCompilationOptions(OutputKind.DynamicallyLinkedLibrary, warningLevel: 9999);

    protected override IEnumerable<DiagnosticAnalyzer> GetDiagnosticAnalyzers() => [new DeclarationAnalyzer()];
}
