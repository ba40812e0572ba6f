using System.Linq;
using System.Numerics;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Approximations;

/// <summary>How real numbers are split into the binary64 numbers of a table.</summary>
internal static class TableNumbers
{
    /// <summary>Bits of a head: the product of two heads is exact in binary64.</summary>
    internal const int HeadBits = 26;

    /// <summary>The nearest binary64 number.</summary>
    internal static ulong Nearest(Ball value) => BinaryFormat.Binary64.Round(value.Center);

    /// <summary>The head of 26 bits, and the binary64 number nearest to what it leaves.</summary>
    internal static ulong[] HeadAndTail(Ball value) =>
        Split(value, value.Center.BitLength + value.Center.Exponent - HeadBits);

    /// <summary>The nearest multiple of a power of two, and the binary64 number nearest to what it leaves.</summary>
    internal static ulong[] Split(Ball value, int unitExponent)
    {
        Dyadic units = value.Center.ScaleByPowerOfTwo(-unitExponent) + new Dyadic(1, -1);
        BigInteger whole = units.Exponent >= 0 ? units.Mantissa << units.Exponent : units.Mantissa >> -units.Exponent;
        var head = new Dyadic(whole, unitExponent);
        return [BinaryFormat.Binary64.Round(head), BinaryFormat.Binary64.Round(value.Center - head)];
    }

    /// <summary>A row: the constant as head and tail, then the other coefficients.</summary>
    internal static ulong[] Row(Ball[] coefficients) =>
        [.. HeadAndTail(coefficients[0]), .. coefficients.Skip(1).Select(Nearest)];
}
