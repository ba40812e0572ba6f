using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>A rule's polynomial and what belongs to it, enclosed with one working precision.</summary>
/// <param name="Polynomial">Π in the rule's coordinate.</param>
/// <param name="Count">What tells its zeros apart, where it is the end of a three-term recurrence; else <c>null</c>.</param>
/// <param name="CenterWeight">The weight of the node c, where the rule has it by symmetry.</param>
/// <param name="Precision">The working precision in bits.</param>
internal sealed record RuleLevel(NodePolynomial Polynomial, ZeroCount? Count, Ball CenterWeight, int Precision);

/// <summary>An interpolatory rule of a weight function, whose nodes are the zeros of a polynomial that a proof can enclose.</summary>
/// <remarks>
/// <para>
/// In the coordinate y = x − c the nodes are the zeros of Π(y), ascending. For an even weight Π(y) = yᵖ R(y²) with p = 0 or 1, and the
/// coordinate is t = y²: each zero t of R stands for the nodes c ± √t, and p = 1 for the node c besides. (p is the parity of the number of nodes.)
/// </para>
/// <para>
/// The weights: for one node y > 0 with y² = t, Π/(u − y) has the even part Π(u)·u/(u² − t) for p = 1 and Π(u)·y/(u² − t) for p = 0, and
/// Π′(y) = 2 y^(p+1) R′(t), so that w = A(t)/(2 tᵖ R′(t)), where A belongs to R and the functional with the moments μₖ = m₂ₖ₊₂ₚ. At c, for p = 1,
/// w = Σ rₖ m₂ₖ/r₀ with the coefficients r of R.
/// </para>
/// </remarks>
internal abstract class RuleSource(WeightMoments moments, int points)
{
    /// <summary>The weight function.</summary>
    public WeightMoments Moments { get; } = moments;

    /// <summary>The number of nodes.</summary>
    public int Points { get; } = points;

    /// <summary>p, for an even weight.</summary>
    public int Parity => Points & 1;

    /// <summary>Whether c is a node by symmetry.</summary>
    public bool HasCenterNode => Moments.IsEven && Parity == 1;

    /// <summary>The number of zeros in the rule's coordinate.</summary>
    public int Zeros => Moments.IsEven ? Points / 2 : Points;

    /// <summary>The sum of all weights: 1, unless the rule is one of a weight function that is no density.</summary>
    public virtual Ball Total(int precision, CancellationToken cancellation) => Ball.FromInteger(1);

    /// <summary>The polynomial at a working precision; <c>null</c> where that does not suffice.</summary>
    /// <param name="precision">In bits.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    /// <param name="wanted">Where the precision does not suffice: what to try next.</param>
    public abstract RuleLevel? At(int precision, CancellationToken cancellation, out int wanted);

    /// <summary>The polynomial exactly; <c>null</c> where its coefficients are not rational or would be too long.</summary>
    public abstract ExactRule? Exact(CancellationToken cancellation);

    /// <summary>
    /// Intervals, ascending, over which the polynomial changes its sign, found without counting zeros; only for rules that have no
    /// recurrence.
    /// </summary>
    public virtual List<(Dyadic Low, Dyadic High)>? Grid(NodePolynomial polynomial, CancellationToken cancellation) => null;

    /// <summary>The moments of the functional in the rule's coordinate, from those of the weight: m₂ₖ₊₂ₚ for an even one.</summary>
    protected static T[] InCoordinate<T>(T[] moments, bool isEven, int parity)
    {
        if (!isEven)
        {
            return moments;
        }

        var chosen = new T[((moments.Length - 1) / 2) - parity + 1];
        for (int k = 0; k < chosen.Length; k++)
        {
            chosen[k] = moments[2 * (k + parity)];
        }

        return chosen;
    }

    /// <summary>What to try after the row of a factorisation that failed.</summary>
    protected static int AfterRow(int row, int size, int precision) =>
        System.Math.Max(precision + (precision / 4), System.Math.Min(2 * precision, precision * size / System.Math.Max(row, 1)));

    /// <summary>The level that a polynomial in the rule's coordinate gives.</summary>
    protected RuleLevel Level(Ball[] coefficients, Ball[] moments, ZeroCount? count, int precision, CancellationToken cancellation)
    {
        Ball total = Total(precision, cancellation);
        if (!total.IsExact)
        {
            moments = System.Array.ConvertAll(moments, moment => Ball.Multiply(moment, total, precision));
        }

        Ball[] functional = InCoordinate(moments, Moments.IsEven, Parity);
        Ball center = default;
        if (HasCenterNode)
        {
            for (int k = 0; k < coefficients.Length; k++)
            {
                center = Ball.Add(center, Ball.Multiply(coefficients[k], moments[2 * k], precision), precision);
            }

            center = coefficients[0].ContainsZero ? Ball.WholeLine : Ball.Divide(center, coefficients[0], precision);
        }

        return new RuleLevel(new NodePolynomial(coefficients, functional, precision, cancellation), count, center, precision);
    }
}
