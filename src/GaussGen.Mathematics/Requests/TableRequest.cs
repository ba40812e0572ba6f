using System.Threading;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Sequences;

namespace GaussGen.Mathematics.Requests;

/// <summary>
/// What is wanted, in the mathematics' own words. Two equal requests have the same table, so a request is the key under
/// which results are remembered; nothing of the source text that asked for it is in it.
/// </summary>
/// <param name="Format">The number format of every entry.</param>
public abstract record TableRequest(BinaryFormat Format)
{
    /// <summary>
    /// What the table promises, in the words of a baseline; the same as the title of the claim that is proven of it. <c>null</c> for a
    /// family of which nothing is proven in assemblies: no baseline can have its tables.
    /// </summary>
    public virtual string? Claim => null;
}

/// <summary>A request for nodes and weights on the real line.</summary>
/// <param name="Format">The number format of every entry.</param>
/// <param name="DropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
public abstract record RuleRequest(BinaryFormat Format, bool DropZeroWeights) : TableRequest(Format)
{
    /// <summary>Whether the rule is to have a companion that estimates its error; see <see cref="RuleTable.Companion"/>.</summary>
    public bool ErrorEstimate { get; init; }

    /// <summary>Constructs the rule, before rounding.</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public abstract RuleTable Construct(CancellationToken cancellation);
}

/// <summary>A request for the moments of a distribution.</summary>
/// <param name="Format">The number format of every entry.</param>
public abstract record MomentRequest(BinaryFormat Format) : TableRequest(Format)
{
    /// <summary>Constructs the moments, before rounding.</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public abstract MomentTable Construct(CancellationToken cancellation);
}

/// <summary>A request for named lists of numbers that are neither a rule nor the moments of a distribution.</summary>
/// <param name="Format">The number format of every entry.</param>
public abstract record SequenceRequest(BinaryFormat Format) : TableRequest(Format)
{
    /// <summary>Constructs the lists, before rounding.</summary>
    /// <exception cref="System.OperationCanceledException">The token was cancelled.</exception>
    public abstract SequenceTable Construct(CancellationToken cancellation);
}
