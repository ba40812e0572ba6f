using System;
using System.Collections.Generic;

namespace GaussGen;

/// <summary>
/// Asks for the moments of the density proportional to exp(−(c₁x² + c₂x⁴ + c₃x⁶ + …)) on the partial class, struct or record
/// that carries it, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Raw</c> (E Xᵏ), <c>Central</c> (E (X − E X)ᵏ) and <c>Absolute</c>
/// (E |X − E X|ᵏ), indexed by the order k from 0 to <see cref="MaximumOrder"/>, and one constant for each entry
/// (<c>Raw3</c>, <c>Central4</c>, <c>Absolute5</c>). They are those of the normalised
/// density, so that <c>Raw0</c> is 1; the mean and all other odd moments are 0, but for the absolute ones. Units: if X is
/// measured in metres, the moment of order k is in metresᵏ, and cₖ in metres⁻²ᵏ.
/// Every entry is the representable value nearest to the true one, ties to even. An argument means its exact binary value.</para>
/// <para>All coefficients but the last may be negative: exp(−(−2x² + x⁴)) is a double well.</para>
/// <para>The type and all types that contain it must be partial. A type carries one table of moments at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>In a project that is marked as CLS-compliant, the compiler warns of the arrays in this attribute (CS3016).</para>
/// <para>Formulas: Trefethen and Weideman 2014, theorem 5.1 (the trapezoidal rule).</para>
/// </remarks>
/// <example>
/// <code>
/// [EvenExponentialMoments(-2.0, 1.0, MaximumOrder = 6)]
/// internal static partial class Pendulum { }
///
/// double variance = Pendulum.Central2;
/// </code>
/// </example>
[CLSCompliant(false)] // the constructor takes arrays
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class EvenExponentialMomentsAttribute : Attribute
{
    /// <summary>Asks for the moments of an even exponential density.</summary>
    /// <param name="coefficients">
    /// c₁, c₂, …: from 1 to 8 finite numbers, the last one above zero. Anything else is a compile-time error, not an exception.
    /// </param>
    public EvenExponentialMomentsAttribute(params double[] coefficients) => Coefficients = coefficients;

    /// <summary>The coefficients c₁, c₂, … of x², x⁴, ….</summary>
    public IReadOnlyList<double> Coefficients { get; }

    /// <summary>The highest order that is generated, from 0 to 100; 4 if not set.</summary>
    public int MaximumOrder { get; set; } = 4;

    /// <summary>The number format of the moments; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
