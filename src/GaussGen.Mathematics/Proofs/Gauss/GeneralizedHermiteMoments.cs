using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>
/// The density proportional to |x|^(2μ) exp(−x²): m₂ₖ = Γ(μ + ½ + k)/Γ(μ + ½) = (μ + ½)(μ + 3/2) ⋯ (μ + k − ½), exactly (NIST DLMF 5.9.1, 5.5.1).
/// </summary>
/// <param name="exponent">μ, above −½.</param>
internal sealed class GeneralizedHermiteMoments(Dyadic exponent) : WeightMoments
{
    /// <inheritdoc/>
    public override bool IsEven => true;

    /// <inheritdoc/>
    public override Dyadic[] Exact(int count, CancellationToken cancellation)
    {
        var moments = new Dyadic[count];
        var product = new Dyadic(BigInteger.One, 0);
        for (int k = 0; k < count; k += 2)
        {
            cancellation.ThrowIfCancellationRequested();
            moments[k] = product;
            product *= exponent + new Dyadic(k + 1, -1);
        }

        return moments;
    }

    /// <inheritdoc/>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation) =>
        System.Array.ConvertAll(Exact(count, cancellation), moment => Ball.FromDyadic(moment).Trim(precision));
}
