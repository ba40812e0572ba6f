using System;
using System.Diagnostics;
using System.Linq;
using System.Reflection;
using Xunit;

namespace GaussGen.Tests;

/// <summary>The attributes are part of what a compiled program promises, so they must be found in it again.</summary>
public sealed class AttributeTests
{
    public static TheoryData<Type> Attributes { get; } = [typeof(GaussHermiteAttribute), typeof(NormalMomentsAttribute)];

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
