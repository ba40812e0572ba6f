namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>Sums over every member that users call, of a table on the type Echo that has a mistake; a variable error is at hand.</summary>
internal static class Uses
{
    /// <summary>All ways in which a rule of some family, with or without an estimate of the error, can be used.</summary>
    public const string OfRule =
        "Echo.PointCount + Echo.DegreeOfExactness + Echo.Nodes[0] + Echo.Weights[0] + Echo.CompanionNodes[0] + Echo.CompanionWeights[0]"
        + " + Echo.Expectation(1, 2, x => x) + Echo.Expectation(2, x => x) + Echo.Expectation(x => x) + Echo.Integral(x => x)"
        + " + Echo.Expectation(1, 2, new Square()) + Echo.Expectation(2, new Square()) + Echo.Expectation(new Square()) + Echo.Integral(new Square())"
        + " + Echo.ExpectationWithError(1, 2, x => x, out error) + Echo.ExpectationWithError(2, x => x, out error)"
        + " + Echo.ExpectationWithError(x => x, out error) + Echo.ExpectationWithError(1, 2, new Square(), out error)"
        + " + Echo.ExpectationWithError(2, new Square(), out error) + Echo.ExpectationWithError(new Square(), out error)";

    public const string OfConstant = " + Echo.NormalizingIntegral";

    public const string OfMoments = "Echo.Raw[1] + Echo.Central.Length + Echo.Absolute[2] + Echo.Raw4 + Echo.Central0 + Echo.Absolute3";
}
