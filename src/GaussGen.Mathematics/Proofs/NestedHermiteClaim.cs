using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be a correctly rounded nested rule for the standard normal density (Genz and Keister 1996): spans and constants as
/// <see cref="GaussRuleClaim"/>, degrees of exactness 1, 5, 15, 29, 51. With an error estimate the companion is the rule of the level below and the
/// factor 1; at level 0 it is the anti-Gaussian rule and the factor ½.
/// </summary>
public sealed record NestedHermiteClaim : TableClaim
{
    /// <summary>The highest level.</summary>
    public const int LargestLevel = 4;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="level">The level, from 0 to <see cref="LargestLevel"/>: 1, 3, 9, 19 or 35 points.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">Whether the rule has a companion that estimates its error.</param>
    /// <exception cref="ArgumentOutOfRangeException">There is no such level.</exception>
    public NestedHermiteClaim(int level, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate)
        : base(format)
    {
        if (level is < 0 or > LargestLevel)
        {
            string message = string.Format(CultureInfo.InvariantCulture, "The level must be from 0 to {0}.", LargestLevel);
            throw new ArgumentOutOfRangeException(nameof(level), level, message);
        }

        Level = level;
        DropZeroWeights = dropZeroWeights;
        HasErrorEstimate = hasErrorEstimate;
    }

    /// <summary>The level.</summary>
    public int Level { get; }

    /// <summary>Whether exactly the nodes whose weight rounds to zero are left out.</summary>
    public bool DropZeroWeights { get; }

    /// <summary>Whether the rule has a companion that estimates its error.</summary>
    public bool HasErrorEstimate { get; }

    /// <inheritdoc/>
    public override string Title =>
        ClaimTitle.NestedHermite(Level, NestedSource.PointsOf(Level), DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    public override string Method =>
        "Nested Hermite rules (Genz and Keister 1996): the nodes are the zeros of a product of polynomials, one more factor a level, so that the "
        + "nodes of a level are among those of the next. The coefficients of each factor are the only solution of linear equations in "
        + "the moments of the normal density, enclosed by elimination in balls. As many sign changes over disjoint intervals as the "
        + "product has zeros prove that they are real and where they are, and the intervals are narrowed by further sign changes until node "
        + "and weight lie between the midpoints around one representable value. A weight is the integral of the polynomial divided by its "
        + "linear factor, over the polynomial's derivative at the node. At the end the sums Σ w xᵏ of the found entries are held against the "
        + "moments of the normal density, a check on the proof itself.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new GaussProof(this, data, NestedSource.Promise(Level, DropZeroWeights, HasErrorEstimate)).Run(null, progress, cancellation);
}
