using System.Text;
using System.Threading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Text;

namespace GaussGen.Generator.Tests.Support;

/// <summary>An additional file of a project, in memory.</summary>
internal sealed class MemoryText(string path, string text) : AdditionalText
{
    private readonly SourceText _text = SourceText.From(text, Encoding.UTF8);

    public override string Path { get; } = path;

    public override SourceText GetText(CancellationToken cancellationToken = default) => _text;
}
