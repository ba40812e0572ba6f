using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of moments of an even exponential density, each a quotient of two integrals by <see cref="ExponentialPanels"/>.</summary>
/// <remarks>
/// The mean is 0, so that central moments are raw ones, and absolute ones of even order are as well. For exp(−c x^(2d)) integration by
/// parts gives 2dc E x^(2d+j) = (j+1) E xʲ, so that E x^(2dn) is the product of (2di + 1)/(2dc) over i = 0, …, n − 1, a rational number.
/// </remarks>
internal sealed class EvenExponentialMomentsProof(EvenExponentialMomentsClaim claim)
{
    private readonly Dyadic[] _coefficients = [.. claim.Coefficients.Select(ClaimNumbers.ValueOf)];

    public TableProof Run(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var lists = new MomentLists(claim.Format, claim.MaximumOrder);
        for (int order = 1; order <= claim.MaximumOrder; order += 2)
        {
            lists.Raw(order, Rational.Zero);
            lists.Central(order, Rational.Zero);
        }

        int degree = 2 * _coefficients.Length;
        if (_coefficients.Count(coefficient => !coefficient.IsZero) == 1)
        {
            Rational divisor = degree * _coefficients[_coefficients.Length - 1].ToRational();
            Rational moment = Rational.One;
            for (int order = degree; order <= claim.MaximumOrder; order += degree)
            {
                cancellation.ThrowIfCancellationRequested();
                moment = moment * (order - degree + 1) / divisor;
                lists.Raw(order, moment);
                lists.Central(order, moment);
                lists.Absolute(order, moment);
            }
        }

        return lists.Prove(claim, data, precision => Enclose(precision, cancellation), progress, cancellation);
    }

    private MomentBalls Enclose(int precision, CancellationToken cancellation)
    {
        Ball[] integrals = ExponentialPanels.Enclose(
            _coefficients, [.. Enumerable.Range(0, claim.MaximumOrder + 1)], precision + 8, cancellation);
        Ball[] moments = Array.ConvertAll(
            integrals, integral => integral.IsFinite ? Ball.Divide(integral, integrals[0], precision + 16) : Ball.WholeLine);
        return new MomentBalls(moments, moments, moments);
    }
}
