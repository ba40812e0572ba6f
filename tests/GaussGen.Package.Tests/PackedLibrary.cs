using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.IO.Compression;
using System.Linq;
using Xunit;

namespace GaussGen.Package.Tests;

/// <summary>
/// The package, made once for all tests from a clean copy of the sources with the one command that the documentation gives,
/// and a place outside the repository where strangers can build against it.
/// </summary>
public sealed class PackedLibrary : IDisposable
{
    private static readonly Dictionary<string, string> NoVariables = [];
    private readonly DirectoryInfo _root = Directory.CreateTempSubdirectory("gaussgen-package-");

    public PackedLibrary()
    {
        // No version is used twice, so that no cache can hold an older package of the same name.
        Version = string.Create(
            CultureInfo.InvariantCulture, $"0.0.1-test.{DateTime.UtcNow:yyyyMMddHHmmss}.{Environment.ProcessId}");
        Feed = Pack("packed");
        PackageFile = Path.Combine(Feed, $"GaussGen.{Version}.nupkg");
        SymbolsFile = Path.Combine(Feed, $"GaussGen.{Version}.snupkg");
        MachinePackages = FindMachinePackages();
    }

    public string Version { get; }

    /// <summary>The folder that holds the package and serves as a source of packages.</summary>
    public string Feed { get; }

    public string PackageFile { get; }

    public string SymbolsFile { get; }

    /// <summary>The machine's own package cache, from which other packages may be read without fetching them again.</summary>
    public string MachinePackages { get; }

    /// <summary>Packs another clean copy of the sources in a folder of its own; returns the folder with the packages.</summary>
    public string Pack(string name)
    {
        string sources = Path.Combine(_root.FullName, name, "sources");
        string output = Path.Combine(_root.FullName, name, "feed");
        Sources.CopyTo(sources);
        Command.Dotnet(sources, NoVariables, "pack", "src/GaussGen", "--output", output, $"-p:Version={Version}")
            .RequireSuccess();
        return output;
    }

    /// <summary>Packs the tool too and puts it beside the package, with the same version.</summary>
    public void PackTool()
    {
        string sources = Path.Combine(_root.FullName, "packed", "sources");
        Command.Dotnet(sources, NoVariables, "pack", "src/GaussGen.Tool", "--output", Feed, $"-p:Version={Version}").RequireSuccess();
    }

    /// <summary>An empty folder outside the repository.</summary>
    public string NewFolder(string name) => _root.CreateSubdirectory(name).FullName;

    /// <summary>The contents of a package by path, without the container's own bookkeeping (ECMA-376, part 2).</summary>
    public static SortedDictionary<string, byte[]> Read(string package)
    {
        SortedDictionary<string, byte[]> contents = new(StringComparer.Ordinal);
        using ZipArchive archive = ZipFile.OpenRead(package);
        foreach (ZipArchiveEntry entry in archive.Entries.Where(entry => !IsBookkeeping(entry.FullName)))
        {
            using MemoryStream bytes = new();
            using Stream stream = entry.Open();
            stream.CopyTo(bytes);
            contents.Add(entry.FullName, bytes.ToArray());
        }

        return contents;
    }

    public void Dispose() => _root.Delete(recursive: true);

    private static bool IsBookkeeping(string path) =>
        path == "[Content_Types].xml"
        || path.StartsWith("_rels/", StringComparison.Ordinal)
        || path.StartsWith("package/", StringComparison.Ordinal);

    private string FindMachinePackages()
    {
        const string prefix = "global-packages:";
        string[] lines = Command.Dotnet(_root.FullName, NoVariables, "nuget", "locals", "global-packages", "--list")
            .RequireSuccess().Output.Split(Environment.NewLine);
        return lines.Single(line => line.StartsWith(prefix, StringComparison.Ordinal))[prefix.Length..].Trim();
    }
}

[CollectionDefinition(Name)]
public sealed class SharedPackage : ICollectionFixture<PackedLibrary>
{
    public const string Name = "The package";
}
