extern alias generator;

using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.IO;
using System.Linq;
using System.Reflection;
using Basic.Reference.Assemblies;
using generator::GaussGen.Generator;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Emit;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>The frameworks that fixtures are compiled for; compilers keep constants in other ways for each.</summary>
public enum Framework
{
    Net8,
    NetStandard2,
}

/// <summary>Compiles fixtures with the real compiler, in memory: by hand, or with the real generator.</summary>
internal static class FixtureCompiler
{
    private static readonly CSharpParseOptions Language = new(LanguageVersion.Latest);

    private static readonly ConcurrentDictionary<(Framework, string), MetadataReference> Libraries = new();

    private static readonly Lazy<ImmutableArray<MetadataReference>> NetStandard = new(() => [Embedded("netstandard.dll"), Embedded("System.Memory.dll")]);

    private static readonly Lazy<string[]> LibrarySources = new(() =>
    [
        .. typeof(FixtureCompiler).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith("library/", StringComparison.Ordinal))
            .Order(StringComparer.Ordinal)
            .Select(name =>
            {
                using StreamReader reader = new(typeof(FixtureCompiler).Assembly.GetManifestResourceStream(name)!);
                return reader.ReadToEnd();
            }),
    ]);

    /// <summary>Compiles source text that uses GaussGen's attributes; a failure to compile fails the test.</summary>
    public static byte[] Compile(
        string source,
        Framework framework = Framework.Net8,
        OptimizationLevel optimization = OptimizationLevel.Release,
        string name = "Boat") =>
        Emit(CreateCompilation(framework, optimization, name, [source], [OwnLibrary(framework)]));

    /// <summary>Compiles source text with the generator at work, as a consumer's build does.</summary>
    public static byte[] Generate(string source, Framework framework = Framework.Net8, OptimizationLevel optimization = OptimizationLevel.Release) =>
        Emit(RunGenerator(CreateCompilation(framework, optimization, "Boat", [source], [OwnLibrary(framework)])));

    /// <summary>Generates from one text and then puts another in a declaration's place, so that it no longer says what was made.</summary>
    public static byte[] GenerateAs(string source, string made, string claimed)
    {
        CSharpCompilation compilation = CreateCompilation(Framework.Net8, OptimizationLevel.Release, "Boat", [source], [OwnLibrary(Framework.Net8)]);
        SyntaxTree changed = CSharpSyntaxTree.ParseText(source.Replace(made, claimed, StringComparison.Ordinal), Language);
        return Emit(RunGenerator(compilation).ReplaceSyntaxTree(compilation.SyntaxTrees[0], changed));
    }

    /// <summary>Compiles a fixture against another library than GaussGen's own.</summary>
    public static byte[] CompileAgainst(string librarySource, string libraryName, string source) =>
        Emit(CreateCompilation(
            Framework.Net8, OptimizationLevel.Release, "Boat", [source], [Library(Framework.Net8, libraryName, [librarySource])]));

    public static CSharpCompilation CreateCompilation(
        Framework framework,
        OptimizationLevel optimization,
        string name,
        IEnumerable<string> sources,
        IEnumerable<MetadataReference> libraries) =>
        CSharpCompilation.Create(
            name,
            sources.Select(source => CSharpSyntaxTree.ParseText(source, Language)),
            [.. framework == Framework.Net8 ? Net80.References.All.CastArray<MetadataReference>() : NetStandard.Value, .. libraries],
            new CSharpCompilationOptions(
                OutputKind.DynamicallyLinkedLibrary, optimizationLevel: optimization, allowUnsafe: true, deterministic: true));

    public static byte[] Emit(Compilation compilation, EmitOptions? options = null)
    {
        using MemoryStream image = new();
        EmitResult result = compilation.Emit(image, options: options);
        return result.Success ? image.ToArray() : throw new InvalidOperationException(string.Join('\n', result.Diagnostics));
    }

    /// <summary>The runtime library as an image that can be loaded.</summary>
    public static byte[] OwnLibraryImage() => Emit(CreateCompilation(Framework.Net8, OptimizationLevel.Release, "GaussGen", LibrarySources.Value, []));

    /// <summary>The runtime library, compiled for the framework from its own sources.</summary>
    public static MetadataReference OwnLibrary(Framework framework) => Library(framework, "GaussGen", LibrarySources.Value);

    private static Compilation RunGenerator(CSharpCompilation compilation)
    {
        _ = CSharpGeneratorDriver.Create([new TableGenerator().AsSourceGenerator()], parseOptions: Language)
            .RunGeneratorsAndUpdateCompilation(compilation, out Compilation output, out ImmutableArray<Diagnostic> diagnostics);
        return diagnostics.IsEmpty ? output : throw new InvalidOperationException(string.Join('\n', diagnostics));
    }

    private static MetadataReference Library(Framework framework, string name, IReadOnlyList<string> sources) =>
        Libraries.GetOrAdd((framework, name + string.Concat(sources)), _ => MetadataReference.CreateFromImage(
            Emit(CreateCompilation(framework, OptimizationLevel.Release, name, sources, []))));

    private static PortableExecutableReference Embedded(string name)
    {
        using Stream stream = Assembly.GetExecutingAssembly().GetManifestResourceStream(name)!;
        return MetadataReference.CreateFromStream(stream);
    }
}
