using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>∫ exp(−t²/2) dt, by the series with positive terms ∫₀ˣ = e^(−x²/2) Σ x^(2j+1)/(2j+1)!! (NIST DLMF 7.6.2).</summary>
internal static class NormalIntegral
{
    /// <summary>The integral from one number to another; <c>null</c> is an infinite end. Its radius is about 2^−precision, whatever its size.</summary>
    /// <param name="lower">The lower end; <c>null</c> for −∞.</param>
    /// <param name="upper">The upper end; <c>null</c> for +∞.</param>
    /// <param name="precision">The working precision.</param>
    /// <param name="cancellation">Looked at in each term of the series.</param>
    internal static Ball Between(Ball? lower, Ball? upper, int precision, CancellationToken cancellation)
    {
        Ball high = upper is null ? Half(precision, cancellation) : FromZero(upper.Value, precision, cancellation);
        Ball low = lower is null ? Ball.Negate(Half(precision, cancellation)) : FromZero(lower.Value, precision, cancellation);
        return Ball.Subtract(high, low, precision);
    }

    /// <summary>∫ exp(−t²/2) dt from 0 to each number in a ball.</summary>
    internal static Ball FromZero(Ball x, int precision, CancellationToken cancellation)
    {
        Ball integral = FromZero(x.Center, precision, cancellation);
        if (x.IsExact)
        {
            return integral;
        }

        // Within the radius the integral changes by at most the radius times the largest density.
        Ball density = Elementary.Exp(Ball.Square(x, 64).Negate().ScaleByPowerOfTwo(-1), 64, cancellation);
        return integral.Enlarge(x.Radius * Approximation.Magnitude(density));
    }

    /// <summary>∫ exp(−t²/2) dt from 0 to x.</summary>
    internal static Ball FromZero(Dyadic x, int precision, CancellationToken cancellation)
    {
        if (x.IsZero)
        {
            return default;
        }

        if (x.Sign < 0)
        {
            return Ball.Negate(FromZero(-x, precision, cancellation));
        }

        int working = precision + 16;
        Ball argument = Ball.FromDyadic(x);
        Ball square = Ball.Square(argument, working);
        Ball density = Elementary.Exp(square.Negate().ScaleByPowerOfTwo(-1), working, cancellation);
        if (Approximation.CeilingLog2(density) < -precision && x > new Dyadic(1, 0))
        {
            // The rest ∫ exp(−t²/2) from x ≥ 1 is at most exp(−x²/2)/x.
            return Half(precision, cancellation).Enlarge(Approximation.Magnitude(density));
        }

        Ball term = argument, sum = default;
        int index = 0;
        do
        {
            cancellation.ThrowIfCancellationRequested();
            sum = Ball.Add(sum, term, working);
            index++;
            term = Ball.Divide(Ball.Multiply(term, square, working), Ball.FromInteger((2 * index) + 1), working);
        }
        while (Approximation.CeilingLog2(term) > Approximation.FloorLog2(sum) - working || !IsPastHalf(square, index));

        // From here on each term is less than half of the one before it.
        sum = sum.Enlarge(Approximation.Magnitude(term).ScaleByPowerOfTwo(1));
        return Ball.Multiply(sum, density, precision);
    }

    /// <summary>Whether x²/(2j + 3) is surely at most one half.</summary>
    private static bool IsPastHalf(Ball square, int index) => square.Upper <= new Dyadic((2 * index) + 3, -1);

    /// <summary>√(π/2).</summary>
    private static Ball Half(int precision, CancellationToken cancellation) =>
        Ball.Divide(Constants.SqrtPi(precision + 8, cancellation), Constants.Sqrt2(precision + 8), precision);
}
