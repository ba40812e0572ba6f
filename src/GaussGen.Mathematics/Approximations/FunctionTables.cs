using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Approximations;

/// <summary>
/// Makes the tables behind the runtime's error functions and normal distribution. A row is a polynomial of degree 9 in the
/// distance from the middle of an interval that is one sixteenth of a binade: the distance is exact in binary64 and at most 1/33 of
/// the argument, so that rounding in the polynomial hardly counts.
/// </summary>
public static class FunctionTables
{
    private const int Precision = 240;
    private const int RowDegree = 9;
    private const int RowsPerBinade = 16;

    /// <summary>All tables, in the order of the committed file.</summary>
    /// <param name="cancellation">Looked at for each value of a function.</param>
    public static IReadOnlyList<FunctionTable> All(CancellationToken cancellation)
    {
        var normal = new NormalReference(Precision, cancellation);
        ErrorFunctionGrid error = normal.ErrorFunctions;
        return
        [
            Powers("Powers", "2^(j/128) as head and tail, j from 0 to 127.", Ball.FromInteger(1), cancellation),
            Powers("DensityPowers", "2^(j/128)/√(2π) as head and tail, j from 0 to 127.", error.PeakDensity, cancellation),
            Logarithms(cancellation),
            Series("ErfSeries", "erf(√v)/√v − 9/8 on [0, 1/4]: coefficients of powers of v.",
                v => RelativeToRoot(v, error.Erf, 9, -3), new Dyadic(1, -2), 9, cancellation),
            Series("CumulativeSeries", "(Φ(√v) − 1/2)/√v − 1/2 on [0, 1/4]: coefficients of powers of v.",
                v => RelativeToRoot(v, normal.FromZero, 1, -1), new Dyadic(1, -2), 9, cancellation),
            Series("QuantileSeries", "Φ⁻¹(1/2 + √v)/√v − 5/2 on [0, (3/16)²]: coefficients of powers of v.",
                v => RelativeToRoot(v, u => QuantileFromHalf(u, normal), 5, -1), new Dyadic(9, -8), 13, cancellation),
            Series("InverseSeries", "erf⁻¹(√v)/√v − 7/8 on [0, 1/4]: coefficients of powers of v.",
                v => RelativeToRoot(v, y => InverseErf(y, normal), 7, -3), new Dyadic(1, -2), 16, cancellation),
            Binades("ErfRows", "erf x on [1/2, 6).",
                x => error.Erf(Ball.FromDyadic(x)), -1, 0, 56, cancellation),
            Binades("ScaledErfcRows", "exp(x²) erfc x on [1/2, 32).",
                x => error.ErfcScaled(Ball.FromDyadic(x)), -1, 0, 96, cancellation),
            Binades("ScaledTailRows", "exp(x²/2) (1 − Φ(x)) on [1/2, 40).",
                x => normal.ScaledTail(Ball.FromDyadic(x)), -1, 0, 100, cancellation),
            Binades("LogTailRows", "ln(exp(x²/2) (1 − Φ(x))) on [1, 64).",
                x => Elementary.Log(normal.ScaledTail(Ball.FromDyadic(x)), Precision, cancellation), 0, 0, 96, cancellation),
            new("LogCumulativeRows", "ln Φ(x) about the middles −1, −15/16, …, 2.",
                Enumerable.Range(-16, 49).Select(i => Row(
                    x => normal.LogCumulative(Ball.FromDyadic(x)), new Dyadic(i, -4), new Dyadic(1, -5), cancellation)).ToArray()),
            Binades("QuantileRows", "The x with 1 − Φ(x) = t, for t in [1/256, 5/16).",
                t => normal.UpperQuantile(Ball.FromDyadic(t), new Dyadic(1, -1)), -8, 0, 100, cancellation),
            Binades("QuantileTailRows", "The x with 1 − Φ(x) = exp(−w²/2), less w, for w in [13/4, 40).",
                w => TailQuantile(w, normal, cancellation), 1, 10, 58, cancellation),
        ];
    }

    /// <summary>The constants, each by name with what it is and the numbers that it is split into.</summary>
    /// <param name="cancellation">Looked at for each constant.</param>
    public static IReadOnlyList<FunctionTable> Constants(CancellationToken cancellation)
    {
        Ball ln2 = Arithmetic.Constants.Ln2(Precision, cancellation);
        Ball rootPi = Arithmetic.Constants.SqrtPi(Precision, cancellation);
        Ball halfRoot2 = Arithmetic.Constants.Sqrt2(Precision).ScaleByPowerOfTwo(-1);
        Ball overRootPi = Ball.Divide(Ball.FromInteger(1), rootPi, Precision);
        Ball peak = Ball.Multiply(overRootPi, halfRoot2, Precision);
        return
        [
            new("StepsPerUnit", "128/ln 2", [[TableNumbers.Nearest(Ball.Divide(Ball.FromInteger(128), ln2, Precision))]]),
            new("Step", "ln 2/128", [TableNumbers.Split(ln2.ScaleByPowerOfTwo(-7), -42)]),
            new("Ln2", "ln 2", [TableNumbers.Split(ln2, -40)]),
            new("InverseSqrtPi", "1/√π", [TableNumbers.HeadAndTail(overRootPi)]),
            new("InverseSqrt2", "1/√2", [TableNumbers.HeadAndTail(halfRoot2)]),
            new("PeakDensity", "1/√(2π)", [TableNumbers.HeadAndTail(peak)]),
            new("LogPeakDensity", "ln(1/√(2π))", [TableNumbers.HeadAndTail(Elementary.Log(peak, Precision, cancellation))]),
        ];
    }

