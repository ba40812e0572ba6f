using System;

namespace GaussGen;

/// <summary>
/// Asks for the moments of a normal distribution on the partial class, struct or record that carries it, as constants that
/// are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Raw</c> (E Xᵏ), <c>Central</c> (E (X − E X)ᵏ) and <c>Absolute</c>
/// (E |X − E X|ᵏ), indexed by the order k from 0 to <see cref="MaximumOrder"/>, and one constant for each entry
/// (<c>Raw3</c>, <c>Central4</c>, <c>Absolute5</c>). Units: if X is measured in metres, the moment of order k is in metresᵏ.
/// Every entry is the representable value nearest to the true one, ties to even.</para>
/// <para>An argument means its exact binary value: <c>0.1</c> is the double nearest to one tenth, and the moments are those of
/// that number.</para>
/// <para>The type and all types that contain it must be partial. A type carries one table of moments at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: E (X − μ)²ᵏ = σ²ᵏ (2k − 1)!!; E |X − μ|ᵏ = σᵏ 2^(k/2) Γ((k + 1)/2)/√π (Papoulis 1965, section 5-4).</para>
/// </remarks>
/// <example>
/// <code>
/// [NormalMoments(mean: 1.5, standardDeviation: 0.25, MaximumOrder = 8)]
/// internal static partial class Wind { }
///
/// double meanOfCube = Wind.Raw3;
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class NormalMomentsAttribute : Attribute
{
    /// <summary>Asks for the moments of a normal distribution.</summary>
    /// <param name="mean">The mean; finite. Anything else is a compile-time error, not an exception.</param>
    /// <param name="standardDeviation">
    /// The standard deviation, in the units of the mean; positive and finite. Anything else is a compile-time error, not an
    /// exception.
    /// </param>
    public NormalMomentsAttribute(double mean, double standardDeviation)
    {
        Mean = mean;
        StandardDeviation = standardDeviation;
    }

    /// <summary>The mean.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation, in the units of the mean.</summary>
    public double StandardDeviation { get; }

    /// <summary>The highest order that is generated, from 0 to 200; 4 if not set.</summary>
    public int MaximumOrder { get; set; } = 4;

    /// <summary>The number format of the moments; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
