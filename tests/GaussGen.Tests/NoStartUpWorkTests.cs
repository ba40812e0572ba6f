using System;
using System.Linq;
using System.Reflection;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Nothing may run before the first call. A type initializer would, and every access would check for it.</summary>
public sealed class NoStartUpWorkTests
{
    private static readonly DateTime ForControl = DateTime.UnixEpoch;

    [Fact]
    public void A_type_initializer_would_be_seen()
    {
        Assert.Equal(1970, ForControl.Year);
        Assert.NotNull(typeof(NoStartUpWorkTests).TypeInitializer);
    }

    [Fact]
    public void The_library_has_no_type_initializer()
    {
        Type[] types = typeof(RuleEvaluation).Assembly.GetTypes();
        Assert.Contains(types, type => type.IsNested);
        Assert.Empty(types.Where(type => type.TypeInitializer is not null).Select(type => type.FullName));
    }

    [Fact]
    public void No_generated_type_has_a_type_initializer_or_a_field_that_needs_one()
    {
        Type[] tables =
        [
            .. typeof(Seven).Assembly.GetTypes().Where(type => type.GetCustomAttributesData()
                .Any(attribute => attribute.AttributeType.Assembly == typeof(GaussHermiteAttribute).Assembly)),
        ];
        Assert.True(tables.Length >= 20, $"{tables.Length} tables");
        Assert.Empty(tables.Where(type => type.TypeInitializer is not null).Select(type => type.FullName));

        const BindingFlags statics = BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic;
        FieldInfo[] fields = [.. tables.SelectMany(type => type.GetFields(statics))];
        Assert.Empty(fields.Where(field => !field.IsLiteral).Select(field => field.Name));
    }
}
