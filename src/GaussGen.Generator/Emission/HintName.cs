using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;

namespace GaussGen.Generator.Emission;

/// <summary>The names of generated files: the type's full name in metadata, and the family.</summary>
/// <remarks>
/// The compiler, and some file systems, compare them without regard to case, and one clash would lose every file. Two types
/// whose names differ in nothing but case therefore have a number in the name, made from the exact letters.
/// </remarks>
internal static class HintName
{
    private const string Extension = ".g.cs";

    /// <summary>The name before the extension, unique but for case.</summary>
    public static string Plain(Declaration declaration) => declaration.Type.MetadataName + "." + declaration.Family;

    /// <summary>Those of some names that equal another of them but for case, in ordinal order.</summary>
    public static EquatableArray<string> CaseTwins(ImmutableArray<string> names, CancellationToken cancellation) => new(names
        .GroupBy(name => name, StringComparer.OrdinalIgnoreCase)
        .Where(group => group.Count() > 1)
        .SelectMany(group => group)
        .OrderBy(name => name, StringComparer.Ordinal));

    public static string Of(Declaration declaration, IEnumerable<string> caseTwins)
    {
        string plain = Plain(declaration);
        return caseTwins.Contains(plain) ? plain + "." + Number(plain) + Extension : plain + Extension;
    }

    // FNV-1a over the letters (Fowler, Noll and Vo 1991): the same number in every process, unlike the host's hash of a string.
    private static string Number(string text)
    {
        ulong hash = 14695981039346656037;
        foreach (char letter in text)
        {
            hash = unchecked((hash ^ letter) * 1099511628211);
        }

        return hash.ToString("x16", CultureInfo.InvariantCulture);
    }
}
