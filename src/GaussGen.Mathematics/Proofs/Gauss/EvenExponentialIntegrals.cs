using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The integrals ∫ x²ᵏ exp(−p(x)) dx from 0 to ∞, k &lt; d, with p(x) = c₁x² + … + c_d x^(2d), c_d above zero.</summary>
/// <remarks>
/// <para>
/// [0, R] is halved into panels c − ρ … c + ρ. There p(c + ρτ) = p(c) + Σ qᵢτⁱ with exact coefficients. Where S = Σ |qᵢ| is small, exp(−Σ qᵢτⁱ) is
/// integrated as a series (<see cref="PanelSeries"/>). Where the whole panel matters too little, its integral is only bounded by
/// 2ρ (c + ρ)²ᵏ exp(−p(c) + S).
/// </para>
/// <para>
/// The tail: let N = 2d c_d R²ᵈ − Σ 2i|cᵢ|R²ⁱ over the negative cᵢ. For x ≥ R, x p′(x) ≥ (x/R)²ᵈ N, as each of the subtracted terms grows less than the
/// first. The derivative of x^(m+1) exp(−p) is −xᵐ exp(−p)(x p′ − m − 1), so that ∫ xᵐ exp(−p) over x ≥ R is at most
/// R^(m+1) exp(−p(R))/(N − m − 1) where the divisor is above zero.
/// </para>
/// </remarks>
internal sealed class EvenExponentialIntegrals
{
    private const double BitsPerUnit = 1.4426950408889634;
    private const double LargestVariation = 16;
    private const int MostPanels = 1 << 13;
    private const int LargestReachLog2 = 40;

    private readonly Dyadic[] _coefficients;
    private readonly int _precision;
    private readonly int _working;
    private readonly CancellationToken _cancellation;
    private readonly Ball[] _sums;

    private EvenExponentialIntegrals(Dyadic[] coefficients, int precision, CancellationToken cancellation)
    {
        _coefficients = coefficients;
        _precision = precision;
        _working = precision + 64;
        _cancellation = cancellation;
        _sums = new Ball[coefficients.Length];
    }

    private int Degree => _coefficients.Length;

    /// <summary>Encloses the integrals; with the whole line where the weight is too extreme for this method.</summary>
    /// <param name="coefficients">c₁, …, c_d, with the largest of |cᵢ|^(1/2i) near 1.</param>
    /// <param name="precision">About the relative accuracy in bits that is wanted.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    public static Ball[] Enclose(Dyadic[] coefficients, int precision, CancellationToken cancellation)
    {
        var integrals = new EvenExponentialIntegrals(coefficients, precision, cancellation);
        return integrals.Integrate() ? integrals._sums : [.. coefficients.Select(_ => Ball.WholeLine)];
    }

    private bool Integrate()
    {
        // R is a power of two beyond which little is left, and the tail can be bounded.
        double lowest = 0;
        int reach = 0;
        for (; ; reach++)
        {
            if (reach > LargestReachLog2)
            {
                return false;
            }

            double end = Math.Pow(2, reach);
            lowest = Math.Min(lowest, Lowest(end / 2, end));
            Dyadic exactEnd = PowerOfTwo(reach);
            if (Slope(exactEnd) > new Dyadic((2 * Degree) + 1, 0) && (Estimate(end) - lowest) * BitsPerUnit > Margin(reach))
            {
                break;
            }
        }

        if (lowest < -(1 << 26))
        {
            return false;
        }

        var open = new Stack<(BigInteger Middle, int HalfWidthLog2)>();
        open.Push((BigInteger.One, reach - 1));
        for (int count = 0; open.Count > 0; count++)
        {
            _cancellation.ThrowIfCancellationRequested();
            (BigInteger middle, int halfWidthLog2) = open.Pop();
            Dyadic[] exponent = Expand(middle, halfWidthLog2);
            double variation = exponent.Skip(1).Sum(coefficient => Math.Abs(ToDouble(coefficient)));
            if ((ToDouble(exponent[0]) - variation - lowest) * BitsPerUnit > Margin(reach))
            {
                Bounded(middle, halfWidthLog2, exponent);
            }
            else if (variation <= LargestVariation)
            {
                Integrated(middle, halfWidthLog2, exponent);
            }
            else if (count > MostPanels)
            {
                return false;
            }
            else
            {
                open.Push(((2 * middle) - 1, halfWidthLog2 - 1));
                open.Push(((2 * middle) + 1, halfWidthLog2 - 1));
            }
        }

        Tail(PowerOfTwo(reach));
        return true;
    }

    /// <summary>How many bits below the largest values something must be to be left out: those wanted, and what the powers of x make of it.</summary>
    private int Margin(int reach) => _precision + 32 + (2 * Degree * (reach + 1));

