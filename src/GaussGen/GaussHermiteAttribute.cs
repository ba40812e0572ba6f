using System;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss–Hermite rule on the partial class, struct or record that carries it: nodes, weights and the expectation
/// of a function of a normal variable, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has <c>PointCount</c>, <c>DegreeOfExactness</c> (2n − 1 for n points), <c>Nodes</c> (ascending),
/// <c>Weights</c> and two forms of <c>Expectation</c>; a rule of the physicists' convention adds <c>Integral</c>, which is
/// ∫ f(x) exp(−x²) dx. Every node and weight is the representable value nearest to the true one, ties to even.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: NIST DLMF 3.5(v) and 18.3; Golub &amp; Welsch 1969.</para>
/// </remarks>
/// <example>
/// <code>
/// [GaussHermite(16)]
/// internal static partial class Sixteen { }
///
/// double meanEcho = Sixteen.Expectation(mean: 4.2, standardDeviation: 0.3, range => Math.Exp(-0.5 * range));
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussHermiteAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 1000. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from
    /// the rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    public GaussHermiteAttribute(int points) => Points = points;

    /// <summary>The number of nodes, from 1 to 1000.</summary>
    public int Points { get; }

    /// <summary>The weight function; <see cref="HermiteConvention.Probabilist"/> if not set.</summary>
    public HermiteConvention Convention { get; set; } = HermiteConvention.Probabilist;

    /// <summary>The number format of nodes and weights; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;

    /// <summary>
    /// What becomes of a node whose weight is so small that it rounds to zero in <see cref="Format"/>. If <c>false</c> (as it
    /// is if not set), the node stays with the weight +0.0 and the compiler warns once; if <c>true</c>, such nodes are left out
    /// and <c>PointCount</c> counts those that are kept.
    /// </summary>
    public bool DropZeroWeights { get; set; }

    /// <summary>
    /// Whether the rule is to estimate its own error; <c>false</c> if not set. If <c>true</c>, with 200 points at most, the
    /// generated part adds the rule's anti-Gaussian companion (<c>CompanionNodes</c>, <c>CompanionWeights</c>; one point more) and
    /// <c>ExpectationWithError</c>, which gives half the distance between the two sums beside the expectation: an estimate and no
    /// bound (Laurie 1996). It costs n + 1 calls of the function beside n.
    /// </summary>
    public bool ErrorEstimate { get; set; }
}
