using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// Finds one zero of a Hermite polynomial by its rank, and with it a node and a weight: each as an enclosure and as the proven
/// nearest value. The methods and their theorems are those of <see cref="HermiteProof"/>.
/// </summary>
internal sealed class HermiteZeroSearch
{
    /// <summary>Where narrowing gives up: the zero is then known to so many bits after the point.</summary>
    private const int LargestNarrowing = 1 << 13;

    private readonly int _degree;
    private readonly int _variance;
    private readonly BinaryFormat _format;
    private readonly bool _needsNodesOfZeroWeights;
    private readonly HermiteZeroEnclosure _enclosure;
    private readonly Dictionary<Dyadic, int> _counts = [];

    public HermiteZeroSearch(GaussHermiteClaim claim)
    {
        _degree = claim.Points;
        _variance = claim.Weight == HermiteWeight.StandardNormalDensity ? 1 : 2;
        _format = claim.Format;
        _needsNodesOfZeroWeights = !claim.DropZeroWeights;
        _enclosure = new HermiteZeroEnclosure(_degree, _variance);
    }

    /// <summary>The zero of a rank: 0 for the zero at 0 of an odd polynomial, 1 for the smallest one above 0, and so on.</summary>
    /// <param name="rank">The rank.</param>
    /// <param name="hints">Encodings that may be the rounded node.</param>
    /// <param name="cancellation">Looked at before each evaluation.</param>
    public (KnownNumber Node, KnownNumber Weight) Find(int rank, IEnumerable<ulong> hints, CancellationToken cancellation)
    {
        if (rank == 0)
        {
            return Narrow(rank, 0UL, Dyadic.Zero, Dyadic.Zero, cancellation);
        }

        foreach (ulong hint in hints)
        {
            if (IsPlausible(hint) && IsNode(hint, rank, cancellation))
            {
                (Dyadic lower, Dyadic upper) = _format.RoundingInterval(hint);
                return Narrow(rank, hint, ToPolynomial(lower), ToPolynomial(upper), cancellation);
            }
        }

        Dyadic above = new(BigInteger.One, 0);
        while (IsBelowZero(above, rank, cancellation))
        {
            above = above.ScaleByPowerOfTwo(1);
        }

        return Narrow(rank, null, Dyadic.Zero, above, cancellation);
    }

    /// <summary>
    /// Narrows the interval that holds the zero until the roundings of weight and node are decided. Each evaluation squares the
    /// distance, so that the precision doubles with it; 1.3 bits a step of the recurrence are added for what balls lose there.
    /// </summary>
    private (KnownNumber Node, KnownNumber Weight) Narrow(
        int rank, ulong? nodeBits, Dyadic lower, Dyadic upper, CancellationToken cancellation)
    {
        Bisect(rank, ref lower, ref upper, cancellation);
        Dyadic u = (lower + upper).ScaleByPowerOfTwo(-1);
        Dyadic distance = (upper - lower).ScaleByPowerOfTwo(-1);
        int extra = 0;
        while (true)
        {
            cancellation.ThrowIfCancellationRequested();
            int known = distance.IsZero ? 64 : 1 - Bound.FromDyadic(distance).CeilingLog2;
            int precision = 32 + (_degree * 13 / 10) + (2 * known) + extra;
            (Ball offset, Ball weight) = _enclosure.At(u, distance, precision);
            if (_variance == 2)
            {
                weight = Ball.Multiply(weight, Constants.SqrtPi(precision, cancellation), precision);
            }

            Ball node = Ball.Add(Ball.FromDyadic(u), offset, precision).ScaleByPowerOfTwo(1 - _variance);
            ulong? weightBits = NearestValue.Of(_format, weight);
            bool needsNode = _needsNodesOfZeroWeights || weightBits != 0;
            if (nodeBits is null && needsNode && NearestValue.Of(_format, node) is ulong bits && IsNode(bits, rank, cancellation))
            {
                nodeBits = bits;
            }

            bool isDecided = weightBits is not null && (nodeBits is not null || !needsNode);
            if (isDecided || known + extra > LargestNarrowing)
            {
                weight = weight.IsFinite ? weight : default;
                return (new KnownNumber(node.Lower, node.Upper, nodeBits), new KnownNumber(weight.Lower, weight.Upper, weightBits));
            }

            extra += Advance(ref u, ref distance, offset);
        }
    }

    /// <summary>Moves to the middle of the new enclosure. Where that is not much narrower, the precision is to blame.</summary>
    /// <returns>Bits to add to the precision.</returns>
    private static int Advance(ref Dyadic u, ref Dyadic distance, Ball offset)
    {
        Dyadic radius = offset.Radius.ToDyadic();
        if (radius.ScaleByPowerOfTwo(2) > distance || distance.IsZero)
        {
            return 64;
        }

        if (radius.IsZero)
        {
            // The zero is the new point itself: so it is for n = 2, where the zeros are ±1.
            u += offset.Center;
            distance = Dyadic.Zero;
            return 0;
        }

        // The new point keeps few bits more than are known of the zero: what is cut off is added to the distance.
        int unit = offset.Radius.CeilingLog2 - 4;
        Dyadic middle = u + offset.Center;
        int shift = unit - middle.Exponent;
        Dyadic point = shift > 0 ? new Dyadic(middle.Mantissa >> shift, unit) : middle;
        u = point;
        distance = radius + (middle - point);
        return 0;
    }

    /// <summary>Halves the interval by exact counts until an evaluation in its middle encloses the zero.</summary>
    private void Bisect(int rank, ref Dyadic lower, ref Dyadic upper, CancellationToken cancellation)
    {
        while (true)
        {
            Dyadic middle = (lower + upper).ScaleByPowerOfTwo(-1);
            if (_enclosure.IsNearEnough(middle, (upper - lower).ScaleByPowerOfTwo(-1)))
            {
                return;
            }

            if (IsBelowZero(middle, rank, cancellation))
            {
                lower = middle;
            }
            else
            {
                upper = middle;
            }
        }
    }

    /// <summary>Whether the zero of a rank lies between the rounding midpoints of a value: exact.</summary>
    private bool IsNode(ulong bits, int rank, CancellationToken cancellation)
    {
        (Dyadic lower, Dyadic upper) = _format.RoundingInterval(bits);
        return lower.Sign >= 0
            && IsBelowZero(ToPolynomial(lower), rank, cancellation)
            && !IsBelowZero(ToPolynomial(upper), rank, cancellation);
    }

    /// <summary>Whether a point lies below the zero of a rank: exact.</summary>
    private bool IsBelowZero(Dyadic u, int rank, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        u = u.Reduce();
        if (!_counts.TryGetValue(u, out int above))
        {
            above = HermiteZeroCount.Above(_degree, _variance, u, cancellation);
            _counts.Add(u, above);
        }

        return above > (_degree / 2) - rank;
    }

    /// <summary>
    /// Whether a found value is of a size that nodes have; the exact count at any other would only take long to say no.
    /// </summary>
    private bool IsPlausible(ulong bits)
    {
        if (!_format.IsFinite(bits) || _format.IsNegative(bits))
        {
            return false;
        }

        Dyadic value = _format.ValueOf(bits);
        int top = value.BitLength + value.Exponent;
        return top is > -8 and <= 8;
    }

    /// <summary>x as u of the monic polynomials: u = x or 2x.</summary>
    private Dyadic ToPolynomial(Dyadic x) => x.ScaleByPowerOfTwo(_variance - 1);
}
