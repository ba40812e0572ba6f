using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Proofs.Gauss;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Proves a Gauss–Hermite table entry by entry.</summary>
/// <remarks>
/// <list type="bullet">
/// <item><description>
/// A node: exact counts of the zeros beyond the two rounding midpoints of the found value (<see cref="HermiteZeroCount"/>) prove
/// that the zero of that rank, and no other, lies between them. A zero is never a midpoint itself: P is monic with integer
/// coefficients, so that its rational zeros are integers (the rational root theorem), and integers and their halves up to the
/// largest node are representable. The zeros are symmetric about 0, so a negative node must be the opposite of a proven one, bit
/// for bit, and the central node of an odd rule +0.
/// </description></item>
/// <item><description>
/// A weight: the Christoffel number at the enclosed zero (<see cref="HermiteZeroEnclosure"/>), narrowed until it lies between the
/// midpoints around one representable value.
/// </description></item>
/// <item><description>
/// A found value that fails is replaced by the right one: the zero is isolated by exact counts, narrowed by the interval Newton
/// method until its rounding is decided, and that rounding is proven like any found one.
/// </description></item>
/// <item><description>
/// With zero weights dropped, the weight of every zero is enclosed, also of those that were left out; exactly those that do not
/// round to zero are expected.
/// </description></item>
/// <item><description>
/// A companion rule goes the road of all other rules (<see cref="RuleSearch"/>).
/// </description></item>
/// </list>
/// </remarks>
internal sealed class HermiteProof
{
    private readonly GaussHermiteClaim _claim;
    private readonly ProofReport _report;
    private readonly HermiteZeroSearch _search;
    private readonly IReadOnlyList<ulong> _foundNodes;
    private readonly IReadOnlyList<ulong> _foundWeights;

    public HermiteProof(GaussHermiteClaim claim, TableData data)
    {
        _claim = claim;
        _report = new ProofReport(claim, data);
        _search = new HermiteZeroSearch(claim);
        _foundNodes = _report.Span("Nodes");
        _foundWeights = _report.Span("Weights");
    }

    public TableProof Run(IProgress<double>? progress, CancellationToken cancellation)
    {
        double share = _claim.HasErrorEstimate ? 0.5 : 1;
        int half = _claim.Points / 2;
        int first = 1 - (_claim.Points & 1);
        var outward = new List<(KnownNumber Node, KnownNumber Weight)>();
        Dyadic beyond = Dyadic.Zero;
        int dropped = 0;
        for (int rank = first; rank <= half; rank++)
        {
            cancellation.ThrowIfCancellationRequested();
            (KnownNumber Node, KnownNumber Weight) entry = _search.Find(rank, Hints(rank), cancellation);
            if (_claim.DropZeroWeights && entry.Weight.Bits == 0)
            {
                dropped += rank == 0 ? 1 : 2;
                beyond = entry.Node.Upper;
            }
            else
            {
                outward.Add(entry);
            }

            progress?.Report(share * (rank - first + 1) / (half - first + 1));
        }

        List<(KnownNumber Node, KnownNumber Weight)> ascending = Mirror(outward);
        List<KnownNumber> nodes = ascending.ConvertAll(entry => entry.Node);
        List<KnownNumber> weights = ascending.ConvertAll(entry => entry.Weight);
        _report.Integer("PointCount", ascending.Count);
        _report.Integer("DegreeOfExactness", (2 * _claim.Points) - 1);
        _report.Entries("Nodes", _foundNodes, nodes);
        _report.Entries("Weights", _foundWeights, weights);
        JudgeScaling(cancellation);
        var judge = new RuleJudge(_report, _claim.Format, _claim.DropZeroWeights);
        FoundRule? companion = _claim.HasErrorEstimate ? JudgeCompanion(judge, progress, cancellation) : null;
        if (!_report.IsClean)
        {
            return _report.Finish([]);
        }

        IReadOnlyList<MomentEquation> equations =
            new HermiteMomentEquations(_claim).Check(_foundNodes, _foundWeights, dropped, beyond, cancellation);
        return _report.Finish(companion is null
            ? equations
            : [.. equations, .. judge.Equations(companion, _claim.Points, cancellation)]);
    }

    private FoundRule JudgeCompanion(RuleJudge judge, IProgress<double>? progress, CancellationToken cancellation)
    {
        _report.Constant("ErrorFactor", Known(Ball.FromDyadic(new Dyadic(1, -1))), isRequired: false);
        return judge.Judge(
            new HermiteAntiGaussSource(_claim.Points, _claim.Weight),
            "CompanionNodes",
            "CompanionWeights",
            null,
            part => progress?.Report(0.5 + (0.5 * part)),
            cancellation);
    }

    /// <summary>
    /// What carries the rule to a normal distribution: Σ wᵢ f(m + s·NodeScale·xᵢ) · ReciprocalTotalWeight, by substitution of
    /// m + s·NodeScale·x in the weight function; and the integral Σ wᵢ f(IntegralLocation + IntegralScale·xᵢ), which is the sum as it is.
    /// </summary>
    private void JudgeScaling(CancellationToken cancellation)
    {
        const int Precision = 256;
        Ball one = Ball.FromInteger(1);
        bool isDensity = _claim.Weight == HermiteWeight.StandardNormalDensity;
        Ball scale = isDensity ? one : Constants.Sqrt2(Precision);
        Ball reciprocal = isDensity ? one : Ball.Divide(one, Constants.SqrtPi(Precision, cancellation), Precision);
        _report.Constant("NodeScale", Known(scale), isRequired: false);
        _report.Constant("ReciprocalTotalWeight", Known(reciprocal), isRequired: false);
        _report.Constant("IntegralLocation", Known(Ball.FromInteger(0)), isRequired: false);
        _report.Constant("IntegralScale", Known(one), isRequired: false);
    }

    private KnownNumber Known(Ball value) => new(value.Lower, value.Upper, NearestValue.Of(_claim.Format, value));

    /// <summary>
    /// Found values that may be the node of a rank: at its place above the centre, and the opposite of the one at its place
    /// below. They only save the search for the zero; nothing is believed of them.
    /// </summary>
    private IEnumerable<ulong> Hints(int rank)
    {
        int left = _claim.DropZeroWeights ? (_claim.Points - _foundNodes.Count) / 2 : 0;
        int above = (_claim.Points / 2) - 1 + (_claim.Points & 1) + rank - left;
        int below = (_claim.Points / 2) - rank - left;
        if (above >= 0 && above < _foundNodes.Count)
        {
            yield return _foundNodes[above];
        }

        if (below >= 0 && below < _foundNodes.Count)
        {
            yield return _claim.Format.Negate(_foundNodes[below]);
        }
    }

    /// <summary>All entries in ascending order, from those at and above the centre.</summary>
    private List<(KnownNumber Node, KnownNumber Weight)> Mirror(List<(KnownNumber Node, KnownNumber Weight)> outward)
    {
        int center = _claim.Points & 1;
        var ascending = new List<(KnownNumber Node, KnownNumber Weight)>((2 * outward.Count) - center);
        for (int index = outward.Count - 1; index >= center; index--)
        {
            (KnownNumber node, KnownNumber weight) = outward[index];
            ulong? bits = node.Bits is ulong known ? _claim.Format.Negate(known) : null;
            ascending.Add((new KnownNumber(-node.Upper, -node.Lower, bits), weight));
        }

        ascending.AddRange(outward);
        return ascending;
    }
}
