using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// A request for a Gauss rule for the density proportional to |x|^(2μ) exp(−x²). The exponent μ is the exact value of a binary64 number.
/// </summary>
public sealed record GaussGeneralizedHermiteRequest : UniversalRuleRequest
{
    /// <summary>The exponent must be above this number: at −½ the weight cannot be integrated.</summary>
    public const double InfimumExponent = -0.5;

    /// <summary>The largest exponent.</summary>
    public const double MaximumExponent = 1e6;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="exponent">μ, above <see cref="InfimumExponent"/> and at most <see cref="MaximumExponent"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public GaussGeneralizedHermiteRequest(int points, double exponent, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
        if (!IsExponent(exponent))
        {
            throw new ArgumentOutOfRangeException(nameof(exponent), exponent, string.Format(
                CultureInfo.InvariantCulture, "The exponent must be above {0} and at most {1}.", InfimumExponent, MaximumExponent));
        }

        // A request is a key: −0 and 0 are one exponent.
        Exponent = exponent == 0 ? 0.0 : exponent;
    }

    /// <summary>μ.</summary>
    public double Exponent { get; }

    /// <summary>Whether a number can be the exponent.</summary>
    public static bool IsExponent(double value) => value is > InfimumExponent and <= MaximumExponent;

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussGeneralizedHermite(Points, Exponent, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">The rule cannot be constructed; the exception says why.</exception>
    public override RuleTable Construct(CancellationToken cancellation) => UniversalRule.Construct(
        new GeneralizedHermiteWeight(Parameters.ValueOf(Exponent)),
        Points,
        new FamilyWords(
            "Generalized Gauss–Hermite rule",
            "the density proportional to |x|^(2·" + Parameters.Write(Exponent) + ") exp(−x²)",
            "Szegő, Orthogonal Polynomials (1939), problem 25; Chihara, An Introduction to Orthogonal Polynomials (1978), V.2"),
        ErrorEstimate,
        cancellation);
}
