using System.Collections.Generic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Tests.Rules.Universal;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules;

/// <summary>Baselines know a table by these words: a change of one is a change of every baseline that has it.</summary>
public class RuleClaimTests
{
    public static TheoryData<string, string> Claims => new()
    {
        { "half-range", "Half-range Gauss–Hermite rule with 7 points, half-normal density" },
        { "truncated -1.5 inf", "Gauss rule with 7 points, standard normal density between -1.5 and ∞" },
        { "truncated -inf 0", "Gauss rule with 7 points, standard normal density between −∞ and 0.0" },
        { "generalized-hermite 0.25", "Generalized Gauss–Hermite rule with 7 points, exponent 0.25" },
        { "log-normal 0.1 0.4", "Gauss rule with 7 points, log-normal density with log-mean 0.1 and log-standard-deviation 0.4" },
        {
            "mixture",
            "Gauss rule with 7 points, mixture of normal densities with weights 0.3, 0.7, means -1.0, 2.0 and standard deviations 0.5, 1.5"
        },
        { "double-well", "Gauss rule with 7 points, even exponential density with coefficients -2.0, 0.5" },
    };

    [Theory]
    [MemberData(nameof(Claims))]
    public void A_request_claims_what_was_asked_for(string family, string claim)
    {
        RuleRequest request = Families.Request(family, 7, BinaryFormat.Binary64);

        Assert.Equal(claim, request.Claim);
        Assert.Equal(claim + ", without zero weights", (request with { DropZeroWeights = true }).Claim);
        Assert.Equal(claim + ", with error estimate", (request with { ErrorEstimate = true }).Claim);
        Assert.Equal(
            claim + ", without zero weights, with error estimate", (request with { DropZeroWeights = true, ErrorEstimate = true }).Claim);
    }

    [Fact]
    public void One_point_is_no_plural() => Assert.Equal(
        "Half-range Gauss–Hermite rule with 1 point, half-normal density", Families.Request("half-range", 1, BinaryFormat.Binary64).Claim);

    [Fact]
    public void Requests_with_and_without_an_estimate_are_different_keys()
    {
        RuleRequest request = Families.Request("half-range", 7, BinaryFormat.Binary64);

        Assert.NotEqual(request, request with { ErrorEstimate = true });
        Assert.Equal(2, new HashSet<RuleRequest> { request, request with { ErrorEstimate = true }, request with { } }.Count);
    }
}
