using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>A pair of nodes ±√t beside the node 0, which all levels from its first one on share.</summary>
/// <param name="zero">t.</param>
internal sealed class NestedNode(PositiveZero zero)
{
    /// <summary>t.</summary>
    internal PositiveZero Zero { get; } = zero;

    /// <summary>√t.</summary>
    internal RealNumber Positive { get; } = new RememberedNumber(null, (precision, cancellation) => Root(zero, precision, cancellation));

    /// <summary>−√t.</summary>
    internal RealNumber Negative { get; } = new RememberedNumber(
        null, (precision, cancellation) => Ball.Negate(Root(zero, precision, cancellation)));

    private static Ball Root(PositiveZero zero, int precision, CancellationToken cancellation) =>
        Ball.Sqrt(zero.Enclose(precision + 4, cancellation), precision + 4);
}
