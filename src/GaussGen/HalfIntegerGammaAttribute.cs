using System;

namespace GaussGen;

/// <summary>
/// Asks for the values of the gamma function at ½, 1½, 2½, … on the partial class, struct or record that carries it, as
/// constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Gamma</c> (entry k is Γ(k + ½)) and <c>Reciprocal</c> (entry k is 1/Γ(k + ½)), k from
/// 0 to <see cref="MaximumOrder"/>. Every entry is the representable value nearest to the true one, ties to even.</para>
/// <para>The type and all types that contain it must be partial. The attribute stays in the compiled assembly, so that a later
/// check can read what was asked for.</para>
/// <para>Formulas: Γ(½) = √π, Γ(x + 1) = x Γ(x) (NIST DLMF 5.4.6, 5.5.1).</para>
/// </remarks>
/// <example>
/// <code>
/// [HalfIntegerGamma(10)]
/// internal static partial class HalfGamma { }
///
/// double rootOfPi = HalfGamma.Gamma[0];
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class HalfIntegerGammaAttribute : Attribute
{
    /// <summary>Asks for the values up to an order.</summary>
    /// <param name="maximumOrder">
    /// The largest k of Γ(k + ½), from 0 to 200. Anything else is a compile-time error, as is an entry that is too large for
    /// <see cref="Format"/>: from k = 172 on in binary64, from k = 35 on in binary32.
    /// </param>
    public HalfIntegerGammaAttribute(int maximumOrder) => MaximumOrder = maximumOrder;

    /// <summary>The largest k of Γ(k + ½).</summary>
    public int MaximumOrder { get; }

    /// <summary>The number format of the entries; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
