using System;
using System.IO;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Baselines;

/// <summary>Reads a baseline from the disk.</summary>
internal static class BaselineFile
{
    private const long MaximumLength = 64L << 20;

    /// <summary>The baseline in a file.</summary>
    /// <exception cref="InputException">There is none, it cannot be read, or it is malformed.</exception>
    public static Baseline Read(string path) => ReadIfPresent(path)
        ?? throw new InputException($"{path} does not exist; name the baseline with --file, or write it with gaussgen baseline write");

    /// <summary>The baseline in a file; null if there is no such file.</summary>
    /// <exception cref="InputException">It cannot be read, or is malformed.</exception>
    public static Baseline? ReadIfPresent(string path)
    {
        try
        {
            FileInfo file = new(path);
            if (Directory.Exists(path))
            {
                throw new InputException($"{path} is a folder; name a file with --file");
            }

            if (!file.Exists)
            {
                return null;
            }

            // Pipes and devices have no length either, and may have no end.
            return file.Length == 0 ? throw new InputException($"{path} is empty, or no regular file; name another file with --file, or delete this one and write it again")
                : file.Length > MaximumLength ? throw new InputException($"{path} is too large for a baseline; name another file with --file")
                : Baseline.Parse(File.ReadAllBytes(path), path);
        }
        catch (Exception error) when (error is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            throw new InputException($"{path} cannot be read: {error.Message}; name a file you may read with --file", error);
        }
    }
}