    private static FunctionTable Powers(string name, string summary, Ball factor, CancellationToken cancellation)
    {
        Ball ln2 = Arithmetic.Constants.Ln2(Precision, cancellation);
        return new(name, summary, Enumerable.Range(0, 128).Select(j =>
        {
            Ball exponent = Ball.Multiply(ln2, Ball.FromDyadic(new Dyadic(j, -7)), Precision);
            return TableNumbers.HeadAndTail(Ball.Multiply(Elementary.Exp(exponent, Precision, cancellation), factor, Precision));
        }).ToArray());
    }

    private static FunctionTable Logarithms(CancellationToken cancellation) => new(
        "Logarithms",
        "For m = 1 + (j + 1/2)/128, j from 0 to 127: ln m as a multiple of 2^−40 and a tail, and 1/m.",
        Enumerable.Range(0, 128).Select(j =>
        {
            Ball middle = Ball.FromDyadic(new Dyadic(257 + (2 * j), -8));
            ulong[] logarithm = TableNumbers.Split(Elementary.Log(middle, Precision, cancellation), -40);
            return logarithm.Concat([TableNumbers.Nearest(Ball.Divide(Ball.FromInteger(1), middle, Precision))]).ToArray();
        }).ToArray());

    private static FunctionTable Series(
        string name, string summary, Func<Dyadic, Ball> function, Dyadic end, int degree, CancellationToken cancellation)
    {
        // Interpolated about the middle, then moved to powers of v itself.
        Dyadic middle = end.ScaleByPowerOfTwo(-1);
        Ball[] coefficients = ChebyshevInterpolation.Interpolate(function, middle, middle, degree, Precision, cancellation);
        for (int i = 0; i < degree; i++)
        {
            for (int k = degree - 1; k >= i; k--)
            {
                coefficients[k] = Ball.Subtract(
                    coefficients[k], Ball.Multiply(coefficients[k + 1], Ball.FromDyadic(middle), Precision), Precision);
            }
        }

        return new(name, summary, coefficients.Select(value => new[] { TableNumbers.Nearest(value) }).ToArray());
    }

    /// <summary>Rows for the sixteenths of binades from a given one on.</summary>
    private static FunctionTable Binades(
        string name, string summary, Func<Dyadic, Ball> function, int firstBinade, int skipped, int count, CancellationToken cancellation) =>
        new(name, summary, Enumerable.Range(skipped, count).Select(i =>
        {
            int scale = firstBinade + (i / RowsPerBinade) - 5;
            var middle = new Dyadic((2 * (RowsPerBinade + (i % RowsPerBinade))) + 1, scale);
            return Row(function, middle, new Dyadic(1, scale), cancellation);
        }).ToArray());

    private static ulong[] Row(Func<Dyadic, Ball> function, Dyadic middle, Dyadic halfWidth, CancellationToken cancellation) =>
        TableNumbers.Row(ChebyshevInterpolation.Interpolate(function, middle, halfWidth, RowDegree, Precision, cancellation));

    /// <summary>f(√v)/√v less the number mantissa·2^exponent.</summary>
    private static Ball RelativeToRoot(Dyadic v, Func<Ball, Ball> function, int mantissa, int exponent)
    {
        Ball root = Ball.Sqrt(Ball.FromDyadic(v), Precision);
        return Ball.Subtract(
            Ball.Divide(function(root), root, Precision), Ball.FromDyadic(new Dyadic(mantissa, exponent)), Precision);
    }

    private static Ball QuantileFromHalf(Ball u, NormalReference normal) =>
        normal.UpperQuantile(Ball.Subtract(Ball.FromDyadic(new Dyadic(1, -1)), u, Precision), Dyadic.Zero);

    private static Ball InverseErf(Ball y, NormalReference normal) => Ball.Multiply(
        QuantileFromHalf(y.ScaleByPowerOfTwo(-1), normal), normal.ErrorFunctions.HalfSqrt2, Precision);

    private static Ball TailQuantile(Dyadic w, NormalReference normal, CancellationToken cancellation)
    {
        Ball argument = Ball.FromDyadic(w);
        Ball tail = Elementary.Exp(Ball.Square(argument, 4 * Precision).ScaleByPowerOfTwo(-1).Negate(), Precision, cancellation);
        Ball start = Ball.Subtract(argument, Ball.Divide(Ball.FromInteger(4), argument, 64), 64);
        return Ball.Subtract(normal.UpperQuantile(tail, start.Center), argument, Precision);
    }
}
