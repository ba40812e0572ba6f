using System;

namespace GaussGen;

/// <summary>
/// Asks for the matrix of a power of the position between the states of a harmonic oscillator, on the partial class, struct or
/// record that carries it, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the span <c>Elements</c> with <see cref="Size"/> × <see cref="Size"/> entries, row by row: entry
/// m · size + n is ⟨m| x^power |n⟩ = ∫ hₘ(x) x^power hₙ(x) dx with the normalised Hermite functions h. The position is
/// dimensionless, in units of √(ħ/(mass · angular frequency)): x = (a + a†)/√2. Every entry is the representable value nearest to
/// the true one, ties to even.</para>
/// <para>The type and all types that contain it must be partial. The attribute stays in the compiled assembly, so that a later
/// check can read what was asked for.</para>
/// <para>Formulas: x hₙ = √((n + 1)/2) hₙ₊₁ + √(n/2) hₙ₋₁ (NIST DLMF 18.9.1).</para>
/// </remarks>
/// <example>
/// <code>
/// [OscillatorMatrixElements(size: 4, power: 4)]
/// internal static partial class Quartic { }
///
/// double groundState = Quartic.Elements[0]; // 3/4
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class OscillatorMatrixElementsAttribute : Attribute
{
    /// <summary>Asks for the matrix of a power.</summary>
    /// <param name="size">The number of states, and of rows and columns, from 1 to 64.</param>
    /// <param name="power">
    /// The power of the position, from 0 to 64. Numbers out of range are a compile-time error, not an exception.
    /// </param>
    public OscillatorMatrixElementsAttribute(int size, int power)
    {
        Size = size;
        Power = power;
    }

    /// <summary>The number of states, from 1 to 64.</summary>
    public int Size { get; }

    /// <summary>The power of the position, from 0 to 64.</summary>
    public int Power { get; }

    /// <summary>The number format of the entries; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
