using System;

namespace GaussGen;

/// <summary>
/// Asks for the moments of a normal variable that is known to lie in an interval, on the partial class, struct or record that
/// carries it, as constants that are computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Raw</c> (E Xᵏ), <c>Central</c> (E (X − E X)ᵏ) and <c>Absolute</c>
/// (E |X − E X|ᵏ), indexed by the order k from 0 to <see cref="MaximumOrder"/>, and one constant for each entry
/// (<c>Raw3</c>, <c>Central4</c>, <c>Absolute5</c>). Central and absolute moments are
/// about the mean of the truncated variable. Units: if X is measured in metres, the moment of order k is in metresᵏ.
/// Every entry is the representable value nearest to the true one, ties to even. An argument means its exact binary value.</para>
/// <para>The type and all types that contain it must be partial. A type carries one table of moments at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: Tallis 1961.</para>
/// </remarks>
/// <example>
/// The depth sounder shows depths from 0.5 m to 12 m only:
/// <code>
/// [TruncatedNormalMoments(mean: 1.5, standardDeviation: 0.5, lower: 0.5, upper: 12.0)]
/// internal static partial class Depth { }
///
/// double variance = Depth.Central2;
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class TruncatedNormalMomentsAttribute : Attribute
{
    /// <summary>Asks for the moments of a truncated normal distribution.</summary>
    /// <param name="mean">The mean before truncation, in the variable's unit; finite.</param>
    /// <param name="standardDeviation">The standard deviation before truncation, in the same unit; positive and finite.</param>
    /// <param name="lower">The lower end, in the same unit; negative infinity where <paramref name="upper"/> is finite.</param>
    /// <param name="upper">
    /// The upper end, above the lower one; positive infinity where <paramref name="lower"/> is finite. An interval that is empty,
    /// the whole line, or of a probability below 2⁻¹⁰²² is a compile-time error, not an exception.
    /// </param>
    public TruncatedNormalMomentsAttribute(double mean, double standardDeviation, double lower, double upper)
    {
        Mean = mean;
        StandardDeviation = standardDeviation;
        Lower = lower;
        Upper = upper;
    }

    /// <summary>The mean before truncation.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation before truncation.</summary>
    public double StandardDeviation { get; }

    /// <summary>The lower end.</summary>
    public double Lower { get; }

    /// <summary>The upper end.</summary>
    public double Upper { get; }

    /// <summary>The highest order that is generated, from 0 to 100; 4 if not set.</summary>
    public int MaximumOrder { get; set; } = 4;

    /// <summary>The number format of the moments; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
