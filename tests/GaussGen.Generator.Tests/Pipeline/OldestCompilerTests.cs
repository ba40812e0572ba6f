using System;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Runtime.Loader;
using GaussGen.Generator.Tests.Support;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;

namespace GaussGen.Generator.Tests.Pipeline;

/// <summary>The generator in the oldest compiler that it is for, loaded beside the one that the other tests use.</summary>
public sealed class OldestCompilerTests
{
    private const string Source =
        """
        using GaussGen;

        namespace Survey
        {
            partial struct @event<T> { }

            partial struct @event
            {
                [GaussHermite(7), NormalMoments(0.5, 2)]
                internal static partial class Größe
                {
                    internal static double Of() => Expectation(1, 2, x => x * x) + Nodes[0] + Raw[1] + Central2;
                }
            }

            [GaussHalfRangeHermite(3, ErrorEstimate = true), LogNormalMoments(0, 0.5), HalfIntegerGamma(4), OscillatorMatrixElements(2, 2)]
            internal static partial class Roll
            {
                internal static double Of() => ExpectationWithError(2, x => x * x, out _) + Nodes[0] + Raw[1] + Gamma[2] + Reciprocal[0] + Elements[3];
            }

            [GaussEvenExponential(3, -2, 1)]
            internal static partial class Well
            {
                internal static double Of() => Expectation(x => x * x) / NormalizingIntegral;
            }

            [GaussHermite(0)]
            internal partial record Mistaken { }
        }
        """;

    [Fact]
    public void It_generates_and_reports_the_same()
    {
        using OldestCompiler old = new();

        Assert.Equal(["4.3.0.0"], old.Call<string[]>(nameof(CompilerVersion)));
        Assert.NotEqual(["4.3.0.0"], CompilerVersion());

        // That compiler would allocate an array at each call of a span property; so it gets the arrays that older frameworks get.
        Assert.Equal(Texts("netstandard2.0"), old.Call<string[]>(nameof(Texts), "netstandard2.0"));
        Assert.Equal(Texts("netstandard2.0"), old.Call<string[]>(nameof(Texts), "net8.0"));
        Assert.NotEqual(Texts("netstandard2.0"), Texts("net8.0"));
        Assert.Equal([], old.Call<string[]>(nameof(Errors), "net8.0"));
        Assert.Equal([], old.Call<string[]>(nameof(Errors), "netstandard2.0"));
        Assert.Equal(["GAUSS004: Ask for 1 to 1000 points instead of 0"], old.Call<string[]>(nameof(Mistakes)));
        Assert.Equal(Mistakes(), old.Call<string[]>(nameof(Mistakes)));
    }

    public static string[] CompilerVersion() => [typeof(CSharpCompilation).Assembly.GetName().Version!.ToString()];

    public static string[] Texts(string framework) => [.. Run(framework).Texts.Select(text => text.Key + "\n" + text.Value)];

    public static string[] Errors(string framework) => [.. Run(framework).CompilerDiagnostics.Select(diagnostic => diagnostic.ToString())];

    public static string[] Mistakes() => [.. Run("net8.0").AnalyzerDiagnosticsOrThrow().GetAwaiter().GetResult()
        .Select(diagnostic => diagnostic.Id + ": " + diagnostic.GetMessage(System.Globalization.CultureInfo.InvariantCulture))];

    private static Outcome Run(string framework) => new Consumer(Source)
    {
        LanguageVersion = LanguageVersion.CSharp10,
        Framework = framework == "net8.0" ? Framework.Net80 : Framework.NetStandard20,
    }.Run();

    /// <summary>A second copy of these tests and of the generator, bound to the old compiler.</summary>
    private sealed class OldestCompiler : AssemblyLoadContext, IDisposable
    {
        private static readonly string[] Copied = ["GaussGen.Generator", "GaussGen.Generator.Tests", "Basic.Reference.Assemblies.Net80"];

        public OldestCompiler()
            : base("oldest compiler", isCollectible: true)
        {
        }

        public T Call<T>(string method, params object[] arguments)
        {
            Assembly tests = LoadFromAssemblyName(typeof(OldestCompilerTests).Assembly.GetName());
            return (T)tests.GetType(typeof(OldestCompilerTests).FullName!, throwOnError: true)!.GetMethod(method)!.Invoke(null, arguments)!;
        }

        public void Dispose() => Unload();

        protected override Assembly? Load(AssemblyName assemblyName)
        {
            string old = Path.Combine(AppContext.BaseDirectory, "OldestRoslyn", assemblyName.Name + ".dll");
            if (File.Exists(old))
            {
                return LoadFromAssemblyPath(old);
            }

            return Copied.Contains(assemblyName.Name)
                ? LoadFromAssemblyPath(Path.Combine(AppContext.BaseDirectory, assemblyName.Name + ".dll"))
                : null;
        }
    }
}
