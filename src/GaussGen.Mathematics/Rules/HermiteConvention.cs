namespace GaussGen.Mathematics.Rules;

/// <summary>Which weight function a Gauss–Hermite rule belongs to.</summary>
public enum HermiteConvention
{
    /// <summary>The standard normal density exp(−x²/2)/√(2π); the weights sum to 1.</summary>
    Probabilist,

    /// <summary>exp(−x²); the weights sum to √π.</summary>
    Physicist,
}
