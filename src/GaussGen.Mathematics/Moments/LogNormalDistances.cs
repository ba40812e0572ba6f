using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Moments;

/// <summary>aₖ = E |Y − 1|ᵏ for odd k, Y log-normal with mean 1 and log-standard-deviation s.</summary>
/// <remarks>
/// <para>
/// The sign of Y − 1 is that of Z − s/2, and E Yʲ sign(Y − 1) = Q^(j(j−1)/2) erf((j − ½) s/√2), Q = exp(s²) (complete the square). So aₖ is the k-th
/// difference Σ (−1)ᵏ⁻ʲ C(k, j) tⱼ of tⱼ = Q^(j(j−1)/2) erf((j − ½) s/√2): the way for large s, where little cancels.
/// </para>
/// <para>
/// Where s is small, tⱼ = e^(−s²/8) g((j − ½) s) with g(v) = e^(v²/2) erf(v/√2) = √(2/π) Σ v^(2i+1)/(2i+1)!! (NIST DLMF 7.6.2), and the k-th difference
/// of vⁿ at points with unit distance is k! times the complete homogeneous polynomial of degree n − k in the points (Milne-Thomson, The Calculus of
/// Finite Differences, 1933, 1.31). Hence, with σ = s/2 and h_i the complete homogeneous polynomials of −1, 1, 3, …, 2k − 1,
/// aₖ = e^(−s²/8) √(2/π) (k−1)!! sᵏ Σ σⁱ h_i k!!/(k+i)!! over even i. The generating function of h is 1/((1 − x²)(1 − 3x)…(1 − (2k−1)x)),
/// so that all terms are positive.
/// </para>
/// </remarks>
/// <param name="deviation">s.</param>
/// <param name="maximumOrder">The highest k.</param>
internal sealed class LogNormalDistances(Dyadic deviation, int maximumOrder)
{
    private const int MaximumPrecision = 1 << 16;

    /// <summary>aₖ at the indexes of odd k, with a relative radius near 2^−precision.</summary>
    internal Ball[] Evaluate(int precision, CancellationToken cancellation) =>
        deviation * new Dyadic(maximumOrder, 0) <= new Dyadic(2, 0)
            ? BySeries(precision + 24, cancellation)
            : ByDifferences(precision, cancellation);

    private Ball[] ByDifferences(int precision, CancellationToken cancellation)
    {
        for (int working = precision + 64; working <= MaximumPrecision;)
        {
            Ball[] differences = Values(working, cancellation);
            int accuracy = int.MaxValue;
            for (int order = 1; order < differences.Length; order++)
            {
                cancellation.ThrowIfCancellationRequested();
                for (int j = differences.Length - 1; j >= order; j--)
                {
                    differences[j] = Ball.Subtract(differences[j], differences[j - 1], working);
                }

                accuracy = (order & 1) == 0 ? accuracy : Math.Min(accuracy, differences[order].RelativeAccuracyBits);
            }

            if (accuracy >= precision)
            {
                return differences;
            }

            working += precision - accuracy + 32;
        }

        throw new RuleConstructionException(
            RuleFailure.RecurrenceNotDetermined,
            "The absolute moments need more bits than are allowed; ask for a lower order or another log-standard-deviation.");
    }

    /// <summary>tⱼ for j = 0 … maximum order.</summary>
    private Ball[] Values(int working, CancellationToken cancellation)
    {
        Ball ratio = Ball.Divide(Constants.Sqrt2(working), Constants.SqrtPi(working, cancellation), working);
        Ball q = Elementary.Exp(Ball.FromDyadic((deviation * deviation).Reduce()), working, cancellation);
        var values = new Ball[maximumOrder + 1];
        // Q^(j(j−1)/2) and Qʲ.
        Ball factor = ratio, power = Ball.FromInteger(1);
        for (int j = 0; j <= maximumOrder; j++)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic end = (deviation * new Dyadic((2 * j) - 1, -1)).Reduce();
            values[j] = Ball.Multiply(factor, NormalIntegral.FromZero(end, working, cancellation), working);
            factor = Ball.Multiply(factor, power, working);
            power = Ball.Multiply(power, q, working);
        }

