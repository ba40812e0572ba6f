using System.Collections.Generic;
using System.Text;
using static GaussGen.Tool.Reports.Html.PlotNumbers;

namespace GaussGen.Tool.Reports.Html;

/// <summary>
/// A drawing inside the report. It has a title and a description for those who do not see it, and takes its colours from the style
/// sheet, so that it follows the light and the dark mode and paper. Marks of one kind are one path, however many they are.
/// </summary>
internal sealed class PlotCanvas
{
    /// <summary>The width in the drawing's own units.</summary>
    public const int Width = 720;

    /// <summary>The height.</summary>
    public const int Height = 270;

    /// <summary>Where the area for data begins and ends.</summary>
    public const int Left = 74, Right = Width - 12, Top = 12, Bottom = Height - 48;

    private readonly MarkupWriter _markup;

    /// <summary>Begins a drawing.</summary>
    public PlotCanvas(MarkupWriter markup, string id, string title, string description)
    {
        _markup = markup;
        markup.Begin(
            "svg", ("role", "img"), ("viewBox", $"0 0 {Width} {Height}"), ("aria-labelledby", $"{id}-title"), ("aria-describedby", $"{id}-text"));
        markup.Line("title", title, ("id", $"{id}-title"));
        markup.Line("desc", description, ("id", $"{id}-text"));
    }

    /// <summary>A horizontal line through the area, with its label at the left axis.</summary>
    public void HorizontalTick(double y, string label, string kind = "grid")
    {
        Path(kind, $"M{Left} {Coordinate(y)}H{Right}");
        Text(Left - 8, y + 4, "end", label);
    }

    /// <summary>A short line below the area, with its label.</summary>
    public void VerticalTick(double x, string label)
    {
        Path("axis", $"M{Coordinate(x)} {Bottom}v5");
        Text(x, Bottom + 19, "middle", label);
    }

    /// <summary>The two axes, and what they show.</summary>
    public void Axes(string horizontal, string vertical)
    {
        Path("axis", $"M{Left} {Top}V{Bottom}H{Right}");
        Text((Left + Right) / 2.0, Height - 8, "middle", horizontal, "name");
        const int middle = (Top + Bottom) / 2;
        _markup.Line("text", vertical, ("class", "name"), ("text-anchor", "middle"), ("transform", $"translate(16 {middle}) rotate(-90)"));
    }

    /// <summary>Text at a place.</summary>
    public void Text(double x, double y, string anchor, string text, string? kind = null)
    {
        (string, string)[] place = [("x", Coordinate(x)), ("y", Coordinate(y)), ("text-anchor", anchor)];
        _markup.Line("text", text, kind is null ? place : [.. place, ("class", kind)]);
    }

    /// <summary>Lines from one height to each point.</summary>
    public void Stems(string kind, double foot, IEnumerable<(double X, double Y)> points) =>
        Marks(kind, points, (path, x, y) => path.Append('M').Append(x).Append(' ').Append(y).Append('V').Append(Coordinate(foot)));

    /// <summary>Round dots: strokes of no length, which round ends make visible.</summary>
    public void Dots(string kind, IEnumerable<(double X, double Y)> points) =>
        Marks(kind, points, (path, x, y) => path.Append('M').Append(x).Append(' ').Append(y).Append("h0"));

    /// <summary>Crosses, for what is wrong.</summary>
    public void Crosses(IEnumerable<(double X, double Y)> points) =>
        Marks("cross", points, (path, x, y) => path.Append('M').Append(x).Append(' ').Append(y).Append("m-4-4l8 8m0-8l-8 8"));

    /// <summary>Empty squares on their corner, for what is not proven.</summary>
    public void Diamonds(IEnumerable<(double X, double Y)> points) =>
        Marks("diamond", points, (path, x, y) => path.Append('M').Append(x).Append(' ').Append(y).Append("m-5 0l5-5l5 5l-5 5z"));

    /// <summary>A line of any form.</summary>
    public void Path(string kind, string data)
    {
        _markup.Begin("path", ("class", kind), ("d", data));
        _markup.End();
    }

    /// <summary>Ends the drawing.</summary>
    public void End() => _markup.End();

    private void Marks(string kind, IEnumerable<(double X, double Y)> points, System.Action<StringBuilder, string, string> draw)
    {
        StringBuilder path = new();
        foreach ((double x, double y) in points)
        {
            draw(path, Coordinate(x), Coordinate(y));
        }

        if (path.Length > 0)
        {
            Path(kind, path.ToString());
        }
    }
}
