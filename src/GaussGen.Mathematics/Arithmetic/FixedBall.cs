namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// An enclosure in fixed-size integers: the numbers between (M − RadiusUnits) · 2^Exponent and (M + RadiusUnits) · 2^Exponent
/// for the 128-bit mantissa M = High·2⁶⁴ + Low, negated where <see cref="IsNegative"/> is set.
/// </summary>
/// <param name="high">The upper half of the mantissa.</param>
/// <param name="low">The lower half of the mantissa.</param>
/// <param name="exponent">The power of two of the mantissa's last place.</param>
/// <param name="isNegative">Whether the midpoint is negated.</param>
/// <param name="radiusUnits">The radius in units of the mantissa's last place.</param>
public readonly partial struct FixedBall(ulong high, ulong low, int exponent, bool isNegative, ulong radiusUnits)
{
    /// <summary>The upper half of the mantissa.</summary>
    public ulong High { get; } = high;

    /// <summary>The lower half of the mantissa.</summary>
    public ulong Low { get; } = low;

    /// <summary>The power of two of the mantissa's last place.</summary>
    public int Exponent { get; } = exponent;

    /// <summary>Whether the midpoint is negated.</summary>
    public bool IsNegative { get; } = isNegative;

    /// <summary>The radius in units of the mantissa's last place.</summary>
    public ulong RadiusUnits { get; } = radiusUnits;
}
