using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Reflection;
using System.Threading;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using Xunit;

namespace GaussGen.Generator.Tests.Emission;

/// <summary>Generated moments, compiled: lists and constants are the table's, bit for bit.</summary>
public sealed class MomentExecutionTests
{
    [Theory]
    [InlineData(0.0, 1.0, 12, NumberFormat.Binary64)]
    [InlineData(1.5, 0.25, 8, NumberFormat.Binary64)]
    [InlineData(-0.1, 3.7, 40, NumberFormat.Binary64)]
    [InlineData(1e-200, 1e-180, 4, NumberFormat.Binary64)]
    [InlineData(0.1, 0.2, 200, NumberFormat.Binary64)]
    [InlineData(0.1, 1e-300, 0, NumberFormat.Binary64)]
    [InlineData(-2.0, 0.5, 10, NumberFormat.Binary32)]
    [InlineData(1e-20, 1e-30, 3, NumberFormat.Binary32)]
    public void Moments_have_the_tables_bits(double mean, double deviation, int order, NumberFormat format)
    {
        string type = format == NumberFormat.Binary32 ? "float" : "double";
        Outcome outcome = new Consumer(
            $$"""
            using GaussGen;

            [NormalMoments({{Number(mean)}}, {{Number(deviation)}}, MaximumOrder = {{order}}, Format = NumberFormat.{{format}})]
            public static partial class Noise
            {
                public static {{type}}[] RawList() => Raw.ToArray();
                public static {{type}}[] CentralList() => Central.ToArray();
                public static {{type}}[] AbsoluteList() => Absolute.ToArray();
            }
            """).Run();
        using LoadedAssembly loaded = new(outcome.Emit());
        RoundedMoments expected = TableMemo.Get(
            new NormalMomentsRequest(mean, deviation, order, Bits.FormatOf(format)), CancellationToken.None);

        Type noise = loaded.Type("Noise");
        foreach ((string list, IReadOnlyList<RoundedValue> values) in new[]
        {
            ("Raw", expected.Raw), ("Central", expected.Central), ("Absolute", expected.Absolute),
        })
        {
            ulong[] bits = values.Select(value => value.Bits).ToArray();
            Assert.Equal(bits, Bits.Of(loaded.Call<Array>("Noise", list + "List")));
            Assert.Equal(bits, Enumerable.Range(0, order + 1).Select(k => Bits.Of(ConstantOf(noise, list + k)!)));
            Assert.Null(ConstantOf(noise, list + (order + 1)));
        }

        Assert.Null(noise.TypeInitializer);
    }

    private static object? ConstantOf(Type type, string name) =>
        type.GetField(name, BindingFlags.Static | BindingFlags.Public)?.GetRawConstantValue();

    private static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
