using System.Numerics;

namespace GaussGen.Mathematics.Arithmetic;

/// <summary>The gamma function at half-integers, which is a rational multiple of √π (NIST DLMF 5.4.6, 5.5.1).</summary>
public static class HalfIntegerGamma
{
    /// <summary>Γ(k + ½) / √π, exactly: (2k−1)!! / 2^k, and (−2)^|k| / (2|k|−1)!! for negative k.</summary>
    public static Rational OverSqrtPi(int k)
    {
        int count = checked(System.Math.Abs(k));
        BigInteger odd = OddProduct(1, count);
        BigInteger power = BigInteger.One << count;
        return k >= 0
            ? new Rational(odd, power)
            : new Rational((count & 1) == 0 ? power : -power, odd);
    }

    /// <summary>Γ(k + ½), with a relative radius below 2^(4−precision).</summary>
    public static Ball Value(int k, int precision)
    {
        Ball ratio = Ball.FromRational(OverSqrtPi(k), precision + 2);
        return Ball.Multiply(ratio, Constants.SqrtPi(precision + 2), precision);
    }

    /// <summary>The product of <paramref name="count"/> successive odd numbers, halved so that the factors are of like size.</summary>
    private static BigInteger OddProduct(long first, int count)
    {
        if (count > 8)
        {
            int half = count / 2;
            return OddProduct(first, half) * OddProduct(first + (2L * half), count - half);
        }

        BigInteger product = BigInteger.One;
        for (int i = 0; i < count; i++)
        {
            product *= first + (2L * i);
        }

        return product;
    }
}
