using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;
using System.Text;
using System.Xml.Linq;
using Xunit;

namespace GaussGen.Package.Tests;

[Collection(SharedPackage.Name)]
public sealed class PackageContentTests(PackedLibrary package)
{
    private readonly SortedDictionary<string, byte[]> _contents = PackedLibrary.Read(package.PackageFile);

    [Fact]
    public void Holds_these_files_and_no_others()
    {
        string[] expected =
        [
            "GaussGen.nuspec",
            "README.md",
            "analyzers/dotnet/cs/GaussGen.Generator.dll",
            "build/GaussGen.targets",
            "buildTransitive/GaussGen.targets",
            "lib/net10.0/GaussGen.dll",
            "lib/net10.0/GaussGen.xml",
            "lib/net8.0/GaussGen.dll",
            "lib/net8.0/GaussGen.xml",
            "lib/netstandard2.0/GaussGen.dll",
            "lib/netstandard2.0/GaussGen.xml",
        ];
        Assert.Equal(expected, _contents.Keys);
    }

    [Fact]
    public void Symbols_are_there_for_each_library_with_their_sources()
    {
        SortedDictionary<string, byte[]> symbols = PackedLibrary.Read(package.SymbolsFile);
        string[] expected =
            ["GaussGen.nuspec", "lib/net10.0/GaussGen.pdb", "lib/net8.0/GaussGen.pdb", "lib/netstandard2.0/GaussGen.pdb"];
        Assert.Equal(expected, symbols.Keys);
        Assert.All(symbols.Where(entry => entry.Key.EndsWith(".pdb", StringComparison.Ordinal)), entry =>
        {
            using MetadataReaderProvider provider = MetadataReaderProvider.FromPortablePdbStream(new MemoryStream(entry.Value));
            MetadataReader reader = provider.GetMetadataReader();
            string[] documents = [.. reader.Documents.Select(handle => reader.GetString(reader.GetDocument(handle).Name))];
            Assert.Contains("/_/src/GaussGen/Require.cs", documents);
            // A kind of custom debug information that the Portable PDB specification assigns to embedded sources.
            Guid embeddedSource = new("0E8A571B-6926-466E-B4AD-8AB04611F5FE");
            int embedded = reader.CustomDebugInformation.Count(handle =>
                reader.GetGuid(reader.GetCustomDebugInformation(handle).Kind) == embeddedSource);
            Assert.Equal(documents.Length, embedded);
        });
    }

    [Fact]
    public void Metadata_say_whose_it_is_and_what_it_does()
    {
        XElement metadata = Metadata();
        string Value(string name) => metadata.Element(metadata.Name.Namespace + name)?.Value ?? "";
        Assert.Equal("GaussGen", Value("id"));
        Assert.Equal(package.Version, Value("version"));
        Assert.Equal("The GaussGen authors", Value("authors"));
        Assert.Equal("MIT", Value("license"));
        Assert.Equal("README.md", Value("readme"));
        Assert.NotEmpty(Value("description"));
        Assert.NotEmpty(Value("tags"));
    }

    [Fact]
    public void Depends_on_nothing_but_System_Memory_and_on_that_only_for_netstandard()
    {
        XElement metadata = Metadata();
        XNamespace space = metadata.Name.Namespace;
        IEnumerable<XElement> groups = metadata.Element(space + "dependencies")!.Elements(space + "group");
        Dictionary<string, string> dependencies = groups.ToDictionary(
            group => group.Attribute("targetFramework")!.Value,
            group => string.Join(' ', group.Elements(space + "dependency").Select(one => one.Attribute("id")!.Value)));
        Assert.Equal(3, dependencies.Count);
        Assert.Equal("", dependencies["net10.0"]);
        Assert.Equal("", dependencies["net8.0"]);
        Assert.Equal("System.Memory", dependencies[".NETStandard2.0"]);
    }

    [Fact]
    public void The_analyzer_refers_only_to_what_every_compiler_host_has()
    {
        // Roslyn 4.3 is the oldest host, and brings these with it.
        string[] expected =
        [
            "Microsoft.CodeAnalysis 4.3.0.0",
            "Microsoft.CodeAnalysis.CSharp 4.3.0.0",
            "System.Collections.Immutable 6.0.0.0",
            "netstandard 2.0.0.0",
        ];
        Assert.Equal(expected, ReferencesOf("analyzers/dotnet/cs/GaussGen.Generator.dll").Order(StringComparer.Ordinal));
    }

