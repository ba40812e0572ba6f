using System.Linq;
using Microsoft.CodeAnalysis.CSharp;

namespace GaussGen.Generator.Declarations;

/// <summary>Names in C# source.</summary>
internal static class Identifier
{
    // Words that mean something in newer versions of the language than the one that this is built against.
    private static readonly string[] NewerKeywords = { "allows", "extension", "field", "file", "required", "scoped" };

    /// <summary>The name as an identifier, with an @ before it if the language reads it as a word of its own.</summary>
    public static string Escape(string name) => IsKeyword(name) ? "@" + name : name;

    private static bool IsKeyword(string name) =>
        SyntaxFacts.GetKeywordKind(name) != SyntaxKind.None
        || SyntaxFacts.GetContextualKeywordKind(name) != SyntaxKind.None
        || NewerKeywords.Contains(name);
}
