using System;
using System.IO;
using System.Linq;

namespace GaussGen.Package.Tests;

/// <summary>The project's own sources, as a clean checkout has them.</summary>
internal static class Sources
{
    private static readonly string[] BuiltFolders = ["bin", "obj", "TestResults"];

    /// <summary>The repository's root, found from the folder that this test runs in.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>Copies what a package is made of, the root's files and <c>src</c>, without what a build has left.</summary>
    public static void CopyTo(string folder)
    {
        Directory.CreateDirectory(folder);
        foreach (string file in Directory.EnumerateFiles(Root).Where(file => Path.GetFileName(file) != ".git"))
        {
            File.Copy(file, Path.Combine(folder, Path.GetFileName(file)));
        }

        CopyFolder(new DirectoryInfo(Path.Combine(Root, "src")), Path.Combine(folder, "src"));
    }

    private static void CopyFolder(DirectoryInfo from, string to)
    {
        Directory.CreateDirectory(to);
        foreach (FileInfo file in from.EnumerateFiles())
        {
            file.CopyTo(Path.Combine(to, file.Name));
        }

        foreach (DirectoryInfo inner in from.EnumerateDirectories().Where(inner => !BuiltFolders.Contains(inner.Name)))
        {
            CopyFolder(inner, Path.Combine(to, inner.Name));
        }
    }

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "GaussGen.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException(
            $"No folder above {AppContext.BaseDirectory} has GaussGen.sln; run the tests from a checkout.");
    }
}
