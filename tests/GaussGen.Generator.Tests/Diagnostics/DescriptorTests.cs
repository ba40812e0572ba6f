using System;
using System.IO;
using System.Linq;
using System.Reflection;
using GaussGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

public sealed class DescriptorTests
{
    private static readonly DiagnosticDescriptor[] Defined = typeof(DiagnosticDescriptors)
        .GetFields(BindingFlags.Static | BindingFlags.Public)
        .Select(field => field.GetValue(null))
        .OfType<DiagnosticDescriptor>()
        .ToArray();

    [Fact]
    public void All_that_are_defined_are_announced_under_numbers_of_their_own()
    {
        Assert.Equal(Defined.Select(each => each.Id).Order(), new DeclarationAnalyzer().SupportedDiagnostics.Select(each => each.Id).Order());
        Assert.Equal(Defined.Length, Defined.Select(each => each.Id).Distinct().Count());
        Assert.All(Defined, each => Assert.Matches("^GAUSS0[0-9][0-9]$", each.Id));
    }

    [Fact]
    public void Each_has_a_section_in_the_readme_that_its_link_leads_to()
    {
        string[] headings = File.ReadAllLines(Path.Combine(AppContext.BaseDirectory, "README.md"))
            .Where(line => line.StartsWith('#'))
            .Select(line => line.TrimStart('#').Trim())
            .ToArray();

        Assert.All(Defined, each =>
        {
            Assert.Single(headings, heading => heading == each.Id);
            Assert.Equal("README.md#" + each.Id.ToLowerInvariant(), each.HelpLinkUri);
        });
    }

    [Fact]
    public void Each_message_begins_with_what_to_do_or_what_is_so_and_has_no_full_stop() => Assert.All(Defined, each =>
    {
        string message = each.MessageFormat.ToString(null);
        Assert.True(message.Length > 20);
        Assert.False(message.EndsWith('.'));
        Assert.True(char.IsUpper(message[0]) || message.StartsWith("{0}", StringComparison.Ordinal));
    });
}
