using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>A number that keeps the enclosures it has given. Thread-safe.</summary>
/// <param name="exact">The number, where it is rational; else <c>null</c>.</param>
/// <param name="enclose">The enclosure at a working precision.</param>
internal sealed class RememberedNumber(Rational? exact, Func<int, CancellationToken, Ball> enclose) : RealNumber
{
    private readonly SharedByPrecision<Boxed> _enclosures = new((precision, cancellation) => new Boxed(enclose(precision, cancellation)));

    public override Rational? ExactValue => exact;

    public override Ball Enclose(int precision, CancellationToken cancellation) => exact is { } value
        ? Ball.FromRational(value, precision)
        : _enclosures.At(precision, cancellation).Value;

    private sealed record Boxed(Ball Value);
}
