using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;

namespace GaussGen.Mathematics.Sequences;

/// <summary>
/// A request for the matrix elements ⟨m|xᵖ|n⟩, m and n from 0 to size − 1, between the stationary states of the harmonic oscillator, with the
/// dimensionless coordinate x = (a + a†)/√2, in which the ground state is π^(−1/4) exp(−x²/2).
/// </summary>
public sealed record OscillatorMatrixElementsRequest : SequenceRequest
{
    /// <summary>The smallest number of states.</summary>
    public const int MinimumSize = 1;

    /// <summary>The largest number of states: a matrix has then 4096 entries, 32 kilobytes of binary64.</summary>
    public const int MaximumSize = 64;

    /// <summary>The smallest power; x⁰ gives the unit matrix.</summary>
    public const int MinimumPower = 0;

    /// <summary>
    /// The largest power. Between 64 states x⁶⁴ has elements below 2²²⁴, which binary64 holds; with higher powers the larger elements soon
    /// differ from the smaller ones by more than its precision, so that a product with such a matrix says little.
    /// </summary>
    public const int MaximumPower = 64;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="size">The number of states, from <see cref="MinimumSize"/> to <see cref="MaximumSize"/>.</param>
    /// <param name="power">The power p of x, from <see cref="MinimumPower"/> to <see cref="MaximumPower"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public OscillatorMatrixElementsRequest(int size, int power, BinaryFormat format)
        : base(format)
    {
        Size = Parameters.RequireCount(size, MinimumSize, MaximumSize, "The number of states", nameof(size));
        Power = Parameters.RequireCount(power, MinimumPower, MaximumPower, "The power", nameof(power));
    }

    /// <summary>The number of states: rows, and columns, of the matrix.</summary>
    public int Size { get; }

    /// <summary>The power p of x.</summary>
    public int Power { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.OscillatorMatrixElements(Size, Power);

    /// <summary>Whether a number can be the number of states.</summary>
    public static bool IsSize(int value) => value is >= MinimumSize and <= MaximumSize;

    /// <summary>Whether a number can be the power.</summary>
    public static bool IsPower(int value) => value is >= MinimumPower and <= MaximumPower;

    /// <inheritdoc/>
    public override SequenceTable Construct(CancellationToken cancellation)
    {
        string element = "⟨m|x^" + Power.ToString(CultureInfo.InvariantCulture) + "|n⟩";
        string size = Size.ToString(CultureInfo.InvariantCulture);
        return new SequenceTable(
            new SequenceDescription(
                "The matrix elements " + element + " between the first " + size + " states of the harmonic oscillator, x = (a + a†)/√2",
                "an exact rational number times the square root of an integer; exact where that root is rational",
                "Wick 1950 for the normal order of (a + a†)^p; NIST DLMF 18.39(i) for the states"),
            [
                new NamedSequence(
                    "Elements",
                    OscillatorElements.RowMajor(Size, Power, cancellation),
                    element + ", row by row: m is index / " + size + ", n is index modulo " + size + "."),
            ]);
    }
}
