using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports.Html;

/// <summary>The outcome in words and counts. Whatever was found and not proven is counted.</summary>
internal static class OutcomeText
{
    /// <summary>The outcome in a few words.</summary>
    public static string Headline(VerificationResult result) =>
        !result.Tables.Any() ? "No table found, nothing proven"
        : result.ExitCode == ExitCode.AllProven ? "All proven"
        : result.ExitCode == ExitCode.NotAllProven ? "Not all proven"
        : "What was read is proven, but not all could be read";

    /// <summary>The verdict on a table, with a sign that needs no colour.</summary>
    public static string Of(Verdict verdict) => verdict switch
    {
        Verdict.Proven => "✓ proven",
        Verdict.Wrong => "✗ wrong",
        _ => "? not proven",
    };

    /// <summary>The counts, those that are zero left out.</summary>
    public static IEnumerable<(string Name, string Text)> Counts(VerificationResult result)
    {
        List<TableResult> tables = [.. result.Tables];
        yield return ("Tables", $"{tables.Count(table => table.Verdict == Verdict.Proven)} of {tables.Count} proven");
        yield return ("Entries", $"{tables.Sum(table => table.Proven)} of {tables.Sum(table => table.Entries)} proven");
        if (tables.Select(table => table.WorstDistanceInUlp).Max() is { } worst)
        {
            yield return ("Worst distance", $"at most {UlpText.Of(worst)} ulp");
        }

        yield return ("Assemblies", $"{result.Files.Count(file => file.Tables.Count > 0)} with a table");
        foreach ((string name, int count) in new[]
        {
            ("Wrong tables", tables.Count(table => table.Verdict == Verdict.Wrong)),
            ("Tables not proven", tables.Count(table => table.Verdict == Verdict.Unproven)),
            ("Unreadable files", result.Unreadable.Count()),
            ("Native images passed by", result.Skipped(UnreadableReason.NativeImage)),
            ("Reference assemblies passed by", result.Skipped(UnreadableReason.ReferenceAssembly)),
            ("Assemblies without a table", result.Files.Count(file => file is { Assembly: not null, Tables.Count: 0 })),
        })
        {
            if (count > 0)
            {
                yield return (name, $"{count}");
            }
        }
    }
}
