using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The standard normal density on an interval: differences of Fₖ(a) = ∫₀ᵃ xᵏ exp(−x²/2) dx, carried to the middle of the interval by
/// <see cref="ShiftedMoments"/>.
/// </summary>
/// <remarks>
/// <para>
/// Fₖ(a) = a^(k+1) exp(−a²/2) Σ a²ʲ/((k+1)(k+3) ⋯ (k+1+2j)) over j ≥ 0 (NIST DLMF 8.7.1) for the two highest k; for the others
/// Fₖ₋₂ = (a^(k−1) exp(−a²/2) + Fₖ)/(k − 1), by parts. All terms are positive, so nothing cancels. Once a² ≤ (k+3+2j)/2 each term is at most half
/// the one before, and what is left out at most the last term.
/// </para>
/// <para>
/// Fₖ(∞) = 2^((k−1)/2) Γ((k+1)/2). For a² ≥ 2k the rest beyond a is at most 2 a^(k−1) exp(−a²/2): by parts it is
/// a^(k−1) exp(−a²/2) plus (k−1)/a² ≤ ½ times itself, at most. Where that is too small to matter it takes the place of the series.
/// </para>
/// </remarks>
/// <param name="lower">The lower end; <c>null</c> for −∞.</param>
/// <param name="upper">The upper end; <c>null</c> for +∞, but not both.</param>
/// <param name="points">The number of nodes, by which the middle is chosen.</param>
internal sealed class TruncatedNormalMoments(Dyadic? lower, Dyadic? upper, int points) : WeightMoments
{
    // Beyond 64 standard deviations lies less than exp(−64²/2) < 2^−2900; no table is made for such a part.
    private static readonly Dyadic Farthest = new(1, 6);

    private Dyadic? _center;

    /// <inheritdoc/>
    public override Dyadic? Lower => lower;

    /// <inheritdoc/>
    public override Dyadic? Upper => upper;

    /// <inheritdoc/>
    public override bool IsEven => lower is { } low && upper is { } high && low == -high;

    /// <inheritdoc/>
    public override Dyadic Center => _center ??= IsEven ? Dyadic.Zero : FindCenter();

    /// <inheritdoc/>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation) => IsFar
        ? [.. Enumerable.Repeat(Ball.WholeLine, count)]
        : ShiftedMoments.Of(
            (bits, token) =>
            {
                Ball[] above = FromZero(upper, 1, count, bits, token);
                Ball[] below = IsEven ? above : FromZero(lower, -1, count, bits, token);
                var moments = new Ball[count];
                for (int k = 0; k < count; k++)
                {
                    moments[k] = !IsEven ? Ball.Subtract(above[k], below[k], bits)
                        : k % 2 == 0 ? above[k].ScaleByPowerOfTwo(1)
                        : default;
                }

                return moments;
            },
            Center,
            precision,
            cancellation);

    private bool IsFar => (lower is { } low && low > Farthest) || (upper is { } high && high < -Farthest);

    /// <summary>∫ xᵏ exp(−x²/2) dx from 0 to an end of either sign, for k = 0, …, count − 1.</summary>
    private static Ball[] FromZero(Dyadic? end, int infiniteSign, int count, int bits, CancellationToken cancellation)
    {
        Dyadic? magnitude = end is { } finite ? Dyadic.Abs(finite) : null;
        Ball[] integrals = ToMagnitude(magnitude, count, bits + 16, cancellation);
        int sign = end is { } known ? known.Sign : infiniteSign;
        for (int k = 0; sign < 0 && k < count; k += 2)
        {
            integrals[k] = Ball.Negate(integrals[k]);
        }

        return integrals;
    }

    private static Ball[] ToMagnitude(Dyadic? end, int count, int bits, CancellationToken cancellation)
    {
        if (end is not { } a)
        {
            return Whole(count, bits, cancellation);
        }

        if (a.IsZero)
        {
            return new Ball[count];
        }

        Dyadic square = a * a;
        // Where exp(−a²/2) is far below 2^−bits, also beside the powers of a.
        if (square > new Dyadic((4 * (bits + (2 * count))) + 64, 0))
        {
            return Cut(Whole(count, bits, cancellation), Ball.FromDyadic(a).Trim(64), cancellation);
        }

        Ball point = Ball.FromDyadic(a);
        Ball argument = Ball.FromDyadic(square);
        Ball density = Elementary.Exp(Ball.FromDyadic(-square.ScaleByPowerOfTwo(-1)), bits, cancellation);
        // edges[k] = a^(k+1) exp(−a²/2).
        var edges = new Ball[count];
        for (int k = 0; k < count; k++)
        {
            edges[k] = Ball.Multiply(k == 0 ? density : edges[k - 1], point, bits);
        }

        var integrals = new Ball[count];
        for (int k = count - 1; k >= 0; k--)
        {
            cancellation.ThrowIfCancellationRequested();
            integrals[k] = k + 2 >= count
                ? Ball.Multiply(edges[k], Series(argument, k, bits, cancellation), bits)
                : Ball.Divide(Ball.Add(edges[k], integrals[k + 2], bits), Ball.FromInteger(k + 1), bits);
        }

        return integrals;
    }

