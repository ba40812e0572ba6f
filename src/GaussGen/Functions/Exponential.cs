using System;
using System.Runtime.CompilerServices;

namespace GaussGen;

/// <summary>
/// The exponential function as a factor. exp(−(s + t)) = 2^k 2^(j/128) exp r, with 2^(j/128) from a table as head and tail (Tang
/// 1989, "Table-driven implementation of the exponential function in IEEE floating-point arithmetic"). Only additions, products
/// and bit patterns: no function of the host, and no fused product, whose result would differ from host to host.
/// </summary>
internal static class Exponential
{
    /// <summary>A number plus this, less this, is the nearest integer, for numbers up to 2^51.</summary>
    internal const double NearestInteger = 6755399441055744.0;

    private const long HeadMask = ~0x7FFFFFFL;

    /// <summary>The 26 leading bits of a number.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Head(double x) => BitConverter.Int64BitsToDouble(BitConverter.DoubleToInt64Bits(x) & HeadMask);

    /// <summary>A magnitude with the sign of another number.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double WithSign(double magnitude, double sign) => BitConverter.Int64BitsToDouble(
        BitConverter.DoubleToInt64Bits(magnitude) | (BitConverter.DoubleToInt64Bits(sign) & long.MinValue));

    /// <summary>x² = result + rest: the result exact, as the square of the 26 leading bits (Cody 1969, "Rational Chebyshev approximations for the error function").</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Square(double x, out double rest)
    {
        double head = Head(x);
        rest = (x - head) * (x + head);
        return head * head;
    }

    /// <summary>(result + low)·2^k = exp(−(s + t))·(head + rest); the result is exactly the product of two heads.</summary>
    /// <param name="s">The exponent's main part.</param>
    /// <param name="t">A small part beside it.</param>
    /// <param name="head">The factor's head, of at most 26 bits (27 do where the table's head leaves room).</param>
    /// <param name="rest">The factor's rest.</param>
    /// <param name="low">What is to be added to the result.</param>
    /// <param name="k">The power of two.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Product(double s, double t, double head, double rest, out double low, out int k)
    {
        double grown = Reduced(s, t, out int index);
        ReadOnlySpan<double> power = FunctionTables.Powers.Slice((index & 127) * 2, 2);
        double powerHead = power[0];
        double powerRest = power[1] + ((powerHead + power[1]) * grown);
        low = (powerHead * rest) + (powerRest * (head + rest));
        k = index >> 7;
        return powerHead * head;
    }

    /// <summary>exp(−(s + t))/√(2π), rounded. A table of its own has the factor in it already, which saves a product.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double TimesPeakDensity(double s, double t)
    {
        double grown = Reduced(s, t, out int index);
        ReadOnlySpan<double> power = FunctionTables.DensityPowers.Slice((index & 127) * 2, 2);
        double head = power[0];
        return Scale(head + (power[1] + ((head + power[1]) * grown)), index >> 7);
    }

    /// <summary>exp(−(s + t)) = 2^(index/128)·(1 + result).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static double Reduced(double s, double t, out int index)
    {
        double shifted = (s * -FunctionTables.StepsPerUnit) + NearestInteger;
        double n = shifted - NearestInteger;

        // The integer stands in the last bits of the shifted number, where no conversion has to be waited for.
        index = (int)BitConverter.DoubleToInt64Bits(shifted);
        double r = ((-s - (n * FunctionTables.StepHead)) - (n * FunctionTables.StepTail)) - t;
        double square = r * r;
        return r + (square * ((0.5 + (r * (1.0 / 6.0))) + (square * ((1.0 / 24.0) + (r * (1.0 / 120.0))))));
    }

    /// <summary>exp(−(s + t))·(head + rest), rounded.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Times(double s, double t, double head, double rest)
    {
        double high = Product(s, t, head, rest, out double low, out int k);
        return Scale(high + low, k);
    }

    /// <summary>value·2^k, rounded once more only where the result is subnormal; |value| is from 2^−100 to 2^100.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double Scale(double value, int k) =>
        (uint)(k + 900) <= 1800u ? value * PowerOfTwo(k) : ScaleFar(value, k);

    /// <summary>2^k for k from −1022 to 1023.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static double PowerOfTwo(int k) => BitConverter.Int64BitsToDouble((long)(k + 1023) << 52);

    private static double ScaleFar(double value, int k) => k switch
    {
        < -1500 => 0.0,
        < 0 => value * PowerOfTwo(-800) * PowerOfTwo(k + 800),
        _ => value * PowerOfTwo(800) * PowerOfTwo(k - 800),
    };
}
