using System;
using System.Collections.Generic;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded values of the gamma function at the half-integers: spans "Gamma", Γ(k + ½), and "Reciprocal",
/// 1/Γ(k + ½), by k from 0.
/// </summary>
public sealed record HalfIntegerGammaClaim : TableClaim
{
    /// <summary>The largest k.</summary>
    public const int LargestOrder = 200;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="maximumOrder">The largest k, from 0 to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of the values.</param>
    /// <exception cref="ArgumentOutOfRangeException">The order is outside its range.</exception>
    public HalfIntegerGammaClaim(int maximumOrder, BinaryFormat format)
        : base(format)
    {
        MaximumOrder = ClaimNumbers.RequireOrder(maximumOrder, LargestOrder);
    }

    /// <summary>The largest k.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.HalfIntegerGamma(MaximumOrder);

    /// <inheritdoc/>
    public override string Method =>
        "The gamma function at half-integers: Γ(k + ½) from factorials by the duplication formula (DLMF 5.5.5), and its reciprocal as "
        + "(−1)ᵏ Γ(½ − k)/π by the reflection formula (DLMF 5.5.3), each by itself. Both hold √π, and are enclosed at growing precision "
        + "until the enclosure lies between the midpoints around one representable value. Every found bit pattern is then compared with "
        + "that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        var report = new ProofReport(this, data);
        int count = MaximumOrder + 1;
        report.Entries("Gamma", report.Span("Gamma"), Decide(precision => Gamma(count, precision, cancellation), cancellation));
        progress?.Report(0.5);
        report.Entries("Reciprocal", report.Span("Reciprocal"), Decide(precision => Reciprocal(count, precision, cancellation), cancellation));
        progress?.Report(1);
        return report.Finish([]);
    }

    private KnownNumber[] Decide(Func<int, IReadOnlyList<Ball>> enclose, CancellationToken cancellation) =>
        KnownNumbers.Decide(Format, new KnownNumber?[MaximumOrder + 1], enclose, cancellation);

    /// <summary>Γ(k + ½) = √π 2^(1−2k) (2k−1)!/(k−1)! for k ≥ 1, from Γ(2z) = 2^(2z−1) Γ(z) Γ(z + ½)/√π at z = k; √π for k = 0.</summary>
    private static Ball[] Gamma(int count, int precision, CancellationToken cancellation)
    {
        int working = precision + 8;
        Ball rootOfPi = Ball.Sqrt(Constants.Pi(working, cancellation), working);
        var values = new Ball[count];
        values[0] = rootOfPi;
        BigInteger numerator = BigInteger.One, denominator = BigInteger.One;
        for (int k = 1; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            // (2k−1)! and (k−1)! from those of k − 1.
            numerator *= k == 1 ? 1 : ((2 * k) - 1) * ((2 * k) - 2);
            denominator *= k == 1 ? 1 : k - 1;
            Ball ratio = Ball.Divide(Ball.FromInteger(numerator), Ball.FromInteger(denominator), working);
            values[k] = Ball.Multiply(ratio.ScaleByPowerOfTwo(1 - (2 * k)), rootOfPi, working);
        }

        return values;
    }

    /// <summary>
    /// 1/Γ(½ + k) = (−1)ᵏ Γ(½ − k)/π, from Γ(½ + k) Γ(½ − k) = π/cos(πk); and Γ(½ − k) = √π / ((−½)(−3/2)…(½ − k)) downward by Γ(z) = Γ(z + 1)/z.
    /// </summary>
    private static Ball[] Reciprocal(int count, int precision, CancellationToken cancellation)
    {
        int working = precision + 8;
        Ball pi = Constants.Pi(working, cancellation);
        Ball first = Ball.Divide(Ball.Sqrt(pi, working), pi, working);
        var values = new Ball[count];
        Rational product = Rational.One;
        for (int k = 0; k < count; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            product *= k == 0 ? Rational.One : new Rational(1 - (2 * k), 2);
            Ball reflected = Ball.Divide(first, Ball.FromRational(product, working), working);
            values[k] = (k & 1) == 0 ? reflected : Ball.Negate(reflected);
        }

        return values;
    }
}