    /// <summary>Σ s^j/((k+1)(k+3) ⋯ (k+1+2j)).</summary>
    private static Ball Series(Ball square, int k, int bits, CancellationToken cancellation)
    {
        Ball term = Ball.Divide(Ball.FromInteger(1), Ball.FromInteger(k + 1), bits);
        Ball sum = term;
        for (int j = 1; ; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            term = Ball.Divide(Ball.Multiply(term, square, bits), Ball.FromInteger(k + 1 + (2 * j)), bits);
            sum = Ball.Add(sum, term, bits);
            if (square.Upper <= new Dyadic(k + 3 + (2 * j), -1) && term.Upper <= sum.Lower.ScaleByPowerOfTwo(-bits))
            {
                return sum.Enlarge(Bound.FromDyadic(term.Upper));
            }
        }
    }

    private static Ball[] Whole(int count, int bits, CancellationToken cancellation)
    {
        // 2^((k−1)/2) Γ((k+1)/2): 2ʲ j! for k = 2j + 1, and √2 2^(j−1) Γ(j + ½) for k = 2j.
        Ball root = Constants.Sqrt2(bits + 8);
        var integrals = new Ball[count];
        Ball factorial = Ball.FromInteger(1);
        for (int k = 0; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            int j = k / 2;
            if (k % 2 == 0)
            {
                integrals[k] = Ball.Multiply(HalfIntegerGamma.Value(j, bits + 8), root, bits).ScaleByPowerOfTwo(j - 1);
            }
            else
            {
                factorial = j == 0 ? factorial : Ball.Multiply(factorial, Ball.FromInteger(j), bits);
                integrals[k] = factorial.ScaleByPowerOfTwo(j);
            }
        }

        return integrals;
    }

    /// <summary>Enlarges the integrals to infinity by what lies beyond a.</summary>
    private static Ball[] Cut(Ball[] integrals, Ball a, CancellationToken cancellation)
    {
        Ball exponent = Ball.Negate(Ball.Square(a, 64)).ScaleByPowerOfTwo(-1);
        // exp(−2^27) bounds all that is smaller.
        var least = new Dyadic(-1, 27);
        exponent = exponent.Upper < least ? Ball.FromDyadic(least) : exponent;
        // 2 a^(k−1) exp(−a²/2).
        Ball rest = Ball.Divide(Elementary.Exp(exponent, 64, cancellation).ScaleByPowerOfTwo(1), a, 64);
        for (int k = 0; k < integrals.Length; k++)
        {
            integrals[k] = integrals[k].Enlarge(Bound.FromDyadic(rest.Upper));
            rest = Ball.Multiply(rest, a, 64);
        }

        return integrals;
    }

    /// <summary>
    /// About the middle of where the nodes are; of no consequence for the result. From the mode m on, the density falls by exp(−4n) where
    /// m r + r²/2 = 4n.
    /// </summary>
    private Dyadic FindCenter()
    {
        double low = lower is { } l ? Approximately(l) : -1e9, high = upper is { } u ? Approximately(u) : 1e9;
        double mode = Math.Max(low, Math.Min(high, 0)), magnitude = Math.Abs(mode);
        double far = Math.Sqrt((magnitude * magnitude) + (8.0 * points)) - magnitude;
        double near = Math.Sqrt(8.0 * points) + magnitude;
        low = Math.Max(low, mode - (mode < 0 ? far : near));
        high = Math.Min(high, mode + (mode > 0 ? far : near));
        double width = high - low, center = low + (width / 2);
        int unit = -4;
        for (double step = 1.0 / 16; step > width / 16 && unit > -1000; step /= 2)
        {
            unit--;
        }

        Dyadic exact = ClaimNumbers.ValueOf(center);
        return (exact.Exponent >= unit ? exact : new Dyadic(exact.Mantissa >> (unit - exact.Exponent), unit)).Reduce();
    }

    /// <summary>A binary64 number near a parameter, which was one.</summary>
    private static double Approximately(Dyadic value) =>
        BitConverter.Int64BitsToDouble((long)Formats.BinaryFormat.Binary64.Round(value));
}
