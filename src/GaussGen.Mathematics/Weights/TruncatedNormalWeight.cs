using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Weights;

/// <summary>The standard normal density on an interval, one end or both finite. The coordinate is y = x − c.</summary>
internal sealed class TruncatedNormalWeight : MomentWeight
{
    private readonly Dyadic? _lower;
    private readonly Dyadic? _upper;
    private readonly Dyadic _centre;

    /// <summary>The weight for rules of about so many points, from which the centre is chosen.</summary>
    internal TruncatedNormalWeight(Dyadic? lower, Dyadic? upper, int points)
    {
        _lower = lower;
        _upper = upper;
        IsEven = lower is { } low && upper is { } high && low == -high;
        _centre = IsEven ? Dyadic.Zero : TruncatedCentre.Choose(lower, upper, points);
    }

    /// <inheritdoc/>
    internal override bool IsEven { get; }

    /// <inheritdoc/>
    internal override RealNumber? Lower => End(_lower);

    /// <inheritdoc/>
    internal override RealNumber? Upper => End(_upper);

    /// <inheritdoc/>
    internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
    {
        Ball[] moments = TruncatedMoments.About(_lower, _upper, _centre, count, precision, cancellation);
        for (int k = 1; IsEven && k < count; k += 2)
        {
            moments[k] = default;
        }

        return moments;
    }

    /// <inheritdoc/>
    internal override Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation) =>
        Ball.Add(coordinate, Ball.FromDyadic(_centre), int.MaxValue);

    /// <inheritdoc/>
    internal override Rational? ToLineExactly(Rational coordinate) => coordinate + _centre.ToRational();

    /// <inheritdoc/>
    protected override int ExpectedLoss(int count) => TruncatedCentre.ExpectedLoss(_lower, _upper, IsEven, count);

    private RealNumber? End(Dyadic? end) => end is { } value ? RealNumber.Exact((value - _centre).ToRational()) : null;
}
