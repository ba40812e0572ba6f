namespace GaussGen;

/// <summary>The number format of a generated table; it decides the C# type of its entries.</summary>
public enum NumberFormat
{
    /// <summary>IEEE 754 binary64: <see cref="double"/>, 53 significant bits.</summary>
    Binary64 = 0,

    /// <summary>IEEE 754 binary32: <see cref="float"/>, 24 significant bits.</summary>
    Binary32 = 1,
}
