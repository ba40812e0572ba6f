using System;
using System.Linq;
using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;

namespace GaussGen.Generator.Tests.Emission;

/// <summary>Consumers that make life hard for generated code: it compiles without a warning in all of them.</summary>
public sealed class HostileConsumerTests
{
    /// <summary>C# 9, no usings but what is written, and names of the framework and the library for other things.</summary>
    private const string OwnNames =
        """
        [assembly: global::System.CLSCompliant(true)]

        namespace Acme.GaussGen
        {
            using HermiteConvention = global::GaussGen.HermiteConvention;
            using NumberFormat = global::GaussGen.NumberFormat;

            /// <summary>Not that one.</summary>
            public class System { }

            /// <summary>Not that one.</summary>
            public class GaussGen { }

            /// <summary>Not that one.</summary>
            public class Func<T, U> { }

            /// <summary>Not that one.</summary>
            public class ReadOnlySpan<T> { }

            /// <summary>Not that one.</summary>
            public interface IIntegrand<T> { }

            /// <summary>Not that one.</summary>
            public static class Require { }

            /// <summary>Not that one.</summary>
            public static class RuleEvaluation { }

            /// <summary>Not that one.</summary>
            public class GeneratedCodeAttribute { }

            /// <summary>Has a table.</summary>
            [global::GaussGen.GaussHermite(6)]
            [global::GaussGen.NormalMoments(0, 1)]
            public static partial class Echo
            {
                /// <summary>Not that one.</summary>
                public class System { }

                /// <summary>Not that one.</summary>
                public class GaussGen { }

                /// <summary>Not that one.</summary>
                public class @double { }

                /// <summary>Not that one.</summary>
                public static int TIntegrand => 0;

                /// <summary>Not that one.</summary>
                public static int mean => 0;

                /// <summary>Not that one.</summary>
                public static int scale => 0;

                private static double Of() => Expectation(1, 2, x => x * x) + Nodes[0] + Raw[1] + Raw1;
            }

            /// <summary>Has tables.</summary>
            [global::GaussGen.GaussHalfRangeHermite(3, ErrorEstimate = true)]
            [global::GaussGen.HalfIntegerGamma(3, Format = NumberFormat.Binary32)]
            [global::GaussGen.OscillatorMatrixElements(2, 3)]
            [global::GaussGen.LogNormalMoments(0, 0.5)]
            public static partial class Roll
            {
                /// <summary>Not that one.</summary>
                public class System { }

                /// <summary>Not that one.</summary>
                public static int scale => 0;

                private static int expectation => 0;

                /// <summary>Not that one.</summary>
                public static int companion => expectation;

                /// <summary>Not that one.</summary>
                public static int error => 0;

                private static double Of() => ExpectationWithError(2, x => x * x, out _) + CompanionNodes[0] + Raw[1] + Raw1 + Gamma[2] + Elements[3];
            }

            #pragma warning disable CS3016 // arrays in attributes
            [global::GaussGen.GaussEvenExponential(3, -2, 1, ErrorEstimate = true)]
            #pragma warning restore CS3016
            internal static partial class Well
            {
                /// <summary>Not that one.</summary>
                public class System { }

                private static double Of() => Expectation(x => x * x) + NormalizingIntegral;
            }

            /// <summary>Has tables inside.</summary>
            public partial interface IBoat
            {
                /// <summary>Has tables inside.</summary>
                public readonly partial struct @event
                {
                    /// <summary>Has a table.</summary>
                    [global::GaussGen.GaussHermite(5, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32)]
                    public sealed partial record @record { }

                    /// <summary>Has a table.</summary>
                    [global::GaussGen.NormalMoments(0.5, 0.1, Format = NumberFormat.Binary32, MaximumOrder = 12)]
                    public abstract partial class Größe水 { }

                    [global::GaussGen.GaussHermite(5)]
                    private ref partial struct @where { }
                }
            }
        }

        [global::GaussGen.GaussHermite(4)]
        internal sealed partial class Outside : global::System.Exception { }
        """;

