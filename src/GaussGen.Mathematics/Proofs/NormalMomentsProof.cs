using System;
using System.Collections.Generic;
using System.Globalization;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of normal moments entry by entry, each from a closed form and not from the entry before it.</summary>
/// <remarks>
/// With m the mean and s the standard deviation, both dyadic, so that all sums and products below are exact:
/// <list type="bullet">
/// <item><description>
/// E Xᵏ = Σ k!/((k−2j)! j! 2ʲ) mᵏ⁻²ʲ s²ʲ over 0 ≤ 2j ≤ k, the binomial expansion of (m + sZ)ᵏ with E Z²ʲ = (2j)!/(2ʲ j!)
/// (DLMF 5.4.6 with 5.5.1; the polynomial is a Hermite polynomial of imaginary argument, DLMF 18.5.13);
/// </description></item>
/// <item><description>E (X − m)ᵏ = (2j)!/(2ʲ j!) s²ʲ for k = 2j, and 0 for odd k by symmetry;</description></item>
/// <item><description>
/// E |X − m|ᵏ for k = 2j + 1 is sᵏ √2 (2j)!/(2ʲ Γ(j+½)): Winkelbauer (2012) has sᵏ 2^(k/2) Γ((k+1)/2)/√π, and the duplication
/// formula DLMF 5.5.5 turns Γ(j+1) into √π (2j)!/(4ʲ Γ(j+½)). The value is enclosed in balls until it lies between the midpoints
/// around one representable value.
/// </description></item>
/// </list>
/// </remarks>
internal sealed class NormalMomentsProof
{
    private const int FirstPrecision = 128;

    private const int LargestPrecision = 1 << 13;

    private readonly NormalMomentsClaim _claim;
    private readonly ProofReport _report;
    private readonly Dyadic _mean;
    private readonly Dyadic _meanSquared;
    private readonly Dyadic[] _standardDeviationPowers;
    private readonly BigInteger[] _factorials;

    public NormalMomentsProof(NormalMomentsClaim claim, TableData data)
    {
        _claim = claim;
        _report = new ProofReport(claim, data);
        _mean = ClaimNumbers.ValueOf(claim.Mean);
        _meanSquared = _mean * _mean;
        _standardDeviationPowers = Powers(ClaimNumbers.ValueOf(claim.StandardDeviation), claim.MaximumOrder);
        _factorials = new BigInteger[claim.MaximumOrder + 1];
        _factorials[0] = BigInteger.One;
        for (int k = 1; k <= claim.MaximumOrder; k++)
        {
            _factorials[k] = _factorials[k - 1] * k;
        }
    }

    public TableProof Run(IProgress<double>? progress, CancellationToken cancellation)
    {
        int count = _claim.MaximumOrder + 1;
        var raw = new KnownNumber[count];
        var central = new KnownNumber[count];
        var absolute = new KnownNumber[count];
        for (int order = 0; order < count; order++)
        {
            cancellation.ThrowIfCancellationRequested();
            raw[order] = Exact(Raw(order, cancellation));
            central[order] = Exact(order % 2 == 0 ? Even(order) : Dyadic.Zero);
            absolute[order] = order % 2 == 0 ? central[order] : OddAbsolute(order, cancellation);
            progress?.Report((order + 1) / (double)count);
        }

        Judge("Raw", raw);
        Judge("Central", central);
        Judge("Absolute", absolute);
        return _report.Finish([]);
    }

    private void Judge(string member, KnownNumber[] known)
    {
        IReadOnlyList<ulong> found = _report.Span(member);
        _report.Entries(member, found, known);
        for (int order = 0; order < known.Length; order++)
        {
            _report.Constant(member + order.ToString(CultureInfo.InvariantCulture), known[order], isRequired: true);
        }
    }

    /// <summary>The sum of the remarks as a polynomial in m², by Horner's scheme.</summary>
    private Dyadic Raw(int order, CancellationToken cancellation)
    {
        Dyadic sum = Dyadic.Zero;
        for (int j = 0; j <= order / 2; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            BigInteger coefficient = _factorials[order] / ((_factorials[order - (2 * j)] * _factorials[j]) << j);
            sum = (sum * _meanSquared) + (new Dyadic(coefficient, 0) * _standardDeviationPowers[2 * j]);
        }

        return order % 2 == 0 ? sum : sum * _mean;
    }

    private Dyadic Even(int order) =>
        new Dyadic(_factorials[order] / (_factorials[order / 2] << (order / 2)), 0) * _standardDeviationPowers[order];

    private KnownNumber OddAbsolute(int order, CancellationToken cancellation)
    {
        int j = order / 2;
        Dyadic factor = (_standardDeviationPowers[order] * new Dyadic(_factorials[2 * j], 0)).ScaleByPowerOfTwo(-j);
        for (int precision = FirstPrecision; ; precision *= 2)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball numerator = Ball.Multiply(Ball.FromDyadic(factor), Constants.Sqrt2(precision), precision);
            Ball value = Ball.Divide(numerator, HalfIntegerGamma.Value(j, precision), precision);
            ulong? bits = NearestValue.Of(_claim.Format, value);
            if (bits is not null || precision >= LargestPrecision)
            {
                return new KnownNumber(value.Lower, value.Upper, bits);
            }
        }
    }

    private KnownNumber Exact(Dyadic value) => new(value, value, NearestValue.Of(_claim.Format, Ball.FromDyadic(value)));

    private static Dyadic[] Powers(Dyadic factor, int count)
    {
        var powers = new Dyadic[count + 1];
        powers[0] = new Dyadic(BigInteger.One, 0);
        for (int k = 1; k <= count; k++)
        {
            powers[k] = powers[k - 1] * factor;
        }

        return powers;
    }
}
