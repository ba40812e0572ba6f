using System;

namespace GaussGen;

/// <summary>
/// Asks for one of a chain of rules for normal variables in which each rule has all the nodes of the one before, on the partial
/// class, struct or record that carries it: nodes, weights and the expectation of a function, as constants that are computed
/// and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>Levels 0 to 4 have 1, 3, 9, 19 and 35 points and degrees of exactness 1, 5, 15, 29 and 51. The weight function is the
/// standard normal density; the weights sum to 1, and two of level 3 are negative. The generated part has <c>PointCount</c>,
/// <c>DegreeOfExactness</c>, <c>Nodes</c> (ascending), <c>Weights</c> and two forms of
/// <c>Expectation(mean, standardDeviation, f)</c>. Every node and weight is the representable value nearest to the true one, ties
/// to even.</para>
/// <para>Nested rules are for those who compare levels, or build sparse grids: what was computed at a level serves the next.
/// For one sum alone a rule of <see cref="GaussHermiteAttribute"/> is exact to a higher degree with as many points.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Genz and Keister 1996.</para>
/// </remarks>
/// <example>
/// <code>
/// [NestedHermite(2, ErrorEstimate = true)]
/// internal static partial class Nine { }
///
/// double meanEcho = Nine.ExpectationWithError(4.2, 0.3, range => Math.Exp(-0.5 * range), out double error);
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class NestedHermiteAttribute : Attribute
{
    /// <summary>Asks for the rule of a level.</summary>
    /// <param name="level">The level, from 0 to 4. One that does not exist is a compile-time error, not an exception.</param>
    public NestedHermiteAttribute(int level) => Level = level;

    /// <summary>The level, from 0 to 4.</summary>
    public int Level { get; }

    /// <summary>The number format of nodes and weights; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;

    /// <summary>
    /// What becomes of a node whose weight is so small that it rounds to zero in <see cref="Format"/>. If <c>false</c> (as it
    /// is if not set), the node stays with the weight +0.0 and the compiler warns once; if <c>true</c>, such nodes are left out
    /// and <c>PointCount</c> counts those that are kept.
    /// </summary>
    public bool DropZeroWeights { get; set; }

    /// <summary>
    /// Whether the rule is to estimate its own error; <c>false</c> if not set. If <c>true</c>, the generated part adds the rule of
    /// the level below (at level 0 the anti-Gaussian rule of Laurie 1996) as <c>CompanionNodes</c> and <c>CompanionWeights</c>, and
    /// <c>ExpectationWithError</c>, which gives the distance between the two sums (at level 0 half of it) beside the expectation:
    /// an estimate and no bound.
    /// </summary>
    public bool ErrorEstimate { get; set; }
}
