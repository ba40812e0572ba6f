using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>One normal component of a mixture.</summary>
/// <param name="Weight">Its weight, above zero.</param>
/// <param name="Mean">Its mean.</param>
/// <param name="StandardDeviation">Its standard deviation, above zero.</param>
internal readonly record struct MixtureComponent(Dyadic Weight, Dyadic Mean, Dyadic StandardDeviation);

/// <summary>
/// A finite mixture of normal densities: the sum over the components of weight · Σ k!/(2ʲ j! (k−2j)!) d^(k−2j) s²ʲ, d the distance of the mean
/// from c (NIST DLMF 5.4.6 and the binomial theorem). All terms of one component have one sign.
/// </summary>
internal sealed class NormalMixtureMoments : WeightMoments
{
    private readonly MixtureComponent[] _components;

    public NormalMixtureMoments(IEnumerable<MixtureComponent> components)
    {
        _components = [.. components.OrderBy(component => component.Mean)];
        // The mean of the outer means: where a mixture is symmetric at all, its centre.
        Center = (_components[0].Mean + _components[_components.Length - 1].Mean).ScaleByPowerOfTwo(-1).Reduce();
        IsEven = IsSymmetric();
    }

    /// <inheritdoc/>
    public override Dyadic Center { get; }

    /// <inheritdoc/>
    public override bool IsEven { get; }

    /// <inheritdoc/>
    public override Dyadic[] Exact(int count, CancellationToken cancellation) =>
        System.Array.ConvertAll(Evaluate(count, int.MaxValue, cancellation), moment => moment.Center.Reduce());

    /// <inheritdoc/>
    /// <remarks>Operations on single numbers that need not drop bits are exact.</remarks>
    protected override Ball[] Evaluate(int count, int precision, CancellationToken cancellation)
    {
        var moments = new Ball[count];
        foreach (MixtureComponent component in _components)
        {
            Ball distance = Ball.FromDyadic(component.Mean - Center);
            Ball square = Ball.Square(distance, precision);
            Ball variance = Ball.Square(Ball.FromDyadic(component.StandardDeviation), precision);
            Ball[] variances = Powers(variance, (count + 1) / 2, precision);
            for (int k = 0; k < count; k += IsEven ? 2 : 1)
            {
                cancellation.ThrowIfCancellationRequested();
                Ball moment = Sum(k, square, variances, precision);
                moment = k % 2 == 0 ? moment : Ball.Multiply(moment, distance, precision);
                moment = Ball.Multiply(moment, Ball.FromDyadic(component.Weight), precision);
                moments[k] = Ball.Add(moments[k], moment, precision);
            }
        }

        return moments;
    }

    /// <summary>Σ k!/(2ʲ j! (k−2j)!) d^(k−2j) s²ʲ without the odd factor d, by Horner's scheme in d².</summary>
    private static Ball Sum(int order, Ball square, Ball[] variances, int precision)
    {
        BigInteger coefficient = BigInteger.One;
        Ball sum = default;
        for (int j = 0; j <= order / 2; j++)
        {
            Ball term = Ball.Multiply(Ball.FromInteger(coefficient), variances[j], precision);
            sum = Ball.Add(Ball.Multiply(sum, square, precision), term, precision);
            int left = order - (2 * j);
            coefficient = coefficient * left * (left - 1) / (2 * (j + 1));
        }

        return sum;
    }

    private static Ball[] Powers(Ball factor, int count, int precision)
    {
        var powers = new Ball[count + 1];
        powers[0] = Ball.FromInteger(1);
        for (int k = 1; k <= count; k++)
        {
            powers[k] = Ball.Multiply(powers[k - 1], factor, precision);
        }

        return powers;
    }

    /// <summary>Whether the components with their means mirrored at c are the same ones.</summary>
    private bool IsSymmetric()
    {
        List<MixtureComponent> left = [.. _components];
        foreach (MixtureComponent component in _components)
        {
            Dyadic mirrored = Center + Center - component.Mean;
            int index = left.FindIndex(other => other.Mean == mirrored
                && other.Weight == component.Weight && other.StandardDeviation == component.StandardDeviation);
            if (index < 0)
            {
                return false;
            }

            left.RemoveAt(index);
        }

        return true;
    }
}
