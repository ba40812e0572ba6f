using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Types that cannot have a generated part: where it is told, and that nothing else is.</summary>
public sealed class HostTests
{
    [Fact]
    public Task A_type_that_is_not_partial_is_told_at_its_name() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static class {|GAUSS001:Echo|} { }
        """);

    [Fact]
    public Task A_containing_type_that_is_not_partial_is_told_at_its_name() => DeclarationTest.Report(
        """
        using GaussGen;

        internal class {|GAUSS001:Boat|}
        {
            internal partial struct Sonar
            {
                [NormalMoments(0, 1)]
                internal static partial class Noise { }
            }
        }
        """);

    [Fact]
    public Task A_containing_type_is_told_once_for_all_that_is_in_it() => DeclarationTest.Report(
        """
        using GaussGen;

        internal class {|GAUSS001:Boat|}
        {
            [GaussHermite(5)]
            internal static partial class Echo { }

            [NormalMoments(0, 1)]
            internal static partial class Noise { }
        }
        """);

    [Fact]
    public Task A_generic_type_is_told_at_its_type_parameters_and_its_members_are_there() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static partial class Echo{|GAUSS002:<T, @class>|} { }

        internal static class Use
        {
            internal static double Of() => Echo<int, long>.Expectation(1, 2, x => x) + Echo<int, long>.Nodes[0];
        }
        """);

    [Fact]
    public Task A_generic_containing_type_is_told_at_its_type_parameters() => DeclarationTest.Report(
        """
        using GaussGen;

        internal partial interface IBoat{|GAUSS002:<T>|}
        {
            [GaussHermite(5)]
            internal static partial class Echo { }
        }

        internal static class Use
        {
            internal const int Count = IBoat<string>.Echo.PointCount;
        }
        """);

    [Fact]
    public Task A_type_that_is_local_to_a_file_is_told_at_its_name() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        file static partial class {|GAUSS003:Echo|} { }
        """);

    [Fact]
    public Task Partial_on_some_parts_only_is_the_compilers_to_tell() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static partial class Echo { }

        internal static class {|CS0260:Echo|} { }

        internal static class Use
        {
            internal const int Count = Echo.PointCount;
        }
        """);

    [Theory]
    [InlineData("class")]
    [InlineData("static class")]
    [InlineData("abstract class")]
    [InlineData("sealed class")]
    [InlineData("struct")]
    [InlineData("readonly struct")]
    [InlineData("ref struct")]
    [InlineData("readonly ref struct")]
    [InlineData("record")]
    [InlineData("sealed record")]
    [InlineData("record struct")]
    [InlineData("readonly record struct")]
    public Task Every_kind_of_class_and_struct_can_have_a_table(string kind)
    {
        string header = kind.EndsWith("record struct", System.StringComparison.Ordinal)
            ? kind.Replace("record struct", "partial record struct", System.StringComparison.Ordinal)
            : kind.Insert(kind.LastIndexOf(' ') + 1, "partial ");
        return DeclarationTest.Report(
            $$"""
            using GaussGen;

            [GaussHermite(5), NormalMoments(0, 1)]
            internal {{header}} Echo { }

            internal static class Use
            {
                internal static double Of() => Echo.Expectation(1, 2, x => x) + Echo.Nodes[Echo.PointCount - 1] + Echo.Raw[2] + Echo.Absolute1;
            }
            """);
    }
}
