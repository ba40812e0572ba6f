using System;
using System.Collections.Generic;
using System.Linq;
using System.Runtime.CompilerServices;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Requests;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Xunit;

namespace GaussGen.Generator.Tests.Pipeline;

/// <summary>An edit costs what it touches: nothing, if no declaration is touched.</summary>
[Collection(Alone.Name)]
public sealed class IncrementalTests
{
    private const string Declarations =
        """
        using GaussGen;

        namespace Survey
        {
            [GaussHermite(7)]
            internal static partial class Echo
            {
                internal static double Half => 0.5;
            }

            [NormalMoments(0.5, 2, MaximumOrder = 6)]
            internal static partial class Noise { }
        }
        """;

    private const string Other = "internal static class Log { internal static int Count() => 1; }";

    public static TheoryData<string, int, string, string> UnrelatedEdits => new()
    {
        { "another file", 1, "Count() => 1", "Count() => 2" },
        { "a new type in another file", 1, "internal static class Log", "internal class Chart { } internal static class Log" },
        { "a line before everything", 0, "using GaussGen;", "// survey\n\nusing GaussGen;" },
        { "documentation on the type", 0, "[GaussHermite(7)]", "/// <summary>Own words.</summary>\n[GaussHermite(7)]" },
        { "a body inside the type", 0, "Half => 0.5", "Half => 1.0 / 2" },
        { "a member inside the type", 0, "internal static double Half", "internal static int Two; internal static double Half" },
        { "the same number in other words", 0, "GaussHermite(7)", "GaussHermiteAttribute(points: 3 + 4)" },
        { "accessibility", 0, "internal static partial class Noise", "public static partial class Noise" },
        { "an attribute of another kind", 0, "[NormalMoments", "[System.Obsolete] [NormalMoments" },
    };

    [Theory]
    [MemberData(nameof(UnrelatedEdits))]
    public void An_unrelated_edit_leaves_every_step_and_constructs_nothing(string what, int file, string before, string after)
    {
        EditingSession session = new(new Consumer(Declarations, Other));
        long constructions = TableMemo.Constructions;
        object[] texts = TextsOf(session);

        session.Edit(file, text => text.Replace(before, after, StringComparison.Ordinal));

        Assert.All(EditingSession.StepNames, step =>
        {
            Assert.NotEmpty(session.ReasonsOf(step));
            Assert.All(session.ReasonsOf(step), reason => Assert.True(
                reason is IncrementalStepRunReason.Cached or IncrementalStepRunReason.Unchanged, $"{what}: {step} is {reason}"));
        });
        Assert.All(session.ReasonsOf(TrackingNames.Files), reason => Assert.Equal(IncrementalStepRunReason.Cached, reason));
        Assert.All(
            session.Result.TrackedOutputSteps.SelectMany(step => step.Value).SelectMany(run => run.Outputs),
            output => Assert.Equal(IncrementalStepRunReason.Cached, output.Reason));
        Assert.Equal(constructions, TableMemo.Constructions);
        Assert.Equal(texts, TextsOf(session), ReferenceEqualityComparer.Instance);
    }

    [Fact]
    public void A_baseline_leaves_every_step()
    {
        EditingSession session = new(new Consumer(Declarations, Other));
        object[] texts = TextsOf(session);

        session.Add(new MemoryText("gaussgen.baseline", "no baseline"));

        Assert.All(EditingSession.StepNames, step => Assert.All(
            session.ReasonsOf(step),
            reason => Assert.True(reason is IncrementalStepRunReason.Cached or IncrementalStepRunReason.Unchanged, $"{step} is {reason}")));
        Assert.Equal(texts, TextsOf(session), ReferenceEqualityComparer.Instance);
    }

    [Fact]
    public void A_changed_declaration_is_all_that_is_constructed()
    {
        EditingSession session = new(new Consumer(
            Declarations, "[GaussGen.GaussHermite(613)] internal static partial class Wide { }", Other));
        long constructions = TableMemo.Constructions;

        session.Edit(1, text => text.Replace("613", "614", StringComparison.Ordinal));

        Assert.Equal(constructions + 1, TableMemo.Constructions);
        Assert.Equal(
            [IncrementalStepRunReason.Modified, IncrementalStepRunReason.Cached, IncrementalStepRunReason.Cached],
            session.ReasonsOf(TrackingNames.Files).Order());
        Assert.DoesNotContain(session.ReasonsOf(TrackingNames.Target), reason => reason == IncrementalStepRunReason.Modified);
    }

