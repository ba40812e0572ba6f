using System;
using System.Linq;
using System.Threading;
using BenchmarkDotNet.Attributes;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace GaussGen.Benchmarks;

/// <summary>
/// A Gauss–Hermite table from nothing: ours to the last correctly rounded and proven binary64 value, against the set-up that a
/// program would do at start, the symmetric eigenvalue decomposition of the recurrence's matrix (Golub and Welsch 1969).
/// </summary>
[MemoryDiagnoser]
public class ConstructionBenchmarks
{
    [Params(5, 20, 64, 200, 1000)]
    public int Points { get; set; }

    [Benchmark(Baseline = true, Description = "eigenvalues, unproven")]
    public double Eigenvalues()
    {
        (double[] nodes, double[] weights) = EigenvalueRule(Points);
        return nodes[0] + weights[0];
    }

    [Benchmark(Description = "certified, correctly rounded")]
    public RoundedRule Certified() => CertifiedRule(Points);

    internal static (double[] Nodes, double[] Weights) EigenvalueRule(int points)
    {
        Matrix<double> jacobi = Matrix<double>.Build.Dense(points, points);
        for (int k = 1; k < points; k++)
        {
            jacobi[k - 1, k] = jacobi[k, k - 1] = Math.Sqrt(k);
        }

        Evd<double> decomposition = jacobi.Evd(Symmetricity.Symmetric);
        double[] nodes = decomposition.EigenValues.Select(value => value.Real).ToArray();
        double[] weights = decomposition.EigenVectors.Row(0).Select(component => component * component).ToArray();
        return (nodes, weights);
    }

    internal static RoundedRule CertifiedRule(int points)
    {
        var request = new GaussHermiteRequest(points, Mathematics.Rules.HermiteConvention.Probabilist, BinaryFormat.Binary64, DropZeroWeights: false);
        return RuleRounding.Round(request.Construct(CancellationToken.None), request.Format, request.DropZeroWeights, CancellationToken.None);
    }
}
