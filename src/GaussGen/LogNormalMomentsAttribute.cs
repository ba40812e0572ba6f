using System;

namespace GaussGen;

/// <summary>
/// Asks for the moments of a log-normal variable on the partial class, struct or record that carries it, as constants that are
/// computed and proven while the program is compiled.
/// </summary>
/// <remarks>
/// <para>The generated part has the spans <c>Raw</c> (E Xᵏ), <c>Central</c> (E (X − E X)ᵏ) and <c>Absolute</c>
/// (E |X − E X|ᵏ), indexed by the order k from 0 to <see cref="MaximumOrder"/>, and one constant for each entry
/// (<c>Raw3</c>, <c>Central4</c>, <c>Absolute5</c>). Units: if X is measured in metres, the moment of
/// order k is in metresᵏ.
/// Every entry is the representable value nearest to the true one, ties to even. An argument means its exact binary value.</para>
/// <para>The variable is exp(Y) for normal Y with mean <see cref="LogMean"/> and standard deviation
/// <see cref="LogStandardDeviation"/>; central and absolute moments are about its own mean exp(m + s²/2).</para>
/// <para>The type and all types that contain it must be partial. A type carries one table of moments at most. The attribute stays in the
/// compiled assembly, so that a later check can read what was asked for.</para>
/// <para>Formulas: E Xᵏ = exp(k m + k² s²/2) (Aitchison and Brown 1957).</para>
/// </remarks>
/// <example>
/// <code>
/// [LogNormalMoments(logMean: 0.0, logStandardDeviation: 0.25)]
/// internal static partial class Fading { }
///
/// double meanStrength = Fading.Raw1;
/// </code>
/// </example>
[AttributeUsage(AttributeTargets.Class | AttributeTargets.Struct, AllowMultiple = false, Inherited = false)]
public sealed class LogNormalMomentsAttribute : Attribute
{
    /// <summary>Asks for the moments of a log-normal distribution.</summary>
    /// <param name="logMean">The mean m of the variable's logarithm; finite.</param>
    /// <param name="logStandardDeviation">
    /// The standard deviation s of the variable's logarithm; positive and finite. Anything else is a compile-time error, not an
    /// exception.
    /// </param>
    public LogNormalMomentsAttribute(double logMean, double logStandardDeviation)
    {
        LogMean = logMean;
        LogStandardDeviation = logStandardDeviation;
    }

    /// <summary>The mean of the variable's logarithm.</summary>
    public double LogMean { get; }

    /// <summary>The standard deviation of the variable's logarithm.</summary>
    public double LogStandardDeviation { get; }

    /// <summary>The highest order that is generated, from 0 to 100; 4 if not set.</summary>
    public int MaximumOrder { get; set; } = 4;

    /// <summary>The number format of the moments; <see cref="NumberFormat.Binary64"/> if not set.</summary>
    public NumberFormat Format { get; set; } = NumberFormat.Binary64;
}
