using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using GaussGen.Generator.Tests.Support;
using Xunit;

namespace GaussGen.Generator.Tests.Emission;

public sealed class HintNameTests
{
    [Theory]
    [InlineData("[GaussHermite(3)] partial class Echo { }", "Echo.GaussHermite.g.cs")]
    [InlineData("namespace Survey.Boat { [NormalMoments(0, 1)] partial class Noise { } }", "Survey.Boat.Noise.NormalMoments.g.cs")]
    [InlineData("namespace @class { partial struct @new { [GaussHermite(3)] partial record struct Größe { } } }", "class.new+Größe.GaussHermite.g.cs")]
    [InlineData("partial class Outer<T, U> { [GaussHermite(3)] partial class Echo<V> { } }", "Outer`2+Echo`1.GaussHermite.g.cs")]
    public void It_is_the_full_name_and_the_family(string source, string expected) =>
        Assert.Equal([expected], NamesOf(source));

    [Fact]
    public void Two_families_on_a_type_have_two_files() => Assert.Equal(
        ["Echo.GaussHermite.g.cs", "Echo.NormalMoments.g.cs"],
        NamesOf("[GaussHermite(3), NormalMoments(0, 1)] partial class Echo { }"));

    [Fact]
    public void Names_that_differ_in_case_alone_have_files_that_differ_in_more()
    {
        const string Twins = "[GaussHermite(3)] partial class Echo { } [GaussHermite(4)] partial class echo { } [GaussHermite(5)] partial class ECHO { }";
        IReadOnlyCollection<string> names = NamesOf(Twins + " [GaussHermite(6)] partial class Other { } [NormalMoments(0, 1)] partial class eCho { }");

        Assert.Equal(5, names.Distinct(StringComparer.OrdinalIgnoreCase).Count());
        Assert.Contains("Other.GaussHermite.g.cs", names);
        Assert.Contains("eCho.NormalMoments.g.cs", names);
        Assert.Subset(names.ToHashSet(), NamesOf(Twins).ToHashSet());
    }

    [Fact]
    public void Each_file_has_the_type_that_its_name_says()
    {
        Outcome outcome = new Consumer("using GaussGen; [GaussHermite(3)] partial class Echo { } [GaussHermite(4)] partial class echo { }").Run();

        Assert.Equal(2, outcome.Texts.Count);
        Assert.All(outcome.Texts, text => Assert.Contains($"class {text.Key.Split('.')[0]}\n", text.Value, StringComparison.Ordinal));
        Assert.All(outcome.Texts.Keys, name => Assert.DoesNotContain(name, Path.GetInvalidFileNameChars().Contains));
        Assert.Empty(outcome.Compilation.GetDiagnostics().Where(diagnostic => diagnostic.Id != "CS8981"));
    }

    private static string[] NamesOf(string source) => new Consumer("using GaussGen; " + source).Run().Texts.Keys.ToArray();
}
