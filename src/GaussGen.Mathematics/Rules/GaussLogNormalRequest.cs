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
/// A request for a Gauss rule for the log-normal density: of exp(Y) for normal Y. Both parameters are the exact values of binary64 numbers.
/// Weights fall below 2^−1022 before the largest number of nodes, unless the standard deviation is small.
/// </summary>
public sealed record GaussLogNormalRequest : UniversalRuleRequest
{
    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="logMean">The mean of the logarithm; finite.</param>
    /// <param name="logStandardDeviation">The standard deviation of the logarithm; finite and above zero.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public GaussLogNormalRequest(int points, double logMean, double logStandardDeviation, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
        if (!Parameters.IsFinite(logMean))
        {
            throw new ArgumentOutOfRangeException(nameof(logMean), logMean, "The mean of the logarithm must be finite.");
        }

        if (!Parameters.IsPositive(logStandardDeviation))
        {
            throw new ArgumentOutOfRangeException(
                nameof(logStandardDeviation), logStandardDeviation, "The standard deviation of the logarithm must be finite and above zero.");
        }

        // A request is a key: −0 and 0 are one mean.
        LogMean = logMean == 0 ? 0.0 : logMean;
        LogStandardDeviation = logStandardDeviation;
    }

    /// <summary>The mean of the logarithm.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the logarithm.</summary>
    public double LogStandardDeviation { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussLogNormal(Points, LogMean, LogStandardDeviation, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">
    /// The outermost weight or node is not representable, or the rule cannot be constructed for another reason that the exception tells.
    /// </exception>
    public override RuleTable Construct(CancellationToken cancellation)
    {
        Dyadic mean = Parameters.ValueOf(LogMean), deviation = Parameters.ValueOf(LogStandardDeviation);
        RequireRange(mean.ToRational(), (deviation * deviation).ToRational());
        var words = new FamilyWords(
            "Gauss rule",
            "the log-normal density with log-mean " + Parameters.Write(LogMean) + " and log-standard-deviation " + Parameters.Write(LogStandardDeviation),
            "Wigert 1923; Chihara, An Introduction to Orthogonal Polynomials (1978), VI.2");
        RuleTable table = UniversalRule.Construct(
            new LogNormalWeight(mean, deviation, Points), Points, words, ErrorEstimate, cancellation);
        // The smallest node of all: a companion's lies below the rule's own.
        RealNumber first = (table.Companion?.Nodes ?? table.Nodes)[0];
        return first.Enclose(Rounding.FirstPrecision, cancellation).Upper < new Dyadic(1, -1022) ? throw NodeOutOfRange() : table;
    }

    /// <summary>
    /// Refuses what is out of range for sure before any work. With m = 0: xₙ ≥ aₙ₋₁ ≥ Q^(2n−3/2), and wₙ xₙ^(2n−1) ≤ E X^(2n−1) = Q^((2n−1)²/2), so that
    /// ln wₙ ≤ −s² (2n−1)(n−1). For all m: ln xₙ ≥ m + (2n − 3/2) s² and ln x₁ ≤ ln a₀ = m + s²/2. The outermost node x of an anti-Gaussian
    /// companion is at least aₙ ≥ Q^(2n+1/2), and its weight w times x²ⁿ at most 2 E X²ⁿ = 2 Q^(2n²), as the companion's sum and that of the rule,
    /// which is not negative, have that sum; so that ln w ≤ ln 2 − s² n(2n+1).
    /// </summary>
    private void RequireRange(Rational mean, Rational variance)
    {
        // 1022 ln 2 < 709 and 1024 ln 2 < 710.
        if (variance * (((2 * Points) - 1) * (Points - 1)) > 709)
        {
            throw new RuleConstructionException(
                RuleFailure.WeightNotRepresentable,
                "The outermost weight of the rule is below 2^-1022, the smallest normal binary64 number; ask for fewer points or a smaller log-standard-deviation.");
        }

        if (ErrorEstimate && variance * (Points * ((2 * Points) + 1)) > 710)
        {
            throw new RuleConstructionException(
                RuleFailure.WeightNotRepresentable,
                "The outermost weight of the error estimate's companion rule is below 2^-1022, the smallest normal binary64 number; "
                + "ask for fewer points, a smaller log-standard-deviation or no error estimate.");
        }

        int last = ErrorEstimate ? (4 * Points) + 1 : (4 * Points) - 3;
        if (mean + (variance * new Rational(last, 2)) > 710 || mean + (variance / 2) < -709)
        {
            throw NodeOutOfRange();
        }
    }

    private RuleConstructionException NodeOutOfRange() => new(
        RuleFailure.NodeNotRepresentable,
        ErrorEstimate
            ? "The outermost node of the rule or of its error estimate's companion is not a normal binary64 number; ask for fewer points, for a "
                + "log-mean nearer to zero, or for no error estimate."
            : "The outermost node of the rule is not a normal binary64 number; ask for fewer points, or for a log-mean nearer to zero.");
}
