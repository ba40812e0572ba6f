using System.Collections.Generic;
using System.IO;
using System.Linq;

namespace GaussGen.Mathematics.Tests;

/// <summary>Reference values that other software made; see the script beside each file in the folder Data.</summary>
internal static class ReferenceData
{
    /// <summary>The fields of each line of a file of values between commas; lines with # and the heading are left out.</summary>
    public static IReadOnlyList<string[]> Read(string fileName) =>
        Lines(fileName).Skip(1).Select(line => line.Split(',')).ToList();

    /// <summary>The words of each line of a file of values between spaces; lines with # are left out.</summary>
    public static IReadOnlyList<string[]> Words(string fileName) =>
        Lines(fileName).Select(line => line.Split(' ')).ToList();

    private static List<string> Lines(string fileName)
    {
        using Stream stream = typeof(ReferenceData).Assembly.GetManifestResourceStream(fileName)
            ?? throw new FileNotFoundException("There is no reference data " + fileName + ".", fileName);
        using var reader = new StreamReader(stream);
        return reader.ReadToEnd()
            .Split('\n')
            .Select(line => line.TrimEnd('\r'))
            .Where(line => line.Length > 0 && line[0] != '#')
            .ToList();
    }
}
