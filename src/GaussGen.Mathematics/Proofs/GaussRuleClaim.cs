using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be a correctly rounded Gauss rule for a weight function: spans "Nodes" and "Weights", constants "PointCount" and
/// "DegreeOfExactness" (2n−1, of the whole rule also where zero weights are dropped), with an error estimate also the spans
/// "CompanionNodes" and "CompanionWeights" of the anti-Gaussian rule, and, where the data has them, "NodeScale" (1),
/// "ReciprocalTotalWeight" (1), "ExpectationLocation" (0), "ExpectationScale" (1) and "ErrorFactor" (½).
/// </summary>
public abstract record GaussRuleClaim : TableClaim
{
    /// <summary>The largest number of points.</summary>
    public const int LargestPointCount = 64;

    private protected GaussRuleClaim(int points, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(format)
    {
        if (points is < 1 or > LargestPointCount)
        {
            string message = string.Format(CultureInfo.InvariantCulture, "The rule must have from 1 to {0} points.", LargestPointCount);
            throw new ArgumentOutOfRangeException(nameof(points), points, message);
        }

        Points = points;
        DropZeroWeights = dropZeroWeights;
        HasErrorEstimate = hasErrorEstimate;
    }

    /// <summary>The number of points before any is dropped.</summary>
    public int Points { get; }

    /// <summary>Whether exactly the nodes whose weight rounds to zero are left out.</summary>
    public bool DropZeroWeights { get; }

    /// <summary>Whether the rule has an anti-Gaussian companion that estimates its error.</summary>
    public bool HasErrorEstimate { get; }

    /// <inheritdoc/>
    public override string Method =>
        MomentsInWords + " Cholesky's method on the matrix of these moments, in ball arithmetic, gives the coefficients of the orthogonal "
        + "polynomials; its pivots, proven to be above zero, show that the zeros are real and simple. A sign change of the polynomial over "
        + "each of as many disjoint intervals as it has zeros proves where all nodes are, and the intervals are narrowed by further sign "
        + "changes until node and weight lie between the midpoints around one representable value. A weight is the integral of the "
        + "polynomial divided by its linear factor, over the polynomial's derivative at the node. A companion is the anti-Gaussian rule "
        + "(Laurie 1996), proven in the same way. At the end the sums Σ w xᵏ of the found entries are held against the moments of the "
        + "weight function, a check on the proof itself.";

    /// <summary>Where the moments come from, as a sentence.</summary>
    private protected abstract string MomentsInWords { get; }

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var promise = RulePromise.Gauss(Moments(), Points, DropZeroWeights, HasErrorEstimate);
        return new GaussProof(this, data, promise).Run(Constants(cancellation), progress, cancellation);
    }

    /// <summary>The weight function.</summary>
    private protected abstract WeightMoments Moments();

    /// <summary>What judges constants beyond those of every rule; <c>null</c> if there are none.</summary>
    private protected virtual Action<ProofReport>? Constants(CancellationToken cancellation) => null;
}