    /// <summary>Adds the integrals over a panel by the series of the exponential.</summary>
    private void Integrated(BigInteger middle, int halfWidthLog2, Dyadic[] exponent)
    {
        Ball[] parts = new PanelSeries(exponent, _working, _cancellation).Integrals((2 * Degree) - 1);
        Ball factor = Elementary.Exp(Ball.FromDyadic(-exponent[0]), _working, _cancellation);
        for (int k = 0; k < Degree; k++)
        {
            // (ρ(n + τ))²ᵏ by the binomial theorem.
            Ball sum = default;
            BigInteger binomial = BigInteger.One;
            for (int i = 0; i <= 2 * k; i++)
            {
                BigInteger coefficient = binomial * BigInteger.Pow(middle, (2 * k) - i);
                sum = Ball.Add(sum, Ball.Multiply(Ball.FromInteger(coefficient), parts[i], _working), _working);
                binomial = binomial * ((2 * k) - i) / (i + 1);
            }

            sum = Ball.Multiply(sum, factor, _working).ScaleByPowerOfTwo(((2 * k) + 1) * halfWidthLog2);
            _sums[k] = Ball.Add(_sums[k], sum, _working);
        }
    }

    /// <summary>Enlarges the integrals by what a panel adds at most.</summary>
    private void Bounded(BigInteger middle, int halfWidthLog2, Dyadic[] exponent)
    {
        Dyadic variation = Dyadic.Zero;
        for (int i = 1; i < exponent.Length; i++)
        {
            variation += Dyadic.Abs(exponent[i]);
        }

        Bound most = Exponential(variation - exponent[0]).ScaleByPowerOfTwo(halfWidthLog2 + 1);
        Bound end = Bound.FromMagnitude(middle + 1, halfWidthLog2);
        for (int k = 0; k < Degree; k++)
        {
            _sums[k] = _sums[k].Enlarge(most);
            most = most * end * end;
        }
    }

    private void Tail(Dyadic end)
    {
        Bound most = Exponential(-Value(end)) * Bound.FromDyadic(end);
        for (int k = 0; k < Degree; k++)
        {
            Dyadic divisor = Slope(end) - new Dyadic((2 * k) + 1, 0);
            _sums[k] = _sums[k].Enlarge(Bound.DivideByAtLeast(most, divisor));
            most = most * Bound.FromDyadic(end) * Bound.FromDyadic(end);
        }
    }

    /// <summary>A bound of the exponential function.</summary>
    private Bound Exponential(Dyadic exponent)
    {
        // exp(−2^27) bounds all that is smaller; exponents above zero are no larger than what was let through as negligible.
        var least = new Dyadic(-1, 27);
        Ball value = Ball.FromDyadic(exponent < least ? least : exponent).Trim(64);
        return Bound.FromDyadic(Elementary.Exp(value, 64, _cancellation).Upper);
    }

    /// <summary>The coefficients of p(2ʰ(n + τ)) as a polynomial in τ, exactly, by repeated synthetic division.</summary>
    private Dyadic[] Expand(BigInteger middle, int halfWidthLog2)
    {
        var expanded = new Dyadic[(2 * Degree) + 1];
        for (int i = 1; i <= Degree; i++)
        {
            expanded[2 * i] = _coefficients[i - 1].ScaleByPowerOfTwo(2 * i * halfWidthLog2);
        }

        var point = new Dyadic(middle, 0);
        for (int start = 0; start < expanded.Length - 1; start++)
        {
            for (int i = expanded.Length - 2; i >= start; i--)
            {
                expanded[i] += expanded[i + 1] * point;
            }
        }

        return expanded;
    }

    private Dyadic Value(Dyadic x)
    {
        Dyadic square = x * x, value = Dyadic.Zero;
        for (int i = Degree - 1; i >= 0; i--)
        {
            value = (value + _coefficients[i]) * square;
        }

        return value;
    }

    /// <summary>N.</summary>
    private Dyadic Slope(Dyadic x)
    {
        Dyadic square = x * x, power = square, sum = Dyadic.Zero;
        for (int i = 1; i <= Degree; i++)
        {
            Dyadic term = _coefficients[i - 1] * power * new Dyadic(2 * i, 0);
            sum += i == Degree || term.Sign < 0 ? term : Dyadic.Zero;
            power *= square;
        }

        return sum;
    }

    /// <summary>About the least value of p between two points.</summary>
    private double Lowest(double from, double to)
    {
        const int Steps = 256;
        double best = from, step = (to - from) / Steps;
        for (int i = 0; i <= Steps; i++)
        {
            double x = from + (i * step);
            best = Estimate(x) < Estimate(best) ? x : best;
        }

        for (int i = 0; i < 60; i++)
        {
            step /= 2;
            best = Estimate(best - step) < Estimate(best) ? best - step : Estimate(best + step) < Estimate(best) ? best + step : best;
        }

        return Estimate(best);
    }

    private double Estimate(double x)
    {
        double value = 0;
        for (int i = Degree - 1; i >= 0; i--)
        {
            value = (value + ToDouble(_coefficients[i])) * x * x;
        }

        return value;
    }

    private static Dyadic PowerOfTwo(int exponent) => new(BigInteger.One, exponent);

    private static double ToDouble(Dyadic value) => value.Sign < 0
        ? -NearestValue.ToDoubleUpward(-value)
        : NearestValue.ToDoubleUpward(value);
}
