using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;

namespace GaussGen.Package.Tests;

/// <summary>
/// Somebody who has the package and nothing else of this repository: a fresh folder with a configuration that names the
/// feed beside the machine's own sources, a package cache of its own, and projects with every warning an error.
/// </summary>
internal sealed class Stranger
{
    private readonly PackedLibrary _package;
    private readonly string _folder;
    private readonly Dictionary<string, string> _environment;

    public Stranger(PackedLibrary package, string name)
    {
        _package = package;
        _folder = package.NewFolder(name);
        _environment = new() { ["NUGET_PACKAGES"] = Path.Combine(_folder, "cache") };
        // The fallback folder spares fetching what the machine has already; the version of ours is in no cache.
        File.WriteAllText(Path.Combine(_folder, "nuget.config"), $"""
            <configuration>
              <packageSources>
                <add key="the-package-under-test" value="{package.Feed}" />
              </packageSources>
              <fallbackPackageFolders>
                <add key="machine" value="{package.MachinePackages}" />
              </fallbackPackageFolders>
            </configuration>
            """);
    }

    /// <summary>Writes a project that refers to the package, or to other projects instead; returns its name.</summary>
    public string AddProject(string name, string properties, string source, params string[] projectReferences)
    {
        DirectoryInfo folder = Directory.CreateDirectory(Path.Combine(_folder, name));
        IEnumerable<string> references = projectReferences.Length == 0
            ? [$"<PackageReference Include=\"GaussGen\" Version=\"{_package.Version}\" />"]
            : projectReferences.Select(other => $"<ProjectReference Include=\"../{other}/{other}.csproj\" />");
        File.WriteAllText(Path.Combine(folder.FullName, $"{name}.csproj"), $"""
            <Project Sdk="Microsoft.NET.Sdk">
              <PropertyGroup>
                {properties}
                <TreatWarningsAsErrors>true</TreatWarningsAsErrors>
                <GenerateDocumentationFile>true</GenerateDocumentationFile>
              </PropertyGroup>
              <ItemGroup>
                {string.Join('\n', references)}
              </ItemGroup>
            </Project>
            """);
        File.WriteAllText(Path.Combine(folder.FullName, "Source.cs"), source);
        return name;
    }

    public CommandResult Dotnet(params string[] arguments) => Command.Dotnet(_folder, _environment, arguments);

    /// <summary>Runs what a build or a publication left, with more variables where they are needed.</summary>
    public CommandResult Run(string program, params string[] arguments) =>
        Command.Run(program, _folder, _environment, arguments);

    public string PathOf(params string[] parts) => Path.Combine([_folder, .. parts]);

    /// <summary>The files of a folder by name, to see what a consumer would ship.</summary>
    public IEnumerable<string> FilesOf(params string[] parts) =>
        Directory.EnumerateFiles(PathOf(parts)).Select(file => Path.GetFileName(file));

    /// <summary>Reads the lines <c>name = value</c> that a program printed.</summary>
    public static Dictionary<string, string> Values(CommandResult run) =>
        run.RequireSuccess().Output
            .Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries)
            .Select(line => line.Split(" = "))
            .ToDictionary(parts => parts[0], parts => parts.Length == 2 ? parts[1] : throw new FormatException(run.Output));
}
