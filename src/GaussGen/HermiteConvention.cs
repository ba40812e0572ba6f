namespace GaussGen;

/// <summary>Which of the two usual weight functions a Gauss–Hermite rule is for (NIST DLMF 18.3, table 18.3.1).</summary>
public enum HermiteConvention
{
    /// <summary>
    /// The weight is the standard normal density exp(−x²/2)/√(2π); the nodes are the zeros of Heₙ and the weights sum to 1.
    /// The sum Σ wᵢ f(xᵢ) approximates the expectation of f under the standard normal distribution.
    /// </summary>
    Probabilist = 0,

    /// <summary>
    /// The weight is exp(−x²); the nodes are the zeros of Hₙ and the weights sum to √π. The sum Σ wᵢ f(xᵢ) approximates
    /// ∫ f(x) exp(−x²) dx over the real line.
    /// </summary>
    Physicist = 1,
}
