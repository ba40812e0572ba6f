using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;

namespace GaussGen.Tool.Plots;

/// <summary>A stem plot in letters: a stem at each abscissa, as high as its value.</summary>
/// <param name="Points">Abscissas, and the values above them; only finite values above zero have a stem.</param>
/// <param name="Width">The width in letters, labels included.</param>
/// <param name="Height">The height in lines, without axis and labels.</param>
internal sealed record TerminalStemPlot(IReadOnlyList<(double X, double Y)> Points, int Width, int Height)
{
    /// <summary>From this ratio of the largest to the smallest value on, small ones can be told apart on a logarithmic scale only.</summary>
    private const double LogarithmicFrom = 50;

    private const int LabelWidth = 9;

    private readonly double[] _values = [.. Points.Select(point => point.Y).Where(IsShown)];

    /// <summary>Whether the scale of the values is logarithmic.</summary>
    public bool IsLogarithmic => _values.Length > 0 && _values.Max() / _values.Min() >= LogarithmicFrom;

    /// <summary>The lines of the plot, in plain ASCII if nothing else can be shown; none if no value can be.</summary>
    public IReadOnlyList<string> Draw(bool isUnicode)
    {
        if (_values.Length == 0)
        {
            return [];
        }

        Letters letters = isUnicode ? Letters.Unicode : Letters.Ascii;
        double top = Scale(_values.Max());
        double bottom = IsLogarithmic ? Math.Floor(Scale(_values.Min())) : 0;
        double left = Points.Min(point => point.X);
        double right = Points.Max(point => point.X);
        int columns = Width - LabelWidth - 2;
        int?[] heads = Heads(columns, left, right, bottom, top);

        List<string> lines = [];
        for (int row = Height - 1; row >= 0; row--)
        {
            bool isLabelled = row == Height - 1 || row == 0 || row == Height / 2;
            string label = isLabelled ? Label(bottom + ((top - bottom) * (row / (Height - 1.0)))) : "";
            string stems = string.Concat(heads.Select(head => head == row ? letters.Head : head > row ? letters.Stem : ' '));
            lines.Add($"{label.PadLeft(LabelWidth)} {(isLabelled ? letters.Tick : letters.Side)}{stems}".TrimEnd());
        }

        lines.Add(new string(' ', LabelWidth + 1) + letters.Corner + string.Concat(heads.Select(head => head is null ? letters.Base : letters.Foot)));
        lines.Add(Abscissas(left, right, columns));
        return lines;
    }

    /// <summary>By column: the row of the highest head, −1 for an abscissa without a stem, null where there is no abscissa.</summary>
    private int?[] Heads(int columns, double left, double right, double bottom, double top)
    {
        int?[] heads = new int?[columns];
        foreach ((double x, double y) in Points)
        {
            // Halves, for the width between two numbers may be no number any more.
            int column = right > left ? (int)Math.Round(((x / 2) - (left / 2)) / ((right / 2) - (left / 2)) * (columns - 1)) : columns / 2;
            int row = !IsShown(y) ? -1 : top > bottom ? (int)Math.Round((Scale(y) - bottom) / (top - bottom) * (Height - 1)) : Height - 1;
            heads[column] = Math.Max(heads[column] ?? -1, row);
        }

        return heads;
    }

    private static bool IsShown(double value) => value > 0 && double.IsFinite(value);

    private double Scale(double value) => IsLogarithmic ? Math.Log10(value) : value;

    private string Label(double scaled) => IsLogarithmic
        ? Math.Pow(10, scaled).ToString("0.0E+0", CultureInfo.InvariantCulture)
        : scaled.ToString("G3", CultureInfo.InvariantCulture);

    private static string Abscissas(double left, double right, int columns)
    {
        string first = left.ToString("G3", CultureInfo.InvariantCulture);
        string last = right.ToString("G3", CultureInfo.InvariantCulture);
        string indent = new(' ', LabelWidth + 2);
        return right > left
            ? indent + first + last.PadLeft(columns - first.Length)
            : indent + first.PadLeft((columns / 2) + first.Length);
    }

    private sealed record Letters(char Head, char Stem, char Side, char Tick, char Corner, char Base, char Foot)
    {
        public static Letters Unicode { get; } = new('●', '│', '│', '┤', '└', '─', '┴');

        public static Letters Ascii { get; } = new('o', '|', '|', '+', '+', '-', '+');
    }
}
