using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.IO;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Text;

namespace GaussGen.Generator.Diagnostics;

/// <summary>
/// The baselines of a project: its additional files of the name gaussgen.baseline, or of a name that ends with .gaussgen.baseline.
/// </summary>
internal sealed class BaselineSet
{
    private const string FileName = "gaussgen.baseline";

    private readonly ImmutableArray<BaselineFile> _files;

    private BaselineSet(ImmutableArray<BaselineFile> files) => _files = files;

    /// <summary>Whether there is nothing to compare with: no baseline, or one that cannot be read, which is told in its own place.</summary>
    public bool IsSilent => _files.IsEmpty || _files.Any(file => file.Flaw is not null);

    /// <summary>The baselines among some files.</summary>
    /// <param name="files">All additional files.</param>
    /// <param name="read">Reads a text, or remembers what was read of it.</param>
    /// <param name="cancellation">Passed on.</param>
    public static BaselineSet Of(ImmutableArray<AdditionalText> files, Func<SourceText, BaselineText?> read, CancellationToken cancellation)
    {
        HashSet<string> paths = new(StringComparer.Ordinal);
        return new BaselineSet(files
            .Where(file => IsBaseline(file.Path) && paths.Add(file.Path))
            .Select(file => Read(file, file.GetText(cancellation), read))
            .ToImmutableArray());
    }

    /// <summary>Tells, in the place of the first wrong line, what is wrong with a file that is in the place of a baseline.</summary>
    public void ReportFlaw(AdditionalFileAnalysisContext context)
    {
        if (_files.FirstOrDefault(file => ReferenceEquals(file.Source, context.AdditionalFile)) is { Flaw: { } flaw } flawed)
        {
            context.ReportDiagnostic(Diagnostic.Create(
                DiagnosticDescriptors.NoBaseline, PlaceOf(flawed, flaw.Line), flaw.Line, flawed.Name, flaw.What));
        }
    }

    /// <summary>The difference between a table and the baselines; <c>null</c> if one of them has the table as it is.</summary>
    public BaselineDifference? Compare(BaselineEntry table)
    {
        BaselineDifference? difference = null;
        foreach (BaselineFile file in _files)
        {
            if (file.Content?.Find(table) is { } known)
            {
                if (known == table)
                {
                    return null;
                }

                difference ??= new BaselineDifference(file.Name, string.Join("; ", known.DifferencesTo(table)));
            }
        }

        return difference ?? new BaselineDifference(_files[0].Name, "the table is not in it");
    }

    private static bool IsBaseline(string path)
    {
        string name = Path.GetFileName(path);
        return name.Equals(FileName, StringComparison.OrdinalIgnoreCase) || name.EndsWith("." + FileName, StringComparison.OrdinalIgnoreCase);
    }

    private static BaselineFile Read(AdditionalText file, SourceText? text, Func<SourceText, BaselineText?> read) =>
        text is not null && read(text) is { } content
            ? new BaselineFile(file, text, content, content.Flaw)
            : new BaselineFile(file, null, null, new BaselineFlaw(1, "cannot be read; make the file readable, or take it from the project"));

    /// <summary>A line as a baseline has them: between line feeds, without a carriage return at its end.</summary>
    private static Location PlaceOf(BaselineFile file, int line)
    {
        string[] lines = (file.Text?.ToString() ?? string.Empty).Split('\n');
        int start = lines.Take(line - 1).Sum(before => before.Length + 1);
        int length = lines[line - 1].TrimEnd('\r').Length;
        return Location.Create(
            file.Source.Path,
            new TextSpan(start, length),
            new LinePositionSpan(new LinePosition(line - 1, 0), new LinePosition(line - 1, length)));
    }

    /// <summary>One baseline.</summary>
    /// <param name="Source">The additional file.</param>
    /// <param name="Text">Its text; <c>null</c> if it cannot be read.</param>
    /// <param name="Content">What the text says; <c>null</c> if it cannot be read.</param>
    /// <param name="Flaw">What is wrong; <c>null</c> if nothing is.</param>
    private sealed record BaselineFile(AdditionalText Source, SourceText? Text, BaselineText? Content, BaselineFlaw? Flaw)
    {
        public string Name => Path.GetFileName(Source.Path);
    }
}

/// <summary>How a table differs from what was reviewed.</summary>
/// <param name="File">The name of the baseline.</param>
/// <param name="What">The differences as one phrase.</param>
internal sealed record BaselineDifference(string File, string What);
