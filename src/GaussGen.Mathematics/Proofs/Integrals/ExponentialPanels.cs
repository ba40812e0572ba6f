using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Integrals;

/// <summary>The integrals ∫ xᵏ exp(−p(x)) dx from 0 to ∞ with p(x) = c₁x² + c₂x⁴ + … + c_d x^(2d), c_d > 0.</summary>
/// <remarks>
/// <para>
/// [0, R] is halved again and again. A panel with the middle c = n·r and half the width r has x = r(n + τ) and
/// p(x) = p(c) + Σ pᵢ rⁱ τⁱ with |τ| ≤ 1, where the pᵢ are the exact Taylor coefficients of p at c. Where S = Σ |pᵢ| rⁱ is small, the
/// exponential's series in τ is integrated term by term (<see cref="ExponentialSeries"/>), and (n + τ)ᵏ is built up by k multiplications
/// with an integer. Where the whole panel's integral is at most 2r (r(n+1))ᵏ exp(−p(c) + S), too little to matter for every k, that bound
/// is added to the radius.
/// </para>
/// <para>
/// The tail: if x p′(x) − k − 1 ≥ D > 0 for all x ≥ R, then ∫ xᵏ exp(−p) over x ≥ R is at most R^(k+1) exp(−p(R))/D, because
/// the derivative of x^(k+1) exp(−p) is −xᵏ exp(−p)(x p′ − k − 1). As a polynomial in x², x p′ grows from R² on if none of its Taylor
/// coefficients there is negative.
/// </para>
/// </remarks>
internal sealed class ExponentialPanels
{
    // Panels are halved until the exponent varies by no more than this, so that a series has some dozens of terms.
    private static readonly Bound LargestVariation = Bound.FromParts(12, 0);

    // What the exponential function can be asked for.
    private static readonly Dyadic LargestExponent = new(1, 27);

    private const int MaximumPanels = 20000;
    private const int MaximumReachLog2 = 1 << 12;

    private readonly Dyadic[] _coefficients;
    private readonly int[] _orders;
    private readonly int _precision;
    private readonly CancellationToken _cancellation;
    private readonly double[] _bestLog2;
    private readonly Bound[] _leftOut;
    private readonly List<Panel> _kept = [];

    private ExponentialPanels(Dyadic[] coefficients, int[] orders, int precision, CancellationToken cancellation)
    {
        _coefficients = coefficients;
        _orders = orders;
        _precision = precision;
        _cancellation = cancellation;
        _bestLog2 = new double[orders.Length];
        _leftOut = new Bound[orders.Length];
        // On [0, 2^near] each of the d terms of p is at most 1/d, so that the integral is at least 2^(near(k+1))/(e(k+1)).
        int near = Enumerable.Range(1, coefficients.Length).Where(j => !coefficients[j - 1].IsZero).Min(j =>
            FloorDivide(-(coefficients[j - 1].BitLength + coefficients[j - 1].Exponent + Magnitude.BitLength((ulong)coefficients.Length)), 2 * j));
        for (int i = 0; i < orders.Length; i++)
        {
            _bestLog2[i] = (near * (orders[i] + 1.0)) - Estimate.Log2(orders[i] + 1) - Estimate.BitsPerUnit - Estimate.Log2Error;
        }
    }

    /// <summary>Encloses the integrals.</summary>
    /// <param name="coefficients">c₁, …, c_d, the last above zero.</param>
    /// <param name="orders">The exponents k, not negative.</param>
    /// <param name="precision">The relative accuracy in bits that each integral is to have.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    /// <returns>One ball for each order; the whole line where the weight is too extreme for this method.</returns>
    public static Ball[] Enclose(
        IReadOnlyList<Dyadic> coefficients, IReadOnlyList<int> orders, int precision, CancellationToken cancellation)
    {
        var integrals = new ExponentialPanels([.. coefficients], [.. orders], precision, cancellation);
        return integrals.Integrate() ?? [.. orders.Select(_ => Ball.WholeLine)];
    }

