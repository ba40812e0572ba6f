using System;
using System.Collections.Generic;
using System.Linq;

namespace SurveyBoat;

/// <summary>Writes tables of comparisons to the console and counts what does not agree.</summary>
internal sealed class Report
{
    private readonly List<Comparison> _all = [];

    /// <summary>The exit code: 0 if all results agree with their simulation, otherwise 1.</summary>
    public int ExitCode => _all.All(comparison => comparison.Agrees) ? 0 : 1;

    public void Table(string title, IEnumerable<Comparison> comparisons)
    {
        Console.WriteLine();
        Console.WriteLine(title);
        Console.WriteLine($"  {"",-22} {"at the mean",12} {"expected",12} {"simulated",12} {"std. error",11} {"apart",7}");
        foreach (Comparison comparison in comparisons)
        {
            _all.Add(comparison);
            Console.WriteLine(
                $"  {comparison.Label,-22} {comparison.AtTheMean,12:G6} {comparison.Calculated,12:G6} "
                + $"{comparison.Simulated.Value,12:G6} {comparison.Simulated.StandardError,11:G3} "
                + $"{comparison.StandardErrorsApart,7:F2}{(comparison.Agrees ? "" : "  <- does not agree")}");
        }
    }

    public static void Line(string text) => Console.WriteLine(text);

    public void Summary()
    {
        int disagreements = _all.Count(comparison => !comparison.Agrees);
        Console.WriteLine();
        Console.WriteLine(disagreements == 0
            ? $"All {_all.Count} results agree with their simulation within 5 standard errors."
            : $"{disagreements} of {_all.Count} results are more than 5 standard errors from their simulation.");
    }
}
