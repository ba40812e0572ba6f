using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>A declaration whose arguments this version of the tool cannot turn into a claim. The message says what to do.</summary>
internal sealed class ClaimException(string message) : Exception(message);

/// <summary>Reads the arguments of one declaration and keeps account of which were read.</summary>
internal sealed class ClaimArguments(Declaration declaration)
{
    private readonly HashSet<string> _unread = new(declaration.Named.Keys, StringComparer.Ordinal);
    private int _positional;

    /// <summary>The next positional argument.</summary>
    /// <exception cref="ClaimException">There is none, or it is of another type.</exception>
    public T Next<T>() =>
        _positional < declaration.Arguments.Count && declaration.Arguments[_positional++] is T value
            ? value
            : throw new ClaimException($"argument {_positional} of [{declaration.Name}] is not what this version of the tool expects; use the tool's version of the package");

    /// <summary>The next positional argument, a list of numbers.</summary>
    /// <exception cref="ClaimException">There is none, it is null, or it is of another type.</exception>
    public IReadOnlyList<double> NextList()
    {
        int position = _positional + 1;
        if (_positional < declaration.Arguments.Count && declaration.Arguments[_positional] is null)
        {
            throw new ClaimException($"argument {position} of [{declaration.Name}] is null where a list of numbers is expected; give the numbers");
        }

        object?[] list = Next<object?[]>();
        return list.All(value => value is double) ? [.. list.Cast<double>()]
            : throw new ClaimException($"argument {position} of [{declaration.Name}] is not a list of binary64 numbers; use the tool's version of the package");
    }

    /// <summary>A named argument, or what the attribute means without it.</summary>
    /// <exception cref="ClaimException">It is of another type.</exception>
    public T Named<T>(string name, T otherwise)
    {
        _ = _unread.Remove(name);
        return !declaration.Named.TryGetValue(name, out object? value) ? otherwise
            : value is T typed ? typed
            : throw new ClaimException($"{name} of [{declaration.Name}] is not what this version of the tool expects; use the tool's version of the package");
    }

    /// <summary>The number format, which every table attribute has under the same name and numbers.</summary>
    /// <exception cref="ClaimException">The number is of no format that this version of the tool knows.</exception>
    public BinaryFormat Format() => Named("Format", 0) switch
    {
        0 => BinaryFormat.Binary64,
        1 => BinaryFormat.Binary32,
        var other => throw new ClaimException($"Format {other} of [{declaration.Name}] is unknown to this version of the tool; install a newer one"),
    };

    /// <summary>Whether nodes whose weight rounds to zero are left out.</summary>
    public bool DropZeroWeights() => Named("DropZeroWeights", false);

    /// <summary>Whether a rule has a companion that estimates its error.</summary>
    public bool HasErrorEstimate() => Named(ClaimFamily.ErrorEstimate, false);

    /// <summary>The highest order of moments.</summary>
    public int MaximumOrder() => Named("MaximumOrder", 4);

    /// <summary>Whether an enumeration's member is its second and last one.</summary>
    /// <exception cref="ClaimException">The number is of neither.</exception>
    public bool IsSecond(string name) => Named(name, 0) switch
    {
        0 => false,
        1 => true,
        var other => throw new ClaimException($"{name} {other} of [{declaration.Name}] is unknown to this version of the tool; install a newer one"),
    };

    /// <summary>Refuses a declaration of which something was not read: the claim made of it would be another one.</summary>
    /// <exception cref="ClaimException">There is such an argument.</exception>
    public void RequireAllRead()
    {
        if (_positional < declaration.Arguments.Count || _unread.Count > 0)
        {
            string which = _unread.Count > 0 ? _unread.Order(StringComparer.Ordinal).First() : $"argument {_positional + 1}";
            throw new ClaimException($"{which} of [{declaration.Name}] is unknown to this version of the tool; install a newer one");
        }
    }
}
