using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// Jₙ = ∫₀^∞ tⁿ exp(−q(t)) dt for n = 0, 1, …, q a polynomial with q(0) = 0. With t = x² and p(x) = q(x²), ∫ |x|^(2n+1) exp(−p(x)) dx over the real
/// line is Jₙ: the odd absolute moments, for which the trapezoidal rule fails because |x| is not analytic.
/// </summary>
/// <remarks>
/// <para>
/// The half-line is cut into panels c ± ρ. On one, with t = c + ρv, q(t) = g₀ + h₁v + … + h_d v^d (exactly, by Horner's scheme), and
/// exp(g₀ − q) = Σ aᵢvⁱ with a₀ = 1 and i aᵢ = −Σ j h_j aᵢ₋ⱼ, since the derivative of exp(−h) is −h′ exp(−h). On the circle |v| = 4 the function is at
/// most e^S, S = Σ |h_j| 4^j, so that |aᵢ| ≤ e^S 4^−i (Cauchy), and what follows aₙ adds up to at most e^S 4^−N/3 for |v| ≤ 1.
/// The panel is made so narrow that S stays below a limit.
/// </para>
/// <para>
/// ∫ vⁱ exp(g₀ − q) dv = Σ 2aⱼ/(i + j + 1) over even i + j; the binomial theorem gives the integrals of (c + ρv)ⁿ.
/// </para>
/// <para>
/// The panels end at a T where all Taylor coefficients of q′ are at least 0 and T q′(T) ≥ 2n: beyond, q(t) ≥ q(T) + q′(T)(t − T) and
/// tⁿ ≤ Tⁿ exp(n(t − T)/T), so that the rest is at most Tⁿ exp(−q(T))/(q′(T) − n/T) ≤ 2 Tⁿ exp(−q(T))/q′(T).
/// </para>
/// </remarks>
internal sealed class HalfLineIntegrals
{
    /// <summary>The largest number of panels; weight functions that need more are refused.</summary>
    internal const int MaximumPanels = 1 << 10;

    private const int MaximumPrecision = 1 << 16;

    private readonly Dyadic[] _exponent;
    private readonly Dyadic[] _slope;
    private readonly int _count;
    private readonly int _working;
    private readonly double _largestVariation;
    private readonly Ball[] _sums;
    private readonly Ball[] _reciprocals;

    private HalfLineIntegrals(EvenPolynomial exponent, int count, int working)
    {
        _exponent = new Dyadic[exponent.Terms + 1];
        _slope = new Dyadic[exponent.Terms];
        for (int j = 1; j <= exponent.Terms; j++)
        {
            _exponent[j] = exponent.Coefficient(j);
            _slope[j - 1] = exponent.Coefficient(j) * new Dyadic(j, 0);
        }

        _count = count;
        _working = working;
        // Wide panels need more terms and lose a few bits more; this is about where the work is least (measured).
        _largestVariation = Math.Max(16, working / 3.0);
        _sums = new Ball[count];
        int terms = TermsFor(_largestVariation) + count + 2;
        _reciprocals = new Ball[terms];
        for (int k = 1; k < terms; k++)
        {
            _reciprocals[k] = Ball.Divide(Ball.FromInteger(2), Ball.FromInteger(k), working);
        }
    }

    /// <summary>The integrals with n = 0 … count − 1, each known to the precision.</summary>
    /// <param name="exponent">q, as a polynomial in t.</param>
    /// <param name="count">How many integrals.</param>
    /// <param name="precision">The bits that each should be known to.</param>
    /// <param name="cancellation">Looked at several times for each panel.</param>
    /// <exception cref="RuleConstructionException">More than <see cref="MaximumPanels"/> panels, or too many bits, are needed.</exception>
    internal static Ball[] Evaluate(EvenPolynomial exponent, int count, int precision, CancellationToken cancellation)
    {
        for (int working = precision + 64 + count; working <= MaximumPrecision;)
        {
            Ball[] integrals = new HalfLineIntegrals(exponent, count, working).Run(cancellation);
            int missing = int.MinValue;
            foreach (Ball integral in integrals)
            {
                missing = Math.Max(missing, precision - Math.Max(0, integral.RelativeAccuracyBits));
            }

            if (missing <= 0)
            {
                return integrals;
            }

            working += missing + 32;
        }

        throw EvenExponentialIntegrals.TooManyTerms();
    }

    private Ball[] Run(CancellationToken cancellation)
    {
        Dyadic left = Dyadic.Zero;
        int power = 0;
        for (int panel = 0; panel < MaximumPanels; panel++)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic[] local = Widest(left, ref power);
            AddPanel(left + new Dyadic(1, power), power, local, cancellation);
            left = (left + new Dyadic(1, power + 1)).Reduce();
            if (TryAddRest(left, cancellation))
            {
                return _sums;
            }

            power++;
        }

