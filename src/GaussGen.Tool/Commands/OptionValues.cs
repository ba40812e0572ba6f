using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Commands;

/// <summary>Reads the values of options that describe one table, and keeps account of which were read.</summary>
/// <param name="table">The option that names the table: "--rule gauss-hermite".</param>
/// <param name="options">All options, with what was given for each.</param>
internal sealed class OptionValues(string table, IReadOnlyList<(string Option, string? Value)> options)
{
    private const char Separator = ',';

    private readonly HashSet<string> _read = new(StringComparer.Ordinal);

    /// <summary>A whole number.</summary>
    /// <exception cref="InputException">It is missing, or none.</exception>
    public int Integer(string option) => Integer(option, Required(option, "a whole number"));

    /// <summary>A whole number, or another if none is given.</summary>
    /// <exception cref="InputException">It is none.</exception>
    public int Integer(string option, int otherwise) => Given(option) is { } value ? Integer(option, value) : otherwise;

    /// <summary>A finite number.</summary>
    /// <exception cref="InputException">It is missing, or none.</exception>
    public double Number(string option)
    {
        string value = Required(option, "a number");
        return Parse(value) is { } number && double.IsFinite(number) ? number
            : throw new InputException($"{option} must be a finite number such as 0.25 or 1.5e-3, not {value}");
    }

    /// <summary>An end of an interval, which may be infinite and is so if it is not given.</summary>
    /// <exception cref="InputException">It is no number.</exception>
    public double End(string option, double otherwise) => Given(option) is not { } value ? otherwise
        : Parse(value) ?? throw new InputException($"{option} must be a number such as -0.25 or 1.5e-3, or left out where there is no end, not {value}");

    /// <summary>A list of finite numbers.</summary>
    /// <exception cref="InputException">It is missing, or none.</exception>
    public IReadOnlyList<double> List(string option)
    {
        string value = Required(option, "numbers with commas between them");
        double?[] numbers = [.. value.Split(Separator).Select(Parse)];
        return numbers.All(number => number is { } each && double.IsFinite(each)) ? [.. numbers.Select(number => number!.Value)]
            : throw new InputException($"{option} must be finite numbers with commas between them, such as 0.25,-1.5e-3,2, not {value}");
    }

    /// <summary>Whether a flag is set.</summary>
    public bool Flag(string option) => Given(option) is not null;

    /// <summary>Whether the second of two names is given; the first is meant if none is.</summary>
    /// <exception cref="InputException">It is neither.</exception>
    public bool IsSecond(string option, string first, string second) => Given(option) switch
    {
        null => false,
        { } value when value == first => false,
        { } value when value == second => true,
        { } value => throw new InputException($"{option} {value} is unknown; choose {first} or {second}"),
    };

    /// <summary>The number format.</summary>
    /// <exception cref="InputException">It is none.</exception>
    public BinaryFormat Format() => IsSecond("--format", "binary64", "binary32") ? BinaryFormat.Binary32 : BinaryFormat.Binary64;

    /// <summary>Refuses an option that has no meaning for the table.</summary>
    /// <exception cref="InputException">There is one.</exception>
    public void RequireAllRead()
    {
        if (options.FirstOrDefault(option => option.Value is not null && !_read.Contains(option.Option)) is { Option: { } unread })
        {
            string read = string.Join(", ", options.Select(option => option.Option).Where(_read.Contains));
            throw new InputException($"{unread} is no option of {table}, which has {read}; leave it out");
        }
    }

    /// <summary>What a parameter that cannot be means for the command line: the option to change, and how.</summary>
    public InputException Refusal(ArgumentException error)
    {
        string option = "--" + string.Concat((error.ParamName ?? "").Select(letter => char.IsAsciiLetterUpper(letter) ? $"-{char.ToLowerInvariant(letter)}" : $"{letter}"));
        string? value = options.FirstOrDefault(each => each.Option == option).Value;
        string text = ParameterMistake.Text(error);
        return new InputException($"{(value is null ? table : $"{option} {value}")}: {char.ToLowerInvariant(text[0])}{text[1..]}");
    }

    private string? Given(string option)
    {
        _ = _read.Add(option);
        return options.First(each => each.Option == option).Value;
    }

    private string Required(string option, string what) => Given(option) ?? throw new InputException($"{table} needs {option}, {what}");

    private static int Integer(string option, string value) =>
        int.TryParse(value, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int number) ? number
            : throw new InputException($"{option} must be a whole number, not {value}");

    /// <summary>The nearest binary64 number; null for what is none, and for one too large to be finite, which is not what was meant.</summary>
    private static double? Parse(string text)
    {
        bool isNumber = double.TryParse(text.Trim(), NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && !double.IsNaN(number);
        return isNumber && (double.IsFinite(number) || !text.Any(char.IsAsciiDigit)) ? number : null;
    }
}
