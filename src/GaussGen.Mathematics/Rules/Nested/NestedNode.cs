using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>A pair of nodes ±√t beside the node 0, which all levels from its first one on share.</summary>
internal sealed class NestedNode
{
    /// <summary>
    /// With so many bits more than wanted t is asked for: what the weights of the highest level lose to cancellation on the way from t
    /// (measured), and no matter for what is enclosed. All ask for the same, so that t is enclosed once.
    /// </summary>
    internal const int Reserve = 240;

    /// <summary>The pair of nodes of a zero t.</summary>
    internal NestedNode(PositiveZero zero)
    {
        Square = new RememberedNumber(zero.ExactValue, zero.Enclose);
        Positive = new RememberedNumber(
            null, (precision, cancellation) => Ball.Sqrt(Square.Enclose(precision + Reserve, cancellation).Trim(precision + 8), precision + 4));
        Negative = RealNumber.FromEnclosures((precision, cancellation) => Ball.Negate(Positive.Enclose(precision, cancellation)));
    }

    /// <summary>t.</summary>
    internal RealNumber Square { get; }

    /// <summary>√t.</summary>
    internal RealNumber Positive { get; }

    /// <summary>−√t.</summary>
    internal RealNumber Negative { get; }
}
