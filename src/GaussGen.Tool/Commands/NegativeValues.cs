using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Tool.Commands;

/// <summary>
/// Numbers below zero on the command line. The library that reads it takes whatever begins with a minus sign for an option; no option
/// of this program begins with a digit, so that "--mean -0.5" can only mean "--mean=-0.5".
/// </summary>
internal static class NegativeValues
{
    /// <summary>The arguments, with each negative number joined to the option before it.</summary>
    public static IReadOnlyList<string> Join(IReadOnlyList<string> arguments)
    {
        List<string> joined = [];
        foreach (string argument in arguments)
        {
            if (IsNegative(argument) && joined.LastOrDefault() is { } last && IsOption(last))
            {
                joined[^1] = last + "=" + argument;
            }
            else
            {
                joined.Add(argument);
            }
        }

        return joined;
    }

    private static bool IsOption(string argument) => argument.StartsWith("--", System.StringComparison.Ordinal) && argument.Length > 2 && !argument.Contains('=');

    private static bool IsNegative(string argument) =>
        argument is ['-', var next, ..] && (char.IsAsciiDigit(next) || next == '.' || argument.StartsWith("-inf", System.StringComparison.OrdinalIgnoreCase));
}