    private Ball[]? Integrate()
    {
        // x = R is a power of two, first where the leading term is near 1, then twice as large until the tail can be bounded.
        Dyadic leading = _coefficients[_coefficients.Length - 1];
        int reach = -(leading.BitLength + leading.Exponent) / (2 * _coefficients.Length);
        int mostReach = reach + MaximumReachLog2;
        while (LeastSlope(reach) is null)
        {
            _cancellation.ThrowIfCancellationRequested();
            if (++reach > mostReach)
            {
                return null;
            }
        }

        // [0, R] is the panel with n = 1 and r = R/2; [R, 2R] the one with n = 3 and r = R/2.
        if (!Divide(new Panel(BigInteger.One, reach - 1)))
        {
            return null;
        }

        while (!IsTailSmall(reach))
        {
            _cancellation.ThrowIfCancellationRequested();
            if (reach > mostReach || !Divide(new Panel(3, reach - 1)))
            {
                return null;
            }

            reach++;
        }

        return Sum(reach);
    }

    /// <summary>Halves a panel until each part can be integrated or left out; false if there are too many parts.</summary>
    private bool Divide(Panel whole)
    {
        List<Panel> open = [whole];
        int count = 0;
        while (open.Count > 0)
        {
            // All panels of one width first, so that what the largest part gives is known before anything is left out.
            foreach (Panel panel in open)
            {
                _cancellation.ThrowIfCancellationRequested();
                panel.Expand(_coefficients);
                NoteLowerBound(panel);
            }

            List<Panel> halves = [];
            foreach (Panel panel in open)
            {
                if (IsNegligible(panel))
                {
                    LeaveOut(panel);
                }
                else if (panel.Variation <= LargestVariation)
                {
                    _kept.Add(panel);
                }
                else
                {
                    halves.Add(new Panel((2 * panel.Middle) - 1, panel.HalfWidthLog2 - 1));
                    halves.Add(new Panel((2 * panel.Middle) + 1, panel.HalfWidthLog2 - 1));
                }
            }

            count += halves.Count;
            if (count > MaximumPanels)
            {
                return false;
            }

            open = halves;
        }

        return true;
    }

    /// <summary>The part of a panel above its middle where the exponent varies by 1 at most gives so much at least.</summary>
    private void NoteLowerBound(Panel panel)
    {
        double part = panel.VariationEstimate > 1 ? 1 / panel.VariationEstimate : 1;
        double rest = Estimate.Log2(part) + panel.HalfWidthLog2 - (Estimate.BitsPerUnit * (panel.ValueEstimate + 1));
        for (int i = 0; i < _orders.Length; i++)
        {
            double log2 = rest + (_orders[i] * panel.Log2Of(panel.Middle));
            _bestLog2[i] = log2 > _bestLog2[i] ? log2 : _bestLog2[i];
        }
    }

    private bool IsNegligible(Panel panel)
    {
        double rest = panel.HalfWidthLog2 + 1 - (Estimate.BitsPerUnit * panel.LowestEstimate);
        for (int i = 0; i < _orders.Length; i++)
        {
            double most = rest + (_orders[i] * (panel.Log2Of(panel.Middle + 1) + Estimate.Log2Error));
            if (!(most < _bestLog2[i] - Margin))
            {
                return false;
            }
        }

        return true;
    }

    private bool IsTailSmall(int reach)
    {
        Dyadic end = PowerOfTwo(reach);
        double value = Estimate.BitsPerUnit * Estimate.Of(Value(end));
        for (int i = 0; i < _orders.Length; i++)
        {
            if (!(((_orders[i] + 1.0) * reach) - value < _bestLog2[i] - Margin))
            {
                return false;
            }
        }

        return true;
    }

    private double Margin => _precision + 32;

