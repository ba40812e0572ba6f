using System;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a table of matrix elements of the harmonic oscillator.</summary>
/// <remarks>
/// With x = z/√2 the product of two states is the standard normal density times He_m(z) He_n(z)/√(m! n!), so that
/// ⟨m|xᵖ|n⟩ = E[Zᵖ He_m(Z) He_n(Z)]/√(2ᵖ m! n!). He_n has the coefficients (−1)ⁱ n!/(i! (n−2i)! 2ⁱ) (DLMF 18.5.13, 18.7.12) and E Z^(2q) = (2q−1)!!,
/// so that the numerator is an integer.
/// </remarks>
internal sealed class OscillatorMatrixElementsProof
{
    private readonly OscillatorMatrixElementsClaim _claim;
    private readonly BigInteger[][] _polynomials;
    private readonly BigInteger[] _factorials;
    private readonly BigInteger[] _moments;

    public OscillatorMatrixElementsProof(OscillatorMatrixElementsClaim claim)
    {
        _claim = claim;
        int size = claim.Size;
        _factorials = new BigInteger[size];
        for (int n = 0; n < size; n++)
        {
            _factorials[n] = n == 0 ? BigInteger.One : _factorials[n - 1] * n;
        }

        _polynomials = new BigInteger[size][];
        for (int n = 0; n < size; n++)
        {
            _polynomials[n] = new BigInteger[n + 1];
            for (int i = 0; 2 * i <= n; i++)
            {
                BigInteger coefficient = _factorials[n] / ((_factorials[i] * _factorials[n - (2 * i)]) << i);
                _polynomials[n][n - (2 * i)] = (i & 1) == 0 ? coefficient : -coefficient;
            }
        }

        // E Zʲ up to the highest power that a product can have.
        _moments = new BigInteger[claim.Power + (2 * size) - 1];
        _moments[0] = BigInteger.One;
        for (int j = 2; j < _moments.Length; j += 2)
        {
            _moments[j] = _moments[j - 2] * (j - 1);
        }
    }

    public TableProof Run(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        int size = _claim.Size;
        var known = new KnownNumber[size * size];
        for (int m = 0; m < size; m++)
        {
            // E[Zᵖ He_m Zʲ] for every j ≤ m, which each element of the row is a combination of.
            BigInteger[] row = Row(m);
            for (int n = 0; n <= m; n++)
            {
                cancellation.ThrowIfCancellationRequested();
                BigInteger numerator = BigInteger.Zero;
                for (int j = n & 1; j <= n; j += 2)
                {
                    numerator += _polynomials[n][j] * row[j];
                }

                known[(m * size) + n] = known[(n * size) + m] = Element(numerator, (_factorials[m] * _factorials[n]) << _claim.Power, cancellation);
            }

            progress?.Report((m + 1) / (double)size);
        }

        var report = new ProofReport(_claim, data);
        report.Entries("Elements", report.Span("Elements"), known);
        return report.Finish([]);
    }

    private BigInteger[] Row(int m)
    {
        var row = new BigInteger[m + 1];
        for (int j = 0; j <= m; j++)
        {
            for (int i = m & 1; i <= m; i += 2)
            {
                row[j] += _polynomials[m][i] * _moments[_claim.Power + i + j];
            }
        }

        return row;
    }

    /// <summary>numerator/√square, exactly where the root is an integer.</summary>
    private KnownNumber Element(BigInteger numerator, BigInteger square, CancellationToken cancellation)
    {
        BigInteger root = IntegerRoot.Floor(square, out BigInteger remainder);
        if (remainder.IsZero || numerator.IsZero)
        {
            return KnownNumbers.Exact(_claim.Format, new Rational(numerator, root));
        }

        return KnownNumbers.Decide(
            _claim.Format,
            [null],
            precision => [Ball.Divide(Ball.FromInteger(numerator), Ball.Sqrt(Ball.FromInteger(square), precision + 8), precision)],
            cancellation)[0];
    }
}