        return values;
    }

    private Ball[] BySeries(int working, CancellationToken cancellation)
    {
        Dyadic half = deviation.ScaleByPowerOfTwo(-1);
        Ball factor = Ball.Divide(Constants.Sqrt2(working), Constants.SqrtPi(working, cancellation), working);
        Ball exponential = Elementary.Exp(Ball.FromDyadic(-(half * half).ScaleByPowerOfTwo(-1)), working, cancellation);
        factor = Ball.Multiply(Ball.Multiply(factor, exponential, working), Ball.FromDyadic(deviation), working);
        Ball square = Ball.FromDyadic((deviation * deviation).Reduce());
        var results = new Ball[maximumOrder + 1];
        var cuts = new (int Terms, Bound Remainder)[maximumOrder + 1];
        int terms = 0;
        for (int k = 1; k <= maximumOrder; k += 2)
        {
            cuts[k] = Cut(k, working, cancellation);
            terms = Math.Max(terms, cuts[k].Terms);
        }

        // σⁱ h_i, at first of −1 and 1.
        var polynomials = new Ball[terms];
        for (int i = 0; i < terms; i += 2)
        {
            polynomials[i] = Ball.FromDyadic(half).Pow(i, working);
        }

        for (int k = 1; k <= maximumOrder; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Ball point = Ball.FromDyadic(half * new Dyadic((2 * k) - 1, 0));
            for (int i = 1; k > 1 && i < terms; i++)
            {
                polynomials[i] = Ball.Add(polynomials[i], Ball.Multiply(point, polynomials[i - 1], working), working);
            }

            if ((k & 1) != 0)
            {
                results[k] = Ball.Multiply(factor, Sum(polynomials, k, cuts[k].Terms, working).Enlarge(cuts[k].Remainder), working);
                factor = Ball.Multiply(Ball.Multiply(factor, square, working), Ball.FromInteger(k + 1), working);
            }
        }

        return results;
    }

    /// <summary>Σ σⁱ h_i k!!/(k+i)!! over even i below an even number, by Horner's scheme.</summary>
    private static Ball Sum(Ball[] polynomials, int k, int terms, int working)
    {
        Ball sum = default;
        for (int i = terms - 2; i >= 0; i -= 2)
        {
            sum = Ball.Add(polynomials[i], Ball.Divide(sum, Ball.FromInteger(k + i + 2), working), working);
        }

        return sum;
    }

    /// <summary>An even number of terms for k, and a bound of the sum of all later ones, below 2^−working.</summary>
    /// <remarks>
    /// h_i has C(i+k, k) monomials, each at most (2k − 1)ⁱ, so that a term is at most C(i+k, k) (ks)ⁱ k!!/(k+i)!!. Two such bounds have the ratio
    /// (i+k+2)(i+k+1)(ks)²/((i+2)(i+1)(k+i+2)), which falls with i; where it is at most ½ the rest is at most twice the first bound of it.
    /// </remarks>
    private (int Terms, Bound Remainder) Cut(int k, int working, CancellationToken cancellation)
    {
        Dyadic reach = deviation * new Dyadic(k, 0), square = reach * reach;
        Bound term = Bound.PowerOfTwo(0);
        for (int i = 0; ; i += 2)
        {
            cancellation.ThrowIfCancellationRequested();
            Dyadic numerator = square * new Dyadic((long)(i + k + 2) * (i + k + 1), 0);
            var denominator = new Dyadic((long)(i + 2) * (i + 1) * (k + i + 2), 0);
            if (i > 0 && numerator.ScaleByPowerOfTwo(1) <= denominator && term.CeilingLog2 < -working - 1)
            {
                return (i, term.ScaleByPowerOfTwo(1));
            }

            term = Bound.DivideByAtLeast(term * Bound.FromDyadic(numerator), denominator);
        }
    }
}
