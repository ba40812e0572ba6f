using System.Collections.Immutable;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Generator.Declarations;

/// <summary>
/// Every family there is. A new one is its file in the mathematics, its attribute in the runtime library, and one line here.
/// </summary>
internal static class DeclarationTable
{
    public static ImmutableArray<Family> Families { get; } = ImmutableArray.Create(
        Family.OfRules("GaussHermite", read => new GaussHermiteRequest(
            read.Points(GaussHermite.MaximumPoints),
            read.Choice("Convention", HermiteConvention.Probabilist),
            read.Format(),
            read.DropZeroWeights())),
        Family.OfMoments("NormalMoments", read => new NormalMomentsRequest(
            read.Finite("mean"),
            read.Positive("standardDeviation"),
            read.MaximumOrder(NormalMomentsRequest.LargestOrder),
            read.Format())));
}
