using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The anti-Gaussian rule of a Gauss–Hermite rule (Laurie 1996; see <see cref="AntiGaussSource"/>), with the polynomial's coefficients from their
/// closed form, which is quick for large rules too.
/// </summary>
/// <remarks>
/// For the normal density of variance v, and exp(−x²) is √π times that of variance ½: the monic orthogonal polynomial of degree d is
/// Σ d!/(j! (d−2j)!) (−v/2)ʲ x^(d−2j) (NIST DLMF 18.5.13), bₖ = k v (18.9.1), and in t = x² the members of one parity obey
/// Pₖ₊₂ = (t − v(2k+1)) Pₖ − v² k(k−1) Pₖ₋₂. The moments are m₂ₖ = 2ᵏ (½)(3/2) ⋯ (k − ½) vᵏ.
/// </remarks>
internal sealed class HermiteAntiGaussSource : RuleSource
{
    private readonly int _gaussPoints;
    private readonly int _varianceLog2;
    private readonly bool _isDensity;

    /// <summary>The companion of a rule with the given number of nodes.</summary>
    public HermiteAntiGaussSource(int gaussPoints, HermiteWeight weight)
        : base(MomentsOf(weight), gaussPoints + 1)
    {
        _gaussPoints = gaussPoints;
        _isDensity = weight == HermiteWeight.StandardNormalDensity;
        _varianceLog2 = _isDensity ? 0 : -1;
    }

    /// <inheritdoc/>
    public override Ball Total(int precision, CancellationToken cancellation) =>
        _isDensity ? Ball.FromInteger(1) : Constants.SqrtPi(precision, cancellation);

    /// <inheritdoc/>
    public override RuleLevel? At(int precision, CancellationToken cancellation, out int wanted)
    {
        wanted = precision;
        var ratio = new Dyadic(_gaussPoints, _varianceLog2);
        Dyadic[] coefficients = Polynomial(_gaussPoints + 1);
        Dyadic[] subtracted = Polynomial(_gaussPoints - 1);
        for (int k = 0; k < subtracted.Length; k++)
        {
            coefficients[k] -= ratio * subtracted[k];
        }

        var diagonal = new Ball[Zeros];
        var squares = new Ball[Zeros];
        for (int index = 0; index < Zeros; index++)
        {
            int k = (2 * index) + Parity;
            var last = index == Zeros - 1 ? ratio : Dyadic.Zero;
            diagonal[index] = Ball.FromDyadic(new Dyadic((2 * k) + 1, _varianceLog2) + last);
            squares[index] = Ball.FromDyadic(new Dyadic(k * (k - 1), 2 * _varianceLog2));
        }

        return Level(
            System.Array.ConvertAll(coefficients, coefficient => Ball.FromDyadic(coefficient).Trim(precision)),
            Moments.Enclose((2 * _gaussPoints) + 2, precision, cancellation),
            new ZeroCount(diagonal, squares, precision),
            precision,
            cancellation);
    }

    /// <inheritdoc/>
    public override ExactRule? Exact(CancellationToken cancellation) => null;

    private static WeightMoments MomentsOf(HermiteWeight weight)
    {
        var one = new Dyadic(1, 0);
        return weight == HermiteWeight.StandardNormalDensity
            ? new NormalMixtureMoments([new MixtureComponent(one, Dyadic.Zero, one)])
            : new GeneralizedHermiteMoments(Dyadic.Zero);
    }

    /// <summary>The coefficients in t, without a factor x, ascending.</summary>
    private Dyadic[] Polynomial(int degree)
    {
        int half = degree / 2;
        var coefficients = new Dyadic[half + 1];
        // d!/(j! (d−2j)!), which is (2j)!/j! times a binomial coefficient.
        BigInteger count = BigInteger.One;
        for (int j = 0; j <= half; j++)
        {
            coefficients[half - j] = new Dyadic(j % 2 == 0 ? count : -count, j * (_varianceLog2 - 1));
            int left = degree - (2 * j);
            count = count * left * (left - 1) / (j + 1);
        }

        return coefficients;
    }
}
