using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;

namespace GaussGen.Mathematics.Rules;

/// <summary>A request for a Gauss rule that comes out of the pipeline for any weight function (<see cref="Universal.UniversalRule"/>).</summary>
public abstract record UniversalRuleRequest : RuleRequest
{
    /// <summary>The smallest number of nodes.</summary>
    public const int MinimumPoints = 1;

    /// <summary>The largest number of nodes.</summary>
    public const int MaximumPoints = 64;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="MinimumPoints"/> to <see cref="MaximumPoints"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">The number of nodes is out of range.</exception>
    private protected UniversalRuleRequest(int points, BinaryFormat format, bool dropZeroWeights)
        : base(format, dropZeroWeights) =>
        Points = Parameters.RequireCount(points, MinimumPoints, MaximumPoints, "The number of points", nameof(points));

    /// <summary>The number of nodes.</summary>
    public int Points { get; }
}
