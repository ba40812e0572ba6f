using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>All nodes and weights of a rule at one precision, in the coordinate y of the weight function.</summary>
/// <param name="Nodes">The nodes, ascending; of an even weight the upper half is enclosed and the lower one is its mirror image.</param>
/// <param name="Weights">The weights, which sum to 1.</param>
internal sealed record GaussEnclosures(Ball[] Nodes, Ball[] Weights)
{
    /// <summary>The same with the nodes in the variable of which the weight function's moments are the moments.</summary>
    internal GaussEnclosures ForMomentsOf(WeightFunction weight) => this with { Nodes = Array.ConvertAll(Nodes, weight.ToMomentCoordinate) };
}

/// <summary>From a recurrence to certified nodes and weights.</summary>
internal static class GaussConstruction
{
    /// <summary>What is lost between the working precision and the wanted accuracy relative to the gaps between nodes.</summary>
    private const int Reserve = 44;

    /// <summary>A weight may be known to so many bits fewer than the nodes.</summary>
    private const int WeightSlack = 12;

    /// <summary>The coefficients are asked for with so many more bits, as errors in them grow along the recurrence.</summary>
    private const int CoefficientSlack = 8;

    private const int MaximumAttempts = 12;

    /// <summary>Encloses the n nodes and weights of the Gauss rule.</summary>
    /// <param name="recurrenceAt">The recurrence with n coefficients aₖ at an accuracy in bits.</param>
    /// <param name="isGraded">See <see cref="WeightFunction.IsGraded"/>.</param>
    /// <param name="precision">The working precision; the enclosures are about <see cref="Reserve"/> bits wider, or narrower.</param>
    /// <param name="cancellation">Looked at for each node.</param>
    /// <exception cref="RuleConstructionException">The nodes cannot be separated within the limits.</exception>
    internal static GaussEnclosures Construct(
        Func<int, CancellationToken, Recurrence> recurrenceAt, bool isGraded, int precision, CancellationToken cancellation)
    {
        Dyadic[]? starts = null;
        int working = Math.Max(precision, Reserve + 32);
        int target = working - Reserve;
        // How close the points must come to the nodes; and bits that the evaluations need beyond what usually serves.
        int search = target, extra = 0;
        for (int attempt = 0; attempt < MaximumAttempts; attempt++)
        {
            Recurrence recurrence = recurrenceAt(working + CoefficientSlack + extra, cancellation);
            if (recurrence.Count == 1)
            {
                return new GaussEnclosures([recurrence.Diagonal(0)], [Ball.FromInteger(1)]);
            }

            int missing = 0;
            starts ??= StartingNodes.FromDoubles(recurrence, isGraded, cancellation);
            NodeCertificate.Point[]? points =
                starts is null ? null : Evaluate(recurrence, starts, isGraded, search, extra, out missing, cancellation);
            if (points is null)
            {
                starts = missing > 0 ? starts : StartingNodes.FromSignCounts(recurrence, working + extra, cancellation);
                extra += Math.Max(missing, Math.Max(extra / 2, 32)) + 16;
                continue;
            }

            GaussEnclosures? enclosures = AreIsolated(points) ? Enclose(recurrence, points, working + extra) : null;
            missing = enclosures is null ? target / 2 : MissingBits(points, enclosures, isGraded, target);
            if (enclosures is not null && missing <= 0)
            {
                return enclosures;
            }

            starts = Array.ConvertAll(points, point => point.At);
            search += missing + 16;
            extra += missing + 16;
        }

        throw new RuleConstructionException(
            RuleFailure.RecurrenceNotDetermined,
            "The nodes of the rule lie too close together to be told apart; ask for fewer points, or for a weight whose parts differ less in size.");
    }

    /// <summary>The values beside each node; of an even weight only from the middle upwards. Outermost first.</summary>
    private static NodeCertificate.Point[]? Evaluate(
        Recurrence recurrence, Dyadic[] starts, bool isGraded, int target, int extra, out int missing, CancellationToken cancellation)
    {
        int n = recurrence.Count;
        int precision = target + Reserve + extra + (3 * n / 4);
        Recurrence coefficients = recurrence.Trim(precision + 24);
        var points = new NodeCertificate.Point[n];
        missing = 0;
        for (int i = n - 1; i >= FirstOf(recurrence); i--)
        {
            cancellation.ThrowIfCancellationRequested();
            bool isCentre = recurrence.IsEven && (2 * i) + 1 == n;
            Dyadic? at = isCentre
                ? Dyadic.Zero
                : NewtonSearch.Refine(coefficients, starts[i], StartGapLog2(starts, i, isGraded), target, extra, out missing, cancellation);
            if (at is null)
            {
                return null;
            }

            int leading = Math.Max(0, at.Value.BitLength - target - 16);
            points[i] = new NodeCertificate.Point(
                at.Value, MonicPolynomials.At(coefficients, at.Value, precision + leading, target + 28));
        }

        Mirror(points, recurrence.IsEven);
        return points;
    }