    public static TheoryData<LanguageVersion, NullableContextOptions, bool> Settings
    {
        get
        {
            TheoryData<LanguageVersion, NullableContextOptions, bool> data = new();
            foreach (LanguageVersion version in Enum.GetValues<LanguageVersion>().Where(version => version >= LanguageVersion.CSharp9))
            {
                // The outermost versions in every context, those between in the two common ones.
                NullableContextOptions[] contexts = version is LanguageVersion.CSharp9 or LanguageVersion.Latest
                    ? Enum.GetValues<NullableContextOptions>()
                    : [NullableContextOptions.Disable, NullableContextOptions.Enable];
                foreach (NullableContextOptions context in contexts)
                {
                    data.Add(version, context, true);
                    data.Add(version, context, false);
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Settings))]
    public async Task Own_names_in_any_language_version_and_nullable_context(LanguageVersion version, NullableContextOptions nullable, bool isNewFramework)
    {
        Outcome outcome = new Consumer(OwnNames)
        {
            LanguageVersion = version,
            Nullable = nullable,
            Documentation = DocumentationMode.Diagnose,
            Framework = isNewFramework ? Framework.Net80 : Framework.NetStandard20,
        }.Run();

        Assert.Equal(11, outcome.Texts.Count);
        Assert.Empty(outcome.CompilerDiagnostics);
        Assert.Empty(await outcome.AnalyzerDiagnostics());
    }

    [Fact]
    public async Task Friends_that_both_have_tables_of_the_same_name()
    {
        const string Boat =
            """
            [assembly: System.Runtime.CompilerServices.InternalsVisibleTo("Bench")]

            namespace Survey
            {
                [GaussGen.GaussHermite(5)]
                internal static partial class Echo { }

                [GaussGen.GaussHermite(6)]
                internal partial class Wave { }
            }
            """;
        const string Bench =
            """
            namespace Calibration
            {
                using Survey;

                [GaussGen.GaussHermite(7)]
                internal static partial class Echo { }

                [GaussGen.NormalMoments(0, 1)]
                internal partial class Swell : Wave { }

                internal static class Use
                {
                    internal static double Of() => Echo.Nodes[0] + Survey.Echo.Nodes[0] + Swell.Nodes[0] + Swell.Raw2 + Echo.Expectation(0, 1, x => x);
                }
            }
            """;
        Outcome boat = new Consumer(Boat).Run();
        Outcome bench = new Consumer(Bench)
        {
            AssemblyName = "Bench",
            OtherReferences = [boat.Compilation.ToMetadataReference()],
        }.Run();
        Outcome fromImage = new Consumer(Bench)
        {
            AssemblyName = "Bench",
            OtherReferences = [MetadataReference.CreateFromImage(boat.Emit())],
        }.Run();

        foreach (Outcome outcome in new[] { boat, bench, fromImage })
        {
            Assert.Empty(outcome.CompilerDiagnostics);
            Assert.Empty(await outcome.AnalyzerDiagnostics());
        }

        Assert.Equal(bench.Texts, fromImage.Texts);
    }

    [Fact]
    public async Task A_hidden_rule_of_a_friend_is_told_like_one_in_the_same_project()
    {
        Outcome boat = new Consumer(
            """
            [assembly: System.Runtime.CompilerServices.InternalsVisibleTo("Bench")]
            [GaussGen.GaussHermite(6)]
            internal partial class Wave { }
            """).Run();
        Outcome bench = new Consumer("[GaussGen.GaussHermite(7)] internal partial class Swell : Wave { }")
        {
            AssemblyName = "Bench",
            OtherReferences = [MetadataReference.CreateFromImage(boat.Emit())],
        }.Run();

        Assert.Empty(bench.CompilerDiagnostics);
        Assert.Equal(["GAUSS006"], (await bench.AnalyzerDiagnostics()).Select(diagnostic => diagnostic.Id));
    }

    [Theory]
    [InlineData("using Rule = GaussGen.GaussHermiteAttribute; [Rule(5)] static partial class Echo { }")]
    [InlineData("using global::GaussGen; [GaussHermite(5)] static partial class Echo { }")]
    [InlineData("[global::GaussGen.GaussHermiteAttribute(5)] static partial class Echo { }")]
    [InlineData("[GaussGen.GaussHermite(5), System.Obsolete] static partial class Echo { }")]
    [InlineData("#pragma warning disable\n[GaussGen.GaussHermite(5)] static partial class Echo { }")]
    [InlineData("unsafe partial class A { [GaussGen.GaussHermite(5)] partial class Echo { } }")]
    [InlineData("partial class A { protected internal partial class B { [GaussGen.GaussHermite(5)] private partial struct Echo { } } }")]
    [InlineData("partial record A(int X) { [GaussGen.GaussHermite(5)] private partial record struct Echo(int Y); }")]
    [InlineData("partial class A<T> { } partial class A { [GaussGen.GaussHermite(5)] partial class Echo { } }")]
    [InlineData("namespace A.B.C; [GaussGen.GaussHermite(5)] partial class Echo(int nodes) { int N => nodes; }")]
    [InlineData("class Base<T> { } [GaussGen.GaussHermite(5)] partial class Echo : Base<Echo> { }")]
    [InlineData("[GaussGen.GaussHermite(5)] partial class Echo { static Echo() { } }")]
    [InlineData("interface INodes { double[] Nodes { get; } } [GaussGen.GaussHermite(5)] partial class Echo : INodes { double[] INodes.Nodes => null!; }")]
    public async Task Attributes_and_types_of_every_shape(string source)
    {
        Consumer consumer = new(source) { AllowUnsafe = true };

        Outcome outcome = consumer.Run();

        Assert.Contains("PointCount = 5", outcome.Text, StringComparison.Ordinal);
        Assert.Empty(outcome.CompilerDiagnostics);
        Assert.Empty(await outcome.AnalyzerDiagnostics());
    }

    [Theory]
    [InlineData("[GaussHermite(5)] static partial class Echo { } sealed class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int n) { } }")]
    [InlineData("namespace Own { [GaussHermite(5)] static partial class Echo { } sealed class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int n) { } } }")]
    [InlineData("[Own.GaussGen.GaussHermite(5)] static partial class Echo { } namespace Own.GaussGen { sealed class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int n) { } } }")]
    [InlineData("[Own.GaussHermite(5)] static partial class Echo { } partial class Own { public sealed class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int n) { } } }")]
    public async Task Attributes_of_the_same_name_from_elsewhere_mean_nothing(string source)
    {
        Outcome outcome = new Consumer(source).Run();

        Assert.Empty(outcome.Texts);
        Assert.Empty(outcome.CompilerDiagnostics);
        Assert.Empty(await outcome.AnalyzerDiagnostics());
    }
}
