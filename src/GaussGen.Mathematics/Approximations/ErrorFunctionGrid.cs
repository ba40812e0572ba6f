using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Approximations;

/// <summary>
/// The error functions as balls at one precision, for many arguments: Taylor's series about the nearest of the points j/64, whose
/// coefficients are kept. Meant for measuring and for making coefficients; it shares nothing with what it measures.
/// </summary>
/// <remarks>
/// <para>With d = exp(−c²): erfc(c + h) = erfc c − (2/√π) d h Σ dₙ hⁿ, where dₙ = bₙ/(n + 1) and Σ bₙ tⁿ = exp(−2ct − t²), so that
/// b₀ = 1 and (n + 1) bₙ₊₁ = −2c bₙ − 2 bₙ₋₁ (the generating function of the Hermite polynomials, NIST DLMF 18.12.15).</para>
/// <para>The rest after N terms: on the circle |t| = 1/2, |exp(−2ct − t²)| ≤ exp(c + 1/4) &lt; 2^41 for c ≤ 28, so |bₙ| ≤ 2^(41+n)
/// (Cauchy), and for |h| ≤ 2^−6 + 2^−20 the rest of Σ dₙ hⁿ is below 2^41 (2|h|)^N / (1 − 2|h|) ≤ 2^(42 − 4.999 N).</para>
/// <para>erfc 28 comes from the asymptotic series (DLMF 7.12.1), whose error is below the first term left out; the values at the
/// other points follow downwards, where erfc grows and its relative error shrinks.</para>
/// </remarks>
public sealed partial class ErrorFunctionGrid
{
    private const int PointsPerUnit = 64;
    private const int LargestPoint = 28;

    private readonly int _precision;
    private readonly Ball _twoOverSqrtPi;
    private readonly Ball _halfSqrt2;
    private readonly GridPoint[] _points = new GridPoint[(LargestPoint * PointsPerUnit) + 1];
    private readonly CancellationToken _cancellation;

    /// <summary>Prepares the points.</summary>
    /// <param name="precision">The working precision in bits, 64 to 1000; results have about 16 correct bits less.</param>
    /// <param name="cancellation">Looked at for each point here, and in each evaluation later.</param>
    /// <exception cref="ArgumentOutOfRangeException">The precision is outside its range.</exception>
    public ErrorFunctionGrid(int precision, CancellationToken cancellation = default)
    {
        if (precision is < 64 or > 1000)
        {
            throw new ArgumentOutOfRangeException(nameof(precision), "Give a precision from 64 to 1000 bits.");
        }

        _precision = precision;
        _cancellation = cancellation;
        Ball rootPi = Constants.SqrtPi(precision + 8, cancellation);
        _twoOverSqrtPi = Ball.Divide(Ball.FromInteger(2), rootPi, precision);
        _halfSqrt2 = Constants.Sqrt2(precision + 8).ScaleByPowerOfTwo(-1);
        var top = new Dyadic(LargestPoint, 0);
        Ball tail = Ball.Multiply(Asymptotic(Ball.FromDyadic(top)), ExpOfMinusSquare(Ball.FromDyadic(top)), precision);
        _points[_points.Length - 1] = new GridPoint(top, tail, this);
        for (int i = _points.Length - 2; i >= 0; i--)
        {
            cancellation.ThrowIfCancellationRequested();
            var center = new Dyadic(i, -6);
            _points[i] = new GridPoint(center, _points[i + 1].Erfc(Ball.FromDyadic(new Dyadic(-1, -6))), this);
        }
    }

    /// <summary>The working precision in bits.</summary>
    public int Precision => _precision;

    /// <summary>1/√2.</summary>
    internal Ball HalfSqrt2 => _halfSqrt2;

    /// <summary>1/√(2π).</summary>
    internal Ball PeakDensity => Ball.Multiply(_twoOverSqrtPi, _halfSqrt2, _precision).ScaleByPowerOfTwo(-1);

    /// <summary>The error function; relative accuracy near zero is kept.</summary>
    public Ball Erf(Ball x)
    {
        if (x.Midpoint.Sign < 0)
        {
            return Ball.Negate(Erf(Ball.Negate(x)));
        }

        if (IsBeyond(x))
        {
            return Ball.Subtract(Ball.FromInteger(1), Erfc(x), _precision);
        }

        GridPoint point = Nearest(x, out Ball offset);
        Ball change = point.Change(offset);
        return point.Center.IsZero
            ? change
            : Ball.Add(Ball.Subtract(Ball.FromInteger(1), point.Tail, _precision), change, _precision);
    }

    /// <summary>The complementary error function; relative accuracy in the upper tail is kept.</summary>
    public Ball Erfc(Ball x)
    {
        if (x.Midpoint.Sign < 0)
        {
            return Ball.Subtract(Ball.FromInteger(2), Erfc(Ball.Negate(x)), _precision);
        }

        if (IsBeyond(x))
        {
            return Ball.Multiply(Asymptotic(x), ExpOfMinusSquare(x), _precision);
        }

        GridPoint point = Nearest(x, out Ball offset);
        return point.Erfc(offset);
    }

    /// <summary>exp(x²) erfc x.</summary>
    public Ball ErfcScaled(Ball x) => x.Midpoint.Sign > 0 && IsBeyond(x)
        ? Asymptotic(x)
        : Ball.Multiply(
            Elementary.Exp(Ball.Square(x, 4 * _precision), _precision, _cancellation), Erfc(x), _precision);

    private static bool IsBeyond(Ball x) => x.Center > new Dyadic((LargestPoint * PointsPerUnit * 2) - 1, -7);

    private GridPoint Nearest(Ball x, out Ball offset)
    {
        _cancellation.ThrowIfCancellationRequested();
        Dyadic half = (x.Center.ScaleByPowerOfTwo(6) + new Dyadic(1, -1)).Reduce();
        int index = (int)(half.Exponent >= 0
            ? half.Mantissa << half.Exponent
            : -half.Exponent > half.BitLength ? 0 : half.Mantissa >> -half.Exponent);
        GridPoint point = _points[index];
        offset = point.Center.IsZero ? x : Ball.Subtract(x, Ball.FromDyadic(point.Center), _precision);
        return offset.Radius.CeilingLog2 <= -20
            ? point
            : throw new ArgumentOutOfRangeException(nameof(x), "The argument's radius must be at most 2^-20.");
    }

    private Ball ExpOfMinusSquare(Ball x) =>
        Elementary.Exp(Ball.Square(x, 4 * _precision).Negate(), _precision, _cancellation);

    /// <summary>exp(x²) erfc x from 28 − 1/128 on: (1/(x√π)) Σ (−1)^k (2k−1)!!/(2x²)^k.</summary>
    private Ball Asymptotic(Ball x)
    {
        Ball step = Ball.Divide(Ball.FromInteger(-1), Ball.Square(x, _precision).ScaleByPowerOfTwo(1), _precision);
        Ball term = Ball.FromInteger(1), sum = default;
        for (int k = 1; term.Midpoint.Sign != 0 && Approximation.Magnitude(term) > Bound.PowerOfTwo(-_precision); k++)
        {
            _cancellation.ThrowIfCancellationRequested();
            sum = Ball.Add(sum, term, _precision);
            term = Ball.Multiply(Ball.Multiply(term, step, _precision), Ball.FromInteger((2 * k) - 1), _precision);
        }

        sum = sum.Enlarge(Approximation.Magnitude(term));
        return Ball.Divide(Ball.Multiply(sum, _twoOverSqrtPi, _precision).ScaleByPowerOfTwo(-1), x, _precision);
    }
}
