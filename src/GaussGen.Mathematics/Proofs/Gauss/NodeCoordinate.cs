using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Between the line and the coordinate of a rule's polynomial: y = x − c, or t = (x − c)² for an even weight.</summary>
/// <param name="center">c.</param>
/// <param name="isEven">Whether the weight is even about c.</param>
internal sealed class NodeCoordinate(Dyadic center, bool isEven)
{
    /// <summary>
    /// The interval, in the coordinate, of what rounds to a found value; <c>null</c> for NaN, the infinities and numbers at c of an even weight.
    /// </summary>
    public (Dyadic Low, Dyadic High)? RoundingInterval(BinaryFormat format, ulong bits)
    {
        if (!format.IsFinite(bits))
        {
            return null;
        }

        (Dyadic low, Dyadic high) = format.RoundingInterval(bits);
        low -= center;
        high -= center;
        if (!isEven)
        {
            return (low, high);
        }

        if (low.Sign < 0)
        {
            (low, high) = (-high, -low);
        }

        return low.Sign >= 0 ? (low * low, high * high) : null;
    }

    /// <summary>The node on the line.</summary>
    /// <param name="zero">An enclosure in the coordinate.</param>
    /// <param name="side">1, or −1 for the node below the centre of an even weight.</param>
    /// <param name="precision">Working precision in bits.</param>
    public Ball ToLine(Ball zero, int side, int precision)
    {
        Ball y = isEven ? Ball.Sqrt(zero, precision) : zero;
        return Ball.Add(Ball.FromDyadic(center), side < 0 ? Ball.Negate(y) : y, int.MaxValue);
    }

    /// <summary>The node on the line exactly; <c>null</c> if it is not rational.</summary>
    public Rational? ToLine(Rational zero, int side)
    {
        Rational? y = isEven ? ExactRule.Root(zero) : zero;
        return y is { } known ? center.ToRational() + (side * known) : null;
    }
}
