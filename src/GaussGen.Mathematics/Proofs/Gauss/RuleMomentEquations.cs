using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// A check on the proof itself: if every entry is at most half a unit in its last place from its true value, then the sums
/// Σ wᵢ xᵢᵏ of the entries are near the moments of the weight function by an allowance that can be computed.
/// </summary>
/// <remarks>
/// With w and x the true values, w̃ and x̃ the entries, |w − w̃| ≤ a and |x − x̃| ≤ b, each term differs by at most
/// (|w̃| + a)(|x̃| + b)ᵏ − |w̃| |x̃|ᵏ; both sums are exact.
/// </remarks>
internal sealed class RuleMomentEquations(RuleSource source, BinaryFormat format, int degreeOfExactness)
{
    /// <summary>The highest degree that is checked.</summary>
    private const int HighestDegree = 8;

    private const int Precision = 256;

    private readonly WeightMoments _moments = source.Moments;

    /// <summary>
    /// The equations as far as the rule is exact and <see cref="HighestDegree"/> allows, without those that hold by symmetry.
    /// </summary>
    /// <param name="nodes">The found nodes.</param>
    /// <param name="weights">The found weights.</param>
    /// <param name="dropped">The nodes that were left out because their weight rounds to zero.</param>
    /// <param name="cancellation">Looked at once a term.</param>
    public IReadOnlyList<MomentEquation> Check(
        IReadOnlyList<ulong> nodes, IReadOnlyList<ulong> weights, IReadOnlyList<KnownNumber> dropped, CancellationToken cancellation)
    {
        var equations = new List<MomentEquation>();
        int highest = Math.Min(HighestDegree, degreeOfExactness);
        Ball[] right = AboutZero(highest + 1, cancellation);
        int step = _moments.IsEven && _moments.Center.IsZero ? 2 : 1;
        for (int degree = 0; degree <= highest; degree += step)
        {
            Dyadic sum = Dyadic.Zero, size = Dyadic.Zero, allowance = Dyadic.Zero;
            for (int index = 0; index < nodes.Count; index++)
            {
                cancellation.ThrowIfCancellationRequested();
                Dyadic node = format.ValueOf(nodes[index]);
                Dyadic weight = format.ValueOf(weights[index]);
                Dyadic term = weight * Power(node, degree);
                Dyadic most = (Dyadic.Abs(weight) + HalfUnit(weights[index])) * Power(Dyadic.Abs(node) + HalfUnit(nodes[index]), degree);
                sum += term;
                size += Dyadic.Abs(term);
                allowance += most - Dyadic.Abs(term);
            }

            foreach (KnownNumber node in dropped)
            {
                Dyadic low = Dyadic.Abs(node.Lower), high = Dyadic.Abs(node.Upper);
                allowance += Power(low > high ? low : high, degree).ScaleByPowerOfTwo(format.MinimumExponent - 1);
            }

            equations.Add(Compare(degree, sum, size, allowance, right[degree]));
        }

        return equations;
    }

    private static MomentEquation Compare(int degree, Dyadic sum, Dyadic size, Dyadic allowance, Ball moment)
    {
        Ball difference = Ball.Subtract(Ball.FromDyadic(sum), moment, int.MaxValue);
        // A moment is a ball: where both sides agree as far as it tells, nothing speaks against them.
        Dyadic least = Dyadic.Abs(difference.Center) - difference.Radius.ToDyadic();
        Dyadic residual = Dyadic.Abs(difference.Center) + difference.Radius.ToDyadic();
        return new MomentEquation(degree, Relative(residual, size), Relative(allowance, size), least <= allowance);
    }

    /// <summary>A part of Σ |wᵢ xᵢᵏ|, rounded up; the part itself where all nodes are zero.</summary>
    private static double Relative(Dyadic value, Dyadic size) => NearestValue.ToDoubleUpward(size.IsZero
        ? value
        : Ball.Divide(Ball.FromDyadic(value), Ball.FromDyadic(size), Precision).Upper);

    /// <summary>The moments about zero, by the binomial theorem from those about c.</summary>
    private Ball[] AboutZero(int count, CancellationToken cancellation)
    {
        Ball[] about = _moments.Enclose(count, Precision, cancellation);
        Ball total = source.Total(Precision, cancellation);
        var result = new Ball[count];
        for (int k = 0; k < count; k++)
        {
            BigInteger binomial = BigInteger.One;
            for (int j = k; j >= 0; j--)
            {
                Dyadic factor = Power(_moments.Center, k - j) * new Dyadic(binomial, 0);
                result[k] = Ball.Add(result[k], Ball.Multiply(about[j], Ball.FromDyadic(factor), Precision), Precision);
                binomial = binomial * j / (k - j + 1);
            }

            result[k] = Ball.Multiply(result[k], total, Precision);
        }

        return result;
    }

    /// <summary>Half a unit in the last place.</summary>
    private Dyadic HalfUnit(ulong bits) => new(BigInteger.One, format.UnitExponent(bits) - 1);

    private static Dyadic Power(Dyadic value, int exponent) =>
        new(BigInteger.Pow(value.Mantissa, exponent), checked(value.Exponent * exponent));
}
