using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// A weight function as a proof knows it: by its moments about a point c, mₖ = ∫ (x − c)ᵏ w(x) dx / ∫ w(x) dx. Proofs are carried out in
/// y = x − c, with c near the nodes where that saves bits.
/// </summary>
internal abstract class WeightMoments
{
    private readonly Dictionary<(int Count, int Precision), Ball[]> _known = [];

    /// <summary>c, exactly.</summary>
    public virtual Dyadic Center => Dyadic.Zero;

    /// <summary>Whether w(c − y) = w(c + y), so that odd moments are zero.</summary>
    public virtual bool IsEven => false;

    /// <summary>The lower end of the interval that carries the weight; <c>null</c> for −∞.</summary>
    public virtual Dyadic? Lower => null;

    /// <summary>The upper end; <c>null</c> for +∞.</summary>
    public virtual Dyadic? Upper => null;

    /// <summary>m₀ = 1, m₁, …, enclosed; the odd ones of an even weight are zero exactly.</summary>
    /// <param name="count">How many.</param>
    /// <param name="precision">Working precision in bits; the even moments have about so many right ones.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    public Ball[] Enclose(int count, int precision, CancellationToken cancellation)
    {
        if (!_known.TryGetValue((count, precision), out Ball[]? moments))
        {
            moments = Evaluate(count, precision + 8, cancellation);
            Ball total = moments[0];
            for (int k = 1; k < count; k++)
            {
                cancellation.ThrowIfCancellationRequested();
                moments[k] = Ball.Divide(moments[k], total, precision);
            }

            moments[0] = Ball.FromInteger(1);
            _known.Add((count, precision), moments);
        }

        return moments;
    }

    /// <summary>
    /// The moments up to one common factor above zero, exactly; <c>null</c> where they are not binary fractions. Only such weights have
    /// nodes and weights that are rational by more than symmetry, and may lie half-way between two representable numbers.
    /// </summary>
    public virtual Dyadic[]? Exact(int count, CancellationToken cancellation) => null;

    /// <summary>The moments up to one common factor above zero.</summary>
    protected abstract Ball[] Evaluate(int count, int precision, CancellationToken cancellation);
}
