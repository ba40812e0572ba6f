using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// A probability on the real line, or a part of it, whose orthogonal polynomials can be enclosed at any precision. It speaks of
/// a coordinate y that suits the arithmetic; <see cref="ToLine"/> carries y to the variable x.
/// </summary>
/// <remarks>
/// To add a weight, say how its recurrence is enclosed: in closed form where there is one, or by its moments
/// (<see cref="MomentWeight"/>). Everything else is the pipeline's.
/// </remarks>
internal abstract class WeightFunction
{
    /// <summary>Whether the weight is symmetric about y = 0.</summary>
    internal virtual bool IsEven => false;

    /// <summary>Whether the weight is symmetric about x = 0.</summary>
    internal bool IsSymmetricOnLine => IsEven && ToLineExactly(Rational.Zero) is { IsZero: true };

    /// <summary>
    /// Whether the Jacobi matrix grows so fast from row to row that the smallest nodes are far below its norm; then the starting
    /// points are sought with high relative accuracy.
    /// </summary>
    internal virtual bool IsGraded => false;

    /// <summary>The lower end of the weight's interval in y; <c>null</c> where it reaches to −∞.</summary>
    internal virtual RealNumber? Lower => null;

    /// <summary>The upper end of the weight's interval in y; <c>null</c> where it reaches to +∞.</summary>
    internal virtual RealNumber? Upper => null;

    /// <summary>The recurrence with n coefficients aₖ, known to at least <paramref name="accuracy"/> bits.</summary>
    /// <param name="count">The number n.</param>
    /// <param name="accuracy">The bits in the sense of <see cref="Recurrence.AccuracyBits"/>.</param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    /// <exception cref="Rules.RuleConstructionException">The recurrence is not determined within the stated limits.</exception>
    internal abstract Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation);

    /// <summary>
    /// The moments ∫ yᵏ w, k = 0 … count − 1, of the weight with any total mass above zero; see <see cref="ToMomentCoordinate"/>. Odd ones of an even weight may be left out
    /// (zero).
    /// </summary>
    /// <param name="count">How many.</param>
    /// <param name="precision">The bits that each should be known to, relative to ∫ |y|ᵏ w.</param>
    /// <param name="cancellation">Looked at at least every 10 ms.</param>
    internal abstract Ball[] Moments(int count, int precision, CancellationToken cancellation);

    /// <summary>
    /// The recurrence with n coefficients exactly, where they are rational and it is cheap to say so; else <c>null</c>.
    /// </summary>
    internal virtual RationalRecurrence? ExactRecurrence(int count) => null;

    /// <summary>The variable of which <see cref="Moments"/> are the moments, at a coordinate y; most often y itself.</summary>
    internal virtual Ball ToMomentCoordinate(Ball coordinate) => coordinate;

    /// <summary>The node with an index of the rule with n points, where it is known to be rational; else <c>null</c>.</summary>
    internal virtual Rational? ExactNode(int points, int index) => null;

    /// <summary>The variable x at a coordinate y.</summary>
    internal virtual Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation) => coordinate;

    /// <summary>The variable x at a rational coordinate y, where it is rational; else <c>null</c>.</summary>
    internal virtual Rational? ToLineExactly(Rational coordinate) => coordinate;
}
