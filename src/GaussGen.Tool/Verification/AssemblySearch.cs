using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Threading;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>A file to be verified, or a place that could not be searched.</summary>
/// <param name="Path">The path.</param>
/// <param name="IsNamed">Whether the path itself was given.</param>
/// <param name="Error">Why the place could not be searched; null for a file.</param>
internal sealed record SearchedFile(string Path, bool IsNamed, UnreadableException? Error = null);

/// <summary>Turns the paths of a command line into files: a file is itself, a folder stands for the assemblies in and below it.</summary>
internal static class AssemblySearch
{
    private static readonly string[] Extensions = [".dll", ".exe"];

    /// <summary>All files, in the order of the paths and then by name, each once.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static IReadOnlyList<SearchedFile> Find(IEnumerable<string> paths, CancellationToken cancellation)
    {
        List<SearchedFile> files = [];
        HashSet<string> seen = new(StringComparer.Ordinal);
        foreach (string path in paths)
        {
            IEnumerable<SearchedFile> found = Directory.Exists(path) ? InFolder(path, cancellation) : [new SearchedFile(path, IsNamed: true)];
            files.AddRange(found.Where(file => seen.Add(Path.GetFullPath(file.Path))));
        }

        return files;
    }

    private static IEnumerable<SearchedFile> InFolder(string root, CancellationToken cancellation)
    {
        Stack<string> folders = new([root]);
        while (folders.TryPop(out string? folder))
        {
            cancellation.ThrowIfCancellationRequested();
            if (!TryList(folder, out FileSystemInfo[] content, out UnreadableException? error))
            {
                yield return new SearchedFile(folder, IsNamed: false, error);
                continue;
            }

            foreach (FileSystemInfo file in content.Where(item => item is FileInfo && Extensions.Contains(item.Extension.ToLowerInvariant())))
            {
                yield return new SearchedFile(Path.Combine(folder, file.Name), IsNamed: false);
            }

            // A linked folder may lead back to one above it; what it holds is found where it really is.
            foreach (FileSystemInfo inner in Enumerable.Reverse(content).Where(item => item is DirectoryInfo && item.LinkTarget is null))
            {
                folders.Push(Path.Combine(folder, inner.Name));
            }
        }
    }

    private static bool TryList(string folder, out FileSystemInfo[] content, out UnreadableException? error)
    {
        try
        {
            content = new DirectoryInfo(folder).GetFileSystemInfos();
            Array.Sort(content, (a, b) => string.CompareOrdinal(a.Name, b.Name));
            error = null;
            return true;
        }
        catch (Exception cause) when (cause is UnauthorizedAccessException or IOException)
        {
            content = [];
            error = new UnreadableException(UnreadableReason.NoPermission, "is a folder that may not be searched; grant this user permission to read it", cause);
            return false;
        }
    }
}
