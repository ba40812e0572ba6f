using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Baselines;

namespace GaussGen.Tool.Baselines;

/// <summary>A table that is not as the baseline has it.</summary>
/// <param name="Before">What the baseline says; null if the table is new.</param>
/// <param name="After">What was found; null if the table is gone.</param>
internal sealed record BaselineChange(BaselineEntry? Before, SurveyedTable? After)
{
    /// <summary>What differs, in order: tables of the baseline and new ones by their lines.</summary>
    public static IReadOnlyList<BaselineChange> Between(Baseline before, IReadOnlyList<SurveyedTable> after)
    {
        Dictionary<(string, string, string), BaselineEntry> known = before.Entries.ToDictionary(entry => entry.Identity);
        ILookup<(string, string, string), SurveyedTable> found = after.ToLookup(table => table.Entry.Identity);
        IEnumerable<BaselineChange> removed = before.Entries
            .Where(entry => !found.Contains(entry.Identity))
            .Select(entry => new BaselineChange(entry, null));
        IEnumerable<BaselineChange> other = after
            .Select(table => new BaselineChange(known.GetValueOrDefault(table.Entry.Identity), table))
            .Where(change => change.Before != change.After!.Entry);
        return [.. removed.Concat(other).OrderBy(change => (change.Before ?? change.After!.Entry).Line, System.StringComparer.Ordinal)];
    }

    /// <summary>Whether the table is new.</summary>
    public bool IsAdded => Before is null;

    /// <summary>Whether the table is gone.</summary>
    public bool IsRemoved => After is null;

    /// <summary>One line on the change.</summary>
    /// <param name="baseline">The path of the baseline.</param>
    /// <param name="hasAssembly">Whether the assembly of a table that is gone was looked at.</param>
    public string Describe(string baseline, bool hasAssembly) => (Before, After) switch
    {
        (null, { } added) => $"{added.Path}: added {added.Entry.Type}: {added.Entry.Claim}, {added.Entry.Format}",
        ({ } removed, null) => $"{baseline}: removed {removed.Type} of {removed.Assembly}: {removed.Claim}, {removed.Format}"
            + (hasAssembly ? "" : $"; no assembly {removed.Assembly} was looked at"),
        ({ } old, { } found) => $"{found.Path}: changed {old.Type}: {string.Join("; ", old.DifferencesTo(found.Entry))}",
        _ => "",
    };
}
