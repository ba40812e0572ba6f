using System;
using System.Linq;
using System.Reflection;
using System.Threading;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Generator.Tests.Emission;

/// <summary>Generated rules, compiled and run: the constants are the table's, bit for bit, and the sums are what they say.</summary>
public sealed class RuleExecutionTests
{
    private static readonly int[] PointCounts = [1, 2, 3, 4, 7, 20, 64, 171, 400];

    [Theory]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary64, true)]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary64, false)]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary32, true)]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary32, false)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary64, true)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary64, false)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary32, true)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary32, false)]
    public void A_rule_has_the_tables_bits(HermiteConvention convention, NumberFormat format, bool isNewFramework)
    {
        using LoadedAssembly loaded = Compile(convention, format, isNewFramework, string.Empty, PointCounts);
        foreach (int points in PointCounts)
        {
            RoundedRule expected = Expected(points, convention, format);
            Assert.Equal(points, loaded.Call<int>(Probe(points), "PointCount"));
            Assert.Equal((2 * points) - 1, loaded.Call<int>(Probe(points), "Degree"));
            Assert.Equal(expected.Nodes.Select(node => node.Bits), Bits.Of(loaded.Call<Array>(Probe(points), "Nodes")));
            Assert.Equal(expected.Weights.Select(weight => weight.Bits), Bits.Of(loaded.Call<Array>(Probe(points), "Weights")));
        }
    }

    [Theory]
    [InlineData(NumberFormat.Binary64)]
    [InlineData(NumberFormat.Binary32)]
    public void Left_out_nodes_are_left_out(NumberFormat format)
    {
        using LoadedAssembly loaded = Compile(HermiteConvention.Physicist, format, true, ", DropZeroWeights = true", 1000);
        RoundedRule whole = Expected(1000, HermiteConvention.Physicist, format);

        Assert.InRange(whole.ZeroWeights, 1, 999);
        Assert.Equal(1000 - whole.ZeroWeights, loaded.Call<int>(Probe(1000), "PointCount"));
        Assert.DoesNotContain(0UL, Bits.Of(loaded.Call<Array>(Probe(1000), "Weights")));
        Assert.Equal(
            whole.Nodes.Where((_, index) => whole.Weights[index].Bits != 0).Select(node => node.Bits),
            Bits.Of(loaded.Call<Array>(Probe(1000), "Nodes")));
    }

    [Theory]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary64, 1e-15)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary64, 1e-15)]
    [InlineData(HermiteConvention.Probabilist, NumberFormat.Binary32, 1e-6)]
    [InlineData(HermiteConvention.Physicist, NumberFormat.Binary32, 1e-6)]
    public void The_expectation_of_a_square_is_the_mean_squared_plus_the_variance(
        HermiteConvention convention, NumberFormat format, double tolerance)
    {
        int[] pointCounts = [2, 3, 16];
        using LoadedAssembly loaded = Compile(convention, format, true, string.Empty, pointCounts);
        foreach (int points in pointCounts)
        {
            foreach ((double mean, double deviation) in new[] { (0.0, 1.0), (1.5, 0.25), (-3.0, 2.0), (4.0, 0.0) })
            {
                double exact = (mean * mean) + (deviation * deviation);
                double ofFunction = Call("OfFunction", mean, deviation);
                Assert.InRange(ofFunction, exact * (1 - tolerance), exact * (1 + tolerance));
                Assert.Equal(ofFunction, Call("OfStruct", mean, deviation));
            }

            Assert.Equal(7.0, Call("OfConstantAtMean", 1.25));
            Assert.Throws<ArgumentNullException>(() => Call("OfNull"));
            foreach (double refused in new[] { -1.0, double.NaN, double.PositiveInfinity, -float.Epsilon })
            {
                Assert.Throws<ArgumentOutOfRangeException>(() => Call("OfFunction", 0.0, refused));
                Assert.Throws<ArgumentOutOfRangeException>(() => Call("OfStruct", 0.0, refused));
            }

            double Call(string method, params double[] arguments) => Convert.ToDouble(
                loaded.Call<object>(
                    Probe(points),
                    method,
                    arguments.Select(argument => format == NumberFormat.Binary32 ? (object)(float)argument : argument).ToArray()),
                null);
        }
    }

    [Fact]
    public void A_physicists_rule_integrates_over_its_weight_function()
    {
        Outcome outcome = new Consumer(
            """
            using GaussGen;

            [GaussHermite(12, Convention = HermiteConvention.Physicist)]
            internal static partial class Echo { }

            internal struct Square : IIntegrand<double>
            {
                public double Evaluate(double x) => x * x;
            }

            public static class Probe
            {
                public static double One() => Echo.Integral(x => 1);
                public static double OfSquare() => Echo.Integral(new Square());
            }
            """).Run();
        using LoadedAssembly loaded = new(outcome.Emit());

        double sqrtPi = Math.Sqrt(Math.PI);
        Assert.Equal(sqrtPi, loaded.Call<double>("Probe", "One"), 1e-15);
        Assert.Equal(sqrtPi / 2, loaded.Call<double>("Probe", "OfSquare"), 1e-15);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Data_is_in_the_image_where_the_target_can_and_in_private_arrays_elsewhere(bool isNewFramework)
    {
        using LoadedAssembly loaded = Compile(HermiteConvention.Probabilist, NumberFormat.Binary64, isNewFramework, string.Empty, 5);
        Type rule = loaded.Type("N5.Echo");
        FieldInfo[] fields = rule
            .GetFields(BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic)
            .Where(field => !field.IsLiteral)
            .ToArray();

        Assert.Equal(isNewFramework, rule.TypeInitializer is null);
        Assert.Equal(isNewFramework ? 0 : 2, fields.Length);
        Assert.All(fields, field => Assert.True(field.IsPrivate && field.IsInitOnly));
    }

    private static string Probe(int points) => $"N{points}.Probe";

    private static LoadedAssembly Compile(
        HermiteConvention convention, NumberFormat format, bool isNewFramework, string otherArguments, params int[] pointCounts) =>
        new(new Consumer(pointCounts.Select(points => Source(points, convention, format, otherArguments)).ToArray())
        {
            Framework = isNewFramework ? Framework.Net80 : Framework.NetStandard20,
        }.Run().Emit());

    private static string Source(int points, HermiteConvention convention, NumberFormat format, string otherArguments) =>
        $$"""
        using System;
        using GaussGen;
        using T = System.{{(format == NumberFormat.Binary32 ? "Single" : "Double")}};

        namespace N{{points}}
        {
            [GaussHermite({{points}}, Convention = HermiteConvention.{{convention}}, Format = NumberFormat.{{format}}{{otherArguments}})]
            internal static partial class Echo { }

            public struct Square : IIntegrand<T>
            {
                public T Evaluate(T x) => x * x;
            }

            public static class Probe
            {
                public static int PointCount() => Echo.PointCount;
                public static int Degree() => Echo.DegreeOfExactness;
                public static T[] Nodes() => Echo.Nodes.ToArray();
                public static T[] Weights() => Echo.Weights.ToArray();
                public static T OfFunction(T mean, T standardDeviation) => Echo.Expectation(mean, standardDeviation, x => x * x);
                public static T OfStruct(T mean, T standardDeviation) => Echo.Expectation(mean, standardDeviation, new Square());
                public static T OfConstantAtMean(T mean) => Echo.Expectation(mean, 0, x => x == mean ? 7 : throw new InvalidOperationException());
                public static T OfNull() => Echo.Expectation(0, 1, null!);
            }
        }
        """;

    private static RoundedRule Expected(int points, HermiteConvention convention, NumberFormat format) => TableMemo.Get(
        new GaussHermiteRequest(points, (Mathematics.Rules.HermiteConvention)(int)convention, Bits.FormatOf(format), false),
        CancellationToken.None);
}
