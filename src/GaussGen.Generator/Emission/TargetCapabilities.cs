using System;
using System.Linq;
using System.Threading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace GaussGen.Generator.Emission;

/// <summary>What the consumer's compiler and framework can do; every choice between forms of generated code is made here.</summary>
/// <param name="HasLanguage">Whether the language is C# 9 or later, which tables are written in.</param>
/// <param name="KeepsSpansInImage">
/// Whether <c>ReadOnlySpan&lt;double&gt; X => new double[] { … }</c> becomes data in the compiled file, read in place. It needs
/// RuntimeHelpers.CreateSpan and a compiler that knows it; without, such a property allocates an array at each call or once
/// at a moment that nobody chose, and a private static array is the better form.
/// </param>
internal sealed record TargetCapabilities(bool HasLanguage, bool KeepsSpansInImage)
{
    /// <summary>The oldest language version that tables are written in.</summary>
    public const LanguageVersion OldestLanguage = Microsoft.CodeAnalysis.CSharp.LanguageVersion.CSharp9;

    private static readonly Version OldestCompilerWithSpanData = new(4, 5);

    private static readonly Version RunningCompiler = typeof(CSharpCompilation).Assembly.GetName().Version ?? new Version(0, 0);

    public static TargetCapabilities Of(Compilation compilation, CancellationToken cancellation) => Of(compilation, RunningCompiler);

    /// <summary>The capabilities of a compilation under some version of the compiler.</summary>
    public static TargetCapabilities Of(Compilation compilation, Version compiler) => new(
        compilation is CSharpCompilation { LanguageVersion: >= OldestLanguage },
        compiler >= OldestCompilerWithSpanData && HasCreateSpan(compilation));

    private static bool HasCreateSpan(Compilation compilation) =>
        compilation.GetTypeByMetadataName("System.Runtime.CompilerServices.RuntimeHelpers") is { } helpers
        && helpers.GetMembers("CreateSpan").Any(member => member.DeclaredAccessibility == Accessibility.Public);
}
