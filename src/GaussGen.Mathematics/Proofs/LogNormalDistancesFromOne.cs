using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;

namespace GaussGen.Mathematics.Proofs;

/// <summary>E (Y − 1)ᵏ and E |Y − 1|ᵏ for Y = exp(sZ − s²/2), which has the mean 1.</summary>
/// <remarks>
/// <para>
/// With Z = U + s/2 the density is exp(−s²/8) exp(−sU/2) times that of a standard normal U, and Y − 1 = exp(sU) − 1, so that
/// exp(−sU/2) (Y − 1)ᵏ = (sU)ᵏ W(sU) with W(v) = exp((k−1)v/2) (sinh(v/2)/(v/2))ᵏ = Σ wᵢ vⁱ, all wᵢ > 0. Hence
/// E (Y − 1)ᵏ = exp(−s²/8) sᵏ Σ wᵢ sⁱ E U^(k+i), in which only the i of k's parity count, and for odd k
/// E |Y − 1|ᵏ = exp(−s²/8) sᵏ Σ wᵢ sⁱ E |U|^(k+i) over even i, because U and Y − 1 have one sign.
/// </para>
/// <para>
/// The rest: sinh(v/2)/(v/2) has smaller coefficients than exp(v/2), so wᵢ ≤ (k−½)ⁱ/i!; and E |U|^(m+1) ≤ √(m+1) E |U|ᵐ by Schwarz's inequality
/// with E |U|^(m+2) = (m+1) E |U|ᵐ. Once (k−½) s √(k+i+1)/(i+1) ≤ ½, which falls in i, the terms from i on sum to twice the bound of the first at most.
/// </para>
/// <para>
/// Where s is so large that this is long, E (Y − 1)ᵏ = Σ (−1)ᵏ⁻ʲ C(k, j) Q^(j(j−1)/2), Q = exp(s²), loses few bits, and for odd k it is all but
/// E |Y − 1|ᵏ, which exceeds it by 2 E max(1 − Y, 0)ᵏ ≤ 2. E |Y − 1| is 2 (2Φ(s/2) − 1) for every s.
/// </para>
/// </remarks>
internal sealed class LogNormalDistancesFromOne(Dyadic deviation, int maximumOrder, int precision)
{
    private readonly int _bits = precision + 48;
    private readonly int _alternatingBits = precision + 48 + (2 * maximumOrder);
    private readonly double _estimate = Estimate.Of(deviation);
    private Ball[]? _exponentials;
    private Ball[]? _sinhPower;
    private int _sinhOrder;

    /// <summary>E |Y − 1| = 4/√(2π) ∫₀^(s/2) exp(−t²/2) dt.</summary>
    public Ball First(CancellationToken cancellation)
    {
        Ball integral = TruncatedPowers.OneSided(default, Ball.FromDyadic(deviation.ScaleByPowerOfTwo(-1)), 1, precision, cancellation)[0];
        Ball root = Ball.Multiply(Constants.Sqrt2(_bits), Constants.SqrtPi(_bits, cancellation), _bits);
        return Ball.Divide(integral.ScaleByPowerOfTwo(2), root, _bits);
    }

    /// <summary>Both moments of an order of 2 or more; orders must be asked for in ascending order.</summary>
    public (Ball Signed, Ball Magnitude) Of(int order, CancellationToken cancellation)
    {
        double growth = Estimate.BitsPerUnit * _estimate * _estimate * order * (order - 1) / 2;
        if (growth < precision + 16)
        {
            return BySeries(order, cancellation);
        }

        Ball signed = ByBinomialSum(order, cancellation);
        Ball magnitude = (order & 1) == 0 ? signed : Ball.Add(signed, Ball.FromInteger(1).Enlarge(Bound.PowerOfTwo(0)), _bits);
        return (signed, magnitude);
    }

    private Ball ByBinomialSum(int order, CancellationToken cancellation)
    {
        if (_exponentials is null)
        {
            _exponentials = new Ball[maximumOrder + 1];
            for (int j = 0; j <= maximumOrder; j++)
            {
                cancellation.ThrowIfCancellationRequested();
                Dyadic exponent = deviation * deviation * new Dyadic(j * (j - 1) / 2, 0);
                _exponentials[j] = Elementary.Exp(Ball.FromDyadic(exponent), _alternatingBits, cancellation);
            }
        }

        Ball sum = default;
        BigInteger binomial = BigInteger.One;
        for (int j = order; j >= 0; j--)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball term = Ball.Multiply(Ball.FromInteger(binomial), _exponentials[j], _alternatingBits);
            sum = ((order - j) & 1) == 0 ? Ball.Add(sum, term, _alternatingBits) : Ball.Subtract(sum, term, _alternatingBits);
            binomial = binomial * j / (order - j + 1);
        }

