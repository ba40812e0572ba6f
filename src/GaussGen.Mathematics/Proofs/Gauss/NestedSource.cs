using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The nested rules for the standard normal density (Genz and Keister 1996, "Fully symmetric interpolatory rules for multiple integrals over
/// infinite regions with Gaussian weight"): Ω = x E₁(x²) E₂(x²) ⋯, where the factor E_p has as few conditions as it has coefficients.
/// </summary>
/// <remarks>
/// <para>
/// With Ω₀ = x and Ω_p = Ω_(p−1) E_p, E_p monic of degree q = 1, 3, 5, 8 in t = x², E_p is what makes ∫ Ω_p xʲ w = 0 for j = 1, 3, …, 2q − 1.
/// For even j the integral is zero by symmetry, so it is for all j ≤ 2q: an interpolatory rule on the N zeros is exact to degree
/// N − 1 for any nodes, and here to N + 2q, as the quotient of a polynomial of that degree by Ω_p has degree 2q at most. That gives the
/// degrees 5, 15, 29, 51. The zeros of one rule are among those of the next, which has its factors.
/// </para>
/// <para>
/// With sₖ = ∫ R(x²) x²ᵏ⁺² w for Ω_(p−1) = x R(x²), the conditions are Σ eₗ sₗ₊ᵢ = −s_(q+i), i &lt; q, solved by elimination in balls; pivots that
/// are not zero prove that E_p is the only solution. That its zeros are real is proven by their sign changes.
/// </para>
/// </remarks>
internal sealed class NestedSource : RuleSource
{
    private static readonly int[] FactorDegrees = [1, 3, 5, 8];
    private static readonly int[] PointCounts = [1, 3, 9, 19, 35];
    private static readonly int[] Degrees = [1, 5, 15, 29, 51];

    private readonly int _level;

    /// <summary>The rule of a level from 1 to 4; that of level 0 is a Gauss rule.</summary>
    public NestedSource(WeightMoments standardNormal, int level)
        : base(standardNormal, PointCounts[level]) => _level = level;

    /// <summary>The number of points of a level.</summary>
    public static int PointsOf(int level) => PointCounts[level];

    /// <summary>What a claim of a level promises.</summary>
    public static RulePromise Promise(int level, bool dropZeroWeights, bool hasErrorEstimate)
    {
        var one = new Dyadic(1, 0);
        var normal = new NormalMixtureMoments([new MixtureComponent(one, Dyadic.Zero, one)]);
        RuleSource? companion = !hasErrorEstimate ? null : level == 0 ? new AntiGaussSource(normal, 1) : Of(normal, level - 1);
        Rational factor = level == 0 ? new Rational(1, 2) : Rational.One;
        return new RulePromise(Of(normal, level), Degrees[level], dropZeroWeights, companion, factor);
    }

    /// <inheritdoc/>
    public override RuleLevel? At(int precision, CancellationToken cancellation, out int wanted)
    {
        wanted = 2 * precision;
        Ball[] moments = Moments.Enclose(2 * PointCounts[_level], precision, cancellation);
        Ball[] functional = InCoordinate(moments, isEven: true, parity: 1);
        Ball[] product = [Ball.FromInteger(1)];
        for (int factor = 0; factor < _level; factor++)
        {
            if (Factor(product, functional, FactorDegrees[factor], precision, cancellation) is not { } next)
            {
                return null;
            }

            product = Multiply(product, next, precision);
        }

        return Level(product, moments, count: null, precision, cancellation);
    }

    /// <inheritdoc/>
    public override ExactRule? Exact(CancellationToken cancellation) => null;

    /// <inheritdoc/>
    /// <remarks>Steps of 1/64 in x, far less than the distance of two nodes, to 16, beyond the outermost node.</remarks>
    public override List<(Dyadic Low, Dyadic High)>? Grid(NodePolynomial polynomial, CancellationToken cancellation)
    {
        const int Log2Steps = 6, Last = 16 << Log2Steps;
        var changes = new List<(Dyadic Low, Dyadic High)>();
        Dyadic before = Dyadic.Zero;
        int? sign = polynomial.Sign(before);
        for (int step = 1; step <= Last; step++)
        {
            cancellation.ThrowIfCancellationRequested();
            var point = new Dyadic(step * step, -2 * Log2Steps);
            int? next = polynomial.Sign(point);
            if (next is null)
            {
                continue;
            }

            if (sign is not null && next != sign)
            {
                changes.Add((before, point));
            }

            (before, sign) = (point, next);
        }

        return changes;
    }

    private static RuleSource Of(WeightMoments normal, int level) => level == 0 ? new GaussSource(normal, 1) : new NestedSource(normal, level);

    /// <summary>The coefficients of E_p, ascending; <c>null</c> where a pivot may be zero.</summary>
    private static Ball[]? Factor(Ball[] product, Ball[] functional, int degree, int precision, CancellationToken cancellation)
    {
        var sums = new Ball[2 * degree];
        for (int k = 0; k < sums.Length; k++)
        {
            for (int j = 0; j < product.Length; j++)
            {
                sums[k] = Ball.Add(sums[k], Ball.Multiply(product[j], functional[j + k], precision), precision);
            }
        }

        var rows = new Ball[degree][];
        for (int i = 0; i < degree; i++)
        {
            rows[i] = new Ball[degree + 1];
            for (int l = 0; l < degree; l++)
            {
                rows[i][l] = sums[i + l];
            }

            rows[i][degree] = Ball.Negate(sums[degree + i]);
        }

        return LinearSystem.Solve(rows, precision, cancellation) is { } solution
            ? [.. solution, Ball.FromInteger(1)]
            : null;
    }

    private static Ball[] Multiply(Ball[] left, Ball[] right, int precision)
    {
        var product = new Ball[left.Length + right.Length - 1];
        for (int i = 0; i < left.Length; i++)
        {
            for (int j = 0; j < right.Length; j++)
            {
                product[i + j] = Ball.Add(product[i + j], Ball.Multiply(left[i], right[j], precision), precision);
            }
        }

        return product;
    }
}
