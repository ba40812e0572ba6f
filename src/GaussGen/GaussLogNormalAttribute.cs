using System;

namespace GaussGen;

/// <summary>
/// Asks for a Gauss rule for a log-normal variable on the partial class, struct or record that carries it: nodes, weights and
/// the expectation of a function, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The variable is exp(Y) for normal Y with mean <see cref="LogMean"/> and standard deviation
/// <see cref="LogStandardDeviation"/>. The generated part has <c>PointCount</c>, <c>DegreeOfExactness</c> (2n − 1 for n points),
/// <c>Nodes</c> (ascending, all positive, in the variable's own unit), <c>Weights</c>, which sum to 1, and two forms of
/// <c>Expectation(f)</c>. Every node and weight is the representable value nearest to the true one, ties to even. An argument
/// means its exact binary value.</para>
/// <para>The rule is exact for polynomials in the variable itself. The nodes spread fast, and the outermost weights are soon too
/// small for any number format; for a smooth function of the logarithm, a rule of <see cref="GaussHermiteAttribute"/> on
/// f(exp(y)) needs fewer points.</para>
/// <para>The type and all types that contain it must be partial. A type carries one rule at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Wigert 1923; Chihara, An Introduction to Orthogonal Polynomials (1978), section VI.2.</para>
/// </remarks>
/// <example>
/// The strength of an echo fades in the water by a factor that is log-normal:
/// <code>
/// [GaussLogNormal(6, logMean: 0.0, logStandardDeviation: 0.25)]
/// internal static partial class Fading { }
///
/// double meanPower = Fading.Expectation(strength => strength * strength);
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class GaussLogNormalAttribute : Attribute
{
    /// <summary>Asks for a rule with a number of points.</summary>
    /// <param name="points">
    /// The number n of nodes, from 1 to 64. The rule integrates every polynomial of degree up to 2n − 1 exactly, apart from the
    /// rounding of the constants and of the arithmetic. A number outside the range is a compile-time error, not an exception.
    /// </param>
    /// <param name="logMean">The mean of the variable's logarithm; finite.</param>
    /// <param name="logStandardDeviation">
    /// The standard deviation of the variable's logarithm; positive and finite. Where the outermost node or weight is no normal
    /// binary64 number, that is a compile-time error, not an exception.
    /// </param>
    public GaussLogNormalAttribute(int points, double logMean, double logStandardDeviation)
    {
        Points = points;
        LogMean = logMean;
        LogStandardDeviation = logStandardDeviation;
    }

    /// <summary>The number of nodes, from 1 to 64.</summary>
    public int Points { get; }

    /// <summary>The mean of the variable's logarithm.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the variable's logarithm.</summary>
    public double LogStandardDeviation { get; }

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
