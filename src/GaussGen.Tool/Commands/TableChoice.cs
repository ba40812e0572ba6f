using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Threading;
using GaussGen.Tool.Output;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Commands;

/// <summary>Finds the tables that a command line names in one assembly.</summary>
internal static class TableChoice
{
    private const int ShownNames = 5;

    /// <summary>Reads an assembly.</summary>
    /// <exception cref="InputException">It cannot be read, or is a folder.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static FileResult Open(string path, VerificationProgress progress, CancellationToken cancellation)
    {
        if (Directory.Exists(path))
        {
            throw new InputException($"{path} is a folder; name one assembly (.dll, .exe)");
        }

        FileResult file = Verifier.Read([path], progress, cancellation)[0];
        return file.Error is null ? file : throw new InputException($"{path} {file.Error.Message}", file.Error);
    }

    /// <summary>The tables of the named types, in the order of the names; of all types, by name, if none is named.</summary>
    /// <exception cref="InputException">There is no such type, or more than one.</exception>
    public static IReadOnlyList<DeclaredTable> Choose(FileResult file, IReadOnlyList<string> names)
    {
        DeclaredTable[] tables = [.. file.Assembly!.Types.OrderBy(type => type.Name, StringComparer.Ordinal).SelectMany(DeclaredTable.Of)];
        return tables.Length == 0 ? throw new InputException($"{file.Path} holds no table; name an assembly with a table attribute")
            : names.Count == 0 ? tables
            : [.. names.SelectMany(name => Find(tables, name, file.Path)).Distinct()];
    }

    /// <summary>The tables of one type: of the named one, or of the only one there is.</summary>
    /// <exception cref="InputException">There is no such type, or more than one.</exception>
    public static IReadOnlyList<DeclaredTable> ChooseOneType(FileResult file, string? name)
    {
        IReadOnlyList<DeclaredTable> tables = Choose(file, name is null ? [] : [name]);
        return tables.Select(table => table.Type.Name).Distinct().Count() == 1 ? tables
            : throw new InputException($"{file.Path} has several tables; name one of {List(tables.Select(table => table.Type.Name))}");
    }

    /// <summary>A type by its full name, or by the last parts of it if no other type ends so.</summary>
    private static List<DeclaredTable> Find(DeclaredTable[] tables, string name, string path)
    {
        string sought = name.Replace('+', '.');
        List<DeclaredTable> found = [.. tables.Where(table => table.Type.Name == sought)];
        if (found.Count == 0)
        {
            found.AddRange(tables.Where(table => table.Type.Name.EndsWith("." + sought, StringComparison.Ordinal)));
        }

        string[] types = [.. found.Select(table => table.Type.Name).Distinct()];
        return types.Length switch
        {
            0 => throw new InputException($"{path} has no type {name} with a table; it has {List(tables.Select(table => table.Type.Name))}"),
            1 => found,
            _ => throw new InputException($"{name} may be {List(types)}; give the whole name"),
        };
    }

    private static string List(IEnumerable<string> names)
    {
        string[] all = [.. names.Distinct()];
        string rest = all.Length > ShownNames ? $" and {all.Length - ShownNames} more" : "";
        return string.Join(", ", all.Take(ShownNames)) + rest;
    }
}
