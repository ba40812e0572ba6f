using System;
using System.Linq;
using System.Threading;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Tool.Tests.Reading;

/// <summary>Every way in which compilers keep a table is read to the bit; everything else is refused, never misread.</summary>
public class FormTests
{
    private const string Special = "1.5, -0.0, 0.0, double.NaN, double.PositiveInfinity, -double.Epsilon, double.MaxValue";

    private static readonly double[] SpecialValues =
        [1.5, -0.0, 0.0, double.NaN, double.PositiveInfinity, -double.Epsilon, double.MaxValue];

    public static TheoryData<Framework, OptimizationLevel> Builds => new()
    {
        { Framework.Net8, OptimizationLevel.Release },
        { Framework.Net8, OptimizationLevel.Debug },
        { Framework.NetStandard2, OptimizationLevel.Release },
        { Framework.NetStandard2, OptimizationLevel.Debug },
    };

    public static TheoryData<string> Unknowable => new()
    {
        "public static ReadOnlySpan<double> T => new ReadOnlySpan<double>(new double[] { 1, 2, 3, 4 }, 1, 2);",
        "public static ReadOnlySpan<double> T => ((ReadOnlySpan<double>)new double[] { 1, 2, 3, 4 }).Slice(1);",
        "public static ReadOnlySpan<double> T => new double[] { 1, 2, Math.Sqrt(3) };",
        "public static ReadOnlySpan<double> T => Environment.TickCount > 0 ? new double[] { 1, 2, 3 } : new double[] { 1, 2, 4 };",
        "public static ReadOnlySpan<double> T { get { Console.Write(1); return new double[] { 1, 2, 3 }; } }",
        "public static double[] Array = { 1, 2, 3 }; public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array = { 1, 2, 3 }; static Boats() { Array[1] = 7; } public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array = { 1, 2, 3 }; static Boats() { Array = new double[] { 4, 5, 6 }; } public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array; static Boats() { if (Environment.TickCount > 0) { Array = new double[] { 4, 5, 6 }; } } public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array; static Boats() { if (Environment.TickCount > 0) { return; } Array = new double[] { 4, 5, 6 }; } public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array = Environment.TickCount > 0 ? new double[] { 1, 2, 3 } : new double[] { 4, 5, 6 }; public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array = Make(); static double[] Make() => new double[] { 1, 2, 3 }; public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array = { 1, Math.PI * Environment.TickCount, 3 }; public static ReadOnlySpan<double> T => Array;",
        "static readonly double[] Array; static Boats() { switch (Environment.TickCount) { case 0: case 1: case 2: case 3: Array = new double[] { 4, 5, 6 }; break; default: throw new Exception(); } } public static ReadOnlySpan<double> T => Array;",
        "public static ReadOnlySpan<double> T => throw new NotSupportedException();",
        "public extern static ReadOnlySpan<double> T { get; }",
    };

