using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;
using Xunit.Abstractions;

namespace GaussGen.Generator.Tests.Fuzz;

/// <summary>Two thousand random changes of sources that compile, as half-finished edits are: no crash of generator or analyzer.</summary>
public sealed class MutationTests(ITestOutputHelper output)
{
    private const int Mutations = 2000;

    private static readonly string[] Sources =
    [
        """
        using System;
        using GaussGen;

        namespace Survey.Boat
        {
            public partial class Sonar<T> where T : class
            {
                [GaussHermite(5, Convention = HermiteConvention.Physicist)]
                private static partial class Echo { }
            }

            [NormalMoments(mean: 1.5, standardDeviation: 0.25, MaximumOrder = 8)]
            internal static partial class Wind { public const double Half = 0.5; }

            internal static class Use
            {
                internal static double Of() => Wind.Raw3 + Wind.Central[2];
            }
        }
        """,
        """
        using GaussGen;

        namespace Survey;

        public partial record struct Outer(int Nodes)
        {
            partial interface IInner
            {
                [GaussHermite(points: 3, Format = NumberFormat.Binary32, DropZeroWeights = true), NormalMoments(0, 1)]
                internal readonly ref partial struct @event
                {
                    public static double Expectation(double a, double b, Func<double, double> c) => a;
                    private int get_Weights() => 0;
                }
            }
        }

        file static partial class Hidden { }
        """,
        """
        [GaussGen.GaussHermite(2)]
        partial class Base { }

        [GaussGen.GaussHermite(4)]
        partial class Derived : Base { static double Weights => 1; }

        partial class Derived { enum Raw { } }

        [GaussGen.NormalMoments(-1e3, 1e-3, Format = GaussGen.NumberFormat.Binary32)]
        partial class Derived { }
        """,
    ];

    private static readonly string[] Fragments =
    [
        "[", "]", "(", ")", "{", "}", "<", ">", ",", ";", "=", ":", ".", "@", "\"", "'", "/*", "//", "#if", "#pragma", "partial", "static", "file", "class", "struct",
        "record", "interface", "namespace", "using", "global::", "GaussHermite", "NormalMoments", "GaussGen", "Convention", "Format", "0", "-1", "1001", "NaN", "null",
        "T", "where", "ref", "readonly", "Nodes", "Expectation", "Raw1", "[GaussHermite(5)]", "[NormalMoments(0, 1)]", "partial class Echo { }", "\0", "\uD800", "é", "\u200B",
    ];

    [Fact]
    public async Task A_broken_source_breaks_nothing_else()
    {
        output.WriteLine($"GAUSSGEN_SEED={FuzzSeed.Value}");
        Random random = new(FuzzSeed.Value);
        Consumer consumer = new(Sources);
        CSharpCompilation valid = consumer.Compile();
        GeneratorDriver driver = CSharpGeneratorDriver.Create([new TableGenerator().AsSourceGenerator()], parseOptions: consumer.ParseOptions);
        int files = 0;
        for (int i = 0; i < Mutations; i++)
        {
            SyntaxTree original = valid.SyntaxTrees[random.Next(Sources.Length)];
            string mutated = Mutate(original, random);
            CSharpCompilation compilation = valid.ReplaceSyntaxTree(original, consumer.Parse(mutated, original.FilePath));
            driver = driver.RunGeneratorsAndUpdateCompilation(compilation, out Compilation updated, out _);

            // In an editor the analyzer sees the generated parts too; that takes longer, and every fourth time is enough.
            Outcome outcome = new(driver.GetRunResult(), i % 4 == 0 ? (CSharpCompilation)updated : compilation, []);

            Assert.True(outcome.Result.Results.Single().Exception is null, $"{outcome.Result.Results.Single().Exception}\n{mutated}");
            try
            {
                _ = await outcome.AnalyzerDiagnosticsOrThrow();
            }
            catch (Exception exception)
            {
                Assert.Fail($"{exception}\n{mutated}");
            }

            files += outcome.Texts.Count;
        }

        // Most of the changes leave most of the declarations standing, so that there is something to break.
        output.WriteLine($"{files} files");
        Assert.True(files > 2 * Mutations);
    }

    private static string Mutate(SyntaxTree tree, Random random)
    {
        List<string> tokens = tree.GetRoot().DescendantTokens().Select(token => token.ToFullString()).ToList();
        for (int changes = random.Next(1, 4); changes > 0; changes--)
        {
            int at = random.Next(tokens.Count);
            switch (random.Next(7))
            {
                case 0:
                    tokens.RemoveAt(at);
                    break;
                case 1:
                    tokens.Insert(at, tokens[at]);
                    break;
                case 2:
                    int other = random.Next(tokens.Count);
                    (tokens[at], tokens[other]) = (tokens[other], tokens[at]);
                    break;
                case 3:
                    tokens[at] = Fragments[random.Next(Fragments.Length)] + " ";
                    break;
                case 4:
                    tokens.Insert(at, Fragments[random.Next(Fragments.Length)] + " ");
                    break;
                case 5:
                    tokens.RemoveRange(at, Math.Min(random.Next(1, 8), tokens.Count - at));
                    break;
                default:
                    int letter = random.Next(tokens[at].Length + 1);
                    tokens[at] = tokens[at].Insert(letter, ((char)random.Next(32, 127)).ToString());
                    break;
            }

            if (tokens.Count == 0)
            {
                tokens.Add(" ");
            }
        }

        return string.Concat(tokens);
    }
}
