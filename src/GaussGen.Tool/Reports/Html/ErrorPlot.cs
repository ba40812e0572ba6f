using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Verification;
using static GaussGen.Tool.Reports.Html.PlotNumbers;

namespace GaussGen.Tool.Reports.Html;

/// <summary>
/// Every entry by its distance from the true value. A nearest value is at most half a unit in the last place away, which is the upper
/// line; what is not proven stands above it, whatever its distance, for no scale could show both.
/// </summary>
internal sealed class ErrorPlot
{
    private const int SmallestGroup = 92;
    private const int Gap = 16;
    private const int StripHeight = 30;

    /// <summary>So many groups leave room for their counts beside the names.</summary>
    private const int MostCountedGroups = 4;

    private readonly List<(string Name, List<EntryProof> Entries)> _groups;
    private readonly double _worst;

    private ErrorPlot(TableProof proof)
    {
        List<EntryProof> numbers = [.. proof.Entries.Where(entry => !entry.IsInteger)];
        _groups = [.. numbers.Where(entry => entry.Index is not null).GroupBy(entry => entry.Member).Select(group => (group.Key, group.ToList()))];
        List<EntryProof> constants = [.. numbers.Where(entry => entry.Index is null)];
        if (constants.Count > 0)
        {
            _groups.Add(("Constants", constants));
        }

        _worst = numbers.Select(entry => entry.DistanceInUlp).DefaultIfEmpty(0).Max();
    }

    /// <summary>The plot of a table; null if there is nothing to draw.</summary>
    public static ErrorPlot? Of(TableProof? proof)
    {
        ErrorPlot? plot = proof is null ? null : new ErrorPlot(proof);
        return plot is { _groups.Count: > 0 } ? plot : null;
    }

    /// <summary>Draws it.</summary>
    public void Write(MarkupWriter markup, string id)
    {
        PlotCanvas canvas = new(markup, id, "Distance of each entry from its true value", Description());
        PlotScale up = new(0, 0.5, PlotCanvas.Bottom - 5, Count(Verdict.Proven) == Total ? PlotCanvas.Top + 6 : PlotCanvas.Top + StripHeight);
        foreach ((double distance, string label) in new[] { (0, "0"), (0.125, "⅛"), (0.25, "¼"), (0.375, "⅜"), (0.5, "½") })
        {
            canvas.HorizontalTick(up.At(distance), label, distance == 0.5 ? "limit" : "grid");
        }

        if (Count(Verdict.Proven) < Total)
        {
            canvas.Text(PlotCanvas.Left - 8, PlotCanvas.Top + 14, "end", "failed");
        }

        canvas.Axes("entry, in the order of its member", "ulp");
        WriteGroups(canvas, up);
        canvas.End();
    }

    private int Total => _groups.Sum(group => group.Entries.Count);

    private int Count(Verdict verdict) => _groups.Sum(group => group.Entries.Count(entry => entry.Verdict == verdict));

    private string Description()
    {
        string names = string.Join(", ", _groups.Select(group => $"{group.Name} ({group.Entries.Count})"));
        string failed = Count(Verdict.Proven) == Total ? ""
            : $" {Counted.Of(Count(Verdict.Wrong), "entry is", "entries are")} wrong and {Count(Verdict.Unproven)} not proven; these stand above the line of ½ ulp.";
        return $"{Counted.Of(Total, "entry", "entries")} of {names}. The worst is at most {UlpText.Of(_worst)} ulp from its true value.{failed}";
    }

    private void WriteGroups(PlotCanvas canvas, PlotScale up)
    {
        const int inset = 10;
        const int width = PlotCanvas.Right - PlotCanvas.Left;
        double smallest = Math.Min(SmallestGroup, ((double)width / _groups.Count) - Gap);
        double free = width - (smallest * _groups.Count) - (Gap * (_groups.Count - 1));
        double start = PlotCanvas.Left;
        bool isFine = Total > 400;
        foreach ((string name, List<EntryProof> entries) in _groups)
        {
            double end = start + smallest + (free * entries.Count / Total);
            PlotScale across = new(0, entries.Count, start + inset, end - inset);
            List<(EntryProof Entry, double X)> places = [.. entries.Select((entry, index) => (entry, across.At(index + 0.5)))];
            IEnumerable<(double X, double Y)> Above(Verdict verdict) =>
                places.Where(place => place.Entry.Verdict == verdict).Select(place => (place.X, (double)PlotCanvas.Top + 10));
            canvas.Dots(
                isFine ? "dot fine" : "dot",
                places.Where(place => place.Entry.Verdict == Verdict.Proven).Select(place => (place.X, up.At(place.Entry.DistanceInUlp))));
            canvas.Crosses(Above(Verdict.Wrong));
            canvas.Diamonds(Above(Verdict.Unproven));
            canvas.Text((start + end) / 2, PlotCanvas.Bottom + 19, "middle", _groups.Count > MostCountedGroups ? name : $"{name} ({entries.Count})");
            start = end + Gap;
            if (start < PlotCanvas.Right)
            {
                canvas.Path("divider", $"M{Coordinate(start - (Gap / 2.0))} {PlotCanvas.Top}V{PlotCanvas.Bottom + 22}");
            }
        }
    }
}
