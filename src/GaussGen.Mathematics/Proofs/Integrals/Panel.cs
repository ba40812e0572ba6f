using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Integrals;

/// <summary>The interval from (n−1)r to (n+1)r, where r is a power of two, and the polynomial p of an even exponential on it.</summary>
/// <param name="middle">n, an odd number.</param>
/// <param name="halfWidthLog2">log₂ r.</param>
internal sealed class Panel(BigInteger middle, int halfWidthLog2)
{
    private Dyadic[] _scaled = [];

    /// <summary>n.</summary>
    public BigInteger Middle { get; } = middle;

    /// <summary>log₂ r.</summary>
    public int HalfWidthLog2 { get; } = halfWidthLog2;

    /// <summary>p at the middle, exactly.</summary>
    public Dyadic Value => _scaled[0];

    /// <summary>A bound of |p(x) − p(nr)| on the panel.</summary>
    public Bound Variation { get; private set; }

    /// <summary>About <see cref="Value"/>.</summary>
    public double ValueEstimate { get; private set; }

    /// <summary>About <see cref="Variation"/>.</summary>
    public double VariationEstimate { get; private set; }

    /// <summary>About a lower bound of p on the panel.</summary>
    public double LowestEstimate { get; private set; }

    /// <summary>About log₂ of a multiple of r, too small by less than <see cref="Estimate.Log2Error"/>.</summary>
    public double Log2Of(BigInteger multiple) => Estimate.Log2(Estimate.Of(new Dyadic(multiple, 0))) + HalfWidthLog2;

    /// <summary>Finds the coefficients of p(r(n + τ)) as a polynomial in τ, for p(x) = Σ cⱼ x²ʲ.</summary>
    public void Expand(Dyadic[] coefficients)
    {
        var powers = new Dyadic[(2 * coefficients.Length) + 1];
        for (int j = 0; j < coefficients.Length; j++)
        {
            powers[2 * (j + 1)] = coefficients[j].ScaleByPowerOfTwo(checked(2 * (j + 1) * HalfWidthLog2));
        }

        _scaled = Shift(powers, new Dyadic(Middle, 0));
        for (int i = 1; i < _scaled.Length; i++)
        {
            Variation += Bound.FromDyadic(_scaled[i]);
        }

        ValueEstimate = Estimate.Of(Value);
        VariationEstimate = Estimate.Of(Variation.ToDyadic());
        LowestEstimate = Estimate.Of(Value - Variation.ToDyadic());
    }

    /// <summary>∫ xᵏ exp(p(nr) − p(x)) dx over the panel, for k = 0, …, <paramref name="largest"/>.</summary>
    /// <remarks>
    /// With G(k, m) = ∫₋₁¹ (n + τ)ᵏ τᵐ F(τ) dτ the binomial (n + τ) gives G(k+1, m) = n G(k, m) + G(k, m+1), and the integral is
    /// r^(k+1) G(k, 0). Errors of the G(0, m) grow by n + 1 a step at most, as (n + τ)ᵏ itself does.
    /// </remarks>
    public Ball[] Integrate(int largest, int bits, CancellationToken cancellation)
    {
        List<Ball> exponent = [];
        for (int i = 1; i < _scaled.Length; i++)
        {
            exponent.Add(Ball.FromDyadic(_scaled[i]));
        }

        var series = new ExponentialSeries(exponent, bits, cancellation);
        var row = new BigInteger[largest + 1];
        Bound error = default;
        for (int m = 0; m <= largest; m++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball moment = series.Symmetric(m);
            int shift = checked(moment.Exponent + bits);
            row[m] = shift >= 0 ? moment.Midpoint << shift : moment.Midpoint >> -shift;
            error = Bound.Max(error, moment.Radius + Bound.PowerOfTwo(-bits));
        }

        var integrals = new Ball[largest + 1];
        Bound growth = Bound.FromMagnitude(Middle + 1, 0);
        for (int k = 0; ; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            integrals[k] = new Ball(row[0], -bits, error).ScaleByPowerOfTwo(checked((k + 1) * HalfWidthLog2));
            if (k == largest)
            {
                return integrals;
            }

            for (int m = 0; m + k < largest; m++)
            {
                row[m] = (Middle * row[m]) + row[m + 1];
            }

            error *= growth;
        }
    }

    /// <summary>The coefficients of P(c + t) as a polynomial in t, exactly, by repeated synthetic division (Horner's scheme).</summary>
    public static Dyadic[] Shift(Dyadic[] polynomial, Dyadic by)
    {
        var shifted = (Dyadic[])polynomial.Clone();
        for (int start = 0; start < shifted.Length - 1; start++)
        {
            for (int i = shifted.Length - 2; i >= start; i--)
            {
                shifted[i] += shifted[i + 1] * by;
            }
        }

        return Array.ConvertAll(shifted, coefficient => coefficient.Reduce());
    }
}
