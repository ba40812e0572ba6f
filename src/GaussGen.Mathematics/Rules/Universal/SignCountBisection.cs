using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Separates the nodes of a rule by bisection on the sign changes of π₀, π₁, …, πₙ (Sturm). The signs are those of midpoints, so that the
/// outcome is a proposal and no proof.
/// </summary>
internal sealed class SignCountBisection(Recurrence recurrence, int precision, CancellationToken cancellation)
{
    /// <summary>A range is narrow enough where it is 2^−12 of the distance to the next ones.</summary>
    private const int Narrowness = 12;

    private readonly Dyadic[] _low = new Dyadic[recurrence.Count];
    private readonly Dyadic[] _high = new Dyadic[recurrence.Count];

    // Enough to tell apart what the precision tells apart, and a limit in any case.
    private readonly int _steps = 2 * precision;

    /// <summary>Points close to all nodes, which lie between −bound and bound; <c>null</c> where the counts contradict each other.</summary>
    internal Dyadic[]? Separate(Dyadic bound)
    {
        if (!Isolate(-bound, bound, 0, recurrence.Count, _steps))
        {
            return null;
        }

        var middles = new Dyadic[recurrence.Count];
        for (int i = 0; i < middles.Length; i++)
        {
            for (int step = 0; !IsNarrow(i) && step < _steps; step++)
            {
                Halve(i);
                Halve(i + 1);
            }

            middles[i] = Middle(_low[i], _high[i]);
        }

        return middles;
    }

    /// <summary>Halves a range that has the nodes from index below to before above until each has a range of its own.</summary>
    private bool Isolate(Dyadic low, Dyadic high, int below, int above, int steps)
    {
        if (above - below <= 1)
        {
            if (above > below)
            {
                (_low[below], _high[below]) = (low, high);
            }

            return true;
        }

        Dyadic middle = Middle(low, high);
        int count = CountBelow(middle);
        return steps > 0 && count >= below && count <= above
            && Isolate(low, middle, below, count, steps - 1)
            && Isolate(middle, high, count, above, steps - 1);
    }

    private void Halve(int i)
    {
        if (i < _low.Length)
        {
            Dyadic middle = Middle(_low[i], _high[i]);
            (_low[i], _high[i]) = CountBelow(middle) <= i ? (middle, _high[i]) : (_low[i], middle);
        }
    }

    private bool IsNarrow(int i)
    {
        Dyadic width = (_high[i] - _low[i]).ScaleByPowerOfTwo(Narrowness);
        return (i == 0 || width <= _low[i] - _high[i - 1]) && (i + 1 == _low.Length || width <= _low[i + 1] - _high[i]);
    }

    /// <summary>How many nodes seem to be below a point: n less the sign changes.</summary>
    private int CountBelow(Dyadic point)
    {
        cancellation.ThrowIfCancellationRequested();
        int changes = 0, sign = 1;
        foreach (Ball value in MonicPolynomials.AllAt(recurrence, Ball.FromDyadic(point), precision))
        {
            int next = value.Midpoint.Sign == 0 ? -sign : value.Midpoint.Sign;
            changes += next == sign ? 0 : 1;
            sign = next;
        }

        return recurrence.Count - changes;
    }

    private static Dyadic Middle(Dyadic low, Dyadic high) => (low + high).ScaleByPowerOfTwo(-1).Reduce();
}
