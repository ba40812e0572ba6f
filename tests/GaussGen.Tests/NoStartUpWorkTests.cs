using System;
using System.Linq;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Nothing may run before the first call: a type initializer would, and it would make every access check for it.</summary>
public sealed class NoStartUpWorkTests
{
    [Fact]
    public void The_library_has_no_type_initializer()
    {
        Type[] types = typeof(RuleEvaluation).Assembly.GetTypes();
        Assert.Contains(types, type => type.IsNested);
        Assert.Empty(types.Where(type => type.TypeInitializer is not null).Select(type => type.FullName));
    }
}
