using System;

namespace GaussGen.Tests;

/// <summary>
/// Gauss–Hermite rules for the standard normal density whose nodes and weights have closed forms: the zeros of He₁ … He₅ are
/// roots of linear and quadratic equations in x², and wᵢ = n!/(n He₍ₙ₋₁₎(xᵢ))² (Abramowitz &amp; Stegun 1964, 25.4.46).
/// </summary>
internal static class SmallRules
{
    public static (double[] Nodes, double[] Weights) Get(int points) => points switch
    {
        1 => ([0.0], [1.0]),
        2 => ([-1.0, 1.0], [0.5, 0.5]),
        3 => Mirror([Math.Sqrt(3.0)], [1.0 / 6.0], centre: 2.0 / 3.0),
        4 => Mirror(
            [Math.Sqrt(3.0 + Math.Sqrt(6.0)), Math.Sqrt(3.0 - Math.Sqrt(6.0))],
            [(3.0 - Math.Sqrt(6.0)) / 12.0, (3.0 + Math.Sqrt(6.0)) / 12.0],
            centre: null),
        5 => Mirror(
            [Math.Sqrt(5.0 + Math.Sqrt(10.0)), Math.Sqrt(5.0 - Math.Sqrt(10.0))],
            [(7.0 - (2.0 * Math.Sqrt(10.0))) / 60.0, (7.0 + (2.0 * Math.Sqrt(10.0))) / 60.0],
            centre: 8.0 / 15.0),
        _ => throw new ArgumentOutOfRangeException(nameof(points)),
    };

    public static (float[] Nodes, float[] Weights) GetSingle(int points)
    {
        (double[] nodes, double[] weights) = Get(points);
        return (Array.ConvertAll(nodes, x => (float)x), Array.ConvertAll(weights, w => (float)w));
    }

    /// <summary>E Zᵏ for a standard normal Z: (k − 1)!! for even k.</summary>
    public static double StandardMoment(int order)
    {
        if (order % 2 != 0)
        {
            return 0.0;
        }

        double product = 1.0;
        for (int factor = order - 1; factor > 1; factor -= 2)
        {
            product *= factor;
        }

        return product;
    }

    private static (double[] Nodes, double[] Weights) Mirror(double[] positive, double[] weights, double? centre)
    {
        int count = (2 * positive.Length) + (centre is null ? 0 : 1);
        double[] allNodes = new double[count];
        double[] allWeights = new double[count];
        for (int i = 0; i < positive.Length; i++)
        {
            allNodes[i] = -positive[i];
            allNodes[count - 1 - i] = positive[i];
            allWeights[i] = allWeights[count - 1 - i] = weights[i];
        }

        if (centre is double weight)
        {
            allWeights[count / 2] = weight;
        }

        return (allNodes, allWeights);
    }
}
