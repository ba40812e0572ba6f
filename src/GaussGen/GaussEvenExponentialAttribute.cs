using System;
using System.Collections.Generic;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for the density proportional to exp(−(c₁x² + c₂x⁴ + c₃x⁶ + …)), as of a particle in an anharmonic well,
/// on the partial class, struct or record that carries it: nodes, weights and the expectation of a function, as constants that
/// are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The weight function is divided by its integral over the real line, so that the weights sum to 1; the integral is the
/// constant <c>NormalizingIntegral</c>, in the rule's number format. The generated part has <c>PointCount</c>,
/// <c>DegreeOfExactness</c> (2n − 1 for n points), <c>Nodes</c> (ascending), <c>Weights</c> and two forms of
/// <c>Expectation(f)</c>. Every entry is the representable value nearest to the true one, ties to even. An argument means its
/// exact binary value.</para>
/// <para>All coefficients but the last may be negative: exp(−(−2x² + x⁴)) is a double well. The coefficient cₖ is in one over the
/// variable's unit to the power 2k.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>In a project that is marked as CLS-compliant, the compiler warns of the arrays in this attribute (CS3016).</para>
/// <para>Formulas: Trefethen and Weideman 2014, theorem 5.1 (moments by the trapezoidal rule); NIST DLMF 18.9.1.</para>
/// </remarks>
/// <example>
/// The bench's pendulum has two resting places, at −1 and 1:
/// <code>
/// [GaussEvenExponential(16, -2.0, 1.0)]
/// internal static partial class Pendulum { }
///
/// double meanReading = Pendulum.Expectation(x => gain * Math.Sqrt(1.0 + (x * x)));
/// </code>
/// </example>
[CLSCompliant(false)] // the constructor takes arrays
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussEvenExponentialAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    /// <param name="coefficients">
    /// c₁, c₂, …: from 1 to 8 finite numbers, the last one above zero. Anything else is a compile-time error, not an exception.
    /// </param>
    public GaussEvenExponentialAttribute(int points, params double[] coefficients)
    {
        Points = points;
        Coefficients = coefficients;
    }

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The coefficients c₁, c₂, … of x², x⁴, ….</summary>
    public IReadOnlyList<double> Coefficients { get; }

    /// <summary>The number format of nodes, weights and integral; <see cref="NumberFormat.Binary64"/> if not set.</summary>
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
