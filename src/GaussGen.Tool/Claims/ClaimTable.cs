using System;
using System.Collections.Frozen;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>A family of tables as the verifier knows it.</summary>
/// <param name="Attribute">The attribute's name without its suffix.</param>
/// <param name="Spans">The spans that hold the family's entries.</param>
/// <param name="IsLocated">
/// Whether the family's expectation takes a mean and a standard deviation, so that its code holds the constants that carry the rule
/// to them.
/// </param>
/// <param name="ReadClaim">Makes the claim of a declaration's arguments.</param>
internal sealed record ClaimFamily(string Attribute, IReadOnlyList<string> Spans, bool IsLocated, Func<ClaimArguments, TableClaim> ReadClaim)
{
    /// <summary>The integers that tell a rule's size and quality; moments have none.</summary>
    private static readonly string[] RuleIntegers = ["PointCount", "DegreeOfExactness"];

    /// <summary>Whether a constant is one of the integers that stand beside the family's spans.</summary>
    public bool IsInteger(string constant) => Spans.Contains("Nodes") && RuleIntegers.Contains(constant);

    /// <summary>Whether each entry of a span has a constant of its own.</summary>
    public bool HasEntryConstants => !Spans.Contains("Nodes");

    /// <summary>Whether a constant repeats an entry of a span, as "Raw3" does.</summary>
    public bool IsEntry(string constant) => Spans.Any(span =>
        constant.Length > span.Length && constant.StartsWith(span, StringComparison.Ordinal) && constant.Skip(span.Length).All(char.IsAsciiDigit));
}

/// <summary>Every family there is. A new one is its claim in the mathematics and one line here.</summary>
internal static class ClaimTable
{
    private static readonly string[] Rule = ["Nodes", "Weights"];
    private static readonly string[] Moments = ["Raw", "Central", "Absolute"];

    private static readonly FrozenDictionary<string, ClaimFamily> Families = new ClaimFamily[]
    {
        new("GaussHermite", Rule, true, read => new GaussHermiteClaim(read.Next<int>(), Weight(read), read.Format(), read.Named("DropZeroWeights", false))),
        new("NormalMoments", Moments, false, read => new NormalMomentsClaim(read.Next<double>(), read.Next<double>(), read.Named("MaximumOrder", 4), read.Format())),
    }.ToFrozenDictionary(family => family.Attribute, StringComparer.Ordinal);

    /// <summary>The attributes of all families.</summary>
    public static IEnumerable<string> Attributes => Families.Keys;

    /// <summary>The family that a declaration belongs to, or null if this version of the tool does not know it.</summary>
    public static ClaimFamily? Find(string attribute) => Families.GetValueOrDefault(attribute);

    /// <summary>What a declaration promises.</summary>
    /// <exception cref="ClaimException">The arguments are not such as the family has.</exception>
    public static TableClaim Read(ClaimFamily family, Declaration declaration)
    {
        ClaimArguments arguments = new(declaration);
        try
        {
            TableClaim claim = family.ReadClaim(arguments);
            arguments.RequireAllRead();
            return claim;
        }
        catch (ArgumentException error)
        {
            string message = error.Message.Split('\n')[0];
            throw new ClaimException($"[{declaration.Name}] asks for what cannot be: {message}");
        }
    }

    private static HermiteWeight Weight(ClaimArguments read) =>
        read.IsSecond("Convention") ? HermiteWeight.ExponentialOfMinusSquare : HermiteWeight.StandardNormalDensity;
}
