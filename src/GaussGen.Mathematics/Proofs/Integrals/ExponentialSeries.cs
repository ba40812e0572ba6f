using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Integrals;

/// <summary>
/// F(τ) = exp(−(q₁τ + q₂τ² + … + q_D τ^D)) as a Taylor polynomial, with a bound of the rest for |τ| ≤ 1, and the integrals of τᵐF over
/// [0, 1] and [−1, 1].
/// </summary>
/// <remarks>
/// <para>
/// F′ = −q′F gives the coefficients φ₀ = 1, (j+1) φ_(j+1) = −Σ i qᵢ φ_(j+1−i), by induction from the first D.
/// </para>
/// <para>
/// The rest: with T = Σ i|qᵢ| the recurrence gives |φ_(j+1)| ≤ T/(j+1) · max(|φ_j|, …, |φ_(j+1−D)|). From j ≥ 2T on, each coefficient is at
/// most half the largest of the D before it. If those are at most M, the next D are at most M/2, the D after those at most M/4, and all
/// that follow sum to at most D·M.
/// </para>
/// </remarks>
internal sealed class ExponentialSeries
{
    // A series this long belongs to an exponent that should have been cut into panels.
    private const int MaximumTerms = 1 << 17;

    private readonly List<BigInteger> _coefficients = [];
    private readonly int _bits;
    private readonly Bound _error;

    /// <summary>The series to about 2^−<paramref name="bits"/>.</summary>
    /// <param name="exponent">q₁, …, q_D; at least one.</param>
    /// <param name="bits">The power of two of the unit that coefficients are kept in, and where the series ends.</param>
    /// <param name="cancellation">Looked at before each term.</param>
    public ExponentialSeries(IReadOnlyList<Ball> exponent, int bits, CancellationToken cancellation)
    {
        _bits = bits;
        int degree = exponent.Count;
        var slopes = new Ball[degree];
        Bound total = default;
        for (int i = 0; i < degree; i++)
        {
            slopes[i] = Ball.Multiply(Ball.FromInteger(-(i + 1)), exponent[i], bits + 16);
            total += AtMost(slopes[i]);
        }

        // The last D coefficients, the newest first.
        var recent = new LinkedList<Ball>();
        _ = recent.AddFirst(Ball.FromInteger(1));
        Keep(Ball.FromInteger(1), ref _error);
        for (int j = 0; ; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            if (total.IsFinite && total.ToDyadic() <= new Dyadic(j, -1))
            {
                Bound largest = default;
                foreach (Ball coefficient in recent)
                {
                    largest = Bound.Max(largest, AtMost(coefficient));
                }

                if (largest <= Bound.PowerOfTwo(-bits))
                {
                    _error += Bound.FromParts((ulong)degree, 0) * largest;
                    return;
                }
            }

            if (!total.IsFinite || j >= MaximumTerms)
            {
                _error = Bound.Infinite;
                return;
            }

            Ball sum = default;
            int index = 0;
            foreach (Ball coefficient in recent)
            {
                sum = Ball.Add(sum, Ball.Multiply(slopes[index++], coefficient, bits + 16), bits + 16);
            }

            Ball next = Ball.Divide(sum, Ball.FromInteger(j + 1), bits + 16);
            Keep(next, ref _error);
            _ = recent.AddFirst(next);
            if (recent.Count > degree)
            {
                recent.RemoveLast();
            }
        }
    }

    /// <summary>∫₀¹ τᵐ F(τ) dτ = Σ φⱼ/(m+j+1).</summary>
    public Ball FromZero(int power)
    {
        BigInteger sum = BigInteger.Zero;
        for (int j = 0; j < _coefficients.Count; j++)
        {
            sum += _coefficients[j] / (power + j + 1);
        }

        return Enclosed(sum, power);
    }

    /// <summary>∫₋₁¹ τᵐ F(τ) dτ = Σ 2φⱼ/(m+j+1) over the j for which m+j is even.</summary>
    public Ball Symmetric(int power)
    {
        BigInteger sum = BigInteger.Zero;
        for (int j = power & 1; j < _coefficients.Count; j += 2)
        {
            sum += _coefficients[j] / (power + j + 1);
        }

        return Enclosed(sum, power).ScaleByPowerOfTwo(1);
    }

    /// <summary>Each division drops less than one unit; an error of φⱼ is divided by m+j+1, so by m+1 at least.</summary>
    private Ball Enclosed(BigInteger sum, int power)
    {
        Bound dropped = Bound.FromParts((ulong)_coefficients.Count, -_bits);
        return new Ball(sum, -_bits, Bound.DivideByAtLeast(_error, new Dyadic(power + 1, 0)) + dropped);
    }

    private void Keep(Ball coefficient, ref Bound error)
    {
        int shift = checked(coefficient.Exponent + _bits);
        _coefficients.Add(shift >= 0 ? coefficient.Midpoint << shift : coefficient.Midpoint >> -shift);
        error += coefficient.Radius + (shift >= 0 ? default : Bound.PowerOfTwo(-_bits));
    }

    private static Bound AtMost(Ball value) => Bound.FromMagnitude(value.Midpoint, value.Exponent) + value.Radius;
}
