using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Moments;

/// <summary>The moments of the density proportional to exp(−p(x)), p(x) = c₁x² + … + c_d x²ᵈ. Mean and odd moments are 0.</summary>
/// <remarks>
/// <para>
/// Even moments come from <see cref="EvenExponentialIntegrals"/>, odd absolute ones from <see cref="HalfLineIntegrals"/>, where for d = 1 both
/// are known: (k−1)!!/(2c₁)^(k/2), and n!/(c₁ⁿ √(πc₁)) for k = 2n + 1 (Winkelbauer 2012 with variance 1/(2c₁)).
/// </para>
/// <para>
/// Integration by parts gives (2i + 1) E X²ⁱ = Σ 2j cⱼ E X²ⁱ⁺²ʲ, so that every even moment is a combination of 1, E X², …, E X²ᵈ⁻² with rational factors.
/// Where only the factor of 1 is not zero the moment is rational, and is given exactly: E X⁴ = 1/(4c₂) for p = c₂x⁴. That is decided in exact
/// arithmetic.
/// </para>
/// </remarks>
internal sealed class EvenExponentialMoments
{
    private readonly Dyadic[] _coefficients;
    private readonly EvenExponentialWeight _weight;
    private readonly int _maximumOrder;
    private readonly SharedByPrecision<Ball[]> _even;
    private readonly SharedByPrecision<Ball[]> _odd;

    /// <summary>The moments to an order; the last coefficient is above zero.</summary>
    internal EvenExponentialMoments(Dyadic[] coefficients, int maximumOrder)
    {
        _coefficients = coefficients;
        _maximumOrder = maximumOrder;
        _weight = new EvenExponentialWeight(coefficients);
        _even = new SharedByPrecision<Ball[]>(Even);
        _odd = new SharedByPrecision<Ball[]>(Odd);
    }

    /// <summary>E Xᵏ, which is E (X − E X)ᵏ too.</summary>
    internal IReadOnlyList<RealNumber> Central(CancellationToken cancellation)
    {
        Rational?[] exact = ExactEven(cancellation);
        RealNumber zero = RealNumber.Exact(Rational.Zero);
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            int order = k;
            moments[k] = (k & 1) != 0 ? zero
                : exact[k / 2] is { } value ? RealNumber.Exact(value)
                : RealNumber.FromEnclosures((precision, token) => _even.At(precision, token)[order]);
        }

        return moments;
    }

    /// <summary>E |X|ᵏ, the central moment for even k.</summary>
    internal IReadOnlyList<RealNumber> Absolute(IReadOnlyList<RealNumber> central)
    {
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            int order = k;
            moments[k] = (k & 1) == 0
                ? central[k]
                : RealNumber.FromEnclosures((precision, token) => _odd.At(precision, token)[order / 2]);
        }

        return moments;
    }

    private Ball[] Even(int precision, CancellationToken cancellation)
    {
        int working = precision + 8;
        Ball[] moments = _weight.Moments(_maximumOrder + 1, working, cancellation);
        Ball mass = moments[0];
        for (int k = 0; k < moments.Length; k += 2)
        {
            moments[k] = Ball.Divide(moments[k], mass, working).ScaleByPowerOfTwo(k * _weight.Power);
        }

        return moments;
    }

    /// <summary>E |X|^(2n+1) at index n.</summary>
    private Ball[] Odd(int precision, CancellationToken cancellation)
    {
        int working = precision + 8, count = (_maximumOrder + 1) / 2;
        if (_coefficients.Length == 1)
        {
            return OddOfNormal(count, working, cancellation);
        }

        Ball mass = _weight.Moments(1, working, cancellation)[0];
        Ball[] moments = HalfLineIntegrals.Evaluate(_weight.Exponent, count, working, cancellation);
        for (int n = 0; n < count; n++)
        {
            moments[n] = Ball.Divide(moments[n], mass, working).ScaleByPowerOfTwo(((2 * n) + 1) * _weight.Power);
        }

        return moments;
    }

    private Ball[] OddOfNormal(int count, int working, CancellationToken cancellation)
    {
        Ball coefficient = Ball.FromDyadic(_coefficients[0]);
        Ball square = Ball.Multiply(Constants.Pi(working, cancellation), coefficient, working);
        Ball moment = Ball.Divide(Ball.FromInteger(1), Ball.Sqrt(square, working), working);
        var moments = new Ball[count];
        for (int n = 0; n < count; n++)
        {
            moments[n] = moment;
            moment = Ball.Divide(Ball.Multiply(moment, Ball.FromInteger(n + 1), working), coefficient, working);
        }

        return moments;
    }

    /// <summary>E X²ⁱ at index i where it is rational, else <c>null</c>.</summary>
    /// <remarks>
    /// With g = 2d c_d, gᵐ E X²ⁱ for m = max(0, i − d + 1) is a combination of 1, E X², …, E X²ᵈ⁻² with dyadic factors.
    /// </remarks>
    private Rational?[] ExactEven(CancellationToken cancellation)
    {
        int terms = _coefficients.Length, count = (_maximumOrder / 2) + 1;
        Dyadic leading = (_coefficients[terms - 1] * new Dyadic(2 * terms, 0)).Reduce();
        var powers = new Dyadic[count + 1];
        powers[0] = new Dyadic(1, 0);
        var combinations = new Dyadic[count][];
        var exact = new Rational?[count];
        for (int i = 0; i < count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            powers[i + 1] = (powers[i] * leading).Reduce();
            combinations[i] = new Dyadic[terms];
            if (i < terms)
            {
                combinations[i][i] = new Dyadic(1, 0);
            }
            else
            {
                Combine(combinations, i, powers, cancellation);
            }

            if (IsConstant(combinations[i]))
            {
                exact[i] = combinations[i][0].ToRational() / powers[Math.Max(0, i - terms + 1)].ToRational();
            }
        }

        return exact;
    }

    /// <summary>g E X²ⁱ = (2(i−d) + 1) E X²ⁱ⁻²ᵈ − Σ 2j cⱼ E X²ⁱ⁻²ᵈ⁺²ʲ over j &lt; d, times a power of g.</summary>
    private void Combine(Dyadic[][] combinations, int index, Dyadic[] powers, CancellationToken cancellation)
    {
        int terms = _coefficients.Length;
        for (int j = 0; j < terms; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            int from = index - terms + j;
            Dyadic factor = j == 0 ? new Dyadic((2 * from) + 1, 0) : -_coefficients[j - 1] * new Dyadic(2 * j, 0);
            factor *= powers[index - terms - Math.Max(0, from - terms + 1)];
            for (int t = 0; t < terms && !factor.IsZero; t++)
            {
                combinations[index][t] = (combinations[index][t] + (factor * combinations[from][t])).Reduce();
            }
        }
    }

    private static bool IsConstant(Dyadic[] combination)
    {
        for (int t = 1; t < combination.Length; t++)
        {
            if (!combination[t].IsZero)
            {
                return false;
            }
        }

        return true;
    }
}
