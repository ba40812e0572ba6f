using System;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Proves from values at n points that each lies beside one node of its own, and encloses nodes and weights. The theorems are in
/// the file README.md beside this one.
/// </summary>
internal static class NodeCertificate
{
    /// <summary>What is known at one point: the point, the values there, and the square of the residual norm η.</summary>
    internal readonly struct Point(Dyadic at, MonicValues values)
    {
        internal Dyadic At => at;

        internal MonicValues Values => values;

        /// <summary>η² = πₙ(x)²/S: the squared residual norm of the vector (π₀, …, πₙ₋₁)(x), normalised, as an eigenvector.</summary>
        internal Bound ResidualSquared { get; } = Residual(values);

        private static Bound Residual(MonicValues values)
        {
            Bound value = Approximation.Magnitude(values.Value);
            return Bound.DivideByAtLeast(value * value, values.Sum.IsPositive == Trilean.True ? values.Sum.Lower : Dyadic.Zero);
        }
    }

    /// <summary>
    /// Whether η is below an eighth of the distance to the nearest other point. Where that holds for all n points, the n intervals of
    /// half-width η are disjoint, so that each has exactly one of the n nodes.
    /// </summary>
    internal static bool IsIsolated(in Point point, Dyadic gap) => gap.Sign > 0
        && point.ResidualSquared.IsFinite
        && point.ResidualSquared.ToDyadic() < (gap * gap).ScaleByPowerOfTwo(-6);

    /// <summary>
    /// The node beside an isolated point: |λ − ρ| ≤ η²/(¾ gap) with the Rayleigh quotient ρ = x − πₙ(x) πₙ₋₁(x)/S.
    /// </summary>
    internal static Ball Node(in Point point, Dyadic gap, int precision, out Bound distance)
    {
        MonicValues values = point.Values;
        Ball correction = Ball.Divide(Ball.Multiply(values.Value, values.Previous, precision), values.Sum, precision);
        Bound width = Bound.DivideByAtLeast(point.ResidualSquared, ThreeQuarters(gap));
        distance = Approximation.Magnitude(correction) + width;
        int kept = Math.Max(precision, point.At.BitLength + 16);
        return Ball.Subtract(Ball.FromDyadic(point.At), correction, kept).Enlarge(width);
    }

    /// <summary>
    /// The weight of that node: hₙ₋₁/S at the point, times 1 ± (2z + 6r) with z = 2(n−1)·distance/(¾ gap) and r = (η/(⅞ gap))².
    /// </summary>
    internal static Ball Weight(in Point point, Dyadic gap, Bound distance, int points, Ball norm, int precision)
    {
        Bound z = Bound.DivideByAtLeast(distance, ThreeQuarters(gap)) * Bound.FromParts((ulong)(2 * (points - 1)), 0);
        Bound r = Bound.DivideByAtLeast(point.ResidualSquared, gap * gap) * Bound.FromParts(64, 0);
        r = Bound.DivideByAtLeast(r, new Dyadic(49, 0));
        Ball weight = Ball.Divide(norm, point.Values.Sum, precision);
        Bound relative = z.ScaleByPowerOfTwo(1) + (r * Bound.FromParts(6, 0));
        return z.CeilingLog2 > 0 || r.CeilingLog2 > -1 ? Ball.WholeLine : weight.Enlarge(Approximation.Magnitude(weight) * relative);
    }

    private static Dyadic ThreeQuarters(Dyadic gap) => new(gap.Mantissa * 3, checked(gap.Exponent - 2));
}
