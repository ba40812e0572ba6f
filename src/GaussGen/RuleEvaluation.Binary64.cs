using System;
using System.Runtime.CompilerServices;

namespace GaussGen;

public static partial class RuleEvaluation
{
    /// <summary>The sum over a symmetric rule: Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <typeparam name="TIntegrand">The type of the integrand.</typeparam>
    /// <param name="nodes">The nodes, ascending; node n − 1 − i is the opposite of node i.</param>
    /// <param name="weights">Their weights, as many; weight n − 1 − i equals weight i.</param>
    /// <param name="mean">Where a node of zero is carried to.</param>
    /// <param name="scale">
    /// What a node is multiplied by: the standard deviation, times √2 for a rule of the weight exp(−x²).
    /// </param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum; f(mean) itself where the scale is 0.</returns>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double Symmetric<TIntegrand>(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double> =>
        Symmetric(nodes, weights, mean, scale, 1.0, integrand);

    /// <summary>The sum over a symmetric rule, times a factor: factor · Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <typeparam name="TIntegrand">The type of the integrand.</typeparam>
    /// <param name="nodes">The nodes, ascending; node n − 1 − i is the opposite of node i.</param>
    /// <param name="weights">Their weights, as many; weight n − 1 − i equals weight i.</param>
    /// <param name="mean">Where a node of zero is carried to.</param>
    /// <param name="scale">
    /// What a node is multiplied by: the standard deviation, times √2 for a rule of the weight exp(−x²).
    /// </param>
    /// <param name="factor">One over the sum of the weights, for an expectation; it is applied to the finished sum.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum times the factor; f(mean) itself, without the factor, where the scale is 0.</returns>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static double Symmetric<TIntegrand>(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, double factor, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>
    {
        RequireEqualLengths(nodes.Length, weights.Length);
        if (scale == 0.0)
        {
            return integrand.Evaluate(mean);
        }

        // Both pieces have the length that limits the loop: that is what lets the JIT drop the bounds checks.
        int half = nodes.Length / 2;
        ReadOnlySpan<double> halfNodes = nodes.Slice(0, half);
        ReadOnlySpan<double> halfWeights = weights.Slice(0, half);
        double sum = 0.0;
        for (int i = 0; i < halfNodes.Length; i++)
        {
            double offset = scale * halfNodes[i];
            sum += halfWeights[i] * (integrand.Evaluate(mean + offset) + integrand.Evaluate(mean - offset));
        }

        if ((nodes.Length & 1) != 0)
        {
            sum += weights[half] * integrand.Evaluate(mean);
        }

        return factor * sum;
    }

    /// <summary>The sum over a symmetric rule: Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <param name="nodes">The nodes, ascending; node n − 1 − i is the opposite of node i.</param>
    /// <param name="weights">Their weights, as many; weight n − 1 − i equals weight i.</param>
    /// <param name="mean">Where a node of zero is carried to.</param>
    /// <param name="scale">
    /// What a node is multiplied by: the standard deviation, times √2 for a rule of the weight exp(−x²).
    /// </param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum; f(mean) itself where the scale is 0.</returns>
    /// <exception cref="ArgumentNullException">The integrand is <c>null</c>.</exception>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double Symmetric(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, Func<double, double> integrand) =>
        Symmetric(nodes, weights, mean, scale, 1.0, integrand);

