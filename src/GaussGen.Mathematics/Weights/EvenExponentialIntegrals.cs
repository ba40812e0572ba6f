using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// ∫ x²ᵏ exp(−p(x)) dx over the real line for k = 0, 1, …, by the trapezoidal rule, which converges geometrically for such integrands.
/// All terms are positive, so that the integrals are known to as many bits as the terms.
/// </summary>
/// <remarks>
/// The error of the rule is bounded by <see cref="StripBound"/>; Iₖ is log-convex in k (Hölder), so that bounds at the two ends
/// bound all between. The terms exp(−p(jh)) follow each other by multiplicative differences: p(jh) is a polynomial of degree 2d in j, whose
/// 2d-th difference is constant. The sum is cut at an N beyond which −p is concave and the last ratio of terms is at most ½:
/// the ratios fall from there, so that the rest is at most the last term.
/// </remarks>
internal static class EvenExponentialIntegrals
{
    /// <summary>The largest number of terms of a sum; weight functions that need more are refused.</summary>
    internal const int MaximumTerms = 1 << 12;

    /// <summary>The integrals with k = 0 … count − 1.</summary>
    /// <param name="exponent">p, with at least two terms.</param>
    /// <param name="count">How many integrals.</param>
    /// <param name="precision">The bits that each should be known to.</param>
    /// <param name="cancellation">Looked at for each term.</param>
    /// <exception cref="RuleConstructionException">More than <see cref="MaximumTerms"/> terms are needed.</exception>
    internal static Ball[] Evaluate(EvenPolynomial exponent, int count, int precision, CancellationToken cancellation)
    {
        TrapezoidalStep step = TrapezoidalStep.Choose(exponent, count - 1, precision, cancellation);
        // The k-th difference loses log₂ C(N, k) bits over N steps.
        int working = precision + 32 + (int)(2 * exponent.Terms * Math.Log(1 + (step.ExpectedTerms / exponent.Terms), 2));
        Ball[] sums = Sum(exponent, step.Size, count, working, precision, cancellation);
        Ball square = Ball.FromDyadic(step.Size * step.Size);
        Ball factor = Ball.FromDyadic(step.Size.ScaleByPowerOfTwo(1));
        for (int k = 0; k < count; k++)
        {
            sums[k] = Ball.Multiply(sums[k], factor, working).Enlarge(Bound.PowerOfTwo(step.ErrorLog2(k)));
            factor = Ball.Multiply(factor, square, working);
        }

        return sums;
    }

    /// <summary>½ [k = 0] + Σ j²ᵏ exp(−p(jh)) over j ≥ 1, for each k.</summary>
    private static Ball[] Sum(
        EvenPolynomial exponent, Dyadic step, int count, int working, int precision, CancellationToken cancellation)
    {
        Ball[] differences = MultiplicativeDifferences(exponent, step, working, cancellation);
        var sums = new Ball[count];
        sums[0] = Ball.FromInteger(1).ScaleByPowerOfTwo(-1);
        Ball lastBefore = default;
        for (int j = 1; j <= MaximumTerms; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            Advance(differences, working);
            Ball square = Ball.FromInteger((BigInteger)j * j), term = differences[0];
            bool isNegligible = true;
            for (int k = 0; k < count; k++)
            {
                isNegligible &= Approximation.CeilingLog2(term) < Approximation.FloorLog2(sums[k]) - precision;
                sums[k] = Ball.Add(sums[k], term, working);
                term = k + 1 < count ? Ball.Multiply(term, square, working) : term;
            }

            if (isNegligible && IsAtMostHalf(term, lastBefore) && exponent.IsConvexBeyond(step * new Dyadic(j - 1, 0)))
            {
                AddRest(sums, differences[0], square);
                return sums;
            }

            lastBefore = term;
        }

        throw TooManyTerms();
    }

    internal static RuleConstructionException TooManyTerms() => new(
        RuleFailure.RecurrenceNotDetermined,
        "The weight function has parts that are too narrow for its extent; choose coefficients with shallower wells.");

    private static bool IsAtMostHalf(Ball term, Ball before) => !term.ContainsZero
        && before.IsPositive == Trilean.True && term.Upper.ScaleByPowerOfTwo(1) <= before.Lower;

    private static void AddRest(Ball[] sums, Ball term, Ball square)
    {
        Bound rest = Approximation.Magnitude(term), factor = Approximation.Magnitude(square);
        for (int k = 0; k < sums.Length; k++)
        {
            sums[k] = sums[k].Enlarge(rest);
            rest *= factor;
        }
    }

    /// <summary>exp(Δᵒ(−p(jh))) at j = 0 for the orders o = 0 … 2d; the differences themselves are exact.</summary>
    private static Ball[] MultiplicativeDifferences(
        EvenPolynomial exponent, Dyadic step, int working, CancellationToken cancellation)
    {
        int degree = 2 * exponent.Terms;
        var values = new Dyadic[degree + 1];
        for (int j = 0; j <= degree; j++)
        {
            values[j] = -exponent.At(step * step * new Dyadic(j * j, 0));
        }

        for (int order = 1; order <= degree; order++)
        {
            for (int j = degree; j >= order; j--)
            {
                values[j] -= values[j - 1];
            }
        }

        return Array.ConvertAll(values, value => Elementary.Exp(Ball.FromDyadic(value.Reduce()), working, cancellation));
    }

    private static void Advance(Ball[] differences, int working)
    {
        for (int order = 0; order < differences.Length - 1; order++)
        {
            differences[order] = Ball.Multiply(differences[order], differences[order + 1], working);
        }
    }
}
