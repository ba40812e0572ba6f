using System;
using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// The claim to be the correctly rounded matrix elements ⟨m|xᵖ|n⟩ between states of the harmonic oscillator, x = (a + a†)/√2: the span "Elements",
/// row by row. Each is proven by <see cref="OscillatorMatrixElementsProof"/>.
/// </summary>
public sealed record OscillatorMatrixElementsClaim : TableClaim
{
    /// <summary>The largest number of states.</summary>
    public const int LargestSize = 64;

    /// <summary>The largest power.</summary>
    public const int LargestPower = 64;

    /// <summary>A claim with the given promises.</summary>
    /// <param name="size">The number of states, from 1 to <see cref="LargestSize"/>.</param>
    /// <param name="power">The power p of x, from 0 to <see cref="LargestPower"/>.</param>
    /// <param name="format">The number format of the elements.</param>
    /// <exception cref="ArgumentOutOfRangeException">A promise is outside its range.</exception>
    public OscillatorMatrixElementsClaim(int size, int power, BinaryFormat format)
        : base(format)
    {
        if (size is < 1 or > LargestSize)
        {
            string message = string.Format(CultureInfo.InvariantCulture, "The number of states must be from 1 to {0}.", LargestSize);
            throw new ArgumentOutOfRangeException(nameof(size), size, message);
        }

        if (power is < 0 or > LargestPower)
        {
            string message = string.Format(CultureInfo.InvariantCulture, "The power must be from 0 to {0}.", LargestPower);
            throw new ArgumentOutOfRangeException(nameof(power), power, message);
        }

        Size = size;
        Power = power;
    }

    /// <summary>The number of states.</summary>
    public int Size { get; }

    /// <summary>The power p of x.</summary>
    public int Power { get; }

    /// <inheritdoc/>
    public override string Title => ClaimTitle.OscillatorMatrixElements(Size, Power);

    /// <inheritdoc/>
    public override string Method =>
        "Matrix elements of the harmonic oscillator: the states are Hermite polynomials times the square root of a normal density, so that "
        + "each element is a moment integral, an integer from the polynomials' explicit coefficients (DLMF 18.5.13) and the moments of the "
        + "normal distribution, over the square root of an integer. Where that root is rational the element is exact; else it is enclosed "
        + "at growing precision until the enclosure lies between the midpoints around one representable value. Every found bit pattern is then "
        + "compared with that value.";

    /// <inheritdoc/>
    public override TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation) =>
        new OscillatorMatrixElementsProof(this).Run(data, progress, cancellation);
}
