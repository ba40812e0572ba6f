using System;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for a standard normal variable that is known to lie in an interval, on the partial class, struct or
/// record that carries it: nodes, weights and the expectation of a function, as constants that are computed and proven while
/// the program is compiled.
/// </summary>
/// <remarks>
/// <para>The weight function is the standard normal density on [<see cref="Lower"/>, <see cref="Upper"/>] divided by the
/// probability of the interval, so that the weights sum to 1. The generated part has <c>PointCount</c>, <c>DegreeOfExactness</c>
/// (2n − 1 for n points), <c>Nodes</c> (ascending, all inside the interval), <c>Weights</c> and two forms of
/// <c>Expectation(f)</c>: the expectation of f(Z) for standard normal Z, given that Z is in the interval. Every node and weight
/// is the representable value nearest to the true one, ties to even.</para>
/// <para>The interval is in standard deviations from the mean, and cannot be moved at run time: for a sensor with mean m and
/// standard deviation s that reads from a to b, give (a − m)/s and (b − m)/s, and let f take m + s·z. An argument means its exact
/// binary value.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Tallis 1961 (moments); NIST DLMF 7.6.2.</para>
/// </remarks>
/// <example>
/// The depth sounder shows nothing below 0.5 m, two standard deviations under the mean:
/// <code>
/// [GaussTruncatedNormal(10, lower: -2.0, upper: double.PositiveInfinity)]
/// internal static partial class Shallow { }
///
/// double meanDelay = Shallow.Expectation(z => 2.0 * (1.5 + (0.5 * z)) / speedOfSound);
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussTruncatedNormalAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points on an interval.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    /// <param name="lower">
    /// The lower end, in standard deviations from the mean; negative infinity where <paramref name="upper"/> is finite.
    /// </param>
    /// <param name="upper">
    /// The upper end, above the lower one; positive infinity where <paramref name="lower"/> is finite. An interval that is empty,
    /// the whole line, or of a probability below 2⁻¹⁰²² (about beyond 37 standard deviations) is a compile-time error.
    /// </param>
    public GaussTruncatedNormalAttribute(int points, double lower, double upper)
    {
        Points = points;
        Lower = lower;
        Upper = upper;
    }

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The lower end of the interval, in standard deviations from the mean.</summary>
    public double Lower { get; }

    /// <summary>The upper end of the interval, in standard deviations from the mean.</summary>
    public double Upper { get; }

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