    /// <summary>The sum over a symmetric rule, times a factor: factor · Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <param name="nodes">The nodes, ascending; node n − 1 − i is the opposite of node i.</param>
    /// <param name="weights">Their weights, as many; weight n − 1 − i equals weight i.</param>
    /// <param name="mean">Where a node of zero is carried to.</param>
    /// <param name="scale">
    /// What a node is multiplied by: the standard deviation, times √2 for a rule of the weight exp(−x²).
    /// </param>
    /// <param name="factor">One over the sum of the weights, for an expectation; it is applied to the finished sum.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum times the factor; f(mean) itself, without the factor, where the scale is 0.</returns>
    /// <exception cref="ArgumentNullException">The integrand is <c>null</c>.</exception>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double Symmetric(
        ReadOnlySpan<double> nodes,
        ReadOnlySpan<double> weights,
        double mean,
        double scale,
        double factor,
        Func<double, double> integrand)
    {
        RequireIntegrand(integrand);
        return Symmetric(nodes, weights, mean, scale, factor, new DelegateIntegrand<double>(integrand));
    }

    /// <summary>The sum over a rule of any shape, symmetric or not: Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <typeparam name="TIntegrand">The type of the integrand.</typeparam>
    /// <param name="nodes">The nodes, ascending.</param>
    /// <param name="weights">Their weights, as many.</param>
    /// <param name="mean">Where a node of zero is carried to; 0 for a weight function without a free location.</param>
    /// <param name="scale">What a node is multiplied by; 1 for a weight function without a free scale.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum; f(mean) itself where the scale is 0.</returns>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double General<TIntegrand>(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double> =>
        General(nodes, weights, mean, scale, 1.0, integrand);

    /// <summary>The sum over a rule of any shape, symmetric or not, times a factor: factor · Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <typeparam name="TIntegrand">The type of the integrand.</typeparam>
    /// <param name="nodes">The nodes, ascending.</param>
    /// <param name="weights">Their weights, as many.</param>
    /// <param name="mean">Where a node of zero is carried to; 0 for a weight function without a free location.</param>
    /// <param name="scale">What a node is multiplied by; 1 for a weight function without a free scale.</param>
    /// <param name="factor">One over the sum of the weights, for an expectation; it is applied to the finished sum.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum times the factor; f(mean) itself, without the factor, where the scale is 0.</returns>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static double General<TIntegrand>(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, double factor, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>
    {
        RequireEqualLengths(nodes.Length, weights.Length);
        if (scale == 0.0)
        {
            return integrand.Evaluate(mean);
        }

        // Each half runs towards the middle with a sum of its own. Every loop is limited by the common length of the pieces it
        // reads: that is what lets the JIT drop the bounds checks. The unsigned comparison ends the downward loop below 0.
        int half = nodes.Length / 2;
        ReadOnlySpan<double> lowNodes = nodes.Slice(0, half);
        ReadOnlySpan<double> lowWeights = weights.Slice(0, half);
        double low = 0.0;
        for (int i = 0; i < lowNodes.Length; i++)
        {
            low += lowWeights[i] * integrand.Evaluate(mean + (scale * lowNodes[i]));
        }

        ReadOnlySpan<double> highNodes = nodes.Slice(nodes.Length - half, half);
        ReadOnlySpan<double> highWeights = weights.Slice(nodes.Length - half, half);
        double high = 0.0;
        for (int i = highNodes.Length - 1; (uint)i < (uint)highNodes.Length; i--)
        {
            high += highWeights[i] * integrand.Evaluate(mean + (scale * highNodes[i]));
        }

        double sum = low + high;
        if ((nodes.Length & 1) != 0)
        {
            sum += weights[half] * integrand.Evaluate(mean + (scale * nodes[half]));
        }

        return factor * sum;
    }

    /// <summary>The sum over a rule of any shape, symmetric or not: Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <param name="nodes">The nodes, ascending.</param>
    /// <param name="weights">Their weights, as many.</param>
    /// <param name="mean">Where a node of zero is carried to; 0 for a weight function without a free location.</param>
    /// <param name="scale">What a node is multiplied by; 1 for a weight function without a free scale.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum; f(mean) itself where the scale is 0.</returns>
    /// <exception cref="ArgumentNullException">The integrand is <c>null</c>.</exception>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double General(
        ReadOnlySpan<double> nodes, ReadOnlySpan<double> weights, double mean, double scale, Func<double, double> integrand) =>
        General(nodes, weights, mean, scale, 1.0, integrand);

    /// <summary>The sum over a rule of any shape, symmetric or not, times a factor: factor · Σ wᵢ f(mean + scale · xᵢ).</summary>
    /// <param name="nodes">The nodes, ascending.</param>
    /// <param name="weights">Their weights, as many.</param>
    /// <param name="mean">Where a node of zero is carried to; 0 for a weight function without a free location.</param>
    /// <param name="scale">What a node is multiplied by; 1 for a weight function without a free scale.</param>
    /// <param name="factor">One over the sum of the weights, for an expectation; it is applied to the finished sum.</param>
    /// <param name="integrand">The function.</param>
    /// <returns>The sum times the factor; f(mean) itself, without the factor, where the scale is 0.</returns>
    /// <exception cref="ArgumentNullException">The integrand is <c>null</c>.</exception>
    /// <exception cref="ArgumentException">There are not as many weights as nodes.</exception>
    public static double General(
        ReadOnlySpan<double> nodes,
        ReadOnlySpan<double> weights,
        double mean,
        double scale,
        double factor,
        Func<double, double> integrand)
    {
        RequireIntegrand(integrand);
        return General(nodes, weights, mean, scale, factor, new DelegateIntegrand<double>(integrand));
    }
}