    [Theory]
    [MemberData(nameof(Builds))]
    public void Span_properties_over_constants(Framework framework, OptimizationLevel optimization)
    {
        FoundType type = ReadType(
            $$"""
            public static ReadOnlySpan<double> Many => new double[] { {{Special}} };
            public static ReadOnlySpan<double> Again => new double[] { {{Special}} };
            public static ReadOnlySpan<double> Block { get { return new double[] { {{Special}} }; } }
            public static ReadOnlySpan<double> One => new double[] { 0.1 };
            public static ReadOnlySpan<double> Two => new double[] { 0.1, 0.2 };
            public static ReadOnlySpan<double> Zeros => new double[] { 0, 0, 0, 0 };
            public static ReadOnlySpan<double> Sparse => new double[] { 0, 0, 0, 0, 0, 0, 0, 7 };
            public static ReadOnlySpan<double> Listed => [0.1, 0.2, 0.3];
            public static ReadOnlySpan<float> Single => new float[] { 0.1f, -0.0f, float.NaN };
            public static ReadOnlySpan<long> Wide => new long[] { long.MinValue, -1, long.MaxValue };
            public static ReadOnlySpan<ulong> Unsigned => new ulong[] { ulong.MaxValue, 1, 0 };
            public static ReadOnlySpan<int> Int => new int[] { int.MinValue, -1, int.MaxValue };
            public static ReadOnlySpan<short> Short => new short[] { short.MinValue, -1, 1 };
            public static ReadOnlySpan<byte> Byte => new byte[] { 0, 255, 7 };
            public static ReadOnlySpan<byte> OneByte => new byte[] { 9 };
            public static ReadOnlySpan<sbyte> Signed => new sbyte[] { -128, 127 };
            """,
            framework,
            optimization);

        Assert.Empty(type.UnreadSpans);
        AssertDoubles(type, "Many", SpecialValues);
        AssertDoubles(type, "Again", SpecialValues);
        AssertDoubles(type, "Block", SpecialValues);
        AssertDoubles(type, "One", 0.1);
        AssertDoubles(type, "Two", 0.1, 0.2);
        AssertDoubles(type, "Zeros", 0, 0, 0, 0);
        AssertDoubles(type, "Sparse", 0, 0, 0, 0, 0, 0, 0, 7);
        AssertDoubles(type, "Listed", 0.1, 0.2, 0.3);
        Assert.Equal(
            new float[] { 0.1f, -0.0f, float.NaN }.Select(value => (ulong)BitConverter.SingleToUInt32Bits(value)), type.Spans["Single"].AllBits());
        Assert.Equal([1UL << 63, ulong.MaxValue, long.MaxValue], type.Spans["Wide"].AllBits());
        Assert.Equal([ulong.MaxValue, 1, 0], type.Spans["Unsigned"].AllBits());
        Assert.Equal([0x80000000, 0xFFFFFFFF, 0x7FFFFFFF], type.Spans["Int"].AllBits());
        Assert.Equal([0x8000, 0xFFFF, 1UL], type.Spans["Short"].AllBits());
        Assert.Equal([0UL, 255, 7], type.Spans["Byte"].AllBits());
        Assert.Equal([9UL], type.Spans["OneByte"].AllBits());
        Assert.Equal([0x80UL, 0x7F], type.Spans["Signed"].AllBits());
        Assert.Equal(ElementType.Single, type.Spans["Single"].Element);
    }

    [Theory]
    [MemberData(nameof(Builds))]
    public void Empty_tables(Framework framework, OptimizationLevel optimization)
    {
        FoundType type = ReadType(
            """
            private static readonly double[] Nothing = { };
            private static readonly double[] Shared = Array.Empty<double>();
            public static ReadOnlySpan<double> A => new double[] { };
            public static ReadOnlySpan<double> B => new double[0];
            public static ReadOnlySpan<double> C => default;
            public static ReadOnlySpan<double> D => Array.Empty<double>();
            public static ReadOnlySpan<double> E => Nothing;
            public static ReadOnlySpan<double> F => Shared;
            """,
            framework,
            optimization);

        Assert.Empty(type.UnreadSpans);
        Assert.Equal(6, type.Spans.Count);
        Assert.All(type.Spans.Values, span => Assert.Equal(0, span.Count));
    }

    [Theory]
    [MemberData(nameof(Builds))]
    public void Properties_over_static_read_only_arrays(Framework framework, OptimizationLevel optimization)
    {
        FoundType type = ReadType(
            $$"""
            private static readonly int Before = Environment.TickCount > 0 ? 3 : 4;
            private static readonly double[] ManyTable = { {{Special}} };
            private static readonly double[] OneTable = { 0.1 };
            private static readonly object Between = new();
            private static readonly double[] TwoTable = { 0.1, -0.0 };
            private static readonly double[] SparseTable = { 0, 0, 0, 0, 0, 0, 0, 7 };
            private static readonly long[] WideTable = { 1, -2 };
            private static readonly ulong[] UnsignedTable = { 1, uint.MaxValue };
            private static readonly short[] ShortTable = { 1, -2 };
            private static readonly float[] SingleTable = { 0.1f, 2f };
            private static readonly int After = Between is null ? 1 : throw new InvalidOperationException();
            public static ReadOnlySpan<double> Many => ManyTable;
            public static ReadOnlySpan<double> One => OneTable;
            public static ReadOnlySpan<double> Two => new ReadOnlySpan<double>(TwoTable);
            public static ReadOnlySpan<double> Sparse { get { return SparseTable; } }
            public static ReadOnlySpan<long> Wide => WideTable;
            public static ReadOnlySpan<ulong> Unsigned => UnsignedTable;
            public static ReadOnlySpan<short> Short => ShortTable;
            public static ReadOnlySpan<float> Single => SingleTable;
            public static ReadOnlySpan<double> Elsewhere => Tables.Values;
            private static class Tables { public static readonly double[] Values = { 1, 2, 3 }; }
            """,
            framework,
            optimization);

        Assert.Empty(type.UnreadSpans);
        AssertDoubles(type, "Many", SpecialValues);
        AssertDoubles(type, "One", 0.1);
        AssertDoubles(type, "Two", 0.1, -0.0);
        AssertDoubles(type, "Sparse", 0, 0, 0, 0, 0, 0, 0, 7);
        AssertDoubles(type, "Elsewhere", 1, 2, 3);
        Assert.Equal([1, ulong.MaxValue - 1], type.Spans["Wide"].AllBits());
        Assert.Equal([1, (ulong)uint.MaxValue], type.Spans["Unsigned"].AllBits());
        Assert.Equal([1UL, 0xFFFE], type.Spans["Short"].AllBits());
        Assert.Equal([(ulong)BitConverter.SingleToUInt32Bits(0.1f), 0x40000000], type.Spans["Single"].AllBits());
    }

