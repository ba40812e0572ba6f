using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>F(τ) = exp(−(q₁τ + q₂τ² + … + q_D τ^D)) for |τ| ≤ 1 as a Taylor series whose rest is bounded.</summary>
/// <remarks>
/// F′ = −q′F gives φ₀ = 1 and j φⱼ = −Σ i qᵢ φⱼ₋ᵢ. On the circle |τ| = 2ᵘ, |F| ≤ M = exp(Σ |qᵢ| 2^(iu)), so that Cauchy's estimate is
/// |φⱼ| ≤ M 2^(−ju), and what is left out from φ_J on is at most M 2^(−Ju)/(1 − 2^−u) ≤ M 2^(1−Ju) for u ≥ 1.
/// </remarks>
internal sealed class PanelSeries
{
    private const double BitsPerUnit = 1.4426950408889634;
    private const int LargestCircle = 12;

    private readonly Ball[] _series;
    private readonly Bound _rest;
    private readonly int _bits;

    /// <summary>Expands the exponential.</summary>
    /// <param name="exponent">p(c), which has no part in F, then q₁, …, q_D.</param>
    /// <param name="bits">The accuracy in bits that is wanted.</param>
    /// <param name="cancellation">Looked at once a term.</param>
    public PanelSeries(Dyadic[] exponent, int bits, CancellationToken cancellation)
    {
        (int circle, int count) = Choose(exponent, bits);
        var slopes = new Ball[exponent.Length];
        Dyadic logarithm = Dyadic.Zero;
        for (int i = 1; i < exponent.Length; i++)
        {
            slopes[i] = Ball.FromDyadic(exponent[i] * new Dyadic(-i, 0)).Trim(bits);
            logarithm += Dyadic.Abs(exponent[i]).ScaleByPowerOfTwo(i * circle);
        }

        // Terms beyond 1 in magnitude cancel later; their bits are kept.
        _bits = bits;
        Ball largest = Elementary.Exp(Ball.FromDyadic(logarithm).Trim(64), 64, cancellation);
        _rest = Bound.FromDyadic(largest.Upper).ScaleByPowerOfTwo(1 - (count * circle));
        _series = new Ball[count];
        _series[0] = Ball.FromInteger(1);
        for (int j = 1; j < count; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = default;
            for (int i = 1; i < slopes.Length && i <= j; i++)
            {
                sum = Ball.Add(sum, Ball.Multiply(slopes[i], _series[j - i], bits), bits);
            }

            _series[j] = Ball.Divide(sum, Ball.FromInteger(j), bits);
        }
    }

    /// <summary>∫ τⁱ F(τ) dτ from −1 to 1, for i = 0, …, count − 1: Σ 2φⱼ/(i+j+1) over the j for which i + j is even.</summary>
    public Ball[] Integrals(int count)
    {
        var integrals = new Ball[count];
        for (int i = 0; i < count; i++)
        {
            Ball sum = default;
            for (int j = i & 1; j < _series.Length; j += 2)
            {
                sum = Ball.Add(sum, Ball.Divide(_series[j], Ball.FromInteger(i + j + 1), _bits), _bits);
            }

            integrals[i] = sum.ScaleByPowerOfTwo(1).Enlarge(_rest.ScaleByPowerOfTwo(1));
        }

        return integrals;
    }

    /// <summary>The circle with the fewest terms, by estimates.</summary>
    private static (int Circle, int Count) Choose(Dyadic[] exponent, int bits)
    {
        (int Circle, int Count) best = (1, int.MaxValue);
        for (int circle = 1; circle <= LargestCircle; circle++)
        {
            double logarithm = 0;
            for (int i = 1; i < exponent.Length; i++)
            {
                logarithm += NearestValue.ToDoubleUpward(Dyadic.Abs(exponent[i]).ScaleByPowerOfTwo(i * circle));
            }

            double terms = (bits + 2 + (logarithm * BitsPerUnit)) / circle;
            best = terms < best.Count - 1 ? (circle, (int)terms + 1) : best;
        }

        return best;
    }
}
