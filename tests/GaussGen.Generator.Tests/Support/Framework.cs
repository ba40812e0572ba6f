using System;
using System.Collections.Immutable;
using System.IO;
using System.Linq;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace GaussGen.Generator.Tests.Support;

/// <summary>A framework that consumers compile against: its reference assemblies, and the library as built for it.</summary>
public sealed class Framework
{
    public const string DefaultAssemblyName = "Boat";

    private static readonly string Folder = Path.Combine(AppContext.BaseDirectory, "References");

    private readonly string _name;

    private Framework(string name, ImmutableArray<MetadataReference> references)
    {
        _name = name;
        References = references;

        // Compilations that begin with this one share what the compiler has read of the references.
        Empty = CSharpCompilation.Create(DefaultAssemblyName, references: references);
        _ = Empty.GetDiagnostics();
    }

    public static Framework Net80 { get; } = new(
        "net8.0",
        Basic.Reference.Assemblies.Net80.References.All.Cast<MetadataReference>().Concat(FilesOf("net8.0")).ToImmutableArray());

    public static Framework NetStandard20 { get; } = new("netstandard2.0", FilesOf("netstandard2.0"));

    public ImmutableArray<MetadataReference> References { get; }

    public CSharpCompilation Empty { get; }

    public override string ToString() => _name;

    private static ImmutableArray<MetadataReference> FilesOf(string name) => Directory
        .GetFiles(Path.Combine(Folder, name), "*.dll")
        .Order(StringComparer.Ordinal)
        .Select(path => (MetadataReference)MetadataReference.CreateFromFile(path))
        .ToImmutableArray();
}