    /// <summary>An array on each call is what older compilers make of a span property.</summary>
    [Theory]
    [InlineData(Framework.Net8)]
    [InlineData(Framework.NetStandard2)]
    public void Array_built_on_each_call(Framework framework)
    {
        FoundType type = ReadType(
            "public static ReadOnlySpan<double> Values { get { double[] array = new double[] { 0.1, 0.2, 0.3 }; return array; } }",
            framework,
            OptimizationLevel.Release);
        AssertDoubles(type, "Values", 0.1, 0.2, 0.3);
    }

    [Theory]
    [MemberData(nameof(Unknowable))]
    public void Anything_else_is_named_as_unread(string members)
    {
        FoundType type = ReadType(members, Framework.Net8, OptimizationLevel.Release);
        Assert.Equal(["T"], type.UnreadSpans.Keys);
        Assert.Empty(type.Spans);
    }

    [Fact]
    public void Properties_that_are_no_tables_are_left_alone()
    {
        FoundType type = ReadType(
            """
            public static int Count => 3;
            public static double[] Array => new double[] { 1 };
            public static ReadOnlySpan<char> Text => "abc";
            public static ReadOnlySpan<double> Method() => new double[] { 1 };
            """,
            Framework.Net8,
            OptimizationLevel.Release);
        Assert.Empty(type.UnreadSpans);
        Assert.Empty(type.Spans);
    }

    [Fact]
    public void Constants_are_read_from_the_metadata()
    {
        FoundType type = ReadType(
            """
            public const int PointCount = 16;
            public const double Raw3 = 0.1;
            public const float Central4 = -0.0f;
            internal const long Wide = -1;
            public const string Text = "no table";
            public const object Nothing = null;
            public static readonly double NotConstant = 3;
            """,
            Framework.Net8,
            OptimizationLevel.Release);
        Assert.Equal(["Central4", "PointCount", "Raw3", "Wide"], type.Constants.Keys.Order());
        Assert.Equal(new FoundConstant("PointCount", ElementType.Int32, 16), type.Constants["PointCount"]);
        Assert.Equal(new FoundConstant("Raw3", ElementType.Double, BitConverter.DoubleToUInt64Bits(0.1)), type.Constants["Raw3"]);
        Assert.Equal(new FoundConstant("Central4", ElementType.Single, 0x80000000), type.Constants["Central4"]);
        Assert.Equal(new FoundConstant("Wide", ElementType.Int64, ulong.MaxValue), type.Constants["Wide"]);
    }

    private static FoundType ReadType(string members, Framework framework, OptimizationLevel optimization)
    {
        string source = "using System; using GaussGen; [GaussHermite(3)] static partial class Boats { " + members + " }";
        using AssemblyImage image = AssemblyImage.FromBytes(FixtureCompiler.Compile(source, framework, optimization));
        return Assert.Single(AssemblyReader.Read(image, CancellationToken.None).Types);
    }

    private static void AssertDoubles(FoundType type, string name, params double[] expected)
    {
        Assert.Equal(ElementType.Double, type.Spans[name].Element);
        Assert.Equal(expected.Select(BitConverter.DoubleToUInt64Bits), type.Spans[name].AllBits());
    }
}
