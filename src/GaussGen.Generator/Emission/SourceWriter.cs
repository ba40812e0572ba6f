using System;
using System.Text;

namespace GaussGen.Generator.Emission;

/// <summary>Text with indentation. Lines end with '\n' on every host, and an empty line has no spaces.</summary>
internal sealed class SourceWriter
{
    private const int SpacesPerLevel = 4;

    private readonly StringBuilder _text = new();
    private int _level;

    /// <summary>The column at which the next line begins, from 0.</summary>
    public int Column => _level * SpacesPerLevel;

    public void Line(string text = "")
    {
        if (text.Length > 0)
        {
            _ = _text.Append(' ', Column).Append(text);
        }

        _ = _text.Append('\n');
    }

    /// <summary>Writes an opening brace; what is written until the result is disposed stands inside.</summary>
    /// <param name="closing">What ends the block.</param>
    public IDisposable Block(string closing = "}")
    {
        Line("{");
        _level++;
        return new Closing(this, closing);
    }

    /// <summary>The text, once every block is closed.</summary>
    public override string ToString() =>
        _level == 0 ? _text.ToString() : throw new InvalidOperationException("A block of generated code was left open.");

    private sealed class Closing(SourceWriter writer, string text) : IDisposable
    {
        public void Dispose()
        {
            writer._level--;
            writer.Line(text);
        }
    }
}
