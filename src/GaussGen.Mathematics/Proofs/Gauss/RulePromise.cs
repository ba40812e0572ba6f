using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>What a claim promises, in the terms of the proof.</summary>
/// <param name="Rule">The rule.</param>
/// <param name="DegreeOfExactness">Its degree of exactness, of the whole rule also where zero weights are dropped.</param>
/// <param name="DropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
/// <param name="Companion">The rule that estimates the error; <c>null</c> without an estimate.</param>
/// <param name="ErrorFactor">What the difference of both sums is multiplied by: ½, or 1.</param>
internal sealed record RulePromise(
    RuleSource Rule, int DegreeOfExactness, bool DropZeroWeights, RuleSource? Companion, Rational ErrorFactor)
{
    /// <summary>The promise of a Gauss rule, with an anti-Gaussian companion where an estimate is wanted.</summary>
    public static RulePromise Gauss(WeightMoments moments, int points, bool dropZeroWeights, bool hasErrorEstimate) => new(
        new GaussSource(moments, points),
        (2 * points) - 1,
        dropZeroWeights,
        hasErrorEstimate ? new AntiGaussSource(moments, points) : null,
        new Rational(1, 2));
}