    [Fact]
    public void Lists_in_declarations_are_compared_by_their_values()
    {
        const string Lists =
            """
            using GaussGen;

            [GaussNormalMixture(3, new[] { 0.75, 0.25 }, new[] { 4.0, 3 }, new[] { 0.5, 1 })]
            internal static partial class Quay { }

            [GaussEvenExponential(3, 0.0, 1)]
            internal static partial class Well { }

            [OscillatorMatrixElements(2, 3)]
            internal static partial class Spring { }
            """;
        EditingSession session = new(new Consumer(Lists, Other));
        long constructions = TableMemo.Constructions;
        object[] texts = TextsOf(session);

        session.Edit(0, text => text
            .Replace("new[] { 0.75, 0.25 }", "new double[] { 3 / 4.0, 0.25 }", StringComparison.Ordinal)
            .Replace("3, 0.0, 1", "3, new double[] { -0.0, 1 }", StringComparison.Ordinal));

        Assert.All(session.ReasonsOf(TrackingNames.Files), reason => Assert.Equal(IncrementalStepRunReason.Cached, reason));
        Assert.Equal(constructions, TableMemo.Constructions);
        Assert.Equal(texts, TextsOf(session), ReferenceEqualityComparer.Instance);

        session.Edit(0, text => text.Replace("new[] { 0.5, 1 }", "new[] { 0.5, 1.25 }", StringComparison.Ordinal));

        Assert.Equal(constructions + 1, TableMemo.Constructions);
        Assert.Equal(
            [IncrementalStepRunReason.Modified, IncrementalStepRunReason.Cached, IncrementalStepRunReason.Cached],
            session.ReasonsOf(TrackingNames.Files).Order());
        Assert.DoesNotContain(ObjectGraph.ReachableFrom(EditingSession.StepNames.SelectMany(session.ValuesOf)), IsOfACompilation);
    }

    [Theory]
    [InlineData("Half => 0.5", "Half => 0.5; internal static int Nodes")]
    [InlineData("static partial class Echo", "partial class Echo")]
    [InlineData("namespace Survey", "namespace Bench")]
    [InlineData("internal static partial class Echo", "internal static class Echo")]
    public void An_edit_that_matters_is_noticed(string before, string after)
    {
        EditingSession session = new(new Consumer(Declarations, Other));
        object[] texts = TextsOf(session);

        session.Edit(0, text => text.Replace(before, after, StringComparison.Ordinal));

        Assert.NotEqual(texts, TextsOf(session));
    }

    [Fact]
    public void Another_language_version_is_noticed_and_another_reference_is_not()
    {
        EditingSession session = new(new Consumer(Declarations));
        object[] texts = TextsOf(session);

        CSharpCompilation bench = CSharpCompilation.Create("Bench", references: Framework.Net80.References);
        session.Update(compilation => compilation.AddReferences(bench.ToMetadataReference()));
        Assert.All(session.ReasonsOf(TrackingNames.Target), reason => Assert.Equal(IncrementalStepRunReason.Unchanged, reason));
        Assert.Equal(texts, TextsOf(session), ReferenceEqualityComparer.Instance);

        session.Update(compilation => compilation.RemoveAllSyntaxTrees().AddSyntaxTrees(compilation.SyntaxTrees.Select(tree =>
            CSharpSyntaxTree.ParseText(tree.GetText(), new CSharpParseOptions(LanguageVersion.CSharp8), tree.FilePath))));
        Assert.All(session.ReasonsOf(TrackingNames.Target), reason => Assert.Equal(IncrementalStepRunReason.Modified, reason));
        Assert.NotEqual(texts, TextsOf(session));
    }

    [Fact]
    public void Steps_hold_no_symbol_node_or_location()
    {
        EditingSession session = new(new Consumer(Declarations, Other));
        IEnumerable<object> values = EditingSession.StepNames.SelectMany(session.ValuesOf);

        IReadOnlyCollection<object> reachable = ObjectGraph.ReachableFrom(values);

        Assert.Contains(reachable, item => item is TypeHeader);
        Assert.DoesNotContain(reachable, IsOfACompilation);
    }

    [Fact]
    public void The_walk_over_objects_finds_what_it_looks_for()
    {
        CSharpCompilation compilation = new Consumer(Declarations).Compile();
        SyntaxTree tree = compilation.SyntaxTrees[0];
        SyntaxNode node = tree.GetRoot().DescendantNodes().OfType<ClassDeclarationSyntax>().First();
        ISymbol symbol = compilation.GetSemanticModel(tree).GetDeclaredSymbol(node)!;

        foreach (object hidden in new object[] { node, symbol, node.GetLocation(), tree, compilation })
        {
            object inArray = new EquatableArray<(int, Holder)>([(1, new Holder(hidden))]);
            Assert.Contains(ObjectGraph.ReachableFrom([inArray]), IsOfACompilation);
        }
    }

    [Fact]
    public void An_old_compilation_can_be_collected()
    {
        EditingSession session = new(new Consumer(Declarations, Other));
        WeakReference old = session.Compilation;
        WeakReference tree = TreeOf(old);

        session.Edit(1, text => text + "// edited");
        session.Edit(0, text => text + "// edited");
        CollectGarbage();

        Assert.False(old.IsAlive);
        Assert.False(tree.IsAlive);
        GC.KeepAlive(session);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static WeakReference TreeOf(WeakReference compilation) => new(((CSharpCompilation)compilation.Target!).SyntaxTrees[0]);

    private static void CollectGarbage()
    {
        for (int i = 0; i < 3; i++)
        {
            GC.Collect();
            GC.WaitForPendingFinalizers();
        }
    }

    private static bool IsOfACompilation(object item) => item
        is ISymbol or SyntaxNode or SyntaxTree or Location or SyntaxReference or Compilation or SemanticModel or AttributeData;

    private static object[] TextsOf(EditingSession session) =>
        session.Result.GeneratedSources.Select(source => (object)source.SourceText).ToArray();

    private sealed record Holder(object Value);
}
