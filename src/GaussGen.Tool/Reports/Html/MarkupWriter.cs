using System;
using System.Collections.Frozen;
using System.IO;
using System.Text;
using System.Xml;
using GaussGen.Tool.Output;

namespace GaussGen.Tool.Reports.Html;

/// <summary>
/// Writes a document that is HTML and well-formed XML at once. All text and every attribute passes through here and is escaped, and
/// made fit for one line: what an assembly calls its types is nothing to trust.
/// </summary>
internal sealed class MarkupWriter : IDisposable
{
    private const string VectorGraphics = "http://www.w3.org/2000/svg";

    // Elements that a reader of the source looks for at the beginning of a line. White space around them means nothing.
    private static readonly FrozenSet<string> OnOwnLine = new[]
    {
        "html", "head", "meta", "title", "style", "body", "header", "nav", "main", "section", "h1", "h2", "h3", "p", "ul", "li", "dl", "dt",
        "div", "table", "thead", "tbody", "tr", "details", "figure", "figcaption", "svg", "desc", "path", "text",
    }.ToFrozenSet(StringComparer.Ordinal);

    private readonly XmlWriter _xml;
    private int _depth;
    private int _graphicsDepth;

    /// <summary>Opens a document; its type is written at once.</summary>
    public MarkupWriter(Stream stream)
    {
        XmlWriterSettings settings = new()
        {
            Encoding = new UTF8Encoding(false),
            NewLineChars = "\n",
            OmitXmlDeclaration = true,
            CloseOutput = false,
        };
        _xml = XmlWriter.Create(stream, settings);
        _xml.WriteDocType("html", null, null, null);
    }

    /// <summary>Begins an element with its attributes.</summary>
    public void Begin(string name, params (string Name, string Value)[] attributes)
    {
        _depth++;
        if (OnOwnLine.Contains(name))
        {
            _xml.WriteWhitespace("\n");
        }

        if (name == "svg")
        {
            _graphicsDepth = _depth;
        }

        _xml.WriteStartElement(name, _graphicsDepth > 0 ? VectorGraphics : "");
        foreach ((string attribute, string value) in attributes)
        {
            // The data of a path is numbers of our own, and long.
            _xml.WriteAttributeString(attribute, attribute == "d" ? value : PlainText.OneLine(value));
        }
    }

    /// <summary>Ends the innermost element, with an end tag: HTML takes "&lt;div/&gt;" for a beginning.</summary>
    public void End()
    {
        _xml.WriteFullEndElement();
        if (_depth == _graphicsDepth)
        {
            _graphicsDepth = 0;
        }

        _depth--;
    }

    /// <summary>Writes an element of the kind that never has content or an end tag.</summary>
    public void Void(string name, params (string Name, string Value)[] attributes)
    {
        Begin(name, attributes);
        _xml.WriteEndElement();
        _depth--;
    }

    /// <summary>Writes an element that holds text only.</summary>
    public void Line(string name, string text, params (string Name, string Value)[] attributes)
    {
        Begin(name, attributes);
        Text(text);
        End();
    }

    /// <summary>Writes text.</summary>
    public void Text(string text) => _xml.WriteString(PlainText.OneLine(text));

    /// <summary>Writes a style sheet of our own as it is; it must not contain "&lt;" or "&amp;".</summary>
    public void Style(string sheet)
    {
        Begin("style");
        _xml.WriteRaw("\n" + sheet.ReplaceLineEndings("\n"));
        End();
    }

    /// <inheritdoc/>
    public void Dispose() => _xml.Dispose();
}
