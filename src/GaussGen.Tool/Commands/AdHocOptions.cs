using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Commands;

/// <summary>Reads the options that describe a table which no assembly declares.</summary>
internal static class AdHocOptions
{
    private const int DefaultMaximumOrder = 4;

    /// <summary>The table that the options describe; null if they describe none.</summary>
    /// <exception cref="InputException">An option is missing, out of place, or not a value that it can have.</exception>
    public static AdHocTable? Read(ExportSettings settings)
    {
        if (settings.Rule is not null && settings.Moments is not null)
        {
            throw new InputException("--rule and --moments describe different tables; give one of them");
        }

        RequireNone(settings.Rule is null ? settings.GivenRuleOptions : [], "--rule gauss-hermite");
        RequireNone(settings.Moments is null ? settings.GivenMomentOptions : [], "--moments normal");
        RequireNone(settings.Format is not null && settings is { Rule: null, Moments: null } ? ["--format"] : [], "--rule and --moments");
        return settings.Rule is not null ? Rule(settings)
            : settings.Moments is not null ? Moments(settings)
            : null;
    }

    private static AdHocTable Rule(ExportSettings settings) => settings.Rule == "gauss-hermite"
        ? AdHocTable.GaussHermite(
            Integer("--points", settings.Points, "--rule gauss-hermite", 1, GaussHermiteClaim.LargestPointCount),
            IsSecond("--convention", settings.Convention, "probabilist", "physicist"),
            Format(settings),
            settings.DropZeroWeights)
        : throw new InputException($"--rule {settings.Rule} is unknown; choose gauss-hermite");

    private static AdHocTable Moments(ExportSettings settings)
    {
        if (settings.Moments != "normal")
        {
            throw new InputException($"--moments {settings.Moments} is unknown; choose normal");
        }

        double deviation = Number("--standard-deviation", settings.StandardDeviation);
        return deviation > 0
            ? AdHocTable.NormalMoments(
                Number("--mean", settings.Mean),
                deviation,
                settings.MaximumOrder is null
                    ? DefaultMaximumOrder
                    : Integer("--maximum-order", settings.MaximumOrder, "--moments normal", 0, NormalMomentsClaim.LargestOrder),
                Format(settings))
            : throw new InputException($"--standard-deviation must be above zero, not {settings.StandardDeviation}");
    }

    private static BinaryFormat Format(ExportSettings settings) =>
        IsSecond("--format", settings.Format, "binary64", "binary32") ? BinaryFormat.Binary32 : BinaryFormat.Binary64;

    private static bool IsSecond(string option, string? value, string first, string second) =>
        value == second || (value is null || value == first ? false : throw new InputException($"{option} {value} is unknown; choose {first} or {second}"));

    private static int Integer(string option, string? value, string family, int from, int to)
    {
        string range = $"a whole number from {from} to {to}";
        return value is null ? throw new InputException($"{family} needs {option}, {range}")
            : int.TryParse(value, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int number) && number >= from && number <= to ? number
            : throw new InputException($"{option} must be {range}, not {value}");
    }

    private static double Number(string option, string? value) =>
        value is null ? throw new InputException($"--moments normal needs {option}, a number")
        : double.TryParse(value, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number) ? number
        : throw new InputException($"{option} must be a finite number such as 0.25 or 1.5e-3, not {value}");

    private static void RequireNone(IEnumerable<string> options, string owner)
    {
        if (options.FirstOrDefault() is { } option)
        {
            throw new InputException($"{option} belongs to {owner}; leave it out");
        }
    }
}
