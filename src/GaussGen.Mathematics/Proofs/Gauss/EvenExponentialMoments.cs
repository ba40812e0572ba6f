using System;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Integrals;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>The density proportional to exp(−p(x)), p(x) = c₁x² + c₂x⁴ + … + c_d x^(2d) with c_d above zero.</summary>
/// <remarks>
/// With one coefficient the moments are (k−1)!! (2c₁)^(−k/2) for even k (NIST DLMF 5.4.6). Else the first d even ones are integrals that
/// <see cref="ExponentialPanels"/> encloses, and the others follow by parts: (2k+1) I₂ₖ = Σ 2i cᵢ I₂ₖ₊₂ᵢ, which gives the last of them.
/// What cancels there is paid for in bits.
/// </remarks>
internal sealed class EvenExponentialMoments : WeightMoments
{
    // The most bits that are spent on what cancels.
    private const int LargestPrecision = 1 << 14;

    private readonly Dyadic[] _coefficients;
    private readonly Dyadic[] _scaled;
    private readonly int _power;

    public EvenExponentialMoments(Dyadic[] coefficients)
    {
        _coefficients = coefficients;
        // y = 2^−s x brings the largest of the |cᵢ|^(1/2i) near 1, and with it the size of all moments.
        _power = coefficients
            .Select((coefficient, index) => (Coefficient: coefficient, Degree: 2 * (index + 1)))
            .Where(term => !term.Coefficient.IsZero)
            .Min(term => -(term.Coefficient.BitLength + term.Coefficient.Exponent) / term.Degree);
        _scaled = [.. coefficients.Select((coefficient, index) => coefficient.ScaleByPowerOfTwo(2 * (index + 1) * _power))];
    }

    /// <inheritdoc/>
    public override bool IsEven => true;

    private bool IsNormal => _coefficients.Length == 1;

    /// <summary>∫ exp(−p(x)) dx over the real line.</summary>
    public Ball Integral(int precision, CancellationToken cancellation) => IsNormal
        ? Ball.Sqrt(Ball.Divide(Constants.Pi(precision + 8, cancellation), Ball.FromDyadic(_coefficients[0]), precision + 8), precision)
        : ExponentialPanels.Enclose(_scaled, [0], precision, cancellation)[0].ScaleByPowerOfTwo(_power + 1);

    /// <inheritdoc/>
    /// <remarks>With one coefficient, times (2c₁) to the highest power.</remarks>
    public override Dyadic[]? Exact(int count, CancellationToken cancellation)
    {
        if (!IsNormal)
        {
            return null;
        }

        Dyadic twice = _coefficients[0].ScaleByPowerOfTwo(1);
        var moments = new Dyadic[count];
        var factor = new Dyadic(BigInteger.One, 0);
        int last = (count - 1) / 2 * 2;
        for (int k = last; k >= 0; k -= 2)
        {
            moments[k] = factor;
            factor *= twice;
        }

        BigInteger product = BigInteger.One;
        for (int k = 2; k <= last; k += 2)
        {
            cancellation.ThrowIfCancellationRequested();
            product *= k - 1;
            moments[k] *= new Dyadic(product, 0);
        }

        return moments;
    }

    /// <inheritdoc/>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation)
    {
        if (Exact(count, cancellation) is { } exact)
        {
            return Array.ConvertAll(exact, moment => Ball.FromDyadic(moment).Trim(precision));
        }

        for (int bits = precision + 64; ;)
        {
            Ball[] moments = ByParts(count, bits, cancellation);
            int accuracy = int.MaxValue;
            for (int k = 0; k < count; k += 2)
            {
                accuracy = Math.Min(accuracy, moments[k].IsFinite ? moments[k].RelativeAccuracyBits : -bits);
            }

            if (accuracy >= precision || bits >= LargestPrecision || !moments[0].IsFinite)
            {
                return Array.ConvertAll(moments, moment => moment.Trim(precision));
            }

            bits = Math.Min(LargestPrecision, bits + precision - accuracy + 32);
        }
    }

    private Ball[] ByParts(int count, int bits, CancellationToken cancellation)
    {
        int degree = _scaled.Length;
        int[] orders = [.. Enumerable.Range(0, degree).Select(k => 2 * k)];
        Ball[] first = ExponentialPanels.Enclose(_scaled, orders, bits, cancellation);
        var even = new Ball[Math.Max((count + 1) / 2, degree)];
        Array.Copy(first, even, degree);
        Ball divisor = Ball.FromDyadic(_scaled[degree - 1] * new Dyadic(2 * degree, 0));
        for (int k = 0; k + degree < even.Length; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball sum = Ball.Multiply(Ball.FromInteger((2 * k) + 1), even[k], bits);
            for (int i = 1; i < degree; i++)
            {
                Ball factor = Ball.FromDyadic(_scaled[i - 1] * new Dyadic(2 * i, 0));
                sum = Ball.Subtract(sum, Ball.Multiply(factor, even[k + i], bits), bits);
            }

            even[k + degree] = Ball.Divide(sum, divisor, bits);
        }

        var moments = new Ball[count];
        for (int k = 0; k < count; k += 2)
        {
            moments[k] = even[k / 2].ScaleByPowerOfTwo(k * _power);
        }

        return moments;
    }
}
