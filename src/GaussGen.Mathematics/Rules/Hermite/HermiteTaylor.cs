using System;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// The zero of the Taylor series F(h) = Heₙ(x + h)/Heₙ′(x) near h = 0, and its slope there, in fixed-size integers: section 4 of
/// Derivation.md. Lengths are in units of the point's last place: η = 2²⁵h, |η| ≤ 1, and F(η) = u + η + b₂η² + … + b₅η⁵ + tail.
/// </summary>
internal struct HermiteTaylor
{
    /// <summary>Covers the roundings on the way to F and to F′, which section 4 counts.</summary>
    private const double Rounding = 64 * TaylorFixed.Unit;

    private const double LargestOffset = 1.05;

    // ⌊2¹²⁰/6⌋.
    private static readonly TaylorFixed Sixth = new(0x002AAAAAAAAAAAAA, 0xAAAAAAAAAAAAAAAA);

    private readonly int _points;
    private readonly uint _point;
    private readonly TaylorFixed _u;
    private TaylorFixed _b2;
    private TaylorFixed _b3;
    private long _b4;
    private long _b5;

    /// <param name="points">n, from 3 to 1000.</param>
    /// <param name="point">X, for x = X/2²⁵.</param>
    /// <param name="u">F(0), at most 1 in magnitude.</param>
    internal HermiteTaylor(int points, uint point, TaylorFixed u)
        : this()
    {
        _points = points;
        _point = point;
        _u = u;
    }

    /// <summary>The zero η*.</summary>
    internal TaylorFixed Zero { get; private set; }

    /// <summary>F′(η*) − 1.</summary>
    internal TaylorFixed Slope { get; private set; }

    /// <summary>A bound of the error of <see cref="Zero"/>.</summary>
    internal double ZeroError { get; private set; }

    /// <summary>A bound of the error of <see cref="Slope"/>.</summary>
    internal double SlopeError { get; private set; }

    /// <summary>Finds the zero; <c>false</c> where the point is too far from it.</summary>
    /// <param name="error">A bound of the error of u.</param>
    internal bool TrySolve(double error)
    {
        double seed = Seed();
        if (!(Math.Abs(seed) <= LargestOffset))
        {
            return false;
        }

        Coefficients();
        // The seed becomes an exact number; what follows is about this number and no longer about how it was found.
        var eta = (long)(seed * (1L << 62));
        long fourth = TaylorFixed.Times62(_b5, eta);
        TaylorFixed value = _b3 + TaylorFixed.FromUnits(TaylorFixed.Times62(_b4 + fourth, eta));
        value = (_b2 + value.Times62(eta)).Times62(eta).Times62(eta);
        TaylorFixed offset = TaylorFixed.FromUnits(eta).ShiftLeft(TaylorFixed.FractionBits - 62);
        value = _u + offset + value;

        TaylorFixed slope = _b3.Times(3) + TaylorFixed.FromUnits(TaylorFixed.Times62((4 * _b4) + (5 * fourth), eta));
        slope = (_b2.Times(2) + slope.Times62(eta)).Times62(eta);

        // One step of Newton's method, 1/(1 + q) taken as 1 − q; and the slope carried over to the new place.
        TaylorFixed step = (value * slope) - value;
        TaylorFixed bend = _b2.Times(2) + _b3.Times(6).Times62(eta);
        Zero = offset + step;
        Slope = slope + (bend * step);
        SetErrors(error, Math.Abs(eta / (double)(1L << 62)), Math.Abs(value.ToDouble()));
        return true;
    }

    /// <summary>The terms up to the third in double arithmetic; the start and each round give 18 bits.</summary>
    private readonly double Seed()
    {
        double x = _point * UnitOf50, u = _u.ToDouble();
        double second = 0.5 * (x - (_points * UnitOf50 * u));
        double third = ((2 * x * second) - ((_points - 1) * UnitOf50)) / 6;
        double eta = -u;
        for (int round = 0; round < 2; round++)
        {
            eta = -(u + (eta * eta * (second + (eta * third))));
        }

        return eta;
    }

    private const double UnitOf50 = 1.0 / (1L << 50);

    /// <summary>
    /// (j+1)(j+2)·b_{j+2} = (j+1)·X/2⁵⁰·b_{j+1} − (n−j)/2⁵⁰·b_j, from f″ = x f′ − n f, with b₀ = u and b₁ = 1.
    /// </summary>
    private void Coefficients()
    {
        var n = (uint)_points;
        TaylorFixed x = TaylorFixed.FromUnits(_point);
        _b2 = x.ShiftLeft(62).ShiftLeft(7) - _u.ShiftRight(10).Times(n).ShiftRight(41);
        TaylorFixed product = _b2.ShiftRight(20).Times(_point).ShiftRight(29);
        _b3 = (product - TaylorFixed.FromUnits(n - 1).ShiftLeft(62).ShiftLeft(8)) * Sixth;
        long upper = 3 * _b3.Times(_point).ShiftRight(50).ToUnits();
        _b4 = (upper - _b2.Times(n - 2).ShiftRight(50).ToUnits()) / 12;
        upper = 4 * TaylorFixed.FromUnits(_b4).Times(_point).ShiftRight(50).ToUnits();
        _b5 = (upper - _b3.Times(n - 3).ShiftRight(50).ToUnits()) / 20;
    }

    /// <summary>Theorem 6.</summary>
    private void SetErrors(double error, double eta, double residual)
    {
        // λ/2²⁵ for λ = (1 + √2)√n, which bounds the growth from one derivative to the next (theorem 4).
        double growth = 2.4143 * Math.Sqrt(_points) / (1 << HermiteRecurrence.PointBits);
        double ratio = growth * eta;
        double power = ratio * ratio * ratio * ratio * ratio;
        double valueError = error + (power * eta / 719) + Rounding;
        double slopeError = (power / 119) + Rounding + (growth * error);
        double zeroError = (1.001 * valueError)
            + (residual * ((5 * ratio * ratio) + (1.1 * growth * residual) + slopeError))
            + Rounding;
        ZeroError = HermiteErrorBound.Slack * zeroError;
        double bendError = growth * growth * residual * ((growth * eta * eta) + residual);
        SlopeError = HermiteErrorBound.Slack * (slopeError + (1.1 * growth * zeroError) + bendError + Rounding);
    }
}
