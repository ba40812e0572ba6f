using System;

namespace GaussGen.Tool.Claims;

/// <summary>What the mathematics says of a parameter that cannot be.</summary>
internal static class ParameterMistake
{
    /// <summary>The sentence without the parameter's name and value, which .NET adds for programmers, and without its full stop.</summary>
    public static string Text(ArgumentException error)
    {
        string line = error.Message.Split('\n')[0];
        string added = $" (Parameter '{error.ParamName}')";
        int end = line.LastIndexOf(added, StringComparison.Ordinal);
        return (end < 0 ? line : line[..end]).TrimEnd('.', '\r');
    }
}
