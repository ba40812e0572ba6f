using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Benchmarks;

/// <summary>
/// The largest error of a table's entries in units in the last place, for the certified construction and for the eigenvalue method, against
/// enclosures of 400 bits. A node of zero is left out: a unit in its last place means nothing.
/// </summary>
internal static class AccuracyComparison
{
    private const int ReferencePrecision = 400;

    internal static void Run()
    {
        Console.WriteLine("       certified, ulp        eigenvalues, ulp");
        Console.WriteLine("n      nodes   weights       nodes   weights   weights above 1e-10");
        foreach (int points in new[] { 5, 20, 64, 200 })
        {
            RoundedRule ours = ConstructionBenchmarks.CertifiedRule(points);
            (double[] nodes, double[] weights) = ConstructionBenchmarks.EigenvalueRule(points);
            double[] likely = ours.Weights.Select((weight, i) => ToDouble(weight.Bits) > 1e-10 ? weights[i] : double.NaN).ToArray();
            Console.WriteLine(string.Format(
                CultureInfo.InvariantCulture,
                "{0,-6} {1,5:F3}   {2,7:F3}     {3,7:G3}   {4,7:F0}   {5,19:F0}",
                points,
                LargestError(ours.Table.Nodes, ours.Nodes.Select(node => ToDouble(node.Bits))),
                LargestError(ours.Table.Weights, ours.Weights.Select(weight => ToDouble(weight.Bits))),
                LargestError(ours.Table.Nodes, nodes),
                LargestError(ours.Table.Weights, weights),
                LargestError(ours.Table.Weights, likely)));
        }
    }

    private static double LargestError(IReadOnlyList<RealNumber> truth, IEnumerable<double> found) =>
        truth.Zip(found, Error).Max();

    /// <summary>The distance in units in the last place of the true value; NaN stands for an entry that is not asked about.</summary>
    private static double Error(RealNumber truth, double found)
    {
        Ball reference = truth.Enclose(ReferencePrecision, CancellationToken.None);
        if (double.IsNaN(found) || reference.ContainsZero)
        {
            return 0;
        }

        ulong bits = BinaryFormat.Binary64.Round(reference.Center);
        double unit = Math.BitIncrement(Math.Abs(ToDouble(bits))) - Math.Abs(ToDouble(bits));
        Dyadic distance = Dyadic.Abs(reference.Center - BinaryFormat.Binary64.ValueOf(BitConverter.DoubleToUInt64Bits(found)));
        return ToDouble(BinaryFormat.Binary64.Round(distance)) / unit;
    }

    private static double ToDouble(ulong bits) => BitConverter.UInt64BitsToDouble(bits);
}
