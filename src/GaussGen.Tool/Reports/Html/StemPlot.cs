using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using static GaussGen.Tool.Reports.Html.PlotNumbers;

namespace GaussGen.Tool.Reports.Html;

/// <summary>
/// A rule as it was found: a stem at each node, as high as its weight. Weights that span more than a few powers of ten are drawn
/// on a logarithmic scale, on which a zero has no place: such nodes are marked on the axis.
/// </summary>
internal sealed class StemPlot
{
    // Beyond this ratio the smaller weights could not be told from zero.
    private const double LargestLinearRatio = 500;
    private const int ManyNodes = 120;

    private readonly List<(double Node, double Weight, bool IsProven)> _pairs = [];

    private readonly bool _isLogarithmic;

    private StemPlot(TableProof proof)
    {
        Dictionary<int, EntryProof> weights = Entries(proof, "Weights");
        foreach ((int index, EntryProof node) in Entries(proof, "Nodes").OrderBy(pair => pair.Key))
        {
            if (weights.TryGetValue(index, out EntryProof? weight))
            {
                bool isProven = node.Verdict == Verdict.Proven && weight.Verdict == Verdict.Proven;
                _pairs.Add((Value(node.Found, proof.Claim.Format), Value(weight.Found, proof.Claim.Format), isProven));
            }
        }

        Undrawn = _pairs.RemoveAll(pair => !double.IsFinite(pair.Node) || !double.IsFinite(pair.Weight));
        _isLogarithmic = _pairs.Count > 0 && _pairs.All(pair => pair.Weight >= 0) && Largest > 0 && Largest / LargestLinearRatio > SmallestAboveZero;
    }

    /// <summary>How many pairs are not numbers that a plot can show.</summary>
    public int Undrawn { get; }

    /// <summary>How many weights stand on the axis, because a logarithmic scale has no place for zero.</summary>
    public int OnAxis => _isLogarithmic ? ZeroCount : 0;

    /// <summary>The plot of a table; null if it is no rule or has nothing to draw.</summary>
    public static StemPlot? Of(TableProof? proof)
    {
        StemPlot? plot = proof is null ? null : new StemPlot(proof);
        return plot is { _pairs.Count: > 0 } ? plot : null;
    }

    /// <summary>Draws it.</summary>
    public void Write(MarkupWriter markup, string id)
    {
        PlotCanvas canvas = new(markup, id, "Nodes and weights", Description());
        PlotScale across = Across();
        foreach (double tick in Ticks(across.Low, across.High, 8))
        {
            canvas.VerticalTick(across.At(tick), Label(tick));
        }

        (Func<double, double> height, double foot) = _isLogarithmic ? LogarithmicHeights(canvas) : LinearHeights(canvas);
        canvas.Axes("node", _isLogarithmic ? "weight (logarithmic)" : "weight");
        bool IsOnAxis(double weight) => _isLogarithmic && weight == 0;
        List<(double X, double Y, bool IsProven, bool IsZero)> places =
            [.. _pairs.Select(pair => (across.At(pair.Node), IsOnAxis(pair.Weight) ? foot : height(pair.Weight), pair.IsProven, IsOnAxis(pair.Weight)))];
        canvas.Stems(_pairs.Count > ManyNodes ? "stem fine" : "stem", foot, places.Where(place => !place.IsZero).Select(Point));
        canvas.Dots("zero", places.Where(place => place.IsZero && place.IsProven).Select(Point));
        canvas.Dots(_pairs.Count > ManyNodes ? "dot fine" : "dot", places.Where(place => !place.IsZero && place.IsProven).Select(Point));
        canvas.Crosses(places.Where(place => !place.IsProven).Select(Point));
        canvas.End();
    }

    private static (double X, double Y) Point((double X, double Y, bool IsProven, bool IsZero) place) => (place.X, place.Y);

    private static Dictionary<int, EntryProof> Entries(TableProof proof, string member) =>
        proof.Entries.Where(entry => entry.Member == member && entry.Index is not null).ToDictionary(entry => entry.Index!.Value);

    private double SmallestAboveZero => _pairs.Where(pair => pair.Weight > 0).Select(pair => pair.Weight).DefaultIfEmpty(1).Min();

    private double Largest => _pairs.Max(pair => pair.Weight);

    private int ZeroCount => _pairs.Count(pair => pair.Weight == 0);

    /// <summary>What a person who does not see the plot is told.</summary>
    private string Description()
    {
        string scale = _isLogarithmic ? "on a logarithmic scale" : "on a linear scale";
        string zeros = ZeroCount == 0 ? "" : $" {Counted.Of(ZeroCount, "weight is", "weights are")} zero{(_isLogarithmic ? " and marked on the axis" : "")}.";
        int below = _pairs.Count(pair => pair.Weight < 0);
        zeros += below == 0 ? "" : $" {Counted.Of(below, "weight is", "weights are")} below zero.";
        return $"{Counted.Of(_pairs.Count, "node", "nodes")} from {Label(_pairs.Min(pair => pair.Node))} to {Label(_pairs.Max(pair => pair.Node))}; "
            + (Largest > 0 ? $"weights above zero from {Label(SmallestAboveZero)} to {Label(Largest)}, {scale}.{zeros}" : "no weight is above zero.");
    }

    private PlotScale Across()
    {
        const int inset = 14;
        double low = _pairs.Min(pair => pair.Node);
        double high = _pairs.Max(pair => pair.Node);
        return low < high
            ? new PlotScale(low, high, PlotCanvas.Left + inset, PlotCanvas.Right - inset)
            : new PlotScale(low - 1, low + 1, PlotCanvas.Left + inset, PlotCanvas.Right - inset);
    }

    private (Func<double, double> Height, double Foot) LinearHeights(PlotCanvas canvas)
    {
        double low = Math.Min(0, _pairs.Min(pair => pair.Weight));
        double high = Math.Max(0, Largest);
        PlotScale up = new(low, high > low ? high : low + 1, PlotCanvas.Bottom, PlotCanvas.Top + 6);
        foreach (double tick in Ticks(up.Low, up.High, 4))
        {
            canvas.HorizontalTick(up.At(tick), Label(tick));
        }

        return (up.At, up.At(0));
    }

    private (Func<double, double> Height, double Foot) LogarithmicHeights(PlotCanvas canvas)
    {
        int low = (int)Math.Floor(Math.Log10(SmallestAboveZero));
        int high = (int)Math.Ceiling(Math.Log10(Largest));
        PlotScale up = new(low, high, PlotCanvas.Bottom - 5, PlotCanvas.Top + 6);
        foreach (double power in Ticks(low, high, 5).Where(power => power == Math.Round(power)))
        {
            canvas.HorizontalTick(up.At(power), PowerOfTen((int)power));
        }

        return (weight => up.At(Math.Log10(weight)), PlotCanvas.Bottom);
    }
}
