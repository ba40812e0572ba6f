using System.Threading.Tasks;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Names of generated members that are taken: told at what takes them.</summary>
public sealed class NameTests
{
    [Theory]
    [InlineData("private static int {|GAUSS006:Nodes|};")]
    [InlineData("private const int {|GAUSS006:PointCount|} = 3;")]
    [InlineData("private int {|GAUSS006:Weights|} => 3;")]
    [InlineData("private enum {|GAUSS006:DegreeOfExactness|} { }")]
    [InlineData("private event System.Action {|GAUSS006:Expectation|} { add { } remove { } }")]
    [InlineData("private static int {|GAUSS006:get_Nodes|}() => 0;")]
    [InlineData("private static double {|GAUSS006:Expectation|}(double a, double b, System.Func<double, double> c) => a;")]
    [InlineData("private static void {|GAUSS006:Expectation|}<T>(double a, double b, T c) { }")]
    [InlineData("private static int {|GAUSS006:Nodes|}, {|GAUSS006:Weights|};")]
    public Task A_member_of_the_type(string member) => DeclarationTest.Report(
        $$"""
        #pragma warning disable CS0169 // an unused field
        using GaussGen;

        [GaussHermite(5)]
        internal partial class Echo
        {
            {{member}}
        }
        """);

    [Theory]
    [InlineData("internal static double Integral => 1;")]
    [InlineData("internal static double Raw => 1;")]
    [InlineData("internal static double Expectation(double range) => range;")]
    [InlineData("internal static double Expectation(double a, float b, System.Func<double, double> c) => Expectation(a, (double)b, c);")]
    [InlineData("internal static double Expectation(in double a, double b, System.Func<double, double> c) => b;")]
    [InlineData("internal static double Expectation<T>(double a, double b, System.Func<double, T> c) => b;")]
    [InlineData("internal static double Nodes_ => Nodes[0];")]
    public Task Names_and_overloads_that_leave_room(string member) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [GaussHermite(5)]
        internal partial class Echo
        {
            {{member}}
        }

        internal static class Use
        {
            internal static double Of() => Echo.Expectation(1.0, 2.0, x => x) + Echo.Nodes[0];
        }
        """);

    [Theory]
    [InlineData("GaussHalfRangeHermite(3)", "private static double {|GAUSS006:Expectation|}(double scale, System.Func<double, double> f) => scale;")]
    [InlineData("GaussHalfRangeHermite(3)", "private static double Expectation(double a, double b, System.Func<double, double> c) => Expectation(b, c);")]
    [InlineData("GaussHalfRangeHermite(3)", "internal static double NormalizingIntegral => 1;")]
    [InlineData("GaussTruncatedNormal(3, 0, 1)", "private static double {|GAUSS006:Expectation|}<T>(T f) => 1;")]
    [InlineData("GaussEvenExponential(3, 1)", "private static double {|GAUSS006:NormalizingIntegral|}() => 1;")]
    [InlineData("HalfIntegerGamma(3)", "private static double {|GAUSS006:Gamma|}(double x) => x;")]
    [InlineData("HalfIntegerGamma(3)", "internal static double Elements => 1;")]
    [InlineData("OscillatorMatrixElements(3, 2)", "private static int {|GAUSS006:get_Elements|}() => 0;")]
    [InlineData("OscillatorMatrixElements(3, 2)", "internal static double Gamma => 1;")]
    public Task A_member_of_a_type_with_another_table(string attribute, string member) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [{{attribute}}]
        internal static partial class Echo
        {
            {{member}}
        }
        """);

    [Theory]
    [InlineData("GaussHalfRangeHermite(3), NormalMoments(0, 1), HalfIntegerGamma(2), OscillatorMatrixElements(2, 2)")]
    [InlineData("GaussHermite(3), {|GAUSS005:GaussHalfRangeHermite(3)|}")]
    [InlineData("GaussEvenExponential(3, 1), {|GAUSS005:GaussTruncatedNormal(3, 0, 1)|}, {|GAUSS005:GaussHermite(3)|}")]
    [InlineData("GaussEvenExponential(3, 1), EvenExponentialMoments(1)")]
    [InlineData("LogNormalMoments(0, 1), {|GAUSS005:NormalMoments(0, 1)|}")]
    public Task Tables_beside_each_other(string attributes) => DeclarationTest.Report(
        $$"""
        using GaussGen;

        [{{attributes}}]
        internal static partial class Echo
        {
        }
        """);

    [Fact]
    public Task A_type_that_inherits_from_one_with_lists() => DeclarationTest.Report(
        """
        using GaussGen;

        [HalfIntegerGamma(3)]
        internal partial class Bench
        {
        }

        [OscillatorMatrixElements(2, 2)]
        internal partial class Spring : Bench
        {
            internal static double Of() => Gamma[0] + Elements[0];
        }

        [{|GAUSS006:HalfIntegerGamma(2)|}]
        internal partial class Second : Bench
        {
        }
        """);

    [Fact]
    public Task An_integral_is_in_the_way_where_a_rule_has_one() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5, Convention = HermiteConvention.Physicist)]
        internal static partial class Echo
        {
            internal static double {|GAUSS006:Integral|} => 1;
        }
        """);

    [Fact]
    public Task A_member_on_another_part_of_the_type() => DeclarationTest.Report(
        """
        using GaussGen;

        [NormalMoments(0, 1, MaximumOrder = 12)]
        internal static partial class Noise { }
        """,
        """
        internal static partial class Noise
        {
            internal const int {|GAUSS006:Central12|} = 0;
            internal const int Central13 = 0;
        }
        """);

    [Fact]
    public Task A_positional_parameter_of_a_record() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal sealed partial record Echo(double[] {|GAUSS006:Nodes|});
        """);

    [Fact]
    public Task A_parameter_of_a_class_leaves_room() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal sealed partial class Echo(double[] Nodes)
        {
            internal int Length { get; } = Nodes.Length;
        }
        """);

    [Fact]
    public Task The_name_of_the_type_itself() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(5)]
        internal static partial class {|GAUSS006:Weights|} { }

        internal static class Use
        {
            internal static double Of() => Weights.Nodes[0];
        }
        """);

    [Fact]
    public Task An_inherited_member_is_told_once_at_the_attribute() => DeclarationTest.Report(
        """
        using GaussGen;

        internal class Instrument
        {
            protected int Nodes = 1;
            internal int Weights { get; }
            private int PointCount => 0;
        }

        [{|GAUSS006:GaussHermite(5)|}]
        internal partial class Echo : Instrument { }

        internal static class Use
        {
            internal static double Of() => Echo.PointCount + Echo.Expectation(1.0, 2.0, x => x);
        }
        """);

    [Fact]
    public Task A_rule_on_a_base_type_is_told_once_at_the_attribute() => DeclarationTest.Report(
        """
        using GaussGen;

        [GaussHermite(3)]
        internal partial class Instrument { }

        internal class Sonar : Instrument { }

        [{|GAUSS006:GaussHermite(5)|}]
        internal partial class Echo : Sonar { }

        internal static class Use
        {
            internal static double Of() => Echo.PointCount + Echo.Nodes[0] + Echo.Expectation(1.0, 2.0, x => x);
        }
        """);

    [Fact]
    public Task Moments_on_a_base_type_leave_room_for_a_rule() => DeclarationTest.Report(
        """
        using GaussGen;

        [NormalMoments(0, 1)]
        internal partial class Instrument { }

        [GaussHermite(5)]
        internal partial class Echo : Instrument { }
        """);
}
