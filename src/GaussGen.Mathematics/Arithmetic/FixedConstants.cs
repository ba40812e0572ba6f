using System;
using System.Threading;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// Constants in fixed-size integers, for a first try. Each is off by less than one unit; a test holds them to <see cref="Constants"/>.
/// </summary>
internal static class FixedConstants
{
    /// <summary>1/√2.</summary>
    internal static FixedBall InverseSqrt2 => new(0xb504f333f9de6484, 0x597d89b3754abe9f, -128, false, 1);

    /// <summary>√2.</summary>
    internal static FixedBall Sqrt2 => InverseSqrt2.ScaleByPowerOfTwo(1);

    /// <summary>√π.</summary>
    internal static FixedBall SqrtPi => new(0xe2dfc48da77b553c, 0xe1d82906aedc9c1f, -127, false, 1);

    /// <summary>A constant that is also known at any precision.</summary>
    internal static RealNumber ToRealNumber(FixedBall first, Func<int, CancellationToken, Ball> enclose) =>
        new Constant(first, enclose);

    private sealed class Constant(FixedBall first, Func<int, CancellationToken, Ball> enclose) : RealNumber
    {
        public override FixedBall? FirstEnclosure => first;

        public override Ball Enclose(int precision, CancellationToken cancellation) => enclose(precision, cancellation);
    }
}
