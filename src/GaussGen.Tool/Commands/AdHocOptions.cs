using System;
using System.Collections.Frozen;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Commands;

/// <summary>Reads the options that describe a table which no assembly declares. A family has a line here.</summary>
internal static class AdHocOptions
{
    private const int DefaultMaximumOrder = 4;

    private static readonly FrozenDictionary<string, Func<OptionValues, AdHocTable>> Rules = new Dictionary<string, Func<OptionValues, AdHocTable>>
    {
        ["gauss-hermite"] = read => AdHocTable.GaussHermite(
            read.Integer("--points"), read.IsSecond("--convention", "probabilist", "physicist"), Rule(read)),
        ["gauss-half-range-hermite"] = read => AdHocTable.GaussHalfRangeHermite(read.Integer("--points"), Rule(read)),
        ["gauss-truncated-normal"] = read => AdHocTable.GaussTruncatedNormal(
            read.Integer("--points"), read.End("--lower", double.NegativeInfinity), read.End("--upper", double.PositiveInfinity), Rule(read)),
        ["gauss-generalized-hermite"] = read => AdHocTable.GaussGeneralizedHermite(read.Integer("--points"), read.Number("--exponent"), Rule(read)),
        ["gauss-log-normal"] = read => AdHocTable.GaussLogNormal(
            read.Integer("--points"), read.Number("--log-mean"), read.Number("--log-standard-deviation"), Rule(read)),
        ["gauss-normal-mixture"] = read => AdHocTable.GaussNormalMixture(
            read.Integer("--points"), read.List("--weights"), read.List("--means"), read.List("--standard-deviations"), Rule(read)),
        ["gauss-even-exponential"] = read => AdHocTable.GaussEvenExponential(read.Integer("--points"), read.List("--coefficients"), Rule(read)),
        ["nested-hermite"] = read => AdHocTable.NestedHermite(read.Integer("--level"), Rule(read)),
    }.ToFrozenDictionary(StringComparer.Ordinal);

    private static readonly FrozenDictionary<string, Func<OptionValues, AdHocTable>> Moments = new Dictionary<string, Func<OptionValues, AdHocTable>>
    {
        ["normal"] = read => AdHocTable.NormalMoments(
            read.Number("--mean"), read.Number("--standard-deviation"), Order(read), read.Format()),
        ["truncated-normal"] = read => AdHocTable.TruncatedNormalMoments(
            read.Number("--mean"),
            read.Number("--standard-deviation"),
            read.End("--lower", double.NegativeInfinity),
            read.End("--upper", double.PositiveInfinity),
            Order(read),
            read.Format()),
        ["half-normal"] = read => AdHocTable.HalfNormalMoments(read.Number("--scale"), Order(read), read.Format()),
        ["log-normal"] = read => AdHocTable.LogNormalMoments(
            read.Number("--log-mean"), read.Number("--log-standard-deviation"), Order(read), read.Format()),
        ["even-exponential"] = read => AdHocTable.EvenExponentialMoments(read.List("--coefficients"), Order(read), read.Format()),
    }.ToFrozenDictionary(StringComparer.Ordinal);

    private static readonly FrozenDictionary<string, Func<OptionValues, AdHocTable>> Sequences = new Dictionary<string, Func<OptionValues, AdHocTable>>
    {
        ["half-integer-gamma"] = read => AdHocTable.HalfIntegerGamma(read.Integer("--maximum-order"), read.Format()),
        ["oscillator-matrix-elements"] = read => AdHocTable.OscillatorMatrixElements(read.Integer("--size"), read.Integer("--power"), read.Format()),
    }.ToFrozenDictionary(StringComparer.Ordinal);

    /// <summary>The names of the tables that can be made, by the option that takes them.</summary>
    public static IReadOnlyList<(string Option, IEnumerable<string> Names)> Names =>
        [("--rule", Rules.Keys), ("--moments", Moments.Keys), ("--sequence", Sequences.Keys)];

    /// <summary>The table that the options describe; null if they describe none.</summary>
    /// <exception cref="InputException">An option is missing, out of place, or not a value that it can have.</exception>
    public static AdHocTable? Read(TableSettings settings)
    {
        (string Option, string? Name, FrozenDictionary<string, Func<OptionValues, AdHocTable>> Families)[] kinds =
        [
            ("--rule", settings.Rule, Rules),
            ("--moments", settings.Moments, Moments),
            ("--sequence", settings.Sequence, Sequences),
        ];
        (string Option, string? Name, FrozenDictionary<string, Func<OptionValues, AdHocTable>> Families)[] given = [.. kinds.Where(kind => kind.Name is not null)];
        if (given.Length > 1)
        {
            throw new InputException($"{given[0].Option} and {given[1].Option} describe different tables; give one of them");
        }

        if (given.Length == 0)
        {
            string? option = settings.Options.FirstOrDefault(option => option.Value is not null).Option;
            return option is null ? null
                : throw new InputException($"{option} describes a table that is made with --rule, --moments or --sequence; name one, or leave {option} out");
        }

        (string kind, string? name, FrozenDictionary<string, Func<OptionValues, AdHocTable>> families) = given[0];
        return families.TryGetValue(name!, out Func<OptionValues, AdHocTable>? read)
            ? Read(read, new OptionValues($"{kind} {name}", settings.Options))
            : throw new InputException($"{kind} {name} is unknown; choose {Choice(families.Keys)}");
    }

    private static AdHocTable Read(Func<OptionValues, AdHocTable> read, OptionValues values)
    {
        try
        {
            AdHocTable table = read(values);
            values.RequireAllRead();
            return table;
        }
        catch (ArgumentException error)
        {
            throw values.Refusal(error);
        }
    }

    private static RuleChoices Rule(OptionValues read) => new(read.Format(), read.Flag("--drop-zero-weights"), read.Flag("--error-estimate"));

    private static int Order(OptionValues read) => read.Integer("--maximum-order", DefaultMaximumOrder);

    private static string Choice(IEnumerable<string> names)
    {
        string[] all = [.. names.Order(StringComparer.Ordinal)];
        return string.Join(", ", all[..^1]) + " or " + all[^1];
    }
}
