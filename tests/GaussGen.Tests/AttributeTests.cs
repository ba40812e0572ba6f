using System;
using System.Diagnostics;
using System.Linq;
using System.Reflection;
using Xunit;

namespace GaussGen.Tests;

/// <summary>The attributes are part of what a compiled program promises, so they must be found in it again.</summary>
public sealed class AttributeTests
{
    public static TheoryData<Type> Attributes { get; } =
        [.. typeof(GaussHermiteAttribute).Assembly.GetExportedTypes().Where(type => type.IsSubclassOf(typeof(Attribute)))];

    [Theory]
    [MemberData(nameof(Attributes))]
    public void A_table_attribute_goes_once_on_a_class_or_a_struct_and_is_not_inherited(Type attribute)
    {
        AttributeUsageAttribute usage = attribute.GetCustomAttribute<AttributeUsageAttribute>()!;
        Assert.Equal(AttributeTargets.Class | AttributeTargets.Struct, usage.ValidOn);
        Assert.False(usage.AllowMultiple);
        Assert.False(usage.Inherited);
        Assert.True(attribute.IsSealed);
        Assert.Empty(attribute.GetCustomAttributes<ConditionalAttribute>());
    }

    [Fact]
    public void A_rule_that_says_nothing_else_is_the_probabilists_in_binary64_with_every_node()
    {
        GaussHermiteAttribute attribute = new(7);
        Assert.Equal(7, attribute.Points);
        Assert.Equal(HermiteConvention.Probabilist, attribute.Convention);
        Assert.Equal(NumberFormat.Binary64, attribute.Format);
        Assert.False(attribute.DropZeroWeights);
        Assert.False(attribute.ErrorEstimate);
    }

    [Fact]
    public void A_table_that_says_nothing_else_is_in_binary64_with_every_node_and_no_estimate() => Assert.All(
        new Attribute[]
        {
            new GaussHalfRangeHermiteAttribute(5),
            new GaussTruncatedNormalAttribute(5, lower: -1.0, upper: 2.0),
            new GaussGeneralizedHermiteAttribute(5, exponent: 0.5),
            new GaussLogNormalAttribute(5, logMean: 0.0, logStandardDeviation: 0.25),
            new GaussNormalMixtureAttribute(5, weights: [1.0], means: [0.0], standardDeviations: [2.0]),
            new GaussEvenExponentialAttribute(5, 1.0, 2.0),
            new NestedHermiteAttribute(level: 2),
            new TruncatedNormalMomentsAttribute(mean: 1.0, standardDeviation: 2.0, lower: 0.0, upper: 4.0),
            new HalfNormalMomentsAttribute(scale: 0.5),
            new LogNormalMomentsAttribute(logMean: 0.0, logStandardDeviation: 0.25),
            new EvenExponentialMomentsAttribute(1.0, 2.0),
            new HalfIntegerGammaAttribute(maximumOrder: 5),
            new OscillatorMatrixElementsAttribute(size: 5, power: 3),
        },
        attribute => Assert.All(attribute.GetType().GetProperties().Where(property => property.CanWrite), property => Assert.Equal(
            property.Name == "MaximumOrder" ? 4 : property.PropertyType == typeof(bool) ? false : NumberFormat.Binary64,
            property.GetValue(attribute))));

    [Fact]
    public void Arguments_are_kept_under_their_names()
    {
        GaussTruncatedNormalAttribute truncated = new(5, -1.0, 2.0);
        Assert.Equal((5, -1.0, 2.0), (truncated.Points, truncated.Lower, truncated.Upper));
        GaussLogNormalAttribute logNormal = new(5, -1.0, 2.0);
        Assert.Equal((5, -1.0, 2.0), (logNormal.Points, logNormal.LogMean, logNormal.LogStandardDeviation));
        LogNormalMomentsAttribute moments = new(-1.0, 2.0);
        Assert.Equal((-1.0, 2.0), (moments.LogMean, moments.LogStandardDeviation));
        GaussNormalMixtureAttribute mixture = new(5, [0.5, 0.25], [1.0, 2.0], [3.0, 4.0]);
        Assert.Equal((5, 0.25, 1.0, 4.0), (mixture.Points, mixture.Weights[1], mixture.Means[0], mixture.StandardDeviations[1]));
        Assert.Equal([1.0, 2.0], new GaussEvenExponentialAttribute(5, 1.0, 2.0).Coefficients);
        Assert.Equal((7, 0.5), (new GaussGeneralizedHermiteAttribute(7, 0.5).Points, new GaussGeneralizedHermiteAttribute(7, 0.5).Exponent));
        TruncatedNormalMomentsAttribute depth = new(1.0, 2.0, 3.0, 4.0);
        Assert.Equal((1.0, 2.0, 3.0, 4.0), (depth.Mean, depth.StandardDeviation, depth.Lower, depth.Upper));
        Assert.Equal((0.5, 3), (new HalfNormalMomentsAttribute(0.5).Scale, new NestedHermiteAttribute(3).Level));
        Assert.Equal(7, new GaussHalfRangeHermiteAttribute(7).Points);
        Assert.Equal(7, new HalfIntegerGammaAttribute(7).MaximumOrder);
        Assert.Equal((7, 3), (new OscillatorMatrixElementsAttribute(7, 3).Size, new OscillatorMatrixElementsAttribute(7, 3).Power));
    }

    [Fact]
    public void Moments_that_say_nothing_else_go_up_to_order_four_in_binary64()
    {
        NormalMomentsAttribute attribute = new(mean: -2.5, standardDeviation: 0.5);
        Assert.Equal(-2.5, attribute.Mean);
        Assert.Equal(0.5, attribute.StandardDeviation);
        Assert.Equal(4, attribute.MaximumOrder);
        Assert.Equal(NumberFormat.Binary64, attribute.Format);
    }

    [Fact]
    public void A_declared_rule_can_be_read_back_from_the_assembly()
    {
        GaussHermiteAttribute attribute = typeof(TwentySingle).GetCustomAttribute<GaussHermiteAttribute>()!;
        Assert.Equal(20, attribute.Points);
        Assert.Equal(HermiteConvention.Physicist, attribute.Convention);
        Assert.Equal(NumberFormat.Binary32, attribute.Format);
        Assert.True(attribute.DropZeroWeights);
    }

    [Fact]
    public void Declared_moments_can_be_read_back_without_running_the_attribute()
    {
        CustomAttributeData data = typeof(Wind).GetCustomAttributesData()
            .Single(a => a.AttributeType == typeof(NormalMomentsAttribute));
        Assert.Equal([1.5, 0.25], data.ConstructorArguments.Select(a => (double)a.Value!));
        CustomAttributeNamedArgument order = Assert.Single(data.NamedArguments);
        Assert.Equal(nameof(NormalMomentsAttribute.MaximumOrder), order.MemberName);
        Assert.Equal(8, order.TypedValue.Value);
    }

    [Fact]
    public void The_values_of_the_enumerations_are_fixed_because_compiled_programs_hold_them()
    {
        Assert.Equal([("Probabilist", 0), ("Physicist", 1)], Values<HermiteConvention>());
        Assert.Equal([("Binary64", 0), ("Binary32", 1)], Values<NumberFormat>());
    }

    private static (string Name, int Value)[] Values<T>()
        where T : struct, Enum =>
        [.. Enum.GetValues<T>().Select(v => (v.ToString(), Convert.ToInt32(v)))];
}
