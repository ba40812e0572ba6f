using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// An interval of the standard normal density and a centre of moments, as balls. The distances are given beside the ends, since a difference
/// of two balls that lie close together would lose the bits that they have in common.
/// </summary>
/// <param name="Lower">The lower end; <c>null</c> for −∞.</param>
/// <param name="Upper">The upper end; <c>null</c> for +∞.</param>
/// <param name="LowerDistance">The lower end less the centre.</param>
/// <param name="UpperDistance">The upper end less the centre.</param>
/// <param name="Centre">The centre.</param>
internal sealed record TruncatedInterval(Ball? Lower, Ball? Upper, Ball? LowerDistance, Ball? UpperDistance, Ball Centre)
{
    /// <summary>The interval with exact ends and centre.</summary>
    internal static TruncatedInterval FromExact(Dyadic? lower, Dyadic? upper, Dyadic centre) => new(
        ToBall(lower), ToBall(upper), ToBall(lower - centre), ToBall(upper - centre), Ball.FromDyadic(centre));

    private static Ball? ToBall(Dyadic? value) => value is { } number ? Ball.FromDyadic(number) : null;
}
