using System;
using System.Linq;
using System.Reflection;
using System.Threading.Tasks;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Emission;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Generator.Tests.Declarations;

/// <summary>What is said in two places is said alike: by the attributes and by what reads them.</summary>
public sealed class SeamTests
{
    [Fact]
    public void Every_family_has_its_attribute_and_every_attribute_its_family() => Assert.Equal(
        typeof(GaussHermiteAttribute).Assembly.GetExportedTypes()
            .Where(type => type.IsSubclassOf(typeof(Attribute)))
            .Select(type => type.FullName)
            .Order(StringComparer.Ordinal),
        DeclarationTable.Families.Select(family => family.AttributeName).Order(StringComparer.Ordinal));

    [Fact]
    public void Attributes_are_for_classes_and_structs_and_once_a_type() => Assert.All(DeclarationTable.Families, family =>
    {
        AttributeUsageAttribute usage = AttributeOf(family).GetCustomAttribute<AttributeUsageAttribute>()!;
        Assert.Equal(AttributeTargets.Class | AttributeTargets.Struct, usage.ValidOn);
        Assert.False(usage.AllowMultiple);
        Assert.False(usage.Inherited);
        Assert.True(AttributeOf(family).IsSealed);
    });

    [Fact]
    public void Conventions_have_the_same_names_and_numbers() => Assert.Equal(
        Enum.GetValues<HermiteConvention>().Select(member => (member.ToString(), (int)member)),
        Enum.GetValues<Mathematics.Rules.HermiteConvention>().Select(member => (member.ToString(), (int)member)));

