using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Emission;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Hermite;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;
using Convention = GaussGen.Mathematics.Rules.HermiteConvention;

namespace GaussGen.Generator.Tests.Pipeline;

/// <summary>The generated text depends on the declarations, and on nothing else.</summary>
public sealed class SameBytesTests
{
    private const string Usings = "using GaussGen;\n";

    private const double HalfStep = 1.0 / (1 << 26);

    private static readonly string[] Declarations =
    [
        "namespace Survey { [GaussHermite(7)] internal static partial class Echo { } }",
        "namespace Survey { [GaussHermite(31, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32)] internal partial struct Wave { } }",
        "namespace Survey.Bench { [NormalMoments(-0.1, 1e-3, MaximumOrder = 9)] internal static partial class Noise { } }",
        "[NormalMoments(double.NaN, -2.5)] internal static partial class Mistaken { }",
        "[GaussHermite(400)] internal static partial class Wide { }",
    ];

    [Theory]
    [InlineData("de-DE")]
    [InlineData("sv-SE")]
    [InlineData("fa-IR")]
    [InlineData("tr-TR")]
    public async Task In_any_culture(string name)
    {
        CultureInfo culture = CultureInfo.GetCultureInfo(name);
        Assert.NotEqual(
            (-0.5).ToString(CultureInfo.InvariantCulture) + "I".ToLower(CultureInfo.InvariantCulture),
            (-0.5).ToString(culture) + "I".ToLower(culture));

        ImmutableSortedDictionary<string, string> expected = Run(Declarations);
        string[] messages = await Messages(Declarations);
        Assert.Equal(5, expected.Count);
        Assert.Equal(3, messages.Length);

        // Flows into whatever threads the analyzer uses.
        CultureInfo.CurrentCulture = CultureInfo.CurrentUICulture = culture;
        Assert.Equal(expected, Run(Declarations));
        Assert.Equal(messages, await Messages(Declarations));
    }

    [Fact]
    public void On_repeated_runs() => Assert.Equal(Run(Declarations), Run(Declarations));

    [Fact]
    public void For_reordered_files()
    {
        Consumer consumer = new(Declarations.Select(text => Usings + text).ToArray());
        CSharpCompilation compilation = consumer.Compile();
        CSharpCompilation reordered = compilation.RemoveAllSyntaxTrees().AddSyntaxTrees(compilation.SyntaxTrees.Reverse());
        Assert.NotEqual(compilation.SyntaxTrees[0].FilePath, reordered.SyntaxTrees[0].FilePath);

        Assert.Equal(Run(Declarations), Consumer.Run(new TableGenerator(), reordered, consumer.ParseOptions).Texts);
    }

    [Fact]
    public void For_declarations_in_one_file_or_many() =>
        Assert.Equal(Run(Declarations), TextsOf(new Consumer(Usings + string.Join('\n', Declarations))));

    [Fact]
    public void For_an_attribute_on_any_part_of_a_type()
    {
        string plain = Run(["[GaussHermite(5)] internal static partial class Echo { internal const int A = 1; }"]).Single().Value;

        Assert.Equal(plain, Run(
        [
            "internal partial class Echo { internal const int A = 1; }",
            "static partial class Echo { }",
            "[GaussHermiteAttribute(points: 2 + 3, DropZeroWeights = false)] partial class Echo { }",
        ]).Single().Value);
    }

    [Fact]
    public void With_documentation_read_or_not()
    {
        Consumer consumer = new(Usings + "/** <summary>Own words.</summary> */ [GaussHermite(5)] static partial class Echo { }");

        Assert.Equal(
            (consumer with { Documentation = DocumentationMode.None }).Run().Text,
            (consumer with { Documentation = DocumentationMode.Diagnose }).Run().Text);
    }

    [Theory]
    [InlineData(3)]
    [InlineData(10)]
    [InlineData(64)]
    [InlineData(201)]
    [InlineData(640)]
    [InlineData(1000)]
    public void From_other_guesses_of_the_nodes(int points)
    {
        // A guess is in double arithmetic, which may differ from host to host; here it is off by half of what the proof starts from.
        double[] guesses = HermiteGuess.PositiveZeros(points, CancellationToken.None);
        double[] others = guesses.Select((guess, index) => guess + (index % 3 == 0 ? HalfStep : -HalfStep)).ToArray();

        foreach (Convention convention in Enum.GetValues<Convention>())
        {
            Assert.Equal(TextOf(points, convention, guesses), TextOf(points, convention, others));
        }
    }

    private static string TextOf(int points, Convention convention, double[] guesses)
    {
        RuleTable table = GaussHermite.Construct(points, convention, guesses, CancellationToken.None);
        RoundedRule rule = RuleRounding.Round(table, BinaryFormat.Binary64, dropZeroWeights: false, CancellationToken.None);
        TablePart part = RulePart.Of(rule, new TargetCapabilities(HasLanguage: true, KeepsSpansInImage: true));
        SourceWriter writer = new();
        writer.Remarks(part.Remarks.ToArray());
        foreach (GeneratedMember member in part.Members)
        {
            member.Write(writer);
        }

        return writer.ToString();
    }

    private static ImmutableSortedDictionary<string, string> Run(IEnumerable<string> declarations) =>
        TextsOf(new Consumer(declarations.Select(text => Usings + text).ToArray()));

    private static ImmutableSortedDictionary<string, string> TextsOf(Consumer consumer) => consumer.Run().Texts;

    private static async Task<string[]> Messages(IEnumerable<string> declarations)
    {
        Outcome outcome = new Consumer(declarations.Select(text => Usings + text).ToArray()).Run();
        ImmutableArray<Diagnostic> diagnostics = await outcome.AnalyzerDiagnostics();
        return diagnostics.Select(diagnostic => diagnostic.GetMessage(CultureInfo.InvariantCulture)).Order(StringComparer.Ordinal).ToArray();
    }
}
