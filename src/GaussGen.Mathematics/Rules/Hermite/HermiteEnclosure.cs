using System;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>One positive zero of Heₙ and its weight, enclosed in fixed-size integers: section 5 of Derivation.md.</summary>
internal static class HermiteEnclosure
{
    /// <summary>
    /// The radius of a node in units of its 128-bit mantissa: a relative 2⁻¹⁰⁰ or less. Radii are fixed, a little wider than what is
    /// proven for any n, so that what a table says about its accuracy does not depend on the host's double arithmetic.
    /// </summary>
    internal const ulong NodeRadius = 1UL << 27;

    /// <summary>The radius of a weight in units of its 128-bit mantissa: a relative 2⁻⁸⁷ or less.</summary>
    internal const ulong WeightRadius = 1UL << 40;

    private const double LargestLoss = 1L << 40;

    /// <summary>
    /// Encloses the zero next to the point and its weight. <c>false</c> where the point is too far from a zero to prove anything.
    /// Where it is <c>true</c>, exactly one zero lies within 1.1·2⁻²⁵ of the point (theorem 5).
    /// </summary>
    /// <param name="points">n, from 3 to 1000.</param>
    /// <param name="point">X, for x = X/2²⁵.</param>
    /// <param name="roots">√k at index k, up to n.</param>
    /// <param name="factor">(n−1)!/n.</param>
    /// <param name="node">The zero; its radius may be too wide to be of use.</param>
    /// <param name="weight">(n−1)!/(n·Heₙ₋₁²) at the zero; its radius may be too wide to be of use.</param>
    internal static bool TryEnclose(
        int points, uint point, double[] roots, in FixedBall factor, out FixedBall node, out FixedBall weight)
    {
        node = weight = default;
        if (!HermiteRecurrence.IsCovered(points, point))
        {
            return false;
        }

        HermiteValues values = HermiteRecurrence.Evaluate(points, point, roots);
        double error = HermiteErrorBound.AtEnd(values.Error);
        double errorBefore = HermiteErrorBound.BeforeEnd(values.Error, roots[points]);
        if (!TryLower(in values, points, errorBefore, out FixedBall lower)
            || !TryRatio(in values, points, in lower, out TaylorFixed ratio))
        {
            return false;
        }

        // u = 2⁷M/(n·M′): its error is at most (2⁷E/n + |u|E′)/(|M′| − E′), and E′ is below 2⁻⁵⁰ of |M′|.
        double scale = HermiteErrorBound.Slack / Math.Abs(values.Previous.ToDouble());
        double ratioError = ((error * (1 << HermiteRecurrence.StepBits) / points * (1 << HermiteRecurrence.PointBits))
            + (Math.Abs(ratio.ToDouble()) * errorBefore)) * scale;
        ratioError += 4 * TaylorFixed.Unit;
        var taylor = new HermiteTaylor(points, point, ratio);
        if (!(Math.Abs(ratio.ToDouble()) + ratioError <= 1) || !taylor.TrySolve(ratioError))
        {
            return false;
        }

        node = Node(point, in taylor);
        weight = Weight(in lower, in factor, in taylor);
        return true;
    }

    /// <summary>Heₙ₋₁ in magnitude, where its leading digits are certain.</summary>
    private static bool TryLower(in HermiteValues values, int points, double error, out FixedBall lower)
    {
        int shift = values.Previous.Magnitude(out ulong high, out ulong low);
        lower = default;
        double units = error / (1L << shift);
        if (high >> 50 == 0 || !(units <= LargestLoss))
        {
            return false;
        }

        // One unit for the digits that the magnitude drops, one for the conversion of the bound.
        int exponent = shift + (HermiteRecurrence.StepBits * (points - 1)) - Scale(in values);
        lower = new FixedBall(high, low, exponent, false, (ulong)units + 2).Normalize();
        return true;
    }

    /// <summary>2²⁵·Heₙ/(n·Heₙ₋₁) with an error of less than four units, where it is below 1.</summary>
    private static bool TryRatio(in HermiteValues values, int points, in FixedBall lower, out TaylorFixed ratio)
    {
        int shift = values.Current.Magnitude(out ulong high, out ulong low);
        ratio = default;
        if (high == 0 && low == 0)
        {
            return true;
        }

        int exponent = shift + (HermiteRecurrence.StepBits * points) - Scale(in values);
        FixedBall numerator = new FixedBall(high, low, exponent, false, 0).Normalize();
        FixedBall quotient = FixedBall.Divide(in numerator, FixedBall.Multiply(in lower, (uint)points));
        int drop = -(quotient.Exponent + HermiteRecurrence.PointBits + TaylorFixed.FractionBits);
        if (drop < 128 - TaylorFixed.FractionBits)
        {
            return false;
        }

        ratio = drop >= 128 ? default
            : drop >= 64 ? new TaylorFixed(0, quotient.High >> (drop - 64))
            : new TaylorFixed((long)(quotient.High >> drop), (quotient.High << (64 - drop)) | (quotient.Low >> drop));
        if (values.Current.IsNegative != values.Previous.IsNegative)
        {
            ratio = -ratio;
        }

        return true;
    }

    private static FixedBall Node(uint point, in HermiteTaylor taylor)
    {
        // X/2²⁵ + η/2²⁵ with 121 bits behind the point; one unit for the bits of η that are dropped, one for the bound's conversion.
        TaylorFixed offset = taylor.Zero.ShiftRight(HermiteRecurrence.PointBits - 1);
        ulong radius = ToUnits(taylor.ZeroError, 1.0 / (1 << (HermiteRecurrence.PointBits - 1)));
        var high = (ulong)(((long)point << 32) + offset.High);
        return new FixedBall(high, offset.Low, -TaylorFixed.FractionBits - 1, false, radius).Normalize();
    }

    private static FixedBall Weight(in FixedBall lower, in FixedBall factor, in HermiteTaylor taylor)
    {
        TaylorFixed slope = TaylorFixed.One + taylor.Slope;
        var growth = new FixedBall((ulong)slope.High, slope.Low, -TaylorFixed.FractionBits, false, ToUnits(taylor.SlopeError, 1));
        FixedBall atZero = FixedBall.Multiply(in lower, growth.Normalize());
        return FixedBall.Divide(in factor, FixedBall.Multiply(in atZero, in atZero));
    }

    /// <summary>An error bound in units of 2⁻¹²⁰, rounded up, with one unit to spare; beyond reach it is 2⁵⁰ units.</summary>
    private static ulong ToUnits(double error, double factor)
    {
        double units = error * factor / TaylorFixed.Unit;
        return units < 1L << 50 ? (ulong)units + 2 : 1UL << 50;
    }

    private static int Scale(in HermiteValues values) => HermiteRecurrence.FirstScale + (32 * values.Moves);
}