    [Theory]
    [InlineData("net8.0")]
    [InlineData("net10.0")]
    [InlineData("netstandard2.0")]
    public void The_library_refers_only_to_its_framework(string framework)
    {
        Assert.DoesNotContain(ReferencesOf($"lib/{framework}/GaussGen.dll"), reference =>
            !reference.StartsWith("System.", StringComparison.Ordinal)
            && !reference.StartsWith("netstandard ", StringComparison.Ordinal));
    }

    [Fact]
    public void The_readme_is_the_repositorys()
    {
        Assert.Equal(File.ReadAllBytes(Path.Combine(Sources.Root, "README.md")), _contents["README.md"]);
    }

    [Theory]
    [InlineData("net8.0")]
    [InlineData("net10.0")]
    [InlineData("netstandard2.0")]
    public void Every_public_type_is_documented(string framework)
    {
        XDocument documentation = Xml($"lib/{framework}/GaussGen.xml");
        HashSet<string> documented = [.. documentation.Descendants("member")
            .Where(member => !string.IsNullOrWhiteSpace(member.Element("summary")?.Value))
            .Select(member => member.Attribute("name")!.Value)];
        string[] types = [.. PublicTypesOf($"lib/{framework}/GaussGen.dll")];
        Assert.Contains("GaussGen.GaussHermiteAttribute", types);
        Assert.All(types, type => Assert.Contains($"T:{type}", documented));
    }

    [Fact]
    public void No_file_names_a_folder_of_the_machine_it_was_built_on()
    {
        string temporary = Path.TrimEndingDirectorySeparator(Path.GetTempPath());
        Assert.All(_contents.Concat(PackedLibrary.Read(package.SymbolsFile)), entry =>
        {
            Assert.False(entry.Value.AsSpan().IndexOf(Encoding.UTF8.GetBytes(temporary)) >= 0, entry.Key);
            Assert.False(entry.Value.AsSpan().IndexOf(Encoding.Unicode.GetBytes(temporary)) >= 0, entry.Key);
        });
    }

    [Fact]
    public void Another_packing_in_another_folder_gives_the_same_bytes()
    {
        string feed = package.Pack("packed-again");
        AssertSameContents(_contents, PackedLibrary.Read(Path.Combine(feed, Path.GetFileName(package.PackageFile))));
        AssertSameContents(
            PackedLibrary.Read(package.SymbolsFile),
            PackedLibrary.Read(Path.Combine(feed, Path.GetFileName(package.SymbolsFile))));
    }

    private static void AssertSameContents(SortedDictionary<string, byte[]> first, SortedDictionary<string, byte[]> second)
    {
        Assert.Equal(first.Keys, second.Keys);
        Assert.DoesNotContain(first.Keys, path => !first[path].AsSpan().SequenceEqual(second[path]));
    }

    private XElement Metadata()
    {
        XElement root = Xml("GaussGen.nuspec").Root!;
        return root.Element(root.Name.Namespace + "metadata")!;
    }

    private XDocument Xml(string path) => XDocument.Load(new MemoryStream(_contents[path]));

    private string[] ReferencesOf(string path)
    {
        using PEReader file = new(new MemoryStream(_contents[path]));
        MetadataReader reader = file.GetMetadataReader();
        return [.. reader.AssemblyReferences.Select(reader.GetAssemblyReference)
            .Select(reference => $"{reader.GetString(reference.Name)} {reference.Version}")];
    }

    private string[] PublicTypesOf(string path)
    {
        using PEReader file = new(new MemoryStream(_contents[path]));
        MetadataReader reader = file.GetMetadataReader();
        return [.. reader.TypeDefinitions.Select(reader.GetTypeDefinition)
            .Where(type => (type.Attributes & TypeAttributes.VisibilityMask) == TypeAttributes.Public)
            .Select(type => $"{reader.GetString(type.Namespace)}.{reader.GetString(type.Name)}")];
    }
}
