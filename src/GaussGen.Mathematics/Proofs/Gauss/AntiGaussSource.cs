using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The anti-Gaussian rule of the Gauss rule with n nodes (Laurie 1996, "Anti-Gaussian quadrature formulas"): n + 1 nodes, and for
/// polynomials up to degree 2n + 1 an error of the same size as the Gauss rule's and the opposite sign.
/// </summary>
/// <remarks>
/// <para>
/// That error makes it the Gauss rule of the functional L′(f) = 2 L(f) − G(f), G being the Gauss rule's sum. L′ agrees with 2L − L = L up
/// to degree 2n − 1, so that it has the same π₀, …, πₙ; and G(πₙ f) = 0, so that L′(πₙ²) = 2 hₙ with hₖ = L(πₖ²). The recurrence of
/// its polynomial of degree n + 1 therefore has the last coefficient 2 hₙ/hₙ₋₁ = 2bₙ in place of bₙ, while aₙ = L′(y πₙ²)/L′(πₙ²) stays as it
/// is: Π = (y − aₙ) πₙ − 2bₙ πₙ₋₁ = πₙ₊₁ − bₙ πₙ₋₁. L′ is positive definite up to that degree, so the zeros are real and simple.
/// </para>
/// <para>
/// The rule is exact for L′, and hence for L up to degree 2n − 1; as n ≤ 2n − 1, the weights are those that L gives.
/// </para>
/// <para>
/// For an even weight both polynomials have one parity: Π(y) = yᵖ (R_N(t) − bₙ R_(N−1)(t)), N = ⌊(n+1)/2⌋, which the recurrence in t ends in
/// with α_(N−1) + bₙ in place of α_(N−1).
/// </para>
/// </remarks>
internal sealed class AntiGaussSource(WeightMoments moments, int gaussPoints) : RuleSource(moments, gaussPoints + 1)
{
    /// <inheritdoc/>
    public override RuleLevel? At(int precision, CancellationToken cancellation, out int wanted)
    {
        wanted = precision;
        Ball[] moments = Moments.Enclose((2 * gaussPoints) + 2, precision, cancellation);
        Ball[] functional = InCoordinate(moments, Moments.IsEven, Parity);
        var factors = HankelFactors.Of(functional, Zeros, needsLastPivot: false, precision, cancellation, out int rows);
        if (factors is null)
        {
            wanted = AfterRow(rows, Zeros, precision);
            return null;
        }

        if (Ratio(factors, moments, precision, cancellation) is not { } ratio)
        {
            wanted = precision + (precision / 2);
            return null;
        }

        int lower = Moments.IsEven ? Zeros - 1 : Zeros - 2;
        Ball[] coefficients = factors.Polynomial(Zeros, cancellation);
        Ball[] subtracted = factors.Polynomial(lower, cancellation);
        for (int k = 0; k <= lower; k++)
        {
            coefficients[k] = Ball.Subtract(coefficients[k], Ball.Multiply(ratio, subtracted[k], precision), precision);
        }

        return Level(coefficients, moments, Count(factors, ratio, precision), precision, cancellation);
    }

    /// <inheritdoc/>
    public override ExactRule? Exact(CancellationToken cancellation)
    {
        if (Zeros > ExactRule.LargestDegree || Moments.Exact((2 * gaussPoints) + 2, cancellation) is not { } moments)
        {
            return null;
        }

        Rational[] all = Array.ConvertAll(moments, moment => moment.ToRational());
        var polynomials = ExactPolynomials.Of(InCoordinate(all, Moments.IsEven, Parity), Zeros, cancellation);
        int lower = Moments.IsEven ? Zeros - 1 : Zeros - 2;
        Rational[] coefficients = polynomials.Polynomial(Zeros);
        Rational norm = Moments.IsEven
            ? ExactPolynomials.Of(InCoordinate(all, isEven: true, 1 - Parity), gaussPoints / 2, cancellation).Norm(gaussPoints / 2)
            : polynomials.Norm(gaussPoints);
        Rational ratio = norm / polynomials.Norm(Moments.IsEven ? Zeros - 1 : gaussPoints - 1);
        Rational[] subtracted = polynomials.Polynomial(lower);
        for (int k = 0; k <= lower; k++)
        {
            coefficients[k] -= ratio * subtracted[k];
        }

        return new ExactRule(this, coefficients, moments);
    }

    /// <summary>bₙ = hₙ/hₙ₋₁. For an even weight hₙ is a pivot of the functional of the other parity.</summary>
    private Ball? Ratio(HankelFactors factors, Ball[] moments, int precision, CancellationToken cancellation)
    {
        if (!Moments.IsEven)
        {
            return factors.Square(gaussPoints);
        }

        int half = gaussPoints / 2;
        Ball[] functional = InCoordinate(moments, isEven: true, 1 - Parity);
        var other = HankelFactors.Of(functional, half, needsLastPivot: true, precision, cancellation, out _);
        return other is null ? null : Ball.Divide(other.Pivot(half), factors.Pivot(Zeros - 1), precision);
    }

    private ZeroCount Count(HankelFactors factors, Ball ratio, int precision)
    {
        var diagonal = new Ball[Zeros];
        var squares = new Ball[Zeros];
        for (int k = 0; k < Zeros; k++)
        {
            diagonal[k] = factors.Diagonal(k);
            squares[k] = k == 0 ? default : factors.Square(k);
        }

        if (Moments.IsEven)
        {
            diagonal[Zeros - 1] = Ball.Add(diagonal[Zeros - 1], ratio, precision);
        }
        else
        {
            squares[Zeros - 1] = squares[Zeros - 1].ScaleByPowerOfTwo(1);
        }

        return new ZeroCount(diagonal, squares, precision);
    }
}
