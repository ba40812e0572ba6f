using System.Numerics;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Nested;

/// <summary>A polynomial with integer coefficients, in exact arithmetic.</summary>
/// <param name="coefficients">The coefficients, the constant first; the last one is not zero.</param>
internal sealed class IntegerPolynomial(params BigInteger[] coefficients)
{
    /// <summary>The degree.</summary>
    internal int Degree => coefficients.Length - 1;

    /// <summary>The coefficient of a power.</summary>
    internal BigInteger this[int power] => coefficients[power];

    /// <summary>The product.</summary>
    internal IntegerPolynomial Times(IntegerPolynomial other)
    {
        var product = new BigInteger[Degree + other.Degree + 1];
        for (int i = 0; i <= Degree; i++)
        {
            for (int j = 0; j <= other.Degree; j++)
            {
                product[i + j] += coefficients[i] * other[j];
            }
        }

        return new IntegerPolynomial(product);
    }

    /// <summary>The derivative; the degree is at least 1.</summary>
    internal IntegerPolynomial Derivative()
    {
        var derivative = new BigInteger[Degree];
        for (int i = 1; i <= Degree; i++)
        {
            derivative[i - 1] = i * coefficients[i];
        }

        return new IntegerPolynomial(derivative);
    }

    /// <summary>The value at a point, exactly.</summary>
    internal Dyadic At(Dyadic point)
    {
        Dyadic value = Dyadic.Zero;
        for (int i = Degree; i >= 0; i--)
        {
            value = (value * point) + new Dyadic(coefficients[i], 0);
        }

        return value;
    }

    /// <summary>The value at a rational point, exactly.</summary>
    internal Rational At(Rational point)
    {
        Rational value = Rational.Zero;
        for (int i = Degree; i >= 0; i--)
        {
            value = (value * point) + coefficients[i];
        }

        return value;
    }

    /// <summary>A ball around the values at the points of a ball.</summary>
    internal Ball At(Ball point, int precision)
    {
        Ball value = default;
        for (int i = Degree; i >= 0; i--)
        {
            value = Ball.Add(Ball.Multiply(value, point, precision), Ball.FromInteger(coefficients[i]), precision);
        }

        return value;
    }
}
