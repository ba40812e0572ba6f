using System;

namespace GaussGen.Benchmarks;

/// <summary>What a careful programmer writes over a rule's constants.</summary>
internal static class HandWritten<TTable>
    where TTable : struct, ITable
{
    /// <summary>One node after another.</summary>
    public static double Plain<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>
    {
        ReadOnlySpan<double> nodes = TTable.Nodes;
        ReadOnlySpan<double> weights = TTable.Weights;
        double sum = 0.0;
        for (int i = 0; i < nodes.Length && i < weights.Length; i++)
        {
            sum += weights[i] * integrand.Evaluate(mean + (standardDeviation * nodes[i]));
        }

        return sum;
    }

    /// <summary>Two opposite nodes at a time, which saves half of the multiplications by nodes and weights.</summary>
    public static double InPairs<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>
    {
        ReadOnlySpan<double> nodes = TTable.Nodes;
        ReadOnlySpan<double> weights = TTable.Weights;
        double sum = 0.0;
        for (int i = 0; i < TTable.PointCount / 2; i++)
        {
            double offset = standardDeviation * nodes[i];
            sum += weights[i] * (integrand.Evaluate(mean + offset) + integrand.Evaluate(mean - offset));
        }

        return TTable.PointCount % 2 == 0 ? sum : sum + (weights[TTable.PointCount / 2] * integrand.Evaluate(mean));
    }

    /// <summary>The same with what <c>Expectation</c> promises: a checked standard deviation, and exactness at zero.</summary>
    public static double WithChecks<TIntegrand>(double mean, double standardDeviation, TIntegrand integrand)
        where TIntegrand : struct, IIntegrand<double>
    {
        if (!(standardDeviation >= 0.0 && standardDeviation <= double.MaxValue))
        {
            Refuse(standardDeviation);
        }

        return standardDeviation == 0.0 ? integrand.Evaluate(mean) : InPairs(mean, standardDeviation, integrand);
    }

    private static void Refuse(double standardDeviation) => throw new ArgumentOutOfRangeException(nameof(standardDeviation));
}
