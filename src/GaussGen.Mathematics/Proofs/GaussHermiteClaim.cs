using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>The weight function of a Gauss–Hermite rule.</summary>
public enum HermiteWeight
{
    /// <summary>exp(−x²/2)/√(2π), the density of the standard normal distribution; the nodes are the zeros of He (probabilists).</summary>
    StandardNormalDensity,

    /// <summary>exp(−x²); the nodes are the zeros of H (physicists).</summary>
    ExponentialOfMinusSquare,
}

/// <summary>
/// The claim to be a correctly rounded Gauss–Hermite rule: spans "Nodes" and "Weights", constants "PointCount" and
/// "DegreeOfExactness" (2n−1, of the whole rule also where zero weights are dropped), and, where the data has them, "NodeScale" (1
/// or √2) and "ReciprocalTotalWeight" (1 or 1/√π). Each entry is proven by <see cref="HermiteProof"/>.
/// </summary>
public sealed record GaussHermiteClaim : TableClaim
{
    /// <summary>The largest number of points.</summary>
    public const int LargestPointCount = 1000;

    /// <summary>The largest number of points of a rule with an error estimate.</summary>
    public const int LargestPointCountWithErrorEstimate = 200;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="points">The number of points, from 1 to <see cref="LargestPointCount"/>.</param>
    /// <param name="weight">The weight function.</param>
    /// <param name="format">The number format of nodes and weights.</param>
    /// <param name="dropZeroWeights">Whether exactly the nodes whose weight rounds to zero are left out.</param>
    /// <param name="hasErrorEstimate">
    /// Whether the rule has an anti-Gaussian companion that estimates its error; with one it has at most
    /// <see cref="LargestPointCountWithErrorEstimate"/> points.
    /// </param>
    /// <exception cref="ArgumentOutOfRangeException">The points or the weight are outside their range.</exception>
    public GaussHermiteClaim(
        int points, HermiteWeight weight, BinaryFormat format, bool dropZeroWeights, bool hasErrorEstimate = false)
        : base(format)
    {
        if (points is < 1 or > LargestPointCount)
        {
            string message = string.Format(
                CultureInfo.InvariantCulture, "A Gauss–Hermite rule must have from 1 to {0} points.", LargestPointCount);
            throw new ArgumentOutOfRangeException(nameof(points), points, message);
        }

        if (hasErrorEstimate && points > LargestPointCountWithErrorEstimate)
        {
            string message = string.Format(
                CultureInfo.InvariantCulture,
                "A Gauss–Hermite rule with an error estimate must have from 1 to {0} points.",
                LargestPointCountWithErrorEstimate);
            throw new ArgumentOutOfRangeException(nameof(points), points, message);
        }

        if (weight is not (HermiteWeight.StandardNormalDensity or HermiteWeight.ExponentialOfMinusSquare))
        {
            throw new ArgumentOutOfRangeException(nameof(weight), weight, "The weight must be one of the two Hermite weights.");
        }

        Points = points;
        Weight = weight;
        DropZeroWeights = dropZeroWeights;
        HasErrorEstimate = hasErrorEstimate;
    }

    /// <summary>The number of points before any is dropped.</summary>
    public int Points { get; }

    /// <summary>The weight function.</summary>
    public HermiteWeight Weight { get; }

    /// <summary>Whether exactly the nodes whose weight rounds to zero are left out.</summary>
    public bool DropZeroWeights { get; }

    /// <summary>Whether the rule has an anti-Gaussian companion that estimates its error.</summary>
    public bool HasErrorEstimate { get; }

    /// <inheritdoc/>
    public override string Title =>
        ClaimTitle.GaussHermite(Points, Weight == HermiteWeight.ExponentialOfMinusSquare, DropZeroWeights, HasErrorEstimate);

    /// <inheritdoc/>
    public override string Method =>
        "Gauss–Hermite rules: the nodes are the zeros of the Hermite polynomial. For each node, the zeros beyond the two rounding "
        + "midpoints of the found value are counted exactly, in integers, by the sign changes of the recurrence (Sturm 1829; "
        + "Szegő, Orthogonal Polynomials, 3.3). The counts differ by one exactly if the zero of that rank lies between the "
        + "midpoints, so that the found value is the nearest one. Each weight is the Christoffel number, enclosed over an "
        + "enclosure of its zero that is narrowed until it lies between the midpoints around one representable value. A companion is the "
        + "anti-Gaussian rule (Laurie 1996): sign changes of its polynomial enclose its nodes, and a weight is the integral of the "
        + "polynomial divided by its linear factor, over the polynomial's derivative at the node. At the end "
        + "the sums Σ w xᵏ of the found entries are held against the moments of the weight function, a check on the proof itself.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new HermiteProof(this, data).Run(progress, cancellation);
}
