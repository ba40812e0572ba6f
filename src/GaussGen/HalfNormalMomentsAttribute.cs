using System;

namespace GaussGen;

/// <summary>
/// Asks for the moments of a half-normal variable, the magnitude of normal noise, on the partial class, struct or record that
/// carries it, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Raw</c> (E Xᵏ), <c>Central</c> (E (X − E X)ᵏ) and <c>Absolute</c>
/// (E |X − E X|ᵏ), indexed by the order k from 0 to <see cref="MaximumOrder"/>, and one constant for each entry
/// (<c>Raw3</c>, <c>Central4</c>, <c>Absolute5</c>). Units: if X is measured in metres, the moment of
/// order k is in metresᵏ.
/// Every entry is the representable value nearest to the true one, ties to even. An argument means its exact binary value.</para>
/// <para>The variable is scale · |Z| for standard normal Z; its mean is scale · √(2/π), about which the central and absolute
/// moments are taken.</para>
/// <para>The type and all types that contain it must be partial. A type carries one table of moments at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: E Xᵏ = scaleᵏ 2^(k/2) Γ((k + 1)/2)/√π (NIST DLMF 5.9.1).</para>
/// </remarks>
/// <example>
/// <code>
/// [HalfNormalMoments(scale: 0.12)]
/// internal static partial class Roll { }
///
/// double meanRoll = Roll.Raw1;
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class HalfNormalMomentsAttribute : Attribute
{
    /// <summary>Asks for the moments of a half-normal distribution.</summary>
    /// <param name="scale">
    /// The scale, in the variable's unit: the standard deviation of the noise whose magnitude the variable is; positive and
    /// finite. Anything else is a compile-time error, not an exception.
    /// </param>
    public HalfNormalMomentsAttribute(double scale) => Scale = scale;

    /// <summary>The scale.</summary>
    public double Scale { get; }

    /// <summary>The highest order that is generated, from 0 to 200; 4 if not set.</summary>
    public int MaximumOrder { get; set; } = 4;

    /// <summary>The number format of the moments; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
