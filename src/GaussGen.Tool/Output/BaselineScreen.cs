using System.Collections.Generic;
using System.Linq;
using GaussGen.Tool.Baselines;
using Spectre.Console;

namespace GaussGen.Tool.Output;

/// <summary>A baseline on the terminal: a line for what could not be read, a line a change, and the sum.</summary>
internal static class BaselineScreen
{
    private static readonly Style Good = new(Color.Green);
    private static readonly Style Bad = new(Color.Red);

    /// <summary>What could not be read.</summary>
    public static void ShowProblems(BaselineSurvey survey, Terminal terminal)
    {
        VerificationScreen.ShowFindings(survey.Result, terminal);
        VerificationScreen.ShowUnread(survey.Result, terminal);
    }

    /// <summary>A line a change.</summary>
    public static void ShowChanges(string path, IReadOnlyList<BaselineChange> changes, BaselineSurvey survey, Terminal terminal)
    {
        foreach (BaselineChange change in changes)
        {
            bool hasAssembly = change.Before is null || survey.HasAssembly(change.Before.Assembly);
            Terminal.WriteLine(terminal.Results, change.Describe(path, hasAssembly), Bad);
        }
    }

    /// <summary>What a check ends with.</summary>
    public static void ShowSum(string path, Baseline baseline, IReadOnlyList<BaselineChange> changes, BaselineSurvey survey, Terminal terminal)
    {
        if (changes.Count > 0)
        {
            Terminal.WriteLine(
                terminal.Results,
                $"Not as in {path}: {Count(changes)}. After a review, renew it with gaussgen baseline write.",
                Bad);
        }
        else if (!survey.IsIncomplete)
        {
            Terminal.WriteLine(terminal.Results, $"As in {path}: {Count(baseline.Entries.Count, "table")}.", Good);
        }
    }

    /// <summary>What was written, and what is new about it.</summary>
    public static void ShowWritten(string path, Baseline? old, BaselineSurvey survey, Terminal terminal)
    {
        IReadOnlyList<BaselineChange> changes = old is null ? [] : BaselineChange.Between(old, survey.Tables);
        foreach (BaselineChange change in changes)
        {
            Terminal.WriteLine(terminal.Results, change.Describe(path, hasAssembly: true));
        }

        string difference = old is null ? "" : changes.Count == 0 ? ", nothing changed" : ", " + Count(changes);
        Terminal.WriteLine(terminal.Results, $"Wrote {path}: {Count(survey.Tables.Count, "table")}{difference}.", Good);
    }

    private static string Count(IReadOnlyList<BaselineChange> changes)
    {
        (int Number, string Word)[] counts =
        [
            (changes.Count(change => change.IsAdded), "added"),
            (changes.Count(change => change.IsRemoved), "removed"),
            (changes.Count(change => change is { IsAdded: false, IsRemoved: false }), "changed"),
        ];
        return string.Join(", ", counts.Where(count => count.Number > 0).Select(count => $"{count.Number} {count.Word}"));
    }

    private static string Count(int number, string noun) => $"{number} {noun}{(number == 1 ? "" : "s")}";
}
