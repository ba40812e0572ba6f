using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// A request for a Gauss rule for the standard normal density on an interval, one end of which may be infinite. An end is the exact
/// value of a binary64 number.
/// </summary>
public sealed record GaussTruncatedNormalRequest : UniversalRuleRequest
{
    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="lower">The lower end; −∞ is allowed where the upper end is finite.</param>
    /// <param name="upper">The upper end, above the lower one; +∞ is allowed where the lower end is finite.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public GaussTruncatedNormalRequest(int points, double lower, double upper, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
        if (!IsInterval(lower, upper))
        {
            throw new ArgumentOutOfRangeException(
                nameof(upper), upper, "The lower end must be below the upper end, and one of them finite. For the whole line use a Gauss–Hermite rule.");
        }

        // A request is a key: −0 and 0 are one end.
        Lower = lower == 0 ? 0.0 : lower;
        Upper = upper == 0 ? 0.0 : upper;
    }

    /// <summary>The lower end.</summary>
    public double Lower { get; }

    /// <summary>The upper end.</summary>
    public double Upper { get; }

    /// <summary>Whether two numbers can be the ends: the lower below the upper, and one of them finite.</summary>
    public static bool IsInterval(double lower, double upper) => lower < upper && !(double.IsInfinity(lower) && double.IsInfinity(upper));

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussTruncatedNormal(Points, Lower, Upper, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">
    /// The probability of the interval is below 2^−1022, or the rule cannot be constructed for another reason that the exception tells.
    /// </exception>
    public override RuleTable Construct(CancellationToken cancellation)
    {
        Dyadic? lower = TruncatedNormalParameters.End(Lower), upper = TruncatedNormalParameters.End(Upper);
        TruncatedNormalParameters.RequireMass(lower, upper, cancellation);
        var words = new FamilyWords(
            "Gauss rule",
            "the standard normal density on " + TruncatedNormalParameters.Write(Lower, Upper),
            "NIST DLMF 7.6.2; Tallis 1961 for the moments");
        return UniversalRule.Construct(new TruncatedNormalWeight(lower, upper, Points), Points, words, ErrorEstimate, cancellation);
    }
}

/// <summary>Checks and texts of the ends of a truncated normal distribution.</summary>
internal static class TruncatedNormalParameters
{
    /// <summary>The end exactly; <c>null</c> for an infinite one.</summary>
    internal static Dyadic? End(double value) => double.IsInfinity(value) ? null : Parameters.ValueOf(value);

    /// <summary>"[−1.0, 2.0]", "[8.0, ∞)".</summary>
    internal static string Write(double lower, double upper) =>
        (double.IsInfinity(lower) ? "(" : "[") + Parameters.Write(lower) + ", " + Parameters.Write(upper) + (double.IsInfinity(upper) ? ")" : "]");

    /// <summary>Refuses an interval, in units of the standard deviation from the mean, whose probability is surely below 2^−1022.</summary>
    /// <exception cref="RuleConstructionException">The probability is too small.</exception>
    internal static void RequireMass(Dyadic? lower, Dyadic? upper, CancellationToken cancellation) =>
        RequireMass(new TruncatedNormalDistribution(Dyadic.Zero, new Dyadic(1, 0), lower, upper), cancellation);

    /// <summary>Refuses a distribution whose interval has a probability that is surely below 2^−1022.</summary>
    /// <exception cref="RuleConstructionException">The probability is too small.</exception>
    internal static void RequireMass(TruncatedNormalDistribution distribution, CancellationToken cancellation)
    {
        // Beyond 39 standard deviations the whole tail is below exp(−39²/2) < 2^−1097; nothing need be computed there.
        if (distribution.IsBeyond(39) || IsTooSmall(Mass(distribution, cancellation), cancellation))
        {
            throw new RuleConstructionException(
                RuleFailure.MassTooSmall,
                "The interval has a probability below 2^-1022; choose one that is wider or nearer to the mean.");
        }
    }

    private static Ball Mass(TruncatedNormalDistribution distribution, CancellationToken cancellation) =>
        TruncatedMoments.About((working, _) => distribution.About(distribution.Mean, working), 1, 64, cancellation)[0];

    /// <summary>Whether ∫ exp(−x²/2) dx is surely below √(2π) 2^−1022.</summary>
    private static bool IsTooSmall(Ball integral, CancellationToken cancellation)
    {
        Ball least = Ball.Multiply(Constants.SqrtPi(64, cancellation), Constants.Sqrt2(64), 64).ScaleByPowerOfTwo(-1022);
        return Ball.IsLess(integral, least) == Trilean.True;
    }
}
