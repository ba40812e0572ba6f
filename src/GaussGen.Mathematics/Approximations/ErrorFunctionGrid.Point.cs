using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Approximations;

/// <content>One point and its series.</content>
public sealed partial class ErrorFunctionGrid
{
    private sealed class GridPoint
    {
        private readonly ErrorFunctionGrid _grid;
        private readonly Ball[] _coefficients;
        private readonly Ball _factor;
        private readonly Bound _rest;

        internal GridPoint(Dyadic center, Ball tail, ErrorFunctionGrid grid)
        {
            (Center, Tail, _grid) = (center, tail, grid);
            int precision = grid._precision;
            _factor = Ball.Multiply(grid.ExpOfMinusSquare(Ball.FromDyadic(center)), grid._twoOverSqrtPi, precision);

            // 4.999 N >= precision + 42, so that the rest is below 2^-precision.
            int count = ((precision + 42) / 4) + 1;
            while ((count - 1) * 4999 >= (precision + 42) * 1000)
            {
                count--;
            }

            _rest = Bound.PowerOfTwo(-precision);
            _coefficients = new Ball[count];
            Ball before = default;
            Ball current = Ball.FromInteger(1);
            Ball twice = Ball.FromDyadic(center.ScaleByPowerOfTwo(1));
            for (int n = 0; n < count; n++)
            {
                _coefficients[n] = Ball.Divide(current, Ball.FromInteger(n + 1), precision);
                Ball next = Ball.Add(Ball.Multiply(twice, current, precision), before.ScaleByPowerOfTwo(1), precision);
                (before, current) = (current, Ball.Divide(next, Ball.FromInteger(-(n + 1)), precision));
            }
        }

        internal Dyadic Center { get; }

        /// <summary>erfc at the point.</summary>
        internal Ball Tail { get; }

        internal Ball Erfc(Ball offset) => Ball.Subtract(Tail, Change(offset), _grid._precision);

        /// <summary>erf(c + h) − erf c.</summary>
        internal Ball Change(Ball offset)
        {
            int precision = _grid._precision;
            Ball sum = _coefficients[_coefficients.Length - 1];
            for (int n = _coefficients.Length - 2; n >= 0; n--)
            {
                sum = Ball.Add(Ball.Multiply(sum, offset, precision), _coefficients[n], precision);
            }

            return Ball.Multiply(Ball.Multiply(sum.Enlarge(_rest), offset, precision), _factor, precision);
        }
    }
}