    [Theory]
    [InlineData(NumberFormat.Binary64, "double")]
    [InlineData(NumberFormat.Binary32, "float")]
    public void Formats_have_their_types(NumberFormat format, string type)
    {
        Assert.Equal(2, Enum.GetValues<NumberFormat>().Length);
        Assert.Contains($"ReadOnlySpan<{type}> Nodes", TextOf($"GaussHermite(3, Format = NumberFormat.{format})"), StringComparison.Ordinal);
        Assert.Contains($"ReadOnlySpan<{type}> Raw", TextOf($"NormalMoments(0, 1, Format = NumberFormat.{format})"), StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_not_set_is_what_the_attribute_says()
    {
        GaussHermiteAttribute rule = new(5);
        Assert.Equal(
            TextOf($"GaussHermite(5, Convention = HermiteConvention.{rule.Convention}, Format = NumberFormat.{rule.Format}, DropZeroWeights = {(rule.DropZeroWeights ? "true" : "false")})"),
            TextOf("GaussHermite(5)"));

        NormalMomentsAttribute moments = new(0.5, 2);
        Assert.Equal(
            TextOf($"NormalMoments(0.5, 2, MaximumOrder = {moments.MaximumOrder}, Format = NumberFormat.{moments.Format})"),
            TextOf("NormalMoments(0.5, 2)"));
    }

    [Fact]
    public void Every_property_that_can_be_set_changes_what_is_generated()
    {
        (string Attribute, string Property, string Value)[] settings =
        [
            ("GaussHermite(400{0})", nameof(GaussHermiteAttribute.Convention), "HermiteConvention.Physicist"),
            ("GaussHermite(400{0})", nameof(GaussHermiteAttribute.Format), "NumberFormat.Binary32"),
            ("GaussHermite(400{0})", nameof(GaussHermiteAttribute.DropZeroWeights), "true"),
            ("NormalMoments(0, 1{0})", nameof(NormalMomentsAttribute.MaximumOrder), "2"),
            ("NormalMoments(0, 1{0})", nameof(NormalMomentsAttribute.Format), "NumberFormat.Binary32"),
            .. Samples.OtherRules.Concat(Samples.OtherMoments).Concat(Samples.Sequences).Select(table =>
                (table.Replace(")", "{0})", StringComparison.Ordinal), "Format", "NumberFormat.Binary32")),
            ("GaussHermite(7{0})", nameof(GaussHermiteAttribute.ErrorEstimate), "true"),
            .. Samples.OtherRules.Select(rule => (rule.Replace(")", "{0})", StringComparison.Ordinal), "ErrorEstimate", "true")),
            .. Samples.OtherMoments.Select(table => (table.Replace(")", "{0})", StringComparison.Ordinal), "MaximumOrder", "2")),
            .. Samples.RulesWithZeroWeights.Select(rule =>
                (rule.Replace(")", ", Format = NumberFormat.Binary32{0})", StringComparison.Ordinal), "DropZeroWeights", "true")),
        ];

        // No weight of a nested rule is so small that it rounds to zero.
        Assert.Equal(
            DeclarationTable.Families.Sum(family => AttributeOf(family).GetProperties().Count(property => property.CanWrite)),
            settings.Length + 1);
        Assert.All(settings, setting => Assert.False(
            IsStandIn(TextOf(setting.Attribute.Replace("{0}", $", {setting.Property} = {setting.Value}", StringComparison.Ordinal))), setting.ToString()));
        Assert.All(settings, setting => Assert.NotEqual(
            TextOf(setting.Attribute.Replace("{0}", string.Empty, StringComparison.Ordinal)),
            TextOf(setting.Attribute.Replace("{0}", $", {setting.Property} = {setting.Value}", StringComparison.Ordinal))));
    }

    [Theory]
    [InlineData(GaussHermite.MinimumPoints, GaussHermite.MaximumPoints, "GaussHermite({0}, DropZeroWeights = true)")]
    [InlineData(NormalMomentsRequest.SmallestOrder, NormalMomentsRequest.LargestOrder, "NormalMoments(0, 1, MaximumOrder = {0}, Format = NumberFormat.Binary64)")]
    public async Task Ranges_are_those_of_the_mathematics(int lowest, int highest, string attribute)
    {
        foreach ((int value, bool isAllowed) in new[] { (lowest - 1, false), (lowest, true), (highest, true), (highest + 1, false) })
        {
            string source = attribute.Replace("{0}", $"{value}", StringComparison.Ordinal);
            Outcome outcome = Run(source);
            Assert.Equal(isAllowed, !IsStandIn(outcome.Text));
            Assert.Equal(isAllowed ? 0 : 1, (await outcome.AnalyzerDiagnostics()).Length);
        }
    }

    [Theory]
    [MemberData(nameof(Samples.SoundAndMistaken), MemberType = typeof(Samples))]
    public void Every_generated_name_is_one_that_is_looked_for_among_a_types_own(string attribute)
    {
        Family family = DeclarationTable.Families.Single(each => each.Name == attribute.Substring(0, attribute.IndexOf('(', StringComparison.Ordinal)));
        foreach (Framework framework in new[] { Framework.Net80, Framework.NetStandard20 })
        {
            string text = Run(attribute, framework).Text;
            Assert.NotEmpty(GeneratedText.NamesIn(text));
            Assert.All(GeneratedText.NamesIn(text), name => Assert.True(TakenMember.MightBeGenerated(family, name), name));
        }
    }

    [Fact]
    public void Every_member_of_a_table_is_on_its_stand_in()
    {
        Assert.Equal(
            DeclarationTable.Families.Select(family => family.Name).Order(StringComparer.Ordinal),
            Samples.Pairs.Select(pair => pair.Sound.Split('(')[0]).Distinct().Order(StringComparer.Ordinal));
        foreach ((string sound, string mistaken) in Samples.Pairs)
        {
            Assert.False(IsStandIn(TextOf(sound)), sound);
            Assert.True(IsStandIn(TextOf(mistaken)));
            Assert.Subset(GeneratedText.SurfaceOf(TextOf(mistaken)).ToHashSet(), GeneratedText.SurfaceOf(TextOf(sound)).ToHashSet());
        }
    }

    [Theory]
    [InlineData("4.2.0.0", false)]
    [InlineData("4.3.0.0", false)]
    [InlineData("4.4.0.0", false)]
    [InlineData("4.5.0.0", true)]
    [InlineData("4.10.0.0", true)]
    [InlineData("5.0.0.0", true)]
    public void Spans_are_in_the_image_from_the_first_compiler_that_puts_them_there(string compiler, bool isInImage)
    {
        Assert.Equal(isInImage, TargetCapabilities.Of(Framework.Net80.Empty, new Version(compiler)).KeepsSpansInImage);
        Assert.False(TargetCapabilities.Of(Framework.NetStandard20.Empty, new Version(compiler)).KeepsSpansInImage);
    }

    private static Type AttributeOf(Family family) => typeof(GaussHermiteAttribute).Assembly.GetType(family.AttributeName, throwOnError: true)!;

    private static bool IsStandIn(string text) => text.Contains("stand-in", StringComparison.Ordinal);

    private static string TextOf(string attribute) => Run(attribute).Text;

    private static Outcome Run(string attribute, Framework? framework = null) =>
        new Consumer($"using GaussGen; [{attribute}] internal static partial class Echo {{ }}") { Framework = framework ?? Framework.Net80 }.Run();
}