    private static GaussEnclosures Enclose(Recurrence recurrence, NodeCertificate.Point[] points, int precision)
    {
        int n = points.Length;
        Ball norm = Ball.FromInteger(1);
        for (int k = 1; k < n; k++)
        {
            norm = Ball.Multiply(norm, recurrence.Square(k), precision);
        }

        var nodes = new Ball[n];
        var weights = new Ball[n];
        for (int i = FirstOf(recurrence); i < n; i++)
        {
            Dyadic gap = Gap(points, i);
            bool isCentre = recurrence.IsEven && (2 * i) + 1 == n;
            nodes[i] = NodeCertificate.Node(points[i], gap, precision, out Bound distance);
            weights[i] = NodeCertificate.Weight(points[i], gap, isCentre ? Bound.Zero : distance, n, norm, precision);
            if (isCentre)
            {
                // πₙ is odd, so that the point 0 is the node.
                nodes[i] = default;
                weights[i] = Ball.Divide(norm, points[i].Values.Sum, precision);
            }
            else if (recurrence.IsEven)
            {
                nodes[n - 1 - i] = Ball.Negate(nodes[i]);
                weights[n - 1 - i] = weights[i];
            }
        }

        return new GaussEnclosures(nodes, weights);
    }

    private static bool AreIsolated(NodeCertificate.Point[] points)
    {
        for (int i = 0; i < points.Length; i++)
        {
            if (!NodeCertificate.IsIsolated(points[i], Gap(points, i)))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>
    /// How many bits the nodes lack relative to their gaps, of a graded matrix also to themselves, or the weights, which may have fewer, to
    /// themselves.
    /// </summary>
    private static int MissingBits(NodeCertificate.Point[] points, GaussEnclosures enclosures, bool isGraded, int target)
    {
        int missing = int.MinValue;
        for (int i = 0; i < points.Length; i++)
        {
            Bound radius = enclosures.Nodes[i].Radius;
            int bits = radius.IsZero ? target : Approximation.FloorLog2(Gap(points, i)) - radius.CeilingLog2;
            bits = isGraded ? Math.Min(bits, enclosures.Nodes[i].RelativeAccuracyBits) : bits;
            missing = Math.Max(missing, target - Math.Min(bits, enclosures.Weights[i].RelativeAccuracyBits + WeightSlack));
        }

        return missing;
    }

    private static int FirstOf(Recurrence recurrence) => recurrence.IsEven ? recurrence.Count / 2 : 0;

    private static void Mirror(NodeCertificate.Point[] points, bool isEven)
    {
        for (int i = 0; isEven && i < points.Length / 2; i++)
        {
            NodeCertificate.Point mirrored = points[points.Length - 1 - i];
            points[i] = new NodeCertificate.Point(-mirrored.At, mirrored.Values);
        }
    }

    /// <summary>The distance to the nearest other point.</summary>
    private static Dyadic Gap(NodeCertificate.Point[] points, int i)
    {
        Dyadic? below = i > 0 ? points[i].At - points[i - 1].At : null;
        Dyadic? above = i + 1 < points.Length ? points[i + 1].At - points[i].At : null;
        return below is null || (above is not null && above.Value < below.Value) ? above!.Value : below.Value;
    }

    private static int StartGapLog2(Dyadic[] starts, int i, bool isGraded)
    {
        int below = i > 0 ? Approximation.FloorLog2(starts[i] - starts[i - 1]) : int.MaxValue;
        int above = i + 1 < starts.Length ? Approximation.FloorLog2(starts[i + 1] - starts[i]) : int.MaxValue;
        int gap = Math.Min(below, above);
        return isGraded ? Math.Min(gap, Approximation.FloorLog2(starts[i])) : gap;
    }
}
