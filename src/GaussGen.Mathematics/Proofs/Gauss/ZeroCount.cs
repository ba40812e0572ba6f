using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Counts the zeros of Π beyond a point by the sign changes of the three-term recurrence that ends in it.</summary>
/// <remarks>
/// With Pₖ₊₁ = (y − αₖ) Pₖ − βₖ Pₖ₋₁ and all βₖ above zero, P₀, …, P_N is a Sturm sequence: the number of its sign changes at y is the
/// number of zeros of P_N above y (Szegő, Orthogonal Polynomials, 3.3). A member inside the sequence whose sign is not known does not matter
/// where its neighbours have opposite signs: they change once between them in any case. Where they are known to be unequal to zero and
/// have the same sign, the member is not zero, and nothing is decided.
/// </remarks>
internal sealed class ZeroCount(Ball[] diagonal, Ball[] squares, int precision)
{
    /// <summary>How many zeros are above a point; <c>null</c> where the enclosures do not tell.</summary>
    public int? Above(Dyadic y)
    {
        Ball point = Ball.FromDyadic(y);
        Ball before = default;
        Ball current = Ball.FromInteger(1);
        int changes = 0;
        int lastSign = 1;
        bool isOpen = false;
        for (int k = 0; k < diagonal.Length; k++)
        {
            Ball next = Ball.Multiply(Ball.Subtract(point, diagonal[k], precision), current, precision);
            if (k > 0)
            {
                next = Ball.Subtract(next, Ball.Multiply(squares[k], before, precision), precision);
            }

            before = current;
            current = next;
            if (current.ContainsZero)
            {
                if (isOpen)
                {
                    return null;
                }

                isOpen = true;
                continue;
            }

            int sign = current.Midpoint.Sign;
            if (isOpen && sign == lastSign)
            {
                return null;
            }

            changes += sign == lastSign ? 0 : 1;
            lastSign = sign;
            isOpen = false;
        }

        return isOpen ? null : changes;
    }

    /// <summary>Intervals, ascending, that hold one zero each; <c>null</c> where the enclosures do not tell the zeros apart.</summary>
    /// <param name="cancellation">Looked at before each count.</param>
    public List<(Dyadic Low, Dyadic High)>? Isolate(CancellationToken cancellation)
    {
        if (Array.Exists(diagonal, value => !value.IsFinite) || Array.Exists(squares, value => !value.IsFinite))
        {
            return null;
        }

        (Dyadic low, Dyadic high) = Range();
        if (Above(low) != diagonal.Length || Above(high) != 0)
        {
            return null;
        }

        var isolated = new List<(Dyadic Low, Dyadic High)>();
        var open = new Stack<(Dyadic Low, int AboveLow, Dyadic High, int AboveHigh)>();
        open.Push((low, diagonal.Length, high, 0));
        while (open.Count > 0)
        {
            cancellation.ThrowIfCancellationRequested();
            (Dyadic Low, int AboveLow, Dyadic High, int AboveHigh) part = open.Pop();
            int inside = part.AboveLow - part.AboveHigh;
            if (inside == 1)
            {
                isolated.Add((part.Low, part.High));
            }
            else if (inside > 1)
            {
                if (Split(part.Low, part.High) is not var (middle, above))
                {
                    return null;
                }

                // The lower part is taken first, so that the intervals come out ascending.
                open.Push((middle, above, part.High, part.AboveHigh));
                open.Push((part.Low, part.AboveLow, middle, above));
            }
        }

        return isolated;
    }

    /// <summary>An inner point of an interval and its count: the middle, or another one where a zero may lie there.</summary>
    private (Dyadic Middle, int Above)? Split(Dyadic low, Dyadic high)
    {
        Dyadic width = high - low;
        foreach (int sixteenths in new[] { 8, 7, 10 })
        {
            Dyadic middle = (low + (width * new Dyadic(sixteenths, -4))).Reduce();
            if (Above(middle) is int above)
            {
                return (middle, above);
            }
        }

        return null;
    }

    /// <summary>
    /// An interval that holds all zeros: they are the eigenvalues of the symmetric tridiagonal matrix with the diagonal αₖ and the
    /// off-diagonal √βₖ, and lie in the union of its Gershgorin intervals.
    /// </summary>
    private (Dyadic Low, Dyadic High) Range()
    {
        const int Coarse = 32;
        Dyadic? low = null, high = null;
        Ball before = default;
        for (int k = 0; k < diagonal.Length; k++)
        {
            Ball after = k + 1 < diagonal.Length ? Ball.Sqrt(squares[k + 1].Trim(Coarse), Coarse) : default;
            Ball radius = Ball.Add(before, after, Coarse);
            Dyadic least = Ball.Subtract(diagonal[k].Trim(Coarse), radius, Coarse).Lower;
            Dyadic most = Ball.Add(diagonal[k].Trim(Coarse), radius, Coarse).Upper;
            low = low is { } l && l < least ? l : least;
            high = high is { } h && h > most ? h : most;
            before = after;
        }

        Dyadic margin = (high!.Value - low!.Value).ScaleByPowerOfTwo(-8) + Dyadic.Abs(high.Value).ScaleByPowerOfTwo(-24);
        margin = margin.IsZero ? new Dyadic(1, 0) : margin;
        return ((low.Value - margin).Reduce(), (high.Value + margin).Reduce());
    }
}
