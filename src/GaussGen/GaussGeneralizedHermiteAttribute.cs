using System;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for the weight |x|^(2μ) exp(−x²) on the partial class, struct or record that carries it: nodes, weights
/// and the expectation of a function, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The weight function is divided by its integral Γ(μ + ½), so that the weights sum to 1. The generated part has
/// <c>PointCount</c>, <c>DegreeOfExactness</c> (2n − 1 for n points), <c>Nodes</c> (ascending), <c>Weights</c> and two forms of
/// <c>Expectation(f)</c>. Every node and weight is the representable value nearest to the true one, ties to even.</para>
/// <para>If X has this density, X² has the gamma distribution with shape μ + ½, and √2·|X| the chi distribution with 2μ + 1
/// degrees of freedom: μ = ½ gives the length of a two-dimensional normal vector (Rayleigh), μ = 1 of a three-dimensional one
/// (Maxwell). An argument means its exact binary value.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Szegő, Orthogonal Polynomials (1939), problem 25; Chihara, An Introduction to Orthogonal Polynomials (1978),
/// section V.2.</para>
/// </remarks>
/// <example>
/// The position error of the boat has two components of equal standard deviation; its length has the Rayleigh distribution:
/// <code>
/// [GaussGeneralizedHermite(12, exponent: 0.5)]
/// internal static partial class Miss { }
///
/// double meanOverlap = Miss.Expectation(x => Math.Exp(-deviation * Math.Sqrt(2.0) * Math.Abs(x) / beamWidth));
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussGeneralizedHermiteAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    /// <param name="exponent">
    /// μ, above −½ and at most 10⁶; 0 gives the weight exp(−x²). Anything else is a compile-time error, not an exception.
    /// </param>
    public GaussGeneralizedHermiteAttribute(int points, double exponent)
    {
        Points = points;
        Exponent = exponent;
    }

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The exponent μ of |x|^(2μ).</summary>
    public double Exponent { get; }

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
