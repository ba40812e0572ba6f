using System;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>The theorems behind the certificate, tried on points that are far from good: what it encloses must hold the true numbers.</summary>
public class NodeCertificateTests
{
    [Fact]
    public void Enclosures_from_any_isolated_points_contain_the_true_nodes_and_weights()
    {
        var random = new Random(20260301);
        WeightFunction[] weights = [new HalfRangeWeight(), Well(), Mixture()];
        int certified = 0;
        foreach (WeightFunction weight in weights)
        {
            foreach (int n in new[] { 2, 3, 7, 16, 24 })
            {
                GaussEnclosures truth = GaussRule.Of(weight, n).At(320, default);
                Recurrence recurrence = weight.Recurrence(n, 160, default);
                for (int round = 0; round < 20; round++)
                {
                    certified += AssertRound(recurrence, truth, random.Next(8, 60), random.Next(60, 200), random);
                }
            }
        }

        // The points must often be good enough, or nothing was tested.
        Assert.True(certified > 1000, certified + " nodes were certified");
    }

    [Fact]
    public void Points_that_miss_a_node_are_not_isolated()
    {
        WeightFunction weight = Mixture();
        Recurrence recurrence = weight.Recurrence(5, 160, default);
        GaussEnclosures truth = GaussRule.Of(weight, 5).At(160, default);
        for (int i = 0; i < 4; i++)
        {
            // Half-way between two nodes.
            Dyadic middle = (truth.Nodes[i].Center + truth.Nodes[i + 1].Center).ScaleByPowerOfTwo(-1);
            Dyadic gap = truth.Nodes[i + 1].Center - middle;
            var point = new NodeCertificate.Point(middle, MonicPolynomials.At(recurrence, middle, 160, 120));
            Assert.False(NodeCertificate.IsIsolated(in point, gap));
        }
    }

    private static int AssertRound(Recurrence recurrence, GaussEnclosures truth, int error, int precision, Random random)
    {
        int n = recurrence.Count;
        Ball norm = Ball.FromInteger(1);
        for (int k = 1; k < n; k++)
        {
            norm = Ball.Multiply(norm, recurrence.Square(k), 160);
        }

        NodeCertificate.Point[] points = [.. truth.Nodes.Select(node =>
        {
            Dyadic at = node.Center + new Dyadic(random.Next(-1000, 1001), -10 - error);
            return new NodeCertificate.Point(at, MonicPolynomials.At(recurrence, at, precision, precision));
        })];
        Dyadic Gap(int i) => Enumerable.Range(0, n).Where(j => j != i).Min(j => Dyadic.Abs(points[j].At - points[i].At));
        if (!Enumerable.Range(0, n).All(i => NodeCertificate.IsIsolated(in points[i], Gap(i))))
        {
            return 0;
        }

        for (int i = 0; i < n; i++)
        {
            Ball node = NodeCertificate.Node(in points[i], Gap(i), precision, out Bound distance);
            Assert.True(Overlap(node, truth.Nodes[i]), $"node {i} of {n}, error 2^-{error}, {precision} bits");
            Assert.True(distance.ToDyadic() >= Dyadic.Abs(truth.Nodes[i].Center - points[i].At) - truth.Nodes[i].Radius.ToDyadic());
            Ball weight = NodeCertificate.Weight(in points[i], Gap(i), distance, n, norm, precision);
            Assert.True(!weight.IsFinite || Overlap(weight, truth.Weights[i]), $"weight {i} of {n}, error 2^-{error}, {precision} bits");
        }

        return n;
    }

    private static bool Overlap(Ball left, Ball right) => left.Lower <= right.Upper && right.Lower <= left.Upper;

    private static EvenExponentialWeight Well() => new([new Dyadic(-2, 0), new Dyadic(1, -1)]);

    private static NormalMixtureWeight Mixture() => new(
    [
        new NormalComponent(new Dyadic(3, 0), new Dyadic(-1, 0), new Dyadic(1, -1)),
        new NormalComponent(new Dyadic(7, 0), new Dyadic(2, 0), new Dyadic(3, -1)),
    ]);
}
