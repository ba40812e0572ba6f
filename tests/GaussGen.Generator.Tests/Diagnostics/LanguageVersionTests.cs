using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Microsoft.CodeAnalysis.CSharp;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Projects whose language is too old: one report, however many declarations, and all uses of the members compile.</summary>
public sealed class LanguageVersionTests
{
    [Theory]
    [InlineData(LanguageVersion.CSharp5)]
    [InlineData(LanguageVersion.CSharp6)]
    [InlineData(LanguageVersion.CSharp7)]
    [InlineData(LanguageVersion.CSharp7_3)]
    [InlineData(LanguageVersion.CSharp8)]
    public Task Below_nine_is_told_once_at_the_first_declaration(LanguageVersion version) => DeclarationTest.Report(
        version,
        """
        using GaussGen;

        namespace Survey
        {
            internal partial class Boat
            {
                [{|GAUSS013:GaussHermite(5)|}]
                internal partial struct Echo { }

                [NormalMoments(0, 1)]
                internal static partial class Noise { }
            }

            internal static class Use
            {
                internal static double Of()
                {
                    return Boat.Echo.Expectation(1, 2, x => x) + Boat.Echo.Nodes[0] + Boat.Noise.Raw3 + First.PointCount + First.Integral(x => x);
                }
            }
        }
        """,
        """
        using GaussGen;

        namespace Survey
        {
            [GaussHermite(0, Convention = HermiteConvention.Physicist)]
            internal static partial class First { }
        }
        """);

    [Theory]
    [InlineData(LanguageVersion.CSharp9)]
    [InlineData(LanguageVersion.CSharp10)]
    [InlineData(LanguageVersion.CSharp11)]
    [InlineData(LanguageVersion.CSharp12)]
    [InlineData(LanguageVersion.Preview)]
    public Task From_nine_on_nothing_is_told(LanguageVersion version) => DeclarationTest.Report(
        version,
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static partial class Echo { }

        [NormalMoments(0, 1)]
        internal static partial class Noise { }
        """);
}
