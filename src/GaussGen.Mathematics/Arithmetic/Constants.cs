using System.Collections.Concurrent;
using System.Numerics;
using System.Threading;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>Mathematical constants as balls. Each is computed once a precision class and remembered; all members are thread-safe.</summary>
public static class Constants
{
    private static readonly ConcurrentDictionary<int, Ball> PiByClass = new();
    private static readonly ConcurrentDictionary<int, Ball> Ln2ByClass = new();
    private static readonly ConcurrentDictionary<int, Ball> SqrtPiByClass = new();
    private static readonly ConcurrentDictionary<int, Ball> Sqrt2ByClass = new();

    /// <summary>π, with a radius below 2^(3−precision).</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public static Ball Pi(int precision, CancellationToken cancellation = default)
    {
        int size = ClassOf(precision);
        if (!PiByClass.TryGetValue(size, out Ball value))
        {
            // π = 16 arctan(1/5) − 4 arctan(1/239): Machin (1706).
            value = Sum(size, cancellation, (16, 5, true), (-4, 239, true));
            PiByClass[size] = value;
        }

        return value.Trim(precision);
    }

    /// <summary>The natural logarithm of 2, with a radius below 2^(3−precision).</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public static Ball Ln2(int precision, CancellationToken cancellation = default)
    {
        int size = ClassOf(precision);
        if (!Ln2ByClass.TryGetValue(size, out Ball value))
        {
            // ln 2 = 18 artanh(1/26) − 2 artanh(1/4801) + 8 artanh(1/8749), a relation of Machin's kind: with
            // 2 artanh(1/q) = ln((q+1)/(q−1)) it reads (27/25)⁹ (4800/4802) (8750/8748)⁴ = 2.
            value = Sum(size, cancellation, (18, 26, false), (-2, 4801, false), (8, 8749, false));
            Ln2ByClass[size] = value;
        }

        return value.Trim(precision);
    }

    /// <summary>√π, with a radius below 2^(3−precision).</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public static Ball SqrtPi(int precision, CancellationToken cancellation = default)
    {
        int size = ClassOf(precision);
        if (!SqrtPiByClass.TryGetValue(size, out Ball value))
        {
            value = Ball.Sqrt(Pi(size, cancellation), size);
            SqrtPiByClass[size] = value;
        }

        return value.Trim(precision);
    }

    /// <summary>√2, with a radius below 2^(3−precision).</summary>
    public static Ball Sqrt2(int precision)
    {
        int size = ClassOf(precision);
        if (!Sqrt2ByClass.TryGetValue(size, out Ball value))
        {
            value = Ball.Sqrt(Ball.FromInteger(2), size);
            Sqrt2ByClass[size] = value;
        }

        return value.Trim(precision);
    }

    /// <summary>
    /// The precision that is computed when another is asked: the least 2^k or 3·2^(k−1) with at least 16 bits to spare. It
    /// depends on the asked precision alone and never on what was asked before, so that results do not depend on history.
    /// </summary>
    private static int ClassOf(int precision)
    {
        int size = 128;
        while (size < precision + 16L)
        {
            size = checked((size & (size - 1)) == 0 ? size + (size / 2) : size / 3 * 4);
        }

        return size;
    }

    /// <summary>Σ factor · arctan(1/q) or Σ factor · artanh(1/q), with a radius below 2^−precision.</summary>
    private static Ball Sum(int precision, CancellationToken cancellation, params (int Factor, int Q, bool Alternating)[] terms)
    {
        int bits = checked(precision + 32);
        BigInteger sum = BigInteger.Zero;
        ulong units = 0;
        foreach ((int factor, int q, bool alternating) in terms)
        {
            sum += factor * InverseArgument(q, bits, alternating, cancellation, out ulong error);
            units += (ulong)System.Math.Abs(factor) * error;
        }

        return new Ball(sum, -bits, Bound.FromParts(units, -bits));
    }

    /// <summary>arctan(1/q) or artanh(1/q) in units of 2^−bits, off by less than <paramref name="error"/> units, q at least 2.</summary>
    /// <remarks>
    /// Σ (±1)^i q^−(2i+1) / (2i+1), both divisions rounded down. The power is too small by less than 1 + 1/q² + … &lt; 2 units, so that
    /// each term is off by less than 3, and what follows the first power below one unit sums to less than 2/(1 − 1/q²) ≤ 3.
    /// </remarks>
    private static BigInteger InverseArgument(int q, int bits, bool alternating, CancellationToken cancellation, out ulong error)
    {
        BigInteger square = q * q;
        BigInteger power = (BigInteger.One << bits) / q;
        BigInteger sum = BigInteger.Zero;
        int index = 0;
        for (; !power.IsZero; index++)
        {
            cancellation.ThrowIfCancellationRequested();
            BigInteger term = power / ((2 * index) + 1);
            sum = alternating && (index & 1) != 0 ? sum - term : sum + term;
            power /= square;
        }

        error = (3UL * (ulong)index) + 3;
        return sum;
    }
}
