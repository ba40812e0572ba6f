using System;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for half-normal variables, the magnitudes of normal noise, on the partial class, struct or record that
/// carries it: nodes, weights and the expectation of a function, as constants that are computed and proven while the program
/// is compiled.
/// </summary>
/// <remarks>
/// <para>The weight function is the density √(2/π) exp(−x²/2) on [0, ∞), so that the weights sum to 1. The generated part has
/// <c>PointCount</c>, <c>DegreeOfExactness</c> (2n − 1 for n points), <c>Nodes</c> (ascending, all positive), <c>Weights</c> and
/// two forms of <c>Expectation(scale, f)</c>: the expectation of f(scale · |Z|) for standard normal Z. The scale is in the
/// variable's own unit and is not its standard deviation, which is scale · √(1 − 2/π). Scale 0 gives f(0); a scale that is
/// negative, NaN or infinite throws <see cref="ArgumentOutOfRangeException"/>. Every node and weight is the representable value
/// nearest to the true one, ties to even.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Steen, Byrne and Gelbard 1969.</para>
/// </remarks>
/// <example>
/// The draught of the hull adds to the sounding by the size of the boat's roll, whichever way it rolls:
/// <code>
/// [GaussHalfRangeHermite(8)]
/// internal static partial class Roll { }
///
/// double meanRise = Roll.Expectation(scale: 0.12, angle => 0.5 * beam * Math.Sin(angle));
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussHalfRangeHermiteAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    public GaussHalfRangeHermiteAttribute(int points) => Points = points;

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The number format of nodes and weights; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;

    /// <summary>
    /// What becomes of a node whose weight is so small that it rounds to zero in <see cref="Format"/>. If <c>false</c> (as it
    /// is if not set), the node stays with the weight +0.0 and the compiler warns once; if <c>true</c>, such nodes are left out
    /// and <c>PointCount</c> counts those that are kept.
    /// </summary>
    public bool DropZeroWeights { get; set; }

    /// <summary>
    /// Whether the rule is to estimate its own error; <c>false</c> if not set. If <c>true</c>, the generated part adds the rule's
    /// anti-Gaussian companion (<c>CompanionNodes</c>, <c>CompanionWeights</c>; one point more) and <c>ExpectationWithError</c>,
    /// which gives half the distance between the two sums beside the expectation: an estimate and no bound (Laurie 1996). Where a
    /// companion's node would leave the interval of the weight function, that is a compile-time error.
    /// </summary>
    public bool ErrorEstimate { get; set; }
}