        throw EvenExponentialIntegrals.TooManyTerms();
    }

    /// <summary>g₀, h₁, … of the widest panel from a point on whose ρ is 2^power or less by powers of two.</summary>
    private Dyadic[] Widest(Dyadic left, ref int power)
    {
        for (; ; power--)
        {
            Dyadic[] local = PolynomialPositivity.Shift(_exponent, left + new Dyadic(1, power));
            for (int j = 1; j < local.Length; j++)
            {
                local[j] = local[j].ScaleByPowerOfTwo(j * power);
            }

            if (Approximation.ToDouble(Variation(local)) <= _largestVariation)
            {
                return local;
            }
        }
    }

    /// <summary>S = Σ |h_j| 4^j.</summary>
    private static Dyadic Variation(Dyadic[] local)
    {
        Dyadic sum = Dyadic.Zero;
        for (int j = 1; j < local.Length; j++)
        {
            sum += Dyadic.Abs(local[j]).ScaleByPowerOfTwo(2 * j);
        }

        return sum;
    }

    /// <summary>How many terms make e^S 4^−N less than 2^−working.</summary>
    private int TermsFor(double variation) => (int)((_working + (1.4427 * variation)) / 2) + 3;

    private void AddPanel(Dyadic centre, int power, Dyadic[] local, CancellationToken cancellation)
    {
        Dyadic variation = Variation(local);
        int terms = TermsFor(Approximation.ToDouble(variation));
        Ball[] series = Series(local, terms, cancellation);
        // ∫ |v|ⁱ ≤ 2 times the bound of what follows the last term.
        Bound rest = Approximation.Magnitude(Elementary.Exp(Ball.FromDyadic(variation), 32, cancellation)).ScaleByPowerOfTwo(-2 * (terms - 1));
        var integrals = new Ball[_count];
        for (int i = 0; i < _count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default;
            for (int j = i & 1; j < terms; j += 2)
            {
                sum = Ball.Add(sum, Ball.Multiply(series[j], _reciprocals[i + j + 1], _working), _working);
            }

            integrals[i] = sum.Enlarge(rest).ScaleByPowerOfTwo(power * i);
        }

        Translate(integrals, Ball.FromDyadic(centre.Reduce()), cancellation);
        Ball factor = Elementary.Exp(Ball.FromDyadic(-local[0]), _working, cancellation).ScaleByPowerOfTwo(power);
        for (int n = 0; n < _count; n++)
        {
            _sums[n] = Ball.Add(_sums[n], Ball.Multiply(integrals[n], factor, _working), _working);
        }
    }

    /// <summary>a₀, a₁, ….</summary>
    private Ball[] Series(Dyadic[] local, int terms, CancellationToken cancellation)
    {
        var factors = new Ball[local.Length];
        for (int j = 1; j < local.Length; j++)
        {
            factors[j] = Ball.FromDyadic((local[j] * new Dyadic(-j, 0)).Reduce()).Trim(_working);
        }

        var series = new Ball[terms];
        series[0] = Ball.FromInteger(1);
        for (int i = 1; i < terms; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default;
            for (int j = 1; j < factors.Length && j <= i; j++)
            {
                sum = Ball.Add(sum, Ball.Multiply(factors[j], series[i - j], _working), _working);
            }

            series[i] = Ball.Divide(sum, Ball.FromInteger(i), _working);
        }

        return series;
    }

    /// <summary>From the integrals of (ρv)ⁿ to those of (c + ρv)ⁿ: in each round one factor of all that have one left is shifted.</summary>
    private void Translate(Ball[] integrals, Ball centre, CancellationToken cancellation)
    {
        for (int round = 1; round < integrals.Length; round++)
        {
            cancellation.ThrowIfCancellationRequested();
            for (int n = integrals.Length - 1; n >= round; n--)
            {
                integrals[n] = Ball.Add(integrals[n], Ball.Multiply(centre, integrals[n - 1], _working), _working);
            }
        }
    }

    /// <summary>Adds what lies beyond T if that is proven to be negligible.</summary>
    private bool TryAddRest(Dyadic end, CancellationToken cancellation)
    {
        Dyadic[] slope = PolynomialPositivity.Shift(_slope, end);
        if (!Array.TrueForAll(slope, coefficient => coefficient.Sign >= 0)
            || slope[0].IsZero || slope[0] * end < new Dyadic(2 * (_count - 1), 0))
        {
            return false;
        }

        Dyadic value = PolynomialPositivity.Shift(_exponent, end)[0];
        Bound rest = Approximation.Magnitude(Elementary.Exp(Ball.FromDyadic(-value), 32, cancellation)).ScaleByPowerOfTwo(1);
        rest = Bound.DivideByAtLeast(rest, slope[0]);
        Bound factor = Bound.FromDyadic(end);
        var bounds = new Bound[_count];
        for (int n = 0; n < _count; n++)
        {
            if (rest.CeilingLog2 > Approximation.FloorLog2(_sums[n]) - _working)
            {
                return false;
            }

            bounds[n] = rest;
            rest *= factor;
        }

        for (int n = 0; n < _count; n++)
        {
            _sums[n] = _sums[n].Enlarge(bounds[n]);
        }

        return true;
    }
}
