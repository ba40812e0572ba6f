using System;
using System.Collections.Generic;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for a finite mixture of normal distributions on the partial class, struct or record that carries it:
/// nodes, weights and the expectation of a function, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The weight function is Σ pᵢ φ((x − mᵢ)/sᵢ)/sᵢ with the standard normal density φ, where the pᵢ are
/// <see cref="Weights"/> divided by their exact sum, so that they need not sum to 1. The generated part has <c>PointCount</c>,
/// <c>DegreeOfExactness</c> (2n − 1 for n points), <c>Nodes</c> (ascending, in the variable's own unit), <c>Weights</c>, which
/// sum to 1, and two forms of <c>Expectation(f)</c>. Every node and weight is the representable value nearest to the true one,
/// ties to even. An argument means its exact binary value.</para>
/// <para>One rule of n points for a mixture of k components does the work of k rules with n points each.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>In a project that is marked as CLS-compliant, the compiler warns of the arrays in this attribute (CS3016).</para>
/// <para>Formulas: Stein 1981 (moments of the components); Golub and Welsch 1969.</para>
/// </remarks>
/// <example>
/// A range finder mostly sees the quay, and now and then the fender in front of it (metres):
/// <code>
/// [GaussNormalMixture(12, new[] { 0.9, 0.1 }, new[] { 4.0, 3.2 }, new[] { 0.05, 0.2 })]
/// internal static partial class Quay { }
///
/// double meanForce = Quay.Expectation(range => stiffness * Math.Exp(-range));
/// </code>
/// </example>
[CLSCompliant(false)] // the constructor takes arrays
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussNormalMixtureAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points. The three arrays have one length, from 1 to 64.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    /// <param name="weights">
    /// The weights of the components; finite, none negative, at least one above zero. They are divided by their exact sum.
    /// </param>
    /// <param name="means">The means of the components, in the variable's unit; finite.</param>
    /// <param name="standardDeviations">
    /// The standard deviations of the components, in the same unit; positive and finite. Arrays that break these rules or differ
    /// in length are a compile-time error, not an exception.
    /// </param>
    public GaussNormalMixtureAttribute(int points, double[] weights, double[] means, double[] standardDeviations)
    {
        Points = points;
        Weights = weights;
        Means = means;
        StandardDeviations = standardDeviations;
    }

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The weights of the components, as they were given.</summary>
    public IReadOnlyList<double> Weights { get; }

    /// <summary>The means of the components.</summary>
    public IReadOnlyList<double> Means { get; }

    /// <summary>The standard deviations of the components.</summary>
    public IReadOnlyList<double> StandardDeviations { get; }

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
    /// which gives half the distance between the two sums beside the expectation: an estimate and no bound (Laurie 1996). It
    /// costs n + 1 calls of the function beside n.
    /// </summary>
    public bool ErrorEstimate { get; set; }
}