    private void LeaveOut(Panel panel)
    {
        Bound most = Exponential(panel.Variation.ToDyadic() - panel.Value).ScaleByPowerOfTwo(panel.HalfWidthLog2 + 1);
        Bound end = Bound.FromMagnitude(panel.Middle + 1, panel.HalfWidthLog2);
        for (int i = 0; i < _orders.Length; i++)
        {
            _leftOut[i] += most * Power(end, _orders[i]);
        }
    }

    /// <summary>The sum over all panels, and the tail; <c>null</c> if a value of the weight is out of range.</summary>
    private Ball[]? Sum(int reach)
    {
        int bits = _precision + 64 + (int)(2 * Estimate.BitsPerUnit * 12);
        var sums = new Ball[_orders.Length];
        int largest = _orders.Max();
        foreach (Panel panel in _kept)
        {
            if (IsNegligible(panel))
            {
                LeaveOut(panel);
                continue;
            }

            if (Dyadic.Abs(panel.Value) > LargestExponent)
            {
                return null;
            }

            Ball[] integrals = panel.Integrate(largest, bits, _cancellation);
            Ball factor = Elementary.Exp(Ball.FromDyadic(-panel.Value), bits, _cancellation);
            for (int i = 0; i < _orders.Length; i++)
            {
                sums[i] = Ball.Add(sums[i], Ball.Multiply(integrals[_orders[i]], factor, bits), bits);
            }
        }

        Dyadic slope = LeastSlope(reach)!.Value;
        Bound last = Exponential(-Value(PowerOfTwo(reach)));
        for (int i = 0; i < _orders.Length; i++)
        {
            Dyadic divisor = slope - new Dyadic(_orders[i] + 1, 0);
            Bound tail = Bound.DivideByAtLeast(last.ScaleByPowerOfTwo(checked((_orders[i] + 1) * reach)), divisor);
            sums[i] = sums[i].Enlarge(_leftOut[i] + tail);
        }

        return sums;
    }

    /// <summary>A lower bound of x p′(x) for x ≥ 2^reach that is above k + 1 for all orders; <c>null</c> if this gives none.</summary>
    private Dyadic? LeastSlope(int reach)
    {
        var slopes = new Dyadic[_coefficients.Length + 1];
        for (int j = 1; j < slopes.Length; j++)
        {
            slopes[j] = _coefficients[j - 1] * new Dyadic(2 * j, 0);
        }

        Dyadic[] shifted = Panel.Shift(slopes, PowerOfTwo(2 * reach));
        return Array.Exists(shifted, coefficient => coefficient.Sign < 0) || shifted[0] <= new Dyadic(_orders.Max() + 1, 0)
            ? null
            : shifted[0];
    }

    private Dyadic Value(Dyadic x)
    {
        Dyadic square = x * x;
        Dyadic sum = Dyadic.Zero;
        for (int j = _coefficients.Length - 1; j >= 0; j--)
        {
            sum = (sum + _coefficients[j]) * square;
        }

        return sum;
    }

    private Bound Exponential(Dyadic exponent)
    {
        if (exponent > LargestExponent)
        {
            return Bound.Infinite;
        }

        // The exponential of −2²⁷ bounds that of all numbers below it, and is small enough for any format.
        Ball value = Ball.FromDyadic(exponent < -LargestExponent ? -LargestExponent : exponent);
        return Bound.FromDyadic(Elementary.Exp(value.Trim(128), 64, _cancellation).Upper);
    }

    private static Bound Power(Bound value, int exponent)
    {
        Bound result = Bound.PowerOfTwo(0);
        for (int bit = Magnitude.BitLength((ulong)exponent) - 1; bit >= 0; bit--)
        {
            result *= result;
            result = ((exponent >> bit) & 1) != 0 ? result * value : result;
        }

        return result;
    }

    private static int FloorDivide(int value, int divisor) => value >= 0 ? value / divisor : -((divisor - 1 - value) / divisor);

    private static Dyadic PowerOfTwo(int exponent) => new(BigInteger.One, exponent);
}
