using System;
using System.Collections.Frozen;
using System.Collections.Generic;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>Every family there is. A new one is its claim in the mathematics and one line here.</summary>
internal static class ClaimTable
{
    private static readonly FrozenDictionary<string, ClaimFamily> Families = new[]
    {
        ClaimFamily.Rule("GaussHermite", SumForm.Located, read => new GaussHermiteClaim(
            read.Next<int>(), Weight(read), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussHalfRangeHermite", SumForm.ScaleOnly, read => new GaussHalfRangeHermiteClaim(
            read.Next<int>(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussTruncatedNormal", SumForm.Fixed, read => new GaussTruncatedNormalClaim(
            read.Next<int>(), read.Next<double>(), read.Next<double>(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussGeneralizedHermite", SumForm.Fixed, read => new GaussGeneralizedHermiteClaim(
            read.Next<int>(), read.Next<double>(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussLogNormal", SumForm.Fixed, read => new GaussLogNormalClaim(
            read.Next<int>(), read.Next<double>(), read.Next<double>(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussNormalMixture", SumForm.Fixed, read => new GaussNormalMixtureClaim(
            read.Next<int>(), read.NextList(), read.NextList(), read.NextList(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Rule("GaussEvenExponential", SumForm.Fixed, read => new GaussEvenExponentialClaim(
            read.Next<int>(), read.NextList(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())) with
        {
            Constants = ["NormalizingIntegral"],
        },
        ClaimFamily.Rule("NestedHermite", SumForm.Located, read => new NestedHermiteClaim(
            read.Next<int>(), read.Format(), read.DropZeroWeights(), read.HasErrorEstimate())),
        ClaimFamily.Moments("NormalMoments", read => new NormalMomentsClaim(
            read.Next<double>(), read.Next<double>(), read.MaximumOrder(), read.Format())),
        ClaimFamily.Moments("TruncatedNormalMoments", read => new TruncatedNormalMomentsClaim(
            read.Next<double>(), read.Next<double>(), read.Next<double>(), read.Next<double>(), read.MaximumOrder(), read.Format())),
        ClaimFamily.Moments("HalfNormalMoments", read => new HalfNormalMomentsClaim(
            read.Next<double>(), read.MaximumOrder(), read.Format())),
        ClaimFamily.Moments("LogNormalMoments", read => new LogNormalMomentsClaim(
            read.Next<double>(), read.Next<double>(), read.MaximumOrder(), read.Format())),
        ClaimFamily.Moments("EvenExponentialMoments", read => new EvenExponentialMomentsClaim(
            read.NextList(), read.MaximumOrder(), read.Format())),
        ClaimFamily.Sequences("HalfIntegerGamma", ["Gamma", "Reciprocal"], read => new HalfIntegerGammaClaim(read.Next<int>(), read.Format())),
        ClaimFamily.Sequences("OscillatorMatrixElements", ["Elements"], read => new OscillatorMatrixElementsClaim(
            read.Next<int>(), read.Next<int>(), read.Format())),
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
            throw new ClaimException($"[{declaration.Name}] asks for what cannot be: {ParameterMistake.Text(error)}");
        }
    }

    private static HermiteWeight Weight(ClaimArguments read) =>
        read.IsSecond("Convention") ? HermiteWeight.ExponentialOfMinusSquare : HermiteWeight.StandardNormalDensity;
}
