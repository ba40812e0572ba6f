using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// A check of a rule's degree of exactness by the moments themselves: Σ wᵢ yᵢᵏ − mₖ/m₀ for all k up to that degree, enclosed. That they
/// vanish is what exactness means; the enclosures show it to so many bits.
/// </summary>
internal sealed class MomentResiduals
{
    private readonly Ball[] _sizes;

    private MomentResiduals(Ball[] residuals, Ball[] sizes, int exact)
    {
        Residuals = residuals;
        _sizes = sizes;
        Bits = int.MaxValue;
        for (int k = 0; k < exact; k++)
        {
            Bound above = Approximation.Magnitude(residuals[k]);
            Bits = above.IsZero ? Bits : Math.Min(Bits, Approximation.FloorLog2(sizes[k].Lower) - above.CeilingLog2);
        }
    }

    /// <summary>The residuals by order.</summary>
    internal Ball[] Residuals { get; }

    /// <summary>The magnitude of every residual that must vanish is at most 2^−Bits of Σ wᵢ |yᵢ|ᵏ.</summary>
    internal int Bits { get; }

    /// <summary>Encloses the residuals of a rule in the variable of the moments.</summary>
    /// <param name="rule">Nodes yᵢ and weights wᵢ; of an even weight in mirrored pairs.</param>
    /// <param name="moments">The moments m₀, m₁, …, as many as residuals are wanted.</param>
    /// <param name="exact">How many of the residuals must vanish: the degree of exactness and one.</param>
    /// <param name="isEven">Whether nodes and weights are symmetric about 0, so that those of odd order vanish of themselves.</param>
    /// <param name="precision">The working precision.</param>
    /// <param name="cancellation">Looked at for each order.</param>
    /// <exception cref="InvalidOperationException">
    /// A residual that must vanish is surely not zero: the construction of rule or moments is wrong.
    /// </exception>
    internal static MomentResiduals Of(
        GaussEnclosures rule, Ball[] moments, int exact, bool isEven, int precision, CancellationToken cancellation)
    {
        (Ball[] factors, Ball[] terms) = isEven ? UpperHalf(rule, precision) : (rule.Nodes, (Ball[])rule.Weights.Clone());
        var residuals = new Ball[moments.Length];
        var sizes = new Ball[moments.Length];
        for (int k = 0; k < moments.Length; k += isEven ? 2 : 1)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default, size = default;
            for (int i = 0; i < terms.Length; i++)
            {
                sum = Ball.Add(sum, terms[i], precision);
                size = Ball.Add(size, terms[i].Abs(), precision);
                terms[i] = Ball.Multiply(terms[i], factors[i], precision);
            }

            sizes[k] = size;
            residuals[k] = Ball.Subtract(sum, Ball.Divide(moments[k], moments[0], precision), precision);
            if (k < exact && !residuals[k].ContainsZero)
            {
                throw new InvalidOperationException("A rule does not reproduce a moment that it should; its construction is wrong.");
            }
        }

        return new MomentResiduals(residuals, sizes, exact);
    }

    /// <summary>The residuals of the mean of two rules for one weight, all of which must vanish.</summary>
    /// <exception cref="InvalidOperationException">One is surely not zero: a construction is wrong.</exception>
    internal MomentResiduals MeanWith(MomentResiduals other, int precision)
    {
        var means = new Ball[Residuals.Length];
        for (int k = 0; k < means.Length; k++)
        {
            means[k] = Ball.Add(Residuals[k], other.Residuals[k], precision).ScaleByPowerOfTwo(-1);
            if (!means[k].ContainsZero)
            {
                throw new InvalidOperationException("The errors of two rules are not opposite as they should be; a construction is wrong.");
            }
        }

        return new MomentResiduals(means, _sizes, means.Length);
    }

    /// <summary>The squares of the nodes from the middle upwards, and the weights of pairs.</summary>
    private static (Ball[] Squares, Ball[] Weights) UpperHalf(GaussEnclosures rule, int precision)
    {
        int n = rule.Nodes.Length, first = n / 2;
        var squares = new Ball[n - first];
        var weights = new Ball[n - first];
        for (int i = 0; i < squares.Length; i++)
        {
            bool isCentre = (2 * (first + i)) + 1 == n;
            squares[i] = Ball.Square(rule.Nodes[first + i], precision);
            weights[i] = isCentre ? rule.Weights[first + i] : rule.Weights[first + i].ScaleByPowerOfTwo(1);
        }

        return (squares, weights);
    }
}
