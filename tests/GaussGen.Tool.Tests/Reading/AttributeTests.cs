using System;
using System.Linq;
using System.Threading;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using Xunit;

namespace GaussGen.Tool.Tests.Reading;

/// <summary>What a declaration says is read to the last argument; whose attribute it is is never guessed from its name alone.</summary>
public class AttributeTests
{
    private const string Library = """
        using System;
        namespace GaussGen
        {
            public enum Shade { Light, Dark }
            public sealed class ManyAttribute : Attribute
            {
                public ManyAttribute(int a, double b, bool c, string d, Shade e, double[] f, params int[] g) { }
                public long Long { get; set; }
                public float Single { get; set; }
                public sbyte Small;
                public Shade Shade { get; set; }
                public Shade[] Shades { get; set; }
                public double[] Numbers { get; set; }
                public string Text { get; set; }
            }
            public sealed class TypedAttribute : Attribute { public TypedAttribute(Type type) { } }
            public sealed class BoxedAttribute : Attribute { public object Value { get; set; } }
            public sealed class ForeignAttribute : Attribute { public DayOfWeek Day { get; set; } }
        }
        """;

    [Fact]
    public void Own_declarations_with_all_arguments()
    {
        FoundType[] types = Read(
            """
            using GaussGen;
            namespace Survey.Boat
            {
                [GaussHermite(20, Convention = HermiteConvention.Physicist, Format = NumberFormat.Binary32, DropZeroWeights = true)]
                static partial class Twenty { internal partial struct Inner { [NormalMoments(-0.0, 0.25, MaximumOrder = 8)] public record Wind; } }
            }
            [GaussHermite(1)] partial struct One { }
            """);

        Assert.Equal(["One", "Survey.Boat.Twenty", "Survey.Boat.Twenty.Inner.Wind"], types.Select(type => type.Name).Order());
        Declaration twenty = Assert.Single(types.Single(type => type.Name == "Survey.Boat.Twenty").Declarations);
        Assert.Equal("GaussHermite", twenty.Name);
        Assert.Equal([20], twenty.Arguments);
        Assert.Equal(1, twenty.Named["Convention"]);
        Assert.Equal(1, twenty.Named["Format"]);
        Assert.Equal(true, twenty.Named["DropZeroWeights"]);
        Declaration wind = Assert.Single(types.Single(type => type.Name.EndsWith("Wind", StringComparison.Ordinal)).Declarations);
        Assert.Equal("NormalMoments", wind.Name);
        Assert.Equal([-0.0, 0.25], wind.Arguments.Cast<double>().Select(BitConverter.DoubleToInt64Bits).Select(BitConverter.Int64BitsToDouble));
        Assert.True(double.IsNegative((double)wind.Arguments[0]!));
        Assert.Equal(8, wind.Named["MaximumOrder"]);
    }

    [Fact]
    public void Every_argument_type_that_a_table_attribute_may_have()
    {
        FoundType type = Assert.Single(ReadAgainst(
            "GaussGen",
            """
            [GaussGen.Many(-1, double.NaN, true, "d\u00e9", GaussGen.Shade.Dark, new[] { 0.5, double.PositiveInfinity }, 7, 8,
                Long = long.MinValue, Single = 0.5f, Small = -3, Shade = GaussGen.Shade.Dark, Shades = new[] { GaussGen.Shade.Dark },
                Numbers = null, Text = null)]
            class T { }
            """));
        Declaration declaration = Assert.Single(type.Declarations);
        Assert.Equal([-1, double.NaN, true, "dé", 1, new object?[] { 0.5, double.PositiveInfinity }, new object?[] { 7, 8 }], declaration.Arguments);
        Assert.Equal(long.MinValue, declaration.Named["Long"]);
        Assert.Equal(0.5, declaration.Named["Single"]);
        Assert.Equal(-3, declaration.Named["Small"]);
        Assert.Equal(1, declaration.Named["Shade"]);
        Assert.Equal(new object?[] { 1 }, declaration.Named["Shades"]);
        Assert.Null(declaration.Named["Numbers"]);
        Assert.Null(declaration.Named["Text"]);
    }

    [Theory]
    [InlineData("[GaussGen.Typed(typeof(int))] class T { }", "Typed")]
    [InlineData("[GaussGen.Boxed(Value = 3)] class T { }", "Boxed")]
    [InlineData("[GaussGen.Foreign(Day = System.DayOfWeek.Friday)] class T { }", "Foreign")]
    public void Arguments_of_other_types_are_named_as_unread(string source, string name)
    {
        FoundType type = Assert.Single(ReadAgainst("GaussGen", source));
        Assert.Empty(type.Declarations);
        Assert.Equal([name], type.UnreadDeclarations.Keys);
    }

    [Fact]
    public void Another_assemblys_attribute_of_the_same_name_is_no_declaration() =>
        Assert.Empty(ReadAgainst("Other", "[GaussGen.Typed(typeof(int))] class T { }"));

    [Fact]
    public void An_attribute_merged_into_the_assembly_is_a_declaration()
    {
        using AssemblyImage image = AssemblyImage.FromBytes(FixtureCompiler.Compile(
            "namespace GaussGen { class GaussHermiteAttribute : System.Attribute { public GaussHermiteAttribute(int points) { } } [GaussHermite(5)] class T { } }"));
        FoundType type = Assert.Single(AssemblyReader.Read(image, CancellationToken.None).Types);
        Assert.Equal([5], Assert.Single(type.Declarations).Arguments);
    }

    [Fact]
    public void A_declaration_on_a_method_is_found_too()
    {
        FoundType found = Assert.Single(ReadAgainst("GaussGen", "namespace N { class T { [GaussGen.Boxed] void M() { } } }"));
        Assert.Equal("N.T.M", found.Name);
        Assert.Equal("Boxed", Assert.Single(found.Declarations).Name);
    }

    private static FoundType[] Read(string source)
    {
        using AssemblyImage image = AssemblyImage.FromBytes(FixtureCompiler.Compile(source));
        return [.. AssemblyReader.Read(image, CancellationToken.None).Types];
    }

    private static FoundType[] ReadAgainst(string libraryName, string source)
    {
        using AssemblyImage image = AssemblyImage.FromBytes(FixtureCompiler.CompileAgainst(Library, libraryName, source));
        return [.. AssemblyReader.Read(image, CancellationToken.None).Types];
    }
}
