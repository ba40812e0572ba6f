using System;
using System.Threading;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// A real number that is known exactly, or that can be enclosed as tightly as anyone asks. It is what a table holds before
/// a number format is chosen, and all that rounding needs to know of it.
/// </summary>
public abstract class RealNumber
{
    /// <summary>The number, where it is rational and known exactly; such a number never enters the rounding loop.</summary>
    public virtual Rational? ExactValue => null;

    /// <summary>
    /// The number in fixed-size arithmetic, where its construction has such an enclosure at hand: a first try that saves the
    /// rounding from big integers in nearly all cases.
    /// </summary>
    public virtual FixedBall? FirstEnclosure => null;

    /// <summary>
    /// A ball that contains the number. Its radius shrinks towards zero as <paramref name="precision"/> grows; it need not
    /// be below 2^−precision at the first try.
    /// </summary>
    /// <param name="precision">Working precision in bits, at least 32.</param>
    /// <param name="cancellation">Looked at least every 10 ms.</param>
    public abstract Ball Enclose(int precision, CancellationToken cancellation);

    /// <summary>The rational number itself.</summary>
    public static RealNumber Exact(Rational value) => new ExactNumber(value);

    /// <summary>A number given by a function from a working precision to a ball that contains it.</summary>
    public static RealNumber FromEnclosures(Func<int, CancellationToken, Ball> enclose) => new EnclosedNumber(enclose);

    private sealed class ExactNumber(Rational value) : RealNumber
    {
        public override Rational? ExactValue => value;

        public override Ball Enclose(int precision, CancellationToken cancellation) => Ball.FromRational(value, precision);
    }

    private sealed class EnclosedNumber(Func<int, CancellationToken, Ball> enclose) : RealNumber
    {
        public override Ball Enclose(int precision, CancellationToken cancellation) => enclose(precision, cancellation);
    }
}
