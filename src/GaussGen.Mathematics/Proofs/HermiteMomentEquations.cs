using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// A check on the proof itself: if every entry is at most half a unit in its last place from its true value, then the sums
/// Σ wᵢ xᵢᵏ of the entries are near the moments of the weight function by an allowance that can be computed.
/// </summary>
/// <remarks>
/// With w and x the true values, w̃ and x̃ the entries, |w − w̃| ≤ a and |x − x̃| ≤ b, each term differs by at most
/// (w̃ + a)(|x̃| + b)ᵏ − w̃ |x̃|ᵏ; both sums are exact. The moments are (k−1)!! of the standard normal density, and √π (k−1)!!/2^(k/2) of
/// exp(−x²) (DLMF 5.4.6). A rule with n nodes is exact to degree 2n−1 (DLMF 3.5(v)), and odd degrees hold by symmetry.
/// </remarks>
internal sealed class HermiteMomentEquations(GaussHermiteClaim claim)
{
    /// <summary>The highest degree that is checked.</summary>
    private const int HighestDegree = 8;

    private const int Precision = 192;

    /// <summary>The equations of degrees 0, 2, … as far as the rule is exact and <see cref="HighestDegree"/> allows.</summary>
    /// <param name="nodes">The found nodes.</param>
    /// <param name="weights">The found weights.</param>
    /// <param name="dropped">How many nodes were left out because their weight rounds to zero.</param>
    /// <param name="beyond">An upper bound of the magnitude of those.</param>
    /// <param name="cancellation">Looked at once a term.</param>
    public IReadOnlyList<MomentEquation> Check(
        IReadOnlyList<ulong> nodes, IReadOnlyList<ulong> weights, int dropped, Dyadic beyond, CancellationToken cancellation)
    {
        var equations = new List<MomentEquation>();
        BinaryFormat format = claim.Format;
        for (int degree = 0; degree <= Math.Min(HighestDegree, (2 * claim.Points) - 2); degree += 2)
        {
            Dyadic sum = Dyadic.Zero;
            Dyadic allowance = new Dyadic(dropped, format.MinimumExponent - 1) * Power(beyond, degree);
            for (int index = 0; index < nodes.Count; index++)
            {
                cancellation.ThrowIfCancellationRequested();
                Dyadic node = Dyadic.Abs(format.ValueOf(nodes[index]));
                Dyadic weight = format.ValueOf(weights[index]);
                Dyadic term = weight * Power(node, degree);
                sum += term;
                allowance += ((weight + HalfUnit(weights[index])) * Power(node + HalfUnit(nodes[index]), degree)) - term;
            }

            equations.Add(Compare(degree, sum, allowance, cancellation));
        }

        return equations;
    }

    private static MomentEquation Compare(int degree, Dyadic sum, Dyadic allowance, Ball moment)
    {
        Ball difference = Ball.Subtract(Ball.FromDyadic(sum), moment, int.MaxValue);
        Dyadic residual = Dyadic.Abs(difference.Center) + difference.Radius.ToDyadic();
        return new MomentEquation(degree, Relative(residual, moment), Relative(allowance, moment), residual <= allowance);
    }

    private static double Relative(Dyadic value, Ball moment) =>
        NearestValue.ToDoubleUpward(Ball.Divide(Ball.FromDyadic(value), moment, Precision).Upper);

    private MomentEquation Compare(int degree, Dyadic sum, Dyadic allowance, CancellationToken cancellation)
    {
        BigInteger product = BigInteger.One;
        for (int factor = degree - 1; factor > 1; factor -= 2)
        {
            product *= factor;
        }

        Ball moment = Ball.FromInteger(product);
        if (claim.Weight == HermiteWeight.ExponentialOfMinusSquare)
        {
            moment = Ball.Multiply(moment, Constants.SqrtPi(Precision, cancellation), Precision).ScaleByPowerOfTwo(-degree / 2);
        }

        return Compare(degree, sum, allowance, moment);
    }

    /// <summary>Half a unit in the last place.</summary>
    private Dyadic HalfUnit(ulong bits) => new(BigInteger.One, claim.Format.UnitExponent(bits) - 1);

    private static Dyadic Power(Dyadic value, int exponent) =>
        new(BigInteger.Pow(value.Mantissa, exponent), checked(value.Exponent * exponent));
}