        return sum;
    }

    private (Ball Signed, Ball Magnitude) BySeries(int order, CancellationToken cancellation)
    {
        (int count, Bound rest) = Length(order, cancellation);
        Ball[] sinh = SinhPower(order, (count / 2) + 1, cancellation);
        Ball[] exponential = ExponentialTerms(order, count);
        Ball even = default, odd = default;
        Ball evenMoment = NormalMoment(order), oddMoment = NormalMoment(order + 1);
        for (int i = 0; i < count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball coefficient = default;
            for (int n = 0; 2 * n <= i; n++)
            {
                coefficient = Ball.Add(coefficient, Ball.Multiply(sinh[n], exponential[i - (2 * n)], _bits), _bits);
            }

            if ((i & 1) == 0)
            {
                even = Ball.Add(even, Ball.Multiply(coefficient, evenMoment, _bits), _bits);
                evenMoment = Ball.Multiply(evenMoment, Ball.FromInteger(order + i + 1), _bits);
            }
            else
            {
                odd = Ball.Add(odd, Ball.Multiply(coefficient, oddMoment, _bits), _bits);
                oddMoment = Ball.Multiply(oddMoment, Ball.FromInteger(order + i + 1), _bits);
            }
        }

        Ball factor = Ball.Multiply(
            Elementary.Exp(Ball.FromDyadic(-(deviation * deviation).ScaleByPowerOfTwo(-3)), _bits, cancellation),
            Ball.Pow(Ball.FromDyadic(deviation), order, _bits),
            _bits);
        even = Ball.Multiply(even.Enlarge(rest), factor, _bits);
        odd = Ball.Multiply(odd.Enlarge(rest), factor, _bits);
        return ((order & 1) == 0 ? even : odd, even);
    }

    /// <summary>How many terms to sum, and a bound of the others.</summary>
    private (int Count, Bound Remainder) Length(int order, CancellationToken cancellation)
    {
        // The first term of the odd ones has one more factor s than that of the even ones.
        int wanted = checked(-_bits - Math.Max(0, -(deviation.BitLength + deviation.Exponent)));
        Bound term = Bound.PowerOfTwo(0);
        Bound slope = Bound.FromDyadic(deviation * new Dyadic((2 * order) - 1, -1));
        for (int i = 0; ; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Bound root = Bound.FromDyadic(Ball.Sqrt(Ball.FromInteger(order + i + 1), 40).Upper);
            Bound ratio = Bound.DivideByAtLeast(slope * root, new Dyadic(i + 1, 0));
            if (i > 1 && ratio <= Bound.PowerOfTwo(-1) && term <= Bound.PowerOfTwo(wanted))
            {
                Ball moment = NormalMoment(order);
                return (i, Bound.FromDyadic(moment.Upper) * term.ScaleByPowerOfTwo(1));
            }

            term *= ratio;
        }
    }

    /// <summary>The coefficients of (sinh(v/2)/(v/2))^order at v = s·t, by even powers of t; kept from the order before, and longer as needed.</summary>
    private Ball[] SinhPower(int order, int count, CancellationToken cancellation)
    {
        if (_sinhPower is null || _sinhPower.Length < count)
        {
            _sinhPower = new Ball[count * 2];
            _sinhPower[0] = Ball.FromInteger(1);
            _sinhOrder = 0;
        }

        Ball[] factor = new Ball[_sinhPower.Length];
        factor[0] = Ball.FromInteger(1);
        Dyadic square = (deviation * deviation).ScaleByPowerOfTwo(-2);
        for (int n = 1; n < factor.Length; n++)
        {
            Ball numerator = Ball.Multiply(factor[n - 1], Ball.FromDyadic(square), _bits);
            factor[n] = Ball.Divide(numerator, Ball.FromInteger(2 * n * ((2 * n) + 1)), _bits);
        }

        for (; _sinhOrder < order; _sinhOrder++)
        {
            for (int n = _sinhPower.Length - 1; n > 0; n--)
            {
                cancellation.ThrowIfCancellationRequested();
                Ball sum = _sinhPower[n];
                for (int j = 1; j <= n; j++)
                {
                    sum = Ball.Add(sum, Ball.Multiply(factor[j], _sinhPower[n - j], _bits), _bits);
                }

                _sinhPower[n] = sum;
            }
        }

        return _sinhPower;
    }

    /// <summary>((k−1)s/2)ʲ/j!.</summary>
    private Ball[] ExponentialTerms(int order, int count)
    {
        var terms = new Ball[count];
        terms[0] = Ball.FromInteger(1);
        Ball factor = Ball.FromDyadic(deviation * new Dyadic(order - 1, -1));
        for (int j = 1; j < count; j++)
        {
            terms[j] = Ball.Divide(Ball.Multiply(terms[j - 1], factor, _bits), Ball.FromInteger(j), _bits);
        }

        return terms;
    }

    /// <summary>E |U|ᵐ: (m−1)!!, for odd m times √(2/π) (Winkelbauer 2012).</summary>
    private Ball NormalMoment(int power)
    {
        BigInteger product = BigInteger.One;
        for (int j = power - 1; j > 1; j -= 2)
        {
            product *= j;
        }

        Ball moment = Ball.FromInteger(product);
        return (power & 1) == 0
            ? moment
            : Ball.Divide(Ball.Multiply(moment, Constants.Sqrt2(_bits), _bits), Constants.SqrtPi(_bits), _bits);
    }
}
