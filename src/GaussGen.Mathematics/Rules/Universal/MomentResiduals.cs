using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// A check of a rule's degree of exactness by the moments themselves: Σ wᵢ yᵢᵏ − mₖ/m₀ for all k up to that degree, enclosed. That they
/// vanish is what exactness means; the enclosures show it to so many bits.
/// </summary>
internal sealed class MomentResiduals
{
    private MomentResiduals(Ball[] residuals, Ball[] sizes)
    {
        Residuals = residuals;
        Bits = int.MaxValue;
        for (int k = 0; k < residuals.Length; k++)
        {
            Bound above = Approximation.Magnitude(residuals[k]);
            Bits = above.IsZero ? Bits : Math.Min(Bits, Approximation.FloorLog2(sizes[k].Lower) - above.CeilingLog2);
        }
    }

    /// <summary>The residuals by order.</summary>
    internal Ball[] Residuals { get; }

    /// <summary>The magnitude of every residual is at most 2^−Bits of Σ wᵢ |yᵢ|ᵏ.</summary>
    internal int Bits { get; }

    /// <summary>Encloses the residuals of a rule in its weight's coordinate.</summary>
    /// <param name="nodes">The nodes yᵢ.</param>
    /// <param name="weights">The weights wᵢ.</param>
    /// <param name="moments">The moments m₀ … up to the degree of exactness.</param>
    /// <param name="isEven">Whether nodes and weights are symmetric about 0, so that odd orders vanish.</param>
    /// <param name="precision">The working precision.</param>
    /// <param name="cancellation">Looked at for each order.</param>
    /// <exception cref="InvalidOperationException">A residual is surely not zero: the construction of rule or moments is wrong.</exception>
    internal static MomentResiduals Of(
        Ball[] nodes, Ball[] weights, Ball[] moments, bool isEven, int precision, CancellationToken cancellation)
    {
        var residuals = new Ball[moments.Length];
        var sizes = new Ball[moments.Length];
        var terms = (Ball[])weights.Clone();
        for (int k = 0; k < moments.Length; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default, size = default;
            for (int i = 0; i < terms.Length; i++)
            {
                sum = Ball.Add(sum, terms[i], precision);
                size = Ball.Add(size, terms[i].Abs(), precision);
                terms[i] = Ball.Multiply(terms[i], nodes[i], precision);
            }

            bool vanishes = isEven && (k & 1) != 0;
            sizes[k] = size;
            residuals[k] = vanishes ? default : Ball.Subtract(sum, Ball.Divide(moments[k], moments[0], precision), precision);
            if (!residuals[k].ContainsZero)
            {
                throw new InvalidOperationException("A rule does not reproduce a moment that it should; its construction is wrong.");
            }
        }

        return new MomentResiduals(residuals, sizes);
    }

    /// <summary>The residuals of a Gauss rule up to its degree of exactness.</summary>
    internal static MomentResiduals Of(GaussRule rule, int precision, CancellationToken cancellation)
    {
        GaussEnclosures enclosures = rule.At(precision, cancellation);
        WeightFunction weight = rule.Weight;
        Ball[] moments = weight.Moments(2 * rule.Points, precision, cancellation);
        Ball[] nodes = Array.ConvertAll(enclosures.Nodes, weight.ToMomentCoordinate);
        return Of(nodes, enclosures.Weights, moments, weight.IsEven, precision, cancellation);
    }
}
